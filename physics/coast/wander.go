package coast

import "math"

// wander is how gusts and bumps move a speed: a force that comes and goes with
// a memory, as an Ornstein–Uhlenbeck process, so that in times long beside the
// memory the speed wanders by far [m/s in 1 s], growing with the root of time.
type wander struct{ far, memoryS float64 }

// filter is Kalman's (J. Basic Eng. 82 (1960) 35) for readings of a speed that
// wanders. It turns several lists of readings, given one row at a time, into
// innovations of variance 1.
type filter struct {
	w             wander
	vss, vsf, vff float64 // variances of the speed's and the force's doubt
	speed, force  []float64
}

func newFilter(w wander, lists int) *filter {
	f := &filter{w: w, speed: make([]float64, lists), force: make([]float64, lists)}
	if w.far > 0 {
		f.vff = w.far * w.far / (2 * w.memoryS * w.memoryS)
	}
	return f
}

// pass lets time go by [s].
func (f *filter) pass(dt float64) {
	if f.w.far == 0 {
		return
	}
	memory, still := f.w.memoryS, f.w.far*f.w.far/(2*f.w.memoryS*f.w.memoryS)
	keep := math.Exp(-dt / memory)
	moved := memory * (1 - keep)
	for i, force := range f.force {
		f.speed[i] += moved * force
		f.force[i] = keep * force
	}
	vss := f.vss + 2*moved*f.vsf + moved*moved*f.vff
	vsf := keep * (f.vsf + moved*f.vff)
	f.vss = vss + still*memory*memory*(2*dt/memory-3+4*keep-keep*keep)
	f.vsf = vsf + still*memory*(1-keep)*(1-keep)
	f.vff = keep*keep*f.vff + still*(1-keep*keep)
}

// take turns a row of readings, off by an error, into innovations, in place,
// and gives the logarithm of the variance that they had.
func (f *filter) take(row []float64, err float64) float64 {
	s := f.vss + err*err
	by, gainS, gainF := 1/math.Sqrt(s), f.vss/s, f.vsf/s
	for i, r := range row {
		off := r - f.speed[i]
		f.speed[i] += gainS * off
		f.force[i] += gainF * off
		row[i] = off * by
	}
	f.vff -= gainF * f.vsf
	f.vsf -= gainS * f.vsf
	f.vss -= gainS * f.vss
	return math.Log(s)
}
