package state

import (
	"errors"
	"math"
	"slices"
	"strings"
	"testing"

	"hillwright/physics/ask"
	"hillwright/physics/click"
	"hillwright/physics/coast"
	"hillwright/physics/synth"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// coasting is what would be heard of a coast-down: click rates by formula, no
// sound.
func coasting(back bool) *click.Heard {
	d := synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19, Grade: 0.002}
	if back {
		d.Grade = -d.Grade
	}
	v := d.Coast(8.5)
	s := click.Stretch{Falls: true, SureOf: 1}
	for t := 0.25; t < 40; t += 0.25 {
		p := click.Point{AtS: t, RateHz: v(t) * 36 / 2.155, ErrorHz: 0.05}
		s.Curve = append(s.Curve, p)
		if len(s.Curve)%2 == 0 {
			s.Points = append(s.Points, p)
		}
	}
	return &click.Heard{LengthS: 40, Stretches: []click.Stretch{s}, Picture: click.Picture{StepS: 1, RatesHz: []float64{10, 20}, Levels: make([]uint8, 80)}}
}

func atBench(t *testing.T) *State {
	t.Helper()
	s := First(shop(), "en")
	s, _ = Reduce(s, Action{Name: GoTo, Arg: GoBench})
	for _, set := range []string{"coast.clicks_per_turn=36", "coast.circumference_m=2.155", "coast.mass_kg=105", "day.density_kgm3=1.19"} {
		s, _ = Reduce(s, Action{Name: SetTo, Arg: set})
	}
	return s
}

func asked(effects []Effect) []EffectKind {
	var out []EffectKind
	for _, e := range effects {
		out = append(out, e.Kind)
	}
	return out
}

func record(t *testing.T, s *State, h *click.Heard, now int64) *State {
	t.Helper()
	s, e := Reduce(s, Action{Name: SoundFor, Arg: ForRun})
	if !slices.Contains(asked(e), StartSound) || !slices.Contains(asked(e), Wake) || s.Bench.Sound.Stage != SoundRecording {
		t.Fatalf("recording: %v, %q", asked(e), s.Bench.Sound.Stage)
	}
	s, _ = Reduce(s, Action{Name: SoundLevel, X: 0.2, Y: 41})
	s, e = Reduce(s, Action{Name: SoundDone})
	if !slices.Contains(asked(e), StopSound) || !slices.Contains(asked(e), Sleep) {
		t.Fatalf("stopped: %v", asked(e))
	}
	s, e = Reduce(s, Action{Name: SoundReady, Arg: "recording.wav", Text: "recorded"})
	if !slices.Contains(asked(e), Listen) {
		t.Fatalf("at hand: %v", asked(e))
	}
	s, _ = Reduce(s, Action{Name: ListenPart, X: 0.5})
	s, e = Reduce(s, Action{Name: Listened, Heard: h, Now: now})
	if !slices.Contains(asked(e), StoreThing) {
		t.Fatalf("heard: %v is not kept", asked(e))
	}
	return s
}

// Two runs each way, recorded, give the drag; one tap puts it into the bike as
// measured; undo takes it out.
func TestCoastDownIntoTheBike(t *testing.T) {
	s := atBench(t)
	for i := range 4 {
		s = record(t, s, coasting(i%2 == 1), 1790000000+int64(i))
	}
	if runs := s.Runs(); len(runs) != 4 || runs[0].Back || !runs[1].Back || runs[2].Back || !runs[3].Back {
		t.Fatalf("%d runs, ways not in turn", len(runs))
	}
	r := s.Bench.Result
	if r == nil || math.Abs(r.Crr.Value/0.007-1) > 0.03 || math.Abs(r.CdAM2.Value/0.52-1) > 0.03 {
		t.Fatalf("%+v, %v", r, s.Bench.Refused)
	}
	if s.Bench.Then == nil || s.BikeHas() {
		t.Fatal("the hill's answer with the new drag is not shown before the tap")
	}
	was, _ := s.Question.Value("bike.crr")
	s, _ = Reduce(s, Action{Name: IntoBike})
	is, _ := s.Question.Value("bike.crr")
	if is == was || s.Question.SourceOf("bike.crr") != ask.Measured || s.Question.SourceOf("bike.cda_m2") != ask.Measured || !s.BikeHas() {
		t.Errorf("Crr %v, was %v, from %v", is, was, s.Question.SourceOf("bike.crr"))
	}
	if s.Rig.Bike.Crr != is {
		t.Error("the hill's answer does not follow")
	}
	s, _ = Reduce(s, Action{Name: Undo})
	if back, _ := s.Question.Value("bike.crr"); back != was || len(s.Runs()) != 4 {
		t.Errorf("after undo Crr is %v, was %v", back, was)
	}
}

