package hill

import (
	"bytes"
	"strconv"
	"unicode/utf8"
)

// xmlToken is what the XML scanner found.
type xmlToken uint8

const (
	xmlStart xmlToken = iota // an element begins: name, attr
	xmlEnd                   // an element ends; depth is that of the element around it
	xmlText                  // text or CDATA within an element
	xmlDone                  // the root element is closed
)

// deepest bounds how deep elements may lie within each other.
const deepest = 100

// xmlScanner reads XML 1.0 as a stream, as far as tracks need it: elements,
// attributes, text, CDATA, character references and the five entities that XML
// itself defines. Document types are refused. Elements must be nested well.
type xmlScanner struct {
	*scanner
	depth    int      // of the element that stands open
	open     []byte   // names of the open elements, one behind the other
	openAt   []int    // where each begins in open
	name     []byte   // of the element that began or ended, without its prefix
	attrs    []byte   // names and values, one behind the other
	attrAt   [][3]int // name from, name to = value from, value to
	text     []byte
	wantText bool // text is kept only when somebody wants it
	closeNow bool // the element that began was empty: <a/>
}

// attr gives an attribute's value, or nil.
func (x *xmlScanner) attr(name string) []byte {
	for _, a := range x.attrAt {
		if string(x.attrs[a[0]:a[1]]) == name {
			return x.attrs[a[1]:a[2]]
		}
	}
	return nil
}

// next gives the next token. On an error the scanner is of no further use.
func (x *xmlScanner) nextToken() (xmlToken, *TrackError) {
	if x.closeNow {
		x.closeNow = false
		return x.pop()
	}
	for {
		c, ok := x.next()
		if !ok {
			return 0, x.ended()
		}
		if c != '<' {
			x.back()
			if err := x.plainText(); err != nil {
				return 0, err
			}
			if x.wantText && x.depth > 0 {
				return xmlText, nil
			}
			continue
		}
		if c, ok = x.next(); !ok {
			return 0, x.ended()
		}
		switch {
		case c == '?':
			if err := x.skipTo("?>"); err != nil {
				return 0, err
			}
		case c == '!':
			isText, err := x.declaration()
			if err != nil {
				return 0, err
			}
			if isText {
				return xmlText, nil
			}
		case c == '/':
			return x.endTag()
		default:
			x.back()
			return xmlStart, x.startTag()
		}
	}
}

// plainText reads text up to the next tag, which it leaves.
func (x *xmlScanner) plainText() *TrackError {
	x.text = x.text[:0]
	raw, ok := x.until('<', x.text)
	if !ok {
		return x.ended()
	}
	x.back()
	x.text = raw
	if x.wantText {
		x.text = expand(raw)
	}
	return nil
}

// declaration reads what begins with "<!". It tells whether it is wanted text.
func (x *xmlScanner) declaration() (isText bool, err *TrackError) {
	head := make([]byte, 0, 7)
	for len(head) < 7 {
		c, ok := x.next()
		if !ok {
			return false, x.ended()
		}
		head = append(head, c)
		switch {
		case len(head) == 2 && string(head) == "--":
			return false, x.skipTo("-->")
		case len(head) == 7 && string(head) == "[CDATA[":
			return x.cdata()
		case len(head) == 7 && string(bytes.ToUpper(head)) == "DOCTYPE":
			return false, x.doctype()
		}
	}
	return false, x.broken("<!" + string(head))
}

func (x *xmlScanner) cdata() (bool, *TrackError) {
	x.text = x.text[:0]
	for {
		var ok bool
		if x.text, ok = x.until('>', x.text); !ok {
			return false, x.ended()
		}
		if bytes.HasSuffix(x.text, []byte("]]")) {
			x.text = x.text[:len(x.text)-2]
			return x.wantText && x.depth > 0, nil
		}
		if len(x.text) >= mostKept { // too long for a name or number: only its end matters
			return false, x.skipTo("]]>")
		}
		x.text = append(x.text, '>')
	}
}

// doctype refuses a document type, and tells a web page by it.
func (x *xmlScanner) doctype() *TrackError {
	c, ok := x.space()
	word := []byte{c}
	for ok && len(word) < 5 {
		c, ok = x.next()
		word = append(word, c)
	}
	if string(bytes.ToLower(word[:min(4, len(word))])) == "html" {
		return &TrackError{Kind: TrackWrongFile, Looks: LooksHTML}
	}
	return &TrackError{Kind: TrackDoctype, Line: x.line()}
}

// skipTo skips everything up to and with a mark.
func (x *xmlScanner) skipTo(mark string) *TrackError {
	last, matched := mark[len(mark)-1], 0
	for {
		c, ok := x.next()
		if !ok {
			return x.ended()
		}
		switch {
		case matched == len(mark)-1 && c == last:
			return nil
		case c == mark[matched] && matched < len(mark)-1:
			matched++
		case matched == 2 && c == mark[1]: // "--->" and "]]]>": one more of the same
		case c == mark[0]:
			matched = 1
		default:
			matched = 0
		}
	}
}

