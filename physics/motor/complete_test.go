package motor

import (
	"math"
	"testing"

	"hillwright/physics/assume"

	"pgregory.net/rapid"
)

var unknown = Sheet{MassKg: math.NaN(), NominalV: math.NaN(), WheelM: math.NaN(), TopMps: math.NaN()}

var (
	crankMotor  = Motor{Kind: Crank, TorqueNm: 85, PowerW: 600, CadenceHigh: 115}
	gearedMotor = Motor{Kind: RearHub, TorqueNm: 45, PowerW: 400}
	directMotor = Motor{Kind: RearHub, TorqueNm: 45, PowerW: 400, DirectDrive: true}
)

func completed(m *Motor) *Circuit {
	c, _ := Complete(m, unknown)
	return &c
}

func inside(t *testing.T, what string, got, low, high float64) {
	t.Helper()
	if !(got >= low && got <= high) {
		t.Errorf("%s: %.3f, want %.3f to %.3f", what, got, low, high)
	}
}

// The maps that workshops know, common practice, no source. 250 W at the output,
// winding at 60 °C; hub motors in a wheel of 0.34 m radius.
func TestEfficiencyMapsArePlausible(t *testing.T) {
	wheel := func(kmh float64) float64 { return kmh / 3.6 / 0.34 }
	crank := func(rpm float64) float64 { return rpm * math.Pi / 30 }
	for _, row := range []struct {
		name            string
		m               *Motor
		radPerS, nm     float64
		lowest, highest float64
	}{
		{"crank, 250 W at 60/min", &crankMotor, crank(60), 250 / crank(60), 0.73, 0.83},
		{"crank, 250 W at 75/min", &crankMotor, crank(75), 250 / crank(75), 0.76, 0.84},
		{"crank, 250 W at 90/min", &crankMotor, crank(90), 250 / crank(90), 0.77, 0.85},
		{"crank, 250 W at 30/min", &crankMotor, crank(30), 250 / crank(30), 0.40, 0.65},
		{"geared hub, 250 W at 20 km/h", &gearedMotor, wheel(20), 250 / wheel(20), 0.75, 0.82},
		{"geared hub, 250 W at 25 km/h", &gearedMotor, wheel(25), 250 / wheel(25), 0.75, 0.82},
		{"geared hub, 40 N·m at 5 km/h", &gearedMotor, wheel(5), 40, 0.25, 0.50},
		{"direct drive, 250 W at 25 km/h", &directMotor, wheel(25), 250 / wheel(25), 0.70, 0.82},
		{"direct drive, 40 N·m at 5 km/h", &directMotor, wheel(5), 40, 0.15, 0.35},
	} {
		inside(t, row.name, completed(row.m).Efficiency(row.nm, row.radPerS, 60), row.lowest, row.highest)
	}
}

// At 5 km/h on 20 % a hub motor turns most of its power into heat; a
// direct-drive one more yet. That has to come out of the circuit. 100 kg all up
// at 1.389 m/s want 192 N; with 90 W of the rider the motor's share is 127 N,
// 43 N·m at a wheel of 0.34 m.
func TestHubMotorsHeatOnASlowSteepClimb(t *testing.T) {
	const speed, radius, nm = 1.389, 0.34, 43
	lost := func(m *Motor) float64 {
		f := completed(m).Draw(nm, speed/radius, 80)
		return 1 - f.OutputW/f.ElectricW
	}
	geared, direct := lost(&gearedMotor), lost(&directMotor)
	if geared < 0.5 || direct < geared {
		t.Errorf("lost: geared %.2f, direct drive %.2f; want more than half, and direct drive more", geared, direct)
	}
	gears := Motor{Kind: Crank, TorqueNm: 85, PowerW: 600, CadenceHigh: 115}
	f := completed(&gears).Draw(nm*speed/radius/(65*math.Pi/30), 65*math.Pi/30, 80)
	if crank := 1 - f.OutputW/f.ElectricW; crank > 0.3 {
		t.Errorf("a crank motor in a low gear loses %.2f of the same power", crank)
	}
}

