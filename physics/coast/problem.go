package coast

import "math"

// problem is a least-squares fit of runs: numbers with what is known of them
// beforehand, and readings with errors.
type problem struct {
	models []model
	known  []Value // beforehand; an error of 0 holds the number, +Inf knows nothing
	p      []float64
	errors [][]float64 // of each run's readings, outliers widened
	wander wander
	scale  float64 // by which errors turn out larger than stated, at least 1
	free   []int
	cov    matrix // of the free numbers
}

// steps are those by which numbers are changed to see what they do.
var steps = [...]float64{
	pCrr: 1e-5, pCdA: 1e-3, pGrade: 1e-5, pHead: 1e-2, pMass: 0.05, pInertia: 0.01, pDensity: 1e-3, pScale: 1e-4,
}

var ownSteps = [...]float64{pStart: 1e-3, pGust: 1e-2, pPlace: 1e-2}

func stepOf(at int) float64 {
	if at < shared {
		return steps[at]
	}
	return ownSteps[(at-shared)%own]
}

// gustPart is how much the wind differs from run to run beside what is not
// known of it. Common practice, no source.
const gustPart = 0.4

// newProblem begins from what is known beforehand. heldCrr and heldCdA tell
// that what the bike was taken to have counts.
func newProblem(runs []Run, s *Setup, heldCrr, heldCdA bool) *problem {
	nothing := math.Inf(1)
	q := &problem{scale: 1}
	q.known = []Value{
		pCrr: {s.Crr.Value, nothing}, pCdA: {s.CdAM2.Value, nothing}, pGrade: s.Grade, pHead: s.HeadMps,
		pMass: s.MassKg, pInertia: s.InertiaKg, pDensity: s.DensityKgM3, pScale: s.CircumferencePart,
	}
	if heldCrr {
		q.known[pCrr].Error = s.Crr.Error
	}
	if heldCdA {
		q.known[pCdA].Error = s.CdAM2.Error
	}
	for i := range runs {
		m := model{run: &runs[i], at: i, back: 1, readings: len(runs[i].Points) + len(runs[i].Marks)}
		if runs[i].Back {
			m.back = -1
		}
		q.models = append(q.models, m)
		errs := make([]float64, m.readings)
		for k := range errs {
			errs[k] = m.error(k)
		}
		q.errors = append(q.errors, errs)
		start := Value{m.reading(0), nothing}
		place := Value{0, 0}
		if runs[i].Marks != nil {
			a, b := runs[i].Marks[0], runs[i].Marks[1]
			start.Value = (b.AtM - a.AtM) / (b.AtS - a.AtS)
			place = Value{a.AtM, nothing}
		}
		q.known = append(q.known, start, Value{0, gustPart * s.HeadMps.Error}, place)
	}
	q.p = make([]float64, len(q.known))
	for i, k := range q.known {
		q.p[i] = k.Value
		if k.Error > 0 {
			q.free = append(q.free, i)
		}
	}
	return q
}

// linear is the problem around the numbers as they are: for each run which of
// the free numbers it knows, and a row for each reading: what is left of it,
// and what each of those numbers does to it.
type linear struct {
	known [][]int // places in free
	rows  [][][]float64
}

func (q *problem) linearise() linear {
	var out linear
	for i := range q.models {
		m := &q.models[i]
		var known []int
		for f, at := range q.free {
			if at < shared || (at-shared)/own == i {
				known = append(known, f)
			}
		}
		base, moved := make([]float64, m.readings), make([]float64, m.readings)
		m.predict(q.p, base)
		cells := make([]float64, m.readings*(1+len(known)))
		rows := make([][]float64, m.readings)
		for k := range rows {
			rows[k] = cells[k*(1+len(known)) : (k+1)*(1+len(known))]
			rows[k][0] = m.reading(k) - base[k]
		}
		for c, f := range known {
			at := q.free[f]
			kept, step := q.p[at], stepOf(at)
			q.p[at] = kept + step
			m.predict(q.p, moved)
			q.p[at] = kept
			for k := range rows {
				rows[k][1+c] = (moved[k] - base[k]) / step
			}
		}
		out.known, out.rows = append(out.known, known), append(out.rows, rows)
	}
	return out
}

