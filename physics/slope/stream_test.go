package slope

import (
	"math"
	"math/rand/v2"

	"hillwright/physics/unit"
)

// stream is a sensor made up: what it says of an angle that is held still.
type stream struct {
	rng *rand.Rand
	// noise [rad] that hangs together over togetherS [s], white noise beside it,
	// a drift [rad/s] and bumps per second
	noise, togetherS, white, drift, bumps float64
	step                                  float64 // rounding [rad]
	hz                                    float64
	slow                                  float64 // state of the noise
	bump                                  float64
}

func anyStream(rng *rand.Rand) *stream {
	log := func(low, high float64) float64 { return low * math.Pow(high/low, rng.Float64()) }
	s := &stream{
		rng:   rng,
		noise: log(0.01, 0.5) * degree, togetherS: log(0.02, 1), white: log(0.01, 0.3) * degree,
		step: float64(OrientationStep), hz: 10 + 50*rng.Float64(), bumps: 0.15 * rng.Float64(),
	}
	if rng.IntN(3) == 0 {
		s.drift = rng.NormFloat64() * 0.1 / 60 * degree // a tenth of a degree a minute
	}
	s.slow = rng.NormFloat64()
	return s
}

// next is what the sensor says of a true angle after another sample's time.
func (s *stream) next(t, angle float64) float64 {
	dt := 1 / s.hz
	keep := math.Exp(-dt / s.togetherS)
	s.slow = keep*s.slow + math.Sqrt(1-keep*keep)*s.rng.NormFloat64()
	s.bump *= math.Exp(-dt / 0.08)
	if s.rng.Float64() < s.bumps*dt {
		s.bump = s.rng.NormFloat64() * 3 * degree
	}
	v := angle + s.noise*s.slow + s.white*s.rng.NormFloat64() + s.drift*t + s.bump
	return math.Round(v/s.step) * s.step
}

// lie feeds an average with an angle until it is enough or maxS are over, and
// gives the time at the end.
func (s *stream) lie(fromS, angle, maxS float64) (Average, float64) {
	a := NewSteady(0, unit.Angle(s.step))
	t := fromS
	for ; t < fromS+maxS && !a.Average().Enough; t += 1 / s.hz {
		a.Add(t, unit.Angle(s.next(t, angle)))
	}
	return a.Average(), t
}
