package hill

import "math"

// datum is one measured height: part of the way from node to node+1, so that
// a curve z takes the value (1−part)·z[node] + part·z[node+1] there.
type datum struct {
	node    int
	part    float64
	heightM float64
	weight  float64 // 0 to 1, as it begins
	filled  bool    // not measured: filled in to hold the curve over a hole
}

// smoother fits a curve at evenly spaced nodes to heights: it minimises
//
//	Σ w·(h − Bz)² + λ·Σ p·(z[i−1] − 2z[i] + z[i+1])²
//
// which is the method of Whittaker (1923, Proc. Edinb. Math. Soc. 41, 63–75)
// and Henderson (1924, Trans. Actuar. Soc. Am. 25, 29–40), on a basis of
// straight pieces between nodes (Eilers & Marx 1996, Stat. Sci. 11, 89–121, of
// degree 1), solved as a banded system (Eilers 2003, Anal. Chem. 75, 3631–3636).
type smoother struct {
	data []datum
	w    []float64 // current weights of data
	p    []float64 // current weights of the roughness at inner nodes
	z    []float64 // the curve
	// The symmetric system: diagonal and two bands above it; factors after
	// solve; bands of the inverse after inverse.
	d, e, f    []float64
	rhs        []float64
	s0, s1, s2 []float64
}

func newSmoother(nodes int, data []datum) *smoother {
	block := make([]float64, 10*nodes)
	cut := func() []float64 {
		v := block[:nodes:nodes]
		block = block[nodes:]
		return v
	}
	s := &smoother{data: data, w: make([]float64, len(data)), p: cut(), z: cut(), d: cut(), e: cut(), f: cut(),
		rhs: cut(), s0: cut(), s1: cut(), s2: cut()}
	for i := range data {
		s.w[i] = data[i].weight
	}
	for i := range s.p {
		s.p[i] = 1
	}
	return s
}

// solve finds the curve for a λ by the LDLᵀ factors of the banded system.
func (s *smoother) solve(lambda float64) {
	n := len(s.z)
	d, e, f, z := s.d, s.e, s.f, s.rhs
	clear(d)
	clear(e)
	clear(f)
	clear(z)
	for i := range s.data {
		o := &s.data[i]
		b := o.part
		a, w := 1-b, s.w[i]
		d[o.node] += w * a * a
		z[o.node] += w * a * o.heightM
		if b > 0 {
			d[o.node+1] += w * b * b
			e[o.node] += w * a * b
			z[o.node+1] += w * b * o.heightM
		}
	}
	for i := 1; i < n-1; i++ {
		l := lambda * s.p[i]
		d[i-1] += l
		d[i] += 4 * l
		d[i+1] += l
		e[i-1] -= 2 * l
		e[i] -= 2 * l
		f[i-1] += l
	}
	// LDLᵀ: e and f become the bands of L below the diagonal.
	for i := 0; i < n; i++ {
		if i >= 2 {
			d[i] -= f[i-2] * f[i-2] * d[i-2]
		}
		if i >= 1 {
			d[i] -= e[i-1] * e[i-1] * d[i-1]
			e[i] -= e[i-1] * f[i-1] * d[i-1]
		}
		e[i] /= d[i]
		f[i] /= d[i]
	}
	for i := 1; i < n; i++ {
		z[i] -= e[i-1] * z[i-1]
		if i >= 2 {
			z[i] -= f[i-2] * z[i-2]
		}
	}
	for i := n - 1; i >= 0; i-- {
		z[i] /= d[i]
		if i+1 < n {
			z[i] -= e[i] * z[i+1]
		}
		if i+2 < n {
			z[i] -= f[i] * z[i+2]
		}
	}
	copy(s.z, z)
}

// at is the curve's height at a datum.
func (s *smoother) at(o *datum) float64 {
	if o.part == 0 {
		return s.z[o.node]
	}
	return (1-o.part)*s.z[o.node] + o.part*s.z[o.node+1]
}

// score is the generalised cross-validation of the last solution (Craven &
// Wahba 1979, Numer. Math. 31, 377–403): mean squared residual over the squared
// share of freedom that is left. The trace needs only the bands of the inverse
// (Hutchinson & de Hoog 1985, Numer. Math. 47, 99–106).
func (s *smoother) score() float64 {
	s.inverse()
	sum, count, trace := 0.0, 0.0, 0.0
	for i := range s.data {
		o := &s.data[i]
		if o.filled {
			continue
		}
		a, b, w := 1-o.part, o.part, s.w[i]
		lever := a * a * s.s0[o.node]
		if b > 0 {
			lever += 2*a*b*s.s1[o.node] + b*b*s.s0[o.node+1]
		}
		r := o.heightM - s.at(o)
		sum += w * r * r
		count++
		trace += w * lever
	}
	free := 1 - trace/count
	if !(free > 1e-9) {
		return math.Inf(1)
	}
	return sum / count / (free * free)
}

// inverse finds the diagonal and two bands of the inverse from the factors.
func (s *smoother) inverse() {
	n := len(s.z)
	for i := n - 1; i >= 0; i-- {
		var l1, l2, d1, c1, d2 float64
		if i+1 < n {
			l1, d1, c1 = s.e[i], s.s0[i+1], s.s1[i+1]
		}
		if i+2 < n {
			l2, d2 = s.f[i], s.s0[i+2]
		}
		s.s2[i] = -l1*c1 - l2*d2
		s.s1[i] = -l1*d1 - l2*c1
		s.s0[i] = 1/s.d[i] - l1*s.s1[i] - l2*s.s2[i]
	}
}
