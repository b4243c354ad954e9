package ride

import (
	"math"

	"hillwright/physics/brake"
	"hillwright/physics/hill"
	"hillwright/physics/rig"
	"hillwright/physics/road"
	"hillwright/physics/unit"
)

// wayDown answers for the way down a hill, in the direction in which it falls
// more, for a rig whose brakes are cool at the top.
func wayDown(r *rig.Rig, p *hill.Profile, o Options) WayDown {
	if p.AscentM() > p.DescentM() {
		back := p.Reversed()
		p = &back
	}
	d := WayDown{Falls: p.DescentM() > 0}
	if !d.Falls {
		return d
	}
	airC := float64(r.Day.TemperatureC)
	fall := brake.Descent{
		Pieces: make([]brake.Piece, len(p.Grade)),
		MassKg: r.InertialKg, DragN: 0.5 * r.Road.DensityKgM3 * (r.Road.DragM2 + r.Road.WheelDragM2),
		AirC: airC, FrontC: airC, RearC: airC,
	}
	weight := r.Road.MassKg * unit.Gravity
	steepest := unit.Grade(0)
	for i, g := range p.Grade {
		fall.Pieces[i] = brake.Piece{LengthM: p.EdgeM[i+1] - p.EdgeM[i], DriveN: weight * (-g.Sin() - r.Road.Crr*g.Cos())}
		steepest = min(steepest, g)
	}
	d.SteepestGrade = -steepest
	fall.StopMps2, _ = stops(r, steepest, airC, airC)
	if fall.StopMps2 <= 0 {
		d.FrontPeakC, d.RearPeakC, d.StoppingM, d.Warm = airC, airC, math.Inf(1), true
		return d
	}
	peak := r.Brakes.Peak(&fall, o.DownMps)
	d.FrontPeakC, d.RearPeakC = peak.FrontC, peak.RearC
	d.Warm = r.Brakes.Cautious(peak)
	d.DecelMps2, d.StopBy = stops(r, steepest, peak.FrontC, peak.RearC)
	d.StoppingM = road.StoppingM(o.DownMps, d.DecelMps2, o.ReactS)
	bySight := math.Min(FastestMps, road.SpeedForM(o.SightM, fall.StopMps2, o.ReactS))
	d.MostMps = r.Brakes.SpeedByHeat(&fall, bySight)
	d.ByHeat = d.MostMps < bySight-1e-6
	return d
}

// FastestMps is the highest speed down that is ever advised [m/s]: 50 km/h.
// Common practice, no source.
const FastestMps = 50 / 3.6

// stops is the hardest deceleration [m/s²] on a grade with the brakes at
// temperatures [°C], and what bounds it.
func stops(r *rig.Rig, g unit.Grade, frontC, rearC float64) (mps2 float64, by road.StopLimit) {
	return r.Stance.Decel(r.Mu, g.Sin(), g.Cos(), r.Front.ForceN(frontC, r.Wet), r.Rear.ForceN(rearC, r.Wet))
}
