package state

import (
	"strings"

	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// Reduce gives the state after an action, and what the device is to do. prev
// is not altered. An action that is not known changes nothing.
func Reduce(prev *State, a Action) (*State, []Effect) {
	next := prev.clone()
	if next.doPicture(a) {
		return next, nil // a finger on a picture changes nothing that is kept
	}
	effects := next.do(a)
	if next.stale {
		next.answer()
	}
	if next.Side.stale && next.Side.Open {
		next.consider()
	}
	if next.Bench.stale && next.Bench.Open {
		next.weighRuns()
	}
	return next, append(effects, storage(prev, next)...)
}

// clone copies what actions write to; lists are replaced, never written into.
func (s *State) clone() *State {
	c := *s
	c.Question.Source = copied(s.Question.Source)
	c.Chosen = copied(s.Chosen)
	return &c
}

func (s *State) do(a Action) []Effect {
	if did, effects := s.doInput(a); did {
		return effects
	}
	if s.doTour(a) {
		return nil
	}
	if did, effects := s.doKept(a); did {
		return effects
	}
	if did, effects := s.doHill(a); did {
		return effects
	}
	if did, effects := s.doHillside(a); did {
		return effects
	}
	if did, effects := s.doBench(a); did {
		return effects
	}
	return s.doRest(a)
}

// doRest does what opens and closes, and settings, and the device's reports.
func (s *State) doRest(a Action) []Effect {
	switch a.Name {
	case Open:
		s.leave()
		s.Message = Message{}
		if s.Place == a.Arg {
			s.Place = ""
			return nil
		}
		s.Place, s.All, s.Path, s.Name = a.Arg, a.Arg == string(Ride), "", s.NameOf(keep.Kind(a.Arg))
		return []Effect{{Kind: Show, Key: "place"}}
	case Close:
		from := s.Place
		if s.Path != "" && !s.All {
			from = s.Path
		}
		s.leave()
		s.Place, s.Path, s.Faults = "", "", nil
		return []Effect{{Kind: Show, Key: "blank-" + from}}
	case ShowAll:
		s.All = !s.All
		s.Place, s.Path = a.Arg, ""
	case SetLanguage:
		s.likes.lang = a.Arg
		return s.dress()
	case SetUnits:
		s.likes.units = a.Arg
		return s.dress()
	case SetMark:
		s.likes.mark = a.Arg
		return s.dress()
	case SetTheme:
		s.Theme = a.Arg
		if a.Arg == "device" {
			s.Theme = ""
		}
		return s.dress()
	case DeviceLikes:
		s.likes.deviceLang, s.likes.deviceMark = a.Arg, a.Text
		return s.dress()
	case Print:
		return []Effect{{Kind: PrintPage}}
	case UseNew:
		return []Effect{{Kind: UseNewVersion}}
	case Dismiss:
		s.Message = Message{}
	case Undo:
		s.undo()
	case Stored:
		s.stored(a.Arg)
	case Waiting:
		s.Device.Waiting = true
	case CanShare:
		s.Device.CanShare = true
	case Wide:
		s.Device.WidthPx = min(max(a.X, 280), 1200)
	case Dropping:
		s.Device.Dropping = a.Arg != ""
	case Broke:
		s.Broken = a.Text
	case GoOn:
		s.Broken = ""
	}
	return nil
}

// stored takes how the device keeps things; what a person must know of it is
// said once.
func (s *State) stored(how string) {
	if how == s.Device.Storage {
		return
	}
	s.Device.Storage = how
	switch how {
	case "refused":
		s.say(Message{Key: words.StorageRefused})
	case "full":
		s.say(Message{Key: words.StorageFull})
	}
}

// dress takes over what the person likes.
func (s *State) dress() []Effect {
	hint := s.Sections == s.hint()
	s.Voice = s.voice()
	if hint {
		s.Sections = s.hint()
	}
	return []Effect{{Kind: Dress}}
}

// leave ends typing: what was wrong in a field is forgotten with its text.
func (s *State) leave() {
	s.Typing = Typing{}
}

// say puts a message on the page in place of the one before.
func (s *State) say(m Message) {
	m.Set = true
	s.Message = m
}

// undoable remembers the state before a change that a person may regret.
func (s *State) undoable(prev *State) {
	was := *prev
	was.before = nil
	s.before = &was
}

func (s *State) undo() {
	if s.before == nil {
		return
	}
	was := s.before
	s.Question, s.base, s.Chosen = was.Question, was.base, copied(was.Chosen)
	s.Question.Source = copied(was.Question.Source)
	s.Own, s.Sections, s.Profile = was.Own, was.Sections, was.Profile
	s.ownRevision++
	s.Bench.stale = true
	s.before, s.Message, s.stale = nil, Message{}, true
}

// cut splits "kind:id" and "path=value".
func cut(arg, sign string) (string, string) {
	a, b, _ := strings.Cut(arg, sign)
	return a, b
}
