package slope

import (
	"math"

	"hillwright/physics/hill"
)

// Fix is one fix of a location sensor, as the Geolocation API gives it (W3C,
// Geolocation, 2024): AccuracyM is the radius within which the place lies in
// 95 of 100 fixes [m], HeightAccuracyM the same for the height [m]. HeightM
// and HeightAccuracyM are NaN when there is none.
type Fix struct {
	hill.Point
	AccuracyM, HeightAccuracyM float64
}

// Heights says where the heights of a track come from.
type Heights uint8

// Where heights come from.
const (
	Satellite  Heights = iota // or not known
	Barometric                // of a recorder with an air pressure sensor
	Surveyed                  // a map or a height model
)

// Errors of heights and places, 1 σ. Common practice, no source; a fix that
// tells its own error is believed.
const (
	barometricM  = 0.5   // a pressure sensor's heights against each other [m]
	surveyedM    = 1.5   // a height model's [m]
	satelliteM   = 4.0   // a satellite receiver's [m]
	togetherM    = 200.0 // a track's height errors hang together over this way [m]
	heightToSide = 1.5   // a satellite's height error, by that of the place
	trackScale   = 0.01  // a track's length is so much off
	trackEndM    = 2.0   // and its ends so far [m]
)

// Factors from an error to the radius or half-width that holds 95 of 100.
const (
	factor95  = 1.959963984540054
	radius95  = 2.4477468306808161 // in two directions: √(−2 ln 0.05)
	leastFix  = 5                  // fixes
	leastLegM = 10.0
	leastWayM = 20.0
	mostNodes = 150
)

// heightsTogetherS are the times over which a sensor's height errors may hang
// together [s]. The one that makes the grade worst is taken.
var heightsTogetherS = [...]float64{1, 5, 15, 60, 240}

// TrackStretch makes a reading of a stretch of a profile, fromM to toM along
// the road [m]. Its error comes from where the heights come from.
func TrackStretch(p *hill.Profile, fromM, toM float64, from Heights) (Reading, error) {
	for _, note := range p.Notes {
		if note.Kind == hill.NoteNoHeights || note.Kind == hill.NoteZeroHeights {
			return Reading{}, &Error{Kind: NoHeights, What: "track"}
		}
	}
	if !finite(fromM) || !finite(toM) {
		return Reading{}, &Error{Kind: NotANumber, What: "stretch", Got: toM - fromM}
	}
	fromM, toM = max(0, fromM), min(toM, p.LengthM())
	lengthM := toM - fromM
	if lengthM < leastWayM {
		return Reading{}, &Error{Kind: TooShort, What: "stretch", Got: max(0, lengthM)}
	}
	end := satelliteM
	switch from {
	case Barometric:
		end = barometricM
	case Surveyed:
		end = surveyedM
	}
	rise := Measured{
		Value: p.HeightAt(toM) - p.HeightAt(fromM),
		Error: end * math.Sqrt(2*(1-math.Exp(-lengthM/togetherM))),
	}
	length := Measured{lengthM, root(trackScale*lengthM, trackEndM)}
	return riseOver(rise, length, AlongRoad, ByTrack)
}
