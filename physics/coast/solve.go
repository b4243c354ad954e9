package coast

import "math"

// matrix is a small square one, row by row.
type matrix struct {
	n int
	v []float64
}

func newMatrix(n int) matrix { return matrix{n, make([]float64, n*n)} }

func (m matrix) at(i, j int) *float64 { return &m.v[i*m.n+j] }

// inverse gives the inverse of a symmetric positive definite matrix by its
// Cholesky factor; false where it is none.
func (m matrix) inverse() (matrix, bool) {
	n := m.n
	l := newMatrix(n)
	for i := range n {
		for j := 0; j <= i; j++ {
			sum := *m.at(i, j)
			for k := range j {
				sum -= *l.at(i, k) * *l.at(j, k)
			}
			if i == j {
				if !(sum > 0) {
					return matrix{}, false
				}
				*l.at(i, i) = math.Sqrt(sum)
			} else {
				*l.at(i, j) = sum / *l.at(j, j)
			}
		}
	}
	out := newMatrix(n)
	column := make([]float64, n)
	for c := range n {
		for i := range n {
			sum := 0.0
			if i == c {
				sum = 1
			}
			for k := range i {
				sum -= *l.at(i, k) * column[k]
			}
			column[i] = sum / *l.at(i, i)
		}
		for i := n - 1; i >= 0; i-- {
			sum := column[i]
			for k := i + 1; k < n; k++ {
				sum -= *l.at(k, i) * column[k]
			}
			column[i] = sum / *l.at(i, i)
			*out.at(i, c) = column[i]
		}
	}
	return out, true
}
