package draw

import (
	"math"

	"hillwright/physics/brake"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// Measures of the brakes' picture [px].
const (
	barTall  = 16.0
	barPitch = bandWords + barTall + 8
	barRoom  = 1.3 // the scale reaches so many times as far as the highest caution
)

// Brakes draws how warm the brakes get on the way down against the temperature
// at which a rider should be told: a bar for each brake that there is, hatched
// openly below its caution, solid beyond. nil where nothing falls.
func Brakes(d *ride.WayDown, r *rig.Rig, wide float64, v words.Voice) *dom.Node {
	if !d.Falls {
		return nil
	}
	bars := []struct {
		name  words.Key
		kind  *brake.Kind
		peakC float64
	}{{words.InFrontBrake, &r.Front, d.FrontPeakC}, {words.InRearBrake, &r.Rear, d.RearPeakC}}
	airC, mostC := float64(r.Day.TemperatureC), 0.0
	for _, b := range bars {
		if !b.kind.None() {
			mostC = math.Max(mostC, math.Max(airC+barRoom*(b.kind.CautionC.Usual-airC), b.peakC))
		}
	}
	from, to := sectionSide, wide-sectionSide
	x := func(c float64) float64 { return from + (to-from)*clampTo((c-airC)/(mostC-airC), 0, 1) }
	var parts dom.Parts
	top, said := 0.0, ""
	for _, b := range bars {
		if b.kind.None() {
			continue
		}
		cautionC := b.kind.CautionC.Usual
		name, peak := v.Say(b.name), v.Temperature(unit.Celsius(b.peakC))
		caution := v.Say(words.BrakeCaution, v.Temperature(unit.Celsius(cautionC)))
		if said != "" {
			said += "; "
		}
		said += name + ": " + peak + " (" + caution + ")"
		ceiling, floor := top+bandWords, top+bandWords+barTall
		var frame, bar, mark path
		frame.rect(box{from, ceiling, to, floor})
		if b.peakC > airC {
			bar.rect(box{from, ceiling, x(b.peakC), floor})
		}
		mark.move(x(cautionC), ceiling-3)
		mark.upTo(floor + 3)
		hatching := "open"
		if b.peakC > cautionC {
			hatching = "solid"
		}
		parts = append(parts,
			bar.node("ground-"+hatching, dom.With("fill", "url(#hatch-"+hatching+")")), frame.node("band-frame"), mark.node("bar-mark"),
			label{lines: []string{name + " · " + caution}, x: from, y: top + 12, px: smallPx, class: "words"}.node(),
			label{lines: []string{peak}, x: to, y: top + 12, px: smallPx, anchor: fromEnd, class: "figure"}.node())
		top += barPitch
	}
	return picture("img", "brakes", v.Say(words.GroupBrakes), said+".", Size{wide, top}, parts)
}
