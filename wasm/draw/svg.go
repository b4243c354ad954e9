package draw

import (
	"math"
	"strconv"

	"hillwright/wasm/dom"
)

// Size is the size of a picture in CSS pixels; the picture's units are pixels
// at 1:1, so that its type is as large as it says. Pictures are made for
// widths from 320 to about 1200.
type Size struct{ W, H float64 }

// Sizes of type [px]: words and figures, and the smallest that is used.
const (
	wordsPx = 13.0
	smallPx = 12.0
	lineGap = 1.2 // line height in sizes of type
)

// num writes a coordinate to a tenth of a pixel, never with an exponent.
func num(x float64) string {
	r := math.Round(x * 10)
	if r == 0 || math.IsNaN(r) {
		return "0"
	}
	return strconv.FormatFloat(r/10, 'f', -1, 64)
}

type point struct{ x, y float64 }

// path gathers the data of one <path>.
type path struct{ d []byte }

func (p *path) op(letter byte, values ...float64) {
	p.d = append(p.d, letter)
	for i, v := range values {
		if i > 0 {
			p.d = append(p.d, ' ')
		}
		p.d = append(p.d, num(v)...)
	}
}

func (p *path) move(x, y float64) { p.op('M', x, y) }
func (p *path) line(x, y float64) { p.op('L', x, y) }
func (p *path) across(x float64)  { p.op('H', x) }
func (p *path) upTo(y float64)    { p.op('V', y) }
func (p *path) close()            { p.d = append(p.d, 'Z') }
func (p *path) curve(a, b, c point) {
	p.op('C', a.x, a.y, b.x, b.y, c.x, c.y)
}

// chain adds a line through points.
func (p *path) chain(points []point) {
	for i, q := range points {
		if i == 0 {
			p.move(q.x, q.y)
		} else {
			p.line(q.x, q.y)
		}
	}
}

// disc adds a filled circle.
func (p *path) disc(x, y, r float64) {
	p.move(x-r, y)
	p.op('A', r, r, 0, 1, 0, x+r, y)
	p.op('A', r, r, 0, 1, 0, x-r, y)
	p.close()
}

// rect adds a rectangle.
func (p *path) rect(b box) {
	p.move(b.x0, b.y0)
	p.across(b.x1)
	p.upTo(b.y1)
	p.across(b.x0)
	p.close()
}

// node gives the path as an element, or nil when it is empty.
func (p *path) node(class string, more ...dom.Part) *dom.Node {
	if len(p.d) == 0 {
		return nil
	}
	return dom.El("path", dom.Class(class), dom.With("d", string(p.d)), dom.Parts(more))
}

// picture makes the outermost <svg>. The role is img where nothing inside can
// be touched, group where something can.
func picture(role, id, title, desc string, s Size, parts ...dom.Part) *dom.Node {
	return dom.SVG(
		dom.Class("picture picture-"+id),
		dom.With("viewBox", "0 0 "+num(s.W)+" "+num(s.H)),
		dom.With("width", num(s.W)), dom.With("height", num(s.H)),
		dom.With("font-size", num(wordsPx)),
		dom.With("role", role),
		dom.With("aria-labelledby", id+"-title "+id+"-desc"),
		dom.El("title", dom.ID(id+"-title"), dom.Text(title)),
		dom.El("desc", dom.ID(id+"-desc"), dom.Text(desc)),
		dom.Parts(parts),
	)
}
