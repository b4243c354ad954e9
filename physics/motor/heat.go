package motor

import "math"

// Heat is a motor as two lumps of heat: the winding with the iron it sits on,
// and the case that the air cools. Capacities in J/K, conductances in W/K. The
// case gives CaseWPerK to still air and PerRootMps·√(air speed) [W/K per
// √(m/s)] more to moving air: the laminar law of a plate or cylinder in a
// stream (textbook, from memory). Between EaseFromC and EaseToC [°C, the first
// less than the second] of the winding the motor's torque limit falls to
// nothing. All capacities and conductances must be positive.
type Heat struct {
	WindingJPerK, CaseJPerK float64
	WindingWPerK            float64
	CaseWPerK, PerRootMps   float64
	EaseFromC, EaseToC      float64
}

// Ease is the part of its torque limit that the motor still gives at a winding
// temperature [°C]: 1 to 0, linear between EaseFromC and EaseToC.
func (h *Heat) Ease(windingC float64) float64 {
	switch {
	case windingC <= h.EaseFromC:
		return 1
	case windingC >= h.EaseToC:
		return 0
	}
	return (h.EaseToC - windingC) / (h.EaseToC - h.EaseFromC)
}

// ToAir is the conductance from case to air [W/K] at an air speed [m/s].
func (h *Heat) ToAir(airMps float64) float64 {
	return h.CaseWPerK + h.PerRootMps*math.Sqrt(math.Abs(airMps))
}

// Settle gives the temperatures [°C] at which winding and case come to rest
// under constant losses [W] in air of airC [°C] at airMps [m/s].
func (h *Heat) Settle(airC, airMps, windingLossW, caseLossW float64) (windingC, caseC float64) {
	caseC = airC + (windingLossW+caseLossW)/h.ToAir(airMps)
	return caseC + windingLossW/h.WindingWPerK, caseC
}
