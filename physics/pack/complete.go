package pack

import (
	"math"

	"hillwright/physics/assume"
)

// Usual values of packs. Common practice, no source.
const (
	wiringOhm  = 0.03 // BMS, leads and connectors [Ω]
	relaxShare = 0.5
	relaxS     = 40
	hourly     = 2.0 // discharge limit per capacity [1/h] ...
	leastA     = 15  // ... and at least this [A]
	hourlyIn   = 0.5 // charge limit per capacity [1/h]
)

// Complete makes a pack of its label, nominal energy [Wh] and voltage [V, NaN:
// 36 V], its chemistry and its health (0 to 1, NaN: new), and lists what was
// assumed. Without energy there is no pack: the zero Pack and an empty list.
func Complete(nominalWh, nominalV float64, c Chemistry, health float64) (Pack, []assume.Value) {
	if !(nominalWh > 0) {
		return Pack{}, nil
	}
	k := &cells[c]
	var list []assume.Value
	if !(nominalV > 0) {
		nominalV = 36
		list = append(list, assume.Around("nominal_v", nominalV, 0.98, 1.45, "pack-voltage-usual",
			"The label gives no voltage: the most usual one is taken."))
	}
	if !(health > 0) {
		health = 1
		list = append(list, assume.Value{Path: "health", Value: 1, Low: 0.8, High: 1, Reason: "pack-taken-as-new",
			Text: "Age is not known: the pack is taken as new."})
	}
	p := Pack{
		Chemistry: c, NominalWh: nominalWh, NominalV: nominalV, Health: health,
		Series:     math.Max(1, math.Round(nominalV/k.nominalV)),
		RelaxShare: relaxShare, RelaxS: relaxS, CutV: k.cutV,
	}
	ah := nominalWh / nominalV
	p.ResistanceOhm = p.Series*k.ohmAh/ah + wiringOhm
	p.MaxA = math.Max(leastA, hourly*ah)
	p.MaxChargeA = hourlyIn * ah
	return p, append(list,
		assume.Value{Path: "series", Value: p.Series, Low: p.Series, High: p.Series, Reason: "pack-series-from-voltage",
			Text: "Cells in series by the nominal voltage."},
		assume.Around("resistance_ohm", p.ResistanceOhm, 0.7, 1.5, "pack-resistance-from-capacity",
			"Resistance by capacity and chemistry, with leads and connectors: a larger pack resists less."),
		assume.Around("relax_share", p.RelaxShare, 0.5, 1.6, "pack-relaxation-usual", "Usual slow part of the sag and the time it takes."),
		assume.Around("relax_s", p.RelaxS, 0.5, 2, "pack-relaxation-usual", "Usual slow part of the sag and the time it takes."),
		assume.Around("max_a", p.MaxA, 0.75, 1.5, "pack-current-usual", "Usual current limit for the capacity."),
		assume.Value{Path: "max_charge_a", Value: p.MaxChargeA, Low: 0, High: 2 * p.MaxChargeA, Reason: "pack-recovery-usual",
			Text: "Usual charging current while riding; some packs take none."},
		assume.Value{Path: "cut_v", Value: p.CutV, Low: p.CutV - 0.2, High: p.CutV + 0.2, Reason: "pack-cut-usual",
			Text: "Usual low-voltage cut per cell for the chemistry."},
	)
}
