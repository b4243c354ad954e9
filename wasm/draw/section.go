package draw

import (
	"math"

	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// Measures of the section [px].
const (
	sectionSide  = 8.0  // free at the left and right
	sectionRows  = 36.0 // below the base line: distances and heights
	sectionSky   = 36.0 // above the highest road: bracket and label
	stakeSky     = 26.0 // and for a stake with its words
	groundLeast  = 18.0 // ground below the lowest road
	bracketLift  = 12.0 // the bracket above the road
	stakeHeight  = 20.0
	stationRoom  = 62.0 // between stations at least
	mostStations = 6
)

// exaggerations are those that are used: heights are drawn so many times as
// tall as lengths.
var exaggerations = []float64{10, 5, 3, 2, 1}

// section is the geometry of a hill's picture.
type section struct {
	size    Size
	profile *hill.Profile
	answer  *ride.Answer

	lengthM, lowM float64
	start         float64 // x of the hill's foot
	perM          float64 // px per metre along
	exaggeration  float64
	base          float64 // y of the base line
	ground0       float64 // y of the lowest road
	road          []point
}

// newSection lays the hill out; nil where the profile has no road.
func newSection(p *hill.Profile, a *ride.Answer, size Size) *section {
	if len(p.EdgeM) < 2 || !(p.LengthM() > 0) {
		return nil
	}
	if a == nil {
		a = &ride.Answer{}
	}
	s := &section{size: size, profile: p, answer: a, lengthM: p.LengthM()}
	low, high := math.Inf(1), math.Inf(-1)
	for _, h := range p.HeightM {
		low, high = math.Min(low, h), math.Max(high, h)
	}
	s.lowM = low
	s.base = size.H - sectionRows
	sky := sectionSky
	if a.Stalled {
		sky += stakeSky
	}
	room := math.Max(8, s.base-groundLeast-sky)
	wide := size.W - 2*sectionSide
	s.start, s.perM, s.exaggeration = sectionSide, wide/s.lengthM, 1
	for _, e := range exaggerations {
		if (high-low)*e*s.perM <= room {
			s.exaggeration = e
			break
		}
	}
	if tall := (high - low) * s.perM * s.exaggeration; tall > room {
		// Steeper than the picture: narrower rather than untrue.
		s.perM *= room / tall
		s.start += (wide - s.lengthM*s.perM) / 2
	}
	spare := room - (high-low)*s.perM*s.exaggeration
	s.ground0 = s.base - groundLeast - 0.4*spare
	s.road = s.thinned(p)
	return s
}

func (s *section) x(atM float64) float64 { return s.start + atM*s.perM }
func (s *section) y(heightM float64) float64 {
	return s.ground0 - (heightM-s.lowM)*s.perM*s.exaggeration
}

// Section draws the hill as a cut through the ground, hatched by headroom,
// with the hardest stretch in a bracket. It holds a staff (.staff) that is
// hidden until the page moves it; see SectionAt. Without an answer (nil) the
// ground is plain. Hatches must stand on the same page.
func Section(p *hill.Profile, a *ride.Answer, size Size, v words.Voice) *dom.Node {
	s := newSection(p, a, size)
	if s == nil {
		return picture("img", "section", v.Say(words.SectionTitle), "", size)
	}
	marks := s.marks(v)
	low := s.stations(v)
	scale := label{lines: []string{v.Say(words.Exaggeration, v.Number(s.exaggeration, 0))}, px: smallPx, class: "quiet"}
	size.H = s.corner(&scale, marks.taken)
	return picture("img", "section", v.Say(words.SectionTitle), s.summary(v), size,
		s.cuts(), low.ordinates.node("ordinate"), s.baseLine().node("base"), s.roadLine().node("road"),
		low.marks.node("level-mark"), low.labels,
		marks.bracket.node("bracket"), marks.stake.node("stake"), staffNode(), marks.labels,
		scale.node(),
		dom.El("rect", dom.Class("touch"), dom.Act("move-staff", ""),
			dom.With("x", "0"), dom.With("y", "0"), dom.With("width", num(s.size.W)), dom.With("height", num(s.base))),
	)
}

// cuts are the hatched grounds, one path for each hatching.
func (s *section) cuts() dom.Parts {
	var d [hatches]path
	for _, run := range s.stretches() {
		s.ground(&d[run.as], run.from, run.to)
	}
	var parts dom.Parts
	for i := range d {
		if as := hatch(i); as == hatchBeyond {
			parts = append(parts, d[i].node("ground-beyond"))
		} else {
			parts = append(parts, d[i].node("ground-"+hatchNames[as], dom.With("fill", "url(#hatch-"+hatchNames[as]+")")))
		}
	}
	return parts
}

func (s *section) roadLine() *path {
	d := &path{}
	d.chain(s.road)
	return d
}

func (s *section) baseLine() *path {
	d := &path{}
	d.move(s.start, s.base)
	d.across(s.x(s.lengthM))
	return d
}

// corner puts the words of the exaggeration where the sky is free, else below
// everything; it gives the picture's height.
func (s *section) corner(l *label, taken []box) float64 {
	w, h := l.width(), l.height()
	for _, left := range []float64{sectionSide, s.size.W - sectionSide - w} {
		*l = l.at(left, 4)
		if b := l.box(); b.free(taken) && s.roof(b.x0, b.x1) > b.y1+4 {
			return s.size.H
		}
	}
	*l = l.at(sectionSide, s.size.H)
	return s.size.H + h + 2
}

// summary says in words what the picture shows.
func (s *section) summary(v words.Voice) string {
	a := s.answer
	if len(a.Trace.AtM) == 0 {
		return v.Length(s.lengthM)
	}
	text := v.Say(words.SectionText, v.Length(s.lengthM), v.Height(s.profile.AscentM()), hardestWords(a, v), v.Headroom(a.Balance.Headroom()))
	if a.Stalled {
		text += " " + v.Say(words.SectionStalled, v.Length(a.StalledAtM))
	}
	return text
}

func hardestWords(a *ride.Answer, v words.Voice) string {
	h := &a.Hardest
	return v.Say(words.StretchAt, v.Length(h.ToM-h.FromM), v.Grade(h.Grade), v.Length(h.FromM))
}
