package draw

import (
	"math"
	"sort"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/ride"
	"hillwright/wasm/dom"
)

func drawnBalance(t *rapid.T) ride.Balance {
	pulls := rapid.SliceOfN(rapid.Float64Range(0.5, 3000), 3, 9).Draw(t, "pulls")
	if rapid.Bool().Draw(t, "close together") {
		for i := range pulls {
			pulls[i] = pulls[0] + pulls[i]/100
		}
	}
	sort.Float64s(pulls)
	return weighed(rapid.Float64Range(-300, 3000).Draw(t, "wanted"), pulls...)
}

func TestBalanceIsWellDrawn(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		b := drawnBalance(t)
		size := Size{rapid.Float64Range(320, 1000).Draw(t, "w"), 230}
		opt := BalanceOptions{WantedN: rapid.SampledFrom([]float64{math.NaN(), 0, 1, 300, 5000}).Draw(t, "tried")}
		n := Balance(&b, size, rapid.SampledFrom(voices).Draw(t, "voice"), opt)
		checkPicture(t, n)
		checkLeaders(t, n)
	})
}

// checkLeaders checks that no leader cuts a label and that leaders, running
// from peg to pole, do not cross.
func checkLeaders(t *rapid.T, n *dom.Node) {
	d, _ := classed(n, "leader")[0].Attr("d")
	line := steps(t, d)
	words := texts(n)
	for i := 0; i+2 < len(line); i += 3 {
		foot, pole, top := line[i], line[i+1], line[i+2]
		if foot.op != 'M' || pole.op != 'L' || top.op != 'V' {
			t.Fatalf("a leader is %v", line[i:i+3])
		}
		if i > 0 && (pole.x <= line[i-2].x || foot.x < line[i-3].x) {
			t.Fatalf("leaders cross: %v after %v", line[i:i+3], line[i-3:i])
		}
		for _, w := range words {
			if pole.x > w.box.x0 && pole.x < w.box.x1 && top.y < w.box.y1 && pole.y > w.box.y0 {
				t.Fatalf("the pole at %v cuts %q", pole.x, w.text)
			}
		}
	}
}

// Dragging the weight to where a pull stands gives that pull.
func TestBalancePullIsWhereItStands(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		b := drawnBalance(t)
		size := Size{rapid.Float64Range(320, 1000).Draw(t, "w"), 230}
		most := BalancePull(&b, size, size.W)
		pull := rapid.Float64Range(0, most).Draw(t, "pull")
		n := Balance(&b, size, metric, BalanceOptions{WantedN: pull})
		d, _ := classed(n, "cord")[0].Attr("d")
		x := steps(t, d)[0].x
		if got := BalancePull(&b, size, x); math.Abs(got-pull) > most/(size.W-2*balanceSide)*0.051 {
			t.Fatalf("the weight of %v N hangs at %v, which reads %v N", pull, x, got)
		}
		if BalancePull(&b, size, -100) != 0 || BalancePull(&b, size, 9999) != most {
			t.Fatal("the scale does not end at its ends")
		}
		for _, p := range b.Pegs[:1] {
			if p.PullN > most {
				t.Fatalf("the first peg at %v lies beyond the scale's %v", p.PullN, most)
			}
		}
	})
}

// Pegs that the weight has passed are broken, the first beyond it is inked, the
// others stand.
func TestPegsBreakOneByOne(t *testing.T) {
	b := weighed(200, 300, 400, 500)
	for _, c := range []struct {
		tried                   float64
		broken, inked, standing int
		gap                     string
		short                   bool
	}{
		{math.NaN(), 0, 1, 2, "33", false},
		{300, 0, 1, 2, "0", false},
		{330, 1, 1, 1, "10", true},
		{450, 2, 1, 0, "50", true},
		{600, 3, 0, 0, "100", true},
	} {
		n := Balance(&b, Size{360, 230}, metric, BalanceOptions{WantedN: c.tried})
		count := func(class string, per int) int {
			sum := 0
			for _, k := range classed(n, class) {
				d, _ := k.Attr("d")
				sum += strings.Count(d, "M")
			}
			return sum / per
		}
		if got := [3]int{count("peg-broken", 4), count("peg-binds", 1), count("peg-head", 1)}; got != [3]int{c.broken, c.inked, c.standing} {
			t.Errorf("tried %v: broken, inked, standing %v, want %d %d %d", c.tried, got, c.broken, c.inked, c.standing)
		}
		if short := len(classed(n, "gap-short")) == 1; short != c.short {
			t.Errorf("tried %v: short is %v", c.tried, short)
		}
		if !strings.Contains(n.Words(), c.gap+"\u202f%") {
			t.Errorf("tried %v: no %s %% in %q", c.tried, c.gap, n.Words())
		}
	}
}

