package slope

import (
	"errors"
	"math"
	"testing"

	"gonum.org/v1/gonum/stat/distuv"
	"pgregory.net/rapid"

	"hillwright/physics/hill"
	"hillwright/physics/unit"
)

func refused(t *testing.T, name string, err error, want ErrorKind) {
	t.Helper()
	var e *Error
	if !errors.As(err, &e) || e.Kind != want {
		t.Errorf("%s: got %v, want kind %d", name, err, want)
	} else if e.Error() == "" {
		t.Errorf("%s: says nothing", name)
	}
}

func still(deg float64) Average {
	return Average{Mean: unit.FromDegrees(deg), Error: unit.FromDegrees(0.02), Seconds: 5}
}

func wantGrade(t *testing.T, name string, r Reading, err error, want float64) {
	t.Helper()
	if err != nil {
		t.Errorf("%s: %v", name, err)
	} else if math.Abs(float64(r.Grade)-want) > 1e-12 {
		t.Errorf("%s: got %v, want %v", name, float64(r.Grade), want)
	}
}

func TestHalfATurnCancelsTheOffset(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		road, offset := rapid.Float64Range(-40, 40).Draw(t, "road"), rapid.Float64Range(-4.9, 4.9).Draw(t, "offset")
		r, kept, err := Turned(still(road+offset), still(offset-road), Support{BaseM: 1}, "phone/back")
		if err != nil {
			t.Fatal(err)
		}
		if want := math.Tan(road * degree); math.Abs(float64(r.Grade)-want) > 1e-12 || math.Abs(kept.Angle.Degrees()-offset) > 1e-12 {
			t.Fatalf("grade %v, want %v; offset %v°, want %v°", r.Grade, want, kept.Angle.Degrees(), offset)
		}
		once, err := Tilt(still(road+offset), kept, Support{BaseM: 1})
		if err != nil || math.Abs(float64(once.Grade-r.Grade)) > 1e-12 {
			t.Fatalf("once: %v, %v; twice %v", once.Grade, err, r.Grade)
		}
		if once.Error <= r.Error || once.Shared <= 0 || once.SharedBy != "phone/back" {
			t.Fatalf("once is not less sure than twice: %+v, %+v", once, r)
		}
	})
}

func TestTiltRefusals(t *testing.T) {
	on := Support{BaseM: 1}
	_, _, err := Turned(still(10), still(10), on, "")
	refused(t, "not turned", err, NotTurned)
	_, _, err = Turned(still(10), still(8), Support{BaseM: 1.1, Bike: true}, "")
	if err != nil {
		t.Errorf("a tube that falls by 9°: %v", err)
	}
	_, _, err = Turned(Average{}, still(1), on, "")
	refused(t, "nothing measured", err, NotEnough)
	_, err = Tilt(still(10), Offset{}, Support{BaseM: 1.1, Bike: true})
	refused(t, "a bike's tube", err, NotCalibrated)
	_, err = Tilt(still(60), Offset{}, on)
	refused(t, "too steep", err, OutOfRange)
	_, err = Tilt(still(90), Offset{}, on)
	refused(t, "upright", err, OutOfRange)
	_, err = Tilt(still(1), Offset{}, Support{})
	refused(t, "no edge", err, OutOfRange)
	_, err = Sighted(Average{Mean: 0.1}, Offset{})
	refused(t, "no sight", err, NotEnough)
	r, err := Tilt(still(5), Offset{}, on)
	if err != nil || r.Error < math.Tan(1*degree) {
		t.Errorf("a phone never measured: %+v, %v, want an error of a degree", r, err)
	}
}

// Triangles: 3-4-5 and 5-12-13, along the road and level.
func TestTapeByTriangles(t *testing.T) {
	exact := func(v float64) Measured { return Measured{Value: v} }
	r, err := Tape(exact(3), exact(5), AlongRoad)
	wantGrade(t, "3 up over 5 of road", r, err, 0.75)
	r, err = Tape(exact(-5), exact(12), AlongLevel)
	wantGrade(t, "5 down over 12 level", r, err, -5.0/12)
	if math.Abs(r.LengthM-13) > 1e-12 {
		t.Errorf("road of 5 down over 12 level: %v m, want 13", r.LengthM)
	}
	r, err = LevelRaised(Measured{0.12, 0.001}, exact(1))
	wantGrade(t, "a metre's level raised by 12 cm", r, err, 0.12)
	if math.Abs(r.Error-math.Sqrt2*0.001) > 1e-12 {
		t.Errorf("its error: %v, want 0.001·√2", r.Error)
	}
	r, err = WheelAndStairs(exact(10), exact(2), exact(32), Measured{0.1875, 0.002})
	wantGrade(t, "32 steps, 6 m, beside 20 m of road", r, err, 6/math.Sqrt(364))
	r, err = WheelAndHeights(exact(10), exact(2), Measured{412, 0.3}, Measured{418, 0.4})
	wantGrade(t, "6 m beside 20 m of road", r, err, 6/math.Sqrt(364))
	// Along the road the error grows with the slope: dg = ds/cos³.
	if want := 0.5 / 20 / math.Pow(1-0.09, 1.5); math.Abs(r.Error-want) > 1e-12 {
		t.Errorf("its error: %v, want %v", r.Error, want)
	}
}

