package coast

import "math"

// What a run must have.
const (
	leastReadings = 5
	leastS        = 6
	leastStartMps = 2.5
	leastPart     = 0.15
	fastestMps    = 40
	mostReadings  = 5000
)

// checked tells what is wrong with a run.
func checked(at int, r *Run) error {
	n := len(r.Points) + len(r.Marks)
	if n < leastReadings {
		return &Error{Kind: TooFew, Run: at, Got: float64(n), Want: leastReadings}
	}
	if len(r.Points) > 0 && len(r.Marks) > 0 || n > mostReadings {
		return &Error{Kind: BadNumber, Run: at}
	}
	var first, last, begins, ends float64
	if len(r.Marks) > 0 {
		m := r.Marks
		for i, v := range m {
			if !finite(v.AtM, v.AtS, v.ErrorS) || !(v.ErrorS > 0) || math.Abs(v.AtS) > 1e6 || math.Abs(v.AtM) > 1e6 || i > 0 && !(v.AtS > m[i-1].AtS && v.AtM > m[i-1].AtM) {
				return &Error{Kind: BadNumber, Run: at}
			}
		}
		speed := func(a, b int) float64 { return (m[b].AtM - m[a].AtM) / (m[b].AtS - m[a].AtS) }
		first, last = m[0].AtS, m[n-1].AtS
		begins, ends = speed(0, 1), speed(n-2, n-1)
	} else {
		p := r.Points
		for i, v := range p {
			if !finite(v.AtS, v.SpeedMps, v.ErrorMps) || !(v.ErrorMps > 0) || v.SpeedMps < 0 || v.SpeedMps > fastestMps || math.Abs(v.AtS) > 1e6 || i > 0 && !(v.AtS > p[i-1].AtS) {
				return &Error{Kind: BadNumber, Run: at}
			}
		}
		first, last = p[0].AtS, p[n-1].AtS
		begins, ends = (p[0].SpeedMps+p[1].SpeedMps)/2, (p[n-1].SpeedMps+p[n-2].SpeedMps)/2
	}
	switch {
	case begins > fastestMps:
		return &Error{Kind: BadNumber, Run: at}
	case last-first < leastS:
		return &Error{Kind: TooShort, Run: at, Got: last - first, Want: leastS}
	case ends >= begins:
		return &Error{Kind: SpeedsUp, Run: at}
	case begins < leastStartMps:
		return &Error{Kind: TooSlow, Run: at, Got: begins, Want: leastStartMps}
	case ends > (1-leastPart)*begins:
		return &Error{Kind: SmallRange, Run: at, Got: 1 - ends/begins, Want: leastPart}
	}
	return nil
}

func finite(list ...float64) bool {
	for _, v := range list {
		if math.IsNaN(v) || math.IsInf(v, 0) {
			return false
		}
	}
	return true
}

// checkedSetup tells whether the numbers known beforehand are such.
func checkedSetup(s *Setup) error {
	for _, row := range []struct {
		v         Value
		low, high float64
	}{
		{s.MassKg, 5, 1000}, {s.InertiaKg, 0, 100}, {s.Grade, -0.4, 0.4}, {s.HeadMps, -20, 20}, {s.DensityKgM3, 0.3, 2},
		{s.CircumferencePart, 0.5, 2}, {s.Crr, 0.0005, 0.2}, {s.CdAM2, 0.05, 6},
	} {
		if !finite(row.v.Value, row.v.Error) || row.v.Value < row.low || row.v.Value > row.high || row.v.Error < 0 {
			return &Error{Kind: BadNumber}
		}
	}
	return nil
}
