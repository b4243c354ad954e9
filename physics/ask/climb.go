package ask

import (
	"math"

	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/rule"
	"hillwright/physics/unit"
)

// Rig puts the question's parts together. altitudeM is where the ride is when
// the day does not say [m].
func (q *Question) Rig(altitudeM float64) (*rig.Rig, error) {
	law, ok := rule.ByID(q.Ride.LawID)
	if !ok {
		in, _ := InputAt("ride.law")
		return nil, &Problem{Kind: NotAChoice, Path: "ride.law", Got: q.Ride.LawID, Input: in}
	}
	return rig.New(q.Bike, q.Rider, q.Load, q.Day, law, q.level(), altitudeM)
}

func (q *Question) level() int {
	if q.Ride.Level == highestLevel {
		return len(q.Bike.Motor.Levels)
	}
	return q.Ride.Level
}

func (q *Question) options() ride.Options {
	o := &q.Ride
	return ride.Options{
		StartMps: o.StartMps, DownMps: o.DownMps, Charge: o.Charge, Reserve: o.ChargeKept,
		Back: o.Back, Trips: int(math.Round(o.Trips)), PauseS: o.PauseS, Recover: o.Recover, SightM: o.SightM, ReactS: o.ReactS,
	}
}

// Climb answers the question for a hill.
func (q *Question) Climb(p *hill.Profile) (*rig.Rig, *ride.Answer, error) {
	r, err := q.Rig(middleHeight(p))
	if err != nil {
		return nil, nil, err
	}
	a, err := ride.Climb(r, p, q.options())
	if err != nil {
		return nil, nil, err
	}
	return r, &a, nil
}

// middleHeight is where the air of a ride is taken [m]: half-way between its
// lowest and its highest place; the density differs by 1 % for 80 m.
func middleHeight(p *hill.Profile) float64 {
	if !p.HeightKnown || len(p.HeightM) == 0 {
		return 0
	}
	low, high := p.HeightM[0], p.HeightM[0]
	for _, h := range p.HeightM {
		low, high = min(low, h), max(high, h)
	}
	return (low + high) / 2
}

// Steady answers the question for one grade that goes on.
func (q *Question) Steady(g unit.Grade) (*rig.Rig, *ride.SteadyAnswer, error) {
	r, err := q.Rig(0)
	if err != nil {
		return nil, nil, err
	}
	a := ride.Steady(r, g, q.options())
	return r, &a, nil
}
