package coast

import "math"

// What a bike can have.
const (
	leastCrr, mostCrr = 0.0008, 0.12
	leastCdA, mostCdA = 0.08, 4
)

// Fit finds Crr and CdA from coast-downs. What the data cannot tell better than
// the setup knows is held there, and marked. The error is an *Error.
func Fit(runs []Run, s Setup) (*Result, error) {
	if len(runs) == 0 {
		return nil, &Error{Kind: NoRun}
	}
	for i := range runs {
		if err := checked(i, &runs[i]); err != nil {
			return nil, err
		}
	}
	if err := checkedSetup(&s); err != nil {
		return nil, err
	}
	q, err := solve(runs, &s, false, false)
	if err != nil {
		return nil, err
	}
	heldCrr, heldCdA := false, false
	for range 2 {
		overCrr, overCdA := q.sigma(pCrr)/s.Crr.Error, q.sigma(pCdA)/s.CdAM2.Error
		switch {
		case !heldCrr && overCrr > 1 && (overCrr >= overCdA || heldCdA):
			heldCrr = true
		case !heldCdA && overCdA > 1:
			heldCdA = true
		default:
			return result(q, runs, &s, heldCrr, heldCdA)
		}
		if heldCrr && heldCdA {
			return nil, &Error{Kind: CannotTell}
		}
		if q, err = solve(runs, &s, heldCrr, heldCdA); err != nil {
			return nil, err
		}
	}
	return result(q, runs, &s, heldCrr, heldCdA)
}

// solve settles, looks at what is left, and settles again with it.
func solve(runs []Run, s *Setup, heldCrr, heldCdA bool) (*problem, error) {
	q := newProblem(runs, s, heldCrr, heldCdA)
	if !q.settle(1e-3) {
		return nil, &Error{Kind: TooNoisy}
	}
	for _, enough := range []float64{1e-4, 1e-7} {
		q.widen()
		q.judge()
		if !q.settle(enough) {
			return nil, &Error{Kind: TooNoisy}
		}
	}
	return q, nil
}

// sigma is the standard deviation of a number.
func (q *problem) sigma(at int) float64 {
	for f, each := range q.free {
		if each == at {
			return math.Sqrt(*q.cov.at(f, f))
		}
	}
	return 0
}

// intervalFactor times the standard deviation is half a 90 % interval: that of
// the normal distribution, and a quarter more, since how much the speed wanders
// is estimated too; from trials.
const intervalFactor = 1.645 * 1.25

func (q *problem) estimate(at int, held bool) Estimate {
	v, e := q.p[at], q.sigma(at)
	return Estimate{Value: v, Low: v - intervalFactor*e, High: v + intervalFactor*e, Error: e, Held: held}
}

func result(q *problem, runs []Run, s *Setup, heldCrr, heldCdA bool) (*Result, error) {
	r := &Result{
		Crr: q.estimate(pCrr, heldCrr), CdAM2: q.estimate(pCdA, heldCdA),
		Grade: q.estimate(pGrade, false), HeadMps: q.estimate(pHead, false), Wander: q.wander.far,
	}
	if r.Crr.Value < leastCrr || r.Crr.Value > mostCrr || r.CdAM2.Value < leastCdA || r.CdAM2.Value > mostCdA {
		return nil, &Error{Kind: Impossible, Got: r.Crr.Value, Want: r.CdAM2.Value}
	}
	r.Crr.Low, r.CdAM2.Low = math.Max(0, r.Crr.Low), math.Max(0, r.CdAM2.Low)
	for f, a := range q.free {
		for g, b := range q.free {
			if a == pCrr && b == pCdA {
				r.Correlation = *q.cov.at(f, g) / (r.Crr.Error * r.CdAM2.Error)
			}
		}
	}
	for i := range runs {
		r.BothWays = r.BothWays || runs[i].Back != runs[0].Back
		r.Runs = append(r.Runs, q.runFit(i))
	}
	q.odd(runs, s, heldCrr, heldCdA, r)
	return r, nil
}

func (q *problem) runFit(i int) RunFit {
	m := &q.models[i]
	n := m.readings
	base := make([]float64, n)
	m.predict(q.p, base)
	out := RunFit{FromS: m.time(0), ToS: m.time(n - 1)}
	sum := 0.0
	for k := range n {
		off := (m.reading(k) - base[k]) / m.error(k)
		sum += off * off
	}
	out.Misfit = math.Sqrt(sum / float64(n))
	// The curve is in speeds, for marks too.
	speeds := Run{Back: m.run.Back, Points: make([]Point, n)}
	for k := range n {
		speeds.Points[k].AtS = m.time(k)
	}
	asSpeeds := model{run: &speeds, back: m.back, at: i, readings: n}
	asSpeeds.predict(q.p, base)
	for k, v := range base {
		out.Curve = append(out.Curve, Point{AtS: m.time(k), SpeedMps: math.Max(0, v)})
		if k > 0 {
			out.LengthM += (base[k] + base[k-1]) / 2 * (m.time(k) - m.time(k-1))
		}
	}
	out.StartMps, out.EndMps = out.Curve[0].SpeedMps, out.Curve[n-1].SpeedMps
	return out
}

// oddBy is how much better the runs must fit, in the sum of squares, when one
// is taken to have been ridden the other way.
const oddBy = 12

// odd marks the run that fits much better the other way.
func (q *problem) odd(runs []Run, s *Setup, heldCrr, heldCdA bool, r *Result) {
	if len(runs) < 2 || len(runs) > 12 {
		return
	}
	base := q.cost()
	most, which := oddBy*1.0, -1
	for i := range runs {
		turned := append([]Run(nil), runs...)
		turned[i].Back = !turned[i].Back
		t := newProblem(turned, s, heldCrr, heldCdA)
		copy(t.p, q.p)
		for k := range t.errors {
			copy(t.errors[k], q.errors[k])
		}
		t.wander, t.scale = q.wander, q.scale
		e := t.normal(t.linearise(), t.wander)
		square := t.finish(&e, t.scale)
		cov, ok := e.a.inverse()
		if !ok {
			continue
		}
		// What one step would leave.
		for f := range t.free {
			for g := range t.free {
				square -= e.b[f] * *cov.at(f, g) * e.b[g]
			}
		}
		if better := base - square; better > most {
			most, which = better, i
		}
	}
	if which >= 0 {
		r.Runs[which].Odd = true
	}
}
