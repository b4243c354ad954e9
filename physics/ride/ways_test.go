package ride_test

import (
	"math"
	"strings"
	"testing"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/physics/ride"
)

func ridden(t *testing.T, sections string, set ...string) *ride.Answer {
	t.Helper()
	q := ask.Default()
	for _, s := range set {
		path, value, _ := strings.Cut(s, "=")
		if err := q.Set(path, value); err != nil {
			t.Fatal(err)
		}
	}
	p, err := hill.ParseSections(sections)
	if err != nil {
		t.Fatal(err)
	}
	_, a, err := q.Climb(&p)
	if err != nil {
		t.Fatal(err)
	}
	return a
}

// The way on which it stalls, and the one on which the pack first gives too
// little, are named, and both places are counted from the foot of the hill.
func TestWaysAreNamed(t *testing.T) {
	// Down first: only the way back climbs what the legs and an empty pack cannot.
	a := ridden(t, "100m@1%,300m@-16%", "ride.back=yes", "ride.charge=0")
	if !a.Stalled || !a.StalledBack || a.StalledTrip != 0 || a.StalledAtM < 100 || a.StalledAtM > 400 {
		t.Errorf("stalls: %v at %v, trip %d, back %v; want on the first way back, between 100 and 400 m", a.Stalled, a.StalledAtM, a.StalledTrip, a.StalledBack)
	}
	// A small pack serves some trips and not all of them.
	a = ridden(t, "1500m@9%", "bike.pack.energy_wh=100", "bike.pack.max_a=80", "bike.pack.resistance_ohm=0.05", "ride.trips=6", "ride.back=yes")
	if !a.CutOut || a.CutOutTrip == 0 || a.CutOutBack || a.CutOutAtM < 0 || a.CutOutAtM > 1500 {
		t.Errorf("pack: %v at %v, trip %d, back %v; want on a later way up", a.CutOut, a.CutOutAtM, a.CutOutTrip, a.CutOutBack)
	}
}

// How long the motor holds is asked from cold, however hot the ride made it.
func TestEasingIsCountedFromCold(t *testing.T) {
	sections := "2500m@11%"
	set := []string{"bike.motor.kind=rear-hub", "bike.motor.torque_nm=45", "bike.motor.power_w=400"}
	once := ridden(t, sections, set...)
	thrice := ridden(t, sections, append(set, "ride.trips=3", "bike.pack.energy_wh=3000")...)
	short := ridden(t, "100m@11%", set...)
	for _, a := range []*ride.Answer{once, thrice} {
		if math.IsInf(a.EasingS, 1) || math.Abs(a.EasingS/short.EasingS-1) > 0.15 {
			t.Errorf("holds %.0f s on the long hill, %.0f s on a short one of the same grade", a.EasingS, short.EasingS)
		}
	}
}
