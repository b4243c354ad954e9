package draw

import (
	"math"

	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// Measures of the pull diagram [px].
const (
	diagramLeft   = 40.0
	diagramRight  = 10.0
	diagramTop    = 22.0
	diagramBottom = 36.0
	samplePx      = 4.0
)

// leastMost is the least speed [m/s] at the diagram's right end: enough for
// the cut-offs of common laws.
const leastMost = 8.4

// sample is the best pull at one speed.
type sample struct {
	mps, pullN float64
	by         rig.Limit
}

// diagram is the geometry of pull against speed.
type diagram struct {
	rig     *rig.Rig
	now     rig.Now // charged, cool and rested on this grade
	grade   unit.Grade
	running ride.Running
	voice   words.Voice
	size    Size

	mostMps, stepMps float64
	mostN, stepN     float64
	plot             box
	best             []sample
}

func newDiagram(r *rig.Rig, g unit.Grade, running ride.Running, size Size, v words.Voice) *diagram {
	fresh := r.Fresh(1)
	d := &diagram{rig: r, now: r.At(&fresh, g.Sin(), g.Cos()), grade: g, running: running, voice: v, size: size}
	d.plot = box{diagramLeft, diagramTop, size.W - diagramRight, size.H - diagramBottom}
	d.mostMps = math.Max(leastMost, 1.5*running.SpeedMps)
	mps, newtons := d.units()
	d.stepMps = mps * tidyStep(d.mostMps/mps, 7)
	d.sample()
	d.stepN = newtons * tidyStep(d.mostN/newtons, max(2, int((d.plot.y1-d.plot.y0)/34)))
	return d
}

// units are what one of the shown units is in m/s and in N.
func (d *diagram) units() (mps, newtons float64) {
	if d.voice.Units == words.Imperial {
		return unit.MetresPerMile / 3600, newtonsPerPound
	}
	return 1 / 3.6, 1
}

func (d *diagram) unitNames() (speed, pull string) {
	if d.voice.Units == words.Imperial {
		return "mph", "lbf"
	}
	return "km/h", "N"
}

// sample finds the best pull of all gears along the speeds.
func (d *diagram) sample() {
	n := int((d.plot.x1 - d.plot.x0) / samplePx)
	for i := 0; i <= n; i++ {
		s := sample{mps: d.mostMps * float64(i) / float64(n), pullN: math.Inf(-1)}
		for gear := range d.rig.Gears {
			if p := d.rig.PullAt(s.mps, gear, &d.now); p.Sum() > s.pullN {
				s.pullN, s.by = p.Sum(), p.By
			}
		}
		d.best = append(d.best, s)
		d.mostN = math.Max(d.mostN, s.pullN)
	}
	d.mostN = math.Max(1.06*d.mostN, 1)
}

func (d *diagram) x(mps float64) float64 {
	return d.plot.x0 + mps/d.mostMps*(d.plot.x1-d.plot.x0)
}

func (d *diagram) y(newtons float64) float64 {
	return d.plot.y1 - newtons/d.mostN*(d.plot.y1-d.plot.y0)
}

// loadAt is the road load [N] at a speed [m/s], with the day's wind straight ahead.
func (d *diagram) loadAt(mps float64) float64 {
	return d.rig.Road.Force(mps, d.grade.Sin(), d.grade.Cos(), d.rig.Day.WindMps, 0)
}

// PullDiagram draws pull against speed: each gear thin, the best of them bold
// with the limit that decides it, the road load of a grade dashed, and the
// speed at which it settles. A zero running means that it does not hold.
func PullDiagram(r *rig.Rig, g unit.Grade, running ride.Running, size Size, v words.Voice) *dom.Node {
	d := newDiagram(r, g, running, size, v)
	axes, taken := d.axes()
	crossing, taken := d.crossing(append(taken, d.loadBoxes()...))
	return picture("img", "pull", v.Say(words.PullTitle), d.summary(v), size,
		axes, d.gears(), d.load(), d.envelope(), crossing, d.names(taken))
}

func (d *diagram) summary(v words.Voice) string {
	if d.running.SpeedMps <= 0 {
		return v.Say(words.PullTextNone, v.Grade(d.grade))
	}
	return v.Say(words.PullText, v.Grade(d.grade), v.Speed(d.running.SpeedMps), v.Gear(d.rig, d.running.Gear), v.Limit(d.running.SetBy))
}

// axes are the two scales, with faint lines across at the pulls.
func (d *diagram) axes() (dom.Parts, []box) {
	var lines, across path
	var parts dom.Parts
	var taken []box
	add := func(l label) {
		taken = append(taken, l.box())
		parts = append(parts, l.node())
	}
	mps, newtons := d.units()
	speedName, pullName := d.unitNames()
	lines.move(d.plot.x0, d.plot.y0)
	lines.upTo(d.plot.y1)
	lines.across(d.plot.x1)
	for i := 0; float64(i)*d.stepMps <= d.mostMps*(1+1e-9); i++ {
		x := d.x(float64(i) * d.stepMps)
		lines.move(x, d.plot.y1)
		lines.upTo(d.plot.y1 + 4)
		l := label{lines: []string{d.voice.Number(float64(i)*d.stepMps/mps, 0)}, x: x, y: d.plot.y1 + 17, px: smallPx, anchor: fromMiddle, class: "quiet"}
		add(l.clamp(2, d.size.W-2))
	}
	for i := 1; float64(i)*d.stepN <= d.mostN*(1+1e-9); i++ {
		y := d.y(float64(i) * d.stepN)
		across.move(d.plot.x0, y)
		across.across(d.plot.x1)
		add(label{lines: []string{d.voice.Number(float64(i)*d.stepN/newtons, 0)}, x: d.plot.x0 - 5, y: y + 4, px: smallPx, anchor: fromEnd, class: "quiet"})
	}
	add(label{lines: []string{d.voice.Say(words.AxisPull) + ", " + pullName}, x: 2, y: 12, px: smallPx, class: "words"})
	add(label{lines: []string{d.voice.Say(words.AxisSpeed) + ", " + speedName}, x: d.plot.x1, y: d.size.H - 4, px: smallPx, anchor: fromEnd, class: "words"})
	return append(dom.Parts{across.node("grid"), lines.node("base")}, parts...), taken
}

// gears are the pulls by gear, the gear in use drawn stronger.
func (d *diagram) gears() dom.Parts {
	var all, used path
	for gear := range d.rig.Gears {
		to := &all
		if d.running.SpeedMps > 0 && gear == d.running.Gear {
			to = &used
		}
		for i, s := range d.best {
			pull := d.rig.PullAt(s.mps, gear, &d.now).Sum()
			if i == 0 {
				to.move(d.x(s.mps), d.y(pull))
			} else {
				to.line(d.x(s.mps), d.y(pull))
			}
			if pull <= 0 {
				break
			}
		}
	}
	return dom.Parts{all.node("gear-curve"), used.node("gear-used")}
}

func (d *diagram) envelope() *dom.Node {
	var line path
	for i, s := range d.best {
		if i == 0 {
			line.move(d.x(s.mps), d.y(s.pullN))
		} else {
			line.line(d.x(s.mps), d.y(s.pullN))
		}
	}
	return line.node("envelope")
}

// load is the road load, where it lies within the picture.
func (d *diagram) load() *dom.Node {
	var line path
	within := false
	for _, s := range d.best {
		n := d.loadAt(s.mps)
		switch {
		case n < 0 || n > d.mostN:
			within = false
		case within:
			line.line(d.x(s.mps), d.y(n))
		default:
			line.move(d.x(s.mps), d.y(n))
			within = true
		}
	}
	return line.node("load")
}

// loadBoxes is the room that the load's line takes.
func (d *diagram) loadBoxes() []box {
	var out []box
	for _, s := range d.best {
		if n := d.loadAt(s.mps); n >= 0 && n <= d.mostN {
			x, y := d.x(s.mps), d.y(n)
			out = append(out, box{x - samplePx/2, y - 2, x + samplePx/2, y + 2})
		}
	}
	return out
}

// crossing is the point where the speed settles, with speed and gear.
func (d *diagram) crossing(taken []box) (dom.Parts, []box) {
	r := &d.running
	pull := r.RiderN + r.MotorN
	if r.SpeedMps <= 0 || pull < 0 || pull > d.mostN {
		return nil, taken
	}
	x, y := d.x(r.SpeedMps), d.y(pull)
	var dot, down path
	dot.disc(x, y, 5)
	down.move(x, y)
	down.upTo(d.plot.y1)
	taken = append(taken, box{x - 6, y - 6, x + 6, y + 6})
	l := label{
		lines: []string{d.voice.Speed(r.SpeedMps), d.voice.Gear(d.rig, r.Gear)},
		px:    wordsPx, class: "figure halo",
	}
	parts := dom.Parts{down.node("drop"), dot.node("crossing")}
	if l, _, ok := d.above(l, []point{{x, y}}, taken); ok {
		taken = append(taken, l.box())
		parts = append(parts, l.node())
	}
	return parts, taken
}
