package hill

import "math"

// The length scales of smoothing [m]. The bounds of cross-validation, and the
// scale for heights in whole metres, whose errors go together and would mislead
// it, were chosen on synthetic ramps and flats with noise (see the test): 20 m
// still shows a 30 m ramp at 18 %, 8 m leaves a curve that is clean alone.
const (
	ShortestSmoothM = 8.0
	LongestSmoothM  = 20.0
	coarseSmoothM   = 15.0
	firstSmoothM    = 12.0 // of the first curve, which shows where the road bends
	scalesTried     = 8
	rounds          = 6    // of reweighting
	leastScale      = 0.7  // pieces: a softer curve would swing between heights that lie off its nodes
	leastSpreadM    = 0.2  // heights are never thought to be better than this
	leastPull       = 0.2  // weight of a rounded height within half a metre
	leastStiff      = 0.02 // what is left of the roughness weight at the sharpest bend
)

// fitHeights finds the heights at the nodes, which are spacing m apart.
func fitHeights(data []datum, nodes int, spacingM float64, kind heightKind, smoothM float64) []float64 {
	s := newSmoother(nodes, data)
	stiff := func(scaleM float64) float64 {
		x := max(scaleM/spacingM, leastScale)
		return x * x * x * x
	}
	s.solve(stiff(firstSmoothM))
	s.forgiveBends(spacingM)
	switch {
	case smoothM != 0:
	case kind == coarseHeights:
		smoothM = coarseSmoothM
	default:
		smoothM = s.choose(stiff)
	}
	for range rounds {
		s.solve(stiff(smoothM))
		if kind == coarseHeights {
			s.forgiveHalfMetre()
		} else {
			s.forgiveOutliers()
		}
		s.forgiveBends(spacingM)
	}
	s.solve(stiff(smoothM))
	return s.z
}

// choose gives the length scale with the least cross-validation score.
func (s *smoother) choose(stiff func(float64) float64) float64 {
	best, least := ShortestSmoothM, math.Inf(1)
	for i := range scalesTried {
		scale := ShortestSmoothM * math.Pow(LongestSmoothM/ShortestSmoothM, float64(i)/(scalesTried-1))
		s.solve(stiff(scale))
		if score := s.score(); score < least {
			best, least = scale, score
		}
	}
	return best
}

// forgiveOutliers weighs each height by how far it lies off the curve, with
// Tukey's biweight (Beaton & Tukey 1974, Technometrics 16, 147–185): 4.685 times
// the spread, estimated by the median, and more weigh nothing.
func (s *smoother) forgiveOutliers() {
	off := make([]float64, 0, len(s.data))
	for i := range s.data {
		if !s.data[i].filled {
			off = append(off, math.Abs(s.data[i].heightM-s.at(&s.data[i])))
		}
	}
	reach := 4.685 * max(1.4826*medianOf(off), leastSpreadM)
	for i := range s.data {
		o := &s.data[i]
		if o.filled {
			continue
		}
		u := (o.heightM - s.at(o)) / reach
		s.w[i] = 0
		if u = 1 - u*u; u > 0 {
			s.w[i] = o.weight * u * u
		}
	}
}

// forgiveHalfMetre lets the curve pass anywhere within half a metre of a
// height that was rounded to whole metres: what lies within pulls little.
func (s *smoother) forgiveHalfMetre() {
	for i := range s.data {
		o := &s.data[i]
		if o.filled {
			continue
		}
		off := math.Abs(o.heightM - s.at(o))
		s.w[i] = o.weight * max(leastPull, 1-0.5/max(off, 0.5))
	}
}

// forgiveBends weighs the roughness less where the curve bends far more than
// it does elsewhere, so that the road is taken for stretches of even grade with
// bends between them and a short ramp keeps its grade. It is the robust
// reweighting above, turned on the roughness, with Cauchy's weights (Holland &
// Welsch 1977, Commun. Stat. A 6, 813–827); a bend of 1 % in grade from piece
// to piece is never thought to be much.
func (s *smoother) forgiveBends(spacingM float64) {
	n := len(s.z)
	if n < 3 {
		return
	}
	bend := func(i int) float64 { return math.Abs(s.z[i-1] - 2*s.z[i] + s.z[i+1]) }
	bends := s.rhs[:n-2] // free between two solutions
	for i := range bends {
		bends[i] = bend(i + 1)
	}
	usual := max(3*medianOf(bends), 0.01*spacingM)
	for i := 1; i < n-1; i++ {
		u := bend(i) / usual
		s.p[i] = max(leastStiff, 1/(1+u*u))
	}
}
