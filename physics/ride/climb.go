package ride

import (
	"errors"
	"math"

	"hillwright/physics/hill"
	"hillwright/physics/rig"
)

// Options say how a hill is ridden. The zero value of each but Charge works.
type Options struct {
	StartMps float64 // speed at the foot [m/s]
	DownMps  float64 // speed that the brakes hold on the way down [m/s]
	Charge   float64 // the pack's charge at the start, 0 to 1
	Reserve  float64 // charge that is kept back for TripsPerCharge, 0 to 1
	Back     bool    // there and back
	Trips    int     // how often; 0 is once
	PauseS   float64 // rest after every way [s]
	Recover  bool    // a motor that can brakes on the way down and recovers
	SightM   float64 // way that one sees on the way down [m]
	ReactS   float64 // time to react before braking [s]
	// StepScale scales the length of the computation's steps: 0 and 1 are the
	// usual ones, 0.5 halves them.
	StepScale float64
}

// ErrNoRoad says that a profile has no piece of road.
var ErrNoRoad = errors.New("the hill has no road: give it at least one stretch")

// Climb takes a rig over a hill from its foot, there and back and several
// times if asked, and gives the whole answer. It fails only for a profile
// without road.
func Climb(r *rig.Rig, p *hill.Profile, o Options) (Answer, error) {
	if len(p.Grade) == 0 {
		return Answer{}, ErrNoRoad
	}
	if o.StepScale == 0 {
		o.StepScale = 1
	}
	// Nobody rides down more slowly than they balance.
	o.DownMps = math.Max(o.DownMps, r.Rider.HoldMps)
	t := newTour(r, p, o)
	t.ride()
	return t.answer(), nil
}

// tour is all the ways of a ride: up, and back if asked, as often as asked.
type tour struct {
	rig     *rig.Rig
	hill    *hill.Profile
	back    *hill.Profile // nil when nobody rides back
	opt     Options
	run     *run
	ways    []way
	least   []float64 // least headroom of each piece of the hill, all passes
	hardest passing
	used    float64 // charge used on the first trip
	cut     int     // the way on which the pack first gave too little, while run.cutOut
	foot    int     // the way on which a foot first went down, while run.footedAtM ≥ 0
}

// way is one way of the tour that has been ridden.
type way struct {
	trip  int
	back  bool
	timeS float64
	trace Trace
}

// passing is the hardest place so far: the way, the piece in the direction of
// that way, the state in which it was passed.
type passing struct {
	way, piece int
	headroom   float64
	body       rig.Body
	passed     []Running
	wanted     float64
}

func newTour(r *rig.Rig, p *hill.Profile, o Options) *tour {
	t := &tour{rig: r, hill: p, opt: o, least: make([]float64, len(p.Grade))}
	for i := range t.least {
		t.least[i] = 1
	}
	if o.Back {
		back := p.Reversed()
		t.back = &back
	}
	t.hardest.headroom = math.Inf(1)
	t.run = newRun(r, o)
	return t
}

func (t *tour) ride() {
	trips := max(t.opt.Trips, 1)
	for trip := range trips {
		if !t.way(t.hill, trip, false) {
			return
		}
		if t.back != nil && !t.way(t.back, trip, true) {
			return
		}
		if trip == 0 {
			t.used = t.opt.Charge - t.run.body.Charge
		}
	}
}

// way rides one way; false when the rig stalls on it.
func (t *tour) way(p *hill.Profile, trip int, back bool) bool {
	s := t.run
	if len(t.ways) > 0 {
		s.pause(t.opt.PauseS)
	}
	s.begin(p, len(t.ways) == 0)
	hadCut, hadFoot := s.cutOut, s.footedAtM >= 0
	done := true
	for i := range p.Grade {
		if done = s.piece(i); !done {
			s.skip(i + 1)
			break
		}
	}
	s.finish()
	t.ways = append(t.ways, way{trip: trip, back: back, timeS: s.timeS - s.beganS, trace: s.trace})
	if s.footedAtM >= 0 && !hadFoot {
		t.foot = len(t.ways) - 1
	}
	if s.cutOut && !hadCut {
		t.cut = len(t.ways) - 1
	}
	t.gather(back)
	return done
}

