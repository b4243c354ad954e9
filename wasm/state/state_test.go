package state

import (
	"math"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

func shop() *keep.Shop {
	names := func(s string) map[string]string { return map[string]string{"": s} }
	return &keep.Shop{
		Name: "Shop", LawID: "eu-25", Units: "metric", Languages: []string{"en", "de"},
		Things: []keep.Thing{
			{Kind: keep.Rider, ID: "steady", Names: names("a steady rider"), Values: map[string]string{"mass_kg": "80", "power_w": "110"}},
			{Kind: keep.Rider, ID: "strong", Names: names("a strong rider"), Values: map[string]string{"mass_kg": "74", "power_w": "200"}},
			{Kind: keep.Bike, ID: "trekking", Names: names("the trekking bike"), Values: map[string]string{"mass_kg": "25"}, Sources: map[string]string{"mass_kg": "measured"}},
			{Kind: keep.Bike, ID: "weak", Names: names("the weak bike"), Values: map[string]string{"motor.torque_nm": "20", "crr": "0.012"}},
			{Kind: keep.Load, ID: "bag", Names: names("a bag"), Values: map[string]string{"mass_kg": "9"}},
			{Kind: keep.Day, ID: "mild", Names: names("mild"), Values: map[string]string{"temperature_c": "15"}},
		},
		Hills: []keep.Hill{
			{ID: "school", Names: names("the school hill"), EdgeM: []float64{0, 400, 460}, HeightM: []float64{0, 28, 38}},
			{ID: "flat", Names: names("the flat"), EdgeM: []float64{0, 1000}, HeightM: []float64{0, 0}},
		},
	}
}

// after gives the state after actions, and all that the device was asked.
func after(t testing.TB, actions ...Action) (*State, []Effect) {
	t.Helper()
	s, all := First(shop(), "en"), []Effect(nil)
	for _, a := range actions {
		if a.Now == 0 {
			a.Now = 1800000000
		}
		var effects []Effect
		s, effects = Reduce(s, a)
		all = append(all, effects...)
	}
	return s, all
}

func TestFirstIsAnswered(t *testing.T) {
	s := First(shop(), "de")
	if s.Answer == nil || s.Trouble != nil || s.NameOf(Hill) != "the school hill" || s.Voice.Lang != words.German || !s.Voice.Comma {
		t.Errorf("answer %v, trouble %v, hill %q, voice %+v", s.Answer, s.Trouble, s.NameOf(Hill), s.Voice)
	}
	empty := First(&keep.Shop{Name: "Bare"}, "fr")
	if empty.Answer == nil || empty.Chosen[Hill] != TypedHill {
		t.Errorf("a shop without things: answer %v, hill %q", empty.Answer, empty.Chosen[Hill])
	}
}

func TestActions(t *testing.T) {
	const mass = "rider.mass_kg"
	big := strings.Repeat("x", 300)
	tests := []struct {
		name    string
		actions []Action
		check   func(s *State) bool
	}{
		{"step up", []Action{{Name: StepUp, Arg: mass}}, func(s *State) bool { return s.Question.Rider.MassKg == 81 }},
		{"step to the round value", []Action{{Name: Type, Arg: mass, Text: "80.4"}, {Name: StepDown, Arg: mass}}, func(s *State) bool { return s.Question.Rider.MassKg == 80 }},
		{"step stops at the range", []Action{{Name: Type, Arg: mass, Text: "180"}, {Name: StepUp, Arg: mass}}, func(s *State) bool { return s.Question.Rider.MassKg == 180 && s.Typing.Err == nil }},
		{"step in pounds", []Action{{Name: SetUnits, Arg: "imperial"}, {Name: StepUp, Arg: mass}}, func(s *State) bool { return math.Abs(s.Question.Rider.MassKg-178*0.45359237) < 1e-9 }},
		{"step what is not given", []Action{{Name: StepUp, Arg: "day.altitude_m"}}, func(s *State) bool { return s.Question.Day.AltitudeM > 0 }},
		{"type in German", []Action{{Name: SetLanguage, Arg: "de"}, {Name: Type, Arg: mass, Text: "82,5"}}, func(s *State) bool { return s.Question.Rider.MassKg == 82.5 }},
		{"typed nonsense keeps text and answer", []Action{{Name: Type, Arg: mass, Text: "8o"}}, func(s *State) bool {
			return s.Typing.Err != nil && s.Typing.Text == "8o" && s.Question.Rider.MassKg == 80 && s.Answer != nil
		}},
		{"typed beyond the range", []Action{{Name: Type, Arg: mass, Text: "9000"}}, func(s *State) bool { return s.Typing.Err != nil && s.Question.Rider.MassKg == 80 }},
		{"leaving a right field forgets its text", []Action{{Name: Type, Arg: mass, Text: "82"}, {Name: Typed, Arg: mass}}, func(s *State) bool { return s.Typing == Typing{} }},
		{"leaving a wrong field keeps its text", []Action{{Name: Type, Arg: mass, Text: "x"}, {Name: Typed, Arg: mass}}, func(s *State) bool { return s.Typing.Text == "x" }},
		{"empty means not given", []Action{{Name: Type, Arg: "day.altitude_m", Text: "900"}, {Name: Type, Arg: "day.altitude_m", Text: ""}}, func(s *State) bool { return math.IsNaN(s.Question.Day.AltitudeM) }},
		{"a list", []Action{{Name: Type, Arg: "bike.sprockets", Text: "11 34 51"}}, func(s *State) bool { return len(s.Rig.Gears) == 3 }},
		{"a choice", []Action{{Name: SetTo, Arg: "bike.motor.kind=none"}}, func(s *State) bool { return s.Rig.Bike.Motor.Kind == 0 }},
		{"a level the motor lacks", []Action{{Name: SetTo, Arg: "ride.level=9"}}, func(s *State) bool { return s.Trouble != nil && s.Answer != nil }},
		{"and back", []Action{{Name: SetTo, Arg: "ride.level=9"}, {Name: SetTo, Arg: "ride.level=1"}}, func(s *State) bool { return s.Trouble == nil && s.Rig.Level == 1 }},
		{"a measured value that is changed is assumed", []Action{{Name: StepUp, Arg: "bike.mass_kg"}}, func(s *State) bool { return s.Question.SourceOf("bike.mass_kg") == ask.Assumed }},
		{"reset", []Action{{Name: StepUp, Arg: "bike.mass_kg"}, {Name: Reset, Arg: "bike.mass_kg"}}, func(s *State) bool {
			return !s.AnyChanged(keep.Bike) && s.Question.SourceOf("bike.mass_kg") == ask.Measured
		}},
		{"source", []Action{{Name: SourceTo, Arg: mass + "=measured"}}, func(s *State) bool { return s.Question.SourceOf(mass) == ask.Measured && s.Changed(mass) }},
		{"choosing drops what the other bike set", []Action{{Name: Choose, Arg: "bike:weak"}, {Name: Choose, Arg: "bike:trekking"}}, func(s *State) bool { return s.Question.Bike.Crr == 0.008 && s.Question.Bike.Motor.TorqueNm == 65 }},
		{"choosing says that changes go", []Action{{Name: StepUp, Arg: mass}, {Name: Choose, Arg: "rider:strong"}}, func(s *State) bool { return s.Message.Undo && s.Question.Rider.MassKg == 74 }},
		{"and undo brings them back", []Action{{Name: StepUp, Arg: mass}, {Name: Choose, Arg: "rider:strong"}, {Name: Undo}}, func(s *State) bool { return s.Question.Rider.MassKg == 81 && s.Chosen[keep.Rider] == "steady" }},
		{"choosing what is not there", []Action{{Name: Choose, Arg: "bike:gone"}, {Name: Choose, Arg: "hill:gone"}}, func(s *State) bool { return s.Chosen[keep.Bike] == "trekking" && s.Chosen[Hill] == "school" }},
		{"sections", []Action{{Name: TypeSections, Text: "200 m at 10 %"}}, func(s *State) bool { return s.SectionsErr == nil && math.Abs(s.Answer.LengthM-200) < 1e-9 }},
		{"wrong sections keep the answer", []Action{{Name: TypeSections, Text: "200 m at"}}, func(s *State) bool { return s.SectionsErr != nil && math.Abs(s.Answer.LengthM-460) < 1e-9 }},
		{"a sketch", []Action{{Name: Sketch, X: 0, Y: 160}, {Name: Sketch, X: 160, Y: 80}, {Name: Sketch, X: 161, Y: 70}, {Name: Sketch, X: 320, Y: 80}}, func(s *State) bool {
			return s.Chosen[Hill] == SketchedHill && len(s.Drawn.Points) == 3 && math.Abs(s.Answer.AscentM-100) < 1e-6 && math.Abs(float64(s.Profile.Grade[0])-0.2) < 1e-9
		}},
		{"going back wipes", []Action{{Name: Sketch, X: 0, Y: 160}, {Name: Sketch, X: 200, Y: 80}, {Name: Sketch, X: 100, Y: 120}}, func(s *State) bool { return len(s.Drawn.Points) == 2 && s.Drawn.Points[1].X == 100 }},
		{"a longer sketch", []Action{{Name: Sketch, X: 0, Y: 160}, {Name: Sketch, X: 320, Y: 80}, {Name: SketchLong, Arg: "3000"}}, func(s *State) bool { return s.Answer.LengthM > 3000 && math.Abs(s.Answer.AscentM-300) < 1e-6 }},
		{"one point is no hill", []Action{{Name: Sketch, X: 9, Y: 9}, {Name: SketchLong, Arg: "300"}, {Name: SketchClear}}, func(s *State) bool { return s.Chosen[Hill] == "school" && s.Answer.LengthM == 460 }},
		{"the staff", []Action{{Name: MoveStaff, X: 100}}, func(s *State) bool { return s.StaffM > 0 && s.StaffM < 460 }},
		{"the staff by keys", []Action{{Name: StaffStep, Arg: "+"}, {Name: StaffStep, Arg: "+"}}, func(s *State) bool { return s.StaffM > s.Answer.Hardest.FromM }},
		{"the weight", []Action{{Name: WeightStep, Arg: "+"}}, func(s *State) bool { g, ok := s.TriedGrade(); return ok && g > s.Answer.Balance.Grade }},
		{"the weight goes back with a new answer", []Action{{Name: WeightStep, Arg: "+"}, {Name: StepUp, Arg: mass}}, func(s *State) bool { return math.IsNaN(s.WeightN) }},
		{"language", []Action{{Name: SetLanguage, Arg: "de"}}, func(s *State) bool { return s.Voice.Lang == words.German && s.Voice.Comma }},
		{"a language the shop lacks", []Action{{Name: DeviceLikes, Arg: "fr-FR", Text: ","}}, func(s *State) bool { return s.Voice.Lang == words.English && s.Voice.Comma }},
		{"mark", []Action{{Name: SetLanguage, Arg: "de"}, {Name: SetMark, Arg: "point"}}, func(s *State) bool { return !s.Voice.Comma }},
		{"theme", []Action{{Name: SetTheme, Arg: "dusk"}, {Name: SetTheme, Arg: "device"}}, func(s *State) bool { return s.Theme == "" }},
		{"open and close", []Action{{Name: Open, Arg: "bike"}, {Name: Open, Arg: "bike"}}, func(s *State) bool { return s.Place == "" }},
		{"one thing at a time", []Action{{Name: Open, Arg: "bike"}, {Name: ShowPath, Arg: mass}}, func(s *State) bool { return s.Place == "rider" && s.Path == mass }},
		{"refused storage is told once", []Action{{Name: Stored, Arg: "refused"}, {Name: Dismiss}, {Name: Stored, Arg: "refused"}}, func(s *State) bool { return s.Device.Storage == "refused" && !s.Message.Set }},
		{"a name too long", []Action{{Name: TypeName, Arg: "bike", Text: big}, {Name: Keep, Arg: "bike"}}, func(s *State) bool { return len(s.Own.Things[0].Names[""]) <= longestName }},
		{"no name, nothing kept", []Action{{Name: TypeName, Arg: "bike", Text: "  "}, {Name: Keep, Arg: "bike"}}, func(s *State) bool { return len(s.Own.Things) == 0 }},
		{"an unknown action", []Action{{Name: "dance"}}, func(s *State) bool { return s.Answer != nil }},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			if s, _ := after(t, test.actions...); !test.check(s) {
				t.Errorf("after %+v: %+v", test.actions, s)
			}
		})
	}
}

