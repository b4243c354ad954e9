package slope

import (
	"math"

	"hillwright/physics/unit"
)

// Combined is what several readings of one pitch say together. Its Error is
// already widened when they do not fit.
type Combined struct {
	Reading
	// ChiSquare is the sum of squares of the readings' distances from the
	// combined grade, each by its error; Freedom is readings − 1; P is the chance
	// of a sum as large when the errors are right.
	ChiSquare float64
	Freedom   int
	P         float64
	// Misfit tells that P is below 0.05: one of the readings is likely wrong.
	// Widened is then the factor by which the error was widened, √(χ²/freedom)
	// (R. T. Birge, Phys. Rev. 40 (1932) 207), otherwise 1.
	Misfit  bool
	Widened float64
	// Odd is the reading that fits worst, −1 without a misfit or when two
	// readings cannot tell.
	Odd int
}

// misfitP is the chance below which readings are said not to fit.
const misfitP = 0.05

// Combine weighs readings of one pitch by inverse variance. What readings of
// the same SharedBy have in common is not averaged down: they are combined
// first, and their shared error is added once. Grades are to be counted in one
// direction (see Reversed).
func Combine(readings []Reading) (Combined, error) {
	if len(readings) == 0 {
		return Combined{}, &Error{Kind: NotEnough, What: "readings"}
	}
	for _, r := range readings {
		if _, err := checked(r); err != nil {
			return Combined{}, err
		}
		if !finite(r.Shared) || r.Shared < 0 || r.Shared > r.Error {
			return Combined{}, &Error{Kind: OutOfRange, What: "shared error", Got: r.Shared}
		}
	}
	if len(readings) == 1 {
		return Combined{Reading: readings[0], P: 1, Widened: 1, Odd: -1}, nil
	}
	mean, variance, chi := weigh(readings, -1)
	c := Combined{ChiSquare: chi, Freedom: len(readings) - 1, Widened: 1, Odd: -1}
	c.P = chanceBeyond(chi, c.Freedom)
	if c.P < misfitP {
		c.Misfit, c.Widened = true, max(1, math.Sqrt(chi/float64(c.Freedom)))
		c.Odd = odd(readings)
	}
	r, err := checked(Reading{Grade: unit.Grade(mean), Error: math.Sqrt(variance) * c.Widened, Method: ByAll})
	c.Reading = r
	return c, err
}

// odd is the reading without which the rest fits best.
func odd(readings []Reading) int {
	if len(readings) < 3 {
		return -1
	}
	worst, least := -1, math.Inf(1)
	for i := range readings {
		if _, _, chi := weigh(readings, i); chi < least {
			worst, least = i, chi
		}
	}
	return worst
}

// sum gathers values by inverse variance.
type sum struct{ w, wx, wxx float64 }

func (s *sum) add(x, variance float64) {
	s.w += 1 / variance
	s.wx += x / variance
	s.wxx += x * x / variance
}

func (s *sum) mean() float64 { return s.wx / s.w }

// chi is the sum of squares of the distances from the mean, each by its error.
func (s *sum) chi() float64 { return max(0, s.wxx-s.wx*s.wx/s.w) }

// weigh combines all readings but one; skip is −1 for all.
func weigh(readings []Reading, skip int) (mean, variance, chi float64) {
	var all sum
	done := make([]bool, len(readings))
	for i := range readings {
		if i == skip || done[i] {
			continue
		}
		var group sum
		shared := readings[i].Shared
		for j := i; j < len(readings); j++ {
			alike := j == i || readings[i].SharedBy != "" && readings[j].SharedBy == readings[i].SharedBy
			if j == skip || done[j] || !alike {
				continue
			}
			done[j] = true
			shared = max(shared, readings[j].Shared)
			group.add(float64(readings[j].Grade), readings[j].ownVariance())
		}
		all.add(group.mean(), 1/group.w+shared*shared)
		chi += group.chi()
	}
	return all.mean(), 1 / all.w, chi + all.chi()
}

// ownVariance is what is left of the variance without the shared part.
func (r *Reading) ownVariance() float64 {
	return max(r.Error*r.Error-r.Shared*r.Shared, 1e-6*r.Error*r.Error)
}

// chanceBeyond is the chance that chi-square of so many degrees of freedom is
// larger: closed sums for whole degrees (Abramowitz & Stegun 1964, 26.4.4 and
// 26.4.5).
func chanceBeyond(chi float64, freedom int) float64 {
	if chi <= 0 {
		return 1
	}
	half := chi / 2
	if freedom%2 == 0 {
		term, total := 1.0, 1.0
		for i := 1; i < freedom/2; i++ {
			term *= half / float64(i)
			total += term
		}
		return min(1, math.Exp(-half)*total)
	}
	total := math.Erfc(math.Sqrt(half))
	term := math.Exp(-half) * math.Sqrt(half) / (math.Sqrt(math.Pi) / 2)
	for i := 1; i <= freedom/2; i++ {
		total += term
		term *= half / (float64(i) + 0.5)
	}
	return min(1, total)
}
