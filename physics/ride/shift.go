package ride

import (
	"math"

	"hillwright/physics/rig"
)

// How a rider shifts. Common practice, no source.
const (
	restS      = 2.0     // seconds between one shift and the thought of the next
	worthwhile = 1.003   // gain in pull for which a gear is changed
	backAgain  = 1.06    // gain for which the last change is undone
	legs       = 0.08    // how much nearer to the liked cadence a gear must bring
	easedTo    = 1 / 3.0 // part of the pull that is kept while the chain moves
)

// shifter is the gear in use and the hand on the lever.
type shifter struct {
	gear, from int
	leftS      float64 // of the shift under way
	sinceS     float64 // since the last one
	table      *gearTable
}

// gearTable keeps the best gear by speed, in steps of wishStep; −1 where it is
// not yet known. It holds for limits like those it was made for.
type gearTable struct {
	wish [wishes]int8
	now  rig.Now
}

const (
	wishStep = 0.2
	wishes   = 128
)

func newShifter(r *rig.Rig) shifter {
	return shifter{from: -1, sinceS: restS, table: &gearTable{}}
}

// start takes the gear for a speed at the foot.
func (s *shifter) start(r *rig.Rig, startMps float64, body *rig.Body) {
	s.table.renew(r, body)
	s.gear = s.best(r, math.Max(startMps, r.Rider.HoldMps/2))
}

func (t *gearTable) renew(r *rig.Rig, body *rig.Body) {
	t.now = r.At(body, 0, 1)
	for i := range t.wish {
		t.wish[i] = -1
	}
}

// stale tells that heat, charge or legs have changed what gears are worth.
func (t *gearTable) stale(now *rig.Now) bool {
	return math.Abs(now.Ease-t.now.Ease) > 0.05 ||
		math.Abs(now.PackW-t.now.PackW) > 0.1*t.now.PackW ||
		math.Abs(now.RiderW-t.now.RiderW) > 0.1*t.now.RiderW
}

func (s *shifter) best(r *rig.Rig, v float64) int {
	i := min(int(v/wishStep), wishes-1)
	if s.table.wish[i] < 0 {
		s.table.wish[i] = int8(r.BestGear((float64(i)+0.5)*wishStep, &s.table.now))
	}
	return int(s.table.wish[i])
}

// choose begins a shift where one is wanted.
func (s *shifter) choose(r *rig.Rig, v float64, body *rig.Body, now *rig.Now) {
	if s.table.stale(now) {
		s.table.renew(r, body)
	}
	if s.wants(r, v, now) {
		s.from, s.gear = s.gear, s.best(r, v)
		s.leftS, s.sinceS = r.Bike.ShiftS, 0
	}
}

// wants tells whether the rider would shift now: where another gear pulls
// enough more, or suits the legs better, or the cadence has left their range.
func (s *shifter) wants(r *rig.Rig, v float64, now *rig.Now) bool {
	if s.under() || s.sinceS < restS {
		return false
	}
	to := s.best(r, v)
	if to == s.gear {
		return false
	}
	need, nearer := worthwhile, legs
	if to == s.from {
		need, nearer = backAgain, 3*legs
	}
	return !s.suits(r, v) ||
		r.OffLiked(v, s.gear)-r.OffLiked(v, to) >= nearer ||
		r.PullAt(v, to, now).Sum() >= need*r.PullAt(v, s.gear, now).Sum()
}

func (s *shifter) suits(r *rig.Rig, v float64) bool {
	c := r.CadenceAt(v, s.gear)
	return c >= r.Rider.CadenceLow && c <= r.Rider.CadenceHigh
}

// under tells whether a shift is under way.
func (s *shifter) under() bool { return s.leftS > 0 }

// endedBefore tells whether the shift under way is over well before s seconds.
func (s *shifter) endedBefore(seconds float64) bool {
	return s.under() && seconds > s.leftS+0.001
}

// ease is the part of the pull that the shift leaves.
func (s *shifter) ease() float64 {
	if s.under() {
		return easedTo
	}
	return 1
}

// cap shortens a step so that it does not reach far beyond the shift's end.
func (s *shifter) cap(v, h float64) float64 {
	if !s.under() {
		return h
	}
	return math.Min(h, math.Max(v*s.leftS, 0.02))
}

func (s *shifter) pass(dt float64) {
	s.sinceS += dt
	s.leftS -= dt
	if s.leftS < 1e-6 {
		s.leftS = 0
	}
}

// rest is a stop: time to take an easy gear for the start.
func (s *shifter) rest() {
	s.gear, s.from, s.leftS, s.sinceS = 0, -1, 0, restS
}
