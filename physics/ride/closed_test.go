package ride

import (
	"math"
	"testing"

	"hillwright/physics/unit"
)

// Constant pull until the power is reached, then constant power, without drag:
// t = m·v1/F + m·(v²−v1²)/(2P), v1 = P/F. The times for 100 kg, 250 W, 7.5 m/s
// are common practice, no source.
func TestConstantPullThenConstantPower(t *testing.T) {
	for _, row := range []struct{ pullN, seconds float64 }{{210, 11.53}, {71, 13.73}} {
		const mass, watts, v = 100.0, 250.0, 7.5
		v1 := watts / row.pullN
		closed := mass*v1/row.pullN + mass*(v*v-v1*v1)/(2*watts)
		if math.Abs(closed-row.seconds) > 0.006 {
			t.Errorf("closed form gives %.3f s, the figure is %.2f", closed, row.seconds)
		}
		length := mass*v1*v1/(2*row.pullN) + mass*(v*v*v-v1*v1*v1)/(3*watts)
		a, err := Climb(pusher(row.pullN, watts), made(length, 0), Options{DownMps: 100, Charge: 1})
		if err != nil {
			t.Fatal(err)
		}
		end := a.Trace.SpeedMps[len(a.Trace.SpeedMps)-1]
		if math.Abs(end/v-1) > 1e-4 {
			t.Errorf("%g N: %.5f m/s after %.2f m, want %g", row.pullN, end, length, v)
		}
		if math.Abs(a.ClimbS/closed-1) > 1e-3 {
			t.Errorf("%g N: %.4f s, want %.4f", row.pullN, a.ClimbS, closed)
		}
	}
}

// Lifting 100 kg with 250 W: 0.2551 m/s upward, whatever the torque. Common
// practice, no source; taken at 9.8 m/s², so the power is scaled to our G.
func TestPowerDecidesHowFast(t *testing.T) {
	for _, pullN := range []float64{400, 300, 250} {
		r := pusher(pullN, 250*unit.Gravity/9.8)
		for _, row := range []struct{ percent, mps float64 }{{7, 3.65}, {22, 1.19}} {
			at := At(unit.Percent(row.percent), 0)
			r.Rider.HoldMps = 0.5
			run, ok := Settle(r, at, fresh(r), 100)
			if !ok || math.Abs(run.SpeedMps-row.mps) > 0.006 {
				t.Errorf("%g N on %g %%: %.4f m/s, want %.2f", pullN, row.percent, run.SpeedMps, row.mps)
			}
			if up := run.SpeedMps * at.sin; math.Abs(up-0.2551) > 0.0001 {
				t.Errorf("%g N on %g %%: climbs %.5f m/s, want 0.2551", pullN, row.percent, up)
			}
		}
	}
}

// Torque decides how steep: 210 N hold 21.94 %, 71 N hold 7.26 % of 100 kg at
// 9.8 m/s² (common practice, no source).
func TestPullDecidesHowSteep(t *testing.T) {
	for _, row := range []struct{ pullN, percent float64 }{{210, 21.94}, {71, 7.26}} {
		r := pusher(row.pullN*unit.Gravity/9.8, 5000)
		b := Weigh(r, At(0.05, 0), fresh(r))
		if got := float64(b.SteepestGrade) * 100; math.Abs(got-row.percent) > 0.01 {
			t.Errorf("%g N hold %.3f %%, want %.2f", row.pullN, got, row.percent)
		}
	}
}

// On a long grade the simulation ends where the steady state says, for the
// state of heat, charge and legs in which it ends.
func TestSimulationEndsInTheSteadyState(t *testing.T) {
	r := trekking().rig()
	for percent := -12.0; percent <= 21; percent++ {
		tour := newTour(r, made(2500, percent), usual)
		tour.opt.StepScale = 1
		tour.run.opt.StepScale = 1
		tour.ride()
		run, held := Settle(r, At(unit.Percent(percent), 0), &tour.run.body, usual.DownMps)
		if tour.run.stalled || !held {
			t.Fatalf("%g %%: stalled %v, steady state holds %v", percent, tour.run.stalled, held)
		}
		if v := tour.run.speed(); math.Abs(v/run.SpeedMps-1) > 0.002 {
			t.Errorf("%g %%: simulation runs %.4f m/s, steady state %.4f", percent, v, run.SpeedMps)
		}
	}
}

// What the steepest grade holds, it holds; a little more, it does not.
func TestSteepestGradeIsTheEdge(t *testing.T) {
	r := trekking().rig()
	edge := Weigh(r, At(0, 0), fresh(r)).SteepestGrade
	if s := Steady(r, edge-0.0005, usual); !s.Held {
		t.Errorf("does not hold %v, just below its steepest grade", edge-0.0005)
	}
	if s := Steady(r, edge+0.0005, usual); s.Held {
		t.Errorf("holds %v, just above its steepest grade", edge+0.0005)
	}
}
