package view

import (
	"errors"
	"math"

	"hillwright/physics/coast"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
	. "hillwright/wasm/dom"
	"hillwright/wasm/draw"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// rulerTall is how tall a ruler is drawn [px].
const rulerTall = 82

// drag is what the runs say: Crr and CdA with what is not known of them.
func (v *viewer) drag() *Node {
	head := El("h2", ID("drag-title"), With("tabindex", "-1"), v.say(words.HeadDrag))
	r := v.Bench.Result
	if r == nil {
		if len(v.Runs()) == 0 || v.Bench.Refused == nil {
			return region("section", "bench-drag", Bare("hidden"))
		}
		why := v.Problem(v.Bench.Refused)
		var e *coast.Error
		if !v.Question.ClicksKnown() && errors.As(v.Bench.Refused, &e) && e.Kind == coast.NoRun {
			why = v.Voice.Say(words.BenchClicksMissing)
		}
		return region("section", "bench-drag", With("aria-labelledby", "drag-title"), head, El("p", Class("problem"), With("role", "alert"), Text(why)))
	}
	half := func(e coast.Estimate) float64 { return (e.High - e.Low) / 2 }
	setup := v.State.CoastSetup()
	notes := Parts{Class("notes-list")}
	note := func(yes bool, k words.Key, args ...string) {
		if yes {
			notes = append(notes, El("li", v.say(k, args...)))
		}
	}
	note(r.Crr.Held, words.DragHeldCrr)
	note(r.CdAM2.Held, words.DragHeldCdA)
	note(!r.BothWays, words.DragOneWay)
	if !r.Crr.Held && !r.CdAM2.Held {
		notes = append(notes, El("li", Text(v.Lean(r.Correlation))))
	}
	note(r.BothWays, words.DragRoad, v.gradeWith(r.Grade.Value, half(r.Grade)), v.Speed(r.HeadMps.Value)+" ± "+v.Speed(half(r.HeadMps)))
	note(r.Wander > 0.01, words.DragGusts)
	rolling := setup.MassKg.Value * unit.Gravity * r.Crr.Value
	air := 0.5 * setup.DensityKgM3.Value * r.CdAM2.Value * coast.SpunMps * coast.SpunMps
	note(true, words.DragShares, v.Speed(coast.SpunMps), v.Pull(rolling), v.Pull(air))
	return region("section", "bench-drag", Class("bench-drag"), With("aria-labelledby", "drag-title"), head,
		v.ruler("crr", words.DragCrr, r.Crr, setup.Crr, v.Crr, v.Crr(r.Crr.Value)+" ± "+v.Crr(half(r.Crr))),
		v.ruler("cda", words.DragCdA, r.CdAM2, setup.CdAM2, func(x float64) string { return v.Voice.Number(x, 2) },
			v.Voice.Number(r.CdAM2.Value, 3)+" ± "+v.Area(half(r.CdAM2))),
		El("p", Class("hint"), v.say(words.DragKey)),
		El("ul", notes))
}

func (v *viewer) ruler(id string, name words.Key, e coast.Estimate, prior coast.Value, write func(float64) string, value string) *Node {
	size := draw.Size{W: v.Device.WidthPx, H: rulerTall}
	return El("div", Class("ruler"),
		El("p", Class("editor-name"), Text(capital(v.Voice.Say(name)))),
		El("div", Class("canvas"), draw.DragRuler(draw.Ruler{
			ID: id, Title: capital(v.Voice.Say(name)), Value: value, Write: write, Held: e.Held,
			PriorLow: prior.Value - 1.645*prior.Error, PriorHigh: prior.Value + 1.645*prior.Error, Low: e.Low, Is: e.Value, High: e.High,
		}, size)))
}

// intoBike puts what was measured into the bike, after showing what that does
// to the hill's answer.
func (v *viewer) intoBike() *Node {
	b := &v.Bench
	if b.Result == nil || b.Then == nil || v.Answer == nil {
		return region("section", "bench-into", Bare("hidden"))
	}
	var do Part = button("main wide", state.IntoBike, "", v.say(words.IntoBikeButton))
	if v.BikeHas() {
		do = El("p", Class("hint"), v.say(words.IntoBikeSame))
	}
	return region("section", "bench-into", With("aria-labelledby", "into-title"),
		El("h2", ID("into-title"), v.say(words.HeadIntoBike)),
		El("p", Class("hint"), Text(v.NameOf(state.Hill))),
		El("div", Class("before-after"),
			v.outcome(words.IntoBikeNow, v.Rig, v.Answer),
			If(!v.BikeHas(), v.outcome(words.IntoBikeThen, b.ThenRig, b.Then))),
		do)
}

// outcome is the hill's answer in a few figures.
func (v *viewer) outcome(title words.Key, r *rig.Rig, a *ride.Answer) *Node {
	row := func(k words.Key, value string) Part {
		return El("div", El("dt", v.say(k)), El("dd", Text(value)))
	}
	return El("div", Class("outcome"),
		El("h3", v.say(title)),
		El("p", Class("now word-"+a.Verdict.String()), verdictShape(a.Verdict), Text(v.Verdict(a.Verdict))),
		El("dl", Class("pitch-figures"),
			row(words.DragCrr, v.Crr(r.Bike.Crr)),
			row(words.DragCdA, v.Area(r.Bike.CdAM2)),
			row(words.LabelSpeed, v.Speed(a.Hardest.Running.SpeedMps)),
			row(words.LabelTime, v.Duration(a.ClimbS)),
			row(words.LabelChargeLeft, v.Percent(a.ChargeLeft))))
}

// spun is what the wheel on the stand says.
func (v *viewer) spun() *Node {
	head := El("h2", ID("spun-title"), With("tabindex", "-1"), v.say(words.HeadSpun))
	s := v.Bench.Spun
	if s == nil {
		why := Part(nil)
		switch {
		case v.Bench.SpunErr != nil:
			why = Text(v.Problem(v.Bench.SpunErr))
		case v.SpinHeard():
			why = v.say(words.BenchClicksMissing)
		default:
			return region("section", "bench-spun", Bare("hidden"))
		}
		return region("section", "bench-spun", With("aria-labelledby", "spun-title"), head, El("p", Class("problem"), With("role", "alert"), why))
	}
	says := words.SpunFine
	if s.Drags {
		says = words.SpunDrags
	}
	with := func(e coast.Estimate, write func(float64) string) string {
		return write(e.Value) + " ± " + write((e.High-e.Low)/2)
	}
	row := func(k words.Key, value string, args ...string) Part {
		return El("div", El("dt", v.say(k, args...)), El("dd", Text(value)))
	}
	f := &v.Bench.Turn
	rub := El("p", v.say(words.SpunNoRub))
	from, to := 0.0, 0.0
	if f.Found {
		rub = El("p", Class("problem"), With("role", "alert"), v.say(words.SpunRub, v.Decibel(f.PeakDB)))
		from, to = math.Max(0, f.AtTurn-0.08), math.Min(1, f.AtTurn+0.08)
	}
	at := v.Speed(coast.SpunMps)
	return region("section", "bench-spun", Class("bench-drag"), With("aria-labelledby", "spun-title"), head,
		El("p", Class("still"), With("role", "status"), v.say(says)),
		El("dl", Class("pitch-figures"),
			row(words.SpunPower, with(s.PowerW, v.FinePower), at),
			row(words.SpunTypical, v.FinePower(s.Typical.Low)+" – "+v.FinePower(s.Typical.High)),
			row(words.SpunTorque, with(s.TorqueNm, v.Torque)),
			row(words.SpunRest, with(s.RestS, v.Seconds), at)),
		rub,
		El("div", Class("canvas"), draw.Turn(f.LevelDB, from, to, v.Voice.Say(words.TurnPicture), v.Voice.Say(words.TurnPicture), draw.Size{W: v.Device.WidthPx, H: 130})))
}
