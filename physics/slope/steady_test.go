package slope

import (
	"math"
	"math/rand/v2"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/unit"
)

// feed gives an average samples at 50 a second of a function of time.
func feed(s *Steady, from, to float64, angle func(t float64) float64) {
	for t := from; t < to; t += 0.02 {
		s.Add(t, unit.Angle(angle(t)))
	}
}

func quiet(seed uint64, angle float64) func(float64) float64 {
	rng := rand.New(rand.NewPCG(seed, 1))
	return func(float64) float64 { return angle + 0.05*degree*rng.NormFloat64() }
}

func TestSteadyOfAStillPhone(t *testing.T) {
	s := NewSteady(0, OrientationStep)
	feed(s, 0, 1.5, quiet(1, 0.1))
	if a := s.Average(); a.Enough || a.Progress <= 0 || a.Progress >= 1 {
		t.Errorf("enough after a second and a half: %+v", a)
	}
	feed(s, 1.5, 5, quiet(2, 0.1))
	a := s.Average()
	if !a.Enough || a.Progress != 1 || a.Drifting || a.Moves != 0 || a.Bumps != 0 || a.Steadiness < 0.9 {
		t.Errorf("a still phone: %+v", a)
	}
	if math.Abs(float64(a.Mean)-0.1) > 2*float64(a.Error) || a.Seconds < 4.7 || a.Seconds > 5 {
		t.Errorf("a still phone at 0.1 rad: %+v", a)
	}
}

// With one value for ever, rounding is all that is left: step/√12.
func TestSteadyOfARoundedSensor(t *testing.T) {
	s := NewSteady(0, AccelerationStep)
	feed(s, 0, 10, func(float64) float64 { return 0.05 })
	if got, want := float64(s.Average().Error), float64(AccelerationStep)/math.Sqrt(12); math.Abs(got-want) > 1e-12 {
		t.Errorf("error of a constant: %v, want %v", got, want)
	}
}

func TestSteadyLeavesBumpsOut(t *testing.T) {
	s := NewSteady(0, OrientationStep)
	still := quiet(3, 0.1)
	feed(s, 0, 10, func(t float64) float64 {
		if t > 3 && t < 3.3 || t > 7 && t < 7.2 {
			return still(t) + 3*degree
		}
		return still(t)
	})
	a := s.Average()
	if a.Moves != 0 || a.Bumps < 5 || a.Bumps > 12 {
		t.Errorf("two bumps: %+v", a)
	}
	if off := math.Abs(float64(a.Mean) - 0.1); off > 0.02*degree {
		t.Errorf("bumps moved the mean by %v°", off/degree)
	}
}

func TestSteadyBeginsAnewWhenMoved(t *testing.T) {
	for _, c := range []struct {
		name        string
		seconds, by float64
	}{{"set down elsewhere", 0, 2}, {"turned slowly", 1.5, 10}, {"a little", 0, 0.6}} {
		s := NewSteady(0, OrientationStep)
		still := quiet(4, 0.1)
		feed(s, 0, 20, func(t float64) float64 {
			part := 0.0
			if t > 6 {
				part = 1
			}
			if t > 6 && c.seconds > 0 {
				part = min(1, (t-6)/c.seconds)
			}
			return still(t) + c.by*degree*part
		})
		a := s.Average()
		if a.Moves == 0 || a.Seconds > 14 || math.Abs(float64(a.Mean)-0.1-c.by*degree) > 0.03*degree {
			t.Errorf("%s: %+v, mean off by %v°", c.name, a, (float64(a.Mean)-0.1)/degree-c.by)
		}
	}
}

func TestSteadyTellsADrift(t *testing.T) {
	s := NewSteady(0, OrientationStep)
	still := quiet(5, 0)
	feed(s, 0, 20, func(t float64) float64 { return still(t) + 0.05*degree*t })
	a := s.Average()
	if !a.Drifting || a.Enough || a.Error < 0.5*degree {
		t.Errorf("a drift of a degree, half of which may be error: %+v", a)
	}
}

func TestSteadinessHalves(t *testing.T) {
	s := NewSteady(0, OrientationStep)
	feed(s, 0, 5, func(t float64) float64 { return 0.3 * degree * math.Sqrt2 * math.Sin(2*math.Pi*t*5) })
	if got := s.Average().Steadiness; math.Abs(got-0.5) > 0.02 {
		t.Errorf("a scatter of 0.3° gives a steadiness of %v, want 0.5", got)
	}
}

func TestSteadyAfterASilence(t *testing.T) {
	s := NewSteady(0, OrientationStep)
	feed(s, 0, 5, quiet(6, 0.1))
	feed(s, 9, 9.5, quiet(7, 0.2))
	if a := s.Average(); a.Enough || a.Seconds > 0.6 {
		t.Errorf("goes on after a silence of 4 s: %+v", a)
	}
	feed(s, 1, 4, quiet(8, 0.3))
	if a := s.Average(); math.Abs(float64(a.Mean)-0.3) > 0.001 {
		t.Errorf("goes on though time went back: %+v", a)
	}
}

func TestSteadyNeverNaN(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := NewSteady(unit.Angle(rapid.Float64().Draw(t, "target")), unit.Angle(rapid.Float64Range(-1, 1).Draw(t, "step")))
		time := rapid.SampledFrom([]float64{0, 1e9, 1.7e12, 1e300, -5}).Draw(t, "start")
		for range rapid.IntRange(0, 400).Draw(t, "samples") {
			angle := rapid.OneOf(rapid.Float64Range(-4, 4), rapid.SampledFrom([]float64{0, 0.1, math.NaN(), math.Inf(1)})).Draw(t, "angle")
			time += rapid.SampledFrom([]float64{0, 0.016, 0.05, 0.3, 1.9, 3, -1, math.NaN()}).Draw(t, "wait")
			if math.IsNaN(time) {
				s.Add(time, unit.Angle(angle))
				time = 10
			}
			s.Add(time, unit.Angle(angle))
			a := s.Average()
			for _, v := range []float64{float64(a.Mean), float64(a.Error), a.Seconds, a.Steadiness, a.Progress} {
				if !finite(v) {
					t.Fatalf("not a number: %+v", a)
				}
			}
			if a.Error < 0 || a.Steadiness < 0 || a.Steadiness > 1 || a.Progress < 0 || a.Progress > 1 {
				t.Fatalf("out of range: %+v", a)
			}
		}
	})
}