// A number that is held leans on the bike as it was chosen, not on what was put
// into it: the same runs say the same after the tap, and are not offered again.
func TestHeldDoesNotCreep(t *testing.T) {
	s := record(t, atBench(t), coasting(false), 1790000000)
	first := s.Bench.Result
	if first == nil || !first.Crr.Held {
		t.Fatalf("one way on a road that looks level: %+v, %v", first, s.Bench.Refused)
	}
	s, _ = Reduce(s, Action{Name: IntoBike})
	if again := s.Bench.Result; again == nil || again.Crr != first.Crr || again.CdAM2 != first.CdAM2 || !s.BikeHas() {
		t.Errorf("%+v became %+v", first.Crr, again)
	}
}

// A person says which way, what counts, where it is cut; each changes the
// result, and is kept.
func TestRunsAreThePersons(t *testing.T) {
	s := atBench(t)
	for i := range 2 {
		s = record(t, s, coasting(i%2 == 1), 1790000000+int64(i))
	}
	// Two short ones; the first is left out, the second is blamed by its number.
	odd := s
	for i := range 2 {
		h := coasting(false)
		h.Stretches[0].Points = h.Stretches[0].Points[:6]
		odd = record(t, odd, h, 1790000010+int64(i))
	}
	odd, _ = Reduce(odd, Action{Name: RunUse, Arg: odd.Runs()[2].ID + "=no"})
	var e0 *coast.Error
	if !errors.As(odd.Bench.Refused, &e0) || e0.Kind != coast.TooShort || e0.Run != 3 {
		t.Errorf("blamed: %v", odd.Bench.Refused)
	}
	id := s.Runs()[1].ID
	grade := s.Bench.Result.Grade.Value
	s, e := Reduce(s, Action{Name: RunWay, Arg: id + "=out", Now: 5})
	if s.Bench.Result.Grade.Value == grade || !slices.Contains(asked(e), StoreThing) {
		t.Error("the way changes nothing")
	}
	s, _ = Reduce(s, Action{Name: RunWay, Arg: id + "=back"})
	s, _ = Reduce(s, Action{Name: RunUse, Arg: id + "=no"})
	if len(s.Bench.Result.Runs) != 1 || s.RunFit(id) != nil {
		t.Error("a run that is left out counts")
	}
	s, _ = Reduce(s, Action{Name: RunUse, Arg: id + "=yes"})
	first := s.Runs()[1].FromS
	s, _ = Reduce(s, Action{Name: CutLater, Arg: id + "=from"})
	s, _ = Reduce(s, Action{Name: CutEarlier, Arg: id + "=to"})
	if r := s.Runs()[1]; r.FromS != first+0.5 || r.ToS > 39.5 {
		t.Errorf("cut to %v to %v s", r.FromS, r.ToS)
	}
	s, _ = Reduce(s, Action{Name: CutHandle, Arg: id + "=to", X: 40})
	if r := s.Runs()[1]; r.ToS != r.FromS+leastRunS {
		t.Errorf("a handle beyond the other cuts to %v to %v s", r.FromS, r.ToS)
	}
	s, _ = Reduce(s, Action{Name: RunForget, Arg: id})
	if len(s.Runs()) != 1 || !s.Message.Undo {
		t.Error("the run is not forgotten")
	}
	s, _ = Reduce(s, Action{Name: Undo})
	if len(s.Runs()) != 2 {
		t.Error("the run does not come back")
	}
}

// What was measured comes back with the page.
func TestBenchComesBack(t *testing.T) {
	s := atBench(t)
	s = record(t, s, coasting(false), 1790000000)
	s, _ = Reduce(s, Action{Name: Restored, Data: keep.Encode(s.Own), Text: string(keep.EncodeSettings(s.settings()))})
	again, _ := Reduce(First(shop(), "en"), Action{Name: Restored, Data: keep.Encode(s.Own), Text: string(keep.EncodeSettings(s.settings()))})
	again, _ = Reduce(again, Action{Name: GoTo, Arg: GoBench})
	if len(again.Runs()) != 1 || again.Question.Coast.ClicksPerTurn != 36 || again.Bench.Result == nil {
		t.Errorf("%d runs, %v clicks, %v", len(again.Runs()), again.Question.Coast.ClicksPerTurn, again.Bench.Refused)
	}
	if v := again.ClickView(&again.Runs()[0]); v.Picture != nil || len(v.Line) == 0 {
		t.Error("the line does not come back")
	}
}

