package dom

// Part is what an element is made of: an Attr, a *Node, a Text, or Parts.
//
// The makers of parts are not inlined: views call them by the thousand, and
// each call in line made the page's program larger.
type Part interface{ addTo(*Node) }

// El makes an element of its parts, in order.
//
//go:noinline
func El(tag string, parts ...Part) *Node {
	n := &Node{Tag: tag}
	n.Add(parts...)
	return n
}

// Add gives an element more parts.
//
//go:noinline
func (k *Node) Add(parts ...Part) {
	for _, p := range parts {
		if p != nil {
			p.addTo(k)
		}
	}
}

// SVGNamespace is the XML namespace of SVG.
const SVGNamespace = "http://www.w3.org/2000/svg"

// SVG makes the outermost element of a picture, with its namespace.
func SVG(parts ...Part) *Node {
	n := El("svg", With("xmlns", SVGNamespace))
	n.Add(parts...)
	return n
}

// Text is words inside an element.
type Text string

func (t Text) addTo(n *Node) { n.Kids = append(n.Kids, &Node{Text: string(t)}) }

// Parts is several parts as one.
type Parts []Part

func (ps Parts) addTo(n *Node) { n.Add(ps...) }

// addTo hangs a node under n. A nil node adds nothing, so that a view may
// leave a piece out by returning nil.
func (k *Node) addTo(n *Node) {
	if k != nil {
		n.Kids = append(n.Kids, k)
	}
}

func (a Attr) addTo(n *Node) { n.Attrs = append(n.Attrs, a) }

// With is an attribute with a value.
//
//go:noinline
func With(name, value string) Part { return &Attr{name, value} }

// Bare is an attribute without a value, such as hidden.
//
//go:noinline
func Bare(name string) Part { return &Attr{Name: name} }

// Class gives an element its classes, with blanks between them.
//
//go:noinline
func Class(names string) Part { return &Attr{"class", names} }

// ID names an element.
//
//go:noinline
func ID(name string) Part { return &Attr{"id", name} }

// Act says which action a touch on the element asks for, and its argument.
//
//go:noinline
func Act(name, arg string) Part {
	return Parts{Attr{"data-act", name}, Attr{"data-arg", arg}}
}

// If gives the part when the condition holds, else nothing.
//
//go:noinline
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
