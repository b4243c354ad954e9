package ask

import (
	"math"
	"slices"
	"sort"
	"strconv"
	"strings"

	"hillwright/physics/brake"
	"hillwright/physics/gear"
	"hillwright/physics/motor"
	"hillwright/physics/pack"
	"hillwright/physics/rig"
	"hillwright/physics/road"
	"hillwright/physics/rule"
)

// Form is how an input is written.
type Form uint8

// The forms. Number is a decimal number with a point; Whole a whole number;
// Choice one of the input's Choices; List numbers with blanks between them;
// Tyre an ISO 5775 size such as 47-622.
const (
	Number Form = iota
	Whole
	Choice
	List
	Tyre
)

// Input describes one input: its dotted path, its unit as written in paths and
// keys, its form, the range in which the computation holds, the words allowed,
// the word that means "not given" (empty when it must be given), and how far
// it is usually off: Spread is a part of the value, or in the input's own unit
// when Absolute. Source is where its value comes from unless said otherwise.
type Input struct {
	Path      string
	Unit      string
	Form      Form
	Low, High float64
	Choices   []string
	Blank     string
	Spread    float64
	Absolute  bool
	Source    Source

	num  func(*Question) *float64
	text func(*Question) (get func() string, set func(string) bool)
}

func number(path, unitName string, low, high, spread float64, absolute bool, s Source, at func(*Question) *float64) Input {
	return Input{Path: path, Unit: unitName, Low: low, High: high, Spread: spread, Absolute: absolute, Source: s, num: at}
}

func blank(in Input, word string) Input { in.Blank = word; return in }

