package view

import (
	"strconv"

	"hillwright/physics/ask"
	. "hillwright/wasm/dom"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// tourWords are the blanks for how often, whether there and back, and the
// pauses where there are any.
func (v *viewer) tourWords() Part {
	word := El("button", With("type", "button"), Class("blank"), ID("blank-"+state.PlaceTour), Act(state.Open, state.PlaceTour),
		flag("aria-expanded", v.Place == state.PlaceTour), With("aria-controls", "place"), Text(v.Voice.Tour(&v.Question)))
	if ride := &v.Question.Ride; ride.PauseS > 0 && (ride.Back || ride.Trips > 1) {
		return v.fill(words.AskPauses, word, v.inputAs("ride.pause_s", v.Duration(ride.PauseS)))
	}
	return word
}

// often are the round trips of one touch.
var often = []int{2, 3, 5, 10}

// tour is the place where a round trip is chosen.
func (v *viewer) tour() Part {
	is, known := v.RoundTrips()
	list := Parts{Class("choices")}
	for times, key := range []words.Key{words.TourOneWay, words.TourBack} {
		chosen := known && times == is
		list = append(list, El("li", button("choice", state.RoundTrip, strconv.Itoa(times), flag("aria-pressed", chosen),
			tick(chosen), El("span", Class("choice-name"), Text(capital(v.Voice.Say(key)))))))
	}
	row := Parts{Class("one-of"), With("role", "group"), With("aria-label", v.Voice.Say(words.TourBack))}
	for _, times := range often {
		row = append(row, button("one", state.RoundTrip, strconv.Itoa(times), flag("aria-pressed", known && times == is),
			v.say(words.TourTimesBack, v.Voice.Number(float64(times), 0))))
	}
	return Parts{El("ul", list), El("div", row), v.dial("ride.trips"), v.dial("ride.pause_s")}
}

// dial is an input's name over its stepper.
func (v *viewer) dial(path string) *Node {
	in, _ := ask.InputAt(path)
	name := v.inputName(path)
	return El("div", Class("editor"), With("role", "group"), With("aria-label", name),
		El("p", Class("editor-name"), Text(capital(name))), v.stepper(in, name), v.problem(path))
}
