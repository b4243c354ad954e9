package ask

import (
	"math"
	"sort"
	"strconv"
	"strings"

	"hillwright/physics/gear"
	"hillwright/physics/motor"
	"hillwright/physics/rule"
	"hillwright/physics/unit"
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
	number("bike.motor.efficiency", "1", 0.2, 1, 0.08, false, Assumed, func(q *Question) *float64 { return &q.Bike.Motor.Efficiency }),
	number("bike.pack_wh", "Wh", 0, 5000, 0.05, false, Sheet, func(q *Question) *float64 { return &q.Bike.PackWh }),

	number("load.mass_kg", "kg", 0, 250, 0.10, false, Assumed, func(q *Question) *float64 { return &q.Load.MassKg }),
	number("load.cda_m2", "m²", 0, 2, 0.30, false, Assumed, func(q *Question) *float64 { return &q.Load.CdAM2 }),

	number("day.temperature_c", "°C", -30, 50, 2, true, Assumed, func(q *Question) *float64 { return (*float64)(&q.Day.TemperatureC) }),
	number("day.humidity", "1", 0, 1, 0.15, true, Assumed, func(q *Question) *float64 { return &q.Day.Humidity }),
	blank(number("day.altitude_m", "m", -400, 6000, 30, true, Assumed, func(q *Question) *float64 { return &q.Day.AltitudeM }), "hill"),
	blank(number("day.density_kgm3", "kg/m³", 0.4, 1.7, 0.01, false, Measured, func(q *Question) *float64 { return &q.Day.DensityKgM3 }), "computed"),
	number("day.wind_mps", "m/s", -25, 25, 1, true, Assumed, func(q *Question) *float64 { return &q.Day.WindMps }),
	blank(number("day.wind_from_deg", "°", 0, 360, 20, true, Assumed, func(q *Question) *float64 { return &q.Day.WindFromDeg }), "ahead"),

	level(),
	number("ride.start_mps", "m/s", 0, 15, 0, true, Assumed, func(q *Question) *float64 { return &q.Ride.StartMps }),
	number("ride.down_mps", "m/s", 1, 25, 1, true, Assumed, func(q *Question) *float64 { return &q.Ride.DownMps }),
	law(),
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

func motorKind() Input {
	return Input{Path: "bike.motor.kind", Form: Choice, Choices: motor.Kinds(), Source: Sheet, text: func(q *Question) (func() string, func(string) bool) {
		return func() string { return q.Bike.Motor.Kind.String() }, func(s string) bool {
			for i, name := range motor.Kinds() {
				if name == s {
					q.Bike.Motor.Kind = motor.Kind(i)
					return true
				}
			}
			return false
		}
	}}
}

func law() Input {
	var ids []string
	for _, l := range rule.All() {
		ids = append(ids, l.ID)
	}
	return Input{Path: "ride.law", Form: Choice, Choices: ids, Source: Assumed, text: func(q *Question) (func() string, func(string) bool) {
		return func() string { return q.Ride.LawID }, func(s string) bool {
			if _, ok := rule.ByID(s); !ok {
				return false
			}
			q.Ride.LawID = s
			return true
		}
	}}
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

// Default is the question that stands before anything is chosen: a trekking
// bike with a crank motor by class defaults, a steady rider, a bag, a mild day.
// Each number is a class default, common practice, no source, unless its
// package says otherwise.
func Default() Question {
	q := Question{Source: map[string]Source{}}
	nan := math.NaN()
	q.Rider.MassKg, q.Rider.PowerW = 80, 110
	q.Rider.CadenceLow, q.Rider.CadenceLiked, q.Rider.CadenceHigh = 45, 70, 100
	q.Rider.CrankM, q.Rider.HoldMps = 0.17, 1.4
	b := &q.Bike
	b.MassKg, b.Crr, b.CdAM2, b.WheelDragM2, b.WheelInertiaKgM2 = 25, 0.008, 0.55, 0.0044, 0.25
	b.Tyre, b.RolloutM = gear.Tyre{WidthMM: 47, BeadSeatMM: 622}, nan
	b.Train = gear.Train{Rings: []int{38}, Sprockets: []int{11, 13, 15, 18, 21, 24, 28, 32, 37, 42, 46}, Efficiency: 0.96}
	b.ShiftS = 0.3
	b.Motor = motor.Motor{Kind: motor.Crank, TorqueNm: 65, PowerW: 500, Levels: []float64{0.6, 1.2, 2, 3.2}, CadenceHigh: 115, Efficiency: 0.78}
	b.PackWh = 500
	q.Day.TemperatureC, q.Day.Humidity = unit.Celsius(15), 0.6
	q.Day.AltitudeM, q.Day.DensityKgM3, q.Day.WindFromDeg = nan, nan, nan
	q.Ride = Ride{Level: highestLevel, StartMps: 0, DownMps: 25 / 3.6, LawID: "eu-25"}
	return q
}
