package road

import "hillwright/physics/unit"

// Place is a mass and where it sits [kg, m]. AheadM is measured along the road
// forward from where the rear tyre touches it (negative: behind, such as a
// load on the tail of a rack), HeightM up from the road, both with the bike on
// the level.
type Place struct{ MassKg, AheadM, HeightM float64 }

// Frame is a bike as a body on two wheels: WheelbaseM [m, > 0] and its whole
// mass with rider and load in one place, the centre of mass.
type Frame struct {
	WheelbaseM float64
	Mass       Place
}

// NewFrame puts masses together on a wheelbase [m]: bike, rider, front box,
// rear rack, child seat, each at its place. A place of no mass changes nothing.
func NewFrame(wheelbaseM float64, places ...Place) Frame {
	var m, ahead, height float64
	for _, p := range places {
		m += p.MassKg
		ahead += p.MassKg * p.AheadM
		height += p.MassKg * p.HeightM
	}
	if m <= 0 {
		return Frame{WheelbaseM: wheelbaseM}
	}
	return Frame{WheelbaseM: wheelbaseM, Mass: Place{MassKg: m, AheadM: ahead / m, HeightM: height / m}}
}

// Trailer is a trailer on its own wheels without motor or brake. MassKg with
// its load [kg]; 0 means no trailer. PoleM is the distance from its axle
// forward to the hitch [m, > 0]; AheadM and HeightM its centre of mass ahead of
// its axle and above the road [m]; Hitch where it is coupled to the bike,
// HitchAheadM from the rear tyre's contact (at the hub 0, behind it negative)
// and HitchHeightM above the road [m].
type Trailer struct {
	MassKg, PoleM, AheadM, HeightM float64
	HitchAheadM, HitchHeightM      float64
}

// Stance tells how a rig stands on its wheels: every force that a road puts
// against a wheel is the level, unloaded one [N] times cos θ and a part of the
// drive [N per N]. The drive is the force along the road that slope and
// acceleration ask of all wheels together: M·(G·sin θ + a), forward positive;
// negative when braking. Rolling resistance acts at the road and turns nothing;
// the air's moment is left out (at the speed at which grip matters uphill it is
// below one part in a hundred).
//
// Derived from the moments about the rear tyre's contact; with a trailer, from
// those about its axle first. b is the centre of mass ahead of the rear
// contact, h its height, L the wheelbase: without a trailer
// front = (m·G·b·cos θ − h·drive)/L.
type Stance struct {
	MassKg                   float64 // the whole rig with its trailer
	FrontN, RearN, TrailerN  float64 // on the level, no drive; they sum to the weight
	FrontBy, RearBy, TrailBy float64 // per newton of drive; they sum to 0
}

// Stand works out the stance of a bike and its trailer (the zero Trailer is
// none). Frame.WheelbaseM must be > 0, and Trailer.PoleM too if it has mass; of a
// rig without mass nothing can be asked.
func Stand(f Frame, t Trailer) Stance {
	m, l := f.Mass.MassKg, f.WheelbaseM
	s := Stance{MassKg: m + t.MassKg}
	if s.MassKg <= 0 {
		return s
	}
	// Per metre per second squared across the road (cross) and along it (along).
	var hitchCross, hitchAlong float64
	if t.MassKg > 0 {
		hitchCross = t.MassKg * t.AheadM / t.PoleM
		hitchAlong = -t.MassKg * (t.HeightM - t.HitchHeightM) / t.PoleM
	}
	frontCross := (m*f.Mass.AheadM + t.HitchAheadM*hitchCross) / l
	frontAlong := (t.HitchAheadM*hitchAlong - m*f.Mass.HeightM - t.MassKg*t.HitchHeightM) / l
	s.FrontN = frontCross * unit.Gravity
	s.RearN = (m + hitchCross - frontCross) * unit.Gravity
	s.TrailerN = (t.MassKg - hitchCross) * unit.Gravity
	s.FrontBy = frontAlong / s.MassKg
	s.RearBy = (hitchAlong - frontAlong) / s.MassKg
	s.TrailBy = -hitchAlong / s.MassKg
	return s
}

// Wheels are the forces of the road against the wheels, across the road [N].
// One below 0 cannot be: that wheel has lifted.
type Wheels struct{ FrontN, RearN, TrailerN float64 }

// Wheels gives the forces across the road at a drive [N] on a road whose angle
// has the given cosine.
func (s *Stance) Wheels(cos, driveN float64) Wheels {
	return Wheels{
		FrontN:   s.FrontN*cos + s.FrontBy*driveN,
		RearN:    s.RearN*cos + s.RearBy*driveN,
		TrailerN: s.TrailerN*cos + s.TrailBy*driveN,
	}
}

// DriveN is the drive [N] of a road with the given sine at an acceleration
// [m/s²].
func (s *Stance) DriveN(sin, accel float64) float64 { return s.MassKg * (unit.Gravity*sin + accel) }
