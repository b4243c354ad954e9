package hill

import (
	"bytes"
	"math"
	"strconv"
)

// decimal reads a decimal number. Plain ones of up to 15 digits are exact as
// an integer divided by an exact power of ten (Clinger 1990); the rest goes to
// strconv.
func decimal(b []byte) (float64, bool) {
	b = bytes.TrimSpace(b)
	i, negative := 0, false
	if len(b) > 0 && (b[0] == '-' || b[0] == '+') {
		negative = b[0] == '-'
		i++
	}
	digits, behind, mark := 0, 0, false
	var n uint64
	for ; i < len(b); i++ {
		switch c := b[i]; {
		case isDigit(c):
			n = n*10 + uint64(c-'0')
			digits++
			if mark {
				behind++
			}
		case c == '.' && !mark:
			mark = true
		default:
			return slowDecimal(b)
		}
		if digits > 15 {
			return slowDecimal(b)
		}
	}
	if digits == 0 {
		return 0, false
	}
	v := float64(n) / tens[behind]
	if negative {
		v = -v
	}
	return v, true
}

var tens = [16]float64{1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15}

func slowDecimal(b []byte) (float64, bool) {
	if len(b) > 64 {
		return 0, false
	}
	v, err := strconv.ParseFloat(string(b), 64)
	return v, err == nil && !math.IsNaN(v) && !math.IsInf(v, 0)
}

// clock reads a time by ISO 8601 as GPX writes it, "2013-05-07T15:47:44.5Z" or
// with an offset, as seconds since 1970 UTC; NaN when it is none. A time
// without a zone is taken as UTC.
func clock(b []byte) float64 {
	b = bytes.TrimSpace(b)
	if len(b) < 19 || b[4] != '-' || b[7] != '-' || b[13] != ':' || b[16] != ':' {
		return math.NaN()
	}
	field := func(from, to int) int {
		n := 0
		for _, c := range b[from:to] {
			if !isDigit(c) {
				return -1 << 20
			}
			n = n*10 + int(c-'0')
		}
		return n
	}
	year, month, day := field(0, 4), field(5, 7), field(8, 10)
	hour, minute, second := field(11, 13), field(14, 16), field(17, 19)
	if year < 0 || month < 1 || month > 12 || day < 1 || day > 31 || hour < 0 || minute < 0 || second < 0 {
		return math.NaN()
	}
	rest, part := b[19:], 0.0
	if len(rest) > 0 && rest[0] == '.' {
		n := 1
		for scale := 0.1; n < len(rest) && isDigit(rest[n]); n++ {
			part += scale * float64(rest[n]-'0')
			scale /= 10
		}
		rest = rest[n:]
	}
	offset := 0
	if len(rest) == 6 && (rest[0] == '+' || rest[0] == '-') {
		at := len(b) - 6
		offset = field(at+1, at+3)*60 + field(at+4, at+6)
		if rest[0] == '-' {
			offset = -offset
		}
	}
	return float64(((daysSince1970(year, month, day)*24+hour)*60+minute-offset)*60+second) + part
}

// daysSince1970 counts days in the Gregorian calendar: years begin in March so
// that the leap day comes last (Hatcher 1984, Q. J. R. astr. Soc. 25, 53–55).
func daysSince1970(year, month, day int) int {
	if month <= 2 {
		year--
		month += 12
	}
	return 365*year + year/4 - year/100 + year/400 + (153*(month-3)+2)/5 + day - 1 - 719468
}
