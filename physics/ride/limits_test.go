package ride

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/motor"
	"hillwright/physics/rig"
	"hillwright/physics/road"
)

// dragless takes rolling, air and bearings away, so that what is left has a
// closed form.
func dragless(r *rig.Rig) *rig.Rig {
	r.Road.Crr, r.Road.DragM2, r.Road.WheelDragM2, r.Road.BearingFactor = 0, 0, 0, 0
	return r
}

// mighty is a trekking bike whose motor never binds.
func mighty() parts {
	p := trekking()
	p.bike.Motor.TorqueNm, p.bike.Motor.PowerW, p.bike.Motor.Levels = 300, 5000, []float64{10}
	p.bike.Pack.EnergyWh, p.bike.Pack.MaxA = 5000, 200
	p.level, p.rider.PowerW = 1, 500
	return p
}

// The front wheel lifts where the grade is the centre of mass's distance ahead
// of the rear contact over its height (statics).
func TestFrontWheelLiftsAtItsClosedForm(t *testing.T) {
	p := mighty()
	r := dragless(p.rig())
	mass := p.bike.MassKg + p.rider.MassKg
	at := p.bike.Places
	b := (p.bike.MassKg*at.BikeAheadM + p.rider.MassKg*at.RiderAheadM) / mass
	h := (p.bike.MassKg*at.BikeHeightM + p.rider.MassKg*at.RiderHeightM) / mass
	bal := Weigh(r, At(0.2, 0), fresh(r))
	if bal.Pegs[0].Limit != rig.Lift {
		t.Fatalf("%v binds, not the front wheel", bal.Pegs[0].Limit)
	}
	if got := float64(bal.SteepestGrade); math.Abs(got/(b/h)-1) > 1e-6 {
		t.Errorf("the front wheel lifts at %.5f, b/h is %.5f", got, b/h)
	}
}

// On slippery ground the rear tyre slips at tan θ = μ·(L−b)/(L−μ·h).
func TestRearTyreSlipsAtItsClosedForm(t *testing.T) {
	p := mighty()
	p.day.Mu = 0.15
	r := dragless(p.rig())
	bal := Weigh(r, At(0.05, 0), fresh(r))
	want := r.Stance.SlideGrade(road.RearDrive, 0.15)
	if bal.Pegs[0].Limit != rig.Grip || math.Abs(float64(bal.SteepestGrade/want)-1) > 1e-6 {
		t.Errorf("%v binds at %.5f, closed form %.5f", bal.Pegs[0].Limit, bal.SteepestGrade, want)
	}
}

func TestHotterNeverPullsMore(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		r := drawParts(t).rig()
		v := rapid.Float64Range(0, 9).Draw(t, "v")
		b := *fresh(r)
		b.WindingC = rapid.Float64Range(-10, 150).Draw(t, "winding")
		hotter := b
		hotter.WindingC += rapid.Float64Range(0.1, 40).Draw(t, "more")
		now, then := r.At(&b, 0.05, 1), r.At(&hotter, 0.05, 1)
		if p, q := r.PullAt(v, 0, &now).Sum(), r.PullAt(v, 0, &then).Sum(); q > p+1e-9 {
			t.Fatalf("pull rose from %v to %v N with heat", p, q)
		}
	})
}

func TestEmptierAndColderPacksNeverGiveMore(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p := drawParts(t)
		p.bike.Pack.EnergyWh = rapid.Float64Range(150, 900).Draw(t, "wh")
		p.day.TemperatureC = 20
		warm := p.rig()
		p.day.PackC = rapid.Float64Range(-25, 19).Draw(t, "pack")
		cold := p.rig()
		full := *fresh(warm)
		less := full
		less.Charge = rapid.Float64Range(0, 1).Draw(t, "charge")
		v := rapid.Float64Range(0, 9).Draw(t, "v")
		pull := func(r *rig.Rig, b rig.Body) float64 {
			now := r.At(&b, 0.05, 1)
			return r.PullAt(v, 0, &now).Sum()
		}
		if pull(warm, less) > pull(warm, full)+1e-9 || pull(cold, full) > pull(warm, full)+1e-9 {
			t.Fatalf("pull: full %v, at %v %v, cold %v", pull(warm, full), less.Charge, pull(warm, less), pull(cold, full))
		}
	})
}

