package state

import (
	"math"

	"hillwright/physics/ride"
	"hillwright/physics/unit"
	"hillwright/wasm/draw"
)

var nowhere = math.NaN()

// Sizes of the pictures: on a phone their height follows from their width, on
// anything wider it is fixed. The stylesheet says the same, so that nothing
// jumps when the true width becomes known after the first paint.
const (
	widePx      = 420
	sectionTall = 0.62
	sectionPx   = 270
	balanceTall = 0.60
	balancePx   = 230
	pullTall    = 0.75
	pullPx      = 340
)

// SectionSize is the size in which the section is drawn.
func (s *State) SectionSize() draw.Size { return s.size(sectionTall, sectionPx) }

// BalanceSize is the size in which the balance is drawn.
func (s *State) BalanceSize() draw.Size { return s.size(balanceTall, balancePx) }

// PullSize is the size in which the pull diagram is drawn.
func (s *State) PullSize() draw.Size { return s.size(pullTall, pullPx) }

func (s *State) size(tall, px float64) draw.Size {
	if s.Device.WidthPx >= widePx {
		return draw.Size{W: s.Device.WidthPx, H: px}
	}
	return draw.Size{W: s.Device.WidthPx, H: math.Round(s.Device.WidthPx * tall)}
}

// steps is how many steps of a key lie between foot and end, and between
// nothing and what is wanted.
const steps = 50

// doPicture does what a finger does on a picture.
func (s *State) doPicture(a Action) bool {
	if s.Answer == nil || s.Profile == nil {
		return false
	}
	switch a.Name {
	case Pull:
		s.ShowPull = !s.ShowPull
	case MoveStaff:
		s.StaffM = draw.SectionAt(s.Profile, s.Answer, s.SectionSize(), a.X).AtM
	case StaffStep:
		length := s.Profile.LengthM()
		if math.IsNaN(s.StaffM) {
			s.StaffM = s.Answer.Hardest.FromM
		} else {
			s.StaffM = min(max(s.StaffM+signed(a.Arg)*length/steps, 0), length)
		}
	case MoveWeight:
		s.WeightN = draw.BalancePull(&s.Answer.Balance, s.BalanceSize(), a.X)
	case WeightStep:
		now := s.WeightN
		if math.IsNaN(now) {
			now = s.Answer.Balance.WantedN
		}
		s.WeightN = max(now+signed(a.Arg)*math.Abs(s.Answer.Balance.WantedN)/steps, 0)
	case WeightBack:
		s.WeightN = nowhere
	default:
		return false
	}
	return true
}

func signed(arg string) float64 {
	if arg == "-" {
		return -1
	}
	return 1
}

// TriedGrade is the grade on which the dragged weight would hang there by
// itself, all else as it is. ok is false when no weight was dragged.
func (s *State) TriedGrade() (g unit.Grade, ok bool) {
	if math.IsNaN(s.WeightN) || s.Answer == nil {
		return 0, false
	}
	b, road := &s.Answer.Balance, &s.Rig.Road
	weight := road.MassKg * unit.Gravity
	drag := b.WantedN - weight*(b.Grade.Sin()+road.Crr*b.Grade.Cos())
	return unit.GradeOf(unit.Angle(math.Asin(road.SteepestSine(s.WeightN, drag)))), true
}

// Settled is how the rig would ride on the hardest place's grade if it went on
// for ever, cool and rested, as the pull diagram shows; zero when that grade is
// not held.
func (s *State) Settled() ride.Running {
	fresh := s.Rig.Fresh(s.Question.Ride.Charge)
	run, ok := ride.Settle(s.Rig, ride.At(s.Answer.Balance.Grade, s.Question.Day.WindMps), &fresh, s.Question.Ride.DownMps)
	if !ok {
		return ride.Running{}
	}
	return run
}
