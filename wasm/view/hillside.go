package view

import (
	"hillwright/physics/unit"
	. "hillwright/wasm/dom"
	"hillwright/wasm/draw"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// hillside is the place at the foot of a pitch: the grade and how it is
// measured, go or don't, the way down, the group, what was read. What is
// touched most lies at the foot of the screen, under the thumb.
func (v *viewer) hillside() *Node {
	return El("div", Class("page by-thumb at-hillside"),
		draw.Hatches(),
		v.masthead(),
		El("main",
			El("div", Class("asks"), v.sideGrade(), v.sideMeasure(), v.sideReadings()),
			El("div", Class("pictures"), v.sidePitch(), v.place(), v.sideDown(), v.sideGroup()),
			El("div", Class("notes"), v.sideCautions()),
		),
		v.sideFoot(),
		v.dropping(),
		v.message(),
		v.broken(),
	)
}

// sideGrade is the grade of the pitch as its readings say it together.
func (v *viewer) sideGrade() *Node {
	head := El("div", Class("row spread"),
		El("h2", ID("grade-title"), With("tabindex", "-1"), v.say(words.HeadGrade), Text(": "), Text(v.PitchName())),
		If(v.ReadHere() > 0, button("plain", state.PlaceNext, "", v.say(words.PlaceNextButton))))
	read, ok := v.Combined()
	if v.Side.Way != "" && v.Side.Way != state.WayChoose {
		return region("section", "side-grade", Bare("hidden")) // one figure at a time
	}
	if !ok {
		return region("section", "side-grade", Class("side-grade"), With("aria-labelledby", "grade-title"), head,
			El("p", v.say(words.NoGrade)))
	}
	count := v.Voice.Say(words.ReadOnce) + ", " + v.Method(read.Method)
	if n := v.ReadHere(); n > 1 {
		count = v.Voice.Say(words.ReadTimes, v.Voice.Number(float64(n), 0))
	}
	return region("section", "side-grade", Class("side-grade"), With("aria-labelledby", "grade-title"), head,
		El("div", Class("grade-is"),
			El("p", Class("huge"), Text(v.GradeFine(read.Grade)), El("span", Class("error"), Text(v.GradeError(read.PlusMinus())))),
			draw.Wedge(read.Grade.Angle(), 150, 64)),
		El("p", Class("hint"), Text(count)),
		If(read.Misfit, El("p", Class("problem"), With("role", "alert"), v.say(words.ReadMisfit, v.Voice.Number(read.Widened, 1)))))
}

// sideFoot stays at the foot of the screen: the next step of measuring, or the
// answer told aloud.
func (v *viewer) sideFoot() *Node {
	var do, out Part
	main := func(act, arg string, k words.Key) *Node { return button("main", act, arg, v.say(k)) }
	t := &v.Side.Tilt
	switch v.Side.Way {
	case "":
		if v.ReadHere() == 0 {
			return region("section", "side-foot", Bare("hidden")) // the ways themselves are offered
		}
		do = main(state.Measure, state.WayChoose, words.MeasureAgain)
		if v.Side.Pitch != nil {
			out = main(state.Tell, "", words.TellButton)
		}
	case state.WayChoose:
		out = main(state.Measure, "", words.MeasureStop)
	default:
		out = main(state.Measure, "", words.MeasureStop)
		switch {
		case v.sensorFails():
		case v.Side.Way == state.WayTilt && t.Taking:
			do = main(state.StartOver, "", words.TiltOver)
		case v.Side.Way == state.WayTilt && t.Half():
			do = main(state.Average, "", words.TiltTurned)
		case v.Side.Way == state.WayTilt:
			do = main(state.Average, "", words.TiltTake)
		case v.Side.Way == state.WaySight && t.Frozen:
			do = main(state.OneReading, "", words.SightUse)
		case v.Side.Way == state.WaySight:
			do = main(state.Freeze, "", words.SightFreeze)
		default:
			do = main(state.Read, "", words.ReadUse)
		}
	}
	return region("section", "side-foot", Class("side-foot"), With("aria-labelledby", "foot-title"),
		El("h2", ID("foot-title"), Class("unseen"), Text(capital(v.Voice.Say(words.FootName)))), do, out)
}

// dialStepper is a dial's name over its stepper, all by thumb.
func (v *viewer) dialStepper(path string) *Node {
	name := v.inputName(path)
	return El("div", Class("editor"), With("role", "group"), With("aria-label", name),
		El("p", Class("editor-name"), Text(capital(name))),
		El("div", Class("stepper"),
			button("step", state.DialDown, path, With("aria-label", v.Voice.Say(words.StepDown, name)), Text("−")),
			El("output", Class("stepper-shown"), Text(v.DialVoice(path).Value(path, v.Dial(path)))),
			button("step", state.DialUp, path, With("aria-label", v.Voice.Say(words.StepUp, name)), Text("+"))))
}

// picking is a choice of a few.
func (v *viewer) picking(title words.Key, name string, choices ...any) *Node {
	row := Parts{}
	is := v.Picked(name, choices[0].(string))
	for i := 0; i < len(choices); i += 2 {
		word := choices[i].(string)
		row = append(row, v.one(state.Pick, name+"="+word, v.say(choices[i+1].(words.Key)), is == word))
	}
	label := capital(v.Voice.Say(title))
	return El("div", El("p", Class("editor-name"), Text(label)),
		El("div", Class("one-of"), With("role", "group"), With("aria-label", label), row))
}

func (v *viewer) sideCautions() *Node {
	list := Parts{Class("cautions-list")}
	for _, k := range []words.Key{words.CautionEstimate, words.CautionHillside, words.CautionDescent, words.CautionWetRoad, words.CautionLoad, words.CautionPractice} {
		list = append(list, El("li", v.say(k)))
	}
	return region("section", "cautions", With("aria-labelledby", "cautions-title"),
		El("h2", ID("cautions-title"), v.say(words.HeadCautions)), El("ul", list))
}

// liveWedge is the slope as it is tilted.
func (v *viewer) liveWedge(a unit.Angle) *Node {
	return region("div", "side-wedge", Class("canvas"), draw.Wedge(a, 328, 150))
}