// normal are the normal equations of a linear problem at some wander: the
// matrix, the right side, the sum of squares that is left before the step, and
// the logarithms of the readings' variances.
type normal struct {
	a            matrix
	b            []float64
	square, logs float64
	readings     float64
}

func (q *problem) normal(l linear, w wander) normal {
	n := len(q.free)
	out := normal{a: newMatrix(n), b: make([]float64, n)}
	for i := range q.models {
		m := &q.models[i]
		w := w
		if m.run.Marks != nil {
			w.far = 0 // a place hardly wanders beside what a thumb is off
		}
		known := l.known[i]
		f := newFilter(w, 1+len(known))
		row := make([]float64, 1+len(known))
		own := make([]float64, len(known)*len(known))
		for k := range m.readings {
			if k > 0 {
				f.pass(m.time(k) - m.time(k-1))
			}
			copy(row, l.rows[i][k])
			out.logs += f.take(row, q.errors[i][k])
			out.square += row[0] * row[0]
			for c, x := range row[1:] {
				out.b[known[c]] += x * row[0]
				for d, y := range row[1 : c+2] {
					own[c*len(known)+d] += x * y
				}
			}
		}
		out.readings += float64(m.readings)
		for c := range known {
			for d := 0; d <= c; d++ {
				*out.a.at(known[c], known[d]) += own[c*len(known)+d]
			}
		}
	}
	return out
}

// finish brings in the scale and what is known beforehand.
func (q *problem) finish(e *normal, scale float64) (square float64) {
	by := 1 / (scale * scale)
	square = e.square * by
	for f, at := range q.free {
		e.b[f] *= by
		for g := 0; g <= f; g++ {
			*e.a.at(f, g) *= by
			*e.a.at(g, f) = *e.a.at(f, g)
		}
		if k := q.known[at]; !math.IsInf(k.Error, 1) {
			off := (k.Value - q.p[at]) / k.Error
			*e.a.at(f, f) += 1 / (k.Error * k.Error)
			e.b[f] += off / k.Error
			square += off * off
		}
	}
	return square
}

// settle takes Gauss–Newton steps, shortened where they do not help (Levenberg
// 1944, Marquardt 1963), until they bring less than a part of the sum of squares or are
// many; false where
// the numbers leave all bounds.
func (q *problem) settle(enough float64) bool {
	damp := 1e-6
	for range 60 {
		e := q.normal(q.linearise(), q.wander)
		square := q.finish(&e, q.scale)
		if math.IsNaN(square) || math.IsInf(square, 0) {
			return false
		}
		cov, ok := e.a.inverse()
		if !ok {
			return false
		}
		q.cov = cov
		kept := append([]float64(nil), q.p...)
		for ; ; damp *= 10 {
			better := square - q.stepped(&e, kept, damp)
			if better > enough*(1+square) {
				damp = math.Max(1e-9, damp/10)
				break
			}
			if better >= 0 || damp > 1e6 {
				if better < 0 {
					copy(q.p, kept)
				}
				return true
			}
		}
	}
	return true
}

// stepped takes a step from where the normal equations were made, and gives the
// sum of squares there.
func (q *problem) stepped(e *normal, from []float64, damp float64) float64 {
	n := len(q.free)
	a := matrix{n, append([]float64(nil), e.a.v...)}
	for f := range n {
		*a.at(f, f) *= 1 + damp
	}
	inverse, ok := a.inverse()
	if !ok {
		return math.Inf(1)
	}
	for f, at := range q.free {
		step := 0.0
		for g := range n {
			step += *inverse.at(f, g) * e.b[g]
		}
		q.p[at] = from[at] + step
	}
	q.p[pCrr] = math.Max(-0.2, math.Min(1, q.p[pCrr]))
	q.p[pCdA] = math.Max(-2, math.Min(20, q.p[pCdA]))
	if square := q.cost(); !math.IsNaN(square) {
		return square
	}
	return math.Inf(1)
}

