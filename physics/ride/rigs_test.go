package ride

import (
	"math"

	"hillwright/physics/gear"
	"hillwright/physics/hill"
	"hillwright/physics/motor"
	"hillwright/physics/rider"
	"hillwright/physics/rig"
	"hillwright/physics/rule"
	"hillwright/physics/unit"
)

// made makes a profile of pieces: length [m], grade [%], and so on.
func made(parts ...float64) *hill.Profile {
	p := &hill.Profile{EdgeM: []float64{0}, HeightM: []float64{0}}
	for i := 0; i < len(parts); i += 2 {
		g := unit.Percent(parts[i+1])
		n := len(p.EdgeM) - 1
		p.Grade = append(p.Grade, g)
		p.EdgeM = append(p.EdgeM, p.EdgeM[n]+parts[i])
		p.HeightM = append(p.HeightM, p.HeightM[n]+parts[i]*g.Sin())
	}
	return p
}

// parts of a trekking bike with a crank motor, a rider of 80 kg and a day.
type parts struct {
	bike  rig.Bike
	rider rider.Rider
	load  rig.Load
	day   rig.Day
	level int
}

func trekking() parts {
	nan := math.NaN()
	return parts{
		bike: rig.Bike{
			MassKg: 25, Crr: 0.008, CdAM2: 0.55, WheelDragM2: 0.0044, WheelInertiaKgM2: 0.25,
			Tyre: gear.Tyre{WidthMM: 47, BeadSeatMM: 622}, RolloutM: nan, ShiftS: 0.3,
			Train: gear.Train{Rings: []int{38}, Sprockets: []int{11, 13, 15, 18, 21, 24, 28, 32, 37, 42, 46}, Efficiency: 0.96},
			Motor: motor.Motor{Kind: motor.Crank, TorqueNm: 65, PowerW: 500, Levels: []float64{0.6, 1.2, 2, 3.2}, CadenceHigh: 115},
			Sheet: rig.MotorSheet{MassKg: nan, SystemV: 36, TorqueNmPerA: nan, WindingOhm: nan, MaxPackA: nan, EaseFromC: nan, EaseToC: nan, CaseWPerK: nan},
			Pack:  rig.PackSheet{EnergyWh: 500, Health: 1, ResistanceOhm: nan, MaxA: nan},
			Places: rig.Places{WheelbaseM: 1.12, BikeAheadM: 0.50, BikeHeightM: 0.55, RiderAheadM: 0.42, RiderHeightM: 1.10,
				RackAheadM: -0.05, RackHeightM: 0.80, BoxAheadM: 1.1, BoxHeightM: 0.60},
			FrontBrake: "hydraulic-180", RearBrake: "hydraulic-160", FrontBrakeShare: 0.6,
		},
		rider: rider.Rider{MassKg: 80, PowerW: 110, CadenceLow: 45, CadenceLiked: 70, CadenceHigh: 100, CrankM: 0.17, HoldMps: 1.4, CriticalW: 180, ReserveJ: 15000},
		day:   rig.Day{TemperatureC: 15, Humidity: 0.6, AltitudeM: nan, DensityKgM3: nan, WindFromDeg: nan, Ground: "asphalt-dry", Mu: nan, PackC: nan},
		level: 4,
	}
}

func (p parts) rig() *rig.Rig {
	law, _ := rule.ByID("eu-25")
	r, err := rig.New(p.bike, p.rider, p.load, p.day, law, p.level, 0)
	if err != nil {
		panic(err)
	}
	return r
}

// pusher is a rig of 100 kg without any drag or motor whose rider pulls with
// pullN until their power is reached.
func pusher(pullN, watts float64) *rig.Rig {
	p := trekking()
	p.level = 0
	p.bike.Motor.Kind = motor.None
	p.bike.MassKg, p.bike.WheelInertiaKgM2 = 20, 0
	p.bike.Train = gear.Train{Rings: []int{20}, Sprockets: []int{20}, Efficiency: 1}
	p.rider.PowerW, p.rider.CadenceHigh, p.rider.CriticalW = watts, 1e6, 1e6
	p.day.Mu = 50
	p.bike.Places.RiderAheadM, p.bike.Places.RiderHeightM, p.bike.Places.BikeHeightM = 0.6, 0.01, 0.01
	p.bike.RolloutM = 2 * math.Pi * p.rider.TorqueLimit() / pullN
	r := p.rig()
	r.Road.Crr, r.Road.DragM2, r.Road.WheelDragM2, r.Road.BearingFactor = 0, 0, 0, 0
	return r
}

var usual = Options{DownMps: 25 / 3.6, Charge: 1, Reserve: 0.15, SightM: 30, ReactS: 0.8}

// fresh is a rig's state at rest with a full pack.
func fresh(r *rig.Rig) *rig.Body {
	b := r.Fresh(1)
	return &b
}
