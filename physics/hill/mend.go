package hill

import (
	"math"
	"sort"
)

// When a recording is taken for faulty. Common practice, no source: a rider
// does not leave the way by eight usual legs and come straight back, and who
// stays within 8 m for 20 s stands (even pushing a bike takes 0.4 m/s).
const (
	jumpM       = 50.0  // a leg that may be a jump is longer
	jumpLegs    = 8.0   // and longer than so many usual legs
	jumpMps     = 15.0  // or faster
	jumpPoints  = 5     // most points off the way in one go
	standM      = 8.0   // standing: within this radius
	standS      = 20.0  // for this time
	gapM        = 100.0 // a hole is longer
	gapLegs     = 10.0  // and longer than so many usual legs
	leastWayM   = 10.0  // a way that is worth a profile
	driftS      = 60.0  // a height step that took longer is drift
	heightJumpM = 15.0  // a height that is off by more than this, and steeper than 1:1, is a spike
)

// way is a mended track: points, how far along each lies [m, level], and the
// heights, shifted behind holes between segments so that they follow on.
type way struct {
	points []Point
	atM    []float64
	notes  []Note
}

func (w *way) note(kind NoteKind, atM, lengthM float64) {
	for i := range w.notes {
		if w.notes[i].Kind == kind {
			w.notes[i].Count++
			w.notes[i].LengthM += lengthM
			return
		}
	}
	w.notes = append(w.notes, Note{Kind: kind, Count: 1, AtM: atM, LengthM: lengthM})
}

// mend lays out a track segment by segment. What lies between segments was not
// recorded and is left out: the road goes on at the next segment's first point,
// and its height follows on, so that no wall arises.
func mend(t *Track) way {
	var w way
	usual := usualLegM(t)
	shift := 0.0
	for n, from := range t.SegmentStart {
		to := len(t.Points)
		if n+1 < len(t.SegmentStart) {
			to = t.SegmentStart[n+1]
		}
		old := len(w.points)
		w.segment(t.Points[from:to], usual)
		if old == 0 || len(w.points) == old {
			continue
		}
		hole := leg(&w.points[old-1], &w.points[old])
		w.note(NoteSegments, w.atM[old-1], hole)
		shift = w.step(old)
		for i := old; i < len(w.points); i++ {
			w.points[i].HeightM -= shift
		}
	}
	return w
}

// step is the rise over a hole: from the last known height before the point to
// the first known one from it on, whose heights are not shifted yet.
func (w *way) step(at int) float64 {
	before, after := math.NaN(), math.NaN()
	for i := at - 1; i >= 0 && math.IsNaN(before); i-- {
		before = w.points[i].HeightM
	}
	for i := at; i < len(w.points) && math.IsNaN(after); i++ {
		after = w.points[i].HeightM
	}
	if d := after - before; !math.IsNaN(d) {
		return d
	}
	return 0
}

// segment adds a segment without its standing still, doubled points and spikes.
func (w *way) segment(points []Point, usual float64) {
	at := 0.0
	if n := len(w.atM); n > 0 {
		at = w.atM[n-1]
	}
	var last *Point
	for i := 0; i < len(points); i++ {
		p := points[i]
		if p.LatDeg == 0 && p.LonDeg == 0 { // what a receiver without a fix writes
			w.note(NoteSpike, at, 0)
			continue
		}
		d := 0.0
		if last != nil {
			d = leg(last, &p)
			if d == 0 {
				w.note(NoteDuplicate, at, 0)
				if math.IsNaN(last.HeightM) {
					last.HeightM = p.HeightM
				}
				last.TimeS = p.TimeS
				continue
			}
			if off := w.offTheWay(last, points[i:], d, usual); off > 0 {
				for ; off > 1; off-- {
					w.note(NoteSpike, at, 0)
					i++
				}
				w.note(NoteSpike, at, 0)
				continue
			}
			if d > gapM && d > gapLegs*usual {
				w.note(NoteGap, at, d)
			}
		}
		at += d
		w.points, w.atM = append(w.points, p), append(w.atM, at)
		last = &w.points[len(w.points)-1]
		if skip := standing(points[i:]); skip > 0 {
			w.note(NotePause, at, 0)
			i += skip
			last.TimeS = points[i].TimeS
		}
	}
}

// offTheWay counts the points, from the first of ahead on, that lie off the
// way: reached by a jump of d, left by another one back to near the last good
// point.
func (w *way) offTheWay(last *Point, ahead []Point, d, usual float64) int {
	if !jump(last, &ahead[0], d, usual) {
		return 0
	}
	for n := 1; n <= jumpPoints && n < len(ahead); n++ {
		back := leg(&ahead[n-1], &ahead[n])
		rest := leg(last, &ahead[n])
		if jump(&ahead[n-1], &ahead[n], back, usual) && rest < 0.5*min(d, back) {
			return n
		}
	}
	return 0
}

func jump(a, b *Point, d, usual float64) bool {
	if d < jumpM {
		return false
	}
	dt := b.TimeS - a.TimeS
	return d > jumpLegs*usual || dt > 0 && d/dt > jumpMps
}

// standing counts the points behind the first one at which the recorder still
// stands there.
func standing(points []Point) int {
	t0 := points[0].TimeS
	if math.IsNaN(t0) {
		return 0
	}
	n := 0
	for n+1 < len(points) {
		p := &points[n+1]
		if math.Abs(p.LatDeg-points[0].LatDeg) > 1e-4 { // 11 m: no need to know it better
			break
		}
		d := leg(&points[0], p)
		if !(d <= standM) || !(p.TimeS >= t0) {
			break
		}
		n++
	}
	if points[n].TimeS-t0 < standS {
		return 0
	}
	return n
}

// usualLegM is the median length of the legs that have one [m]. Of a long track
// a part of the legs tells enough.
func usualLegM(t *Track) float64 {
	every := 1 + len(t.Points)/5000
	var legs []float64
	for i := every; i < len(t.Points); i += every {
		if d := leg(&t.Points[i-1], &t.Points[i]); d > 0 {
			legs = append(legs, d)
		}
	}
	if len(legs) == 0 {
		return 0
	}
	sort.Float64s(legs)
	return legs[len(legs)/2]
}
