package rider

import "hillwright/physics/unit"

// PushShare is how hard a person on foot pushes a bike uphill for some
// minutes, as a share of their own weight. Common practice, no source.
func PushShare() unit.Band { return unit.Band{Low: 0.07, Usual: 0.12, High: 0.20} }

// PushN is the usual push along the road [N] of a person on foot with a body
// mass [kg]. Their own weight is carried by their own legs: against it stands
// the road load of the bike and what it carries, with the motor's pull at
// walking speed added where there is walk assistance.
func PushN(massKg float64) float64 { return PushShare().Usual * massKg * unit.Gravity }
