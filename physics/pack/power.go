package pack

import "math"

// Bound is what ends the power that a pack gives.
type Bound uint8

// The bounds: the BMS's current limit, its low-voltage cut, and no charge.
const (
	ByCurrent Bound = iota
	ByVoltage
	ByCharge
)

var bounds = [...]string{"current", "voltage", "charge"}

func (b Bound) String() string { return bounds[b] }

// warmEnough is the cell temperature [°C] below which a BMS takes no charge,
// since cold cells plate lithium. Common practice, no source.
const warmEnough = 0

// Current is the current [A] at which the pack gives a power [W at its
// terminals, negative while charging], and whether the pack allows it. Where
// no current gives the power, it is the one that gives the most.
//
// R·I² − V·I + P = 0, the root with the smaller current, in the form that holds
// for small P.
func (p *Pack) Current(powerW, charge, relaxV, cellC float64) (amps float64, ok bool) {
	emf, ohm := p.OpenV(charge)-relaxV, p.Resistance(charge, cellC)
	if emf <= 0 {
		return 0, false
	}
	under := emf*emf - 4*ohm*powerW
	if under < 0 {
		return emf / (2 * ohm), false
	}
	amps = 2 * powerW / (emf + math.Sqrt(under))
	if powerW >= 0 {
		most, _ := p.mostAmps(emf, ohm, charge)
		return amps, amps <= most
	}
	return amps, -amps <= p.mostChargeAmps(emf, ohm, charge, cellC)
}

// mostAmps is the most current [A] that the BMS and the cells allow.
func (p *Pack) mostAmps(emf, ohm, charge float64) (float64, Bound) {
	if charge <= 0 || p.none() {
		return 0, ByCharge
	}
	// Beyond emf/2R more current gives less power.
	byVoltage := min(emf-p.CutV*p.Series, emf/2) / ohm
	switch {
	case byVoltage <= 0:
		return 0, ByVoltage
	case byVoltage < p.MaxA:
		return byVoltage, ByVoltage
	}
	return p.MaxA, ByCurrent
}

// mostChargeAmps is the most current [A, ≥ 0] that the pack takes.
func (p *Pack) mostChargeAmps(emf, ohm, charge, cellC float64) float64 {
	if charge >= 1 || cellC < warmEnough || p.none() {
		return 0
	}
	byVoltage := (cells[p.Chemistry].fullV*p.Series - emf) / ohm
	return max(0, min(p.MaxChargeA, byVoltage))
}

// MaxPower is the most power [W at the terminals] that the pack gives at this
// moment before its BMS cuts, and what ends it.
func (p *Pack) MaxPower(charge, relaxV, cellC float64) (powerW float64, by Bound) {
	emf, ohm := p.OpenV(charge)-relaxV, p.Resistance(charge, cellC)
	amps, by := p.mostAmps(emf, ohm, charge)
	return amps * (emf - ohm*amps), by
}

// SustainedPower is the most power [W] that the pack gives at a charge once the
// slow part of the sag has settled, and what ends it: what counts on a long
// steady climb, while MaxPower after a rest counts for a short pitch.
func (p *Pack) SustainedPower(charge, cellC float64) (powerW float64, by Bound) {
	emf, ohm := p.OpenV(charge), p.Resistance(charge, cellC)*(1+p.RelaxShare)
	amps, by := p.mostAmps(emf, ohm, charge)
	return amps * (emf - ohm*amps), by
}

// MaxRecovery is the most power [W, ≥ 0] that the pack takes in at this moment:
// nothing when full or when its cells are below freezing.
func (p *Pack) MaxRecovery(charge, relaxV, cellC float64) float64 {
	emf, ohm := p.OpenV(charge)-relaxV, p.Resistance(charge, cellC)
	amps := p.mostChargeAmps(emf, ohm, charge, cellC)
	return amps * (emf + ohm*amps)
}
