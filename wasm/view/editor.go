package view

import (
	"strconv"

	"hillwright/physics/ask"
	. "hillwright/wasm/dom"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// sourceMark tells by a mark and a word where a value came from, what stands
// for it when it is not given, and whether it was changed.
func (v *viewer) sourceMark(path, instead string) *Node {
	source := v.Behind(path).Source
	return El("span", Class("source"), sourceShape(source), Text(v.Source(source)),
		If(instead != "", Text(" · "+instead)),
		If(v.Changed(path), Parts{Text(" · "), v.say(words.KeptChanged)}))
}

// sourceShape: an open ring for what is assumed, a half-filled one for the
// maker's sheet, a full one for what was measured.
func sourceShape(source ask.Source) *Node {
	fill := map[ask.Source]string{
		ask.Assumed:  "",
		ask.Sheet:    "M8 2a6 6 0 0 1 0 12z",
		ask.Measured: "M8 2a6 6 0 0 1 0 12a6 6 0 0 1 0-12z",
	}[source]
	return SVG(Class("source-shape"), With("viewBox", "0 0 16 16"), With("width", "16"), With("height", "16"), With("aria-hidden", "true"),
		El("circle", With("cx", "8"), With("cy", "8"), With("r", "6")), El("path", With("d", fill)))
}

// editor changes one input: a stepper for numbers, a list for choices, a field
// for the rest.
func (v *viewer) editor(path string) *Node {
	in, ok := ask.InputAt(path)
	if !ok {
		return nil
	}
	name, _ := v.Input(path)
	return El("div", Class("editor"), With("role", "group"), With("aria-label", name),
		If(!v.All, El("p", Class("editor-name"), Text(capital(name)))),
		v.control(in, name),
		v.problem(path),
		v.band(path),
		If(in.Form != ask.Choice && in.Form != ask.Whole, v.blank(in)),
		If(in.Form != ask.Choice && in.Form != ask.Whole, v.sources(path)),
		If(v.Changed(path), button("plain", state.Reset, path, v.say(words.ButtonBackToShop))),
	)
}

func (v *viewer) control(in ask.Input, name string) Part {
	switch {
	case in.Path == "ride.level":
		return v.levels(in)
	case in.Form == ask.Choice:
		return v.choicesOf(in)
	case in.Form == ask.Number:
		return v.stepper(in, name)
	}
	text, _ := v.Question.Get(in.Path)
	return v.field(in.Path, name, v.raw(in.Path, v.Choice(in.Path, text)), "text")
}

// raw is what stands in a field: what is being typed, or else the value.
func (v *viewer) raw(path, value string) string {
	if v.Typing.Path == path {
		return v.Typing.Text
	}
	return value
}

func (v *viewer) stepper(in ask.Input, name string) *Node {
	_, unit := v.Input(in.Path)
	number, given := v.NumberOf(in.Path)
	value, instead := "", ""
	if given {
		value = v.Entry(in.Path, number)
	} else if number != 0 {
		instead = v.Entry(in.Path, number)
	}
	return El("div", Class("stepper"),
		button("step", state.StepDown, in.Path, With("aria-label", v.Voice.Say(words.StepDown, name)), Text("−")),
		El("div", Class("stepper-value"), v.field(in.Path, name, v.raw(in.Path, value), "decimal", If(instead != "", With("placeholder", instead))), If(unit != "", El("span", Class("unit"), Text(unit)))),
		button("step", state.StepUp, in.Path, With("aria-label", v.Voice.Say(words.StepUp, name)), Text("+")),
	)
}

func (v *viewer) field(path, name, value, mode string, more ...Part) *Node {
	return El("input", ID("field-"+path), With("type", "text"), With("inputmode", mode), With("autocomplete", "off"), With("spellcheck", "false"),
		With("aria-label", name), With("aria-describedby", "problem-"+path), flag("aria-invalid", v.wrong(path)),
		With("value", value), Act(state.Type, path), Parts(more))
}

func (v *viewer) wrong(path string) bool { return v.Typing.Path == path && v.Typing.Err != nil }

// problem stands beside the blank, in the reader's words, for as long as what
// is typed does not fit.
func (v *viewer) problem(path string) *Node {
	var text Part
	if v.wrong(path) {
		text = Text(v.Problem(v.Typing.Err))
	}
	return El("p", ID("problem-"+path), Class("problem"), With("role", "alert"), text)
}

// band tells how far a number may be off, and why a class default stands in for
// one that is not given.
func (v *viewer) band(path string) Parts {
	shown := v.Behind(path)
	var out Parts
	if low, high := shown.Low, shown.High; low < high {
		out = append(out, El("p", Class("band"), v.say(words.NoteBand, v.Entry(path, low), v.Value(path, high))))
	}
	if shown.Reason != "" {
		out = append(out, El("p", Class("band"), Text(v.Reason(shown.Reason))))
	}
	return out
}

// blank lets an input be not given, where that has a meaning.
func (v *viewer) blank(in ask.Input) Part {
	if in.Blank == "" {
		return nil
	}
	text, _ := v.Question.Get(in.Path)
	return button("choice", state.SetTo, in.Path+"="+in.Blank, flag("aria-pressed", text == in.Blank),
		tick(text == in.Blank), El("span", Class("choice-name"), Text(capital(v.Choice(in.Path, in.Blank)))))
}

func (v *viewer) sources(path string) *Node {
	is := v.Question.SourceOf(path)
	row := Parts{Class("one-of"), With("role", "group"), With("aria-label", v.Voice.Say(words.LabelSource))}
	for _, source := range []ask.Source{ask.Assumed, ask.Sheet, ask.Measured} {
		row = append(row, button("one", state.SourceTo, path+"="+source.String(), flag("aria-pressed", source == is),
			sourceShape(source), Text(v.Source(source))))
	}
	return El("div", row)
}

func (v *viewer) choicesOf(in ask.Input) *Node {
	is, _ := v.Question.Get(in.Path)
	list := Parts{Class("choices")}
	for _, word := range in.Choices {
		list = append(list, v.option(in.Path, word, v.Choice(in.Path, word), word == is))
	}
	return El("ul", list)
}

func (v *viewer) option(path, word, name string, chosen bool) *Node {
	return El("li", button("choice", state.SetTo, path+"="+word, flag("aria-pressed", chosen),
		tick(chosen), El("span", Class("choice-name"), Text(capital(name)))))
}

// levels are the assist levels that the motor has, highest first.
func (v *viewer) levels(in ask.Input) *Node {
	is, _ := v.Question.Get(in.Path)
	list := Parts{Class("choices"), v.option(in.Path, in.Blank, v.Voice.Say(words.AskLevelHighest), is == in.Blank)}
	factors := v.Question.Bike.Motor.Levels
	for n := len(factors); n > 0; n-- {
		word := strconv.Itoa(n)
		list = append(list, v.option(in.Path, word, v.Voice.Say(words.AskLevel, word)+" · × "+v.Voice.Number(factors[n-1], 1), is == word))
	}
	list = append(list, v.option(in.Path, "0", v.Voice.Say(words.AskLevelOff), is == "0"))
	return El("ul", list)
}