// A recording that gives nothing says why, and stays at hand.
func TestListeningFails(t *testing.T) {
	s := atBench(t)
	s, e := Reduce(s, Action{Name: SoundFrom, Arg: ForRun})
	if !slices.Contains(asked(e), PickSound) {
		t.Fatal("no file is asked for")
	}
	s, _ = Reduce(s, Action{Name: SoundReady, Arg: "talk.mp3", Text: "file"})
	s, _ = Reduce(s, Action{Name: ListenFailed, Err: &click.Error{Kind: click.NoClicks, Got: 12}})
	if s.Bench.Err == nil || s.Bench.Sound.Stage != SoundHeld {
		t.Fatalf("%v, %q", s.Bench.Err, s.Bench.Sound.Stage)
	}
	s, e = Reduce(s, Action{Name: SoundAgain})
	if !slices.Contains(asked(e), Listen) || s.Bench.Err != nil {
		t.Error("it is not listened to again")
	}
	s, e = Reduce(s, Action{Name: SoundLeave})
	if !slices.Contains(asked(e), StopListening) || s.Bench.Sound.Stage != SoundHeld {
		t.Error("it is not stopped")
	}
	// What comes late is of no use.
	s, _ = Reduce(s, Action{Name: Listened, Heard: coasting(false)})
	if len(s.Runs()) != 0 {
		t.Error("a stopped listening gives a run")
	}
	s, _ = Reduce(s, Action{Name: SoundAgain})
	still := coasting(false)
	still.Stretches[0].Falls = false
	s, _ = Reduce(s, Action{Name: Listened, Heard: still})
	if s.Bench.Sound.Said != words.SoundNoFall || len(s.Runs()) != 0 {
		t.Errorf("what does not fall: %v, %d runs", s.Bench.Sound.Said, len(s.Runs()))
	}
}

func TestMicrophoneFails(t *testing.T) {
	for _, how := range []string{"refused", "absent"} {
		s := atBench(t)
		s, _ = Reduce(s, Action{Name: SoundFor, Arg: ForRun})
		s, e := Reduce(s, Action{Name: SoundFailed, Arg: how})
		if s.Bench.Sound.Stage != SoundNone || s.Bench.Sound.Fails != how || !slices.Contains(asked(e), Sleep) {
			t.Errorf("%s: %+v", how, s.Bench.Sound)
		}
	}
	// Stopped before the browser gave it, it is over.
	s0 := atBench(t)
	s0, _ = Reduce(s0, Action{Name: SoundFor, Arg: ForRun})
	if s0, _ = Reduce(s0, Action{Name: SoundDone}); s0.Bench.Sound.Stage != SoundNone {
		t.Errorf("a recording that never began is %q", s0.Bench.Sound.Stage)
	}
	// Leaving the bench ends a recording; it is listened to all the same.
	s := atBench(t)
	s, _ = Reduce(s, Action{Name: SoundFor, Arg: ForRun})
	_, e := Reduce(s, Action{Name: GoTo, Arg: GoSentence})
	if !slices.Contains(asked(e), StopSound) {
		t.Error("the microphone stays on")
	}
}

// Clicks of a turn from a wheel that is rolled. The number comes from Count,
// which is tried with sound in physics/click.
func TestCountFails(t *testing.T) {
	s := atBench(t)
	s, _ = Reduce(s, Action{Name: SoundFrom, Arg: ForCount})
	s, _ = Reduce(s, Action{Name: SoundReady, Arg: "rolled.wav", Text: "file"})
	s, _ = Reduce(s, Action{Name: Listened, Heard: coasting(false)})
	var e *click.Error
	if !errors.As(s.Bench.Err, &e) || e.Kind != click.NoSingle {
		t.Errorf("%v", s.Bench.Err)
	}
}

