package rig

import (
	"math"

	"hillwright/physics/assume"
	"hillwright/physics/brake"
	"hillwright/physics/gear"
	"hillwright/physics/motor"
	"hillwright/physics/pack"
	"hillwright/physics/road"
)

// Bike is a bike as the shop knows it. MassKg with pack and motor [kg]; Crr
// coefficient of rolling resistance; CdAM2 drag area with a rider in the usual
// posture [m²]; WheelDragM2 the wheels' rotational drag [m²];
// WheelInertiaKgM2 both wheels' moment of inertia [kg·m²]; RolloutM a measured
// roll-out [m], NaN when there is none and the tyre decides; ShiftS the time
// that a shift takes [s].
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
	Sheet            MotorSheet
	Pack             PackSheet
	Places           Places
	FrontBrake       string
	RearBrake        string
	FrontBrakeShare  float64
}

// MotorSheet is what is known of a motor beside torque, power and kind; NaN
// where it is not, and a class default stands in. MassKg [kg]; SystemV the
// nominal voltage of motor and pack [V]; the others are the circuit's and the
// heat model's values of the same names.
type MotorSheet struct {
	MassKg, SystemV          float64
	TorqueNmPerA, WindingOhm float64
	MaxPackA                 float64
	EaseFromC, EaseToC       float64
	CaseWPerK                float64
}

// PackSheet is what is known of a pack: energy on the label [Wh], chemistry,
// share of the capacity left by age, and where known resistance [Ω] and
// current limit [A], NaN otherwise.
type PackSheet struct {
	EnergyWh      float64
	Chemistry     pack.Chemistry
	Health        float64
	ResistanceOhm float64
	MaxA          float64
}

// Places says where masses sit on the bike: ahead of the rear tyre's contact
// and above the road [m]. Bike is the bare bike's centre of mass, Rider the
// seated rider's, Rack and Box those of loads behind and in front.
type Places struct {
	WheelbaseM                float64
	BikeAheadM, BikeHeightM   float64
	RiderAheadM, RiderHeightM float64
	RackAheadM, RackHeightM   float64
	BoxAheadM, BoxHeightM     float64
}

// LoadPlace is where a load rides.
type LoadPlace uint8

// The places of a load.
const (
	OnRack LoadPlace = iota
	InBox
	OnTrailer
)

var loadPlaces = []string{"rack", "box", "trailer"}

// LoadPlaces gives the written names of the places.
func LoadPlaces() []string { return append([]string(nil), loadPlaces...) }

func (p LoadPlace) String() string { return loadPlaces[p] }

// Load is what the bike carries besides the rider: mass [kg], added drag area
// [m²], and where it rides.
type Load struct {
	ID, Name string
	MassKg   float64
	CdAM2    float64
	Place    LoadPlace
}

// trailerOf is a trailer with its load, by class defaults; common practice, no
// source: an axle 1.2 m behind a hitch at the height of the rear axle, the load
// a little ahead of the axle.
func trailerOf(massKg float64) road.Trailer {
	return road.Trailer{MassKg: massKg, PoleM: 1.2, AheadM: 0.08, HeightM: 0.5, HitchAheadM: 0, HitchHeightM: 0.34}
}

func (b *Bike) stance(riderKg float64, cargo Load) road.Stance {
	at := &b.Places
	places := []road.Place{
		{MassKg: b.MassKg, AheadM: at.BikeAheadM, HeightM: at.BikeHeightM},
		{MassKg: riderKg, AheadM: at.RiderAheadM, HeightM: at.RiderHeightM},
	}
	var trailer road.Trailer
	switch cargo.Place {
	case OnRack:
		places = append(places, road.Place{MassKg: cargo.MassKg, AheadM: at.RackAheadM, HeightM: at.RackHeightM})
	case InBox:
		places = append(places, road.Place{MassKg: cargo.MassKg, AheadM: at.BoxAheadM, HeightM: at.BoxHeightM})
	case OnTrailer:
		trailer = trailerOf(cargo.MassKg)
	}
	return road.Stand(road.NewFrame(at.WheelbaseM, places...), trailer)
}

// circuit completes the motor: what the sheet says wins over the class.
func (b *Bike) circuit(radiusM, topMps float64) (motor.Circuit, motor.Heat, []assume.Value) {
	s := b.Sheet
	c, assumed := motor.Complete(&b.Motor, motor.Sheet{MassKg: s.MassKg, NominalV: s.SystemV, WheelM: radiusM, TopMps: topMps})
	h, more := motor.CompleteHeat(&b.Motor, s.MassKg)
	assumed = append(assumed, more...)
	for _, known := range []struct {
		at    *float64
		value float64
	}{
		{&c.TorqueNmPerA, s.TorqueNmPerA}, {&c.WindingOhm, s.WindingOhm}, {&c.MaxPackA, s.MaxPackA},
		{&h.EaseFromC, s.EaseFromC}, {&h.EaseToC, s.EaseToC}, {&h.CaseWPerK, s.CaseWPerK},
	} {
		if !math.IsNaN(known.value) {
			*known.at = known.value
		}
	}
	return c, h, assumed
}

// packed completes the pack in the same way.
func (b *Bike) packed() (pack.Pack, []assume.Value) {
	p, assumed := pack.Complete(math.Max(b.Pack.EnergyWh, 1), b.Sheet.SystemV, b.Pack.Chemistry, b.Pack.Health)
	if !math.IsNaN(b.Pack.ResistanceOhm) {
		p.ResistanceOhm = b.Pack.ResistanceOhm
	}
	if !math.IsNaN(b.Pack.MaxA) {
		p.MaxA = b.Pack.MaxA
	}
	return p, assumed
}

func (b *Bike) brakes() (front, rear brake.Kind, err error) {
	front, ok := brake.KindByID(b.FrontBrake)
	rear, ok2 := brake.KindByID(b.RearBrake)
	if !ok || !ok2 || front.None() && rear.None() {
		return front, rear, ErrBrakes
	}
	return front, rear, nil
}
