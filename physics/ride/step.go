package ride

import (
	"math"

	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// forces are the pulls and resistances [N] that change along a step, and
// their net with the constant ones.
type forces struct{ rider, motor, drag, air, bearings, net float64 }

func (s *run) forces(at *Place, now *rig.Now, kineticJ float64, coast bool) forces {
	r := s.rig
	v := math.Sqrt(2 * math.Max(kineticJ, 0) / r.InertialKg)
	parts := r.Road.Parts(v, at.sin, at.cos, at.HeadMps, at.CrossMps)
	f := forces{air: parts.Air, bearings: parts.Bearings}
	if s.pedals(v, coast) {
		pull := r.PullAt(v, s.shift.gear, now)
		ease := s.shift.ease()
		f.rider, f.motor = ease*pull.RiderN, ease*pull.MotorN
	}
	f.drag = dragOf(r, v, f.motor)
	f.net = f.rider + f.motor - f.drag - parts.Sum()
	return f
}

// plus adds w of another moment's forces.
func (f forces) plus(w float64, g forces) forces {
	return forces{f.rider + w*g.rider, f.motor + w*g.motor, f.drag + w*g.drag, f.air + w*g.air, f.bearings + w*g.bearings, f.net + w*g.net}
}

// step advances the ride by h metres of road: classical Runge–Kutta in the
// kinetic energy, whose change per metre is the sum of the forces. The work of
// each force is summed with the same weights, so the books balance. What
// changes slowly (heat, charge, legs, brakes) follows at the end of the step,
// each by its own exact step.
func (s *run) step(at *Place, now *rig.Now, h float64, coast bool) {
	v0 := s.speed()
	k1 := s.forces(at, now, s.kineticJ, coast)
	k2 := s.forces(at, now, s.kineticJ+h/2*k1.net, coast)
	middle := s.kineticJ + h/2*k2.net
	k3 := s.forces(at, now, middle, coast)
	k4 := s.forces(at, now, s.kineticJ+h*k3.net, coast)
	mean := k1.plus(2, k2).plus(2, k3).plus(1, k4)
	if kinetic := s.kineticJ + h/6*mean.net; kinetic < 0 {
		// It comes to rest within the step: ride only to where it does.
		h *= 0.999999 * s.kineticJ / (s.kineticJ - kinetic)
		middle = s.kineticJ / 2
	}
	w := h / 6
	weight := s.rig.Road.MassKg * unit.Gravity
	riderJ, motorJ, dragJ := w*mean.rider, w*mean.motor, w*mean.drag
	kinetic := s.kineticJ + w*mean.net
	brakesJ := 0.0
	if most := 0.5 * s.rig.InertialKg * s.opt.DownMps * s.opt.DownMps; coast && kinetic > most {
		held := math.Max(most, s.kineticJ-h*brakeN(s.rig))
		brakesJ = math.Max(0, kinetic-held)
		kinetic -= brakesJ
	}
	s.kineticJ = kinetic
	s.netN, s.bendN = k4.net, math.Abs(k4.net-k1.net)/h
	s.atM += h
	dt := s.duration(h, v0, middle)
	s.timeS += dt
	s.slowS += dt
	if s.speed() >= s.rig.Rider.HoldMps {
		s.slowS = 0
	}
	s.shift.pass(dt)

	e := &s.sums
	e.RiderJ += riderJ
	e.MotorJ += motorJ
	e.DragJ += dragJ
	e.AirJ += w * mean.air
	e.BearingsJ += w * mean.bearings
	e.SlopeJ += weight * at.sin * h
	e.RollingJ += weight * s.rig.Road.Crr * at.cos * h
	e.BrakesJ += brakesJ
	if dt > 0 {
		s.slowly(slow{at: at, h: h, dt: dt, riderJ: riderJ, motorJ: motorJ, brakesJ: brakesJ, rolls: true})
	}
}

// brakeN is how hard a rider slows for the way down [N]: 1.5 m/s², well within
// what dry tyres and brakes give. Common practice, no source.
func brakeN(r *rig.Rig) float64 { return 1.5 * r.InertialKg }

// duration is the time [s] that h metres took, from the speed before, the
// kinetic energy half-way, and the state after: Simpson's rule on 1/v; near
// standstill, where 1/v has no Simpson, the constant-force form 2h/(v0+v1).
func (s *run) duration(h, v0, middleJ float64) float64 {
	v1 := s.speed()
	if v0 < 0.7 || v1 < 0.7 || middleJ <= 0 {
		return 2 * h / math.Max(v0+v1, 1e-6)
	}
	vm := math.Sqrt(2 * middleJ / s.rig.InertialKg)
	return h / 6 * (1/v0 + 4/vm + 1/v1)
}
