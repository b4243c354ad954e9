package state

import (
	"math"
	"testing"
)

func TestRoundTrip(t *testing.T) {
	tests := []struct {
		name    string
		actions []Action
		back    bool
		trips   float64
		times   int
		known   bool
	}{
		{"at first", nil, false, 1, 0, true},
		{"there and back", []Action{{Name: RoundTrip, Arg: "1"}}, true, 1, 1, true},
		{"three times", []Action{{Name: RoundTrip, Arg: "3"}}, true, 3, 3, true},
		{"one more", []Action{{Name: RoundTrip, Arg: "3"}, {Name: StepUp, Arg: "ride.trips"}}, true, 4, 4, true},
		{"one way again", []Action{{Name: RoundTrip, Arg: "3"}, {Name: RoundTrip, Arg: "0"}}, false, 1, 0, true},
		{"up alone, twice", []Action{{Name: SetTo, Arg: "ride.trips=2"}}, false, 2, 0, false},
		{"beyond the range", []Action{{Name: RoundTrip, Arg: "99"}}, true, 1, 1, true},
		{"no number", []Action{{Name: RoundTrip, Arg: "often"}}, false, 1, 0, true},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			s, _ := after(t, test.actions...)
			times, known := s.RoundTrips()
			if o := &s.Question.Ride; o.Back != test.back || o.Trips != test.trips || times != test.times || known != test.known {
				t.Errorf("back %v, %v trips; %d times, known %v", o.Back, o.Trips, times, known)
			}
		})
	}
	once, _ := after(t)
	thrice, _ := after(t, Action{Name: RoundTrip, Arg: "3"}, Action{Name: SetTo, Arg: "ride.pause_s=600"})
	if least := 3*once.Answer.ClimbS + 5*600; thrice.Answer.TourS < least || thrice.Answer.ChargeLeft >= once.Answer.ChargeLeft {
		t.Errorf("three round trips take %v s (at least %v), leave %v of the charge (once %v)", thrice.Answer.TourS, least, thrice.Answer.ChargeLeft, once.Answer.ChargeLeft)
	}
}

// An input that is not given shows what the computation takes, and a thumb
// steps on from there.
func TestWhatStandsBehindAnInput(t *testing.T) {
	s, _ := after(t)
	for _, path := range []string{"bike.motor.winding_ohm", "bike.pack.resistance_ohm", "bike.rollout_m", "day.density_kgm3", "day.grip", "day.pack_c"} {
		shown := s.Behind(path)
		value, given := s.NumberOf(path)
		if given || math.IsNaN(shown.Value) || value != shown.Value {
			t.Errorf("%s: %v, given %v, behind it %+v", path, value, given, shown)
		}
		up, _ := Reduce(s, Action{Name: StepUp, Arg: path})
		if now, given := up.NumberOf(path); !given || now <= value || now > value*1.2+2 {
			t.Errorf("%s: a step up from %v gives %v", path, value, now)
		}
	}
	if shown := s.Behind("bike.motor.mass_kg"); shown.Reason == "" || !(shown.Low < shown.Value && shown.Value < shown.High) {
		t.Errorf("the motor's mass: %+v", shown)
	}
	if empty := new(State); !math.IsNaN(empty.Behind("bike.mass_kg").Value) {
		t.Error("something stands behind an input without a rig")
	}
}

// A value of the ride that the sentence shows opens alone, not in the list of
// all.
func TestChargeOpensAlone(t *testing.T) {
	s, _ := after(t, Action{Name: ShowPath, Arg: "ride.charge"})
	if s.Place != string(Ride) || s.All || s.Path != "ride.charge" {
		t.Errorf("place %q, all %v, path %q", s.Place, s.All, s.Path)
	}
}
