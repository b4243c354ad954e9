package road

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/air"
	"hillwright/physics/unit"
)

// The worked sample of Martin et al. 1998 (J. Appl. Biomech. 14:276–291):
// 471.8 m in 56.42 s from 8.27 to 8.45 m/s. Inputs as read; the powers are
// computed from them; the paper's printed total of about 213.3 W is from
// memory, so ±1 W is allowed on it.
func TestMartinSample(t *testing.T) {
	const (
		distance, seconds = 471.8, 56.42
		v0, v1            = 8.27, 8.45
		mass, inertia     = 90.0, 0.14
		radius            = 0.311
		chain             = 0.976
	)
	v := distance / seconds
	head, cross := air.Along(2.94, float64(unit.FromDegrees(310)), float64(unit.FromDegrees(340)))
	yaw := math.Atan2(math.Abs(cross), v+head) * 180 / math.Pi
	if math.Abs(yaw-7.67) > 0.01 {
		t.Errorf("yaw %.3f°, want 7.67", yaw)
	}
	// The paper refers its drag areas to the square of the air speed along the
	// road, Load to that speed times the resultant: cos(yaw) lies between.
	toOurs := math.Cos(yaw * math.Pi / 180)
	drag := 0.258 + (0.257-0.258)*(yaw-5)/5
	l := Load{MassKg: mass, Crr: 0.0032, DragM2: drag * toOurs, WheelDragM2: 0.0044 * toOurs, DensityKgM3: 1.2234, BearingFactor: 1}
	slope := unit.Grade(0.003)
	p := l.Parts(v, slope.Sin(), slope.Cos(), head, cross)
	kinetic := 0.5 * (mass + inertia/(radius*radius)) * (v1*v1 - v0*v0) / seconds
	for _, row := range []struct {
		name      string
		got, want float64
		within    float64
	}{
		{"air", p.Air * v, 159.4, 0.06},
		{"rolling", p.Rolling * v, 23.6, 0.06},
		{"bearings", p.Bearings * v, 1.37, 0.006},
		{"grade", p.Slope * v, 22.1, 0.06},
		{"kinetic", kinetic, 2.44, 0.006},
		{"at the cranks", (p.Sum()*v + kinetic) / chain, 214.1, 0.1},
		{"printed total", (p.Sum()*v + kinetic) / chain, 213.3, 1},
	} {
		if math.Abs(row.got-row.want) > row.within {
			t.Errorf("%s: %.3f W, want %.2f ± %g", row.name, row.got, row.want, row.within)
		}
	}
}

// Common practice, no source: 100 kg at 9.8 m/s². Our G is 9.80665, so the
// force is scaled to it.
func TestPullHoldsGrade(t *testing.T) {
	l := Load{MassKg: 100}
	for _, row := range []struct{ newtons, degrees, percent float64 }{
		{210, 12.37, 21.94}, {71, 4.15, 7.26},
	} {
		sine := l.SteepestSine(row.newtons*unit.Gravity/9.8, 0)
		angle := unit.Angle(math.Asin(sine))
		if math.Abs(angle.Degrees()-row.degrees) > 0.01 || math.Abs(float64(unit.GradeOf(angle))*100-row.percent) > 0.01 {
			t.Errorf("%g N holds %.3f° %.3f %%, want %g° %g %%", row.newtons, angle.Degrees(), float64(unit.GradeOf(angle))*100, row.degrees, row.percent)
		}
	}
}

func TestSteepestSineSolvesTheBalance(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		l := Load{
			MassKg: rapid.Float64Range(40, 350).Draw(t, "kg"),
			Crr:    rapid.Float64Range(0.002, 0.1).Draw(t, "crr"),
		}
		pull := rapid.Float64Range(0, 2000).Draw(t, "pull")
		drag := rapid.Float64Range(0, 50).Draw(t, "drag")
		sine := l.SteepestSine(pull, drag)
		if sine == 1 {
			return
		}
		cos := math.Sqrt(1 - sine*sine)
		back := l.MassKg*unit.Gravity*(sine+l.Crr*cos) + drag
		if math.Abs(back-pull) > 1e-9*(1+pull) {
			t.Fatalf("pull %g, but that grade wants %g", pull, back)
		}
	})
}

func TestForceIsItsParts(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		l := Load{MassKg: 110, Crr: 0.008, DragM2: 0.6, WheelDragM2: 0.004, DensityKgM3: 1.2, BearingFactor: 1}
		v := rapid.Float64Range(0, 20).Draw(t, "v")
		head := rapid.Float64Range(-15, 15).Draw(t, "head")
		g := unit.Grade(rapid.Float64Range(-0.4, 0.4).Draw(t, "grade"))
		f := l.Force(v, g.Sin(), g.Cos(), head, 0)
		if more := l.Force(v+0.1, g.Sin(), g.Cos(), head, 0); more <= f {
			t.Fatalf("faster is not harder: %g then %g", f, more)
		}
		tail := v + head
		wind := 0.5 * 1.2 * 0.604 * tail * math.Abs(tail)
		want := 110*unit.Gravity*(g.Sin()+0.008*g.Cos()) + wind + (91+8.7*v)/1000
		if math.Abs(f-want) > 1e-9*(1+math.Abs(want)) {
			t.Fatalf("force %g, by hand %g", f, want)
		}
	})
}
