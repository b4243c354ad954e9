// Package coast turns speed over time of a bike that coasts into its drag: Crr
// and CdA with errors, and what the data cannot tell. It also judges a wheel
// that spins down on a stand. Start with Fit.
//
// The equation is −m_eff·dv/dt = m·G·(Crr·cos θ + sin θ) + ½ρ·CdA·(v+w)·|v+w|
// with m_eff = m + ΣI/r². Runs both ways cancel a small grade and wind, as in
// SAE J1263; here the grade and the wind are fitted with the rest, within what
// is known of them. Bearings and freehub count in with rolling, the wheels' own
// drag and a load's with the air.
package coast

import (
	"math"

	"hillwright/physics/click"
)

// Value is a number and how far it may be off, one standard deviation.
type Value struct{ Value, Error float64 }

// Setup is what is known beforehand: all-up mass and the wheels' inertia as a
// mass, ΣI/r² [kg]; the road's grade in the outward direction (rise/run); the
// wind against that direction [m/s]; the air's density [kg/m³]; by what all
// speeds are to be multiplied (1 and the roll-out's error); and Crr and CdA
// [m²] as they are taken to be, which stand in where the data cannot tell.
type Setup struct {
	MassKg, InertiaKg Value
	Grade, HeadMps    Value
	DensityKgM3       Value
	CircumferencePart Value
	Crr, CdAM2        Value
}

// Run is one coast-down: its speeds, or the times at marks. Back tells that it
// was ridden against the outward direction.
type Run struct {
	Back   bool
	Points []Point
	Marks  []Mark
}

// Point is a speed at a time.
type Point struct{ AtS, SpeedMps, ErrorMps float64 }

// Mark is the time at which a mark was passed, AtM [m] along the road.
type Mark struct{ AtM, AtS, ErrorS float64 }

// Errors of what a person reads off, one standard deviation: a thumb on a
// stopwatch [s]; a display of whole km/h that follows a little late [m/s].
// Common practice, no source.
const (
	ThumbErrorS     = 0.15
	DisplayErrorMps = 0.5 / 3.6
)

// Estimate is a number that was found: Low and High are its 90 % interval,
// Error one standard deviation. Held tells that the data could not tell it
// better than was known before.
type Estimate struct {
	Value, Low, High, Error float64
	Held                    bool
}

// Result is what runs say together. Grade and HeadMps are for the outward
// direction.
type Result struct {
	Crr, CdAM2     Estimate
	Correlation    float64 // of the errors of Crr and CdA
	Grade, HeadMps Estimate
	BothWays       bool
	Runs           []RunFit
	Wander         float64 // how much gusts and bumps move the speed [m/s in 1 s]
}

// RunFit is how one run fits: its part that was used, the length of road [m],
// the root mean square of what is left beside its errors, the fitted speeds.
// Odd tells that it would fit much better had it been ridden the other way.
type RunFit struct {
	FromS, ToS       float64
	StartMps, EndMps float64
	LengthM          float64
	Misfit           float64
	Odd              bool
	Curve            []Point
}

// FromClicks turns click rates into speeds: the wheel's circumference [m] over
// its clicks per turn.
func FromClicks(points []click.Point, clicksPerTurn, circumferenceM float64) []Point {
	by := circumferenceM / clicksPerTurn
	out := make([]Point, len(points))
	for i, p := range points {
		out[i] = Point{p.AtS, p.RateHz * by, p.ErrorHz * by}
	}
	return out
}

// ClicksPerTurn gives the clicks of one turn, a whole number, from clicks that
// were counted over whole turns; off is by how many the count may be wrong. The
// error is an *Error when no whole number comes out.
func ClicksPerTurn(clicks int, off, turns float64) (float64, error) {
	per := float64(clicks) / turns
	whole := math.Round(per)
	// The first or the last click may lie beyond the turns.
	if !(turns >= 1) || whole < 4 || whole > 200 || math.Abs(per-whole)*turns > 1.5+off || (1+off)/turns > 0.5 {
		return 0, &Error{Kind: NotWhole, Got: per, Want: turns}
	}
	return whole, nil
}
