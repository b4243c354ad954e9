package ride

import (
	"math"
	"testing"

	"hillwright/physics/hill"
	"hillwright/physics/motor"
	"hillwright/physics/rig"
)

// whole is the state of the second method: place, speed, winding, case, charge,
// slow sag, W′, and the work of the rider and the motor at the tyre.
type whole [9]float64

// wholeRate gives the state's rate of change in time, written apart from the
// simulation: the plain differential equations of each part.
func wholeRate(r *rig.Rig, p *hill.Profile, y whole) whole {
	v := math.Max(y[1], 0)
	i := min(p.PieceAt(y[0]), len(p.Grade)-1)
	g := p.Grade[i]
	body := rig.Body{WindingC: y[2], CaseC: y[3], Charge: y[4], RelaxV: y[5], ReserveJ: y[6]}
	now := r.At(&body, g.Sin(), g.Cos())
	pull := r.PullAt(v, 0, &now)
	load := r.Road.Force(v, g.Sin(), g.Cos(), r.Day.WindMps, 0)
	turns := r.MotorTurns(0)
	flow := r.Circuit.Draw(pull.MotorN/turns/r.MotorToRoad(), v*turns, y[2])
	airC := float64(r.Day.TemperatureC)
	inward := r.Heat.WindingWPerK * (y[2] - y[3])
	outward := (r.Heat.CaseWPerK + r.Heat.PerRootMps*math.Sqrt(math.Abs(v+r.Day.WindMps))) * (y[3] - airC)
	// Terminal power P = (emf − R·I)·I, by Newton's method.
	ohm, emf, amps := r.Pack.Resistance(y[4], r.PackC), r.Pack.OpenV(y[4])-y[5], 0.0
	for range 30 {
		amps -= ((emf-ohm*amps)*amps - flow.ElectricW) / (emf - 2*ohm*amps)
	}
	crankW := pull.RiderN * v / r.Bike.Train.Efficiency
	legs := r.Rider.CriticalW - crankW
	if legs > 0 {
		legs *= (r.Rider.ReserveJ - y[6]) / r.Rider.ReserveJ
	}
	return whole{
		v, (pull.Sum() - load) / r.InertialKg,
		(flow.WindingW - inward) / r.Heat.WindingJPerK, (flow.CaseW + inward - outward) / r.Heat.CaseJPerK,
		-amps / 3600 / r.Pack.CapacityAh(r.PackC), (amps*ohm*r.Pack.RelaxShare - y[5]) / r.Pack.RelaxS,
		legs, pull.RiderN * v, pull.MotorN * v,
	}
}

// wholeRide rides a profile by fixed steps of time, classical Runge–Kutta. It
// stops at the end of the road and gives the state and the time.
func wholeRide(r *rig.Rig, p *hill.Profile, v0 float64) (whole, float64) {
	b := r.Fresh(1)
	y, t := whole{0, v0, b.WindingC, b.CaseC, 1, 0, b.ReserveJ}, 0.0
	add := func(y whole, h float64, k whole) whole {
		for n := range y {
			y[n] += h * k[n]
		}
		return y
	}
	for y[0] < p.LengthM() && t < 7200 {
		h := math.Min(0.05, math.Max(1e-4, (p.LengthM()-y[0])/math.Max(y[1], 0.1)))
		k1 := wholeRate(r, p, y)
		k2 := wholeRate(r, p, add(y, h/2, k1))
		k3 := wholeRate(r, p, add(y, h/2, k2))
		k4 := wholeRate(r, p, add(y, h, k3))
		for n := range y {
			y[n] += h / 6 * (k1[n] + 2*k2[n] + 2*k3[n] + k4[n])
		}
		t += h
	}
	return y, t
}

func TestWholeStateAgainstASecondMethod(t *testing.T) {
	single := trekking()
	single.bike.Train.Sprockets = []int{40}
	hot := single
	hot.day.TemperatureC, hot.load.MassKg = 35, 15
	tired := single
	tired.rider.PowerW, tired.rider.CriticalW, tired.rider.ReserveJ = 220, 150, 9000
	hub := single
	hub.bike.Motor.Kind, hub.bike.Motor.TorqueNm, hub.bike.Motor.PowerW = motor.RearHub, 55, 500
	cold := single
	cold.day.TemperatureC, cold.bike.Pack.Health, cold.bike.Pack.EnergyWh = -10, 0.7, 250
	for name, parts := range map[string]parts{"single": single, "hot": hot, "tired": tired, "hub": hub, "cold": cold} {
		r := parts.rig()
		p := made(800, 7, 300, 11, 900, 8)
		o := usual
		o.StartMps = 3
		tour := newTour(r, p, o)
		tour.opt.StepScale, tour.run.opt.StepScale = 1, 1
		tour.ride()
		if tour.run.stalled {
			t.Errorf("%s stalls at %.0f m", name, tour.run.atM)
			continue
		}
		y, seconds := wholeRide(r, p, 3)
		b, e := tour.run.body, tour.run.sums
		for what, pair := range map[string][2]float64{
			"time": {tour.run.timeS, seconds}, "rider": {e.RiderJ, y[7]}, "motor": {e.MotorJ, y[8]},
			"winding [K]": {b.WindingC + 273.15, y[2] + 273.15}, "warming": {b.WindingC - float64(r.Day.TemperatureC), y[2] - float64(r.Day.TemperatureC)},
			"charge used": {1 - b.Charge, 1 - y[4]}, "sag": {b.RelaxV, y[5]}, "legs": {b.ReserveJ, y[6]},
		} {
			if math.Abs(pair[0]/pair[1]-1) > 0.002 {
				t.Errorf("%s, %s: %.5f, second method %.5f (%.3f %%)", name, what, pair[0], pair[1], 100*(pair[0]/pair[1]-1))
			}
		}
	}
}
