package view

import (
	. "hillwright/wasm/dom"
	"hillwright/wasm/draw"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// bench is the place where a bike's drag is measured: what is known, the sound,
// the runs, what they say, and what that does to the hill's answer.
func (v *viewer) bench() *Node {
	var left, right Parts
	if v.Bench.Doing() == state.JobStand {
		left, right = Parts{v.benchJob(), v.place(), v.benchSound()}, Parts{v.spun()}
	} else {
		left, right = Parts{v.benchJob(), v.place(), v.benchSound()}, Parts{v.drag(), v.intoBike(), v.runs()}
	}
	return El("div", Class("page by-thumb at-bench"),
		draw.Hatches(),
		v.masthead(),
		El("main",
			El("div", Class("asks"), left),
			El("div", Class("pictures"), right),
			El("div", Class("notes"), v.benchCautions()),
		),
		v.benchFoot(),
		v.dropping(),
		v.message(),
		v.broken(),
	)
}

// benchJob is which job it is, and what is known of the bike and the road: a
// sentence whose bold words can be changed.
func (v *viewer) benchJob() *Node {
	job := v.Bench.Doing()
	one := func(is string, k words.Key) *Node {
		return v.one(state.BenchJob, is, Text(capital(v.Voice.Say(k))), job == is)
	}
	first := true
	intro, says := words.BenchCoastIntro, Parts{
		v.fill(words.AskBenchBike, v.thing(keep.Bike, &first), v.input("coast.mass_kg"), v.input("coast.clicks_per_turn"), v.input("coast.circumference_m")),
		Text(" "),
		v.fill(words.AskBenchRoad, v.input("coast.grade"), v.input("coast.grade_error"), v.input("coast.wind_mps")),
	}
	if job == state.JobStand {
		intro = words.BenchStandIntro
		says = v.fill(words.AskBenchWheel, v.input("coast.clicks_per_turn"), v.input("coast.circumference_m"), v.input("bike.wheel_inertia_kgm2"))
	}
	var here Part
	if read, ok := v.Combined(); ok && job == state.JobCoast {
		here = button("plain", state.GradeFromSide, "", v.say(words.BenchGradeHere, v.GradeFine(read.Grade)+" "+v.GradeError(read.PlusMinus())))
	}
	return region("section", "bench-job", Class("bench-job"), With("aria-labelledby", "bench-title"),
		El("h2", ID("bench-title"), With("tabindex", "-1"), v.say(words.HeadBench)),
		El("div", Class("one-of"), With("role", "group"), With("aria-label", v.Voice.Say(words.BenchJobs)), one(state.JobCoast, words.JobCoast), one(state.JobStand, words.JobStand)),
		El("p", v.say(intro)),
		El("p", Class("sentence"), says),
		here)
}

func (v *viewer) benchCautions() *Node {
	list := Parts{Class("cautions-list")}
	all := []words.Key{words.CautionEstimate, words.CautionCoast, words.CautionMotorOff, words.CautionDescent, words.CautionPractice}
	if v.Bench.Doing() == state.JobStand {
		all = []words.Key{words.CautionEstimate, words.CautionStand, words.CautionPractice}
	}
	for _, k := range all {
		list = append(list, El("li", v.say(k)))
	}
	return region("section", "cautions", With("aria-labelledby", "cautions-title"),
		El("h2", ID("cautions-title"), v.say(words.HeadCautions)), El("ul", list))
}

// benchFoot stays at the foot of the screen, under the thumb: record and stop,
// or the taps.
func (v *viewer) benchFoot() *Node {
	main := func(act, arg string, inside Part) *Node { return button("main", act, arg, inside) }
	purpose := state.ForRun
	if v.Bench.Doing() == state.JobStand {
		purpose = state.ForSpin
	}
	var inside Parts
	r, l := &v.Bench.Sound, &v.Bench.Laps
	switch {
	case v.Place != "":
		return region("section", "side-foot", Bare("hidden")) // what is open has a foot of its own
	case r.Stage == state.SoundRecording:
		inside = Parts{main(state.SoundDone, "", v.say(words.SoundStop))}
	case r.Stage == state.SoundListening:
		inside = Parts{main(state.SoundLeave, "", v.say(words.SoundListenStop))}
	case l.Way == state.LapDisplay && v.LapSpeed(len(l.AtS)) >= 0:
		inside = Parts{main(state.Lap, "", v.say(words.LapTapAt, v.Speed(v.LapSpeed(len(l.AtS))))), main(state.LapsEnd, "", v.say(words.LapDone))}
	case l.Way == state.LapMarks:
		inside = Parts{main(state.Lap, "", v.say(words.LapTapAt, v.Length(float64(len(l.AtS))*v.Dial(state.DialMarks)))), main(state.LapsEnd, "", v.say(words.LapDone))}
	case l.Way != "":
		inside = Parts{main(state.LapsEnd, "", v.say(words.LapDone))}
	default:
		inside = Parts{main(state.SoundFor, purpose, v.say(words.SoundStart))}
	}
	return region("section", "side-foot", Class("side-foot"), With("aria-labelledby", "foot-title"),
		El("h2", ID("foot-title"), Class("unseen"), Text(capital(v.Voice.Say(words.FootName)))), inside)
}

// gradeWith writes a grade that was found, with half its 90 % interval.
func (v *viewer) gradeWith(value, half float64) string {
	return v.Voice.Number(100*value, 2) + " % ± " + v.Voice.Number(100*half, 2) + " %"
}
