package motor

import "math"

// Step moves winding and case on by a time [s, ≥ 0] of constant losses [W] in
// air of airC [°C] at airMps [m/s], by the closed form of the two balances
//
//	Cw·dTw/dt = Pw − Gw·(Tw − Tc)
//	Cc·dTc/dt = Pc + Gw·(Tw − Tc) − Ga·(Tc − Ta)
//
// so it is exact and stable for any length of step.
func (h *Heat) Step(windingC, caseC, airC, airMps, windingLossW, caseLossW, seconds float64) (windingThen, caseThen float64) {
	var p path
	h.path(&p, windingC, caseC, airC, airMps, windingLossW, caseLossW, 0)
	return p.at(seconds)
}

// path is the closed form x(t) = x₀ + ∫₀ᵗ exp(A·τ)dτ · r of the two
// temperatures, with r their rates at the start and A the balances' matrix. For
// a 2×2 matrix with eigenvalues fast < slow and g(λ) = (exp(λt) − 1)/λ,
//
//	∫₀ᵗ exp(A·τ)dτ = g(fast) + (g(slow) − g(fast))/(slow − fast) · (A − fast).
//
// The eigenvalues are real and distinct since both off-diagonal entries are
// positive (textbook matrix function).
type path struct {
	windingC, caseC       float64
	windingRate, caseRate float64 // r [K/s]
	windingTurn, caseTurn float64 // (A − fast)·r [K/s²]
	fast, slow            float64 // [1/s]
}

// path fills the closed form in. perK is by how much the winding's loss grows
// with its temperature [W/K].
func (h *Heat) path(p *path, windingC, caseC, airC, airMps, windingLossW, caseLossW, perK float64) {
	in, out := h.WindingWPerK, h.ToAir(airMps)
	ww, wc := (perK-in)/h.WindingJPerK, in/h.WindingJPerK
	cw, cc := in/h.CaseJPerK, -(in+out)/h.CaseJPerK
	p.windingC, p.caseC = windingC, caseC
	across := in * (windingC - caseC)
	p.windingRate = (windingLossW - across) / h.WindingJPerK
	p.caseRate = (caseLossW + across - out*(caseC-airC)) / h.CaseJPerK

	half := (ww - cc) / 2
	mean, apart := (ww+cc)/2, math.Sqrt(half*half+wc*cw)
	// The eigenvalues' product, without the cancellation of ww·cc − wc·cw.
	product := (in*out - perK*(in+out)) / (h.WindingJPerK * h.CaseJPerK)
	if mean > 0 {
		p.slow = mean + apart
		p.fast = product / p.slow
	} else {
		p.fast = mean - apart
		p.slow = product / p.fast
	}
	p.windingTurn = (ww-p.fast)*p.windingRate + wc*p.caseRate
	p.caseTurn = cw*p.windingRate + (cc-p.fast)*p.caseRate
}

// at gives the temperatures [°C] after a time [s].
func (p *path) at(seconds float64) (windingC, caseC float64) {
	fast, slow := grown(p.fast, seconds), grown(p.slow, seconds)
	turn := (slow - fast) / (p.slow - p.fast)
	return p.windingC + fast*p.windingRate + turn*p.windingTurn, p.caseC + fast*p.caseRate + turn*p.caseTurn
}

// grown is (exp(λt) − 1)/λ [s]. Within short steps its series is quicker and, up
// to the next term x⁶/5040, exact to the last bit.
func grown(perS, seconds float64) float64 {
	x := perS * seconds
	if math.Abs(x) < 1e-2 {
		return seconds * (1 + x/2*(1+x/3*(1+x/4*(1+x/5*(1+x/6)))))
	}
	return math.Expm1(x) / perS
}
