package click

import "math"

// A window holds about windowClicks clicks, within bounds [s].
const (
	windowClicks = 14
	shortWindowS = 0.4
	longWindowS  = 2.6
)

// A point counts when the clicks' harmonics stand so far above what lies
// between them, and when it lies near the path: within offPath clicks over the
// window, or within offPart of the rate.
const (
	standsOut = 4
	offPath   = 1.6
	offPart   = 0.05
)

// errorFloor is the least error of a rate, as a part of it: no window is known
// better, whatever its noise.
const errorFloor = 1e-4

func windowS(rateHz float64) float64 {
	return max(shortWindowS, min(longWindowS, windowClicks/rateHz))
}

// stretch makes a stretch of a span of columns; false when too little of it
// holds.
func (l *Listener) stretch(s span) (Stretch, bool) {
	g := newGuide(&l.rates, s)
	f := &fitter{onset: l.onset, hz: l.envelopeHz()}
	fromS, toS := g.ends(f)
	out := Stretch{SureOf: s.sure}
	for t := fromS; t < toS; {
		rate, _ := g.at(t)
		w := windowS(rate)
		if toS-t < 1.5*w {
			w = toS - t
		}
		if got, ok := g.fit(f, t, t+w); ok {
			out.Points = append(out.Points, got.point())
		}
		t += w
	}
	var before, last local
	for t := fromS; t < toS; t += hopS {
		rate, _ := g.at(t)
		w := min(windowS(rate), toS-fromS)
		start := max(fromS, min(t-w/2, toS-w))
		got, ok := g.fit(f, start, start+w)
		if !ok {
			continue
		}
		if last = got; before.rateHz == 0 {
			before = got
			out.Curve = append(out.Curve, got.pointAt(fromS))
		} else {
			out.Curve = append(out.Curve, got.pointAt(t))
		}
	}
	if len(out.Points) < 4 || len(out.Curve) < 8 {
		return out, false
	}
	out.Curve = append(out.Curve, last.pointAt(toS))
	out.Points, out.Curve = inLine(out.Points), inLine(out.Curve)
	if len(out.Points) < 4 || len(out.Curve) < 8 || out.ToS()-out.FromS() < shortestS {
		return out, false
	}
	out.Falls = falls(out.Curve, out.Points)
	out.between = l.betweens(&out)
	return out, true
}

func (l *local) point() Point { return l.pointAt(l.atS) }

// pointAt is the fitted rate at a time within or at the end of its window.
func (l *local) pointAt(t float64) Point {
	rate := l.rateHz + l.slope*(t-l.atS)
	return Point{AtS: t, RateHz: rate, ErrorHz: math.Hypot(l.error, errorFloor*rate)}
}

// guide is the path of a span, smoothed: rates and their slopes to begin a fit
// from.
type guide struct {
	fromS float64
	logs  []float64 // logarithm of the rate, by column
}

func newGuide(r *rates, s span) *guide {
	raw := make([]float64, len(s.rows))
	rows := len(r.grid)
	for i, row := range s.rows {
		raw[i] = math.Log(r.grid[row])
		if row == 0 || row+1 == rows {
			continue
		}
		at := (s.from+i)*rows + row
		a, b, c := float64(r.scores[at-1]), float64(r.scores[at]), float64(r.scores[at+1])
		if d := a - 2*b + c; d < 0 {
			raw[i] += max(-0.5, min(0.5, (a-c)/2/d)) * math.Ln2 / perOctave
		}
	}
	g := &guide{fromS: float64(s.from) * hopS, logs: make([]float64, len(raw))}
	for i := range raw {
		g.logs[i], _ = line(raw, i, 3)
	}
	return g
}

// line fits a straight line to the values around a place and gives it there,
// with its slope by place.
func line(values []float64, at, reach int) (value, slope float64) {
	from, to := max(0, at-reach), min(len(values), at+reach+1)
	var n, x, y, xx, xy float64
	for i := from; i < to; i++ {
		d := float64(i - at)
		n, x, y, xx, xy = n+1, x+d, y+values[i], xx+d*d, xy+d*values[i]
	}
	det := n*xx - x*x
	if det <= 0 {
		return values[at], 0
	}
	return (xx*y - x*xy) / det, (n*xy - x*y) / det
}

// at gives the path's rate and slope at a time, beyond its ends too.
func (g *guide) at(t float64) (rateHz, slope float64) {
	place := (t - g.fromS) / hopS
	i := max(0, min(len(g.logs)-1, int(math.Round(place))))
	value, by := line(g.logs, i, 4)
	rate := math.Exp(value + by*max(-4, min(4, place-float64(i))))
	return rate, rate * by / hopS
}

// fit fits a window, begun from the path.
func (g *guide) fit(f *fitter, fromS, toS float64) (local, bool) {
	rate, slope := g.at((fromS + toS) / 2)
	got, ok := f.fit(fromS, toS, rate, slope)
	off := math.Abs(got.rateHz - rate)
	ok = ok && got.power > standsOut*got.noise && (off*(toS-fromS) < offPath || off < offPart*rate) && got.rateHz > 0.5*LowestRateHz
	return got, ok
}

