package motor

import "math"

// copperPerK is the rise of copper's resistance per kelvin, of its value at
// 20 °C. Source: 0.00393/K for copper of 100 % IACS (an instrument maker's
// manual, see CHECKS.md; annealed copper ranges from 0.00381 to 0.00397).
const copperPerK = 0.00393

// Circuit is the equivalent circuit of a brushless motor with its controller,
// reduced to direct current: one torque constant, one resistance. The shaft is
// the motor's own; the output is the cranks for a crank motor and the wheel for
// a hub motor. Methods take output torques [N·m] and output speeds [rad/s].
//
// Valid for Ratio ≥ 1, 0 < GearEfficiency ≤ 1, TorqueNmPerA > 0, WindingOhm > 0
// and everything else ≥ 0. Winding temperatures from −60 °C up.
type Circuit struct {
	// Ratio is shaft turns per output turn.
	Ratio float64
	// GearEfficiency is the share of the shaft's torque, times Ratio, that
	// reaches the output: 1 without gears.
	GearEfficiency float64
	// TorqueNmPerA is the torque per phase current at the shaft [N·m/A]; in SI
	// it is also the voltage per shaft speed [V·s/rad].
	TorqueNmPerA float64
	// WindingOhm is the winding's resistance at 20 °C [Ω].
	WindingOhm float64
	// LeadOhm is what the phase current meets outside the winding: switches
	// and leads [Ω], taken as not warming.
	LeadOhm float64
	// NoLoadNm is the part of the no-load torque at the shaft that does not
	// depend on speed: bearings, seals, hysteresis [N·m].
	NoLoadNm float64
	// IronNmPerRadS is the part that grows with shaft speed: eddy currents
	// [N·m·s/rad].
	IronNmPerRadS float64
	// IdleW is what the electronics take while the motor is on [W].
	IdleW float64
	// MaxPhaseA and MaxPackA are the controller's limits on the phase current
	// and on the current from the pack [A].
	MaxPhaseA, MaxPackA float64
	// MaxChargeA is the most current given back to the pack [A]; 0 where the
	// motor does not recover.
	MaxChargeA float64
	// Freewheel tells that the output turns freely when the motor rests.
	Freewheel bool
	// ControllerInside tells that the controller's losses heat the motor's
	// case; otherwise they are lost elsewhere.
	ControllerInside bool
}

// WindingAt is the winding's resistance [Ω] at a temperature [°C].
func (c *Circuit) WindingAt(windingC float64) float64 {
	return c.WindingOhm * (1 + copperPerK*(windingC-20))
}

func (c *Circuit) ohm(windingC float64) float64 { return c.WindingAt(windingC) + c.LeadOhm }

// lostNm is the torque [N·m] that the turning shaft loses at a shaft speed.
func (c *Circuit) lostNm(shaft float64) float64 { return c.NoLoadNm + c.IronNmPerRadS*shaft }

// fromPhase is the output torque [N·m] of a phase current, 0 where it does not
// overcome the no-load torque.
func (c *Circuit) fromPhase(amps, shaft float64) float64 {
	nm := c.TorqueNmPerA*amps - c.lostNm(shaft)
	if nm <= 0 {
		return 0
	}
	return c.Ratio * c.GearEfficiency * nm
}

// TorqueByPhase is the output torque [N·m] that the phase-current limit leaves
// at an output speed [rad/s, ≥ 0].
func (c *Circuit) TorqueByPhase(radPerS float64) float64 {
	return c.fromPhase(c.MaxPhaseA, radPerS*c.Ratio)
}

// TorqueByVoltage is the output torque [N·m] that the pack's voltage [V] can
// drive through a winding at windingC [°C] at an output speed [rad/s, ≥ 0]: the
// straight line from stall to no-load speed, whose knee sinks with the pack.
func (c *Circuit) TorqueByVoltage(radPerS, packV, windingC float64) float64 {
	shaft := radPerS * c.Ratio
	return c.fromPhase((packV-c.TorqueNmPerA*shaft)/c.ohm(windingC), shaft)
}

// TorqueByPackCurrent is the output torque [N·m] that a pack current of maxA
// [A], or the controller's own limit where that is less, can pay for at packV
// [V] under load, an output speed [rad/s, ≥ 0] and a winding temperature [°C].
func (c *Circuit) TorqueByPackCurrent(radPerS, packV, maxA, windingC float64) float64 {
	return c.TorqueByElectric(radPerS, packV*math.Min(maxA, c.MaxPackA), windingC)
}

// TorqueByElectric is the output torque [N·m] that electricW [W] from the pack
// pay for at an output speed [rad/s, ≥ 0] and a winding temperature [°C].
//
// R·I² + K·ω·I = P has one root that is not negative; it is written so that it
// holds at rest too.
func (c *Circuit) TorqueByElectric(radPerS, electricW, windingC float64) float64 {
	p := electricW - c.IdleW
	if p <= 0 {
		return 0
	}
	shaft := radPerS * c.Ratio
	backV := c.TorqueNmPerA * shaft
	return c.fromPhase(2*p/(backV+math.Sqrt(backV*backV+4*c.ohm(windingC)*p)), shaft)
}

// BrakeTorque is the most torque [N·m against the output's turning] with which
// the motor may brake and still give back: the least that the phase-current
// limit, the charge current (maxA [A] or the circuit's own MaxChargeA, at packV
// [V]) and the point of most recovery leave. 0 with a freewheel, without
// recovery and at rest.
func (c *Circuit) BrakeTorque(radPerS, packV, maxA, windingC float64) float64 {
	maxA = math.Min(maxA, c.MaxChargeA)
	if c.Freewheel || maxA <= 0 || radPerS <= 0 {
		return 0
	}
	shaft := radPerS * c.Ratio
	backV, ohm := c.TorqueNmPerA*shaft, c.ohm(windingC)
	amps := math.Min(c.MaxPhaseA, backV/(2*ohm))
	p := packV*maxA + c.IdleW
	if under := backV*backV - 4*ohm*p; under > 0 {
		amps = math.Min(amps, 2*p/(backV+math.Sqrt(under)))
	}
	return c.Ratio / c.GearEfficiency * (c.TorqueNmPerA*amps + c.lostNm(shaft))
}