var catalogue = []Input{
	number("rider.mass_kg", "kg", 25, 180, 2, true, Assumed, func(q *Question) *float64 { return &q.Rider.MassKg }),
	number("rider.power_w", "W", 0, 600, 0.20, false, Assumed, func(q *Question) *float64 { return &q.Rider.PowerW }),
	number("rider.cadence_low_rpm", "rpm", 15, 90, 5, true, Assumed, func(q *Question) *float64 { return &q.Rider.CadenceLow }),
	number("rider.cadence_liked_rpm", "rpm", 30, 110, 8, true, Assumed, func(q *Question) *float64 { return &q.Rider.CadenceLiked }),
	number("rider.cadence_high_rpm", "rpm", 50, 150, 8, true, Assumed, func(q *Question) *float64 { return &q.Rider.CadenceHigh }),
	number("rider.crank_m", "m", 0.1, 0.2, 0.0025, true, Assumed, func(q *Question) *float64 { return &q.Rider.CrankM }),
	number("rider.hold_speed_mps", "m/s", 0.5, 4, 0.3, true, Assumed, func(q *Question) *float64 { return &q.Rider.HoldMps }),
	number("rider.critical_w", "W", 20, 500, 0.15, false, Assumed, func(q *Question) *float64 { return &q.Rider.CriticalW }),
	number("rider.reserve_j", "J", 2000, 40000, 0.25, false, Assumed, func(q *Question) *float64 { return &q.Rider.ReserveJ }),

	number("bike.mass_kg", "kg", 6, 120, 0.5, true, Sheet, func(q *Question) *float64 { return &q.Bike.MassKg }),
	number("bike.crr", "1", 0.001, 0.1, 0.25, false, Assumed, func(q *Question) *float64 { return &q.Bike.Crr }),
	number("bike.cda_m2", "m²", 0.1, 3, 0.12, false, Assumed, func(q *Question) *float64 { return &q.Bike.CdAM2 }),
	number("bike.wheel_drag_m2", "m²", 0, 0.05, 0.5, false, Assumed, func(q *Question) *float64 { return &q.Bike.WheelDragM2 }),
	number("bike.wheel_inertia_kgm2", "kg·m²", 0, 2, 0.3, false, Assumed, func(q *Question) *float64 { return &q.Bike.WheelInertiaKgM2 }),
	tyre(),
	blank(number("bike.rollout_m", "m", 0.5, 3, 0.003, false, Measured, func(q *Question) *float64 { return &q.Bike.RolloutM }), "tyre"),
	teeth("bike.chainrings", 14, 64, func(q *Question) *[]int { return &q.Bike.Train.Rings }),
	teeth("bike.sprockets", 8, 60, func(q *Question) *[]int { return &q.Bike.Train.Sprockets }),
	factors("bike.hub_ratios", 0.2, 8, "none", func(q *Question) *[]float64 { return &q.Bike.Train.HubRatios }),
	number("bike.drive_efficiency", "1", 0.5, 1, 0.02, false, Assumed, func(q *Question) *float64 { return &q.Bike.Train.Efficiency }),
	number("bike.shift_s", "s", 0, 3, 0.3, false, Assumed, func(q *Question) *float64 { return &q.Bike.ShiftS }),
	motorKind(),
	number("bike.motor.torque_nm", "N·m", 0, 300, 0.10, false, Sheet, func(q *Question) *float64 { return &q.Bike.Motor.TorqueNm }),
	number("bike.motor.power_w", "W", 0, 5000, 0.10, false, Sheet, func(q *Question) *float64 { return &q.Bike.Motor.PowerW }),
	factors("bike.motor.levels", 0, 10, "none", func(q *Question) *[]float64 { return &q.Bike.Motor.Levels }),
	number("bike.motor.cadence_high_rpm", "rpm", 40, 200, 5, true, Assumed, func(q *Question) *float64 { return &q.Bike.Motor.CadenceHigh }),
	yesNo("bike.motor.direct_drive", Sheet, func(q *Question) *bool { return &q.Bike.Motor.DirectDrive }),
	number("bike.motor.voltage_v", "V", 12, 100, 0.02, false, Assumed, func(q *Question) *float64 { return &q.Bike.Sheet.SystemV }),
	completed("bike.motor.mass_kg", "kg", 1, 15, func(q *Question) *float64 { return &q.Bike.Sheet.MassKg }),
	completed("bike.motor.torque_nm_per_a", "N·m/A", 0.005, 5, func(q *Question) *float64 { return &q.Bike.Sheet.TorqueNmPerA }),
	completed("bike.motor.winding_ohm", "Ω", 0.001, 2, func(q *Question) *float64 { return &q.Bike.Sheet.WindingOhm }),
	completed("bike.motor.max_pack_a", "A", 2, 200, func(q *Question) *float64 { return &q.Bike.Sheet.MaxPackA }),
	completed("bike.motor.ease_from_c", "°C", 50, 160, func(q *Question) *float64 { return &q.Bike.Sheet.EaseFromC }),
	completed("bike.motor.ease_to_c", "°C", 60, 200, func(q *Question) *float64 { return &q.Bike.Sheet.EaseToC }),
	completed("bike.motor.case_w_per_k", "W/K", 0.05, 20, func(q *Question) *float64 { return &q.Bike.Sheet.CaseWPerK }),
	number("bike.pack.energy_wh", "Wh", 0, 5000, 0.05, false, Sheet, func(q *Question) *float64 { return &q.Bike.Pack.EnergyWh }),
	chemistry(),
	number("bike.pack.health", "1", 0.3, 1, 0.08, true, Assumed, func(q *Question) *float64 { return &q.Bike.Pack.Health }),
	completed("bike.pack.resistance_ohm", "Ω", 0.005, 3, func(q *Question) *float64 { return &q.Bike.Pack.ResistanceOhm }),
	completed("bike.pack.max_a", "A", 2, 200, func(q *Question) *float64 { return &q.Bike.Pack.MaxA }),
	number("bike.wheelbase_m", "m", 0.7, 2.6, 0.02, false, Assumed, func(q *Question) *float64 { return &q.Bike.Places.WheelbaseM }),
	number("bike.mass_ahead_m", "m", -0.5, 2, 0.06, true, Assumed, func(q *Question) *float64 { return &q.Bike.Places.BikeAheadM }),
	number("bike.mass_height_m", "m", 0.2, 1.2, 0.06, true, Assumed, func(q *Question) *float64 { return &q.Bike.Places.BikeHeightM }),
	number("bike.rider_ahead_m", "m", 0, 2, 0.06, true, Assumed, func(q *Question) *float64 { return &q.Bike.Places.RiderAheadM }),
	number("bike.rider_height_m", "m", 0.5, 1.6, 0.06, true, Assumed, func(q *Question) *float64 { return &q.Bike.Places.RiderHeightM }),
	number("bike.rack_ahead_m", "m", -0.8, 1, 0.05, true, Assumed, func(q *Question) *float64 { return &q.Bike.Places.RackAheadM }),
	number("bike.rack_height_m", "m", 0.2, 1.5, 0.08, true, Assumed, func(q *Question) *float64 { return &q.Bike.Places.RackHeightM }),
	number("bike.box_ahead_m", "m", 0.3, 2.5, 0.05, true, Assumed, func(q *Question) *float64 { return &q.Bike.Places.BoxAheadM }),
	number("bike.box_height_m", "m", 0.2, 1.5, 0.08, true, Assumed, func(q *Question) *float64 { return &q.Bike.Places.BoxHeightM }),
	brakeKind("bike.front_brake", func(q *Question) *string { return &q.Bike.FrontBrake }),
	brakeKind("bike.rear_brake", func(q *Question) *string { return &q.Bike.RearBrake }),
	number("bike.front_brake_share", "1", 0, 1, 0.15, true, Assumed, func(q *Question) *float64 { return &q.Bike.FrontBrakeShare }),

	number("load.mass_kg", "kg", 0, 250, 0.10, false, Assumed, func(q *Question) *float64 { return &q.Load.MassKg }),
	number("load.cda_m2", "m²", 0, 2, 0.30, false, Assumed, func(q *Question) *float64 { return &q.Load.CdAM2 }),
	loadPlace(),

	number("day.temperature_c", "°C", -30, 50, 2, true, Assumed, func(q *Question) *float64 { return (*float64)(&q.Day.TemperatureC) }),
	number("day.humidity", "1", 0, 1, 0.15, true, Assumed, func(q *Question) *float64 { return &q.Day.Humidity }),
	blank(number("day.altitude_m", "m", -400, 6000, 30, true, Assumed, func(q *Question) *float64 { return &q.Day.AltitudeM }), "hill"),
	blank(number("day.density_kgm3", "kg/m³", 0.4, 1.7, 0.01, false, Measured, func(q *Question) *float64 { return &q.Day.DensityKgM3 }), "computed"),
	number("day.wind_mps", "m/s", -25, 25, 1, true, Assumed, func(q *Question) *float64 { return &q.Day.WindMps }),
	blank(number("day.wind_from_deg", "°", 0, 360, 20, true, Assumed, func(q *Question) *float64 { return &q.Day.WindFromDeg }), "ahead"),
	ground(),
	blank(number("day.grip", "1", 0.05, 1.2, 0.1, true, Measured, func(q *Question) *float64 { return &q.Day.Mu }), "ground"),
	blank(number("day.pack_c", "°C", -30, 60, 3, true, Measured, func(q *Question) *float64 { return &q.Day.PackC }), "day"),

	level(),
	number("ride.start_mps", "m/s", 0, 15, 0, true, Assumed, func(q *Question) *float64 { return &q.Ride.StartMps }),
	number("ride.down_mps", "m/s", 1, 25, 1, true, Assumed, func(q *Question) *float64 { return &q.Ride.DownMps }),
	law(),
	number("ride.charge", "1", 0, 1, 0.03, true, Assumed, func(q *Question) *float64 { return &q.Ride.Charge }),
	number("ride.charge_kept", "1", 0, 0.9, 0, true, Assumed, func(q *Question) *float64 { return &q.Ride.ChargeKept }),
	yesNo("ride.back", Assumed, func(q *Question) *bool { return &q.Ride.Back }),
	number("ride.trips", "1", 1, 30, 0, true, Assumed, func(q *Question) *float64 { return &q.Ride.Trips }),
	number("ride.pause_s", "s", 0, 86400, 0, true, Assumed, func(q *Question) *float64 { return &q.Ride.PauseS }),
	yesNo("ride.recover", Assumed, func(q *Question) *bool { return &q.Ride.Recover }),
	number("ride.sight_m", "m", 3, 300, 0.3, false, Assumed, func(q *Question) *float64 { return &q.Ride.SightM }),
	number("ride.reaction_s", "s", 0.2, 4, 0.3, true, Assumed, func(q *Question) *float64 { return &q.Ride.ReactS }),

	blank(number("coast.clicks_per_turn", "1", 4, 200, 0, true, Measured, func(q *Question) *float64 { return &q.Coast.ClicksPerTurn }), "unknown"),
	blank(number("coast.circumference_m", "m", 0.5, 3, 0.003, false, Measured, func(q *Question) *float64 { return &q.Coast.CircumferenceM }), "rollout"),
	blank(number("coast.mass_kg", "kg", 20, 600, 1, true, Measured, func(q *Question) *float64 { return &q.Coast.MassKg }), "sum"),
	blank(number("coast.mass_error_kg", "kg", 0, 50, 0.5, false, Assumed, func(q *Question) *float64 { return &q.Coast.MassErrorKg }), "usual"),
	blank(number("coast.grade", "1", -0.2, 0.2, 0.001, true, Measured, func(q *Question) *float64 { return &q.Coast.Grade }), "level"),
	blank(number("coast.grade_error", "1", 0, 0.05, 0.5, false, Assumed, func(q *Question) *float64 { return &q.Coast.GradeError }), "usual"),
	number("coast.wind_mps", "m/s", -8, 8, 0.5, true, Assumed, func(q *Question) *float64 { return &q.Coast.WindMps }),
	number("coast.wind_error_mps", "m/s", 0, 5, 0.5, false, Assumed, func(q *Question) *float64 { return &q.Coast.WindErrorMps }),
	number("coast.rolled_turns", "1", 1, 50, 0, true, Measured, func(q *Question) *float64 { return &q.Coast.RolledTurns }),
}

