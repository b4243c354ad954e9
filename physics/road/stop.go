package road

import (
	"math"

	"hillwright/physics/unit"
)

// StopLimit is what holds a stop back.
type StopLimit uint8

// What bounds a deceleration.
const (
	BrakesBound StopLimit = iota // the brakes give no more
	FrontSlides                  // the front tyre slides
	RearSlides                   // the rear tyre slides
	BothSlide                    // both tyres slide
	OverTheBars                  // the rear wheel lifts
)

// Decel is the hardest deceleration [m/s², along the road, without the help of
// rolling resistance and air] and what bounds it, at a friction coefficient mu
// [> 0] on a road whose angle has the given sine and cosine (downhill: sin < 0)
// with brakes that give at most frontN and rearN at the tyre [N, ≥ 0; 0 is a
// brake not used, +Inf one that is as strong as the grip]. A value of 0 or less
// means that the rig does not come to a stop: it then goes on at that
// acceleration.
//
// Braking shifts load forward, so each wheel's force is the lesser of the
// brake's and mu·(N ± B·force): the sum is bounded by four straight lines, one
// per pairing, and the least crossing is the stop. The rear wheel lifts at
// G·(sin θ + cos θ·(L−b)/h) without a trailer.
func (s *Stance) Decel(mu, sin, cos, frontN, rearN float64) (mps2 float64, by StopLimit) {
	front, rear := mu*s.FrontN*cos, mu*s.RearN*cos
	frontBy, rearBy := -mu*s.FrontBy, -mu*s.RearBy

	most, by := frontN+rearN, BrakesBound
	if n := (front + rearN) / (1 - frontBy); frontBy < 1 && n < most {
		most, by = n, FrontSlides
	}
	if n := (frontN + rear) / (1 - rearBy); rearBy < 1 && n < most {
		most, by = n, RearSlides
	}
	if n := (front + rear) / (1 - frontBy - rearBy); frontBy+rearBy < 1 && n < most {
		most, by = n, BothSlide
	}
	if s.RearBy > 0 {
		if n := s.RearN * cos / s.RearBy; n < most {
			most, by = n, OverTheBars
		}
	}
	return unit.Gravity*sin + most/s.MassKg, by
}

// StoppingM is the way [m] from a speed [m/s, ≥ 0] to a stop, at a steady
// deceleration [m/s²] that begins after a reaction time [s, ≥ 0] in which the
// speed is held. +Inf when the deceleration is not above 0.
func StoppingM(speedMps, decelMps2, reactionS float64) float64 {
	if speedMps <= 0 {
		return 0
	}
	if decelMps2 <= 0 {
		return math.Inf(1)
	}
	return speedMps*reactionS + speedMps*speedMps/(2*decelMps2)
}

// SpeedForM is the highest speed [m/s] from which a stop takes no more than a
// way [m, ≥ 0]: StoppingM turned round. 0 when the deceleration is not above 0.
func SpeedForM(wayM, decelMps2, reactionS float64) float64 {
	if decelMps2 <= 0 || wayM <= 0 {
		return 0
	}
	lost := decelMps2 * reactionS
	// The difference of two nearly equal numbers, written as a quotient.
	return 2 * decelMps2 * wayM / (lost + math.Sqrt(lost*lost+2*decelMps2*wayM))
}

// ReactionS is the time from seeing to braking of an attentive rider with the
// fingers on the levers [s]. Common practice, no source.
func ReactionS() unit.Band { return unit.Band{Low: 0.7, Usual: 1.0, High: 1.5} }

// SightM is the way that a rider can count on seeing ahead on a winding hill
// [m]. Common practice, no source: choose what the road shows.
func SightM() unit.Band { return unit.Band{Low: 15, Usual: 30, High: 60} }
