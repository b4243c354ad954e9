package ask

import (
	"math"

	"hillwright/physics/brake"
	"hillwright/physics/gear"
	"hillwright/physics/motor"
	"hillwright/physics/rider"
	"hillwright/physics/rig"
	"hillwright/physics/road"
	"hillwright/physics/unit"
)

// Default is the question that stands before anything is chosen: a trekking
// bike with a crank motor by class defaults, a steady rider, a bag, a mild day.
// Each number is a class default, common practice, no source, unless its
// package says otherwise.
func Default() Question {
	q := Question{Source: map[string]Source{}}
	nan := math.NaN()
	q.Rider.MassKg, q.Rider.PowerW = 80, 110
	q.Rider.CadenceLow, q.Rider.CadenceLiked, q.Rider.CadenceHigh = 45, 70, 100
	q.Rider.CrankM, q.Rider.HoldMps = 0.17, 1.4
	class, _ := rider.ClassByID("steady")
	legs := class.Endurance(q.Rider.MassKg)
	q.Rider.CriticalW, q.Rider.ReserveJ = legs.CriticalW, legs.ReserveJ
	b := &q.Bike
	b.MassKg, b.Crr, b.CdAM2, b.WheelDragM2, b.WheelInertiaKgM2 = 25, 0.008, 0.55, 0.0044, 0.25
	b.Tyre, b.RolloutM = gear.Tyre{WidthMM: 47, BeadSeatMM: 622}, nan
	b.Train = gear.Train{Rings: []int{38}, Sprockets: []int{11, 13, 15, 18, 21, 24, 28, 32, 37, 42, 46}, Efficiency: 0.96}
	b.ShiftS = 0.3
	b.Motor = motor.Motor{Kind: motor.Crank, TorqueNm: 65, PowerW: 500, Levels: []float64{0.6, 1.2, 2, 3.2}, CadenceHigh: 115}
	b.Sheet = rig.MotorSheet{MassKg: nan, SystemV: 36, TorqueNmPerA: nan, WindingOhm: nan, MaxPackA: nan, EaseFromC: nan, EaseToC: nan, CaseWPerK: nan}
	b.Pack = rig.PackSheet{EnergyWh: 500, Health: 1, ResistanceOhm: nan, MaxA: nan}
	b.Places = rig.Places{
		WheelbaseM: 1.12, BikeAheadM: 0.50, BikeHeightM: 0.55, RiderAheadM: 0.42, RiderHeightM: 1.10,
		RackAheadM: -0.05, RackHeightM: 0.80, BoxAheadM: 1.10, BoxHeightM: 0.60,
	}
	b.FrontBrake, b.RearBrake, b.FrontBrakeShare = "hydraulic-180", "hydraulic-160", brake.FrontShare().Usual
	q.Day.TemperatureC, q.Day.Humidity = unit.Celsius(15), 0.6
	q.Day.AltitudeM, q.Day.DensityKgM3, q.Day.WindFromDeg = nan, nan, nan
	q.Day.Ground, q.Day.Mu, q.Day.PackC = "asphalt-dry", nan, nan
	q.Ride = Ride{
		Level: highestLevel, DownMps: 25 / 3.6, LawID: "eu-25", Charge: 1, ChargeKept: 0.15, Trips: 1,
		SightM: road.SightM().Usual, ReactS: road.ReactionS().Usual,
	}
	q.Coast = Coast{
		ClicksPerTurn: nan, CircumferenceM: nan, MassKg: nan, MassErrorKg: nan, Grade: nan, GradeError: nan,
		WindErrorMps: 0.5, RolledTurns: 5,
	}
	return q
}
