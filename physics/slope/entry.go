package slope

import (
	"math"

	"hillwright/physics/hill"
)

// Entry is a reading as it is kept: where and when, over what length, with what
// note.
type Entry struct {
	Reading
	Place, Note string
	// TimeS is when it was read [s since 1970, UTC], NaN when not known.
	TimeS float64
	// Pitch is the length along the road for which it stands [m]; 0 when not known.
	Pitch Measured
	// At is where the pitch begins: latitude, longitude [°] and height [m], each
	// NaN when not known. Its TimeS is not used.
	At hill.Point
}

// placed tells that the latitude and longitude are known, away from the poles.
func (e *Entry) placed() bool {
	return math.Abs(e.At.LatDeg) <= mostLatDeg && math.Abs(e.At.LonDeg) <= 180
}

// pitchM is the length for which the entry stands [m]: the one given, otherwise
// the one that the reading spans, otherwise 0.
func (e *Entry) pitchM() float64 {
	for _, m := range []float64{e.Pitch.Value, e.Reading.LengthM} {
		if m > 0 && finite(m) {
			return m
		}
	}
	return 0
}

// Hill makes a hill of readings, foot first: one piece each, as long as its
// pitch. Entries without a length are refused (NoLength, Got the entry's
// number from 1). Heights begin at that of the first entry when it is known.
func Hill(name string, entries []Entry) (hill.Profile, error) {
	if len(entries) == 0 {
		return hill.Profile{}, &Error{Kind: NotEnough, What: "readings"}
	}
	foot := entries[0].At.HeightM
	known := finite(foot)
	if !known {
		foot = 0
	}
	edges, heights := []float64{0}, []float64{foot}
	for i := range entries {
		e := &entries[i]
		if _, err := checked(e.Reading); err != nil {
			return hill.Profile{}, err
		}
		length := e.pitchM()
		if length < leastPitchM {
			return hill.Profile{}, &Error{Kind: NoLength, What: e.Place, Got: float64(i + 1)}
		}
		edges = append(edges, edges[i]+length)
		heights = append(heights, heights[i]+length*e.Grade.Sin())
	}
	if total := edges[len(entries)]; total > hill.LongestTypedM {
		return hill.Profile{}, &Error{Kind: OutOfRange, What: "length", Got: total}
	}
	p, err := hill.FromHeights(edges, heights, nil)
	p.Name, p.HeightKnown = name, known
	return p, err
}

const leastPitchM = 1.0
