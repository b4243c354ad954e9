package words

import (
	"fmt"
	"os"
	"strings"
	"testing"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/physics/motor"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/rule"
	"hillwright/physics/unit"
)

var (
	inEnglish = Voice{}
	inGerman  = Voice{Lang: German, Comma: true}
	inFeet    = Voice{Units: Imperial}
)

func rigOf(t *testing.T, kind motor.Kind, law string, level int) *rig.Rig {
	t.Helper()
	q := ask.Default()
	q.Bike.Motor.Kind = kind
	l, ok := rule.ByID(law)
	if !ok {
		t.Fatal("no law " + law)
	}
	r, err := rig.New(q.Bike, q.Rider, q.Load, q.Day, l, level, 0)
	if err != nil {
		t.Fatal(err)
	}
	return r
}

// rigWith is the default rig with inputs set.
func rigWith(t *testing.T, set ...string) *rig.Rig {
	t.Helper()
	q := ask.Default()
	q.Rider.CriticalW, q.Rider.ReserveJ = 160, 12000
	for _, s := range set {
		path, value, _ := strings.Cut(s, "=")
		if err := q.Set(path, value); err != nil {
			t.Fatal(err)
		}
	}
	r, err := q.Rig(0)
	if err != nil {
		t.Fatal(err)
	}
	return r
}

// answerOf is an answer by hand: the words are tested here, not the numbers.
func answerOf(verdict ride.Verdict, binds, sets rig.Limit, headroom float64) *ride.Answer {
	return &ride.Answer{
		Verdict: verdict, LengthM: 460, Stalled: verdict == ride.Short, StalledAtM: 431,
		WindingPeakC: 118, ReserveLeftJ: 12000,
		Balance: ride.Balance{
			Grade: 0.18, SpeedMps: 1.4, Gear: 0, WantedN: 212, SteepestGrade: 0.21,
			Pegs: []ride.Peg{{Limit: binds, PullN: 212 / (1 - headroom), Headroom: headroom}, {Limit: rig.Power, PullN: 600, Headroom: 0.65}},
		},
		Hardest: ride.Stretch{
			FromM: 400, ToM: 460, Grade: 0.18, SteepestGrade: 0.18,
			Running: ride.Running{SpeedMps: 2.53, Gear: 2, SetBy: sets},
		},
	}
}

type say struct {
	name   string
	reason func(v Voice) string
}

