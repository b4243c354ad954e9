package draw

import (
	"math"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
	"hillwright/wasm/words"
)

// made makes a profile of pieces and an answer with the given headroom on each,
// hardest on the piece of the least; stalledAt is NaN where it does not.
func made(lengths, grades, headroom []float64, stalledAt float64) (*hill.Profile, *ride.Answer) {
	p := &hill.Profile{EdgeM: []float64{0}, HeightM: []float64{200}}
	a := &ride.Answer{}
	at, h, hardest := 0.0, 200.0, 0
	for i := range lengths {
		g := unit.Grade(grades[i])
		if math.IsNaN(stalledAt) || at <= stalledAt {
			addPoint(&a.Trace, at, headroom[i])
		}
		at += lengths[i]
		h += lengths[i] * g.Sin()
		p.EdgeM = append(p.EdgeM, at)
		p.HeightM = append(p.HeightM, h)
		p.Grade = append(p.Grade, g)
		if headroom[i] < headroom[hardest] {
			hardest = i
		}
	}
	end := at
	if !math.IsNaN(stalledAt) {
		a.Stalled, a.StalledAtM, end = true, stalledAt, stalledAt
	}
	addPoint(&a.Trace, end, a.Trace.Headroom[len(a.Trace.Headroom)-1])
	a.Hardest = ride.Stretch{FromM: p.EdgeM[hardest], ToM: p.EdgeM[hardest+1], Grade: p.Grade[hardest]}
	a.Balance = weighed((1-headroom[hardest])*400, 400, 450, 700)
	return p, a
}

func addPoint(t *ride.Trace, atM, headroom float64) {
	t.AtM = append(t.AtM, atM)
	t.TimeS = append(t.TimeS, atM/3)
	t.SpeedMps = append(t.SpeedMps, 3)
	t.Gear = append(t.Gear, 0)
	t.CadenceRPM = append(t.CadenceRPM, 60)
	t.RiderW = append(t.RiderW, 100)
	t.MotorW = append(t.MotorW, 200)
	t.WantedN = append(t.WantedN, 100)
	t.PullN = append(t.PullN, 150)
	t.Headroom = append(t.Headroom, headroom)
	t.SetBy = append(t.SetBy, rig.Torque)
	t.WindingC = append(t.WindingC, 20+atM/10)
	t.Charge = append(t.Charge, 0.8)
	t.ReserveJ = append(t.ReserveJ, 12000)
}

// weighed makes a balance of pulls in order.
func weighed(wanted float64, pulls ...float64) ride.Balance {
	b := ride.Balance{Grade: 0.12, SpeedMps: 1.1, WantedN: wanted}
	for i, n := range pulls {
		b.Pegs = append(b.Pegs, ride.Peg{Limit: rig.Limit(i) % rig.Limits, PullN: n, Headroom: 1 - wanted/n})
	}
	return b
}

var voices = []words.Voice{metric, german, imperial}

func drawnSize(t *rapid.T) Size {
	return Size{rapid.Float64Range(320, 1000).Draw(t, "w"), rapid.Float64Range(200, 400).Draw(t, "h")}
}

func drawnHill(t *rapid.T) (*hill.Profile, *ride.Answer) {
	n := rapid.IntRange(1, 40).Draw(t, "n")
	scale := rapid.SampledFrom([]float64{1, 10, 1000}).Draw(t, "scale")
	list := func(name string, low, high float64) []float64 {
		return rapid.SliceOfN(rapid.Float64Range(low, high), n, n).Draw(t, name)
	}
	lengths := list("lengths", 1*scale, 30*scale)
	stalledAt := math.NaN()
	if rapid.Bool().Draw(t, "stalls") {
		stalledAt = rapid.Float64Range(0, lengths[0]*float64(n)/3).Draw(t, "stalled")
		total := 0.0
		for _, l := range lengths {
			total += l
		}
		stalledAt = math.Min(stalledAt, total)
	}
	return made(lengths, list("grades", -0.3, 0.5), list("headroom", -0.5, 1), stalledAt)
}

