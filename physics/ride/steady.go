package ride

import (
	"math"
	"sort"

	"hillwright/physics/air"
	"hillwright/physics/hill"
	"hillwright/physics/rig"
	"hillwright/physics/road"
	"hillwright/physics/unit"
)

// Place is what the road and the wind are at one place: the grade, the wind
// against and across the rider [m/s].
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

// Weigh weighs a place in a state of the rig: what it wants against what every
// limit allows, at the slowest speed at which the rider still balances, in the
// gear that pulls most.
func Weigh(r *rig.Rig, at Place, body *rig.Body) Balance {
	v := r.Rider.HoldMps
	now := r.At(body, at.sin, at.cos)
	gear := r.StrongestGear(v, &now)
	pegs, _ := r.Pegs(v, gear, &now)
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
	b.SteepestGrade = steepest(r, &at, body, v, gear)
	return b
}

// steepest is the steepest grade on which the pull of a gear is no less than
// the road load. Tyres and balance hold less the steeper it gets, so it is
// sought; from the closed form for the other limits downward.
func steepest(r *rig.Rig, at *Place, body *rig.Body, v float64, gear int) unit.Grade {
	spare := func(a float64) float64 {
		here := Place{sin: math.Sin(a), cos: math.Cos(a), HeadMps: at.HeadMps, CrossMps: at.CrossMps}
		now := r.At(body, here.sin, here.cos)
		return r.PullAt(v, gear, &now).Sum() - wanted(r, &here, v)
	}
	low, high := -math.Pi/3, math.Pi/2*0.99
	if spare(low) < 0 {
		return unit.GradeOf(unit.Angle(low))
	}
	if spare(high) >= 0 {
		return road.Vertical
	}
	for range 50 {
		if mid := (low + high) / 2; spare(mid) >= 0 {
			low = mid
		} else {
			high = mid
		}
	}
	return unit.GradeOf(unit.Angle(low))
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

// Settle finds how a rig in a state runs once it has settled at a place: the
// speed, met first from below, at which its pull is the road's load. ok is
// false when the pull does not hold it up even at the slowest speed. downMps
// is the speed that the brakes hold where the road drives.
func Settle(r *rig.Rig, at Place, body *rig.Body, downMps float64) (run Running, ok bool) {
	now := r.At(body, at.sin, at.cos)
	net := func(v float64) float64 {
		pull := r.PullAt(v, r.BestGear(v, &now), &now)
		return pull.Sum() - dragOf(r, v, pull.MotorN) - wanted(r, &at, v)
	}
	slow := r.Rider.HoldMps
	if net(slow) < 0 {
		return Running{}, false
	}
	if wanted(r, &at, downMps) < 0 {
		return Running{SpeedMps: downMps, Gear: r.BestGear(downMps, &now), SetBy: rig.Coasting}, true
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
	return running(r, slow, r.BestGear(slow, &now), &now), true
}

// dragOf is what a motor that rests holds back [N].
func dragOf(r *rig.Rig, v, motorN float64) float64 {
	if motorN > 0 {
		return 0
	}
	return r.DragN(v)
}

func running(r *rig.Rig, v float64, gear int, now *rig.Now) Running {
	pull := r.PullAt(v, gear, now)
	run := Running{
		SpeedMps: v, Gear: gear, CadenceRPM: r.CadenceAt(v, gear),
		RiderN: pull.RiderN, MotorN: pull.MotorN,
		RiderW: pull.RiderN * v, MotorW: pull.MotorN * v,
		SetBy: pull.By,
	}
	if torque, spin := motorWork(r, &run); torque > 0 {
		run.MotorEfficiency = r.Circuit.Efficiency(torque, spin, now.WindingC)
	}
	return run
}

// motorWork is the torque [N·m] and the speed [rad/s] of the motor's output.
func motorWork(r *rig.Rig, run *Running) (torqueNm, radPerS float64) {
	turns := r.MotorTurns(run.Gear)
	return run.MotorN / (turns * r.MotorToRoad()), run.SpeedMps * turns
}

// Steady answers for one grade that goes on for ever, with the wind straight
// ahead, for a rig as it stands there: charged, cool and rested.
func Steady(r *rig.Rig, g unit.Grade, o Options) SteadyAnswer {
	at := At(g, r.Day.WindMps)
	body := r.Fresh(o.Charge)
	a := SteadyAnswer{Balance: Weigh(r, at, &body)}
	a.Running, a.Held = Settle(r, at, &body, o.DownMps)
	a.Verdict = verdict(!a.Held, a.Balance.Headroom())
	a.Start = startAt(r, at, &body, a.Running.Gear)
	a.EasingS = easing(r, at, &body, o.DownMps)
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

// easing is how long the motor holds a steady climb at a place from cold [s].
// Where the rig does not hold itself up, it is asked at the slowest speed.
func easing(r *rig.Rig, at Place, body *rig.Body, downMps float64) float64 {
	run, ok := Settle(r, at, body, downMps)
	if !ok {
		now := r.At(body, at.sin, at.cos)
		v := r.Rider.HoldMps
		run = running(r, v, r.StrongestGear(v, &now), &now)
	}
	torque, spin := motorWork(r, &run)
	if torque <= 0 {
		return math.Inf(1)
	}
	c := float64(r.Day.TemperatureC)
	return r.Circuit.SecondsToEasing(&r.Heat, torque, spin, c, c, c, math.Abs(run.SpeedMps+at.HeadMps))
}
