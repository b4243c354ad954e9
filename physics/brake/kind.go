package brake

import (
	"math"

	"hillwright/physics/unit"
)

// Kind is a sort of brake with its class defaults. MassKg is the mass of what
// takes up the heat [kg], AreaM2 its surface in the air [m²], LengthM how far
// the air runs along it [m], SpecificJKgK its specific heat. Stir is how much
// better the moving air cools it than a flat plate (holes, arms, turning).
// IntoIt is the part of the braking power that warms it; the rest goes by pads,
// caliper and hub.
// CautionC is the temperature at which a rider should be told, FadeC that at
// which the brake has lost half its force [°C]. FullN is the force at the tyre
// that a hand, or a foot, gets out of it cold and dry [N], WetShare what is
// left of that when it is wet.
//
// Masses and areas are near those of parts on the scale; Stir, IntoIt, the
// temperatures and the forces are common practice, no source.
type Kind struct {
	ID           string
	MassKg       unit.Band
	SpecificJKgK float64
	AreaM2       float64
	LengthM      float64
	Stir         unit.Band
	IntoIt       unit.Band
	CautionC     unit.Band
	FadeC        unit.Band
	FullN        unit.Band
	WetShare     unit.Band
}

const (
	steel   = 470 // specific heat of steel [J/(kg·K)], from memory
	alloy   = 900 // of aluminium [J/(kg·K)], from memory
	ironHub = 500 // of a hub shell of steel and alloy [J/(kg·K)], assumed
)

var (
	discStir    = unit.Band{Low: 1.5, Usual: 2.5, High: 3.5}
	discInto    = unit.Band{Low: 0.80, Usual: 0.90, High: 0.97}
	discCaution = unit.Band{Low: 180, Usual: 200, High: 230}
	discFade    = unit.Band{Low: 250, Usual: 280, High: 330}
	discWet     = unit.Band{Low: 0.70, Usual: 0.85, High: 1.0}
)

var kinds = []Kind{
	{ID: "hydraulic-160", MassKg: unit.Band{Low: 0.09, Usual: 0.11, High: 0.13}, SpecificJKgK: steel, AreaM2: 0.0165, LengthM: 0.160,
		Stir: discStir, IntoIt: discInto, CautionC: discCaution, FadeC: discFade, FullN: unit.Band{Low: 350, Usual: 450, High: 600}, WetShare: discWet},
	{ID: "hydraulic-180", MassKg: unit.Band{Low: 0.115, Usual: 0.14, High: 0.165}, SpecificJKgK: steel, AreaM2: 0.0205, LengthM: 0.180,
		Stir: discStir, IntoIt: discInto, CautionC: discCaution, FadeC: discFade, FullN: unit.Band{Low: 400, Usual: 520, High: 680}, WetShare: discWet},
	{ID: "hydraulic-203", MassKg: unit.Band{Low: 0.155, Usual: 0.185, High: 0.22}, SpecificJKgK: steel, AreaM2: 0.0265, LengthM: 0.203,
		Stir: discStir, IntoIt: discInto, CautionC: discCaution, FadeC: discFade, FullN: unit.Band{Low: 450, Usual: 590, High: 760}, WetShare: discWet},
	{ID: "cable-disc-160", MassKg: unit.Band{Low: 0.10, Usual: 0.125, High: 0.15}, SpecificJKgK: steel, AreaM2: 0.0175, LengthM: 0.160,
		Stir: discStir, IntoIt: discInto, CautionC: discCaution, FadeC: discFade, FullN: unit.Band{Low: 250, Usual: 340, High: 450}, WetShare: discWet},
	{ID: "rim", MassKg: unit.Band{Low: 0.40, Usual: 0.50, High: 0.65}, SpecificJKgK: alloy, AreaM2: 0.12, LengthM: 0.025,
		Stir: unit.Band{Low: 0.6, Usual: 1.0, High: 1.5}, IntoIt: unit.Band{Low: 0.85, Usual: 0.95, High: 1},
		CautionC: unit.Band{Low: 70, Usual: 80, High: 90}, FadeC: unit.Band{Low: 90, Usual: 100, High: 130},
		FullN: unit.Band{Low: 260, Usual: 350, High: 480}, WetShare: unit.Band{Low: 0.25, Usual: 0.45, High: 0.70}},
	{ID: "drum", MassKg: unit.Band{Low: 0.6, Usual: 0.8, High: 1.1}, SpecificJKgK: ironHub, AreaM2: 0.030, LengthM: 0.09,
		Stir: unit.Band{Low: 0.5, Usual: 0.8, High: 1.2}, IntoIt: unit.Band{Low: 0.85, Usual: 0.95, High: 1},
		CautionC: unit.Band{Low: 100, Usual: 120, High: 150}, FadeC: unit.Band{Low: 150, Usual: 180, High: 230},
		FullN: unit.Band{Low: 170, Usual: 240, High: 330}, WetShare: unit.Band{Low: 0.95, Usual: 1, High: 1}},
	{ID: "coaster", MassKg: unit.Band{Low: 0.5, Usual: 0.7, High: 0.9}, SpecificJKgK: ironHub, AreaM2: 0.020, LengthM: 0.07,
		Stir: unit.Band{Low: 0.5, Usual: 0.8, High: 1.2}, IntoIt: unit.Band{Low: 0.85, Usual: 0.95, High: 1},
		CautionC: unit.Band{Low: 90, Usual: 110, High: 130}, FadeC: unit.Band{Low: 130, Usual: 160, High: 210},
		FullN: unit.Band{Low: 200, Usual: 300, High: 420}, WetShare: unit.Band{Low: 0.95, Usual: 1, High: 1}},
	{ID: "none"},
}

