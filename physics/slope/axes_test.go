package slope

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/num/quat"
	"pgregory.net/rapid"
)

// about is the quaternion of a turn about an axis.
func about(x, y, z, deg float64) quat.Number {
	s, c := math.Sincos(deg * math.Pi / 360)
	return quat.Number{Real: c, Imag: x * s, Jmag: y * s, Kmag: z * s}
}

func rotate(q quat.Number, v Vector) Vector {
	r := quat.Mul(quat.Mul(q, quat.Number{Imag: v.X, Jmag: v.Y, Kmag: v.Z}), quat.Conj(q))
	return Vector{r.Imag, r.Jmag, r.Kmag}
}

func near(a, b Vector, eps float64) bool {
	return math.Abs(a.X-b.X) < eps && math.Abs(a.Y-b.Y) < eps && math.Abs(a.Z-b.Z) < eps
}

// The device turned about its own axes, one after the other, by quaternions.
func orientation(alpha, beta, gamma float64) quat.Number {
	return quat.Mul(quat.Mul(about(0, 0, 1, alpha), about(1, 0, 0, beta)), about(0, 1, 0, gamma))
}

var awkward = []float64{-180, -90, -45, 0, 1e-9, 45, 90, 135, 180, 270}

func anyAngle(most float64) *rapid.Generator[float64] {
	return rapid.OneOf(rapid.Float64Range(-most, most), rapid.SampledFrom(awkward))
}

func TestAxesAgainstQuaternions(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		alpha, beta, gamma := anyAngle(360).Draw(t, "alpha"), anyAngle(180).Draw(t, "beta"), anyAngle(180).Draw(t, "gamma")
		q := orientation(alpha, beta, gamma)
		a := AxesOf(alpha, beta, gamma)
		for _, c := range []struct {
			name string
			got  Vector
			from Vector
		}{{"right", a.Right, Vector{X: 1}}, {"top", a.Top, Vector{Y: 1}}, {"out", a.Out, Vector{Z: 1}}} {
			if want := rotate(q, c.from); !near(c.got, want, 1e-12) {
				t.Fatalf("%s: got %v, quaternions give %v", c.name, c.got, want)
			}
		}
		up, ok := UpOfOrientation(beta, gamma)
		want := rotate(quat.Conj(q), Vector{Z: 1}) // the world's up, seen from the device
		if !ok || !near(Vector(up), want, 1e-12) {
			t.Fatalf("up: got %v, want %v", up, want)
		}
		fromPull, still, ok := UpOfAcceleration(9.8*want.X, 9.8*want.Y, 9.8*want.Z)
		if !ok || !still || !near(Vector(fromPull), want, 1e-12) {
			t.Fatalf("up of acceleration: got %v, want %v", fromPull, want)
		}
	})
}

// A phone laid with its long edge on a line of known grade, then rolled about
// that edge and turned about by any compass direction, reads that grade: all
// orientations, made by quaternions and put back into the event's angles.
func TestEdgeReadsTheLineHoweverRolled(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		slope := rapid.OneOf(rapid.Float64Range(-90, 90), rapid.SampledFrom([]float64{-90, 90, 0})).Draw(t, "slope")
		heading, roll := anyAngle(360).Draw(t, "heading"), anyAngle(180).Draw(t, "roll")
		q := quat.Mul(quat.Mul(about(0, 0, 1, heading), about(1, 0, 0, slope)), about(0, 1, 0, roll))
		up := Up(rotate(quat.Conj(q), Vector{Z: 1}))
		if got := up.Angle(LongEdge).Degrees(); math.Abs(got-slope) > 1e-9 {
			t.Fatalf("long edge: got %v°, want %v°", got, slope)
		}
		// The same for the short edge: the phone lies crosswise, its right side ahead.
		q = quat.Mul(q, about(0, 0, 1, 90)) // now −Right points where Top did
		up = Up(rotate(quat.Conj(q), Vector{Z: 1}))
		if got := up.Angle(ShortEdge).Degrees(); math.Abs(got-slope) > 1e-9 {
			t.Fatalf("short edge: got %v°, want %v°", got, slope)
		}
	})
}

func TestPosesByHand(t *testing.T) {
	for _, c := range []struct {
		name        string
		beta, gamma float64
		edge        Edge
		deg         float64
		rest        Rest
	}{
		{"on its back, top end raised", 10, 0, LongEdge, 10, OnBack},
		{"on its back, right side down", 0, 10, ShortEdge, -10, OnBack},
		{"on its face, top end raised", 170, 0, LongEdge, 10, OnFace},
		{"upright", 90, 0, LongEdge, 90, OnBack},
		{"upright, read across", 90, 0, ShortEdge, 0, OnBottom},
		{"head down, read across", -90, 0, ShortEdge, 0, OnTop},
		{"on its right side", 0, 90, LongEdge, 0, OnRight},
		{"on its left side", 0, -90, LongEdge, 0, OnLeft},
		{"on its left side, top raised", 12, -90, LongEdge, 12, OnLeft},
	} {
		up, _ := UpOfOrientation(c.beta, c.gamma)
		if got := up.Angle(c.edge).Degrees(); math.Abs(got-c.deg) > 1e-12 {
			t.Errorf("%s: got %v°, want %v°", c.name, got, c.deg)
		}
		if got := RestOf(up, c.edge); c.name != "upright" && got != c.rest {
			t.Errorf("%s: rests on %q, want %q", c.name, got, c.rest)
		}
	}
}

func TestNoSensor(t *testing.T) {
	nan := math.NaN()
	if _, ok := UpOfOrientation(nan, 0); ok {
		t.Error("took NaN for an angle")
	}
	if _, _, ok := UpOfAcceleration(nan, 0, 0); ok {
		t.Error("took NaN for an acceleration")
	}
	if _, _, ok := UpOfAcceleration(0, 0, 0); ok {
		t.Error("took free fall for a direction")
	}
	if _, still, _ := UpOfAcceleration(0, 0, 12); still {
		t.Error("a phone that is lifted is not still")
	}
}
