package draw

import (
	"math"
	"strings"
	"unicode"

	"hillwright/wasm/dom"
)

// box is an upright rectangle, y downward.
type box struct{ x0, y0, x1, y1 float64 }

func (b box) overlaps(c box) bool {
	return b.x0 < c.x1 && c.x0 < b.x1 && b.y0 < c.y1 && c.y0 < b.y1
}

func (b box) within(c box) bool {
	return b.x0 >= c.x0 && b.x1 <= c.x1 && b.y0 >= c.y0 && b.y1 <= c.y1
}

func (b box) grown(d float64) box { return box{b.x0 - d, b.y0 - d, b.x1 + d, b.y1 + d} }

func (b box) free(taken []box) bool {
	for _, t := range taken {
		if b.overlaps(t) {
			return false
		}
	}
	return true
}

// textWidth is about how wide words are [px] at a size of type. It goes by
// the widest of the usual system faces, so that words never take more.
func textWidth(s string, px float64) float64 {
	sum := 0.0
	for _, r := range s {
		sum += runeWidth(r)
	}
	return sum * px
}

func runeWidth(r rune) float64 {
	switch r {
	case 'i', 'j', 'l', '.', ',', ':', ';', '|', '!', '\'', '·', '\u202f', '’':
		return 0.33
	case 'f', 't', 'r', '(', ')', '-', '/', ' ', '\u00a0', 'I':
		return 0.41
	case 'm', 'w', 'M', 'W', '%', '—':
		return 0.97
	case '−', '×', '≥', '<', '>', '+', '±', '=':
		return 0.84
	}
	if unicode.IsUpper(r) {
		return 0.76
	}
	return 0.64
}

// Where the given x lies in a label.
const (
	fromStart  = "start"
	fromMiddle = "middle"
	fromEnd    = "end"
)

// label is words at a place: x where anchor says, y the base line of the first
// of the lines.
type label struct {
	lines  []string
	x, y   float64
	px     float64
	anchor string
	class  string
}

func (l label) width() float64 {
	w := 0.0
	for _, s := range l.lines {
		w = math.Max(w, textWidth(s, l.px))
	}
	if strings.HasPrefix(l.class, "figure") {
		w *= bolder
	}
	return w
}

// bolder is how much wider bold type runs.
const bolder = 1.12

func (l label) height() float64 { return float64(len(l.lines)) * l.px * lineGap }

// box is the room that the label takes.
func (l label) box() box {
	w := l.width()
	x := l.x
	switch l.anchor {
	case fromMiddle:
		x -= w / 2
	case fromEnd:
		x -= w
	}
	top := l.y - 0.95*l.px
	return box{x, top, x + w, top + l.height()}
}

// clamp moves the label sideways until it lies between two edges.
func (l label) clamp(left, right float64) label {
	b := l.box()
	if b.x1 > right {
		l.x -= b.x1 - right
		b = l.box()
	}
	if b.x0 < left {
		l.x += left - b.x0
	}
	return l
}

// at moves the label so that its box begins at a corner.
func (l label) at(left, top float64) label {
	l.anchor, l.x, l.y = fromStart, left, top+0.95*l.px
	return l
}

func (l label) node() *dom.Node {
	parts := dom.Parts{
		dom.Class(l.class),
		dom.With("x", num(l.x)), dom.With("y", num(l.y)),
		dom.If(l.px != wordsPx, dom.With("font-size", num(l.px))),
		dom.If(l.anchor != fromStart && l.anchor != "", dom.With("text-anchor", l.anchor)),
	}
	if len(l.lines) == 1 {
		return dom.El("text", parts, dom.Text(l.lines[0]))
	}
	for i, s := range l.lines {
		if i == 0 {
			parts = append(parts, dom.El("tspan", dom.Text(s)))
			continue
		}
		parts = append(parts, dom.El("tspan", dom.With("x", num(l.x)), dom.With("dy", num(l.px*lineGap)), dom.Text(s)))
	}
	return dom.El("text", parts)
}
