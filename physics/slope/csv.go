package slope

import (
	"strconv"
	"strings"
)

// csvHead names the columns of CSV, each with its unit.
var csvHead = []string{
	"time_utc", "place", "grade_percent", "error_percent", "method", "length_m", "length_error_m",
	"latitude_deg", "longitude_deg", "height_m", "note",
}

// CSV writes a list of readings as a table with a head (RFC 4180: commas, a
// carriage return and a line feed behind each line, doubled quotation marks),
// UTF-8. Errors are 1 σ. Decimal marks are points; what is not known is empty.
func CSV(entries []Entry) []byte {
	var b []byte
	b = csvLine(b, csvHead...)
	for i := range entries {
		e := &entries[i]
		lat, lon := "", ""
		if e.placed() {
			lat, lon = decimals(e.At.LatDeg, 7), decimals(e.At.LonDeg, 7)
		}
		length, lengthErr := "", ""
		if m := e.pitchM(); m > 0 {
			length = decimals(m, 3)
			if m == e.Pitch.Value {
				lengthErr = decimals(e.Pitch.Error, 3)
			}
		}
		b = csvLine(b, dateTime(e.TimeS), e.Place, decimals(100*float64(e.Grade), 4), decimals(100*e.Error, 4), string(e.Method),
			length, lengthErr, lat, lon, decimals(e.At.HeightM, 2), e.Note)
	}
	return b
}

func csvLine(b []byte, fields ...string) []byte {
	for i, f := range fields {
		if i > 0 {
			b = append(b, ',')
		}
		if !strings.ContainsAny(f, ",\"\r\n") && strings.TrimSpace(f) == f {
			b = append(b, f...)
			continue
		}
		b = append(b, '"')
		b = append(b, strings.ReplaceAll(f, `"`, `""`)...)
		b = append(b, '"')
	}
	return append(b, "\r\n"...)
}

// decimals writes a number with at most so many decimals, "" when it is none.
func decimals(v float64, most int) string {
	if !finite(v) {
		return ""
	}
	s := strconv.FormatFloat(v, 'f', most, 64)
	if strings.Contains(s, ".") {
		s = strings.TrimRight(strings.TrimRight(s, "0"), ".")
	}
	if s == "-0" {
		return "0"
	}
	return s
}
