// Package pack tells what a bike's battery pack gives: its voltage at rest and
// under load, the most power before its BMS cuts, and how its charge falls. Its
// state is two numbers that the caller keeps: charge, 0 to 1, the share left of
// what the pack holds at its temperature and age, and relaxV [V], the part of
// the sag that comes and goes slowly (0 after a rest). Start with Complete, then
// Pack.MaxPower, Pack.Current and Pack.Step.
package pack

import "math"

// Pack is a pack as its sheet, completed by Complete, describes it. Currents
// are positive out of the pack. Cell temperatures are in °C; outside −20 to 60
// the nearer end is taken.
//
// Valid for NominalWh, NominalV, Series, ResistanceOhm, RelaxS > 0, RelaxShare
// ≥ 0, 0 < Health ≤ 1. The zero Pack is a bike without one: it gives nothing,
// takes nothing and stays at charge 0.
type Pack struct {
	Chemistry Chemistry
	// NominalWh and NominalV are the energy [Wh] and voltage [V] on the label.
	NominalWh, NominalV float64
	// Series is how many cells stand in series.
	Series float64
	// ResistanceOhm is what the whole pack resists within a second or two, new,
	// at 25 °C and half charge, with leads and connectors [Ω].
	ResistanceOhm float64
	// RelaxShare is the slow part of the resistance, of the quick part; it
	// comes and goes with the time constant RelaxS [s].
	RelaxShare, RelaxS float64
	// Health is the share left of the capacity the pack had when new.
	Health float64
	// MaxA and MaxChargeA are the BMS's limits on the current out of the pack
	// and into it while riding [A]; MaxChargeA 0: it takes none.
	MaxA, MaxChargeA float64
	// CutV is the voltage per cell at which the BMS cuts under load [V].
	CutV float64
}

// ageOhm is how much the resistance rises per capacity lost: 3 gives 1.6 times
// the resistance at 80 % health. Common practice, no source.
const ageOhm = 3

func (p *Pack) none() bool { return p.NominalWh <= 0 }

// OpenV is the voltage at rest [V] at a charge.
func (p *Pack) OpenV(charge float64) float64 {
	return p.Series * cells[p.Chemistry].openV.at(charge)
}

// Resistance is the quick part of the pack's resistance [Ω] at a charge and a
// cell temperature [°C].
func (p *Pack) Resistance(charge, cellC float64) float64 {
	_, cold := coldAt(cellC)
	return p.ohm(charge, cold)
}

func (p *Pack) ohm(charge, cold float64) float64 {
	return p.ResistanceOhm * (1 + ageOhm*(1-p.Health)) * cold * lowCharge.at(charge)
}

// CapacityAh is the charge that the pack gives from full to empty [Ah] at a cell
// temperature [°C].
func (p *Pack) CapacityAh(cellC float64) float64 {
	if p.none() {
		return 0
	}
	cold, _ := coldAt(cellC)
	return p.NominalWh / p.NominalV * p.Health * cold
}

// OpenWh is the energy [Wh] between empty and a charge at a cell temperature
// [°C], before what the resistance takes.
func (p *Pack) OpenWh(charge, cellC float64) float64 {
	return p.CapacityAh(cellC) * p.Series * cells[p.Chemistry].openV.under(charge)
}

// TerminalV is the voltage [V] under a current [A, negative while charging].
func (p *Pack) TerminalV(charge, relaxV, amps, cellC float64) float64 {
	return p.OpenV(charge) - relaxV - p.Resistance(charge, cellC)*amps
}

// SettledRelaxV is where relaxV comes to rest [V] under a constant current [A].
func (p *Pack) SettledRelaxV(charge, amps, cellC float64) float64 {
	return p.RelaxShare * p.Resistance(charge, cellC) * amps
}

// Step moves the pack's state on by a time [s, ≥ 0] of constant current [A,
// negative while charging] at a cell temperature [°C]. The slow part follows its
// closed form, so no step is too long for it; charge stays within 0 to 1.
func (p *Pack) Step(charge, relaxV, amps, cellC, seconds float64) (chargeThen, relaxVThen float64) {
	if p.none() {
		return 0, 0
	}
	capacity, ohm := coldAt(cellC)
	settled := p.RelaxShare * p.ohm(charge, ohm) * amps
	relaxVThen = settled + (relaxV-settled)*math.Exp(-seconds/p.RelaxS)
	chargeThen = charge - amps*seconds*p.NominalV/(3600*p.NominalWh*p.Health*capacity)
	return min(max(chargeThen, 0), 1), relaxVThen
}
