package pack

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

func fresh(wh float64) *Pack {
	p, _ := Complete(wh, 36, Nickel, 1)
	return &p
}

func same(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance*math.Max(1, math.Abs(want))) {
		t.Errorf("%s: %.12g, want %.12g", what, got, want)
	}
}

func TestCapacityInTheCold(t *testing.T) {
	p := fresh(360) // 10 Ah
	for _, row := range []struct {
		celsius, ah float64
		source      string
	}{
		{-20, 6, "18650 sheet, CHECKS.md"}, {-10, 7.5, "same"}, {0, 8, "same"}, {25, 10, "same"}, {60, 10, "same"},
		{-5, 7.75, "straight between"}, {10, 8.8, "straight between"}, {-40, 6, "end holds"}, {80, 10, "end holds"},
	} {
		same(t, row.source, p.CapacityAh(row.celsius), row.ah, 1e-12)
	}
	p.Health = 0.8
	same(t, "aged", p.CapacityAh(25), 8, 1e-12)
}

func TestResistance(t *testing.T) {
	p := fresh(500)
	same(t, "as completed", p.Resistance(0.5, 25), p.ResistanceOhm, 1e-12)
	same(t, "at freezing", p.Resistance(0.5, 0), 2*p.ResistanceOhm, 1e-12)
	same(t, "empty", p.Resistance(0, 25), 2*p.ResistanceOhm, 1e-12)
	p.Health = 0.8
	same(t, "aged", p.Resistance(0.5, 25), 1.6*p.ResistanceOhm, 1e-12)
}

func TestCurves(t *testing.T) {
	for c := range cells {
		k := &cells[c]
		for i := range steps {
			if k.openV[i+1] <= k.openV[i] || lowCharge[i+1] > lowCharge[i] {
				t.Errorf("chemistry %d: the table turns at %d", c, i)
			}
			same(t, "at an entry", k.openV.at(float64(i)/steps), k.openV[i], 1e-12)
		}
		same(t, "full", k.openV.at(1), k.openV[steps], 0)
		same(t, "more than full", k.openV.at(1.5), k.openV[steps], 0)
		same(t, "between", k.openV.at(0.525), (k.openV[10]+k.openV[11])/2, 1e-12)
		if !(k.openV[steps] < k.fullV && k.cutV < k.openV[0]+0.1) {
			t.Errorf("chemistry %d: charging ends below full, or an idle pack cuts", c)
		}
		// The area under the curve against the midpoint rule.
		const n = 100000
		sum := 0.0
		for i := range n {
			sum += k.openV.at(0.87*(float64(i)+0.5)/n) * 0.87 / n
		}
		same(t, "area", k.openV.under(0.87), sum, 1e-8)
		// A maker's nominal voltage is the mean over the charge, within a few
		// per cent (common practice, no source).
		if mean := k.openV.under(1); math.Abs(mean/k.nominalV-1) > 0.05 {
			t.Errorf("chemistry %d: mean %.3f V, nominal %.3f V", c, mean, k.nominalV)
		}
	}
}

// Under a constant current the slow sag is an exponential, and after it the
// voltage comes back with the same time constant.
func TestRelaxationClosedForm(t *testing.T) {
	p := fresh(1e6) // so large that charge stands still
	p.ResistanceOhm = 0.12
	const amps = 10
	end := p.RelaxShare * 0.12 * amps
	charge, sag := 0.5, 0.0
	for i := 1; i <= 400; i++ {
		charge, sag = p.Step(charge, sag, amps, 25, 0.25)
		same(t, "sag", sag, end*(1-math.Exp(-float64(i)*0.25/p.RelaxS)), 1e-9)
	}
	_, back := p.Step(charge, sag, 0, 25, 2*p.RelaxS)
	same(t, "after a rest", back, sag*math.Exp(-2), 1e-12)
	_, one := p.Step(0.5, 0, amps, 25, 100)
	same(t, "one long step", one, sag, 1e-9)
	same(t, "settled", p.SettledRelaxV(0.5, amps, 25), end, 1e-12)
}

// What the cells give is what arrives at the terminals, what heats the pack,
// and what the slow branch still holds. The branch is a capacitor of τ/R1, which
// here is given a constant R1 by staying above the charge at which R rises.
func TestEnergyIsKept(t *testing.T) {
	p := fresh(500)
	const cellC, dt = 25, 0.01
	charge, sag := 0.95, 0.0
	r0 := p.Resistance(charge, cellC)
	r1 := p.RelaxShare * r0
	before := p.OpenWh(charge, cellC) * 3600
	var terminal, heat float64
	for i := range 120000 {
		amps := 8 + 12*math.Sin(float64(i)*dt/50) // charges now and then
		now, slow := p.Step(charge, sag, amps, cellC, dt)
		middle, middleSag := (charge+now)/2, (sag+slow)/2
		terminal += p.TerminalV(middle, middleSag, amps, cellC) * amps * dt
		heat += (r0*amps*amps + middleSag*middleSag/r1) * dt
		charge, sag = now, slow
	}
	if charge < 0.5 || charge > 0.9 {
		t.Fatalf("ends at charge %g: the test wants the part where R is constant", charge)
	}
	held := 0.5 * (p.RelaxS / r1) * sag * sag
	chemical := before - p.OpenWh(charge, cellC)*3600
	same(t, "energy", terminal+heat+held, chemical, 1e-6)
}

func TestChargeCounts(t *testing.T) {
	p := fresh(360)
	charge, _ := p.Step(0.8, 0, 10, 25, 360)
	same(t, "a tenth of an hour at 1 C", charge, 0.7, 1e-12)
	charge, _ = p.Step(0.8, 0, -10, 25, 360)
	same(t, "and back by recovery", charge, 0.9, 1e-12)
	charge, _ = p.Step(0.8, 0, 10, -10, 360)
	same(t, "in the cold it falls faster", charge, 0.8-0.1/0.75, 1e-12)
	empty, _ := p.Step(0.01, 0, 10, 25, 3600)
	full, _ := p.Step(0.99, 0, -10, 25, 3600)
	same(t, "not below empty", empty, 0, 0)
	same(t, "not above full", full, 1, 0)
}

func TestNoPack(t *testing.T) {
	p, list := Complete(0, 36, Nickel, 1)
	most, by := p.MaxPower(0.5, 0, 20)
	lasting, _ := p.SustainedPower(0.5, 20)
	charge, sag := p.Step(0.5, 0, 0, 20, 0)
	amps, ok := p.Current(100, 0.5, 0, 20)
	if list != nil || most != 0 || by != ByCharge || lasting != 0 || charge != 0 || sag != 0 || amps != 0 || ok ||
		p.MaxRecovery(0.5, 0, 20) != 0 || p.CapacityAh(20) != 0 || p.OpenWh(1, 20) != 0 {
		t.Error("a bike without a pack has power")
	}
}

func anyPack(t *rapid.T) *Pack {
	f := func(low, high float64, name string) float64 { return rapid.Float64Range(low, high).Draw(t, name) }
	p, _ := Complete(f(1, 5000, "Wh"), f(5, 110, "V"), rapid.SampledFrom([]Chemistry{Nickel, IronPhosphate}).Draw(t, "chemistry"), f(0.3, 1, "health"))
	p.ResistanceOhm = f(0.001, 2, "ohm")
	p.RelaxShare = f(0, 3, "share")
	p.RelaxS = f(0.1, 1000, "τ")
	p.MaxA = f(0, 100, "A")
	p.MaxChargeA = f(0, 50, "charge A")
	p.CutV = f(0, 3.8, "cut")
	return &p
}
