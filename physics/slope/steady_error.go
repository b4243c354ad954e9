package slope

import "math"

// What is taken to begin with for the time over which samples hang together: a
// second, with the weight of three seconds of samples. Set so that the tests'
// streams are covered also when they are stopped as soon as it is enough.
const priorTogether, priorCells = 10, 30

// mean gives the mean of the kept cells, its standard error, and what a drift
// may have done to it. Samples that hang together in time count for fewer: the
// variance of the mean is s²τ/(n−τ), where τ is the sum of the autocorrelations
// on both sides, up to five τ (A. Sokal, Monte Carlo methods in statistical
// mechanics, 1989, section 3). With few of them left the error is stretched as
// Student's t is (its expansion for 95 %, Abramowitz & Stegun 1964, 26.7.5).
func (w *work) mean(step float64) (mean, err, drift float64, drifting bool) {
	n := float64(len(w.kept))
	meanT, within, count := 0.0, 0.0, 0.0
	for _, c := range w.kept {
		mean += c.mean / n
		meanT += c.timeS / n
		within += c.squares
		count += float64(c.count)
	}
	w.off = w.off[:0]
	squares, tt, tv := 0.0, 0.0, 0.0
	for _, c := range w.kept {
		dt, dv := c.timeS-meanT, c.mean-mean
		w.off = append(w.off, dv)
		squares += dv * dv
		tt += dt * dt
		tv += dt * dv
	}
	variance := squares / n
	tau := together(w.off, squares)
	free := n/tau - 1
	stretch := 1 + 1.21/free + 1.44/(free*free)
	err = root(math.Sqrt(variance/free)*stretch, rounding(variance+within/count, step))
	if !(tt > 0) { // times too large to tell apart
		return mean, err, 0, false
	}
	rate := tv / tt
	drift, drifting = w.drift(rate, tt, meanT)
	return mean, err, drift, drifting
}

// drift tells what a steady rate [rad/s] may have done to the mean, and whether
// it is more than chance: what is left beside the straight line says what
// chance does to the rate.
func (w *work) drift(rate, tt, meanT float64) (most float64, sure bool) {
	squares := 0.0
	for i, c := range w.kept {
		w.off[i] -= rate * (c.timeS - meanT)
		squares += w.off[i] * w.off[i]
	}
	n := float64(len(w.off))
	tau := together(w.off, squares)
	byChance := squares / n * tau / tt
	span := w.kept[len(w.kept)-1].timeS - w.kept[0].timeS
	most = math.Sqrt(max(0, rate*rate-byChance)) * span / 2
	return most, math.Abs(rate)*span > leastDrift && rate*rate > 9*byChance
}

// together is τ of distances from a mean, in cells, up to a third of them.
// Each autocorrelation is low by about τ/n, since the mean is taken of the same
// samples.
func together(off []float64, squares float64) float64 {
	n := len(off)
	most := float64(n) / 3
	tau := 1.0
	if squares <= 0 {
		return tau
	}
	for lag := 1; lag < n/2 && float64(lag) < 5*tau && tau < most; lag++ {
		product := 0.0
		for i := lag; i < n; i++ {
			product += off[i] * off[i-lag]
		}
		tau += 2 * (product/squares + tau/float64(n))
	}
	tau = (float64(n)*tau + priorCells*priorTogether) / (float64(n) + priorCells)
	return min(tau, most)
}

// rounding is the error of the mean of values that are rounded to a step, when
// they scatter with a variance, rounding included: noise averages it away
// (B. Widrow and I. Kollár, Quantization Noise, 2008, chapter 6).
func rounding(variance, step float64) float64 {
	noise := max(0, variance/(step*step)-1.0/12)
	return step / math.Sqrt(12) * math.Exp(-2*math.Pi*math.Pi*noise)
}
