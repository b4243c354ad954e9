package draw

import (
	"math"
	"strconv"
	"strings"

	"hillwright/wasm/dom"
)

// attr reads an attribute as a number; ok is false where there is none.
func attr(n *dom.Node, name string) (float64, bool) {
	s, ok := n.Attr(name)
	if !ok {
		return 0, false
	}
	x, err := strconv.ParseFloat(s, 64)
	return x, err == nil
}

// classed gives the nodes of a class.
func classed(n *dom.Node, class string) []*dom.Node {
	var out []*dom.Node
	n.Walk(func(k *dom.Node) {
		names, _ := k.Attr("class")
		for _, c := range strings.Fields(names) {
			if c == class {
				out = append(out, k)
			}
		}
	})
	return out
}

// step is one drawing step of a path, in absolute coordinates.
type step struct {
	op   byte
	x, y float64
}

// steps reads a path's data strictly, as it is written here: absolute
// commands, plain decimals without exponent and with one decimal at most.
func steps(t fataler, d string) []step {
	t.Helper()
	count := map[byte]int{'M': 2, 'L': 2, 'H': 1, 'V': 1, 'Z': 0, 'C': 6, 'Q': 4, 'A': 7}
	var out []step
	var x, y, x0, y0 float64
	for len(d) > 0 {
		op := d[0]
		n, known := count[op]
		if !known || len(out) == 0 && op != 'M' {
			t.Fatalf("path has %q at %q", op, d[:min(len(d), 20)])
		}
		end := strings.IndexAny(d[1:], "MLHVZCQA") + 1
		if end == 0 {
			end = len(d)
		}
		fields := strings.Fields(d[1:end])
		if len(fields) != n {
			t.Fatalf("%c wants %d numbers, has %q", op, n, d[1:end])
		}
		var v []float64
		for _, f := range fields {
			z, err := strconv.ParseFloat(f, 64)
			if err != nil || math.IsNaN(z) || math.IsInf(z, 0) || strings.ContainsAny(f, "eE+") || f == "-0" {
				t.Fatalf("%q is no coordinate", f)
			}
			if _, part, _ := strings.Cut(f, "."); len(part) > 1 {
				t.Fatalf("%q has more than a tenth", f)
			}
			v = append(v, z)
		}
		switch op {
		case 'H':
			x = v[0]
		case 'V':
			y = v[0]
		case 'Z':
			x, y = x0, y0
		default:
			x, y = v[n-2], v[n-1]
		}
		if op == 'M' {
			x0, y0 = x, y
		}
		out = append(out, step{op, x, y})
		d = d[end:]
	}
	return out
}

// said is a text of a picture with the room that it takes.
type said struct {
	text string
	box  box
}

func texts(n *dom.Node) []said {
	var out []said
	n.Walk(func(k *dom.Node) {
		if k.Tag != "text" {
			return
		}
		l := label{anchor: fromStart, px: wordsPx}
		l.x, _ = attr(k, "x")
		l.y, _ = attr(k, "y")
		if px, ok := attr(k, "font-size"); ok {
			l.px = px
		}
		if a, ok := k.Attr("text-anchor"); ok {
			l.anchor = a
		}
		l.class, _ = k.Attr("class")
		for _, kid := range k.Kids {
			l.lines = append(l.lines, kid.Words())
		}
		out = append(out, said{k.Words(), l.box()})
	})
	return out
}

// checkPicture checks what holds for every picture: paths well formed, no
// number missing, texts of legible size inside the box, none over another.
func checkPicture(t fataler, n *dom.Node) {
	t.Helper()
	view, _ := n.Attr("viewBox")
	f := strings.Fields(view)
	w, _ := strconv.ParseFloat(f[2], 64)
	h, _ := strconv.ParseFloat(f[3], 64)
	n.Walk(func(k *dom.Node) {
		for _, a := range k.Attrs {
			if strings.Contains(a.Value, "NaN") || strings.Contains(a.Value, "Inf") {
				t.Fatalf("<%s> has %s=%q", k.Tag, a.Name, a.Value)
			}
			if a.Name == "style" {
				t.Fatalf("<%s> has a style, which the page's policy forbids", k.Tag)
			}
			if a.Name == "font-size" {
				if px, _ := strconv.ParseFloat(a.Value, 64); px < 12 {
					t.Fatalf("type of %s px", a.Value)
				}
			}
		}
		if d, ok := k.Attr("d"); ok {
			steps(t, d)
		}
	})
	all := texts(n)
	for i, a := range all {
		if !a.box.within(box{-0.2, -0.2, w + 0.2, h + 0.2}) {
			t.Fatalf("%q at %v reaches out of %v × %v", a.text, a.box, w, h)
		}
		for _, b := range all[i+1:] {
			if a.box.grown(-0.3).overlaps(b.box.grown(-0.3)) {
				t.Fatalf("%q at %v lies over %q at %v", a.text, a.box, b.text, b.box)
			}
		}
	}
}
