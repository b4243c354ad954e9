package hill

import (
	"sort"

	"hillwright/physics/unit"
)

// PieceAt gives the piece on which a place lies, sM along the road from the
// foot [m]: a place on an edge belongs to the piece above it. Before the foot
// it is the first piece, past the end the last, and -1 without any piece.
func (p *Profile) PieceAt(sM float64) int {
	n := len(p.Grade)
	if n == 0 {
		return -1
	}
	after := sort.Search(n, func(i int) bool { return p.EdgeM[i] > sM })
	return max(after-1, 0)
}

// GradeAt gives the grade at a place, as PieceAt finds it; 0 without any piece.
func (p *Profile) GradeAt(sM float64) unit.Grade {
	i := p.PieceAt(sM)
	if i < 0 {
		return 0
	}
	return p.Grade[i]
}

// HeightAt gives the height at a place [m], straight between the edges. Before
// the foot it is the foot's, past the end the end's; 0 without any piece.
func (p *Profile) HeightAt(sM float64) float64 {
	i := p.PieceAt(sM)
	if i < 0 {
		return 0
	}
	part := (sM - p.EdgeM[i]) / (p.EdgeM[i+1] - p.EdgeM[i])
	part = max(0, min(1, part))
	return p.HeightM[i] + part*(p.HeightM[i+1]-p.HeightM[i])
}
