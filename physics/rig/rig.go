// Package rig puts a bike, a rider, a load and a day together and tells what
// the whole can pull at a speed, limit by limit. Start with New, then
// Rig.Fresh and Rig.At for the state it is in, Rig.Pegs for the limits and
// Rig.Road for what the road wants.
package rig

import (
	"errors"
	"math"

	"hillwright/physics/air"
	"hillwright/physics/assume"
	"hillwright/physics/brake"
	"hillwright/physics/gear"
	"hillwright/physics/motor"
	"hillwright/physics/pack"
	"hillwright/physics/rider"
	"hillwright/physics/road"
	"hillwright/physics/rule"
	"hillwright/physics/unit"
)

// Day is the weather and what it makes of the road. Humidity 0 to 1. AltitudeM
// NaN: the hill's own height (or sea level). DensityKgM3 NaN: computed. WindMps
// with WindFromDeg NaN blows against the rider all the way; otherwise from that
// direction [° clockwise from north] wherever the road's bearing is known.
// Ground is the id of what the road is made of, wet or dry; Mu the friction
// coefficient where it is known better, NaN otherwise. PackC is the pack's
// temperature [°C], NaN: the day's.
type Day struct {
	ID, Name     string
	TemperatureC unit.Celsius
	Humidity     float64
	AltitudeM    float64
	DensityKgM3  float64
	WindMps      float64
	WindFromDeg  float64
	Ground       string
	Mu           float64
	PackC        float64
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

	Circuit   motor.Circuit
	Heat      motor.Heat
	Pack      pack.Pack
	PackC     float64 // the cells' temperature [°C]
	Endurance rider.Endurance
	Stance    road.Stance
	Mu        float64
	Wet       bool
	Front     brake.Kind
	Rear      brake.Kind
	Brakes    brake.Pair
	// Assumed lists the class defaults that stand in for what no sheet gave, by
	// the paths of the question's inputs.
	Assumed []assume.Value

	factor float64   // the level's motor power per rider power
	crank  []float64 // crank angle per road, by gear [rad/m]
}

// What can be wrong with the parts of a rig.
var (
	ErrLevel  = errors.New("the motor has no such assist level")
	ErrGears  = errors.New("the bike has no gear: give it at least one chainring and one sprocket")
	ErrBrakes = errors.New("the bike has no brake that is known: give it a front or a rear one")
	ErrGround = errors.New("the road's ground is not known")
)

// New makes a rig. altitudeM is where the day's altitude is not given [m]. It
// fails where the parts cannot make a bike that rides: no gear, no brake, a
// level that the motor does not have, a ground that is not known.
func New(b Bike, r rider.Rider, cargo Load, d Day, law rule.Law, level int, altitudeM float64) (*Rig, error) {
	g := &Rig{Bike: b, Rider: r, Cargo: cargo, Day: d, Law: law, Level: level}
	if g.Gears = b.Train.Gears(); len(g.Gears) == 0 {
		return nil, ErrGears
	}
	if b.Motor.Kind == motor.None {
		g.Level = 0
	}
	if g.Level < 0 || g.Level > len(b.Motor.Levels) {
		return nil, ErrLevel
	}
	if g.Level > 0 {
		g.factor = b.Motor.Levels[g.Level-1]
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
		DensityKgM3:   d.Density(altitudeM),
		BearingFactor: 1,
	}
	g.crank = make([]float64, len(g.Gears))
	for i, each := range g.Gears {
		g.crank[i] = 2 * math.Pi / each.Development(g.CircumferenceM)
	}
	return g, g.complete(radius)
}

// complete works out what stands behind the sheet: circuit, heat, pack, the
// legs, the stance on the wheels, the ground, the brakes.
func (g *Rig) complete(radiusM float64) error {
	b, d := &g.Bike, &g.Day
	var more []assume.Value
	g.Circuit, g.Heat, g.Assumed = b.circuit(radiusM, g.Law.SpeedMps)
	prefix(g.Assumed, "bike.motor.")
	g.Pack, more = b.packed()
	prefix(more, "bike.pack.")
	g.Assumed = append(g.Assumed, more...)
	g.PackC = d.PackC
	if math.IsNaN(d.PackC) {
		g.PackC = float64(d.TemperatureC)
	}
	g.Endurance = rider.Endurance{CriticalW: g.Rider.CriticalW, ReserveJ: g.Rider.ReserveJ}
	g.Stance = b.stance(g.Rider.MassKg, g.Cargo)
	ground, ok := road.GroundByID(d.Ground)
	if !ok {
		return ErrGround
	}
	g.Mu, g.Wet = ground.Mu.Usual, ground.Wet
	if !math.IsNaN(d.Mu) {
		g.Mu = d.Mu
	}
	var err error
	if g.Front, g.Rear, err = b.brakes(); err != nil {
		return err
	}
	g.Brakes = brake.NewPair(g.Front, g.Rear, b.FrontBrakeShare)
	return nil
}

func prefix(list []assume.Value, path string) {
	for i := range list {
		list[i].Path = path + list[i].Path
	}
}

// Density is the air's density on the day [kg/m³], at a place whose altitude is
// altitudeM [m] when the day does not give one.
func (d *Day) Density(altitudeM float64) float64 {
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

// Assists tells whether a motor is there and switched on.
func (g *Rig) Assists() bool { return g.Level > 0 }
