package ride

import (
	"math"
	"testing"

	"hillwright/physics/motor"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// Just below the steepest grade it is tight, well below it clears, above it is
// short: by the headroom, 10 % of the pull.
func TestVerdictGoesByHeadroom(t *testing.T) {
	r := trekking().rig()
	edge := Weigh(r, At(0, 0), fresh(r)).SteepestGrade
	for _, row := range []struct {
		part float64
		want Verdict
	}{{0.7, Clears}, {0.96, Tight}, {1.05, Short}} {
		g := edge * unit.Grade(row.part)
		s := Steady(r, g, usual)
		if s.Verdict != row.want {
			t.Errorf("%.3f of the steepest grade: %v with headroom %.3f, want %v", row.part, s.Verdict, s.Balance.Headroom(), row.want)
		}
		a, _ := Climb(r, made(40, float64(g)*100), usual)
		if a.Verdict != row.want {
			t.Errorf("%.3f of the steepest grade, simulated: %v, want %v", row.part, a.Verdict, row.want)
		}
	}
}

// How the hardest stretch is passed is the slowest that the trace shows there.
func TestHardestIsPassedAtItsSlowest(t *testing.T) {
	r := trekking().rig()
	a, _ := Climb(r, made(300, 5, 150, 14, 200, 3), usual)
	slow := math.Inf(1)
	for i, m := range a.Trace.AtM {
		if m > 310 && m <= 450 {
			slow = math.Min(slow, a.Trace.SpeedMps[i])
		}
	}
	if got := a.Hardest.Running.SpeedMps; math.Abs(got/slow-1) > 0.06 || got == 0 {
		t.Errorf("passes at %.3f m/s, the trace's slowest there is %.3f", got, slow)
	}
	if e := a.Hardest.Running.MotorEfficiency; e < 0.5 || e > 0.9 {
		t.Errorf("motor efficiency there is %.2f", e)
	}
}

// A person pushes 0.15 to 0.3 of their weight (rider.PushN); bike and load of
// 33 kg on 12 % want about 42 N.
func TestPushing(t *testing.T) {
	p := trekking()
	p.load.MassKg, p.level = 8, 0
	r := p.rig()
	if !startAt(r, At(0.12, 0), fresh(r), 0).PushOK {
		t.Error("nobody pushes 33 kg up 12 %")
	}
	p.load.MassKg = 150
	heavy := p.rig()
	if startAt(heavy, At(0.25, 0), fresh(heavy), 0).PushOK {
		t.Error("a person pushes 175 kg up 25 % without help")
	}
	p.level = 4
	helped := p.rig()
	if !startAt(helped, At(0.15, 0), fresh(helped), 0).PushOK {
		t.Error("walk assistance does not help 175 kg up 15 %")
	}
}

// 15 % kept back, 3 % used a trip: (1 − 0.15)/0.03 trips.
func TestTripsPerCharge(t *testing.T) {
	o := usual
	o.Back, o.Trips = true, 2
	a, _ := Climb(trekking().rig(), made(900, 8), o)
	one := usual
	one.Back = true
	b, _ := Climb(trekking().rig(), made(900, 8), one)
	if want := (1 - 0.15) / (1 - b.ChargeLeft); math.Abs(a.TripsPerCharge/want-1) > 1e-9 {
		t.Errorf("%.3f trips a charge, want %.3f", a.TripsPerCharge, want)
	}
}

// A rig that must stop for a shift on a place that it holds puts a foot down
// and goes on; that is tight, whatever the headroom.
func TestAFootGoesDownWhereItHolds(t *testing.T) {
	p := trekking()
	p.bike.ShiftS = 3
	p.bike.Train.Sprockets = []int{12, 46}
	a, _ := Climb(p.rig(), made(80, 0, 120, 22), Options{StartMps: 6, DownMps: 7, Charge: 1})
	if a.Stalled || !a.Footed || a.Verdict != Tight || a.FootedAtM < 80 || a.FootedAtM > 200 || a.FootedTrip != 0 || a.FootedBack {
		t.Errorf("stalled %v, footed %v at %.1f, %v", a.Stalled, a.Footed, a.FootedAtM, a.Verdict)
	}
	// Where it does not hold, no foot helps.
	b, _ := Climb(p.rig(), made(80, 0, 120, 45), Options{StartMps: 6, DownMps: 7, Charge: 1})
	if !b.Stalled || b.Footed {
		t.Errorf("on 45 %%: stalled %v, footed %v", b.Stalled, b.Footed)
	}
}

// The rider changes down before a steep piece, so the slow shift of a heavy
// load does not cost the hill.
func TestChangesDownInTime(t *testing.T) {
	r := trekking().rig()
	a, _ := Climb(r, made(200, 1, 60, 24), usual)
	at := 0
	for i, m := range a.Trace.AtM {
		if m <= 200 {
			at = i
		}
	}
	cruise := r.BestGear(a.Trace.SpeedMps[at], nowAt(r, 0.01))
	if a.Trace.Gear[at] >= cruise {
		t.Errorf("enters 24 %% at %.1f m/s in gear %d, on the level it would ride %d", a.Trace.SpeedMps[at], a.Trace.Gear[at], cruise)
	}
	if a.Footed || a.Stalled {
		t.Errorf("footed %v, stalled %v", a.Footed, a.Stalled)
	}
}

func nowAt(r *rig.Rig, g unit.Grade) *rig.Now {
	now := r.At(fresh(r), g.Sin(), g.Cos())
	return &now
}

// A front hub pulls what μ times the front wheel's load holds, which shrinks
// with the grade (statics: front = (m·G·b·cos θ − h·m·G·sin θ)/L).
func TestFrontHubSlipsAtItsClosedForm(t *testing.T) {
	p := trekking()
	p.bike.Motor.Kind, p.bike.Motor.TorqueNm, p.bike.Motor.PowerW = motor.FrontHub, 200, 2000
	p.day.Mu = 0.5
	r := p.rig()
	g := unit.Grade(0.15)
	b := Weigh(r, At(g, 0), fresh(r))
	mass := p.bike.MassKg + p.rider.MassKg
	at := p.bike.Places
	ahead := (p.bike.MassKg*at.BikeAheadM + p.rider.MassKg*at.RiderAheadM) / mass
	high := (p.bike.MassKg*at.BikeHeightM + p.rider.MassKg*at.RiderHeightM) / mass
	front := mass * unit.Gravity * (ahead*g.Cos() - high*g.Sin()) / at.WheelbaseM
	v := r.Rider.HoldMps
	legs := r.Rider.Power(r.CadenceAt(v, b.Gear)) * 0.96 / v
	for _, peg := range b.Pegs {
		if peg.Limit == rig.Grip && math.Abs(peg.PullN/(legs+0.5*front)-1) > 1e-9 {
			t.Errorf("grip allows %.3f N, by hand %.3f", peg.PullN, legs+0.5*front)
		}
	}
}

// A speed on the way down below the slowest to balance at is ridden at that.
func TestSlowWayDownIsNoStall(t *testing.T) {
	o := usual
	o.DownMps = 0.8
	a, _ := Climb(trekking().rig(), made(50, 1, 300, -9), o)
	if a.Stalled || a.Footed {
		t.Errorf("stalled %v, footed %v on the way down", a.Stalled, a.Footed)
	}
}

// Where the road drives, the rider pedals up to half of the speed that the
// brakes hold and then lets it run.
func TestLetsItRunDownhill(t *testing.T) {
	r := trekking().rig()
	o := usual
	o.StartMps = o.DownMps * 0.6
	if a, _ := Climb(r, made(400, -8), o); a.Energy.RiderJ != 0 || a.Energy.MotorJ != 0 || a.Hardest.Running.SetBy != rig.Coasting {
		t.Errorf("coming fast: rider %v J, motor %v J, %v", a.Energy.RiderJ, a.Energy.MotorJ, a.Hardest.Running.SetBy)
	}
	a, _ := Climb(r, made(400, -8), usual)
	if a.Energy.RiderJ <= 0 {
		t.Error("from rest nobody pedals")
	}
	for i, v := range a.Trace.SpeedMps {
		if w := a.Trace.RiderW[i]; v > 0.55*o.DownMps && w != 0 {
			t.Errorf("still pedals %v W at %.1f m/s", w, v)
		}
	}
}
