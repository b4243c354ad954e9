package ride

import (
	"math"

	"hillwright/physics/rig"
)

// choose begins a shift where the rider wants one.
func (s *run) choose(now *rig.Now) {
	if s.shift.table.stale(now) {
		s.shift.table.renew(s.rig, &s.body)
		s.forget()
	}
	if to, wants := s.wish(now); wants {
		s.shift.shiftTo(s.rig, to)
	}
}

func (s *run) wantsShift(now *rig.Now) bool {
	_, wants := s.wish(now)
	return wants
}

func (s *run) wish(now *rig.Now) (gear int, wants bool) {
	if s.shift.busy() {
		return s.shift.gear, false
	}
	v := s.speed()
	// What is lost while the chain moves, from the net force there was.
	pull := s.rig.PullAt(v, s.shift.gear, now).Sum()
	costs := math.Max(0, (1-easedTo)*pull-s.netN) / s.rig.InertialKg * s.rig.Bike.ShiftS
	return s.shift.wants(s.rig, v, s.aim(v), costs, now)
}

// aim is the speed that the rider has in mind at a speed [m/s]: the least at
// which the road under them and a little way ahead settles, as far as the legs
// can spin the gear for it now.
func (s *run) aim(v float64) float64 {
	least := s.settlesOn(s.onPiece)
	until := s.atM + v*aheadS
	for i := s.onPiece + 1; i < len(s.settles) && s.hill.EdgeM[i] < until; i++ {
		least = math.Min(least, s.settlesOn(i))
	}
	if least >= v {
		return v
	}
	spun := v * s.rig.Rider.CadenceLiked / (spinning * s.rig.Rider.CadenceHigh)
	return math.Max(math.Max(least, spun), s.rig.Rider.HoldMps)
}

func (s *run) settlesOn(i int) float64 {
	if s.settles[i] < 0 {
		at := placeOn(s.rig, s.hill, i)
		s.settles[i] = s.shift.table.settles(s.rig, func(v float64) float64 { return wanted(s.rig, &at, v) })
	}
	return s.settles[i]
}

const (
	footingS     = 8.0 // seconds from a foot on the ground to the start; common practice, no source
	mostFootings = 12  // on one way, before it is called a stall
	apartM       = 5.0 // between two of them, likewise
)

// restart is what a rider does who has come to a stop on a place that the rig
// could hold: a foot on the ground, an easier gear, and on from rest. It is
// false where the rig holds or starts in no gear there, or has just tried.
func (s *run) restart(at *Place, now *rig.Now, coast bool) bool {
	again := s.footings > 0 && s.atM < s.footM+apartM
	if coast || again || s.footings == mostFootings || s.strongest(now) <= wanted(s.rig, at, s.rig.Rider.HoldMps) {
		return false
	}
	start := startAt(s.rig, *at, &s.body, s.shift.gear)
	if !start.OK {
		return false
	}
	if s.footings == 0 && s.footedAtM < 0 {
		s.footedAtM = s.atM
	}
	s.footings++
	s.footM = s.atM
	s.pause(footingS)
	s.shift.gear = start.Gear
	return true
}

// gaveOut is the part of the motor's power below which a pack counts as having
// given out: what is left is felt as none. Common practice, no source.
const gaveOut = 0.25

// seePack notes where the pack first gives out under load.
func (s *run) seePack(now *rig.Now, coast bool) {
	if !coast && !s.cutOut && s.rig.Assists() && now.PackW < gaveOut*s.rig.Bike.Motor.PowerW {
		s.cutOut, s.cutOutAtM = true, s.atM
	}
}
