package view

import (
	"hillwright/physics/coast"
	. "hillwright/wasm/dom"
	"hillwright/wasm/draw"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// runs are the coast-downs of the chosen bike, the latest first.
func (v *viewer) runs() *Node {
	list := v.Runs()
	cards := Parts{Class("run-list")}
	for i := len(list) - 1; i >= 0; i-- {
		cards = append(cards, v.run(&list[i], i+1))
	}
	var inside Part = El("p", Class("hint"), v.say(words.RunsNone))
	if len(list) > 0 {
		inside = El("ul", cards)
	}
	return region("section", "bench-runs", With("aria-labelledby", "runs-title"),
		El("h2", ID("runs-title"), With("tabindex", "-1"), v.say(words.HeadRuns)), inside)
}

// run is one coast-down: its picture, which way it was ridden, whether it
// counts, its ends.
func (v *viewer) run(r *keep.Run, number int) *Node {
	first, last, long, known := v.RunEnds(r)
	line := v.Voice.Say(words.RunNoClicks)
	says := line
	if known {
		line = v.Voice.Say(words.RunLine, v.Seconds(long), v.Speed(first), v.Speed(last))
		says = v.Voice.Say(words.ClickPictureSays, v.Seconds(r.FromS), v.Seconds(r.ToS), v.Speed(first), v.Speed(last))
	}
	pair := func(name words.Key, act, yes, no string, yesName, noName words.Key, is bool) *Node {
		return El("div", Class("one-of"), With("role", "group"), With("aria-label", capital(v.Voice.Say(name))),
			v.one(act, r.ID+"="+yes, v.say(yesName), is), v.one(act, r.ID+"="+no, v.say(noName), !is))
	}
	class := "run"
	if r.LeftOut {
		class += " left-out"
	}
	title := v.Voice.Say(words.ClickPicture) + " · " + r.Name
	args := [2]string{r.ID + "=from", r.ID + "=to"}
	names := [2]string{capital(v.Voice.Say(words.RunCutFrom)), capital(v.Voice.Say(words.RunCutTo))}
	view := v.ClickView(r)
	return El("li", Class(class), With("data-run", r.ID),
		El("h3", Text(v.Voice.Number(float64(number), 0)+" · "+r.Name)),
		El("p", Class("run-line"), Text(line)),
		v.fitting(v.RunFit(r.ID)),
		El("div", Class("canvas"), draw.Clicks(view, title, says, state.CutHandle, args, names)),
		If(view.Picture != nil, El("p", Class("hint"), v.say(words.ClickPictureNote))),
		pair(words.RunWay, state.RunWay, "out", "back", words.RunOut, words.RunBack, !r.Back),
		El("div", Class("cutters"), v.cutter(names[0], args[0], v.Seconds(r.FromS)), v.cutter(names[1], args[1], v.Seconds(r.ToS))),
		El("div", Class("row"),
			pair(words.RunUsed, state.RunUse, "yes", "no", words.RunUse, words.RunLeave, !r.LeftOut),
			button("plain", state.RunForget, r.ID, v.say(words.RunForget))))
}

// cutter moves an end of a run by half a second at a time.
func (v *viewer) cutter(name, arg, shown string) *Node {
	return El("div", Class("editor"), With("role", "group"), With("aria-label", name),
		El("p", Class("editor-name"), Text(name)),
		El("div", Class("stepper"),
			button("step", state.CutEarlier, arg, With("aria-label", v.Voice.Say(words.StepDown, name)), Text("−")),
			El("output", Class("stepper-shown"), Text(shown)),
			button("step", state.CutLater, arg, With("aria-label", v.Voice.Say(words.StepUp, name)), Text("+"))))
}

// worstMisfit is beyond how many of its errors a run is said to fit badly.
const worstMisfit = 3

// fitting says what is odd about how a run fits; nothing for one that does not
// count.
func (v *viewer) fitting(f *coast.RunFit) Part {
	switch {
	case f == nil:
		return nil
	case f.Odd:
		return El("p", Class("problem"), With("role", "alert"), v.say(words.RunOdd))
	case f.Misfit > worstMisfit:
		return El("p", Class("hint"), v.say(words.RunMisfit, v.Voice.Number(f.Misfit, 1)))
	}
	return nil
}
