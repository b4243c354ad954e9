package view

import (
	"strings"
	"testing"

	"hillwright/physics/ask"
	"hillwright/wasm/dom"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
)

// find gives the first node whose attribute has a value.
func find(page *dom.Node, name, value string) *dom.Node {
	var found *dom.Node
	page.Walk(func(n *dom.Node) {
		if found == nil && attr(n, name) == value {
			found = n
		}
	})
	return found
}

func count(page *dom.Node, class string) int {
	n := 0
	page.Walk(func(k *dom.Node) {
		for _, c := range strings.Fields(attr(k, "class")) {
			if c == class {
				n++
			}
		}
	})
	return n
}

func says(t *testing.T, page *dom.Node, id string, want ...string) {
	t.Helper()
	part := find(page, "id", id)
	if part == nil {
		t.Fatalf("no %s", id)
	}
	for _, text := range want {
		if !strings.Contains(part.Words(), text) {
			t.Errorf("%s does not say %q: %s", id, text, part.Words())
		}
	}
}

// The staff goes through section and strip, and its reading tells of both.
func TestStaffGoesThroughTheStrip(t *testing.T) {
	step := state.Action{Name: state.StaffStep, Arg: "+"}
	page := Page(after("en", step))
	says(t, page, "staff-reading", "gear", "motor ", "charge ", "legs ")
	staff, plumb := find(page, "data-region", "staff"), find(page, "data-region", "plumb")
	if staff == nil || plumb == nil {
		t.Fatal("staff or plumb line is no region")
	}
	x := func(n *dom.Node) string {
		x, _, _ := strings.Cut(strings.TrimPrefix(attr(n, "transform"), "translate("), " ")
		return x
	}
	if x(staff) != x(plumb) || x(staff) == "" {
		t.Errorf("the staff stands at %q, the plumb line at %q", x(staff), x(plumb))
	}
	if attr(find(page, "data-region", "strip-picture"), "class") != "canvas bands-3" {
		t.Error("the strip does not say how many bands it has")
	}
	off := Page(after("en", state.Action{Name: state.SetTo, Arg: "bike.motor.kind=none"}, state.Action{Name: state.TypeSections, Text: "300 m at 2 %"}, step))
	says(t, off, "staff-reading", "legs ")
	if attr(find(off, "data-region", "strip-picture"), "class") != "canvas bands-1" {
		t.Error("a bike without motor has more than legs")
	}
}

// What is said of the way: a shape for the start, and nothing of a motor that
// rests.
func TestOnTheWay(t *testing.T) {
	page := Page(after("en"))
	says(t, page, "way", "From rest", "winding", "into heat", "charge is left", "The rider pedals")
	if count(page, "starts") != 1 || count(page, "way-mark") != 4 {
		t.Errorf("%d starts, %d marks", count(page, "starts"), count(page, "way-mark"))
	}
	tour := Page(after("en", state.Action{Name: state.RoundTrip, Arg: "2"}))
	says(t, tour, "way", "There and back, 2 times")
	says(t, tour, "blank-tour", "there and back, 2 times")
	steep := Page(after("en", state.Action{Name: state.TypeSections, Text: "300 m at 45 %"}))
	if count(steep, "stays") != 1 {
		t.Error("no shape for a start that fails")
	}
	off := Page(after("en", state.Action{Name: state.SetTo, Arg: "ride.level=0"}))
	if text := find(off, "id", "way").Words(); strings.Contains(text, "winding") {
		t.Errorf("of a motor that rests it says %q", text)
	}
}

