// Package dom is a picture of a piece of the page as plain data: a tree of
// nodes. Views make it, and two readers take it: the pack step writes it as
// HTML for the first paint, the page hands it to the component library. So
// both show the same thing, and views are tested natively.
package dom

// Node is an element, or a text when Tag is empty.
type Node struct {
	Tag   string
	Text  string
	Attrs []Attr
	Kids  []*Node
}

// Attr is one attribute. An empty Value is a bare attribute ("hidden").
type Attr struct{ Name, Value string }
