package rig

import (
	"math"

	"hillwright/physics/motor"
	"hillwright/physics/road"
	"hillwright/physics/unit"
)

// Body is what of a rig changes slowly along a ride: the motor's temperatures
// [°C], the pack's charge (0 to 1) and slow sag [V], what is left of the
// rider's W′ [J], and the brakes' temperatures [°C].
type Body struct {
	WindingC, CaseC float64
	Charge, RelaxV  float64
	ReserveJ        float64
	FrontC, RearC   float64
}

// Fresh is the state of a rig that has stood in the day's air, with a charge
// of 0 to 1.
func (g *Rig) Fresh(charge float64) Body {
	c := float64(g.Day.TemperatureC)
	return Body{WindingC: c, CaseC: c, Charge: charge, ReserveJ: g.Endurance.ReserveJ, FrontC: c, RearC: c}
}

// Now is what the limits are at one place in one state: what a step of the
// computation holds fixed. RiderW is what the rider is still able to give [W];
// Ease the part of its torque that the heat leaves the motor; PackW what the
// pack gives at most [W], PackV its voltage under such a load [V]; GripN the
// most pull before a driven tyre slips and LiftN before the front wheel lifts
// [N], FrontGripN what a driven front tyre holds.
type Now struct {
	RiderW            float64
	Ease, WindingC    float64
	PackW, PackV      float64
	GripN, FrontGripN float64
	LiftN             float64
}

// At works out the limits of a state on a road whose angle has the given sine
// and cosine.
func (g *Rig) At(b *Body, sin, cos float64) Now {
	n := Now{
		RiderW:   g.Endurance.Able(b.ReserveJ, g.Rider.PowerW),
		WindingC: b.WindingC,
		Ease:     1,
	}
	rolling := g.Road.MassKg * unit.Gravity * g.Road.Crr * cos
	n.LiftN = g.Stance.LiftN(0, cos, rolling)
	if g.Bike.Motor.Kind == motor.FrontHub {
		n.FrontGripN = g.Mu * math.Max(0, g.Stance.Wheels(cos, g.Stance.DriveN(sin, 0)).FrontN)
		n.GripN = math.Inf(1)
	} else {
		n.GripN = g.Stance.GripN(road.RearDrive, g.Mu, cos, rolling)
	}
	if g.Assists() {
		n.Ease = g.Heat.Ease(b.WindingC)
		n.PackW, n.PackV = g.packNow(b)
	}
	return n
}

// demand is the electric power [W per W at the output] by which the voltage
// under load is taken: that of a motor at work near its limit.
const demand = 1.3

func (g *Rig) packNow(b *Body) (mostW, loadedV float64) {
	mostW, _ = g.Pack.MaxPower(b.Charge, b.RelaxV, g.PackC)
	amps, _ := g.Pack.Current(math.Min(mostW, demand*g.Bike.Motor.PowerW), b.Charge, b.RelaxV, g.PackC)
	loadedV = g.Pack.TerminalV(b.Charge, b.RelaxV, amps, g.PackC)
	return math.Min(mostW, loadedV*g.Circuit.MaxPackA), loadedV
}