func TestWayDown(t *testing.T) {
	page := Page(after("en"))
	says(t, page, "down", "Not above", "km/h", "it stops within", "in front")
	down := find(page, "id", "down")
	for _, want := range [][2]string{{state.StepUp, "ride.down_mps"}, {state.StepDown, "ride.down_mps"}, {state.SetTo, "day.ground=asphalt-wet"}, {state.SetTo, "day.ground=asphalt-dry"}} {
		if !acts(down, want[0], want[1]) {
			t.Errorf("the way down has no %v", want)
		}
	}
	if count(down, "most") != 1 || count(down, "bar-mark") != 2 {
		t.Errorf("%d large figures, %d bars", count(down, "most"), count(down, "bar-mark"))
	}
	wet := Page(after("en", state.Action{Name: state.SetTo, Arg: "day.ground=asphalt-wet"}))
	says(t, wet, "down", "Wet:")
	says(t, wet, "sentence", "wet asphalt")
	mud := find(Page(after("en", state.Action{Name: state.SetTo, Arg: "day.ground=mud"})), "id", "down")
	if acts(mud, state.SetTo, "day.ground=mud-dry") || !acts(mud, state.ShowPath, "day.ground") {
		t.Error("mud can be dried")
	}
	flat := find(Page(after("en", state.Action{Name: state.TypeSections, Text: "300 m at 0 %"})), "id", "down")
	if count(flat, "most") != 0 || acts(flat, state.StepUp, "ride.down_mps") {
		t.Errorf("a flat road has a way down: %s", flat.Words())
	}
}

// One touch on the sentence, one on a choice: a round trip. The charge is a
// word of the sentence once it is not full.
func TestRoundTripAndChargeInTheSentence(t *testing.T) {
	open := state.Action{Name: state.Open, Arg: state.PlaceTour}
	page := Page(after("en", open))
	for _, times := range []string{"0", "1", "2", "3", "5", "10"} {
		if !acts(page, state.RoundTrip, times) {
			t.Errorf("no round trip of %s", times)
		}
	}
	for _, path := range []string{"ride.trips", "ride.pause_s"} {
		if !acts(page, state.StepUp, path) || !acts(page, state.Type, path) {
			t.Errorf("no stepper for %s", path)
		}
	}
	says(t, page, "blank-tour", "one way")
	if find(page, "id", "blank-ride.charge") != nil {
		t.Error("a full charge stands in the sentence")
	}
	low := Page(after("de", state.Action{Name: state.SetTo, Arg: "ride.charge=0.4"}, state.Action{Name: state.RoundTrip, Arg: "3"}, state.Action{Name: state.SetTo, Arg: "ride.pause_s=600"}))
	says(t, low, "blank-ride.charge", "40")
	says(t, low, "blank-ride.pause_s", "10")
	says(t, low, "blank-tour", "3-mal")
}

// A bike's inputs stand once each, the usual ones before the groups.
func TestBikeInputsInGroups(t *testing.T) {
	page := Page(after("en", state.Action{Name: state.Open, Arg: "bike"}, state.Action{Name: state.ShowAll, Arg: "bike"}))
	folded := map[string]int{}
	groups := 0
	page.Walk(func(n *dom.Node) {
		if attr(n, "class") == "group" {
			groups++
			inside := 0
			n.Walk(func(k *dom.Node) {
				if attr(k, "class") == "input-row" {
					folded[attr(k, "data-arg")]++
					inside++
				}
			})
			if inside < 3 {
				t.Errorf("group %d has %d inputs", groups, inside)
			}
		}
	})
	if groups != 5 {
		t.Errorf("%d groups", groups)
	}
	for _, in := range state.Inputs(keep.Bike) {
		want := 1
		if groupOf(in.Path) < 0 {
			want = 0
		}
		if folded[in.Path] != want {
			t.Errorf("%s stands %d times in groups, want %d", in.Path, folded[in.Path], want)
		}
	}
	for _, path := range usual {
		if _, ok := ask.InputAt(path); !ok {
			t.Errorf("%s is no input", path)
		}
	}
}

// What a class default stands in for shows its value, its band, its reason.
func TestClassDefaultsShow(t *testing.T) {
	s := after("en", state.Action{Name: state.Open, Arg: "bike"}, state.Action{Name: state.ShowAll, Arg: "bike"}, state.Action{Name: state.ShowPath, Arg: "bike.motor.mass_kg"})
	page := Page(s)
	row := find(page, "data-arg", "bike.motor.mass_kg")
	shown := s.Behind("bike.motor.mass_kg")
	if text := row.Words(); !strings.Contains(text, s.Voice.Value("bike.motor.mass_kg", shown.Value)) || !strings.Contains(text, "as usual in its class") || !strings.Contains(text, "assumed") {
		t.Errorf("the row says %q", text)
	}
	says(t, page, "place", "likely", s.Voice.Reason(shown.Reason))
}
