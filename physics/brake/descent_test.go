package brake

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

func kind(t testing.TB, id string) Kind {
	t.Helper()
	k, ok := KindByID(id)
	if !ok {
		t.Fatalf("no brake of kind %q", id)
	}
	return k
}

func discs(t testing.TB) Pair {
	return NewPair(kind(t, "hydraulic-160"), kind(t, "hydraulic-160"), 0.6)
}

// hill is a way down at one grade: 110 kg, rolling resistance 0.008, drag area
// 0.6 m².
func hill(grade, lengthM float64, pieces int) Descent {
	cos := 1 / math.Sqrt(1+grade*grade)
	const weight = 110 * 9.80665
	d := Descent{MassKg: 110, DragN: 0.5 * 1.2 * 0.6, AirC: 20, FrontC: 20, RearC: 20, StopMps2: 3}
	for range pieces {
		d.Pieces = append(d.Pieces, Piece{LengthM: lengthM / float64(pieces), DriveN: weight * (grade - 0.008) * cos})
	}
	return d
}

// A second, independent way: small steps of time with the plain heat balance.
func TestPeakAgainstSmallSteps(t *testing.T) {
	p := NewPair(kind(t, "hydraulic-180"), kind(t, "rim"), 0.55)
	d := hill(0.12, 900, 3)
	d.Pieces = append(d.Pieces, Piece{400, -20}, Piece{150, 260})
	d.HeadMps = -2
	for _, v := range []float64{1.5, 4, 8, 12} {
		got := p.Peak(&d, v)
		const dt = 0.002
		front, rear := d.FrontC, d.RearC
		mostFront, mostRear := front, rear
		s, i, end := 0.0, 0, d.Pieces[0].LengthM
		for i < len(d.Pieces) {
			drive := d.Pieces[i].DriveN
			va := v + d.HeadMps
			force := math.Max(0, drive-d.DragN*va*math.Abs(va))
			stop := math.Max(0, d.MassKg*v*v/2+drive*v*v/(2*d.StopMps2))
			mostFront = math.Max(mostFront, front+p.FrontShare*stop/p.Front.CapacityJK)
			mostRear = math.Max(mostRear, rear+(1-p.FrontShare)*stop/p.Rear.CapacityJK)
			root := math.Sqrt(math.Abs(va))
			front += dt / p.Front.CapacityJK * (p.FrontShare*force*v - (p.Front.StillWK+p.Front.WindWK*root)*(front-d.AirC))
			rear += dt / p.Rear.CapacityJK * ((1-p.FrontShare)*force*v - (p.Rear.StillWK+p.Rear.WindWK*root)*(rear-d.AirC))
			if s += v * dt; s >= end {
				if i++; i < len(d.Pieces) {
					end += d.Pieces[i].LengthM
				}
			}
		}
		if math.Abs(got.FrontC-mostFront) > 0.001*mostFront || math.Abs(got.RearC-mostRear) > 0.001*mostRear {
			t.Errorf("at %g m/s: peak %.3f and %.3f °C, small steps give %.3f and %.3f", v, got.FrontC, got.RearC, mostFront, mostRear)
		}
	}
}

// A piece cut into many is the same piece.
func TestCuttingAPieceChangesNothing(t *testing.T) {
	p := discs(t)
	one, many := hill(0.15, 800, 1), hill(0.15, 800, 64)
	for v := 1.0; v < 14; v += 0.7 {
		a, b := p.Peak(&one, v), p.Peak(&many, v)
		if math.Abs(a.FrontC-b.FrontC) > 1e-9*a.FrontC || math.Abs(a.RearC-b.RearC) > 1e-9*a.RearC {
			t.Errorf("at %g m/s one piece peaks at %v, sixty-four at %v", v, a, b)
		}
	}
}

func TestPeakSaysWhere(t *testing.T) {
	p := discs(t)
	d := hill(0.15, 500, 1)
	d.Pieces = append(d.Pieces, Piece{2000, 0})
	got := p.Peak(&d, 6)
	if got.FrontAtM != 500 || got.RearAtM != 500 {
		t.Errorf("warmest at %g and %g m, the steep part ends at 500", got.FrontAtM, got.RearAtM)
	}
}

// A wind from behind that is faster than the rider pushes and cools.
func TestTailWind(t *testing.T) {
	d := hill(0.1, 100, 1)
	d.HeadMps = -10
	drive := d.Pieces[0].DriveN
	if got, want := d.HoldW(drive, 4), (drive+d.DragN*36)*4; math.Abs(got-want) > 1e-9 {
		t.Errorf("%.6f W hold 4 m/s with 10 m/s from behind, want %.6f", got, want)
	}
	p := discs(t)
	if got := p.Peak(&d, 4); math.IsNaN(got.FrontC) {
		t.Error("a wind from behind has no temperature")
	}
}

