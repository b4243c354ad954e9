package motor

import (
	"hillwright/physics/assume"
)

// Sheet is what a maker's sheet may say beside torque, power and kind. NaN
// stands for "not on the sheet". MassKg is the motor's mass [kg]; NominalV the
// system's nominal voltage [V]; WheelM the driven wheel's radius [m], of use
// for hub motors only; TopMps the speed to which the motor is meant to assist
// [m/s].
type Sheet struct {
	MassKg, NominalV, WheelM, TopMps float64
}

// class is what motors of one kind have in common. All values are common
// practice, no source.
type class struct {
	massKg float64
	// torquePerRootW is the torque at the output that one watt of copper loss
	// at 20 °C holds at rest [N·m/√W], for massKg. It is the motor's size: it
	// does not depend on how the winding is wound.
	torquePerRootW float64
	// lostW is the no-load loss at the rated speed [W] for massKg, of which
	// half does not depend on speed.
	lostW          float64
	ratio          float64
	gearEfficiency float64
	idleW, leadOhm float64
	// noLoad and rated are the no-load and the rated speed of the output, as
	// parts of the speed to which it assists.
	noLoad, rated    float64
	freewheel        bool
	controllerInside bool
	chargeA          float64
}

var (
	crankClass = class{
		massKg: 2.8, torquePerRootW: 6.8, lostW: 11, ratio: 36, gearEfficiency: 0.90, idleW: 2.5, leadOhm: 0.012,
		noLoad: 1.30, rated: 0.70, freewheel: true, controllerInside: true,
	}
	gearedClass = class{
		massKg: 2.4, torquePerRootW: 2.5, lostW: 20, ratio: 5, gearEfficiency: 0.95, idleW: 2, leadOhm: 0.02,
		noLoad: 1.20, rated: 0.80, freewheel: true,
	}
	directClass = class{
		massKg: 5, torquePerRootW: 2.0, lostW: 16, ratio: 1, gearEfficiency: 1, idleW: 2, leadOhm: 0.02,
		noLoad: 1.25, rated: 0.80, chargeA: 8,
	}
)

func classOf(m *Motor) *class {
	switch {
	case m.Kind == Crank:
		return &crankClass
	case m.DirectDrive:
		return &directClass
	}
	return &gearedClass
}

// hotC is the winding temperature [°C] at which the sheet's power is taken to
// be measured: a motor is rated warm. Common practice, no source.
const hotC = 80

// Complete makes the circuit of a motor of which only the maker's sheet is
// known, and lists what had to be assumed. A motor of kind None gives the zero
// Circuit and an empty list.
//
// The sheet's own words hold: at rest the phase-current limit gives the torque
// on the sheet, and at the rated speed and nominal voltage a warm motor gives
// the power on the sheet.
func Complete(m *Motor, s Sheet) (Circuit, []assume.Value) {
	return Circuit{}, nil
}
