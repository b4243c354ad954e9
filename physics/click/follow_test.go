package click

import (
	"math"
	"testing"

	"hillwright/physics/synth"
)

// a bike of the tests: 105 kg, 36 clicks per turn, 2.155 m.
var bike = synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19}

func scene(change func(*synth.Scene)) synth.Scene {
	s := synth.Scene{
		RateHz: 22050, LengthS: 30, ClicksPerTurn: 36, CircumferenceM: 2.155, Speed: bike.Coast(8.5), SNRdB: 10, Noise: synth.Tyre, Seed: 1,
	}
	if change != nil {
		change(&s)
	}
	return s
}

func hear(rateHz int, sound []float32) (*Heard, error) {
	l, err := NewListener(rateHz)
	if err != nil {
		return nil, err
	}
	l.Write(sound)
	return l.Finish()
}

// within is the share of a coast, by time, over which a curve says the rate to
// a part; a curve says nothing beyond its ends and in gaps over a second.
func within(s *synth.Scene, curve []Point, fromS, toS, part float64) float64 {
	perM := float64(s.ClicksPerTurn) / s.CircumferenceM
	good, all, k := 0.0, 0.0, 0
	for t := fromS; t < toS; t += 0.05 {
		all++
		for k+2 < len(curve) && curve[k+1].AtS < t {
			k++
		}
		a, b := curve[k], curve[k+1]
		if t < a.AtS-0.051 || t > b.AtS+0.051 || b.AtS-a.AtS > 1 {
			continue
		}
		rate := a.RateHz + (t-a.AtS)/(b.AtS-a.AtS)*(b.RateHz-a.RateHz)
		if math.Abs(rate/(s.Speed(t)*perM)-1) < part {
			good++
		}
	}
	return good / all
}

// The rate is right to 1 % over 95 % of the coast, whatever else is heard.
func TestFollowsThrough(t *testing.T) {
	slow := bike.Coast(8.5)
	stopS := 0.0
	for slow(stopS) > 0.6 {
		stopS += 0.1
	}
	for _, row := range []struct {
		name     string
		from, to float64
		s        synth.Scene
	}{
		{"white noise", 0, 30, scene(func(s *synth.Scene) { s.Noise = synth.White })},
		{"tyre noise", 0, 30, scene(nil)},
		{"wind", 0, 30, scene(func(s *synth.Scene) { s.Noise = synth.Wind })},
		{"noise as loud as the clicks", 0, 30, scene(func(s *synth.Scene) { s.SNRdB = 0; s.Noise = synth.White })},
		{"18 clicks", 0, 30, scene(func(s *synth.Scene) { s.ClicksPerTurn = 18 })},
		{"24 clicks", 0, 30, scene(func(s *synth.Scene) { s.ClicksPerTurn = 24 })},
		{"a card on 32 spokes", 0, 30, scene(func(s *synth.Scene) { s.ClicksPerTurn = 32; s.Jitter = 0.03 })},
		{"54 clicks", 0, 30, scene(func(s *synth.Scene) { s.ClicksPerTurn = 54 })},
		{"72 clicks", 0, 30, scene(func(s *synth.Scene) { s.ClicksPerTurn = 72 })},
		{"120 clicks", 0, 30, scene(func(s *synth.Scene) { s.ClicksPerTurn = 120 })},
		{"a hall", 0, 30, scene(func(s *synth.Scene) { s.ReverbS = 0.5 })},
		{"a tenth missed, a tenth doubled", 0, 30, scene(func(s *synth.Scene) { s.Missed, s.Doubled = 0.1, 0.1 })},
		{"the chain slaps", 0, 30, scene(func(s *synth.Scene) { s.SlapsHz = 2 })},
		{"somebody talks", 0, 30, scene(func(s *synth.Scene) { s.Voice = 1 })},
		{"uneven clicks", 0, 30, scene(func(s *synth.Scene) { s.Uneven = 0.6 })},
		{"gain that pumps by 12 dB", 0, 30, scene(func(s *synth.Scene) {
			s.Gain = func(t float64) float64 { return math.Pow(10, 0.3*math.Sin(2*math.Pi*t/3)) }
		})},
		{"gain that steps", 0, 30, scene(func(s *synth.Scene) {
			s.Gain = func(t float64) float64 { return []float64{1, 0.25}[int(t/7)%2] }
		})},
		{"8 kHz", 0, 30, scene(func(s *synth.Scene) { s.RateHz = 8000 })},
		{"16 kHz", 0, 30, scene(func(s *synth.Scene) { s.RateHz = 16000 })},
		{"44.1 kHz", 0, 30, scene(func(s *synth.Scene) { s.RateHz = 44100 })},
		{"48 kHz", 0, 30, scene(func(s *synth.Scene) { s.RateHz = 48000 })},
		{"down to 0.6 m/s", 0, stopS, scene(func(s *synth.Scene) { s.LengthS = stopS + 5 })},
		{"pedalling first, a brake last", 10, 50, scene(func(s *synth.Scene) {
			s.LengthS = 58
			s.Speed = func(t float64) float64 {
				switch {
				case t < 10:
					return 8.5 * t / 10
				case t < 50:
					return slow(t - 10)
				}
				return max(0, slow(40)-2.5*(t-50))
			}
			s.Pedalling = func(t float64) bool { return t < 10 }
		})},
	} {
		t.Run(row.name, func(t *testing.T) {
			t.Parallel()
			h, err := hear(row.s.RateHz, row.s.Make())
			if err != nil {
				t.Fatal(err)
			}
			best := 0.0
			for _, s := range h.Stretches {
				if s.Falls {
					best = max(best, within(&row.s, s.Curve, row.from, row.to, 0.01))
				}
			}
			if best < 0.95 {
				t.Errorf("right to 1 %% over %.1f %% of the coast in the best of %d stretches, want 95", 100*best, len(h.Stretches))
			}
		})
	}
}

