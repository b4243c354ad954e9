package state

import (
	"math"
	"strconv"
	"strings"

	"hillwright/physics/ask"
)

// doInput does what changes one input.
func (s *State) doInput(a Action) (bool, []Effect) {
	switch a.Name {
	case ShowPath:
		s.leave()
		if s.Path == a.Arg {
			s.Path = ""
			return true, nil
		}
		kind, _ := cut(a.Arg, ".")
		if s.Place != kind {
			s.Place, s.All = kind, false
		}
		s.Path, s.Name = a.Arg, s.NameOf(kindOf(a.Arg))
		return true, []Effect{{Kind: Show, Key: "place"}}
	case StepUp:
		s.step(a.Arg, 1)
	case StepDown:
		s.step(a.Arg, -1)
	case Type:
		s.typeIn(a.Arg, a.Text)
	case Typed:
		if s.Typing.Path == a.Arg && s.Typing.Err == nil {
			s.leave()
		}
	case SetTo:
		path, value := cut(a.Arg, "=")
		s.leave()
		s.set(path, value)
	case SourceTo:
		path, name := cut(a.Arg, "=")
		if source, ok := ask.ParseSource(name); ok {
			s.Question.Source[path] = source
		}
	case Reset:
		s.leave()
		value, _ := s.base.Get(a.Arg)
		s.set(a.Arg, value)
		s.takeSource(a.Arg)
	default:
		return false, nil
	}
	return true, nil
}

// set gives an input a value in the text form of ask.Question.Set. What is
// wrong with it is returned and changes nothing. A value other than the chosen
// thing's no longer comes from a sheet or a measurement, until someone says so.
func (s *State) set(path, text string) error {
	was, _ := s.Question.Get(path)
	if err := s.Question.Set(path, text); err != nil {
		return err
	}
	is, _ := s.Question.Get(path)
	given, _ := s.base.Get(path)
	switch {
	case is == given:
		s.takeSource(path)
	case is != was:
		s.Question.Source[path] = ask.Assumed
	}
	s.stale = s.stale || is != was
	return nil
}

// takeSource lets an input come from where the chosen thing says.
func (s *State) takeSource(path string) {
	if source, ok := s.base.Source[path]; ok {
		s.Question.Source[path] = source
		return
	}
	delete(s.Question.Source, path)
}

// Changed tells whether an input differs from the chosen thing's.
func (s *State) Changed(path string) bool {
	is, _ := s.Question.Get(path)
	given, _ := s.base.Get(path)
	return is != given || s.Question.SourceOf(path) != s.base.SourceOf(path)
}

// typeIn takes the whole text of an input's field.
func (s *State) typeIn(path, text string) {
	s.Typing = Typing{Path: path, Text: text}
	in, ok := ask.InputAt(path)
	if !ok {
		return
	}
	if in.Form != ask.Number {
		s.Typing.Err = s.set(path, text)
		return
	}
	if in.Blank != "" && strings.TrimSpace(text) == "" {
		s.Typing.Err = s.set(path, in.Blank)
		return
	}
	shown, ok := s.Voice.ParseNumber(text)
	if !ok {
		s.Typing.Err = &ask.Problem{Kind: ask.NotANumber, Path: path, Got: text, Input: in}
		return
	}
	s.Typing.Err = s.set(path, plain(s.Voice.FromShown(path, shown)))
}

// NumberOf gives an input's number. Where it is not given it is what the
// computation takes in its place, and given is false.
func (s *State) NumberOf(path string) (v float64, given bool) {
	if v, ok := s.Question.Value(path); ok {
		return v, true
	}
	if shown := s.Behind(path); !math.IsNaN(shown.Value) {
		return shown.Value, false
	}
	return 0, false
}

// Behind is what stands behind an input: its own value, or what the computation
// takes in its place, with band and reason.
func (s *State) Behind(path string) ask.Shown {
	nothing := ask.Shown{Value: math.NaN(), Low: math.NaN(), High: math.NaN(), Source: s.Question.SourceOf(path)}
	if s.Rig == nil {
		return nothing
	}
	if shown, ok := s.Question.Shown(path, s.Rig); ok {
		return shown
	}
	return nothing
}

// step moves a number to the next round value in the unit shown, held within
// its range. A whole number or choice has no step: it is chosen from a list.
func (s *State) step(path string, sign float64) {
	in, _ := ask.InputAt(path)
	size := s.Voice.Step(path)
	if in.Form != ask.Number || !(size > 0) {
		return
	}
	s.leave()
	si, _ := s.NumberOf(path)
	steps := s.Voice.Show(path, si) / size
	const off = 1e-6 // a value that lies on a step may miss it by rounding
	if sign > 0 {
		steps = math.Floor(steps+off) + 1
	} else {
		steps = math.Ceil(steps-off) - 1
	}
	value := s.Voice.FromShown(path, steps*size)
	// The range holds the value, so that set cannot fail.
	_ = s.set(path, plain(min(max(value, in.Low), in.High)))
}

// plain writes a number as paths take it, without the dust of a change of
// units.
func plain(v float64) string {
	v, _ = strconv.ParseFloat(strconv.FormatFloat(v, 'g', 12, 64), 64)
	return strconv.FormatFloat(v, 'g', -1, 64)
}