func TestSheetHolds(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		m := Motor{
			Kind: rapid.SampledFrom([]Kind{Crank, RearHub, FrontHub}).Draw(t, "kind"), DirectDrive: rapid.Bool().Draw(t, "direct"),
			TorqueNm: rapid.Float64Range(5, 300).Draw(t, "N·m"), PowerW: rapid.Float64Range(50, 5000).Draw(t, "W"),
			CadenceHigh: rapid.Float64Range(40, 200).Draw(t, "rpm"),
		}
		s := Sheet{
			MassKg: rapid.Float64Range(0.5, 15).Draw(t, "kg"), NominalV: rapid.Float64Range(12, 100).Draw(t, "V"),
			WheelM: rapid.Float64Range(0.1, 0.4).Draw(t, "m"), TopMps: rapid.Float64Range(3, 15).Draw(t, "m/s"),
		}
		c, list := Complete(&m, s)
		rated, top := 0.7, m.CadenceHigh*math.Pi/30
		if m.Kind != Crank {
			rated, top = 0.8, s.TopMps/s.WheelM
		}
		atLeast := func(what string, got, want float64) {
			t.Helper()
			if !(got >= want*(1-1e-9)) {
				t.Errorf("%s: %g, want at least %g", what, got, want)
			}
		}
		atLeast("voltage at rest", c.TorqueByVoltage(0, s.NominalV, 20), m.TorqueNm)
		atLeast("pack current at rest", c.TorqueByPackCurrent(0, s.NominalV, 1e9, 80), m.TorqueNm)
		atLeast("phase current at rest", c.TorqueByPhase(0), m.TorqueNm)
		atLeast("phase current at rest, turned round", m.TorqueNm, c.TorqueByPhase(0))
		w := rated * top
		atLeast("power by voltage", w*c.TorqueByVoltage(w, s.NominalV, 80), m.PowerW)
		atLeast("power by pack current", w*c.TorqueByPackCurrent(w, s.NominalV, 1e9, 80), m.PowerW)
		_, warm := CompleteHeat(&m, s.MassKg)
		told(t, list)
		told(t, warm)
	})
}

// told checks that every assumption has a path of its own, a band around its
// value and a reason.
func told(t interface{ Errorf(string, ...any) }, list []assume.Value) {
	seen := map[string]bool{}
	for _, each := range list {
		if seen[each.Path] || each.Reason == "" || each.Text == "" || !(each.Low <= each.Value && each.Value <= each.High) {
			t.Errorf("bad assumption %+v", each)
		}
		seen[each.Path] = true
	}
	if len(list) == 0 {
		t.Errorf("nothing assumed")
	}
}

func TestWhatTheSheetSaysIsNotAssumed(t *testing.T) {
	paths := func(s Sheet) map[string]bool {
		_, list := Complete(&gearedMotor, s)
		told(t, list)
		all := map[string]bool{}
		for _, each := range list {
			all[each.Path] = true
		}
		return all
	}
	without, with := paths(unknown), paths(Sheet{MassKg: 3, NominalV: 48, WheelM: 0.28, TopMps: 7})
	for _, path := range []string{"mass_kg", "nominal_v", "wheel_m", "top_mps"} {
		if !without[path] || with[path] {
			t.Errorf("%s: assumed %v without and %v with a full sheet", path, without[path], with[path])
		}
	}
	if c, list := Complete(&Motor{}, unknown); c != (Circuit{}) || list != nil {
		t.Error("a bike without a motor has a circuit")
	}
}

func TestKneeSinksWithThePack(t *testing.T) {
	c := completed(&crankMotor)
	knee := func(volts float64) float64 { // highest cadence with 50 N·m
		low, high := 0.0, 40.0
		for range 60 {
			if mid := (low + high) / 2; c.TorqueByVoltage(mid, volts, 60) >= 50 {
				low = mid
			} else {
				high = mid
			}
		}
		return low * 30 / math.Pi
	}
	full, empty := knee(41), knee(31)
	inside(t, "full pack", full, 140, 190)
	inside(t, "empty pack", empty, 100, 140)
}

// A heavier motor of the same sheet is never worse on a climb.
func TestHeavierHoldsMore(t *testing.T) {
	last := 0.0
	for _, kg := range []float64{1.5, 2, 3, 4, 6} {
		s := unknown
		s.MassKg = kg
		c, _ := Complete(&gearedMotor, s)
		h, _ := CompleteHeat(&gearedMotor, kg)
		got := c.HoldTorque(&h, h.EaseFromC, 4, 20, 1.4)
		if got <= last {
			t.Errorf("%g kg holds %g N·m, a lighter one %g", kg, got, last)
		}
		last = got
	}
}
