package road

import (
	"math"

	"hillwright/physics/unit"
)

// Drive is which wheels pull.
type Drive uint8

// The drives. BothDrive shares the pull so that both tyres slip at once, the
// best there is; a bike whose front and rear wheels pull in a known proportion
// is Stance.GripShared.
const (
	RearDrive Drive = iota
	FrontDrive
	BothDrive
)

// Vertical stands for a road without limit where a grade must be a number:
// what holds there holds anywhere.
const Vertical = unit.Grade(100)

// GripN is the most pull [N at the tyre, ≥ 0] that the driven tyres take before
// they slip, at a friction coefficient mu [> 0] on a road whose angle has the
// given cosine. rollingN is the part of the pull that goes into rolling
// resistance and so shifts no load [N]. +Inf where the pull presses the driven
// wheel down faster than it asks for grip: there the front wheel lifts first.
//
// From pull ≤ mu·(N + B·(pull − rolling)): pull = mu·(N − B·rolling)/(1 − mu·B),
// for one wheel mu·m·G·cos θ·(L−b)/(L − mu·h) at the rear and
// mu·m·G·cos θ·b/(L + mu·h) at the front.
func (s *Stance) GripN(d Drive, mu, cos, rollingN float64) float64 {
	switch d {
	case FrontDrive:
		return slips(1, mu, s.FrontN*cos, s.FrontBy, rollingN)
	case BothDrive:
		return slips(1, mu, (s.FrontN+s.RearN)*cos, s.FrontBy+s.RearBy, rollingN)
	}
	return slips(1, mu, s.RearN*cos, s.RearBy, rollingN)
}

// GripShared is GripN for a bike whose front wheel gives a share [0 to 1] of
// the pull and whose rear wheel gives the rest; front tells which slips first.
func (s *Stance) GripShared(frontShare, mu, cos, rollingN float64) (pullN float64, front bool) {
	pullN = slips(1-frontShare, mu, s.RearN*cos, s.RearBy, rollingN)
	if f := slips(frontShare, mu, s.FrontN*cos, s.FrontBy, rollingN); f < pullN {
		return f, true
	}
	return pullN, false
}

// slips solves share·pull = mu·(standing + by·(pull − rolling)).
func slips(share, mu, standingN, by, rollingN float64) float64 {
	left := share - mu*by
	if left <= 0 {
		return math.Inf(1)
	}
	pull := mu * (standingN - by*rollingN) / left
	if pull < 0 {
		return 0
	}
	return pull
}

// LiftN is the most pull [N at the tyre, ≥ 0] that leaves the front wheel a
// share [0 to below 1] of what the bike's two wheels bear, on a road whose
// angle has the given cosine; rollingN as in GripN. Share 0 is the lift
// itself; to steer a bike needs about a tenth (common practice, no source). +Inf where no pull lifts it.
func (s *Stance) LiftN(share, cos, rollingN float64) float64 {
	spare, loss := s.lift(share)
	if loss <= 0 {
		return math.Inf(1)
	}
	if spare <= 0 {
		return 0
	}
	return spare*cos/loss + rollingN
}

// lift gives what the front wheel has above its share on the level [N] and how
// much of that a newton of drive takes.
func (s *Stance) lift(share float64) (spareN, loss float64) {
	return s.FrontN - share*(s.FrontN+s.RearN), share*(s.FrontBy+s.RearBy) - s.FrontBy
}

// LiftGrade is the grade at which, climbing steadily, the front wheel has no
// more than a share [0 to below 1] of what the bike's two wheels bear. For
// share 0 and no trailer it is b/h. Vertical where no grade does it, 0 where it
// has no more than that on the level.
func (s *Stance) LiftGrade(share float64) unit.Grade {
	spare, loss := s.lift(share)
	return steepest(spare, loss*s.MassKg*unit.Gravity)
}

// SlideGrade is the steepest grade on which the driven tyres keep their hold
// climbing steadily, at a friction coefficient mu [> 0]; for both wheels and no
// trailer it is mu. Vertical where the front wheel lifts before they slip.
func (s *Stance) SlideGrade(d Drive, mu float64) unit.Grade {
	n, by := s.RearN, s.RearBy
	switch d {
	case FrontDrive:
		n, by = s.FrontN, s.FrontBy
	case BothDrive:
		n, by = s.FrontN+s.RearN, s.FrontBy+s.RearBy
	}
	return steepest(mu*n, (1-mu*by)*s.MassKg*unit.Gravity)
}

func steepest(holdN, asksN float64) unit.Grade {
	if holdN <= 0 {
		return 0
	}
	if asksN*float64(Vertical) <= holdN {
		return Vertical
	}
	return unit.Grade(holdN / asksN)
}
