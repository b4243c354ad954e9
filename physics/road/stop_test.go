package road

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/brake"
	"hillwright/physics/unit"
)

// Published requirements: way, speed, and the mean deceleration they ask for
// (computed). Each must be met by a 100 kg city bike with hydraulic rotors of
// 160 mm on dry and on wet asphalt: a class default that fails a standard every
// sold bike meets would be wrong.
func TestPublishedStops(t *testing.T) {
	disc, _ := brake.KindByID("hydraulic-160")
	s := Stand(NewFrame(1.1, Place{100, 0.45, 1.0}), Trailer{})
	for _, r := range []struct {
		source         string
		kmh, wayM      float64
		mean           float64
		wet, rearAlone bool
	}{
		{"ISO 4210-2, both, dry (from memory)", 25, 7, 3.445, false, false},
		{"ISO 4210-2, rear, dry (from memory)", 25, 15, 1.608, false, true},
		{"ISO 4210-2, both, wet (from memory)", 16, 5, 1.975, true, false},
		{"ISO 4210-2, rear, wet (from memory)", 16, 10, 0.988, true, true},
		{"16 CFR 1512.5, 4.57 m (secondary), 15 mph (from memory)", 15 * 1.609344, 4.57, 4.920, false, false},
	} {
		v := r.kmh / 3.6
		if got := StoppingM(v, r.mean, 0); math.Abs(got-r.wayM) > 0.005 {
			t.Errorf("%s: %g m/s² stop in %.4f m, want %g", r.source, r.mean, got, r.wayM)
		}
		if got := SpeedForM(r.wayM, r.mean, 0); math.Abs(got-v) > 0.002 {
			t.Errorf("%s: %.4f m/s stop in %g m, want %.4f", r.source, got, r.wayM, v)
		}
		id := "asphalt-dry"
		if r.wet {
			id = "asphalt-wet"
		}
		ground, _ := GroundByID(id)
		front := disc.ForceN(20, r.wet)
		if r.rearAlone {
			front = 0
		}
		if got, _ := s.Decel(ground.Mu.Usual, 0, 1, front, disc.ForceN(20, r.wet)); got < r.mean {
			t.Errorf("%s: the class default stops with %.3f m/s², the rule wants %.3f", r.source, got, r.mean)
		}
	}
}

// One body: the rear lifts at G·(sin θ + cos θ·(L−b)/h), all tyres slide at
// G·(sin θ + μ·cos θ), the rear alone at G·(sin θ + μ·cos θ·b'/(…)).
func TestStopClosedForms(t *testing.T) {
	const b, h, l, m = 0.42, 1.05, 1.12, 104.0
	s := Stand(NewFrame(l, Place{m, b, h}), Trailer{})
	inf := math.Inf(1)
	for _, slope := range []float64{-0.25, -0.1, 0, 0.15} {
		g := unit.Grade(slope)
		sin, cos := g.Sin(), g.Cos()
		const G = unit.Gravity
		for _, r := range []struct {
			name              string
			mu, frontN, rearN float64
			want              float64
			by                StopLimit
		}{
			{"over the bars", 0.9, inf, 0, G * (sin + cos*(l-b)/h), OverTheBars},
			{"over the bars with both", 0.9, inf, inf, G * (sin + cos*(l-b)/h), OverTheBars},
			{"both slide", 0.5, inf, inf, G * (sin + 0.5*cos), BothSlide},
			{"rear alone", 0.8, 0, inf, G * (sin + 0.8*cos*(l-b)/(l+0.8*h)), RearSlides},
			{"front alone", 0.3, inf, 0, G * (sin + 0.3*cos*b/(l-0.3*h)), FrontSlides},
			{"weak brakes", 0.8, 100, 60, G*sin + 160/m, BrakesBound},
			{"no brakes", 0.8, 0, 0, G * sin, BrakesBound},
		} {
			got, by := s.Decel(r.mu, sin, cos, r.frontN, r.rearN)
			if !near(got, r.want) || by != r.by {
				t.Errorf("%s at %g: %.9f m/s² by %d, want %.9f by %d", r.name, slope, got, by, r.want, r.by)
			}
		}
	}
}

func TestStoppingDistance(t *testing.T) {
	for _, r := range []struct{ v, d, reaction, want float64 }{
		{10, 5, 0, 10}, {10, 5, 1, 20}, {0, 5, 1, 0}, {0, -1, 1, 0}, {10, 0, 1, math.Inf(1)}, {10, -2, 1, math.Inf(1)},
	} {
		if got := StoppingM(r.v, r.d, r.reaction); got != r.want {
			t.Errorf("%+v: %g m", r, got)
		}
	}
	rapid.Check(t, func(t *rapid.T) {
		way := rapid.Float64Range(0.1, 500).Draw(t, "way")
		d := rapid.Float64Range(0.01, 10).Draw(t, "deceleration")
		reaction := rapid.Float64Range(0, 3).Draw(t, "reaction")
		if back := StoppingM(SpeedForM(way, d, reaction), d, reaction); math.Abs(back-way) > 1e-9*way {
			t.Fatalf("the speed for %.12g m stops in %.12g m", way, back)
		}
	})
	if SpeedForM(30, 0, 1) != 0 || SpeedForM(0, 3, 1) != 0 || SpeedForM(-5, 3, 1) != 0 {
		t.Error("a speed although it does not stop, or has no way to stop in")
	}
}

func TestDecelProperties(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		_, _, s := drawStance(t)
		g := unit.Grade(rapid.Float64Range(-0.4, 0.3).Draw(t, "grade"))
		mu := rapid.Float64Range(0.05, 1.2).Draw(t, "μ")
		front, rear := rapid.Float64Range(0, 900).Draw(t, "front"), rapid.Float64Range(0, 900).Draw(t, "rear")
		base, by := s.Decel(mu, g.Sin(), g.Cos(), front, rear)
		for name, better := range map[string]float64{
			"more μ":     first(s.Decel(mu+0.1, g.Sin(), g.Cos(), front, rear)),
			"more front": first(s.Decel(mu, g.Sin(), g.Cos(), front+50, rear)),
			"more rear":  first(s.Decel(mu, g.Sin(), g.Cos(), front, rear+50)),
		} {
			if math.IsNaN(better) || better < base-1e-9 {
				t.Fatalf("%s stops with %g m/s², less with %g (%d)", name, better, base, by)
			}
		}
		w := s.Wheels(g.Cos(), s.DriveN(g.Sin(), -base))
		if w.RearN < -1e-6 {
			t.Fatalf("at its hardest stop the rear wheel is up: %g N", w.RearN)
		}
	})
}

func first(a float64, _ StopLimit) float64 { return a }

func BenchmarkDecel(b *testing.B) {
	s := Stand(stands[0].f, stands[0].t)
	for b.Loop() {
		s.Decel(0.55, -0.12, 0.99, 450, 450)
	}
}
