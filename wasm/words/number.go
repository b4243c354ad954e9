package words

import (
	"math"
	"strconv"
	"strings"
	"unicode"
)

const (
	thin  = "\u202f" // narrow no-break space: between number and unit, and thousands
	wide  = "\u00a0" // no-break space: between minutes and seconds
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
// of any width or the other mark between thousands, any kind of minus sign. A
// single mark is the decimal mark; of two different ones the last is. ok is
// false where that makes no finite number, and where blanks or marks stand
// anywhere but between thousands.
func (v Voice) ParseNumber(text string) (value float64, ok bool) {
	rest, negative := sign(strings.TrimSpace(text))
	whole, part := rest, ""
	if at := strings.LastIndexAny(rest, ".,"); at >= 0 {
		if strings.Count(rest, rest[at:at+1]) > 1 {
			return 0, false
		}
		whole, part = rest[:at], rest[at+1:]
	}
	whole, ok = joinThousands(whole)
	if !ok || !digits(part) || whole+part == "" {
		return 0, false
	}
	value, err := strconv.ParseFloat("0"+whole+"."+part+"0", 64)
	if negative {
		value = -value
	}
	return value, err == nil
}

// sign takes the sign off the front of a number.
func sign(text string) (rest string, negative bool) {
	for _, m := range []string{"-", minus, "–", "‐", "‑", "－"} {
		if after, found := strings.CutPrefix(text, m); found {
			return strings.TrimSpace(after), true
		}
	}
	return strings.TrimPrefix(text, "+"), false
}

// joinThousands takes out what stands between thousands; ok is false where
// a group but the first has not three digits.
func joinThousands(whole string) (joined string, ok bool) {
	groups := strings.FieldsFunc(whole, func(r rune) bool {
		return r == '.' || r == ',' || r == '\'' || r == '’' || unicode.IsSpace(r)
	})
	for i, g := range groups {
		if !digits(g) || i > 0 && len(g) != 3 || i == 0 && len(groups) > 1 && len(g) > 3 {
			return "", false
		}
		joined += g
	}
	return joined, true
}

func digits(s string) bool { return strings.Trim(s, "0123456789") == "" }
