package motor

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

// classical is the motor of the textbook: a constant no-load torque and nothing
// else lost.
var classical = Circuit{
	Ratio: 1, GearEfficiency: 1, TorqueNmPerA: 0.5, WindingOhm: 0.4, NoLoadNm: 0.3,
	MaxPhaseA: 1000, MaxPackA: 1000, Freewheel: true,
}

func same(t *testing.T, what string, got, want, tolerance float64) {
	t.Helper()
	if !(math.Abs(got-want) <= tolerance*math.Max(1, math.Abs(want))) {
		t.Errorf("%s: %.15g, want %.15g", what, got, want)
	}
}

func TestStallNoLoadAndBestEfficiency(t *testing.T) {
	const volts = 36.0
	c := &classical
	stallA, idleA := volts/c.WindingOhm, c.NoLoadNm/c.TorqueNmPerA
	same(t, "stall torque of a current V/R", c.TorqueByVoltage(0, volts, 20), c.TorqueNmPerA*stallA-c.NoLoadNm, 1e-12)
	same(t, "power at stall", c.Draw(c.TorqueByVoltage(0, volts, 20), 0, 20).ElectricW, volts*stallA, 1e-12)
	noLoad := (volts - c.WindingOhm*idleA) / c.TorqueNmPerA
	same(t, "torque at the no-load speed", c.TorqueByVoltage(noLoad, volts, 20), 0, 1e-9)
	if c.TorqueByVoltage(noLoad*0.999, volts, 20) <= 0 || c.TorqueByVoltage(noLoad*1.001, volts, 20) != 0 {
		t.Error("the no-load speed is not where torque ends")
	}

	// The best efficiency along the line of full voltage (textbook, from memory).
	best := 0.0
	for i := range 200000 {
		w := noLoad * float64(i) / 200000
		best = math.Max(best, c.Efficiency(c.TorqueByVoltage(w, volts, 20), w, 20))
	}
	want := 1 - math.Sqrt(idleA/stallA)
	same(t, "best efficiency", best, want*want, 1e-9)
}

func TestCopperWarms(t *testing.T) {
	for _, row := range []struct{ celsius, of float64 }{{20, 1}, {120, 1.393}, {-20, 0.8428}} {
		same(t, "resistance", classical.WindingAt(row.celsius), classical.WindingOhm*row.of, 1e-12)
	}
}

// anyCircuit draws circuits over more than the range of real ones.
func anyCircuit(t *rapid.T) *Circuit {
	f := func(low, high float64, name string) float64 { return rapid.Float64Range(low, high).Draw(t, name) }
	return &Circuit{
		Ratio: f(1, 60, "ratio"), GearEfficiency: f(0.5, 1, "gears"), TorqueNmPerA: f(0.005, 4, "constant"),
		WindingOhm: f(0.005, 2, "ohm"), LeadOhm: f(0, 0.2, "lead"), NoLoadNm: f(0, 1, "no load"),
		IronNmPerRadS: f(0, 0.01, "iron"), IdleW: f(0, 10, "idle"), MaxPhaseA: f(0, 200, "phase"),
		MaxPackA: f(0, 100, "pack"), MaxChargeA: f(0, 30, "charge"),
		Freewheel: rapid.Bool().Draw(t, "freewheel"), ControllerInside: rapid.Bool().Draw(t, "inside"),
	}
}

type moment struct{ nm, radPerS, volts, amps, celsius float64 }

func anyMoment(t *rapid.T) moment {
	return moment{
		nm: rapid.Float64Range(0, 300).Draw(t, "N·m"), radPerS: rapid.Float64Range(0, 60).Draw(t, "rad/s"),
		volts: rapid.Float64Range(10, 100).Draw(t, "V"), amps: rapid.Float64Range(0, 80).Draw(t, "A"),
		celsius: rapid.Float64Range(-40, 250).Draw(t, "°C"),
	}
}

func TestEnergyIsKeptBook(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		c, m := anyCircuit(t), anyMoment(t)
		for name, f := range map[string]Flow{
			"draw": c.Draw(m.nm, m.radPerS, m.celsius), "coast": c.Draw(0, m.radPerS, m.celsius),
			"recover": c.Recover(m.nm, m.radPerS, m.celsius),
		} {
			scale := math.Abs(f.OutputW) + f.WindingW + f.CaseW + f.ElsewhereW + 1
			if off := f.ElectricW - (f.OutputW + f.WindingW + f.CaseW + f.ElsewhereW); !(math.Abs(off) <= 1e-12*scale) {
				t.Errorf("%s: %g W off of %+v", name, off, f)
			}
			if f.WindingW < 0 || f.CaseW < 0 || f.ElsewhereW < 0 {
				t.Errorf("%s: a loss gives heat back: %+v", name, f)
			}
		}
		// The same books kept by the electric side: the pack pays back-EMF and
		// resistance times current, and the idle draw.
		shaft := m.radPerS * c.Ratio
		if m.nm > 0 {
			amps := (m.nm/(c.Ratio*c.GearEfficiency) + c.NoLoadNm + c.IronNmPerRadS*shaft) / c.TorqueNmPerA
			want := c.TorqueNmPerA*shaft*amps + (c.WindingAt(m.celsius)+c.LeadOhm)*amps*amps + c.IdleW
			if got := c.Draw(m.nm, m.radPerS, m.celsius).ElectricW; !(math.Abs(got-want) <= 1e-12*want) {
				t.Errorf("draw %g W, the electric side %g W", got, want)
			}
		}
	})
}

