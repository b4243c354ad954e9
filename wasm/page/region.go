//go:build js && wasm

package page

import (
	"github.com/hexops/vecty"

	"hillwright/wasm/dom"
)

// book holds the page as it should be: every region's latest tree and its
// revision, and the component that shows it.
type book struct {
	nodes     map[string]*dom.Node
	revisions map[string]int
	shown     map[string]*region
	last      int // revisions are unique over all regions
	born      int
}

func newBook() *book {
	return &book{nodes: map[string]*dom.Node{}, revisions: map[string]int{}, shown: map[string]*region{}}
}

// whole is the name of the region that holds all others.
const whole = "page"

func regionOf(n *dom.Node) string {
	name, _ := n.Attr("data-region")
	return name
}

// few is how many regions are rendered one by one. The library gives each frame
// only so much time and leaves the rest to later ones: more than a few regions
// are rendered in one go from the top instead, so that none shows an older
// state beside the others.
const few = 3

// take compares a new tree with the last one and renders anew the regions that
// differ.
func (b *book) take(tree *dom.Node) {
	found := &differences{}
	b.compare(whole, tree, found)
	again := found.own
	if len(again) > few {
		for _, name := range found.above {
			b.revise(name)
		}
		again = []string{whole}
	}
	for _, name := range found.own {
		b.revise(name)
	}
	for _, name := range again {
		if r := b.shown[name]; r != nil {
			r.Revision = b.revisions[name]
			vecty.Rerender(r)
		}
	}
}

// differences are the regions that differ by themselves, and those that hold
// such ones.
type differences struct{ own, above []string }

func (b *book) compare(name string, n *dom.Node, found *differences) {
	was := b.nodes[name]
	b.nodes[name] = n
	before := len(found.own)
	b.inside(n, found)
	if len(found.own) > before {
		found.above = append(found.above, name)
	}
	if was == nil || !b.same(was, n, true) {
		found.own = append(found.own, name)
	}
}

func (b *book) inside(n *dom.Node, found *differences) {
	for _, kid := range n.Kids {
		if name := regionOf(kid); name != "" {
			b.compare(name, kid, found)
		} else {
			b.inside(kid, found)
		}
	}
}

func (b *book) revise(name string) {
	b.last++
	b.revisions[name] = b.last
}

// same tells whether two trees are alike; a region inside counts by its name
// alone, since it renders itself.
func (b *book) same(x, y *dom.Node, root bool) bool {
	if x == y {
		return true
	}
	if !root {
		if name := regionOf(x); name != "" {
			return name == regionOf(y)
		}
	}
	if x.Tag != y.Tag || x.Text != y.Text || len(x.Attrs) != len(y.Attrs) || len(x.Kids) != len(y.Kids) {
		return false
	}
	for i := range x.Attrs {
		if x.Attrs[i] != y.Attrs[i] {
			return false
		}
	}
	for i := range x.Kids {
		if !b.same(x.Kids[i], y.Kids[i], false) {
			return false
		}
	}
	return true
}

// root is what is mounted in place of the first paint.
type root struct {
	vecty.Core
	Book *book `vecty:"prop"`
}

// Render implements vecty.Component.
func (r *root) Render() vecty.ComponentOrHTML {
	return vecty.Tag("div", vecty.Markup(vecty.Attribute("id", "app")), r.Book.component(whole))
}

// region is one part of the page. It reads its tree from the book when it is
// rendered, so that it never shows an older one.
type region struct {
	vecty.Core
	Book     *book  `vecty:"prop"`
	Name     string `vecty:"prop"`
	Revision int    `vecty:"prop"`
	born     int    // numbers components as they are made; no prop: it stays what it was
}

func (b *book) component(name string) *region {
	b.born++
	return &region{Book: b, Name: name, Revision: b.revisions[name], born: b.born}
}

// SkipRender implements vecty.RenderSkipper.
func (r *region) SkipRender(prev vecty.Component) bool {
	p, ok := prev.(*region)
	return ok && p.Revision == r.Revision
}

// Render implements vecty.Component.
func (r *region) Render() vecty.ComponentOrHTML {
	// A component that moved to another place among its siblings is made anew,
	// and the library may still render the old one once more: the newest counts.
	if was := r.Book.shown[r.Name]; was == nil || was.born <= r.born {
		r.Book.shown[r.Name] = r
	}
	r.Revision = r.Book.revisions[r.Name]
	n := r.Book.nodes[r.Name]
	return r.Book.element(n, inPicture(n))
}

// inPicture tells that a region's own element is a part of an SVG picture.
func inPicture(n *dom.Node) bool { return n.Tag == "g" }

// html turns a node into the library's; a region inside becomes a component.
func (b *book) html(n *dom.Node, svg bool) vecty.ComponentOrHTML {
	if n.Tag == "" {
		return vecty.Text(n.Text)
	}
	if name := regionOf(n); name != "" {
		return b.component(name)
	}
	return b.element(n, svg)
}

func (b *book) element(n *dom.Node, svg bool) *vecty.HTML {
	svg = svg || n.Tag == "svg"
	field := n.Tag == "input" || n.Tag == "textarea"
	var marks []vecty.Applyer
	if svg {
		// Children do not inherit the namespace: every element is told.
		marks = append(marks, vecty.Namespace(dom.SVGNamespace))
	}
	for _, a := range n.Attrs {
		switch {
		case a.Name == "xmlns":
		case a.Name == "value" && field:
			// The attribute is only a field's first value.
			marks = append(marks, vecty.Property("value", a.Value))
		default:
			marks = append(marks, vecty.Attribute(a.Name, a.Value))
		}
	}
	if n.Tag == "textarea" {
		return vecty.Tag(n.Tag, vecty.Markup(append(marks, vecty.Property("value", n.Words()))...))
	}
	parts := make([]vecty.MarkupOrChild, 1, len(n.Kids)+1)
	parts[0] = vecty.Markup(marks...)
	for _, kid := range n.Kids {
		parts = append(parts, b.html(kid, svg))
	}
	return vecty.Tag(n.Tag, parts...)
}
