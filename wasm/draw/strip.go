package draw

import (
	"hillwright/physics/hill"
	"hillwright/physics/motor"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// Measures of the strip [px]: a band is a row of words over a run of line.
const (
	bandWords = 18.0
	bandTall  = 22.0
	bandPitch = bandWords + bandTall + 7
)

// LowLegs is the part of W′ below which the strip hatches the rider's legs.
// Common practice, no source.
const LowLegs = 0.25

// band is one thing that runs along the way: what it is at each point of the
// trace, between which bounds it is drawn, and the mark beyond which it is bad.
type band struct {
	name      string
	of        []float64
	low, high float64
	mark      float64
	marked    bool   // the mark is drawn
	markText  string // what is said of it beside the name, where there is room
	above     bool   // it is bad above the mark, else below it
	write     func(float64) string
}

func (b *band) bad(value float64) bool {
	if b.above {
		return value > b.mark
	}
	return value < b.mark
}

// bandsOf are the bands that this rig has: a bike whose motor rests has no
// heat, one without a motor no charge.
func bandsOf(a *ride.Answer, r *rig.Rig, kept float64, v words.Voice) []band {
	t, n := &a.Trace, len(a.Trace.AtM)
	var out []band
	if n == 0 {
		return nil
	}
	if r.Assists() && len(t.WindingC) == n {
		celsius := func(c float64) string { return v.Temperature(unit.Celsius(c)) }
		b := band{name: v.Say(words.BandMotor), of: t.WindingC, low: float64(r.Day.TemperatureC), high: r.Heat.EaseToC,
			mark: r.Heat.EaseFromC, marked: true, markText: v.Say(words.BandEasing, celsius(r.Heat.EaseFromC)), above: true, write: celsius}
		for _, c := range t.WindingC {
			b.low, b.high = min(b.low, c), max(b.high, c)
		}
		out = append(out, b)
	}
	if r.Bike.Motor.Kind != motor.None && r.Bike.Pack.EnergyWh > 0 && len(t.Charge) == n {
		out = append(out, band{name: v.Say(words.StripCharge), of: t.Charge, high: 1, mark: kept, marked: kept > 0,
			markText: v.Say(words.BandKept, v.Percent(kept)), write: v.Percent})
	}
	if whole := r.Endurance.ReserveJ; whole > 0 && len(t.ReserveJ) == n {
		out = append(out, band{name: v.Say(words.BandLegs), of: t.ReserveJ, high: whole, mark: LowLegs * whole, marked: true,
			markText: v.Say(words.BandLow, v.Percent(LowLegs)),
			write:    func(j float64) string { return v.Percent(j / whole) }})
	}
	return out
}

// strip is the geometry of the strip under a section.
type strip struct {
	*section
	bands []band
}

// StripBands is how many bands the strip of a rig has.
func StripBands(a *ride.Answer, r *rig.Rig) int { return len(bandsOf(a, r, 0, words.Voice{})) }

// Strip draws what runs along the way under the section of a size, to its
// scale and margins: the motor's heat with the temperature at which it begins
// to ease off, the charge with what is kept back (0 to 1), the rider's legs
// (what is left of W′). A band is hatched where it is bad. It holds a plumb
// line (.plumb) that is hidden until the page moves it with the staff. Its
// height follows from its bands; nil when there is none.
func Strip(p *hill.Profile, a *ride.Answer, r *rig.Rig, kept float64, size Size, v words.Voice) *dom.Node {
	s := newStrip(p, a, r, kept, size, v)
	if s == nil {
		return nil
	}
	size.H = float64(len(s.bands)) * bandPitch
	var parts, labels dom.Parts
	for i := range s.bands {
		top := float64(i) * bandPitch
		parts = append(parts, s.draw(&s.bands[i], top))
		labels = append(labels, s.labels(&s.bands[i], top+12))
	}
	return picture("img", "strip", StripTitle(a, v), s.summary(), size, parts, plumb(size.H), labels,
		dom.El("rect", dom.Class("touch"), dom.Act("move-staff", ""),
			dom.With("x", "0"), dom.With("y", "0"), dom.With("width", num(size.W)), dom.With("height", num(size.H))))
}

// StripTitle is the strip's name, with the trip that it shows where that is not
// the first.
func StripTitle(a *ride.Answer, v words.Voice) string {
	title := v.Say(words.StripTitle)
	if a.Hardest.Trip > 0 {
		return v.Say(words.WhyAtTrip, title, v.Number(float64(a.Hardest.Trip+1), 0))
	}
	return title
}

func newStrip(p *hill.Profile, a *ride.Answer, r *rig.Rig, kept float64, size Size, v words.Voice) *strip {
	bands := bandsOf(a, r, kept, v)
	s := newSection(p, a, size)
	if s == nil || len(bands) == 0 {
		return nil
	}
	return &strip{s, bands}
}

// draw is one band with its upper edge at top.
func (s *strip) draw(b *band, top float64) dom.Parts {
	ceiling, floor := top+bandWords, top+bandWords+bandTall
	y := func(value float64) float64 {
		return floor - clampTo((value-b.low)/(b.high-b.low), 0, 1)*bandTall
	}
	var hatched, beyond, frame, mark, line path
	for _, x := range s.badRuns(b) {
		hatched.rect(box{x[0], ceiling, x[1], floor})
	}
	at := s.answer.Trace.AtM
	end := s.x(clampTo(at[len(at)-1], 0, s.lengthM))
	if far := s.x(s.lengthM); far > end+0.5 {
		beyond.rect(box{end, ceiling, far, floor})
	}
	frame.move(s.start, ceiling)
	frame.upTo(floor)
	frame.across(s.x(s.lengthM))
	frame.upTo(ceiling)
	if b.marked {
		mark.move(s.start, y(b.mark))
		mark.across(s.x(s.lengthM))
	}
	points := make([]point, len(at))
	for i, m := range at {
		points[i] = point{s.x(m), y(b.of[i])}
	}
	line.chain(thin(points))
	return dom.Parts{
		beyond.node("ground-beyond"), hatched.node("band-bad", dom.With("fill", "url(#hatch-upright)")),
		frame.node("band-frame"), mark.node("band-mark"),
		dom.If(len(hatched.d) > 0, line.node("band-halo")), line.node("band-line"),
	}
}

// labels are the band's name at its left and the value at its end at its right.
func (s *strip) labels(b *band, y float64) dom.Parts {
	value := label{lines: []string{b.write(b.of[len(b.of)-1])}, x: s.size.W - sectionSide, y: y, px: smallPx, anchor: fromEnd, class: "figure halo"}
	name := label{lines: []string{b.name}, x: sectionSide, y: y, px: smallPx, class: "words halo"}
	if b.marked {
		long := name
		long.lines = []string{b.name + " · " + b.markText}
		if long.box().x1+10 < value.box().x0 {
			name = long
		}
	}
	return dom.Parts{name.node(), value.node()}
}

// badRuns are the stretches [px] on which a band is beyond its mark, with those
// that lie less than a pixel apart as one.
func (s *strip) badRuns(b *band) [][2]float64 {
	var out [][2]float64
	at := s.answer.Trace.AtM
	for i := 0; i+1 < len(at); i++ {
		from, to := at[i], at[i+1]
		u, w := b.of[i], b.of[i+1]
		first, last := b.bad(u), b.bad(w)
		if !first && !last || !(to > from) {
			continue
		}
		if first != last {
			cross := from + (to-from)*clampTo((b.mark-u)/(w-u), 0, 1)
			if first {
				to = cross
			} else {
				from = cross
			}
		}
		x0, x1 := s.x(from), s.x(to)
		if n := len(out); n > 0 && x0 < out[n-1][1]+1 {
			out[n-1][1] = max(out[n-1][1], x1)
			continue
		}
		out = append(out, [2]float64{x0, max(x1, x0+1)})
	}
	return out
}

// thin keeps of a line that runs to the right the first, the lowest, the
// highest and the last point of each column of a pixel, in their order.
func thin(points []point) []point {
	var out []point
	for i := 0; i < len(points); {
		first, low, high := i, i, i
		column := int(points[i].x)
		for ; i < len(points) && int(points[i].x) == column; i++ {
			if points[i].y < points[low].y {
				low = i
			}
			if points[i].y > points[high].y {
				high = i
			}
		}
		kept := -1
		for _, k := range []int{first, min(low, high), max(low, high), i - 1} {
			if k > kept {
				out = append(out, points[k])
				kept = k
			}
		}
	}
	return out
}

// plumb is the line that hangs from the staff through the strip.
func plumb(tall float64) *dom.Node {
	var d path
	d.move(0, 0)
	d.upTo(tall)
	return dom.El("g", dom.Class("plumb"), dom.With("visibility", "hidden"), d.node("plumb-line"))
}

// PlumbTransform is the value of the transform attribute that moves the
// element .plumb of the strip under the staff.
func (s Staff) PlumbTransform() string { return "translate(" + num(s.X) + " 0)" }

// summary tells of each band what it is at the foot and at the end.
func (s *strip) summary() string {
	text := ""
	for i := range s.bands {
		b := &s.bands[i]
		if i > 0 {
			text += "; "
		}
		text += b.name + ": " + b.write(b.of[0]) + " → " + b.write(b.of[len(b.of)-1])
		if b.marked {
			text += " (" + b.markText + ")"
		}
	}
	return text + "."
}

// StripText gives the strip's figures as a table: what each band is at the
// places that SectionText names, as far as the rig comes.
func StripText(p *hill.Profile, a *ride.Answer, r *rig.Rig, kept float64, v words.Voice) *dom.Node {
	s := newStrip(p, a, r, kept, Size{W: 360, H: 240}, v)
	if s == nil {
		return table(StripTitle(a, v), nil, nil)
	}
	heads := []string{v.Say(words.AxisLength)}
	for i := range s.bands {
		heads = append(heads, s.bands[i].name)
	}
	var rows [][]string
	for _, m := range s.named(v) {
		row := []string{v.Length(m)}
		k, part, known := spotOn(a, m)
		for i := range s.bands {
			text := ""
			if known {
				text = s.bands[i].write(between(s.bands[i].of, k, part))
			}
			row = append(row, text)
		}
		rows = append(rows, row)
	}
	return table(s.summary(), heads, rows)
}

// StateText says what the bands are at the staff; "" where the rig does not
// come.
func StateText(at Staff, a *ride.Answer, r *rig.Rig, v words.Voice) string {
	k, part, known := spotOn(a, at.AtM)
	if !known {
		return ""
	}
	text := ""
	for _, b := range bandsOf(a, r, 0, v) {
		if text != "" {
			text += " · "
		}
		text += b.name + " " + b.write(between(b.of, k, part))
	}
	return text
}
