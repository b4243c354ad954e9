package state

import (
	"strconv"
	"strings"

	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// mostInGroup is how many riders a group has: more do not fit on a phone.
const mostInGroup = 12

// doGroup changes who stands at the foot of the pitch.
func (s *State) doGroup(a Action) {
	group := append([]Pair(nil), s.Side.Group...)
	at, err := strconv.Atoi(a.Arg)
	inside := err == nil && at >= 0 && at < len(group)
	switch {
	case a.Name == GroupOpen:
		s.Side.Adding = !s.Side.Adding
	case a.Name == GroupAdd && len(group) < mostInGroup:
		group = append(group, Pair{Bike: s.Chosen[keep.Bike], Rider: a.Arg})
	case a.Name == GroupDrop && inside:
		group = without(group, at)
	case a.Name == GroupTake && inside:
		s.choose(keep.Bike, group[at].Bike)
		s.choose(keep.Rider, group[at].Rider)
	}
	s.Side.Group, s.Side.stale = group, true
}

// Weakest is the place of the pair in the group that has least to spare, −1
// where there are fewer than two with an answer.
func (s *State) Weakest() int {
	weakest, answered := -1, 0
	for i := range s.Side.Group {
		p := s.Side.Group[i].Pitch
		if p == nil {
			continue
		}
		answered++
		if weakest < 0 || weaker(p, s.Side.Group[weakest].Pitch) {
			weakest = i
		}
	}
	if answered < 2 {
		return -1
	}
	return weakest
}

func weaker(a, b *Pitch) bool {
	if a.Word != b.Word {
		return a.Word > b.Word
	}
	return a.Answer.Balance.Headroom() < b.Answer.Balance.Headroom()
}

// hillside gives how the hillside was left, for the settings.
func (s *State) hillside() map[string]string {
	side := &s.Side
	out := map[string]string{}
	if side.Open {
		out["open"] = "yes"
	}
	if side.Place != "" {
		out["place"] = side.Place
	}
	for path, v := range side.dials {
		out[path] = strconv.FormatFloat(v, 'g', -1, 64)
	}
	for name, choice := range side.picks {
		out["pick."+name] = choice
	}
	for i, p := range side.Group {
		out["group."+strconv.Itoa(i)] = p.Bike + "+" + p.Rider
	}
	for i := range min(len(side.Ride.Fixes), mostKept) {
		out["fix."+strconv.Itoa(i)] = textOf(&side.Ride.Fixes[i])
	}
	if t := &side.Tilt; t.Half() {
		for name, v := range map[string]float64{"mean": float64(t.First.Mean), "error": float64(t.First.Error), "seconds": t.First.Seconds} {
			out["first."+name] = strconv.FormatFloat(v, 'g', -1, 64)
		}
		out["first.rest"] = string(t.rest)
	}
	return out
}

// restoreHillside takes over how the hillside was left.
func (s *State) restoreHillside(kept map[string]string) {
	side := &s.Side
	side.Open, side.Place = kept["open"] == "yes", kept["place"]
	side.dials, side.picks, side.Group = map[string]float64{}, map[string]string{}, nil
	for name, text := range kept {
		v, err := strconv.ParseFloat(text, 64)
		if choice, isPick := strings.CutPrefix(name, "pick."); isPick {
			side.picks[choice] = text
			continue
		}
		limits, isDial := dialRanges[name]
		offset := strings.HasPrefix(name, "offset")
		if err == nil && (isDial && v >= limits.low && v <= limits.high || offset && v > -1 && v < 1) {
			side.dials[name] = v
		}
	}
	for i := range mostInGroup {
		bike, rider, ok := strings.Cut(kept["group."+strconv.Itoa(i)], "+")
		if ok && s.thing(keep.Bike, bike) != nil && s.thing(keep.Rider, rider) != nil {
			side.Group = append(side.Group, Pair{Bike: bike, Rider: rider})
		}
	}
	for i := range mostKept {
		f, ok := fixOf(kept["fix."+strconv.Itoa(i)])
		if !ok {
			break
		}
		side.Ride.Fixes = append(side.Ride.Fixes, f)
	}
	side.Tilt.restoreFirst(kept)
}

// tell says the answer aloud, or in tones.
func (s *State) tell() []Effect {
	p := s.Side.Pitch
	if p == nil {
		return nil
	}
	if s.Picked("say", "voice") == "voice" && s.CanSpeak() {
		return []Effect{{Kind: Speak, Key: s.Voice.Lang.Tag(), Data: []byte(s.Voice.PitchSpoken(p.Rig, p.Answer, p.Word, p.Read.Grade, p.Read.PlusMinus()))}}
	}
	return []Effect{{Kind: Tone, Key: words.ToneOf(p.Word)}}
}

// CanSpeak tells that the device has a voice of its own, which needs no
// network, in the page's language.
func (s *State) CanSpeak() bool {
	for _, tag := range strings.Fields(s.Device.Voices) {
		if l, ok := words.LangOf(tag); ok && l == s.Voice.Lang {
			return true
		}
	}
	return false
}
