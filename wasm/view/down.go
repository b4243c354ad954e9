package view

import (
	"slices"
	"strings"

	"hillwright/physics/ask"
	. "hillwright/wasm/dom"
	"hillwright/wasm/draw"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// brakesWide is how wide the brakes are drawn [px].
const brakesWide = 328

// wayDown is the way down: the speed not to exceed, the speed that is chosen
// and what it does, the ground under it, the brakes, what to mind.
func (v *viewer) wayDown() *Node {
	if v.Answer == nil {
		return region("section", "down", Bare("hidden"))
	}
	d := &v.Answer.WayDown
	lines := v.DownLines(v.Rig, d, v.Question.Ride.DownMps)
	said := Parts{El("p", Class("down-most"), v.large(lines[0], v.Speed(d.MostMps)))}
	if d.Falls {
		said = append(said, El("div", Class("down-asks"), v.downSpeed(), If(!v.Side.Open, v.wetOrDry())))
	}
	for _, line := range lines[1:] {
		said = append(said, El("p", Text(line)))
	}
	list := Parts{Class("cautions-list")}
	for _, text := range v.Cautions(v.Rig, d, v.Question.Ride.DownMps) {
		list = append(list, El("li", Text(text)))
	}
	return region("section", "down", With("aria-labelledby", "down-title"),
		El("h2", ID("down-title"), Text(capital(v.Voice.Say(words.LabelDown)))),
		said,
		If(v.Side.Open && d.Falls, v.downFigures(d)),
		El("div", Class("canvas"), draw.Brakes(d, v.Rig, brakesWide, v.Voice)),
		If(len(list) > 1, El("ul", list)))
}

// large sets a figure of a sentence large.
func (v *viewer) large(text, figure string) Part {
	before, after, found := strings.Cut(text, figure)
	if !found {
		return Text(text)
	}
	return Parts{Text(before), El("b", Class("most"), Text(figure)), Text(after)}
}

// downSpeed is the speed chosen for the way down, with a thumb's steps.
func (v *viewer) downSpeed() *Node {
	const path = "ride.down_mps"
	name, _ := v.Input(path)
	return El("div", Class("stepper"), With("role", "group"), With("aria-label", name),
		button("step", state.StepDown, path, With("aria-label", v.Voice.Say(words.StepDown, name)), Text("−")),
		El("output", Class("stepper-shown"), Text(v.valueOf(path))),
		button("step", state.StepUp, path, With("aria-label", v.Voice.Say(words.StepUp, name)), Text("+")))
}

// wetOrDry switches the ground between wet and dry; where it is always wet
// there is nothing to switch, and the list of grounds opens instead.
func (v *viewer) wetOrDry() *Node {
	const path = "day.ground"
	in, _ := ask.InputAt(path)
	is, _ := v.Question.Get(path)
	kind, _, _ := strings.Cut(is, "-")
	row := Parts{Class("one-of"), With("role", "group"), With("aria-label", v.inputName(path))}
	n := 0
	for _, ground := range []string{kind + "-dry", kind + "-wet"} {
		if slices.Contains(in.Choices, ground) {
			n++
			row = append(row, button("one", state.SetTo, path+"="+ground, flag("aria-pressed", ground == is), Text(capital(v.Choice(path, ground)))))
		}
	}
	if n < 2 {
		return El("p", v.fill(words.OnGround, button("plain", state.ShowPath, path, Text(v.Choice(path, is)))))
	}
	return El("div", row)
}

func (v *viewer) inputName(path string) string {
	name, _ := v.Input(path)
	return name
}
