package coast

import (
	"math"

	"hillwright/physics/road"
	"hillwright/physics/unit"
)

// SpunMps is the speed of the tyre at which a wheel's drag is told: 25 km/h.
const SpunMps = 25 / 3.6

// Spun is how a wheel on a stand slows: the torque that does not change with
// speed [N·m], the power [W] and the force at the tyre [N] that turning it at
// 25 km/h costs, the time from there to rest [s]. Typical is the power of a
// wheel in order, Low to High. Drags tells that this one costs more.
type Spun struct {
	TorqueNm, PowerW, ForceN, RestS Estimate
	Typical                         Estimate
	Drags                           bool
	Fit                             RunFit
}

// Band around what good bearings and the wheel's own wind cost. Common
// practice, no source: seals, grease and a hub gear differ by so much.
const typicalLow, typicalHigh = 0.4, 3

// wheelWindM2 is the drag area of one turning wheel [m²]: half of the pair's in
// Martin et al. 1998.
const wheelWindM2 = 0.0022

// Spin judges a wheel that spins down on a stand, by the speed of its tyre, its
// moment of inertia [kg·m²], its circumference [m] and the air's density
// [kg/m³]. The error is an *Error.
func Spin(points []Point, inertiaKgM2 Value, circumferenceM, densityKgM3 float64) (*Spun, error) {
	radius := circumferenceM / (2 * math.Pi)
	asMass := inertiaKgM2.Value / (radius * radius)
	runs := []Run{{Points: points}}
	if err := checked(0, &runs[0]); err != nil {
		return nil, err
	}
	if !finite(asMass, densityKgM3) || !(asMass > 0) || !(densityKgM3 > 0) || !(inertiaKgM2.Error >= 0) {
		return nil, &Error{Kind: BadNumber}
	}
	// A wheel slows by the equation of a bike whose mass is its inertia's.
	s := Setup{
		MassKg: Value{Value: asMass}, DensityKgM3: Value{Value: densityKgM3}, CircumferencePart: Value{Value: 1},
		Crr: Value{Value: 0.01}, CdAM2: Value{Value: 0.005},
	}
	q, err := solve(runs, &s, false, false)
	if err != nil {
		return nil, err
	}
	known := inertiaKgM2.Error / inertiaKgM2.Value
	force := func(crr, cda, v float64) float64 { return asMass*unit.Gravity*crr + 0.5*densityKgM3*cda*v*v }
	out := &Spun{Fit: q.runFit(0)}
	out.TorqueNm = q.derived(func(crr, cda float64) float64 { return radius * force(crr, cda, 0) }, known)
	out.ForceN = q.derived(func(crr, cda float64) float64 { return force(crr, cda, SpunMps) }, known)
	out.PowerW = q.derived(func(crr, cda float64) float64 { return SpunMps * force(crr, cda, SpunMps) }, known)
	out.RestS = q.derived(func(crr, cda float64) float64 { return restS(unit.Gravity*crr, 0.5*densityKgM3*cda/asMass) }, 0)
	usual := SpunMps * (road.Bearings(SpunMps)/2 + 0.5*densityKgM3*wheelWindM2*SpunMps*SpunMps)
	out.Typical = Estimate{Value: usual, Low: typicalLow * usual, High: typicalHigh * usual}
	out.Drags = out.PowerW.Value > out.Typical.High
	return out, nil
}

// restS is the time in which even + square·v² brings 25 km/h to rest [s].
func restS(even, square float64) float64 {
	even = math.Max(even, 1e-4)
	if square <= 1e-9 {
		return SpunMps / even
	}
	return math.Atan(SpunMps*math.Sqrt(square/even)) / math.Sqrt(even*square)
}

// derived is a number that follows from Crr and CdA, with what is not known of
// them, and of a factor before it, a part.
func (q *problem) derived(f func(crr, cda float64) float64, part float64) Estimate {
	crr, cda := q.p[pCrr], q.p[pCdA]
	v := f(crr, cda)
	e1, e2 := math.Max(1e-7, 1e-3*math.Abs(crr)), math.Max(1e-7, 1e-3*math.Abs(cda))
	d := [2]float64{(f(crr+e1, cda) - f(crr-e1, cda)) / (2 * e1), (f(crr, cda+e2) - f(crr, cda-e2)) / (2 * e2)}
	place := [2]int{-1, -1}
	for i, at := range q.free {
		if at == pCrr || at == pCdA {
			place[at] = i
		}
	}
	variance := part * part * v * v
	for i := range 2 {
		for k := range 2 {
			variance += d[i] * d[k] * *q.cov.at(place[i], place[k])
		}
	}
	e := math.Sqrt(math.Max(0, variance))
	return Estimate{Value: v, Low: math.Max(0, v-intervalFactor*e), High: v + intervalFactor*e, Error: e}
}
