package view

import (
	"strings"
	"testing"

	"hillwright/physics/click"
	"hillwright/physics/coast"
	"hillwright/physics/sound"
	"hillwright/physics/synth"
	"hillwright/wasm/dom"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// rolling is what would be heard of a coast-down, or of a wheel on the stand:
// click rates by formula.
func rolling(back bool) *click.Heard {
	d := synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19, Grade: 0.002}
	if back {
		d.Grade = -d.Grade
	}
	v := d.Coast(8.5)
	s := click.Stretch{Falls: true, SureOf: 1}
	for t := 0.25; t < 40; t += 0.5 {
		s.Points = append(s.Points, click.Point{AtS: t, RateHz: v(t) * 36 / 2.155, ErrorHz: 0.05})
	}
	s.Curve = s.Points
	return &click.Heard{LengthS: 40, Stretches: []click.Stretch{s}, Picture: click.Picture{StepS: 1, RatesHz: []float64{50, 60, 72}, Levels: make([]uint8, 120)}}
}

func heardAs(purpose string, back bool) []state.Action {
	return []state.Action{
		{Name: state.SoundFrom, Arg: purpose}, {Name: state.SoundReady, Arg: "a.mp3", Text: "recorded"}, {Name: state.Listened, Heard: rolling(back)},
	}
}

// Every state of the bench, in both languages: the words that it must have, ids
// once, nothing said in braces.
func TestBenchStates(t *testing.T) {
	clicks := state.Action{Name: state.SetTo, Arg: "coast.clicks_per_turn=36"}
	list := func(parts ...[]state.Action) (out []state.Action) {
		for _, p := range parts {
			out = append(out, p...)
		}
		return out
	}
	known := []state.Action{clicks}
	stand := []state.Action{{Name: state.BenchJob, Arg: state.JobStand}}
	failed := func(err error) []state.Action {
		return []state.Action{{Name: state.SoundFrom, Arg: state.ForRun}, {Name: state.SoundReady, Arg: "a.mp3", Text: "file"}, {Name: state.ListenFailed, Err: err}}
	}
	for _, test := range []struct {
		name    string
		actions []state.Action
		says    []words.Key
	}{
		{"nothing yet", nil, []words.Key{words.HeadBench, words.BenchClicksMissing, words.BenchCount, words.SoundRecord, words.SoundOpen, words.SoundMarks, words.SoundDisplay, words.RunsNone, words.CautionCoast, words.CautionMotorOff, words.SoundStart}},
		{"recording", []state.Action{{Name: state.SoundFor, Arg: state.ForRun}, {Name: state.SoundLevel, X: 0.001, Y: 3, Text: "gain"}}, []words.Key{words.SoundHow, words.SoundQuiet, words.SoundGain, words.SoundStop}},
		{"loud", []state.Action{{Name: state.SoundFor, Arg: state.ForRun}, {Name: state.SoundLevel, X: 0.99, Y: 3}}, []words.Key{words.SoundLoud}},
		{"refused", []state.Action{{Name: state.SoundFor, Arg: state.ForRun}, {Name: state.SoundFailed, Arg: "refused"}}, []words.Key{words.SoundRefused, words.SoundOpen}},
		{"absent", []state.Action{{Name: state.SoundFor, Arg: state.ForRun}, {Name: state.SoundFailed, Arg: "absent"}}, []words.Key{words.SoundAbsent}},
		{"lost", []state.Action{{Name: state.SoundFor, Arg: state.ForRun}, {Name: state.SoundFailed, Arg: "full"}, {Name: state.SoundReady, Arg: "a.wav"}, {Name: state.ListenFailed, Err: &click.Error{}}}, []words.Key{words.SoundFull}},
		{"listening", []state.Action{{Name: state.SoundFrom, Arg: state.ForRun}, {Name: state.SoundReady, Arg: "a.mp3"}, {Name: state.ListenPart, X: 0.4}}, []words.Key{words.SoundListenStop}},
		{"speech", failed(&click.Error{Kind: click.Silent}), []words.Key{words.ClickSilent, words.SoundAgain}},
		{"a picture", failed(&sound.Error{Kind: sound.NotSound, Looks: sound.LookPicture}), []words.Key{words.LookAPicture}},
		{"clicks unknown", heardAs(state.ForRun, false), []words.Key{words.RunNoClicks, words.BenchClicksMissing, words.SoundSave}},
		{"one way", list(known, heardAs(state.ForRun, false)), []words.Key{words.DragHeldCrr, words.DragOneWay, words.DragKey, words.RunOut, words.RunLeave, words.RunForget, words.ClickPictureNote}},
		{"both ways", list(known, heardAs(state.ForRun, false), heardAs(state.ForRun, true)), []words.Key{words.DragCrr, words.DragCdA, words.HeadIntoBike, words.IntoBikeNow, words.IntoBikeThen, words.IntoBikeButton}},
		{"in the bike", list(known, heardAs(state.ForRun, false), heardAs(state.ForRun, true), []state.Action{{Name: state.IntoBike}}), []words.Key{words.IntoBikeSame}},
		{"taps", []state.Action{{Name: state.LapsBegin, Arg: state.LapMarks}, {Name: state.Lap, ClockS: 1}}, []words.Key{words.LapUndo, words.LapDone}},
		{"the display", []state.Action{{Name: state.LapsBegin, Arg: state.LapDisplay}}, []words.Key{words.DialShown, words.DialFewer, words.LapDone}},
		{"the stand", stand, []words.Key{words.BenchStandIntro, words.CautionStand}},
		{"a wheel", list(known, stand, heardAs(state.ForSpin, false)), []words.Key{words.SpunTypical, words.SpunTorque, words.SpunNoRub}},
		{"a wheel of unknown clicks", list(stand, heardAs(state.ForSpin, false)), []words.Key{words.BenchClicksMissing}},
		{"a blank is open", []state.Action{{Name: state.ShowPath, Arg: "coast.grade"}}, []words.Key{words.HeadCoast, words.BlankLevel}},
	} {
		for _, lang := range []string{"en", "de"} {
			s := state.First(shop(), lang)
			for _, a := range append([]state.Action{{Name: state.GoTo, Arg: state.GoBench}}, test.actions...) {
				a.Now = 1800000000
				s, _ = state.Reduce(s, a)
			}
			checkState(t, test.name+", "+lang, s.Voice, Page(s), test.says)
		}
	}
}

