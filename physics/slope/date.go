package slope

import (
	"math"
	"strconv"
)

// latestS is the end of the year 9999 [s since 1970].
const latestS = 253402300799

// dateTime writes a time [s since 1970, UTC] by ISO 8601 to the millisecond,
// "2024-05-07T15:47:44.500Z"; "" when it is not known or outside the years 1 to
// 9999. Days are counted in the Gregorian calendar from a March, so that the
// leap day comes last (Hatcher 1984, Q. J. R. astr. Soc. 25, 53–55).
func dateTime(timeS float64) string {
	if !(timeS > -62135596800 && timeS < latestS) {
		return ""
	}
	ms := int64(math.Round(timeS * 1000))
	day, rest := ms/86400000, ms%86400000
	if rest < 0 {
		day, rest = day-1, rest+86400000
	}
	const perEra = 146097 // days in 400 years
	day += 719468         // since the first of March of the year 0
	era, inEra := day/perEra, day%perEra
	year := (inEra - inEra/1460 + inEra/36524 - inEra/146096) / 365
	inYear := inEra - (365*year + year/4 - year/100)
	month := (5*inYear + 2) / 153 // from March
	date := inYear - (153*month+2)/5 + 1
	year += 400 * era
	if month += 3; month > 12 {
		month, year = month-12, year+1
	}
	b := make([]byte, 0, 24)
	b = append(b, digits(year, 4)...)
	b = append(append(b, '-'), digits(month, 2)...)
	b = append(append(b, '-'), digits(date, 2)...)
	b = append(append(b, 'T'), digits(rest/3600000, 2)...)
	b = append(append(b, ':'), digits(rest/60000%60, 2)...)
	b = append(append(b, ':'), digits(rest/1000%60, 2)...)
	if rest%1000 != 0 {
		b = append(append(b, '.'), digits(rest%1000, 3)...)
	}
	return string(append(b, 'Z'))
}

// digits writes a whole number with leading zeros.
func digits(v int64, width int) string {
	s := strconv.FormatInt(v, 10)
	for len(s) < width {
		s = "0" + s
	}
	return s
}
