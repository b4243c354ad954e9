package hill

import (
	"math"
	"strconv"
	"strings"
	"unicode"

	"hillwright/physics/unit"
)

// FormatSections writes a profile as ParseSections takes it, in metres and per
// cent: "400m@7%,60m@18%". Neighbours of one grade are joined. Lengths and
// grades are written in full, so that reading gives the profile back to about
// 1e-12; ParseSections refuses more than MostTyped sections and grades beyond
// SteepestTyped, which a recorded track may have.
func FormatSections(p *Profile) string {
	var b strings.Builder
	for i := 0; i < len(p.Grade); {
		j := i + 1
		for j < len(p.Grade) && p.Grade[j] == p.Grade[i] {
			j++
		}
		if i > 0 {
			b.WriteByte(',')
		}
		b.WriteString(plainNumber(p.EdgeM[j] - p.EdgeM[i]))
		b.WriteString("m@")
		b.WriteString(plainNumber(float64(p.Grade[i]) * 100))
		b.WriteByte('%')
		i = j
	}
	return b.String()
}

// plainNumber writes a number to 13 digits without an exponent, never with
// just three decimals, which ParseSections takes for a mark of thousands.
func plainNumber(v float64) string {
	if v == 0 {
		return "0"
	}
	decimals := 12 - int(math.Floor(math.Log10(math.Abs(v))))
	s := strconv.FormatFloat(v, 'f', max(decimals, 0), 64)
	if strings.Contains(s, ".") {
		s = strings.TrimRight(strings.TrimRight(s, "0"), ".")
	}
	if threeBehindMark(s) {
		s += "0"
	}
	return s
}

// leadingNumber reads a decimal number, with a sign of any kind and a point or
// a comma as its mark, from the front.
func leadingNumber(s string) (v float64, text, rest string, ok bool) {
	s = strings.TrimSpace(s)
	sign, body := 1.0, s
	for _, minus := range []string{"-", "\u2212", "\u2013"} {
		if after, found := strings.CutPrefix(body, minus); found {
			sign, body = -1, strings.TrimLeft(after, " ")
			break
		}
	}
	if sign > 0 {
		body = strings.TrimPrefix(body, "+")
	}
	n := digitsAt(body, 0)
	if n < len(body) && (body[n] == '.' || body[n] == ',') {
		n += 1 + digitsAt(body, n+1)
	}
	v, err := strconv.ParseFloat(strings.Replace(body[:n], ",", ".", 1), 64)
	if err != nil {
		return 0, "", s, false
	}
	return sign * v, s[:len(s)-len(body)+n], body[n:], true
}

// digitsAt counts the digits that stand from i on.
func digitsAt(s string, i int) int {
	n := 0
	for i+n < len(s) && isDigit(s[i+n]) {
		n++
	}
	return n
}

func isDigit(c byte) bool { return c >= '0' && c <= '9' }

// threeBehindMark tells that a number has a mark with exactly three digits
// behind it and one to three before it, other than a lone 0: "1,500".
func threeBehindMark(s string) bool {
	at := strings.IndexAny(s, ".,")
	whole := strings.TrimLeft(s[:max(at, 0)], "+-")
	return at >= 0 && len(s)-at-1 == 3 && len(whole) >= 1 && len(whole) <= 3 && whole != "0"
}

// cutWord takes a word of letters (and the marks for feet) from the front.
func cutWord(s string) (word, rest string) {
	s = strings.TrimSpace(s)
	end := len(s)
	for i, r := range s {
		if !unicode.IsLetter(r) && r != '\'' && r != '\u2032' {
			end = i
			break
		}
	}
	return s[:end], s[end:]
}

// firstWord is what an error shows of a text: up to the first blank.
func firstWord(s string) string {
	s = strings.TrimSpace(s)
	if i := strings.IndexAny(s, " \t"); i > 0 {
		return s[:i]
	}
	return s
}

// afterJoiner drops what stands between a length and its grade.
func afterJoiner(s string) string {
	s = strings.TrimSpace(s)
	for _, sign := range []string{"@", "\u00e0"} {
		if after, ok := strings.CutPrefix(s, sign); ok {
			return after
		}
	}
	word, rest := cutWord(s)
	switch strings.ToLower(word) {
	case "at", "of", "mit", "bei", "zu":
		return rest
	}
	return s
}

// metresPer gives the length of a unit of length [m]. Foot, yard and mile are
// the international ones (1959 agreement), exact.
func metresPer(word string) (float64, bool) {
	switch strings.ToLower(word) {
	case "m", "metre", "metres", "meter", "meters", "metern":
		return 1, true
	case "km", "kilometre", "kilometres", "kilometer", "kilometers", "kilometern":
		return 1000, true
	case "ft", "foot", "feet", "fu\u00df", "fuss", "'", "\u2032":
		return 0.3048, true
	case "yd", "yard", "yards":
		return 0.9144, true
	case "mi", "mile", "miles", "meile", "meilen":
		return unit.MetresPerMile, true
	}
	return 0, false
}
