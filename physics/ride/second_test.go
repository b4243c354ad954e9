package ride

import (
	"math"
	"testing"

	"hillwright/physics/hill"
	"hillwright/physics/rig"
)

// second rides a profile by another method, written apart: Dormand–Prince 5(4)
// with step control, in time, over place and speed, ideal gears at every
// moment. It gives the time to the end [s] and the rider's and motor's work at
// the tyre [J].
func second(r *rig.Rig, p *hill.Profile) (seconds, riderJ, motorJ float64) {
	c := []float64{0, 0.2, 0.3, 0.8, 8.0 / 9, 1, 1}
	a := [][]float64{{}, {0.2}, {3.0 / 40, 9.0 / 40}, {44.0 / 45, -56.0 / 15, 32.0 / 9},
		{19372.0 / 6561, -25360.0 / 2187, 64448.0 / 6561, -212.0 / 729},
		{9017.0 / 3168, -355.0 / 33, 46732.0 / 5247, 49.0 / 176, -5103.0 / 18656},
		{35.0 / 384, 0, 500.0 / 1113, 125.0 / 192, -2187.0 / 6784, 11.0 / 84}}
	b4 := []float64{5179.0 / 57600, 0, 7571.0 / 16695, 393.0 / 640, -92097.0 / 339200, 187.0 / 2100, 1.0 / 40}
	piece := 0
	rate := func(y [4]float64) [4]float64 {
		v := math.Max(y[1], 0)
		g := p.Grade[piece]
		now := r.At(fresh(r), g.Sin(), g.Cos())
		pull := r.PullAt(v, r.BestGear(v, &now), &now)
		load := r.Road.Force(v, g.Sin(), g.Cos(), r.Day.WindMps, 0)
		return [4]float64{v, (pull.Sum() - load) / r.InertialKg, pull.RiderN * v, pull.MotorN * v}
	}
	y := [4]float64{}
	h := 0.01
	for piece < len(p.Grade) {
		end := p.EdgeM[piece+1]
		var k [7][4]float64
		k[0] = rate(y)
		for i := 1; i < 7; i++ {
			z := y
			for j, w := range a[i] {
				for n := range z {
					z[n] += h * w * k[j][n]
				}
			}
			k[i] = rate(z)
		}
		y5, off := y, 0.0
		for n := range y {
			e := 0.0
			for i := range c {
				w := 0.0
				if i < 6 {
					w = a[6][i]
				}
				y5[n] += h * w * k[i][n]
				e += h * (w - b4[i]) * k[i][n]
			}
			off = math.Max(off, math.Abs(e)/(1e-6*(1+math.Abs(y[n]))))
		}
		if off > 1 && h > 1e-4 {
			h *= 0.5
			continue
		}
		if y5[0] > end+1e-6 && h > 1e-7 {
			h *= math.Max(0.1, 0.999*(end-y[0])/(y5[0]-y[0]))
			if end-y[0] > 1e-6 {
				continue
			}
		}
		y = y5
		seconds += h
		if y[0] >= end-1e-6 {
			piece++
			h = 0.01
			continue
		}
		if off < 0.3 {
			h = math.Min(h*1.5, 0.5)
		}
	}
	return seconds, y[2], y[3]
}

func TestAgainstASecondIntegrator(t *testing.T) {
	ideal := trekking()
	ideal.bike.ShiftS = 0
	heavy := ideal
	heavy.bike.MassKg, heavy.load.MassKg = 40, 12
	windy := ideal
	windy.day.WindMps = 6
	weak := ideal
	weak.rider.PowerW, weak.level = 115, 3
	single := ideal
	single.bike.Train.Sprockets = []int{36}
	// The simulation's rider waits between shifts, the second method's does
	// not, so only the rig with one gear is held to the integrators' own error.
	within := map[string]float64{"single": 0.0005, "trekking": 0.005, "heavy": 0.005, "windy": 0.005, "weak": 0.005}
	for name, parts := range map[string]parts{"single": single, "trekking": ideal, "heavy": heavy, "windy": windy, "weak": weak} {
		for _, p := range []*hill.Profile{made(400, 7, 60, 18), made(300, 1, 200, 5, 100, 12, 300, 3), made(2000, 8)} {
			r := parts.rig()
			a, err := Climb(r, p, usual)
			if err != nil || a.Stalled {
				t.Fatalf("%s: %v, stalled %v", name, err, a.Stalled)
			}
			seconds, riderJ, motorJ := second(r, p)
			for what, pair := range map[string][2]float64{
				"time": {a.ClimbS, seconds}, "rider": {a.Energy.RiderJ, riderJ}, "motor": {a.Energy.MotorJ, motorJ},
			} {
				if math.Abs(pair[0]/pair[1]-1) > within[name] {
					t.Errorf("%s over %.0f m, %s: %.3f, second method %.3f (%.3f %%)", name, p.LengthM(), what, pair[0], pair[1], 100*(pair[0]/pair[1]-1))
				}
			}
		}
	}
}
