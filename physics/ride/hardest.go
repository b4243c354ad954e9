package ride

import (
	"math"

	"hillwright/physics/unit"
)

// alike is how much of the hardest piece's wanted pull a neighbour must want
// to belong to the same stretch.
const alike = 0.85

// stretch is the road around the hardest piece that wants nearly as much, and
// how the rig passed it at its slowest.
func (t *tour) stretch() Stretch {
	h := &t.hardest
	p := t.profileOf(h.way)
	wants := func(i int) float64 {
		at := placeOn(t.rig, p, i)
		return wanted(t.rig, &at, t.rig.Rider.HoldMps)
	}
	floor := alike * h.wanted
	from, to := h.piece, h.piece
	for from > 0 && wants(from-1) >= floor {
		from--
	}
	for to < len(p.Grade)-1 && wants(to+1) >= floor {
		to++
	}
	back := t.ways[h.way].back
	st := Stretch{
		FromM: t.fromFoot(p.EdgeM[from], back), ToM: t.fromFoot(p.EdgeM[to+1], back),
		Grade: p.Grade[h.piece], SteepestGrade: p.Grade[h.piece],
		Trip: t.ways[h.way].trip, Back: back,
	}
	if back {
		st.FromM, st.ToM = st.ToM, st.FromM
	}
	if from != to {
		length, rise := p.EdgeM[to+1]-p.EdgeM[from], p.HeightM[to+1]-p.HeightM[from]
		st.Grade = unit.GradeOf(unit.Angle(math.Asin(rise / length)))
	}
	slow := math.Inf(1)
	for _, run := range h.passed[from : to+1] {
		if run.SpeedMps > 0 && run.SpeedMps < slow {
			slow, st.Running = run.SpeedMps, run
		}
	}
	return st
}
