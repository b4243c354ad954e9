package words

import (
	"math"

	"hillwright/physics/unit"
)

// scale is how an SI quantity of an input is shown in one system of units:
// shown = si·times + plus, in a unit. A unit's name that differs by language
// is a key.
type scale struct {
	times, plus float64
	unit        string
	unitKey     Key // used when unit is empty and named is true
	named       bool
}

// shown is a quantity's scale by system of units.
type shown [2]scale

func both(s scale) shown { return shown{s, s} }

var (
	asIs        = both(scale{times: 1})
	asWatt      = both(scale{times: 1, unit: "W"})
	asWattHours = both(scale{times: 1, unit: "Wh"})
	asSeconds   = both(scale{times: 1, unit: "s"})
	asPercent   = both(scale{times: 100, unit: "%"})
	asArea      = both(scale{times: 1, unit: "m²"})
	asInertia   = both(scale{times: 1, unit: "kg·m²"})
	asDensity   = both(scale{times: 1, unit: "kg/m³"})
	asDegrees   = both(scale{times: 1, unit: "°"})
	asMM        = both(scale{times: 1000, unit: "mm"})
	asTyre      = both(scale{times: 1, unit: "mm"})
	asCadence   = both(scale{times: 1, unitKey: UnitTurnsPerMin, named: true})
	asTeeth     = both(scale{times: 1, unitKey: UnitTeeth, named: true})
	asMass      = shown{{times: 1, unit: "kg"}, {times: 1 / kgPerPound, unit: "lb"}}
	asHeight    = shown{{times: 1, unit: "m"}, {times: 1 / metresPerFoot, unit: "ft"}}
	asSpeed     = shown{{times: 3.6, unit: "km/h"}, {times: 3600 / unit.MetresPerMile, unit: "mph"}}
	asTorque    = shown{{times: 1, unit: "N·m"}, {times: 1 / newtonMetrePerLF, unit: "lbf·ft"}}
	asVolt      = both(scale{times: 1, unit: "V"})
	asAmpere    = both(scale{times: 1, unit: "A"})
	asMilliohm  = both(scale{times: 1000, unit: "mΩ"})
	asPerAmpere = both(scale{times: 1, unit: "N·m/A"})
	asCooling   = both(scale{times: 1, unit: "W/K"})
	asKilojoule = both(scale{times: 1e-3, unit: "kJ"})
	asMinutes   = both(scale{times: 1. / 60, unit: "min"})
	asPlace     = shown{{times: 100, unit: "cm"}, {times: 1 / metresPerInch, unit: "in"}}
	asTemp      = shown{{times: 1, unit: "°C"}, {times: 1.8, plus: 32, unit: "°F"}}
)

// input is what a person sees of one input: its name, how it is shown, and a
// thumb's step by system of units, in the shown unit. A step of 0 means that
// the input is no number.
type input struct {
	path string
	name Key
	show shown
	step [2]float64
}

