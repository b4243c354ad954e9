package state

import (
	"bytes"

	"hillwright/physics/hill"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// doHill does what chooses a thing or a hill, types one, or reads a track.
func (s *State) doHill(a Action) (bool, []Effect) {
	switch a.Name {
	case Choose:
		kind, id := cut(a.Arg, ":")
		if keep.Kind(kind) == Hill {
			s.chooseHill(id)
		} else {
			s.choose(keep.Kind(kind), id)
		}
		s.Place, s.Path = "", ""
		return true, []Effect{{Kind: Show, Key: "blank-" + kind}}
	case TypeSections:
		s.Sections = a.Text
		s.chooseHill(TypedHill)
	case Sketch:
		s.draw(a.X, a.Y)
	case SketchClear:
		s.Drawn.Points = nil
	case SketchLong:
		s.drawLong(a.Arg)
	case PickTrack:
		return true, []Effect{{Kind: PickTrackFile}}
	case TrackFile:
		return true, s.readTrack(a)
	case TrackPart:
		s.Reading.Part = a.X
	case StopTrack:
		s.Reading = Reading{}
		return true, []Effect{{Kind: StopReading}}
	case TrackFailed:
		s.Reading.Active, s.Reading.Err = false, a.Err
		s.Place, s.Path = string(Hill), ""
		return true, []Effect{{Kind: Show, Key: "place"}}
	case TrackRead:
		s.trackRead(a)
		return true, []Effect{{Kind: Show, Key: "blank-" + string(Hill)}}
	default:
		return false, nil
	}
	return true, nil
}

// Hills gives all hills that can be chosen: the person's own first, then the
// shop's.
func (s *State) Hills() []keep.Hill {
	return append(append([]keep.Hill(nil), s.Own.Hills...), s.Shop.Hills...)
}

func (s *State) hill(id string) *keep.Hill {
	for _, h := range s.Hills() {
		if h.ID == id {
			return &h
		}
	}
	return nil
}

func (s *State) hillName() string {
	if h := s.hill(s.Chosen[Hill]); h != nil {
		return h.Name(s.Voice.Lang.Tag())
	}
	if s.Chosen[Hill] == SketchedHill {
		return s.Voice.Say(words.HillDrawn)
	}
	return s.Voice.Say(words.HillTyped)
}

func (s *State) hint() string { return s.Voice.Say(words.HillSectionsHint) }

func (s *State) chooseHill(id string) {
	if id != TypedHill && id != SketchedHill && s.hill(id) == nil {
		return
	}
	s.Chosen[Hill] = id
	s.pickHill()
	s.Name = s.hillName()
}

// pickHill makes the profile of the chosen hill. A hill that makes none leaves
// the last one, and says why.
func (s *State) pickHill() {
	switch id := s.Chosen[Hill]; id {
	case TypedHill:
		p, err := hill.ParseSections(s.Sections)
		if s.SectionsErr = err; err != nil {
			return
		}
		s.Profile = &p
	case SketchedHill:
		p, err := s.Drawn.profile()
		if err != nil {
			return // a hill begins with its second place
		}
		s.Profile = p
	default:
		p, err := s.hill(id).Profile(s.Voice.Lang.Tag())
		if err != nil {
			s.Trouble = err
			return
		}
		s.Profile = p
	}
	s.stale = true
	s.StaffM = nowhere
}

// readTrack takes a file that was picked or dropped. A file of saved things
// that was dropped is imported.
func (s *State) readTrack(a Action) []Effect {
	s.Device.Dropping = false
	head := a.Data[:min(len(a.Data), 200)]
	if bytes.Contains(head, []byte(`"hillwright-things"`)) {
		s.importFile(a)
		return nil
	}
	s.Reading = Reading{File: a.Arg, Active: true}
	s.Place, s.Path = string(Hill), ""
	return []Effect{{Kind: ReadTrack, Key: a.Arg, Data: a.Data}, {Kind: Show, Key: "place"}}
}

// trackRead keeps the hill of a track and chooses it.
func (s *State) trackRead(a Action) {
	if !s.Reading.Active || a.Hill == nil {
		return // it was stopped
	}
	name := a.Hill.Name
	if name == "" {
		name = shortName(a.Arg)
	}
	if name == "" {
		name = s.Voice.Say(words.HillTrack)
	}
	id := s.ownHillID(name, a.Now)
	s.undoable(s.clone())
	s.putHill(keep.HillOf(a.Hill, id, name), a.Now)
	s.chooseHill(id)
	s.Reading = Reading{Notes: a.Hill.Notes, File: a.Arg}
	s.Place, s.Path = "", ""
	s.say(Message{Key: words.HillRead, Args: []string{name, s.Voice.Length(a.Hill.LengthM()), s.Voice.Height(a.Hill.AscentM())}, Undo: true})
}
