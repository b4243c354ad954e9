package hill

import (
	"math"
	"testing"

	"pgregory.net/rapid"
)

// climb is a clean recording: n points, everyM apart, one each everyS, rising
// at a grade along a straight way north.
func climb(n int, everyM, everyS, grade float64) Track {
	t := Track{SegmentStart: []int{0}}
	for i := range n {
		x := float64(i) * everyM
		t.Points = append(t.Points, Point{LatDeg: 47 + x/111_170, LonDeg: 8, HeightM: 400.25 + grade*x, TimeS: float64(i) * everyS})
	}
	return t
}

func noteOf(p *Profile, kind NoteKind) Note {
	for _, n := range p.Notes {
		if n.Kind == kind {
			return n
		}
	}
	return Note{}
}

// Each fault is put into a clean climb of 2 km at 6 %; length, ascent and the
// steepest grade must come out as without it, and the notes must say it.
func TestFaultsAreMended(t *testing.T) {
	nan := math.NaN()
	insert := func(tr *Track, at int, points ...Point) {
		tr.Points = append(tr.Points[:at:at], append(points, tr.Points[at:]...)...)
	}
	for _, c := range []struct {
		name  string
		do    func(tr *Track)
		note  NoteKind
		count int
		known bool
	}{
		{"a point 300 m off", func(tr *Track) { tr.Points[100].LonDeg += 0.004 }, NoteSpike, 1, true},
		{"two points 300 m off", func(tr *Track) { tr.Points[100].LonDeg += 0.004; tr.Points[101].LonDeg += 0.004 }, NoteSpike, 2, true},
		{"a point off, without times", func(tr *Track) {
			for i := range tr.Points {
				tr.Points[i].TimeS = nan
			}
			tr.Points[100].LonDeg += 0.004
		}, NoteSpike, 1, true},
		{"a receiver without a fix", func(tr *Track) { tr.Points[50].LatDeg, tr.Points[50].LonDeg = 0, 0 }, NoteSpike, 1, true},
		{"one height of 2000 m", func(tr *Track) { tr.Points[70].HeightM = 2000 }, NoteSpike, 1, true},
		{"two heights far down", func(tr *Track) { tr.Points[70].HeightM = -300; tr.Points[71].HeightM = -300 }, NoteSpike, 2, true},
		{"doubled points", func(tr *Track) { insert(tr, 40, tr.Points[40], tr.Points[40], tr.Points[40]) }, NoteDuplicate, 3, true},
		{"a pause of five minutes", func(tr *Track) {
			var still []Point
			for i := range 300 {
				p := tr.Points[120]
				p.LatDeg += 2e-5 * math.Sin(float64(i))
				p.LonDeg += 2e-5 * math.Cos(1.7*float64(i))
				p.TimeS += float64(i)
				still = append(still, p)
			}
			for i := 121; i < len(tr.Points); i++ {
				tr.Points[i].TimeS += 300
			}
			insert(tr, 121, still...)
		}, NotePause, 1, true},
		{"a hole of 300 m", func(tr *Track) { tr.Points = append(tr.Points[:60:60], tr.Points[90:]...) }, NoteGap, 1, true},
		{"some heights missing", func(tr *Track) {
			for i := 20; i < 50; i++ {
				tr.Points[i].HeightM = nan
			}
		}, NoteSomeHeights, 30, true},
		{"some heights zero", func(tr *Track) {
			for i := 20; i < 50; i++ {
				tr.Points[i].HeightM = 0
			}
		}, NoteSomeHeights, 30, true},
		{"whole metres", func(tr *Track) {
			for i := range tr.Points {
				tr.Points[i].HeightM = math.Round(tr.Points[i].HeightM)
			}
		}, NoteCoarseHeights, 1, true},
		{"two segments", func(tr *Track) { tr.SegmentStart = []int{0, 100} }, NoteSegments, 1, true},
		{"no heights", func(tr *Track) {
			for i := range tr.Points {
				tr.Points[i].HeightM = nan
			}
		}, NoteNoHeights, 1, false},
		{"zero heights", func(tr *Track) {
			for i := range tr.Points {
				tr.Points[i].HeightM = 0
			}
		}, NoteZeroHeights, 1, false},
		{"times that stand still", func(tr *Track) {
			for i := range tr.Points {
				tr.Points[i].TimeS = 5
			}
		}, NoteSpike, 0, true},
		{"times that run back", func(tr *Track) {
			for i := range tr.Points {
				tr.Points[i].TimeS = -float64(i)
			}
		}, NoteSpike, 0, true},
	} {
		t.Run(c.name, func(t *testing.T) {
			tr := climb(201, 10, 2, 0.06)
			c.do(&tr)
			p := mustProfile(t, &tr)
			sound(t, &p)
			if n := noteOf(&p, c.note); n.Count != c.count {
				t.Errorf("note %v, want a count of %d; all notes %v", n, c.count, p.Notes)
			}
			wantLength, wantAscent, wantSteepest := 2000*math.Hypot(1, 0.06), 120.0, 0.06
			if !c.known {
				wantLength, wantAscent, wantSteepest = 2000, 0, 0
			}
			if c.note == NoteSegments { // the leg between them was not recorded
				wantLength, wantAscent = wantLength*199/200, wantAscent*199/200
			}
			if p.HeightKnown != c.known {
				t.Errorf("height known: %v", p.HeightKnown)
			}
			if math.Abs(p.LengthM()-wantLength) > 3 {
				t.Errorf("length %.2f m, want %.2f", p.LengthM(), wantLength)
			}
			if math.Abs(p.AscentM()-wantAscent) > 1 {
				t.Errorf("ascent %.2f m, want %.2f", p.AscentM(), wantAscent)
			}
			steepest := 0.0
			for _, g := range p.Grade {
				steepest = max(steepest, float64(g))
			}
			if math.Abs(steepest-wantSteepest) > 0.012 {
				t.Errorf("steepest %.4f, want %.4f", steepest, wantSteepest)
			}
		})
	}
}