var inputs = []input{
	{"rider.mass_kg", InRiderMass, asMass, [2]float64{1, 2}},
	{"rider.power_w", InRiderPower, asWatt, [2]float64{10, 10}},
	{"rider.cadence_low_rpm", InCadenceLow, asCadence, [2]float64{1, 1}},
	{"rider.cadence_liked_rpm", InCadenceLiked, asCadence, [2]float64{1, 1}},
	{"rider.cadence_high_rpm", InCadenceHigh, asCadence, [2]float64{1, 1}},
	{"rider.crank_m", InCrank, asMM, [2]float64{2.5, 2.5}},
	{"rider.hold_speed_mps", InHoldSpeed, asSpeed, [2]float64{0.5, 0.25}},
	{"bike.mass_kg", InBikeMass, asMass, [2]float64{0.5, 1}},
	{"bike.crr", InCrr, asIs, [2]float64{0.0005, 0.0005}},
	{"bike.cda_m2", InCdA, asArea, [2]float64{0.01, 0.01}},
	{"bike.wheel_drag_m2", InWheelDrag, asArea, [2]float64{0.0005, 0.0005}},
	{"bike.wheel_inertia_kgm2", InWheelInertia, asInertia, [2]float64{0.01, 0.01}},
	{"bike.tyre", InTyre, asTyre, [2]float64{}},
	{"bike.rollout_m", InRollout, asMM, [2]float64{1, 1}},
	{"bike.chainrings", InChainrings, asTeeth, [2]float64{}},
	{"bike.sprockets", InSprockets, asTeeth, [2]float64{}},
	{"bike.hub_ratios", InHubRatios, asIs, [2]float64{}},
	{"bike.drive_efficiency", InDriveEfficiency, asPercent, [2]float64{0.5, 0.5}},
	{"bike.shift_s", InShift, asSeconds, [2]float64{0.1, 0.1}},
	{"bike.motor.kind", InMotorKind, asIs, [2]float64{}},
	{"bike.motor.torque_nm", InMotorTorque, asTorque, [2]float64{5, 5}},
	{"bike.motor.power_w", InMotorPower, asWatt, [2]float64{25, 25}},
	{"bike.motor.levels", InMotorLevels, asIs, [2]float64{}},
	{"bike.motor.cadence_high_rpm", InMotorCadence, asCadence, [2]float64{1, 1}},
	{"bike.pack.energy_wh", InPack, asWattHours, [2]float64{25, 25}},
	{"load.mass_kg", InLoadMass, asMass, [2]float64{1, 2}},
	{"load.cda_m2", InLoadCdA, asArea, [2]float64{0.01, 0.01}},
	{"day.temperature_c", InTemperature, asTemp, [2]float64{1, 2}},
	{"day.humidity", InHumidity, asPercent, [2]float64{5, 5}},
	{"day.altitude_m", InAltitude, asHeight, [2]float64{10, 50}},
	{"day.density_kgm3", InDensity, asDensity, [2]float64{0.01, 0.01}},
	{"day.wind_mps", InWind, asSpeed, [2]float64{1, 1}},
	{"day.wind_from_deg", InWindFrom, asDegrees, [2]float64{5, 5}},
	{"ride.level", InLevel, asIs, [2]float64{1, 1}},
	{"ride.start_mps", InStart, asSpeed, [2]float64{1, 1}},
	{"ride.down_mps", InDown, asSpeed, [2]float64{1, 1}},
	{"ride.law", InLaw, asIs, [2]float64{}},
	{"rider.critical_w", InCritical, asWatt, [2]float64{5, 5}},
	{"rider.reserve_j", InReserve, asKilojoule, [2]float64{0.5, 0.5}},
	{"bike.motor.direct_drive", InDirectDrive, asIs, [2]float64{}},
	{"bike.motor.voltage_v", InVoltage, asVolt, [2]float64{1, 1}},
	{"bike.motor.mass_kg", InMotorMass, asMass, [2]float64{0.1, 0.2}},
	{"bike.motor.torque_nm_per_a", InTorquePerAmp, asPerAmpere, [2]float64{0.005, 0.005}},
	{"bike.motor.winding_ohm", InWinding, asMilliohm, [2]float64{1, 1}},
	{"bike.motor.max_pack_a", InMaxPackA, asAmpere, [2]float64{1, 1}},
	{"bike.motor.ease_from_c", InEaseFrom, asTemp, [2]float64{1, 2}},
	{"bike.motor.ease_to_c", InEaseTo, asTemp, [2]float64{1, 2}},
	{"bike.motor.case_w_per_k", InCaseCooling, asCooling, [2]float64{0.05, 0.05}},
	{"bike.pack.chemistry", InChemistry, asIs, [2]float64{}},
	{"bike.pack.health", InHealth, asPercent, [2]float64{1, 1}},
	{"bike.pack.resistance_ohm", InPackOhm, asMilliohm, [2]float64{5, 5}},
	{"bike.pack.max_a", InPackMaxA, asAmpere, [2]float64{1, 1}},
	{"bike.wheelbase_m", InWheelbase, asMM, [2]float64{10, 10}},
	{"bike.mass_ahead_m", InBikeAhead, asPlace, [2]float64{1, 0.5}},
	{"bike.mass_height_m", InBikeHeight, asPlace, [2]float64{1, 0.5}},
	{"bike.rider_ahead_m", InRiderAhead, asPlace, [2]float64{1, 0.5}},
	{"bike.rider_height_m", InRiderHeight, asPlace, [2]float64{1, 0.5}},
	{"bike.rack_ahead_m", InRackAhead, asPlace, [2]float64{1, 0.5}},
	{"bike.rack_height_m", InRackHeight, asPlace, [2]float64{1, 0.5}},
	{"bike.box_ahead_m", InBoxAhead, asPlace, [2]float64{1, 0.5}},
	{"bike.box_height_m", InBoxHeight, asPlace, [2]float64{1, 0.5}},
	{"bike.front_brake", InFrontBrake, asIs, [2]float64{}},
	{"bike.rear_brake", InRearBrake, asIs, [2]float64{}},
	{"bike.front_brake_share", InFrontShare, asPercent, [2]float64{5, 5}},
	{"load.place", InLoadPlace, asIs, [2]float64{}},
	{"day.ground", InGround, asIs, [2]float64{}},
	{"day.grip", InGrip, asIs, [2]float64{0.05, 0.05}},
	{"day.pack_c", InPackTemperature, asTemp, [2]float64{1, 2}},
	{"ride.charge", InCharge, asPercent, [2]float64{5, 5}},
	{"ride.charge_kept", InChargeKept, asPercent, [2]float64{5, 5}},
	{"ride.back", InBack, asIs, [2]float64{}},
	{"ride.trips", InTrips, asIs, [2]float64{1, 1}},
	{"ride.pause_s", InPause, asMinutes, [2]float64{5, 5}},
	{"ride.recover", InRecover, asIs, [2]float64{}},
	{"ride.sight_m", InSight, asHeight, [2]float64{5, 10}},
	{"ride.reaction_s", InReaction, asSeconds, [2]float64{0.1, 0.1}},
	{"coast.clicks_per_turn", InClicks, asIs, [2]float64{1, 1}},
	{"coast.circumference_m", InAround, asMM, [2]float64{1, 1}},
	{"coast.mass_kg", InCoastMass, asMass, [2]float64{0.5, 1}},
	{"coast.mass_error_kg", InCoastMassError, asMass, [2]float64{0.5, 1}},
	{"coast.grade", InCoastGrade, asPercent, [2]float64{0.1, 0.1}},
	{"coast.grade_error", InCoastGradeError, asPercent, [2]float64{0.05, 0.05}},
	{"coast.wind_mps", InCoastWind, asSpeed, [2]float64{1, 1}},
	{"coast.wind_error_mps", InCoastWindError, asSpeed, [2]float64{0.5, 0.5}},
	{"coast.rolled_turns", InRolledTurns, asIs, [2]float64{1, 1}},
}

