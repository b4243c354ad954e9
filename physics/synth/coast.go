package synth

import "math"

const gravity = 9.80665

// Drag is what slows a bike that coasts: all-up mass and the wheels' inertia
// as a mass (ΣI/r²) [kg], the coefficients, the air, the road's grade
// (rise/run) and the head wind [m/s].
type Drag struct {
	MassKg, InertiaKg float64
	Crr, CdAM2        float64
	DensityKgM3       float64
	Grade, HeadMps    float64
	// Gust is how the force wanders: its standard deviation [N], with a memory
	// of about two seconds; Seed chooses the course that it takes.
	GustN float64
	Seed  uint64
}

// Coast gives the speed [m/s] over time [s] of a bike that coasts from v0, 0
// once it stands: −m_eff·dv/dt = m·G·(Crr·cos θ + sin θ) + ½ρ·CdA·(v+w)·|v+w|,
// by small steps of a fourth-order method.
func (d Drag) Coast(v0 float64) func(tS float64) float64 {
	const step = 0.02
	c := chance{d.Seed}
	gust := 0.0
	cos := 1 / math.Hypot(1, d.Grade)
	sin := d.Grade * cos
	slow := func(v float64) float64 {
		along := v + d.HeadMps
		force := d.MassKg*gravity*(d.Crr*cos+sin) + 0.5*d.DensityKgM3*d.CdAM2*along*math.Abs(along) + gust
		return -force / (d.MassKg + d.InertiaKg)
	}
	speeds := []float64{v0}
	for v := v0; v > 0 && len(speeds) < 60_000; {
		if d.GustN > 0 {
			keep := math.Exp(-step / 2)
			gust = gust*keep + d.GustN*math.Sqrt(1-keep*keep)*c.normal()
		}
		k1 := slow(v)
		k2 := slow(v + step/2*k1)
		k3 := slow(v + step/2*k2)
		k4 := slow(v + step*k3)
		v += step / 6 * (k1 + 2*k2 + 2*k3 + k4)
		speeds = append(speeds, math.Max(0, v))
	}
	return func(tS float64) float64 {
		at := tS / step
		i := int(at)
		if tS < 0 || i+1 >= len(speeds) {
			return 0
		}
		return speeds[i] + (at-float64(i))*(speeds[i+1]-speeds[i])
	}
}
