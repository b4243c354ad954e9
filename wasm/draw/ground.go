package draw

import (
	"math"

	"hillwright/physics/hill"
	"hillwright/physics/ride"
)

// OpenFrom is the headroom from which the ground is hatched openly; below
// ride.TightBelow it is solid. Common practice, no source.
const OpenFrom = 0.35

// hatch is how a stretch of ground is drawn.
type hatch uint8

const (
	hatchOpen hatch = iota
	hatchClose
	hatchSolid
	hatchBeyond // not ridden
	hatches
)

var hatchNames = [hatches]string{"open", "close", "solid", "beyond"}

// hatchOf tells how ground is hatched at a headroom.
func hatchOf(headroom float64) hatch {
	switch {
	case headroom >= OpenFrom:
		return hatchOpen
	case headroom >= ride.TightBelow:
		return hatchClose
	}
	return hatchSolid
}

// stretch is a run of ground of one hatching between two x [px].
type stretch struct {
	from, to float64
	as       hatch
}

// stretches cuts the ground into upright columns of a pixel, gives each the
// hatching of its least headroom, and joins alike neighbours, so that a short
// hard piece on a long hill is not lost.
func (s *section) stretches() []stretch {
	n := int(math.Ceil(s.x(s.lengthM) - s.start))
	if n < 1 {
		return nil
	}
	least := make([]float64, n)
	for i := range least {
		least[i] = math.Inf(1)
	}
	t := &s.answer.Trace
	for i := 0; i+1 < len(t.AtM); i++ {
		first := math.Floor(s.x(t.AtM[i]) - s.start + 1e-6)
		last := math.Ceil(s.x(t.AtM[i+1])-s.start-1e-6) - 1
		for k := max(0, int(first)); k <= min(n-1, int(last)); k++ {
			least[k] = math.Min(least[k], t.Headroom[i])
		}
	}
	if h := &s.answer.Hardest; s.answer.Stalled && len(s.answer.Balance.Pegs) > 0 {
		// The hardest stretch is weighed even where the rig does not reach it.
		for k := int(s.x(h.FromM) - s.start); k < int(math.Ceil(s.x(h.ToM)-s.start)); k++ {
			if k >= 0 && k < n && math.IsInf(least[k], 1) {
				least[k] = s.answer.Balance.Headroom()
			}
		}
	}
	var out []stretch
	for k, h := range least {
		as := hatchBeyond
		if !math.IsInf(h, 1) {
			as = hatchOf(h)
		}
		to := math.Min(s.start+float64(k+1), s.x(s.lengthM))
		if len(out) > 0 && out[len(out)-1].as == as {
			out[len(out)-1].to = to
			continue
		}
		out = append(out, stretch{s.start + float64(k), to, as})
	}
	return out
}

// thinned gives the road's line: all edges when they are few, else the lowest
// and the highest of each column of a pixel, in their order.
func (s *section) thinned(p *hill.Profile) []point {
	at := func(i int) point { return point{s.x(p.EdgeM[i]), s.y(p.HeightM[i])} }
	n := len(p.EdgeM)
	var out []point
	if float64(n) <= 2*s.size.W {
		for i := range n {
			out = append(out, at(i))
		}
		return out
	}
	out = append(out, at(0))
	for i := 1; i < n-1; {
		column := math.Floor(s.x(p.EdgeM[i]))
		low, high := i, i
		for ; i < n-1 && math.Floor(s.x(p.EdgeM[i])) == column; i++ {
			if p.HeightM[i] < p.HeightM[low] {
				low = i
			}
			if p.HeightM[i] > p.HeightM[high] {
				high = i
			}
		}
		out = append(out, at(min(low, high)))
		if low != high {
			out = append(out, at(max(low, high)))
		}
	}
	return append(out, at(n-1))
}

// roadY gives the road's y at an x, along the thinned line.
func (s *section) roadY(x float64) float64 {
	i := s.after(x)
	if i == 0 {
		return s.road[0].y
	}
	if i == len(s.road) {
		return s.road[i-1].y
	}
	a, b := s.road[i-1], s.road[i]
	if b.x <= a.x {
		return b.y
	}
	return a.y + (b.y-a.y)*(x-a.x)/(b.x-a.x)
}

// after is the index of the first point of the road beyond x.
func (s *section) after(x float64) int {
	low, high := 0, len(s.road)
	for low < high {
		mid := (low + high) / 2
		if s.road[mid].x > x {
			high = mid
		} else {
			low = mid + 1
		}
	}
	return low
}

// roof is the y of the road's highest point between two x.
func (s *section) roof(from, to float64) float64 {
	top := math.Min(s.roadY(from), s.roadY(to))
	for i := s.after(from); i < len(s.road) && s.road[i].x < to; i++ {
		top = math.Min(top, s.road[i].y)
	}
	return top
}

// ground adds the ground below the road between two x to a path.
func (s *section) ground(d *path, from, to float64) {
	d.move(from, s.base)
	d.upTo(s.roadY(from))
	for i := s.after(from); i < len(s.road) && s.road[i].x < to; i++ {
		d.line(s.road[i].x, s.road[i].y)
	}
	d.line(to, s.roadY(to))
	d.upTo(s.base)
	d.close()
}
