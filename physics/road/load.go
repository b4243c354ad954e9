// Package road gives the forces that a road, the air and the wheels put
// against a bike. Forces are along the road [N]; a positive Load is what must
// be pulled. Start with Load.Force.
//
// The equation is the one published for road cycling by Martin, Milliken,
// Cobb, McFadden and Coggan, Journal of Applied Biomechanics 14 (1998)
// 276–291, kept without its small-angle steps.
package road

import (
	"math"

	"hillwright/physics/unit"
)

// Load holds what resists: MassKg all-up [kg]; Crr the coefficient of rolling
// resistance; DragM2 the drag area of bike, rider and load together [m²];
// WheelDragM2 the wheels' rotational share of it [m², Fw of the source];
// DensityKgM3 the air's density [kg/m³]; BearingFactor scales the wheel
// bearings' resistance (1 is a pair of good wheels).
type Load struct {
	MassKg        float64
	Crr           float64
	DragM2        float64
	WheelDragM2   float64
	DensityKgM3   float64
	BearingFactor float64
}

// Parts are the shares of the road load [N], positive backward.
type Parts struct{ Slope, Rolling, Air, Bearings float64 }

// Sum is the whole road load [N].
func (p Parts) Sum() float64 { return p.Slope + p.Rolling + p.Air + p.Bearings }

// Parts gives the shares of the road load at a speed [m/s, ≥ 0] on a road
// whose angle has the given sine and cosine, with a head and a cross wind
// [m/s, head positive against the rider].
func (l *Load) Parts(speedMps, sin, cos, headMps, crossMps float64) Parts {
	weight := l.MassKg * unit.Gravity
	along := speedMps + headMps
	return Parts{
		Slope:    weight * sin,
		Rolling:  weight * l.Crr * cos,
		Air:      0.5 * l.DensityKgM3 * (l.DragM2 + l.WheelDragM2) * along * math.Sqrt(along*along+crossMps*crossMps),
		Bearings: l.BearingFactor * Bearings(speedMps),
	}
}

// Force is the whole road load [N], as Parts.
func (l *Load) Force(speedMps, sin, cos, headMps, crossMps float64) float64 {
	return l.Parts(speedMps, sin, cos, headMps, crossMps).Sum()
}

// Bearings is the resistance of a pair of wheel bearings [N] at a speed
// [m/s]: (91 + 8.7·v)·10⁻³, from the source's regression (Dahn et al. 1991
// in Martin et al. 1998). Published for road speeds, 0 to about 20 m/s.
func Bearings(speedMps float64) float64 { return (91 + 8.7*speedMps) / 1000 }

// SteepestSine is the sine of the angle of the road that a pull [N] holds when
// drag [N] of it goes into air and bearings: the closed form of
// m·G·(sin θ + Crr·cos θ) = pull − drag. It is 1 where any road is held, −1
// where the pull does not hold the steepest fall.
func (l *Load) SteepestSine(pullN, dragN float64) float64 {
	phi := math.Atan(l.Crr)
	s := (pullN - dragN) / (l.MassKg * unit.Gravity) * math.Cos(phi)
	if s >= 1 {
		return 1
	}
	if s <= -1 {
		return -1
	}
	return math.Sin(math.Asin(s) - phi)
}
