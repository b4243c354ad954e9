package slope

import (
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
	off     []float64
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
		if math.Abs(now-before) > max(leastMove, 10*max(scatter, scatterNow)) {
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
