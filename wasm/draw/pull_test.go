package draw

import (
	"math"
	"strconv"
	"strings"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// drawnRig is the common bike made heavier, lighter, with another motor.
func drawnRig(t *rapid.T) *rig.Rig {
	number := func(path string, low, high float64) []string {
		x := rapid.Float64Range(low, high).Draw(t, path)
		return []string{path, strconv.FormatFloat(x, 'f', 1, 64)}
	}
	set := number("rider.mass_kg", 45, 130)
	set = append(set, number("load.mass_kg", 0, 120)...)
	set = append(set, number("rider.power_w", 50, 300)...)
	set = append(set, number("bike.motor.torque_nm", 20, 120)...)
	set = append(set, number("bike.motor.power_w", 100, 900)...)
	set = append(set, "bike.motor.kind", rapid.SampledFrom([]string{"none", "crank", "rear-hub"}).Draw(t, "kind"))
	_, _, r, _ := real(t, "100 m at 5 %", set...)
	return r
}

func TestPullDiagramIsWellDrawn(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		r := drawnRig(t)
		g := unit.Grade(rapid.Float64Range(-0.1, 0.4).Draw(t, "grade"))
		fresh := r.Fresh(1)
		run, held := ride.Settle(r, ride.At(g, r.Day.WindMps), &fresh, 25/3.6)
		size := Size{rapid.Float64Range(320, 900).Draw(t, "w"), rapid.Float64Range(220, 420).Draw(t, "h")}
		v := rapid.SampledFrom(voices).Draw(t, "voice")
		n := PullDiagram(r, g, run, size, v)
		checkPicture(t, n)
		table := PullText(r, g, run, v).Words()
		if !held {
			if len(classed(n, "crossing")) != 0 {
				t.Fatal("a crossing is marked where nothing holds")
			}
			return
		}
		for _, part := range []string{v.Speed(run.SpeedMps), v.Gear(r, run.Gear)} {
			if !strings.Contains(n.Words(), part) || !strings.Contains(table, part) {
				t.Fatalf("%q is missing in %q or %q", part, n.Words(), table)
			}
		}
	})
}

// The marked crossing lies on both lines: the best pull and the load.
func TestCrossingLiesOnBothLines(t *testing.T) {
	r := bench(t)
	for _, percent := range []float64{2, 6, 12, 18} {
		g := unit.Percent(percent)
		fresh := r.Fresh(1)
		run, held := ride.Settle(r, ride.At(g, r.Day.WindMps), &fresh, 25/3.6)
		if !held {
			t.Fatalf("the common bike does not hold %v %%", percent)
		}
		d := newDiagram(r, g, run, Size{700, 400}, metric)
		x, y := d.x(run.SpeedMps), d.y(run.RiderN+run.MotorN)
		if load := d.y(d.loadAt(run.SpeedMps)); math.Abs(load-y) > 0.5 {
			t.Errorf("at %v %% the load passes %v px from the crossing", percent, load-y)
		}
		if best := d.y(r.PullAt(run.SpeedMps, run.Gear, &d.now).Sum()); math.Abs(best-y) > 0.5 {
			t.Errorf("at %v %% the gear's pull passes %v px from the crossing", percent, best-y)
		}
		if math.IsNaN(x) || x < d.plot.x0 || x > d.plot.x1 {
			t.Errorf("the crossing lies at x %v", x)
		}
	}
}

// A limit that decides a long part of the best pull is named.
func TestLimitsAreNamedWhereTheyDecide(t *testing.T) {
	r := bench(t)
	n := PullDiagram(r, 0.1, ride.Running{}, Size{360, 260}, metric)
	d := newDiagram(r, 0.1, ride.Running{}, Size{360, 260}, metric)
	for _, run := range d.runs() {
		if name := metric.Limit(run.by); run.last-run.from > 8 && !strings.Contains(n.Words(), name) {
			t.Errorf("%s decides from %v to %v m/s and is not named", name, d.best[run.from].mps, d.best[run.last].mps)
		}
	}
}

func BenchmarkPullDiagram(b *testing.B) {
	r := bench(b)
	fresh := r.Fresh(1)
	run, _ := ride.Settle(r, ride.At(0.1, 0), &fresh, 7)
	for b.Loop() {
		PullDiagram(r, 0.1, run, Size{360, 260}, metric)
	}
}
