package click

import (
	"math"
	"sort"
)

// Single clicks are told apart when they are at least aloneS apart [s].
const aloneS = 0.012

// mostOnsets is how many single clicks are kept: more than any roll-out has.
const mostOnsets = 4000

// onsetsOf finds single clicks in the loudness: its peaks, which fall into two
// groups, clicks and noise, parted where the variance within the groups is
// least (Otsu, IEEE Trans. Syst. Man Cybern. 9 (1979) 62; from memory). It
// gives none where the groups are no clear two.
func onsetsOf(level []uint8, hz float64) []float64 {
	reach := max(1, int(aloneS*hz/2))
	type peak struct {
		at    int
		level uint8
	}
	var peaks []peak
	var counts [256]int
	for i := reach; i+reach < len(level); i++ {
		v := level[i]
		top := v > level[i-1] && v >= level[i+1]
		for d := 1; top && d <= reach; d++ {
			top = v > level[i-d] && v >= level[i+d]
		}
		if top {
			peaks = append(peaks, peak{i, v})
			counts[v]++
		}
	}
	split, apart := otsu(counts[:])
	if apart < leastApartDB/levelDB {
		return nil
	}
	var out []float64
	for _, p := range peaks {
		if int(p.level) >= split {
			out = append(out, float64(p.at)/hz)
		}
	}
	if len(out) > mostOnsets {
		return nil
	}
	return out
}

// leastApartDB is how far clicks must stand above noise to be counted [dB].
const leastApartDB = 10

// otsu gives the first value of the upper group, and how far the two groups'
// means are apart.
func otsu(counts []int) (split int, apart float64) {
	var all, sum float64
	for v, n := range counts {
		all += float64(n)
		sum += float64(n * v)
	}
	best := -1.0
	var below, belowSum float64
	for v, n := range counts {
		if below > 0 && below < all {
			m0, m1 := belowSum/below, (sum-belowSum)/(all-below)
			if between := below * (all - below) * (m1 - m0) * (m1 - m0); between > best {
				best, split, apart = between, v, m1-m0
			}
		}
		below += float64(n)
		belowSum += float64(n * v)
	}
	return split, apart
}

// Count counts single clicks between two times [s], for a wheel that is rolled
// through counted turns; off is by how many it may be wrong. The error is an
// *Error.
func (h *Heard) Count(fromS, toS float64) (clicks int, off float64, err error) {
	var at []float64
	for _, t := range h.onsets {
		if t >= fromS && t <= toS {
			at = append(at, t)
		}
	}
	if len(at) < 8 {
		return 0, 0, &Error{Kind: NoSingle}
	}
	odd := 0.0
	for i := 1; i+1 < len(at); i++ {
		a, b := at[i]-at[i-1], at[i+1]-at[i]
		// One that is missing doubles a gap, one too many halves it; a wheel that
		// starts or stops changes its gaps little by little.
		if r := a / b; r > 1.7 || r < 1/1.7 {
			odd++
		}
	}
	off = odd / 2
	if off > 0.1*float64(len(at)) {
		return 0, 0, &Error{Kind: NoSingle}
	}
	return len(at), off, nil
}

func median(values []float64) float64 {
	if len(values) == 0 {
		return math.NaN()
	}
	sort.Float64s(values)
	n := len(values)
	return (values[(n-1)/2] + values[n/2]) / 2
}
