package words

import (
	"math"
	"strings"
	"testing"

	"hillwright/physics/unit"
)

// bare shows the special blanks as plain ones, so that tables can be read.
func bare(s string) string { return strings.NewReplacer(thin, " ", wide, " ").Replace(s) }

func TestNumber(t *testing.T) {
	for _, c := range []struct {
		value    float64
		decimals int
		point    string
		comma    string
	}{
		{0, 0, "0", "0"},
		{7.25, 1, "7.2", "7,2"}, // ties go to the even digit of the binary value
		{7.26, 1, "7.3", "7,3"},
		{-7.26, 1, "−7.3", "−7,3"},
		{-0.04, 1, "0.0", "0,0"}, // no minus before a shown zero
		{math.Copysign(0, -1), 0, "0", "0"},
		{999.96, 1, "1000.0", "1000,0"},
		{9999, 0, "9999", "9999"},
		{9999.5, 0, "10 000", "10 000"},
		{1234567.891, 2, "1 234 567.89", "1 234 567,89"},
		{-12345, 0, "−12 345", "−12 345"},
		{math.NaN(), 1, "–", "–"},
		{math.Inf(1), 1, "–", "–"},
		{math.Inf(-1), 0, "–", "–"},
	} {
		if got := bare(Voice{}.Number(c.value, c.decimals)); got != c.point {
			t.Errorf("%v: got %s, want %s", c.value, got, c.point)
		}
		if got := bare(Voice{Comma: true}.Number(c.value, c.decimals)); got != c.comma {
			t.Errorf("%v with a comma: got %s, want %s", c.value, got, c.comma)
		}
	}
}

// The wanted conversions are by the definitions of the units (1959 agreement:
// 0.3048 m, 1609.344 m, 0.45359237 kg; lbf with 9.80665 m/s²), worked by hand.
func TestQuantities(t *testing.T) {
	de := Voice{Lang: German, Comma: true}
	us := Voice{Units: Imperial}
	for _, c := range []struct {
		what              string
		write             func(Voice) string
		metric, comma, ft string
	}{
		{"speed", func(v Voice) string { return v.Speed(2) }, "7.2 km/h", "7,2 km/h", "4.5 mph"},
		{"speed, law", func(v Voice) string { return v.Speed(15.5 * 0.44704) }, "24.9 km/h", "24,9 km/h", "15.5 mph"},
		{"speed back", func(v Voice) string { return v.Speed(-1) }, "−3.6 km/h", "−3,6 km/h", "−2.2 mph"},
		{"length, short", func(v Voice) string { return v.Length(4.26) }, "4.3 m", "4,3 m", "14 ft"},
		{"length", func(v Voice) string { return v.Length(60) }, "60 m", "60 m", "197 ft"},
		{"length, edge below 10", func(v Voice) string { return v.Length(9.96) }, "10 m", "10 m", "33 ft"},
		{"length, edge below km", func(v Voice) string { return v.Length(999.4) }, "999 m", "999 m", "0.62 mi"},
		{"length, edge at km", func(v Voice) string { return v.Length(999.5) }, "1.00 km", "1,00 km", "0.62 mi"},
		{"length, edge at 10 km", func(v Voice) string { return v.Length(9996) }, "10.0 km", "10,0 km", "6.21 mi"},
		{"length, edge at a fifth of a mile", func(v Voice) string { return v.Length(1055.6 * 0.3048) }, "322 m", "322 m", "0.20 mi"},
		{"length, long", func(v Voice) string { return v.Length(123456) }, "123 km", "123 km", "76.7 mi"},
		{"height", func(v Voice) string { return v.Height(1234) }, "1234 m", "1234 m", "4049 ft"},
		{"height, small", func(v Voice) string { return v.Height(4.26) }, "4.3 m", "4,3 m", "14 ft"},
		{"mass", func(v Voice) string { return v.Mass(82) }, "82 kg", "82 kg", "181 lb"},
		{"mass, tenth", func(v Voice) string { return v.Mass(9.54) }, "9.5 kg", "9,5 kg", "21 lb"},
		{"grade", func(v Voice) string { return v.Grade(0.18) }, "18 %", "18 %", "18 %"},
		{"grade below 10", func(v Voice) string { return v.Grade(0.0726) }, "7.3 %", "7,3 %", "7.3 %"},
		{"grade, edge", func(v Voice) string { return v.Grade(0.0996) }, "10 %", "10 %", "10 %"},
		{"grade, edge below", func(v Voice) string { return v.Grade(0.0994) }, "9.9 %", "9,9 %", "9.9 %"},
		{"grade down", func(v Voice) string { return v.Grade(-0.05) }, "−5.0 %", "−5,0 %", "−5.0 %"},
		{"power", func(v Voice) string { return v.Power(249.6) }, "250 W", "250 W", "250 W"},
		{"pull", func(v Voice) string { return v.Pull(210) }, "210 N", "210 N", "47.2 lbf"},
		{"temperature", func(v Voice) string { return v.Temperature(8) }, "8 °C", "8 °C", "46 °F"},
		{"temperature, cold", func(v Voice) string { return v.Temperature(-20) }, "−20 °C", "−20 °C", "−4 °F"},
		{"energy", func(v Voice) string { return v.Energy(36 * 3600) }, "36 Wh", "36 Wh", "36 Wh"},
		{"energy, small", func(v Voice) string { return v.Energy(4.26 * 3600) }, "4.3 Wh", "4,3 Wh", "4.3 Wh"},
		{"percent", func(v Voice) string { return v.Percent(0.356) }, "36 %", "36 %", "36 %"},
		{"cadence", func(v Voice) string { return v.Cadence(62.4) }, "62 turns/min", "62 U/min", "62 turns/min"},
		{"headroom", func(v Voice) string { return v.Headroom(0.36) }, "36 % in hand", "36 % Reserve", "36 % in hand"},
		{"headroom, little", func(v Voice) string { return v.Headroom(0.004) }, "0.4 % in hand", "0,4 % Reserve", "0.4 % in hand"},
		{"headroom, edge", func(v Voice) string { return v.Headroom(0.0096) }, "1 % in hand", "1 % Reserve", "1 % in hand"},
		{"headroom, short", func(v Voice) string { return v.Headroom(-0.12) }, "12 % short", "12 % zu wenig", "12 % short"},
		{"headroom, hardly short", func(v Voice) string { return v.Headroom(-0.003) }, "0.3 % short", "0,3 % zu wenig", "0.3 % short"},
		{"duration, s", func(v Voice) string { return v.Duration(42.4) }, "42 s", "42 s", "42 s"},
		{"duration, edge at a minute", func(v Voice) string { return v.Duration(59.6) }, "1 min", "1 min", "1 min"},
		{"duration", func(v Voice) string { return v.Duration(250) }, "4 min 10 s", "4 min 10 s", "4 min 10 s"},
		{"duration, edge at an hour", func(v Voice) string { return v.Duration(3599.6) }, "1 h", "1 h", "1 h"},
		{"duration, edge within hours", func(v Voice) string { return v.Duration(2*3600 - 20) }, "2 h", "2 h", "2 h"},
		{"duration, h", func(v Voice) string { return v.Duration(3900) }, "1 h 5 min", "1 h 5 min", "1 h 5 min"},
		{"duration back", func(v Voice) string { return v.Duration(-250) }, "−4 min 10 s", "−4 min 10 s", "−4 min 10 s"},
	} {
		for _, w := range []struct {
			v    Voice
			want string
		}{{Voice{}, c.metric}, {de, c.comma}, {us, c.ft}} {
			if got := bare(c.write(w.v)); got != w.want {
				t.Errorf("%s: got %q, want %q", c.what, got, w.want)
			}
		}
	}
}

