package click

import (
	"runtime"
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

// An hour of sound, 12 coast-downs of 45 s with pauses; what the heap has
// claimed at the end.
func BenchmarkHour(b *testing.B) {
	s := synth.Scene{
		RateHz: 22050, LengthS: 60, ClicksPerTurn: 36, CircumferenceM: 2.155, SNRdB: 10, Seed: 1,
		Speed: synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19}.Coast(8.5),
	}
	sound := s.Make()
	for b.Loop() {
		l, err := NewListener(s.RateHz)
		if err != nil {
			b.Fatal(err)
		}
		for range 60 {
			l.Write(sound)
		}
		if _, err := l.Finish(); err != nil {
			b.Fatal(err)
		}
	}
	var m runtime.MemStats
	runtime.ReadMemStats(&m)
	b.ReportMetric(float64(m.HeapSys)/1e6, "heap-MB")
}
