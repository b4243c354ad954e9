package brake

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

// rk4 integrates dT/dt = (P − loss(T))/C with the classical method: a second,
// independent way to every temperature here.
func rk4(tempC, powerW, capacity, seconds float64, steps int, loss func(tempC float64) float64) float64 {
	dt := seconds / float64(steps)
	slope := func(c float64) float64 { return (powerW - loss(c)) / capacity }
	for range steps {
		a := slope(tempC)
		b := slope(tempC + a*dt/2)
		c := slope(tempC + b*dt/2)
		d := slope(tempC + c*dt)
		tempC += (a + 2*b + 2*c + d) * dt / 6
	}
	return tempC
}

func TestStepAgainstIntegration(t *testing.T) {
	for _, k := range Kinds() {
		if k.None() {
			continue
		}
		s := k.Sink()
		for _, row := range []struct{ start, air, watts, mps, seconds float64 }{
			{20, 20, 300, 6, 60}, {180, 5, 0, 10, 120}, {90, 30, 40, 0, 600}, {20, -10, 800, 14, 20},
		} {
			g := s.WK(row.mps)
			want := rk4(row.start, row.watts, s.CapacityJK, row.seconds, 4000, func(c float64) float64 { return g * (c - row.air) })
			if got := s.Step(row.start, row.air, row.watts, row.mps, row.seconds); math.Abs(got-want) > 1e-6 {
				t.Errorf("%s %v: %.7f °C, integration gives %.7f", k.ID, row, got, want)
			}
		}
	}
}

// The radiation is taken as a constant conductance. Against the law of the
// fourth power (σ = 5.670374419e-8, CODATA; emissivity 0.5) a rotor at its
// caution must not come out cooler by more than 5 K nor warmer by more than 15.
func TestRadiationAsAConstant(t *testing.T) {
	const sigma, emissivity = 5.670374419e-8, 0.5
	k := kind(t, "hydraulic-160")
	s := k.Sink()
	for _, row := range []struct{ watts, mps, seconds float64 }{{110, 1.5, 600}, {190, 4, 300}, {240, 6, 600}, {700, 6, 20}} {
		exact := rk4(20, row.watts, s.CapacityJK, row.seconds, 20000, func(c float64) float64 {
			area := k.AreaM2 / k.IntoIt.Usual
			radiated := sigma * emissivity * area * (math.Pow(c+273.15, 4) - math.Pow(20+273.15, 4))
			return (area*6+s.WindWK*math.Sqrt(row.mps))*(c-20) + radiated
		})
		got := s.Step(20, 20, row.watts, row.mps, row.seconds)
		t.Logf("%v: %.1f °C, with T⁴ %.1f", row, got, exact)
		if got < exact-5 || got > exact+15 {
			t.Errorf("%v: %.1f °C, with radiation by the fourth power %.1f", row, got, exact)
		}
	}
}

// Two steps are one, and long after it is the steady temperature.
func TestStepsCompose(t *testing.T) {
	k := kind(t, "hydraulic-180")
	s := k.Sink()
	rapid.Check(t, func(t *rapid.T) {
		start := rapid.Float64Range(-20, 400).Draw(t, "start")
		air := rapid.Float64Range(-20, 45).Draw(t, "air")
		watts := rapid.Float64Range(0, 2000).Draw(t, "watts")
		mps := rapid.Float64Range(-20, 20).Draw(t, "mps")
		a, b := rapid.Float64Range(0, 300).Draw(t, "a"), rapid.Float64Range(0, 300).Draw(t, "b")
		one := s.Step(start, air, watts, mps, a+b)
		two := s.Step(s.Step(start, air, watts, mps, a), air, watts, mps, b)
		if math.Abs(one-two) > 1e-9*(1+math.Abs(one)) {
			t.Fatalf("one step %.12g °C, two %.12g", one, two)
		}
		if more := s.Step(start, air, watts+10, mps, a+b); more < one-1e-9 {
			t.Fatalf("more power gives %.6f °C, less %.6f", more, one)
		}
		long, steady := s.Step(start, air, watts, mps, 1e6), s.SteadyC(air, watts, mps)
		if math.Abs(long-steady) > 1e-9*(1+math.Abs(steady)) {
			t.Fatalf("after a long time %.9f °C, steady %.9f", long, steady)
		}
	})
}

// Without cooling every joule is stored.
func TestWithoutCooling(t *testing.T) {
	s := Sink{CapacityJK: 50}
	if got := s.Step(20, 20, 100, 8, 30); math.Abs(got-80) > 1e-12 {
		t.Errorf("3000 J into 50 J/K: %g °C, want 80", got)
	}
	if got := s.SteadyC(20, 100, 8); !math.IsInf(got, 1) {
		t.Errorf("nothing cools it, yet it settles at %g °C", got)
	}
	if got := s.SteadyC(20, 0, 8); got != 20 {
		t.Errorf("no power, no cooling: %g °C, want the air's 20", got)
	}
}

func TestKinds(t *testing.T) {
	seen := map[string]bool{}
	for _, k := range Kinds() {
		if seen[k.ID] {
			t.Errorf("%s stands twice", k.ID)
		}
		seen[k.ID] = true
		if k.None() {
			continue
		}
		for name, b := range map[string]struct{ Low, Usual, High float64 }{
			"mass": k.MassKg, "stir": k.Stir, "into it": k.IntoIt, "caution": k.CautionC, "fade": k.FadeC, "force": k.FullN, "wet": k.WetShare,
		} {
			if !(0 < b.Low && b.Low <= b.Usual && b.Usual <= b.High) {
				t.Errorf("%s: the band of %s is %v", k.ID, name, b)
			}
		}
		if k.CautionC.High > k.FadeC.Low {
			t.Errorf("%s: the caution's band reaches into the fade's", k.ID)
		}
		for _, row := range []struct{ c, left float64 }{
			{20, 1}, {k.CautionC.Usual, 1}, {k.FadeC.Usual, 0.5}, {2*k.FadeC.Usual - k.CautionC.Usual, 0}, {2000, 0},
		} {
			if got := k.Left(row.c); math.Abs(got-row.left) > 1e-12 {
				t.Errorf("%s at %g °C keeps %g of its force, want %g", k.ID, row.c, got, row.left)
			}
		}
		if dry, wet := k.ForceN(20, false), k.ForceN(20, true); dry != k.FullN.Usual || wet > dry {
			t.Errorf("%s: %g N dry, %g N wet, the sheet says %g", k.ID, dry, wet, k.FullN.Usual)
		}
	}
	if _, ok := KindByID("no such brake"); ok {
		t.Error("found a brake that is not there")
	}
	// A larger rotor is never warmer.
	small, large := kind(t, "hydraulic-160"), kind(t, "hydraulic-203")
	a, b := small.Sink(), large.Sink()
	for _, s := range []float64{1, 10, 100, 1000} {
		if a.Step(20, 20, 300, 6, s) <= b.Step(20, 20, 300, 6, s) {
			t.Errorf("after %g s the larger rotor is no cooler", s)
		}
	}
}

func BenchmarkStep(b *testing.B) {
	k := kind(b, "hydraulic-160")
	s := k.Sink()
	c := 20.0
	for b.Loop() {
		c = s.Step(c, 20, 300, 6, 0.1)
	}
}
