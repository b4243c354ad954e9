package hill

import (
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/mat"
)

// The banded solver and the trace against dense matrices of a linear algebra
// library, for random data, weights and roughness weights.
func TestSmootherAgainstDenseMatrices(t *testing.T) {
	for _, nodes := range []int{3, 4, 7, 30} {
		r := rand.New(rand.NewPCG(uint64(nodes), 1))
		var data []datum
		for range 2 * nodes {
			data = append(data, datum{node: r.IntN(nodes - 1), part: r.Float64(), heightM: 100 * r.Float64(), weight: 0.1 + r.Float64()})
		}
		s := newSmoother(nodes, data)
		for i := range s.p {
			s.p[i] = 0.01 + r.Float64()
		}
		const lambda = 2.5
		s.solve(lambda)

		basis := mat.NewDense(len(data), nodes, nil)
		weights := mat.NewDiagDense(len(data), nil)
		heights := mat.NewVecDense(len(data), nil)
		for i, o := range data {
			basis.Set(i, o.node, 1-o.part)
			basis.Set(i, o.node+1, o.part)
			weights.SetDiag(i, o.weight)
			heights.SetVec(i, o.heightM)
		}
		rough := mat.NewDense(nodes-2, nodes, nil)
		roughWeights := mat.NewDiagDense(nodes-2, nil)
		for i := range nodes - 2 {
			rough.Set(i, i, 1)
			rough.Set(i, i+1, -2)
			rough.Set(i, i+2, 1)
			roughWeights.SetDiag(i, lambda*s.p[i+1])
		}
		var system, part, inverse, hat mat.Dense
		system.Product(basis.T(), weights, basis)
		part.Product(rough.T(), roughWeights, rough)
		system.Add(&system, &part)
		if err := inverse.Inverse(&system); err != nil {
			t.Fatal(err)
		}
		hat.Product(basis, &inverse, basis.T(), weights)
		var z mat.VecDense
		part.Reset()
		part.Product(&inverse, basis.T(), weights)
		z.MulVec(&part, heights)
		sum := 0.0
		for i := range nodes {
			if math.Abs(z.AtVec(i)-s.z[i]) > 1e-9 {
				t.Errorf("%d nodes: z[%d] = %.12f, dense %.12f", nodes, i, s.z[i], z.AtVec(i))
			}
		}
		for i, o := range data {
			r := o.heightM - s.at(&data[i])
			sum += o.weight * r * r
		}
		n := float64(len(data))
		free := 1 - mat.Trace(&hat)/n
		want := sum / n / (free * free)
		if got := s.score(); math.Abs(got/want-1) > 1e-9 {
			t.Errorf("%d nodes: score %.12g, dense %.12g", nodes, got, want)
		}
	}
}

// A straight line has no roughness: every λ leaves it as it is.
func TestSmootherKeepsStraightLine(t *testing.T) {
	const nodes = 200
	var data []datum
	for i := range nodes - 1 {
		data = append(data, datum{node: i, part: 0.5, heightM: 3 + 0.7*(float64(i)+0.5), weight: 1})
	}
	for _, lambda := range []float64{1e-3, 1, 1e4} {
		s := newSmoother(nodes, data)
		s.solve(lambda)
		for i, z := range s.z {
			if want := 3 + 0.7*float64(i); math.Abs(z-want) > 1e-6 {
				t.Fatalf("λ %g: z[%d] = %g, want %g", lambda, i, z, want)
			}
		}
	}
}

// A wave of length 2π·ℓ on evenly spaced nodes keeps half its height: the
// response is 1/(1 + λ·(2 sin(ω/2))⁴) (Eilers 2003, of the second order).
func TestSmootherHalvesTheWaveOfItsScale(t *testing.T) {
	const nodes, scale = 4001, 20.0 // scale in nodes
	omega := 1 / scale
	data := make([]datum, nodes)
	for i := range data {
		data[i] = datum{node: min(i, nodes-2), heightM: math.Sin(omega * float64(i)), weight: 1}
		if i == nodes-1 {
			data[i].part = 1
		}
	}
	s := newSmoother(nodes, data)
	s.solve(math.Pow(scale, 4))
	want := 1 / (1 + math.Pow(scale, 4)*math.Pow(2*math.Sin(omega/2), 4))
	for i := nodes/2 - 100; i < nodes/2+100; i++ {
		if got := s.z[i]; math.Abs(got-want*data[i].heightM) > 1e-6 {
			t.Fatalf("z[%d] = %.9f, want %.9f", i, got, want*data[i].heightM)
		}
	}
	if math.Abs(want-0.5) > 1e-3 {
		t.Errorf("response at 2πℓ is %.4f, want 0.5", want)
	}
}
