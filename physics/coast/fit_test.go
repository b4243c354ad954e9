package coast

import (
	"errors"
	"math"
	"testing"

	"gonum.org/v1/gonum/mat"
	"pgregory.net/rapid"

	"hillwright/physics/road"
	"hillwright/physics/synth"
	"hillwright/physics/unit"
)

// known is what is known of the tests' bike and road, well.
func known() Setup {
	return Setup{
		MassKg: Value{105, 0.5}, InertiaKg: Value{1.8, 0.4}, Grade: Value{0, 0.003}, HeadMps: Value{0, 0.3},
		DensityKgM3: Value{1.19, 0.01}, CircumferencePart: Value{1, 0.002}, Crr: Value{0.008, 0.002}, CdAM2: Value{0.6, 0.08},
	}
}

// closed is the speed of a coast-down on the level without wind, in closed
// form: −dv/dt = a + b·v² gives v = √(a/b)·tan(atan(v0·√(b/a)) − t·√(ab)).
func closed(s *Setup, v0, crr, cda, t float64) float64 {
	inert := s.MassKg.Value + s.InertiaKg.Value
	a, b := s.MassKg.Value*unit.Gravity*crr/inert, 0.5*s.DensityKgM3.Value*cda/inert
	return math.Sqrt(a/b) * math.Tan(math.Atan(v0*math.Sqrt(b/a))-t*math.Sqrt(a*b))
}

func clean(s *Setup, back bool, v0, crr, cda float64) Run {
	r := Run{Back: back}
	for t := 0.25; t < 45; t += 0.5 {
		if v := closed(s, v0, crr, cda, t); v > 1.5 {
			r.Points = append(r.Points, Point{t, v, 0.002 * v})
		} else {
			break
		}
	}
	return r
}

// The integration against the closed form.
func TestModelAgainstClosedForm(t *testing.T) {
	s := known()
	r := clean(&s, false, 9, 0.007, 0.52)
	q := newProblem([]Run{r}, &s, false, false)
	q.p[pCrr], q.p[pCdA], q.p[ownAt(0, pStart)] = 0.007, 0.52, r.Points[0].SpeedMps
	got := make([]float64, len(r.Points))
	q.models[0].predict(q.p, got)
	for i, p := range r.Points {
		if math.Abs(got[i]-p.SpeedMps) > 1e-7 {
			t.Fatalf("at %v s: %v m/s, closed form %v", p.AtS, got[i], p.SpeedMps)
		}
	}
}

// The books of a coast-down: what the bike loses in kinetic energy went into
// rolling, slope and air, along the road that the fit says.
func TestEnergyOfTheModel(t *testing.T) {
	s := known()
	r := Run{Marks: make([]Mark, 4001)}
	speeds := Run{Points: make([]Point, 4001)}
	for i := range r.Marks {
		r.Marks[i] = Mark{float64(i), 0.01 * float64(i), 1}
		speeds.Points[i] = Point{0.01 * float64(i), 1, 1}
	}
	q := newProblem([]Run{r}, &s, false, false)
	q.p[pCrr], q.p[pCdA], q.p[pGrade], q.p[pHead], q.p[ownAt(0, pStart)], q.p[ownAt(0, pPlace)] = 0.006, 0.5, -0.002, 1.2, 8, 0
	n := len(r.Marks)
	x, v := make([]float64, n), make([]float64, n)
	q.models[0].predict(q.p, x)
	q.models[0].run = &speeds
	q.models[0].predict(q.p, v)
	inert := q.p[pMass] + q.p[pInertia]
	cos := 1 / math.Hypot(1, q.p[pGrade])
	lost := 0.0
	for i := 1; i < n; i++ {
		mid := (v[i] + v[i-1]) / 2
		along := mid + q.p[pHead]
		force := q.p[pMass]*unit.Gravity*(q.p[pCrr]*cos+q.p[pGrade]*cos) + 0.5*q.p[pDensity]*q.p[pCdA]*along*math.Abs(along)
		lost += force * (x[i] - x[i-1])
	}
	if kinetic := inert / 2 * (v[0]*v[0] - v[n-1]*v[n-1]); math.Abs(lost/kinetic-1) > 1e-6 {
		t.Errorf("%v J went into the road, the bike lost %v J", lost, kinetic)
	}
}

