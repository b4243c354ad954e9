package ask

import (
	"encoding/json"
	"math"
	"strconv"
	"testing"

	"hillwright/physics/motor"
)

// No number that a class default stands for is left without value, band and
// reason; what is given wins.
func TestShownFillsWhatIsLeftOpen(t *testing.T) {
	for _, kind := range []motor.Kind{motor.Crank, motor.RearHub, motor.FrontHub} {
		for _, direct := range []bool{false, true} {
			q := Default()
			q.Bike.Motor.Kind, q.Bike.Motor.DirectDrive = kind, direct && kind != motor.Crank
			r, err := q.Rig(0)
			if err != nil {
				t.Fatal(err)
			}
			for _, in := range Inputs() {
				s, ok := q.Shown(in.Path, r)
				if !ok {
					t.Fatalf("%s is not shown", in.Path)
				}
				if in.Blank != "assumed" {
					continue
				}
				if !s.Open || s.Reason == "" || s.Because == "" || s.Source != Assumed || !(s.Low <= s.Value && s.Value <= s.High) {
					t.Errorf("%v: %s shows %+v", kind, in.Path, s)
				}
				if _, err := strconv.ParseFloat(s.Text, 64); err != nil {
					t.Errorf("%s prints %q, no number", in.Path, s.Text)
				}
				// Set to the very value it took, it shows the same, as given.
				again := q
				if err := again.Set(in.Path, format(s.Value)); err != nil {
					t.Errorf("%v: the class's own value does not fit: %v", kind, err)
					continue
				}
				if given, _ := again.Shown(in.Path, r); given.Open || given.Reason != "" || given.Value != s.Value || given.Source != Sheet {
					t.Errorf("given, %s shows %+v", in.Path, given)
				}
			}
		}
	}
}

// Without a motor there is nothing to assume of one.
func TestShownOfNoMotor(t *testing.T) {
	q := Default()
	q.Bike.Motor.Kind = motor.None
	r, err := q.Rig(0)
	if err != nil {
		t.Fatal(err)
	}
	if s, ok := q.Shown("bike.motor.mass_kg", r); !ok || s.Text != "" || !math.IsNaN(s.Value) || s.Reason != "" {
		t.Errorf("without a motor its mass shows %+v", s)
	}
}

func TestShownFollowsOtherInputs(t *testing.T) {
	q := Default()
	q.Day.TemperatureC = -3
	r, err := q.Rig(0)
	if err != nil {
		t.Fatal(err)
	}
	for path, want := range map[string]float64{
		"day.pack_c": -3, "day.grip": 0.80, "ride.level": 4, "bike.rollout_m": r.CircumferenceM,
		"day.density_kgm3": r.Road.DensityKgM3, "rider.mass_kg": 80,
	} {
		if s, _ := q.Shown(path, r); s.Value != want {
			t.Errorf("%s shows %v, want %v", path, s.Value, want)
		}
	}
	if s, _ := q.Shown("day.altitude_m", r); s.Text != "hill" || !math.IsNaN(s.Value) {
		t.Errorf("the hill's own height shows %+v", s)
	}
	if _, ok := q.Shown("bike.wings", r); ok {
		t.Error("an unknown path is shown")
	}
}

func TestInputsJSON(t *testing.T) {
	q := Default()
	r, err := q.Rig(0)
	if err != nil {
		t.Fatal(err)
	}
	var list []map[string]any
	if err := json.Unmarshal(InputsJSON(&q, r), &list); err != nil {
		t.Fatal(err)
	}
	if len(list) != len(Inputs()) {
		t.Fatalf("%d of %d inputs", len(list), len(Inputs()))
	}
	for i, in := range Inputs() {
		row := list[i]
		_, isNumber := row["value"].(float64)
		if row["path"] != in.Path || row["unit"] != in.Unit || in.Blank == "assumed" && (!isNumber || row["reason"] == nil || row["low"] == nil) {
			t.Errorf("%s: %v", in.Path, row)
		}
	}
}
