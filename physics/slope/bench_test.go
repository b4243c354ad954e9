package slope

import (
	"fmt"
	"math/rand/v2"
	"testing"

	"hillwright/physics/hill"
	"hillwright/physics/unit"
)

// A sample from the event's angles to the average, with the average full.
func BenchmarkSample(b *testing.B) {
	s := NewSteady(1e-9, OrientationStep)
	src := anyStream(rand.New(rand.NewPCG(1, 1)))
	src.bumps = 0
	beta := make([]float64, 4096)
	for i := range beta {
		beta[i] = src.next(float64(i)/60, 0.1) / degree
	}
	b.ReportAllocs()
	i := 0
	for b.Loop() {
		up, _ := UpOfOrientation(beta[i%len(beta)], 3)
		s.Add(float64(i)/60, up.Angle(LongEdge))
		_ = s.Average()
		i++
	}
}

func BenchmarkCombine(b *testing.B) {
	for _, n := range []int{2, 4, 20} {
		var list []Reading
		for i := range n {
			list = append(list, Reading{Grade: 0.1 + unit.Grade(i%5)*0.02, Error: 0.005})
		}
		b.Run(fmt.Sprint(n), func(b *testing.B) {
			for b.Loop() {
				if _, err := Combine(list); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}

func BenchmarkRideStretch(b *testing.B) {
	for _, n := range []int{20, 100, 1000, 10000} {
		var fixes []Fix
		for i := range n {
			fixes = append(fixes, Fix{hill.Point{LatDeg: 47 + 3e-5*float64(i), LonDeg: 8, HeightM: 400 + 0.3*float64(i), TimeS: float64(i)}, 5, 8})
		}
		b.Run(fmt.Sprint(n), func(b *testing.B) {
			for b.Loop() {
				if _, err := RideStretch(fixes, Barometric); err != nil && n != 20 {
					b.Fatal(err)
				}
			}
		})
	}
}

func BenchmarkGPX(b *testing.B) {
	entries := []Entry{pitch(0.07, 400, nowhere), pitch(0.18, 120, nowhere), pitch(0.03, 4000, nowhere)}
	for b.Loop() {
		if _, err := GPX("Mill lane", "", entries); err != nil {
			b.Fatal(err)
		}
	}
}
