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
	saveSpeed  = 1.1     // of the slowest speed, below which nobody changes up
	aheadS     = 3.0     // how far ahead a rider looks for what is steep
	spinning   = 0.95    // of the highest cadence, to which a rider changes down
)

// shifter is the gear in use and the hand on the lever.
type shifter struct {
	gear, from int
	leftS      float64 // of the shift under way
	sinceS     float64 // since the last one
	table      *gearTable
}

// gearTable keeps the best gear by speed and its pull, in steps of wishStep; −1
// where they are not yet known. It holds for limits like those it was made for.
type gearTable struct {
	wish [wishes]int8
	pull [wishes]float64
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

// at makes sure that a step of the table is known.
func (t *gearTable) at(r *rig.Rig, i int) {
	if t.wish[i] < 0 {
		v := (float64(i) + 0.5) * wishStep
		gear := r.BestGear(v, &t.now)
		t.wish[i], t.pull[i] = int8(gear), r.PullAt(v, gear, &t.now).Sum()
	}
}

// settles is about the speed at which a road settles [m/s] that wants a load
// of given newtons at a speed; 0 where it is not held.
func (t *gearTable) settles(r *rig.Rig, load func(v float64) float64) float64 {
	for i := range t.wish {
		t.at(r, i)
		if v := (float64(i) + 0.5) * wishStep; t.pull[i] < load(v) {
			return v - wishStep
		}
	}
	return wishes * wishStep
}

func (s *shifter) best(r *rig.Rig, v float64) int {
	i := min(int(v/wishStep), wishes-1)
	s.table.at(r, i)
	return int(s.table.wish[i])
}

// wants tells whether the rider would shift now, and to which gear: where it
// pulls enough more, or suits the legs better, or the cadence has left their
// range. aimMps is the speed that the rider has in mind [m/s]: their own, or on
// the way into something steep a lower one, for which they change down in time.
// costs is what a shift takes of the speed [m/s]: nobody changes up where it
// would stop them.
func (s *shifter) wants(r *rig.Rig, v, aimMps, costs float64, now *rig.Now) (to int, wants bool) {
	to = s.best(r, aimMps)
	if to == s.gear || to > s.gear && v-costs < saveSpeed*r.Rider.HoldMps {
		return s.gear, false
	}
	need, nearer := worthwhile, legs
	if to == s.from && aimMps >= v {
		need, nearer = backAgain, 3*legs
	}
	return to, !s.suits(r, v) ||
		r.OffLiked(aimMps, s.gear)-r.OffLiked(aimMps, to) >= nearer ||
		r.PullAt(aimMps, to, now).Sum() >= need*r.PullAt(aimMps, s.gear, now).Sum()
}

// shiftTo begins a shift.
func (s *shifter) shiftTo(r *rig.Rig, gear int) {
	s.from, s.gear = s.gear, gear
	s.leftS, s.sinceS = r.Bike.ShiftS, 0
}

func (s *shifter) suits(r *rig.Rig, v float64) bool {
	c := r.CadenceAt(v, s.gear)
	return c >= r.Rider.CadenceLow && c <= r.Rider.CadenceHigh
}

// busy tells that a shift is under way or that the last one was just now.
func (s *shifter) busy() bool { return s.under() || s.sinceS < restS }

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
