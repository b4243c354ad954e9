package synth

import (
	"math"
	"slices"
	"testing"
)

func still(float64) float64 { return 5 }

// A coast-down on the level without wind has a closed form.
func TestCoastAgainstClosedForm(t *testing.T) {
	d := Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19}
	a, b := d.MassKg*gravity*d.Crr/106.8, 0.5*d.DensityKgM3*d.CdAM2/106.8
	v := d.Coast(9)
	for s := 0.0; s < 40; s += 3.7 {
		want := math.Sqrt(a/b) * math.Tan(math.Atan(9*math.Sqrt(b/a))-s*math.Sqrt(a*b))
		if math.Abs(v(s)-want) > 1e-5 {
			t.Errorf("at %v s %v m/s, closed form %v", s, v(s), want)
		}
	}
	if v(-1) != 0 || v(1000) != 0 {
		t.Error("it moves before its time or never stops")
	}
}

// The noise is as loud as it is said to be, and a seed gives the same sound.
func TestNoiseIsAsSaid(t *testing.T) {
	power := func(x []float32) (p float64) {
		for _, v := range x {
			p += float64(v) * float64(v) / float64(len(x))
		}
		return p
	}
	for _, colour := range []Colour{White, Tyre, Wind} {
		s := Scene{RateHz: 22050, LengthS: 10, ClicksPerTurn: 30, CircumferenceM: 2.1, Speed: still, SNRdB: math.Inf(1), Noise: colour, Seed: 9}
		clicks := power(s.Make())
		s.SNRdB = 3
		first := s.Make()
		if db := 10 * math.Log10(clicks/(power(first)-clicks)); math.Abs(db-3) > 0.5 {
			t.Errorf("colour %d: clicks are %.1f dB over the noise, want 3", colour, db)
		}
		if !slices.Equal(first, s.Make()) {
			t.Errorf("colour %d: the same seed sounds otherwise", colour)
		}
	}
}

// As many clicks as turns times clicks per turn.
func TestClicksAreCounted(t *testing.T) {
	s := Scene{RateHz: 8000, LengthS: 20, ClicksPerTurn: 10, CircumferenceM: 2, Speed: still, SNRdB: math.Inf(1)}
	n, quiet := 0, 1000
	for _, x := range s.Make() {
		if quiet++; math.Abs(float64(x)) > 0.02 {
			if quiet > 150 {
				n++
			}
			quiet = 0
		}
	}
	if n < 498 || n > 501 {
		t.Errorf("%d clicks in 50 turns of 10", n)
	}
}
