package click

import "strconv"

// ErrorKind says why no clicks could be followed.
type ErrorKind uint8

// Why no clicks could be followed.
const (
	OddRate  ErrorKind = iota // Got: the sampling rate [Hz]
	TooShort                  // Got: the length [s]
	TooLong                   // Got: the length [s]
	Silent                    // Got: the loudest sample, full scale 1
	NoClicks                  // Got: the length [s]
	NotFlat                   // numbers that are no Heard
	NoSingle                  // single clicks cannot be told apart, nothing can be counted
)

// Error says why no clicks could be followed.
type Error struct {
	Kind ErrorKind
	Got  float64
}

func (e *Error) Error() string {
	number := func(digits int) string { return strconv.FormatFloat(e.Got, 'f', digits, 64) }
	switch e.Kind {
	case OddRate:
		return "the sampling rate is " + number(0) + " Hz; expected " + strconv.Itoa(LowestHz) + " to " + strconv.Itoa(HighestHz) + " Hz"
	case TooShort:
		return "the recording lasts " + number(1) + " s; expected at least " + strconv.Itoa(shortestS) + " s, a coast-down lasts 20 s or more"
	case TooLong:
		return "the recording lasts over " + strconv.Itoa(longestS/3600) + " hours; cut it to the coast-down"
	case Silent:
		return "the recording is silent; was the microphone covered, or another one chosen?"
	case NotFlat:
		return "the numbers of a recording are damaged; open the recording again"
	case NoSingle:
		return "single clicks cannot be told apart; roll the wheel slowly, the phone close to the hub, in a quiet place"
	}
	return "no clicks were found in " + number(0) + " s; expected the freehub's clicks while the bike coasts: put the phone close to the rear hub, do not pedal, and where the hub is silent fix a card so that it touches the spokes"
}
