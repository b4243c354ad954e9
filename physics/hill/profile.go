// Package hill turns what a person has of a hill (a recorded track, typed
// sections, a line drawn with a finger) into a Profile: pieces of road of
// constant grade, foot first. Newcomers call ParseSections or ReadTrack and
// then FromTrack.
package hill

import "hillwright/physics/unit"

// Profile is a road as a chain of pieces of constant grade.
//
// EdgeM has one value more than Grade: piece i runs from EdgeM[i] to
// EdgeM[i+1], distance along the road [m], EdgeM[0] = 0, strictly rising.
// HeightM is the height at each edge [m above sea level, or above the foot
// when HeightKnown is false]. BearingRad is the direction of travel of each
// piece [rad, clockwise from north], or nil when it is not known.
type Profile struct {
	ID, Name    string
	EdgeM       []float64
	HeightM     []float64
	Grade       []unit.Grade
	BearingRad  []float64
	HeightKnown bool
	// Notes say what was mended on the way from the track, for the person.
	Notes []Note
}

// LengthM is the length along the road [m].
func (p *Profile) LengthM() float64 {
	if len(p.EdgeM) == 0 {
		return 0
	}
	return p.EdgeM[len(p.EdgeM)-1]
}

// AscentM is the sum of all rises [m].
func (p *Profile) AscentM() float64 { return p.climb(1) }

// DescentM is the sum of all falls [m], positive.
func (p *Profile) DescentM() float64 { return p.climb(-1) }

func (p *Profile) climb(sign float64) float64 {
	sum := 0.0
	for i := 1; i < len(p.HeightM); i++ {
		if d := sign * (p.HeightM[i] - p.HeightM[i-1]); d > 0 {
			sum += d
		}
	}
	return sum
}
