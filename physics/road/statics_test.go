package road

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/mat"

	"hillwright/physics/unit"
)

// The unknowns of a bike with a trailer: the road's forces across it, the
// hitch's two forces, the tyres' two forces along the road, the acceleration.
const (
	frontN = iota
	rearN
	trailerN
	hitchUpN
	hitchAlongN
	frontPullN
	rearPullN
	accel
	unknowns
)

// row is one linear equation: Σ coefficient·unknown = right.
type row struct {
	coefficients map[int]float64
	right        float64
}

// equilibrium solves the plane equilibrium of both bodies, the moments taken
// about each body's own centre of mass, with two closing equations. It shares
// nothing with Stand: not the points of moment, not the order of elimination.
func equilibrium(t testing.TB, f Frame, tr Trailer, sin, cos, rolling float64, closing ...row) [unknowns]float64 {
	t.Helper()
	const g = unit.Gravity
	m, b, h, l := f.Mass.MassKg, f.Mass.AheadM, f.Mass.HeightM, f.WheelbaseM
	x, y := tr.HitchAheadM, tr.HitchHeightM
	rows := []row{
		{map[int]float64{frontPullN: 1, rearPullN: 1, hitchAlongN: -1, accel: -m}, m*g*sin + rolling},
		{map[int]float64{frontN: 1, rearN: 1, hitchUpN: -1}, m * g * cos},
		{map[int]float64{frontN: l - b, rearN: -b, frontPullN: h, rearPullN: h, hitchUpN: -(x - b), hitchAlongN: y - h}, rolling * h},
		{map[int]float64{hitchAlongN: 1, accel: -tr.MassKg}, tr.MassKg * g * sin},
		{map[int]float64{hitchUpN: 1, trailerN: 1}, tr.MassKg * g * cos},
		{map[int]float64{trailerN: -tr.AheadM, hitchUpN: tr.PoleM - tr.AheadM, hitchAlongN: -(y - tr.HeightM)}, 0},
	}
	if tr.MassKg == 0 {
		rows[5] = row{map[int]float64{hitchUpN: 1}, 0}
	}
	rows = append(rows, closing...)
	a, right := mat.NewDense(unknowns, unknowns, nil), mat.NewVecDense(unknowns, nil)
	for i, r := range rows {
		for j, c := range r.coefficients {
			a.Set(i, j, c)
		}
		right.SetVec(i, r.right)
	}
	var solved mat.VecDense
	if err := solved.SolveVec(a, right); err != nil {
		t.Fatal(err)
	}
	var out [unknowns]float64
	for i := range out {
		out[i] = solved.AtVec(i)
	}
	return out
}

// A city bike, a long-tail with a child, a bike with a box in front; with and
// without a trailer.
var stands = []struct {
	name string
	f    Frame
	t    Trailer
}{
	{"city", NewFrame(1.10, Place{25, 0.5, 0.55}, Place{80, 0.38, 1.15}), Trailer{}},
	{"long-tail", NewFrame(1.28, Place{32, 0.6, 0.55}, Place{75, 0.55, 1.1}, Place{30, -0.05, 1.0}), Trailer{}},
	{"front box", NewFrame(1.95, Place{45, 1.0, 0.5}, Place{85, 0.4, 1.1}, Place{60, 1.35, 0.6}), Trailer{}},
	{"trailer at the hub", NewFrame(1.10, Place{25, 0.5, 0.55}, Place{80, 0.38, 1.15}), Trailer{MassKg: 55, PoleM: 1.3, AheadM: 0.12, HeightM: 0.55, HitchHeightM: 0.33}},
	{"trailer at the seat post", NewFrame(1.15, Place{27, 0.5, 0.55}, Place{70, 0.4, 1.1}), Trailer{MassKg: 40, PoleM: 1.6, AheadM: 0.05, HeightM: 0.8, HitchAheadM: -0.1, HitchHeightM: 0.9}},
}

var slopes = []float64{-0.30, -0.12, 0, 0.08, 0.22, 0.35}

func near(a, b float64) bool { return math.Abs(a-b) <= 1e-9*(1+math.Abs(b)) }

func TestWheelsAgainstEquilibrium(t *testing.T) {
	for _, c := range stands {
		s := Stand(c.f, c.t)
		for _, slope := range slopes {
			g := unit.Grade(slope)
			for _, a := range []float64{-3, 0, 0.3} {
				want := equilibrium(t, c.f, c.t, g.Sin(), g.Cos(), 9,
					row{map[int]float64{accel: 1}, a}, row{map[int]float64{frontPullN: 1}, 0})
				got := s.Wheels(g.Cos(), s.DriveN(g.Sin(), a))
				if !near(got.FrontN, want[frontN]) || !near(got.RearN, want[rearN]) || !near(got.TrailerN, want[trailerN]) {
					t.Errorf("%s at %g and %g m/s²: %v N, equilibrium gives %.6f, %.6f, %.6f", c.name, slope, a, got, want[frontN], want[rearN], want[trailerN])
				}
			}
		}
	}
}

