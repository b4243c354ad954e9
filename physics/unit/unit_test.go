package unit

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

func TestKnownValues(t *testing.T) {
	for _, row := range []struct {
		name      string
		got, want float64
	}{
		{"100 % is 45°", Grade(1).Angle().Degrees(), 45},
		{"sine of 100 %", Grade(1).Sin(), math.Sqrt2 / 2},
		{"0 °C", Celsius(0).Kelvin(), 273.15},
		{"15.5 mph in km/h (SI 2015/24)", Speed(15.5 * MetresPerMile / 3600).KMH(), 24.944832},
		{"10 m/s in km/h", Speed(10).KMH(), 36},
		{"10 m/s in mph", Speed(10).MPH(), 22.36936292},
	} {
		if math.Abs(row.got-row.want) > 1e-8 {
			t.Errorf("%s: %.10f, want %.10f", row.name, row.got, row.want)
		}
	}
}

func TestGradeAndAngleAreOneThing(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		g := Grade(rapid.Float64Range(-3, 3).Draw(t, "grade"))
		if back := GradeOf(g.Angle()); math.Abs(float64(back-g)) > 1e-12*(1+math.Abs(float64(g))) {
			t.Fatalf("%v came back as %v", g, back)
		}
		if s := g.Sin()*g.Sin() + g.Cos()*g.Cos(); math.Abs(s-1) > 1e-12 {
			t.Fatalf("sin²+cos² = %v", s)
		}
	})
}
