package draw

import (
	"math"
	"os"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/ride"
	"hillwright/wasm/words"
)

// warmed gives a trace heat, charge and legs that wander between bounds.
func warmed(a *ride.Answer, low, high float64) {
	t := &a.Trace
	for i := range t.AtM {
		part := 0.5 + 0.5*math.Sin(float64(i)*0.7)
		t.WindingC[i] = low + part*(high-low)
		t.Charge[i] = 1 - part
		t.ReserveJ[i] = part * 20000
	}
}

func TestStripIsWellDrawn(t *testing.T) {
	r := bench(t)
	rapid.Check(t, func(t *rapid.T) {
		p, a := drawnHill(t)
		warmed(a, rapid.Float64Range(-30, 60).Draw(t, "low"), rapid.Float64Range(61, 220).Draw(t, "high"))
		size, kept := drawnSize(t), rapid.Float64Range(0, 0.9).Draw(t, "kept")
		v := rapid.SampledFrom(voices).Draw(t, "voice")
		n := Strip(p, a, r, kept, size, v)
		checkPicture(t, n)
		lines := classed(n, "band-line")
		if len(lines) != 3 || len(lines) != StripBands(a, r) {
			t.Fatalf("%d bands", len(lines))
		}
		sec := newSection(p, a, size)
		for i, line := range lines {
			d, _ := line.Attr("d")
			all := steps(t, d)
			for k, s := range all {
				top := float64(i)*bandPitch + bandWords
				if s.y < top-0.11 || s.y > top+bandTall+0.11 || k > 0 && s.x < all[k-1].x {
					t.Fatalf("band %d leaves its room or runs back at %v", i, s)
				}
			}
			if first := all[0].x; math.Abs(first-sec.start) > 0.11 {
				t.Fatalf("the strip begins at %v, the section at %v", first, sec.start)
			}
			if last := all[len(all)-1].x; math.Abs(last-sec.x(a.Trace.AtM[len(a.Trace.AtM)-1])) > 0.11 {
				t.Fatalf("the strip ends at %v", last)
			}
		}
	})
}

// What is hatched is what lies beyond the mark, to a pixel.
func TestStripHatchesWhatIsBad(t *testing.T) {
	r := bench(t)
	rapid.Check(t, func(t *rapid.T) {
		p, a := drawnHill(t)
		warmed(a, 20, 180)
		size := drawnSize(t)
		s := newStrip(p, a, r, 0.3, size, metric)
		for i := range s.bands {
			b := &s.bands[i]
			runs := s.badRuns(b)
			for x := s.start + 0.5; x < s.x(a.Trace.AtM[len(a.Trace.AtM)-1]); x++ {
				k, part, _ := spotOn(a, (x-s.start)/s.perM)
				near := false // of an edge of what is bad
				in := false
				for _, run := range runs {
					in = in || x >= run[0] && x <= run[1]
					near = near || math.Abs(x-run[0]) < 1.6 || math.Abs(x-run[1]) < 1.6
				}
				if bad := b.bad(between(b.of, k, part)); bad != in && !near {
					t.Fatalf("%s at x %v: bad is %v, hatched %v", b.name, x, bad, in)
				}
			}
		}
	})
}

// A bike without motor has legs alone, one whose motor rests charge too.
func TestStripOfWhatThereIs(t *testing.T) {
	for _, c := range []struct {
		set  []string
		want string
	}{
		{nil, "motor charge legs"},
		{[]string{"ride.level", "0"}, "charge legs"},
		{[]string{"bike.motor.kind", "none"}, "legs"},
	} {
		p, a, r, _ := real(t, "400 m at 3 %, 60 m at 2 %", c.set...)
		n := Strip(p, a, r, 0.1, Size{340, 210}, metric)
		checkPicture(t, n)
		var got []string
		for _, b := range bandsOf(a, r, 0.1, metric) {
			got = append(got, b.name)
		}
		if strings.Join(got, " ") != c.want {
			t.Errorf("%v: bands %v, want %s", c.set, got, c.want)
		}
		if text := StateText(SectionAtDistance(p, a, Size{340, 210}, 200), a, r, metric); !strings.HasPrefix(text, got[0]) {
			t.Errorf("%v: the staff says %q", c.set, text)
		}
	}
}

