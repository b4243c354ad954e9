package motor

import "math"

// horizon is how far SecondsTo looks ahead [s]: two days of climbing.
const horizon = 48 * 3600

// SecondsTo is the time [s] until the winding reaches a temperature [°C] under a
// steady load: windingLossW [W] is the copper loss at windingC and grows as the
// copper warms (the current stays); caseLossW, airC and airMps are constant. 0
// where it is that hot already, +Inf where it never gets there within two days.
func (h *Heat) SecondsTo(reachC, windingC, caseC, airC, airMps, windingLossW, caseLossW float64) float64 {
	if windingC >= reachC {
		return 0
	}
	perK := windingLossW * copperPerK / (1 + copperPerK*(windingC-20))
	var p path
	h.path(&p, windingC, caseC, airC, airMps, windingLossW, caseLossW, perK)
	reached := func(t float64) bool { w, _ := p.at(t); return w >= reachC }
	// The winding's temperature turns once at most: it may rise first and fall
	// as the case cools, or fall first and rise.
	low := 0.0
	if turn := p.turns(); turn > 0 && turn < horizon {
		if reached(turn) {
			return between(0, turn, reached)
		}
		low = turn
	}
	for high := low + 60; ; high = low + 2*(high-low) {
		if reached(high) {
			return between(low, high, reached)
		}
		if high > horizon {
			return math.Inf(1)
		}
	}
}

// turns is when the winding's temperature turns [s]; NaN or negative when it
// never does.
func (p *path) turns() float64 {
	apart := p.slow - p.fast
	slow := p.windingTurn / apart // share of the slow part in the rate
	return math.Log((slow-p.windingRate)/slow) / apart
}

// between halves an interval in which reached turns true down to a thousandth of
// a second.
func between(low, high float64, reached func(float64) bool) float64 {
	for high-low > 1e-3 {
		if mid := (low + high) / 2; reached(mid) {
			high = mid
		} else {
			low = mid
		}
	}
	return high
}

// SecondsToEasing is the time [s] until a motor that gives a steady output
// torque [N·m] at an output speed [rad/s] begins to ease off, from the winding's
// and the case's temperatures [°C] in air of airC [°C] at airMps [m/s]; +Inf
// where it never does.
func (c *Circuit) SecondsToEasing(h *Heat, torqueNm, radPerS, windingC, caseC, airC, airMps float64) float64 {
	f := c.Draw(torqueNm, radPerS, windingC)
	return h.SecondsTo(h.EaseFromC, windingC, caseC, airC, airMps, f.WindingW, f.CaseW)
}

// HoldTorque is the output torque [N·m] at which the winding comes to rest at
// windingC [°C], at an output speed [rad/s, ≥ 0] in air of airC [°C] at airMps
// [m/s]; 0 where even turning without torque makes it hotter. The losses are
// quadratic in the current, so it has a closed form.
func (c *Circuit) HoldTorque(h *Heat, windingC, radPerS, airC, airMps float64) float64 {
	shaft := radPerS * c.Ratio
	lost, out := c.lostNm(shaft), h.ToAir(airMps)
	a := c.WindingAt(windingC) * (1/out + 1/h.WindingWPerK)
	b := (1 - c.GearEfficiency) * c.TorqueNmPerA * shaft / out
	constantW := c.GearEfficiency * lost * shaft
	if c.ControllerInside {
		a += c.LeadOhm / out
		constantW += c.IdleW
	}
	left := windingC - airC - constantW/out
	if left <= 0 {
		return 0
	}
	return c.fromPhase(2*left/(b+math.Sqrt(b*b+4*a*left)), shaft)
}

// EasedTorque is the most output torque [N·m] that heat leaves for good: where
// easing off, of a torque limit of limitNm [N·m], and the warmth of the torque
// that is left are in balance. Speeds and air as in HoldTorque; windingC [°C] is
// the winding's temperature there.
func (c *Circuit) EasedTorque(h *Heat, limitNm, radPerS, airC, airMps float64) (torqueNm, windingC float64) {
	if c.HoldTorque(h, h.EaseFromC, radPerS, airC, airMps) >= limitNm {
		low, high := math.Min(airC, h.EaseFromC), h.EaseFromC
		for range 40 {
			if mid := (low + high) / 2; c.HoldTorque(h, mid, radPerS, airC, airMps) < limitNm {
				low = mid
			} else {
				high = mid
			}
		}
		return limitNm, high
	}
	low, high := h.EaseFromC, h.EaseToC
	for range 40 {
		if mid := (low + high) / 2; c.HoldTorque(h, mid, radPerS, airC, airMps) < h.Ease(mid)*limitNm {
			low = mid
		} else {
			high = mid
		}
	}
	return h.Ease(high) * limitNm, high
}