// A motor at its limit on a long steep climb eases off at about the time that
// the steady answer gives.
func TestEasesOffWhenItSays(t *testing.T) {
	p := trekking()
	p.bike.Motor.Kind, p.bike.Motor.TorqueNm, p.bike.Motor.PowerW = motor.RearHub, 60, 600
	p.rider.PowerW = 160
	r := p.rig()
	says := Steady(r, 0.11, usual).EasingS
	o := usual
	o.StartMps = Steady(r, 0.11, usual).Running.SpeedMps
	a, err := Climb(r, made(4000, 11), o)
	if err != nil {
		t.Fatal(err)
	}
	for i, c := range a.Trace.WindingC {
		if c >= r.Heat.EaseFromC {
			if got := a.Trace.TimeS[i]; math.Abs(got/says-1) > 0.05 {
				t.Errorf("eases off after %.0f s, said %.0f s", got, says)
			}
			return
		}
	}
	t.Errorf("never eases off; said %.0f s, peak %.0f °C", says, a.WindingPeakC)
}

// A cold old pack cuts out on the steep part with charge left on the display.
func TestColdOldPackGivesOutWithChargeLeft(t *testing.T) {
	p := trekking()
	p.day.TemperatureC = -12
	p.bike.Pack.EnergyWh, p.bike.Pack.Health = 300, 0.65
	p.bike.Motor.PowerW, p.bike.Motor.TorqueNm, p.rider.PowerW = 600, 80, 150
	r := p.rig()
	o := usual
	o.Charge = 0.45
	a, err := Climb(r, made(3000, 6, 600, 15), o)
	if err != nil {
		t.Fatal(err)
	}
	if a.Balance.Pegs[0].Limit != rig.Cells || a.ChargeLeft < 0.05 {
		t.Errorf("%v binds, charge left %.2f, headroom %.2f", a.Balance.Pegs[0].Limit, a.ChargeLeft, a.Balance.Headroom())
	}
	warm := p
	warm.day.TemperatureC = 20
	b, _ := Climb(warm.rig(), made(3000, 6, 600, 15), o)
	if b.Balance.Pegs[0].Limit == rig.Cells && b.Balance.Headroom() < a.Balance.Headroom() {
		t.Errorf("warm is no better: headroom %.2f, cold %.2f", b.Balance.Headroom(), a.Balance.Headroom())
	}
}

func TestTiredRiderSlowsDown(t *testing.T) {
	p := trekking()
	p.level, p.rider.PowerW, p.rider.CriticalW, p.rider.ReserveJ = 0, 250, 180, 9000
	p.bike.MassKg = 14
	r := p.rig()
	a, _ := Climb(r, made(3000, 5), usual)
	last := len(a.Trace.SpeedMps) - 1
	early := a.Trace.SpeedMps[last/20]
	if a.ReserveLeftJ > 0.05*9000 || a.Trace.SpeedMps[last] > 0.85*early {
		t.Errorf("W′ left %.0f J, speed %.2f then %.2f m/s", a.ReserveLeftJ, early, a.Trace.SpeedMps[last])
	}
	// (P − CP)·t = W′: until three quarters are gone the power is as wanted.
	for i, left := range a.Trace.ReserveJ {
		if left < 9000/4 {
			if want := 0.75 * 9000 / (250 - 180.0); math.Abs(a.Trace.TimeS[i]/want-1) > 0.05 {
				t.Errorf("three quarters of W′ gone after %.0f s, closed form %.0f s", a.Trace.TimeS[i], want)
			}
			break
		}
	}
}

