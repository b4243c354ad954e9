package slope

import (
	"math"

	"hillwright/physics/unit"
)

// Vector holds components along three axes.
type Vector struct{ X, Y, Z float64 }

// Axes are a device's axes as unit vectors in the world, X east, Y north, Z up:
// Right along the screen's short side, Top along its long side towards the top
// edge, Out of the screen towards who looks at it.
type Axes struct{ Right, Top, Out Vector }

// AxesOf gives the device's axes from the angles of a DeviceOrientation event
// [°]: alpha about Out, then beta about Right, then gamma about Top, each about
// the axis as the turns before have left it (W3C, Device Orientation and
// Motion, 2024, section 4.1): R = Rz(α)·Rx(β)·Ry(γ), whose columns are the axes.
// Any finite angles hold, also beyond the event's own ranges.
func AxesOf(alphaDeg, betaDeg, gammaDeg float64) Axes {
	sa, ca := sincosDeg(alphaDeg)
	sb, cb := sincosDeg(betaDeg)
	sg, cg := sincosDeg(gammaDeg)
	return Axes{
		Right: Vector{ca*cg - sa*sb*sg, sa*cg + ca*sb*sg, -cb * sg},
		Top:   Vector{-sa * cb, ca * cb, sb},
		Out:   Vector{ca*sg + sa*sb*cg, sa*sg - ca*sb*cg, cb * cg},
	}
}

// Up is the direction of the world's up in the device's axes. It is all that a
// grade needs; it does not depend on the compass.
func (a Axes) Up() Up { return Up{a.Right.Z, a.Top.Z, a.Out.Z} }

// Up is a unit vector that points up in the world, by its components along a
// device's axes Right (X), Top (Y) and Out (Z).
type Up Vector

// UpOfOrientation gives up from beta and gamma of a DeviceOrientation event
// [°]. False when an angle is not a number, as on a device without the sensor.
func UpOfOrientation(betaDeg, gammaDeg float64) (Up, bool) {
	if !finite(betaDeg) || !finite(gammaDeg) {
		return Up{}, false
	}
	return AxesOf(0, betaDeg, gammaDeg).Up(), true
}

// stillMps2 is how far the acceleration of a phone at rest may lie from
// standard gravity [m/s²]: 0.05 for the place on earth, the rest for the
// sensor's scale (common practice, no source).
const stillMps2 = 0.5

// UpOfAcceleration gives up from the acceleration including gravity of a
// DeviceMotion event [m/s²]: at rest it points up, z is +9.8 with the phone on
// its back (W3C, as above, section 4.3). Some systems give it the other way
// round. still is false when its size is not that of
// gravity, because the phone is being moved; ok is false when there is none.
func UpOfAcceleration(x, y, z float64) (up Up, still, ok bool) {
	size := math.Sqrt(x*x + y*y + z*z)
	if !finite(size) || size < 1 {
		return Up{}, false, false
	}
	return Up{x / size, y / size, z / size}, math.Abs(size-unit.Gravity) <= stillMps2, true
}

// Edge is an edge of the phone, and the direction in which its rise counts.
type Edge uint8

// The edges.
const (
	LongEdge  Edge = iota // along Y, rising towards the top
	ShortEdge             // along X, rising towards the right
)

// Angle is the angle of an edge with the level, −90° to 90°, positive when the
// edge rises. It is that of the edge itself, however the phone is rolled about
// it: face up, face down, on its side.
func (u Up) Angle(e Edge) unit.Angle {
	along, side := u.Y, u.X
	if e == ShortEdge {
		along, side = u.X, u.Y
	}
	return unit.Angle(math.Atan2(along, math.Hypot(side, u.Z)))
}

// sincosDeg is exact at whole quarter turns.
func sincosDeg(deg float64) (sin, cos float64) {
	turn := math.Mod(deg, 360)
	switch turn {
	case 0:
		return 0, 1
	case 90, -270:
		return 1, 0
	case 180, -180:
		return 0, -1
	case 270, -90:
		return -1, 0
	}
	return math.Sincos(turn * math.Pi / 180)
}
