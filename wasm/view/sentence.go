package view

import (
	"math"

	"hillwright/physics/ask"
	. "hillwright/wasm/dom"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// sentence is what is asked: a sentence whose bold words can be changed.
func (v *viewer) sentence() *Node {
	first := true
	var who Parts
	rider := v.fill(words.AskRider, v.thing(keep.Rider, &first), v.input("rider.mass_kg"), v.input("rider.power_w"))
	who = append(who, v.fill(words.AskClimb, rider, v.load(), v.thing(keep.Bike, nil), v.thing(state.Hill, nil), v.day()))
	return region("section", "sentence", With("aria-labelledby", "sentence-title"),
		El("h2", ID("sentence-title"), Class("unseen"), v.say(words.HeadInputs)),
		El("p", Class("sentence"), who, Text(" "), v.ride()),
		El("p", Class("hint"), v.say(words.AskTouch)),
	)
}

// fill puts parts into the blanks of a text.
func (v *viewer) fill(k words.Key, blanks ...Part) Parts {
	var out Parts
	for _, piece := range v.Pieces(k) {
		switch {
		case piece.Blank < 0:
			out = append(out, Text(piece.Text))
		case piece.Blank < len(blanks):
			out = append(out, blanks[piece.Blank])
		}
	}
	return out
}

// thing is the blank for what is chosen of a kind. At the first of a sentence
// it begins with a large letter.
func (v *viewer) thing(kind keep.Kind, first *bool) *Node {
	name := v.NameOf(kind)
	if name == "" {
		name = v.Voice.Say(headOf(kind))
	}
	if first != nil && *first {
		name, *first = capital(name), false
	}
	open := v.Place == string(kind) && v.Path == ""
	return El("button", With("type", "button"), Class("blank"), ID("blank-"+string(kind)), Act(state.Open, string(kind)),
		flag("aria-expanded", open), With("aria-controls", "place"), Text(name))
}

// input is the blank for an input's value.
func (v *viewer) input(path string) *Node { return v.inputAs(path, v.valueOf(path)) }

func (v *viewer) inputAs(path, text string) *Node {
	return El("button", With("type", "button"), Class("blank"), ID("blank-"+path), Act(state.ShowPath, path),
		flag("aria-expanded", v.Path == path && !v.All), With("aria-controls", "place"), Text(text))
}

func (v *viewer) load() Part {
	if kg, _ := v.Question.Value("load.mass_kg"); kg == 0 && !v.Changed("load.mass_kg") {
		return v.thing(keep.Load, nil)
	}
	return v.fill(words.AskLoad, v.thing(keep.Load, nil), v.input("load.mass_kg"))
}

func (v *viewer) day() Part {
	return v.fill(words.AskDay, v.thing(keep.Day, nil), v.input("day.temperature_c"), v.input("day.ground"))
}

// ride is the end of the sentence: what else is asked of the ride opens with
// the assist level; then how often, and the charge where it is not full.
func (v *viewer) ride() Part {
	open := v.Place == string(state.Ride) && (v.Path == "" || v.All)
	out := Parts{El("button", With("type", "button"), Class("blank"), ID("blank-"+string(state.Ride)), Act(state.Open, string(state.Ride)),
		flag("aria-expanded", open), With("aria-controls", "place"), Text(capital(v.level()))), Text(", "), v.tourWords()}
	const charge = "ride.charge"
	if v.Question.Ride.Charge < 1 || v.Path == charge && !v.All {
		out = append(out, Text(", "), v.inputAs(charge, v.Voice.Say(words.AskCharge, v.valueOf(charge))))
	}
	return append(out, Text("."))
}

func (v *viewer) level() string {
	text, _ := v.Question.Get("ride.level")
	switch text {
	case "highest":
		return v.Voice.Say(words.AskLevelHighest)
	case "0":
		return v.Voice.Say(words.AskLevelOff)
	}
	return v.Voice.Say(words.AskLevel, text)
}

// valueOf writes an input's value with its unit, or the word for what stands
// in its place.
func (v *viewer) valueOf(path string) string {
	value, instead := v.valueAndWord(path)
	if instead != "" {
		return value + " (" + instead + ")"
	}
	return value
}

// valueAndWord writes an input's value with its unit; where it is not given,
// what is taken instead, and the word for that.
func (v *viewer) valueAndWord(path string) (value, instead string) {
	in, _ := ask.InputAt(path)
	text, _ := v.Question.Get(path)
	if in.Form != ask.Number {
		if path == "ride.level" {
			return v.level(), ""
		}
		return v.Choice(path, text), ""
	}
	if number, ok := v.Question.Value(path); ok {
		return v.Value(path, number), ""
	}
	word := v.Choice(path, in.Blank)
	if shown := v.Behind(path); !math.IsNaN(shown.Value) {
		return v.Value(path, shown.Value), word
	}
	return word, ""
}

// headOf is the heading of a kind.
func headOf(kind keep.Kind) words.Key {
	switch kind {
	case keep.Rider:
		return words.HeadRider
	case keep.Load:
		return words.HeadLoad
	case keep.Bike:
		return words.HeadBike
	case keep.Day:
		return words.HeadDay
	case state.Hill:
		return words.HeadHill
	case state.Coast:
		return words.HeadCoast
	}
	return words.HeadRide
}
