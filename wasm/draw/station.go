package draw

import (
	"math"

	"hillwright/physics/unit"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// stationsOf gives the places [m] that are named along a road: its ends and
// tidy distances in the person's units between them.
func stationsOf(lengthM float64, v words.Voice) []float64 {
	in := 1.0
	if v.Units == words.Imperial {
		in = 0.3048
		if lengthM > unit.MetresPerMile/5 {
			in = unit.MetresPerMile
		}
	}
	step := in * tidyStep(lengthM/in, mostStations-1)
	var at []float64
	for i := 0; float64(i)*step < lengthM-step/4; i++ {
		at = append(at, float64(i)*step)
	}
	return append(at, lengthM)
}

// stationMarks is what stands below the road: lines down to the base, and in two rows
// the distance and, beside the mark for levels, the height.
type stationMarks struct {
	ordinates, marks path
	labels           dom.Parts
	taken            []box
}

// levelMark is the room [px] of the mark before a height.
const levelMark = 11.0

func (s *section) stations(v words.Voice) stationMarks {
	var out stationMarks
	at := stationsOf(s.lengthM, v)
	s.station(&out, at[0], v)
	s.station(&out, at[len(at)-1], v)
	for _, m := range at[1 : len(at)-1] {
		s.station(&out, m, v)
	}
	return out
}

// station adds one place, unless its words would touch a neighbour's.
func (s *section) station(out *stationMarks, atM float64, v words.Voice) {
	x := s.x(atM)
	far := label{lines: []string{v.Length(atM)}, x: x, y: s.base + 15, px: smallPx, anchor: fromMiddle, class: "figure"}
	tall := label{lines: []string{v.Height(s.profile.HeightAt(atM))}, x: x + levelMark/2, y: s.base + 31, px: smallPx, anchor: fromMiddle, class: "quiet"}
	far = far.clamp(2, s.size.W-2)
	tall = tall.clamp(2+levelMark, s.size.W-2)
	a, b := far.box(), tall.box()
	b.x0 -= levelMark
	room := box{math.Min(a.x0, b.x0), a.y0, math.Max(a.x1, b.x1), b.y1}
	if !room.grown(3).free(out.taken) {
		return
	}
	out.taken = append(out.taken, room)
	out.ordinates.move(x, s.roadY(x))
	out.ordinates.upTo(s.base + 4)
	m := b.x0 + 4
	out.marks.move(m-4, tall.y-8)
	out.marks.across(m + 4)
	out.marks.line(m, tall.y)
	out.marks.close()
	out.labels = append(out.labels, far.node(), tall.node())
}
