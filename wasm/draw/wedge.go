package draw

import (
	"math"

	"hillwright/physics/unit"
	"hillwright/wasm/dom"
)

// Wedge draws the ground under a road of one grade, cut open, true to its angle:
// a level line at its foot, the ground hatched. It turns about its foot, so that
// it follows a phone that is tilted. The drawing is as wide and as high as said
// [px]; it has no words of its own, they stand beside it.
func Wedge(a unit.Angle, wide, tall float64) *dom.Node {
	const edge = 10.0
	angle := math.Max(-math.Pi/2, math.Min(math.Pi/2, float64(a)))
	foot := point{edge, tall - edge}
	if angle < 0 {
		foot.y = edge
	}
	// As long as the picture holds, in the direction of the road.
	long := math.Min((wide-2*edge)/math.Max(math.Cos(angle), 1e-6), (tall-2*edge)/math.Max(math.Abs(math.Sin(angle)), 1e-6))
	top := point{foot.x + long*math.Cos(angle), foot.y - long*math.Sin(angle)}
	var ground, road, level, rise path
	ground.move(foot.x, foot.y)
	ground.line(top.x, top.y)
	ground.line(top.x, tall)
	ground.line(foot.x, tall)
	ground.close()
	road.move(foot.x, foot.y)
	road.line(top.x, top.y)
	level.move(foot.x, foot.y)
	level.across(wide - edge)
	rise.move(top.x, top.y)
	rise.upTo(foot.y)
	return dom.SVG(dom.Class("picture picture-wedge"), dom.With("viewBox", "0 0 "+num(wide)+" "+num(tall)), dom.With("aria-hidden", "true"),
		ground.node("ground-open", dom.With("fill", "url(#hatch-open)")),
		level.node("band-mark"), rise.node("ordinate"), road.node("road"))
}

// Marks puts two handles on a section, at places across it [px], for the ends
// of a stretch; act is the action that a finger on one asks for, args what it is
// about.
func Marks(section *dom.Node, s Size, act string, args [2]string, names [2]string, x [2]float64) *dom.Node {
	for i := range x {
		var line path
		line.move(0, 12)
		line.upTo(s.H - 44)
		var flag path
		side := 1.0
		if i == 0 {
			side = -1
		}
		flag.move(0, s.H-68)
		flag.line(side*26, s.H-68)
		flag.line(side*18, s.H-57)
		flag.line(side*26, s.H-46)
		flag.line(0, s.H-46)
		flag.close()
		section.Add(dom.El("g", dom.With("data-region", "mark-"+args[i]), dom.With("transform", "translate("+num(x[i])+" 0)"),
			line.node("stake"), flag.node("peg-binds"),
			dom.El("rect", dom.Class("touch"), dom.Act(act, args[i]), dom.With("role", "img"), dom.With("aria-label", names[i]),
				dom.With("x", num(side*34-34)), dom.With("y", "0"), dom.With("width", "68"), dom.With("height", num(s.H-40)))))
	}
	return section
}
