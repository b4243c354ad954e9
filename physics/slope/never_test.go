package slope

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/hill"
	"hillwright/physics/unit"
)

// anyFloat gives every kind of number, most of them near what people measure.
var anyFloat = rapid.OneOf(
	rapid.Float64Range(-2, 2), rapid.Float64Range(0, 1000), rapid.Float64(),
	rapid.SampledFrom([]float64{0, 1, -1, math.NaN(), math.Inf(1), math.Inf(-1), 5e-324, math.MaxFloat64}),
)

// Whatever comes in, a reading is refused or a number with a positive error.
func TestEveryDoorGivesNumbersOrRefuses(t *testing.T) {
	good := func(t *rapid.T, door string, r Reading, err error) {
		if err != nil {
			if err.Error() == "" {
				t.Fatalf("%s refuses without a word", door)
			}
			return
		}
		low, high := r.Interval90()
		for _, v := range []float64{float64(r.Grade), r.Error, r.Shared, r.LengthM, float64(low), float64(high)} {
			if !finite(v) {
				t.Fatalf("%s: %+v", door, r)
			}
		}
		if r.Error <= 0 || r.Shared > r.Error || math.Abs(float64(r.Grade)) > 1 || r.Method == "" {
			t.Fatalf("%s: %+v", door, r)
		}
	}
	rapid.Check(t, func(t *rapid.T) {
		f := func() float64 { return anyFloat.Draw(t, "number") }
		m := func() Measured { return Measured{f(), f()} }
		average := func() Average { return Average{Mean: unit.Angle(f()), Error: unit.Angle(f())} }
		on := Support{BaseM: f(), Bike: rapid.Bool().Draw(t, "bike")}
		kept := Offset{Angle: unit.Angle(f()), Error: unit.Angle(f())}

		r, offset, err := Turned(average(), average(), on, "p")
		good(t, "Turned", r, err)
		if !finite(float64(offset.Angle)) || !finite(float64(offset.Error)) {
			t.Fatalf("offset %+v", offset)
		}
		all := []Reading{r}
		r, err = Tilt(average(), kept, on)
		good(t, "Tilt", r, err)
		all = append(all, r)
		r, err = Sighted(average(), kept)
		good(t, "Sighted", r, err)
		all = append(all, r)
		r, err = Tape(m(), m(), Along(rapid.IntRange(0, 1).Draw(t, "along")))
		good(t, "Tape", r, err)
		all = append(all, r)
		r, err = LevelRaised(m(), m())
		good(t, "LevelRaised", r, err)
		r, err = WheelAndHeights(m(), m(), m(), m())
		good(t, "WheelAndHeights", r, err)
		r, err = WheelAndStairs(m(), m(), m(), m())
		good(t, "WheelAndStairs", r, err)
		r, err = Typed(unit.Grade(f()), f())
		good(t, "Typed", r, err)
		all = append(all, r)

		var known []Reading
		for _, r := range all {
			if r.Error > 0 {
				known = append(known, r)
			}
		}
		for _, list := range [][]Reading{all, known} {
			c, err := Combine(list)
			good(t, "Combine", c.Reading, err)
			if err == nil && (!finite(c.ChiSquare) || !(c.P >= 0 && c.P <= 1) || !(c.Widened >= 1)) {
				t.Fatalf("Combine: %+v", c)
			}
		}
	})
}

func TestRideOfAnythingGivesNumbersOrRefuses(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		var fixes []Fix
		at := 0.0
		for i := range rapid.IntRange(0, 30).Draw(t, "fixes") {
			fix := Fix{hill.Point{LatDeg: 47 + at, LonDeg: 8, HeightM: 400 + 1e4*at, TimeS: float64(i)}, 5, 8}
			at += rapid.Float64Range(0, 1e-4).Draw(t, "step")
			odd := anyFloat.Draw(t, "odd")
			switch rapid.IntRange(0, 20).Draw(t, "which") {
			case 0:
				fix.LatDeg = odd
			case 1:
				fix.LonDeg = odd
			case 2:
				fix.HeightM = odd
			case 3:
				fix.TimeS = odd
			case 4:
				fix.AccuracyM = odd
			case 5:
				fix.HeightAccuracyM = odd
			}
			fixes = append(fixes, fix)
		}
		r, err := RideStretch(fixes, Heights(rapid.IntRange(0, 2).Draw(t, "heights")))
		if err == nil && (!finite(float64(r.Grade)) || !finite(r.Error) || r.Error <= 0 || !finite(r.LengthM)) {
			t.Fatalf("%+v", r)
		}
	})
}
