// Package ride takes a rig over a hill. Start with Climb, which gives the
// whole answer, or Steady, which answers for one grade without a hill.
package ride

import (
	"hillwright/physics/rig"
	"hillwright/physics/road"
	"hillwright/physics/unit"
)

// Verdict is the one word of an answer.
type Verdict uint8

// The verdicts. Clears: pull to spare on the hardest stretch (TightBelow or
// more of it unused). Tight: it gets up, with little to spare, only by
// momentum, or with a foot on the ground on the way. Short: it stops before the
// end.
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
	// SteepestGrade is the steepest grade that the pull holds, tyres and
	// balance included.
	SteepestGrade unit.Grade
}

// Headroom is the first peg's: the part of its pull that is to spare.
func (b *Balance) Headroom() float64 { return b.Pegs[0].Headroom }

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
	// MotorEfficiency is the part of the pack's power that leaves the motor, 0
	// when it rests.
	MotorEfficiency float64
	SetBy           rig.Limit
}

// SteadyAnswer is the answer for one grade that goes on for ever. Held is
// false when the rig cannot keep itself up on it; then Running is zero.
type SteadyAnswer struct {
	Verdict Verdict
	Held    bool
	Balance Balance
	Running Running
	Start   Start
	// EasingS is how long the motor holds from cold before it eases off [s],
	// +Inf when it never does.
	EasingS float64
}

// Start is whether the rig starts from rest at a place: with the given
// acceleration through the first half turn of the cranks, in its easiest
// suitable gear. StoppedBy is the limit that prevents it. InGear tells whether
// it also starts in the gear in which it was riding there. PushOK tells whether
// a person on foot gets it up, with walk assistance where the law and the
// motor give it.
type Start struct {
	OK        bool
	StoppedBy rig.Limit
	Gear      int
	InGear    bool
	PushOK    bool
	WantedN   float64
	PullN     float64
}

// Stretch is a part of the hill [m along the road from its foot]. Grade is its
// mean, SteepestGrade its steepest piece. Trip and Back tell on which trip, and
// whether on the way back, it is hardest.
type Stretch struct {
	FromM, ToM    float64
	Grade         unit.Grade
	SteepestGrade unit.Grade
	Trip          int
	Back          bool
	// Running is how the rig passes it in the simulation, at its slowest.
	Running Running
}

// Trace is a ride point by point, for pictures and the staff. All slices have
// one length. Headroom is the least at this place of all passes.
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
	WindingC   []float64
	Charge     []float64
	ReserveJ   []float64 // what is left of the rider's W′
}

// Energy is where the work of a ride came from and went [J].
type Energy struct {
	// At the road: what rider and motor gave at the tyre and the kinetic energy
	// at the start; what slope, rolling, air, bearings, a dragging motor and the
	// brakes took, and the kinetic energy at the end.
	RiderJ, MotorJ                    float64
	SlopeJ, RollingJ, AirJ, BearingsJ float64
	DragJ, BrakesJ                    float64
	KineticStartJ, KineticEndJ        float64
	// Behind the tyre: what the cells gave (ChemicalJ, less what recovery put
	// back), what the pack kept as heat, what left it; where that went.
	ChemicalJ, PackHeatJ, FromPackJ     float64
	ShaftJ, WindingJ, CaseJ, ElsewhereJ float64
	// RecoveredJ is what the motor's braking put into the pack.
	RecoveredJ float64
	// RiderCrankJ is what the rider gave at the cranks.
	RiderCrankJ float64
}

// WayDown is what is said of the way down a hill, in the direction in which it
// falls. Falls is false when it does not.
type WayDown struct {
	Falls bool
	// FrontPeakC and RearPeakC are the brakes' peaks at the chosen speed.
	FrontPeakC, RearPeakC float64
	// Warm tells that a brake passes its caution at the chosen speed.
	Warm bool
	// SteepestGrade is the steepest fall, positive.
	SteepestGrade unit.Grade
	// DecelMps2 and StoppingM are for the chosen speed on the steepest fall,
	// with the brakes as warm as they get; StopBy is what bounds the stop.
	DecelMps2, StoppingM float64
	StopBy               road.StopLimit
	// MostMps is the speed not to exceed, ByHeat whether the brakes' heat sets
	// it (else the way that one sees).
	MostMps float64
	ByHeat  bool
}

// Answer is everything that is said of a rig on a hill.
type Answer struct {
	Verdict Verdict
	Balance Balance // at the hardest place
	Hardest Stretch
	Start   Start // from rest, at the hardest place
	// ClimbS is the riding time once over the hill, on the trip of the hardest
	// stretch; TourS that of everything with pauses.
	ClimbS, TourS float64
	Energy        Energy
	LengthM       float64
	AscentM       float64
	DescentM      float64
	// Stalled tells that the rig stops before the end, at StalledAtM from the
	// foot of the hill, on StalledTrip (from 0), StalledBack on the way back.
	Stalled     bool
	StalledAtM  float64
	StalledTrip int
	StalledBack bool
	// Footed tells that a foot goes down on the way and the rig starts again
	// from rest, first at FootedAtM from the foot of the hill, on FootedTrip
	// (from 0), FootedBack on the way back.
	Footed     bool
	FootedAtM  float64
	FootedTrip int
	FootedBack bool

	WindingPeakC float64
	// EasingS is how long the motor holds a steady climb of the hardest stretch
	// from cold before it eases off [s], +Inf when it never does.
	EasingS    float64
	ChargeLeft float64
	// CutOut tells that the pack gave out under load (less than a quarter of the
	// motor's power), first at CutOutAtM from the foot of the hill, on CutOutTrip (from 0), CutOutBack on
	// the way back.
	CutOut     bool
	CutOutAtM  float64
	CutOutTrip int
	CutOutBack bool
	// TripsPerCharge is how often a full charge, less the reserve, serves for
	// what the first trip took; +Inf when it took nothing.
	TripsPerCharge float64
	ReserveLeftJ   float64 // the least that was left of the rider's W′
	WayDown        WayDown
	Trace          Trace
}