func TestKeepForgetUndo(t *testing.T) {
	s, effects := after(t, Action{Name: StepUp, Arg: "bike.mass_kg"}, Action{Name: TypeName, Arg: "bike", Text: "Otto"}, Action{Name: Keep, Arg: "bike"})
	if s.NameOf(keep.Bike) != "Otto" || s.AnyChanged(keep.Bike) || s.Question.Bike.MassKg != 25.5 {
		t.Fatalf("kept %+v", s.Own)
	}
	key := "bike:" + s.Chosen[keep.Bike]
	if !has(effects, StoreThing, key) {
		t.Errorf("not stored: %+v", effects)
	}
	again, _ := after(t, Action{Name: TypeName, Arg: "bike", Text: "Otto"}, Action{Name: Keep, Arg: "bike"}, Action{Name: TypeName, Arg: "bike", Text: "Otto"}, Action{Name: Keep, Arg: "bike"})
	if len(again.Own.Things) != 1 {
		t.Errorf("the same name twice makes %d things", len(again.Own.Things))
	}
	gone, effects := Reduce(s, Action{Name: Forget, Arg: key})
	if len(gone.Own.Things) != 0 || gone.Chosen[keep.Bike] != "trekking" || !has(effects, DropThing, key) {
		t.Errorf("forgotten: %+v, %+v", gone.Own, effects)
	}
	back, effects := Reduce(gone, Action{Name: Undo})
	if len(back.Own.Things) != 1 || back.NameOf(keep.Bike) != "Otto" || !has(effects, StoreThing, key) {
		t.Errorf("undone: %+v, %+v", back.Own, effects)
	}
}

