package words

import (
	"math"

	"hillwright/physics/unit"
)

// Exact by definition: the international foot and pound (1959 agreement), and
// the pound-force from them and standard gravity.
const (
	metresPerFoot    = 0.3048
	metresPerInch    = metresPerFoot / 12
	kgPerPound       = 0.45359237
	newtonPerPound   = kgPerPound * unit.Gravity
	newtonMetrePerLF = newtonPerPound * metresPerFoot
	joulePerWh       = 3600
)

// Speed writes a speed [m/s] in km/h or mph, with one decimal.
func (v Voice) Speed(mps float64) string {
	value, unitName := v.speedIn(mps)
	return v.with(v.Number(value, 1), unitName)
}

func (v Voice) speedIn(mps float64) (value float64, unitName string) {
	if v.Units == Imperial {
		return unit.Speed(mps).MPH(), "mph"
	}
	return unit.Speed(mps).KMH(), "km/h"
}

// Length writes a length along the road [m]: m below a kilometre, then km; ft
// below a fifth of a mile, then mi.
func (v Voice) Length(m float64) string {
	if v.Units == Imperial {
		if ft := m / metresPerFoot; math.Round(math.Abs(ft)) < 1056 {
			return v.with(v.Number(ft, 0), "ft")
		}
		mi := m / unit.MetresPerMile
		return v.with(v.Number(mi, decimals(mi, step{10, 2}, step{100, 1})), "mi")
	}
	if math.Round(math.Abs(m)) < 1000 {
		return v.with(v.short(m, decimals(m, step{10, 1})), "m")
	}
	return v.with(v.Number(m/1000, decimals(m/1000, step{10, 2}, step{100, 1})), "km")
}

// Height writes a height or an ascent [m] in m or ft.
func (v Voice) Height(m float64) string {
	if v.Units == Imperial {
		return v.with(v.Number(m/metresPerFoot, 0), "ft")
	}
	return v.with(v.short(m, decimals(m, step{10, 1})), "m")
}

// Mass writes a mass [kg] in kg to a tenth, or in whole lb.
func (v Voice) Mass(kg float64) string {
	if v.Units == Imperial {
		return v.with(v.Number(kg/kgPerPound, 0), "lb")
	}
	return v.with(v.short(kg, 1), "kg")
}

// Grade writes a grade in per cent: one decimal below 10 %, none from there.
func (v Voice) Grade(g unit.Grade) string {
	p := float64(g) * 100
	return v.with(v.Number(p, decimals(p, step{10, 1})), "%")
}

// Power writes a power [W].
func (v Voice) Power(w float64) string { return v.with(v.Number(w, 0), "W") }

// Pull writes a force along the road [N] in N or lbf.
func (v Voice) Pull(n float64) string {
	if v.Units == Imperial {
		lbf := n / newtonPerPound
		return v.with(v.Number(lbf, decimals(lbf, step{100, 1})), "lbf")
	}
	return v.with(v.Number(n, 0), "N")
}

// Temperature writes a temperature in whole °C or °F.
func (v Voice) Temperature(c unit.Celsius) string {
	if v.Units == Imperial {
		return v.with(v.Number(float64(c)*1.8+32, 0), "°F")
	}
	return v.with(v.Number(float64(c), 0), "°C")
}

// Duration writes a time [s]: "42 s", "4 min 10 s", "1 h 5 min".
func (v Voice) Duration(s float64) string {
	if math.IsNaN(s) || math.IsInf(s, 0) {
		return dash
	}
	total := math.Round(math.Abs(s))
	sign := ""
	if s < 0 && total > 0 {
		sign = minus
	}
	two := func(big float64, bigUnit string, small float64, smallUnit string) string {
		text := sign + v.with(v.Number(big, 0), bigUnit)
		if small > 0 {
			text += wide + v.with(v.Number(small, 0), smallUnit)
		}
		return text
	}
	switch {
	case total < 60:
		return sign + v.with(v.Number(total, 0), "s")
	case total < 3600:
		return two(math.Floor(total/60), "min", math.Mod(total, 60), "s")
	}
	minutes := math.Round(total / 60)
	return two(math.Floor(minutes/60), "h", math.Mod(minutes, 60), "min")
}

// About writes a time [s] no more exactly than a forecast deserves: to half a
// minute up to ten, to a minute up to the hour, then to five.
func (v Voice) About(s float64) string {
	to := 300.0
	switch {
	case s < 600:
		to = 30
	case s < 3600:
		to = 60
	}
	return v.Duration(math.Max(to, math.Round(s/to)*to))
}

// Energy writes an energy given in joule as watt-hours.
func (v Voice) Energy(joule float64) string {
	wh := joule / joulePerWh
	return v.with(v.Number(wh, decimals(wh, step{10, 1})), "Wh")
}

// Percent writes a part (0.36) in whole per cent.
func (v Voice) Percent(part float64) string { return v.with(v.Number(part*100, 0), "%") }

// Cadence writes a cadence [crank turns/min].
func (v Voice) Cadence(rpm float64) string {
	return v.with(v.Number(rpm, 0), v.text(UnitTurnsPerMin))
}

// Headroom says how much of a limit's pull is to spare (ride.Peg.Headroom), or
// how much is missing. Below 1 % it shows a tenth, so that a little too little
// never reads as nothing.
func (v Voice) Headroom(part float64) string {
	p := math.Abs(part) * 100
	text := v.with(v.Number(p, decimals(p, step{1, 1})), "%")
	switch {
	case text == dash:
		return dash
	case part < 0:
		return v.Say(HeadroomShort, text)
	}
	return v.Say(HeadroomLeft, text)
}
