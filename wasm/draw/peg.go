package draw

import (
	"math"

	"hillwright/physics/ride"
	"hillwright/wasm/dom"
)

// flag is a peg's label: it stands to the right of a pole at its slot, in a row
// counted upward from the pegs; a leader runs from the peg to the slot.
type flag struct {
	peg  ride.Peg
	text string
	x    float64 // of the peg
	slot float64
	row  int
}

// slotGap is how far apart the poles of flags stand at least [px].
const slotGap = 7.0

func (f flag) right() float64 { return f.slot + 4 + bolder*textWidth(f.text, smallPx) }

// layFlags gives every peg a slot and a row. Slots keep the pegs' order and
// leave their labels room at the right, so leaders do not cross. Going from
// right to left, a label takes the lowest row above all poles that it passes,
// so that no pole cuts a label.
func (c *balance) layFlags() []flag {
	flags := make([]flag, len(c.of.Pegs))
	next := c.size.W
	for i := len(flags) - 1; i >= 0; i-- {
		p := c.of.Pegs[i]
		f := flag{peg: p, text: c.voice.Limit(p.Limit) + " " + c.voice.Pull(p.PullN), x: c.x(p.PullN)}
		f.slot = math.Min(f.x, next-slotGap)
		f.slot = math.Min(f.slot, c.size.W-3-(f.right()-f.slot))
		next = f.slot
		flags[i] = f
	}
	for i := len(flags) - 1; i >= 0; i-- {
		f := &flags[i]
		f.slot = math.Max(f.slot, 4+float64(i)*slotGap)
		for _, other := range flags[i+1:] {
			if other.slot < f.right()+6 && other.row >= f.row {
				f.row = other.row + 1
			}
		}
	}
	return flags
}

// pegs draws the pegs, their leaders and labels.
func (c *balance) pegs() dom.Parts {
	var stems, heads, binds, broken, leaders path
	var labels dom.Parts
	fan := c.barrel - pegTall
	first := true
	for _, f := range c.flags {
		passed := f.peg.PullN < c.wantedN
		class := "words"
		switch {
		case passed:
			breakPeg(&broken, f.x, c.barrel)
		case first:
			first = false
			stem(&stems, f.x, c.barrel)
			binds.disc(f.x, fan, 5)
			class = "figure"
		default:
			stem(&stems, f.x, c.barrel)
			heads.disc(f.x, fan, 3.5)
		}
		if f.peg.PullN > c.mostN {
			offScale(&stems, f.x, c.barrel)
		}
		bottom := fan - fanLeast - float64(f.row)*rowHeight
		leaders.move(f.x, fan-5)
		leaders.line(f.slot, fan-fanLeast+1)
		leaders.upTo(bottom - rowHeight + 3)
		l := label{lines: []string{f.text}, x: f.slot + 4, y: bottom - 5, px: smallPx, class: class}
		labels = append(labels, l.node())
	}
	return dom.Parts{
		leaders.node("leader"), stems.node("peg"), broken.node("peg-broken"),
		heads.node("peg-head"), binds.node("peg-binds"), labels,
	}
}

func stem(d *path, x, foot float64) {
	d.move(x, foot)
	d.upTo(foot - pegTall)
}

// breakPeg draws a snapped peg: a splintered stump, and its upper part leaning
// over to the right.
func breakPeg(d *path, x, foot float64) {
	d.move(x, foot)
	d.upTo(foot - 6)
	d.line(x-3, foot-9)
	d.move(x, foot-6)
	d.line(x+2, foot-8)
	d.move(x+3, foot-10)
	d.line(x+11, foot-17)
	d.move(x+9, foot-20)
	d.line(x+13, foot-14)
}

// offScale marks a peg that stands beyond the end of the scale.
func offScale(d *path, x, foot float64) {
	d.move(x+3, foot-13)
	d.line(x+8, foot-10)
	d.line(x+3, foot-7)
}
