package view

import (
	. "hillwright/wasm/dom"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// answer is the word of the answer, and why.
func (v *viewer) answer() *Node {
	head := El("h2", ID("answer-title"), Class("unseen"), v.say(words.HeadAnswer))
	if v.Answer == nil {
		return region("section", "answer", With("aria-labelledby", "answer-title"), head, v.trouble())
	}
	a := v.Answer
	stale := ""
	if v.Trouble != nil {
		stale = " stale"
	}
	return region("section", "answer", Class("answer word-"+a.Verdict.String()+stale), With("aria-labelledby", "answer-title"),
		head, v.trouble(),
		El("div", With("aria-live", "polite"),
			El("p", Class("word"), v.shape(), Text(v.Verdict(a.Verdict)),
				El("span", Class("room"), Text(v.Headroom(a.Balance.Headroom())))),
			El("p", Class("means"), Text(v.means())),
			El("p", Class("why"), Text(v.Why(v.Rig, a)))),
	)
}

// trouble says why there is no answer for the inputs as they are; the last
// answer stays below it.
func (v *viewer) trouble() Part {
	if v.Trouble == nil {
		return nil
	}
	return El("p", Class("problem"), With("role", "alert"), Text(v.Problem(v.Trouble)))
}

func (v *viewer) means() string {
	return v.Voice.Say([]words.Key{words.VerdictClearsMeans, words.VerdictTightMeans, words.VerdictShortMeans}[v.Answer.Verdict])
}

// figures are the answer's figures as notes beside it, and what can be done
// with them.
func (v *viewer) figures() *Node {
	if v.Answer == nil {
		return region("section", "figures", Bare("hidden"))
	}
	return region("section", "figures", With("aria-labelledby", "figures-title"),
		El("h2", ID("figures-title"), v.say(words.HeadFigures)),
		El("ul", Class("notes-list"), v.notes()),
		El("div", Class("row"),
			button("plain", state.Figures, "", v.say(words.ButtonFigures)),
			If(v.Device.CanShare, button("plain", state.Share, "", v.say(words.ButtonShare))),
			button("plain", state.Print, "", v.say(words.ButtonPrint))),
	)
}

func (v *viewer) notes() Parts {
	a, r := v.Answer, v.Rig
	var out Parts
	note := func(k words.Key, args ...string) {
		line := Parts{}
		for i := range args {
			line = append(line, El("b", Text(args[i])))
		}
		out = append(out, El("li", v.fill(k, line...)))
	}
	if run := &a.Hardest.Running; run.SpeedMps > 0 {
		note(words.NoteThere, v.Speed(run.SpeedMps), v.Gear(r, run.Gear), v.Cadence(run.CadenceRPM))
	}
	if pegs := a.Balance.Pegs; len(pegs) > 0 {
		note(words.NoteBinds, v.Limit(pegs[0].Limit), v.Headroom(pegs[0].Headroom))
		if len(pegs) > 1 {
			note(words.NoteNext, v.Limit(pegs[1].Limit), v.Headroom(pegs[1].Headroom))
		}
	}
	note(words.NoteHolds, v.Grade(a.Balance.SteepestGrade))
	if a.Stalled {
		note(words.NoteUntil, v.Length(a.StalledAtM), v.Duration(a.ClimbS))
	} else {
		note(words.NoteWhole, v.Length(a.LengthM), v.Height(a.AscentM), v.Duration(a.ClimbS))
	}
	e := &a.Energy
	if sum := e.RiderJ + e.MotorJ; sum > 0 {
		note(words.NoteShares, v.Energy(e.RiderJ), v.Energy(e.MotorJ), v.Percent(e.MotorJ/sum))
	}
	if pack := v.Question.Bike.Pack.EnergyWh; pack > 0 && e.FromPackJ > 0 {
		note(words.NotePack, v.Energy(e.FromPackJ), v.Percent(e.FromPackJ/(pack*3600)))
	}
	return out
}

// cautions are what must always be known before riding, and what was mended in
// the track.
func (v *viewer) cautions() *Node {
	list := Parts{Class("cautions-list")}
	for _, n := range v.Reading.Notes {
		if v.IsOwn(state.Hill, v.Chosen[state.Hill]) {
			list = append(list, El("li", Text(v.Note(n))))
		}
	}
	for _, k := range []words.Key{words.CautionEstimate, words.CautionDescent, words.CautionGrip, words.CautionLoad, words.CautionPractice, words.CautionLaw} {
		list = append(list, El("li", v.say(k)))
	}
	return region("section", "cautions", With("aria-labelledby", "cautions-title"),
		El("h2", ID("cautions-title"), v.say(words.HeadCautions)), El("ul", list))
}
