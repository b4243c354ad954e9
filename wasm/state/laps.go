package state

import (
	"hillwright/physics/coast"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// Ways to measure a coast-down without sound.
const (
	LapMarks   = "marks"   // a tap at each mark along the road
	LapDisplay = "display" // a tap as the display falls by a step
)

// Dials of these ways.
const (
	DialMarks = "dial.marks" // distance between marks [m]
	DialShown = "dial.shown" // the display's first speed [m/s]
	DialFewer = "dial.fewer" // the step by which it falls [m/s]
)

// Laps are taps of a thumb while a bike coasts.
type Laps struct {
	Way string // LapMarks or LapDisplay, "" for none
	AtS []float64
}

// mostLaps is how many taps a run takes.
const mostLaps = 200

// doLaps does what taps do.
func (s *State) doLaps(a Action) (bool, []Effect) {
	l := &s.Bench.Laps
	switch a.Name {
	case LapsBegin:
		if s.Bench.Sound.busy() {
			return true, nil
		}
		*l = Laps{Way: a.Arg}
		s.Bench.Err, s.Bench.Sound.Said = nil, 0
		if a.Arg == "" {
			return true, []Effect{{Kind: Sleep}, {Kind: Show, Key: "bench-sound"}}
		}
		return true, []Effect{{Kind: Wake}, {Kind: Show, Key: "bench-sound"}}
	case Lap:
		n := len(l.AtS)
		if l.Way == "" || n >= mostLaps || n > 0 && !(a.ClockS > l.AtS[n-1]) || l.Way == LapDisplay && s.LapSpeed(n) < 0 {
			return true, nil
		}
		l.AtS = append(append([]float64(nil), l.AtS...), a.ClockS)
		return true, []Effect{{Kind: Tone, Key: "step"}}
	case LapBack:
		if n := len(l.AtS); n > 0 {
			l.AtS = l.AtS[: n-1 : n-1]
		}
	case LapsEnd:
		return true, s.lapsEnd(a.Now)
	default:
		return false, nil
	}
	return true, nil
}

// LapSpeed is what the display shows at a tap, counted from 0 [m/s].
func (s *State) LapSpeed(tap int) float64 {
	return s.Dial(DialShown) - float64(tap)*s.Dial(DialFewer)
}

// leastLaps is how many taps make a run.
const leastLaps = 5

// lapsEnd makes a run of the taps.
func (s *State) lapsEnd(now int64) []Effect {
	l := s.Bench.Laps
	if len(l.AtS) < leastLaps {
		s.Bench.Err = &coast.Error{Kind: coast.TooFew, Run: len(s.Runs()), Got: float64(len(l.AtS)), Want: leastLaps}
		return nil
	}
	r := keep.Run{Kind: keep.MarkRun, Name: s.Voice.Say(words.SoundMarks)}
	if l.Way == LapDisplay {
		r.Kind, r.Name = keep.SpeedRun, s.Voice.Say(words.SoundDisplay)
	}
	for i, t := range l.AtS {
		is, err := float64(i)*s.Dial(DialMarks), coast.ThumbErrorS
		if l.Way == LapDisplay {
			is, err = s.LapSpeed(i), coast.DisplayErrorMps
		}
		r.AtS, r.Is, r.Error = append(r.AtS, t-l.AtS[0]), append(r.Is, is), append(r.Error, err)
	}
	s.Bench.Laps, s.Bench.Err = Laps{}, nil
	s.addRun(r, now, 0)
	return []Effect{{Kind: Sleep}, {Kind: Tone, Key: "done"}, {Kind: Show, Key: "bench-runs"}}
}