func has(effects []Effect, kind EffectKind, key string) bool {
	for _, e := range effects {
		if e.Kind == kind && e.Key == key {
			return true
		}
	}
	return false
}

// What was exported comes back on another device; what is wrong changes nothing.
func TestExportImport(t *testing.T) {
	_, effects := after(t, Action{Name: TypeName, Arg: "bike", Text: "Otto"}, Action{Name: Keep, Arg: "bike"}, Action{Name: TypeName, Arg: "hill", Text: "Home"}, Action{Name: Keep, Arg: "hill"}, Action{Name: Export})
	file := effects[len(effects)-1]
	if file.Kind != Download {
		t.Fatalf("no download: %+v", effects)
	}
	s, stored := after(t, Action{Name: ImportFile, Arg: "x.json", Data: file.Data})
	if len(s.Own.Things) != 1 || len(s.Own.Hills) != 1 || len(stored) < 2 || len(s.Faults) != 0 {
		t.Errorf("imported %+v, stored %d, faults %v", s.Own, len(stored), s.Faults)
	}
	for _, bad := range []string{"", "{", `{"a":1}`, `{"format":"hillwright-things","version":9}`} {
		worse, stored := Reduce(s, Action{Name: ImportFile, Arg: "bad.json", Data: []byte(bad)})
		if len(worse.Faults) == 0 || len(worse.Own.Things) != 1 || len(stored) != 0 {
			t.Errorf("%q: faults %v, own %+v", bad, worse.Faults, worse.Own)
		}
	}
	dropped, _ := after(t, Action{Name: TrackFile, Arg: "x.json", Data: file.Data})
	if len(dropped.Own.Things) != 1 || dropped.Reading.Active {
		t.Error("a dropped file of things is not imported")
	}
}

