// Package state is the one state of the page and the one place where it
// changes. Start with First, which makes the state a page opens with, and
// Reduce, which takes an Action and gives the next state and what the device
// is to do. Both are pure: no clock, no browser, and a state that was given out
// is never altered, so that a failure leaves the last good one.
package state

import (
	"math"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// Hill is the word for hills where things go by kind, and Ride for how it is
// ridden.
const (
	Hill keep.Kind = "hill"
	Ride keep.Kind = "ride"
	// Coast is for the inputs of a coast-down; there are no things of it.
	Coast keep.Kind = "coast"
)

// Kinds are the kinds of things in the order of the sentence.
var kinds = []keep.Kind{keep.Rider, keep.Load, keep.Bike, Hill, keep.Day, Ride}

// Kinds gives the kinds of things in the order of the sentence.
func Kinds() []keep.Kind { return append([]keep.Kind(nil), kinds...) }

// TypedHill is the id of the hill that is typed as sections, SketchedHill of
// the one that is drawn with a finger.
const (
	TypedHill    = "typed"
	SketchedHill = "sketched"
)

// State is everything that the page shows.
type State struct {
	Shop  *keep.Shop
	Voice words.Voice
	Theme string // "sun", "dusk", or "" for the device's
	Own   keep.Things

	Question ask.Question
	Chosen   map[keep.Kind]string // by kind; an id of Own or of the shop
	Profile  *hill.Profile
	Rig      *rig.Rig
	Answer   *ride.Answer
	// Trouble is why there is no answer for the inputs as they are; Answer is
	// then the last one.
	Trouble error

	Place  string // what is open under the sentence: a kind, or one of the Places
	All    bool   // it shows all of its inputs
	Path   string // the input whose editor is open
	Typing Typing

	Sections    string // as typed
	SectionsErr error
	Drawn       Drawing
	Name        string // as typed, for what is to be kept
	Reading     Reading

	Side  Hillside
	Bench Bench

	StaffM   float64 // where the staff stands along the road [m]; NaN: nowhere
	WeightN  float64 // where the weight was dragged to [N]; NaN: it hangs free
	ShowPull bool

	Message Message
	Faults  []keep.Fault // of the last import
	Device  Device
	Broken  string // what happened, when something broke

	base        ask.Question // as the chosen things give it
	stale       bool         // inputs changed since Answer
	ownRevision int
	likes       likes
	before      *State // for Undo
}

// Places that open besides the kinds.
const (
	PlaceKept     = "kept"
	PlaceSettings = "settings"
)

// Typing is a field while it is typed in: the raw text, and what is wrong with
// it.
type Typing struct {
	Path string
	Text string
	Err  error
}

// Reading is a track on its way to a profile.
type Reading struct {
	File   string
	Active bool
	Part   float64
	Err    error
	Notes  []hill.Note // of the last one that was read
}

// Message is a slip of paper at the foot of the page.
type Message struct {
	Key  words.Key
	Args []string
	Undo bool
	Set  bool
}

// Device is what the page knows of what it runs on.
type Device struct {
	Storage  string // "refused", "full", "loose", "safe"; "" before it is known
	Waiting  bool   // a new version waits
	CanShare bool
	Dropping bool
	WidthPx  float64 // how wide pictures are
	ZoneS    float64 // what its clock is ahead of UTC [s]
	Voices   string  // tags of the languages that it speaks without a network
}

// likes is what the person chose and what the device prefers; "" is no choice.
type likes struct{ lang, units, mark, deviceLang, deviceMark string }

// firstWidth is how wide pictures are drawn before the device says: a small
// phone's [px].
const firstWidth = 328

// First is the state with which the page opens: the shop's first bike, rider,
// load, day and hill, answered. lang is one of the shop's languages; an
// unknown or empty one gives the shop's first.
func First(shop *keep.Shop, lang string) *State {
	s := &State{
		Shop: shop, Chosen: map[keep.Kind]string{},
		StaffM: math.NaN(), WeightN: math.NaN(),
		Device: Device{WidthPx: firstWidth},
		Drawn:  Drawing{LongM: sketchLengths[1]},
		likes:  likes{deviceLang: lang},
	}
	s.Question = ask.Default()
	s.Voice = s.voice()
	s.Sections = s.Voice.Say(words.HillSectionsHint)
	for _, kind := range kinds {
		if kind == Hill || kind == Ride {
			continue
		}
		if all := s.Things(kind); len(all) > 0 {
			s.Chosen[kind] = all[0].ID
		}
	}
	s.Chosen[Hill] = TypedHill
	if len(shop.Hills) > 0 {
		s.Chosen[Hill] = shop.Hills[0].ID
	}
	s.rebase()
	s.Question = s.base
	s.Question.Source = copied(s.base.Source)
	s.pickHill()
	s.answer()
	return s
}

// voice puts together what the person likes, what the device prefers and what
// the shop has.
func (s *State) voice() words.Voice {
	v := words.Voice{}
	for _, tag := range []string{s.likes.lang, s.likes.deviceLang, first(s.Shop.Languages)} {
		if l, ok := words.LangOf(tag); ok && s.offers(l) {
			v.Lang = l
			break
		}
	}
	units := s.likes.units
	if units == "" {
		units = s.Shop.Units
	}
	if units == "imperial" {
		v.Units = words.Imperial
	}
	switch {
	case s.likes.mark != "":
		v.Comma = s.likes.mark == "comma"
	case s.likes.deviceMark != "" && s.likes.lang == "":
		v.Comma = s.likes.deviceMark == ","
	default:
		v.Comma = v.Lang == words.German
	}
	return v
}

// Languages gives the languages that the shop offers.
func (s *State) Languages() []words.Lang {
	var out []words.Lang
	for _, l := range words.Langs() {
		if s.offers(l) {
			out = append(out, l)
		}
	}
	return out
}

// offers tells whether the shop has the language; a shop that names none has
// all.
func (s *State) offers(l words.Lang) bool {
	if len(s.Shop.Languages) == 0 {
		return true
	}
	for _, tag := range s.Shop.Languages {
		if mine, ok := words.LangOf(tag); ok && mine == l {
			return true
		}
	}
	return false
}

// answer computes the answer anew. Where the inputs give none, the last one
// stays and Trouble says why.
func (s *State) answer() {
	s.stale = false
	s.Side.stale, s.Bench.stale = true, true
	if s.Profile == nil {
		return
	}
	r, a, err := s.Question.Climb(s.Profile)
	s.Trouble = err
	if err != nil {
		return
	}
	s.Rig, s.Answer = r, a
	s.WeightN = math.NaN()
}

func first(list []string) string {
	if len(list) == 0 {
		return ""
	}
	return list[0]
}

func copied[K comparable, V any](m map[K]V) map[K]V {
	out := make(map[K]V, len(m))
	for k, v := range m {
		out[k] = v
	}
	return out
}
