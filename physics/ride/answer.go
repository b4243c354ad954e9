// Package ride takes a rig over a hill. Start with Climb, which gives the
// whole answer, or Steady, which answers for one grade without a hill.
package ride

import (
	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// Verdict is the one word of an answer.
type Verdict uint8

// The verdicts. Clears: pull to spare on the hardest stretch (TightBelow or
// more of it unused). Tight: it gets up, with little or only momentum to
// spare. Short: it stops before the end.
const (
	Clears Verdict = iota
	Tight
	Short
)

var verdictNames = []string{"clears", "tight", "short"}

// String is the verdict's name in files and on the command line.
func (v Verdict) String() string { return verdictNames[v] }

// TightBelow is the headroom under which an answer is tight. Common practice,
// no source: a rider and a sheet are not known better than to a tenth.
const TightBelow = 0.10

// Peg is one limit on the balance: the pull that it alone allows [N at the
// tyre] at the slowest speed at which one can still balance, in the gear that
// pulls most there, and its headroom: the part of that pull which the place
// does not want (1 − wanted/pull; negative when it wants more).
type Peg struct {
	Limit    rig.Limit
	PullN    float64
	Headroom float64
}

// Balance weighs what a place wants against what every limit allows.
// Pegs are in order, least pull first; the first one binds. A limit that does
// not act at this speed is left out.
type Balance struct {
	Grade      unit.Grade
	SpeedMps   float64 // the speed of the weighing: the slowest to balance at
	Gear       int     // index into rig.Gears
	CadenceRPM float64
	WantedN    float64 // what the road wants there
	Pegs       []Peg
	// SteepestGrade is the steepest grade that the first peg holds.
	SteepestGrade unit.Grade
}

// Running is how a rig rides along at one place once it has settled (or, in a
// trace, passes by): the gear, what sets the speed, and who gives what.
type Running struct {
	SpeedMps   float64
	Gear       int
	CadenceRPM float64
	RiderN     float64 // at the tyre
	MotorN     float64 // at the tyre
	RiderW     float64 // at the tyre
	MotorW     float64 // at the tyre
	SetBy      rig.Limit
}

// SteadyAnswer is the answer for one grade that goes on for ever. Held is
// false when the rig cannot keep itself up on it; then Running is zero.
type SteadyAnswer struct {
	Verdict Verdict
	Held    bool
	Balance Balance
	Running Running
}

// Stretch is a part of the hill [m along the road from its foot]. Grade is its
// mean, SteepestGrade its steepest piece.
type Stretch struct {
	FromM, ToM    float64
	Grade         unit.Grade
	SteepestGrade unit.Grade
	// Running is how the rig passes the steepest piece in the simulation, at
	// its slowest there.
	Running Running
}

// Trace is the ride point by point, for pictures and the staff. All slices
// have one length; Headroom is that of the balance at this place.
type Trace struct {
	AtM        []float64
	TimeS      []float64
	SpeedMps   []float64
	Gear       []int
	CadenceRPM []float64
	RiderW     []float64 // at the tyre
	MotorW     []float64 // at the tyre
	WantedN    []float64
	PullN      []float64 // the first peg of the balance here
	Headroom   []float64
	SetBy      []rig.Limit // the limit that decides the pull as it passes
}

// Energy is where the work of a ride came from and went [J]. In is what the
// rider and motor gave at the tyre plus the kinetic energy at the start; the
// rest is where it went. Climb checks In − Out = 0 to 1e-6 of In on every run.
type Energy struct {
	RiderJ, MotorJ                      float64
	SlopeJ, RollingJ, AirJ, BearingsJ   float64
	BrakesJ                             float64
	KineticStartJ, KineticEndJ          float64
	RiderCrankJ, MotorShaftJ, FromPackJ float64
}

// Answer is everything that is said of a rig on a hill.
type Answer struct {
	Verdict  Verdict
	Balance  Balance // at the hardest place
	Hardest  Stretch
	TimeS    float64
	Energy   Energy
	LengthM  float64
	AscentM  float64
	DescentM float64
	// Stalled tells that the rig stops before the end, at StalledAtM.
	Stalled    bool
	StalledAtM float64
	Trace      Trace
}

// Headroom is the first peg's: the part of its pull that is to spare.
func (b *Balance) Headroom() float64 {
	if len(b.Pegs) == 0 {
		return 0
	}
	return b.Pegs[0].Headroom
}
