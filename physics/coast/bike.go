package coast

import (
	"hillwright/physics/road"
	"hillwright/physics/unit"
)

// Bike gives a bike's own Crr and CdA such that the road load of package road,
// which has bearings, the wheels' drag [m²] and the load's [m²] apart, resists
// as the result does over the speeds of its runs: bearings, which grow with
// speed, are shared between the two.
func (r *Result) Bike(s *Setup, wheelDragM2, loadDragM2 float64) (crr, cdaM2 Estimate) {
	middle, n := 0.0, 0.0
	for i := range r.Runs {
		middle += (r.Runs[i].StartMps + r.Runs[i].EndMps) / 2
		n++
	}
	middle /= n
	// A line a + b·v is a + b·v̄/2 + b·v²/(2·v̄) where it touches, at v̄.
	still := road.Bearings(0)
	by := (road.Bearings(middle) - still) / middle
	crr = r.Crr.less((still + by*middle/2) / (s.MassKg.Value * unit.Gravity))
	cdaM2 = r.CdAM2.less(wheelDragM2 + loadDragM2 + by/middle/s.DensityKgM3.Value)
	return crr, cdaM2
}

func (e Estimate) less(by float64) Estimate {
	e.Value -= by
	e.Low -= by
	e.High -= by
	return e
}
