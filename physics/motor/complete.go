package motor

import (
	"math"

	"hillwright/physics/assume"
)

// Sheet is what a maker's sheet may say beside torque, power and kind. NaN
// stands for "not on the sheet". MassKg is the motor's mass [kg]; NominalV the
// system's nominal voltage [V]; WheelM the driven wheel's radius [m] and TopMps
// the speed to which the motor is meant to assist [m/s], both of use for hub
// motors only.
type Sheet struct {
	MassKg, NominalV, WheelM, TopMps float64
}

// Complete makes the circuit of a motor of which only the maker's sheet is
// known, and lists what had to be assumed. A motor of kind None gives the zero
// Circuit and an empty list.
//
// The sheet's own words hold: at rest the phase-current limit gives the torque
// on the sheet, and at the rated speed and nominal voltage a warm motor gives
// the power on the sheet.
//
// How a motor's size follows from its mass is the textbook scaling of similar
// machines: torque per root watt of copper loss grows as length to the 5/2,
// mass as its cube; iron loss grows with mass.
func Complete(m *Motor, s Sheet) (Circuit, []assume.Value) {
	if m.Kind == None {
		return Circuit{}, nil
	}
	k := classOf(m)
	var list []assume.Value
	given := func(value float64, other assume.Value) float64 {
		if value > 0 {
			return value
		}
		list = append(list, other)
		return other.Value
	}
	massKg := given(s.MassKg, assume.Around("mass_kg", k.massKg, 0.75, 1.3, "motor-mass-of-class",
		"The sheet gives no motor mass: that of its class is taken."))
	volts := given(s.NominalV, assume.Around("nominal_v", usualV, 0.98, 1.45, "motor-voltage-usual",
		"The sheet gives no voltage: the most usual one is taken."))
	var top float64
	if m.Kind == Crank {
		top = given(m.CadenceHigh, assume.Around("cadence_high_rpm", 110, 0.9, 1.1, "motor-cadence-of-class",
			"The sheet gives no highest cadence: that of its class is taken.")) * math.Pi / 30
	} else {
		speed := given(s.TopMps, assume.Around("top_mps", 25/3.6, 0.95, 1.3, "motor-top-speed-usual",
			"The sheet does not say to which speed the hub motor assists: 25 km/h is taken."))
		top = speed / given(s.WheelM, assume.Around("wheel_m", 0.34, 0.7, 1.05, "motor-wheel-usual",
			"The hub motor's wheel is not known: the most usual size is taken."))
	}

	size := massKg / k.massKg
	shaft := k.rated * top * k.ratio // rated shaft speed
	c := Circuit{
		Ratio:            k.ratio,
		GearEfficiency:   k.gearEfficiency,
		NoLoadNm:         k.lostW * size / 2 / shaft,
		IronNmPerRadS:    k.lostW * size / 2 / (shaft * shaft),
		IdleW:            k.idleW,
		MaxChargeA:       k.chargeA,
		Freewheel:        k.freewheel,
		ControllerInside: k.controllerInside,
	}
	geared := c.Ratio * c.GearEfficiency
	perRootW := k.torquePerRootW * math.Pow(size, 5./6) / geared
	perW := perRootW * perRootW
	rated := k.rated * top
	noLoad := k.noLoad * top * k.ratio
	warm := 1 + copperPerK*(hotC-20)
	c.TorqueNmPerA = min(
		constant(volts, perW, noLoad, c.lostNm(noLoad), 1+k.leadShare),
		constant(volts, perW, shaft, m.PowerW/rated/geared+c.lostNm(shaft), warm+k.leadShare),
		constant(volts, perW, 0, m.TorqueNm/geared+c.NoLoadNm, 1+k.leadShare),
	)
	c.WindingOhm = c.TorqueNmPerA * c.TorqueNmPerA / perW
	c.LeadOhm = k.leadShare * c.WindingOhm
	c.MaxPhaseA = (m.TorqueNm/geared + c.NoLoadNm) / c.TorqueNmPerA
	mostW := math.Max(c.Draw(m.PowerW/rated, rated, hotC).ElectricW, c.Draw(m.TorqueNm, 0, hotC).ElectricW)
	c.MaxPackA = packMargin * mostW / volts
	return c, append(list, c.assumed()...)
}

// assumed lists what Complete sets in every circuit, with the band of each.
func (c *Circuit) assumed() []assume.Value {
	list := []assume.Value{
		assume.Around("torque_nm_per_a", c.TorqueNmPerA, 0.9, 1.1, "motor-wound-for-speed",
			"Wound so that the no-load speed lies above the speed to which it assists, and that the sheet's power is reached warm."),
		assume.Around("winding_ohm", c.WindingOhm, 0.7, 1.4, "motor-resistance-from-mass",
			"Resistance by the motor's mass and class: a heavier motor holds more torque per watt of heat."),
		assume.Around("lead_ohm", c.LeadOhm, 0.5, 2, "motor-leads-usual",
			"Usual resistance of the controller's switches and the leads."),
		assume.Around("no_load_nm", c.NoLoadNm, 0.5, 1.6, "motor-no-load-from-mass",
			"No-load loss by the motor's mass and class; half of it does not depend on speed."),
		assume.Around("iron_nm_per_rad_s", c.IronNmPerRadS, 0.5, 1.6, "motor-no-load-from-mass",
			"No-load loss by the motor's mass and class; half of it does not depend on speed."),
		assume.Around("idle_w", c.IdleW, 0.5, 2, "motor-idle-usual",
			"Usual draw of the electronics while the motor is on."),
		assume.Around("max_phase_a", c.MaxPhaseA, 0.95, 1.1, "motor-phase-from-torque",
			"The phase current that gives the sheet's torque at rest."),
		assume.Around("max_pack_a", c.MaxPackA, 0.85, 1.25, "motor-pack-current-from-power",
			"The pack current that gives the sheet's power warm, and a little more."),
	}
	if c.GearEfficiency < 1 {
		list = append(list,
			assume.Around("ratio", c.Ratio, 0.6, 1.5, "motor-ratio-of-class", "Inner reduction usual in its class; it hardly changes the answer."),
			assume.Value{Path: "gear_efficiency", Value: c.GearEfficiency, Low: c.GearEfficiency - 0.04, High: c.GearEfficiency + 0.03,
				Reason: "motor-gears-of-class", Text: "Loss of the inner gears usual in its class."})
	}
	if c.MaxChargeA > 0 {
		list = append(list, assume.Value{Path: "max_charge_a", Value: c.MaxChargeA, Low: 0, High: 1.5 * c.MaxChargeA,
			Reason: "motor-recovery-usual", Text: "Usual charging current of direct-drive controllers that recover; some do not."})
	}
	return list
}

// constant is the largest torque constant [N·m/A] with which a motor wound for
// volts [V] gives a shaft torque [N·m] at a shaft speed [rad/s], where perW is
// the torque squared per watt of copper loss at 20 °C [N²·m²/W] and ohms is all
// resistance, as it is then, over the winding's at 20 °C: from V = K·ω + R·τ/K
// with R = ohms·K²/perW.
func constant(volts, perW, shaft, torqueNm, ohms float64) float64 {
	return volts / (shaft + ohms*torqueNm/perW)
}