// A second method that shares nothing: decelerations from differences, by
// linear least squares on 1 and v² (gonum).
func TestAgainstLinearLeastSquares(t *testing.T) {
	s := known()
	s.Grade.Error, s.HeadMps.Error = 0, 0
	r := clean(&s, false, 9, 0.0068, 0.49)
	n := len(r.Points) - 1
	a, b := mat.NewDense(n, 2, nil), mat.NewVecDense(n, nil)
	for i := range n {
		p, q := r.Points[i], r.Points[i+1]
		// The mean of v² over the step, by Simpson's rule through the middle.
		mid := closed(&s, 9, 0.0068, 0.49, (p.AtS+q.AtS)/2)
		a.Set(i, 0, 1)
		a.Set(i, 1, (p.SpeedMps*p.SpeedMps+4*mid*mid+q.SpeedMps*q.SpeedMps)/6)
		b.SetVec(i, (p.SpeedMps-q.SpeedMps)/(q.AtS-p.AtS))
	}
	var x mat.VecDense
	if err := x.SolveVec(a, b); err != nil {
		t.Fatal(err)
	}
	inert := s.MassKg.Value + s.InertiaKg.Value
	crr, cda := x.AtVec(0)*inert/(s.MassKg.Value*unit.Gravity), x.AtVec(1)*inert*2/s.DensityKgM3.Value
	got, err := Fit([]Run{r}, s)
	if err != nil {
		t.Fatal(err)
	}
	if math.Abs(got.Crr.Value/crr-1) > 1e-3 || math.Abs(got.CdAM2.Value/cda-1) > 1e-3 {
		t.Errorf("Crr %v, CdA %v; by linear least squares %v, %v", got.Crr.Value, got.CdAM2.Value, crr, cda)
	}
}

// SAE J1263 takes the mean of both directions: so do the fits of each direction
// alone, taken as level, where the grade is small.
func TestBothWaysIsTheMean(t *testing.T) {
	s := known()
	d := synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19, Grade: 0.002}
	run := func(back bool) Run {
		e := d
		if back {
			e.Grade = -e.Grade
		}
		v := e.Coast(8.5)
		r := Run{Back: back}
		for t := 0.25; t < 40; t += 0.5 {
			r.Points = append(r.Points, Point{t, v(t), 0.002 * v(t)})
		}
		return r
	}
	level := s
	level.Grade.Error, level.HeadMps.Error = 0, 0
	out, err1 := Fit([]Run{run(false)}, level)
	back, err2 := Fit([]Run{run(true)}, level)
	both, err3 := Fit([]Run{run(false), run(true)}, s)
	if err := errors.Join(err1, err2, err3); err != nil {
		t.Fatal(err)
	}
	if mean := (out.Crr.Value + back.Crr.Value) / 2; math.Abs(both.Crr.Value-mean) > 1.5e-4 || math.Abs(both.Crr.Value-0.007) > 1e-4 {
		t.Errorf("both ways Crr %v, mean of the two %v (%v, %v), truth 0.007", both.Crr.Value, mean, out.Crr.Value, back.Crr.Value)
	}
	if math.Abs(both.Grade.Value-0.002) > 2e-4 || !both.BothWays {
		t.Errorf("the grade came out as %v, truth 0.002", both.Grade.Value)
	}
}

