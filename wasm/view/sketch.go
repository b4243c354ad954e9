package view

import (
	"strconv"

	. "hillwright/wasm/dom"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// sketch is where a hill is drawn with a finger.
func (v *viewer) sketch() *Node {
	w, h := coordinate(state.SketchWide), coordinate(state.SketchTall)
	lengths := Parts{}
	for _, m := range state.SketchLengths() {
		lengths = append(lengths, v.one(state.SketchLong, coordinate(m), Text(v.Length(m)), v.Drawn.LongM == m))
	}
	line := ""
	for i, p := range v.Drawn.Points {
		line += map[bool]string{true: "M", false: "L"}[i == 0] + coordinate(p.X) + " " + coordinate(p.Y)
	}
	return El("details", Class("sketch"), El("summary", v.say(words.HillDraw)),
		El("p", Class("hint"), v.say(words.HillDrawHelp)),
		El("div", Class("one-of"), With("role", "group"), With("aria-label", v.Voice.Say(words.LabelLength)), lengths),
		SVG(Class("pad"), With("viewBox", "0 0 "+w+" "+h), With("role", "img"), With("aria-label", v.Voice.Say(words.HillDrawn)), With("font-size", "13"),
			El("path", Class("base"), With("d", "M0 "+h+"H"+w)),
			El("path", Class("ordinate"), With("d", "M0 "+h+"L"+w+" "+coordinate(state.SketchTall/2)+"M0 "+h+"L"+w+" 0")),
			El("text", Class("quiet"), With("x", w), With("y", coordinate(state.SketchTall/2+16)), With("text-anchor", "end"), Text(v.Grade(0.10))),
			El("text", Class("quiet"), With("x", w), With("y", "16"), With("text-anchor", "end"), Text(v.Grade(0.20))),
			El("path", Class("road"), With("d", line)),
			El("rect", Class("touch"), Act(state.Sketch, ""), With("x", "0"), With("y", "0"), With("width", w), With("height", h))),
		button("plain", state.SketchClear, "", v.say(words.HillDrawAgain)),
	)
}

func coordinate(x float64) string { return strconv.FormatFloat(x, 'f', 0, 64) }
