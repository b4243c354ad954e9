package rig

// Limit is one thing that holds a bike back.
type Limit uint8

// The limits, in the order in which the page explains them. Coasting is no
// limit on pull: it says that the road drives and nobody pedals.
const (
	Torque  Limit = iota // the motor's torque through this gear
	Power                // the motor's power at this speed
	Rider                // the rider's effort times the assist level
	CutOff               // the law's speed limit on assistance
	Cadence              // the crank motor's cadence range
	Heat                 // the motor eases off because it is hot
	Cells                // what the pack gives: voltage, current, charge
	Grip                 // the driven tyre slips
	Lift                 // the front wheel lifts
	Coasting
	Limits // how many there are
)

var limitNames = [Limits]string{"torque", "power", "rider", "cut-off", "cadence", "heat", "cells", "grip", "lift", "coasting"}

// String is the limit's name in files and on the command line.
func (l Limit) String() string { return limitNames[l] }

// Pegs holds, for each limit, the pull at the tyre [N] that this limit alone
// would allow at one speed in one gear; +Inf where it does not limit there.
type Pegs [Limits]float64

// Least gives the limit that allows the least and its pull [N].
func (p *Pegs) Least() (Limit, float64) {
	at, least := Limit(0), p[0]
	for l := Limit(1); l < Coasting; l++ {
		if p[l] < least {
			at, least = l, p[l]
		}
	}
	return at, least
}
