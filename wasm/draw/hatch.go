package draw

import (
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// Hatches holds the patterns of the ground, once for a page: slanting lines far
// apart for open ground, crossed and close for close ground, filled for solid.
// Upright lines are for what is bad in a strip. They differ in tone and in drawing, so they read in one colour and in print.
func Hatches() *dom.Node {
	return dom.SVG(dom.Class("hatches"),
		dom.With("width", "0"), dom.With("height", "0"), dom.With("aria-hidden", "true"), dom.With("focusable", "false"),
		dom.El("defs",
			pattern("open", 12, func(lines *path) {
				lines.move(-1, 13)
				lines.line(13, -1)
				lines.move(-1, 1)
				lines.line(1, -1)
				lines.move(11, 13)
				lines.line(13, 11)
			}),
			pattern("close", 6, func(lines *path) {
				lines.move(-1, 7)
				lines.line(7, -1)
				lines.move(-1, 1)
				lines.line(1, -1)
				lines.move(5, 7)
				lines.line(7, 5)
				lines.move(-1, -1)
				lines.line(7, 7)
			}),
			pattern("solid", 6, nil),
			pattern("upright", 4, func(lines *path) {
				lines.move(2, -1)
				lines.line(2, 5)
			}),
		))
}

func pattern(name string, side float64, draw func(*path)) *dom.Node {
	ground := "hatch-ground"
	if draw == nil {
		ground = "hatch-solid"
	}
	var lines path
	if draw != nil {
		draw(&lines)
	}
	return dom.El("pattern", dom.ID("hatch-"+name), dom.With("patternUnits", "userSpaceOnUse"),
		dom.With("width", num(side)), dom.With("height", num(side)),
		dom.El("rect", dom.Class(ground), dom.With("width", num(side)), dom.With("height", num(side))),
		lines.node("hatch-line"))
}

// Legend explains the hatching: a list of swatches with words.
func Legend(v words.Voice) *dom.Node {
	item := func(as hatch, key words.Key) *dom.Node {
		name := hatchNames[as]
		return dom.El("li",
			dom.SVG(dom.Class("swatch"), dom.With("viewBox", "0 0 28 16"), dom.With("width", "28"), dom.With("height", "16"), dom.With("aria-hidden", "true"),
				dom.El("rect", dom.Class("ground-"+name), dom.With("width", "28"), dom.With("height", "16"), dom.With("fill", "url(#hatch-"+name+")"))),
			dom.Text(" "+v.Say(key)))
	}
	return dom.El("ul", dom.Class("hatch-key"),
		item(hatchOpen, words.HatchOpen), item(hatchClose, words.HatchClose), item(hatchSolid, words.HatchSolid))
}