func TestSectionIsWellDrawn(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p, a := drawnHill(t)
		size := drawnSize(t)
		v := rapid.SampledFrom(voices).Draw(t, "voice")
		n := Section(p, a, size, v)
		checkPicture(t, n)

		road, _ := classed(n, "road")[0].Attr("d")
		line := steps(t, road)
		for i := 1; i < len(line); i++ {
			if line[i].x < line[i-1].x {
				t.Fatalf("the road runs back from %v to %v", line[i-1].x, line[i].x)
			}
		}
		base := size.H - sectionRows
		for _, s := range line {
			if s.x < 0 || s.x > size.W || s.y < sectionSky-0.1 || s.y > base-groundLeast+0.1 {
				t.Fatalf("the road leaves its room at %v, %v", s.x, s.y)
			}
		}
		at := newSection(p, a, size)
		for _, w := range texts(n) {
			if w.box.y0 < base && at.roof(w.box.x0, w.box.x1) < w.box.y1 {
				t.Fatalf("%q at %v lies over the road", w.text, w.box)
			}
		}
	})
}

// The exaggeration that is said is the one that is drawn: measured on the
// staff's foot, whose places are known in metres and in pixels.
func TestSectionIsTrueToItsHeights(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p, a := drawnHill(t)
		size := drawnSize(t)
		low, high := 0, 0
		for i := range p.HeightM {
			if p.HeightM[i] < p.HeightM[low] {
				low = i
			}
			if p.HeightM[i] > p.HeightM[high] {
				high = i
			}
		}
		if p.HeightM[high]-p.HeightM[low] < 1 {
			return
		}
		foot, top := SectionAtDistance(p, a, size, p.EdgeM[low]), SectionAtDistance(p, a, size, p.EdgeM[high])
		up := (foot.Y - top.Y) / (top.HeightM - foot.HeightM)
		along := (top.X - foot.X) / (top.AtM - foot.AtM)
		text := Section(p, a, size, metric).Words()
		said := metric.Say(words.Exaggeration, metric.Number(math.Round(up/along), 0))
		if !strings.Contains(text, said) || math.Abs(up/along-math.Round(up/along)) > 1e-6 {
			t.Fatalf("drawn ×%v, the picture says %q", up/along, text)
		}
		if wide := along * p.LengthM(); up/along > 1.5 && math.Abs(wide-(size.W-2*sectionSide)) > 1e-6 {
			t.Fatalf("exaggerated, and yet only %v px of %v wide", wide, size.W)
		}
	})
}

// Every place that is ridden lies on ground at least as solid as its headroom
// asks, and no more solid than its worst neighbour within a pixel.
func TestHatchingAgreesWithHeadroom(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p, a := drawnHill(t)
		size := drawnSize(t)
		s := newSection(p, a, size)
		runs := s.stretches()
		for i, r := range runs {
			if i > 0 && (r.from != runs[i-1].to || r.as == runs[i-1].as) {
				t.Fatalf("runs %v and %v do not follow each other", runs[i-1], r)
			}
			for x := r.from + 0.5; x < r.to; x++ {
				want := hatchBeyond
				pixel := 1 / s.perM
				atM := math.Floor(x-s.start) * pixel
				least := math.Inf(1)
				for k := 0; k+1 < len(a.Trace.AtM); k++ {
					if a.Trace.AtM[k] < atM+pixel-1e-6*pixel && a.Trace.AtM[k+1] > atM+1e-6*pixel {
						least = math.Min(least, a.Trace.Headroom[k])
					}
				}
				if math.IsInf(least, 1) && a.Stalled && atM+pixel > a.Hardest.FromM && atM < a.Hardest.ToM {
					continue // the hardest stretch, weighed though not ridden
				}
				if !math.IsInf(least, 1) {
					want = hatchOf(least)
				}
				if r.as != want {
					t.Fatalf("ground at %v m (x %v) is %s, headroom %v asks for %s", atM, x, hatchNames[r.as], least, hatchNames[want])
				}
			}
		}
	})
}

func TestHatchOf(t *testing.T) {
	for _, c := range []struct {
		headroom float64
		want     hatch
	}{{1, hatchOpen}, {0.35, hatchOpen}, {0.349, hatchClose}, {0.1, hatchClose}, {0.099, hatchSolid}, {-2, hatchSolid}} {
		if got := hatchOf(c.headroom); got != c.want {
			t.Errorf("headroom %v is %s, want %s", c.headroom, hatchNames[got], hatchNames[c.want])
		}
	}
}

