package gear

import (
	"math"
	"testing"
)

// Roll-outs of common practice, from memory: charts for cycle computers, which
// scatter by about 1.5 % between each other.
func TestCircumferenceAgainstCharts(t *testing.T) {
	for _, row := range []struct {
		tyre  Tyre
		metre float64
	}{
		{Tyre{25, 622}, 2.105}, {Tyre{32, 622}, 2.155}, {Tyre{47, 622}, 2.220}, {Tyre{50, 559}, 2.055}, {Tyre{47, 406}, 1.565},
	} {
		if got := row.tyre.Circumference(); math.Abs(got/row.metre-1) > 0.015 {
			t.Errorf("%d-%d: %.3f m, charts say %.3f", row.tyre.WidthMM, row.tyre.BeadSeatMM, got, row.metre)
		}
	}
}

// ISO 5775 bead seats (540 and 547 from memory).
func TestBeadSeats(t *testing.T) {
	for _, d := range []int{203, 254, 288, 305, 355, 406, 457, 507, 540, 547, 559, 571, 584, 590, 597, 599, 622, 630, 635} {
		if !(Tyre{37, d}).Known() {
			t.Errorf("bead seat %d is not known", d)
		}
	}
	for _, odd := range []Tyre{{37, 623}, {10, 622}, {200, 622}, {}} {
		if odd.Known() {
			t.Errorf("%v should not be known", odd)
		}
	}
}

// Development by its definition: chainring/sprocket × circumference. 38/19 on
// a 2.1 m wheel covers 4.2 m a turn.
func TestGears(t *testing.T) {
	gears := Train{Rings: []int{38}, Sprockets: []int{11, 19, 38}}.Gears()
	want := []struct {
		label string
		dev   float64
	}{{"38/38", 2.1}, {"38/19", 4.2}, {"38/11", 38.0 / 11 * 2.1}}
	if len(gears) != len(want) {
		t.Fatalf("%d gears, want %d", len(gears), len(want))
	}
	for i, w := range want {
		if gears[i].Label != w.label || math.Abs(gears[i].Development(2.1)-w.dev) > 1e-12 {
			t.Errorf("gear %d is %s with %.3f m, want %s with %.3f", i, gears[i].Label, gears[i].Development(2.1), w.label, w.dev)
		}
	}
}

func TestNearlyAlikeGearsAreOne(t *testing.T) {
	// 44/22 and 32/16 are both 2.
	gears := Train{Rings: []int{32, 44}, Sprockets: []int{16, 22}}.Gears()
	if len(gears) != 3 {
		t.Errorf("%d gears, want 3: %v", len(gears), gears)
	}
}

func TestHubGearsMultiply(t *testing.T) {
	gears := Train{Rings: []int{40}, Sprockets: []int{20}, HubRatios: []float64{0.5, 1, 1.6}}.Gears()
	if len(gears) != 3 || gears[0].Ratio != 1 || gears[2].Ratio != 3.2 || gears[1].Label != "40/20 · 2" {
		t.Errorf("hub gears are %v", gears)
	}
}
