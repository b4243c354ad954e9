package motor

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

var lumps = Heat{
	WindingJPerK: 350, CaseJPerK: 800, WindingWPerK: 1.4, CaseWPerK: 0.6, PerRootMps: 0.4,
	EaseFromC: 110, EaseToC: 140,
}

func TestEase(t *testing.T) {
	for _, row := range []struct{ celsius, share float64 }{{-20, 1}, {110, 1}, {125, 0.5}, {140, 0}, {300, 0}} {
		same(t, "share", lumps.Ease(row.celsius), row.share, 1e-12)
	}
}

func TestCoolingGrowsWithAirSpeed(t *testing.T) {
	same(t, "still", lumps.ToAir(0), 0.6, 1e-12)
	same(t, "9 m/s", lumps.ToAir(9), 0.6+0.4*3, 1e-12)
	same(t, "9 m/s from behind", lumps.ToAir(-9), 0.6+0.4*3, 1e-12)
}

// With a winding that is one with the case the two balances are one, whose
// closed form is an exponential.
func TestSingleLumpLimit(t *testing.T) {
	h := lumps
	h.WindingWPerK = 1e9
	g, c := h.ToAir(4), h.WindingJPerK+h.CaseJPerK
	for _, seconds := range []float64{0.05, 10, 600, 7200} {
		w, _ := h.Step(60, 60, 15, 4, 90, 30, seconds)
		end := 15 + 120/g
		same(t, "temperature", w, end+(60-end)*math.Exp(-seconds*g/c), 1e-6)
	}
}

// The two eigenvalues, from trace and determinant, must be the rates at which a
// winding and a case with no losses fall along the two eigenvectors.
func TestTwoLumpEigenvalues(t *testing.T) {
	h := lumps
	in, out := h.WindingWPerK, h.ToAir(2)
	a, b, c, d := -in/h.WindingJPerK, in/h.WindingJPerK, in/h.CaseJPerK, -(in+out)/h.CaseJPerK
	trace, det := a+d, a*d-b*c
	for _, sign := range []float64{-1, 1} {
		rate := (trace + sign*math.Sqrt(trace*trace-4*det)) / 2
		// (A − rate)·x = 0 with x = (b, rate − a).
		w0, c0 := 50.0, 50*(rate-a)/b
		for _, seconds := range []float64{0.1, 100, 3000} {
			w, k := h.Step(10+w0, 10+c0, 10, 2, 0, 0, seconds)
			fall := math.Exp(rate * seconds)
			same(t, "winding", w, 10+w0*fall, 1e-11)
			same(t, "case", k, 10+c0*fall, 1e-11)
		}
	}
}

// integrate is an independent adaptive integrator: the Runge–Kutta–Fehlberg
// pair of orders 4 and 5 (Fehlberg 1969; coefficients from memory, their
// order is checked by the results).
func integrate(f func(x [2]float64) [2]float64, x [2]float64, seconds, tolerance float64) [2]float64 {
	t, step := 0.0, math.Min(seconds, 0.1)
	add := func(scale ...float64) func(k ...[2]float64) [2]float64 {
		return func(k ...[2]float64) [2]float64 {
			y := x
			for i := range k {
				y[0] += step * scale[i] * k[i][0]
				y[1] += step * scale[i] * k[i][1]
			}
			return y
		}
	}
	for t < seconds {
		step = math.Min(step, seconds-t)
		k1 := f(x)
		k2 := f(add(1. / 4)(k1))
		k3 := f(add(3./32, 9./32)(k1, k2))
		k4 := f(add(1932./2197, -7200./2197, 7296./2197)(k1, k2, k3))
		k5 := f(add(439./216, -8, 3680./513, -845./4104)(k1, k2, k3, k4))
		k6 := f(add(-8./27, 2, -3544./2565, 1859./4104, -11./40)(k1, k2, k3, k4, k5))
		fifth := add(16./135, 0, 6656./12825, 28561./56430, -9./50, 2./55)(k1, k2, k3, k4, k5, k6)
		fourth := add(25./216, 0, 1408./2565, 2197./4104, -1./5)(k1, k2, k3, k4, k5)
		off := math.Hypot(fifth[0]-fourth[0], fifth[1]-fourth[1])
		if off <= tolerance {
			t += step
			x = fifth
		}
		step *= math.Min(4, math.Max(0.1, 0.9*math.Pow(tolerance/math.Max(off, 1e-300), 0.2)))
	}
	return x
}

// balances gives the two rates [K/s] as PHYSICS 6 states them, written a second
// time. The winding's loss grows with its temperature by perK [W/K] from fromC.
func balances(h *Heat, airC, airMps, windingW, caseW, perK, fromC float64) func([2]float64) [2]float64 {
	return func(x [2]float64) [2]float64 {
		across := (x[0] - x[1]) * h.WindingWPerK
		away := (x[1] - airC) * (h.CaseWPerK + h.PerRootMps*math.Sqrt(airMps))
		return [2]float64{(windingW + perK*(x[0]-fromC) - across) / h.WindingJPerK, (caseW + across - away) / h.CaseJPerK}
	}
}

// The series of short steps joins the closed form.
func TestShortStepsMeetLongOnes(t *testing.T) {
	for _, x := range []float64{-1e-6, -1e-3, -0.0099, 0.0099, 1e-4} {
		if got, want := grown(x/30, 30), math.Expm1(x)/x*30; !(math.Abs(got/want-1) < 4e-16) {
			t.Errorf("at %g %.17g, want %.17g", x, got, want)
		}
	}
}