// Odd hills still give a picture.
func TestSectionOfOddHills(t *testing.T) {
	nan := math.NaN()
	odd := map[string]func() (*hill.Profile, *ride.Answer){
		"flat": func() (*hill.Profile, *ride.Answer) {
			return made([]float64{500, 500}, []float64{0, 0}, []float64{1, 1}, nan)
		},
		"single piece": func() (*hill.Profile, *ride.Answer) {
			return made([]float64{60}, []float64{0.18}, []float64{0.05}, nan)
		},
		"one metre": func() (*hill.Profile, *ride.Answer) { return made([]float64{1}, []float64{3}, []float64{0.5}, nan) },
		"downhill": func() (*hill.Profile, *ride.Answer) {
			return made([]float64{400, 300}, []float64{-0.05, -0.2}, []float64{1, 1}, nan)
		},
		"stalled at 0": func() (*hill.Profile, *ride.Answer) {
			return made([]float64{60, 50}, []float64{0.4, 0.1}, []float64{-0.5, 0.2}, 0)
		},
		"stalled at end": func() (*hill.Profile, *ride.Answer) {
			return made([]float64{60, 50}, []float64{0.1, 0.4}, []float64{0.5, -0.2}, 110)
		},
		"long":      func() (*hill.Profile, *ride.Answer) { return long(10000) },
		"no answer": func() (*hill.Profile, *ride.Answer) { p, _ := long(5); return p, nil },
	}
	r := bench(t)
	for name, make := range odd {
		t.Run(name, func(t *testing.T) {
			p, a := make()
			for _, v := range voices {
				for _, size := range []Size{{320, 180}, {360, 220}, {700, 300}} {
					checkPicture(t, Section(p, a, size, v))
					for _, x := range []float64{-50, 0, 100, size.W, 9999} {
						s := SectionAt(p, a, size, x)
						if math.IsNaN(s.X+s.Y+s.HeightM+s.AtM) || s.AtM < 0 || s.AtM > p.LengthM() {
							t.Errorf("staff at %v: %+v", x, s)
						}
					}
				}
				if text := SectionText(p, a, r, v).Words(); strings.Contains(text, "NaN") {
					t.Error(text)
				}
			}
		})
	}
	if n := Section(&hill.Profile{}, nil, Size{360, 220}, metric); n == nil || n.Tag != "svg" {
		t.Error("a profile without road has no picture")
	}
}

func bench(t testing.TB) *rig.Rig {
	_, _, r, _ := real(t, "400 m at 7 %, 60 m at 18 %")
	return r
}

// long is a road of 100 km in n pieces, up and down.
func long(n int) (*hill.Profile, *ride.Answer) {
	lengths, grades, headroom := make([]float64, n), make([]float64, n), make([]float64, n)
	for i := range n {
		lengths[i] = 100000 / float64(n)
		grades[i] = 0.06*math.Sin(float64(i)/300) + 0.04*math.Sin(float64(i)*1.7)
		headroom[i] = 0.5 - 4*grades[i]
	}
	return made(lengths, grades, headroom, math.NaN())
}

func TestLongHillsAreThinned(t *testing.T) {
	p, a := long(10000)
	d, _ := classed(Section(p, a, Size{360, 220}, metric), "road")[0].Attr("d")
	if n := len(steps(t, d)); n > 2*360+2 {
		t.Errorf("%d points for 360 px", n)
	}
	// Every column keeps its highest and its lowest place, and the road runs on.
	s := newSection(p, a, Size{360, 220})
	low, high := map[float64]float64{}, map[float64]float64{}
	for i, m := range p.EdgeM {
		x, y := math.Floor(s.x(m)), s.y(p.HeightM[i])
		if top, ok := high[x]; !ok || y < top {
			high[x] = y
		}
		if bottom, ok := low[x]; !ok || y > bottom {
			low[x] = y
		}
	}
	for i, q := range s.road {
		if i > 0 && q.x < s.road[i-1].x {
			t.Fatalf("the road runs back at %v", q.x)
		}
		if x := math.Floor(q.x); q.y == high[x] {
			delete(high, x)
		}
		if x := math.Floor(q.x); q.y == low[x] {
			delete(low, x)
		}
	}
	if len(high)+len(low) > 0 {
		t.Errorf("thinning lost the highest of %d and the lowest of %d columns", len(high), len(low))
	}
}