// A lift between two segments leaves no wall: the road goes on without it.
func TestHoleBetweenSegmentsLeavesNoWall(t *testing.T) {
	tr := climb(201, 10, 2, 0.06)
	tr.SegmentStart = []int{0, 100}
	for i := 100; i < len(tr.Points); i++ {
		tr.Points[i].LatDeg += 0.02
		tr.Points[i].HeightM += 300
	}
	p := mustProfile(t, &tr)
	if math.Abs(p.AscentM()-119.4) > 0.5 {
		t.Errorf("ascent %.2f m, want 119.4", p.AscentM())
	}
	n := noteOf(&p, NoteSegments)
	if n.Count != 1 || math.Abs(n.AtM-990) > 1 || math.Abs(n.LengthM-2233.4) > 2 {
		t.Errorf("note %+v, want one hole of 2233 m at 990 m", n)
	}
}

// The recorder's height drifts up by 30 m while the rider stands for three
// minutes: no wall, and the climb behind it is as high as it is.
func TestDriftWhileStandingLeavesNoWall(t *testing.T) {
	tr := climb(201, 10, 2, 0.06)
	for i := 100; i < len(tr.Points); i++ {
		tr.Points[i].HeightM += 30
		tr.Points[i].TimeS += 180
	}
	p := mustProfile(t, &tr)
	if math.Abs(p.AscentM()-119.4) > 0.5 || noteOf(&p, NoteSpike).Count != 1 {
		t.Errorf("ascent %.2f m, want 119.4; notes %v", p.AscentM(), p.Notes)
	}
}

// Every 25th height is 4 m off: such heights weigh nothing.
func TestOutlyingHeightsWeighNothing(t *testing.T) {
	tr := climb(201, 10, 2, 0.06)
	for i := 10; i < len(tr.Points); i += 25 {
		tr.Points[i].HeightM += 4
	}
	p := mustProfile(t, &tr)
	for i, g := range p.Grade {
		if math.Abs(float64(g)-0.06) > 0.002 {
			t.Errorf("piece %d has grade %.4f, want 0.06", i, g)
		}
	}
}

// Over the crest of a hill 500 m have no heights: the curve may not swing up
// there, where nothing is known, but goes straight across.
func TestCurveGoesStraightOverAHole(t *testing.T) {
	tr := climb(201, 10, 2, 0.10)
	for i := range tr.Points {
		x := float64(i) * 10
		tr.Points[i].HeightM = 400.25 + 0.10*math.Min(x, 2000-x)
		if x > 750 && x < 1250 {
			tr.Points[i].HeightM = math.NaN()
		}
	}
	p := mustProfile(t, &tr)
	for s := 800.0; s < 1200; s += 10 {
		if g := float64(p.GradeAt(s)); math.Abs(g) > 0.002 {
			t.Errorf("at %g m the grade is %.4f, want 0", s, g)
		}
	}
}

