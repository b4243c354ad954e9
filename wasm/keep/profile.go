package keep

import (
	"math"

	"hillwright/physics/hill"
	"hillwright/physics/unit"
)

// Name gives a thing's name in a language, or else its name for the rest, or
// else its id.
func (t *Thing) Name(lang string) string { return nameIn(t.Names, lang, t.ID) }

// Name gives a hill's name in a language; see Thing.Name.
func (h *Hill) Name(lang string) string { return nameIn(h.Names, lang, h.ID) }

func nameIn(names map[string]string, lang, id string) string {
	for _, name := range []string{names[lang], names[""], names["en"]} {
		if name != "" {
			return name
		}
	}
	for _, l := range sorted(names) {
		return names[l]
	}
	return id
}

// Profile makes the stored hill one to ride on. It returns a Fault when edges
// and heights do not make a hill.
func (h *Hill) Profile(lang string) (*hill.Profile, error) {
	if wrong := h.wrong(); wrong != "" {
		return nil, Fault{BadHill, h.Name(lang), wrong}
	}
	p := &hill.Profile{ID: h.ID, Name: h.Name(lang), EdgeM: h.EdgeM, HeightM: h.HeightM, HeightKnown: h.HeightKnown}
	for i := 1; i < len(h.EdgeM); i++ {
		road, rise := h.EdgeM[i]-h.EdgeM[i-1], h.HeightM[i]-h.HeightM[i-1]
		p.Grade = append(p.Grade, unit.Grade(rise/math.Sqrt(road*road-rise*rise)))
	}
	for _, deg := range h.BearingDeg {
		p.BearingRad = append(p.BearingRad, deg*math.Pi/180)
	}
	return p, nil
}

// HillOf makes a profile one to be stored, under an id and a name.
func HillOf(p *hill.Profile, id, name string) Hill {
	h := Hill{ID: id, Names: map[string]string{"": name}, EdgeM: p.EdgeM, HeightM: p.HeightM, HeightKnown: p.HeightKnown}
	for _, rad := range p.BearingRad {
		h.BearingDeg = append(h.BearingDeg, rad*180/math.Pi)
	}
	return h
}
