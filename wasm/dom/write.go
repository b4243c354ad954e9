package dom

import (
	"errors"
	"io"
	"strings"
)

// isVoid tells whether HTML writes the element without an end tag, and lets
// nothing stand inside it.
func isVoid(tag string) bool {
	switch tag {
	case "area", "base", "br", "col", "embed", "hr", "img", "input", "link", "meta", "source", "track", "wbr":
		return true
	}
	return false
}

// escape writes what would end a text or an attribute as entities.
func escape(s string) string {
	if !strings.ContainsAny(s, `&<>"`) {
		return s
	}
	var b strings.Builder
	for i := 0; i < len(s); i++ {
		switch s[i] {
		case '&':
			b.WriteString("&amp;")
		case '<':
			b.WriteString("&lt;")
		case '>':
			b.WriteString("&gt;")
		case '"':
			b.WriteString("&quot;")
		default:
			b.WriteByte(s[i])
		}
	}
	return b.String()
}

// WriteHTML writes the tree as HTML, SVG inside it included. It fails on what
// HTML cannot say: a name with odd signs, the same attribute twice, something
// inside a void element, and script or style, whose insides are not escaped
// and which no view has a use for. Nothing more is written after a failure.
func WriteHTML(w io.Writer, n *Node) error {
	if n == nil {
		return nil
	}
	out := &writer{to: w}
	out.node(n)
	return out.err
}

// HTML gives the tree as HTML in one string; see WriteHTML.
func HTML(n *Node) (string, error) {
	var b strings.Builder
	err := WriteHTML(&b, n)
	return b.String(), err
}

type writer struct {
	to  io.Writer
	err error
}

func (w *writer) put(parts ...string) {
	for _, s := range parts {
		if w.err != nil {
			return
		}
		_, w.err = io.WriteString(w.to, s)
	}
}

func (w *writer) fail(n *Node, what string) {
	if w.err == nil {
		w.err = errors.New("cannot write <" + n.Tag + "> as HTML: " + what)
	}
}

func (w *writer) node(n *Node) {
	if n.Tag == "" {
		w.put(escape(n.Text))
		return
	}
	if !goodName(n.Tag) {
		w.fail(n, "the name has signs that a tag cannot have")
	}
	if n.Tag == "script" || n.Tag == "style" {
		w.fail(n, "its inside would not be escaped; link a file instead")
	}
	w.put("<", n.Tag)
	for i, a := range n.Attrs {
		w.attr(n, a)
		for _, before := range n.Attrs[:i] {
			if before.Name == a.Name {
				w.fail(n, "attribute "+a.Name+" is given twice")
			}
		}
	}
	w.put(">")
	if isVoid(n.Tag) {
		if len(n.Kids) > 0 {
			w.fail(n, "nothing can stand inside it")
		}
		return
	}
	for _, kid := range n.Kids {
		w.node(kid)
	}
	w.put("</", n.Tag, ">")
}

func (w *writer) attr(n *Node, a Attr) {
	if !goodName(a.Name) {
		w.fail(n, "attribute "+a.Name+" has signs that a name cannot have")
	}
	w.put(" ", a.Name)
	if a.Value != "" {
		w.put(`="`, escape(a.Value), `"`)
	}
}

// goodName tells whether a name is one that our pages use: letters, digits,
// and - : _ inside it.
func goodName(name string) bool {
	for i := 0; i < len(name); i++ {
		c := name[i]
		letter := c >= 'a' && c <= 'z' || c >= 'A' && c <= 'Z'
		if !letter && (i == 0 || !(c >= '0' && c <= '9' || c == '-' || c == ':' || c == '_')) {
			return false
		}
	}
	return name != ""
}
