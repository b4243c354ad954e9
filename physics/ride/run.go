package ride

import (
	"math"

	"hillwright/physics/hill"
	"hillwright/physics/rig"
)

// run is a ride under way: the state, and what has been gathered on this way.
type run struct {
	rig  *rig.Rig
	hill *hill.Profile
	opt  Options

	state
	stalled       bool
	cutOut        bool
	cutOutAtM     float64
	footedAtM     float64 // where a foot first went down, along its way; −1 nowhere
	windingPeakC  float64
	reserveLeastJ float64

	trace    Trace
	beganS   float64
	nextM    float64
	everyM   float64
	passed   []Running  // how each piece was passed, at its slowest
	headroom []float64  // at each piece, as it was passed
	settles  []float64  // about the speed at which each piece settles; −1 not yet known
	bodies   []rig.Body // the state in which each piece was left
	strong   int        // the gear that pulls most at the slowest speed
	onPiece  int
	footings int     // how often a foot went down on this way
	footM    float64 // where it did last
}

// state is what a step of the computation changes.
type state struct {
	atM, timeS, kineticJ float64
	netN                 float64 // pull less load at the end of the last step
	bendN                float64 // its change along the last step, per metre
	slowS                float64 // for how long it has been too slow to balance
	body                 rig.Body
	shift                shifter
	sums                 Energy
}

func newRun(r *rig.Rig, o Options) *run {
	s := &run{rig: r, opt: o, footedAtM: -1}
	s.body = r.Fresh(o.Charge)
	s.windingPeakC, s.reserveLeastJ = s.body.WindingC, s.body.ReserveJ
	s.kineticJ = 0.5 * r.InertialKg * o.StartMps * o.StartMps
	s.sums.KineticStartJ = s.kineticJ
	s.shift = newShifter(r)
	return s
}

// tracePoints is about how many points a trace has: enough for a wide screen.
const tracePoints = 600

// begin sets out on a way.
func (s *run) begin(p *hill.Profile, first bool) {
	s.hill, s.atM, s.nextM, s.beganS = p, 0, 0, s.timeS
	s.everyM = math.Max(2, p.LengthM()/tracePoints)
	s.trace = newTrace(int(p.LengthM()/s.everyM) + 2*len(p.Grade) + 8)
	s.passed = make([]Running, len(p.Grade))
	s.headroom = make([]float64, len(p.Grade))
	s.bodies = make([]rig.Body, len(p.Grade))
	s.settles = make([]float64, len(p.Grade))
	s.forget()
	s.footings = 0
	level := s.rig.At(&s.body, 0, 1)
	s.strong = s.rig.StrongestGear(s.rig.Rider.HoldMps, &level)
	if first {
		s.shift.start(s.rig, s.opt.StartMps, &s.body)
	}
}

func (s *run) speed() float64 { return math.Sqrt(2 * s.kineticJ / s.rig.InertialKg) }

// forget drops what is known of speeds ahead.
func (s *run) forget() {
	for i := range s.settles {
		s.settles[i] = -1
	}
}

// piece rides one piece of constant grade; false when the rig stalls on it.
func (s *run) piece(i int) bool {
	at := placeOn(s.rig, s.hill, i)
	end := s.hill.EdgeM[i+1]
	coast := wanted(s.rig, &at, s.opt.DownMps) < 0
	now := s.rig.At(&s.body, at.sin, at.cos)
	s.onPiece = i
	s.mark(&at, &now, coast)
	settled := false // passed[i] holds a speed that was not still rising
	for s.atM < end {
		now = s.rig.At(&s.body, at.sin, at.cos)
		s.choose(&now)
		s.seePack(&now, coast)
		before, shifting := s.speed(), s.shift.under()
		s.advance(&at, &now, end, coast)
		after := s.speed()
		if falling := after <= before && !shifting; !settled || falling && after < s.passed[i].SpeedMps {
			s.passed[i] = s.running(after, &now, coast)
			settled = settled || falling
		}
		if s.hasStalled(before, after) {
			if s.restart(&at, &now, coast) {
				settled, s.passed[i] = false, Running{}
				continue
			}
			s.stalled = true
			break
		}
		if s.atM >= s.nextM {
			s.mark(&at, &now, coast)
		}
	}
	s.leave(i, &at)
	return !s.stalled
}

