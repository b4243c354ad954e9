package dom

// Part is what an element is made of: an Attr, a *Node, a Text, or Parts.
type Part interface{ addTo(*Node) }

// El makes an element of its parts, in order.
func El(tag string, parts ...Part) *Node {
	n := &Node{Tag: tag}
	for _, p := range parts {
		if p != nil {
			p.addTo(n)
		}
	}
	return n
}

// SVGNamespace is the XML namespace of SVG.
const SVGNamespace = "http://www.w3.org/2000/svg"

// SVG makes the outermost element of a picture, with its namespace.
func SVG(parts ...Part) *Node {
	return El("svg", Attr{"xmlns", SVGNamespace}, Parts(parts))
}

// Text is words inside an element.
type Text string

func (t Text) addTo(n *Node) { n.Kids = append(n.Kids, &Node{Text: string(t)}) }

// Parts is several parts as one.
type Parts []Part

func (ps Parts) addTo(n *Node) {
	for _, p := range ps {
		if p != nil {
			p.addTo(n)
		}
	}
}

// addTo hangs a node under n. A nil node adds nothing, so that a view may
// leave a piece out by returning nil.
func (k *Node) addTo(n *Node) {
	if k != nil {
		n.Kids = append(n.Kids, k)
	}
}

func (a Attr) addTo(n *Node) { n.Attrs = append(n.Attrs, a) }

// With is an attribute with a value.
func With(name, value string) Attr { return Attr{name, value} }

// Bare is an attribute without a value, such as hidden.
func Bare(name string) Attr { return Attr{Name: name} }

// Class gives an element its classes, with blanks between them.
func Class(names string) Attr { return Attr{"class", names} }

// ID names an element.
func ID(name string) Attr { return Attr{"id", name} }

// Act says which action a touch on the element asks for, and its argument.
func Act(name, arg string) Parts {
	return Parts{Attr{"data-act", name}, Attr{"data-arg", arg}}
}

// If gives the part when the condition holds, else nothing.
func If(yes bool, p Part) Part {
	if yes {
		return p
	}
	return Parts(nil)
}

// Attr gives an attribute's value, and whether the element has it.
func (k *Node) Attr(name string) (string, bool) {
	for _, a := range k.Attrs {
		if a.Name == name {
			return a.Value, true
		}
	}
	return "", false
}

// Walk calls visit for the node and all below it, in reading order.
func (k *Node) Walk(visit func(*Node)) {
	if k == nil {
		return
	}
	visit(k)
	for _, kid := range k.Kids {
		kid.Walk(visit)
	}
}

// Words gives all text of the node and below, as it is read aloud.
func (k *Node) Words() string {
	text := ""
	k.Walk(func(n *Node) {
		if n.Tag == "" {
			text += n.Text
		}
	})
	return text
}
