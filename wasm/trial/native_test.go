//go:build !js

package trial

import (
	"strings"
	"testing"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// asked is a question as the terminal puts it together, to compare the page
// with: nothing of the page's own state or views is in it.
type asked struct {
	t     testing.TB
	shop  *keep.Shop
	voice words.Voice
	q     ask.Question
	road  *hill.Profile
}

// ask puts the shop's things together; an empty id is the first of its kind.
func newAsked(t testing.TB, bike, rider, load, day, road string) *asked {
	t.Helper()
	from, err := parts()
	if err != nil {
		t.Fatal(err)
	}
	a := &asked{t: t, shop: &from.Shop.Shop, voice: English, q: ask.Default()}
	a.set("ride.law", a.shop.LawID)
	a.take(keep.Bike, bike)
	a.take(keep.Rider, rider)
	a.take(keep.Load, load)
	a.take(keep.Day, day)
	a.climb(road)
	return a
}

func (a *asked) take(kind keep.Kind, id string) {
	a.t.Helper()
	for _, thing := range a.shop.Things {
		if thing.Kind == kind && (id == "" || thing.ID == id) {
			if err := thing.Put(&a.q); err != nil {
				a.t.Fatal(err)
			}
			return
		}
	}
	a.t.Fatalf("the demo shop has no %s %q", kind, id)
}

func (a *asked) climb(id string) {
	a.t.Helper()
	for _, h := range a.shop.Hills {
		if id == "" || h.ID == id {
			road, err := h.Profile("en")
			if err != nil {
				a.t.Fatal(err)
			}
			a.road = road
			return
		}
	}
	a.t.Fatalf("the demo shop has no hill %q", id)
}

// typed climbs sections as they are typed.
func (a *asked) typed(sections string) {
	a.t.Helper()
	road, err := hill.ParseSections(sections)
	if err != nil {
		a.t.Fatal(err)
	}
	a.road = &road
}

func (a *asked) set(path, value string) {
	a.t.Helper()
	if err := a.q.Set(path, value); err != nil {
		a.t.Fatal(err)
	}
}

// climbed is what came out.
type climbed struct {
	*ride.Answer
	rig *rig.Rig
	why string
}

func (a *asked) answer() climbed {
	a.t.Helper()
	r, answer, err := a.q.Climb(a.road)
	if err != nil {
		a.t.Fatal(err)
	}
	return climbed{answer, r, a.voice.Why(r, answer)}
}

// json is the answer as the terminal writes it.
func (a *asked) json() []byte {
	a.t.Helper()
	c := a.answer()
	return ask.AnswerJSON(c.rig, c.Answer, c.why)
}

// spaced writes a text as tab.text reads it: every run of white space, the
// hard space before a unit included, is one plain space.
func spaced(text string) string { return strings.Join(strings.Fields(text), " ") }

// answers waits until the page shows the answer, and compares what it shows.
func (p *tab) answers(a *asked) {
	p.t.Helper()
	c, v := a.answer(), a.voice
	p.shows("#answer .why", c.why)
	p.same("#answer .why", c.why)
	p.same("#answer .word", v.Verdict(c.Verdict)+v.Headroom(c.Balance.Headroom()))
	for _, figure := range figures(c, v) {
		p.shows("#figures", figure)
	}
}

// figures are all figures that stand among the notes.
func figures(c climbed, v words.Voice) []string {
	list := []string{v.Grade(c.Balance.SteepestGrade), v.Duration(c.ClimbS)}
	for i, peg := range c.Balance.Pegs {
		if i < 2 {
			list = append(list, v.Limit(peg.Limit), v.Headroom(peg.Headroom))
		}
	}
	if run := &c.Hardest.Running; run.SpeedMps > 0 {
		list = append(list, v.Speed(run.SpeedMps), v.Gear(c.rig, run.Gear), v.Cadence(run.CadenceRPM))
	}
	if c.Stalled {
		list = append(list, v.Length(c.StalledAtM))
	} else {
		list = append(list, v.Length(c.LengthM), v.Height(c.AscentM))
	}
	if sum := c.Energy.RiderJ + c.Energy.MotorJ; sum > 0 {
		list = append(list, v.Energy(c.Energy.RiderJ), v.Energy(c.Energy.MotorJ), v.Percent(c.Energy.MotorJ/sum))
	}
	return list
}

// same compares an element's words.
func (p *tab) same(selector, want string) {
	p.t.Helper()
	if got := p.text(selector); got != spaced(want) {
		p.t.Errorf("%s shows %q, the terminal says %q", selector, got, spaced(want))
	}
}