func TestTrack(t *testing.T) {
	p, err := hill.FromHeights([]float64{0, 100}, []float64{300, 310}, nil)
	if err != nil {
		t.Fatal(err)
	}
	s, effects := after(t, Action{Name: TrackFile, Arg: "dir/Lane.gpx", Data: []byte("<gpx")})
	if !s.Reading.Active || !has(effects, ReadTrack, "dir/Lane.gpx") {
		t.Fatalf("not read: %+v", effects)
	}
	read, _ := Reduce(s, Action{Name: TrackRead, Arg: "dir/Lane.gpx", Hill: &p, Now: 5})
	if read.NameOf(Hill) != "Lane" || len(read.Own.Hills) != 1 || read.Answer.LengthM != 100 || read.Reading.Active {
		t.Errorf("read: %q %+v", read.NameOf(Hill), read.Reading)
	}
	stopped, _ := Reduce(s, Action{Name: StopTrack})
	if late, _ := Reduce(stopped, Action{Name: TrackRead, Arg: "x", Hill: &p}); len(late.Own.Hills) != 0 {
		t.Error("a reading that was stopped came in all the same")
	}
	failed, _ := Reduce(s, Action{Name: TrackFailed, Err: &hill.TrackError{Kind: hill.TrackEmpty}})
	if failed.Reading.Err == nil || failed.Place != string(Hill) || failed.Answer == nil {
		t.Errorf("failed: %+v", failed.Reading)
	}
}

