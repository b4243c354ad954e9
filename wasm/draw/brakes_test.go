package draw

import (
	"strings"
	"testing"
)

// A brake beyond its caution is solid, one below it open; a brake that is not
// there has no bar.
func TestBrakes(t *testing.T) {
	for _, c := range []struct {
		sections    string
		set         []string
		bars, solid int
	}{
		{"400 m at 7 %", nil, 2, 0},
		{"6 km at 14 %", []string{"bike.front_brake", "rim", "bike.rear_brake", "rim", "ride.down_mps", "8", "load.mass_kg", "40"}, 2, 1},
		{"300 m at 9 %", []string{"bike.rear_brake", "none"}, 1, 1},
	} {
		for _, v := range voices {
			_, a, r, _ := real(t, c.sections, c.set...)
			n := Brakes(&a.WayDown, r, 328, v)
			checkPicture(t, n)
			if bars, solid := len(classed(n, "bar-mark")), len(classed(n, "ground-solid")); bars != c.bars || solid != c.solid {
				t.Errorf("%s %v: %d bars, %d solid, want %d, %d", c.sections, c.set, bars, solid, c.bars, c.solid)
			}
			desc := ""
			for _, k := range n.Kids {
				if k.Tag == "desc" {
					desc = k.Words()
				}
			}
			for _, s := range texts(n) {
				for _, part := range strings.Split(s.text, " · ") {
					if !strings.Contains(desc, part) {
						t.Errorf("the picture says %q, its description does not: %s", part, desc)
					}
				}
			}
		}
	}
	_, a, r, _ := real(t, "300 m at 0 %")
	if n := Brakes(&a.WayDown, r, 328, metric); n != nil {
		t.Error("brakes where nothing falls")
	}
}