// The table says at the foot and the end what the picture's labels say, and the
// staff the same as the table.
func TestStripTextCarriesTheFigures(t *testing.T) {
	for _, v := range voices {
		p, a, r, _ := real(t, "2 km at 6 %, 500 m at 12 %", "rider.power_w", "260", "ride.charge", "0.6")
		text := StripText(p, a, r, 0.1, v).Words()
		for _, s := range texts(Strip(p, a, r, 0.1, Size{340, 210}, v)) {
			for _, part := range strings.Split(s.text, " · ") {
				if !strings.Contains(text, part) {
					t.Errorf("the strip says %q, its table does not: %s", part, text)
				}
			}
		}
		end := StateText(SectionAtDistance(p, a, Size{340, 210}, p.LengthM()), a, r, v)
		for _, part := range strings.Split(end, " · ") {
			value := part[strings.LastIndexByte(part, ' ')+1:]
			if !strings.Contains(text, value) {
				t.Errorf("the staff says %q at the end, the table does not: %s", part, text)
			}
		}
	}
	p, a := made([]float64{400, 60, 100}, []float64{0.07, 0.18, 0.02}, []float64{0.5, -0.2, 0.8}, 430)
	if text := StateText(SectionAtDistance(p, a, Size{340, 210}, 500), a, bench(t), metric); text != "" {
		t.Errorf("beyond the stall the staff says %q", text)
	}
}

func TestLongStripsAreThinned(t *testing.T) {
	p, a := long(10000)
	warmed(a, 20, 180)
	r := bench(t)
	n := Strip(p, a, r, 0.2, Size{360, 220}, metric)
	checkPicture(t, n)
	for _, line := range classed(n, "band-line") {
		d, _ := line.Attr("d")
		all := steps(t, d)
		if len(all) > 4*360 {
			t.Errorf("%d points for 360 px", len(all))
		}
		low, high := math.Inf(1), math.Inf(-1)
		for _, s := range all {
			low, high = math.Min(low, s.y), math.Max(high, s.y)
		}
		if high-low < bandTall*0.7 {
			t.Errorf("thinning lost the ups and downs: %v to %v", low, high)
		}
	}
	for _, bad := range classed(n, "band-bad") {
		d, _ := bad.Attr("d")
		if n := strings.Count(d, "M"); n > 360 {
			t.Errorf("%d hatched pieces for 360 px", n)
		}
	}
}

// The stylesheet gives a strip of each number of bands the height that it has,
// so that nothing jumps when the true width becomes known.
func TestStylesheetKnowsTheStripsHeight(t *testing.T) {
	css, err := os.ReadFile("../../site/style.css")
	if err != nil {
		t.Fatal(err)
	}
	for n := 1; n <= 3; n++ {
		if rule := ".bands-" + num(float64(n)) + " .picture-strip { height: " + num(float64(n)*bandPitch) + "px; }"; !strings.Contains(string(css), rule) {
			t.Errorf("site/style.css lacks %q", rule)
		}
	}
}

// Odd rides still give a strip.
func TestStripOfOddRides(t *testing.T) {
	r := bench(t)
	p, a := made([]float64{60, 50}, []float64{0.4, 0.1}, []float64{-0.5, 0.2}, 0)
	checkPicture(t, Strip(p, a, r, 0, Size{320, 180}, german))
	p, a = made([]float64{1}, []float64{3}, []float64{0.5}, math.NaN())
	checkPicture(t, Strip(p, a, r, 0.9, Size{320, 180}, words.Voice{}))
	if n := Strip(p, &ride.Answer{}, r, 0, Size{320, 180}, metric); n != nil {
		t.Error("a strip of no ride")
	}
}
