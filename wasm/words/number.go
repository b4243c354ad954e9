package words

import (
	"math"
	"strconv"
	"strings"
)

const (
	thin  = "\u202f" // narrow no-break space: between number and unit, and thousands
	minus = "\u2212" // minus sign
	dash  = "–"      // what stands where there is no number
)

// Number writes a value with a fixed count of decimals (0 to 9), the region's
// decimal mark, a real minus sign, and thin blanks between thousands from
// 10,000 on. Not a number and infinite are a dash.
func (v Voice) Number(value float64, decimals int) string {
	if math.IsNaN(value) || math.IsInf(value, 0) {
		return dash
	}
	s := strconv.FormatFloat(math.Abs(value), 'f', decimals, 64)
	whole, part, hasPart := strings.Cut(s, ".")
	var b strings.Builder
	if value < 0 && strings.Trim(s, "0.") != "" {
		b.WriteString(minus)
	}
	for i := range whole {
		if i > 0 && len(whole) > 4 && (len(whole)-i)%3 == 0 {
			b.WriteString(thin)
		}
		b.WriteByte(whole[i])
	}
	if hasPart {
		b.WriteString(v.mark())
		b.WriteString(part)
	}
	return b.String()
}

func (v Voice) mark() string {
	if v.Comma {
		return ","
	}
	return "."
}

// short writes a value with at most so many decimals, without zeros at the end.
func (v Voice) short(value float64, decimals int) string {
	s := v.Number(value, decimals)
	if decimals == 0 || !strings.Contains(s, v.mark()) {
		return s
	}
	return strings.TrimSuffix(strings.TrimRight(s, "0"), v.mark())
}

// step says from which value on (once rounded) fewer decimals are shown.
type step struct {
	below    float64
	decimals int
}

// decimals picks the decimals for a value: those of the first step below which
// the value still lies after it was rounded to them.
func decimals(value float64, steps ...step) int {
	for _, s := range steps {
		p := math.Pow10(s.decimals)
		if math.Round(math.Abs(value)*p)/p < s.below {
			return s.decimals
		}
	}
	return 0
}

func (v Voice) with(number, unit string) string {
	if number == dash || unit == "" {
		return number
	}
	return number + thin + unit
}

// ParseNumber reads a number as a person types it: either decimal mark, blanks
// of any width between thousands, any kind of minus sign, and a sign in front. A single
// mark is the decimal mark; of two different marks the last one is. ok is
// false where that makes no finite number.
func (v Voice) ParseNumber(text string) (value float64, ok bool) {
	var b strings.Builder
	points, commas := strings.Count(text, "."), strings.Count(text, ",")
	decimal := '.'
	switch {
	case points > 0 && commas > 0:
		decimal = rune(text[strings.LastIndexAny(text, ".,")])
	case commas > 0:
		decimal = ','
	}
	if points > 1 && commas > 1 || points > 1 && commas == 0 || commas > 1 && points == 0 {
		return 0, false
	}
	for _, r := range strings.TrimSpace(text) {
		switch {
		case r >= '0' && r <= '9':
			b.WriteRune(r)
		case r == decimal:
			b.WriteByte('.')
		case r == '.' || r == ',' || isBlank(r) || r == '\'' || r == '’':
			// between thousands
		case r == '-' || r == '−' || r == '–' || r == '‐' || r == '‑' || r == '－':
			b.WriteByte('-')
		case r == '+':
			b.WriteByte('+')
		default:
			return 0, false
		}
	}
	value, err := strconv.ParseFloat(b.String(), 64)
	return value, err == nil && !math.IsInf(value, 0)
}

func isBlank(r rune) bool {
	return r == ' ' || r == '\u00a0' || r == '\u202f' || r == '\u2009' || r == '\u2007'
}
