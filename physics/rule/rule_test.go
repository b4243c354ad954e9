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
		{"us-2", 20 * 1.609344, "three classes, California VC 312.5"},
		{"us-3", 28 * 1.609344, "three classes, California VC 312.5"},
		{"jp-24", 24, "Road Traffic Act Enforcement Rules art. 1-3"},
		{"eu-l1e-a", 25, "Regulation (EU) 168/2013, L1e-A"},
		{"eu-45", 45, "Regulation (EU) 168/2013, L1e-B"},
		{"ch-25", 25, "VTS art. 18 (from memory)"},
		{"ch-45", 45, "VTS art. 18 (from memory)"},
		{"au-25", 25, "Australian Design Rule (from memory)"},
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

// Power, factor, tolerances and the ways to the end of assistance, as read.
func TestFigures(t *testing.T) {
	get := func(id string) Law {
		l, ok := ByID(id)
		if !ok {
			t.Fatalf("no law %q", id)
		}
		return l
	}
	eu, us, fast, light := get("eu-25"), get("us-1"), get("eu-45"), get("eu-l1e-a")
	for _, row := range []struct {
		name, source string
		got, want    float64
	}{
		{"EU power", "EN 15194: 0.25 kW", eu.PowerW, 250},
		{"EU start-up assistance", "EN 15194 clause 4.2.12: 6 km/h", eu.AloneMps * 3.6, 6},
		{"EU end of pedalling", "EN 15194 clause 4.2.13.1: 2 m", eu.StopsWithinM, 2},
		{"EU end of pedalling with brake switches", "EN 15194 clause 4.2.13.1: 5 m", eu.StopsWithinSwitchM, 5},
		{"EU speed tolerance", "EN 15194: 10 %", eu.SpeedTolerance, 0.10},
		{"EU power tolerance", "EN 15194: 5 %", eu.PowerTolerance, 0.05},
		{"GB power", "SI 2015/24 reg. 2(4)", get("gb-15mph").PowerW, 250},
		{"US power", "16 CFR 1512.2(a)(2): 750 W", us.PowerW, 750},
		{"L1e-A power", "Regulation (EU) 168/2013 (secondary)", light.PowerW, 1000},
		{"L1e-B power", "Regulation (EU) 168/2013 (secondary)", fast.PowerW, 4000},
		{"L1e-B factor", "at most 4 (secondary)", fast.MaxRatio, 4},
	} {
		if math.Abs(row.got-row.want) > 1e-9 {
			t.Errorf("%s: %g, %s says %g", row.name, row.got, row.source, row.want)
		}
	}
}

func TestAlone(t *testing.T) {
	eu, _ := ByID("eu-25")
	us1, _ := ByID("us-1")
	us2, _ := ByID("us-2")
	for _, row := range []struct {
		name string
		got  bool
		want bool
	}{
		{"EU at rest", eu.Alone(0), true},
		{"EU at a walk", eu.Alone(5.9 / 3.6), true},
		{"EU at a trot", eu.Alone(6.1 / 3.6), false},
		{"US class 1 at rest", us1.Alone(0), false},
		{"US class 2 at 19 mph", us2.Alone(19 * mph), true},
		{"US class 2 at 21 mph", us2.Alone(21 * mph), false},
	} {
		if row.got != row.want {
			t.Errorf("%s: %v", row.name, row.got)
		}
	}
}

func TestRegions(t *testing.T) {
	seen := 0
	for region, first := range map[string]string{"EU": "eu-25", "GB": "gb-15mph", "US": "us-1", "JP": "jp-24", "CH": "ch-25", "AU": "au-25"} {
		found := ForRegion(region)
		if len(found) == 0 || found[0].ID != first {
			t.Errorf("%s: %v, want %s first", region, found, first)
		}
		seen += len(found)
	}
	if seen != len(All()) {
		t.Errorf("the regions have %d laws, all together are %d", seen, len(All()))
	}
	if len(ForRegion("XX")) != 0 {
		t.Error("a region that is not there has laws")
	}
	for _, l := range All() {
		if l.Text == "" || l.AsOf == "" || l.Region == "" {
			t.Errorf("%s: text, date or region is missing", l.ID)
		}
	}
}
