package hill

import (
	"errors"
	"math"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/unit"
)

func TestParseSections(t *testing.T) {
	type section struct{ lengthM, grade float64 }
	for _, c := range []struct {
		text string
		want []section
	}{
		{"400m@7%,60m@18%", []section{{400, 0.07}, {60, 0.18}}},
		{"400 m at 7 %, 60 m at 18 %", []section{{400, 0.07}, {60, 0.18}}},
		{"400 m mit 7 %, 60 m mit 18 %", []section{{400, 0.07}, {60, 0.18}}},
		{"400 m mit 7,5 %, 60 m mit 18 %", []section{{400, 0.075}, {60, 0.18}}},
		{"0,4 km mit 7,5%;60 Meter mit 18 Prozent", []section{{400, 0.075}, {60, 0.18}}},
		{"1.25 km at 3.5 percent then 60 m of -6%", []section{{1250, 0.035}, {60, -0.06}}},
		{"100 m bei 4 % dann 50m @ \u22122 %", []section{{100, 0.04}, {50, -0.02}}},
		{"1 mi @ 5%", []section{{1609.344, 0.05}}},
		{"200 ft at 10%, 50' at 0 %", []section{{60.96, 0.10}, {15.24, 0}}},
		{"80 yd at 1:8", []section{{73.152, 0.125}}},
		{"100 m 5 %\n200 m 6 %\n", []section{{100, 0.05}, {200, 0.06}}},
		{"100 m \u00e0 5 %,", []section{{100, 0.05}}},
		{"1.234 km at 60%", []section{{1234, 0.60}}},
		{"0.125 m at 1 %, 5 m at +2%", []section{{0.125, 0.01}, {5, 0.02}}},
	} {
		p, err := ParseSections(c.text)
		if err != nil {
			t.Errorf("%q: %v", c.text, err)
			continue
		}
		if len(p.Grade) != len(c.want) {
			t.Errorf("%q: %d sections, want %d", c.text, len(p.Grade), len(c.want))
			continue
		}
		at, height := 0.0, 0.0
		for i, want := range c.want {
			at += want.lengthM
			height += want.lengthM * math.Sin(math.Atan(want.grade))
			if math.Abs(p.EdgeM[i+1]-at) > 1e-9 || math.Abs(float64(p.Grade[i])-want.grade) > 1e-12 || math.Abs(p.HeightM[i+1]-height) > 1e-9 {
				t.Errorf("%q: section %d ends at %g m, height %g, grade %g; want %g, %g, %g", c.text, i+1, p.EdgeM[i+1], p.HeightM[i+1], p.Grade[i], at, height, want.grade)
			}
		}
	}
}

func TestSectionErrors(t *testing.T) {
	for _, c := range []struct {
		text    string
		kind    SectionErrorKind
		section int
		says    string
	}{
		{"", SectionsEmpty, 0, "nothing is typed"},
		{"  ", SectionsEmpty, 0, "nothing is typed"},
		{"100m@5%,,50m@3%", SectionEmpty, 2, "nothing between"},
		{"steep", SectionNoLength, 1, `"steep"`},
		{"7 % for 400 m", SectionNoUnit, 1, `"%"`},
		{"400@7%", SectionNoUnit, 1, `"@7%"`},
		{"400 furlongs at 7%", SectionNoUnit, 1, `"furlongs"`},
		{"400m", SectionNoGrade, 1, ""},
		{"100m@5%, 400m@steep", SectionNoGrade, 2, `"steep"`},
		{"400m@7", SectionNoPercent, 1, "expected %"},
		{"1,500 ft at 7%", SectionAmbiguous, 1, `"1,500"`},
		{"1.500 m at 7%", SectionAmbiguous, 1, `"1.500"`},
		{"400m@7% uphill", SectionLeftOver, 1, `"uphill"`},
		{"0 m at 7%", SectionLengthRange, 1, "above 0"},
		{"-5 m at 7%", SectionLengthRange, 1, "above 0"},
		{"501 km at 7%", SectionLengthRange, 1, "500 km"},
		{"400m@61%", SectionGradeRange, 1, "60 %"},
		{"400m@-61%", SectionGradeRange, 1, "60 %"},
		{"400m@1:0", SectionGradeRange, 1, "60 %"},
		{"0.5 m at 5%", SectionsTooShort, 0, "1 m or more"},
		{"300km@1%,300km@1%", SectionsTooLong, 0, "500 km or less"},
		{strings.Repeat("1m@1%,", 1001), SectionsTooMany, 0, "1000"},
	} {
		_, err := ParseSections(c.text)
		var e *SectionError
		if !errors.As(err, &e) {
			t.Errorf("%.40q: error %v, want a *SectionError", c.text, err)
			continue
		}
		if e.Kind != c.kind || e.Section != c.section || !strings.Contains(e.Error(), c.says) {
			t.Errorf("%.40q: kind %d, section %d, %q; want kind %d, section %d, saying %q", c.text, e.Kind, e.Section, e.Error(), c.kind, c.section, c.says)
		}
	}
}

// What is written is read back.
func TestFormatSectionsRoundTrip(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := rapid.IntRange(1, 30).Draw(t, "sections")
		p := Profile{EdgeM: []float64{0}, HeightM: []float64{0}}
		for i := range n {
			length := rapid.Float64Range(0.5, 5000).Draw(t, "length")
			g := unit.Grade(rapid.Float64Range(-0.59, 0.59).Draw(t, "grade"))
			if rapid.Bool().Draw(t, "three decimals") {
				length = math.Round(length*1000) / 1000
			}
			p.EdgeM = append(p.EdgeM, p.EdgeM[i]+length)
			p.HeightM = append(p.HeightM, p.HeightM[i]+length*g.Sin())
			p.Grade = append(p.Grade, g)
		}
		text := FormatSections(&p)
		q, err := ParseSections(text)
		if p.LengthM() < 1 {
			return
		}
		if err != nil {
			t.Fatalf("%q: %v", text, err)
		}
		if math.Abs(q.LengthM()/p.LengthM()-1) > 1e-10 {
			t.Fatalf("%q: length %g, want %g", text, q.LengthM(), p.LengthM())
		}
		for i, at := range p.EdgeM {
			if math.Abs(q.HeightAt(at)-p.HeightM[i]) > 1e-6 {
				t.Fatalf("%q: height at %g is %g, want %g", text, at, q.HeightAt(at), p.HeightM[i])
			}
		}
	})
}

func FuzzParseSections(f *testing.F) {
	for _, s := range []string{"400m@7%,60m@18%", "400 m mit 7,5 %; 60 m at 1:8", "1 mi @ -5%", "9e999m@1%", "1'@\u2212,5%", "0x1m@1%", "1,500 m"} {
		f.Add(s)
	}
	f.Fuzz(func(t *testing.T, text string) {
		p, err := ParseSections(text)
		if err != nil {
			if err.Error() == "" {
				t.Error("an error without words")
			}
			return
		}
		sound(t, &p)
		if len(p.Grade) > MostTyped || p.LengthM() > LongestTypedM || p.LengthM() < ShortestTypedM {
			t.Errorf("%q: %d sections, %g m", text, len(p.Grade), p.LengthM())
		}
	})
}
