package motor

// Flow is where a motor's power goes at one moment [W]: what the pack gives is
// what leaves the output and what is lost,
//
//	ElectricW = OutputW + WindingW + CaseW + ElsewhereW.
//
// ElectricW is negative while the pack is charged, OutputW while the road
// drives the motor. WindingW and CaseW are the heat that goes into the two
// nodes of Heat; ElsewhereW is the heat of a controller outside the motor.
type Flow struct {
	ElectricW, OutputW, WindingW, CaseW, ElsewhereW float64
}

// Draw is the flow that an output torque [N·m] takes at an output speed [rad/s,
// ≥ 0] and a winding temperature [°C]. A torque of 0 or less is a motor that is
// on but not driving: it idles, and without a freewheel the road turns it.
// Whether the limits allow the torque is asked of the Torque methods.
func (c *Circuit) Draw(torqueNm, radPerS, windingC float64) Flow {
	if torqueNm <= 0 {
		return c.coast(radPerS)
	}
	shaft := radPerS * c.Ratio
	geared := torqueNm / (c.Ratio * c.GearEfficiency)
	lost := c.lostNm(shaft)
	amps := (geared + lost) / c.TorqueNmPerA
	f := Flow{
		OutputW:  torqueNm * radPerS,
		WindingW: c.WindingAt(windingC) * amps * amps,
		CaseW:    (lost + (1-c.GearEfficiency)*geared) * shaft,
	}
	return c.close(f, amps)
}

// coast is the flow of a motor that is on and not driving.
func (c *Circuit) coast(radPerS float64) Flow {
	dragW := c.Drag(radPerS) * radPerS
	return c.close(Flow{OutputW: 0 - dragW, CaseW: dragW}, 0)
}

// close adds the controller's losses and what the pack gives for it all.
func (c *Circuit) close(f Flow, amps float64) Flow {
	controllerW := c.LeadOhm*amps*amps + c.IdleW
	if c.ControllerInside {
		f.CaseW += controllerW
	} else {
		f.ElsewhereW = controllerW
	}
	f.ElectricW = f.OutputW + f.WindingW + f.CaseW + f.ElsewhereW
	return f
}

// Drag is the torque [N·m] against the output's turning of a motor that is not
// driven, at an output speed [rad/s, ≥ 0]: none with a freewheel.
func (c *Circuit) Drag(radPerS float64) float64 {
	if c.Freewheel || radPerS <= 0 {
		return 0
	}
	return c.Ratio / c.GearEfficiency * c.lostNm(radPerS*c.Ratio)
}

// Recover is the flow while the motor brakes the output with a torque [N·m, ≥ 0]
// at an output speed [rad/s, ≥ 0] and a winding temperature [°C]. Drag is part
// of the braking torque; with less than that, nothing is recovered. Beyond
// BrakeTorque the pack may have to pay for the braking: then ElectricW is
// positive. With a freewheel the motor cannot brake: the flow is that of a
// motor at rest.
func (c *Circuit) Recover(brakeTorqueNm, radPerS, windingC float64) Flow {
	if c.Freewheel || brakeTorqueNm <= c.Drag(radPerS) {
		return c.coast(radPerS)
	}
	shaft := radPerS * c.Ratio
	geared := brakeTorqueNm / c.Ratio
	lost := c.lostNm(shaft)
	amps := (geared*c.GearEfficiency - lost) / c.TorqueNmPerA
	f := Flow{
		OutputW:  -brakeTorqueNm * radPerS,
		WindingW: c.WindingAt(windingC) * amps * amps,
		CaseW:    (lost + (1-c.GearEfficiency)*geared) * shaft,
	}
	return c.close(f, amps)
}

// Efficiency is the share of the pack's power that leaves the output, 0 to 1, at
// an output torque [N·m], an output speed [rad/s] and a winding temperature
// [°C]; 0 at rest and without torque.
func (c *Circuit) Efficiency(torqueNm, radPerS, windingC float64) float64 {
	if torqueNm <= 0 || radPerS <= 0 {
		return 0
	}
	f := c.Draw(torqueNm, radPerS, windingC)
	return f.OutputW / f.ElectricW
}
