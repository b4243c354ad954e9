package click

import "math"

// fft is a fast Fourier transform of a power of two complex numbers (Cooley &
// Tukey 1965), in place on two lists.
type fft struct {
	n        int
	cos, sin []float64
	swap     []int32
}

func newFFT(n int) *fft {
	f := &fft{n: n, cos: make([]float64, n/2), sin: make([]float64, n/2), swap: make([]int32, n)}
	for i := range f.cos {
		f.sin[i], f.cos[i] = math.Sincos(-2 * math.Pi * float64(i) / float64(n))
	}
	for i, j := 1, 0; i < n; i++ {
		bit := n >> 1
		for ; j&bit != 0; bit >>= 1 {
			j ^= bit
		}
		j ^= bit
		f.swap[i] = int32(j)
	}
	return f
}

func (f *fft) transform(re, im []float64) {
	re, im = re[:f.n], im[:f.n]
	for i, j := range f.swap {
		if i < int(j) {
			re[i], re[j] = re[j], re[i]
			im[i], im[j] = im[j], im[i]
		}
	}
	for size := 2; size <= f.n; size <<= 1 {
		half, step := size/2, f.n/size
		for from := 0; from < f.n; from += size {
			for k, t := 0, 0; k < half; k, t = k+1, t+step {
				c, s := f.cos[t], f.sin[t]
				a, b := from+k, from+k+half
				x, y := re[b]*c-im[b]*s, re[b]*s+im[b]*c
				re[b], im[b] = re[a]-x, im[a]-y
				re[a], im[a] = re[a]+x, im[a]+y
			}
		}
	}
}

// powers gives the power spectra of two real lists that were put into re and
// im, by their symmetry: one transform does both.
func (f *fft) powers(re, im, first, second []float64) {
	f.transform(re, im)
	for k := range f.n / 2 {
		other := (f.n - k) & (f.n - 1)
		ar, ai := re[k]+re[other], im[k]-im[other]
		br, bi := im[k]+im[other], re[other]-re[k]
		first[k] = (ar*ar + ai*ai) / 4
		second[k] = (br*br + bi*bi) / 4
	}
}
