package rider

import "hillwright/physics/unit"

// Class is a plain word for what a rider has in their legs, with the numbers
// it stands for per kilogram of body: critical power [W/kg], W′ [J/kg] and the
// power wanted on a climb when nothing else is said [W/kg].
//
// A rider of an assisted bike seldom wants more than their critical power: the
// usual WantedWKg lies below the usual CriticalWKg in every class, so W′ stays
// full and the rider does not fade. It is a steep pitch, a weak motor or a
// "push hard" that takes the wanted power above it.
type Class struct {
	ID          string
	CriticalWKg unit.Band
	ReserveJKg  unit.Band
	WantedWKg   unit.Band
}

// The bands overlap on purpose: the words are a person's own. Common practice,
// no source; the published values for trained cyclists, 3 to 5 W/kg and 150 to
// 300 J/kg (from memory), lie at and above the strong end.
var classes = []Class{
	{ID: "easy", CriticalWKg: unit.Band{Low: 1.0, Usual: 1.4, High: 1.9}, ReserveJKg: unit.Band{Low: 90, Usual: 140, High: 200}, WantedWKg: unit.Band{Low: 0.6, Usual: 0.9, High: 1.2}},
	{ID: "steady", CriticalWKg: unit.Band{Low: 1.6, Usual: 2.1, High: 2.7}, ReserveJKg: unit.Band{Low: 120, Usual: 180, High: 240}, WantedWKg: unit.Band{Low: 1.0, Usual: 1.4, High: 1.8}},
	{ID: "strong", CriticalWKg: unit.Band{Low: 2.4, Usual: 3.1, High: 3.9}, ReserveJKg: unit.Band{Low: 150, Usual: 220, High: 300}, WantedWKg: unit.Band{Low: 1.6, Usual: 2.2, High: 2.9}},
}

// Classes gives every class, the least first.
func Classes() []Class { return append([]Class(nil), classes...) }

// ClassByID finds a class ("easy", "steady", "strong"); ok is false when there
// is none of that name.
func ClassByID(id string) (c Class, ok bool) {
	for _, c := range classes {
		if c.ID == id {
			return c, true
		}
	}
	return Class{}, false
}

// Endurance is the usual endurance of a rider of this class and a body mass
// [kg].
func (c *Class) Endurance(massKg float64) Endurance {
	return Endurance{CriticalW: c.CriticalWKg.Usual * massKg, ReserveJ: c.ReserveJKg.Usual * massKg}
}
