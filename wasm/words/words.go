// Package words is what the page and the terminal say: one catalogue of words
// in every language, numbers with their units and the region's decimal mark,
// and sentences made from the computation. Start with Voice and Voice.Say;
// Voice.Why makes the sentence below the answer.
//
// To add a word: add its constant to Key in key.go, or key_ride.go or key_hillside.go (where it
// belongs, with a comment when the blanks are not plain), and its text to
// english.go and german.go, or english_ride.go and german_ride.go, and so on. Blanks are written {0}, {1}; every language must have the same
// ones, in any order. Check tells what is missing.
package words

import "strings"

// Lang is a language of the catalogue.
type Lang uint8

// The languages. English is the zero value.
const (
	English Lang = iota
	German
	langs // how many there are
)

var tags = [langs]string{"en", "de"}

// Tag is the language's tag by BCP 47, as in the page's lang attribute.
func (l Lang) Tag() string { return tags[l] }

// LangOf finds the language of a BCP 47 tag such as "de-AT"; ok is false where
// the catalogue has none for it.
func LangOf(tag string) (l Lang, ok bool) {
	first, _, _ := strings.Cut(strings.ToLower(tag), "-")
	for i, t := range tags {
		if t == first {
			return Lang(i), true
		}
	}
	return English, false
}

// Langs gives every language, in the order in which they are offered.
func Langs() []Lang { return []Lang{English, German} }

// Units is the system of units in which quantities are shown.
type Units uint8

// The systems. Inside everything is SI; this is only how it is shown.
const (
	Metric   Units = iota
	Imperial       // mph, ft and mi, lb, lbf, °F
)

// Voice is how one person is spoken to: a language, units, and whether their
// decimal mark is a comma. The zero value is English, metric, with a point.
type Voice struct {
	Lang  Lang
	Units Units
	Comma bool
}

var (
	english   = whole(englishPage, englishRide, englishHillside, englishBench)
	german    = whole(germanPage, germanRide, germanHillside, germanBench)
	catalogue = [langs]*[keys]string{&english, &german}
)

// whole lays the parts of a language's catalogue over each other.
func whole(page [keys]string, parts ...[keys]string) [keys]string {
	for _, part := range parts {
		for k, text := range part {
			if text != "" {
				page[k] = text
			}
		}
	}
	return page
}

func (v Voice) text(k Key) string {
	l := v.Lang
	if l >= langs {
		l = English
	}
	return catalogue[l][k]
}

// Say gives a text of the catalogue with its blanks {0}, {1} ... filled. A
// blank without an argument stays empty.
func (v Voice) Say(k Key, args ...string) string {
	var b strings.Builder
	for _, p := range cut(v.text(k)) {
		switch {
		case p.Blank < 0:
			b.WriteString(p.Text)
		case p.Blank < len(args):
			b.WriteString(args[p.Blank])
		}
	}
	return b.String()
}

// Piece is a part of a text: plain words when Blank is negative, else the blank
// of that number.
type Piece struct {
	Text  string
	Blank int
}

// Pieces gives a text cut at its blanks, in this language's order, so that a
// view can put something to touch in each.
func (v Voice) Pieces(k Key) []Piece { return cut(v.text(k)) }

func cut(text string) []Piece {
	var out []Piece
	from := 0
	for i := 0; i+2 < len(text); i++ {
		if text[i] != '{' || text[i+2] != '}' || text[i+1] < '0' || text[i+1] > '9' {
			continue
		}
		if i > from {
			out = append(out, Piece{Text: text[from:i], Blank: -1})
		}
		out = append(out, Piece{Blank: int(text[i+1] - '0')})
		from = i + 3
		i += 2
	}
	if from < len(text) || len(out) == 0 {
		out = append(out, Piece{Text: text[from:], Blank: -1})
	}
	return out
}

// capital gives a text with its first letter large. Texts of the catalogue
// that may stand first begin with an ASCII letter.
func capital(s string) string {
	if s == "" || s[0] < 'a' || s[0] > 'z' {
		return s
	}
	return string(s[0]-'a'+'A') + s[1:]
}
