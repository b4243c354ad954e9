package hill

import (
	"math"
	"strconv"

	"hillwright/physics/unit"
)

// ProfileErrorKind says what is wrong with edges and heights.
type ProfileErrorKind uint8

// What can be wrong with a profile that is made of edges and heights.
const (
	ProfileTooShort   ProfileErrorKind = iota // fewer than two edges
	ProfileLengths                            // the slices do not fit together
	ProfileNotRising                          // an edge is not beyond the one before it, or the first is not 0
	ProfileNotANumber                         // a value is not finite
	ProfileTooSteep                           // a piece rises by more than its length allows
)

// ProfileError is what is wrong, and at which edge or piece, from 0.
type ProfileError struct {
	Kind  ProfileErrorKind
	Index int
}

var profileErrorText = []string{
	"a profile needs two edges or more",
	"a profile needs one height per edge, and one bearing per piece or none",
	"edges must begin at 0 and rise",
	"edges, heights and bearings must be finite numbers",
	"a piece must not rise or fall by more than 0.95 of its length along the road",
}

// Error says it in English.
func (e *ProfileError) Error() string {
	return "profile, edge " + strconv.Itoa(e.Index) + ": " + profileErrorText[e.Kind]
}

// mostSine bounds rise over road length: 0.95 is a grade of 304 %, beyond any road.
const mostSine = 0.95

// FromHeights makes a profile of edges along the road and a height at each [m],
// with a bearing per piece [rad from north] or nil. It keeps the slices. The
// same numbers always give the same profile. Grades follow from rise and road
// length: g = sin/√(1 − sin²), sin = rise/length. HeightKnown is left false:
// the caller knows it. The error is a *ProfileError.
func FromHeights(edgeM, heightM, bearingRad []float64) (Profile, error) {
	n := len(edgeM) - 1
	if n < 1 {
		return Profile{}, &ProfileError{Kind: ProfileTooShort}
	}
	if len(heightM) != n+1 || len(bearingRad) != 0 && len(bearingRad) != n {
		return Profile{}, &ProfileError{Kind: ProfileLengths}
	}
	if edgeM[0] != 0 {
		return Profile{}, &ProfileError{Kind: ProfileNotRising}
	}
	p := Profile{EdgeM: edgeM, HeightM: heightM, Grade: make([]unit.Grade, n)}
	if len(bearingRad) == n {
		p.BearingRad = bearingRad
	}
	for i := range p.Grade {
		length, rise := edgeM[i+1]-edgeM[i], heightM[i+1]-heightM[i]
		bearing := 0.0
		if p.BearingRad != nil {
			bearing = p.BearingRad[i]
		}
		if sum := length + rise + bearing; math.IsNaN(sum) || math.IsInf(sum, 0) {
			return Profile{}, &ProfileError{Kind: ProfileNotANumber, Index: i}
		}
		if length <= 0 {
			return Profile{}, &ProfileError{Kind: ProfileNotRising, Index: i + 1}
		}
		sine := rise / length
		if math.Abs(sine) > mostSine {
			return Profile{}, &ProfileError{Kind: ProfileTooSteep, Index: i}
		}
		p.Grade[i] = unit.Grade(sine / math.Sqrt(1-sine*sine))
	}
	return p, nil
}

// Reversed gives the way back: the end becomes the foot, rises become falls,
// and bearings turn round. Notes stay, their places counted from the new foot.
func (p *Profile) Reversed() Profile {
	n := len(p.Grade)
	r := Profile{ID: p.ID, Name: p.Name, HeightKnown: p.HeightKnown}
	if n == 0 {
		return r
	}
	total := p.LengthM()
	for i := n; i >= 0; i-- {
		r.EdgeM = append(r.EdgeM, total-p.EdgeM[i])
		r.HeightM = append(r.HeightM, p.HeightM[i])
	}
	for i := n - 1; i >= 0; i-- {
		r.Grade = append(r.Grade, -p.Grade[i])
		if p.BearingRad != nil {
			r.BearingRad = append(r.BearingRad, turned(p.BearingRad[i]+math.Pi))
		}
	}
	for _, note := range p.Notes {
		note.AtM = max(0, total-note.AtM)
		r.Notes = append(r.Notes, note)
	}
	return r
}

// turned brings a bearing into 0 to 2π.
func turned(rad float64) float64 {
	rad = math.Mod(rad, 2*math.Pi)
	if rad < 0 {
		rad += 2 * math.Pi
	}
	return rad
}

// Drawn makes a profile of a line drawn with a finger: horizontal places
// and heights [m] in the order drawn. Where the finger went back, the later
// place wins; pieces steeper than SteepestTyped are laid down to it. The error
// is a *ProfileError when less than two places are left.
func Drawn(horizontalM, heightM []float64) (Profile, error) {
	if len(horizontalM) != len(heightM) {
		return Profile{}, &ProfileError{Kind: ProfileLengths}
	}
	var x, h []float64
	for i := range horizontalM {
		if sum := horizontalM[i] + heightM[i]; math.IsNaN(sum) || math.IsInf(sum, 0) {
			return Profile{}, &ProfileError{Kind: ProfileNotANumber, Index: i}
		}
		for len(x) > 0 && x[len(x)-1] >= horizontalM[i] {
			x, h = x[:len(x)-1], h[:len(h)-1]
		}
		x, h = append(x, horizontalM[i]), append(h, heightM[i])
	}
	edges, heights := make([]float64, len(x)), make([]float64, len(x))
	for i := range x {
		if i == 0 {
			heights[0] = h[0]
			continue
		}
		run := x[i] - x[i-1]
		rise := max(-SteepestTyped*run, min(SteepestTyped*run, h[i]-h[i-1]))
		edges[i] = edges[i-1] + math.Hypot(run, rise)
		heights[i] = heights[i-1] + rise
	}
	return FromHeights(edges, heights, nil)
}
