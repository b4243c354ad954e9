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

var unlimited = math.Inf(1)

// Pegs gives what each limit alone would allow at a speed [m/s, ≥ 0] in a
// gear, and the rider's own pull [N at the tyre]. Each peg is the rider's pull
// plus the motor's as that limit leaves it, or the whole pull that tyres and
// balance take; so the least of them is the pull there is.
func (g *Rig) Pegs(speedMps float64, gear int, now *Now) (p Pegs, riderN float64) {
	v := math.Max(speedMps, slowest)
	crank := g.crank[gear]
	cadence := v * crank * (30 / math.Pi)
	riderW := g.Rider.PowerOf(now.RiderW, cadence)
	riderN = riderW * g.Bike.Train.Efficiency / v
	m := &g.Bike.Motor
	p = Pegs{unlimited, unlimited, riderN, unlimited, unlimited, unlimited, unlimited, now.GripN, now.LiftN, unlimited}
	if !g.Assists() {
		return p, riderN
	}
	turns, toRoad := crank, g.Bike.Train.Efficiency
	if m.Kind != motor.Crank {
		turns, toRoad = 2*math.Pi/g.CircumferenceM, 1
	}
	torqueN := m.TorqueNm * turns * toRoad
	powerN := m.PowerW * toRoad / v
	p[Rider] = riderN + g.factor*riderW*toRoad/v
	p[Torque] = riderN + torqueN
	p[Power] = riderN + powerN
	if share := m.Share(cadence); share < 1 {
		p[Cadence] = riderN + share*torqueN
	}
	if share := g.Law.Share(v); share < 1 {
		p[CutOff] = riderN + share*powerN
	}
	if ratio, limited := g.Law.Ratio(v); limited && ratio < g.factor {
		p[CutOff] = math.Min(p[CutOff], riderN+ratio*riderW*toRoad/v)
	}
	if now.Ease < 1 {
		p[Heat] = riderN + now.Ease*torqueN
	}
	spin := v * turns
	cellsNm := math.Min(g.Circuit.TorqueByVoltage(spin, now.PackV, now.WindingC), g.Circuit.TorqueByElectric(spin, now.PackW, now.WindingC))
	p[Cells] = riderN + cellsNm*turns*toRoad
	if m.Kind == motor.FrontHub {
		p[Grip] = riderN + now.FrontGripN
	}
	return p, riderN
}

// MotorToRoad is the share of the motor's output that reaches the road.
func (g *Rig) MotorToRoad() float64 {
	if g.Bike.Motor.Kind == motor.Crank {
		return g.Bike.Train.Efficiency
	}
	return 1
}

// MotorTurns is how far the motor's output turns per road [rad/m] in a gear.
func (g *Rig) MotorTurns(gear int) float64 {
	if g.Bike.Motor.Kind == motor.Crank {
		return g.crank[gear]
	}
	return 2 * math.Pi / g.CircumferenceM
}

// PullAt gives the pull at a speed [m/s, ≥ 0] in a gear. Where tyres or balance
// take less than the rider alone gives, the rider holds back.
func (g *Rig) PullAt(speedMps float64, gear int, now *Now) Pull {
	pegs, riderN := g.Pegs(speedMps, gear, now)
	by, sum := pegs.Least()
	if sum < riderN {
		return Pull{RiderN: sum, By: by}
	}
	return Pull{RiderN: riderN, MotorN: sum - riderN, By: by}
}

// DragN is what a motor without freewheel holds back [N at the tyre] at a
// speed [m/s] while it rests.
func (g *Rig) DragN(speedMps float64) float64 {
	if g.Circuit.Freewheel || g.Bike.Motor.Kind == motor.None {
		return 0
	}
	turns := 2 * math.Pi / g.CircumferenceM
	return g.Circuit.Drag(speedMps*turns) * turns
}

// near is how much less pull a rider accepts for a cadence they like better.
const near = 0.985

// StrongestGear is the gear that pulls most at a speed [m/s], the easier one
// of two that pull the same.
func (g *Rig) StrongestGear(speedMps float64, now *Now) int {
	best, most := 0, 0.0
	for i := range g.Gears {
		if pull := g.PullAt(speedMps, i, now).Sum(); pull > most*(1+1e-9) {
			best, most = i, pull
		}
	}
	return best
}

// BestGear is the gear a rider would choose at a speed [m/s] when the hill
// asks for all there is: most pull, and of those nearly as good the one whose
// cadence lies nearest to the liked one.
func (g *Rig) BestGear(speedMps float64, now *Now) int {
	var few [32]float64
	pulls, most := few[:0], 0.0
	for i := range g.Gears {
		pull := g.PullAt(speedMps, i, now).Sum()
		pulls, most = append(pulls, pull), math.Max(most, pull)
	}
	best, off := 0, math.Inf(1)
	for i, pull := range pulls {
		if pull < near*most {
			continue
		}
		if d := g.OffLiked(speedMps, i); d < off {
			best, off = i, d
		}
	}
	return best
}

// OffLiked is how far the cadence at a speed [m/s] in a gear lies from the
// rider's liked one, as a logarithm of their ratio.
func (g *Rig) OffLiked(speedMps float64, gear int) float64 {
	return math.Abs(math.Log(math.Max(g.CadenceAt(speedMps, gear), 1) / g.Rider.CadenceLiked))
}
