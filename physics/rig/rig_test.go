package rig

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/gear"
	"hillwright/physics/motor"
	"hillwright/physics/rider"
	"hillwright/physics/rule"
)

func example(kind motor.Kind, level int, law string) *Rig {
	nan := math.NaN()
	b := Bike{
		MassKg: 25, Crr: 0.008, CdAM2: 0.55, Tyre: gear.Tyre{WidthMM: 47, BeadSeatMM: 622}, RolloutM: 2.2,
		Train:      gear.Train{Rings: []int{40}, Sprockets: []int{10, 20, 40}, Efficiency: 0.95},
		Motor:      motor.Motor{Kind: kind, TorqueNm: 60, PowerW: 400, Levels: []float64{1, 3}, CadenceHigh: 110},
		Sheet:      MotorSheet{MassKg: nan, SystemV: 36, TorqueNmPerA: nan, WindingOhm: nan, MaxPackA: nan, EaseFromC: nan, EaseToC: nan, CaseWPerK: nan},
		Pack:       PackSheet{EnergyWh: 500, Health: 1, ResistanceOhm: nan, MaxA: nan},
		Places:     Places{WheelbaseM: 1.12, BikeAheadM: 0.5, BikeHeightM: 0.55, RiderAheadM: 0.42, RiderHeightM: 1.1},
		FrontBrake: "hydraulic-180", RearBrake: "rim", FrontBrakeShare: 0.6,
	}
	r := rider.Rider{MassKg: 80, PowerW: 150, CadenceLow: 45, CadenceLiked: 70, CadenceHigh: 100, CrankM: 0.17, HoldMps: 1.4, CriticalW: 200, ReserveJ: 15000}
	l, _ := rule.ByID(law)
	g, err := New(b, r, Load{}, Day{TemperatureC: 15, AltitudeM: nan, DensityKgM3: nan, WindFromDeg: nan, Ground: "asphalt-dry", Mu: nan, PackC: nan}, l, level, 0)
	if err != nil {
		panic(err)
	}
	return g
}

// level is what the limits are on the level for a fresh rig with a full pack,
// on a road that holds everything.
func level(g *Rig) *Now {
	b := g.Fresh(1)
	now := g.At(&b, 0, 1)
	now.GripN, now.FrontGripN, now.LiftN = math.Inf(1), math.Inf(1), math.Inf(1)
	return &now
}

func torqueAt(g *Rig, gear int) float64 {
	pegs, _ := g.Pegs(1.4, gear, level(g))
	return pegs[Torque]
}

// Pull through gears by hand: torque × 2π × efficiency / development.
func TestCrankMotorPullsThroughTheGears(t *testing.T) {
	g := example(motor.Crank, 2, "eu-25")
	v := 1.4
	for i, development := range []float64{2.2, 4.4, 8.8} {
		pegs, _ := g.Pegs(v, i, level(g))
		cadence := v / development * 60
		riderN := g.Rider.Power(cadence) * 0.95 / v
		if want := riderN + 60*2*math.Pi*0.95/development; math.Abs(pegs[Torque]-want) > 1e-9 {
			t.Errorf("gear %d: torque allows %.3f N, by hand %.3f", i, pegs[Torque], want)
		}
		if want := riderN + 400*0.95/v; math.Abs(pegs[Power]-want) > 1e-9 {
			t.Errorf("gear %d: power allows %.3f N, by hand %.3f", i, pegs[Power], want)
		}
		if want := riderN * 4; math.Abs(pegs[Rider]-want) > 1e-9 {
			t.Errorf("gear %d: the rider at level 2 allows %.3f N, by hand %.3f", i, pegs[Rider], want)
		}
	}
}

// A hub motor's torque does not gear up: torque / radius, in every gear.
func TestHubMotorPullsPastTheGears(t *testing.T) {
	for _, kind := range []motor.Kind{motor.RearHub, motor.FrontHub} {
		g := example(kind, 2, "eu-25")
		for i := range g.Gears {
			riderN := g.Rider.Power(g.CadenceAt(1.4, i)) * 0.95 / 1.4
			if want := riderN + 60*2*math.Pi/2.2; math.Abs(torqueAt(g, i)-want) > 1e-9 {
				t.Errorf("%v, gear %d: torque allows %.3f N, by hand %.3f", kind, i, torqueAt(g, i), want)
			}
		}
	}
}

