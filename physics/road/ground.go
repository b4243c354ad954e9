package road

import "hillwright/physics/unit"

// Ground is what the road is made of: the friction coefficient of a tyre on
// it, rolling, just before it slips. Wet tells that the brakes are wet too.
type Ground struct {
	ID  string
	Mu  unit.Band
	Wet bool
}

// From memory, as such lists stand in handbooks of road safety and of bicycle
// engineering; they were not looked up, and tyre, pressure and temperature move
// them as widely as the bands say.
var grounds = []Ground{
	{"asphalt-dry", unit.Band{Low: 0.65, Usual: 0.80, High: 0.90}, false},
	{"asphalt-wet", unit.Band{Low: 0.40, Usual: 0.55, High: 0.70}, true},
	{"cobbles-dry", unit.Band{Low: 0.50, Usual: 0.60, High: 0.75}, false},
	{"cobbles-wet", unit.Band{Low: 0.25, Usual: 0.40, High: 0.50}, true},
	{"gravel-dry", unit.Band{Low: 0.35, Usual: 0.50, High: 0.60}, false},
	{"gravel-wet", unit.Band{Low: 0.30, Usual: 0.42, High: 0.55}, true},
	{"leaves-wet", unit.Band{Low: 0.12, Usual: 0.20, High: 0.30}, true},
	{"mud", unit.Band{Low: 0.15, Usual: 0.25, High: 0.40}, true},
	{"snow", unit.Band{Low: 0.12, Usual: 0.20, High: 0.30}, true},
}

// Grounds gives every ground, the best roads first, each dry before wet.
func Grounds() []Ground { return append([]Ground(nil), grounds...) }

// GroundByID finds a ground; ok is false when there is none of that name.
func GroundByID(id string) (g Ground, ok bool) {
	for _, g := range grounds {
		if g.ID == id {
			return g, true
		}
	}
	return Ground{}, false
}
