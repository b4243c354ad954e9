package view

import (
	"strings"
	"testing"

	"hillwright/physics/slope"
	"hillwright/wasm/dom"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// atFoot is the hillside after actions.
func atFoot(t testing.TB, lang string, actions ...state.Action) (*state.State, *dom.Node) {
	t.Helper()
	s := state.First(shop(), lang)
	for _, a := range append([]state.Action{{Name: state.GoTo, Arg: state.GoHillside}}, actions...) {
		a.Now = 1800000000
		s, _ = state.Reduce(s, a)
	}
	return s, Page(s)
}

func leans(deg float64) state.Action {
	a := state.Action{Name: state.Tilted}
	for i := range 100 {
		up, _ := slope.UpOfOrientation(deg, 0)
		a.Leans = append(a.Leans, state.Lean{TimeS: 1000 + float64(i)/20, Up: up, Step: slope.OrientationStep})
	}
	return a
}

var tapeRead = []state.Action{{Name: state.Measure, Arg: state.WayTape}, {Name: state.Read}}

// Every state of the hillside, in both languages: the words that it must have,
// one main way on, ids once, nothing said in braces.
func TestHillsideStates(t *testing.T) {
	measure := func(way string, more ...state.Action) []state.Action {
		return append([]state.Action{{Name: state.Measure, Arg: way}}, more...)
	}
	tests := []struct {
		name    string
		actions []state.Action
		says    []words.Key
	}{
		{"nothing yet", nil, []words.Key{words.NoGrade, words.WayTilt, words.WaySight, words.WayTape, words.WayWheel, words.WayRide, words.WayTrack, words.ReadingsNone}},
		{"waiting", measure(state.WayTilt), []words.Key{words.TiltHow, words.TiltWaiting}},
		{"refused", measure(state.WayTilt, state.Action{Name: state.Sensor, Arg: "refused"}), []words.Key{words.SensorRefused, words.WayTape, words.WayWheel, words.WayRide}},
		{"absent", measure(state.WaySight, state.Action{Name: state.Sensor, Arg: "absent"}), []words.Key{words.SensorAbsent, words.WayTape}},
		{"heard", measure(state.WayTilt, leans(5)), []words.Key{words.TiltTake}},
		{"half", measure(state.WayTilt, state.Action{Name: state.Average}, leans(5)), []words.Key{words.TiltTurn, words.TiltTurned, words.TiltOnce, words.TiltUnknown}},
		{"sighted", measure(state.WaySight, leans(5), state.Action{Name: state.Freeze}), []words.Key{words.SightUse, words.SightGoOn}},
		{"wheel", measure(state.WayWheel), []words.Key{words.DialTurns, words.DialStairs, words.ReadUse}},
		{"location refused", measure(state.WayRide, state.Action{Name: state.LocateFailed, Arg: "refused"}), []words.Key{words.RideRefused, words.WayTape}},
		{"piece of a hill", measure(state.WayTrack), []words.Key{words.DialFrom, words.DialTo, words.TrackHeights}},
		{"read", tapeRead, []words.Key{words.ReadOnce, words.WordGo, words.MeansGo, words.PitchSpeed, words.PitchHolds, words.PitchCharge, words.PitchGrip, words.PitchLift, words.MeasureAgain, words.TellButton, words.TellNone, words.ReadingsHill, words.HeadGroup}},
		{"a voice", append(tapeRead[:2:2], state.Action{Name: state.Voiced, Arg: "en-GB de-DE"}), []words.Key{words.TellVoice, words.TellTones}},
		{"refused storage", append(tapeRead[:2:2], state.Action{Name: state.Stored, Arg: "refused"}), []words.Key{words.StorageRefused}},
	}
	for _, test := range tests {
		for _, lang := range []string{"en", "de"} {
			s, page := atFoot(t, lang, test.actions...)
			checkState(t, test.name+", "+lang, s.Voice, page, test.says)
		}
	}
}

// checkState checks a page: the words that it must have, ids once, nothing said
// in braces.
func checkState(t *testing.T, name string, v words.Voice, page *dom.Node, says []words.Key) {
	t.Helper()
	said := strings.ToLower(page.Words())
	for _, k := range says {
		if want := strings.ToLower(v.Say(k)); !strings.Contains(said, want) {
			t.Errorf("%s: does not say %q", name, want)
		}
	}
	ids := map[string]bool{}
	page.Walk(func(n *dom.Node) {
		if id, ok := n.Attr("id"); ok && ids[id] {
			t.Errorf("%s: two elements of the id %s", name, id)
		} else if ok {
			ids[id] = true
		}
	})
	if strings.ContainsAny(said, "{}") {
		t.Errorf("%s: a blank is left open in %s", name, said)
	}
}

// What is told aloud is what is shown.
func TestHillsideTold(t *testing.T) {
	s, _ := atFoot(t, "en", append(tapeRead[:2:2], state.Action{Name: state.Voiced, Arg: "en-GB"})...)
	_, effects := state.Reduce(s, state.Action{Name: state.Tell})
	if len(effects) == 0 || effects[0].Kind != state.Speak {
		t.Fatalf("nothing is said: %+v", effects)
	}
	text, p := string(effects[0].Data), s.Side.Pitch
	for _, want := range []string{s.Voice.Grade(p.Read.Grade), s.Voice.Word(p.Word), s.Voice.Speed(p.Answer.WayDown.MostMps)} {
		if !strings.Contains(text, want) {
			t.Errorf("%q does not say %q", text, want)
		}
	}
	s, _ = state.Reduce(s, state.Action{Name: state.Pick, Arg: "say=tones"})
	if _, effects = state.Reduce(s, state.Action{Name: state.Tell}); effects[0].Kind != state.Tone || effects[0].Key != "go" {
		t.Errorf("tones: %+v", effects)
	}
}
