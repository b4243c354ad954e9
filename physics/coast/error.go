package coast

import "strconv"

// ErrorKind says why no drag comes out.
type ErrorKind uint8

// Why no drag comes out. Run is the run's number from 0 where one is to blame.
const (
	NoRun      ErrorKind = iota // there is nothing to fit
	BadNumber                   // a number that is none, or out of order
	TooFew                      // Got points or marks, Want at least
	TooShort                    // Got seconds, Want at least
	TooSlow                     // it begins at Got m/s, Want at least
	SmallRange                  // the speed falls by the part Got only, Want at least
	SpeedsUp                    // the speed does not fall
	CannotTell                  // neither Crr nor CdA come out better than they were known
	Impossible                  // they come out beyond what a bike can have; Got is Crr, Want CdA
	NotWhole                    // no whole number of clicks per turn: Got clicks per turn, in Want turns
	TooNoisy                    // the fit does not settle
)

// Error says why no drag comes out.
type Error struct {
	Kind      ErrorKind
	Run       int
	Got, Want float64
}

func (e *Error) Error() string {
	f := func(v float64, digits int) string { return strconv.FormatFloat(v, 'f', digits, 64) }
	run := "run " + strconv.Itoa(e.Run+1)
	switch e.Kind {
	case NoRun:
		return "there is no coast-down; record one: coast from about 30 km/h until walking speed, without pedalling or braking"
	case BadNumber:
		return run + ": a time or a speed is no number or out of order; expected times that rise and speeds from 0 to 40 m/s"
	case TooFew:
		return run + ": got " + f(e.Got, 0) + " readings, expected at least " + f(e.Want, 0)
	case TooShort:
		return run + " lasts " + f(e.Got, 1) + " s; expected at least " + f(e.Want, 0) + " s: coast longer, on a longer road"
	case TooSlow:
		return run + " begins at " + f(3.6*e.Got, 0) + " km/h; expected at least " + f(3.6*e.Want, 0) + " km/h: start faster"
	case SmallRange:
		return run + ": the speed falls by " + f(100*e.Got, 0) + " % only; expected at least " + f(100*e.Want, 0) + " %: coast on until walking speed"
	case SpeedsUp:
		return run + ": the speed does not fall; expected a level road without wind from behind, and no pedalling"
	case CannotTell:
		return "the runs cannot tell rolling from air, nor either alone; add runs in both directions, from a higher speed, on a road whose grade is known"
	case Impossible:
		return "the runs give Crr " + f(e.Got, 4) + " and CdA " + f(e.Want, 2) + " m², which no bike has; check the clicks per turn, the mass, the grade and which way each run was ridden"
	case NotWhole:
		return f(e.Got, 2) + " clicks per turn in " + f(e.Want, 0) + " turns is not near a whole number from 4 to 200; count the turns again and roll slowly and evenly"
	}
	return "the runs are too noisy for a fit; record in a quieter place, the phone closer to the hub"
}
