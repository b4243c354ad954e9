package click

import "math"

// The grid of click rates: perOctave rows to a doubling.
const (
	perOctave  = 40
	hopS       = 0.25
	size       = 2048 // values of the envelope in a window
	harmonics  = 10
	scoreUnit  = 1 / 16.0
	slowFactor = 3 // the long window's values are sums of so many
)

// chirps are the relative changes of the rate that a window is straightened by
// [1/s], an even number of them. A coast-down has 0 to about −0.2 where it is
// slow, a roll-out also rises.
var chirps = [2][]float64{
	{0, 0.04, -0.03, -0.07, -0.13, -0.22},
	{0, 0.06, -0.05, -0.12, -0.22, -0.4},
}

// rates is the click-rate spectrogram: for each hop one column of scores, by
// scoreUnit. A score is how far a rate's salience stands out, in standard
// deviations of noise.
type rates struct {
	hz     float64 // of the envelope
	hop    float64 // values between columns
	grid   []float64
	scores []uint8
	next   int // the column that comes next

	transform *fft
	hann      []float64
	re, im    []float64
	power     [2][]float64
	best      []float64
	slow      []float64
	warps     [2][][]sample
}

func newRates(envelopeHz float64) rates {
	r := rates{hz: envelopeHz, hop: hopS * envelopeHz, transform: newFFT(size)}
	for rate := float64(LowestRateHz); rate < HighestRateHz && rate < 0.4*envelopeHz; rate *= math.Exp2(1.0 / perOctave) {
		r.grid = append(r.grid, rate)
	}
	r.hann = make([]float64, size)
	for i := range r.hann {
		r.hann[i] = 0.5 - 0.5*math.Cos(2*math.Pi*(float64(i)+0.5)/size)
	}
	r.re, r.im = make([]float64, size), make([]float64, size)
	r.power[0], r.power[1] = make([]float64, size/2), make([]float64, size/2)
	r.best, r.slow = make([]float64, len(r.grid)), make([]float64, len(r.grid))
	for i, factor := range []int{1, slowFactor} {
		for _, chirp := range chirps[i] {
			r.warps[i] = append(r.warps[i], newWarp(envelopeHz, factor, chirp))
		}
	}
	return r
}

// half is how far a column's long window reaches to either side, in values.
const half = size * slowFactor / 2

// take makes the columns whose windows are complete.
func (r *rates) take(onset []uint8) {
	for len(onset) >= r.centre(r.next)+half {
		r.column(onset)
	}
}

// finish makes the columns whose windows reach beyond the end.
func (r *rates) finish(onset []uint8) {
	for r.centre(r.next) < len(onset) {
		r.column(onset)
	}
}

func (r *rates) centre(column int) int { return int(float64(column) * r.hop) }

func (r *rates) columns() int { return len(r.scores) / max(1, len(r.grid)) }

// Rates below slowBelow go by the long window, above fastAbove by the short one
// [Hz]; between them by both.
const (
	slowBelow = 16
	fastAbove = 32
)

func (r *rates) column(onset []uint8) {
	at := r.centre(r.next)
	r.salience(onset, at, 1, r.best)
	if r.next%2 == 0 { // the long window hardly changes from one hop to the next
		r.salience(onset, at, slowFactor, r.slow)
	}
	r.next++
	for i, rate := range r.grid {
		fast := math.Log2(rate/slowBelow) / math.Log2(float64(fastAbove)/slowBelow)
		fast = max(0, min(1, fast))
		s := fast*r.best[i] + (1-fast)*r.slow[i]
		r.scores = append(r.scores, uint8(max(0, min(255, s/scoreUnit))))
	}
}

// salience gives each rate's score in a window around a value of the envelope,
// the best over all chirps.
func (r *rates) salience(onset []uint8, at, factor int, out []float64) {
	for i := range out {
		out[i] = math.Inf(-1)
	}
	list := r.warps[0]
	if factor > 1 {
		list = r.warps[1]
	}
	for c := 0; c+1 < len(list); c += 2 {
		r.warp(onset, at, factor, list[c], r.re)
		r.warp(onset, at, factor, list[c+1], r.im)
		r.transform.powers(r.re, r.im, r.power[0], r.power[1])
		r.score(r.power[0], factor, out)
		r.score(r.power[1], factor, out)
	}
}

// sample is where a value of a warped window lies in the envelope: from the
// window's middle, in whole values and a part of one.
type sample struct {
	at   int32
	part float32
}

