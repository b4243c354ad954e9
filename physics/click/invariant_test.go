package click

import (
	"math"
	"math/cmplx"
	"slices"
	"testing"

	"gonum.org/v1/gonum/dsp/fourier"
	"pgregory.net/rapid"

	"hillwright/physics/synth"
)

// The own transform against gonum's.
func TestTransformAgainstLibrary(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := 1 << rapid.IntRange(1, 11).Draw(t, "bits")
		a := rapid.SliceOfN(rapid.Float64Range(-10, 10), n, n).Draw(t, "a")
		b := rapid.SliceOfN(rapid.Float64Range(-10, 10), n, n).Draw(t, "b")
		first, second := make([]float64, n/2), make([]float64, n/2)
		newFFT(n).powers(slices.Clone(a), slices.Clone(b), first, second)
		for _, row := range []struct{ in, got []float64 }{{a, first}, {b, second}} {
			want := fourier.NewFFT(n).Coefficients(nil, row.in)
			for k, p := range row.got {
				w := cmplx.Abs(want[k])
				if math.Abs(p-w*w) > 1e-9*(1+w*w)*float64(n) {
					t.Fatalf("n %d, line %d: power %v, gonum %v", n, k, p, w*w)
				}
			}
		}
	})
}

// The rate against the highest line of gonum's spectrum of the sound's own
// envelope, in windows so short that the rate hardly changes: another way to it
// that shares nothing but the samples.
func TestRateAgainstLibrarySpectrum(t *testing.T) {
	s := scene(func(s *synth.Scene) { s.LengthS, s.SNRdB, s.Noise = 30, 20, synth.White })
	sound := s.Make()
	h, err := hear(s.RateHz, sound)
	if err != nil {
		t.Fatal(err)
	}
	const every, n = 8, 1024
	hz := float64(s.RateHz) / every
	checked := 0
	for _, p := range h.Stretches[0].Curve {
		from := int((p.AtS - n/hz/2) * float64(s.RateHz))
		if from < 0 || from+n*every > len(sound) {
			continue
		}
		window := make([]float64, 8*n) // padded, for fine lines
		for i := range n {
			e := 0.0
			for _, x := range sound[from+i*every : from+(i+1)*every] {
				e += math.Abs(float64(x))
			}
			window[i] = e * (0.5 - 0.5*math.Cos(2*math.Pi*float64(i)/n))
		}
		lines := fourier.NewFFT(len(window)).Coefficients(nil, window)
		best, at := 0.0, 0
		for k := int(p.RateHz * 0.8 / hz * 8 * n); k < int(p.RateHz*1.2/hz*8*n); k++ {
			if a := cmplx.Abs(lines[k]); a > best {
				best, at = a, k
			}
		}
		if got := float64(at) * hz / (8 * n); math.Abs(got/p.RateHz-1) > 0.006 {
			t.Errorf("at %.2f s: %.2f clicks/s, the spectrum's highest line is at %.2f", p.AtS, p.RateHz, got)
		}
		checked++
	}
	if checked < 80 {
		t.Errorf("%d windows compared, want most of 120", checked)
	}
}

// How the samples come in parts changes nothing.
func TestPartsChangeNothing(t *testing.T) {
	s := scene(func(s *synth.Scene) { s.LengthS, s.RateHz = 8, 11025 })
	sound := s.Make()
	whole, err := hear(s.RateHz, sound)
	if err != nil {
		t.Fatal(err)
	}
	want := whole.Flat()
	for _, part := range []int{1, 7, 1000, 4096, len(sound) / 2} {
		l, _ := NewListener(s.RateHz)
		for left := sound; len(left) > 0; {
			n := min(part, len(left))
			l.Write(left[:n])
			left = left[n:]
		}
		h, err := l.Finish()
		if err != nil || !slices.Equal(h.Flat(), want) {
			t.Fatalf("in parts of %d it sounds otherwise (%v)", part, err)
		}
	}
}

// Louder or softer by any factor, the rates are the same; later, they are the
// same later.
func TestLoudnessAndTimeShift(t *testing.T) {
	s := scene(func(s *synth.Scene) { s.LengthS, s.RateHz = 12, 16000 })
	sound := s.Make()
	want, err := hear(s.RateHz, sound)
	if err != nil {
		t.Fatal(err)
	}
	for _, by := range []float32{0.02, 0.3, 3} {
		other := make([]float32, len(sound))
		for i, x := range sound {
			other[i] = by * x
		}
		h, err := hear(s.RateHz, other)
		if err != nil {
			t.Fatal(err)
		}
		same(t, want.Stretches[0].Curve, h.Stretches[0].Curve, 0, 1e-3)
	}
	later := append(make([]float32, 3*s.RateHz), sound...)
	h, err := hear(s.RateHz, later)
	if err != nil {
		t.Fatal(err)
	}
	same(t, want.Stretches[0].Curve, h.Stretches[0].Curve, 3, 5e-3)
}

func same(t *testing.T, a, b []Point, laterS, part float64) {
	t.Helper()
	k := 0
	for _, p := range a[2 : len(a)-2] {
		for k+2 < len(b) && b[k+1].AtS < p.AtS+laterS {
			k++
		}
		x, y := b[k], b[k+1]
		rate := x.RateHz + (p.AtS+laterS-x.AtS)/(y.AtS-x.AtS)*(y.RateHz-x.RateHz)
		if math.Abs(rate/p.RateHz-1) > part {
			t.Errorf("at %.2f s %.3f clicks/s, %.3f in the other", p.AtS, p.RateHz, rate)
		}
	}
}

// What is kept of an hour stays below 40 MB, and beyond two hours it says so.
func TestMemoryIsBounded(t *testing.T) {
	l, err := NewListener(8000)
	if err != nil {
		t.Fatal(err)
	}
	second := make([]float32, 8000)
	c := uint32(1)
	for i := range second {
		c = c*1664525 + 1013904223
		second[i] = float32(int32(c)) / (1 << 33)
	}
	for range 600 {
		l.Write(second)
	}
	if kept := cap(l.onset) + cap(l.level) + cap(l.rates.scores); kept > 600*10_000 {
		t.Errorf("%d bytes kept of each second, want at most 10,000", kept/600)
	}
	l.count = longestS * 8000
	l.onset = append(l.onset, make([]uint8, int(longestS*l.envelopeHz()))...)
	l.rates.next = 1 << 30
	if l.Full() {
		t.Error("full before its time")
	}
	l.Write(second)
	if _, err := l.Finish(); kindOf(err) != TooLong || !l.Full() {
		t.Errorf("two hours: %v", err)
	}
}
