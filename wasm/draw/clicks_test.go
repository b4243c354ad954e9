package draw

import (
	"math"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/click"
	"hillwright/wasm/dom"
)

func drawnView(t *rapid.T) *ClickView {
	n := rapid.IntRange(2, 60).Draw(t, "spots")
	v := &ClickView{PerHz: rapid.SampledFrom([]float64{0, 0.06, 1}).Draw(t, "per"), Size: drawnSize(t), Voice: rapid.SampledFrom(voices).Draw(t, "voice"), ID: "a", Dots: rapid.Bool().Draw(t, "dots")}
	at := rapid.Float64Range(-5, 50).Draw(t, "from")
	for range n {
		at += rapid.Float64Range(0.05, 3).Draw(t, "step")
		v.Line = append(v.Line, Spot{at, rapid.Float64Range(0, 300).Draw(t, "is"), rapid.Float64Range(0, 20).Draw(t, "error")})
	}
	v.ToS = v.Line[n-1].AtS
	v.FromS = min(v.ToS, v.Line[0].AtS+rapid.Float64Range(0, 1).Draw(t, "cut"))
	if rapid.Bool().Draw(t, "pictured") {
		rows, columns := rapid.IntRange(1, 12).Draw(t, "rows"), rapid.IntRange(0, 30).Draw(t, "columns")
		v.Picture = &click.Picture{StepS: 0.25, StartS: rapid.Float64Range(-1, 40).Draw(t, "start")}
		for i := range rows {
			v.Picture.RatesHz = append(v.Picture.RatesHz, 5*math.Pow(1.5, float64(i)))
		}
		for i := range rows * columns {
			v.Picture.Levels = append(v.Picture.Levels, uint8(i*53))
		}
	}
	return v
}

// Whatever run there is, the picture is well drawn, its line runs forward
// within the frame, and a finger on a handle is at the handle's time.
func TestClicksAreWellDrawn(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		v := drawnView(t)
		n := Clicks(v, "title", "desc", "cut", [2]string{"a=from", "a=to"}, [2]string{"begin", "end"})
		checkPicture(t, n)
		p := newClicksPlot(v)
		for i, s := range pathOf(t, classed(n, "followed")[0]) {
			if s.x < p.plot.x0-0.1 || s.x > p.plot.x1+0.1 || s.y < p.plot.y0-0.1 || s.y > p.plot.y1+0.1 {
				t.Fatalf("the line leaves the frame at %v", s)
			}
			if math.Abs(s.x-p.x(v.Line[i].AtS)) > 0.1 {
				t.Fatalf("spot %d is drawn at %v", i, s.x)
			}
		}
		if got := ClicksAt(v, p.x(v.FromS)); math.Abs(got-v.FromS) > 1e-6*(1+math.Abs(v.FromS)) {
			t.Fatalf("the handle at %v s reads %v s", v.FromS, got)
		}
	})
}

func pathOf(t fataler, n *dom.Node) []step {
	d, ok := n.Attr("d")
	if !ok {
		t.Fatalf("a path without data")
	}
	return steps(t, d)
}

// What stands out is inked where it is, and densest where it is strongest.
func TestInkLiesWhereClicksStandOut(t *testing.T) {
	v := &ClickView{PerHz: 0.1, Size: Size{360, 260}, ID: "a", Line: []Spot{{0, 8, 0}, {40, 2, 0}}, ToS: 40}
	v.Picture = &click.Picture{StepS: 1, RatesHz: []float64{20, 24, 28.8, 34.56, 41.5, 49.8, 59.7, 71.7}, Levels: make([]uint8, 8*40)}
	v.Picture.Levels[20*8+3] = 200
	v.Picture.Levels[30*8+5] = 70
	n := Clicks(v, "title", "desc", "cut", [2]string{"a", "b"}, [2]string{"a", "b"})
	p := newClicksPlot(v)
	strong := pathOf(t, classed(n, "ink-3")[0])
	if x, y := p.x(20), p.y(34.56*0.1); math.Abs(strong[0].x-p.x(19.5)) > 1.5 || strong[0].x > x || math.Abs(strong[0].y-y) > 12 {
		t.Errorf("the strongest cell begins at %v, want around %v %v", strong[0], x, y)
	}
	if len(classed(n, "ink-2")) != 0 || len(classed(n, "ink-1")) != 1 {
		t.Error("densities do not follow the levels")
	}
	if Clicks(&ClickView{Line: v.Line[:1]}, "", "", "", [2]string{}, [2]string{}) != nil {
		t.Error("one spot makes a picture")
	}
}

func TestRulerIsWellDrawn(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		low := rapid.Float64Range(0, 0.01).Draw(t, "low")
		r := Ruler{
			ID: "crr", Title: "t", Value: "0.0070 ± 0.0002", PriorLow: rapid.Float64Range(0, 0.006).Draw(t, "prior"), PriorHigh: 0.012,
			Low: low, Is: low + 0.001, High: low + 0.002, Held: rapid.Bool().Draw(t, "held"), Write: func(v float64) string { return metric.Number(v, 4) },
		}
		size := Size{rapid.Float64Range(280, 700).Draw(t, "wide"), 82}
		checkPicture(t, DragRuler(r, size))
	})
	if DragRuler(Ruler{Write: func(float64) string { return "" }}, Size{300, 82}) != nil {
		t.Error("a ruler of nothing")
	}
}

// The level's bar grows with the sound and stays in its frame.
func TestLevel(t *testing.T) {
	last := -1.0
	for _, peak := range []float64{0, 0.0005, 0.01, 0.2, 0.9, 1, 3} {
		n := Level(peak, Size{328, 48})
		bar := classed(n, "ground-close")
		if len(bar) == 0 {
			t.Fatalf("no bar at %v", peak)
		}
		x := 0.0
		for _, s := range pathOf(t, bar[0]) {
			x = math.Max(x, s.x)
		}
		if x < last || x > 324.1 {
			t.Errorf("at %v the bar ends at %v, before at %v", peak, x, last)
		}
		last = x
	}
}

func TestTurn(t *testing.T) {
	levels := make([]float64, 32)
	levels[5], levels[6] = 6, 4
	n := Turn(levels, 0.12, 0.25, "t", "d", Size{340, 130})
	checkPicture(t, n)
	if len(classed(n, "bracket")) != 1 || len(classed(Turn(levels, 0, 0, "t", "d", Size{340, 130}), "bracket")) != 0 {
		t.Error("the bracket does not follow what was found")
	}
	if Turn(nil, 0, 0, "", "", Size{340, 130}) != nil {
		t.Error("a picture of nothing")
	}
}