// The stated error against the slope of the formula, by differences.
func TestErrorsByDifferences(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		along := Along(rapid.IntRange(0, 1).Draw(t, "along"))
		length := rapid.Float64Range(1, 100).Draw(t, "length")
		rise := length * rapid.Float64Range(-0.5, 0.5).Draw(t, "part")
		dr, dl := rapid.Float64Range(0.001, 0.1).Draw(t, "rise error"), length*rapid.Float64Range(0.001, 0.1).Draw(t, "length error")
		grade := func(rise, length float64) float64 {
			r, err := Tape(Measured{Value: rise}, Measured{Value: length}, along)
			if err != nil {
				t.Fatal(err)
			}
			return float64(r.Grade)
		}
		const h = 1e-6
		byRise := (grade(rise+h, length) - grade(rise-h, length)) / (2 * h) * dr
		byLength := (grade(rise, length+h) - grade(rise, length-h)) / (2 * h) * dl
		r, err := Tape(Measured{rise, dr}, Measured{length, dl}, along)
		if err != nil {
			t.Fatal(err)
		}
		if want := max(leastError, math.Hypot(byRise, byLength)); math.Abs(r.Error/want-1) > 1e-5 {
			t.Fatalf("error %v, by differences %v", r.Error, want)
		}
	})
}

func TestDistances(t *testing.T) {
	d, err := Distance(Measured{100, 0.1}, Measured{2.1, 0.01})
	if err != nil || math.Abs(d.Value-210) > 1e-12 || math.Abs(d.Error-math.Hypot(0.21, 1)) > 1e-12 {
		t.Errorf("100 turns of 2.1 m: %v, %v", d, err)
	}
	d, err = Paces(Measured{100, 1}, Measured{0.75, 0.02})
	if want := math.Sqrt(0.75*0.75 + 2*2 + 0.375*0.375); err != nil || math.Abs(d.Value-75) > 1e-12 || math.Abs(d.Error-want) > 1e-12 {
		t.Errorf("100 paces of 0.75 m: %v, want ± %v, %v", d, want, err)
	}
	_, err = Paces(Measured{0, 0}, Measured{0.75, 0})
	refused(t, "no paces", err, OutOfRange)
	_, err = Distance(Measured{math.NaN(), 0}, Measured{2, 0})
	refused(t, "NaN turns", err, NotANumber)
	_, err = Distance(Measured{1, 0}, Measured{2, -1})
	refused(t, "a negative error", err, OutOfRange)
	_, err = Tape(Measured{1, 0}, Measured{2, 1}, AlongRoad)
	refused(t, "a length that is hardly known", err, TooShort)
}

func TestIntervalAndLimit(t *testing.T) {
	r := Reading{Grade: 0.12, Error: 0.01}
	low, high := r.Interval90()
	norm := distuv.Normal{Mu: 0.12, Sigma: 0.01}
	if math.Abs(norm.CDF(float64(low))-0.05) > 1e-12 || math.Abs(norm.CDF(float64(high))-0.95) > 1e-12 {
		t.Errorf("90 %% lie between %v and %v", low, high)
	}
	for limit, want := range map[unit.Grade]bool{0.10: false, 0.105: true, 0.12: true, 0.135: true, 0.14: false} {
		if got := r.Straddles(limit); got != want {
			t.Errorf("straddles %v: %v", limit, got)
		}
	}
	if back := r.Reversed(); back.Grade != -0.12 || back.Error != 0.01 {
		t.Errorf("reversed: %+v", back)
	}
}

func TestChanceAgainstGonum(t *testing.T) {
	for freedom := 1; freedom <= 40; freedom++ {
		for _, chi := range []float64{0, 1e-6, 0.1, 1, 3.84, 10, 40, 200} {
			want := distuv.ChiSquared{K: float64(freedom)}.Survival(chi)
			if got := chanceBeyond(chi, freedom); math.Abs(got-want) > 1e-12+1e-9*want {
				t.Errorf("chance beyond %v of %d: %v, gonum %v", chi, freedom, got, want)
			}
		}
	}
}

