// Package slope turns what a person can do at the foot of a pitch into its
// grade with an honest error: a phone laid down (Steady, then Turned or Tilt),
// sighted along (Sighted), a level and a tape (Tape, LevelRaised), wheel turns
// and heights (WheelAndHeights, WheelAndStairs), a stretch of the ride
// (RideStretch, TrackStretch). Combine weighs several readings; an Entry keeps
// one; Hill, CSV and GPX make something of a list of them.
package slope

import (
	"math"

	"hillwright/physics/unit"
)

// SteepestReading bounds every reading: 1 is 100 %, 45°. Beyond it a reading is
// refused as a slip of the hand.
const SteepestReading unit.Grade = 1

// Method says how a grade was read. The texts are stable: they are stored.
type Method string

// The ways to read a grade.
const (
	ByTilt         Method = "tilt"            // phone laid down once, stored offset
	ByTurnedTilt   Method = "tilt-turned"     // phone laid down twice, turned half round
	BySight        Method = "sight"           // along the phone's edge, by eye
	ByTape         Method = "tape"            // rise over a known length
	ByLevel        Method = "level"           // a level, raised at one end
	ByWheelHeights Method = "wheel-altimeter" // wheel turns, two heights
	ByWheelStairs  Method = "wheel-stairs"    // wheel turns, stair steps
	ByRide         Method = "ride"            // fixes of the ride being recorded
	ByTrack        Method = "track"           // a stretch of a loaded track
	ByHand         Method = "typed"
	ByAll          Method = "combined"
)

// Measured is a value with its error (1 σ), both in one unit. An error of 0
// says that it is exact.
type Measured struct{ Value, Error float64 }

// Reading is a grade that was read. Error is its standard error (1 σ), as a
// grade like the grade itself: 0.12 with 0.004 is 12 % ± 0.4 %.
//
// Shared is the part of Error (1 σ) that all readings of the same SharedBy have
// in common, as a phone's stored offset; 0 and "" when there is none. LengthM
// is the road length that the reading spans [m], 0 when it was read at a spot.
type Reading struct {
	Grade    unit.Grade
	Error    float64
	Method   Method
	Shared   float64
	SharedBy string
	LengthM  float64
}

// Factors from a standard error to an interval of the normal distribution.
const (
	factor90 = 1.6448536269514722 // 90 % within
	// ShownFactor makes the ± that is shown of a standard error. 1.96 would hold
	// 95 of 100 if the error itself were known; it is not, so a tenth is added
	// (the guide to uncertainty in measurement, JCGM 100:2008, 6.3, has 2 to 3).
	ShownFactor = 2.15
)

// PlusMinus is the error to show behind ±, as a grade: ShownFactor standard
// errors, which cover the true grade in 95 of 100 readings or more.
func (r Reading) PlusMinus() float64 { return ShownFactor * r.Error }

// Interval90 gives the grades between which the true one lies in 90 of 100
// readings.
func (r Reading) Interval90() (low, high unit.Grade) {
	half := unit.Grade(factor90 * r.Error)
	return r.Grade - half, r.Grade + half
}

// Straddles tells that the 90 % interval reaches to both sides of a limit, the
// steepest grade that is held: then the reading does not decide, and the advice
// is to measure again.
func (r Reading) Straddles(limit unit.Grade) bool {
	low, high := r.Interval90()
	return low < limit && limit < high
}

// Reversed is the same reading the other way along the road.
func (r Reading) Reversed() Reading {
	r.Grade = -r.Grade
	return r
}

// finestError is the least error that a reading may state [grade].
const finestError = 1e-9

// Typed is a grade that a person knows, from a road sign or a map. The error is
// 1 σ; a sign in whole per cent is right to about 0.01 (common practice, no
// source).
func Typed(grade unit.Grade, err float64) (Reading, error) {
	return checked(Reading{Grade: grade, Error: err, Method: ByHand})
}

// checked lets a reading out that is a number, with an error above 0, and no
// steeper than SteepestReading, which also bounds its error.
func checked(r Reading) (Reading, error) {
	switch {
	case !finite(float64(r.Grade)):
		return Reading{}, &Error{Kind: NotANumber, What: "grade", Got: float64(r.Grade)}
	case math.Abs(float64(r.Grade)) > float64(SteepestReading):
		return Reading{}, &Error{Kind: OutOfRange, What: "grade", Got: float64(r.Grade)}
	case !finite(r.Error):
		return Reading{}, &Error{Kind: NotANumber, What: "error", Got: r.Error}
	case r.Error < finestError || r.Error > float64(SteepestReading):
		return Reading{}, &Error{Kind: OutOfRange, What: "error", Got: r.Error}
	}
	return r, nil
}

func finite(v float64) bool { return !math.IsNaN(v) && !math.IsInf(v, 0) }
