package state

import (
	"math"
	"strings"
	"testing"

	"hillwright/physics/hill"
	"hillwright/physics/slope"
	"hillwright/physics/unit"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// lying is what the sensor says of a phone on its back, its top raised by an
// angle [°], for so long [s] from a time on, with a small shake.
func lying(deg, fromS, longS float64) Action {
	a := Action{Name: Tilted}
	for i := 0.0; i < longS*20; i++ {
		up, _ := slope.UpOfOrientation(deg+0.03*math.Sin(i*1.7), 0)
		a.Leans = append(a.Leans, Lean{TimeS: fromS + i/20, Up: up, Step: slope.OrientationStep})
	}
	return a
}

// Two readings, turned half round: the offset cancels, is kept for the device,
// and serves the next single reading.
func TestTiltTurned(t *testing.T) {
	const grade, offset = 8.0, 1.5 // degrees
	s, effects := after(t,
		Action{Name: GoTo, Arg: GoHillside}, Action{Name: Measure, Arg: WayTilt},
		lying(grade+offset, 1000, 0.1), Action{Name: Average}, lying(grade+offset, 1001, 6))
	if !s.Side.Tilt.Half() || s.Side.Tilt.Taking || s.ReadHere() != 0 {
		t.Fatalf("after the first: %+v", s.Side.Tilt)
	}
	for _, want := range []EffectKind{StartTilt, Wake} {
		if !has(effects, want, "") {
			t.Errorf("the device was not asked for %d", want)
		}
	}
	// A reload in between loses nothing.
	again, _ := after(t, Action{Name: Restored, Text: string(keep.EncodeSettings(s.settings()))})
	if !again.Side.Open || !again.Side.Tilt.Half() || again.Side.Tilt.First.Mean != s.Side.Tilt.First.Mean {
		t.Errorf("a reload lost the first reading: %+v", again.Side.Tilt)
	}
	for _, a := range []Action{{Name: Average}, lying(-grade+offset, 1010, 6)} {
		s, effects = Reduce(s, a)
	}
	read, ok := s.Combined()
	if want := math.Tan(grade * math.Pi / 180); !ok || math.Abs(float64(read.Grade)-want) > 0.002 || read.Method != slope.ByTurnedTilt {
		t.Fatalf("read %+v, want %.4f", read, want)
	}
	if s.Side.Way != "" || !has(effects, StopTilt, "") || !has(effects, Sleep, "") {
		t.Errorf("measuring goes on: %q, %+v", s.Side.Way, effects)
	}
	if !has(effects, StoreThing, "reading:"+s.Own.Readings[0].ID) {
		t.Error("the reading was not stored at once")
	}
	for _, a := range []Action{{Name: Measure, Arg: WayTilt}, {Name: Average}, lying(grade+offset, 1100, 6), {Name: OneReading}} {
		s, _ = Reduce(s, a)
	}
	if n := len(s.Own.Readings); n != 2 || math.Abs(float64(s.Own.Readings[1].Grade-read.Grade)) > 0.002 || s.Own.Readings[1].Method != slope.ByTilt {
		t.Errorf("%d readings, the second %+v", n, s.Own.Readings[len(s.Own.Readings)-1])
	}
}

func TestSensorsRefused(t *testing.T) {
	for _, how := range []string{"refused", "absent"} {
		s, _ := after(t, Action{Name: Measure, Arg: WayTilt}, Action{Name: Sensor, Arg: how})
		if s.Side.Tilt.Sensor != how {
			t.Errorf("tilt: %+v", s.Side.Tilt)
		}
		s, _ = after(t, Action{Name: Measure, Arg: WayRide}, Action{Name: LocateFailed, Arg: how})
		if s.Side.Ride.Sensor != how {
			t.Errorf("location: %+v", s.Side.Ride)
		}
		if late, _ := after(t, Action{Name: Sensor, Arg: how}); late.Side.Tilt.Sensor != "" {
			t.Error("a report after the end counts")
		}
	}
}

func TestSight(t *testing.T) {
	s, _ := after(t, Action{Name: Measure, Arg: WaySight}, lying(10, 1000, 4), Action{Name: Freeze}, lying(30, 1005, 2))
	if got := s.Side.Tilt.Angle().Degrees(); math.Abs(got-10) > 0.2 {
		t.Errorf("frozen at 10°, shows %.2f°", got)
	}
	s, _ = Reduce(s, Action{Name: OneReading, Now: 1007})
	if read, ok := s.Combined(); !ok || read.Method != slope.BySight || read.Error < 0.005 {
		t.Errorf("read %+v", read)
	}
}

// tape reads a rise of so many steps of half a centimetre over a metre.
func tape(steps int) []Action {
	out := []Action{{Name: GoTo, Arg: GoHillside}, {Name: Measure, Arg: WayTape}, {Name: Pick, Arg: "tape=map"}}
	for range steps {
		out = append(out, Action{Name: DialUp, Arg: DialRise})
	}
	return append(out, Action{Name: Read, Now: 2000})
}

func TestTapeWheelAndTrack(t *testing.T) {
	s, _ := after(t, tape(4)...)
	if read, _ := s.Combined(); math.Abs(float64(read.Grade)-0.12) > 1e-9 || s.Side.Place != "place 1" {
		t.Errorf("12 cm over a metre: %+v at %q", read, s.Side.Place)
	}
	s, _ = after(t, Action{Name: Measure, Arg: WayWheel}, Action{Name: DialUp, Arg: DialStairs}, Action{Name: Read})
	if read, _ := s.Combined(); read.Method != slope.ByWheelStairs || math.Abs(float64(read.Grade)-0.085) > 0.02 {
		t.Errorf("11 steps over ten turns: %+v", read)
	}
	s, _ = after(t, Action{Name: Measure, Arg: WayTrack}, Action{Name: Pick, Arg: "track-heights=surveyed"})
	if from, to := s.Stretch(); from != 400 || to != 460 {
		t.Errorf("the handles are at %g and %g, not at the hardest stretch", from, to)
	}
	s, _ = Reduce(s, Action{Name: TrackHandle, Arg: DialFrom, X: 0})
	if from, _ := s.Stretch(); from != 0 {
		t.Errorf("dragged to the foot, the handle is at %g", from)
	}
	s, _ = Reduce(s, Action{Name: Read, Now: 3})
	if read, ok := s.Combined(); !ok || math.Abs(float64(read.Grade)-38.0/460) > 0.003 {
		t.Errorf("read %+v, err %v", read, s.Side.Err)
	}
}

func TestRideIsRecorded(t *testing.T) {
	actions := []Action{{Name: Measure, Arg: WayRide}}
	for i := range 40 {
		actions = append(actions, Action{Name: Located, Fix: slope.Fix{
			Point:     hill.Point{LatDeg: 44 + float64(i)*5/111111, LonDeg: 8, HeightM: 300 + float64(i)*0.5, TimeS: 1000 + float64(2*i)},
			AccuracyM: 5, HeightAccuracyM: 3,
		}})
	}
	half, _ := after(t, actions...)
	again, _ := after(t, Action{Name: Restored, Text: string(keep.EncodeSettings(half.settings()))}, Action{Name: Measure, Arg: WayRide})
	if len(again.Side.Ride.Fixes) != 40 || again.Side.Ride.Fixes[39] != half.Side.Ride.Fixes[39] {
		t.Errorf("a reload left %d of 40 fixes", len(again.Side.Ride.Fixes))
	}
	s, _ := after(t, append(actions, Action{Name: Read, Now: 1100})...)
	read, ok := s.Combined()
	if !ok || math.Abs(float64(read.Grade)-0.1) > 0.02 || read.Error < 0.002 || math.IsNaN(s.Own.Readings[0].At.LatDeg) {
		t.Errorf("read %+v at %+v, err %v", read, s.Own.Readings, s.Side.Err)
	}
}

// The word, and "measure again" where the error straddles what is held.
func TestPitchWords(t *testing.T) {
	s, _ := after(t, tape(0)...)
	p := s.Side.Pitch
	if p == nil || p.Word != words.Go || p.Answer.WayDown.StoppingM <= 0 {
		t.Fatalf("10 %%: %+v", p)
	}
	held := p.Answer.Balance.SteepestGrade
	at := func(g unit.Grade, err float64) words.Word {
		return pitchOf(s.Question, slope.Combined{Reading: slope.Reading{Grade: g, Error: err}}, 60).Word
	}
	if w := at(held+0.08, 0.002); w != words.Stop {
		t.Errorf("far beyond what it holds: %d", w)
	}
	if w := at(held, 0.05); w != words.Again {
		t.Errorf("an error on both sides of what it holds: %d", w)
	}
	longer, _ := Reduce(s, Action{Name: DialUp, Arg: DialLength})
	if longer.Side.Pitch.LengthM != 65 || longer.Side.Pitch.Answer.LengthM != 65 {
		t.Errorf("a longer pitch: %+v", longer.Side.Pitch)
	}
	wet, _ := Reduce(s, Action{Name: SetTo, Arg: "day.ground=asphalt-wet"})
	if wet.Side.Pitch.Answer.WayDown.MostMps >= p.Answer.WayDown.MostMps {
		t.Error("wet ground leaves the speed down as it was")
	}
	paced, _ := Reduce(s, Action{Name: DialUp, Arg: DialPaces})
	if got := paced.Dial(DialLength); math.Abs(got-81*0.75) > 1e-9 {
		t.Errorf("81 paces are %g m", got)
	}
}

func TestGroup(t *testing.T) {
	s, _ := after(t, append(tape(12),
		Action{Name: GroupAdd, Arg: "strong"}, Action{Name: Choose, Arg: "bike:weak"}, Action{Name: GroupAdd, Arg: "steady"})...)
	if s.Weakest() != 1 || len(s.Side.Group) != 2 {
		t.Errorf("weakest %d of %+v", s.Weakest(), s.Side.Group)
	}
	s, _ = Reduce(s, Action{Name: GroupTake, Arg: "0"})
	if s.Chosen[keep.Bike] != "trekking" || s.Chosen[keep.Rider] != "strong" {
		t.Errorf("took %v", s.Chosen)
	}
	again, _ := after(t, Action{Name: Restored, Text: string(keep.EncodeSettings(s.settings()))})
	if len(again.Side.Group) != 2 || again.Side.Group[1].Bike != "weak" {
		t.Errorf("restored %+v", again.Side.Group)
	}
	s, _ = Reduce(s, Action{Name: GroupDrop, Arg: "1"})
	if len(s.Side.Group) != 1 || s.Weakest() != -1 {
		t.Errorf("dropped: %+v", s.Side.Group)
	}
}

func TestReadings(t *testing.T) {
	actions := append(tape(4), tape(0)...)
	actions = append(actions, tape(20)...)
	s, _ := after(t, actions...)
	if s.Odd() == "" {
		t.Error("three readings, one far off: no odd one")
	}
	odd := s.Odd()
	fewer, effects := Reduce(s, Action{Name: ReadingForget, Arg: odd})
	if fewer.ReadHere() != 2 || !has(effects, DropThing, "reading:"+odd) {
		t.Errorf("forgotten: %+v", effects)
	}
	if back, _ := Reduce(fewer, Action{Name: Undo}); back.ReadHere() != 3 {
		t.Error("undo does not bring the reading back")
	}
	s, _ = Reduce(fewer, Action{Name: PlaceNext})
	if s.Side.Place != "place 2" || s.Side.Pitch != nil {
		t.Errorf("next place: %q", s.Side.Place)
	}
	for _, a := range tape(8) {
		s, _ = Reduce(s, a)
	}
	s, _ = Reduce(s, Action{Name: PlaceName, Text: "gate", Now: 5})
	s, _ = Reduce(s, Action{Name: ReadingNote, Arg: s.Own.Readings[2].ID + "=wet", Now: 5})
	if r := s.Own.Readings[2]; r.Place != "gate" || r.Note != "wet" {
		t.Errorf("named and noted: %+v", r)
	}
	_, effects = Reduce(s, Action{Name: ReadingsCSV})
	if text := string(effects[0].Data); strings.Count(text, "\r\n") != 4 || !strings.Contains(text, "gate") {
		t.Errorf("CSV: %q", text)
	}
	_, effects = Reduce(s, Action{Name: ReadingsGPX})
	if text := string(effects[0].Data); !strings.Contains(text, `version="1.1"`) || !strings.Contains(text, "<trkpt") {
		t.Errorf("GPX: %.300q", text)
	}
	made, effects := Reduce(s, Action{Name: HillOfReadings, Now: 9})
	if len(made.Own.Hills) != 1 || made.Answer.LengthM < 100 || !has(effects, StoreThing, "hill:"+made.Own.Hills[0].ID) {
		t.Errorf("hill: %+v, err %v", made.Own.Hills, made.Side.Err)
	}
	file := keep.Encode(s.Own)
	got, faults := keep.Decode(file)
	if len(faults) != 0 || string(keep.Encode(got)) != string(file) || len(got.Readings) != 3 {
		t.Errorf("round trip: %v, %d readings", faults, len(got.Readings))
	}
}

// The same pitch of 9° by four ways: together they say 9°, more surely than any
// of them.
func TestFourWaysTogether(t *testing.T) {
	want := math.Tan(9 * math.Pi / 180)
	actions := []Action{{Name: Measure, Arg: WayTilt}, {Name: Average}, lying(9.4, 1000, 6), {Name: Average}, lying(-8.6, 1010, 6)}
	actions = append(actions, tape(12)...) // 16 cm over a metre: 15.8, to half a centimetre
	actions = append(actions, Action{Name: Measure, Arg: WayWheel})
	rollout := First(shop(), "en").Rollout().Value
	for range int(math.Round(10*rollout*math.Sin(9*math.Pi/180)/0.17)) - 10 {
		actions = append(actions, Action{Name: DialUp, Arg: DialStairs})
	}
	actions = append(actions, Action{Name: Read, Now: 3000}, Action{Name: Measure, Arg: WayRide})
	for i := range 60 {
		along := 4 * float64(i)
		actions = append(actions, Action{Name: Located, Fix: slope.Fix{
			Point:     hill.Point{LatDeg: 44 + along/111111, LonDeg: 8, HeightM: 300 + along*want, TimeS: 4000 + 2*float64(i)},
			AccuracyM: 5, HeightAccuracyM: 3,
		}})
	}
	s, _ := after(t, append(actions, Action{Name: Read, Now: 5000})...)
	read, ok := s.Combined()
	if !ok || s.ReadHere() != 4 || read.Misfit || math.Abs(float64(read.Grade)-want) > 2*read.Error {
		t.Fatalf("four ways: %d readings, %+v, want %.4f", s.ReadHere(), read, want)
	}
	for _, r := range s.Own.Readings {
		if read.Error >= r.Error {
			t.Errorf("together ± %.4f, by %s alone ± %.4f", read.Error, r.Method, r.Error)
		}
	}
}

// A tape in inches on a page in metres: the dials turn by its quarter inches,
// and the reading is the same grade.
func TestTapeInItsOwnUnits(t *testing.T) {
	s, _ := after(t, Action{Name: GoTo, Arg: GoHillside}, Action{Name: Measure, Arg: WayTape}, Action{Name: Pick, Arg: "tape=map"},
		Action{Name: Pick, Arg: TapeUnits + "=imperial"}, Action{Name: DialUp, Arg: DialRise})
	if got, want := s.Dial(DialRise), 4.0*0.0254; math.Abs(got-want) > 1e-9 {
		t.Errorf("from 10 cm a quarter inch up is %.5f m, want %.5f", got, want)
	}
	if s.DialVoice(DialLength).Units != s.Voice.Units {
		t.Error("the tape's units change other dials")
	}
	read, err := s.TapeReading()
	if err != nil || math.Abs(float64(read.Grade)-0.1016) > 1e-4 {
		t.Errorf("4 in over a metre is %v, %v", read.Grade, err)
	}
}

// Who is chosen stands in the group with the changes that are not kept yet.
func TestGroupHasTheChosenAsTheyAre(t *testing.T) {
	s, _ := after(t, append(tape(12), Action{Name: GroupAdd, Arg: "steady"})...)
	before := s.Side.Group[0].Pitch.Answer.Balance.Headroom()
	for range 20 {
		s, _ = Reduce(s, Action{Name: StepUp, Arg: "rider.mass_kg"})
	}
	if now := s.Side.Group[0].Pitch.Answer.Balance.Headroom(); now >= before {
		t.Errorf("headroom %v with 20 kg more, %v before", now, before)
	}
}