func tyre() Input {
	return Input{Path: "bike.tyre", Unit: "mm", Form: Tyre, Source: Sheet, text: func(q *Question) (func() string, func(string) bool) {
		t := &q.Bike.Tyre
		return func() string { return strconv.Itoa(t.WidthMM) + "-" + strconv.Itoa(t.BeadSeatMM) }, func(s string) bool {
			w, d, ok := strings.Cut(s, "-")
			width, err1 := strconv.Atoi(strings.TrimSpace(w))
			seat, err2 := strconv.Atoi(strings.TrimSpace(d))
			got := gear.Tyre{WidthMM: width, BeadSeatMM: seat}
			if !ok || err1 != nil || err2 != nil || !got.Known() {
				return false
			}
			*t = got
			return true
		}
	}}
}

func teeth(path string, low, high float64, at func(*Question) *[]int) Input {
	return Input{Path: path, Unit: "1", Form: List, Low: low, High: high, Source: Sheet, text: func(q *Question) (func() string, func(string) bool) {
		list := at(q)
		get := func() string {
			var parts []string
			for _, n := range *list {
				parts = append(parts, strconv.Itoa(n))
			}
			return strings.Join(parts, " ")
		}
		return get, func(s string) bool {
			values, ok := parseList(s, low, high)
			if !ok || len(values) == 0 {
				return false
			}
			whole := make([]int, len(values))
			for i, v := range values {
				if v != math.Trunc(v) {
					return false
				}
				whole[i] = int(v)
			}
			sort.Ints(whole)
			*list = whole
			return true
		}
	}}
}

