package click

import "math"

// local is the rate around a time: rate and slope fitted to a window.
type local struct {
	atS, rateHz, slope float64 // [s], [1/s], [1/s²]
	error              float64 // of the rate [1/s]
	power, noise       float64 // of the harmonics: their mean, what noise gives
}

const (
	most     = 8  // harmonics that are fitted
	segments = 40 // parts into which a window is summed
)

// fitter finds rates anew in the envelope itself.
type fitter struct {
	onset []uint8
	hz    float64
	re    [most + 1][segments]float64
	im    [most + 1][segments]float64
	at    [segments]float64
	n     int
	used  int // harmonics
}

// fit finds the rate that fits a window best, from a guess that is right to
// about one click in the window: least squares of a comb of harmonics whose
// phase is quadratic in time, each with an amplitude of its own. Its error is
// from the curvature of the sum of squares at its top (the Cramér–Rao bound),
// with the noise taken half-way between the harmonics.
func (f *fitter) fit(fromS, toS, guessHz, slope float64) (local, bool) {
	from, to := int(fromS*f.hz), int(toS*f.hz)
	from, to = max(0, from), min(len(f.onset), to)
	if to-from < 2*segments {
		return local{}, false
	}
	mid := float64(from+to-1) / 2
	long := float64(to-from) / f.hz
	f.used = int(min(most, 0.42*f.hz/guessHz))
	if f.used < 1 {
		return local{}, false
	}
	f.sums(from, to, mid, guessHz, slope, 0)
	// First the low harmonics, whose tops are wide, then all.
	df, dc := 0.0, 0.0
	for _, h := range []int{1, 2, 4, most} {
		h = min(h, f.used)
		df, dc = f.climb(h, df, dc, 0.6/(float64(h)*long), 2.4/(float64(h)*long*long))
	}
	top := f.power(f.used, df, dc)
	e1, e2 := 0.05/(float64(f.used)*long), 0.2/(float64(f.used)*long*long)
	ff := (f.power(f.used, df+e1, dc) - 2*top + f.power(f.used, df-e1, dc)) / (e1 * e1)
	cc := (f.power(f.used, df, dc+e2) - 2*top + f.power(f.used, df, dc-e2)) / (e2 * e2)
	fc := (f.power(f.used, df+e1, dc+e2) - f.power(f.used, df+e1, dc-e2) - f.power(f.used, df-e1, dc+e2) + f.power(f.used, df-e1, dc-e2)) / (4 * e1 * e2)
	got := local{atS: mid / f.hz, rateHz: guessHz + df, slope: slope + dc, power: top / float64(f.used)}
	f.sums(from, to, mid, got.rateHz, got.slope, 0.5)
	got.noise = f.power(f.used, 0, 0)/float64(f.used) + 1e-9
	det := ff*cc - fc*fc
	if ff >= 0 || cc >= 0 || det <= 0 {
		return got, false
	}
	got.error = math.Sqrt(got.noise * -cc / det)
	return got, true
}

// sums multiplies the window by each harmonic of the guess, shifted by a part
// of the rate, and sums it in segments.
func (f *fitter) sums(from, to int, mid, rateHz, slope, shift float64) {
	f.n = segments
	mean := 0.0
	for _, v := range f.onset[from:to] {
		mean += float64(v)
	}
	mean /= float64(to - from)
	for h := 1; h <= f.used; h++ {
		f.re[h], f.im[h] = [segments]float64{}, [segments]float64{}
	}
	for i := from; i < to; i++ {
		t := (float64(i) - mid) / f.hz
		turns := rateHz*t + slope*t*t/2
		sin, cos := math.Sincos(-2 * math.Pi * (turns - math.Floor(turns)))
		k := (i - from) * segments / (to - from)
		x := float64(f.onset[i]) - mean
		c, s := cos, sin
		if shift != 0 { // harmonics at h − shift
			back, fore := math.Sincos(2 * math.Pi * shift * turns)
			c, s = cos*fore-sin*back, sin*fore+cos*back
		}
		for h := 1; h <= f.used; h++ {
			f.re[h][k] += x * c
			f.im[h][k] += x * s
			c, s = c*cos-s*sin, c*sin+s*cos
		}
	}
	for k := range segments {
		f.at[k] = (float64(from) + (float64(k)+0.5)*float64(to-from)/segments - mid) / f.hz
	}
}

// power is the sum of the first harmonics' powers when the rate and its slope
// are changed by so much.
func (f *fitter) power(h int, df, dc float64) float64 {
	var re, im [most + 1]float64
	for k := range segments {
		t := f.at[k]
		turns := df*t + dc*t*t/2
		sin, cos := math.Sincos(-2 * math.Pi * turns)
		c, s := cos, sin
		for i := 1; i <= h; i++ {
			re[i] += f.re[i][k]*c - f.im[i][k]*s
			im[i] += f.re[i][k]*s + f.im[i][k]*c
			c, s = c*cos-s*sin, c*sin+s*cos
		}
	}
	sum := 0.0
	for i := 1; i <= h; i++ {
		sum += re[i]*re[i] + im[i]*im[i]
	}
	return sum
}

// climb goes to the top of the power from a place, by looking around it in
// ever smaller steps.
func (f *fitter) climb(h int, df, dc, stepF, stepC float64) (float64, float64) {
	best := f.power(h, df, dc)
	for range 14 {
		bf, bc := df, dc
		for _, d := range [...][2]float64{{1, 0}, {-1, 0}, {0, 1}, {0, -1}, {1, 1}, {-1, -1}} {
			f2, c2 := df+d[0]*stepF, dc+d[1]*stepC
			if p := f.power(h, f2, c2); p > best {
				best, bf, bc = p, f2, c2
			}
		}
		if bf == df && bc == dc {
			stepF, stepC = stepF/2, stepC/2
		}
		df, dc = bf, bc
	}
	return df, dc
}
