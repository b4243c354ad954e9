package state

import (
	"strconv"
	"strings"

	"hillwright/physics/ask"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// doKept does what saves, forgets, exports and imports.
func (s *State) doKept(a Action) (bool, []Effect) {
	switch a.Name {
	case TypeName:
		s.Name = a.Text
	case Keep:
		s.keep(keep.Kind(a.Arg), a.Now)
		return true, []Effect{{Kind: Show, Key: "blank-" + a.Arg}}
	case Forget:
		kind, id := cut(a.Arg, ":")
		s.forget(keep.Kind(kind), id)
	case Export, SaveBroken:
		if a.Name == Export {
			s.say(Message{Key: words.ExportDone, Args: []string{exportName}})
		}
		return true, []Effect{{Kind: Download, Key: exportName, Type: jsonType, Data: keep.Encode(s.Own)}}
	case PickImport:
		return true, []Effect{{Kind: PickThings}}
	case ImportFile:
		s.importFile(a)
	case Restored:
		s.restore(a)
		return true, []Effect{{Kind: Dress}}
	case Figures:
		if s.Answer == nil {
			return true, nil
		}
		data := ask.AnswerJSON(s.Rig, s.Answer, s.Voice.Why(s.Rig, s.Answer))
		return true, []Effect{{Kind: Download, Key: "answer.json", Type: jsonType, Data: data}}
	case Share:
		if s.Answer == nil {
			return true, nil
		}
		text := s.Voice.Verdict(s.Answer.Verdict) + ". " + s.Voice.Why(s.Rig, s.Answer)
		return true, []Effect{{Kind: ShareText, Data: []byte(text)}}
	default:
		return false, nil
	}
	return true, nil
}

const (
	exportName = "hillwright-things.json"
	jsonType   = "application/json"
)

// longestName is how many bytes a name may have.
const longestName = 120

// NameTaken tells whether saving under the typed name replaces one of the
// person's own things of the kind.
func (s *State) NameTaken(kind keep.Kind) bool {
	return s.ownID(kind, strings.TrimSpace(s.Name)) != ""
}

// ownID finds the person's own thing of a name, "" when there is none.
func (s *State) ownID(kind keep.Kind, name string) string {
	lang := s.Voice.Lang.Tag()
	if kind == Hill {
		for _, h := range s.Own.Hills {
			if h.Name(lang) == name {
				return h.ID
			}
		}
		return ""
	}
	for _, t := range s.Own.Things {
		if t.Kind == kind && t.Name(lang) == name {
			return t.ID
		}
	}
	return ""
}

// newID makes an id that no other thing of this device has.
func (s *State) newID(now int64) string {
	return "own-" + strconv.FormatInt(now, 36) + "-" + strconv.Itoa(s.ownRevision)
}

func (s *State) ownHillID(name string, now int64) string {
	if id := s.ownID(Hill, name); id != "" {
		return id
	}
	return s.newID(now)
}

// keep saves what is chosen of a kind, changes and all, under the typed name,
// and chooses what was saved.
func (s *State) keep(kind keep.Kind, now int64) {
	name := strings.TrimSpace(s.Name)
	if len(name) > longestName {
		name = strings.ToValidUTF8(name[:longestName], "")
	}
	if name == "" {
		return
	}
	s.undoable(s.clone())
	if kind == Hill {
		if s.Profile == nil {
			return
		}
		h := keep.HillOf(s.Profile, s.ownHillID(name, now), name)
		if s.Chosen[Hill] == TypedHill {
			h.Sections = s.Sections
		}
		s.putHill(h, now)
		s.chooseHill(h.ID)
	} else {
		t := s.asThing(kind, name, now)
		s.putThing(t)
		s.Chosen[kind] = t.ID
		s.rebase()
	}
	s.Place, s.Path = "", ""
	s.say(Message{Key: words.KeptSaved, Args: []string{name}, Undo: true})
}

// asThing makes a thing of a kind's inputs as they are.
func (s *State) asThing(kind keep.Kind, name string, now int64) keep.Thing {
	t := keep.Thing{
		Kind: kind, ID: s.ownID(kind, name), Names: map[string]string{"": name},
		Values: map[string]string{}, Sources: map[string]string{}, Changed: now,
	}
	if t.ID == "" {
		t.ID = s.newID(now)
	}
	for _, in := range Inputs(kind) {
		key := strings.TrimPrefix(in.Path, string(kind)+".")
		t.Values[key], _ = s.Question.Get(in.Path)
		t.Sources[key] = s.Question.SourceOf(in.Path).String()
	}
	return t
}

func (s *State) putThing(t keep.Thing) {
	list := append([]keep.Thing(nil), s.Own.Things...)
	if at := s.Own.At(t.Kind, t.ID); at >= 0 {
		list[at] = t
	} else {
		list = append(list, t)
	}
	s.Own.Things = list
	s.ownRevision++
}

func (s *State) putHill(h keep.Hill, now int64) {
	h.Changed = now
	list := append([]keep.Hill(nil), s.Own.Hills...)
	if at := s.Own.HillAt(h.ID); at >= 0 {
		list[at] = h
	} else {
		list = append(list, h)
	}
	s.Own.Hills = list
	s.ownRevision++
}

// forget takes one of the person's own things away; when it was chosen, the
// first of its kind that is left is chosen. Without any the inputs stay as they
// are.
func (s *State) forget(kind keep.Kind, id string) {
	if !s.IsOwn(kind, id) {
		return
	}
	s.undoable(s.clone())
	name := ""
	if kind == Hill {
		at := s.Own.HillAt(id)
		name = s.Own.Hills[at].Name(s.Voice.Lang.Tag())
		s.Own.Hills = without(s.Own.Hills, at)
	} else {
		at := s.Own.At(kind, id)
		name = s.Own.Things[at].Name(s.Voice.Lang.Tag())
		s.Own.Things = without(s.Own.Things, at)
	}
	s.ownRevision++
	if s.Chosen[kind] == id {
		s.chooseFirst(kind)
	}
	s.say(Message{Key: words.KeptForgotten, Args: []string{name}, Undo: true})
}

func (s *State) chooseFirst(kind keep.Kind) {
	if kind == Hill {
		id := TypedHill
		if all := s.Hills(); len(all) > 0 {
			id = all[0].ID
		}
		s.chooseHill(id)
		return
	}
	if all := s.Things(kind); len(all) > 0 {
		s.take(kind, all[0].ID)
		return
	}
	delete(s.Chosen, kind)
	s.rebase()
}

func without[T any](list []T, at int) []T {
	out := append([]T(nil), list[:at]...)
	return append(out, list[at+1:]...)
}

// importFile puts the things of a file with the person's own. What is wrong in
// it is told and left out; a file that cannot be read changes nothing.
func (s *State) importFile(a Action) {
	got, faults := keep.Decode(a.Data)
	s.Faults = faults
	s.Place, s.Path = PlaceKept, ""
	if len(got.Things)+len(got.Hills)+len(got.Readings)+len(got.Runs) == 0 && len(faults) > 0 {
		s.Message = Message{}
		return
	}
	s.undoable(s.clone())
	merged, did := keep.Merge(s.Own, got)
	s.Own = merged
	s.ownRevision++
	number := func(n int) string { return s.Voice.Number(float64(n), 0) }
	s.say(Message{Key: words.ImportSummary, Undo: true, Args: []string{number(did.Added), number(did.Replaced), number(did.Same), number(did.Older)}})
	s.takeOver()
}

// takeOver lets chosen things follow what was imported, the person's changes
// staying on top.
func (s *State) takeOver() {
	values, sources := s.changes()
	s.rebase()
	s.Question = s.base
	s.Question.Source = copied(s.base.Source)
	s.apply(values, sources)
	s.pickHill()
	s.stale = true
}

// apply puts changes on top of what the chosen things give. Values that no
// longer fit are left out.
func (s *State) apply(values, sources map[string]string) {
	for path, value := range values {
		_ = s.Question.Set(path, value)
	}
	for path, name := range sources {
		_, known := ask.InputAt(path)
		if source, ok := ask.ParseSource(name); ok && known {
			s.Question.Source[path] = source
		}
	}
}

// restore takes over what the device kept: settings in Text, things in Data.
func (s *State) restore(a Action) {
	s.Own, _ = keep.Decode(a.Data)
	settings, ok := keep.DecodeSettings([]byte(a.Text))
	if !ok {
		return
	}
	s.likes.lang, s.likes.units, s.likes.mark = settings.Lang, settings.Units, settings.Mark
	s.Theme = settings.Theme
	s.Voice = s.voice()
	s.Sections = s.hint()
	if settings.Sections != "" {
		s.Sections = settings.Sections
	}
	for kind, id := range settings.Chosen {
		k := keep.Kind(kind)
		known := s.thing(k, id) != nil
		if k == Hill {
			known = id == TypedHill || s.hill(id) != nil
		}
		if known {
			s.Chosen[k] = id
		}
	}
	s.rebase()
	s.Question = s.base
	s.Question.Source = copied(s.base.Source)
	s.apply(settings.Values, settings.Sources)
	s.pickHill()
	s.restoreHillside(settings.Hillside)
	s.stale = true
}

// settings is how the person left the page.
func (s *State) settings() keep.Settings {
	out := keep.Settings{
		Lang: s.likes.lang, Units: s.likes.units, Mark: s.likes.mark, Theme: s.Theme,
		Chosen: map[string]string{}, Hillside: s.hillside(),
	}
	for kind, id := range s.Chosen {
		out.Chosen[string(kind)] = id
	}
	out.Values, out.Sources = s.changes()
	if s.Sections != s.hint() {
		out.Sections = s.Sections
	}
	return out
}
