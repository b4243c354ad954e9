package synth

import "math"

// noise has power 1.
func noise(n, rateHz int, colour Colour, c *chance) []float64 {
	out := make([]float64, n)
	cutHz := 0.0
	switch colour {
	case Tyre:
		cutHz = 800
	case Wind:
		cutHz = 120
	}
	keep := math.Exp(-2 * math.Pi * cutHz / float64(rateHz))
	low, power := 0.0, 0.0
	for i := range out {
		x := c.normal()
		if cutHz > 0 {
			low = keep*low + (1-keep)*x
			x = low + 0.02*x
		}
		out[i] = x
		power += x * x
	}
	for i := range out {
		out[i] /= math.Sqrt(power/float64(n) + 1e-30)
	}
	return out
}

// echo adds a room: 60 single echoes at chance times that fall by 60 dB within
// a time [s].
func echo(x []float64, rateHz int, fallS float64, c *chance) {
	dry := append([]float64(nil), x...)
	for range 60 {
		t := fallS * c.part()
		late, loud := int(t*float64(rateHz)), 0.25*math.Pow(10, -3*t/fallS)
		if c.next()&1 == 0 {
			loud = -loud
		}
		for i := late; i < len(x) && late > 0; i++ {
			x[i] += loud * dry[i-late]
		}
	}
}

// Voice is something like speech: pulses of a pitch that wanders, through three
// resonances that change with every syllable, with pauses. Its loudest is
// about 1.
func Voice(n, rateHz int, seed uint64) []float64 {
	c := chance{seed}
	out := make([]float64, n)
	rate := float64(rateHz)
	for at := 0; at < n; {
		long := int((0.12 + 0.2*c.part()) * rate)
		if c.part() < 0.25 {
			at += long
			continue
		}
		pitch := 90 + 120*c.part()
		glide := 60 * (c.part() - 0.5)
		formants := [3]float64{300 + 500*c.part(), 900 + 1400*c.part(), 2400 + 800*c.part()}
		for t := 0.0; t < float64(long)/rate; t += 1 / (pitch + glide*t) {
			loud := math.Sin(math.Pi*t*rate/float64(long)) * 0.4
			for k, hz := range formants {
				if hz > 0.45*rate {
					continue
				}
				first := at + int(t*rate)
				for i := first; i < n && i < first+int(0.012*rate); i++ {
					s := float64(i-first) / rate
					out[i] += loud / float64(k+1) * math.Exp(-s*90*float64(k+1)) * math.Sin(2*math.Pi*hz*s)
				}
			}
		}
		at += long
	}
	return out
}

// Music is notes in a beat: chords of decaying tones and a dull drum.
func Music(n, rateHz int, beatHz float64, seed uint64) []float64 {
	c := chance{seed}
	out := make([]float64, n)
	rate := float64(rateHz)
	for beat := 0; ; beat++ {
		at := int(float64(beat) / beatHz * rate)
		if at >= n {
			return out
		}
		for range 3 {
			hz := 110 * math.Pow(2, math.Floor(36*c.part())/12)
			for i := at; i < n && i < at+int(0.8*rate); i++ {
				s := float64(i-at) / rate
				out[i] += 0.1 * math.Exp(-3*s) * (math.Sin(2*math.Pi*hz*s) + 0.5*math.Sin(4*math.Pi*hz*s) + 0.3*math.Sin(6*math.Pi*hz*s))
			}
		}
		if beat%2 == 0 {
			for i := at; i < n && i < at+int(0.08*rate); i++ {
				out[i] += 0.3 * math.Exp(-float64(i-at)/(0.02*rate)) * c.normal()
			}
		}
	}
}
