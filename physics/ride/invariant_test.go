package ride

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/hill"
	"hillwright/physics/motor"
	"hillwright/physics/rig"
)

func drawParts(t *rapid.T) parts {
	p := trekking()
	p.bike.Motor.Kind = motor.Kind(rapid.IntRange(0, 3).Draw(t, "kind"))
	p.bike.Motor.TorqueNm = rapid.Float64Range(15, 120).Draw(t, "torque")
	p.bike.Motor.PowerW = rapid.Float64Range(150, 1200).Draw(t, "power")
	p.bike.MassKg = rapid.Float64Range(10, 60).Draw(t, "bike")
	p.rider.MassKg = rapid.Float64Range(40, 140).Draw(t, "rider")
	p.rider.PowerW = rapid.Float64Range(30, 300).Draw(t, "watts")
	p.load.MassKg = rapid.Float64Range(0, 100).Draw(t, "load")
	p.bike.Crr = rapid.Float64Range(0.003, 0.03).Draw(t, "crr")
	p.bike.CdAM2 = rapid.Float64Range(0.3, 1.2).Draw(t, "cda")
	p.day.WindMps = rapid.Float64Range(-8, 8).Draw(t, "wind")
	p.level = rapid.IntRange(0, 4).Draw(t, "level")
	return p
}

func drawRoad(t *rapid.T) *hill.Profile {
	var flat []float64
	for range rapid.IntRange(1, 8).Draw(t, "pieces") {
		flat = append(flat, rapid.Float64Range(2, 700).Draw(t, "length"), rapid.Float64Range(-25, 25).Draw(t, "percent"))
	}
	return made(flat...)
}

func drawOptions(t *rapid.T) Options {
	return Options{
		StartMps: rapid.Float64Range(0, 8).Draw(t, "start"), DownMps: rapid.Float64Range(2, 14).Draw(t, "down"),
		Charge: rapid.Float64Range(0, 1).Draw(t, "charge"), Reserve: 0.1, SightM: 30, ReactS: 0.8,
		Back: rapid.Bool().Draw(t, "back"), Trips: rapid.IntRange(1, 3).Draw(t, "trips"),
		PauseS: rapid.Float64Range(0, 600).Draw(t, "pause"), Recover: rapid.Bool().Draw(t, "recover"),
	}
}

func TestBooksBalance(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		r, p := drawParts(t).rig(), drawRoad(t)
		a, err := Climb(r, p, drawOptions(t))
		if err != nil {
			t.Fatal(err)
		}
		if road, pack := a.Energy.Imbalance(); math.Abs(road) > 1e-6 || math.Abs(pack) > 1e-6 {
			t.Fatalf("books are out by %g at the road, %g behind the tyre", road, pack)
		}
		e := a.Energy
		if e.RiderJ < 0 || e.MotorJ < 0 || e.BrakesJ < 0 || e.RollingJ < 0 {
			t.Fatalf("work of the wrong sign: %+v", e)
		}
		end := a.Trace.AtM[len(a.Trace.AtM)-1]
		if !a.Stalled && math.Abs(end-p.LengthM()) > 1e-6 {
			t.Fatalf("ends at %g of %g m without having stalled", end, p.LengthM())
		}
		for i, v := range a.Trace.SpeedMps {
			if math.IsNaN(v) || math.IsNaN(a.Trace.TimeS[i]) || math.IsNaN(a.Trace.Headroom[i]) {
				t.Fatalf("no number at trace point %d", i)
			}
			if i > 0 && (a.Trace.TimeS[i] < a.Trace.TimeS[i-1] || a.Trace.AtM[i] < a.Trace.AtM[i-1]) {
				t.Fatalf("time or place runs backward at trace point %d", i)
			}
		}
		if a.Stalled != (a.Verdict == Short) {
			t.Fatalf("stalled %v, verdict %v", a.Stalled, a.Verdict)
		}
	})
}

