package ride

import (
	"math"

	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// alike is how much of the hardest piece's wanted pull a neighbour must want
// to belong to the same stretch.
const alike = 0.85

// worst is the piece with the least headroom.
func (s *run) worst() int {
	worst, most := 0, math.Inf(-1)
	for i := range s.hill.Grade {
		if want := s.wants(i); want > most {
			worst, most = i, want
		}
	}
	return worst
}

func (s *run) wants(i int) float64 {
	at := placeOn(s.rig, s.hill, i)
	return wanted(s.rig, &at, s.rig.Rider.HoldMps)
}

// stretch is the road around a piece that wants nearly as much, and how the
// rig passed it at its slowest.
func (s *run) stretch(worst int) Stretch {
	floor := alike * s.wants(worst)
	from, to := worst, worst
	for from > 0 && s.wants(from-1) >= floor {
		from--
	}
	for to < len(s.hill.Grade)-1 && s.wants(to+1) >= floor {
		to++
	}
	edge, height := s.hill.EdgeM, s.hill.HeightM
	length, rise := edge[to+1]-edge[from], height[to+1]-height[from]
	st := Stretch{
		FromM: edge[from], ToM: edge[to+1],
		Grade:         unit.GradeOf(unit.Angle(math.Asin(rise / length))),
		SteepestGrade: s.hill.Grade[worst],
	}
	if from == to {
		st.Grade = s.hill.Grade[worst]
	}
	slow := math.Inf(1)
	for _, run := range s.passed[from : to+1] {
		if run.SpeedMps > 0 && run.SpeedMps < slow {
			slow, st.Running = run.SpeedMps, run
		}
	}
	return st
}

// finish reckons back from the tyre to the cranks, the motor and the pack.
func (e *Energy) finish(r *rig.Rig) {
	e.RiderCrankJ = e.RiderJ / r.Bike.Train.Efficiency
	e.MotorShaftJ = e.MotorJ / r.MotorToRoad()
	e.FromPackJ = e.MotorShaftJ / r.Bike.Motor.Efficiency
}

// Imbalance is what the books of a ride are out by, as a part of everything
// that went in: rounding, unless the computation is wrong.
func (e *Energy) Imbalance() float64 {
	in := e.RiderJ + e.MotorJ + e.KineticStartJ
	out := e.SlopeJ + e.RollingJ + e.AirJ + e.BearingsJ + e.BrakesJ + e.KineticEndJ
	all := e.RiderJ + e.MotorJ + e.KineticStartJ + math.Abs(e.SlopeJ) + 1
	return (in - out) / all
}
