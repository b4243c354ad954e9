package draw

import (
	"math"

	"hillwright/wasm/dom"
)

// Ruler is one number on a scale: the band that it was taken to be in, and the
// interval that was measured. Held tells that the measurement alone could not
// tell it. Value is how the number is written, with its unit.
type Ruler struct {
	ID, Title, Value    string
	PriorLow, PriorHigh float64
	Low, Is, High       float64
	Held                bool
	Write               func(float64) string
}

// DragRuler draws a ruler: the scale, the band hatched, the measured interval
// as a surveyor's bracket with a full mark at the number, broken where it is
// held.
func DragRuler(r Ruler, s Size) *dom.Node {
	const left, right, base = 14.0, 14.0, 58.0
	low, high := math.Min(r.PriorLow, r.Low), math.Max(r.PriorHigh, r.High)
	if !(high > low) {
		return nil
	}
	pad := 0.12 * (high - low)
	low, high = math.Max(0, low-pad), high+pad
	x := func(v float64) float64 {
		return left + clampTo((v-low)/(high-low), 0, 1)*(s.W-left-right)
	}
	var scale, prior, bracket, mark path
	scale.move(left, base)
	scale.across(s.W - right)
	prior.rect(box{x(r.PriorLow), base - 14, x(r.PriorHigh), base})
	a, b := x(r.Low), x(r.High)
	if b-a < 6 {
		a, b = (a+b)/2-3, (a+b)/2+3
	}
	bracket.move(a, base-2)
	bracket.upTo(base - 26)
	bracket.across(b)
	bracket.upTo(base - 2)
	middle := x(r.Is)
	mark.move(middle, base-16)
	mark.line(middle+6, base-26)
	mark.line(middle, base-36)
	mark.line(middle-6, base-26)
	mark.close()
	parts := dom.Parts{prior.node("ground-open", dom.With("fill", "url(#hatch-open)")), scale.node("ordinate")}
	step := tidyStep(high-low, max(2, int((s.W-left-right)/78)))
	for v := math.Ceil(low/step) * step; v <= high; v += step {
		scale := path{}
		scale.move(x(v), base)
		scale.upTo(base + 5)
		parts = append(parts, scale.node("ordinate"),
			label{lines: []string{r.Write(v)}, x: x(v), y: base + 18, px: smallPx, anchor: fromMiddle}.clamp(2, s.W-2).node())
	}
	class := "bracket"
	if r.Held {
		class = "bracket held"
	}
	parts = append(parts, bracket.node(class), mark.node("peg-binds"),
		label{lines: []string{r.Value}, x: middle, y: 14, px: wordsPx, anchor: fromMiddle, class: "figure halo"}.clamp(2, s.W-2).node())
	return picture("img", "ruler-"+r.ID, r.Title, r.Value, s, parts)
}

// Level draws how loud a recording is: a hatched bar, with uprights between
// which it is good; peak is the loudest sample lately, full scale 1.
func Level(peak float64, s Size) *dom.Node {
	x := func(v float64) float64 {
		db := clampTo(20*math.Log10(math.Max(v, 1e-5)), quietestDB, 0)
		return 4 + (db-quietestDB)/-quietestDB*(s.W-8)
	}
	var bar, frame, good path
	bar.rect(box{4, 8, x(peak), s.H - 8})
	frame.rect(box{4, 8, s.W - 4, s.H - 8})
	for _, v := range []float64{QuietPeak, LoudPeak} {
		good.move(x(v), 2)
		good.upTo(s.H - 2)
	}
	return dom.SVG(dom.Class("picture picture-level"), dom.With("viewBox", "0 0 "+num(s.W)+" "+num(s.H)), dom.With("aria-hidden", "true"),
		bar.node("ground-close", dom.With("fill", "url(#hatch-close)")), frame.node("ordinate"), good.node("stake"))
}

// Peaks between which a recording's level is good, full scale 1: −40 and −1 dB.
const (
	QuietPeak  = 0.01
	LoudPeak   = 0.89
	quietestDB = -60.0
)

// Turn draws the sound between the clicks over one turn of the wheel, as a
// strip that begins and ends at the same spoke: louder is higher; from and to
// are the ends of a part that stands out (parts of a turn), none where they are
// the same.
func Turn(levelDB []float64, from, to float64, title, desc string, s Size) *dom.Node {
	if len(levelDB) == 0 {
		return nil
	}
	low, high := -1.0, 3.0
	for _, v := range levelDB {
		low, high = math.Min(low, v), math.Max(high, v)
	}
	const left, right, top, bottom = 8.0, 8.0, 26.0, 20.0
	y := func(v float64) float64 { return s.H - bottom - (v-low)/(high-low)*(s.H-top-bottom) }
	x := func(part float64) float64 { return left + part*(s.W-left-right) }
	n := float64(len(levelDB))
	var ground, line, base, bracket path
	ground.move(x(0), s.H-bottom)
	for i, v := range levelDB {
		ground.line(x(float64(i)/n), y(v))
		ground.line(x(float64(i+1)/n), y(v))
	}
	ground.line(x(1), s.H-bottom)
	ground.close()
	for i, v := range levelDB {
		if i == 0 {
			line.move(x(0), y(v))
		} else {
			line.line(x(float64(i)/n), y(v))
		}
		line.line(x(float64(i+1)/n), y(v))
	}
	base.move(left, s.H-bottom)
	base.across(s.W - right)
	for q := range 5 {
		base.move(x(float64(q)/4), s.H-bottom)
		base.upTo(s.H - bottom + 5)
	}
	parts := dom.Parts{ground.node("ground-open", dom.With("fill", "url(#hatch-open)")), line.node("road"), base.node("ordinate")}
	if to > from {
		bracket.move(x(from), top)
		bracket.upTo(top - 10)
		bracket.across(x(to))
		bracket.upTo(top)
		parts = append(parts, bracket.node("bracket"))
	}
	for q, text := range []string{"0", "¼", "½", "¾", "1"} {
		parts = append(parts, label{lines: []string{text}, x: x(float64(q) / 4), y: s.H - 4, px: smallPx, anchor: fromMiddle}.clamp(2, s.W-2).node())
	}
	return picture("img", "turn", title, desc, s, parts)
}
