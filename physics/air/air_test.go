package air

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/unit"
)

// The columns are printed with four digits after the point, so half of the
// last digit is what they can say.
func TestStandardAtmosphere(t *testing.T) {
	for _, row := range []struct {
		altitudeM, density, bar float64
		source                  string
	}{
		{0, 1.2250, 1.0133, "US Standard Atmosphere 1976 / ISO 2533, geometric altitude; Mechanical Engineers' Handbook vol. 4, table 6"},
		{1000, 1.1117, 0.8988, "same table"},
		{2000, 1.0066, 0.7950, "same table"},
		{3000, 0.9093, 0.7012, "same table"},
	} {
		p := StandardPressure(row.altitudeM)
		if math.Abs(p/1e5-row.bar) > 0.00006 {
			t.Errorf("%g m: %.5f bar, %s says %.4f", row.altitudeM, p/1e5, row.source, row.bar)
		}
		d := Density(StandardTemperature(row.altitudeM), p, 0)
		if math.Abs(d-row.density) > 0.00011 {
			t.Errorf("%g m: %.5f kg/m³, %s says %.4f", row.altitudeM, d, row.source, row.density)
		}
	}
}

func TestSaturationPressure(t *testing.T) {
	for _, row := range []struct{ c, hPa float64 }{{20, 23.326}, {40, 73.675}} {
		if got := SaturationPressure(unit.Celsius(row.c)) / 100; math.Abs(got-row.hPa) > 0.0006 {
			t.Errorf("%g °C: %.4f hPa, the Magnus form of WMO-No. 8 gives %.3f", row.c, got, row.hPa)
		}
	}
}

// The reference library psychrolib (npm 1.1.1) takes the ASHRAE saturation
// formula, which differs from Magnus by up to 0.3 % of the vapour pressure;
// that moves the density by less than 2 parts in 10⁴.
func TestMoistDensityAgainstPsychrolib(t *testing.T) {
	for _, row := range []struct{ c, humidity, pa, density float64 }{
		{20, 0.5, 101325, 1.198898},
		{35, 0.8, 90000, 0.998258},
	} {
		got := Density(unit.Celsius(row.c), row.pa, row.humidity)
		if math.Abs(got/row.density-1) > 2e-4 {
			t.Errorf("%g °C, %g, %g Pa: %.6f kg/m³, psychrolib has %.6f", row.c, row.humidity, row.pa, got, row.density)
		}
	}
}

func TestDensityFallsWithHeatHeightAndDamp(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		c := rapid.Float64Range(-30, 49).Draw(t, "c")
		h := rapid.Float64Range(0, 5000).Draw(t, "h")
		damp := rapid.Float64Range(0, 0.9).Draw(t, "damp")
		base := Density(unit.Celsius(c), StandardPressure(h), damp)
		for name, other := range map[string]float64{
			"hotter": Density(unit.Celsius(c+1), StandardPressure(h), damp),
			"higher": Density(unit.Celsius(c), StandardPressure(h+50), damp),
			"damper": Density(unit.Celsius(c), StandardPressure(h), damp+0.1),
		} {
			if other >= base {
				t.Fatalf("%s air is not thinner: %v, %v", name, base, other)
			}
		}
	})
}

func TestAlong(t *testing.T) {
	for _, row := range []struct{ from, bearing, head, cross float64 }{
		{0, 0, 1, 0}, {180, 0, -1, 0}, {90, 0, 0, 1}, {310, 340, math.Sqrt(3) / 2, -0.5},
	} {
		head, cross := Along(1, float64(unit.FromDegrees(row.from)), float64(unit.FromDegrees(row.bearing)))
		if math.Abs(head-row.head) > 1e-12 || math.Abs(cross-row.cross) > 1e-12 {
			t.Errorf("wind from %g° on %g°: head %g cross %g", row.from, row.bearing, head, cross)
		}
	}
}
