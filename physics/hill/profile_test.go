package hill

import (
	"errors"
	"math"
	"reflect"
	"testing"

	"pgregory.net/rapid"
)

// sound checks what must hold of every profile.
func sound(t interface {
	Helper()
	Fatalf(string, ...any)
}, p *Profile) {
	t.Helper()
	n := len(p.Grade)
	if n < 1 || len(p.EdgeM) != n+1 || len(p.HeightM) != n+1 || p.BearingRad != nil && len(p.BearingRad) != n {
		t.Fatalf("%d grades, %d edges, %d heights, %d bearings", n, len(p.EdgeM), len(p.HeightM), len(p.BearingRad))
	}
	if p.EdgeM[0] != 0 {
		t.Fatalf("the first edge is %g", p.EdgeM[0])
	}
	for i, g := range p.Grade {
		length, rise := p.EdgeM[i+1]-p.EdgeM[i], p.HeightM[i+1]-p.HeightM[i]
		if !(length > 0) || math.IsInf(length, 0) {
			t.Fatalf("piece %d is %g m long", i, length)
		}
		band := 1e-9 * (1 + math.Abs(p.HeightM[i]) + p.EdgeM[i+1])
		if want := length * math.Sin(math.Atan(float64(g))); !(math.Abs(rise-want) <= band) {
			t.Fatalf("piece %d: rise %g, grade %g and length %g make %g", i, rise, g, length, want)
		}
		if p.BearingRad != nil && !(p.BearingRad[i] >= 0 && p.BearingRad[i] < 2*math.Pi+1e-12) {
			t.Fatalf("piece %d: bearing %g", i, p.BearingRad[i])
		}
	}
	net := p.HeightM[n] - p.HeightM[0]
	if d := p.AscentM() - p.DescentM() - net; !(math.Abs(d) <= 1e-7*(1+p.AscentM()+p.DescentM())) {
		t.Fatalf("ascent %g less descent %g is not the end's height over the foot's, %g", p.AscentM(), p.DescentM(), net)
	}
}

func drawProfile(t *rapid.T) Profile {
	n := rapid.IntRange(1, 40).Draw(t, "pieces")
	edges, heights := []float64{0}, []float64{rapid.Float64Range(-100, 3000).Draw(t, "foot")}
	var bearings []float64
	for i := range n {
		length := rapid.Float64Range(0.1, 500).Draw(t, "length")
		edges = append(edges, edges[i]+length)
		heights = append(heights, heights[i]+length*rapid.Float64Range(-0.9, 0.9).Draw(t, "sine"))
		bearings = append(bearings, rapid.Float64Range(0, 6.28).Draw(t, "bearing"))
	}
	p, err := FromHeights(edges, heights, bearings)
	if err != nil {
		t.Fatal(err)
	}
	p.Notes = []Note{{Kind: NoteGap, Count: 1, AtM: edges[n] / 3}}
	return p
}

func TestProfileProperties(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p := drawProfile(t)
		sound(t, &p)
		again, _ := FromHeights(p.EdgeM, p.HeightM, p.BearingRad)
		again.Notes = p.Notes
		if !reflect.DeepEqual(p, again) {
			t.Fatalf("the same numbers give another profile")
		}
		back := p.Reversed()
		sound(t, &back)
		if math.Abs(back.AscentM()-p.DescentM()) > 1e-9 || math.Abs(back.DescentM()-p.AscentM()) > 1e-9 || math.Abs(back.LengthM()-p.LengthM()) > 1e-9 {
			t.Fatalf("reversed: up %g down %g, was up %g down %g", back.AscentM(), back.DescentM(), p.AscentM(), p.DescentM())
		}
		s := rapid.Float64Range(-10, p.LengthM()+10).Draw(t, "place")
		inside := math.Max(0, math.Min(p.LengthM(), s))
		if d := back.HeightAt(p.LengthM()-inside) - p.HeightAt(inside); math.Abs(d) > 1e-6 {
			t.Fatalf("the height at %g is off by %g from the other end", s, d)
		}
		i := p.PieceAt(s)
		if i < 0 || i >= len(p.Grade) || s >= 0 && s < p.LengthM() && (s < p.EdgeM[i] || s >= p.EdgeM[i+1]) {
			t.Fatalf("place %g lies on piece %d", s, i)
		}
		if p.GradeAt(s) != p.Grade[i] {
			t.Fatalf("grade at %g is %g, want %g", s, p.GradeAt(s), p.Grade[i])
		}
	})
}

func TestPlacesOfAnEmptyProfile(t *testing.T) {
	var p Profile
	if p.PieceAt(1) != -1 || p.GradeAt(1) != 0 || p.HeightAt(1) != 0 || len(p.Reversed().Grade) != 0 {
		t.Error("an empty profile has no places")
	}
}

func TestFromHeightsRefuses(t *testing.T) {
	nan, inf := math.NaN(), math.Inf(1)
	for _, c := range []struct {
		edges, heights, bearings []float64
		kind                     ProfileErrorKind
	}{
		{nil, nil, nil, ProfileTooShort},
		{[]float64{0}, []float64{1}, nil, ProfileTooShort},
		{[]float64{0, 1}, []float64{0}, nil, ProfileLengths},
		{[]float64{0, 1}, []float64{0, 0}, []float64{1, 2}, ProfileLengths},
		{[]float64{1, 2}, []float64{0, 0}, nil, ProfileNotRising},
		{[]float64{0, 2, 2}, []float64{0, 0, 0}, nil, ProfileNotRising},
		{[]float64{0, 2, 1}, []float64{0, 0, 0}, nil, ProfileNotRising},
		{[]float64{0, nan}, []float64{0, 0}, nil, ProfileNotANumber},
		{[]float64{0, inf}, []float64{0, 0}, nil, ProfileNotANumber},
		{[]float64{0, 1}, []float64{0, nan}, nil, ProfileNotANumber},
		{[]float64{0, 1}, []float64{0, 0}, []float64{nan}, ProfileNotANumber},
		{[]float64{0, 1}, []float64{0, 1}, nil, ProfileTooSteep},
	} {
		_, err := FromHeights(c.edges, c.heights, c.bearings)
		var e *ProfileError
		if !errors.As(err, &e) || e.Kind != c.kind || e.Error() == "" {
			t.Errorf("%v %v %v: %v, want kind %d", c.edges, c.heights, c.bearings, err, c.kind)
		}
	}
}

func TestDrawn(t *testing.T) {
	// To 100 m level, a slip back to 80 m, up 10 m to 180 m, then a wall.
	p, err := Drawn([]float64{0, 100, 80, 180, 181}, []float64{5, 5, 5, 15, 100})
	if err != nil {
		t.Fatal(err)
	}
	sound(t, &p)
	want := []float64{0, 80, 80 + math.Hypot(100, 10), 80 + math.Hypot(100, 10) + math.Hypot(1, 0.6)}
	for i, at := range want {
		if math.Abs(p.EdgeM[i]-at) > 1e-9 {
			t.Errorf("edge %d at %g, want %g", i, p.EdgeM[i], at)
		}
	}
	if g := float64(p.Grade[2]); math.Abs(g-SteepestTyped) > 1e-9 {
		t.Errorf("the wall has grade %g, want %g", g, SteepestTyped)
	}
	if _, err := Drawn([]float64{3, 2, 1}, []float64{0, 0, 0}); err == nil {
		t.Error("a line that only goes back makes a profile")
	}
	if _, err := Drawn([]float64{0, math.NaN()}, []float64{0, 0}); err == nil {
		t.Error("no number makes a profile")
	}
}
