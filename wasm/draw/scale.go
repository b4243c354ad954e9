package draw

import "math"

// tidyStep gives the step of a scale from 0 to most, 1, 2 or 5 times a power of
// ten, so that there are at most so many steps.
func tidyStep(most float64, steps int) float64 {
	if !(most > 0) || math.IsInf(most, 0) || steps < 1 {
		return 1
	}
	raw := most / float64(steps)
	ten := math.Pow(10, math.Floor(math.Log10(raw)))
	for _, f := range []float64{1, 2, 5} {
		if f*ten >= raw*(1-1e-9) {
			return f * ten
		}
	}
	return 10 * ten
}

func clampTo(x, low, high float64) float64 { return math.Max(low, math.Min(high, x)) }