// Turned round, with the grade and the wind turned too, it is the same.
func TestMirror(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		w := newWorld(rapid.Uint64Range(0, 1000).Draw(t, "seed"))
		w.setup.Grade.Value, w.setup.HeadMps.Value = 0.001, 0.4
		runs := []Run{w.speeds(false, 8.5, 0, 1, 0.002, 0.003), w.speeds(true, 8.2, 0, 1, 0.002, 0.003)}
		a, err1 := Fit(runs, w.setup)
		for i := range runs {
			runs[i].Back = !runs[i].Back
		}
		w.setup.Grade.Value, w.setup.HeadMps.Value = -0.001, -0.4
		b, err2 := Fit(runs, w.setup)
		if (err1 == nil) != (err2 == nil) {
			t.Fatalf("%v, mirrored %v", err1, err2)
		}
		if err1 == nil && (math.Abs(a.Crr.Value-b.Crr.Value) > 1e-6 || math.Abs(a.CdAM2.Value-b.CdAM2.Value) > 1e-4 || math.Abs(a.Grade.Value+b.Grade.Value) > 1e-6) {
			t.Fatalf("%+v, mirrored %+v", a, b)
		}
	})
}

func TestRefusals(t *testing.T) {
	s := known()
	good := clean(&s, false, 8.5, 0.007, 0.52)
	cut := func(from, to float64) Run { return good.Cut(from, to) }
	rising := Run{}
	level := Run{}
	for i := range 30 {
		rising.Points = append(rising.Points, Point{float64(i), 4 + 0.1*float64(i), 0.02})
		level.Points = append(level.Points, Point{float64(i), 6 - 0.005*float64(i), 0.02})
	}
	wrong := clean(&s, false, 8.5, 0.007, 0.52)
	wrong.Points[5].SpeedMps = math.NaN()
	heavy := clean(&s, false, 8.5, 0.09, 3.6)
	for i := range heavy.Points {
		heavy.Points[i].SpeedMps *= 2.2
	}
	slow := Run{}
	for i := range 30 {
		slow.Points = append(slow.Points, Point{float64(i), 2 - 0.05*float64(i), 0.02})
	}
	for _, row := range []struct {
		name string
		runs []Run
		kind ErrorKind
	}{
		{"nothing", nil, NoRun},
		{"two seconds", []Run{cut(0, 2.4)}, TooShort},
		{"three points", []Run{{Points: good.Points[:3]}}, TooFew},
		{"it rises", []Run{rising}, SpeedsUp},
		{"it hardly falls", []Run{level}, SmallRange},
		{"walking", []Run{slow}, TooSlow},
		{"no number", []Run{good, wrong}, BadNumber},
		{"speeds and marks", []Run{{Points: good.Points, Marks: make([]Mark, 5)}}, BadNumber},
	} {
		_, err := Fit(row.runs, s)
		var e *Error
		if !errors.As(err, &e) || e.Kind != row.kind || err.Error() == "" {
			t.Errorf("%s: %v", row.name, err)
		}
	}
	doubt := s
	doubt.Grade.Error, doubt.HeadMps.Error = 0.05, 4
	if _, err := Fit([]Run{cut(20, 34)}, doubt); err == nil {
		t.Error("a short slow run on a road and in a wind that nobody knows tells something")
	}
	bad := s
	bad.MassKg.Value = math.Inf(1)
	if _, err := Fit([]Run{good}, bad); err == nil {
		t.Error("an endless mass is taken")
	}
}

// What the data cannot tell is held near what was known, and said.
func TestHeld(t *testing.T) {
	s := known()
	one, err := Fit([]Run{clean(&s, false, 9, 0.007, 0.52)}, s)
	if err != nil {
		t.Fatal(err)
	}
	if !one.Crr.Held || one.CdAM2.Held || one.BothWays {
		t.Errorf("one way on a road that looks level: %+v, %+v", one.Crr, one.CdAM2)
	}
	slow := []Run{clean(&s, false, 3.6, 0.007, 0.52), clean(&s, true, 3.6, 0.007, 0.52)}
	for i := range slow {
		for k := range slow[i].Points {
			slow[i].Points[k].ErrorMps = 0.08
		}
	}
	low, err := Fit(slow, s)
	if err != nil {
		t.Fatal(err)
	}
	if !low.CdAM2.Held || low.Crr.Held || math.Abs(low.CdAM2.Value-s.CdAM2.Value) > s.CdAM2.Error {
		t.Errorf("at walking speed the air is told: %+v, %+v", low.Crr, low.CdAM2)
	}
}

