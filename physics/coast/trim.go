package coast

import (
	"math"
	"sort"
)

// What does not belong to a coast-down slows by this much more or less than the
// rest [m/s²], or by this many times the rest's scatter.
const (
	trimMps2   = 0.12
	trimFactor = 5
	trimS      = 2 // slopes are taken over about so long [s]
)

// Trim proposes where a coast-down begins and ends: it leaves out pedalling at
// its beginning and a brake at its end, where the speed changes otherwise than
// the rest says it should. Points are in order of time; it gives their first
// and last time when there is nothing to leave out.
func Trim(points []Point) (fromS, toS float64) {
	n := len(points)
	if n == 0 {
		return 0, 0
	}
	fromS, toS = points[0].AtS, points[n-1].AtS
	slopes := slopesOf(points)
	if len(slopes) < 8 {
		return fromS, toS
	}
	even, square := ordinary(slopes)
	off := make([]float64, len(slopes))
	for i, s := range slopes {
		off[i] = math.Abs(s.mps2 - even - square*s.mps*s.mps)
	}
	limit := math.Max(trimMps2, trimFactor*1.4826*median(append([]float64(nil), off...)))
	// The longest part that fits, over single slopes that do not.
	first, last, begun := 0, -1, -1
	for i := range slopes {
		switch {
		case off[i] <= limit:
			if begun < 0 {
				begun = i
			}
			if i-begun > last-first {
				first, last = begun, i
			}
		case i > 0 && off[i-1] > limit:
			begun = -1
		}
	}
	if last-first < len(slopes)/3 {
		return fromS, toS
	}
	if first > 0 {
		fromS = slopes[first].fromS
	}
	if last < len(slopes)-1 {
		toS = slopes[last].toS
	}
	return fromS, toS
}

// slope is how a speed changes around a time.
type slope struct{ fromS, toS, mps, mps2 float64 }

// slopesOf takes the slopes by straight lines over short times.
func slopesOf(points []Point) []slope {
	var out []slope
	for from := 0; from < len(points); {
		to := from
		for to < len(points) && points[to].AtS-points[from].AtS < trimS {
			to++
		}
		if to >= len(points) {
			to = len(points) - 1
		}
		if to-from < 2 {
			to = min(len(points)-1, from+2)
		}
		if to-from < 1 {
			return out
		}
		var n, t, v, tt, tv float64
		for _, p := range points[from : to+1] {
			d := p.AtS - points[from].AtS
			n, t, v, tt, tv = n+1, t+d, v+p.SpeedMps, tt+d*d, tv+d*p.SpeedMps
		}
		if det := n*tt - t*t; det > 0 {
			out = append(out, slope{points[from].AtS, points[to].AtS, v / n, (n*tv - t*v) / det})
		}
		from += max(1, (to-from)/2)
	}
	return out
}

// ordinary fits slopes by what most of them say: even + square·v², the medians
// of the lines through all pairs (Theil 1950, Sen 1968).
func ordinary(slopes []slope) (even, square float64) {
	stride := max(1, len(slopes)/120) // pairs grow with the square
	var pairs []float64
	for i := 0; i < len(slopes); i += stride {
		for k := i + stride; k < len(slopes); k += stride {
			a, b := slopes[i].mps*slopes[i].mps, slopes[k].mps*slopes[k].mps
			if math.Abs(a-b) > 1 {
				pairs = append(pairs, (slopes[k].mps2-slopes[i].mps2)/(b-a))
			}
		}
	}
	if len(pairs) > 0 {
		sort.Float64s(pairs)
		square = math.Min(0, pairs[len(pairs)/2])
	}
	rest := make([]float64, len(slopes))
	for i, s := range slopes {
		rest[i] = s.mps2 - square*s.mps*s.mps
	}
	sort.Float64s(rest)
	return rest[len(rest)/2], square
}

// Cut gives the part of a run between two times.
func (r Run) Cut(fromS, toS float64) Run {
	out := Run{Back: r.Back}
	for _, p := range r.Points {
		if p.AtS >= fromS && p.AtS <= toS {
			out.Points = append(out.Points, p)
		}
	}
	for _, m := range r.Marks {
		if m.AtS >= fromS && m.AtS <= toS {
			out.Marks = append(out.Marks, m)
		}
	}
	return out
}
