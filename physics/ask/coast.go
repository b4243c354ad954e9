package ask

import (
	"math"

	"hillwright/physics/click"
	"hillwright/physics/coast"
	"hillwright/physics/road"
	"hillwright/physics/unit"
)

// Coast is what a coast-down or a spin-down needs to know beside the bike, the
// rider, the load and the day. Numbers that are left open are NaN: clicks per
// turn of the wheel then are not known, the circumference [m] is the bike's
// roll-out, the mass [kg] the sum of bike, rider and load, the grade of the
// road in the outward direction (rise/run) level. WindMps blows against the
// outward direction [m/s]. Errors are standard deviations. RolledTurns is how
// many turns the wheel is rolled to count its clicks.
type Coast struct {
	ClicksPerTurn         float64
	CircumferenceM        float64
	MassKg, MassErrorKg   float64
	Grade, GradeError     float64
	WindMps, WindErrorMps float64
	RolledTurns           float64
}

// How far what was not measured is off, one standard deviation. Common
// practice, no source.
const (
	weighedErrorKg  = 1.0   // all-up mass from scales
	gradeErrorGiven = 0.001 // a grade that somebody gives
	gradeErrorLevel = 0.003 // a road that looks level
	airError        = 0.015 // density from temperature and height, by the weather's pressure
	tyreError       = 0.01  // roll-out from the tyre's size (package gear)
)

// middleMps is a speed in the middle of a coast-down [m/s].
const middleMps = 5

// Circumference is the wheel's roll-out for a coast-down [m], and how far it
// may be off.
func (q *Question) Circumference() coast.Value {
	measured, _ := InputAt("bike.rollout_m")
	for _, v := range []float64{q.Coast.CircumferenceM, q.Bike.RolloutM} {
		if !math.IsNaN(v) {
			return coast.Value{Value: v, Error: measured.Spread * v}
		}
	}
	v := q.Bike.Tyre.Circumference()
	return coast.Value{Value: v, Error: tyreError * v}
}

// CoastMass is the all-up mass [kg] of a coast-down.
func (q *Question) CoastMass() coast.Value {
	v := coast.Value{Value: q.Coast.MassKg, Error: q.Coast.MassErrorKg}
	if math.IsNaN(v.Value) {
		v.Value = q.Bike.MassKg + q.Rider.MassKg + q.Load.MassKg
	}
	if math.IsNaN(v.Error) {
		v.Error = weighedErrorKg
		if math.IsNaN(q.Coast.MassKg) {
			v.Error = math.Hypot(math.Hypot(q.spread("bike.mass_kg"), q.spread("rider.mass_kg")), q.spread("load.mass_kg"))
		}
	}
	return v
}

// CoastGrade is the road's grade in the outward direction (rise/run).
func (q *Question) CoastGrade() coast.Value {
	v := coast.Value{Value: q.Coast.Grade, Error: q.Coast.GradeError}
	given := !math.IsNaN(v.Value)
	if !given {
		v.Value = 0
	}
	if math.IsNaN(v.Error) {
		v.Error = gradeErrorLevel
		if given {
			v.Error = gradeErrorGiven
		}
	}
	return v
}

// CoastSetup is what the fit of coast-downs starts from: the masses, the road,
// the air, and the bike's own drag as it stands now. altitudeM is where the
// road lies when the day does not say [m].
func (q *Question) CoastSetup(altitudeM float64) coast.Setup {
	mass, around := q.CoastMass(), q.Circumference()
	radius := around.Value / (2 * math.Pi)
	inertia := q.Bike.WheelInertiaKgM2 / (radius * radius)
	density := q.Day.Density(altitudeM)
	densityPart := airError
	if !math.IsNaN(q.Day.DensityKgM3) {
		densityPart = q.part("day.density_kgm3")
	}
	// The fit counts the bearings in with rolling, load and wheels with the air.
	crr := q.Bike.Crr + road.Bearings(middleMps)/(mass.Value*unit.Gravity)
	cda := q.Bike.CdAM2 + q.Load.CdAM2 + q.Bike.WheelDragM2
	return coast.Setup{
		MassKg:            mass,
		InertiaKg:         coast.Value{Value: inertia, Error: q.part("bike.wheel_inertia_kgm2") * inertia},
		Grade:             q.CoastGrade(),
		HeadMps:           coast.Value{Value: q.Coast.WindMps, Error: q.Coast.WindErrorMps},
		DensityKgM3:       coast.Value{Value: density, Error: densityPart * density},
		CircumferencePart: coast.Value{Value: 1, Error: around.Error / around.Value},
		Crr:               coast.Value{Value: crr, Error: q.part("bike.crr") * crr},
		CdAM2:             coast.Value{Value: cda, Error: q.part("bike.cda_m2") * cda},
	}
}

// showCoast puts behind an open input of the coast-down what is taken instead;
// clicks per turn that are not known stay so.
func (q *Question) showCoast(s *Shown, path string) {
	taken := func(v coast.Value) { s.take(v.Value, v.Value-v.Error, v.Value+v.Error) }
	half := func(v float64) { s.take(v, 0.5*v, 1.5*v) } // an error is itself known to half
	switch path {
	case "coast.circumference_m":
		taken(q.Circumference())
	case "coast.mass_kg":
		taken(q.CoastMass())
	case "coast.mass_error_kg":
		half(q.CoastMass().Error)
	case "coast.grade":
		taken(q.CoastGrade())
	case "coast.grade_error":
		half(q.CoastGrade().Error)
	}
}

// spread is how far a number is usually off, in its own unit.
func (q *Question) spread(path string) float64 {
	in, _ := InputAt(path)
	if in.Absolute {
		return in.Spread
	}
	v, _ := q.Value(path)
	return in.Spread * math.Abs(v)
}

// part is the part by which a number is usually off, wherever its value came
// from: a coast-down is not to lean on the one before.
func (q *Question) part(path string) float64 {
	in, _ := InputAt(path)
	return in.Spread
}

// ClicksKnown tells whether the clicks of a turn of the wheel are given.
func (q *Question) ClicksKnown() bool { return !math.IsNaN(q.Coast.ClicksPerTurn) }

// RunOf makes a run of click rates, without what does not belong to the
// coast-down at its ends (coast.Trim). The clicks per turn must be known.
func (q *Question) RunOf(points []click.Point, back bool) coast.Run {
	r := coast.Run{Back: back, Points: coast.FromClicks(points, q.Coast.ClicksPerTurn, q.Circumference().Value)}
	return r.Cut(coast.Trim(r.Points))
}

// BikeDrag gives bike.crr and bike.cda_m2 that resist as the coast-downs did.
func (q *Question) BikeDrag(r *coast.Result) (crr, cdaM2 coast.Estimate) {
	s := q.CoastSetup(0)
	return r.Bike(&s, q.Bike.WheelDragM2, q.Load.CdAM2)
}

// SpinWheel judges a wheel on the stand by its click rates: one of the bike's
// two, with half of their inertia.
func (q *Question) SpinWheel(points []click.Point, altitudeM float64) (*coast.Spun, error) {
	around := q.Circumference().Value
	inertia := q.Bike.WheelInertiaKgM2 / 2
	part := q.part("bike.wheel_inertia_kgm2")
	return coast.Spin(coast.FromClicks(points, q.Coast.ClicksPerTurn, around), coast.Value{Value: inertia, Error: part * inertia}, around, q.Day.Density(altitudeM))
}
