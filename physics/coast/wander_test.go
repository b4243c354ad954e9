package coast

import (
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/mat"
)

// The filter against the whole covariance of an integrated Ornstein–Uhlenbeck
// force (gonum): the same likelihood, by sums of squares and by determinants.
func TestFilterAgainstWholeCovariance(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 4))
	for _, w := range []wander{{0, 1}, {0.02, 0.5}, {0.05, 2}, {0.1, 6}} {
		const n = 25
		times, errs, rest := make([]float64, n), make([]float64, n), make([]float64, n)
		for i := range n {
			if i > 0 {
				times[i] = times[i-1] + 0.2 + rng.Float64()
			}
			errs[i], rest[i] = 0.01+0.02*rng.Float64(), 0.03*rng.NormFloat64()
		}
		// Covariance of ∫f from the first time: with a²= far²/(2·m²), for s ≤ t
		// a²·m·(2s − m·(1 − e^(−s/m) − e^(−t/m) + e^(−(t−s)/m))).
		m := w.memoryS
		a2 := w.far * w.far / (2 * m * m)
		c := mat.NewSymDense(n, nil)
		for i := range n {
			for k := i; k < n; k++ {
				s, u := times[i], times[k]
				v := a2 * m * (2*s - m*(1-math.Exp(-s/m)-math.Exp(-u/m)+math.Exp(-(u-s)/m)))
				if i == k {
					v += errs[i] * errs[i]
				}
				c.SetSym(i, k, v)
			}
		}
		var chol mat.Cholesky
		if !chol.Factorize(c) {
			t.Fatal("the covariance is none")
		}
		var x mat.VecDense
		if err := chol.SolveVecTo(&x, mat.NewVecDense(n, rest)); err != nil {
			t.Fatal(err)
		}
		want, wantLogs := mat.Dot(&x, mat.NewVecDense(n, rest)), chol.LogDet()
		f := newFilter(w, 1)
		got, logs := 0.0, 0.0
		for i := range n {
			if i > 0 {
				f.pass(times[i] - times[i-1])
			}
			row := []float64{rest[i]}
			logs += f.take(row, errs[i])
			got += row[0] * row[0]
		}
		if math.Abs(got/want-1) > 1e-9 || math.Abs(logs-wantLogs) > 1e-9*math.Abs(wantLogs) {
			t.Errorf("%+v: square %v, logs %v; by the whole covariance %v, %v", w, got, logs, want, wantLogs)
		}
	}
}

// A wheel that rolls farther than it was taken to: all speeds are larger.
func TestCircumferenceCounts(t *testing.T) {
	s := known()
	r := []Run{clean(&s, false, 9, 0.007, 0.52), clean(&s, true, 9, 0.007, 0.52)}
	for i := range r {
		for k := range r[i].Points {
			r[i].Points[k].SpeedMps /= 1.03
		}
	}
	s.CircumferencePart = Value{1.03, 0}
	got, err := Fit(r, s)
	if err != nil {
		t.Fatal(err)
	}
	if math.Abs(got.Crr.Value/0.007-1) > 2e-3 || math.Abs(got.CdAM2.Value/0.52-1) > 5e-3 {
		t.Errorf("Crr %v, CdA %v; truth 0.007, 0.52", got.Crr.Value, got.CdAM2.Value)
	}
}
