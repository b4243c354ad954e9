package motor

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
	idleW          float64
	// leadShare is the resistance of switches and leads, of the winding's.
	leadShare float64
	// noLoad and rated are the no-load and the rated speed of the output, as
	// parts of the speed to which it assists.
	noLoad, rated    float64
	freewheel        bool
	controllerInside bool
	chargeA          float64

	// heat holds for massKg: capacities go with mass, conductances with area,
	// mass to the 2/3.
	heat Heat
}

var crankClass = class{
	massKg: 2.8, torquePerRootW: 6.8, lostW: 11, ratio: 36, gearEfficiency: 0.90, idleW: 2.5, leadShare: 0.1,
	noLoad: 1.30, rated: 0.70, freewheel: true, controllerInside: true,
	heat: Heat{WindingJPerK: 230, CaseJPerK: 2000, WindingWPerK: 3, CaseWPerK: 0.8, PerRootMps: 0.5, EaseFromC: 105, EaseToC: 135},
}

var gearedClass = class{
	massKg: 2.4, torquePerRootW: 2.8, lostW: 18, ratio: 5, gearEfficiency: 0.96, idleW: 2, leadShare: 0.07,
	noLoad: 1.20, rated: 0.80, freewheel: true,
	heat: Heat{WindingJPerK: 350, CaseJPerK: 800, WindingWPerK: 1.4, CaseWPerK: 0.6, PerRootMps: 0.4, EaseFromC: 110, EaseToC: 140},
}

var directClass = class{
	massKg: 5, torquePerRootW: 2.0, lostW: 16, ratio: 1, gearEfficiency: 1, idleW: 2, leadShare: 0.07,
	noLoad: 1.25, rated: 0.80, chargeA: 8,
	heat: Heat{WindingJPerK: 950, CaseJPerK: 1300, WindingWPerK: 2.4, CaseWPerK: 0.9, PerRootMps: 0.7, EaseFromC: 110, EaseToC: 140},
}

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
// be measured: a motor is rated warm. usualV is the most usual nominal voltage
// [V]. packMargin is what controllers allow from the pack above what the
// sheet's power needs. Common practice, no source.
const (
	hotC       = 80
	usualV     = 36
	packMargin = 1.1
)