func anyHeat(t *rapid.T) *Heat {
	f := func(low, high float64, name string) float64 { return rapid.Float64Range(low, high).Draw(t, name) }
	return &Heat{
		WindingJPerK: f(20, 3000, "winding J/K"), CaseJPerK: f(50, 8000, "case J/K"), WindingWPerK: f(0.1, 20, "winding W/K"),
		CaseWPerK: f(0.05, 5, "case W/K"), PerRootMps: f(0, 3, "√ W/K"), EaseFromC: f(60, 130, "from"), EaseToC: f(131, 200, "to"),
	}
}

func TestStepAgainstAdaptiveIntegrator(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		h := anyHeat(t)
		f := func(low, high float64, name string) float64 { return rapid.Float64Range(low, high).Draw(t, name) }
		w, c, air, mps := f(-20, 150, "winding"), f(-20, 100, "case"), f(-20, 40, "air"), f(0, 20, "m/s")
		lossW, caseW, seconds := f(0, 600, "winding W"), f(0, 200, "case W"), f(0.01, 600, "s")
		gotW, gotC := h.Step(w, c, air, mps, lossW, caseW, seconds)
		want := integrate(balances(h, air, mps, lossW, caseW, 0, 0), [2]float64{w, c}, seconds, 1e-9)
		if !(math.Abs(gotW-want[0]) < 1e-5 && math.Abs(gotC-want[1]) < 1e-5) {
			t.Errorf("step gives %.9g and %.9g, the integrator %.9g and %.9g", gotW, gotC, want[0], want[1])
		}
		// Two steps are one; a very long one ends where Settle says; the heat
		// that went in is the heat stored and given away.
		half, halfC := h.Step(w, c, air, mps, lossW, caseW, seconds/2)
		twice, twiceC := h.Step(half, halfC, air, mps, lossW, caseW, seconds/2)
		endW, endC := h.Step(w, c, air, mps, lossW, caseW, 1e9)
		restW, restC := h.Settle(air, mps, lossW, caseW)
		for _, pair := range [][2]float64{{twice, gotW}, {twiceC, gotC}, {endW, restW}, {endC, restC}} {
			if !(math.Abs(pair[0]-pair[1]) < 1e-8*(1+math.Abs(pair[1]))) {
				t.Errorf("%.12g, want %.12g", pair[0], pair[1])
			}
		}
	})
}

func TestSecondsToAgainstAdaptiveIntegrator(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		h := anyHeat(t)
		f := func(low, high float64, name string) float64 { return rapid.Float64Range(low, high).Draw(t, name) }
		w, c, air := f(-20, 130, "winding"), f(-20, 130, "case"), f(-20, 40, "air")
		lossW, caseW, reach := f(0, 900, "winding W"), f(0, 200, "case W"), f(60, 140, "reach")
		seconds := h.SecondsTo(reach, w, c, air, 3, lossW, caseW)
		rates := balances(h, air, 3, lossW, caseW, lossW*0.00393/(1+0.00393*(w-20)), w)
		switch {
		case w >= reach:
			if seconds != 0 {
				t.Errorf("%g s to a temperature that is there", seconds)
			}
		case seconds < 2000:
			at := integrate(rates, [2]float64{w, c}, seconds, 1e-9)
			if rate := math.Abs(rates(at)[0]); !(math.Abs(at[0]-reach) < 1e-4+2e-3*rate) {
				t.Errorf("after %g s %.9g °C, want %.9g", seconds, at[0], reach)
			}
			if before := integrate(rates, [2]float64{w, c}, seconds/2, 1e-9); before[0] > reach {
				t.Errorf("%g °C, above %g, already at half of %g s", before[0], reach, seconds)
			}
		default:
			if at := integrate(rates, [2]float64{w, c}, 1900, 1e-8); at[0] >= reach {
				t.Errorf("said to need %g s, is at %g °C of %g after 1900 s", seconds, at[0], reach)
			}
		}
	})
}

// A winding that starts hot over a cold case falls first; one whose case is
// hotter rises first. Both ways round the first crossing counts.
func TestSecondsToOfAWindingThatTurns(t *testing.T) {
	rise := lumps.SecondsTo(100, 95, 140, 20, 0, 0, 0)
	w, _ := lumps.Step(95, 140, 20, 0, 0, 0, rise)
	same(t, "rises to 100 °C and falls again", w, 100, 1e-3)
	if late, _ := lumps.Step(95, 140, 20, 0, 0, 0, 3600); late > 100 {
		t.Errorf("still %g °C", late)
	}
	// A moment's crossing just below the highest point it reaches.
	peak, at := 0.0, 0.0
	for i := range 4000 {
		if w, _ := lumps.Step(95, 140, 20, 0, 0, 0, float64(i)/4); w > peak {
			peak, at = w, float64(i)/4
		}
	}
	if first := lumps.SecondsTo(peak-1e-4, 95, 140, 20, 0, 0, 0); !(first < at+1) {
		t.Errorf("%g °C is there after %g s, said %g", peak-1e-4, at, first)
	}
	if never := lumps.SecondsTo(130, 95, 130, 20, 0, 0, 0); !math.IsInf(never, 1) {
		t.Errorf("reaches its case's temperature after %g s", never)
	}
	if never := lumps.SecondsTo(100, 20, 20, 20, 0, 20, 10); !math.IsInf(never, 1) {
		t.Errorf("a small load reaches 100 °C after %g s", never)
	}
}