// leave notes the state and the headroom with which a piece is left.
func (s *run) leave(i int, at *Place) {
	now := s.rig.At(&s.body, at.sin, at.cos)
	s.bodies[i] = s.body
	s.headroom[i] = headroom(s.wants(i), s.strongest(&now))
}

// strongest is the pull at the slowest speed in the gear that pulls most.
func (s *run) strongest(now *rig.Now) float64 {
	return s.rig.PullAt(s.rig.Rider.HoldMps, s.strong, now).Sum()
}

// skip weighs the pieces that were not reached, in the state of the stall.
func (s *run) skip(from int) {
	for i := from; i < len(s.hill.Grade); i++ {
		at := placeOn(s.rig, s.hill, i)
		s.leave(i, &at)
	}
}

// wants is the pull that a piece wants at the slowest speed [N].
func (s *run) wants(i int) float64 {
	at := placeOn(s.rig, s.hill, i)
	return wanted(s.rig, &at, s.rig.Rider.HoldMps)
}

// finish marks the last point of a way.
func (s *run) finish() {
	i := s.hill.PieceAt(s.atM)
	at := placeOn(s.rig, s.hill, i)
	now := s.rig.At(&s.body, at.sin, at.cos)
	s.mark(&at, &now, wanted(s.rig, &at, s.opt.DownMps) < 0)
}

// closeM is how near to the place where something happens (a shift, a stall) a
// step must end [m].
const closeM = 0.02

// advance takes a step, a shorter one when something happens within it, so
// that events do not depend on where the steps happen to fall.
func (s *run) advance(at *Place, now *rig.Now, end float64, coast bool) {
	was := s.state
	before := s.speed()
	for h := math.Min(end-s.atM, s.stepM(before)); ; h /= 2 {
		s.step(at, now, h, coast)
		if s.atM > end-1e-9 {
			s.atM = end
		}
		after := s.speed()
		happened := s.wantsShift(now) || s.hasStalled(before, after) || was.shift.endedBefore(s.timeS-was.timeS)
		if h < closeM || !happened {
			return
		}
		s.state = was
	}
}

// bendMost is the change of the net force along a step [N] beyond which a step
// is too long to follow it.
const bendMost = 4

// stepM is the length of the next step [m]: a second of road, less where the
// kinetic energy or the net force change fast, and no further than a shift
// lasts.
func (s *run) stepM(v float64) float64 {
	h := math.Min(10, v)
	if change := math.Abs(s.netN); change*h > 0.2*s.kineticJ {
		h = 0.2 * s.kineticJ / change
	}
	if s.bendN*h > bendMost {
		h = bendMost / s.bendN
	}
	return s.shift.cap(v, s.opt.StepScale*math.Max(0.02, h))
}

// wobbleS is how long a rider keeps upright below the slowest speed to balance
// at while it still gains [s]: long enough for a start at startMps2. Common
// practice, no source.
const wobbleS = 6.0

// hasStalled tells whether the rig can no longer keep itself up: slower than
// the slowest speed to balance at, and not gaining or for too long. A shift is
// waited for.
func (s *run) hasStalled(before, after float64) bool {
	if after <= 1e-6 || s.slowS > wobbleS {
		return true
	}
	return after < s.rig.Rider.HoldMps && after <= before && !s.shift.under()
}

// pedals tells whether the rider pedals at a speed [m/s]: always but where the
// road drives to the speed that the brakes hold (coast); there they pedal up to
// half of that speed and then let it run.
func (s *run) pedals(v float64, coast bool) bool {
	return !coast || v < math.Max(s.rig.Rider.HoldMps, s.opt.DownMps/2)
}

func (s *run) running(v float64, now *rig.Now, coast bool) Running {
	if !s.pedals(v, coast) {
		return Running{SpeedMps: v, Gear: s.shift.gear, SetBy: rig.Coasting}
	}
	return running(s.rig, v, s.shift.gear, now)
}
