package hill

import "math"

// WGS84: equatorial radius [m] and flattening (NGA.STND.0036, 2014).
const (
	wgs84A     = 6378137.0
	wgs84F     = 1 / 298.257223563
	wgs84E2    = wgs84F * (2 - wgs84F)                   // first eccentricity squared
	wgs84Prime = wgs84E2 / ((1 - wgs84F) * (1 - wgs84F)) // second eccentricity squared
)

// leg gives the length of the geodesic from a to b on the WGS84 ellipsoid [m].
// Formula: B. R. Bowring, The direct and inverse problems for short geodesic
// lines on the ellipsoid, Surveying and Mapping 41 (1981) 135–141. Against an
// independent geodesic library (see the test) it holds to 1 mm up to 100 km.
func leg(a, b *Point) float64 {
	l := shortLine(a, b)
	return l.lengthM()
}

// bearing gives the direction of the geodesic from a to b, at a [rad, clockwise
// from north, 0 to 2π]; at one place it says nothing.
func bearing(a, b *Point) float64 {
	l := shortLine(a, b)
	return turned(math.Atan2(l.f, l.e) - math.Atan2(l.sinW*(l.sin*l.cosD+l.b*l.cos*l.sinD), l.a*l.cosW*l.cosD))
}

// short holds the quantities of Bowring's paper, by its letters.
type short struct {
	sin, cos               float64 // of the latitude of the first point
	a, b                   float64
	sinW, cosW, sinD, cosD float64
	e, f                   float64
}

func shortLine(a, b *Point) (l short) {
	const rad = math.Pi / 180
	dLat := (b.LatDeg - a.LatDeg) * rad
	dLon := b.LonDeg - a.LonDeg
	if dLon > 180 { // across the date line
		dLon -= 360
	} else if dLon < -180 {
		dLon += 360
	}
	lat := a.LatDeg * rad
	l.sin, l.cos = math.Sincos(lat)
	cos2 := l.cos * l.cos
	b2 := 1 + wgs84Prime*cos2
	l.a, l.b = math.Sqrt(1+wgs84Prime*cos2*cos2), math.Sqrt(b2)
	l.sinW, l.cosW = math.Sincos(l.a * dLon * rad / 2)
	l.sinD, l.cosD = math.Sincos(dLat / (2 * l.b) * (1 + 3*wgs84Prime/(4*b2)*dLat*math.Sin(2*lat+2*dLat/3)))
	l.e = l.sinD * l.cosW
	l.f = l.sinW * (l.b*l.cos*l.cosD - l.sin*l.sinD) / l.a
	return l
}

func (l *short) lengthM() float64 {
	c := math.Sqrt(1 + wgs84Prime)
	return wgs84A * c * 2 * math.Asin(min(1, math.Sqrt(l.e*l.e+l.f*l.f))) / (l.b * l.b)
}

// Apart gives how far two points lie apart on the WGS84 ellipsoid [m], whatever
// their heights; to 1 mm up to 100 km.
func Apart(a, b Point) float64 { return leg(&a, &b) }