// Without sound: taps at marks, and as a display falls.
func TestLaps(t *testing.T) {
	v := synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19}.Coast(7)
	s := atBench(t)
	s, e := Reduce(s, Action{Name: LapsBegin, Arg: LapDisplay})
	if !slices.Contains(asked(e), Wake) {
		t.Error("the screen may sleep")
	}
	s, _ = Reduce(s, Action{Name: LapsEnd})
	if s.Bench.Err == nil {
		t.Error("a run without taps")
	}
	for tap, t0 := 0, 0.0; tap < 14; t0 += 0.01 {
		if v(t0) <= s.LapSpeed(tap) {
			s, _ = Reduce(s, Action{Name: Lap, ClockS: 100 + t0})
			tap++
		}
	}
	s, _ = Reduce(s, Action{Name: Lap, ClockS: 3}) // a clock that goes back
	s, _ = Reduce(s, Action{Name: LapBack})
	s, _ = Reduce(s, Action{Name: LapsEnd, Now: 1790000000})
	if runs := s.Runs(); len(runs) != 1 || runs[0].Kind != keep.SpeedRun || len(runs[0].AtS) != 13 || runs[0].AtS[0] != 0 {
		t.Fatalf("%+v", runs)
	}
	s, _ = Reduce(s, Action{Name: LapsBegin, Arg: LapMarks})
	x, next := 0.0, 0.0
	for t0 := 0.0; t0 < 35; t0 += 0.01 {
		if x >= next {
			s, _ = Reduce(s, Action{Name: Lap, ClockS: 200 + t0})
			next += s.Dial(DialMarks)
		}
		x += 0.01 * v(t0)
	}
	s, _ = Reduce(s, Action{Name: LapsEnd, Now: 1790000001})
	if runs := s.Runs(); len(runs) != 2 || runs[1].Kind != keep.MarkRun || s.Bench.Result == nil {
		t.Fatalf("%d runs, %v", len(runs), s.Bench.Refused)
	}
	if _, _, _, ok := s.RunEnds(&s.Runs()[1]); !ok {
		t.Error("a run of marks has no speeds")
	}
}

// A wheel on the stand.
func TestStand(t *testing.T) {
	s := atBench(t)
	s, _ = Reduce(s, Action{Name: BenchJob, Arg: JobStand})
	s, _ = Reduce(s, Action{Name: SoundFrom, Arg: ForSpin})
	s, _ = Reduce(s, Action{Name: SoundReady, Arg: "wheel.mp3", Text: "file"})
	s, _ = Reduce(s, Action{Name: Listened, Heard: coasting(false)})
	if s.Bench.Spun == nil || len(s.Runs()) != 0 {
		t.Errorf("%v, %d runs", s.Bench.SpunErr, len(s.Runs()))
	}
	s, _ = Reduce(s, Action{Name: SetTo, Arg: "coast.clicks_per_turn=unknown"})
	if s.Bench.Spun != nil || !s.SpinHeard() {
		t.Error("a wheel is judged without its clicks per turn")
	}
}

// No order of actions breaks the bench.
func TestBenchActionsInAnyOrder(t *testing.T) {
	all := []Action{
		{Name: GoTo, Arg: GoBench}, {Name: BenchJob, Arg: JobStand}, {Name: BenchJob, Arg: JobCoast}, {Name: SoundFor, Arg: ForRun}, {Name: SoundFor, Arg: ForCount},
		{Name: SoundFrom, Arg: ForSpin}, {Name: SoundDone}, {Name: SoundKeep}, {Name: SoundAgain}, {Name: SoundLeave}, {Name: LapsBegin, Arg: LapMarks},
		{Name: Lap, ClockS: 1}, {Name: LapBack}, {Name: LapsEnd}, {Name: LapsBegin}, {Name: RunWay, Arg: "x=back"}, {Name: RunUse, Arg: "x=no"}, {Name: RunForget, Arg: "x"},
		{Name: CutHandle, Arg: "x=from", X: 10}, {Name: CutLater, Arg: "x=to"}, {Name: IntoBike}, {Name: GradeFromSide}, {Name: SoundLevel, X: 0.1, Y: 2},
		{Name: SoundReady, Arg: "a.wav"}, {Name: SoundFailed, Arg: "lost"}, {Name: ListenPart, X: 0.1}, {Name: Listened, Heard: coasting(true), Now: 3},
		{Name: ListenFailed, Err: &coast.Error{}}, {Name: GoTo, Arg: GoSentence},
	}
	s := First(shop(), "en")
	seed := uint64(1)
	for range 3000 {
		seed = seed*6364136223846793005 + 1442695040888963407
		s, _ = Reduce(s, all[seed>>33%uint64(len(all))])
		if runs := s.Runs(); len(runs) > 12 {
			s, _ = Reduce(s, Action{Name: RunForget, Arg: runs[0].ID})
		}
	}
	ids := map[string]bool{}
	for _, r := range s.Runs() {
		if ids[r.ID] || strings.TrimSpace(r.ID) == "" {
			t.Errorf("two runs have the id %q", r.ID)
		}
		ids[r.ID] = true
	}
}
