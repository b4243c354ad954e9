package words

import (
	"math"

	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/road"
	"hillwright/physics/unit"
)

// heavyKg is a load of which a rider should be told [kg].
const heavyKg = 15

// Cautions are what this answer gives reason to say before riding, the most
// urgent first; downMps is the speed chosen for the way down [m/s].
func (v Voice) Cautions(r *rig.Rig, d *ride.WayDown, downMps float64) []string {
	var list []string
	if d.Falls {
		list = v.downCautions(r, d, downMps)
	}
	if r.Wet {
		list = append(list, v.text(CautionWet))
	}
	if r.Cargo.MassKg >= heavyKg {
		list = append(list, v.Say(CautionCarries, v.Mass(r.Cargo.MassKg)))
	}
	if r.Cargo.Place == rig.OnTrailer && r.Cargo.MassKg > 0 {
		list = append(list, v.text(CautionTrailer))
	}
	return list
}

func (v Voice) downCautions(r *rig.Rig, d *ride.WayDown, downMps float64) []string {
	var list []string
	if downMps > d.MostMps && d.MostMps >= walkingMps {
		list = append(list, v.Say(CautionTooFast, v.Speed(downMps), v.Speed(d.MostMps)))
	}
	if d.Warm && !neverStops(d) {
		list = append(list, v.Say(CautionFading, v.Temperature(unit.Celsius(math.Max(d.FrontPeakC, d.RearPeakC)))))
	}
	switch d.StopBy {
	case road.OverTheBars:
		list = append(list, v.text(CautionOverBars))
	case road.FrontSlides, road.BothSlide:
		list = append(list, v.text(CautionSlides))
	}
	return list
}