func (x *xmlScanner) startTag() *TrackError {
	from := len(x.open)
	c, ok, err := x.nameInto(&x.open)
	if err != nil {
		return err
	}
	if len(x.openAt) >= deepest {
		return x.broken("elements nested too deep")
	}
	x.openAt = append(x.openAt, from)
	x.depth++
	x.name = localName(x.open[from:])
	x.attrs, x.attrAt = x.attrs[:0], x.attrAt[:0]
	for {
		if ok && isSpace(c) {
			c, ok = x.space()
		}
		if !ok {
			return x.ended()
		}
		switch c {
		case '>':
			return nil
		case '/':
			if c, ok = x.next(); !ok {
				return x.ended()
			}
			if c != '>' {
				return x.broken("/" + string(rune(c)))
			}
			x.closeNow = true
			return nil
		}
		x.back()
		if c, ok, err = x.attribute(); err != nil {
			return err
		}
	}
}

// attribute reads one attribute and the byte behind it.
func (x *xmlScanner) attribute() (c byte, ok bool, err *TrackError) {
	if len(x.attrs) > 16*mostKept || len(x.attrAt) > 256 {
		return 0, false, x.broken("too many attributes")
	}
	from := len(x.attrs)
	c, ok, err = x.nameInto(&x.attrs)
	if err != nil {
		return 0, false, err
	}
	valueFrom := len(x.attrs)
	if ok && isSpace(c) {
		c, ok = x.space()
	}
	if ok && c != '=' {
		return 0, false, x.broken("attribute without =")
	}
	quote, ok := x.space()
	if !ok {
		return 0, false, x.ended()
	}
	if quote != '"' && quote != '\'' {
		return 0, false, x.broken("attribute without quotes")
	}
	value, ok := x.until(quote, x.text[:0])
	if !ok {
		return 0, false, x.ended()
	}
	x.text = value
	x.attrs = append(x.attrs, expand(value)...)
	x.attrAt = append(x.attrAt, [3]int{from, valueFrom, len(x.attrs)})
	c, ok = x.next()
	return c, ok, nil
}

// nameInto appends a name and gives the byte behind it.
func (x *xmlScanner) nameInto(dst *[]byte) (c byte, ok bool, err *TrackError) {
	from := len(*dst)
	for {
		buf := x.buf[x.pos:x.end]
		n := 0
		for n < len(buf) && nameBytes[buf[n]] {
			n++
		}
		if n > 0 && len(*dst) == from && (isDigit(buf[0]) || buf[0] == '-' || buf[0] == '.') {
			return 0, false, x.broken("expected a name, got " + strconv.QuoteRune(rune(buf[0])))
		}
		if len(*dst)-from+n > longestName {
			return 0, false, x.broken("name too long")
		}
		*dst = append(*dst, buf[:n]...)
		x.pos += n
		if c, ok = x.next(); !ok {
			return 0, false, x.ended()
		}
		if !nameBytes[c] {
			break
		}
		x.back() // the name goes on in the next buffer
	}
	if len(*dst) == from {
		return 0, false, x.broken("expected a name, got " + strconv.QuoteRune(rune(c)))
	}
	return c, true, nil
}

const longestName = 256 // bytes

// nameBytes tells which bytes a name may have; digits, - and . not in front.
var nameBytes = func() (t [256]bool) {
	for c := range t {
		letter := c|0x20 >= 'a' && c|0x20 <= 'z' || c >= 0x80
		t[c] = letter || isDigit(byte(c)) || c == '_' || c == ':' || c == '-' || c == '.'
	}
	return t
}()

func (x *xmlScanner) endTag() (xmlToken, *TrackError) {
	x.text = x.text[:0]
	c, ok, err := x.nameInto(&x.text)
	if err != nil {
		return 0, err
	}
	if isSpace(c) {
		c, ok = x.space()
	}
	if !ok {
		return 0, x.ended()
	}
	if x.depth == 0 || c != '>' || !bytes.Equal(x.text, x.open[x.openAt[x.depth-1]:]) {
		return 0, x.broken("</" + string(x.text) + "> closes nothing here")
	}
	return x.pop()
}

func (x *xmlScanner) pop() (xmlToken, *TrackError) {
	from := x.openAt[x.depth-1]
	x.name = localName(x.open[from:])
	x.open, x.openAt = x.open[:from], x.openAt[:x.depth-1]
	if x.depth--; x.depth == 0 {
		return xmlDone, nil
	}
	return xmlEnd, nil
}

func isSpace(c byte) bool { return c == ' ' || c == '\n' || c == '\r' || c == '\t' }

func localName(name []byte) []byte { return name[bytes.LastIndexByte(name, ':')+1:] }

// expand replaces character references and XML's own entities in place; other
// entities stay as they are written.
func expand(s []byte) []byte {
	at := bytes.IndexByte(s, '&')
	if at < 0 {
		return s
	}
	out := s[:at]
	for at < len(s) {
		if s[at] == '&' {
			semi := bytes.IndexByte(s[at:min(len(s), at+12)], ';')
			if r, ok := entity(s[at+1 : at+max(semi, 1)]); semi > 1 && ok {
				out = utf8.AppendRune(out, r) // never longer than the reference
				at += semi + 1
				continue
			}
		}
		out = append(out, s[at])
		at++
	}
	return out
}

func entity(name []byte) (rune, bool) {
	switch string(name) {
	case "amp":
		return '&', true
	case "lt":
		return '<', true
	case "gt":
		return '>', true
	case "quot":
		return '"', true
	case "apos":
		return '\'', true
	}
	if len(name) < 2 || name[0] != '#' {
		return 0, false
	}
	digits, base := string(name[1:]), 10
	if digits[0] == 'x' {
		digits, base = digits[1:], 16
	}
	n, err := strconv.ParseUint(digits, base, 21)
	return rune(n), err == nil && utf8.ValidRune(rune(n)) && n > 0
}
