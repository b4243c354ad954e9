package words

import (
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// level is the grade below which a hill does not climb for the sentence.
const level = 0.003

// Why says in one or two sentences why the answer is what it is: the hardest
// stretch, the pull that it wants, the limit that binds and what it leaves,
// where it stops or what sets the speed. All of it comes from the answer.
func (v Voice) Why(r *rig.Rig, a *ride.Answer) string {
	b := &a.Balance
	switch slowest := v.Speed(a.Hardest.Running.SpeedMps); {
	case a.Verdict != ride.Clears:
	case b.WantedN <= 0:
		return v.Say(WhyAllDown, slowest)
	case b.Grade < level && a.Hardest.SteepestGrade < level:
		return v.Say(WhyDown, v.Pull(b.WantedN), slowest)
	}
	in := stateOf(a)
	first := v.weigh(r, b, in, v.where(a), a.Verdict)
	switch {
	case a.Stalled:
		return first + " " + v.stops(r, a)
	case a.Verdict == ride.Short:
		return first + " " + v.Say(WhyGivesUp)
	case a.Footed:
		return first + " " + v.Say(WhyFootDown, v.onWay(v.Length(a.FootedAtM), a.FootedTrip, a.FootedBack, WhyAtBack, WhyAtTrip, WhyAtTripBack))
	}
	return first + " " + v.speed(r, b, in, &a.Hardest.Running)
}

// atFoot is how far from the foot a rig that stops has not got away [m].
const atFoot = 1.0

// stops tells where it stops, seen from the hardest stretch.
func (v Voice) stops(r *rig.Rig, a *ride.Answer) string {
	at, h := v.Length(a.StalledAtM), &a.Hardest
	switch {
	case a.StalledTrip != h.Trip || a.StalledBack != h.Back:
		return v.Say(WhyStops, v.onWay(at, a.StalledTrip, a.StalledBack, WhyAtBack, WhyAtTrip, WhyAtTripBack))
	case !h.Back && a.StalledAtM < atFoot:
		return v.text(WhyStopsAtFoot)
	case h.Back && a.StalledAtM > a.LengthM-atFoot:
		return v.text(WhyStopsAtTurn)
	case !h.Back && a.StalledAtM < h.FromM || h.Back && a.StalledAtM > h.ToM:
		return v.Say(WhyStopsBefore, at)
	case a.Balance.Headroom() > 0 && lostInShift(r, a):
		return v.Say(WhyStopsShift, at, v.Gear(r, h.Running.Gear))
	case a.Balance.Headroom() > 0:
		return v.Say(WhyStopsThough, at)
	}
	return v.Say(WhyStops, at)
}

// lostInShift tells that a rig which stalled on its hardest stretch, though it
// has the pull, was still in a higher gear than the one that has it: the change
// down, during which the chain carries little, took its speed.
func lostInShift(r *rig.Rig, a *ride.Answer) bool {
	return r.Bike.ShiftS > 0 && a.Hardest.Running.Gear > a.Balance.Gear
}

// onWay adds to a text on which way of a round trip it is: nothing on the first
// way, else by the keys for the way back, a later trip, the way back of one.
func (v Voice) onWay(text string, trip int, back bool, onBack, onTrip, onTripBack Key) string {
	number := v.Number(float64(trip+1), 0)
	switch {
	case trip > 0 && back:
		return v.Say(onTripBack, text, number)
	case trip > 0:
		return v.Say(onTrip, text, number)
	case back:
		return v.Say(onBack, text)
	}
	return text
}

// where names the hardest stretch and on which way it is hardest.
func (v Voice) where(a *ride.Answer) string {
	return v.onWay(v.stretch(a), a.Hardest.Trip, a.Hardest.Back, WhyOnBack, WhyOnTrip, WhyOnTripBack)
}

// stretch names the hardest stretch: its length, its grade, its steepest piece
// where that reads differently, and where it begins.
func (v Voice) stretch(a *ride.Answer) string {
	h := &a.Hardest
	length, mean, steepest := v.Length(h.ToM-h.FromM), v.Grade(h.Grade), v.Grade(h.SteepestGrade)
	from := v.text(WhyFoot)
	if h.FromM > 0 {
		from = v.Length(h.FromM)
	}
	whole := h.FromM <= 0 && h.ToM >= a.LengthM
	switch {
	case whole && mean == steepest:
		return v.Say(WhyWhole, length, mean)
	case whole:
		return v.Say(WhyWholeUpTo, length, mean, steepest)
	case mean == steepest:
		return v.Say(WhyStretch, length, mean, from)
	}
	return v.Say(WhyStretchUpTo, length, mean, from, steepest)
}

// weigh is the sentence of the balance at a place.
func (v Voice) weigh(r *rig.Rig, b *ride.Balance, in state, place string, verdict ride.Verdict) string {
	wanted := v.Pull(b.WantedN)
	if len(b.Pegs) == 0 {
		return capital(v.Say(WhyUnheld, place, wanted))
	}
	peg := b.Pegs[0]
	what := v.what(r, b, in, peg.Limit, b.Gear, b.SpeedMps)
	if peg.Headroom < 0 {
		k := WhyShort
		if verdict != ride.Short {
			k = WhyMomentum
		}
		return capital(v.Say(k, place, wanted, what, v.Pull(peg.PullN), v.Speed(b.SpeedMps)))
	}
	k := WhyClears
	if peg.Headroom < ride.TightBelow {
		k = WhyTight
	}
	return capital(v.Say(k, place, wanted, what, v.Pull(peg.PullN), v.spare(peg.Headroom)))
}

// spare writes a headroom of 0 or more without its words.
func (v Voice) spare(part float64) string {
	p := part * 100
	return v.with(v.Number(p, decimals(p, step{1, 1})), "%")
}

// speed is the sentence of how fast it passes and what decides that.
func (v Voice) speed(r *rig.Rig, b *ride.Balance, in state, run *ride.Running) string {
	speed := v.Speed(run.SpeedMps)
	switch {
	case len(b.Pegs) > 0 && b.Pegs[0].Headroom < 0:
		return capital(v.Say(WhySlowest, speed, v.what(r, b, in, run.SetBy, run.Gear, run.SpeedMps)))
	case len(b.Pegs) > 0 && b.Pegs[0].Limit == run.SetBy:
		return capital(v.Say(WhySpeedToo, speed))
	}
	return capital(v.Say(WhySpeed, speed, v.what(r, b, in, run.SetBy, run.Gear, run.SpeedMps)))
}

// WhySteady says the same of one grade that goes on for ever.
func (v Voice) WhySteady(r *rig.Rig, g unit.Grade, a *ride.SteadyAnswer) string {
	b := &a.Balance
	if a.Held && b.WantedN <= 0 {
		return v.Say(SteadyDown, v.Grade(g), v.Speed(a.Running.SpeedMps))
	}
	verdict := a.Verdict
	if !a.Held {
		verdict = ride.Short
	}
	in := fresh(r)
	first := v.weigh(r, b, in, v.Say(SteadyAt, v.Grade(g)), verdict)
	steepest := v.Grade(b.SteepestGrade)
	switch {
	case !a.Held:
		return first + " " + v.Say(SteadyHolds, steepest)
	case len(b.Pegs) > 0 && b.Pegs[0].Limit == a.Running.SetBy:
		return first + " " + v.Say(SteadySpeedToo, v.Speed(a.Running.SpeedMps), steepest)
	}
	what := v.what(r, b, in, a.Running.SetBy, a.Running.Gear, a.Running.SpeedMps)
	return first + " " + v.Say(SteadySpeed, v.Speed(a.Running.SpeedMps), what, steepest)
}

// Gear names a gear by its teeth: "38/46", with a hub gear "38/18 · 3".
func (v Voice) Gear(r *rig.Rig, gear int) string {
	if gear < 0 || gear >= len(r.Gears) {
		return v.text(GearNone)
	}
	return r.Gears[gear].Label
}
