package rig

import (
	"math"
	"testing"

	"hillwright/physics/motor"
)

// pegAt gives one limit's pull at 1.4 m/s in the easiest gear, in a state.
func pegAt(g *Rig, l Limit, b Body) float64 {
	now := g.At(&b, 0, 1)
	pegs, _ := g.Pegs(1.4, 0, &now)
	return pegs[l]
}

// Half-way through the easing the motor gives half of its torque.
func TestHeatHalvesTheTorqueHalfWay(t *testing.T) {
	g := example(motor.Crank, 2, "eu-25")
	b := g.Fresh(1)
	b.WindingC = (g.Heat.EaseFromC + g.Heat.EaseToC) / 2
	now := g.At(&b, 0, 1)
	pegs, riderN := g.Pegs(1.4, 0, &now)
	if got, want := pegs[Heat]-riderN, (pegs[Torque]-riderN)/2; math.Abs(got/want-1) > 1e-9 {
		t.Errorf("heat leaves the motor %.3f N, half of its torque is %.3f", got, want)
	}
	if cool := pegAt(g, Heat, g.Fresh(1)); !math.IsInf(cool, 1) {
		t.Errorf("a cool motor is held to %.1f N by heat", cool)
	}
}

// What the sheet gives wins over the class, each where it acts.
func TestTheSheetWinsOverTheClass(t *testing.T) {
	base := example(motor.Crank, 2, "eu-25")
	with := func(change func(*Bike)) *Rig {
		b := base.Bike
		change(&b)
		g, err := New(b, base.Rider, base.Cargo, base.Day, base.Law, 2, 0)
		if err != nil {
			t.Fatal(err)
		}
		return g
	}
	for _, row := range []struct {
		name      string
		got, want float64
	}{
		{"winding", with(func(b *Bike) { b.Sheet.WindingOhm = 0.123 }).Circuit.WindingOhm, 0.123},
		{"torque per ampere", with(func(b *Bike) { b.Sheet.TorqueNmPerA = 0.05 }).Circuit.TorqueNmPerA, 0.05},
		{"easing from", with(func(b *Bike) { b.Sheet.EaseFromC = 91 }).Heat.EaseFromC, 91},
		{"easing to", with(func(b *Bike) { b.Sheet.EaseToC = 131 }).Heat.EaseToC, 131},
		{"case", with(func(b *Bike) { b.Sheet.CaseWPerK = 2.5 }).Heat.CaseWPerK, 2.5},
		{"pack resistance", with(func(b *Bike) { b.Pack.ResistanceOhm = 0.31 }).Pack.ResistanceOhm, 0.31},
		{"pack current", with(func(b *Bike) { b.Pack.MaxA = 11 }).Pack.MaxA, 11},
		{"pack temperature", with(func(*Bike) {}).PackC, 15},
	} {
		if row.got != row.want {
			t.Errorf("%s is %v, the sheet says %v", row.name, row.got, row.want)
		}
	}
	few := with(func(b *Bike) { b.Sheet.MaxPackA = 4 })
	if a, b := pegAt(few, Cells, few.Fresh(1)), pegAt(base, Cells, base.Fresh(1)); a >= b {
		t.Errorf("4 A from the pack allow %.1f N, the class's limit %.1f N", a, b)
	}
	if now := few.At(&Body{Charge: 1}, 0, 1); now.PackW > 4*now.PackV+1e-9 {
		t.Errorf("4 A at %.1f V give %.1f W", now.PackV, now.PackW)
	}
}

// A load in a box presses the front wheel, one on a rack lightens it, one on a
// trailer weighs on the bike hardly at all.
func TestWhereALoadRides(t *testing.T) {
	base := example(motor.Crank, 2, "eu-25")
	front := func(place LoadPlace) (front, trailer float64) {
		b := base.Bike
		b.Places.RackAheadM, b.Places.RackHeightM, b.Places.BoxAheadM, b.Places.BoxHeightM = -0.1, 0.8, 1.1, 0.6
		g, err := New(b, base.Rider, Load{MassKg: 30, Place: place}, base.Day, base.Law, 2, 0)
		if err != nil {
			t.Fatal(err)
		}
		w := g.Stance.Wheels(1, 0)
		if sum := w.FrontN + w.RearN + w.TrailerN; math.Abs(sum/(g.Road.MassKg*9.80665)-1) > 1e-9 {
			t.Errorf("the wheels bear %.1f N of %.1f", sum, g.Road.MassKg*9.80665)
		}
		return w.FrontN, w.TrailerN
	}
	rack, _ := front(OnRack)
	box, _ := front(InBox)
	trailed, axle := front(OnTrailer)
	if !(rack < trailed && trailed < box) {
		t.Errorf("front wheel: rack %.0f N, trailer %.0f N, box %.0f N", rack, trailed, box)
	}
	if axle < 0.8*30*9.80665 {
		t.Errorf("the trailer's own axle bears %.0f N of 294 N", axle)
	}
}

func TestUnknownBrakesAndGround(t *testing.T) {
	base := example(motor.Crank, 2, "eu-25")
	b, d := base.Bike, base.Day
	b.FrontBrake = "parachute"
	if _, err := New(b, base.Rider, base.Cargo, d, base.Law, 2, 0); err != ErrBrakes {
		t.Errorf("an unknown brake gives %v", err)
	}
	b.FrontBrake, b.RearBrake = "none", "none"
	if _, err := New(b, base.Rider, base.Cargo, d, base.Law, 2, 0); err != ErrBrakes {
		t.Errorf("no brake at all gives %v", err)
	}
	d.Ground = "lava"
	if _, err := New(base.Bike, base.Rider, base.Cargo, d, base.Law, 2, 0); err != ErrGround {
		t.Errorf("an unknown ground gives %v", err)
	}
}
