package click

import (
	"errors"
	"math"
	"os"
	"testing"

	"hillwright/physics/synth"
)

// What is no coast-down is not taken for one.
func TestRefuses(t *testing.T) {
	const rate = 22050
	n := 30 * rate
	quiet := func(x []float64, loud float64) []float32 {
		out := make([]float32, len(x))
		hiss := synth.Scene{RateHz: rate, LengthS: 30, SNRdB: 0, Speed: func(float64) float64 { return 0 }, CircumferenceM: 2, ClicksPerTurn: 20, Seed: 5}
		for i, h := range hiss.Make() {
			out[i] = float32(loud*x[i]) + 0.01*h
		}
		return out
	}
	tone := func(f func(t float64) float64) []float64 {
		out := make([]float64, n)
		for i := range out {
			out[i] = f(float64(i) / rate)
		}
		return out
	}
	rows := map[string][]float32{
		"hum":              quiet(tone(func(t float64) float64 { return math.Sin(2*math.Pi*100*t) + math.Sin(2*math.Pi*1700*t) }), 0.2),
		"a steady machine": quiet(tone(func(t float64) float64 { return math.Sin(2*math.Pi*3000*t) * (1 + math.Sin(2*math.Pi*25*t)) }), 0.2),
		"pedalling":        quiet(make([]float64, n), 0),
	}
	for seed := range seeds() {
		name := string(rune('a' + seed))
		rows["speech "+name] = quiet(synth.Voice(n, rate, seed), 0.4)
		rows["music "+name] = quiet(synth.Music(n, rate, 1.5+0.4*float64(seed), seed), 0.5)
		white := synth.Scene{RateHz: rate, LengthS: 30, SNRdB: 0, Noise: synth.Colour(seed % 3), Speed: func(float64) float64 { return 0 }, CircumferenceM: 2, ClicksPerTurn: 20, Seed: seed}
		rows["noise "+name] = white.Make()
	}
	for name, sound := range rows {
		t.Run(name, func(t *testing.T) {
			t.Parallel()
			h, err := hear(rate, sound)
			if err != nil {
				var e *Error
				if !errors.As(err, &e) || e.Kind != NoClicks {
					t.Errorf("%v", err)
				}
				return
			}
			for _, s := range h.Stretches {
				if s.Falls {
					t.Errorf("taken for a coast-down from %.1f to %.1f s, %.1f to %.1f clicks/s", s.FromS(), s.ToS(), s.Curve[0].RateHz, s.Curve[len(s.Curve)-1].RateHz)
				}
			}
		})
	}
}

func TestErrors(t *testing.T) {
	if _, err := NewListener(4000); kindOf(err) != OddRate {
		t.Errorf("4 kHz: %v", err)
	}
	for _, row := range []struct {
		name  string
		sound []float32
		kind  ErrorKind
	}{
		{"nothing", nil, TooShort},
		{"two seconds", make([]float32, 16000), TooShort},
		{"silence", make([]float32, 10*8000), Silent},
		{"no numbers", nans(10 * 8000), Silent},
	} {
		if _, err := hear(8000, row.sound); kindOf(err) != row.kind || err.Error() == "" {
			t.Errorf("%s: %v", row.name, err)
		}
	}
}

func kindOf(err error) ErrorKind {
	var e *Error
	if errors.As(err, &e) {
		return e.Kind
	}
	return 255
}

func nans(n int) []float32 {
	out := make([]float32, n)
	for i := range out {
		out[i] = float32(math.NaN())
	}
	return out
}

// seeds is how often chance is tried: in the full run more.
func seeds() uint64 {
	if os.Getenv("HILLWRIGHT_FULL") != "" {
		return 16
	}
	return 4
}
