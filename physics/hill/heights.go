package hill

import (
	"math"
	"slices"
	"sort"
)

// heightKind is what the heights of a way are worth.
type heightKind uint8

const (
	noHeights heightKind = iota
	fineHeights
	coarseHeights // whole metres
)

// mendHeights sets faulty heights to NaN and tells what the rest are worth.
func (w *way) mendHeights() heightKind {
	known, zeros, whole := 0, 0, true
	least := math.Inf(1) // the smallest height but 0
	for i := range w.points {
		h := w.points[i].HeightM
		switch {
		case math.IsNaN(h):
			continue
		case h == 0:
			zeros++
		default:
			least = min(least, math.Abs(h))
		}
		known++
	}
	if known == 0 {
		w.note(NoteNoHeights, 0, w.lengthM())
		return noHeights
	}
	if zeros == known {
		w.note(NoteZeroHeights, 0, w.lengthM())
		return noHeights
	}
	// A road that comes to exactly 0 m has other low points beside it.
	dropZeros := zeros > 0 && least > 20
	for i := range w.points {
		p := &w.points[i]
		if dropZeros && p.HeightM == 0 {
			p.HeightM = math.NaN()
		}
		if math.IsNaN(p.HeightM) {
			w.note(NoteSomeHeights, w.atM[i], 0)
		}
	}
	w.dropHeightSpikes()
	steps := 0
	for i := range w.points {
		h := w.points[i].HeightM
		if math.IsNaN(h) {
			continue
		}
		steps++
		whole = whole && math.Abs(h-math.Round(h)) < 1e-6
	}
	if whole && steps >= 10 {
		w.note(NoteCoarseHeights, 0, w.lengthM())
		return coarseHeights
	}
	return fineHeights
}

// dropHeightSpikes forgets single heights that stand out from the median of
// the seven around them as no road can (a running median: Tukey 1977).
func (w *way) dropHeightSpikes() {
	var at []int
	for i := range w.points {
		if !math.IsNaN(w.points[i].HeightM) {
			at = append(at, i)
		}
	}
	if len(at) < 7 {
		return
	}
	var window [7]float64
	var off []int
	for k := range at {
		from := max(0, min(k-3, len(at)-7))
		for j := range window {
			window[j] = w.points[at[from+j]].HeightM
		}
		if slices.Max(window[:])-slices.Min(window[:]) <= heightJumpM {
			continue
		}
		d := math.Abs(w.points[at[k]].HeightM - medianOf(window[:]))
		reach := w.atM[at[from+6]] - w.atM[at[from]]
		if d > heightJumpM && d > reach {
			off = append(off, at[k])
		}
	}
	for _, i := range off {
		w.points[i].HeightM = math.NaN()
		w.note(NoteSpike, w.atM[i], 0)
	}
}

// dropHeightSteps takes out rises from point to point that are steeper than
// 1:1, higher than heightJumpM, and took the recorder longer than driftS: its
// height drifted, or it found it again, while it hardly moved. The heights
// behind follow on, as behind a hole. Without times nothing is taken out: then
// the heights more likely come from a map, and are right further on.
func (w *way) dropHeightSteps() {
	last, shift := -1, 0.0
	for i := range w.points {
		p := &w.points[i]
		if math.IsNaN(p.HeightM) {
			continue
		}
		p.HeightM -= shift
		if last >= 0 {
			rise := p.HeightM - w.points[last].HeightM
			dt := p.TimeS - w.points[last].TimeS
			if dt > driftS && math.Abs(rise) > max(heightJumpM, w.atM[i]-w.atM[last]) {
				w.note(NoteSpike, w.atM[i], 0)
				shift += rise
				p.HeightM -= rise
			}
		}
		last = i
	}
}

func (w *way) lengthM() float64 {
	if len(w.atM) == 0 {
		return 0
	}
	return w.atM[len(w.atM)-1]
}

// medianOf sorts v and gives its median.
func medianOf(v []float64) float64 {
	sort.Float64s(v)
	n := len(v)
	if n%2 == 1 {
		return v[n/2]
	}
	return (v[n/2-1] + v[n/2]) / 2
}