func TestLimitsAreDrawTurnedRound(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		c, m := anyCircuit(t), anyMoment(t)
		near := func(what string, got, want float64) {
			t.Helper()
			if !(math.Abs(got-want) <= 1e-9*math.Max(1, math.Abs(want))) {
				t.Errorf("%s: %.12g, want %.12g", what, got, want)
			}
		}
		if m.nm > 0.01 {
			near("torque of its own power", c.TorqueByElectric(m.radPerS, c.Draw(m.nm, m.radPerS, m.celsius).ElectricW, m.celsius), m.nm)
		}
		if nm := c.TorqueByPackCurrent(m.radPerS, m.volts, m.amps, m.celsius); nm > 0 {
			near("pack current", c.Draw(nm, m.radPerS, m.celsius).ElectricW, m.volts*math.Min(m.amps, c.MaxPackA))
		}
		shaft := m.radPerS * c.Ratio
		if nm := c.TorqueByVoltage(m.radPerS, m.volts, m.celsius); nm > 0 {
			amps := (m.volts - c.TorqueNmPerA*shaft) / (c.WindingAt(m.celsius) + c.LeadOhm)
			near("full voltage", c.Draw(nm, m.radPerS, m.celsius).ElectricW, m.volts*amps+c.IdleW)
		}
		if nm := c.TorqueByPhase(m.radPerS); nm > 0 {
			near("phase current", c.Draw(nm, m.radPerS, m.celsius).WindingW, c.WindingAt(m.celsius)*c.MaxPhaseA*c.MaxPhaseA)
		}
	})
}

func TestHotterFasterAndEmptierNeverRaiseTorque(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		c, m := anyCircuit(t), anyMoment(t)
		hotter := m.celsius + rapid.Float64Range(0, 100).Draw(t, "hotter")
		faster := m.radPerS + rapid.Float64Range(0, 20).Draw(t, "faster")
		emptier := m.volts - rapid.Float64Range(0, 9).Draw(t, "emptier")
		never := func(what string, more, less float64) {
			t.Helper()
			if !(less >= 0 && more >= 0) || math.IsInf(more, 0) {
				t.Errorf("%s: %g, %g", what, more, less)
			}
			if less > more*(1+1e-12) {
				t.Errorf("%s raises torque from %g to %g", what, more, less)
			}
		}
		byV := c.TorqueByVoltage(m.radPerS, m.volts, m.celsius)
		never("heat at the knee", byV, c.TorqueByVoltage(m.radPerS, m.volts, hotter))
		never("speed at the knee", byV, c.TorqueByVoltage(faster, m.volts, m.celsius))
		never("a lower voltage", byV, c.TorqueByVoltage(m.radPerS, emptier, m.celsius))
		byA := c.TorqueByPackCurrent(m.radPerS, m.volts, m.amps, m.celsius)
		never("heat at the pack's limit", byA, c.TorqueByPackCurrent(m.radPerS, m.volts, m.amps, hotter))
		never("speed at the pack's limit", byA, c.TorqueByPackCurrent(faster, m.volts, m.amps, m.celsius))
		never("speed at the phase limit", c.TorqueByPhase(m.radPerS), c.TorqueByPhase(faster))
		cool, hot := c.Recover(m.nm, m.radPerS, m.celsius).ElectricW, c.Recover(m.nm, m.radPerS, hotter).ElectricW
		if hot < cool-1e-12*math.Abs(cool) {
			t.Errorf("heat raises what %g N·m of braking gives back from %g to %g W", m.nm, -cool, -hot)
		}
	})
}

func TestRecovery(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		c, m := anyCircuit(t), anyMoment(t)
		most := c.BrakeTorque(m.radPerS, m.volts, m.amps, m.celsius)
		if c.Freewheel {
			if most != 0 || c.Drag(m.radPerS) != 0 || c.Recover(m.nm, m.radPerS, m.celsius).OutputW != 0 {
				t.Error("a motor brakes through a freewheel")
			}
			return
		}
		f := c.Recover(most, m.radPerS, m.celsius)
		if ohm := c.WindingAt(m.celsius); f.WindingW > ohm*c.MaxPhaseA*c.MaxPhaseA*(1+1e-9)+1e-12 {
			t.Errorf("brakes with %g A of %g", math.Sqrt(f.WindingW/ohm), c.MaxPhaseA)
		}
		room := m.volts * math.Min(m.amps, c.MaxChargeA)
		if -f.ElectricW > room*(1+1e-9)+1e-9 {
			t.Errorf("recovers %g W where the pack takes %g W", -f.ElectricW, room)
		}
		if -f.ElectricW > most*m.radPerS {
			t.Errorf("recovers %g W of %g W of braking", -f.ElectricW, most*m.radPerS)
		}
		// Up to that torque more braking never gives less back.
		if part := rapid.Float64Range(0, 1).Draw(t, "part") * most; part > 0 {
			if less := c.Recover(part, m.radPerS, m.celsius); less.ElectricW < f.ElectricW-1e-9*(1+math.Abs(f.ElectricW)) {
				t.Errorf("%g N·m gives back %g W, %g N·m only %g W", part, -less.ElectricW, most, -f.ElectricW)
			}
		}
	})
}

func TestDragIsWhatTheRoadPays(t *testing.T) {
	c := classical
	c.Freewheel, c.IronNmPerRadS = false, 0.01
	same(t, "drag", c.Drag(20), 0.3+0.2, 1e-12)
	f := c.Draw(0, 20, 20)
	same(t, "road's power", -f.OutputW, 10, 1e-12)
	same(t, "case's heat", f.CaseW, 10, 1e-12)
	if c.Drag(0) != 0 {
		t.Error("drag at rest")
	}
}
