package ride

import (
	"math"

	"hillwright/physics/motor"
	"hillwright/physics/rider"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// startMps2 is the acceleration with which a start counts as one: less than
// this and a rider tips over before the pedals come round. Common practice, no
// source.
const startMps2 = 0.3

// crawlMps is where torque limits are taken for a start [m/s]: as good as at
// rest.
const crawlMps = 0.1

// startAt tells whether the rig starts from rest at a place: whether, in some
// gear, it pulls what the road wants and startMps2 on top through the first
// half turn of the cranks. ridden is the gear in which it was riding there.
func startAt(r *rig.Rig, at Place, body *rig.Body, ridden int) Start {
	now := r.At(body, at.sin, at.cos)
	if r.Bike.Motor.Kind == motor.FrontHub {
		drive := r.Stance.DriveN(at.sin, startMps2)
		now.FrontGripN = r.Mu * math.Max(0, r.Stance.Wheels(at.cos, drive).FrontN)
	}
	s := Start{WantedN: wanted(r, &at, crawlMps) + startMps2*r.InertialKg, PushOK: pushes(r, at, body)}
	for gear := range r.Gears {
		pull := startPull(r, gear, &now)
		if gear == 0 || pull.Sum() > s.PullN && !s.OK {
			s.PullN, s.StoppedBy, s.Gear = pull.Sum(), pull.By, gear
		}
		ok := pull.Sum() >= s.WantedN
		if ok && !s.OK {
			s.OK, s.Gear, s.PullN, s.StoppedBy = true, gear, pull.Sum(), pull.By
		}
		if gear == ridden {
			s.InGear = ok
		}
	}
	return s
}

// startPull is the pull through the first half turn of the cranks in a gear:
// at the speed that this half turn reaches on average when it starts as it
// should, so that a gear too high for the legs shows.
func startPull(r *rig.Rig, gear int, now *rig.Now) rig.Pull {
	halfTurn := r.Gears[gear].Development(r.CircumferenceM) / 2
	return r.PullAt(math.Max(crawlMps, 0.5*math.Sqrt(2*startMps2*halfTurn)), gear, now)
}

// walkMps is a walking pace uphill [m/s]. Common practice, no source.
const walkMps = 0.8

// pushes tells whether a person on foot gets the bike and its load up a place,
// with walk assistance where the law lets the motor drive alone.
func pushes(r *rig.Rig, at Place, body *rig.Body) bool {
	weight := (r.Road.MassKg - r.Rider.MassKg) * unit.Gravity
	wants := weight * (at.sin + r.Road.Crr*at.cos)
	helps := rider.PushN(r.Rider.MassKg)
	if r.Assists() && r.Law.Alone(walkMps) {
		now := r.At(body, at.sin, at.cos)
		now.RiderW = 0
		pegs, _ := r.Pegs(walkMps, 0, &now)
		pegs[rig.Rider] = math.Inf(1) // nobody pedals: the level's ratio does not count
		_, n := pegs.Least()
		helps += n
	}
	return helps >= wants
}
