package click

import (
	"testing"

	"hillwright/physics/synth"
)

// A coast-down of 45 s at 44.1 kHz, from samples to curve; how many times
// faster than it was ridden.
func BenchmarkListen(b *testing.B) {
	s := synth.Scene{
		RateHz: 44100, LengthS: 45, ClicksPerTurn: 36, CircumferenceM: 2.155, SNRdB: 10, Seed: 1,
		Speed: synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19}.Coast(8.5),
	}
	sound := s.Make()
	for b.Loop() {
		l, err := NewListener(s.RateHz)
		if err != nil {
			b.Fatal(err)
		}
		l.Write(sound)
		if _, err := l.Finish(); err != nil {
			b.Fatal(err)
		}
	}
	b.ReportMetric(s.LengthS*float64(b.N)/b.Elapsed().Seconds(), "x_realtime")
}
