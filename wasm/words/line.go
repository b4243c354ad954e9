package words

import (
	"math"
	"strings"

	"hillwright/physics/ask"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// StartLine says whether it starts from rest on the hardest stretch: in which
// gear, or what stops it and whether it can be pushed.
func (v Voice) StartLine(r *rig.Rig, s *ride.Start) string {
	switch gear := v.Gear(r, s.Gear); {
	case s.OK && len(r.Gears) == 1:
		return v.text(StartOneGear)
	case s.OK && s.InGear:
		return v.Say(StartOK, gear)
	case s.OK:
		return v.Say(StartOther, gear)
	}
	what := v.what(r, nil, unknown(), s.StoppedBy, s.Gear, 0)
	text := v.Say(StartNot, v.Pull(s.WantedN), what, v.Pull(s.PullN))
	if s.PushOK {
		return text + " " + v.text(StartPush)
	}
	return text + " " + v.text(StartNoPush)
}

// HoldLine says how long the motor holds on the hardest stretch before it
// eases off, and how hot its winding gets; "" where no motor works.
func (v Voice) HoldLine(a *ride.Answer) string {
	peak := v.Temperature(unit.Celsius(a.WindingPeakC))
	switch {
	case a.Energy.MotorJ <= 0:
		return ""
	case math.IsInf(a.EasingS, 1):
		return v.Say(HoldsAlways, peak)
	}
	return v.Say(HoldsFor, v.About(a.EasingS), peak)
}

// MotorLine says what the motor makes of the pack's power: pull and heat; ""
// where it rests.
func (v Voice) MotorLine(run *ride.Running) string {
	if run.MotorEfficiency <= 0 {
		return ""
	}
	return v.Say(MotorTurnsInto, v.Percent(run.MotorEfficiency), v.Percent(1-run.MotorEfficiency))
}

// manyTrips is how many trips on a charge are counted.
const manyTrips = 99

// ChargeLine says what charge is left, where the pack gave too little, and how many
// trips a full charge serves; "" where the pack gave nothing.
func (v Voice) ChargeLine(a *ride.Answer) string {
	if a.Energy.FromPackJ <= 0 && a.ChargeLeft > 0 && !a.CutOut {
		return ""
	}
	text := v.Say(ChargeIsLeft, v.Percent(a.ChargeLeft))
	if a.CutOut {
		text = v.Say(ChargeGaveOut, v.CutOutAt(a), v.Percent(a.ChargeLeft))
	}
	if a.Stalled && a.StalledTrip == 0 {
		return text // no trip was finished
	}
	// A trip that is not finished is none.
	switch trips := math.Floor(a.TripsPerCharge + 1e-9); {
	case trips > manyTrips:
		return text + " " + v.Say(ChargeManyTrips, v.Number(manyTrips, 0))
	case trips > 1:
		return text + " " + v.Say(ChargeTrips, v.Number(trips, 0))
	case trips == 1:
		return text + " " + v.text(ChargeOneTrip)
	}
	return text + " " + v.text(ChargeNoTrip)
}

// CutOutAt tells where, and on which way, the pack first gave too little.
func (v Voice) CutOutAt(a *ride.Answer) string {
	return v.onWay(v.Length(a.CutOutAtM), a.CutOutTrip, a.CutOutBack, WhyAtBack, WhyAtTrip, WhyAtTripBack)
}

// LegsLine says whether the rider stays within what they hold for good, and
// else what is left of their reserve at the least.
func (v Voice) LegsLine(r *rig.Rig, a *ride.Answer) string {
	wanted, held := v.Power(r.Rider.PowerW), v.Power(r.Rider.CriticalW)
	if r.Rider.PowerW <= r.Rider.CriticalW {
		return v.Say(LegsForGood, wanted, held)
	}
	k := LegsLeft
	if empty(r, a.ReserveLeftJ) {
		k = LegsEmpty
	}
	return v.Say(k, wanted, held, v.Percent(a.ReserveLeftJ/r.Rider.ReserveJ))
}

// Tour names how often a hill is ridden and whether there and back, as a part
// of a sentence.
func (v Voice) Tour(q *ask.Question) string {
	o, text := &q.Ride, v.text(TourBack)
	switch {
	case !o.Back && o.Trips <= 1:
		return v.text(TourOneWay)
	case !o.Back:
		text = v.text(TourOne)
	}
	if o.Trips > 1 {
		return v.Say(TourTimes, text, v.Number(o.Trips, 0))
	}
	return text
}

// TourLine says what a round trip is and how long it takes with its pauses; ""
// for a hill ridden once, and where it stalls.
func (v Voice) TourLine(q *ask.Question, a *ride.Answer) string {
	o := &q.Ride
	if !o.Back && o.Trips <= 1 || a.Stalled {
		return ""
	}
	text := v.Tour(q)
	if o.PauseS > 0 {
		return capital(v.Say(TourPause, text, v.Duration(a.TourS), v.Duration(o.PauseS)))
	}
	return capital(v.Say(TourAll, text, v.Duration(a.TourS)))
}

// DownLine says what holds for the way down, as DownLines.
func (v Voice) DownLine(r *rig.Rig, d *ride.WayDown, downMps float64) string {
	return strings.Join(v.DownLines(r, d, downMps), " ")
}

// DownLines say what holds for the way down: the speed not to exceed and why,
// the stop from the chosen speed [m/s] and what bounds it, and the brakes'
// temperatures; the first alone where nothing falls or stops.
func (v Voice) DownLines(r *rig.Rig, d *ride.WayDown, downMps float64) []string {
	switch {
	case !d.Falls:
		return []string{v.text(DownNone)}
	case neverStops(d):
		return []string{v.Say(DownNever, v.Grade(d.SteepestGrade))}
	}
	lines := []string{v.downMost(d)}
	if math.IsInf(d.StoppingM, 1) {
		lines = append(lines, v.Say(DownNoStop, v.Speed(downMps)))
	} else {
		lines = append(lines, v.Say(DownStops, v.Speed(downMps), v.Length(d.StoppingM), v.Grade(d.SteepestGrade), v.text(stopTexts[d.StopBy])))
	}
	front, rear := v.Temperature(unit.Celsius(d.FrontPeakC)), v.Temperature(unit.Celsius(d.RearPeakC))
	return append(lines, v.Say(DownBrakes, front, rear))
}

// neverStops tells that even cold brakes do not stop it on the steepest fall.
func neverStops(d *ride.WayDown) bool {
	return math.IsInf(d.StoppingM, 1) && d.MostMps <= 0 && !d.ByHeat
}

func (v Voice) downMost(d *ride.WayDown) string {
	switch speed := v.Speed(d.MostMps); {
	case d.ByHeat && d.MostMps < walkingMps:
		return v.text(DownTooHot)
	case d.ByHeat:
		return v.Say(DownMostHeat, speed)
	case d.MostMps > 0.999*ride.FastestMps:
		return v.Say(DownMostCap, speed)
	default:
		return v.Say(DownMostSight, speed)
	}
}

// walkingMps is a walking pace [m/s]: a speed below it is none to ride down at.
const walkingMps = 1.2