// ends finds where the clicks really begin and end: the outermost bits of sound
// in which they stand out at the rate that the path says.
func (g *guide) ends(f *fitter) (fromS, toS float64) {
	first := max(0, g.fromS-0.5)
	last := min(float64(len(f.onset))/f.hz, g.fromS+float64(len(g.logs)-1)*hopS+0.5)
	bit := func(t float64) float64 {
		rate, _ := g.at(t)
		return max(0.2, 5/rate)
	}
	for fromS = first; fromS < last; fromS += 0.1 {
		if g.heard(f, fromS, fromS+bit(fromS)) {
			break
		}
	}
	for toS = last; toS > fromS; toS -= 0.1 {
		if g.heard(f, toS-bit(toS), toS) {
			break
		}
	}
	return fromS, toS
}

// heard tells whether clicks stand out in a bit of sound and fill it: both its
// halves have them.
func (g *guide) heard(f *fitter, fromS, toS float64) bool {
	got, ok := g.fit(f, fromS, toS)
	if !ok {
		return false
	}
	from, to := max(0, int(fromS*f.hz)), min(len(f.onset), int(toS*f.hz))
	mid := float64(from+to-1) / 2
	f.sums(from, to, mid, got.rateHz, got.slope, 0)
	first, second := f.halves()
	f.sums(from, to, mid, got.rateHz, got.slope, 0.5)
	noise1, noise2 := f.halves()
	return first > standsOut*noise1 && second > standsOut*noise2 && min(first, second) > 0.12*max(first, second)
}

// halves gives the harmonics' powers in either half of a window.
func (f *fitter) halves() (first, second float64) {
	var part [2]float64
	for half := range 2 {
		for h := 1; h <= f.used; h++ {
			var re, im float64
			for k := half * segments / 2; k < (half+1)*segments/2; k++ {
				re, im = re+f.re[h][k], im+f.im[h][k]
			}
			part[half] += re*re + im*im
		}
	}
	return part[0], part[1]
}

// inLine leaves out points far from a curve through their neighbours.
func inLine(points []Point) []Point {
	logs := make([]float64, len(points))
	for i, p := range points {
		logs[i] = math.Log(p.RateHz)
	}
	var out []Point
	for i, p := range points {
		if off := math.Abs(logs[i] - without(points, logs, i)); off < 0.03 || off < 5*p.ErrorHz/p.RateHz {
			out = append(out, p)
		}
	}
	return out
}

// without is what the neighbours of a point say of it: the median of the lines
// through pairs of them on either side.
func without(points []Point, logs []float64, i int) float64 {
	var guesses []float64
	for a := max(0, i-3); a < min(len(points), i+4); a++ {
		for b := a + 1; b < min(len(points), i+4); b++ {
			if a == i || b == i || points[b].AtS <= points[a].AtS {
				continue
			}
			part := (points[i].AtS - points[a].AtS) / (points[b].AtS - points[a].AtS)
			if part > -1.5 && part < 2.5 {
				guesses = append(guesses, logs[a]+part*(logs[b]-logs[a]))
			}
		}
	}
	if len(guesses) == 0 {
		return logs[i]
	}
	return median(guesses)
}

// A coast-down slows by at least leastFall of its speed, over at least
// leastFallS, and is seldom faster than before.
const (
	leastFall  = 0.15
	leastFallS = 6
)

func falls(curve, points []Point) bool {
	first, last := curve[0], curve[len(curve)-1]
	if last.AtS-first.AtS < leastFallS {
		return false
	}
	low, rises := first.RateHz, 0
	for _, p := range curve[1:] {
		if p.RateHz > low*1.01+2*p.ErrorHz {
			rises++
		}
		low = min(low, p.RateHz)
	}
	return last.RateHz < (1-leastFall)*first.RateHz && rises*10 < len(curve) && smooth(points)
}

// mostBend is by how much of itself a rate may bend away from the line through
// its neighbours, in the middle of all bends: a wheel's inertia keeps it far
// below, the pitch of a voice or a tune goes beyond.
const mostBend = 0.002

// leastFound is the part of a stretch in whose windows the clicks must have been
// found.
const leastFound = 0.7

// smooth tells that a rate changes as that of a wheel does, and that it was
// found nearly everywhere.
func smooth(points []Point) bool {
	var bends []float64
	found := 0.0
	for i, p := range points {
		found += windowS(p.RateHz)
		if i == 0 || i+1 == len(points) {
			continue
		}
		a, b := points[i-1], points[i+1]
		part := (p.AtS - a.AtS) / (b.AtS - a.AtS)
		line := math.Log(a.RateHz) + part*math.Log(b.RateHz/a.RateHz)
		bends = append(bends, math.Abs(math.Log(p.RateHz)-line)-2*p.ErrorHz/p.RateHz)
	}
	return median(bends) < mostBend && found > leastFound*(points[len(points)-1].AtS-points[0].AtS)
}
