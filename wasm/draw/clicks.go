package draw

import (
	"math"
	"strconv"

	"hillwright/physics/click"
	"hillwright/physics/unit"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// Spot is a speed at a time, or a click rate where the wheel's clicks are not
// known, with how far it may be off.
type Spot struct{ AtS, Is, Error float64 }

// ClickView is what a picture of a run shows: the spectrogram of its clicks
// (nil where there is none), the line that was followed, the part that counts.
// PerHz is the speed [m/s] of one click per second, 0 where it is not known:
// then the scale is in clicks per second. Dots marks each spot, for runs of
// single readings.
type ClickView struct {
	Picture    *click.Picture
	Line       []Spot
	FromS, ToS float64
	PerHz      float64
	Dots       bool
	Size       Size
	Voice      words.Voice
	ID         string // of the run; ids in the page come from it
}

// Measures of the picture [px].
const (
	clicksLeft   = 40.0
	clicksRight  = 8.0
	clicksTop    = 8.0
	clicksBottom = 26.0
	mostAcross   = 160 // cells
	mostUp       = 90
)

// clicksPlot is the geometry of the picture.
type clicksPlot struct {
	*ClickView
	plot           box
	firstS, lastS  float64
	most           float64 // at the top of the scale
	unit           float64 // of the scale, in what the line is in
	unitName       string
	tidyS, tidyTop float64
}

func newClicksPlot(v *ClickView) *clicksPlot {
	p := &clicksPlot{ClickView: v, plot: box{clicksLeft, clicksTop, v.Size.W - clicksRight, v.Size.H - clicksBottom}, unit: 1, unitName: v.Voice.Say(words.UnitClicks)}
	p.firstS, p.lastS = v.Line[0].AtS, v.Line[len(v.Line)-1].AtS
	pad := max(0.5, 0.03*(p.lastS-p.firstS))
	p.firstS, p.lastS = p.firstS-pad, p.lastS+pad
	for _, s := range v.Line {
		p.most = max(p.most, s.Is)
	}
	p.most = max(p.most*1.25, 1e-3)
	if v.PerHz > 0 {
		p.unit, p.unitName = 1/3.6, "km/h"
		if v.Voice.Units == words.Imperial {
			p.unit, p.unitName = unit.MetresPerMile/3600, "mph"
		}
	}
	p.tidyTop = tidyStep(p.most/p.unit, 4) * p.unit
	p.tidyS = tidyStep(p.lastS-p.firstS, max(2, int((p.plot.x1-p.plot.x0)/64)))
	return p
}

func (p *clicksPlot) x(s float64) float64 {
	part := (s - p.firstS) / (p.lastS - p.firstS)
	return p.plot.x0 + clampTo(part, 0, 1)*(p.plot.x1-p.plot.x0)
}

func (p *clicksPlot) y(is float64) float64 {
	return p.plot.y1 - clampTo(is/p.most, 0, 1)*(p.plot.y1-p.plot.y0)
}

// ClicksAt gives the time [s] at a place across the picture [px].
func ClicksAt(v *ClickView, x float64) float64 {
	if len(v.Line) < 2 {
		return 0
	}
	p := newClicksPlot(v)
	return p.firstS + clampTo((x-p.plot.x0)/(p.plot.x1-p.plot.x0), 0, 1)*(p.lastS-p.firstS)
}

// Clicks draws how much each click rate stands out over time, in ink of three
// densities, and over it the line that was followed. What is cut off at the
// ends is struck out. act is the action of the two handles at the cuts, args
// what they are about, names what they are called.
func Clicks(v *ClickView, title, desc, act string, args, names [2]string) *dom.Node {
	if len(v.Line) < 2 || !(v.Line[len(v.Line)-1].AtS > v.Line[0].AtS) {
		return nil
	}
	p := newClicksPlot(v)
	parts := dom.Parts{p.ink(), p.frame()}
	var line, band path
	for i, s := range v.Line {
		if i == 0 {
			line.move(p.x(s.AtS), p.y(s.Is))
		} else {
			line.line(p.x(s.AtS), p.y(s.Is))
		}
	}
	for i, s := range v.Line {
		if i == 0 {
			band.move(p.x(s.AtS), p.y(s.Is+1.645*s.Error))
		} else {
			band.line(p.x(s.AtS), p.y(s.Is+1.645*s.Error))
		}
	}
	for i := len(v.Line) - 1; i >= 0; i-- {
		s := v.Line[i]
		band.line(p.x(s.AtS), p.y(s.Is-1.645*s.Error))
	}
	band.close()
	parts = append(parts, line.node("band-halo"), band.node("followed-band"), line.node("followed"))
	if v.Dots {
		var dots path
		for _, s := range v.Line {
			dots.disc(p.x(s.AtS), p.y(s.Is), 4)
		}
		parts = append(parts, dots.node("followed-dots"))
	}
	var cut path
	if from := p.x(v.FromS); v.FromS > v.Line[0].AtS {
		cut.rect(box{p.plot.x0, p.plot.y0, from, p.plot.y1})
	}
	if to := p.x(v.ToS); v.ToS < v.Line[len(v.Line)-1].AtS {
		cut.rect(box{to, p.plot.y0, p.plot.x1, p.plot.y1})
	}
	parts = append(parts, cut.node("cut-off", dom.With("fill", "url(#hatch-upright)")))
	for i, at := range [2]float64{v.FromS, v.ToS} {
		parts = append(parts, p.handle(p.x(at), i, act, args[i], names[i]))
	}
	n := picture("group", "clicks-"+v.ID, title, desc, v.Size, parts)
	return n
}

// handle is a flag at a cut: at the left one it points left, at the right one
// right, so that both can be held where they meet.
func (p *clicksPlot) handle(x float64, which int, act, arg, name string) *dom.Node {
	side := 1.0
	if which == 0 {
		side = -1
	}
	var pole, flag path
	pole.move(0, p.plot.y0)
	pole.upTo(p.plot.y1)
	flag.move(0, p.plot.y0+14)
	flag.line(side*22, p.plot.y0+14)
	flag.line(side*15, p.plot.y0+24)
	flag.line(side*22, p.plot.y0+34)
	flag.line(0, p.plot.y0+34)
	flag.close()
	return dom.El("g", dom.With("data-region", "mark-"+arg), dom.With("transform", "translate("+num(x)+" 0)"),
		pole.node("stake"), flag.node("peg-binds"),
		dom.El("rect", dom.Class("touch"), dom.Act(act, arg), dom.With("role", "img"), dom.With("aria-label", name),
			dom.With("x", num(side*25-25)), dom.With("y", num(p.plot.y0)), dom.With("width", "50"), dom.With("height", num(p.plot.y1-p.plot.y0))))
}

// densities are the levels from which a cell is drawn in one of three inks: a
// level is sixteen times how far a rate stands out, in standard deviations.
var densities = [...]uint8{64, 110, 185}

// ink draws the spectrogram: one path for each density, of cells that were
// joined along time.
func (p *clicksPlot) ink() dom.Parts {
	pic := p.Picture
	if pic == nil || pic.Columns() == 0 || !(pic.StepS > 0) {
		return nil
	}
	perHz := p.PerHz
	if !(perHz > 0) {
		perHz = 1
	}
	rows := len(pic.RatesHz)
	first := max(0, int(math.Ceil((p.firstS-pic.StartS)/pic.StepS-0.5)))
	last := min(pic.Columns(), int((p.lastS-pic.StartS)/pic.StepS+0.5)+1)
	wide := max(1, (last-first+mostAcross-1)/mostAcross)
	shown := 0
	for _, hz := range pic.RatesHz {
		if hz*perHz < p.most {
			shown++
		}
	}
	tall := max(1, (shown+mostUp-1)/mostUp)
	var d [len(densities)][]byte
	for row := 0; row < shown; row += tall {
		bottom, top := p.y(edgeRate(pic.RatesHz, row)*perHz), p.y(edgeRate(pic.RatesHz, row+tall)*perHz)
		y, h := int(math.Round(top)), int(math.Round(bottom))-int(math.Round(top))
		if h < 1 {
			h = 1
		}
		begun, as := 0, -1
		for c := first; ; c += wide {
			now := -1
			if c < last {
				now = densityOf(pic.Levels, rows, c, min(last, c+wide), row, min(shown, row+tall))
			}
			if now == as {
				if c >= last {
					break
				}
				continue
			}
			if as >= 0 {
				x0 := int(math.Round(p.x(pic.StartS + (float64(begun)-0.5)*pic.StepS)))
				x1 := int(math.Round(p.x(pic.StartS + (float64(min(c, last))-0.5)*pic.StepS)))
				d[as] = cell(d[as], x0, y, x1-x0, h)
			}
			if begun, as = c, now; c >= last {
				break
			}
		}
	}
	var out dom.Parts
	for i, data := range d {
		if len(data) > 0 {
			out = append(out, dom.El("path", dom.Class("ink-"+strconv.Itoa(i+1)), dom.With("d", string(data))))
		}
	}
	return out
}

// edgeRate is the lower edge of a row of rates that are evenly spaced in their
// logarithms.
func edgeRate(rates []float64, row int) float64 {
	if len(rates) < 2 {
		return rates[0]
	}
	by := math.Sqrt(rates[1] / rates[0])
	if row >= len(rates) {
		return rates[len(rates)-1] * by
	}
	return rates[row] / by
}

// densityOf is the ink of the strongest of some cells, −1 for none.
func densityOf(levels []uint8, rows, fromColumn, toColumn, fromRow, toRow int) int {
	var most uint8
	for c := fromColumn; c < toColumn; c++ {
		for r := fromRow; r < toRow; r++ {
			most = max(most, levels[c*rows+r])
		}
	}
	for i := len(densities) - 1; i >= 0; i-- {
		if most >= densities[i] {
			return i
		}
	}
	return -1
}

func cell(d []byte, x, y, w, h int) []byte {
	if w < 1 {
		return d
	}
	number := func(op byte, v int) { d = strconv.AppendInt(append(d, op), int64(v), 10) }
	number('M', x)
	number(' ', y)
	number('H', x+w)
	number('V', y+h)
	number('H', x)
	return append(d, 'Z')
}

// frame is the scales: speed upward, seconds along.
func (p *clicksPlot) frame() dom.Parts {
	var lines path
	lines.move(p.plot.x0, p.plot.y0)
	lines.upTo(p.plot.y1)
	lines.across(p.plot.x1)
	var labels dom.Parts
	for v := 0.0; v < p.most*0.999; v += p.tidyTop {
		y := p.y(v)
		lines.move(p.plot.x0-4, y)
		lines.across(p.plot.x0)
		labels = append(labels, label{lines: []string{p.Voice.Number(v/p.unit, 0)}, x: p.plot.x0 - 6, y: y + 4, px: smallPx, anchor: fromEnd}.node())
	}
	labels = append(labels, label{lines: []string{p.unitName}, x: p.plot.x0 + 34, y: p.plot.y0 + 11, px: smallPx, class: "halo"}.node())
	for s := math.Ceil(p.firstS/p.tidyS) * p.tidyS; s <= p.lastS; s += p.tidyS {
		x := p.x(s)
		lines.move(x, p.plot.y1)
		lines.upTo(p.plot.y1 + 4)
		text := p.Voice.Number(s, 0)
		if s+p.tidyS > p.lastS {
			text += " s"
		}
		l := label{lines: []string{text}, x: x, y: p.plot.y1 + 17, px: smallPx, anchor: fromMiddle}.clamp(2, p.Size.W-2)
		if l.box().x0 > p.plot.x0-4 { // else it lies under the speeds
			labels = append(labels, l.node())
		}
	}
	return dom.Parts{lines.node("ordinate"), labels}
}
