// Package unit holds the typed quantities of the calculator: those in which a
// mix-up would hurt. Everything else is a float64 whose name ends in its unit
// (massKg, powerW). Start with Grade, which turns rise over run into the sine
// and cosine that the road load needs.
package unit

import "math"

// Gravity is the standard acceleration of free fall [m/s²], exact by
// definition (3rd CGPM, 1901; ISO 80000-3).
const Gravity = 9.80665

// Angle is a plane angle [rad].
type Angle float64

// Degrees gives the angle [°].
func (a Angle) Degrees() float64 { return float64(a) * 180 / math.Pi }

// FromDegrees makes an angle of degrees.
func FromDegrees(deg float64) Angle { return Angle(deg * math.Pi / 180) }

// Grade is rise over run: the tangent of the road's angle. 0.12 is 12 %.
// It holds for any finite value; nothing here takes an angle for small.
type Grade float64

// GradeOf gives the grade of a road that makes the angle with the level.
// Valid below a right angle.
func GradeOf(a Angle) Grade { return Grade(math.Tan(float64(a))) }

// Percent makes a grade of per cent: Percent(12) is 0.12.
func Percent(p float64) Grade { return Grade(p / 100) }

// Angle gives the road's angle with the level.
func (g Grade) Angle() Angle { return Angle(math.Atan(float64(g))) }

// Cos gives the cosine of the road's angle: run over road length.
func (g Grade) Cos() float64 { return 1 / math.Sqrt(1+float64(g)*float64(g)) }

// Sin gives the sine of the road's angle: rise over road length.
func (g Grade) Sin() float64 { return float64(g) * g.Cos() }

// Celsius is a temperature on the Celsius scale.
type Celsius float64

// Kelvin gives the thermodynamic temperature [K].
func (c Celsius) Kelvin() float64 { return float64(c) + 273.15 }

// Speed is a speed along the road [m/s].
type Speed float64

// MetresPerMile is the international mile [m], exact (1959 agreement).
const MetresPerMile = 1609.344

// KMH gives the speed in kilometres per hour.
func (s Speed) KMH() float64 { return float64(s) * 3.6 }

// MPH gives the speed in miles per hour.
func (s Speed) MPH() float64 { return float64(s) * 3600 / MetresPerMile }
