package view

import (
	. "hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// The marks beside what is said of the way, drawn in a square of 32: a wheel
// on a slope that gets away, one with a chock before it, a winding, a cell, a
// crank, a way there and back.
const (
	markStarts = "M3 29L29 19M9 17a6.5 6.5 0 1 0 13 0a6.5 6.5 0 1 0-13 0M20 7L28 4M23.5 2L28 4L26 8.5"
	markStays  = "M3 29L29 19M9 17a6.5 6.5 0 1 0 13 0a6.5 6.5 0 1 0-13 0M23 21.5V12L29 19"
	markHeat   = "M3 24H7M25 24H29M7 24C5 10 13 6 12 16C11 26 17 26 16 16C15 6 22 6 21 16C20 24 24 24 25 24"
	markCharge = "M9 7H23V29H9ZM13 7V3H19V7M12 25H20M12 20H20"
	markLegs   = "M11 16a5 5 0 1 0 10 0a5 5 0 1 0-10 0M19.5 19.5L26 26M22 28L30 24M12.5 12.5L6 6M2 8L10 4"
	markTour   = "M5 14C9 5 21 4 26 11M27 4L26 11L19 10M27 18C23 27 11 28 6 21M5 28L6 21L13 22"
)

// onWay is what happens on the way: the start from rest, how long the motor
// holds, the charge, the legs, the whole of a round trip.
func (v *viewer) onWay() *Node {
	if v.Answer == nil {
		return region("section", "way", Bare("hidden"))
	}
	a := v.Answer
	start, shape := "starts", markStarts
	if !a.Start.OK {
		start, shape = "stays", markStays
	}
	hold := v.HoldLine(a)
	if motor := v.MotorLine(&a.Hardest.Running); hold != "" && motor != "" {
		hold += " " + motor
	}
	return region("section", "way", With("aria-labelledby", "way-title"),
		El("h2", ID("way-title"), v.say(words.HeadOnWay)),
		El("ul", Class("way-list"),
			wayLine(start, shape, v.StartLine(v.Rig, &a.Start)),
			wayLine("", markHeat, hold),
			wayLine("", markCharge, v.ChargeLine(a)),
			wayLine("", markLegs, v.LegsLine(v.Rig, a)),
			wayLine("", markTour, v.TourLine(&v.Question, a))))
}

// wayLine is one thing said, with its mark; nothing where there is nothing to
// say.
func wayLine(class, mark, text string) *Node {
	if text == "" {
		return nil
	}
	return El("li", If(class != "", Class(class)),
		SVG(Class("way-mark"), With("viewBox", "0 0 32 32"), With("width", "32"), With("height", "32"), With("aria-hidden", "true"), El("path", With("d", mark))),
		El("p", Text(text)))
}
