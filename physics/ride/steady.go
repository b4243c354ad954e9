package ride

import (
	"math"
	"sort"

	"hillwright/physics/air"
	"hillwright/physics/hill"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// Place is what the road and the wind are at one place: sine and cosine of the
// road's angle, the wind against and across the rider [m/s].
type Place struct {
	Grade    unit.Grade
	sin, cos float64
	HeadMps  float64
	CrossMps float64
}

// At makes a place of a grade with the wind straight ahead [m/s].
func At(g unit.Grade, headMps float64) Place {
	return Place{Grade: g, sin: g.Sin(), cos: g.Cos(), HeadMps: headMps}
}

// placeOn gives the place of piece i of a profile on the rig's day.
func placeOn(r *rig.Rig, p *hill.Profile, i int) Place {
	at := At(p.Grade[i], r.Day.WindMps)
	if !math.IsNaN(r.Day.WindFromDeg) && p.BearingRad != nil {
		from := float64(unit.FromDegrees(r.Day.WindFromDeg))
		at.HeadMps, at.CrossMps = air.Along(r.Day.WindMps, from, p.BearingRad[i])
	}
	return at
}

// wanted is the road load at a place [N].
func wanted(r *rig.Rig, at *Place, speedMps float64) float64 {
	return r.Road.Force(speedMps, at.sin, at.cos, at.HeadMps, at.CrossMps)
}

// Weigh weighs a place: what it wants against what every limit allows, at the
// slowest speed at which the rider still balances, in the gear that pulls most.
func Weigh(r *rig.Rig, at Place) Balance {
	v := r.Rider.HoldMps
	gear := r.StrongestGear(v)
	pegs := r.Pegs(v, gear)
	b := Balance{
		Grade:      at.Grade,
		SpeedMps:   v,
		Gear:       gear,
		CadenceRPM: r.CadenceAt(v, gear),
		WantedN:    wanted(r, &at, v),
	}
	for l, pull := range pegs {
		if !math.IsInf(pull, 1) {
			b.Pegs = append(b.Pegs, Peg{Limit: rig.Limit(l), PullN: pull, Headroom: headroom(b.WantedN, pull)})
		}
	}
	sort.SliceStable(b.Pegs, func(i, j int) bool { return b.Pegs[i].PullN < b.Pegs[j].PullN })
	flat := At(0, at.HeadMps)
	flat.CrossMps = at.CrossMps
	drag := r.Road.Parts(v, flat.sin, flat.cos, flat.HeadMps, flat.CrossMps)
	sine := r.Road.SteepestSine(b.Pegs[0].PullN, drag.Air+drag.Bearings)
	b.SteepestGrade = unit.GradeOf(unit.Angle(math.Asin(sine)))
	return b
}

// headroom is the part of a pull that is to spare, 1 at most (a road that
// wants nothing leaves all of it) and −9 at least, so that a rig that pulls
// next to nothing still has a figure.
func headroom(wantedN, pullN float64) float64 {
	if wantedN <= 0 {
		return 1
	}
	return math.Max(-9, 1-wantedN/math.Max(pullN, 1e-9))
}

// scanTo is the highest speed that is looked at [m/s].
const scanTo = 40.0

// Settle finds how the rig runs once it has settled at a place: the speed, met
// first from below, at which its pull is the road's load. ok is false when the
// pull does not hold it up even at the slowest speed.
func Settle(r *rig.Rig, at Place, downMps float64) (run Running, ok bool) {
	net := func(v float64) float64 { return r.PullAt(v, r.BestGear(v)).Sum() - wanted(r, &at, v) }
	slow := r.Rider.HoldMps
	if net(slow) < 0 {
		return Running{}, false
	}
	if wanted(r, &at, downMps) < 0 {
		return coasting(r, downMps), true
	}
	fast := slow
	for fast < scanTo && net(fast) >= 0 {
		slow, fast = fast, fast*1.03
	}
	for range 60 {
		mid := (slow + fast) / 2
		if net(mid) >= 0 {
			slow = mid
		} else {
			fast = mid
		}
	}
	return running(r, slow, r.BestGear(slow)), true
}

func coasting(r *rig.Rig, v float64) Running {
	return Running{SpeedMps: v, Gear: r.BestGear(v), SetBy: rig.Coasting}
}

func running(r *rig.Rig, v float64, gear int) Running {
	pull := r.PullAt(v, gear)
	return Running{
		SpeedMps: v, Gear: gear, CadenceRPM: r.CadenceAt(v, gear),
		RiderN: pull.RiderN, MotorN: pull.MotorN,
		RiderW: pull.RiderN * v, MotorW: pull.MotorN * v,
		SetBy: pull.By,
	}
}

// Steady answers for one grade that goes on for ever, with the wind straight
// ahead. downMps is the speed that the brakes hold where the road drives.
func Steady(r *rig.Rig, g unit.Grade, downMps float64) SteadyAnswer {
	at := At(g, r.Day.WindMps)
	a := SteadyAnswer{Balance: Weigh(r, at)}
	a.Running, a.Held = Settle(r, at, downMps)
	a.Verdict = verdict(!a.Held, a.Balance.Headroom())
	return a
}

func verdict(stops bool, headroom float64) Verdict {
	switch {
	case stops:
		return Short
	case headroom < TightBelow:
		return Tight
	}
	return Clears
}
