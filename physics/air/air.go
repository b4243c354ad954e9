// Package air gives the density of the air a rider pushes through and the
// wind along the road. Start with Density.
package air

import (
	"math"

	"hillwright/physics/unit"
)

const (
	// Gas constants of dry air and of water vapour [J/(kg·K)]: ISO 2533 and
	// IAPWS (8.314462618/0.01801528).
	gasDry    = 287.05287
	gasVapour = 461.5228

	// ISO 2533 / US Standard Atmosphere 1976, lowest layer.
	seaPressurePa     = 101325.0
	seaKelvin         = 288.15
	lapseKPerM        = 0.0065
	earthRadiusM      = 6356766.0
	barometerExponent = unit.Gravity / (gasDry * lapseKPerM)
)

// SaturationPressure is the vapour pressure over water [Pa] at a temperature,
// by the Magnus form of the WMO Guide to Instruments (WMO-No. 8). Valid −45 to
// 60 °C, within about 0.3 % of the reference formulations.
func SaturationPressure(t unit.Celsius) float64 {
	c := float64(t)
	return 611.2 * math.Exp(17.62*c/(243.12+c))
}

// StandardPressure is the pressure [Pa] at a geometric altitude [m] in the
// standard atmosphere of ISO 2533. Valid −1000 to 11000 m.
func StandardPressure(altitudeM float64) float64 {
	return seaPressurePa * math.Pow(standardKelvin(altitudeM)/seaKelvin, barometerExponent)
}

// StandardTemperature is the temperature at a geometric altitude [m] in the
// standard atmosphere of ISO 2533. Valid −1000 to 11000 m.
func StandardTemperature(altitudeM float64) unit.Celsius {
	return unit.Celsius(standardKelvin(altitudeM) - 273.15)
}

func standardKelvin(altitudeM float64) float64 {
	geopotential := earthRadiusM * altitudeM / (earthRadiusM + altitudeM)
	return seaKelvin - lapseKPerM*geopotential
}

// Density is the density of moist air [kg/m³] at a temperature, a pressure
// [Pa] and a relative humidity [0 to 1], as a mixture of ideal gases (Dalton).
func Density(t unit.Celsius, pressurePa, humidity float64) float64 {
	vapour := humidity * SaturationPressure(t)
	return (pressurePa-vapour)/(gasDry*t.Kelvin()) + vapour/(gasVapour*t.Kelvin())
}

// Along splits a wind that blows from a direction [rad, clockwise from north]
// at speedMps against a road's bearing [rad]: head is the part against the
// rider (positive slows), cross the part from the side.
func Along(speedMps, fromRad, bearingRad float64) (head, cross float64) {
	sin, cos := math.Sincos(fromRad - bearingRad)
	return speedMps * cos, speedMps * sin
}
