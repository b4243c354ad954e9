package keep

import (
	"math"
	"strconv"

	"hillwright/physics/hill"
	"hillwright/physics/slope"
	"hillwright/physics/unit"
)

// Reading is a grade that was read and kept: the entry of physics/slope under
// an id.
type Reading struct {
	ID string
	slope.Entry
	Changed int64 // when, in seconds since 1970
}

// putReading writes a reading; what is not known is left out.
func putReading(out []byte, r *Reading) []byte {
	out = putText(append(out, `{"id":`...), r.ID)
	for _, each := range []struct{ name, text string }{
		{"place", r.Place}, {"note", r.Note}, {"method", string(r.Method)}, {"shared_by", r.SharedBy},
	} {
		if each.text != "" {
			out = putText(append(putText(append(out, ','), each.name), ':'), each.text)
		}
	}
	for _, each := range r.numbers() {
		if v := *each.at; v == v && (v != 0 || each.always) {
			out = append(putText(append(out, ','), each.name), ':')
			out = strconv.AppendFloat(out, v, 'g', -1, 64)
		}
	}
	return append(putChanged(out, r.Changed), '}')
}

// number is one number of a reading: its name in the file, whether it is always
// written, else it is left out when it is 0 or not a number, and its range.
type number struct {
	name      string
	at        *float64
	always    bool
	low, high float64
}

// numbers are a reading's numbers. The first two must be there.
func (r *Reading) numbers() []number {
	return []number{
		{"grade", (*float64)(&r.Grade), true, -float64(slope.SteepestReading), float64(slope.SteepestReading)},
		{"error", &r.Error, true, 1e-9, 10},
		{"shared", &r.Shared, false, 0, 10},
		{"length_m", &r.LengthM, false, 0, longestM},
		{"time_s", &r.TimeS, false, 0, 1e11},
		{"pitch_m", &r.Pitch.Value, false, 0, longestM},
		{"pitch_error_m", &r.Pitch.Error, false, 0, longestM},
		{"lat_deg", &r.At.LatDeg, true, -90, 90},
		{"lon_deg", &r.At.LonDeg, true, -180, 180},
		{"height_m", &r.At.HeightM, true, -500, 9000},
	}
}

// readings reads a file's readings; one without a grade and an error in their
// ranges is left out and told.
func (r *reader) readings(v any) []Reading {
	list, _ := v.([]any)
	var out []Reading
	for i, each := range list {
		where := "readings[" + strconv.Itoa(i+1) + "]"
		m, _ := each.(map[string]any)
		one := Reading{ID: text(m["id"]), Changed: whole(m["changed"])}
		one.Place, one.Note, one.SharedBy = short(m["place"]), short(m["note"]), short(m["shared_by"])
		one.Method = slope.Method(short(m["method"]))
		if one.ID == "" || len(one.ID) > longest {
			r.fault(BadThing, where, "id: expected 1 to "+strconv.Itoa(longest)+" signs")
			continue
		}
		if wrong := one.take(m); wrong != "" {
			r.fault(BadValue, where+" "+one.ID, wrong)
			continue
		}
		out = append(out, one)
	}
	return out
}

// take puts a file's numbers into a reading, and tells what is wrong with them.
func (r *Reading) take(m map[string]any) string {
	r.Grade = unit.Grade(math.NaN())
	r.TimeS, r.At = math.NaN(), Nowhere()
	for i, n := range r.numbers() {
		v, given := m[n.name].(float64)
		if !given && i > 1 {
			continue
		}
		if !given || !(v >= n.low && v <= n.high) {
			return n.name + ": expected a number from " + strconv.FormatFloat(n.low, 'g', -1, 64) + " to " + strconv.FormatFloat(n.high, 'g', -1, 64)
		}
		*n.at = v
	}
	return ""
}

// Nowhere is the place of a reading that has none.
func Nowhere() hill.Point {
	return hill.Point{LatDeg: math.NaN(), LonDeg: math.NaN(), HeightM: math.NaN(), TimeS: math.NaN()}
}

// short is a text, or none when it is too long.
func short(v any) string {
	s := text(v)
	if len(s) > longest {
		return ""
	}
	return s
}

// ReadingAt finds a reading's place in the list, -1 where there is none of that
// id.
func (t *Things) ReadingAt(id string) int {
	for i := range t.Readings {
		if t.Readings[i].ID == id {
			return i
		}
	}
	return -1
}
