package rider

import "math"

// Endurance is how long a rider can give more than they can give for ever.
// CriticalW is the critical power [W at the cranks, > 0], held without tiring;
// ReserveJ is W′ [J, > 0], the work that can be done above it before it is
// spent.
//
// The model is that of Monod and Scherrer, Ergonomics 8 (1965) 329–338:
// (P − CP)·t = W′. Recovery below the critical power follows the differential
// form of Skiba and others, European Journal of Applied Physiology 115 (2015)
// 703–713: what is spent comes back at the rate D·spent/W′, D = CP − P.
// The model is made for efforts of about two to thirty minutes; it says
// nothing of hunger, heat and the hours before.
type Endurance struct {
	CriticalW float64
	ReserveJ  float64
}

// fadeFrom is the part of W′ below which a rider who wants more than the
// critical power begins to fade. It is this program's own choice, as the
// published model has none: it lets a rider go on at full power until the last
// joule. Common practice, no source: nobody empties themselves on the way
// home.
const fadeFrom = 0.25

// Step gives what is left of W′ [J, 0 to ReserveJ] after a power [W at the
// cranks, ≥ 0] has been held for a time [s, ≥ 0]. It is exact for constant
// power: a straight line above the critical power, an exponential recovery
// below it. A reserve that is spent stays at 0.
func (e *Endurance) Step(leftJ, powerW, seconds float64) float64 {
	below := e.CriticalW - powerW
	if below < 0 {
		leftJ += below * seconds
		if leftJ < 0 {
			return 0
		}
		return leftJ
	}
	return e.ReserveJ - (e.ReserveJ-leftJ)*math.Exp(-below*seconds/e.ReserveJ)
}

// Able is the power [W at the cranks] that a rider with leftJ of W′ [J] still
// gives when they want wantedW [W]: all of it up to the critical power and
// while more than a quarter of W′ is left; below that the part above the
// critical power goes down to nothing along s²·(3 − 2s), s being the rest over
// that quarter. See fadeFrom: the fading is this program's own choice.
func (e *Endurance) Able(leftJ, wantedW float64) float64 {
	above := wantedW - e.CriticalW
	if above <= 0 {
		return wantedW
	}
	s := leftJ / (fadeFrom * e.ReserveJ)
	if s >= 1 {
		return wantedW
	}
	if s <= 0 {
		return e.CriticalW
	}
	return e.CriticalW + above*s*s*(3-2*s)
}

// Lasts is how long a constant power [W at the cranks] can be held from leftJ
// of W′ [J] until it is spent [s]; +Inf at and below the critical power.
func (e *Endurance) Lasts(leftJ, powerW float64) float64 {
	above := powerW - e.CriticalW
	if above <= 0 {
		return math.Inf(1)
	}
	return leftJ / above
}

// PowerFor is the constant power [W at the cranks] that spends leftJ of W′ [J]
// in a time [s, > 0].
func (e *Endurance) PowerFor(leftJ, seconds float64) float64 {
	return e.CriticalW + leftJ/seconds
}
