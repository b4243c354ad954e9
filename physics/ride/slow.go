package ride

import (
	"math"

	"hillwright/physics/motor"
)

// slow is what a step asks of the parts that change slowly: its length [m] and
// time [s], the work of rider, motor and brakes at the tyre [J]. rolls is false
// while the rig stands.
type slow struct {
	at                      *Place
	h, dt                   float64
	riderJ, motorJ, brakesJ float64
	rolls                   bool
}

// slowly moves motor heat, charge, legs and brakes on by a step.
func (s *run) slowly(c slow) {
	r := s.rig
	airMps := 0.0
	if c.rolls {
		airMps = math.Abs(c.h/c.dt + c.at.HeadMps)
	}
	crankJ := c.riderJ / r.Bike.Train.Efficiency
	s.sums.RiderCrankJ += crankJ
	s.body.ReserveJ = r.Endurance.Step(s.body.ReserveJ, crankJ/c.dt, c.dt)
	s.reserveLeastJ = math.Min(s.reserveLeastJ, s.body.ReserveJ)
	recoveredJ := 0.0
	if r.Bike.Motor.Kind != motor.None {
		recoveredJ = s.motor(c, airMps)
	}
	airC := float64(r.Day.TemperatureC)
	rubW := (c.brakesJ - recoveredJ) / c.dt
	s.body.FrontC = r.Brakes.Front.Step(s.body.FrontC, airC, rubW*r.Brakes.FrontShare, airMps, c.dt)
	s.body.RearC = r.Brakes.Rear.Step(s.body.RearC, airC, rubW*(1-r.Brakes.FrontShare), airMps, c.dt)
}

// motor moves the motor's heat and the pack's charge on, and gives the part of
// the brakes' work that the motor did [J].
func (s *run) motor(c slow, airMps float64) (brakedJ float64) {
	r := s.rig
	var f motor.Flow
	if c.rolls {
		spin := r.MotorTurns(s.shift.gear) * c.h / c.dt
		switch {
		case c.brakesJ > 0 && s.opt.Recover && !r.Circuit.Freewheel && r.Assists():
			f, brakedJ = s.recover(c, spin)
		case c.motorJ > 0:
			f = r.Circuit.Draw(c.motorJ/r.MotorToRoad()/c.dt/spin, spin, s.body.WindingC)
		default:
			f = r.Circuit.Draw(0, spin, s.body.WindingC)
		}
	}
	if !r.Assists() {
		f.ElsewhereW -= f.ElectricW // nothing is switched on: the wheel turns the motor, the pack rests
		f.ElectricW = 0
	}
	s.charge(&f, c.dt)
	e := &s.sums
	e.FromPackJ += f.ElectricW * c.dt
	e.ShaftJ += f.OutputW * c.dt
	e.WindingJ += f.WindingW * c.dt
	e.CaseJ += f.CaseW * c.dt
	e.ElsewhereJ += f.ElsewhereW * c.dt
	e.RecoveredJ += math.Max(0, -f.ElectricW) * c.dt
	b := &s.body
	b.WindingC, b.CaseC = r.Heat.Step(b.WindingC, b.CaseC, float64(r.Day.TemperatureC), airMps, f.WindingW, f.CaseW, c.dt)
	s.windingPeakC = math.Max(s.windingPeakC, b.WindingC)
	return brakedJ
}

// recover lets the motor do as much of the braking as it and the pack take.
func (s *run) recover(c slow, spin float64) (f motor.Flow, brakedJ float64) {
	r, b := s.rig, &s.body
	volts := r.Pack.OpenV(b.Charge)
	most := r.Circuit.BrakeTorque(spin, volts, r.Pack.MaxRecovery(b.Charge, b.RelaxV, r.PackC)/volts, b.WindingC)
	torque := math.Min(most, c.brakesJ/c.dt/spin)
	f = r.Circuit.Recover(torque, spin, b.WindingC)
	return f, torque * spin * c.dt
}

// charge draws a flow's power from the pack.
func (s *run) charge(f *motor.Flow, dt float64) {
	r, b := s.rig, &s.body
	amps, _ := r.Pack.Current(f.ElectricW, b.Charge, b.RelaxV, r.PackC)
	open := r.Pack.OpenV(b.Charge)
	s.sums.ChemicalJ += open * amps * dt
	s.sums.PackHeatJ += (open*amps - f.ElectricW) * dt
	b.Charge, b.RelaxV = r.Pack.Step(b.Charge, b.RelaxV, amps, r.PackC, dt)
}

// pause rests: the motor and the brakes cool in still air, the pack's sag
// relaxes, the legs recover.
func (s *run) pause(seconds float64) {
	s.sums.BrakesJ += s.kineticJ // it was stopped by hand, at the top
	s.kineticJ, s.slowS = 0, 0
	s.shift.rest()
	if seconds <= 0 {
		return
	}
	s.timeS += seconds
	level := At(0, 0)
	s.slowly(slow{at: &level, dt: seconds})
}

// Imbalance is what the books of a ride are out by, as a part of what went in:
// first at the road, then behind the tyre. Rounding, unless the computation is
// wrong.
func (e *Energy) Imbalance() (road, pack float64) {
	in := e.RiderJ + e.MotorJ + e.KineticStartJ
	out := e.SlopeJ + e.RollingJ + e.AirJ + e.BearingsJ + e.DragJ + e.BrakesJ + e.KineticEndJ
	road = (in - out) / (in + math.Abs(e.SlopeJ) + 1)
	gone := e.PackHeatJ + e.ShaftJ + e.WindingJ + e.CaseJ + e.ElsewhereJ
	pack = (e.ChemicalJ - gone) / (math.Abs(e.ChemicalJ) + 1)
	return road, pack
}