func TestWhatIsNoNumberIsADash(t *testing.T) {
	for _, x := range []float64{math.NaN(), math.Inf(1), math.Inf(-1)} {
		for _, v := range []Voice{{}, {Lang: German, Units: Imperial, Comma: true}} {
			for i, got := range []string{
				v.Number(x, 1), v.Speed(x), v.Length(x), v.Height(x), v.Mass(x), v.Grade(unit.Grade(x)), v.Power(x),
				v.Pull(x), v.Temperature(unit.Celsius(x)), v.Duration(x), v.Energy(x), v.Percent(x),
				v.Cadence(x), v.Headroom(x), v.Entry("bike.mass_kg", x), v.Value("bike.mass_kg", x),
			} {
				if got != "–" {
					t.Errorf("formatter %d of %v gives %q, want a dash", i, x, got)
				}
			}
		}
	}
}

func TestUnitsDoNotBreakFromTheirNumber(t *testing.T) {
	for _, s := range []string{(Voice{}).Speed(2), (Voice{}).Mass(82), (Voice{}).Duration(250), (Voice{}).Grade(0.3)} {
		if strings.Contains(s, " ") {
			t.Errorf("%q has a blank at which a line may break", s)
		}
	}
}

func TestParseNumber(t *testing.T) {
	for _, c := range []struct {
		text string
		want float64
		ok   bool
	}{
		{"82", 82, true},
		{" 7.5 ", 7.5, true},
		{"7,5", 7.5, true},
		{".5", 0.5, true},
		{"5,", 5, true},
		{"1 234,5", 1234.5, true},
		{"1\u202f234\u202f567.5", 1234567.5, true},
		{"1\u00a0234", 1234, true},
		{"1.234,5", 1234.5, true},
		{"1,234.5", 1234.5, true},
		{"1’234.5", 1234.5, true},
		{"-3", -3, true},
		{"−3,5", -3.5, true},
		{"–3", -3, true},
		{"− 3", -3, true},
		{"+3", 3, true},
		{"1.234", 1.234, true}, // one mark is the decimal mark
		{"", 0, false},
		{"-", 0, false},
		{".", 0, false},
		{"1 2", 0, false},
		{"12 34", 0, false},
		{"1234 567", 0, false},
		{"1.2.3", 0, false},
		{"1.234.567", 0, false},
		{"1.5,2", 0, false},
		{"1-2", 0, false},
		{"--1", 0, false},
		{"1e5", 0, false},
		{"0x10", 0, false},
		{"NaN", 0, false},
		{"Inf", 0, false},
		{"82 kg", 0, false},
		{strings.Repeat("9", 400), 0, false},
	} {
		got, ok := Voice{}.ParseNumber(c.text)
		if ok != c.ok || ok && got != c.want {
			t.Errorf("%q: got %v, %v, want %v, %v", c.text, got, ok, c.want, c.ok)
		}
	}
}

func TestAbout(t *testing.T) {
	for _, row := range []struct {
		s    float64
		want string
	}{{5, "30 s"}, {250, "4 min"}, {266, "4 min 30 s"}, {2415, "40 min"}, {4000, "1 h 5 min"}} {
		if got := bare(inEnglish.About(row.s)); got != row.want {
			t.Errorf("about %g s: %q, want %q", row.s, got, row.want)
		}
	}
}