// cost is the sum of squares at the numbers as they are.
func (q *problem) cost() float64 {
	all := q.free
	q.free = nil
	e := q.normal(q.linearise(), q.wander)
	q.free = all
	square := e.square / (q.scale * q.scale)
	for _, at := range all {
		if k := q.known[at]; !math.IsInf(k.Error, 1) {
			off := (k.Value - q.p[at]) / k.Error
			square += off * off
		}
	}
	return square
}

// judge finds how much the speed wanders, and whether the errors are larger
// than stated, where the readings are likeliest (restricted likelihood;
// Patterson & Thompson, Biometrika 58 (1971) 545).
func (q *problem) judge() {
	near := q.wander // once found, it is only found better
	l := q.linearise()
	at := func(w wander) (cost, scale float64) {
		e := q.normal(l, w)
		cov, ok := func() (matrix, bool) {
			trial := normal{a: matrix{e.a.n, append([]float64(nil), e.a.v...)}, b: append([]float64(nil), e.b...)}
			q.finish(&trial, 1)
			return trial.a.inverse()
		}()
		if !ok {
			return math.Inf(1), 1
		}
		// The sum of squares that is left after the best step, and the volume of
		// the numbers' doubt.
		left, volume := e.square, 0.0
		for f := range q.free {
			for g := range q.free {
				left -= e.b[f] * *cov.at(f, g) * e.b[g]
			}
		}
		spare := e.readings - float64(2+len(q.models))
		scale = math.Sqrt(math.Max(1, left/math.Max(1, spare)))
		volume = -logDeterminant(cov)
		return e.logs + spare*2*math.Log(scale) + left/(scale*scale) + volume, scale
	}
	best, scale := at(wander{})
	q.wander = wander{}
	try := func(w wander) {
		if cost, s := at(w); cost < best {
			best, scale, q.wander = cost, s, w
		}
	}
	if near.memoryS > 0 {
		try(near)
	} else {
		for _, memoryS := range []float64{0.5, 2, 6} {
			for far := 5e-4; far < 1; far *= 2.5 {
				try(wander{far, memoryS})
			}
		}
	}
	for _, by := range []float64{1.4, 1 / 1.4, 1.18, 1 / 1.18} {
		try(wander{q.wander.far * by, q.wander.memoryS})
	}
	q.scale = scale
}

func logDeterminant(m matrix) float64 {
	// By elimination: the matrix is symmetric and positive definite.
	n := m.n
	a := append([]float64(nil), m.v...)
	sum := 0.0
	for k := range n {
		d := a[k*n+k]
		if !(d > 0) {
			return math.Inf(-1)
		}
		sum += math.Log(d)
		for i := k + 1; i < n; i++ {
			by := a[i*n+k] / d
			for j := k; j < n; j++ {
				a[i*n+j] -= by * a[k*n+j]
			}
		}
	}
	return sum
}

// outlierAt is beyond how many errors a reading counts less (Huber, Ann. Math.
// Statist. 35 (1964) 73).
const outlierAt = 2.5

// widen gives readings that stand apart from their neighbours errors that let
// them.
func (q *problem) widen() {
	for i := range q.models {
		m := &q.models[i]
		if m.run.Marks != nil {
			continue
		}
		base := make([]float64, m.readings)
		m.predict(q.p, base)
		rest, apart := make([]float64, m.readings), make([]float64, m.readings)
		for k := range rest {
			rest[k] = m.reading(k) - base[k]
		}
		ratios := make([]float64, m.readings)
		for k := range rest {
			around := append([]float64(nil), rest[max(0, k-2):min(len(rest), k+3)]...)
			apart[k] = math.Abs(rest[k]-median(around)) / m.error(k)
			ratios[k] = apart[k]
		}
		usual := math.Max(1, 1.4826*median(ratios))
		for k := range rest {
			q.errors[i][k] = m.error(k) * math.Max(1, apart[k]/(outlierAt*usual))
		}
	}
}

func median(v []float64) float64 {
	// Insertion: the lists are short or nearly so.
	for i := 1; i < len(v); i++ {
		for k := i; k > 0 && v[k] < v[k-1]; k-- {
			v[k], v[k-1] = v[k-1], v[k]
		}
	}
	n := len(v)
	return (v[(n-1)/2] + v[n/2]) / 2
}
