package slope

import (
	"math"

	"hillwright/physics/hill"
	"hillwright/physics/unit"
)

// RideStretch makes a reading of the fixes of a ride on a pitch, oldest first.
// Fixes without a place, time, height or accuracy are passed over; five over
// 20 m are the least. The grade is that of the straight line through the
// heights; its error (1 σ) takes the height errors to hang together in the way
// that is worst, and is widened when the heights lie further from the line than
// they should.
func RideStretch(fixes []Fix, from Heights) (Reading, error) {
	nodes, seen := gatherNodes(fixes, from)
	if len(nodes) < leastFix {
		if seen >= leastFix && len(nodes) == 0 {
			return Reading{}, &Error{Kind: NoHeights, What: "ride"}
		}
		return Reading{}, &Error{Kind: NotEnough, What: "fixes", Got: float64(len(nodes))}
	}
	level := layOut(nodes)
	if level.Value < max(leastWayM, 3*level.Error) {
		return Reading{}, &Error{Kind: TooShort, What: "stretch", Got: level.Value}
	}
	nodes = thin(nodes)
	grade, own, ok := line(nodes)
	if !ok {
		return Reading{}, &Error{Kind: TooShort, What: "stretch", Got: level.Value}
	}
	err := max(leastError, root(own, grade*level.Error/level.Value))
	return checked(Reading{Grade: unit.Grade(grade), Error: err, Method: ByRide, LengthM: level.Value * math.Hypot(1, grade)})
}

// node is a fix on the way: how far along it lies, level [m], with errors 1 σ.
type node struct {
	fix              Fix
	timeS, atM       float64
	heightM          float64
	placeErr, height float64 // 1 σ, one direction [m]
}

// gatherNodes gives the fixes that can be used, and how many have a place.
func gatherNodes(fixes []Fix, from Heights) (nodes []node, seen int) {
	last := math.Inf(-1)
	for _, f := range fixes {
		if !finite(f.LatDeg) || !finite(f.LonDeg) || math.Abs(f.LatDeg) > 90 || math.Abs(f.LonDeg) > 180 ||
			!finite(f.TimeS) || f.TimeS <= last || !(f.AccuracyM > 0 && f.AccuracyM <= 200) {
			continue
		}
		last = f.TimeS
		seen++
		if !finite(f.HeightM) || math.Abs(f.HeightM) > 12e3 {
			continue
		}
		nodes = append(nodes, node{
			fix: f, timeS: f.TimeS, heightM: f.HeightM,
			placeErr: f.AccuracyM / radius95, height: f.heightError(from),
		})
	}
	return nodes, seen
}

func (f *Fix) heightError(from Heights) float64 {
	switch {
	case from == Barometric:
		return barometricM
	case from == Surveyed:
		return surveyedM
	case f.HeightAccuracyM > 0 && f.HeightAccuracyM <= 1000:
		return f.HeightAccuracyM / factor95
	}
	return heightToSide * f.AccuracyM / factor95
}

// layOut finds how far along each node lies, and the length of the way, level.
// Legs are taken between places that are clearly apart, so that the jitter of
// a slow or standing rider does not add up. What jitter is left makes legs
// longer by nothing, when it hangs together, or by the sum of squares, when it
// does not: the middle is taken, and half of it as error.
func layOut(nodes []node) Measured {
	shortest, longest := 0.0, 0.0
	from := 0
	for i := 1; i < len(nodes); i++ {
		a, b := &nodes[from], &nodes[i]
		d := hill.Apart(a.fix.Point, b.fix.Point)
		if d < max(leastLegM, 4*root(a.placeErr, b.placeErr)/math.Sqrt2) && i < len(nodes)-1 {
			continue
		}
		noise := root(a.placeErr, b.placeErr)
		shortest += math.Sqrt(max(d*d-noise*noise, d*d/4))
		longest += d
		for k := from + 1; k <= i; k++ {
			part := min(1, hill.Apart(a.fix.Point, nodes[k].fix.Point)/max(d, 1e-9))
			if k == i {
				part = 1
			}
			nodes[k].atM = a.atM + part*d
		}
		from = i
	}
	middle := (shortest + longest) / 2
	if longest > 0 {
		for i := range nodes {
			nodes[i].atM *= middle / longest
		}
	}
	ends := root(nodes[0].placeErr, nodes[len(nodes)-1].placeErr)
	return Measured{middle, root(ends, (longest-shortest)/2)}
}

// thin joins neighbours until few enough are left. Their errors hang together,
// so joining does not make them smaller.
func thin(nodes []node) []node {
	every := (len(nodes) + mostNodes - 1) / mostNodes
	if every < 2 {
		return nodes
	}
	var out []node
	for i := 0; i < len(nodes); i += every {
		group := nodes[i:min(i+every, len(nodes))]
		n := float64(len(group))
		var m node
		for _, g := range group {
			m.timeS += g.timeS / n
			m.atM += g.atM / n
			m.heightM += g.heightM / n
			m.height += g.height / n
		}
		out = append(out, m)
	}
	return out
}

// line fits a straight line of height over way and gives its slope and error.
func line(nodes []node) (slope, err float64, ok bool) {
	n := float64(len(nodes))
	meanAt, meanH := 0.0, 0.0
	for _, p := range nodes {
		meanAt += p.atM / n
		meanH += p.heightM / n
	}
	sxx := 0.0
	for _, p := range nodes {
		sxx += (p.atM - meanAt) * (p.atM - meanAt)
	}
	if !(sxx > 1) {
		return 0, 0, false
	}
	weight := make([]float64, len(nodes))
	for i, p := range nodes {
		weight[i] = (p.atM - meanAt) / sxx
		slope += weight[i] * p.heightM
	}
	misfit := 0.0
	for i, p := range nodes {
		off := (p.heightM - meanH - slope*(p.atM-meanAt)) / p.height
		misfit += off * off / (n - 2)
		weight[i] *= p.height
	}
	worst := 0.0
	for _, together := range heightsTogetherS {
		variance := 0.0
		for i := range nodes {
			variance += weight[i] * weight[i]
			for j := range i {
				variance += 2 * weight[i] * weight[j] * math.Exp((nodes[j].timeS-nodes[i].timeS)/together)
			}
		}
		worst = max(worst, variance)
	}
	return slope, math.Sqrt(worst * max(1, misfit)), true
}
