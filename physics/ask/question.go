// Package ask is the door of the calculator: one Question (a bike, a rider, a
// load, a day and how it is ridden), every input of which has a dotted path, a
// unit, a range, a band and a word on where it came from. The page, the shop's
// files, saved things and the command line all use the same paths. Start with
// Default, Question.Set and Question.Climb.
package ask

import (
	"hillwright/physics/rider"
	"hillwright/physics/rig"
)

// Question is everything that is asked about, save the hill. Coast is for
// coast-downs only: no answer about a hill looks at it.
type Question struct {
	Bike  rig.Bike
	Rider rider.Rider
	Load  rig.Load
	Day   rig.Day
	Ride  Ride
	Coast Coast
	// Source says where inputs came from that differ from the catalogue's
	// default, by path.
	Source map[string]Source
}

// Ride is how the hill is ridden: the assist level, the speed at its foot and
// the speed that the brakes hold on the way down [m/s], the law; the pack's
// charge at the start and what of it is kept back (0 to 1); whether it is there
// and back, how often (rounded to whole trips), the pause after every way [s]; whether a motor that can
// recovers on the way down; the way that one sees there [m] and the time to
// react [s].
type Ride struct {
	Level              int
	StartMps           float64
	DownMps            float64
	LawID              string
	Charge, ChargeKept float64
	Back               bool
	Trips              float64
	PauseS             float64
	Recover            bool
	SightM, ReactS     float64
}

// Source is where a number came from.
type Source uint8

// The sources, weakest first.
const (
	Assumed  Source = iota // a class default
	Sheet                  // the maker's sheet
	Measured               // measured here
)

var sourceNames = []string{"assumed", "sheet", "measured"}

// String is the source's name in files and on the command line.
func (s Source) String() string { return sourceNames[s] }