func factors(path string, low, high float64, none string, at func(*Question) *[]float64) Input {
	return Input{Path: path, Unit: "1", Form: List, Low: low, High: high, Blank: none, Source: Sheet, text: func(q *Question) (func() string, func(string) bool) {
		list := at(q)
		get := func() string {
			if len(*list) == 0 {
				return none
			}
			var parts []string
			for _, v := range *list {
				parts = append(parts, format(v))
			}
			return strings.Join(parts, " ")
		}
		return get, func(s string) bool {
			if s == none || s == "" {
				*list = nil
				return true
			}
			values, ok := parseList(s, low, high)
			if ok {
				*list = values
			}
			return ok
		}
	}}
}

// choice makes an input that takes one of some words; at gives what the word's
// index is kept in.
func choice(path string, words []string, s Source, get func(*Question) int, set func(*Question, int)) Input {
	return Input{Path: path, Form: Choice, Choices: words, Source: s, text: func(q *Question) (func() string, func(string) bool) {
		return func() string { return words[get(q)] }, func(text string) bool {
			for i, word := range words {
				if word == text {
					set(q, i)
					return true
				}
			}
			return false
		}
	}}
}

// word makes an input that takes one of some words and keeps the word.
func word(path string, words []string, s Source, at func(*Question) *string) Input {
	return choice(path, words, s, func(q *Question) int {
		return max(0, slices.Index(words, *at(q)))
	}, func(q *Question, i int) { *at(q) = words[i] })
}

