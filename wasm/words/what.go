package words

import (
	"math"

	"hillwright/physics/motor"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// state is what a sentence needs to know of the state in which a rig passes a
// place: the winding's temperature [°C] and what is left of W′ [J]; NaN where
// that is not known.
type state struct{ windingC, reserveJ float64 }

// unknown is a state of which nothing is known.
func unknown() state { return state{math.NaN(), math.NaN()} }

// fresh is the state of a rig that is cool and rested.
func fresh(r *rig.Rig) state {
	b := r.Fresh(1)
	return state{b.WindingC, b.ReserveJ}
}

// stateOf finds the state on the hardest stretch: the hottest and the most
// tired along it. The trace shows the way up; of a way back only the ride's
// own extremes are known.
func stateOf(a *ride.Answer) state {
	h, t := &a.Hardest, &a.Trace
	in := state{math.Inf(-1), math.Inf(1)}
	for i, m := range t.AtM {
		if !h.Back && m >= h.FromM && m <= h.ToM {
			in.windingC = math.Max(in.windingC, t.WindingC[i])
			in.reserveJ = math.Min(in.reserveJ, t.ReserveJ[i])
		}
	}
	if math.IsInf(in.windingC, 0) {
		return state{a.WindingPeakC, a.ReserveLeftJ}
	}
	return in
}

// what names a limit as the subject of a sentence, for this rig in this gear
// at this speed, in a state. b is the balance from which it is read what is
// the matter with the pack; nil when there is none.
func (v Voice) what(r *rig.Rig, b *ride.Balance, in state, l rig.Limit, gear int, speedMps float64) string {
	hub := r.Bike.Motor.Kind == motor.RearHub || r.Bike.Motor.Kind == motor.FrontHub
	switch l {
	case rig.Torque:
		if hub {
			return v.text(WhatTorqueHub)
		}
		return v.Say(WhatTorque, v.Gear(r, gear))
	case rig.Power:
		return v.text(WhatPower)
	case rig.CutOff:
		// A law that sets a ratio limits far below its cut-off.
		if r.Law.MaxRatio > 0 && speedMps < r.Law.SpeedMps-math.Max(r.Law.TaperMps, 0.5) {
			return v.text(WhatRatio)
		}
		return v.Say(WhatCutOff, v.cutOff(&r.Law))
	case rig.Cadence:
		return v.text(WhatCadence)
	case rig.Coasting:
		return v.text(WhatCoasting)
	case rig.Rider:
		return v.whatRider(r, in)
	case rig.Heat:
		if math.IsNaN(in.windingC) {
			return v.text(WhatHeat)
		}
		return v.Say(WhatHeatAt, v.Temperature(unit.Celsius(in.windingC)))
	case rig.Cells:
		return v.whatCells(r, b, in)
	case rig.Grip:
		return v.whatGrip(r)
	case rig.Lift:
		return v.text(WhatLift)
	}
	return v.Limit(l)
}

// tired is the part of the wanted power under which a rider counts as one who
// has run empty.
const tired = 0.98

// empty tells whether a rider no longer gives what they want.
func empty(r *rig.Rig, reserveJ float64) bool {
	return r.Endurance.Able(reserveJ, r.Rider.PowerW) < tired*r.Rider.PowerW
}

func (v Voice) whatRider(r *rig.Rig, in state) string {
	alone, spent := !r.Assists(), empty(r, in.reserveJ)
	level := v.Number(float64(r.Level), 0)
	switch {
	case alone && spent:
		return v.text(WhatRiderEmptyAlone)
	case alone:
		return v.text(WhatRiderAlone)
	case spent:
		return v.Say(WhatRiderEmpty, level)
	}
	return v.Say(WhatRider, level)
}

// better is by what part the motor's pull must rise with a warm, full or new
// pack for cold, charge or age to be named as the matter with it.
const better = 1.05

// warmC is a pack at its best, and coldC one that nobody calls cold [°C].
const (
	warmC = 25
	coldC = 10
)

// whatCells tells what is the matter with the pack, by computing what a better
// one would allow in the same place: warmer, fuller, newer.
func (v Voice) whatCells(r *rig.Rig, b *ride.Balance, in state) string {
	now, ok := cellsPeg(b)
	if !ok {
		return v.text(WhatCells)
	}
	body := r.Fresh(1)
	if !math.IsNaN(in.reserveJ) {
		body.ReserveJ = in.reserveJ
	}
	cells := func(with *rig.Rig) (motorN, riderN float64) {
		at := with.At(&body, b.Grade.Sin(), b.Grade.Cos())
		pegs, riderN := with.Pegs(b.SpeedMps, b.Gear, &at)
		return pegs[rig.Cells] - riderN, riderN
	}
	full, riderN := cells(r)
	warm, young := *r, *r
	warm.PackC = math.Max(warmC, r.PackC)
	young.Pack.Health = 1
	warmN, _ := cells(&warm)
	youngN, _ := cells(&young)
	cold, low := r.PackC < coldC && warmN > better*full, full > better*(now-riderN)
	c := v.Temperature(unit.Celsius(r.PackC))
	switch {
	case cold && low:
		return v.Say(WhatCellsColdLow, c)
	case cold:
		return v.Say(WhatCellsCold, c)
	case low:
		return v.text(WhatCellsLow)
	case youngN > better*full:
		return v.Say(WhatCellsOld, v.Percent(r.Pack.Health))
	}
	return v.text(WhatCells)
}

// cellsPeg is the pull that the pack allows in a balance [N].
func cellsPeg(b *ride.Balance) (pullN float64, ok bool) {
	if b == nil {
		return 0, false
	}
	for _, p := range b.Pegs {
		if p.Limit == rig.Cells {
			return p.PullN, true
		}
	}
	return 0, false
}

// whatGrip names the driven tyre and what it stands on.
func (v Voice) whatGrip(r *rig.Rig) string {
	front := r.Bike.Motor.Kind == motor.FrontHub && r.Assists()
	if !math.IsNaN(r.Day.Mu) {
		k := WhatGripRearMu
		if front {
			k = WhatGripFrontMu
		}
		return v.Say(k, v.short(r.Mu, 2))
	}
	k := WhatGripRear
	if front {
		k = WhatGripFront
	}
	return v.Say(k, v.Choice("day.ground", r.Day.Ground))
}