func whyCases(t *testing.T) []say {
	crank, hub := rigOf(t, motor.Crank, "eu-25", 4), rigOf(t, motor.RearHub, "eu-25", 3)
	none, off := rigOf(t, motor.None, "eu-25", 0), rigOf(t, motor.Crank, "eu-25", 0)
	ratio := rigOf(t, motor.Crank, "jp-24", 2)
	var all []say
	add := func(name string, r *rig.Rig, a *ride.Answer) {
		all = append(all, say{name, func(v Voice) string { return v.Why(r, a) }})
	}
	for _, x := range []struct {
		name     string
		verdict  ride.Verdict
		headroom float64
	}{
		{"clears", ride.Clears, 0.36}, {"tight", ride.Tight, 0.04}, {"tight, hardly", ride.Tight, 0.003},
		{"tight, momentum only", ride.Tight, -0.08}, {"short", ride.Short, -0.22},
	} {
		for l := rig.Limit(0); l < rig.Limits; l++ {
			if l == rig.Coasting {
				continue // never a peg
			}
			add(x.name+", "+l.String(), crank, answerOf(x.verdict, l, rig.Power, x.headroom))
		}
	}
	for l := rig.Limit(0); l < rig.Limits; l++ {
		add("clears, torque; "+l.String()+" sets the speed", crank, answerOf(ride.Clears, rig.Torque, l, 0.36))
	}
	add("hub motor", hub, answerOf(ride.Clears, rig.Torque, rig.Rider, 0.36))
	add("hub motor, short", hub, answerOf(ride.Short, rig.Torque, rig.Torque, -0.36))
	add("no motor", none, answerOf(ride.Tight, rig.Rider, rig.Rider, 0.07))
	add("motor off", off, answerOf(ride.Short, rig.Rider, rig.Rider, -0.07))
	front := rigOf(t, motor.FrontHub, "eu-25", 3)
	add("grip, front hub", front, answerOf(ride.Short, rig.Grip, rig.Grip, -0.2))
	wet := rigWith(t, "day.ground=gravel-wet")
	add("grip, wet gravel", wet, answerOf(ride.Tight, rig.Grip, rig.Rider, 0.05))
	known := rigWith(t, "day.grip=0.3")
	add("grip, measured", known, answerOf(ride.Tight, rig.Grip, rig.Rider, 0.05))
	add("grip, measured, front hub", rigWith(t, "day.grip=0.3", "bike.motor.kind=front-hub"), answerOf(ride.Tight, rig.Grip, rig.Rider, 0.05))
	cells := func(name string, part float64, set ...string) {
		r := rigWith(t, set...)
		a := answerOf(ride.Tight, rig.Cells, rig.Cells, 0.05)
		b := &a.Balance
		body := r.Fresh(1)
		now := r.At(&body, b.Grade.Sin(), b.Grade.Cos())
		pegs, riderN := r.Pegs(b.SpeedMps, b.Gear, &now)
		b.Pegs[0].PullN = riderN + part*(pegs[rig.Cells]-riderN)
		b.WantedN = 0.95 * b.Pegs[0].PullN
		add("pack: "+name, r, a)
	}
	cells("as it is", 1)
	cells("cold", 1, "day.pack_c=-12")
	cells("low", 0.6)
	cells("cold and low", 0.6, "day.pack_c=-12")
	cells("worn", 1, "bike.pack.health=0.5", "bike.pack.energy_wh=250")
	tired := answerOf(ride.Tight, rig.Rider, rig.Rider, 0.05)
	tired.ReserveLeftJ = 0
	add("rider run empty", rigWith(t, "rider.power_w=300"), tired)
	add("rider run empty, motor off", rigWith(t, "rider.power_w=300", "ride.level=0"), tired)
	add("assist ratio", ratio, answerOf(ride.Clears, rig.CutOff, rig.CutOff, 0.2))

	a := answerOf(ride.Clears, rig.Torque, rig.Power, 0.36)
	a.Hardest.SteepestGrade = 0.24
	add("steepest piece differs", crank, a)
	a = answerOf(ride.Clears, rig.Torque, rig.Power, 0.36)
	a.Hardest.FromM = 0
	add("whole way", crank, a)
	a = answerOf(ride.Clears, rig.Torque, rig.Power, 0.36)
	a.Hardest.FromM, a.LengthM = 0, 900
	add("from the foot", crank, a)
	a = answerOf(ride.Clears, rig.Torque, rig.Power, 0.36)
	a.Hardest.FromM, a.Hardest.SteepestGrade = 0, 0.24
	add("whole way, steepest piece differs", crank, a)
	a = answerOf(ride.Short, rig.Torque, rig.Power, 0.36)
	add("stalled in a shift, though the pull is there", crank, a)
	a = answerOf(ride.Short, rig.Torque, rig.Power, 0.1)
	a.Hardest.Running.Gear = 0
	add("stalled though the pull is there", crank, a)
	a = answerOf(ride.Short, rig.Torque, rig.Power, -0.1)
	a.StalledAtM = 73
	add("stalled before the hardest stretch", crank, a)
	a = answerOf(ride.Short, rig.Torque, rig.Power, -0.1)
	a.StalledAtM = 0.3
	add("stalled at the foot", crank, a)
	for _, way := range []struct {
		name string
		trip int
		back bool
	}{{"the way back", 0, true}, {"trip 3", 2, false}, {"the way back of trip 3", 2, true}} {
		a = answerOf(ride.Short, rig.Cells, rig.Power, -0.1)
		a.Hardest.Trip, a.Hardest.Back = way.trip, way.back
		a.StalledTrip, a.StalledBack = way.trip, way.back
		add("stalled on "+way.name, crank, a)
		a = answerOf(ride.Short, rig.Cells, rig.Power, -0.1)
		a.StalledTrip, a.StalledBack = way.trip, way.back
		add("stalled on "+way.name+", hardest on the first", crank, a)
	}
	a = answerOf(ride.Short, rig.Torque, rig.Power, -0.1)
	a.Hardest.Back, a.StalledBack, a.StalledAtM = true, true, 459.5
	add("stalled at the turn", crank, a)
	a = answerOf(ride.Short, rig.Torque, rig.Power, -0.1)
	a.Stalled = false
	add("short, not stalled", crank, a)
	a = answerOf(ride.Clears, rig.Torque, rig.Power, 0)
	a.Balance.Pegs = nil
	add("no limit acts", crank, a)
	a = answerOf(ride.Clears, rig.Torque, rig.Coasting, 1)
	a.Balance.Grade, a.Hardest.SteepestGrade, a.Balance.WantedN = -0.05, -0.05, -40
	add("only down", crank, a)
	a = answerOf(ride.Clears, rig.Torque, rig.CutOff, 0.95)
	a.Balance.Grade, a.Hardest.SteepestGrade, a.Balance.WantedN = 0, 0, 11
	add("level", crank, a)

	steady := func(name string, r *rig.Rig, held bool, binds, sets rig.Limit, headroom float64) {
		from := answerOf(ride.Clears, binds, sets, headroom)
		s := &ride.SteadyAnswer{Held: held, Balance: from.Balance}
		if held {
			s.Running = from.Hardest.Running
		}
		all = append(all, say{name, func(v Voice) string { return v.WhySteady(r, unit.Percent(12), s) }})
	}
	steady("steady", crank, true, rig.Torque, rig.Power, 0.36)
	steady("steady, same limit", crank, true, rig.Rider, rig.Rider, 0.36)
	steady("steady, tight", crank, true, rig.Torque, rig.Power, 0.05)
	steady("steady, not held", crank, false, rig.Torque, rig.Power, -0.3)
	down := &ride.SteadyAnswer{Held: true, Running: ride.Running{SpeedMps: 25 / 3.6, SetBy: rig.Coasting}}
	down.Balance.WantedN = -40
	all = append(all, say{"steady, down", func(v Voice) string { return v.WhySteady(crank, -0.05, down) }})
	return all
}

