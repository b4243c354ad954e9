package draw

import (
	"math"

	"hillwright/physics/rig"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// run is a part of the best pull that one limit decides, by its first and last
// sample.
type run struct {
	by         rig.Limit
	from, last int
}

// runs gives each limit's longest run along the best pull. Where gears change
// the limit may change to and fro; each is named once.
func (d *diagram) runs() []run {
	var all []run
	for i, s := range d.best {
		if n := len(all); n > 0 && all[n-1].by == s.by {
			all[n-1].last = i
			continue
		}
		all = append(all, run{s.by, i, i})
	}
	var out []run
	for l := rig.Limit(0); l < rig.Limits; l++ {
		longest := run{l, 0, -1}
		for _, r := range all {
			if r.by == l && r.last-r.from > longest.last-longest.from {
				longest = r
			}
		}
		if longest.last >= longest.from && d.best[longest.from].pullN > 0 {
			out = append(out, longest)
		}
	}
	return out
}

// names are the limits along the best pull and the load's name, each near its
// line and clear of the others.
func (d *diagram) names(taken []box) dom.Parts {
	var marks path
	var parts dom.Parts
	for _, r := range d.runs() {
		l := label{lines: []string{d.voice.Limit(r.by)}, px: smallPx, class: "words halo"}
		l, at, ok := d.beside(l, r, taken)
		if !ok {
			continue
		}
		b := l.box()
		taken = append(taken, b)
		parts = append(parts, l.node())
		marks.move(clampTo(at.x, b.x0, b.x1), b.y1)
		marks.line(at.x, at.y)
	}
	load := label{lines: []string{d.voice.Say(words.PullLoad)}, px: smallPx, class: "words halo"}
	if l, ok := d.loadName(load, taken); ok {
		parts = append(parts, l.node())
	}
	return append(dom.Parts{marks.node("leader")}, parts...)
}

// beside places words above the best pull near a run.
func (d *diagram) beside(l label, r run, taken []box) (placed label, at point, ok bool) {
	var of []point
	for _, part := range []float64{0.5, 0.35, 0.65, 0.2, 0.8} {
		s := d.best[r.from+int(part*float64(r.last-r.from))]
		of = append(of, point{d.x(s.mps), d.y(s.pullN)})
	}
	return d.above(l, of, taken)
}

// above places words above the best pull, as near to one of some points as it
// goes; at is that point.
func (d *diagram) above(l label, of []point, taken []box) (placed label, at point, ok bool) {
	w, h := l.width(), l.height()
	least := math.Inf(1)
	for _, p := range of {
		for _, aside := range []float64{2, 8, -w / 3, -w * 2 / 3, 24, 40} {
			left := clampTo(p.x+aside, d.plot.x0+4, d.size.W-2-w)
			roof := d.roof(left, left+w)
			for lift := 7.0; lift < 160; lift += 3 {
				try := l.at(left, math.Min(p.y, roof)-lift-h)
				b := try.box()
				far := math.Abs(clampTo(p.x, b.x0, b.x1)-p.x) + p.y - b.y1
				if b.y0 < 1 || far >= least {
					break
				}
				if b.grown(2).free(taken) {
					placed, at, least = try, p, far
					break
				}
			}
		}
	}
	return placed, at, !math.IsInf(least, 1)
}

// roof is the y of the best pull's highest point between two x.
func (d *diagram) roof(from, to float64) float64 {
	top := d.plot.y1
	for _, s := range d.best {
		if x := d.x(s.mps); x >= from-samplePx && x <= to+samplePx {
			top = math.Min(top, d.y(s.pullN))
		}
	}
	return top
}

// loadName places the load's name above its line, as far right as it goes.
func (d *diagram) loadName(l label, taken []box) (label, bool) {
	w, h := l.width(), l.height()
	for right := d.plot.x1 - 2; right-w > d.plot.x0+4; right -= 6 {
		high := math.Inf(1)
		for x := right - w; x <= right; x += samplePx {
			n := d.loadAt((x - d.plot.x0) / (d.plot.x1 - d.plot.x0) * d.mostMps)
			high = math.Min(high, d.y(n))
		}
		try := l.at(right-w, high-4-h)
		if b := try.box(); b.within(box{d.plot.x0, d.plot.y0, d.size.W, d.plot.y1}) && b.free(taken) {
			return try, true
		}
	}
	return l, false
}
