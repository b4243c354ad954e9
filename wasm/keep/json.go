package keep

import (
	"math"
	"sort"
	"strconv"
	"unicode/utf8"
)

// A reader and writer of JSON (RFC 8259) that is only as large as our files
// need: encoding/json would be a third of the page's program. A value is nil,
// bool, float64, string, []any or map[string]any.

// deepest is how far lists and objects may lie inside each other; ours need 4.
const deepest = 16

type jsonReader struct {
	in   []byte
	at   int
	deep int
	what string // what was expected where reading failed, "" when all is well
}

// readJSON reads one value that fills the whole input. When it fails, line and
// column (from 1, column in bytes) tell where, and want what was expected.
func readJSON(in []byte) (v any, line, column int, want string) {
	r := &jsonReader{in: in}
	r.blanks()
	v = r.value()
	r.blanks()
	if r.what == "" && r.at < len(in) {
		r.what = "the end of the file"
	}
	if r.what == "" {
		return v, 0, 0, ""
	}
	line, column = 1, 1
	for _, c := range in[:min(r.at, len(in))] {
		if column++; c == '\n' {
			line, column = line+1, 1
		}
	}
	return nil, line, column, r.what
}

func (r *jsonReader) fail(want string) any {
	if r.what == "" {
		r.what = want
	}
	return nil
}

func (r *jsonReader) peek() byte {
	if r.at < len(r.in) {
		return r.in[r.at]
	}
	return 0
}

func (r *jsonReader) blanks() {
	for r.at < len(r.in) {
		switch r.in[r.at] {
		case ' ', '\t', '\n', '\r':
			r.at++
		default:
			return
		}
	}
}

func (r *jsonReader) value() any {
	switch c := r.peek(); {
	case c == '{':
		return r.object()
	case c == '[':
		return r.list()
	case c == '"':
		return r.text()
	case c == '-' || c >= '0' && c <= '9':
		return r.number()
	}
	for word, v := range map[string]any{"true": true, "false": false, "null": nil} {
		if len(r.in)-r.at >= len(word) && string(r.in[r.at:r.at+len(word)]) == word {
			r.at += len(word)
			return v
		}
	}
	return r.fail("a value")
}

func (r *jsonReader) enter() bool {
	r.at++
	r.blanks()
	if r.deep++; r.deep > deepest {
		r.fail("less deeply nested lists")
	}
	return r.what == ""
}

// next steps over the comma before the next item; false at the closing sign.
func (r *jsonReader) next(first bool, closing byte) bool {
	r.blanks()
	if r.peek() == closing {
		r.at++
		r.deep--
		return false
	}
	if first {
		return true
	}
	if r.peek() != ',' {
		r.fail("a comma or " + string(rune(closing)))
		return false
	}
	r.at++
	r.blanks()
	return true
}

func (r *jsonReader) object() any {
	out := map[string]any{}
	if !r.enter() {
		return nil
	}
	for first := true; r.what == "" && r.next(first, '}'); first = false {
		if r.peek() != '"' {
			return r.fail("a name in quotation marks")
		}
		name, _ := r.text().(string)
		r.blanks()
		if r.what != "" {
			return nil
		}
		if r.peek() != ':' {
			return r.fail("a colon")
		}
		r.at++
		r.blanks()
		out[name] = r.value()
	}
	return out
}

func (r *jsonReader) list() any {
	out := []any{}
	if !r.enter() {
		return nil
	}
	for first := true; r.what == "" && r.next(first, ']'); first = false {
		out = append(out, r.value())
	}
	return out
}

func (r *jsonReader) number() any {
	from := r.at
	for c := r.peek(); c >= '0' && c <= '9' || c == '-' || c == '+' || c == '.' || c == 'e' || c == 'E'; c = r.peek() {
		r.at++
	}
	text := string(r.in[from:r.at])
	v, err := strconv.ParseFloat(text, 64)
	if err != nil || !goodNumber(text) {
		r.at = from
		return r.fail("a number")
	}
	return v
}

