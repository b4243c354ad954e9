package draw

import (
	"sort"

	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// Staff is what the staff shows at one place, and where it stands in the
// picture (X, Y is its foot).
type Staff struct {
	AtM, HeightM float64
	Grade        unit.Grade
	// Known is false where the rig does not come: beyond a stall. What follows
	// is zero then.
	Known    bool
	TimeS    float64
	SpeedMps float64
	Gear     int
	Headroom float64
	Limit    rig.Limit

	X, Y float64
}

// Transform is the value of the transform attribute that moves the element
// .staff of the picture to the place; take its visibility attribute away to
// show it.
func (s Staff) Transform() string { return "translate(" + num(s.X) + " " + num(s.Y) + ")" }

// SectionAt gives the staff at a picture's x [px of its viewBox], held within
// the hill.
func SectionAt(p *hill.Profile, a *ride.Answer, size Size, x float64) Staff {
	s := newSection(p, a, size)
	if s == nil {
		return Staff{}
	}
	return s.staff((x - s.start) / s.perM)
}

// SectionAtDistance gives the staff at a distance along the road [m], held
// within the hill.
func SectionAtDistance(p *hill.Profile, a *ride.Answer, size Size, atM float64) Staff {
	s := newSection(p, a, size)
	if s == nil {
		return Staff{}
	}
	return s.staff(atM)
}

func (s *section) staff(atM float64) Staff {
	atM = clampTo(atM, 0, s.lengthM)
	out := placeOn(s.profile, s.answer, atM)
	out.X = s.x(atM)
	out.Y = s.roadY(out.X)
	return out
}

// placeOn reads off a ride what holds at a distance [m].
func placeOn(p *hill.Profile, a *ride.Answer, atM float64) Staff {
	out := Staff{AtM: atM, HeightM: p.HeightAt(atM), Grade: p.GradeAt(atM)}
	k, part, known := spotOn(a, atM)
	if !known {
		return out
	}
	t := &a.Trace
	out.Known = true
	out.Gear, out.Headroom, out.Limit = t.Gear[k], t.Headroom[k], t.SetBy[k]
	out.TimeS, out.SpeedMps = between(t.TimeS, k, part), between(t.SpeedMps, k, part)
	return out
}

// spotOn finds a distance [m] on a ride: the point of the trace that holds
// there and how far it is on the way to the next one; not known beyond a stall.
func spotOn(a *ride.Answer, atM float64) (k int, part float64, known bool) {
	t := &a.Trace
	n := len(t.AtM)
	if n == 0 || a.Stalled && atM > a.StalledAtM+1e-6 {
		return 0, 0, false
	}
	// Of points at one place the last holds for what follows.
	k = max(0, sort.Search(n, func(k int) bool { return t.AtM[k] > atM+1e-9 })-1)
	if k+1 < n && t.AtM[k+1] > t.AtM[k] {
		part = (atM - t.AtM[k]) / (t.AtM[k+1] - t.AtM[k])
	}
	return k, part, true
}

// between reads a trace's values between two of its points.
func between(of []float64, k int, part float64) float64 {
	if part == 0 {
		return of[k]
	}
	return of[k] + part*(of[k+1]-of[k])
}

// StaffText says what the staff shows.
func StaffText(s Staff, r *rig.Rig, v words.Voice) string {
	if !s.Known {
		return v.Length(s.AtM) + " · " + v.Grade(s.Grade)
	}
	return v.Say(words.StaffText, v.Length(s.AtM), v.Grade(s.Grade), v.Speed(s.SpeedMps), v.Gear(r, s.Gear), v.Headroom(s.Headroom))
}

// Measures of the staff [px].
const (
	staffTall  = 56.0
	staffHalf  = 3.5
	staffField = 7.0
)

// staffNode is a levelling staff with its foot at 0, 0.
func staffNode() *dom.Node {
	var rod, fields path
	rod.rect(box{-staffHalf, -staffTall, staffHalf, 0})
	for i := 0; float64(i)*staffField < staffTall; i++ {
		y := -float64(i) * staffField
		side := box{-staffHalf, y - staffField, 0, y}
		if i%2 == 1 {
			side = box{0, y - staffField, staffHalf, y}
		}
		fields.rect(side)
	}
	fields.move(-5, 6)
	fields.line(0, 0)
	fields.line(5, 6)
	fields.close()
	return dom.El("g", dom.Class("staff"), dom.With("visibility", "hidden"),
		rod.node("staff-rod"), fields.node("staff-mark"))
}
