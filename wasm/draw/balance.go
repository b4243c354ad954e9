package draw

import (
	"math"

	"hillwright/physics/ride"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// BalanceOptions say what a person has tried: WantedN is where they dragged
// the weight [N], NaN when they did not.
type BalanceOptions struct{ WantedN float64 }

// Measures of the balance [px], from the top: labels, fan of leaders, pegs,
// barrel, gap line, weight.
const (
	balanceSide = 40.0
	rowHeight   = 17.0
	fanLeast    = 12.0
	pegTall     = 20.0
	barrelTall  = 40.0
	gapBelow    = 12.0 // gap line below the barrel
	cordTall    = 28.0
	bodyTall    = 42.0
	bodyHalf    = 34.0
)

// balance is the geometry of a balance's picture.
type balance struct {
	of      *ride.Balance
	voice   words.Voice
	size    Size
	mostN   float64 // at the scale's right end
	wantedN float64
	flags   []flag
	barrel  float64 // y of the barrel's upper edge
}

// scaleMost is the pull at the right end of a balance's scale [N]: all pegs
// with some room, but a peg that lies far off does not press the others together.
func scaleMost(b *ride.Balance) float64 {
	near := math.Max(b.WantedN, 1)
	if len(b.Pegs) > 0 {
		near = math.Max(near, b.Pegs[0].PullN)
	}
	far := near
	for _, p := range b.Pegs {
		far = math.Max(far, p.PullN)
	}
	return math.Max(1.25*near, math.Min(1.06*far, 3*near))
}

func newBalance(b *ride.Balance, size Size, v words.Voice, wantedN float64) *balance {
	c := &balance{of: b, voice: v, size: size, mostN: scaleMost(b), wantedN: wantedN}
	c.flags = c.layFlags()
	rows := 0
	for _, f := range c.flags {
		rows = max(rows, f.row+1)
	}
	c.barrel = 4 + float64(rows)*rowHeight + fanLeast + pegTall
	spare := size.H - (c.barrel + barrelTall + cordTall + bodyTall + 4)
	if spare < 0 {
		c.size.H -= spare
	} else {
		c.barrel += spare / 2
	}
	return c
}

// x is where a pull stands; what lies beyond the scale stands at its end.
func (c *balance) x(pullN float64) float64 { return scaleX(c.size, c.mostN, pullN) }

func scaleX(size Size, mostN, pullN float64) float64 {
	return balanceSide + clampTo(pullN/mostN, 0, 1)*(size.W-2*balanceSide)
}

// BalancePull gives the pull [N] at a picture's x [px of its viewBox], held
// within the scale. The scale does not move while the weight is dragged.
func BalancePull(b *ride.Balance, size Size, x float64) (newtons float64) {
	return clampTo((x-balanceSide)/(size.W-2*balanceSide), 0, 1) * scaleMost(b)
}

// Balance draws the spring balance laid flat: the wanted pull as a weight on
// its scale, every limit as a peg at the pull it allows, the first one inked,
// the gap to it measured. Pegs that the weight has passed are broken. The
// picture grows beyond size.H where the labels need it.
func Balance(b *ride.Balance, size Size, v words.Voice, opt BalanceOptions) *dom.Node {
	wanted := b.WantedN
	if !math.IsNaN(opt.WantedN) {
		wanted = opt.WantedN
	}
	c := newBalance(b, size, v, wanted)
	return picture("group", "balance", v.Say(words.BalanceTitle), balanceSummary(b, v), c.size,
		dom.El("g", dom.With("aria-hidden", "true"), c.body(), c.pegs(), c.gap()),
		c.weight(),
	)
}

func balanceSummary(b *ride.Balance, v words.Voice) string {
	return v.Say(words.BalanceText, v.Pull(b.WantedN), v.Grade(b.Grade), v.Speed(b.SpeedMps))
}

// headroom of the first peg at the weight's place, −9 at least as in ride.Weigh.
func (c *balance) headroom() float64 {
	first := c.of.Pegs[0]
	if c.wantedN == c.of.WantedN || first.PullN <= 0 {
		return first.Headroom
	}
	return clampTo(1-c.wantedN/first.PullN, -9, 1)
}

// body is the barrel with ring, hook, spring and scale.
func (c *balance) body() dom.Parts {
	left, right := balanceSide-14, c.size.W-balanceSide+14
	top, bottom := c.barrel, c.barrel+barrelTall
	var shell, window, spring, hook path
	const r = 7.0
	shell.move(left+r, top)
	shell.across(right - r)
	shell.op('Q', right, top, right, top+r)
	shell.upTo(bottom - r)
	shell.op('Q', right, bottom, right-r, bottom)
	shell.across(left + r)
	shell.op('Q', left, bottom, left, bottom-r)
	shell.upTo(top + r)
	shell.op('Q', left, top, left+r, top)
	shell.close()
	slot := box{balanceSide - 6, top + 5, c.size.W - balanceSide + 6, top + 15}
	window.rect(slot)

	middle := (top + bottom) / 2
	hook.move(left, middle)
	hook.across(left - 5)
	hook.op('A', 5, 5, 0, 1, 1, left-15, middle)
	hook.op('A', 5, 5, 0, 1, 1, left-5, middle)
	hook.move(right, middle)
	hook.across(right + 7)
	hook.op('A', 6, 6, 0, 1, 1, right+13, middle+6)

	// The spring is fixed at the left and stretches to the weight.
	const coils = 16
	end := math.Max(c.x(c.wantedN), slot.x0+5)
	spring.move(slot.x0, slot.y1-2)
	for i := range coils {
		y := slot.y0 + 2
		if i%2 == 1 {
			y = slot.y1 - 2
		}
		spring.line(slot.x0+(end-slot.x0)*(float64(i)+0.5)/coils, y)
	}
	spring.line(end, slot.y1-2)
	parts := dom.Parts{hook.node("hook"), shell.node("barrel"), window.node("window"), spring.node("spring")}
	return append(parts, c.scale()...)
}

// scale is the barrel's ticks and figures.
func (c *balance) scale() dom.Parts {
	in := 1.0
	if c.voice.Units == words.Imperial {
		in = newtonsPerPound
	}
	steps := clampTo((c.size.W-2*balanceSide)/58, 2, 6)
	step := in * tidyStep(c.mostN/in, int(steps))
	top := c.barrel + 17
	var ticks path
	var parts dom.Parts
	var taken []box
	for i := 0; float64(i)*step/5 <= c.mostN*(1+1e-9); i++ {
		x := c.x(float64(i) * step / 5)
		ticks.move(x, top)
		if i%5 != 0 {
			ticks.upTo(top + 3)
			continue
		}
		ticks.upTo(top + 6)
		l := label{lines: []string{c.voice.Pull(float64(i/5) * step)}, x: x, y: c.barrel + 34.5, px: smallPx, anchor: fromMiddle, class: "quiet"}
		l = l.clamp(balanceSide-13, c.size.W-balanceSide+13)
		if b := l.box(); b.grown(3).free(taken) {
			taken = append(taken, b)
			parts = append(parts, l.node())
		}
	}
	return append(parts, ticks.node("tick"))
}

// newtonsPerPound is the pound-force [N], exact by definition.
const newtonsPerPound = 4.4482216152605

// gap is the dimension line between the weight and the first peg, with the
// headroom. Where pull is missing it lies on the other side.
func (c *balance) gap() dom.Parts {
	if len(c.of.Pegs) == 0 {
		return nil
	}
	peg, weight := c.x(c.of.Pegs[0].PullN), c.x(c.wantedN)
	from, to := math.Min(peg, weight), math.Max(peg, weight)
	y := c.barrel + barrelTall + gapBelow
	var d path
	d.move(peg, c.barrel+barrelTall)
	d.upTo(y + 5)
	d.move(from, y)
	d.across(to)
	for _, x := range []float64{from, to} {
		d.move(x-3, y+3)
		d.line(x+3, y-3)
	}
	share := c.headroom()
	class := "gap"
	if share < 0 {
		class = "gap gap-short"
	}
	l := label{lines: []string{c.voice.Headroom(share)}, px: wordsPx, y: y + 4.5, class: "figure halo"}
	w := l.width()
	switch {
	case to-from > w+14:
		l.x, l.anchor = (from+to)/2, fromMiddle
	case to+8+w <= c.size.W-4:
		l.x = to + 8
	default:
		l.x, l.anchor = from-8, fromEnd
	}
	return dom.Parts{d.node(class), l.clamp(4, c.size.W-4).node()} // where it fits on neither side, over the line
}

// weight hangs on the scale at the wanted pull. It is a slider: a finger drags
// it, arrow keys move it.
func (c *balance) weight() *dom.Node {
	x := c.x(c.wantedN)
	top := c.barrel + barrelTall + cordTall
	bottom := top + bodyTall
	var cord, body path
	cord.move(x, c.barrel+4)
	cord.upTo(c.barrel + 16)
	cord.move(x, c.barrel+barrelTall)
	cord.upTo(top - 4)
	body.disc(x, top-1, 5)
	body.move(x-9, top+2)
	body.across(x + 9)
	body.curve(point{x + 11, top + 8}, point{x + bodyHalf - 4, top + 6}, point{x + bodyHalf - 2, top + 13})
	body.line(x+bodyHalf, bottom)
	body.across(x - bodyHalf)
	body.line(x-bodyHalf+2, top+13)
	body.curve(point{x - bodyHalf + 4, top + 6}, point{x - 11, top + 8}, point{x - 9, top + 2})
	body.close()

	pull := c.voice.Pull(c.wantedN)
	figure := label{lines: []string{pull}, x: x, y: bottom - 11, px: wordsPx, anchor: fromMiddle, class: "figure on-ink"}
	name := label{lines: []string{c.voice.Say(words.LabelWanted)}, x: x + bodyHalf + 8, y: bottom - 11, px: wordsPx, class: "words"}
	if name.box().x1 > c.size.W-4 {
		name.x, name.anchor = x-bodyHalf-8, fromEnd
	}
	finger := box{x - bodyHalf - 4, c.barrel + barrelTall, x + bodyHalf + 4, bottom + 4}
	return dom.El("g", dom.Class("weight"), dom.Act("drag-weight", ""),
		dom.With("role", "slider"), dom.With("tabindex", "0"),
		dom.With("aria-label", c.voice.Say(words.BalanceWeight)),
		dom.With("aria-orientation", "horizontal"),
		dom.With("aria-valuemin", "0"), dom.With("aria-valuemax", num(c.mostN)),
		dom.With("aria-valuenow", num(clampTo(c.wantedN, 0, c.mostN))), dom.With("aria-valuetext", pull),
		dom.El("rect", dom.Class("touch"), dom.With("x", num(finger.x0)), dom.With("y", num(finger.y0)),
			dom.With("width", num(finger.x1-finger.x0)), dom.With("height", num(finger.y1-finger.y0))),
		cord.node("cord"), body.node("weight-body"), figure.node(), name.node())
}