func TestWithoutMotorOnlyTheRiderPulls(t *testing.T) {
	for _, g := range []*Rig{example(motor.None, 0, "eu-25"), example(motor.Crank, 0, "eu-25")} {
		p := g.PullAt(2, 0, level(g))
		if p.MotorN != 0 || p.By != Rider || p.RiderN <= 0 {
			t.Errorf("pull %+v, want the rider's alone", p)
		}
	}
}

func TestLawEndsTheAssistance(t *testing.T) {
	g := example(motor.Crank, 2, "eu-25")
	if p := g.PullAt(25/3.6, 2, level(g)); p.MotorN > 1e-9 || p.By != CutOff {
		t.Errorf("at 25 km/h the motor still pulls %v N, decided by %v", p.MotorN, p.By)
	}
	if p := g.PullAt(20/3.6, 2, level(g)); p.MotorN <= 0 {
		t.Error("at 20 km/h the motor does not pull")
	}
	// The falling ratio: at 17 km/h motor and rider give the same.
	j := example(motor.Crank, 2, "jp-24")
	if p := j.PullAt(17/3.6, 2, level(j)); math.Abs(p.MotorN/p.RiderN-1) > 1e-9 || p.By != CutOff {
		t.Errorf("at 17 km/h motor %v N, rider %v N, decided by %v", p.MotorN, p.RiderN, p.By)
	}
}

func TestNoGearAndNoLevel(t *testing.T) {
	g := example(motor.Crank, 2, "eu-25")
	if _, err := New(g.Bike, g.Rider, g.Cargo, g.Day, g.Law, 3, 0); err != ErrLevel {
		t.Errorf("level 3 of 2 gives %v", err)
	}
	g.Bike.Train.Sprockets = nil
	if _, err := New(g.Bike, g.Rider, g.Cargo, g.Day, g.Law, 2, 0); err == nil {
		t.Error("a bike without a sprocket is taken")
	}
}

func TestPullIsTheLeastPegAndFallsWithSpeed(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		g := example(motor.Kind(rapid.IntRange(0, 3).Draw(t, "kind")), rapid.IntRange(0, 2).Draw(t, "level"), "eu-25")
		i := rapid.IntRange(0, len(g.Gears)-1).Draw(t, "gear")
		v := rapid.Float64Range(0, 20).Draw(t, "v")
		p := g.PullAt(v, i, level(g))
		pegs, _ := g.Pegs(v, i, level(g))
		if by, n := pegs.Least(); by != p.By || math.Abs(n-p.Sum()) > 1e-9*(1+n) {
			t.Fatalf("pull %+v, least peg %v at %v", p, by, n)
		}
		if p.RiderN < 0 || p.MotorN < -1e-9 || math.IsNaN(p.Sum()) {
			t.Fatalf("pull %+v", p)
		}
		if q := g.PullAt(v+0.1, i, level(g)); q.Sum() > p.Sum()+1e-9 {
			t.Fatalf("pull rises from %v to %v N with speed", p.Sum(), q.Sum())
		}
	})
}

func TestStrongestGearIsStrongest(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		g := example(motor.Crank, 2, "eu-25")
		v := rapid.Float64Range(0.1, 12).Draw(t, "v")
		most := g.PullAt(v, g.StrongestGear(v, level(g)), level(g)).Sum()
		for i := range g.Gears {
			if n := g.PullAt(v, i, level(g)).Sum(); n > most*(1+1e-8) {
				t.Fatalf("gear %d pulls %v N, the strongest %v", i, n, most)
			}
		}
		if chosen := g.PullAt(v, g.BestGear(v, level(g)), level(g)).Sum(); chosen < near*most-1e-9 {
			t.Fatalf("the chosen gear pulls %v of %v N", chosen, most)
		}
	})
}
