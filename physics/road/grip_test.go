package road

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/unit"
)

func TestNewFrame(t *testing.T) {
	f := NewFrame(1.1, Place{MassKg: 20, AheadM: 0.5, HeightM: 0.6}, Place{MassKg: 60, AheadM: 0.4, HeightM: 1.2}, Place{MassKg: 0, AheadM: 9, HeightM: 9})
	if f.Mass.MassKg != 80 || !near(f.Mass.AheadM, 0.425) || !near(f.Mass.HeightM, 1.05) {
		t.Errorf("centre of mass %+v, want 80 kg at 0.425, 1.05 m", f.Mass)
	}
	if got := NewFrame(1.1); got.Mass != (Place{}) {
		t.Errorf("nothing weighs %+v", got.Mass)
	}
}

// The closed forms of the handbooks, for one body: the front lifts at b/h; the
// tyres slide at μ when all pull, at μ(L−b)/(L−μh) at the rear and μb/(L+μh)
// at the front.
func TestClosedForms(t *testing.T) {
	const b, h, l, m = 0.42, 1.05, 1.12, 104.0
	s := Stand(NewFrame(l, Place{m, b, h}), Trailer{})
	for _, r := range []struct {
		name      string
		got, want float64
	}{
		{"lift grade b/h", float64(s.LiftGrade(0)), b / h},
		{"front share of a tenth left", float64(s.LiftGrade(0.1)), (b - 0.1*l) / h},
		{"slide grade, both", float64(s.SlideGrade(BothDrive, 0.55)), 0.55},
		{"slide grade, rear", float64(s.SlideGrade(RearDrive, 0.55)), 0.55 * (l - b) / (l - 0.55*h)},
		{"slide grade, front", float64(s.SlideGrade(FrontDrive, 0.55)), 0.55 * b / (l + 0.55*h)},
		{"front on the level", s.FrontN, m * unit.Gravity * b / l},
		{"rear on the level", s.RearN, m * unit.Gravity * (l - b) / l},
	} {
		if !near(r.got, r.want) {
			t.Errorf("%s: %.12g, want %.12g", r.name, r.got, r.want)
		}
	}
	// What the grade says the pull says too: climbing steadily just there.
	lift := s.LiftGrade(0)
	if got, want := s.LiftN(0, lift.Cos(), 0), s.DriveN(lift.Sin(), 0); !near(got, want) {
		t.Errorf("at the lift grade the pull to lift is %.9f N, to climb %.9f", got, want)
	}
	for d := RearDrive; d <= BothDrive; d++ {
		slide := s.SlideGrade(d, 0.3)
		if got, want := s.GripN(d, 0.3, slide.Cos(), 0), s.DriveN(slide.Sin(), 0); !near(got, want) {
			t.Errorf("drive %d: at the sliding grade the grip is %.9f N, the climb takes %.9f", d, got, want)
		}
	}
	// μ·h ≥ L: pulling presses the rear wheel down faster than it asks for grip.
	if got := s.GripN(RearDrive, 1.1, 1, 0); !math.IsInf(got, 1) {
		t.Errorf("it slips at %g N, yet lifts first", got)
	}
	if got := s.SlideGrade(RearDrive, 1.1); got != Vertical {
		t.Errorf("it slides at %g, yet lifts first", float64(got))
	}
	// A load far behind: the front bears nothing on the level.
	tail := Stand(NewFrame(l, Place{m, -0.05, h}), Trailer{})
	if tail.LiftGrade(0) != 0 || tail.LiftN(0, 1, 0) != 0 {
		t.Errorf("the front is up already, yet lifts at %g, %g N", float64(tail.LiftGrade(0)), tail.LiftN(0, 1, 0))
	}
}

// A trailer helps no tyre on a hill when it hangs on its own wheels.
func TestTrailerTakesGrip(t *testing.T) {
	f := NewFrame(1.1, Place{105, 0.42, 1.0})
	alone, towing := Stand(f, Trailer{}), Stand(f, Trailer{MassKg: 50, PoleM: 1.3, HeightM: 0.3, HitchHeightM: 0.3})
	if a, b := alone.SlideGrade(RearDrive, 0.4), towing.SlideGrade(RearDrive, 0.4); b >= a {
		t.Errorf("alone it climbs %g, with a trailer %g", float64(a), float64(b))
	}
	if a, b := alone.LiftGrade(0), towing.LiftGrade(0); b >= a {
		t.Errorf("alone it lifts at %g, with a trailer at %g", float64(a), float64(b))
	}
}