// Rosters of the same pitch by all four ways, each a little off, its error as stated.
func TestFourWaysCombine(t *testing.T) {
	const truth = 0.14
	angle := math.Atan(truth) / degree
	turned := func() Reading {
		r, _, err := Turned(still(angle+1.3), still(1.25-angle), Support{BaseM: 1}, "")
		if err != nil {
			t.Fatal(err)
		}
		return r
	}()
	sine := unit.Grade(truth).Sin()
	tape := must(Tape(Measured{0.283, 0.003}, Measured{2, 0.005}, AlongLevel))
	wheel := must(WheelAndHeights(Measured{30, 0.1}, Measured{2.1, 0.01}, Measured{400, 0.5}, Measured{400 + 63*sine - 0.4, 0.5}))
	var fixes []Fix
	meridian, _ := radii(47)
	for i := range 60 {
		at := 3 * float64(i)
		fixes = append(fixes, Fix{
			Point:     hill.Point{LatDeg: 47 + at/meridian/degree, LonDeg: 8, HeightM: 400 + truth*at + 0.2*math.Sin(at), TimeS: float64(i)},
			AccuracyM: 3, HeightAccuracyM: math.NaN(),
		})
	}
	ride := must(RideStretch(fixes, Barometric))
	c, err := Combine([]Reading{turned, tape, wheel, ride})
	if err != nil {
		t.Fatal(err)
	}
	if math.Abs(float64(c.Grade)-truth) > c.PlusMinus() || math.Abs(float64(c.Grade)-truth) > 0.002 {
		t.Errorf("combined %v ± %v, want %v", c.Grade, c.Error, truth)
	}
	if c.Misfit || c.Odd != -1 || c.Widened != 1 || c.Method != ByAll || c.Freedom != 3 {
		t.Errorf("four readings that fit: %+v", c)
	}
	for _, r := range []Reading{turned, tape, wheel, ride} {
		if r.Error < c.Error {
			t.Errorf("combined error %v is above %v of %s", c.Error, r.Error, r.Method)
		}
	}
	// A slip: the tape was read a decimetre wrong.
	slip := must(Tape(Measured{0.383, 0.003}, Measured{2, 0.005}, AlongLevel))
	bad, err := Combine([]Reading{turned, slip, wheel, ride})
	if err != nil || !bad.Misfit || bad.Odd != 1 || bad.Widened <= 1 || bad.Error <= c.Error {
		t.Errorf("a slip: %+v, %v", bad, err)
	}
}

func TestCombineByHand(t *testing.T) {
	a, b := Reading{Grade: 0.10, Error: 0.01}, Reading{Grade: 0.13, Error: 0.02}
	c, err := Combine([]Reading{a, b})
	if err != nil || math.Abs(float64(c.Grade)-0.106) > 1e-15 || math.Abs(c.Error-0.01*math.Sqrt(0.8)) > 1e-15 || math.Abs(c.ChiSquare-1.8) > 1e-9 {
		t.Errorf("0.10 ± 0.01 and 0.13 ± 0.02: %+v, %v", c, err)
	}
	// Two readings that share all but nothing of their error are hardly better than one.
	a, b = Reading{Grade: 0.1, Error: 0.02, Shared: 0.0199, SharedBy: "p"}, Reading{Grade: 0.1, Error: 0.02, Shared: 0.0199, SharedBy: "p"}
	if c, _ = Combine([]Reading{a, b}); c.Error < 0.0199 {
		t.Errorf("a shared error was averaged down to %v", c.Error)
	}
	b.SharedBy = "q"
	if c, _ = Combine([]Reading{a, b}); math.Abs(c.Error-0.02/math.Sqrt2) > 1e-12 {
		t.Errorf("errors of two phones: %v, want 0.02/√2", c.Error)
	}
	one, err := Combine([]Reading{a})
	if err != nil || one.Reading != a || one.P != 1 || one.Odd != -1 {
		t.Errorf("one alone: %+v, %v", one, err)
	}
	if two, _ := Combine([]Reading{{Grade: 0, Error: 0.01}, {Grade: 0.2, Error: 0.01}}); !two.Misfit || two.Odd != -1 || math.Abs(two.Error-0.1) > 1e-12 {
		t.Errorf("two that do not fit: %+v; want an error of half their distance", two)
	}
	_, err = Combine(nil)
	refused(t, "none", err, NotEnough)
	_, err = Combine([]Reading{a, {}})
	refused(t, "no error", err, OutOfRange)
}