func TestTheWeightIsASliderForAThumb(t *testing.T) {
	b := weighed(200, 300, 400, 500)
	n := Balance(&b, Size{340, 230}, metric, own)
	w := classed(n, "weight")[0]
	for name, want := range map[string]string{
		"role": "slider", "tabindex": "0", "data-act": "drag-weight",
		"aria-valuemin": "0", "aria-valuenow": "200", "aria-valuetext": "200\u202fN",
	} {
		if got, _ := w.Attr(name); got != want {
			t.Errorf("%s is %q, want %q", name, got, want)
		}
	}
	for _, side := range []string{"width", "height"} {
		if px, ok := attr(classed(w, "touch")[0], side); !ok || px < 56 {
			t.Errorf("the %s to touch is %v px", side, px)
		}
	}
	// A picture with something to touch inside is no image.
	if role, _ := n.Attr("role"); role != "group" {
		t.Errorf("role %q", role)
	}
}

func TestOddBalances(t *testing.T) {
	nine := weighed(100, 310, 311, 312, 313, 314, 315, 316, 317, 318)
	zero := weighed(0, 0, 10)
	for name, b := range map[string]ride.Balance{
		"no pegs": weighed(100), "one": weighed(100, 200), "nine at one place": nine,
		"nothing pulls": zero, "downhill": weighed(-200, 300, 400), "far off": weighed(10, 20, 90000), "a lorry": weighed(60000, 80000, 82000),
	} {
		for _, v := range voices {
			t.Run(name, func(t *testing.T) {
				checkPicture(t, Balance(&b, Size{340, 230}, v, own))
				if text := BalanceText(&b, v).Words(); strings.Contains(text, "NaN") {
					t.Error(text)
				}
			})
		}
	}
}

// Every figure of the drawing's labels stands in the table too.
func TestBalanceTextCarriesTheFigures(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		b := drawnBalance(t)
		v := rapid.SampledFrom(voices).Draw(t, "voice")
		words := BalanceText(&b, v).Words()
		n := Balance(&b, Size{360, 230}, v, own)
		drawn := n.Words()
		for _, p := range b.Pegs {
			for _, part := range []string{v.Limit(p.Limit), v.Pull(p.PullN)} {
				if !strings.Contains(words, part) || !strings.Contains(drawn, part) {
					t.Fatalf("%q is missing in %q or %q", part, words, drawn)
				}
			}
		}
		for _, part := range []string{v.Pull(b.WantedN), v.Headroom(b.Pegs[0].Headroom)} {
			if !strings.Contains(words, part) || !strings.Contains(drawn, part) {
				t.Fatalf("%q is missing in %q or %q", part, words, drawn)
			}
		}
	})
}

// The scale's figures keep apart at any end of the scale.
func TestScaleFiguresKeepApart(t *testing.T) {
	for w := 320.0; w < 800; w += 37 {
		for most := 2.0; most < 200000; most *= 1.07 {
			b := weighed(most/3, most/2)
			for _, v := range voices {
				checkPicture(t, Balance(&b, Size{w, 230}, v, own))
			}
		}
	}
}

func BenchmarkBalance(b *testing.B) {
	of := weighed(200, 300, 310, 400, 500, 600)
	for b.Loop() {
		Balance(&of, Size{360, 230}, metric, own)
	}
}