// drawStance draws a bike that stands on both wheels, with or without a
// trailer that does not tip.
func drawStance(t *rapid.T) (Frame, Trailer, Stance) {
	l := rapid.Float64Range(0.9, 2.2).Draw(t, "wheelbase")
	f := NewFrame(l, Place{
		MassKg:  rapid.Float64Range(40, 300).Draw(t, "mass"),
		AheadM:  rapid.Float64Range(0.15, 0.75).Draw(t, "ahead") * l,
		HeightM: rapid.Float64Range(0.4, 1.5).Draw(t, "height"),
	})
	var tr Trailer
	if rapid.Bool().Draw(t, "with trailer") {
		tr = Trailer{
			MassKg: rapid.Float64Range(5, 100).Draw(t, "trailer"), PoleM: rapid.Float64Range(0.8, 2).Draw(t, "pole"),
			AheadM: rapid.Float64Range(0, 0.2).Draw(t, "load ahead"), HeightM: rapid.Float64Range(0.2, 0.9).Draw(t, "load height"),
			HitchAheadM: rapid.Float64Range(-0.3, 0.1).Draw(t, "hitch ahead"), HitchHeightM: rapid.Float64Range(0.2, 0.9).Draw(t, "hitch height"),
		}
	}
	return f, tr, Stand(f, tr)
}

func TestStanceProperties(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		f, tr, s := drawStance(t)
		g := unit.Grade(rapid.Float64Range(-0.4, 0.5).Draw(t, "grade"))
		drive := rapid.Float64Range(-1500, 1500).Draw(t, "drive")
		w := s.Wheels(g.Cos(), drive)
		weight := (f.Mass.MassKg + tr.MassKg) * unit.Gravity
		if sum := w.FrontN + w.RearN + w.TrailerN; math.Abs(sum-weight*g.Cos()) > 1e-9*weight {
			t.Fatalf("the wheels bear %.9f N, the weight across the road is %.9f", sum, weight*g.Cos())
		}
		mu := rapid.Float64Range(0.05, 1.2).Draw(t, "μ")
		more := mu + rapid.Float64Range(0, 0.3).Draw(t, "more")
		rolling := rapid.Float64Range(0, 60).Draw(t, "rolling")
		for d := RearDrive; d <= BothDrive; d++ {
			a, b := s.GripN(d, mu, g.Cos(), rolling), s.GripN(d, more, g.Cos(), rolling)
			if !(a >= 0) || b < a*(1-1e-12) {
				t.Fatalf("drive %d: μ %g grips %g N, μ %g grips %g N", d, mu, a, more, b)
			}
			if x, y := s.SlideGrade(d, mu), s.SlideGrade(d, more); !(x >= 0) || float64(y) < float64(x)*(1-1e-12) || y > Vertical {
				t.Fatalf("drive %d: μ %g slides at %g, μ %g at %g", d, mu, float64(x), more, float64(y))
			}
		}
		if rear, both := s.GripN(RearDrive, mu, g.Cos(), 0), s.GripN(BothDrive, mu, g.Cos(), 0); rear <= s.LiftN(0, g.Cos(), 0) && both < rear*(1-1e-9) {
			t.Fatalf("both wheels grip %g N, the rear alone %g", both, rear)
		}
		share := rapid.Float64Range(0, 0.4).Draw(t, "share")
		if a, b := s.LiftN(0, g.Cos(), rolling), s.LiftN(share, g.Cos(), rolling); !(b >= 0) || b > a*(1+1e-12) {
			t.Fatalf("lift at %g N, with a share of %g left at %g N", a, share, b)
		}
	})
}

func TestGrounds(t *testing.T) {
	seen := map[string]bool{}
	for _, g := range Grounds() {
		if seen[g.ID] || !(0 < g.Mu.Low && g.Mu.Low < g.Mu.Usual && g.Mu.Usual < g.Mu.High) {
			t.Errorf("%s: twice, or a band out of order: %v", g.ID, g.Mu)
		}
		seen[g.ID] = true
		if found, ok := GroundByID(g.ID); !ok || found != g {
			t.Errorf("%s is not found by its name", g.ID)
		}
	}
	for _, pair := range [][2]string{{"asphalt-dry", "asphalt-wet"}, {"cobbles-dry", "cobbles-wet"}, {"gravel-dry", "gravel-wet"}} {
		dry, _ := GroundByID(pair[0])
		wet, ok := GroundByID(pair[1])
		if !ok || wet.Mu.Usual >= dry.Mu.Usual {
			t.Errorf("%s grips no less than %s", pair[1], pair[0])
		}
	}
	if _, ok := GroundByID("no such ground"); ok {
		t.Error("found a ground that is not there")
	}
}

func BenchmarkGrip(b *testing.B) {
	s := Stand(stands[0].f, stands[0].t)
	for b.Loop() {
		s.GripN(RearDrive, 0.42, 0.98, 9)
		s.LiftN(0.1, 0.98, 9)
	}
}