func TestTrackStretch(t *testing.T) {
	p, err := hill.ParseSections("200 m at 5 %, 100 m at 12 %, 200 m at 3 %")
	if err != nil {
		t.Fatal(err)
	}
	r, err := TrackStretch(&p, 200, 300, Barometric)
	wantGrade(t, "the steep piece", r, err, 0.12)
	if far, _ := TrackStretch(&p, 200, 300, Satellite); far.Error <= r.Error || r.Error <= 0 || r.LengthM != 100 {
		t.Errorf("satellite %v is not less sure than barometric %v", far.Error, r.Error)
	}
	// Heights 0.5 m off at each end, together by 200 m; the length 1 % and 2 m off.
	rise, sine := 0.5*math.Sqrt(2*(1-math.Exp(-0.5))), unit.Grade(0.12).Sin()
	if want := math.Hypot(rise, sine*math.Hypot(1, 2)) / 100 / math.Pow(unit.Grade(0.12).Cos(), 3); math.Abs(r.Error-want) > 1e-12 {
		t.Errorf("its error: %v, want %v", r.Error, want)
	}
	r, err = TrackStretch(&p, -50, 9999, Surveyed)
	wantGrade(t, "all of it", r, err, math.Tan(math.Asin(p.AscentM()/500)))
	_, err = TrackStretch(&p, 200, 210, Barometric)
	refused(t, "10 m", err, TooShort)
	_, err = TrackStretch(&p, math.NaN(), 210, Barometric)
	refused(t, "from nowhere", err, NotANumber)
	_, err = TrackStretch(&hill.Profile{}, 0, 100, Barometric)
	refused(t, "an empty track", err, TooShort)
	p.Notes = []hill.Note{{Kind: hill.NoteNoHeights}}
	_, err = TrackStretch(&p, 0, 100, Barometric)
	refused(t, "no heights", err, NoHeights)
}

func TestRideRefusals(t *testing.T) {
	nan := math.NaN()
	fix := func(i int, every, height float64) Fix {
		return Fix{hill.Point{LatDeg: 47 + every*float64(i)/111e3, LonDeg: 8, HeightM: height, TimeS: float64(i)}, 4, nan}
	}
	var flat, standing, blind []Fix
	for i := range 50 {
		flat, standing, blind = append(flat, fix(i, 3, 400)), append(standing, fix(i, 0, 400)), append(blind, fix(i, 3, nan))
	}
	r, err := RideStretch(flat, Barometric)
	wantGrade(t, "level", r, err, 0)
	_, err = RideStretch(standing, Barometric)
	refused(t, "standing", err, TooShort)
	_, err = RideStretch(blind, Barometric)
	refused(t, "no heights", err, NoHeights)
	_, err = RideStretch(flat[:4], Barometric)
	refused(t, "four fixes", err, NotEnough)
	_, err = RideStretch(nil, Barometric)
	refused(t, "none", err, NotEnough)
}

// On a road that bends from steep to level the heights lie far from one
// straight line, and the error says so.
func TestRideOnABendingRoadIsLessSure(t *testing.T) {
	ride := func(bend float64) Reading {
		var fixes []Fix
		for i := range 60 {
			x := float64(i-30) / 30
			fixes = append(fixes, Fix{hill.Point{LatDeg: 47 + 3e-5*float64(i), LonDeg: 8, HeightM: 400 + 10*x + bend*x*x, TimeS: float64(i)}, 3, 3})
		}
		return must(RideStretch(fixes, Barometric))
	}
	if straight, bent := ride(0), ride(10); bent.Error < 3*straight.Error {
		t.Errorf("bent road ± %v, straight road ± %v", bent.Error, straight.Error)
	}
}

// A rider who stands for two minutes with jittering fixes has not ridden on.
func TestRideStandingAddsNoWay(t *testing.T) {
	meridian, _ := radii(47)
	var fixes []Fix
	at := 0.0
	for i := range 200 {
		if i < 40 || i > 160 {
			at += 3
		}
		jitter := 1.5 * math.Sin(float64(i)*1.7)
		fixes = append(fixes, Fix{hill.Point{LatDeg: 47 + (at+jitter)/meridian/degree, LonDeg: 8, HeightM: 400 + 0.1*at, TimeS: float64(i)}, 1.5 * radius95, 3})
	}
	r := must(RideStretch(fixes, Barometric))
	if math.Abs(float64(r.Grade)-0.1) > 0.01 || math.Abs(r.LengthM-at*math.Hypot(1, 0.1)) > 8 {
		t.Errorf("10 %% over %v m with a stop: %v over %v m", at, r.Grade, r.LengthM)
	}
}