// The pull at which the driven tyre slips: equilibrium closed by pull = μ·N.
func TestGripAgainstEquilibrium(t *testing.T) {
	const rolling = 9
	for _, c := range stands {
		s := Stand(c.f, c.t)
		for _, slope := range slopes {
			g := unit.Grade(slope)
			for _, mu := range []float64{0.2, 0.42, 0.8} {
				for _, r := range []struct {
					name    string
					got     float64
					closing []row
				}{
					{"rear", s.GripN(RearDrive, mu, g.Cos(), rolling), []row{
						{map[int]float64{rearPullN: 1, rearN: -mu}, 0}, {map[int]float64{frontPullN: 1}, 0}}},
					{"front", s.GripN(FrontDrive, mu, g.Cos(), rolling), []row{
						{map[int]float64{frontPullN: 1, frontN: -mu}, 0}, {map[int]float64{rearPullN: 1}, 0}}},
					{"both", s.GripN(BothDrive, mu, g.Cos(), rolling), []row{
						{map[int]float64{frontPullN: 1, frontN: -mu}, 0}, {map[int]float64{rearPullN: 1, rearN: -mu}, 0}}},
				} {
					want := equilibrium(t, c.f, c.t, g.Sin(), g.Cos(), rolling, r.closing...)
					pull := want[frontPullN] + want[rearPullN]
					if math.IsInf(r.got, 1) && pull < 0 {
						continue // the more pull the more grip: no slip
					}
					if !near(r.got, pull) {
						t.Errorf("%s, %s wheels, μ %g at %g: %.6f N, equilibrium gives %.6f", c.name, r.name, mu, slope, r.got, pull)
					}
				}
			}
		}
	}
}

// Pull shared in a known proportion: in equilibrium at that pull one tyre is
// just at its grip and the other is not beyond it.
func TestSharedGripAgainstEquilibrium(t *testing.T) {
	const rolling, mu = 9, 0.35
	for _, c := range stands {
		s := Stand(c.f, c.t)
		for _, share := range []float64{0, 0.2, 0.5, 0.8, 1} {
			g := unit.Grade(0.15)
			pull, front := s.GripShared(share, mu, g.Cos(), rolling)
			got := equilibrium(t, c.f, c.t, g.Sin(), g.Cos(), rolling,
				row{map[int]float64{frontPullN: 1}, share * pull}, row{map[int]float64{rearPullN: 1}, (1 - share) * pull})
			frontUse, rearUse := got[frontPullN]/(mu*got[frontN]), got[rearPullN]/(mu*got[rearN])
			if !near(math.Max(frontUse, rearUse), 1) || front != (frontUse > rearUse) {
				t.Errorf("%s, share %g: at %.2f N the front uses %.6f of its grip, the rear %.6f (front first: %v)", c.name, share, pull, frontUse, rearUse, front)
			}
		}
	}
}

// The pull at which the front wheel bears no more than its share.
func TestLiftAgainstEquilibrium(t *testing.T) {
	const rolling = 9
	for _, c := range stands {
		s := Stand(c.f, c.t)
		for _, slope := range slopes {
			g := unit.Grade(slope)
			for _, share := range []float64{0, 0.1} {
				want := equilibrium(t, c.f, c.t, g.Sin(), g.Cos(), rolling,
					row{map[int]float64{frontN: 1 - share, rearN: -share}, 0}, row{map[int]float64{frontPullN: 1}, 0})
				if got := s.LiftN(share, g.Cos(), rolling); !near(got, want[rearPullN]) {
					t.Errorf("%s at %g, share %g: %.6f N, equilibrium gives %.6f", c.name, slope, share, got, want[rearPullN])
				}
			}
		}
	}
}

// Every pairing of brakes and tyres, found by trying them all in equilibrium
// and keeping the hardest stop that breaks none of its bounds.
func TestDecelAgainstEquilibrium(t *testing.T) {
	for _, c := range stands {
		s := Stand(c.f, c.t)
		for _, slope := range slopes {
			g := unit.Grade(slope)
			for _, mu := range []float64{0.2, 0.55, 0.8, 1.1} {
				for _, brakes := range [][2]float64{{450, 450}, {150, 150}, {0, 1e6}, {1e6, 0}, {1e6, 1e6}, {250, 1e6}, {100, 600}} {
					got, by := s.Decel(mu, g.Sin(), g.Cos(), brakes[0], brakes[1])
					want := hardestStop(t, c.f, c.t, mu, g, brakes)
					if !near(got, want) {
						t.Errorf("%s at %g, μ %g, brakes %v: %.6f m/s² (%d), equilibrium gives %.6f", c.name, slope, mu, brakes, got, by, want)
					}
				}
			}
		}
	}
}

func hardestStop(t *testing.T, f Frame, tr Trailer, mu float64, g unit.Grade, brakes [2]float64) float64 {
	t.Helper()
	frontFull, rearFull := row{map[int]float64{frontPullN: 1}, -brakes[0]}, row{map[int]float64{rearPullN: 1}, -brakes[1]}
	frontSlides := row{map[int]float64{frontPullN: 1, frontN: mu}, 0}
	rearSlides, rearLifts := row{map[int]float64{rearPullN: 1, rearN: mu}, 0}, row{map[int]float64{rearN: 1}, 0}
	rearFree := row{map[int]float64{rearPullN: 1}, 0}
	best := math.Inf(-1)
	for _, closing := range [][]row{
		{frontFull, rearFull}, {frontSlides, rearFull}, {frontFull, rearSlides}, {frontSlides, rearSlides}, {rearLifts, rearFree},
	} {
		got := equilibrium(t, f, tr, g.Sin(), g.Cos(), 0, closing...)
		const slack = 1e-7
		front, rear := -got[frontPullN], -got[rearPullN]
		if front > brakes[0]+slack || rear > brakes[1]+slack || front > mu*got[frontN]+slack || rear > mu*got[rearN]+slack || got[rearN] < -slack || got[frontN] < -slack || front < -slack || rear < -slack {
			continue
		}
		best = math.Max(best, -got[accel])
	}
	return best
}
