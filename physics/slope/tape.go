package slope

import (
	"math"

	"hillwright/physics/unit"
)

// Along says along what a length was measured.
type Along uint8

// The two lengths of a pitch.
const (
	AlongRoad  Along = iota // on the road itself
	AlongLevel              // level, as on a map or under a level
)

// Tape makes a reading of a rise [m, negative when it falls] over a length [m,
// above 0, at most 100 km], each with its error (1 σ). A rise that is read to
// the nearest unit of a tape is right to 0.3 of it.
func Tape(rise, length Measured, along Along) (Reading, error) {
	return riseOver(rise, length, along, ByTape)
}

// LevelRaised makes a reading of a level of levelM [m] whose low end is raised
// by so much above the road [m] that the bubble stands in the middle. rise is
// measured upright. The bubble is taken for right to 1 mm in a metre (common
// practice, no source); negative when the far end had to be raised.
func LevelRaised(raised, level Measured) (Reading, error) {
	raised.Error = root(raised.Error, bubbleError*level.Value)
	return riseOver(raised, level, AlongLevel, ByLevel)
}

const bubbleError = 0.001

// riseOver makes a grade of rise and length. To first order in the errors; a
// length whose error is beyond a third of it is refused.
func riseOver(rise, length Measured, along Along, m Method) (Reading, error) {
	if err := number("length", length, 0, 100e3); err != nil {
		return Reading{}, err
	}
	if err := number("rise", rise, -10e3, 10e3); err != nil {
		return Reading{}, err
	}
	if 3*length.Error > length.Value {
		return Reading{}, &Error{Kind: TooShort, What: "length", Got: length.Value}
	}
	part := rise.Value / length.Value
	own := root(rise.Error, part*length.Error) / length.Value
	roadM := length.Value * math.Hypot(1, part)
	if along == AlongRoad {
		if math.Abs(part) >= 1 {
			return Reading{}, &Error{Kind: OutOfRange, What: "rise", Got: rise.Value}
		}
		cos := math.Sqrt(1 - part*part)
		part, own, roadM = part/cos, own/(cos*cos*cos), length.Value
	}
	own = max(own, leastError)
	return checked(Reading{Grade: unit.Grade(part), Error: own, Method: m, LengthM: roadM})
}

// leastError keeps a reading of lengths that are called exact from outweighing
// everything [grade].
const leastError = 1e-4
