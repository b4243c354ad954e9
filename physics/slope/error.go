package slope

import "strconv"

// ErrorKind says why no reading comes out. The page says it in the reader's
// words by kind.
type ErrorKind uint8

// Why no reading comes out.
const (
	NotANumber    ErrorKind = iota // a value is not finite
	OutOfRange                     // a value lies outside what can be
	TooShort                       // the stretch is too short for its errors
	NotTurned                      // two tilt readings do not differ as half a turn makes them
	NotCalibrated                  // a bike's tube needs the half turn first
	NotEnough                      // too few samples, fixes or readings
	NoHeights                      // the track or the ride has no heights
	NoLength                       // a kept reading stands for no length of road
)

// Error says why no reading comes out: of what, and what was got, in the unit
// of What.
type Error struct {
	Kind ErrorKind
	What string // "grade", "rise", "length", "turns" ...
	Got  float64
}

// Error says it in English.
func (e *Error) Error() string {
	got := strconv.FormatFloat(e.Got, 'g', 4, 64)
	switch e.Kind {
	case NotANumber:
		return "grade reading: the " + e.What + " is not a number; measure or type it again"
	case TooShort:
		return "grade reading: the " + e.What + " of " + got + " m is too short for its error; take a longer one"
	case NotTurned:
		return "grade reading: the two readings differ as if the phone was not turned half round at the same place; take both again"
	case NotCalibrated:
		return "grade reading: how the phone lies on this bike is not known; take two readings, the bike turned half round between them"
	case NotEnough:
		return "grade reading: too few " + e.What + " (" + got + "); go on measuring"
	case NoLength:
		return "grade reading " + got + " (" + strconv.Quote(e.What) + ") has no length of road; pace it out or type it"
	case NoHeights:
		return "grade reading: there are no heights in the " + e.What + "; measure another way"
	}
	return "grade reading: the " + e.What + " is out of range: " + got
}

// number checks that a measured value lies in (low, high], with an error that
// is finite and not negative.
func number(what string, m Measured, low, high float64) error {
	switch {
	case !finite(m.Value):
		return &Error{Kind: NotANumber, What: what, Got: m.Value}
	case !finite(m.Error):
		return &Error{Kind: NotANumber, What: what + " error", Got: m.Error}
	case m.Value <= low || m.Value > high:
		return &Error{Kind: OutOfRange, What: what, Got: m.Value}
	case m.Error < 0 || m.Error > high:
		return &Error{Kind: OutOfRange, What: what + " error", Got: m.Error}
	}
	return nil
}
