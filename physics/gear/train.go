package gear

import (
	"sort"
	"strconv"
)

// Train is the way from the cranks to the driven wheel. Rings and Sprockets
// are tooth counts; HubRatios are the ratios of a hub or bottom-bracket gear,
// empty when there is none; Efficiency is the share of crank power that
// reaches the wheel.
type Train struct {
	Rings      []int
	Sprockets  []int
	HubRatios  []float64
	Efficiency float64
}

// Gear is one gear: Ratio is wheel turns per crank turn.
type Gear struct {
	Label string
	Ratio float64
}

// Development is the road covered per crank turn [m] with a wheel of the given
// circumference [m].
func (g Gear) Development(circumferenceM float64) float64 { return g.Ratio * circumferenceM }

// same is how near two ratios may lie before one of them is no gear of its
// own: a rider does not shift for 2 %.
const same = 1.02

// Gears lists the gears, easiest first. Of gears that are nearly alike (2 %)
// the one that came first in tooth order stays.
func (t Train) Gears() []Gear {
	hubs := t.HubRatios
	if len(hubs) == 0 {
		hubs = []float64{1}
	}
	var all []Gear
	for _, ring := range t.Rings {
		for _, sprocket := range t.Sprockets {
			for i, hub := range hubs {
				label := strconv.Itoa(ring) + "/" + strconv.Itoa(sprocket)
				if len(t.HubRatios) > 0 {
					label += " · " + strconv.Itoa(i+1)
				}
				all = append(all, Gear{label, float64(ring) / float64(sprocket) * hub})
			}
		}
	}
	sort.SliceStable(all, func(i, j int) bool { return all[i].Ratio < all[j].Ratio })
	var kept []Gear
	for _, g := range all {
		if len(kept) == 0 || g.Ratio > same*kept[len(kept)-1].Ratio {
			kept = append(kept, g)
		}
	}
	return kept
}
