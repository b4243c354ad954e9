package ride

import (
	"errors"
	"math"

	"hillwright/physics/hill"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// Options say how a hill is ridden: the speed at its foot [m/s], the speed
// that the brakes hold on the way down [m/s], and a factor on the length of
// the computation's steps (0 and 1 are the usual ones; 0.5 halves them).
type Options struct {
	StartMps  float64
	DownMps   float64
	StepScale float64
}

// ErrNoRoad says that a profile has no piece of road.
var ErrNoRoad = errors.New("the hill has no road: give it at least one stretch")

// Climb takes a rig over a hill from its foot and gives the whole answer. It
// fails only for a profile without road.
func Climb(r *rig.Rig, p *hill.Profile, o Options) (Answer, error) {
	if len(p.Grade) == 0 {
		return Answer{}, ErrNoRoad
	}
	if o.StepScale == 0 {
		o.StepScale = 1
	}
	s := newRun(r, p, o)
	for i := range p.Grade {
		if !s.piece(i) {
			break
		}
	}
	return s.answer(), nil
}

// run is a ride under way: the state, and what has been gathered.
type run struct {
	rig  *rig.Rig
	hill *hill.Profile
	opt  Options
	easy Balance // the weighing of a level road: its pegs hold everywhere

	state
	stalled bool

	trace  Trace
	nextM  float64
	everyM float64
	passed []Running // how each piece was passed, at its slowest
}

// state is what a step of the computation changes.
type state struct {
	atM, timeS, kineticJ float64
	netN                 float64 // pull less load at the end of the last step
	shift                shifter
	sums                 Energy
}

func newRun(r *rig.Rig, p *hill.Profile, o Options) *run {
	s := &run{rig: r, hill: p, opt: o, easy: Weigh(r, At(0, 0))}
	s.kineticJ = 0.5 * r.InertialKg * o.StartMps * o.StartMps
	s.sums.KineticStartJ = s.kineticJ
	s.shift = newShifter(r, o.StartMps)
	s.everyM = math.Max(2, p.LengthM()/tracePoints)
	s.passed = make([]Running, len(p.Grade))
	return s
}

// tracePoints is about how many points a trace has: enough for a wide screen.
const tracePoints = 1200

func (s *run) speed() float64 { return math.Sqrt(2 * s.kineticJ / s.rig.InertialKg) }

// piece rides one piece of constant grade; false when the rig stalls on it.
func (s *run) piece(i int) bool {
	at := placeOn(s.rig, s.hill, i)
	end := s.hill.EdgeM[i+1]
	coast := wanted(s.rig, &at, s.opt.DownMps) < 0
	s.mark(i, &at, coast)
	settled := false // passed[i] holds a speed that was not still rising
	for s.atM < end {
		s.shift.choose(s.rig, s.speed())
		before, shifting := s.speed(), s.shift.under()
		s.advance(&at, end, coast)
		after := s.speed()
		if falling := after <= before && !shifting; !settled || falling && after < s.passed[i].SpeedMps {
			s.passed[i] = s.running(after, coast)
			settled = settled || falling
		}
		if s.hasStalled(before, after) {
			s.stalled = true
			s.mark(i, &at, coast)
			return false
		}
		if s.atM >= s.nextM {
			s.mark(i, &at, coast)
		}
	}
	return true
}

// closeM is how near to the place where something happens (a shift, a stall) a
// step must end [m].
const closeM = 0.002

// advance takes a step, a shorter one when something happens within it, so
// that events do not depend on where the steps happen to fall.
func (s *run) advance(at *Place, end float64, coast bool) {
	was := s.state
	before := s.speed()
	for h := math.Min(end-s.atM, s.stepM(before)); ; h /= 2 {
		s.step(at, h, coast)
		if s.atM > end-1e-9 {
			s.atM = end
		}
		after := s.speed()
		happened := s.shift.wants(s.rig, after) || s.hasStalled(before, after) || was.shift.endedBefore(s.timeS-was.timeS)
		if h < closeM || !happened {
			return
		}
		s.state = was
	}
}

// stepM is the length of the next step [m]: half a second of road, less where
// the kinetic energy changes fast, and no further than a shift lasts.
func (s *run) stepM(v float64) float64 {
	h := math.Min(5, v/2)
	if change := math.Abs(s.netN); change*h > 0.2*s.kineticJ {
		h = 0.2 * s.kineticJ / change
	}
	return s.shift.cap(v, s.opt.StepScale*math.Max(0.02, h))
}

// hasStalled tells whether the rig can no longer keep itself up: slower than
// the slowest speed to balance at, and not gaining. A shift is waited for.
func (s *run) hasStalled(before, after float64) bool {
	if after <= 1e-6 {
		return true
	}
	return after < s.rig.Rider.HoldMps && after <= before && !s.shift.under()
}

// step advances the ride by h metres of road: classical Runge–Kutta in the
// kinetic energy, whose change per metre is the sum of the forces. The work of
// each force is summed with the same weights, so the books balance.
func (s *run) step(at *Place, h float64, coast bool) {
	v0 := s.speed()
	k1 := s.forces(at, s.kineticJ, coast)
	k2 := s.forces(at, s.kineticJ+h/2*k1.net, coast)
	middle := s.kineticJ + h/2*k2.net
	k3 := s.forces(at, middle, coast)
	k4 := s.forces(at, s.kineticJ+h*k3.net, coast)
	w := h / 6
	weight := s.rig.Road.MassKg * unit.Gravity
	slope, rolling := weight*at.sin*h, weight*s.rig.Road.Crr*at.cos*h
	riderJ := w * (k1.rider + 2*k2.rider + 2*k3.rider + k4.rider)
	motorJ := w * (k1.motor + 2*k2.motor + 2*k3.motor + k4.motor)
	airJ := w * (k1.air + 2*k2.air + 2*k3.air + k4.air)
	bearingsJ := w * (k1.bearings + 2*k2.bearings + 2*k3.bearings + k4.bearings)
	kinetic := s.kineticJ + riderJ + motorJ - airJ - bearingsJ - slope - rolling
	if kinetic < 0 {
		// It comes to rest within the step: ride only to where it does.
		part := 0.999999 * s.kineticJ / (s.kineticJ - kinetic)
		h, slope, rolling = h*part, slope*part, rolling*part
		riderJ, motorJ, airJ, bearingsJ = riderJ*part, motorJ*part, airJ*part, bearingsJ*part
		kinetic = s.kineticJ + riderJ + motorJ - airJ - bearingsJ - slope - rolling
		middle = kinetic
	}
	if most := 0.5 * s.rig.InertialKg * s.opt.DownMps * s.opt.DownMps; coast && kinetic > most {
		held := math.Max(most, s.kineticJ-h*brakeN(s.rig))
		if kinetic > held {
			s.sums.BrakesJ += kinetic - held
			kinetic = held
		}
	}
	s.kineticJ = kinetic
	s.netN = k4.net
	s.atM += h
	s.sums.RiderJ += riderJ
	s.sums.MotorJ += motorJ
	s.sums.AirJ += airJ
	s.sums.BearingsJ += bearingsJ
	s.sums.SlopeJ += slope
	s.sums.RollingJ += rolling
	dt := s.duration(h, v0, middle)
	s.timeS += dt
	s.shift.pass(dt)
}

// brakeN is how hard a rider slows for the way down [N]: 1.5 m/s², well within
// what dry tyres and brakes give. Common practice, no source.
func brakeN(r *rig.Rig) float64 { return 1.5 * r.InertialKg }

// duration is the time [s] that h metres took, from the speed before, the
// kinetic energy half-way, and the state after: Simpson's rule on 1/v; near
// standstill, where 1/v has no Simpson, the constant-force form 2h/(v0+v1).
func (s *run) duration(h, v0, middleJ float64) float64 {
	v1 := s.speed()
	if v0 < 0.7 || v1 < 0.7 || middleJ <= 0 {
		return 2 * h / math.Max(v0+v1, 1e-6)
	}
	vm := math.Sqrt(2 * middleJ / s.rig.InertialKg)
	return h / 6 * (1/v0 + 4/vm + 1/v1)
}

// forces are the pulls and resistances [N] that change along a step, and
// their net with the constant ones.
type forces struct{ rider, motor, air, bearings, net float64 }

func (s *run) forces(at *Place, kineticJ float64, coast bool) forces {
	r := s.rig
	v := math.Sqrt(2 * math.Max(kineticJ, 0) / r.InertialKg)
	parts := r.Road.Parts(v, at.sin, at.cos, at.HeadMps, at.CrossMps)
	f := forces{air: parts.Air, bearings: parts.Bearings}
	if !coast {
		pull := r.PullAt(v, s.shift.gear)
		ease := s.shift.ease()
		f.rider, f.motor = ease*pull.RiderN, ease*pull.MotorN
	}
	f.net = f.rider + f.motor - parts.Sum()
	return f
}

func (s *run) running(v float64, coast bool) Running {
	if coast {
		return Running{SpeedMps: v, Gear: s.shift.gear, SetBy: rig.Coasting}
	}
	return running(s.rig, v, s.shift.gear)
}

// mark adds a point to the trace.
func (s *run) mark(i int, at *Place, coast bool) {
	v := s.speed()
	now := s.running(v, coast)
	want := wanted(s.rig, at, s.rig.Rider.HoldMps)
	pull := s.easy.Pegs[0].PullN
	t := &s.trace
	t.AtM = append(t.AtM, s.atM)
	t.TimeS = append(t.TimeS, s.timeS)
	t.SpeedMps = append(t.SpeedMps, v)
	t.Gear = append(t.Gear, now.Gear)
	t.CadenceRPM = append(t.CadenceRPM, now.CadenceRPM)
	t.RiderW = append(t.RiderW, now.RiderW)
	t.MotorW = append(t.MotorW, now.MotorW)
	t.WantedN = append(t.WantedN, want)
	t.PullN = append(t.PullN, pull)
	t.Headroom = append(t.Headroom, headroom(want, pull))
	t.SetBy = append(t.SetBy, now.SetBy)
	s.nextM = s.atM + s.everyM
}

func (s *run) answer() Answer {
	last := len(s.hill.Grade) - 1
	if !s.stalled {
		at := placeOn(s.rig, s.hill, last)
		s.mark(last, &at, wanted(s.rig, &at, s.opt.DownMps) < 0)
	}
	s.sums.KineticEndJ = s.kineticJ
	s.sums.finish(s.rig)
	a := Answer{
		TimeS: s.timeS, Energy: s.sums, Trace: s.trace,
		LengthM: s.hill.LengthM(), AscentM: s.hill.AscentM(), DescentM: s.hill.DescentM(),
		Stalled: s.stalled,
	}
	if s.stalled {
		a.StalledAtM = s.atM
	}
	worst := s.worst()
	at := placeOn(s.rig, s.hill, worst)
	a.Balance = Weigh(s.rig, at)
	a.Hardest = s.stretch(worst)
	a.Verdict = verdict(s.stalled, a.Balance.Headroom())
	return a
}
