package keep

import (
	"math"
	"testing"

	"hillwright/physics/slope"
	"hillwright/physics/unit"

	"pgregory.net/rapid"
)

// What is written is read again, figure for figure; what is not known stays so.
func TestReadingRoundTrip(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		text := rapid.StringN(0, 20, 80)
		r := Reading{ID: rapid.StringN(1, 20, 80).Draw(t, "id"), Changed: 7}
		r.Grade = unit.Grade(rapid.Float64Range(-1, 1).Draw(t, "grade"))
		r.Error = rapid.Float64Range(1e-6, 1).Draw(t, "error")
		r.LengthM, r.Pitch.Value = rapid.Float64Range(0, 1e4).Draw(t, "length"), rapid.Float64Range(0, 1e4).Draw(t, "pitch")
		r.Method, r.At = slope.ByTape, Nowhere()
		r.TimeS = rapid.SampledFrom([]float64{math.NaN(), 1.8e9}).Draw(t, "time")
		if rapid.Bool().Draw(t, "placed") {
			r.At.LatDeg, r.At.LonDeg = rapid.Float64Range(-90, 90).Draw(t, "lat"), 8
		}
		r.Place = text.Draw(t, "place")
		file := Encode(Things{Readings: []Reading{r}})
		got, faults := Decode(file)
		if len(faults) > 0 || len(got.Readings) != 1 || got.Readings[0].Grade != r.Grade || math.IsNaN(got.Readings[0].TimeS) != math.IsNaN(r.TimeS) {
			t.Fatalf("%s: %v, %+v", file, faults, got.Readings)
		}
	})
}

// Files from before there were readings, and readings that are wrong.
func TestReadingFaults(t *testing.T) {
	head := `{"format":"hillwright-things","version":1,"things":[],"hills":[]`
	if got, faults := Decode([]byte(head + `}`)); len(faults) > 0 || len(got.Readings) > 0 {
		t.Errorf("an older file: %v", faults)
	}
	for _, bad := range []string{`{"id":"","grade":0.1,"error":0.01}`, `{"id":"a","error":0.01}`, `{"id":"a","grade":0.1}`, `{"id":"a","grade":7,"error":0.01}`, `{"id":"a","grade":0.1,"error":0.01,"lat_deg":99}`, `7`} {
		got, faults := Decode([]byte(head + `,"readings":[` + bad + `,{"id":"good","grade":0.1,"error":0.01}]}`))
		if len(faults) != 1 || len(got.Readings) != 1 {
			t.Errorf("%s: %v, %d kept", bad, faults, len(got.Readings))
		}
	}
	old := Things{Readings: []Reading{{ID: "a", Changed: 1}}}
	if got, did := Merge(old, Things{Readings: []Reading{{ID: "a", Changed: 2}, {ID: "b"}}}); did.Replaced != 1 || did.Added != 1 || len(got.Readings) != 2 {
		t.Errorf("merged: %+v", did)
	}
}
