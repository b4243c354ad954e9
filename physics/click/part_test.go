package click

import (
	"math"
	"testing"

	"hillwright/physics/synth"
)

// The loudest slap is a full value of the envelope, not one that ran over.
func TestEnvelopeHoldsASlap(t *testing.T) {
	f := newFront(16000)
	c := uint32(1)
	noise := func(loud float64) float64 {
		c = c*1664525 + 1013904223
		return loud * float64(int32(c)) / (1 << 31)
	}
	most := 0
	for i := range 16000 {
		loud := 0.001
		if i > 12000 && i < 12200 {
			loud = 1
		}
		if f.take(noise(loud)) {
			v := int(f.onset())
			if i > 12050 && i < 12190 {
				most = max(most, v)
				if v < 200 {
					t.Fatalf("within the slap the envelope is %d", v)
				}
			}
		}
	}
	if most != 255 {
		t.Errorf("the slap reaches %d, want 255", most)
	}
}

// A blip of two columns is not worth a path; four are. A path goes on over a
// gap.
func TestPathCosts(t *testing.T) {
	for _, row := range []struct {
		columns []int
		want    int
	}{{[]int{20}, 0}, {[]int{20, 21}, 0}, {[]int{20, 21, 22, 23}, 1}, {[]int{10, 11, 12, 13, 14, 15, 20, 21, 22, 23, 24, 25}, 1}, {[]int{5, 6, 7, 8, 9, 40, 41, 42, 43, 44}, 2}} {
		r := newRates(2756)
		r.scores = make([]uint8, 60*len(r.grid))
		for _, c := range row.columns {
			r.scores[c*len(r.grid)+100] = 255
		}
		if got := follow(&r); len(got) != row.want {
			t.Errorf("columns %v: %d paths, want %d", row.columns, len(got), row.want)
		}
	}
}

// What wavers as no wheel can is no coast-down, nor what was found here and
// there only.
func TestFallsAsAWheel(t *testing.T) {
	course := func(waver float64, every int) (curve, points []Point) {
		for i := range 80 {
			x := float64(i) * 0.4
			p := Point{x, 140*math.Exp(-x/20) + waver*140*math.Exp(-x/20)*math.Sin(2.1*x), 0.05}
			curve = append(curve, p)
			if i%every == 0 {
				points = append(points, p)
			}
		}
		return curve, points
	}
	if c, p := course(0, 1); !falls(c, p) {
		t.Error("an even fall is none")
	}
	if c, p := course(0.02, 1); falls(c, p) {
		t.Error("a wavering fall is taken")
	}
	if c, p := course(0, 3); falls(c, p) {
		t.Error("a fall found here and there is taken")
	}
	if c, p := course(0, 1); falls(c[:12], p[:12]) {
		t.Error("five seconds are taken")
	}
}

// The rate that is fitted to a window against the truth, also where it changes
// fast.
func TestFitOfAWindow(t *testing.T) {
	s := synth.Scene{RateHz: 22050, LengthS: 4, ClicksPerTurn: 30, CircumferenceM: 2, SNRdB: 20, Seed: 2, Speed: func(t float64) float64 { return 6 - 0.9*t }}
	l, err := NewListener(s.RateHz)
	if err != nil {
		t.Fatal(err)
	}
	l.Write(s.Make())
	f := &fitter{onset: l.onset, hz: l.envelopeHz()}
	for from := 0.5; from < 3; from += 0.3 {
		mid := from + 0.3
		truth, slope := s.Speed(mid)*15, -0.9*15
		got, ok := f.fit(from, from+0.6, truth*1.01, slope*0.7)
		if !ok || math.Abs(got.rateHz-truth) > 0.15 || math.Abs(got.slope-slope) > 2.5 {
			t.Errorf("at %.1f s: %.2f clicks/s, %.1f/s²; truth %.2f, %.1f", mid, got.rateHz, got.slope, truth, slope)
		}
	}
}
