package rule

import (
	"math"
	"testing"
)

func TestSpeeds(t *testing.T) {
	for _, row := range []struct {
		id     string
		kmh    float64
		source string
	}{
		{"eu-25", 25, "EN 15194"},
		{"gb-15mph", 24.945, "SI 2015/24 reg. 2(4): 15.5 mph"},
		{"us-1", 20 * 1.609344, "three classes, California VC 312.5"},
		{"us-3", 28 * 1.609344, "three classes, California VC 312.5"},
		{"jp-24", 24, "Road Traffic Act Enforcement Rules art. 1-3"},
		{"eu-45", 45, "Regulation (EU) 168/2013, L1e-B"},
	} {
		l, ok := ByID(row.id)
		if !ok || math.Abs(l.SpeedMps*3.6-row.kmh) > 0.0005 {
			t.Errorf("%s ends at %.4f km/h, %s says %.3f", row.id, l.SpeedMps*3.6, row.source, row.kmh)
		}
		if l.Share(l.SpeedMps) != 0 || l.Share(0) != 1 {
			t.Errorf("%s: share is not 1 at rest and 0 at the cut-off", row.id)
		}
	}
	if _, ok := ByID("no such law"); ok {
		t.Error("found a law that is not there")
	}
}

// Japan, Road Traffic Act Enforcement Rules art. 1-3: ratio 2 below 10 km/h,
// 2 − (v−10)/7 up to 24, 0 above.
func TestFallingRatio(t *testing.T) {
	l, _ := ByID("jp-24")
	for _, row := range []struct{ kmh, ratio float64 }{
		{5, 2}, {10, 2}, {15, 1.285714286}, {17, 1}, {20, 0.571428571}, {24, 0}, {30, 0},
	} {
		got, limited := l.Ratio(row.kmh / 3.6)
		if !limited || math.Abs(got-row.ratio) > 1e-9 {
			t.Errorf("%g km/h: ratio %.9f, want %.9f", row.kmh, got, row.ratio)
		}
	}
}

func TestShareFallsInAStraightLine(t *testing.T) {
	l, _ := ByID("eu-25")
	if got := l.Share(24 / 3.6); math.Abs(got-0.5) > 1e-12 {
		t.Errorf("half-way down the taper the share is %g", got)
	}
	if _, limited := l.Ratio(3); limited {
		t.Error("EN 15194 sets no ratio")
	}
}
