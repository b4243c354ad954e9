package view

import (
	"strconv"

	"hillwright/physics/ask"
	. "hillwright/wasm/dom"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// tourWord is the blank for how often, and whether there and back.
func (v *viewer) tourWord() *Node {
	return El("button", With("type", "button"), Class("blank"), ID("blank-"+state.PlaceTour), Act(state.Open, state.PlaceTour),
		flag("aria-expanded", v.Place == state.PlaceTour), With("aria-controls", "place"), Text(v.Voice.Tour(&v.Question)))
}

// often are the round trips of one touch; 0 is one way.
var often = []int{0, 1, 2, 3, 5, 10}

// tour is the place where a round trip is chosen.
func (v *viewer) tour() Part {
	is, known := v.RoundTrips()
	list := Parts{Class("choices two-up")}
	for _, times := range often {
		name := v.Voice.Say(words.TourOneWay)
		switch {
		case times == 1:
			name = v.Voice.Say(words.TourBack)
		case times > 1:
			name = v.Voice.Say(words.TourTimesShort, v.Voice.Number(float64(times), 0))
		}
		chosen := known && times == is
		list = append(list, El("li", button("choice", state.RoundTrip, strconv.Itoa(times), flag("aria-pressed", chosen),
			tick(chosen), El("span", Class("choice-name"), Text(capital(name))))))
	}
	return Parts{El("ul", list), v.dial("ride.trips"), v.dial("ride.pause_s")}
}

// dial is an input's name over its stepper.
func (v *viewer) dial(path string) *Node {
	in, _ := ask.InputAt(path)
	name := v.inputName(path)
	return El("div", Class("editor"), With("role", "group"), With("aria-label", name),
		El("p", Class("editor-name"), Text(capital(name))), v.stepper(in, name), v.problem(path))
}