func inputAt(path string) (input, bool) {
	for _, in := range inputs {
		if in.path == path {
			return in, true
		}
	}
	for _, in := range dials {
		if in.path == path {
			return in, true
		}
	}
	return input{show: asIs}, false
}

func (v Voice) scaleOf(path string) scale {
	in, _ := inputAt(path)
	if v.Units == Imperial {
		return in.show[Imperial]
	}
	return in.show[Metric]
}

// Input gives the person's name of an input of physics/ask and the unit in
// which they see it ("" for none). A path that is not known is its own name.
func (v Voice) Input(path string) (name, unitName string) {
	in, ok := inputAt(path)
	if !ok {
		return path, ""
	}
	s := v.scaleOf(path)
	if s.named {
		return v.text(in.name), v.text(s.unitKey)
	}
	return v.text(in.name), s.unit
}

// Show turns an input's value as physics/ask holds it into the shown unit.
func (v Voice) Show(path string, si float64) float64 {
	s := v.scaleOf(path)
	return si*s.times + s.plus
}

// FromShown turns a value in the shown unit back into what physics/ask holds.
func (v Voice) FromShown(path string, value float64) float64 {
	s := v.scaleOf(path)
	return (value - s.plus) / s.times
}

// Step is a sensible step of the thumb for an input, in the shown unit; 0 for
// inputs that are no numbers.
func (v Voice) Step(path string) float64 {
	in, _ := inputAt(path)
	if v.Units == Imperial {
		return in.step[Imperial]
	}
	return in.step[Metric]
}

// Entry writes an input's value in the shown unit without the unit, as it
// stands in a field: to a tenth of the thumb's step, without zeros at the end.
func (v Voice) Entry(path string, si float64) string {
	places := 4
	if step := v.Step(path); step > 0 {
		places = max(0, int(math.Ceil(1-math.Log10(step))))
	}
	return v.short(v.Show(path, si), places)
}

// Value writes an input's value with its unit.
func (v Voice) Value(path string, si float64) string {
	_, unitName := v.Input(path)
	return v.with(v.Entry(path, si), unitName)
}
