package words

// reasons are the texts for why a class default stands in for a number, by the
// stable keys that physics/motor and physics/pack give (assume.Value.Reason).
var reasons = []struct {
	id   string
	text Key
}{
	{"motor-mass-of-class", ReasonMotorMass},
	{"motor-voltage-usual", ReasonMotorVoltage},
	{"motor-cadence-of-class", ReasonMotorCadence},
	{"motor-top-speed-usual", ReasonMotorTopSpeed},
	{"motor-wheel-usual", ReasonMotorWheel},
	{"motor-wound-for-speed", ReasonMotorWound},
	{"motor-resistance-from-mass", ReasonMotorResistance},
	{"motor-leads-usual", ReasonMotorLeads},
	{"motor-no-load-from-mass", ReasonMotorNoLoad},
	{"motor-idle-usual", ReasonMotorIdle},
	{"motor-phase-from-torque", ReasonMotorPhase},
	{"motor-pack-current-from-power", ReasonMotorPackCurrent},
	{"motor-ratio-of-class", ReasonMotorRatio},
	{"motor-gears-of-class", ReasonMotorGears},
	{"motor-recovery-usual", ReasonMotorRecovery},
	{"heat-capacity-from-mass", ReasonHeatCapacity},
	{"heat-winding-of-class", ReasonHeatWinding},
	{"heat-case-of-class", ReasonHeatCase},
	{"heat-easing-usual", ReasonHeatEasing},
	{"pack-voltage-usual", ReasonPackVoltage},
	{"pack-taken-as-new", ReasonPackNew},
	{"pack-series-from-voltage", ReasonPackSeries},
	{"pack-resistance-from-capacity", ReasonPackResistance},
	{"pack-relaxation-usual", ReasonPackRelaxation},
	{"pack-current-usual", ReasonPackCurrent},
	{"pack-recovery-usual", ReasonPackRecovery},
	{"pack-cut-usual", ReasonPackCut},
}

// Reason says why a class default stands in for a number that no sheet gave.
// A reason that is not known is its own word.
func (v Voice) Reason(id string) string {
	for _, r := range reasons {
		if r.id == id {
			return v.text(r.text)
		}
	}
	return id
}
