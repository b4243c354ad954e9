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
	segments = 32 // parts into which a window is summed
)

// fitter finds rates anew in the envelope itself.
type fitter struct {
	onset  []uint8
	hz     float64
	re     [most + 1][segments]float64
	im     [most + 1][segments]float64
	at     [segments]float64
	used   int // harmonics
	weight [most + 1]float64
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
	f.even()
	// First the low harmonics, whose tops are wide, then all.
	df, dc := 0.0, 0.0
	for _, h := range []int{1, 2, 4, most} {
		h = min(h, f.used)
		df, dc = f.climb(h, df, dc, 0.6/(float64(h)*long), 2.4/(float64(h)*long*long), 5)
	}
	got := local{atS: mid / f.hz, rateHz: guessHz + df, slope: slope + dc}
	f.sums(from, to, mid, got.rateHz, got.slope, 0.5)
	between := f.powers(0, 0)
	f.sums(from, to, mid, got.rateHz, got.slope, 0)
	tops := f.powers(0, 0)
	for h := 1; h <= f.used; h++ {
		got.power += tops[h] / float64(f.used)
		got.noise += between[h] / float64(f.used)
	}
	got.noise += 1e-9
	f.weigh(&between)
	df, dc = f.climb(f.used, 0, 0, 0.1/(float64(f.used)*long), 0.4/(float64(f.used)*long*long), 8)
	got.rateHz, got.slope = got.rateHz+df, got.slope+dc
	got.error = f.spread(df, dc, long)
	return got, got.error > 0
}

// spread is the standard deviation of the rate at the top of the power: from
// its curvature and from how much the window's segments pull it to and fro (the
// sandwich form; Huber 1967). Clicks that come a little early or late shift all
// harmonics alike; segments tell it, harmonics do not. It is 0 where there is
// no top.
func (f *fitter) spread(df, dc, long float64) float64 {
	e1, e2 := 0.05/(float64(f.used)*long), 0.2/(float64(f.used)*long*long)
	top := f.power(f.used, df, dc)
	ff := (f.power(f.used, df+e1, dc) - 2*top + f.power(f.used, df-e1, dc)) / (e1 * e1)
	cc := (f.power(f.used, df, dc+e2) - 2*top + f.power(f.used, df, dc-e2)) / (e2 * e2)
	fc := (f.power(f.used, df+e1, dc+e2) - f.power(f.used, df+e1, dc-e2) - f.power(f.used, df-e1, dc+e2) + f.power(f.used, df-e1, dc-e2)) / (4 * e1 * e2)
	det := ff*cc - fc*fc
	if ff >= 0 || cc >= 0 || det <= 0 {
		return 0
	}
	// Each segment's part of the derivative by phase.
	var pull [segments]float64
	var re, im [most + 1]float64
	for pass := range 2 {
		for k, t := range f.at {
			turns := df*t + dc*t*t/2
			for h := 1; h <= f.used; h++ {
				sin, cos := math.Sincos(-2 * math.Pi * float64(h) * turns)
				x, y := f.re[h][k]*cos-f.im[h][k]*sin, f.re[h][k]*sin+f.im[h][k]*cos
				if pass == 0 {
					re[h], im[h] = re[h]+x, im[h]+y
				} else {
					pull[k] += 4 * math.Pi * f.weight[h] * float64(h) * (re[h]*y - im[h]*x)
				}
			}
		}
	}
	mean, meanT2 := 0.0, 0.0
	for k, t := range f.at {
		mean += pull[k] / segments
		meanT2 += t * t / 2 / segments
	}
	var vff, vfc, vcc float64
	for k, t := range f.at {
		g := pull[k] - mean
		a, b := g*t, g*(t*t/2-meanT2)
		vff, vfc, vcc = vff+a*a, vfc+a*b, vcc+b*b
	}
	// The rate's row of the inverse curvature, on both sides of the scatter.
	// Fitted numbers take from the scatter; how many count is from trials.
	p, q := cc/det, -fc/det
	return math.Sqrt((p*p*vff + 2*p*q*vfc + q*q*vcc) * segments / (segments - 9))
}

// weigh gives each harmonic the weight of its noise, which is taken from what
// lies half-way to its neighbours. Clicks that come a little early or late make
// the high harmonics noisier than the low.
func (f *fitter) weigh(between *[most + 1]float64) {
	all := 0.0
	for h := 1; h <= f.used; h++ {
		all += between[h] / float64(f.used)
	}
	for h := 1; h <= f.used; h++ {
		sum, n := all+1e-9, 1.0 // and a little from all: two numbers are few
		for d := -1; d <= 2; d++ {
			if k := h + d; k >= 1 && k <= f.used {
				sum, n = sum+between[k], n+1
			}
		}
		f.weight[h] = n / sum
	}
}

