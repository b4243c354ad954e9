package view

import (
	"math"
	"strconv"

	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
	. "hillwright/wasm/dom"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// sidePitch is go or don't, for the chosen rider and bike on this grade.
func (v *viewer) sidePitch() *Node {
	head := El("h2", ID("pitch-title"), Class("unseen"), v.say(words.HeadPitch))
	p := v.Side.Pitch
	if p == nil {
		return region("section", "side-pitch", Class("side-pitch"), With("aria-labelledby", "pitch-title"), head, v.trouble(), v.who(), v.pitchAsks())
	}
	low, high := p.Read.Interval90()
	return region("section", "side-pitch", Class("side-pitch "+wordClass(p.Word)), With("aria-labelledby", "pitch-title"), head,
		v.trouble(),
		El("div", With("aria-live", "polite"),
			El("p", Class("word"), wordShape(p.Word), Text(v.Voice.Word(p.Word))),
			El("p", Class("pitch-means"), Text(v.Means(p.Rig, p.Answer, p.Word, low, high, p.LengthM, state.RollingMps))),
			If(p.Word != words.Again && p.Straddles(), El("p", Class("problem"), v.say(words.StraddleStart)))),
		v.who(),
		v.pitchAsks(),
		v.pitchFigures(p),
		v.telling())
}

// wordClass gives a word its colour; the answer's are taken, so that one colour
// always means one thing.
func wordClass(w words.Word) string {
	return [...]string{words.Go: "word-clears", words.Rolling: "word-tight", words.Again: "word-tight", words.Stop: "word-short"}[w]
}

// wordShape is a word's own shape: a wheel over the top, a wheel with a run-up,
// a wheel between two grades, a wheel before a bar.
func wordShape(w words.Word) *Node {
	var lines, wheel string
	switch w {
	case words.Go:
		lines, wheel = "M3 37L34 17H53M45 9L53 17L45 25", "M33 9A6 6 0 1 1 32.9 9Z"
	case words.Rolling:
		lines, wheel = "M3 37H22L53 17M3 23H11M6 29H14", "M30 23A6 6 0 1 1 29.9 23Z"
	case words.Again:
		lines, wheel = "M3 37L53 29M3 37L45 7", "M45 17A6 6 0 1 1 44.9 17Z"
	case words.Stop:
		lines, wheel = "M3 37H22L53 17M29 13L41 33", "M16 30A6 6 0 1 1 15.9 30Z"
	}
	return SVG(Class("shape"), With("viewBox", "0 0 56 40"), With("width", "56"), With("height", "40"), With("aria-hidden", "true"),
		El("path", Class("shape-road"), With("d", lines)), El("path", Class("shape-end"), With("d", wheel)))
}

// who is the rider, the bike and the load that are asked about.
func (v *viewer) who() *Node {
	row := Parts{Class("who")}
	for _, kind := range []keep.Kind{keep.Rider, keep.Bike, keep.Load} {
		row = append(row, El("button", With("type", "button"), Class("who-is"), ID("blank-"+string(kind)), Act(state.Open, string(kind)),
			flag("aria-expanded", v.Place == string(kind)), With("aria-controls", "place"),
			El("span", Class("who-kind"), v.say(headOf(kind))), El("span", Text(capital(v.NameOf(kind))))))
	}
	return El("div", row)
}

// pitchAsks are the pitch's length, and wet or dry.
func (v *viewer) pitchAsks() Part {
	parts := Parts{v.wetOrDry(),
		v.picking(words.LengthName, "length", "typed", words.LengthTyped, "paces", words.LengthPaces, "rolled", words.LengthRolled)}
	switch v.Picked("length", "typed") {
	case "paces":
		parts = append(parts, El("p", Class("length-is"), v.say(words.DialLength), Text(": "), El("b", Text(v.Voice.Value(state.DialLength, v.Dial(state.DialLength))))),
			v.dialStepper(state.DialPaces), v.dialStepper(state.DialPace))
	case "rolled":
		parts = append(parts, El("p", Class("length-is"), v.say(words.DialLength), Text(": "), El("b", Text(v.Voice.Value(state.DialLength, v.Dial(state.DialLength))))),
			v.dialStepper(state.DialRolled))
	default:
		parts = append(parts, v.dialStepper(state.DialLength))
	}
	return El("div", Class("pitch-asks"), parts)
}

// pitchFigures are the answer's figures, readable at arm's length.
func (v *viewer) pitchFigures(p *state.Pitch) *Node {
	a, r := p.Answer, p.Rig
	var rows Parts
	row := func(k words.Key, figure string) {
		rows = append(rows, El("div", El("dt", v.say(k)), El("dd", Text(figure))))
	}
	run := &a.Hardest.Running
	if run.SpeedMps > 0 {
		row(words.PitchSpeed, v.Speed(run.SpeedMps))
		if len(r.Gears) > 1 {
			row(words.PitchGear, v.Gear(r, run.Gear))
		}
	}
	if pegs := a.Balance.Pegs; len(pegs) > 0 {
		row(words.PitchBinds, v.Limit(pegs[0].Limit))
		row(words.LabelHeadroom, v.Headroom(pegs[0].Headroom))
	}
	row(words.PitchHeld, v.Grade(a.Balance.SteepestGrade))
	switch {
	case a.Energy.MotorJ <= 0:
		row(words.PitchHolds, v.Voice.Say(words.PitchNoMotor))
	case math.IsInf(a.EasingS, 1):
		row(words.PitchHolds, v.Voice.Say(words.PitchHoldsAlways))
	default:
		row(words.PitchHolds, v.Duration(a.EasingS))
	}
	if !a.Stalled {
		row(words.PitchTime, v.Duration(a.ClimbS))
	}
	if a.Energy.FromPackJ > 0 {
		row(words.PitchCharge, v.Grade(unit.Grade(v.Question.Ride.Charge-a.ChargeLeft)))
	}
	grip, lift := v.Voice.Say(words.PitchStays), v.Voice.Say(words.PitchStays)
	for _, peg := range a.Balance.Pegs {
		text := v.Headroom(peg.Headroom)
		switch {
		case peg.Limit == rig.Grip && peg.Headroom < 0:
			grip = v.Voice.Say(words.PitchLoose)
		case peg.Limit == rig.Grip:
			grip = text
		case peg.Limit == rig.Lift && peg.Headroom < 0:
			lift = v.Voice.Say(words.PitchLifts)
		case peg.Limit == rig.Lift:
			lift = text
		}
	}
	row(words.PitchGrip, grip)
	row(words.PitchLift, lift)
	return El("dl", Class("pitch-figures"), rows)
}

// telling chooses how the answer is told aloud.
func (v *viewer) telling() Part {
	if !v.CanSpeak() {
		return El("p", Class("hint"), v.say(words.TellNone), Text(" "), v.say(words.TonesMean))
	}
	return Parts{
		v.picking(words.TellName, "say", "voice", words.TellVoice, "tones", words.TellTones),
		If(v.Picked("say", "voice") == "tones", El("p", Class("hint"), v.say(words.TonesMean))),
	}
}

// sideDown is the way down this pitch: the same as on a hill.
func (v *viewer) sideDown() *Node {
	p := v.Side.Pitch
	if p == nil {
		return region("section", "down", Bare("hidden"))
	}
	here := *v.State
	here.Answer, here.Rig = p.Answer, p.Rig
	return (&viewer{State: &here, Voice: v.Voice}).wayDown()
}

// sideGroup is who else stands here, answered together.
func (v *viewer) sideGroup() *Node {
	weakest := v.Weakest()
	list := Parts{Class("group-list")}
	for i, pair := range v.Side.Group {
		name := v.Voice.Say(words.GroupOn, v.nameOf(keep.Rider, pair.Rider), v.nameOf(keep.Bike, pair.Bike))
		at := strconv.Itoa(i)
		class, answer := "", Part(nil)
		if p := pair.Pitch; p != nil {
			class = wordClass(p.Word)
			answer = El("span", Class("group-word"), wordShape(p.Word), Text(v.Voice.Word(p.Word)+" · "+v.Headroom(p.Answer.Balance.Headroom())))
		}
		if i == weakest {
			class += " weakest"
		}
		list = append(list, El("li", Class(class),
			button("group-is", state.GroupTake, at, El("span", Class("choice-name"), Text(capital(name)),
				If(i == weakest, El("span", Class("own"), Text(" · "), v.say(words.GroupWeakest)))), answer),
			button("plain", state.GroupDrop, at, With("aria-label", v.Voice.Say(words.GroupRemove)+": "+name), Text("✕"))))
	}
	var all Part
	if weakest >= 0 {
		p := v.Side.Group[weakest].Pitch
		all = El("p", Class("group-all "+wordClass(p.Word)), v.say(words.GroupAll, v.Voice.Number(float64(len(v.Side.Group)), 0), v.Voice.Word(p.Word)))
	}
	return region("section", "side-group", Class("side-group"), With("aria-labelledby", "group-title"),
		El("h2", ID("group-title"), v.say(words.HeadGroup)),
		If(len(v.Side.Group) == 0, El("p", Class("hint"), v.say(words.GroupNone))),
		all,
		If(len(v.Side.Group) > 0, El("ul", list)),
		button("main wide", state.GroupOpen, "", flag("aria-expanded", v.Side.Adding), v.say(words.GroupAdd, v.NameOf(keep.Bike))),
		If(v.Side.Adding, v.adding()))
}

// adding is the list of riders that can be added.
func (v *viewer) adding() *Node {
	list := Parts{Class("choices")}
	for _, t := range v.Things(keep.Rider) {
		list = append(list, El("li", button("choice", state.GroupAdd, t.ID, El("span", Class("add-mark"), With("aria-hidden", "true"), Text("+")),
			El("span", Class("choice-name"), Text(t.Name(v.Lang.Tag()))), El("span", Class("in-short"), Text(v.inShort(&t))))))
	}
	return El("ul", list)
}

func (v *viewer) nameOf(kind keep.Kind, id string) string {
	for _, t := range v.Things(kind) {
		if t.ID == id {
			return t.Name(v.Lang.Tag())
		}
	}
	return id
}

// downFigures are the way down's figures, readable at arm's length.
func (v *viewer) downFigures(d *ride.WayDown) *Node {
	stop := v.Length(d.StoppingM)
	if math.IsInf(d.StoppingM, 1) {
		stop = v.Voice.Say(words.DownNoStopping)
	}
	return El("dl", Class("pitch-figures"),
		El("div", El("dt", v.say(words.DownStop, v.Speed(v.Question.Ride.DownMps))), El("dd", Text(stop))))
}
