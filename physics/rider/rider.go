// Package rider tells what a person on the pedals gives: a wanted power, held
// within a cadence range, with a torque that body weight bounds when the
// cranks turn slowly. Start with Rider.Power.
package rider

import (
	"math"

	"hillwright/physics/unit"
)

// Rider is a person on the pedals. MassKg is the body's mass with clothes
// [kg]; PowerW the power wanted on the climb [W at the cranks]; CadenceLow
// and CadenceHigh the range in which they like to pedal, CadenceLiked the
// cadence they choose when the gears let them [crank turns per minute].
// CrankM is the crank's length [m], HoldMps the slowest speed at which they
// still balance [m/s]. CriticalW and ReserveJ are critical power [W] and W′ [J].
type Rider struct {
	ID, Name     string
	MassKg       float64
	PowerW       float64
	CadenceLow   float64
	CadenceLiked float64
	CadenceHigh  float64
	CrankM       float64
	HoldMps      float64
	CriticalW    float64
	ReserveJ     float64
}

// fadeOut is how far above the range, as a part of CadenceHigh, pedalling has
// ended: legs do not stop at a line. Common practice, no source.
const fadeOut = 0.15

// TorqueLimit is the torque [N·m] of the body's whole weight on the forward
// pedal, averaged over a turn: (2/π)·m·G·crank. A person who pulls at the bars
// can exceed it for a moment; nobody climbs so.
func (r *Rider) TorqueLimit() float64 {
	return 2 / math.Pi * r.MassKg * unit.Gravity * r.CrankM
}

// Power is what a fresh rider gives [W at the cranks] at a cadence [turns per
// minute, ≥ 0]: the wanted power, less where the torque limit or the end of
// the cadence range cuts it.
func (r *Rider) Power(cadence float64) float64 { return r.PowerOf(r.PowerW, cadence) }

// PowerOf is Power for a rider who wants, or is still able to give, another
// power [W].
func (r *Rider) PowerOf(wantedW, cadence float64) float64 {
	p := wantedW
	if byTorque := r.TorqueLimit() * cadence * math.Pi / 30; byTorque < p {
		p = byTorque
	}
	if over := cadence/r.CadenceHigh - 1; over > 0 {
		if over >= fadeOut {
			return 0
		}
		p *= 1 - over/fadeOut
	}
	return p
}