func yesNo(path string, s Source, at func(*Question) *bool) Input {
	return choice(path, []string{"no", "yes"}, s, func(q *Question) int {
		if *at(q) {
			return 1
		}
		return 0
	}, func(q *Question, i int) { *at(q) = i == 1 })
}

func motorKind() Input {
	return choice("bike.motor.kind", motor.Kinds(), Sheet, func(q *Question) int { return int(q.Bike.Motor.Kind) },
		func(q *Question, i int) { q.Bike.Motor.Kind = motor.Kind(i) })
}

func chemistry() Input {
	return choice("bike.pack.chemistry", pack.Chemistries(), Assumed, func(q *Question) int { return int(q.Bike.Pack.Chemistry) },
		func(q *Question, i int) { q.Bike.Pack.Chemistry = pack.Chemistry(i) })
}

func loadPlace() Input {
	return choice("load.place", rig.LoadPlaces(), Assumed, func(q *Question) int { return int(q.Load.Place) },
		func(q *Question, i int) { q.Load.Place = rig.LoadPlace(i) })
}

func brakeKind(path string, at func(*Question) *string) Input {
	var ids []string
	for _, k := range brake.Kinds() {
		ids = append(ids, k.ID)
	}
	return word(path, ids, Sheet, at)
}

func ground() Input {
	var ids []string
	for _, g := range road.Grounds() {
		ids = append(ids, g.ID)
	}
	return word("day.ground", ids, Assumed, func(q *Question) *string { return &q.Day.Ground })
}

func law() Input {
	var ids []string
	for _, l := range rule.All() {
		ids = append(ids, l.ID)
	}
	return word("ride.law", ids, Assumed, func(q *Question) *string { return &q.Ride.LawID })
}

// classDefault is the word that leaves a number to the class default.
const classDefault = "assumed"

// completed is a number that a maker's sheet seldom gives; "assumed" leaves it
// to the class default, with the default's own band.
func completed(path, unitName string, low, high float64, at func(*Question) *float64) Input {
	return blank(number(path, unitName, low, high, 0.05, false, Sheet, at), classDefault)
}

// highestLevel is what the level is when it is not given: the most the motor has.
const highestLevel = -1

func level() Input {
	return Input{Path: "ride.level", Unit: "1", Form: Whole, Low: 0, High: 9, Blank: "highest", Source: Assumed, text: func(q *Question) (func() string, func(string) bool) {
		get := func() string {
			if q.Ride.Level == highestLevel {
				return "highest"
			}
			return strconv.Itoa(q.Ride.Level)
		}
		return get, func(s string) bool {
			if s == "highest" || s == "" {
				q.Ride.Level = highestLevel
				return true
			}
			n, err := strconv.Atoi(s)
			if err != nil || n < 0 || n > 9 {
				return false
			}
			q.Ride.Level = n
			return true
		}
	}}
}

func parseList(s string, low, high float64) ([]float64, bool) {
	fields := strings.FieldsFunc(s, func(r rune) bool { return r == ' ' || r == ',' || r == ';' || r == '\t' })
	if len(fields) > 64 {
		return nil, false
	}
	var out []float64
	for _, f := range fields {
		v, err := strconv.ParseFloat(f, 64)
		if err != nil || !(v >= low && v <= high) {
			return nil, false
		}
		out = append(out, v)
	}
	return out, true
}

func format(v float64) string { return strconv.FormatFloat(v, 'g', -1, 64) }

// Inputs gives the whole catalogue, in the order in which it is shown.
func Inputs() []Input { return append([]Input(nil), catalogue...) }

// InputAt finds an input by its path.
func InputAt(path string) (Input, bool) {
	for _, in := range catalogue {
		if in.Path == path {
			return in, true
		}
	}
	return Input{}, false
}
