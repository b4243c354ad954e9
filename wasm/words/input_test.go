package words

import (
	"math"
	"testing"

	"hillwright/physics/ask"

	"pgregory.net/rapid"
)

func anyVoice(t *rapid.T) Voice {
	return Voice{
		Lang:  Lang(rapid.IntRange(0, int(langs)-1).Draw(t, "lang")),
		Units: Units(rapid.IntRange(0, 1).Draw(t, "units")),
		Comma: rapid.Bool().Draw(t, "comma"),
	}
}

func anyNumberInput(t *rapid.T) ask.Input {
	var all []ask.Input
	for _, in := range ask.Inputs() {
		if in.Form == ask.Number {
			all = append(all, in)
		}
	}
	return rapid.SampledFrom(all).Draw(t, "input")
}

func TestShownAndBackIsTheSame(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		v, in := anyVoice(t), anyNumberInput(t)
		si := rapid.Float64Range(in.Low, in.High).Draw(t, "si")
		back := v.FromShown(in.Path, v.Show(in.Path, si))
		if math.Abs(back-si) > 1e-12*math.Max(40, math.Abs(si)) {
			t.Fatalf("%s: %v became %v", in.Path, si, back)
		}
	})
}

// What stands in a field, read back, is what was there to within a tenth of
// the thumb's step; and written again it is the same text.
func TestEntryReadBackIsTheSame(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		v, in := anyVoice(t), anyNumberInput(t)
		si := rapid.Float64Range(in.Low, in.High).Draw(t, "si")
		text := v.Entry(in.Path, si)
		shown, ok := v.ParseNumber(text)
		if !ok {
			t.Fatalf("%s: cannot read %q", in.Path, text)
		}
		if off := math.Abs(shown - v.Show(in.Path, si)); off > 0.0501*v.Step(in.Path)+1e-9 {
			t.Fatalf("%s: %q is %v off", in.Path, text, off)
		}
		if again := v.Entry(in.Path, v.FromShown(in.Path, shown)); again != text {
			t.Fatalf("%s: %q became %q", in.Path, text, again)
		}
	})
}

func TestWrittenNumberReadsBack(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		v := anyVoice(t)
		value := rapid.Float64Range(-1e9, 1e9).Draw(t, "value")
		places := rapid.IntRange(0, 6).Draw(t, "decimals")
		got, ok := v.ParseNumber(v.Number(value, places))
		if !ok || math.Abs(got-value) > 0.5000001*math.Pow10(-places)+1e-6 {
			t.Fatalf("%v became %q and %v", value, v.Number(value, places), got)
		}
	})
}

// Whatever is typed, reading it does not panic and never gives what is no number.
func TestParseNumberTakesAnything(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		text := rapid.StringOfN(rapid.SampledFrom([]rune("0123456789.,-−–+ \u202f\u00a0'’ex%é")), 0, 12, -1).Draw(t, "text")
		if got, ok := anyVoice(t).ParseNumber(text); ok && (math.IsNaN(got) || math.IsInf(got, 0)) {
			t.Fatalf("%q gives %v", text, got)
		}
	})
}

func TestShownUnits(t *testing.T) {
	for _, c := range []struct {
		path           string
		si             float64
		metric, inFeet string
	}{
		{"rider.mass_kg", 82, "82 kg", "180.8 lb"},
		{"rider.crank_m", 0.1725, "172.5 mm", "172.5 mm"},
		{"rider.hold_speed_mps", 1.4, "5.04 km/h", "3.13 mph"},
		{"bike.crr", 0.008, "0.008", "0.008"},
		{"bike.drive_efficiency", 0.96, "96 %", "96 %"},
		{"bike.motor.torque_nm", 65, "65 N·m", "47.9 lbf·ft"},
		{"bike.rollout_m", 2.215, "2215 mm", "2215 mm"},
		{"day.temperature_c", -5, "−5 °C", "23 °F"},
		{"day.altitude_m", 500, "500 m", "1640 ft"},
		{"day.wind_mps", -5, "−18 km/h", "−11.2 mph"},
		{"rider.cadence_low_rpm", 45, "45 turns/min", "45 turns/min"},
	} {
		if got := bare(inEnglish.Value(c.path, c.si)); got != c.metric {
			t.Errorf("%s: got %q, want %q", c.path, got, c.metric)
		}
		if got := bare(inFeet.Value(c.path, c.si)); got != c.inFeet {
			t.Errorf("%s: got %q, want %q", c.path, got, c.inFeet)
		}
	}
}

// A thumb crosses a number's whole range in a bearable count of steps, and
// numbers are the only inputs that have steps (a level is a whole number).
func TestSteps(t *testing.T) {
	for _, in := range ask.Inputs() {
		for _, v := range []Voice{inEnglish, inFeet} {
			step := v.Step(in.Path)
			isNumber := in.Form == ask.Number || in.Form == ask.Whole
			if isNumber != (step > 0) {
				t.Errorf("%s: step %v", in.Path, step)
			}
			if isNumber {
				if n := (v.Show(in.Path, in.High) - v.Show(in.Path, in.Low)) / step; n < 5 || n > 2600 {
					t.Errorf("%s: %v steps from end to end", in.Path, n)
				}
			}
		}
	}
}
