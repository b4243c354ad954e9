package state

import (
	"strings"

	"hillwright/physics/ask"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

func kindOf(path string) keep.Kind {
	kind, _ := cut(path, ".")
	return keep.Kind(kind)
}

// Inputs gives the inputs of a kind, in the catalogue's order.
func Inputs(kind keep.Kind) []ask.Input {
	var out []ask.Input
	for _, in := range ask.Inputs() {
		if kindOf(in.Path) == kind {
			out = append(out, in)
		}
	}
	return out
}

// Things gives all things of a kind that can be chosen: the person's own
// first, then the shop's.
func (s *State) Things(kind keep.Kind) []keep.Thing {
	var out []keep.Thing
	for _, list := range [][]keep.Thing{s.Own.Things, s.Shop.Things} {
		for _, t := range list {
			if t.Kind == kind {
				out = append(out, t)
			}
		}
	}
	return out
}

// IsOwn tells whether a thing or a hill is the person's own.
func (s *State) IsOwn(kind keep.Kind, id string) bool {
	if kind == Hill {
		return s.Own.HillAt(id) >= 0
	}
	return s.Own.At(kind, id) >= 0
}

// NameOf gives the name of what is chosen of a kind, "" when nothing is.
func (s *State) NameOf(kind keep.Kind) string {
	if kind == Hill {
		return s.hillName()
	}
	if t := s.thing(kind, s.Chosen[kind]); t != nil {
		return t.Name(s.Voice.Lang.Tag())
	}
	return ""
}

// AnyChanged tells whether an input of a kind differs from the chosen thing's.
func (s *State) AnyChanged(kind keep.Kind) bool {
	for _, in := range Inputs(kind) {
		if s.Changed(in.Path) {
			return true
		}
	}
	return false
}

func (s *State) thing(kind keep.Kind, id string) *keep.Thing {
	for _, t := range s.Things(kind) {
		if t.ID == id {
			return &t
		}
	}
	return nil
}

// rebase computes what the chosen things give. Values that do not fit are left
// out: files and shops were checked when they were read.
func (s *State) rebase() {
	s.base = ask.Default()
	if s.Shop.LawID != "" {
		_ = s.base.Set("ride.law", s.Shop.LawID)
	}
	for kind, id := range s.Chosen {
		if t := s.thing(kind, id); t != nil {
			_ = t.Put(&s.base)
		}
	}
}

// choose takes a thing; what was changed of the one before it goes.
func (s *State) choose(kind keep.Kind, id string) {
	if s.thing(kind, id) == nil {
		return
	}
	if s.AnyChanged(kind) {
		s.undoable(s.clone())
		s.say(Message{Key: words.ChangesGone, Args: []string{s.NameOf(kind)}, Undo: true})
	}
	s.take(kind, id)
}

// take puts a thing's inputs into the question.
func (s *State) take(kind keep.Kind, id string) {
	s.Chosen[kind] = id
	s.rebase()
	for _, in := range Inputs(kind) {
		value, _ := s.base.Get(in.Path)
		_ = s.Question.Set(in.Path, value) // a value that Get gave fits
		s.takeSource(in.Path)
	}
	s.stale = true
	s.Name = s.NameOf(kind)
}

// changes gives the values and sources that differ from the chosen things', by
// path.
func (s *State) changes() (values, sources map[string]string) {
	values, sources = map[string]string{}, map[string]string{}
	for _, in := range ask.Inputs() {
		if !s.Changed(in.Path) {
			continue
		}
		values[in.Path], _ = s.Question.Get(in.Path)
		sources[in.Path] = s.Question.SourceOf(in.Path).String()
	}
	return values, sources
}

// shortName makes a name of a file's.
func shortName(file string) string {
	if i := strings.LastIndexAny(file, `/\`); i >= 0 {
		file = file[i+1:]
	}
	if i := strings.LastIndexByte(file, '.'); i > 0 {
		file = file[:i]
	}
	return file
}
