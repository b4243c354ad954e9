package click

import (
	"fmt"
	"math"
	"testing"
	"time"

	"hillwright/physics/synth"
)

func heardOf(t testing.TB, s synth.Scene) (*Heard, error) {
	l, err := NewListener(s.RateHz)
	if err != nil {
		t.Fatal(err)
	}
	l.Write(s.Make())
	return l.Finish()
}

func TestTry(t *testing.T) {
	base := synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19}
	scene := func(f func(*synth.Scene)) synth.Scene {
		v := base.Coast(8.5)
		s := synth.Scene{RateHz: 44100, LengthS: 45, ClicksPerTurn: 36, CircumferenceM: 2.155, Speed: v, SNRdB: 10, Seed: 1}
		f(&s)
		return s
	}
	for _, row := range []struct {
		name string
		s    synth.Scene
	}{
		{"plain", scene(func(s *synth.Scene) {})},
		{"clean", scene(func(s *synth.Scene) { s.SNRdB = 40 })},
		{"18", scene(func(s *synth.Scene) { s.ClicksPerTurn = 18 })},
		{"72", scene(func(s *synth.Scene) { s.ClicksPerTurn = 72 })},
		{"wind", scene(func(s *synth.Scene) { s.Noise = synth.Wind })},
		{"tyre", scene(func(s *synth.Scene) { s.Noise = synth.Tyre })},
		{"5dB", scene(func(s *synth.Scene) { s.SNRdB = 5 })},
		{"0dB", scene(func(s *synth.Scene) { s.SNRdB = 0 })},
		{"-5dB", scene(func(s *synth.Scene) { s.SNRdB = -5 })},
		{"reverb", scene(func(s *synth.Scene) { s.ReverbS = 0.4 })},
		{"missed", scene(func(s *synth.Scene) { s.Missed = 0.1; s.Doubled = 0.1 })},
		{"slaps", scene(func(s *synth.Scene) { s.SlapsHz = 2 })},
		{"voice", scene(func(s *synth.Scene) { s.Voice = 1 })},
		{"uneven", scene(func(s *synth.Scene) { s.Uneven = 0.6 })},
		{"pump", scene(func(s *synth.Scene) { s.Gain = func(t float64) float64 { return math.Pow(10, 0.6*math.Sin(2*math.Pi*t/3)/2-.3) } })},
		{"16k", scene(func(s *synth.Scene) { s.RateHz = 16000 })},
		{"8k", scene(func(s *synth.Scene) { s.RateHz = 8000 })},
		{"whole", scene(func(s *synth.Scene) { s.LengthS = 110 })},
		{"pedal", scene(func(s *synth.Scene) {
			v := base.Coast(8.5)
			s.LengthS = 60
			s.Speed = func(t float64) float64 {
				if t < 10 {
					return 8.5 * t / 10
				}
				return v(t - 10)
			}
			s.Pedalling = func(t float64) bool { return t < 10 }
		})},
	} {
		sound := row.s.Make()
		l, _ := NewListener(row.s.RateHz)
		began := time.Now()
		l.Write(sound)
		h, err := l.Finish()
		took := time.Since(began).Seconds()
		if err != nil {
			fmt.Println(row.name, err)
			continue
		}
		for _, st := range h.Stretches {
			perM := float64(row.s.ClicksPerTurn) / row.s.CircumferenceM
			bad, sum, sum2, worst := 0, 0.0, 0.0, 0.0
			for _, p := range st.Points {
				z := (p.RateHz - row.s.Speed(p.AtS)*perM) / p.ErrorHz
				sum += z
				sum2 += z * z
				worst = math.Max(worst, math.Abs(z))
			}
			for _, p := range st.Curve {
				if math.Abs(p.RateHz/(row.s.Speed(p.AtS)*perM)-1) > 0.01 {
					bad++
				}
			}
			n := float64(len(st.Points))
			mid := st.Points[len(st.Points)/2]
			fmt.Printf("%-8s %5.2f-%5.2f falls %v sure %.2f points %d curve %d bad %d pull mean %.2f sd %.2f worst %.1f  err %.3f%% v end %.2f x%.0f\n", row.name, st.FromS(), st.ToS(), st.Falls, st.SureOf, len(st.Points), len(st.Curve), bad, sum/n, math.Sqrt(sum2/n-sum*sum/n/n), worst, 100*mid.ErrorHz/mid.RateHz, row.s.Speed(st.ToS()), row.s.LengthS/took)
		}
	}
}