// An odd run and one that fits badly are named.
func TestRunsThatFitBadly(t *testing.T) {
	v := &viewer{State: state.First(shop(), "en"), Voice: words.Voice{}}
	text := func(f *coast.RunFit) string { return dom.El("div", v.fitting(f)).Words() }
	if text(nil) != "" || text(&coast.RunFit{Misfit: 1}) != "" {
		t.Error("a run that fits is named")
	}
	if got := text(&coast.RunFit{Odd: true}); got != v.Voice.Say(words.RunOdd) {
		t.Errorf("%q", got)
	}
	if got := text(&coast.RunFit{Misfit: 5}); !strings.Contains(got, "5.0") {
		t.Errorf("%q", got)
	}
}

// Whatever way of failing there is, it is said in the reader's language.
func TestEveryRefusalIsSaid(t *testing.T) {
	english := words.Voice{}
	german := words.Voice{Lang: words.German, Comma: true}
	check := func(err error) {
		t.Helper()
		a, b := english.Problem(err), german.Problem(err)
		if a == "" || b == "" || a == b || strings.ContainsAny(a+b, "{}") || b == err.Error() {
			t.Errorf("%v: %q, %q", err, a, b)
		}
	}
	for k := coast.NoRun; k <= coast.TooNoisy; k++ {
		check(&coast.Error{Kind: k, Got: 1.5, Want: 3})
	}
	for k := click.OddRate; k <= click.NoSingle; k++ {
		check(&click.Error{Kind: k, Got: 1.5})
	}
	for k := sound.Empty; k <= sound.SlowMP3; k++ {
		check(&sound.Error{Kind: k, Got: 7})
	}
	for l := sound.LookNothing; l <= sound.LookZIP; l++ {
		check(&sound.Error{Kind: sound.NotSound, Looks: l})
	}
}