// Either brake alone is enough for a caution, and for too much.
func TestEitherBrakeCounts(t *testing.T) {
	p := NewPair(kind(t, "hydraulic-160"), kind(t, "rim"), 0.6)
	for _, row := range []struct {
		front, rear     float64
		cautious, bears bool
	}{
		{199, 79, false, true}, {201, 79, true, true}, {199, 81, true, true}, {251, 79, true, false}, {199, 91, true, false},
	} {
		k := Peak{FrontC: row.front, RearC: row.rear}
		if p.Cautious(k) != row.cautious || p.Bears(k) != row.bears {
			t.Errorf("%g and %g °C: cautious %v, bears %v", row.front, row.rear, p.Cautious(k), p.Bears(k))
		}
	}
}

func TestSpeedByHeat(t *testing.T) {
	for _, row := range []struct {
		name     string
		front    string
		grade, m float64
		low, top float64 // what a mechanic would find credible
	}{
		{"gentle", "hydraulic-160", 0.02, 3000, 15, 15},
		{"long and steep on small rotors", "hydraulic-160", 0.15, 3000, 1, 6},
		{"long and steep on large rotors", "hydraulic-203", 0.15, 3000, 1.5, 9},
		{"the same on coaster and drum", "drum", 0.15, 3000, 0, 3},
	} {
		p := NewPair(kind(t, row.front), kind(t, row.front), 0.6)
		d := hill(row.grade, row.m, 10)
		v := p.SpeedByHeat(&d, 15)
		t.Logf("%s: %.2f m/s", row.name, v)
		if v < row.low || v > row.top {
			t.Errorf("%s: %.2f m/s, want %g to %g", row.name, v, row.low, row.top)
		}
		if v > 0 && v < 15 {
			at, above := p.Peak(&d, v), p.Peak(&d, v+1e-4)
			if !p.Bears(at) || p.Bears(above) || !p.Cautious(at) {
				t.Errorf("%s: %.4f m/s peaks at %v, just above it %v; the most is %g °C", row.name, v, at, above, p.FrontMostC)
			}
		}
	}
}

func TestSpeedByHeatIsMonotone(t *testing.T) {
	p := discs(t)
	rapid.Check(t, func(t *rapid.T) {
		grade := rapid.Float64Range(0, 0.35).Draw(t, "grade")
		length := rapid.Float64Range(10, 5000).Draw(t, "length")
		a, b := hill(grade, length, 4), hill(grade, length, 4)
		switch rapid.IntRange(0, 3).Draw(t, "what is worse") {
		case 0:
			b = hill(grade+rapid.Float64Range(0, 0.1).Draw(t, "steeper"), length, 4)
		case 1:
			b.FrontC += rapid.Float64Range(0, 100).Draw(t, "warmer")
		case 2:
			more := rapid.Float64Range(1, 2).Draw(t, "heavier")
			b.MassKg *= more
			for i := range b.Pieces {
				b.Pieces[i].DriveN *= more
			}
		case 3:
			b.AirC += rapid.Float64Range(0, 25).Draw(t, "hotter day")
		}
		va, vb := p.SpeedByHeat(&a, 15), p.SpeedByHeat(&b, 15)
		if vb > va+1e-4 {
			t.Fatalf("the worse descent allows %.5f m/s, the milder %.5f", vb, va)
		}
	})
}

func TestOneBrakeDoesAll(t *testing.T) {
	none, coaster := kind(t, "none"), kind(t, "coaster")
	p := NewPair(none, coaster, 0.6)
	d := hill(0.1, 300, 2)
	got := p.Peak(&d, 4)
	if got.FrontC != d.FrontC || p.FrontShare != 0 {
		t.Errorf("a brake that is not there warms to %g °C", got.FrontC)
	}
	if v := p.SpeedByHeat(&d, 15); v <= 0 {
		t.Errorf("a missing front brake forbids the descent: %g m/s", v)
	}
	if p = NewPair(coaster, none, 0.6); p.FrontShare != 1 {
		t.Errorf("the front brake alone does %g of the braking", p.FrontShare)
	}
}

func TestNeverNaN(t *testing.T) {
	kinds := Kinds()
	rapid.Check(t, func(t *rapid.T) {
		front := rapid.SampledFrom(kinds).Draw(t, "front")
		rear := rapid.SampledFrom(kinds[:len(kinds)-1]).Draw(t, "rear")
		p := NewPair(front, rear, rapid.Float64Range(0, 1).Draw(t, "share"))
		d := hill(rapid.Float64Range(-0.3, 0.4).Draw(t, "grade"), rapid.Float64Range(0, 20000).Draw(t, "length"), 3)
		d.HeadMps = rapid.Float64Range(-15, 15).Draw(t, "head")
		v := p.SpeedByHeat(&d, rapid.Float64Range(0, 20).Draw(t, "most"))
		k := p.Peak(&d, math.Max(v, 0.1))
		for _, x := range []float64{v, k.FrontC, k.RearC, front.Left(k.FrontC), rear.ForceN(k.RearC, true)} {
			if math.IsNaN(x) || x < 0 || math.IsInf(x, 0) {
				t.Fatalf("%v from %v at %v m/s", x, k, v)
			}
		}
	})
}

func BenchmarkSpeedByHeat(b *testing.B) {
	p := discs(b)
	d := hill(0.06, 3000, 100)
	for b.Loop() {
		p.SpeedByHeat(&d, 15)
	}
}
