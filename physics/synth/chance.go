package synth

import "math"

// chance is a stream of numbers that look like chance and are the same for a
// seed: splitmix64 (Steele, Lea & Flood 2014).
type chance struct{ state uint64 }

func (c *chance) next() uint64 {
	c.state += 0x9e3779b97f4a7c15
	z := c.state
	z = (z ^ z>>30) * 0xbf58476d1ce4e5b9
	z = (z ^ z>>27) * 0x94d049bb133111eb
	return z ^ z>>31
}

// part is even over [0, 1).
func (c *chance) part() float64 { return float64(c.next()>>11) / (1 << 53) }

// normal has mean 0 and standard deviation 1 (Box & Muller 1958).
func (c *chance) normal() float64 {
	return math.Sqrt(-2*math.Log(1-c.part())) * math.Cos(2*math.Pi*c.part())
}
