package state

import (
	"math"

	"hillwright/wasm/words"
)

// Dials: what a thumb sets while measuring. They go by path like inputs, and
// are shown and stepped like them (package words).
const (
	DialRise   = "dial.rise"   // [m]
	DialSpan   = "dial.span"   // [m]
	DialEdge   = "dial.edge"   // the straight edge under the phone [m]
	DialTurns  = "dial.turns"  // of the wheel
	DialStairs = "dial.stairs" // steps of a flight
	DialStair  = "dial.stair"  // height of one [m]
	DialFoot   = "dial.foot"   // altimeter at the foot [m]
	DialTop    = "dial.top"    // altimeter at the top [m]
	DialLength = "dial.length" // of the pitch [m]
	DialPaces  = "dial.paces"  // counted along the pitch
	DialPace   = "dial.pace"   // length of one [m]
	DialRolled = "dial.rolled" // wheel turns along the pitch
	DialFrom   = "dial.from"   // of a stretch of the loaded hill [m]
	DialTo     = "dial.to"
)

// dialRange is a dial's first value and its range.
type dialRange struct{ first, low, high float64 }

// dialRanges are the ranges in which package slope takes them, and shorter
// where a thumb would get lost.
var dialRanges = map[string]dialRange{
	DialRise: {0.10, 0, 10}, DialSpan: {1, 0.1, 100}, DialEdge: {1, 0.1, 3},
	DialTurns: {10, 0.25, 2000}, DialStairs: {10, 0, 500}, DialStair: {0.17, 0.02, 0.5},
	DialFoot: {400, -400, 5000}, DialTop: {410, -400, 5000},
	DialLength: {60, 5, 5000}, DialPaces: {80, 1, 5000}, DialPace: {0.75, 0.3, 1.5}, DialRolled: {28, 1, 2000},
	DialFrom: {0, 0, 1e7}, DialTo: {0, 0, 1e7},
	DialMarks: {20, 2, 200}, DialShown: {25 / 3.6, 5 / 3.6, 60 / 3.6}, DialFewer: {1 / 3.6, 0.5 / 3.6, 10 / 3.6},
}

// Dial gives a dial's value.
func (s *State) Dial(path string) float64 {
	if v, ok := s.Side.dials[path]; ok {
		return v
	}
	return dialRanges[path].first
}

// TapeUnits is the choice of the tape's units.
const TapeUnits = "tape-units"

// unitWords are the words of TapeUnits.
var unitWords = map[words.Units]string{words.Metric: "metric", words.Imperial: "imperial"}

// TapeUnit is the units in which level and tape are read: those of the tape at
// hand, the page's own until someone chooses.
func (s *State) TapeUnit() string { return s.Picked(TapeUnits, unitWords[s.Voice.Units]) }

// DialVoice is the voice in which a dial is shown and turned.
func (s *State) DialVoice(path string) words.Voice {
	v := s.Voice
	if path == DialRise || path == DialSpan {
		v.Units = words.Metric
		if s.TapeUnit() == unitWords[words.Imperial] {
			v.Units = words.Imperial
		}
	}
	return v
}

// turnDial moves a dial to the next round value in the unit shown. What a dial
// counts changes the pitch's length with it.
func (s *State) turnDial(path string, sign float64) {
	voice, limits := s.DialVoice(path), dialRanges[path]
	size := voice.Step(path)
	if !(size > 0) {
		return
	}
	const off = 1e-6
	steps := voice.Show(path, s.Dial(path)) / size
	if sign > 0 {
		steps = math.Floor(steps+off) + 1
	} else {
		steps = math.Ceil(steps-off) - 1
	}
	s.setDial(path, min(max(voice.FromShown(path, steps*size), limits.low), limits.high))
}

func (s *State) setDial(path string, v float64) {
	s.Side.dials = with(s.Side.dials, path, v)
	s.Side.Err, s.Side.stale = nil, true
	switch path {
	case DialPaces, DialPace, DialRolled:
		s.lengthFromCount(path)
	}
}

// half is the error of a value that was set to the nearest step of its dial,
// 1 σ: 0.3 of the step (a uniform distribution: 1/√12).
func (s *State) half(path string) float64 {
	voice := s.DialVoice(path)
	return 0.3 * math.Abs(voice.FromShown(path, voice.Step(path))-voice.FromShown(path, 0))
}

// Picked gives which of a few was chosen: the first until someone chooses.
func (s *State) Picked(name, first string) string {
	if is, ok := s.Side.picks[name]; ok {
		return is
	}
	return first
}