// Kinds gives every kind of brake; the last is "none".
func Kinds() []Kind { return append([]Kind(nil), kinds...) }

// KindByID finds a kind; ok is false when there is none of that name.
func KindByID(id string) (k Kind, ok bool) {
	for _, k := range kinds {
		if k.ID == id {
			return k, true
		}
	}
	return Kind{}, false
}

// None tells that there is no brake.
func (k *Kind) None() bool { return k.MassKg.Usual <= 0 }

// Air beside a warm brake, at about 100 °C: conductivity [W/(m·K)], kinematic
// viscosity [m²/s], Prandtl number. From memory of the usual tables.
const (
	airConductivity = 0.031
	airViscosity    = 2.3e-5
	airPrandtl      = 0.70
)

// stillWM2K is what leaves a warm brake in still air [W/(m²·K)]: about 6 by the
// air's own rising and 6 by radiation. Radiation of a surface with emissivity
// 0.5 between 200 °C and surroundings of 20 °C, σ·ε·(T²+T₀²)·(T+T₀), is 6.7;
// taken as a constant it is somewhat high for a cool brake and low, so on the
// safe side, for a hotter one.
const stillWM2K = 12

// Sink gives the brake's usual heat capacity and conductance. The wind's part
// is the mean over a flat plate in laminar flow, Nu = 0.664·Re^½·Pr^⅓ (E.
// Pohlhausen 1921, as every handbook of heat transfer has it; from memory),
// times Stir. What does not go into it (IntoIt) makes both larger by that part, so
// that a Sink takes the whole braking power. A brake of kind "none" takes no
// heat: its capacity is +Inf.
func (k *Kind) Sink() Sink { return k.SinkOf(k.MassKg.Usual, k.Stir.Usual) }

// SinkOf is Sink for a mass [kg] and a Stir that are known better.
func (k *Kind) SinkOf(massKg, stir float64) Sink {
	if k.None() {
		return Sink{CapacityJK: math.Inf(1)}
	}
	wind := 0.664 * airConductivity * math.Cbrt(airPrandtl) / math.Sqrt(airViscosity*k.LengthM)
	area := k.AreaM2 / k.IntoIt.Usual
	return Sink{CapacityJK: massKg * k.SpecificJKgK / k.IntoIt.Usual, StillWK: area * stillWM2K, WindWK: area * stir * wind}
}

// Left is the part of its force [0 to 1] that a brake keeps at a temperature
// [°C]: all of it up to the caution, half at the fade, in a straight line that
// goes on to nothing. Assumed; pads and fluids differ.
func (k *Kind) Left(tempC float64) float64 {
	over := tempC - k.CautionC.Usual
	if over <= 0 {
		return 1
	}
	left := 1 - 0.5*over/(k.FadeC.Usual-k.CautionC.Usual)
	if !(left > 0) {
		return 0
	}
	return left
}

// ForceN is the most force at the tyre [N] at a temperature [°C], wet or dry.
func (k *Kind) ForceN(tempC float64, wet bool) float64 {
	n := k.FullN.Usual * k.Left(tempC)
	if wet {
		n *= k.WetShare.Usual
	}
	return n
}
