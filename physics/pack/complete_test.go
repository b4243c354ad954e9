package pack

import (
	"math"
	"testing"
)

func TestCompleteFromTheLabel(t *testing.T) {
	for _, row := range []struct {
		volts, series float64
		c             Chemistry
	}{{24, 7, Nickel}, {36, 10, Nickel}, {48, 13, Nickel}, {50.4, 14, Nickel}, {36, 11, IronPhosphate}, {48, 15, IronPhosphate}, {51.2, 16, IronPhosphate}} {
		p, list := Complete(500, row.volts, row.c, math.NaN())
		same(t, "cells in series", p.Series, row.series, 0)
		seen := map[string]bool{}
		for _, each := range list {
			if seen[each.Path] || each.Reason == "" || each.Text == "" || !(each.Low <= each.Value && each.Value <= each.High) {
				t.Errorf("bad assumption %+v", each)
			}
			seen[each.Path] = true
		}
		if !seen["health"] || seen["nominal_v"] {
			t.Error("health must be assumed, voltage not")
		}
		// The energy that leaves at a gentle fifth of the capacity per hour is
		// what the label says, within a tenth.
		amps, got, charge, relaxV := p.CapacityAh(25)/5, 0.0, 1.0, 0.0
		for charge > 0 && p.TerminalV(charge, relaxV, amps, 25) > p.CutV*p.Series {
			got += p.TerminalV(charge, relaxV, amps, 25) * amps * 10 / 3600
			charge, relaxV = p.Step(charge, relaxV, amps, 25, 10)
		}
		if math.Abs(got/500-1) > 0.1 {
			t.Errorf("%g V %v: gives %.0f Wh of 500", row.volts, row.c, got)
		}
	}
	if p, _ := Complete(500, math.NaN(), Nickel, 0.8); p.NominalV != 36 || p.Health != 0.8 {
		t.Errorf("completed to %+v", p)
	}
}

func TestLargerPackSagsLess(t *testing.T) {
	last := math.Inf(1)
	for _, wh := range []float64{250, 400, 500, 750, 1000} {
		p := fresh(wh)
		if p.ResistanceOhm >= last {
			t.Errorf("%g Wh resists %g Ω, a smaller one %g", wh, p.ResistanceOhm, last)
		}
		last = p.ResistanceOhm
	}
}
