package ask

import (
	"encoding/json"
	"errors"
	"math"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/hill"
)

// The paths that the README promises.
func TestPromisedPathsExist(t *testing.T) {
	for _, path := range strings.Fields("rider.mass_kg rider.power_w bike.mass_kg bike.crr bike.cda_m2 bike.motor.torque_nm bike.motor.power_w day.temperature_c day.density_kgm3 day.wind_mps") {
		if _, ok := InputAt(path); !ok {
			t.Errorf("%s is no input", path)
		}
	}
}

func TestEveryInputTakesBackItsOwnText(t *testing.T) {
	for _, in := range Inputs() {
		q := Default()
		text, ok := q.Get(in.Path)
		if !ok {
			t.Fatalf("%s cannot be read", in.Path)
		}
		if err := q.Set(in.Path, text); err != nil {
			t.Errorf("%s does not take back %q: %v", in.Path, text, err)
		}
		if again, _ := q.Get(in.Path); again != text {
			t.Errorf("%s turned %q into %q", in.Path, text, again)
		}
	}
}

func TestNumbersRoundTripAndStayInRange(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		in := rapid.SampledFrom(Inputs()).Draw(t, "input")
		if in.num == nil {
			t.Skip("no number")
		}
		q := Default()
		v := rapid.Float64Range(in.Low, in.High).Draw(t, "value")
		if err := q.Set(in.Path, format(v)); err != nil {
			t.Fatal(err)
		}
		if got, ok := q.Value(in.Path); !ok || got != v {
			t.Fatalf("%s: set %v, got %v", in.Path, v, got)
		}
		low, high, ok := q.Band(in.Path)
		if !ok || low > v || high < v || low < in.Low || high > in.High {
			t.Fatalf("%s: band %v to %v around %v", in.Path, low, high, v)
		}
		beyond := in.High + math.Abs(in.High) + 1
		if err := q.Set(in.Path, format(beyond)); err == nil {
			t.Fatalf("%s takes %v", in.Path, beyond)
		}
		if got, _ := q.Value(in.Path); got != v {
			t.Fatalf("%s: a refused value changed it to %v", in.Path, got)
		}
	})
}

func TestProblems(t *testing.T) {
	for _, row := range []struct {
		path, text string
		kind       ProblemKind
		says       string
	}{
		{"bike.colour", "red", NoSuchPath, "no such input"},
		{"rider.mass_kg", "heavy", NotANumber, "a number from 25 to 180 kg"},
		{"rider.mass_kg", "NaN", NotANumber, "a number"},
		{"rider.mass_kg", "", NotANumber, "a number"},
		{"rider.mass_kg", "1e9", OutOfRange, "25 to 180"},
		{"bike.tyre", "47-623", NotATyre, "ISO 5775"},
		{"bike.sprockets", "11 thirteen", NotAList, "blanks between"},
		{"bike.sprockets", "", NotAList, "blanks between"},
		{"bike.sprockets", "11.5", NotAList, "blanks between"},
		{"bike.motor.kind", "rocket", NotAChoice, "one of none, crank"},
		{"ride.law", "moon", NotAChoice, "one of eu-25"},
		{"ride.level", "12", NotANumber, `or "highest"`},
		{"day.density_kgm3", "thin", NotANumber, `or "computed"`},
	} {
		q := Default()
		err := q.Set(row.path, row.text)
		var p *Problem
		if !errors.As(err, &p) || p.Kind != row.kind || p.Path != row.path || !strings.Contains(err.Error(), row.says) {
			t.Errorf("%s=%s: %v, want kind %d and %q", row.path, row.text, err, row.kind, row.says)
		}
	}
}

func TestPutSetsAllThatFits(t *testing.T) {
	q := Default()
	err := q.Put("bike", map[string]string{"mass_kg": "31", "crr": "much", "motor.torque_nm": "85"}, map[string]string{"mass_kg": "measured", "crr": "guessed"})
	var p *Problem
	if !errors.As(err, &p) || p.Path != "bike.crr" {
		t.Errorf("first problem is %v", err)
	}
	if q.Bike.MassKg != 31 || q.Bike.Motor.TorqueNm != 85 || q.SourceOf("bike.mass_kg") != Measured {
		t.Errorf("what fits was not set: %+v", q.Bike)
	}
	if q.SourceOf("bike.motor.torque_nm") != Sheet {
		t.Errorf("source of the torque is %v", q.SourceOf("bike.motor.torque_nm"))
	}
}

func TestMeasuredNarrowsTheBand(t *testing.T) {
	q := Default()
	low, high, _ := q.Band("bike.crr")
	q.Source["bike.crr"] = Measured
	low2, high2, _ := q.Band("bike.crr")
	if high2-low2 >= high-low {
		t.Errorf("band %v to %v became %v to %v", low, high, low2, high2)
	}
}

// What the answer says as JSON is valid and has the promised keys.
func TestAnswerJSON(t *testing.T) {
	q := Default()
	p, err := hill.ParseSections("400m@7%,60m@18%")
	if err != nil {
		t.Fatal(err)
	}
	r, a, err := q.Climb(&p)
	if err != nil {
		t.Fatal(err)
	}
	var m map[string]any
	if err := json.Unmarshal(AnswerJSON(r, a, "a \"why\" \\ with\nall"), &m); err != nil {
		t.Fatal(err)
	}
	for _, key := range strings.Fields("verdict why limit headroom next_limit limits hardest climb_time_s rider_energy_wh motor_energy_wh pack_energy_wh distance_m ascent_m stalled_at_m") {
		if _, ok := m[key]; !ok {
			t.Errorf("the answer has no %s", key)
		}
	}
	hardest := m["hardest"].(map[string]any)
	for _, key := range strings.Fields("from_m to_m grade speed_mps gear cadence_rpm") {
		if _, ok := hardest[key]; !ok {
			t.Errorf("the hardest stretch has no %s", key)
		}
	}
	if m["why"] != "a \"why\" \\ with\nall" || hardest["from_m"] != 400.0 {
		t.Errorf("texts or numbers came back changed: %v, %v", m["why"], hardest["from_m"])
	}
	if hardest["speed_mps"] != a.Hardest.Running.SpeedMps {
		t.Errorf("speed %v was written as %v", a.Hardest.Running.SpeedMps, hardest["speed_mps"])
	}
}

func TestSteadyJSONOfWhatDoesNotHold(t *testing.T) {
	q := Default()
	r, a, err := q.Steady(0.5)
	if err != nil {
		t.Fatal(err)
	}
	var m map[string]any
	if err := json.Unmarshal(SteadyJSON(r, 0.5, a, ""), &m); err != nil {
		t.Fatal(err)
	}
	if m["verdict"] != "short" || m["speed_mps"] != nil || m["headroom"].(float64) >= 0 {
		t.Errorf("50 %% gives %v, %v, %v", m["verdict"], m["speed_mps"], m["headroom"])
	}
}
