package rider

import (
	"math"
	"testing"
)

var steady = Rider{MassKg: 80, PowerW: 150, CadenceLow: 45, CadenceLiked: 70, CadenceHigh: 100, CrankM: 0.17}

// The whole weight on the forward pedal through half a turn has the mean lever
// (2/π)·crank, whatever the rider: integrate it.
func TestTorqueLimitAgainstTheIntegral(t *testing.T) {
	const n = 100000
	sum := 0.0
	for i := range n {
		sum += math.Abs(math.Sin(2 * math.Pi * (float64(i) + 0.5) / n))
	}
	want := sum / n * 80 * 9.80665 * 0.17
	if got := steady.TorqueLimit(); math.Abs(got/want-1) > 1e-8 {
		t.Errorf("torque limit %.4f N·m, the integral gives %.4f", got, want)
	}
}

func TestPowerByCadence(t *testing.T) {
	limit := steady.TorqueLimit()
	for _, row := range []struct{ cadence, watts float64 }{
		{0, 0}, {5, limit * 5 * math.Pi / 30}, {60, 150}, {100, 150}, {107.5, 75}, {115, 0}, {200, 0},
	} {
		if got := steady.Power(row.cadence); math.Abs(got-row.watts) > 1e-9 {
			t.Errorf("at %g turns/min %.4f W, want %.4f", row.cadence, got, row.watts)
		}
	}
}
