package motor

import (
	"math"

	"hillwright/physics/assume"
)

// CompleteHeat makes a motor's two lumps of heat from its kind and mass [kg;
// NaN: that of its class], and lists what was assumed: all of it. A motor of
// kind None gives the zero Heat and an empty list.
func CompleteHeat(m *Motor, massKg float64) (Heat, []assume.Value) {
	if m.Kind == None {
		return Heat{}, nil
	}
	k := classOf(m)
	if !(massKg > 0) {
		massKg = k.massKg
	}
	size := massKg / k.massKg
	area := math.Cbrt(size * size)
	h := k.heat
	h.WindingJPerK *= size
	h.CaseJPerK *= size
	h.WindingWPerK *= area
	h.CaseWPerK *= area
	h.PerRootMps *= area
	const (
		capacity = "Heat capacity by the motor's mass and class."
		inward   = "How well the winding gives its heat to the case, usual in its class: pressed into the case well, behind an air gap badly."
		outward  = "How well the case gives its heat to the air, by its size and class."
		easing   = "Temperature at which controllers of this class usually begin to ease off, and at which they give nothing."
	)
	return h, []assume.Value{
		assume.Around("winding_j_per_k", h.WindingJPerK, 0.7, 1.4, "heat-capacity-from-mass", capacity),
		assume.Around("case_j_per_k", h.CaseJPerK, 0.8, 1.25, "heat-capacity-from-mass", capacity),
		assume.Around("winding_w_per_k", h.WindingWPerK, 0.6, 1.6, "heat-winding-of-class", inward),
		assume.Around("case_w_per_k", h.CaseWPerK, 0.7, 1.4, "heat-case-of-class", outward),
		assume.Around("case_w_per_k_root_mps", h.PerRootMps, 0.6, 1.5, "heat-case-of-class", outward),
		{Path: "ease_from_c", Value: h.EaseFromC, Low: h.EaseFromC - 20, High: h.EaseFromC + 15, Reason: "heat-easing-usual", Text: easing},
		{Path: "ease_to_c", Value: h.EaseToC, Low: h.EaseToC - 15, High: h.EaseToC + 20, Reason: "heat-easing-usual", Text: easing},
	}
}
