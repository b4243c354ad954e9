package slope

import (
	"math"

	"hillwright/physics/unit"
)

// Rest is the side of the phone that points down.
type Rest string

// How a phone lies. The texts are stable: offsets are stored by them.
const (
	OnBack   Rest = "back"
	OnFace   Rest = "face"
	OnLeft   Rest = "left"
	OnRight  Rest = "right"
	OnBottom Rest = "bottom"
	OnTop    Rest = "top"
)

// RestOf tells how the phone lies while an edge of it is read; an offset holds
// for one Rest and Edge.
func RestOf(u Up, e Edge) Rest {
	side, low, high := u.X, OnLeft, OnRight
	if e == ShortEdge {
		side, low, high = u.Y, OnBottom, OnTop
	}
	switch {
	case math.Abs(u.Z) >= math.Abs(side) && u.Z >= 0:
		return OnBack
	case math.Abs(u.Z) >= math.Abs(side):
		return OnFace
	case side >= 0:
		return low
	}
	return high
}

// Offset is what a device reads on the level, kept from a half turn. The zero
// value says that it is not known. Key tells offsets apart: the device, the
// edge, the rest, and the bike when it lies on one.
type Offset struct {
	Angle, Error unit.Angle
	Key          string
}

// Known tells that the offset was measured.
func (o Offset) Known() bool { return o.Error > 0 }

// Support is what the phone lies on.
type Support struct {
	// BaseM is the length of road that it spans [m], 0.1 to 10: the straight
	// edge's, or the bike's wheelbase.
	BaseM float64
	// Bike tells that the phone lies on a bike's tube, whose own angle is not
	// known: between the two readings the bike is turned with the phone on it.
	Bike bool
}

// Errors of laying a phone down, 1 σ. Common practice, no source.
const (
	seatError     = 0.05 * degree // laid down again, it lies so much differently
	roadUnevenM   = 0.002         // a road is so much off a straight line under an edge [m]
	factoryError  = 1.0 * degree  // a phone's offset that was never measured
	ageingError   = 0.1 * degree  // a kept offset: warmth, a year
	scaleError    = 0.003         // a sensor's scale, part of the angle
	sightingError = 0.5 * degree  // by eye along an edge
	mostOffset    = 5.0 * degree  // beyond it the phone was not turned
	mostTube      = 30.0 * degree // a bike's tube
)

// Turned makes a reading of two averages of the same edge at the same place,
// with phone (or bike) turned half round in between: what the sensor adds to
// both cancels. The first counts: the reading is positive where the edge rose
// then. It also gives the offset, to be kept under key for readings to come.
func Turned(first, second Average, on Support, key string) (Reading, Offset, error) {
	if err := on.check(first, second); err != nil {
		return Reading{}, Offset{}, err
	}
	angle := (first.Mean - second.Mean) / 2
	offset := (first.Mean + second.Mean) / 2
	most := unit.Angle(mostOffset)
	if on.Bike {
		most = mostTube
	}
	if math.Abs(float64(offset)) > float64(most) {
		return Reading{}, Offset{}, &Error{Kind: NotTurned, What: "offset", Got: offset.Degrees()}
	}
	each := root(float64(first.Error), float64(second.Error), seatError, seatError) / 2
	r, err := angled(angle, root(each, on.uneven()), 0, "", ByTurnedTilt)
	if err != nil {
		return Reading{}, Offset{}, err
	}
	return r, Offset{Angle: offset, Error: unit.Angle(each), Key: key}, nil
}

// Tilt makes a reading of one average with a kept offset. Without one (an
// Offset whose Error is 0) the phone's own error of 1° is taken; on a bike it is
// refused.
func Tilt(a Average, kept Offset, on Support) (Reading, error) {
	if err := on.check(a); err != nil {
		return Reading{}, err
	}
	if on.Bike && !kept.Known() {
		return Reading{}, &Error{Kind: NotCalibrated, What: "bike"}
	}
	own := root(float64(a.Error), seatError, on.uneven())
	return angled(a.Mean-kept.Angle, own, kept.left(), kept.Key, ByTilt)
}

// Sighted makes a reading of one average of a phone held on edge and sighted
// along: at a place up the road as high above it as the eyes are, or at the
// road's line seen from the side. The eye's error is 0.5°.
func Sighted(a Average, kept Offset) (Reading, error) {
	if err := enough(a); err != nil {
		return Reading{}, err
	}
	return angled(a.Mean-kept.Angle, root(float64(a.Error), sightingError), kept.left(), kept.Key, BySight)
}

// left is the error that stays after the offset is taken off [rad].
func (o Offset) left() float64 {
	if !o.Known() {
		return factoryError
	}
	return root(float64(o.Error), ageingError)
}

// uneven is how far the road under the support is from the road's grade [rad].
func (s Support) uneven() float64 { return roadUnevenM / s.BaseM }

func (s Support) check(averages ...Average) error {
	if err := number("length of the edge", Measured{Value: s.BaseM}, 0.0999, 10); err != nil {
		return err
	}
	return enough(averages...)
}

func enough(averages ...Average) error {
	for _, a := range averages {
		if !finite(float64(a.Mean)) || !finite(float64(a.Error)) || a.Error <= 0 {
			return &Error{Kind: NotEnough, What: "samples", Got: a.Seconds / cellS}
		}
	}
	return nil
}

// angled makes a reading of an angle; own is the error of this reading alone,
// shared what the offset leaves [rad].
func angled(angle unit.Angle, own, shared float64, by string, m Method) (Reading, error) {
	if math.Abs(float64(angle)) >= math.Pi/2 {
		return Reading{}, &Error{Kind: OutOfRange, What: "angle", Got: angle.Degrees()}
	}
	g := unit.GradeOf(angle)
	perRad := 1 + float64(g)*float64(g)
	scale := scaleError * math.Abs(float64(angle))
	return checked(Reading{
		Grade: g, Method: m,
		Error:  perRad * root(own, shared, scale),
		Shared: perRad * shared, SharedBy: by,
	})
}

// root is the root of the sum of squares.
func root(v ...float64) float64 {
	sum := 0.0
	for _, x := range v {
		sum += x * x
	}
	return math.Sqrt(sum)
}
