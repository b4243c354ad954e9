// Package synth makes recordings whose truth is known, for tests: the clicks
// of a freehub over a coast-down of known speed, with noise, echo, voices and
// all that a phone hears besides. The page never uses it. Start with Scene.
package synth

import "math"

// Colour is how a noise sounds.
type Colour uint8

// The colours: White has the same power everywhere, Wind lies low, Tyre falls
// with frequency.
const (
	White Colour = iota
	Tyre
	Wind
)

// Scene is what is recorded. Speed gives the wheel's speed [m/s], 0 where it
// stands; Pedalling tells where no click is heard though the wheel turns (nil:
// never).
type Scene struct {
	RateHz         int
	LengthS        float64
	ClicksPerTurn  int
	CircumferenceM float64
	Speed          func(tS float64) float64
	Pedalling      func(tS float64) bool

	// SNRdB is the mean power of the clicks over that of the noise; noise is
	// left out where it is +Inf.
	SNRdB   float64
	Noise   Colour
	ReverbS float64                  // the time in which an echo falls by 60 dB
	Gain    func(tS float64) float64 // nil: 1
	Missed  float64                  // share of clicks that are not heard
	Doubled float64                  // share of clicks that are heard twice
	SlapsHz float64                  // slaps of the chain per second, at chance times
	Voice   float64                  // loudness of a voice beside the clicks' peaks
	Uneven  float64                  // how much the clicks' loudness goes up and down with every turn, 0 to 1
	Rub     float64                  // loudness of a rub once per turn beside the clicks' peaks
	Jitter  float64                  // standard deviation of a click's place, in clicks
	Seed    uint64
}

// peak is how loud a click is, full scale being 1.
const peak = 0.3

// Make gives the recording, −1 to 1.
func (s *Scene) Make() []float32 {
	n := int(s.LengthS * float64(s.RateHz))
	clicks := make([]float64, n)
	c := chance{s.Seed}
	s.click(clicks, &c)
	if s.ReverbS > 0 {
		echo(clicks, s.RateHz, s.ReverbS, &c)
	}
	power, heard := 0.0, 0
	for i, x := range clicks {
		t := float64(i) / float64(s.RateHz)
		if s.Speed(t) > 0 && (s.Pedalling == nil || !s.Pedalling(t)) {
			power += x * x
			heard++
		}
	}
	all := clicks
	if heard == 0 {
		power, heard = 1e-3, 1
	}
	if !math.IsInf(s.SNRdB, 1) {
		add(all, noise(n, s.RateHz, s.Noise, &c), math.Sqrt(power/float64(heard)*math.Pow(10, -s.SNRdB/10)))
	}
	if s.SlapsHz > 0 {
		s.slap(all, &c)
	}
	if s.Voice > 0 {
		add(all, Voice(n, s.RateHz, s.Seed+7), s.Voice*peak)
	}
	out := make([]float32, n)
	for i, x := range all {
		if s.Gain != nil {
			x *= s.Gain(float64(i) / float64(s.RateHz))
		}
		out[i] = float32(math.Max(-1, math.Min(1, x)))
	}
	return out
}

// click lays the clicks, and the rub between them.
func (s *Scene) click(out []float64, c *chance) {
	rate := float64(s.RateHz)
	perM := float64(s.ClicksPerTurn) / s.CircumferenceM
	phase, number := c.part(), 0 // in clicks
	for i := range out {
		t := float64(i) / rate
		v := s.Speed(t)
		before := phase
		phase += math.Max(0, v) * perM / rate
		silent := s.Pedalling != nil && s.Pedalling(t)
		if s.Rub > 0 && v > 0 {
			turn := phase / float64(s.ClicksPerTurn)
			if turn -= math.Floor(turn); turn < 0.12 {
				out[i] += 0.35 * peak * s.Rub * c.normal() * math.Sin(math.Pi*turn/0.12)
			}
		}
		if math.Floor(phase) == math.Floor(before) || v <= 0 {
			continue
		}
		number++
		if silent || c.part() < s.Missed {
			continue
		}
		at := (math.Floor(phase) - before) / (phase - before)
		if s.Jitter > 0 {
			at += s.Jitter * c.normal() / (v * perM) * rate
		}
		loud := peak * (1 + 0.15*c.normal())
		loud *= 1 + s.Uneven*math.Sin(2*math.Pi*float64(number)/float64(s.ClicksPerTurn))
		ring(out, float64(i)+at, loud, rate)
		if c.part() < s.Doubled {
			ring(out, float64(i)+at+0.3*rate/(v*perM), 0.7*loud, rate)
		}
	}
}

// ring adds one click: three decaying tones, as of a pawl that falls into its
// ratchet. Where a click has them differs from hub to hub; common practice, no
// source.
func ring(out []float64, at, loud, rate float64) {
	first := int(math.Ceil(at))
	for _, tone := range []struct{ hz, decayS, part float64 }{{2300, 0.0012, 0.5}, {4100, 0.0009, 0.7}, {6700, 0.0006, 0.4}} {
		if tone.hz > 0.45*rate {
			continue
		}
		for i := first; i < len(out) && float64(i) < at+8*tone.decayS*rate; i++ {
			if i < 0 {
				continue
			}
			t := (float64(i) - at) / rate
			out[i] += loud * tone.part * math.Exp(-t/tone.decayS) * math.Sin(2*math.Pi*tone.hz*t)
		}
	}
}

// slap adds slaps of a chain: short bursts, much louder than a click.
func (s *Scene) slap(out []float64, c *chance) {
	rate := float64(s.RateHz)
	for t := 0.0; ; {
		t -= math.Log(1-c.part()) / s.SlapsHz
		if t >= s.LengthS {
			return
		}
		at, long := int(t*rate), int(0.012*rate)
		for i := at; i < len(out) && i < at+6*long; i++ {
			out[i] += 1.2 * peak * math.Exp(-float64(i-at)/float64(long)) * c.normal()
		}
	}
}

func add(to, from []float64, loud float64) {
	for i := range to {
		to[i] += loud * from[i]
	}
}