// A reload finds the page as it was left.
func TestRestore(t *testing.T) {
	s, effects := after(t,
		Action{Name: TypeName, Arg: "bike", Text: "Otto"}, Action{Name: Keep, Arg: "bike"},
		Action{Name: StepUp, Arg: "rider.mass_kg"}, Action{Name: SourceTo, Arg: "rider.mass_kg=measured"},
		Action{Name: TypeSections, Text: "250 m at 9 %"}, Action{Name: SetUnits, Arg: "imperial"}, Action{Name: SetTheme, Arg: "dusk"}, Action{Name: SetLanguage, Arg: "de"})
	var things keep.Things
	settings := ""
	for _, e := range effects {
		switch e.Kind {
		case StoreThing:
			one, _ := keep.Decode(e.Data)
			things.Things = append(things.Things, one.Things...)
		case StoreSettings:
			settings = string(e.Data)
		}
	}
	got, _ := after(t, Action{Name: Restored, Data: keep.Encode(things), Text: settings})
	if got.NameOf(keep.Bike) != "Otto" || got.Question.Rider.MassKg != 81 || got.Question.SourceOf("rider.mass_kg") != ask.Measured ||
		got.Sections != "250 m at 9 %" || got.Voice != s.Voice || got.Theme != "dusk" || got.Answer.ClimbS != s.Answer.ClimbS {
		t.Errorf("restored %+v", got)
	}
	if odd, _ := after(t, Action{Name: Restored, Text: `{"chosen":{"bike":"gone"},"values":{"bike.mass_kg":"x","no.such":"1"},"sources":{"no.such":"sheet"}}`}); odd.Chosen[keep.Bike] != "trekking" || odd.Answer == nil {
		t.Errorf("settings of another shop: %+v", odd.Chosen)
	}
}

// Whatever a person does, in whatever order: no panic, the state before is
// untouched, and there is an answer.
func TestAnyOrder(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := First(shop(), "en")
		args := []string{"", "+", "-", "bike", "hill", "ride", "kept", "bike:weak", "hill:flat", "hill:typed", "rider:strong", "bike.mass_kg", "ride.level", "day.density_kgm3",
			"bike.mass_kg=measured", "bike.motor.kind=rear-hub", "ride.level=0", "ride.level=7", "day.altitude_m=hill", "en", "de", "imperial", "comma", "dusk"}
		texts := []string{"", "12", "1,5", "x", "300 m at 12 %", "Otto"}
		for range 30 {
			a := Action{
				Name: rapid.SampledFrom(ByHand()).Draw(t, "name"), Arg: rapid.SampledFrom(args).Draw(t, "arg"),
				Text: rapid.SampledFrom(texts).Draw(t, "text"), X: rapid.Float64Range(-50, 2000).Draw(t, "x"), Y: rapid.Float64Range(-50, 300).Draw(t, "y"), Now: 9,
			}
			before := *s
			settings := string(keep.EncodeSettings(s.settings()))
			next, _ := Reduce(s, a)
			if string(keep.EncodeSettings(s.settings())) != settings || s.Place != before.Place || len(s.Own.Things) != len(before.Own.Things) {
				t.Fatalf("%+v altered the state before it", a)
			}
			if next.Answer == nil {
				t.Fatalf("%+v: no answer", a)
			}
			s = next
		}
	})
}
