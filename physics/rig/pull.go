package rig

import (
	"math"

	"hillwright/physics/motor"
)

// slowest is the speed [m/s] below which power limits are taken as at this
// speed: at rest the torque limits decide, and a division by zero helps nobody.
const slowest = 0.05

// Pull is what reaches the road at one speed in one gear: the rider's and the
// motor's share [N at the tyre] and the limit that decides the sum.
type Pull struct {
	RiderN, MotorN float64
	By             Limit
}

// Sum is the whole pull [N].
func (p Pull) Sum() float64 { return p.RiderN + p.MotorN }

// Pegs gives what each limit alone would allow at a speed [m/s, ≥ 0] in a
// gear. Each is the rider's pull plus the motor's as that limit leaves it, so
// the least of them is the pull there is.
func (g *Rig) Pegs(speedMps float64, gear int) Pegs {
	v := math.Max(speedMps, slowest)
	cadence := g.CadenceAt(v, gear)
	riderW := g.Rider.Power(cadence)
	riderN := riderW * g.Bike.Train.Efficiency / v
	toRoad := g.MotorToRoad()
	m := &g.Bike.Motor

	var p Pegs
	for l := range p {
		p[l] = math.Inf(1)
	}
	p[Rider] = riderN + g.factor*riderW*toRoad/v
	if m.Kind == motor.None || g.Level == 0 {
		return p
	}
	torqueN := m.TorqueNm * g.motorTurns(gear) * toRoad
	p[Torque] = riderN + torqueN
	p[Power] = riderN + m.PowerW*toRoad/v
	if share := m.Share(cadence); share < 1 {
		p[Cadence] = riderN + share*torqueN
	}
	if share := g.Law.Share(v); share < 1 {
		p[CutOff] = riderN + share*m.PowerW*toRoad/v
	}
	if ratio, limited := g.Law.Ratio(v); limited && ratio < g.factor {
		p[CutOff] = math.Min(p[CutOff], riderN+ratio*riderW*toRoad/v)
	}
	return p
}

// MotorToRoad is the share of the motor's output that reaches the road.
func (g *Rig) MotorToRoad() float64 {
	if g.Bike.Motor.Kind == motor.Crank {
		return g.Bike.Train.Efficiency
	}
	return 1
}

// motorTurns is how far the motor's output turns per road [rad/m].
func (g *Rig) motorTurns(gear int) float64 {
	if g.Bike.Motor.Kind == motor.Crank {
		return g.crank[gear]
	}
	return 2 * math.Pi / g.CircumferenceM
}

// PullAt gives the pull at a speed [m/s, ≥ 0] in a gear.
func (g *Rig) PullAt(speedMps float64, gear int) Pull {
	pegs := g.Pegs(speedMps, gear)
	by, sum := pegs.Least()
	v := math.Max(speedMps, slowest)
	riderN := g.Rider.Power(g.CadenceAt(v, gear)) * g.Bike.Train.Efficiency / v
	return Pull{RiderN: riderN, MotorN: sum - riderN, By: by}
}

// near is how much less pull a rider accepts for a cadence they like better.
const near = 0.985

// StrongestGear is the gear that pulls most at a speed [m/s], the easier one
// of two that pull the same.
func (g *Rig) StrongestGear(speedMps float64) int {
	best, most := 0, 0.0
	for i := range g.Gears {
		if pull := g.PullAt(speedMps, i).Sum(); pull > most*(1+1e-9) {
			best, most = i, pull
		}
	}
	return best
}

// BestGear is the gear a rider would choose at a speed [m/s] when the hill
// asks for all there is: most pull, and of those nearly as good the one whose
// cadence lies nearest to the liked one.
func (g *Rig) BestGear(speedMps float64) int {
	most := g.PullAt(speedMps, g.StrongestGear(speedMps)).Sum()
	best, off := 0, math.Inf(1)
	for i := range g.Gears {
		if g.PullAt(speedMps, i).Sum() < near*most {
			continue
		}
		ratio := g.CadenceAt(speedMps, i) / g.Rider.CadenceLiked
		if d := math.Abs(math.Log(math.Max(ratio, 1e-9))); d < off {
			best, off = i, d
		}
	}
	return best
}
