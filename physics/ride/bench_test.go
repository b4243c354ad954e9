package ride

import (
	"strconv"
	"testing"

	"hillwright/physics/hill"
)

// rolling makes a road of about some kilometres, up and down.
func rolling(km int) *hill.Profile {
	var parts []float64
	for range km {
		parts = append(parts, 300, 6, 200, 11, 200, -4, 300, -8)
	}
	return made(parts...)
}

// The cost of a ride over three decades of length: ns/m should not rise.
func BenchmarkClimb(b *testing.B) {
	for _, km := range []int{1, 10, 100} {
		b.Run(strconv.Itoa(km)+"km", func(b *testing.B) {
			r, p := trekking().rig(), rolling(km)
			for b.Loop() {
				if _, err := Climb(r, p, usual); err != nil {
					b.Fatal(err)
				}
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/p.LengthM(), "ns/m")
		})
	}
}

// What one look at the limits costs, beside which a step is measured.
func BenchmarkPull(b *testing.B) {
	r := trekking().rig()
	now := r.At(fresh(r), 0.1, 0.995)
	for b.Loop() {
		r.PullAt(2.5, 8, &now)
	}
}

func BenchmarkAt(b *testing.B) {
	r := trekking().rig()
	body := fresh(r)
	for b.Loop() {
		r.At(body, 0.1, 0.995)
	}
}
