// Package rig puts a bike, a rider, a load and a day together and tells what
// the whole can pull at a speed, limit by limit. Start with New, then
// Rig.Pegs for the limits and Rig.Load for what the road wants.
package rig

import (
	"errors"
	"math"

	"hillwright/physics/air"
	"hillwright/physics/gear"
	"hillwright/physics/motor"
	"hillwright/physics/rider"
	"hillwright/physics/road"
	"hillwright/physics/rule"
	"hillwright/physics/unit"
)

// Bike is a bike as the shop knows it. MassKg with pack and motor [kg]; Crr
// coefficient of rolling resistance; CdAM2 drag area with a rider in the usual
// posture [m²]; WheelDragM2 the wheels' rotational drag [m²];
// WheelInertiaKgM2 both wheels' moment of inertia [kg·m²]; RolloutM a measured
// roll-out [m], NaN when there is none and the tyre decides; PackWh the pack's
// energy [Wh]; ShiftS the time without pull that a shift takes [s].
type Bike struct {
	ID, Name         string
	MassKg           float64
	Crr              float64
	CdAM2            float64
	WheelDragM2      float64
	WheelInertiaKgM2 float64
	Tyre             gear.Tyre
	RolloutM         float64
	Train            gear.Train
	ShiftS           float64
	Motor            motor.Motor
	PackWh           float64
}

// Load is what the bike carries besides the rider: mass [kg] and added drag
// area [m²].
type Load struct {
	ID, Name string
	MassKg   float64
	CdAM2    float64
}

// Day is the weather. Humidity 0 to 1. AltitudeM NaN: the hill's own height
// (or sea level). DensityKgM3 NaN: computed. WindMps with WindFromDeg NaN
// blows against the rider all the way; otherwise from that direction
// [° clockwise from north] wherever the road's bearing is known.
type Day struct {
	ID, Name     string
	TemperatureC unit.Celsius
	Humidity     float64
	AltitudeM    float64
	DensityKgM3  float64
	WindMps      float64
	WindFromDeg  float64
}

// Limit is one thing that holds a bike back.
type Limit uint8

// The limits, in the order in which the page explains them.
const (
	Torque   Limit = iota // the motor's torque through this gear
	Power                 // the motor's power at this speed
	Rider                 // the rider's effort times the assist level
	CutOff                // the law's speed limit on assistance
	Cadence               // the crank motor's cadence range
	Coasting              // the road drives and nobody pedals: not a limit on pull
	Limits                // how many there are
)

var limitNames = [Limits]string{"torque", "power", "rider", "cut-off", "cadence", "coasting"}

// String is the limit's name in files and on the command line.
func (l Limit) String() string { return limitNames[l] }

// Pegs holds, for each limit, the pull at the tyre [N] that this limit alone
// would allow at one speed in one gear; +Inf where it does not limit there.
type Pegs [Limits]float64

// Least gives the limit that allows the least and its pull [N].
func (p *Pegs) Least() (Limit, float64) {
	at := Limit(0)
	for l := Limit(1); l < Limits; l++ {
		if p[l] < p[at] {
			at = l
		}
	}
	return at, p[at]
}

// Rig is a bike with rider and load on a day, made ready for computing.
type Rig struct {
	Bike  Bike
	Rider rider.Rider
	Cargo Load
	Day   Day
	Law   rule.Law
	// Level is the assist level in use, 1 to len(Bike.Motor.Levels); 0 is off.
	Level int

	Gears          []gear.Gear
	CircumferenceM float64
	// InertialKg is the mass that must be accelerated: all-up mass and the
	// wheels' inertia over the radius squared [kg].
	InertialKg float64
	Road       road.Load

	factor float64   // the level's motor power per rider power
	crank  []float64 // crank angle per road, by gear [rad/m]
}

// New makes a rig. altitudeM is where the day's altitude is not given [m]. It
// fails where the parts cannot make a bike that rides: no gear, no mass, a
// level that the motor does not have.
func New(b Bike, r rider.Rider, cargo Load, d Day, law rule.Law, level int, altitudeM float64) (*Rig, error) {
	g := &Rig{Bike: b, Rider: r, Cargo: cargo, Day: d, Law: law, Level: level}
	g.Gears = b.Train.Gears()
	if len(g.Gears) == 0 {
		return nil, errors.New("the bike has no gear: give it at least one chainring and one sprocket")
	}
	if b.Motor.Kind != motor.None && (level < 0 || level > len(b.Motor.Levels)) {
		return nil, ErrLevel
	}
	if b.Motor.Kind != motor.None && level > 0 {
		g.factor = b.Motor.Levels[level-1]
	}
	g.CircumferenceM = b.RolloutM
	if math.IsNaN(b.RolloutM) {
		g.CircumferenceM = b.Tyre.Circumference()
	}
	radius := g.CircumferenceM / (2 * math.Pi)
	mass := b.MassKg + r.MassKg + cargo.MassKg
	g.InertialKg = mass + b.WheelInertiaKgM2/(radius*radius)
	g.Road = road.Load{
		MassKg:        mass,
		Crr:           b.Crr,
		DragM2:        b.CdAM2 + cargo.CdAM2,
		WheelDragM2:   b.WheelDragM2,
		DensityKgM3:   density(d, altitudeM),
		BearingFactor: 1,
	}
	g.crank = make([]float64, len(g.Gears))
	for i, each := range g.Gears {
		g.crank[i] = 2 * math.Pi / each.Development(g.CircumferenceM)
	}
	return g, nil
}

// ErrLevel says that the motor has no such assist level.
var ErrLevel = errors.New("the motor has no such assist level")

func density(d Day, altitudeM float64) float64 {
	if !math.IsNaN(d.DensityKgM3) {
		return d.DensityKgM3
	}
	if !math.IsNaN(d.AltitudeM) {
		altitudeM = d.AltitudeM
	}
	return air.Density(d.TemperatureC, air.StandardPressure(altitudeM), d.Humidity)
}

// CadenceAt is the crank cadence [turns/min] at a speed [m/s] in a gear.
func (g *Rig) CadenceAt(speedMps float64, gear int) float64 {
	return speedMps * g.crank[gear] * 30 / math.Pi
}