// A run that is said to go the wrong way is found.
func TestOddRun(t *testing.T) {
	d := synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19, Grade: 0.003}
	s := known()
	var runs []Run
	for i := range 4 {
		e := d
		if i%2 == 1 {
			e.Grade = -e.Grade
		}
		v := e.Coast(8.5)
		r := Run{Back: i%2 == 1 && i != 3} // the last is said to be outward and was not
		for t := 0.25; t < 40; t += 0.5 {
			r.Points = append(r.Points, Point{t, v(t), 0.002 * v(t)})
		}
		runs = append(runs, r)
	}
	got, err := Fit(runs, s)
	if err != nil {
		t.Fatal(err)
	}
	for i, r := range got.Runs {
		if r.Odd != (i == 3) {
			t.Errorf("run %d odd: %v", i+1, r.Odd)
		}
	}
}

func TestTrim(t *testing.T) {
	v := synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19}.Coast(8.5)
	for _, row := range []struct {
		name     string
		speed    func(t float64) float64
		from, to float64
	}{
		{"nothing", v, 0.25, 40},
		{"a brake", func(t float64) float64 {
			if t > 34 {
				return max(0.2, v(34)-0.9*(t-34))
			}
			return v(t)
		}, 0.25, 34},
		{"pedalling", func(t float64) float64 {
			if t < 6 {
				return 8.5 - 0.5*(6-t)
			}
			return v(t - 6)
		}, 6, 40},
	} {
		var points []Point
		for x := 0.25; x <= 40; x += 0.4 {
			points = append(points, Point{x, row.speed(x) * (1 + 0.0005*math.Sin(91*x)), 0.01})
		}
		from, to := Trim(points)
		if math.Abs(from-row.from) > 1.6 || math.Abs(to-row.to) > 1.6 || row.from > 1 && from < row.from-0.5 || row.to < 39 && to > row.to+0.5 {
			t.Errorf("%s: %v to %v s, want %v to %v", row.name, from, to, row.from, row.to)
		}
	}
	if a, b := Trim(nil); a != 0 || b != 0 {
		t.Error("nothing has ends")
	}
}

// The bike's own numbers resist as the runs did, by the road's own sum.
func TestBikeResistsTheSame(t *testing.T) {
	s := known()
	runs := []Run{clean(&s, false, 8.5, 0.007, 0.52), clean(&s, true, 8.5, 0.007, 0.52)}
	r, err := Fit(runs, s)
	if err != nil {
		t.Fatal(err)
	}
	crr, cda := r.Bike(&s, 0.0044, 0.03)
	load := road.Load{MassKg: s.MassKg.Value, Crr: crr.Value, DragM2: cda.Value + 0.03, WheelDragM2: 0.0044, DensityKgM3: s.DensityKgM3.Value, BearingFactor: 1}
	for v := 2.0; v <= 8.5; v++ {
		want := s.MassKg.Value*unit.Gravity*r.Crr.Value + 0.5*s.DensityKgM3.Value*r.CdAM2.Value*v*v
		if got := load.Force(v, 0, 1, 0, 0); math.Abs(got/want-1) > 0.003 {
			t.Errorf("at %v m/s the bike resists with %v N, the runs with %v N", v, got, want)
		}
	}
	middle := (r.Runs[0].StartMps + r.Runs[0].EndMps) / 2
	want := s.MassKg.Value*unit.Gravity*r.Crr.Value + 0.5*s.DensityKgM3.Value*r.CdAM2.Value*middle*middle
	if got := load.Force(middle, 0, 1, 0, 0); math.Abs(got/want-1) > 1e-5 {
		t.Errorf("in the middle the bike resists with %v N, the runs with %v N", got, want)
	}
}

