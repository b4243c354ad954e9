package slope

import (
	"math"

	"hillwright/physics/hill"
)

// layTrack lays a hill out on the earth: points at the edges of its pieces and
// between them, with the heights of the hill.
func layTrack(p *hill.Profile, entries []Entry) []hill.Point {
	at := start(p, entries)
	out := []hill.Point{at}
	bearing := 0.0
	for i, grade := range p.Grade {
		if next := nextPlaced(entries, i+1); next >= 0 {
			if to := entries[next].At; hill.Apart(at, to) > 1 {
				bearing = towards(at, to)
			}
		}
		lengthM := p.EdgeM[i+1] - p.EdgeM[i]
		steps := math.Ceil(lengthM / gpxEveryM)
		stepM := lengthM / steps * grade.Cos()
		rise := (p.HeightM[i+1] - p.HeightM[i]) / steps
		for k := 1.0; k <= steps; k++ {
			at = moved(at, bearing, stepM)
			at.HeightM = p.HeightM[i] + k*rise
			out = append(out, at)
		}
	}
	return out
}

// start is where the hill begins: where its first reading was taken, or as far
// south of the first known place as the road to it is long.
func start(p *hill.Profile, entries []Entry) hill.Point {
	at := hill.Point{LatDeg: seaLatDeg, LonDeg: seaLonDeg}
	if first := nextPlaced(entries, 0); first >= 0 {
		at = entries[first].At
		for i := range first {
			at = moved(at, math.Pi, (p.EdgeM[i+1]-p.EdgeM[i])*p.Grade[i].Cos())
		}
	}
	at.HeightM, at.TimeS = p.HeightM[0], math.NaN()
	return at
}

// nextPlaced is the first entry from i on whose place is known, −1 without one.
func nextPlaced(entries []Entry, i int) int {
	for ; i < len(entries); i++ {
		if entries[i].placed() {
			return i
		}
	}
	return -1
}

// radii gives the WGS84 ellipsoid's radii of curvature at a latitude, along the
// meridian and along the parallel [m] (NGA.STND.0036, 2014).
func radii(latDeg float64) (meridian, parallel float64) {
	const a, f = 6378137.0, 1 / 298.257223563
	const e2 = f * (2 - f)
	s, c := math.Sincos(latDeg * degree)
	w := 1 - e2*s*s
	return a * (1 - e2) / (w * math.Sqrt(w)), a / math.Sqrt(w) * c
}

// moved is the place so far from another in a direction [rad from north], for
// steps that are short against the earth; it stays off the poles.
func moved(at hill.Point, bearing, distanceM float64) hill.Point {
	s, c := math.Sincos(bearing)
	meridian, _ := radii(at.LatDeg)
	lat := at.LatDeg + distanceM*c/meridian/degree
	lat = max(-mostLatDeg, min(mostLatDeg, lat))
	_, parallel := radii((at.LatDeg + lat) / 2)
	at.LonDeg = withinTurn(at.LonDeg + distanceM*s/parallel/degree)
	at.LatDeg = lat
	return at
}

// mostLatDeg is the latitude up to which tracks are laid out.
const mostLatDeg = 89.0

// towards is the direction from one place to another not far away [rad].
func towards(from, to hill.Point) float64 {
	meridian, parallel := radii((from.LatDeg + to.LatDeg) / 2)
	return math.Atan2(withinTurn(to.LonDeg-from.LonDeg)*parallel, (to.LatDeg-from.LatDeg)*meridian)
}

// withinTurn brings a longitude into −180° to 180°.
func withinTurn(deg float64) float64 { return math.Remainder(deg, 360) }