func TestTooShortAndBadOptions(t *testing.T) {
	still := climb(50, 0.01, 1, 0)
	long := climb(201, 10, 2, 0.06)
	for _, c := range []struct {
		t    *Track
		o    Options
		kind TrackErrorKind
	}{
		{&Track{}, Options{}, TrackTooShort},
		{&still, Options{}, TrackTooShort},
		{&long, Options{SmoothM: 1}, TrackBadOption},
		{&long, Options{SmoothM: math.NaN()}, TrackBadOption},
		{&long, Options{PieceM: 5000}, TrackBadOption},
	} {
		_, err := FromTrack(c.t, c.o)
		if e, ok := err.(*TrackError); !ok || e.Kind != c.kind {
			t.Errorf("%v, want kind %d", err, c.kind)
		}
	}
}

func TestOptions(t *testing.T) {
	tr := noise{everyM: 5, whiteM: 1, overM: 1}.record(newRand(3), 3000, func(x float64) float64 { return 300 + 20*math.Sin(x/200) })
	last := math.Inf(1)
	for _, scale := range []float64{5, 10, 20, 40} {
		p, err := FromTrack(&tr, Options{SmoothM: scale})
		if err != nil {
			t.Fatal(err)
		}
		if p.AscentM() >= last {
			t.Errorf("smoothing over %g m leaves %.1f m of ascent, less smoothing %.1f", scale, p.AscentM(), last)
		}
		last = p.AscentM()
	}
	p, err := FromTrack(&tr, Options{PieceM: 50})
	if err != nil || len(p.Grade) != 60 {
		t.Errorf("%d pieces of 50 m on 3 km, %v", len(p.Grade), err)
	}
}

// The stiffest curve that options allow is still solved well.
func TestStiffestCurveKeepsAnEvenClimb(t *testing.T) {
	tr := climb(1001, 10, 2, 0.06)
	p, err := FromTrack(&tr, Options{SmoothM: 500, PieceM: 1})
	if err != nil {
		t.Fatal(err)
	}
	for i, g := range p.Grade {
		if math.Abs(float64(g)-0.06) > 1e-3 {
			t.Fatalf("piece %d has grade %.6f, want 0.06", i, g)
		}
	}
}

// A straight even road keeps its length and ascent whatever the spacing of its
// points, its place and its direction; every profile is sound and the bearing
// is that of the way.
func TestStraightRoadHoldsWhateverTheSampling(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		lat := rapid.Float64Range(0.1, 70).Draw(t, "latitude") // not 0, 0: that is a receiver without a fix
		if rapid.Bool().Draw(t, "south") {
			lat = -lat
		}
		lon := rapid.Float64Range(-180, 180).Draw(t, "longitude")
		course := rapid.Float64Range(0, 2*math.Pi).Draw(t, "course")
		grade := rapid.Float64Range(-0.25, 0.25).Draw(t, "grade")
		x := 0.0
		var tr Track
		tr.SegmentStart = []int{0}
		for x < 1500 {
			// On a sphere of the local radius, good to a few parts in 1000 here.
			p := Point{LatDeg: lat + x*math.Cos(course)/111_200, TimeS: x / 4}
			p.LonDeg = math.Mod(lon+x*math.Sin(course)/111_320/math.Cos(p.LatDeg*math.Pi/180)+540, 360) - 180
			if n := len(tr.Points); n > 0 {
				d := leg(&tr.Points[n-1], &p)
				p.HeightM = tr.Points[n-1].HeightM + grade*d
			} else {
				p.HeightM = 100.37
			}
			tr.Points = append(tr.Points, p)
			x += rapid.Float64Range(2, 30).Draw(t, "step")
		}
		n := len(tr.Points)
		direct, toEnd := leg(&tr.Points[0], &tr.Points[n-1]), bearing(&tr.Points[0], &tr.Points[n-1])
		p, err := FromTrack(&tr, Options{})
		if err != nil {
			t.Fatal(err)
		}
		sound(t, &p)
		if want := direct * math.Hypot(1, grade); math.Abs(p.LengthM()/want-1) > 1e-3 {
			t.Fatalf("length %.3f m, want %.3f; %d points, ascent %.1f m, notes %v", p.LengthM(), want, n, p.AscentM(), p.Notes)
		}
		rise := tr.Points[n-1].HeightM - tr.Points[0].HeightM
		if net := p.HeightM[len(p.Grade)] - p.HeightM[0]; math.Abs(net-rise) > 0.02*math.Abs(rise)+0.5 {
			t.Fatalf("rises %.2f m, want %.2f", net, rise)
		}
		for i, b := range p.BearingRad {
			if off := math.Remainder(b-toEnd, 2*math.Pi); math.Abs(off) > 0.02 {
				t.Fatalf("piece %d goes to %.4f rad, want %.4f", i, b, toEnd)
			}
		}
	})
}