// A wheel whose torque and wind are known.
func TestSpin(t *testing.T) {
	const inertia, around, rho = 0.12, 2.155, 1.2
	radius := around / (2 * math.Pi)
	wheel := func(torque float64) []Point {
		var out []Point
		v := 8.0
		for i := 0; v > 1.2 && i < 4000; i++ {
			if i%25 == 0 {
				out = append(out, Point{0.02 * float64(i), v, 0.002 * v})
			}
			force := torque/radius + 0.5*rho*0.0022*v*v
			v -= 0.02 * force * radius * radius / inertia
		}
		return out
	}
	free, err := Spin(wheel(0.02), Value{inertia, 0.03}, around, rho)
	if err != nil {
		t.Fatal(err)
	}
	if math.Abs(free.TorqueNm.Value/0.02-1) > 0.03 || free.TorqueNm.Low > 0.02 || free.TorqueNm.High < 0.02 || free.Drags {
		t.Errorf("torque %+v, want 0.02 N·m; drags %v", free.TorqueNm, free.Drags)
	}
	tight, err := Spin(wheel(0.3), Value{inertia, 0.03}, around, rho)
	if err != nil {
		t.Fatal(err)
	}
	if !tight.Drags || tight.RestS.Value >= free.RestS.Value {
		t.Errorf("a tight bearing: %+v, %v", tight.PowerW, tight.Drags)
	}
	// From 25 km/h to rest by hand: I·ω/M without wind is the upper bound.
	if most := inertia * SpunMps / radius / 0.3; tight.RestS.Value > most || tight.RestS.Value < 0.8*most {
		t.Errorf("to rest in %v s, without wind %v s", tight.RestS.Value, most)
	}
}

func TestClicksPerTurn(t *testing.T) {
	for _, row := range []struct {
		clicks     int
		off, turns float64
		want       float64
	}{{180, 0, 5, 36}, {181, 0, 5, 36}, {179, 1, 5, 36}, {90, 0, 5, 18}, {183, 0, 5, 0}, {180, 6, 5, 0}, {10, 0, 5, 0}, {180, 0, 0, 0}, {5000, 0, 5, 0}} {
		got, err := ClicksPerTurn(row.clicks, row.off, row.turns)
		if got != row.want || (err == nil) != (row.want > 0) {
			t.Errorf("%d ± %v in %v turns: %v, %v", row.clicks, row.off, row.turns, got, err)
		}
	}
}

// Whatever is put in, there is an answer or an error of this package.
func FuzzFit(f *testing.F) {
	f.Add([]byte{1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12}, 100.0, 0.01)
	f.Fuzz(func(t *testing.T, data []byte, mass, err float64) {
		s := known()
		s.MassKg = Value{mass, err}
		var runs []Run
		for i := 0; i+2 < len(data) && i < 600; i += 3 {
			if i%90 == 0 {
				runs = append(runs, Run{Back: data[i]&1 == 1})
			}
			r := &runs[len(runs)-1]
			v := float64(int8(data[i+1])) / 8
			if data[i] == 255 {
				v = math.NaN()
			}
			r.Points = append(r.Points, Point{float64(len(r.Points)) * float64(data[i]) / 40, v, float64(data[i+2]) / 100})
		}
		r, e := Fit(runs, s)
		var known *Error
		if e != nil && !errors.As(e, &known) {
			t.Fatal(e)
		}
		if e == nil && !finite(r.Crr.Value, r.Crr.Low, r.Crr.High, r.CdAM2.Value, r.CdAM2.Low, r.CdAM2.High, r.Correlation) {
			t.Fatalf("%+v", r)
		}
		for _, run := range runs {
			Trim(run.Points)
			_, _ = Spin(run.Points, Value{mass, err}, 2.1, 1.2)
		}
	})
}

// What the page does at every touch of a setting: four runs of 80 speeds.
func BenchmarkFit(b *testing.B) {
	w := newWorld(3)
	var runs []Run
	for i := range 4 {
		runs = append(runs, w.speeds(i%2 == 1, 8.5, 0.5, 0.5, 0.001, 0.003))
	}
	for b.Loop() {
		if _, err := Fit(runs, w.setup); err != nil {
			b.Fatal(err)
		}
	}
}
