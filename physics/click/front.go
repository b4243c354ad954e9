package click

import "math"

// envelopeAbout is about how often the envelope is taken [Hz].
const envelopeAbout = 2800

// A band's mean is taken over meanS [s]; single samples count up to slapFactor
// times the mean, so that a slap of the chain does not deafen. In the envelope
// they count up to clip.
const (
	meanS      = 0.6
	slapFactor = 20
	clip       = 4
	onsetUnit  = clip / 255.0
)

// front turns samples into the onset envelope.
type front struct {
	thin    int // samples that are averaged to one, at high rates
	thick   float64
	thinned int
	every   int // such for each value of the envelope
	have    int
	high    [2]biquad // takes off wind and rumble
	bands   []band

	energy float64 // loudness of the last value
	meanBy float64 // weight of a new value in a band's mean
	begun  int
}

// band is one part of the spectrum: its filter, its energy since the last
// value, its recent mean.
type band struct {
	filter       biquad
	energy, mean float64
}

// centres are the middles of the bands [Hz]. Pawls ring at 2 to 8 kHz (common
// practice, no source); a card on the spokes lower.
var centres = []float64{1100, 2100, 4000, 7500}

// enoughHz is the sampling rate that is enough: twice of it or more is thinned.
const enoughHz = 20_000

func newFront(rateHz int) front {
	// What lies above 10 kHz tells no more than what lies below.
	thin := max(1, rateHz/enoughHz)
	hz := float64(rateHz) / float64(thin)
	f := front{thin: thin, every: max(1, int(math.Round(hz/envelopeAbout)))}
	f.meanBy = 1 - math.Exp(-float64(f.every)/hz/meanS)
	f.high[0], f.high[1] = highPass(600/hz, 0.54), highPass(600/hz, 1.31) // Butterworth of fourth order
	for _, c := range centres {
		if c < 0.4*hz {
			f.bands = append(f.bands, band{filter: bandPass(c/hz, 1.5)})
		}
	}
	return f
}

// take takes a sample; true when a value of the envelope is ready.
func (f *front) take(x float64) bool {
	if f.thin > 1 {
		f.thick += x
		if f.thinned++; f.thinned < f.thin {
			return false
		}
		x = f.thick / float64(f.thin)
		f.thick, f.thinned = 0, 0
	}
	x = f.high[1].next(f.high[0].next(x))
	for i := range f.bands {
		b := &f.bands[i]
		y := b.filter.next(x)
		b.energy += y * y
	}
	if f.have++; f.have < f.every {
		return false
	}
	f.have = 0
	return true
}

// onset gives the envelope's value and begins the next.
func (f *front) onset() uint8 {
	sum := 0.0
	f.energy = 0
	by := f.meanBy
	if f.begun < 200 { // at first the mean of all so far
		f.begun++
		by = max(by, 1/float64(f.begun))
	}
	for i := range f.bands {
		b := &f.bands[i]
		e := b.energy / float64(f.every)
		b.energy = 0
		f.energy += e
		ratio := math.Sqrt(e / (b.mean + 1e-13))
		if ratio > clip {
			ratio = clip
		}
		sum += ratio
		if most := slapFactor*b.mean + 1e-10; e > most {
			e = most
		}
		b.mean += by * (e - b.mean)
	}
	return uint8(sum/float64(len(f.bands))/onsetUnit + 0.5)
}

// The loudness is kept in steps of an eighth of a factor of two.
const levelDB = 10 * 0.30103 / 8

func levelOf(energy float64) uint8 {
	l := 8 * (math.Log2(energy+1e-12) + 32)
	return uint8(max(0, min(255, l)))
}

// biquad is a filter of second order in transposed form (R. Bristow-Johnson's
// formulas for its coefficients; from memory).
type biquad struct{ b0, b1, b2, a1, a2, z1, z2 float64 }

func (q *biquad) next(x float64) float64 {
	y := q.b0*x + q.z1
	q.z1 = q.b1*x - q.a1*y + q.z2
	q.z2 = q.b2*x - q.a2*y
	return y
}

// highPass has its corner at a part of the sampling rate.
func highPass(part, quality float64) biquad {
	w := 2 * math.Pi * part
	cos, alpha := math.Cos(w), math.Sin(w)/(2*quality)
	a0 := 1 + alpha
	b := (1 + cos) / 2 / a0
	return biquad{b0: b, b1: -2 * b, b2: b, a1: -2 * cos / a0, a2: (1 - alpha) / a0}
}

// bandPass has its middle at a part of the sampling rate, where it passes all.
func bandPass(part, quality float64) biquad {
	w := 2 * math.Pi * part
	cos, alpha := math.Cos(w), math.Sin(w)/(2*quality)
	a0 := 1 + alpha
	return biquad{b0: alpha / a0, b2: -alpha / a0, a1: -2 * cos / a0, a2: (1 - alpha) / a0}
}