// gather keeps what the way that was just ridden says about hard places.
func (t *tour) gather(back bool) {
	s := t.run
	last := len(s.hill.Grade) - 1
	for i, h := range s.headroom {
		at := i
		if back {
			at = last - i
		}
		t.least[at] = math.Min(t.least[at], h)
		// Of places that want nothing, the one that wants least less.
		if h < t.hardest.headroom || h == t.hardest.headroom && s.wants(i) > t.hardest.wanted {
			t.hardest = passing{way: len(t.ways) - 1, piece: i, headroom: h, body: s.bodies[i], passed: s.passed, wanted: s.wants(i)}
		}
	}
}

func (t *tour) profileOf(w int) *hill.Profile {
	if t.ways[w].back {
		return t.back
	}
	return t.hill
}

func (t *tour) answer() Answer {
	s, h := t.run, &t.hardest
	s.sums.KineticEndJ = s.kineticJ
	a := Answer{
		TourS: s.timeS, Energy: s.sums,
		LengthM: t.hill.LengthM(), AscentM: t.hill.AscentM(), DescentM: t.hill.DescentM(),
		Stalled: s.stalled, WindingPeakC: s.windingPeakC,
		ChargeLeft: s.body.Charge, CutOut: s.cutOut,
		ReserveLeftJ: s.reserveLeastJ,
	}
	last := t.ways[len(t.ways)-1]
	if s.stalled {
		a.StalledAtM = t.fromFoot(s.atM, last.back)
		a.StalledTrip, a.StalledBack = last.trip, last.back
	}
	if s.cutOut {
		on := t.ways[t.cut]
		a.CutOutAtM, a.CutOutTrip, a.CutOutBack = t.fromFoot(s.cutOutAtM, on.back), on.trip, on.back
	}
	if s.footedAtM >= 0 {
		on := t.ways[t.foot]
		a.Footed, a.FootedAtM, a.FootedTrip, a.FootedBack = true, t.fromFoot(s.footedAtM, on.back), on.trip, on.back
	}
	p := t.profileOf(h.way)
	at := placeOn(t.rig, p, h.piece)
	a.Balance = Weigh(t.rig, at, &h.body)
	a.Hardest = t.stretch()
	a.Start = startAt(t.rig, at, &h.body, a.Hardest.Running.Gear)
	cold := t.rig.Fresh(t.opt.Charge) // a motor that is hot already asks less of itself
	a.EasingS = easing(t.rig, at, &cold, t.opt.DownMps)
	a.Verdict = verdict(s.stalled, a.Balance.Headroom())
	if a.Footed && a.Verdict == Clears {
		a.Verdict = Tight
	}
	a.TripsPerCharge = math.Inf(1)
	if used := t.used; used > 1e-9 {
		a.TripsPerCharge = math.Max(0, 1-t.opt.Reserve) / used
	} else if s.stalled && t.rig.Assists() {
		a.TripsPerCharge = 0
	}
	a.WayDown = wayDown(t.rig, t.hill, t.opt)
	t.pictures(&a)
	return a
}

// pictures gives the answer the trace of the way up on the trip of the hardest
// stretch.
func (t *tour) pictures(a *Answer) {
	shown := t.hardest.way
	if t.ways[shown].back {
		shown--
	}
	a.Trace = t.ways[shown].trace
	a.ClimbS = t.ways[shown].timeS
	for i, m := range a.Trace.AtM {
		a.Trace.Headroom[i] = t.least[t.hill.PieceAt(m)]
	}
}

// fromFoot turns a place along a way into one along the hill from its foot.
func (t *tour) fromFoot(m float64, back bool) float64 {
	if back {
		return t.hill.LengthM() - m
	}
	return m
}