// The kinetic energy in the books is that of the speed in the trace, and the
// slope's share is weight times rise: two ways to the same figures.
func TestBooksAgreeWithTrace(t *testing.T) {
	r := trekking().rig()
	p := made(800, 6, 300, -4, 200, 11)
	a, _ := Climb(r, p, usual)
	v := a.Trace.SpeedMps[len(a.Trace.SpeedMps)-1]
	if want := 0.5 * r.InertialKg * v * v; math.Abs(a.Energy.KineticEndJ/want-1) > 1e-12 {
		t.Errorf("kinetic energy %g, by the speed %g", a.Energy.KineticEndJ, want)
	}
	rise := p.HeightM[len(p.HeightM)-1]
	if want := r.Road.MassKg * 9.80665 * rise; math.Abs(a.Energy.SlopeJ/want-1) > 1e-9 {
		t.Errorf("work against the slope %g, weight times rise %g", a.Energy.SlopeJ, want)
	}
}

func TestHalvingTheStepChangesNothing(t *testing.T) {
	for _, p := range []*hill.Profile{made(400, 7, 60, 18), made(300, 2, 150, 10, 100, -5, 300, 6), made(3000, 5)} {
		r := trekking().rig()
		whole, _ := Climb(r, p, usual)
		fine := usual
		fine.StepScale = 0.5
		half, _ := Climb(r, p, fine)
		for name, pair := range map[string][2]float64{
			"time": {whole.ClimbS, half.ClimbS}, "rider": {whole.Energy.RiderJ, half.Energy.RiderJ},
			"motor": {whole.Energy.MotorJ, half.Energy.MotorJ}, "slowest": {whole.Hardest.Running.SpeedMps, half.Hardest.Running.SpeedMps},
		} {
			if math.Abs(pair[0]/pair[1]-1) > 0.001 {
				t.Errorf("%.0f m, %s: %.5f, with half the step %.5f", p.LengthM(), name, pair[0], pair[1])
			}
		}
	}
}

func TestMoreMassNeverRaisesTheSteepestGrade(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p := drawParts(t)
		p.day.WindMps = 0
		before := Weigh(p.rig(), At(0, 0), fresh(p.rig())).SteepestGrade
		p.load.MassKg += rapid.Float64Range(0.5, 40).Draw(t, "more")
		if after := Weigh(p.rig(), At(0, 0), fresh(p.rig())).SteepestGrade; after > before+1e-12 {
			t.Fatalf("steepest grade rose from %v to %v with more load", before, after)
		}
	})
}

func TestMoreTorqueNeverChangesSpeedWherePowerBinds(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p := drawParts(t)
		p.level, p.bike.Motor.Kind = 4, motor.RearHub
		at := At(0.05, 0)
		run, ok := Settle(p.rig(), at, fresh(p.rig()), 7)
		if !ok || run.SetBy != rig.Power {
			t.Skip("power does not bind here")
		}
		p.bike.Motor.TorqueNm *= 1.5
		if more, _ := Settle(p.rig(), at, fresh(p.rig()), 7); math.Abs(more.SpeedMps/run.SpeedMps-1) > 1e-9 {
			t.Fatalf("speed went from %v to %v with more torque", run.SpeedMps, more.SpeedMps)
		}
	})
}

func TestMomentumCarriesOverAShortPitch(t *testing.T) {
	r := trekking().rig()
	a, _ := Climb(r, made(100, 0, 4, 40, 100, 0), Options{StartMps: 6, DownMps: 7, Charge: 1})
	if a.Verdict != Tight || a.Balance.Headroom() >= 0 {
		t.Errorf("a 4 m ramp of 40 %% at speed: %v with headroom %v, want tight and negative", a.Verdict, a.Balance.Headroom())
	}
	b, _ := Climb(r, made(100, 0, 60, 40, 100, 0), Options{StartMps: 6, DownMps: 7, Charge: 1})
	if b.Verdict != Short || !b.Stalled || b.StalledAtM < 100 || b.StalledAtM > 160 {
		t.Errorf("a 60 m ramp of 40 %%: %v, stalled %v at %v", b.Verdict, b.Stalled, b.StalledAtM)
	}
}

func TestHardestStretchIsFound(t *testing.T) {
	a, _ := Climb(trekking().rig(), made(400, 7, 60, 18, 200, 3), usual)
	h := a.Hardest
	if h.FromM != 400 || h.ToM != 460 || math.Abs(float64(h.Grade)-0.18) > 1e-12 {
		t.Errorf("hardest stretch %v to %v at %v, want 400 to 460 at 0.18", h.FromM, h.ToM, h.Grade)
	}
	if _, err := Climb(trekking().rig(), &hill.Profile{}, usual); err != ErrNoRoad {
		t.Errorf("a hill without road gives %v", err)
	}
}