// The errors that points state are those that they have: none is off by much
// more than it says, and together they are not surer than they may be.
func TestErrorsAreHonest(t *testing.T) {
	var n, square, far float64
	for seed := range 2 * seeds() {
		s := scene(func(s *synth.Scene) {
			s.Seed, s.LengthS, s.Jitter, s.Noise = seed, 25, 0.04, synth.White
			s.SNRdB = []float64{-6, -3, 0, 10}[seed%4]
		})
		h, err := hear(s.RateHz, s.Make())
		if err != nil {
			t.Fatal(err)
		}
		perM := float64(s.ClicksPerTurn) / s.CircumferenceM
		for _, p := range h.Stretches[0].Points {
			z := (p.RateHz - s.Speed(p.AtS)*perM) / p.ErrorHz
			n, square = n+1, square+z*z
			if math.Abs(z) > 3 {
				far++
			}
		}
	}
	scatter := math.Sqrt(square / n)
	t.Logf("%.0f points, pulls scatter by %.2f, %.1f %% beyond 3", n, scatter, 100*far/n)
	if scatter > 1.15 || scatter < 0.5 || far > 0.015*n {
		t.Errorf("pulls scatter by %.2f (want about 1), %.1f %% lie beyond 3", scatter, 100*far/n)
	}
}

// Where the clicks begin and end is found to a fifth of a second.
func TestEnds(t *testing.T) {
	v := bike.Coast(8)
	s := scene(func(s *synth.Scene) {
		s.LengthS = 40
		s.Speed = func(t float64) float64 {
			if t < 6.3 || t > 31.7 {
				return 0
			}
			return v(t - 6.3)
		}
	})
	h, err := hear(s.RateHz, s.Make())
	if err != nil {
		t.Fatal(err)
	}
	if len(h.Stretches) != 1 {
		t.Fatalf("%d stretches, want 1", len(h.Stretches))
	}
	if got := h.Stretches[0]; math.Abs(got.FromS()-6.3) > 0.2 || math.Abs(got.ToS()-31.7) > 0.2 {
		t.Errorf("from %.2f to %.2f s, want 6.3 to 31.7", got.FromS(), got.ToS())
	}
}

// Two coast-downs in one recording are two stretches.
func TestTwoRunsInOneRecording(t *testing.T) {
	v := bike.Coast(7)
	s := scene(func(s *synth.Scene) {
		s.LengthS = 70
		s.Speed = func(t float64) float64 {
			if t < 30 {
				return v(t)
			}
			if t < 40 {
				return 4
			}
			return v(t - 40)
		}
		s.Pedalling = func(t float64) bool { return t >= 30 && t < 40 }
	})
	h, err := hear(s.RateHz, s.Make())
	if err != nil {
		t.Fatal(err)
	}
	if len(h.Stretches) != 2 || !h.Stretches[0].Falls || !h.Stretches[1].Falls {
		t.Errorf("%d stretches, want two that fall", len(h.Stretches))
	}
}