// goodNumber tells what ParseFloat lets pass and JSON does not: "+1", "01", "1.".
func goodNumber(s string) bool {
	digits := func() (n int) {
		for n < len(s) && s[n] >= '0' && s[n] <= '9' {
			n++
		}
		defer func() { s = s[n:] }()
		return n
	}
	if s[0] == '-' {
		s = s[1:]
	}
	if len(s) > 1 && s[0] == '0' && s[1] >= '0' && s[1] <= '9' || digits() == 0 {
		return false
	}
	if s != "" && s[0] == '.' {
		if s = s[1:]; digits() == 0 {
			return false
		}
	}
	if s != "" && (s[0] == 'e' || s[0] == 'E') {
		if s = s[1:]; s != "" && (s[0] == '+' || s[0] == '-') {
			s = s[1:]
		}
		return digits() > 0 && s == ""
	}
	return s == ""
}

func (r *jsonReader) text() any {
	r.at++
	var out []byte
	for r.at < len(r.in) {
		c := r.in[r.at]
		switch {
		case c == '"':
			r.at++
			return string(out)
		case c < ' ':
			return r.fail("the end of a text in quotation marks")
		case c == '\\':
			if out = r.escaped(out); r.what != "" {
				return nil
			}
			continue
		}
		sign, size := utf8.DecodeRune(r.in[r.at:])
		out = utf8.AppendRune(out, sign)
		r.at += size
	}
	return r.fail("the end of a text in quotation marks")
}

var escapes = map[byte]byte{'"': '"', '\\': '\\', '/': '/', 'b': '\b', 'f': '\f', 'n': '\n', 'r': '\r', 't': '\t'}

func (r *jsonReader) escaped(out []byte) []byte {
	r.at++
	c := r.peek()
	if plain, ok := escapes[c]; ok {
		r.at++
		return append(out, plain)
	}
	sign, ok := r.hex()
	if !ok {
		r.fail("a known sign after a backslash")
		return out
	}
	if sign >= 0xD800 && sign < 0xDC00 && r.peek() == '\\' {
		back := r.at
		r.at++
		if low, ok := r.hex(); ok && low >= 0xDC00 && low < 0xE000 {
			return utf8.AppendRune(out, 0x10000+(sign-0xD800)<<10+(low-0xDC00))
		}
		r.at = back
	}
	return utf8.AppendRune(out, sign) // a lone half becomes the replacement sign
}

// hex reads uXXXX.
func (r *jsonReader) hex() (rune, bool) {
	if r.peek() != 'u' || r.at+5 > len(r.in) {
		return 0, false
	}
	var v rune
	for _, c := range r.in[r.at+1 : r.at+5] {
		switch {
		case c >= '0' && c <= '9':
			v = v<<4 | rune(c-'0')
		case c|0x20 >= 'a' && c|0x20 <= 'f':
			v = v<<4 | rune(c|0x20-'a'+10)
		default:
			return 0, false
		}
	}
	r.at += 5
	return v, true
}

func putText(out []byte, s string) []byte {
	const hex = "0123456789abcdef"
	out = append(out, '"')
	for _, c := range s {
		switch {
		case c == '"' || c == '\\':
			out = append(out, '\\', byte(c))
		case c < ' ' || c == 0x7f:
			out = append(out, '\\', 'u', '0', '0', hex[c>>4], hex[c&15])
		default:
			out = utf8.AppendRune(out, c)
		}
	}
	return append(out, '"')
}

// putNumber writes a number; what JSON cannot say (not a number, infinite) as
// null.
func putNumber(out []byte, v float64) []byte {
	if math.IsNaN(v) || math.IsInf(v, 0) {
		return append(out, "null"...)
	}
	return strconv.AppendFloat(out, v, 'g', -1, 64)
}

// putMap writes an object of texts, names in alphabetical order.
func putMap(out []byte, m map[string]string) []byte {
	names := make([]string, 0, len(m))
	for name := range m {
		names = append(names, name)
	}
	sort.Strings(names)
	out = append(out, '{')
	for i, name := range names {
		if i > 0 {
			out = append(out, ',')
		}
		out = putText(out, name)
		out = append(out, ':')
		out = putText(out, m[name])
	}
	return append(out, '}')
}

func putNumbers(out []byte, values []float64) []byte {
	out = append(out, '[')
	for i, v := range values {
		if i > 0 {
			out = append(out, ',')
		}
		out = putNumber(out, v)
	}
	return append(out, ']')
}
