package motor

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

// The torque that holds a temperature, drawn from the circuit at that
// temperature, must settle there.
func TestHoldTorqueSettlesThere(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		c, h, m := anyCircuit(t), anyHeat(t), anyMoment(t)
		airC, airMps := rapid.Float64Range(-20, 40).Draw(t, "air"), rapid.Float64Range(0, 15).Draw(t, "m/s")
		nm := c.HoldTorque(h, h.EaseFromC, m.radPerS, airC, airMps)
		if nm > 0 {
			f := c.Draw(nm, m.radPerS, h.EaseFromC)
			if w, _ := h.Settle(airC, airMps, f.WindingW, f.CaseW); !(math.Abs(w-h.EaseFromC) < 1e-7) {
				t.Errorf("%g N·m settles at %.9g °C, want %.9g", nm, w, h.EaseFromC)
			}
		}
		if warm := c.HoldTorque(h, h.EaseFromC, m.radPerS, airC+5, airMps); !(warm >= 0 && warm <= nm) {
			t.Errorf("warmer air holds %g N·m, cooler %g", warm, nm)
		}
		if fast := c.HoldTorque(h, h.EaseFromC, m.radPerS, airC, airMps+5); fast < nm*(1-1e-12) {
			t.Errorf("more wind holds %g N·m, less %g", fast, nm)
		}
	})
}

// The motor run in small steps with its torque limit easing off must come to
// rest where EasedTorque says.
func TestEasedTorqueIsWhereItEnds(t *testing.T) {
	const airC, airMps = 25, 1.4
	for _, row := range []struct {
		m           *Motor
		nm, radPerS float64
	}{{&gearedMotor, 45, 4}, {&directMotor, 45, 4}, {&crankMotor, 85, 6}, {&crankMotor, 20, 7}, {&gearedMotor, 10, 18}} {
		c := completed(row.m)
		h, _ := CompleteHeat(row.m, math.NaN())
		w, k, nm := float64(airC), float64(airC), 0.0
		for range 40000 {
			nm = row.nm * h.Ease(w)
			f := c.Draw(nm, row.radPerS, w)
			w, k = h.Step(w, k, airC, airMps, f.WindingW, f.CaseW, 1)
		}
		gotNm, gotC := c.EasedTorque(&h, row.nm, row.radPerS, airC, airMps)
		same(t, "torque at the end", gotNm, nm, 1e-6)
		same(t, "temperature at the end", gotC, w, 1e-6)
	}
}

// What guides tell of, common practice, no source: a hub motor on a slow steep
// climb eases off within a few minutes, a crank motor at full torque holds
// longer, and at its rated power every motor holds for good.
func TestMinutesUntilItEasesOff(t *testing.T) {
	minutes := func(m *Motor, nm, radPerS, airMps float64) float64 {
		h, _ := CompleteHeat(m, math.NaN())
		return completed(m).SecondsToEasing(&h, nm, radPerS, 20, 20, 20, airMps) / 60
	}
	hub, direct := minutes(&gearedMotor, 40, 4.1, 1.4), minutes(&directMotor, 40, 4.1, 1.4)
	crank := minutes(&crankMotor, 85, 6.3, 2)
	inside(t, "geared hub at 40 N·m and 5 km/h", hub, 1.5, 6)
	inside(t, "direct drive at 40 N·m and 5 km/h", direct, 2, 8)
	inside(t, "crank motor at full torque", crank, 3, 12)
	for _, each := range []float64{
		minutes(&gearedMotor, 250/16.3, 16.3, 5.5), minutes(&directMotor, 250/16.3, 16.3, 5.5), minutes(&crankMotor, 250/7.85, 7.85, 4),
	} {
		if !math.IsInf(each, 1) {
			t.Errorf("eases off after %g min at its rated power", each)
		}
	}
	// A guide's tenth run of the day: the motor that is still warm eases off
	// sooner, and a pause gives the minutes back.
	h, _ := CompleteHeat(&gearedMotor, math.NaN())
	c := completed(&gearedMotor)
	w, k := 90.0, 70.0
	warm := c.SecondsToEasing(&h, 40, 4.1, w, k, 20, 1.4)
	w, k = h.Step(w, k, 20, 0, 0, 0, 1800)
	rested := c.SecondsToEasing(&h, 40, 4.1, w, k, 20, 1.4)
	if !(warm < rested/2 && rested < hub*60) {
		t.Errorf("warm %g s, after half an hour's pause %g s, cold %g s", warm, rested, hub*60)
	}
}