func TestWhyReadsAsWritten(t *testing.T) {
	var b strings.Builder
	voices := []struct {
		tag   string
		voice Voice
	}{{"en", inEnglish}, {"de", inGerman}, {"ft", inFeet}}
	for i, c := range whyCases(t) {
		b.WriteString(c.name + "\n")
		for _, v := range voices {
			if v.tag == "ft" && i > 0 {
				continue // units do not change the sentence: one is enough to read
			}
			text := strings.NewReplacer(thin, " ", wide, " ").Replace(c.reason(v.voice))
			fmt.Fprintf(&b, "  %s  %s\n", v.tag, text)
			if n := strings.Count(text, ". ") + strings.Count(text, ".\n") + 1; n > 2 {
				t.Errorf("%s, %s: %d sentences, two are the most", c.name, v.tag, n)
			}
			if strings.ContainsAny(text, "{}") || strings.Contains(text, "  ") || !strings.HasSuffix(text, ".") {
				t.Errorf("%s, %s: not a clean sentence: %s", c.name, v.tag, text)
			}
		}
	}
	const want, got = "testdata/why.want.txt", "testdata/why.got.txt"
	old, _ := os.ReadFile(want)
	if string(old) == b.String() {
		os.Remove(got)
		return
	}
	if err := os.WriteFile(got, []byte(b.String()), 0o644); err != nil {
		t.Fatal(err)
	}
	t.Errorf("the sentences differ from wasm/words/%s; read wasm/words/%s and, if they are right, accept them:\n\tmv wasm/words/%s wasm/words/%s", want, got, got, want)
}

// Every answer that the computation itself gives has a sentence without a
// dash, an empty blank or a third sentence.
func TestWhySpeaksOfRealAnswers(t *testing.T) {
	for _, kind := range motor.Kinds() {
		q := ask.Default()
		if err := q.Set("bike.motor.kind", kind); err != nil {
			t.Fatal(err)
		}
		for percent := -30; percent <= 60; percent += 3 {
			p, err := hill.ParseSections(fmt.Sprintf("300m@4%%,60m@%d%%,50m@1%%", percent))
			if err != nil {
				t.Fatal(err)
			}
			r, a, err := q.Climb(&p)
			if err != nil {
				t.Fatal(err)
			}
			g := unit.Percent(float64(percent))
			_, steady, err := q.Steady(g)
			if err != nil {
				t.Fatal(err)
			}
			for _, v := range []Voice{inEnglish, inGerman, inFeet} {
				for _, text := range []string{v.Why(r, a), v.WhySteady(r, g, steady)} {
					if strings.Contains(text, dash) || strings.ContainsAny(text, "{}") || strings.Count(text, ". ") > 1 {
						t.Errorf("%s, %d %%: %s", kind, percent, text)
					}
				}
			}
		}
	}
}
