package slope

import (
	"hillwright/physics/unit"
	"math"
	"slices"
)

// What counts as a bump or a move [rad]. Common practice, no source.
const (
	leastScatter = 0.02 * degree // nothing lies stiller
	leastBump    = 0.1 * degree
	leastMove    = 0.5 * degree
	leastDrift   = 0.1 * degree
	halfSteady   = 0.3 * degree
	newestCells  = 10 // a second
)

// Add takes a sample: its time [s, rising] and angle [rad]. A sample that is
// not a number is passed over; after a silence of two seconds, or when time
// goes back, averaging begins anew.
func (s *Steady) Add(timeS float64, angle unit.Angle) {
	if !finite(timeS) || !finite(float64(angle)) {
		return
	}
	begun := s.open.count > 0 || len(s.cells) > 0
	if begun && (timeS < s.lastS || timeS > s.lastS+gapS) {
		s.cells, s.open = s.cells[:0], cell{}
		s.now = Average{Moves: s.moves}
	}
	s.lastS = timeS
	if s.open.count > 0 && timeS >= s.openEndS {
		if len(s.cells) == mostCells {
			copy(s.cells, s.cells[1:])
			s.cells = s.cells[:mostCells-1]
		}
		s.cells = append(s.cells, s.open)
		s.open = cell{}
		s.refresh()
	}
	if s.open.count == 0 {
		s.openEndS = timeS + cellS
	}
	s.open.add(timeS, float64(angle))
}

// add keeps mean and sum of squares (Welford 1962, Technometrics 4, 419).
func (c *cell) add(timeS, v float64) {
	c.count++
	d := v - c.mean
	c.mean += d / float64(c.count)
	c.squares += d * (v - c.mean)
	c.timeS += (timeS - c.timeS) / float64(c.count)
}

// refresh makes the average anew of the cells.
func (s *Steady) refresh() {
	w := &s.work
	if s.moved() {
		s.moves++
		s.cells = append(s.cells[:0], s.cells[len(s.cells)-newestCells:]...)
	}
	s.now = Average{Moves: s.moves, Steadiness: steadiness(s.cells)}
	bumps := w.keep(s.cells)
	n := len(w.kept)
	if n < 4 {
		return
	}
	s.now.Bumps = bumps
	s.now.Seconds = w.kept[n-1].timeS - w.kept[0].timeS + cellS
	mean, err, drift, drifting := w.mean(s.step)
	s.now.Mean, s.now.Error = unit.Angle(mean), unit.Angle(root(err, drift))
	s.now.Drifting = drifting
	wanted := s.target / float64(s.now.Error)
	s.now.Progress = min(1, wanted*wanted, float64(n)/leastCells)
	s.now.Enough = s.now.Progress >= 1 && !drifting
}

// steadiness is one half at a scatter of halfSteady over the newest second.
func steadiness(cells []cell) float64 {
	newest := cells[max(0, len(cells)-newestCells):]
	n, mean, squares := 0.0, 0.0, 0.0
	for _, c := range newest {
		n++
		d := c.mean - mean
		mean += d / n
		squares += d*(c.mean-mean) + c.squares/float64(c.count)
	}
	return 1 / (1 + squares/n/(halfSteady*halfSteady))
}

// work is room that refresh uses again and again.
type work struct {
	kept    []cell
	sorted  []float64
	keeping []bool
}

// middle gives the median of the cells' means and the median distance from it,
// scaled to a standard error (1.4826: normal distribution).
func (w *work) middle(cells []cell) (median, scatter float64) {
	w.sorted = w.sorted[:0]
	for _, c := range cells {
		w.sorted = append(w.sorted, c.mean)
	}
	slices.Sort(w.sorted)
	median = w.sorted[len(w.sorted)/2]
	for i, v := range w.sorted {
		w.sorted[i] = math.Abs(v - median)
	}
	slices.Sort(w.sorted)
	return median, max(leastScatter, 1.4826*w.sorted[len(w.sorted)/2])
}

// moved tells that the newest second lies apart from a second or two before
// it, by much more than either scatters: the phone lies elsewhere.
func (s *Steady) moved() bool {
	n := len(s.cells) - newestCells
	if n < newestCells {
		return false
	}
	now, scatterNow := s.work.middle(s.cells[n:])
	for end := n; end >= newestCells && end > n-4*newestCells; end -= newestCells {
		before, scatter := s.work.middle(s.cells[max(0, end-2*newestCells):end])
		if math.Abs(now-before) > max(leastMove, 6*max(scatter, scatterNow)) {
			return true
		}
	}
	return false
}

// keep takes the cells without the bumps and those beside them, and counts
// what is left out.
func (w *work) keep(cells []cell) (bumps int) {
	median, scatter := w.middle(cells)
	most := max(leastBump, 5*scatter)
	w.keeping = append(w.keeping[:0], make([]bool, len(cells))...)
	for i := range cells {
		w.keeping[i] = math.Abs(cells[i].mean-median) <= most
	}
	w.kept = w.kept[:0]
	for i := range cells {
		alone := w.keeping[i] && (i == 0 || w.keeping[i-1]) && (i+1 == len(cells) || w.keeping[i+1])
		if alone {
			w.kept = append(w.kept, cells[i])
		} else {
			bumps++
		}
	}
	return bumps
}

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
	squares, tt, tv := 0.0, 0.0, 0.0
	for _, c := range w.kept {
		dt, dv := c.timeS-meanT, c.mean-mean
		squares += dv * dv
		tt += dt * dt
		tv += dt * dv
	}
	variance := squares / n
	together := w.together(mean, squares)
	ofMean := variance * together / (n - together)
	free := n/together - 1
	stretch := 1 + 1.21/free + 1.44/(free*free)
	err = math.Sqrt(ofMean) * stretch
	err = root(err, rounding(variance+within/count, step))

	span := n * cellS
	rate := tv / tt
	byChance := variance * together / tt
	drift = math.Sqrt(max(0, rate*rate-byChance)) * span / 2
	drifting = math.Abs(rate)*span > leastDrift && rate*rate > 9*byChance
	return mean, err, drift, drifting
}

// together is τ of the kept cells, 1 to a third of them.
func (w *work) together(mean, squares float64) float64 {
	n := len(w.kept)
	most := float64(n) / 3
	tau := 1.0
	if squares <= 0 {
		return tau
	}
	for lag := 1; lag < n/2 && float64(lag) < 5*tau && tau < most; lag++ {
		product := 0.0
		for i := lag; i < n; i++ {
			product += (w.kept[i].mean - mean) * (w.kept[i-lag].mean - mean)
		}
		tau += 2 * (product/squares + 1/float64(n))
	}
	return max(1, min(tau, most))
}

// rounding is the error of the mean of values that are rounded to a step, when
// they scatter with a variance, rounding included: noise averages it away
// (B. Widrow and I. Kollár, Quantization Noise, 2008, chapter 6).
func rounding(variance, step float64) float64 {
	if step == 0 {
		return 1e-9
	}
	noise := max(0, variance/(step*step)-1.0/12)
	return step / math.Sqrt(12) * math.Exp(-2*math.Pi*math.Pi*noise)
}