// Where the rig stops within the hardest stretch, both words stay near it.
func TestWordsStayNear(t *testing.T) {
	p, a := made([]float64{400, 60, 300}, []float64{0.07, 0.18, 0.02}, []float64{0.5, -0.2, 0.6}, 420)
	for _, w := range []float64{340, 700} {
		size := Size{w, 260}
		s := newSection(p, a, size)
		n := Section(p, a, size, metric)
		checkPicture(t, n)
		for _, w := range texts(n) {
			if b := w.box; strings.Contains(w.text, "420") || strings.Contains(w.text, "·") {
				if over := s.roof(b.x0, b.x1) - b.y1; over > 60 {
					t.Errorf("%q stands %v px above the road", w.text, over)
				}
			}
		}
	}
}

// The bracket's words stand on its bar, and on two lines where one is too long.
func TestBracketWords(t *testing.T) {
	p, a := made([]float64{400, 60}, []float64{0.07, 0.18}, []float64{0.5, 0.05}, math.NaN())
	for _, size := range []Size{{360, 220}, {240, 220}} {
		n := Section(p, a, size, german)
		checkPicture(t, n)
		d, _ := classed(n, "bracket")[0].Attr("d")
		bar := steps(t, d)[1].y
		for _, w := range texts(n) {
			if strings.Contains(w.text, german.Grade(0.18)) && (bar-w.box.y1 < 2 || bar-w.box.y1 > 6) {
				t.Errorf("at %v px the bar lies at %v, the words end at %v", size.W, bar, w.box.y1)
			}
		}
	}
}

// The staff reads the profile and the trace, also at the far side of an edge.
func TestStaffReadsTheRide(t *testing.T) {
	p, a := made([]float64{400, 60, 100}, []float64{0.07, 0.18, 0.02}, []float64{0.5, 0.05, 0.8}, 430)
	a.Trace.SpeedMps = []float64{5, 3, 1}
	cases := []struct {
		atM      float64
		grade    unit.Grade
		known    bool
		headroom float64
		speed    float64
	}{
		{0, 0.07, true, 0.5, 5},
		{200, 0.07, true, 0.5, 4},
		{400, 0.18, true, 0.05, 3},
		{415, 0.18, true, 0.05, 2},
		{430, 0.18, true, 0.05, 1},
		{450, 0.18, false, 0, 0},
		{560, 0.02, false, 0, 0},
	}
	size := Size{360, 220}
	for _, c := range cases {
		s := SectionAtDistance(p, a, size, c.atM)
		if s.Grade != c.grade || s.Known != c.known || s.Headroom != c.headroom || math.Abs(s.SpeedMps-c.speed) > 1e-9 {
			t.Errorf("at %v m: %+v, want %+v", c.atM, s, c)
		}
		if back := SectionAt(p, a, size, s.X); math.Abs(back.AtM-c.atM) > 1e-6 {
			t.Errorf("x %v reads %v m, want %v", s.X, back.AtM, c.atM)
		}
	}
}

// What the picture says in figures, the table says too.
func TestSectionTextCarriesTheFigures(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p, a := drawnHill(t)
		r := &rig.Rig{}
		v := rapid.SampledFrom(voices).Draw(t, "voice")
		text := SectionText(p, a, r, v).Words()
		n := Section(p, a, drawnSize(t), v)
		for _, s := range texts(n) {
			if strings.Contains(s.text, "×") && !strings.Contains(s.text, "·") {
				continue // the exaggeration belongs to the drawing
			}
			for _, part := range strings.Split(s.text, " · ") {
				if !strings.Contains(text, strings.TrimSuffix(part, ".")) && !strings.Contains(part, v.Limit(a.Balance.Pegs[0].Limit)) {
					t.Fatalf("the picture says %q, the table does not: %s", part, text)
				}
			}
		}
		if a.Balance.WantedN > 0 && !strings.Contains(text, v.Limit(a.Balance.Pegs[0].Limit)) {
			t.Fatalf("the table does not name the limit: %s", text)
		}
	})
}

func BenchmarkSectionLong(b *testing.B) {
	p, a := long(10000)
	for b.Loop() {
		Section(p, a, Size{360, 220}, metric)
	}
}
