package motor

import (
	"math"
	"testing"
)

func TestTorqueThenPower(t *testing.T) {
	m := Motor{Kind: Crank, TorqueNm: 60, PowerW: 300, CadenceHigh: 110}
	for _, row := range []struct{ radPerS, nm float64 }{{0, 60}, {5, 60}, {10, 30}} {
		if got := m.Torque(row.radPerS); math.Abs(got-row.nm) > 1e-9 {
			t.Errorf("at %g rad/s %g N·m, want %g", row.radPerS, got, row.nm)
		}
	}
	if (&Motor{Kind: None, TorqueNm: 60, PowerW: 300}).Torque(3) != 0 {
		t.Error("no motor gives torque")
	}
}

func TestShareOfCadence(t *testing.T) {
	crank := Motor{Kind: Crank, CadenceHigh: 100}
	for _, row := range []struct{ cadence, share float64 }{{0, 1}, {100, 1}, {105, 0.5}, {110, 0}, {150, 0}} {
		if got := crank.Share(row.cadence); math.Abs(got-row.share) > 1e-12 {
			t.Errorf("at %g turns/min share %g, want %g", row.cadence, got, row.share)
		}
	}
	hub := Motor{Kind: RearHub, CadenceHigh: 100}
	if hub.Share(150) != 1 {
		t.Error("a hub motor does not care about cadence")
	}
}