func TestThereAndBack(t *testing.T) {
	r := trekking().rig()
	p := made(700, 8)
	once, _ := Climb(r, p, usual)
	o := usual
	o.Back, o.Trips, o.PauseS = true, 3, 120
	tour, _ := Climb(r, p, o)
	if tour.ChargeLeft >= once.ChargeLeft || tour.TourS < 6*60+5*120 {
		t.Errorf("three trips left %.3f of %.3f, took %.0f s", tour.ChargeLeft, once.ChargeLeft, tour.TourS)
	}
	if road, pack := tour.Energy.Imbalance(); math.Abs(road) > 1e-6 || math.Abs(pack) > 1e-6 {
		t.Errorf("books of the tour are out by %g, %g", road, pack)
	}
	if tour.WindingPeakC < once.WindingPeakC {
		t.Errorf("the third trip is cooler: %.1f, once %.1f °C", tour.WindingPeakC, once.WindingPeakC)
	}
	// A hill that climbs on the way back is hardest there.
	down := usual
	down.Back = true
	a, _ := Climb(r, made(300, 0, 400, -12), down)
	if h := a.Hardest; !h.Back || h.FromM != 300 || h.ToM != 700 || math.Abs(float64(h.Grade)-0.12) > 1e-9 {
		t.Errorf("hardest on the way back: %+v", h)
	}
}

func TestRecoveryPutsChargeBack(t *testing.T) {
	p := trekking()
	p.bike.Motor.Kind, p.bike.Motor.DirectDrive, p.bike.Motor.TorqueNm = motor.RearHub, true, 40
	r := p.rig()
	o := usual
	o.Charge = 0.6
	without, _ := Climb(r, made(1500, -8), o)
	o.Recover = true
	with, _ := Climb(r, made(1500, -8), o)
	if with.ChargeLeft <= without.ChargeLeft || with.Energy.RecoveredJ <= 0 || with.ChargeLeft <= 0.6 {
		t.Errorf("charge left %v with recovery, %v without, recovered %v J", with.ChargeLeft, without.ChargeLeft, with.Energy.RecoveredJ)
	}
}

func TestStartFromRest(t *testing.T) {
	p := trekking()
	r := p.rig()
	steep := Weigh(r, At(0, 0), fresh(r)).SteepestGrade
	if s := startAt(r, At(0.10, 0), fresh(r), 10); !s.OK {
		t.Errorf("does not start on 10 %%: %+v", s)
	}
	if s := startAt(r, At(steep+0.3, 0), fresh(r), 0); s.OK {
		t.Errorf("starts on %v", steep+0.3)
	}
	p.day.Mu = 0.12
	if s := startAt(p.rig(), At(0.15, 0), fresh(r), 0); s.OK || s.StoppedBy != rig.Grip {
		t.Errorf("on ice: %+v", s)
	}
	m := mighty()
	m.rider.PowerW = 200
	if s := startAt(m.rig(), At(0.45, 0), fresh(r), 0); s.OK || s.StoppedBy != rig.Lift {
		t.Errorf("where the front wheel lifts: %+v", s)
	}
}

func TestWayDown(t *testing.T) {
	r := trekking().rig()
	a, _ := Climb(r, made(2000, 12), usual)
	d := a.WayDown
	if !d.Falls || d.FrontPeakC <= 15 || d.RearPeakC <= 15 || math.Abs(float64(d.SteepestGrade)-0.12) > 1e-9 {
		t.Errorf("way down %+v", d)
	}
	// Energy: what the fall gives less air and rolling, over the rotors' heat
	// capacity, bounds the warming from above.
	given := r.Road.MassKg * 9.80665 * a.AscentM * r.Brakes.FrontShare
	if warming := d.FrontPeakC - 15; warming > (given+1e5)/r.Brakes.Front.CapacityJK {
		t.Errorf("front brake warms by %.0f K, all of the fall would give %.0f K", warming, given/r.Brakes.Front.CapacityJK)
	}
	if d.MostMps <= 0 || d.StoppingM <= 25/3.6*0.5 || d.DecelMps2 <= 1 {
		t.Errorf("way down %+v", d)
	}
	wet := trekking()
	wet.day.Ground = "asphalt-wet"
	w, _ := Climb(wet.rig(), made(2000, 12), usual)
	if w.WayDown.StoppingM <= d.StoppingM || w.WayDown.MostMps > d.MostMps {
		t.Errorf("wet stops in %.1f m, dry in %.1f m; not to exceed %.1f and %.1f m/s", w.WayDown.StoppingM, d.StoppingM, w.WayDown.MostMps, d.MostMps)
	}
	if level, _ := Climb(r, made(500, 0), usual); level.WayDown.Falls {
		t.Error("a level road falls")
	}
}
