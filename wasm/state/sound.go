package state

import (
	"strconv"

	"hillwright/physics/ask"
	"hillwright/physics/click"
	"hillwright/physics/coast"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// What a recording is for.
const (
	ForRun   = "run"
	ForSpin  = "spin"
	ForCount = "count"
)

// Stages of a recording.
const (
	SoundNone      = ""
	SoundRecording = "recording"
	SoundHeld      = "held" // it is at hand and nothing is done with it
	SoundListening = "listening"
)

// Sound is the recording at hand, or the one that is made now. The device holds
// the sound itself.
type Sound struct {
	Stage    string
	For      string
	Name     string
	Recorded bool    // here, so that it can be saved
	Peak     float64 // full scale 1
	Seconds  float64
	Gain     bool    // the device changes the level by itself
	Part     float64 // of it that is heard
	CutS     float64 // where a damaged file ends [s], 0 for a whole one
	Fails    string  // absent, refused, lost, or full when it lasted as long as it may
	Said     words.Key
	SaidArgs []string
}

// busy tells that it records or listens.
func (r *Sound) busy() bool { return r.Stage == SoundRecording || r.Stage == SoundListening }

// doSound does what happens to recordings.
func (s *State) doSound(a Action) (bool, []Effect) {
	r := &s.Bench.Sound
	switch a.Name {
	case SoundFor:
		if r.busy() {
			return true, nil
		}
		s.Bench.Err, s.Bench.Laps = nil, Laps{}
		*r = Sound{Stage: SoundRecording, For: a.Arg}
		return true, []Effect{{Kind: StartSound}, {Kind: Wake}, {Kind: Show, Key: "bench-sound"}}
	case SoundFrom:
		if r.busy() {
			return true, nil
		}
		s.Bench.Err, s.Bench.Laps = nil, Laps{}
		*r = Sound{Stage: r.Stage, For: a.Arg, Name: r.Name, Recorded: r.Recorded}
		return true, []Effect{{Kind: PickSound}}
	case SoundDone:
		if r.Stage == SoundRecording {
			if r.Seconds == 0 { // nothing was heard yet: nothing will come
				r.Stage = SoundNone
			}
			return true, []Effect{{Kind: StopSound}, {Kind: Sleep}}
		}
	case SoundLevel:
		if r.Stage == SoundRecording {
			r.Peak, r.Seconds, r.Gain = a.X, a.Y, a.Text == "gain"
		}
	case SoundReady:
		r.Name, r.Recorded = a.Arg, a.Text == "recorded"
		return true, s.listen()
	case SoundFailed:
		r.Fails = a.Arg
		if a.Arg != "lost" && a.Arg != "full" { // else what was recorded follows
			r.Stage = SoundNone
		}
		return true, []Effect{{Kind: Sleep}}
	case SoundAgain:
		if r.Stage == SoundHeld {
			return true, s.listen()
		}
	case SoundKeep:
		return true, []Effect{{Kind: SaveSound, Key: "hillwright-coast-" + strconv.FormatInt(a.Now, 36) + ".wav"}}
	case SoundLeave:
		if r.Stage == SoundListening {
			r.Stage, r.Said, r.SaidArgs = SoundHeld, words.SoundStopped, nil
			return true, []Effect{{Kind: StopListening}}
		}
	case ListenPart:
		r.Part = a.X
	case ListenFailed:
		if r.Stage == SoundListening {
			r.Stage, s.Bench.Err = SoundHeld, a.Err
			return true, []Effect{{Kind: Show, Key: "bench-sound"}}
		}
	case Listened:
		if r.Stage == SoundListening {
			return true, s.heard(a)
		}
	default:
		return false, nil
	}
	return true, nil
}

func (s *State) listen() []Effect {
	r := &s.Bench.Sound
	r.Stage, r.Part, r.Said, r.CutS = SoundListening, 0, 0, 0
	s.Bench.Err = nil
	if r.For == "" {
		r.For = ForRun
	}
	return []Effect{{Kind: Listen}, {Kind: Show, Key: "bench-sound"}}
}

// heard takes what was heard, for what the recording was made.
func (s *State) heard(a Action) []Effect {
	r := &s.Bench.Sound
	r.Stage, r.CutS = SoundHeld, a.X
	switch r.For {
	case ForCount:
		return s.count(a.Heard)
	case ForSpin:
		return s.spun(a.Heard)
	}
	added := 0
	for i := range a.Heard.Stretches {
		if st := &a.Heard.Stretches[i]; st.Falls {
			s.addHeard(st, &a.Heard.Picture, a.Now, added)
			added++
		}
	}
	if added == 0 {
		r.Said = words.SoundNoFall
		return []Effect{{Kind: Show, Key: "bench-sound"}}
	}
	return []Effect{{Kind: Tone, Key: "done"}, {Kind: Show, Key: "bench-runs"}}
}

// addHeard keeps a stretch as a run.
func (s *State) addHeard(st *click.Stretch, p *click.Picture, now int64, number int) {
	r := keep.Run{Name: s.Bench.Sound.Name, Kind: keep.ClickRun}
	for _, q := range st.Points {
		r.AtS, r.Is, r.Error = append(r.AtS, q.AtS), append(r.Is, q.RateHz), append(r.Error, q.ErrorHz)
	}
	id := s.addRun(r, now, number)
	s.Bench.pictures = with(s.Bench.pictures, id, p)
	s.Bench.lines = with(s.Bench.lines, id, st.Curve)
}

// usualMetres stands in for the metres of a click where they are not known yet.
const usualMetres = 0.06

// addRun keeps a run, and proposes where it begins and ends and which way it
// was ridden: in turn, as is usual.
func (s *State) addRun(r keep.Run, now int64, number int) string {
	r.ID, r.Bike, r.TimeS, r.Changed = s.newID(now)+"-"+strconv.Itoa(number), s.Chosen[keep.Bike], float64(now), now
	r.FromS, r.ToS = r.AtS[0], r.AtS[len(r.AtS)-1]
	per, known := s.metresPerClick()
	if !known {
		per = usualMetres
	}
	if r.Kind != keep.MarkRun {
		r.FromS, r.ToS = coast.Trim(r.Coast(per).Points)
	}
	if all := s.Runs(); len(all) > 0 {
		r.Back = !all[len(all)-1].Back
	}
	s.Own.Runs = append(append([]keep.Run(nil), s.Own.Runs...), r)
	s.ownRevision++
	s.Bench.stale = true
	return r.ID
}

// count takes the clicks of a turn from a wheel that was rolled.
func (s *State) count(h *click.Heard) []Effect {
	turns := s.Question.Coast.RolledTurns
	n, off, err := h.Count(0, h.LengthS)
	var per float64
	if err == nil {
		per, err = coast.ClicksPerTurn(n, off, turns)
	}
	if s.Bench.Err = err; err != nil {
		return []Effect{{Kind: Show, Key: "bench-sound"}}
	}
	_ = s.set("coast.clicks_per_turn", plain(per)) // ClicksPerTurn gives what the input takes
	s.Question.Source["coast.clicks_per_turn"] = ask.Measured
	number := func(v float64) string { return s.Voice.Number(v, 0) }
	s.Bench.Sound.Said, s.Bench.Sound.SaidArgs = words.BenchCounted, []string{number(float64(n)), number(turns), number(per)}
	s.Bench.stale = true
	return []Effect{{Kind: Tone, Key: "done"}, {Kind: Show, Key: "bench-sound"}}
}

// spun takes the longest stretch that slows down as the wheel on the stand.
func (s *State) spun(h *click.Heard) []Effect {
	var best *click.Stretch
	for i := range h.Stretches {
		if st := &h.Stretches[i]; st.Falls && (best == nil || st.ToS()-st.FromS() > best.ToS()-best.FromS()) {
			best = st
		}
	}
	if best == nil {
		s.Bench.Sound.Said = words.SoundNoFall
		return []Effect{{Kind: Show, Key: "bench-sound"}}
	}
	s.Bench.spin, s.Bench.stale = best, true
	return []Effect{{Kind: Tone, Key: "done"}, {Kind: Show, Key: "bench-spun"}}
}