// newWarp gives the places of a window on a time scale on which a rate with a
// relative change [1/s] is even: φ = t + chirp·t²/2, solved for t.
func newWarp(hz float64, factor int, chirp float64) []sample {
	out := make([]sample, size)
	for i := range out {
		phi := (float64(i) - size/2 + 0.5) * float64(factor) / hz
		t := 2 * phi / (1 + math.Sqrt(max(0.04, 1+2*chirp*phi)))
		low := math.Floor(t * hz)
		out[i] = sample{int32(low), float32(t*hz - low)}
	}
	return out
}

// warp takes a window of the envelope around a value of it, less its mean, by
// the Hann window. What lies beyond the recording's ends is taken as the mean.
func (r *rates) warp(onset []uint8, at, factor int, places []sample, out []float64) {
	sum, weights := 0.0, 0.0
	for i, p := range places {
		k := at + int(p.at)
		if k < 1 || k+2 >= len(onset) {
			out[i] = -1
			continue
		}
		if factor > 1 { // the mean of three values
			b, c := float64(onset[k]), float64(onset[k+1])
			a, d := float64(onset[k-1]), float64(onset[k+2])
			out[i] = (a + b + c + float64(p.part)*(d-a)) / 3
		} else {
			a := float64(onset[k])
			out[i] = a + float64(p.part)*(float64(onset[k+1])-a)
		}
		sum += out[i] * r.hann[i]
		weights += r.hann[i]
	}
	mean := sum / (weights + 1e-9)
	for i, v := range out {
		if v < 0 {
			v = mean
		}
		out[i] = (v - mean) * r.hann[i]
	}
}

// score sums a power spectrum over the harmonics of each rate less what lies
// half-way between them, and keeps the best.
func (r *rates) score(power []float64, factor int, out []float64) {
	mean := 0.0
	for _, p := range power[1:] {
		mean += p
	}
	mean = mean/float64(len(power)) + 1e-9
	for k, p := range power {
		if p > strongest*strongest*mean {
			p = strongest * strongest * mean
		}
		power[k] = math.Sqrt(p / mean)
	}
	perHz := size * float64(factor) / r.hz
	top := float64(len(power) - 2)
	at := func(bin float64) float64 {
		low := int(bin)
		part := bin - float64(low)
		return power[low] + part*(power[low+1]-power[low])
	}
	for i, rate := range r.grid {
		bin := rate * perHz
		sum, square := 0.0, 0.0
		for h := 1; h <= harmonics && float64(h)*bin < top; h++ {
			w := weights[h]
			sum += w * (at(float64(h)*bin) - at((float64(h)-0.5)*bin))
			square += w * w
		}
		if square == 0 {
			continue
		}
		if s := sum / math.Sqrt(2*square) / noiseScatter; s > out[i] {
			out[i] = s
		}
	}
}

// A line of the spectrum counts by its amplitude beside the mean, up to
// strongest, so that a hum does not count for much more than a click's
// harmonic; noiseScatter is the standard deviation of that where the line is of
// noise (Rayleigh's distribution: √(1 − π/4)).
const (
	strongest    = 6
	noiseScatter = 0.463
)

// weights are those of the harmonics: each next one counts a little less.
var weights = func() (w [harmonics + 1]float64) {
	for h := 1; h <= harmonics; h++ {
		w[h] = 1 / math.Sqrt(float64(h))
	}
	return w
}()

// The picture is at most so large.
const (
	pictureColumns = 480
	pictureRows    = 160
)

// picture gives the spectrogram in a size for drawing: of several columns or
// rows the strongest.
func (r *rates) picture() Picture {
	columns, rows := r.columns(), len(r.grid)
	wide, tall := (columns+pictureColumns-1)/pictureColumns, (rows+pictureRows-1)/pictureRows
	wide, tall = max(1, wide), max(1, tall)
	p := Picture{StartS: hopS * float64(wide-1) / 2, StepS: hopS * float64(wide)}
	for row := 0; row < rows; row += tall {
		p.RatesHz = append(p.RatesHz, r.grid[min(rows-1, row+tall/2)])
	}
	for c := 0; c < columns; c += wide {
		for row := 0; row < rows; row += tall {
			var strongest uint8
			for i := c; i < min(columns, c+wide); i++ {
				for j := row; j < min(rows, row+tall); j++ {
					strongest = max(strongest, r.scores[i*rows+j])
				}
			}
			p.Levels = append(p.Levels, strongest)
		}
	}
	return p
}