// even gives all harmonics the same weight.
func (f *fitter) even() {
	for h := range f.weight {
		f.weight[h] = 1
	}
}

// sums multiplies the window by each harmonic of the guess, shifted by a part
// of the rate, and sums it in segments.
func (f *fitter) sums(from, to int, mid, rateHz, slope, shift float64) {
	mean := 0.0
	for _, v := range f.onset[from:to] {
		mean += float64(v)
	}
	mean /= float64(to - from)
	for h := 1; h <= f.used; h++ {
		f.re[h], f.im[h] = [segments]float64{}, [segments]float64{}
	}
	turn := func(x float64) (sin, cos float64) { return math.Sincos(-2 * math.Pi * (x - math.Floor(x))) }
	for k := range segments {
		first, end := from+k*(to-from)/segments, from+(k+1)*(to-from)/segments
		t, dt := (float64(first)-mid)/f.hz, 1/f.hz
		// e to the phase of a click rate, and to that of its shift, from value to
		// value: the phase is quadratic.
		sin, cos := turn(rateHz*t + slope*t*t/2)
		stepSin, stepCos := turn(rateHz*dt + slope*(t*dt+dt*dt/2))
		moreSin, moreCos := turn(slope * dt * dt)
		back, fore := turn(shift * (rateHz*t + slope*t*t/2))
		backStep, foreStep := turn(shift * (rateHz*dt + slope*(t*dt+dt*dt/2)))
		for i := first; i < end; i++ {
			x := float64(f.onset[i]) - mean
			c, s := cos*fore+sin*back, sin*fore-cos*back // harmonic h − shift
			for h := 1; h <= f.used; h++ {
				f.re[h][k] += x * c
				f.im[h][k] += x * s
				c, s = c*cos-s*sin, c*sin+s*cos
			}
			cos, sin = cos*stepCos-sin*stepSin, cos*stepSin+sin*stepCos
			stepCos, stepSin = stepCos*moreCos-stepSin*moreSin, stepCos*moreSin+stepSin*moreCos
			fore, back = fore*foreStep-back*backStep, fore*backStep+back*foreStep
		}
	}
	for k := range segments {
		f.at[k] = (float64(from) + (float64(k)+0.5)*float64(to-from)/segments - mid) / f.hz
	}
}

// power is the weighted sum of the first harmonics' powers when the rate and its slope
// are changed by so much.
func (f *fitter) power(h int, df, dc float64) float64 {
	sum := 0.0
	for i, p := range f.powersTo(h, df, dc) {
		sum += f.weight[i] * p
	}
	return sum
}

// powers are those of all harmonics.
func (f *fitter) powers(df, dc float64) [most + 1]float64 { return f.powersTo(f.used, df, dc) }

func (f *fitter) powersTo(h int, df, dc float64) (out [most + 1]float64) {
	var re, im [most + 1]float64
	// The phase is quadratic from segment to segment: its factor turns by step,
	// and step by the same each time.
	t, dt := f.at[0], f.at[1]-f.at[0]
	turn := func(x float64) (sin, cos float64) { return math.Sincos(-2 * math.Pi * x) }
	sin, cos := turn(df*t + dc*t*t/2)
	stepSin, stepCos := turn(df*dt + dc*(t*dt+dt*dt/2))
	moreSin, moreCos := turn(dc * dt * dt)
	for k := range segments {
		c, s := cos, sin
		for i := 1; i <= h; i++ {
			re[i] += f.re[i][k]*c - f.im[i][k]*s
			im[i] += f.re[i][k]*s + f.im[i][k]*c
			c, s = c*cos-s*sin, c*sin+s*cos
		}
		cos, sin = cos*stepCos-sin*stepSin, cos*stepSin+sin*stepCos
		stepCos, stepSin = stepCos*moreCos-stepSin*moreSin, stepCos*moreSin+stepSin*moreCos
	}
	for i := 1; i <= h; i++ {
		out[i] = re[i]*re[i] + im[i]*im[i]
	}
	return out
}

// climb goes to the top of the power from a place, by looking around it in
// ever smaller steps, so many times.
func (f *fitter) climb(h int, df, dc, stepF, stepC float64, times int) (float64, float64) {
	best := f.power(h, df, dc)
	for range times {
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
