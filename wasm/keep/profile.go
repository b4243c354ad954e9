package keep

import (
	"math"

	"hillwright/physics/hill"
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
	var bearings []float64
	for _, deg := range h.BearingDeg {
		bearings = append(bearings, deg*math.Pi/180)
	}
	p, err := hill.FromHeights(h.EdgeM, h.HeightM, bearings)
	p.ID, p.Name, p.HeightKnown = h.ID, h.Name(lang), h.HeightKnown
	return &p, err
}

// HillOf makes a profile one to be stored, under an id and a name.
func HillOf(p *hill.Profile, id, name string) Hill {
	h := Hill{ID: id, Names: map[string]string{"": name}, EdgeM: p.EdgeM, HeightM: p.HeightM, HeightKnown: p.HeightKnown}
	for _, rad := range p.BearingRad {
		h.BearingDeg = append(h.BearingDeg, rad*180/math.Pi)
	}
	return h
}
