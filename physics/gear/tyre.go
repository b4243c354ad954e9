// Package gear turns wheels, chainrings, sprockets and hub gears into
// development: metres of road per turn of the cranks. Start with Train.Gears.
package gear

import "math"

// beadSeats are the bead-seat diameters [mm] of ISO 5775 that a bike may have.
var beadSeats = []int{203, 254, 288, 305, 355, 406, 457, 507, 540, 547, 559, 571, 584, 590, 597, 599, 622, 630, 635}

// Tyre is a tyre by ISO 5775: width and bead-seat diameter [mm], written
// 47-622.
type Tyre struct{ WidthMM, BeadSeatMM int }

// squash is how much a loaded tyre's roll-out falls short of the free
// circumference. Common practice, no source: charts of roll-out lie 0.5 to 2 %
// below; a measured roll-out wins where there is one.
const squash = 0.990

// Circumference is the roll-out of the loaded tyre [m], taken from its free
// diameter (bead seat plus twice the width). Within about 1 %; measure.
func (t Tyre) Circumference() float64 {
	return squash * math.Pi * float64(t.BeadSeatMM+2*t.WidthMM) / 1000
}

// Known tells whether the bead seat is one of ISO 5775 and the width is one a
// bike's rim takes (18 to 130 mm).
func (t Tyre) Known() bool {
	if t.WidthMM < 18 || t.WidthMM > 130 {
		return false
	}
	for _, d := range beadSeats {
		if d == t.BeadSeatMM {
			return true
		}
	}
	return false
}
