package pack

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

func TestCurrentSolvesThePower(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p := anyPack(t)
		f := func(low, high float64, name string) float64 { return rapid.Float64Range(low, high).Draw(t, name) }
		charge, cellC := f(0, 1, "charge"), f(-40, 70, "°C")
		relaxV := f(-0.2, 0.5, "relax") * p.OpenV(charge)
		powerW := f(-3000, 5000, "W")
		amps, ok := p.Current(powerW, charge, relaxV, cellC)
		most, by := p.MaxPower(charge, relaxV, cellC)
		in := p.MaxRecovery(charge, relaxV, cellC)
		if math.IsNaN(amps) || !(most >= 0) || !(in >= 0) || int(by) >= len(bounds) {
			t.Errorf("current %g A, most %g W, takes %g W", amps, most, in)
		}
		volts := p.TerminalV(charge, relaxV, amps, cellC)
		if ok && !(math.Abs(volts*amps-powerW) <= 1e-9*(1+math.Abs(powerW))) {
			t.Errorf("%g A give %g W, wanted %g", amps, volts*amps, powerW)
		}
		// What is allowed is what MaxPower and MaxRecovery say.
		if clear := 1e-9 * (1 + most); powerW > most+clear && ok || powerW >= 0 && powerW < most-clear && !ok {
			t.Errorf("%g W of %g allowed: %v", powerW, most, ok)
		}
		if clear := 1e-9 * (1 + in); -powerW > in+clear && ok || powerW < 0 && -powerW < in-clear && !ok {
			t.Errorf("charging with %g W of %g allowed: %v", -powerW, in, ok)
		}
		if ok && powerW > 0 && (amps > p.MaxA*(1+1e-12) || volts < p.CutV*p.Series*(1-1e-12)) {
			t.Errorf("allows %g A of %g at %g V, cut at %g V", amps, p.MaxA, volts, p.CutV*p.Series)
		}
		nextCharge, nextV := p.Step(charge, relaxV, amps, cellC, f(0, 1e6, "s"))
		if !(nextCharge >= 0 && nextCharge <= 1) || math.IsNaN(nextV) || math.IsInf(nextV, 0) {
			t.Errorf("steps to %g and %g V", nextCharge, nextV)
		}
	})
}

func TestColdAgeAndEmptinessNeverRaisePower(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p := anyPack(t)
		f := func(low, high float64, name string) float64 { return rapid.Float64Range(low, high).Draw(t, name) }
		charge, cellC := f(0, 1, "charge"), f(-40, 70, "°C")
		older := *p
		older.Health -= f(0, 0.25, "older")
		colder, emptier := cellC-f(0, 30, "colder"), charge*f(0, 1, "emptier")
		most, _ := p.MaxPower(charge, 0, cellC)
		lasting, _ := p.SustainedPower(charge, cellC)
		if lasting > most*(1+1e-12) {
			t.Errorf("lasting %g W, most %g W", lasting, most)
		}
		for name, do := range map[string]func(at func(p *Pack, charge, cellC float64) float64) float64{
			"cold":      func(at func(*Pack, float64, float64) float64) float64 { return at(p, charge, colder) },
			"age":       func(at func(*Pack, float64, float64) float64) float64 { return at(&older, charge, cellC) },
			"emptiness": func(at func(*Pack, float64, float64) float64) float64 { return at(p, emptier, cellC) },
		} {
			m := do(func(p *Pack, charge, cellC float64) float64 { w, _ := p.MaxPower(charge, 0, cellC); return w })
			l := do(func(p *Pack, charge, cellC float64) float64 { w, _ := p.SustainedPower(charge, cellC); return w })
			e := do(func(p *Pack, charge, cellC float64) float64 { return p.OpenWh(charge, cellC) })
			if m > most*(1+1e-12) || l > lasting*(1+1e-12) || e > p.OpenWh(charge, cellC)*(1+1e-12) {
				t.Errorf("%s raises %g, %g W to %g, %g W", name, most, lasting, m, l)
			}
		}
	})
}

// climb draws a steady power until the pack cuts, and gives the charge left.
func climb(p *Pack, charge, powerW, cellC float64) float64 {
	relaxV := 0.0
	for charge > 0 {
		amps, ok := p.Current(powerW, charge, relaxV, cellC)
		if !ok {
			break
		}
		charge, relaxV = p.Step(charge, relaxV, amps, cellC, 1)
	}
	return charge
}

// A cold old pack cuts out on the steep part with charge left on the display; a
// new warm one goes on until it is nearly empty.
func TestColdOldPackCutsOutWithChargeLeft(t *testing.T) {
	newWarm := fresh(500)
	old := *newWarm
	old.Health = 0.75
	warm, cold, steep := climb(newWarm, 0.9, 350, 20), climb(&old, 0.9, 350, -5), climb(&old, 0.9, 500, -5)
	if warm > 0.08 {
		t.Errorf("new and warm it cuts with %.2f left", warm)
	}
	if cold < 0.2 || steep < cold+0.1 {
		t.Errorf("old and cold it cuts with %.2f left at 350 W and %.2f at 500 W", cold, steep)
	}
	_, by := old.MaxPower(steep, old.SettledRelaxV(steep, 15, -5), -5)
	if by != ByVoltage {
		t.Errorf("ended by %v, want voltage", by)
	}
	// After a rest the voltage comes back, and with it power for a short pitch.
	tired, _ := old.SustainedPower(steep, -5)
	rested, _ := old.MaxPower(steep, 0, -5)
	if rested < 1.2*tired {
		t.Errorf("rested %.0f W, tired %.0f W", rested, tired)
	}
}

func TestRecoveryIsRefused(t *testing.T) {
	p := fresh(500)
	if p.MaxRecovery(0.6, 0, 15) <= 0 {
		t.Error("a half-empty warm pack takes nothing")
	}
	for _, row := range []struct {
		why             string
		charge, celsius float64
	}{{"full", 1, 15}, {"frozen", 0.6, -1}} {
		if w := p.MaxRecovery(row.charge, 0, row.celsius); w != 0 {
			t.Errorf("%s, and takes %g W", row.why, w)
		}
		if _, ok := p.Current(-50, row.charge, 0, row.celsius); ok {
			t.Errorf("%s, and allows charging", row.why)
		}
	}
	if almost, half := p.MaxRecovery(0.999, 0, 15), p.MaxRecovery(0.5, 0, 15); almost >= half {
		t.Errorf("nearly full it takes %g W, half full %g W", almost, half)
	}
}
