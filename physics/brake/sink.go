// Package brake tells how warm a brake gets, when it fades, and how fast one
// may go down a hill because of it. Start with KindByID and Kind.Sink for the
// temperature of one brake, Pair.SpeedByHeat for the speed not to exceed.
package brake

import "math"

// Sink is what takes up the heat of one brake, the rotor or the rim, as one
// lump: CapacityJK [J/K, > 0]; the conductance to the air is
// StillWK + WindWK·√(air speed) [W/K, both ≥ 0; WindWK in W/K per √(m/s)].
type Sink struct{ CapacityJK, StillWK, WindWK float64 }

// WK is the conductance to the air [W/K] at an air speed [m/s; from behind it
// cools as well as from ahead].
func (s *Sink) WK(airMps float64) float64 { return s.StillWK + s.WindWK*math.Sqrt(math.Abs(airMps)) }

// Step gives the temperature [°C] after a braking power [W, ≥ 0] has gone into
// the brake for a time [s, ≥ 0] in air of a temperature [°C] that passes at a
// speed [m/s]. It is exact for constant inputs, for any length of step:
// T∞ + (T − T∞)·exp(−g·t/C).
func (s *Sink) Step(tempC, airC, powerW, airMps, seconds float64) float64 {
	g := s.WK(airMps)
	if g <= 0 {
		return tempC + powerW*seconds/s.CapacityJK
	}
	steady := airC + powerW/g
	return steady + (tempC-steady)*math.Exp(-g*seconds/s.CapacityJK)
}

// SteadyC is the temperature [°C] that the brake comes to when a power [W, ≥ 0]
// goes into it for ever; +Inf where nothing cools it.
func (s *Sink) SteadyC(airC, powerW, airMps float64) float64 {
	if powerW == 0 {
		return airC
	}
	return airC + powerW/s.WK(airMps)
}

// Stores is how far an energy [J] that comes at once warms the brake [K].
func (s *Sink) Stores(energyJ float64) float64 { return energyJ / s.CapacityJK }
