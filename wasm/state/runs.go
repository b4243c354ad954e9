package state

import (
	"math"

	"hillwright/physics/click"
	"hillwright/wasm/draw"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// Size of a run's picture.
const (
	clicksTall = 0.72
	clicksPx   = 280
)

// ClickSize is the size in which a run is drawn.
func (s *State) ClickSize() draw.Size { return s.size(clicksTall, clicksPx) }

// cutStep is by how much a cut is moved at a time [s].
const cutStep = 0.5

// doRuns does what a person does with the runs.
func (s *State) doRuns(a Action) (bool, []Effect) {
	id, what := cut(a.Arg, "=")
	change := func(f func(*keep.Run)) { s.changeRun(id, a.Now, f) }
	switch a.Name {
	case RunWay:
		change(func(r *keep.Run) { r.Back = what == "back" })
	case RunUse:
		change(func(r *keep.Run) { r.LeftOut = what == "no" })
	case RunForget:
		s.forgetRun(id)
		return true, []Effect{{Kind: Show, Key: "bench-runs"}}
	case CutHandle:
		if at := s.Own.RunAt(id); at >= 0 {
			t := draw.ClicksAt(s.ClickView(&s.Own.Runs[at]), a.X)
			change(func(r *keep.Run) { moveCut(r, what, t) })
		}
	case CutLater, CutEarlier:
		by := cutStep
		if a.Name == CutEarlier {
			by = -by
		}
		change(func(r *keep.Run) {
			if what == "from" {
				moveCut(r, what, r.FromS+by)
			} else {
				moveCut(r, what, r.ToS+by)
			}
		})
	default:
		return false, nil
	}
	return true, nil
}

// leastRunS is what a cut leaves at least [s].
const leastRunS = 3

// moveCut moves a run's beginning or end, within its readings.
func moveCut(r *keep.Run, which string, t float64) {
	first, last := r.AtS[0], r.AtS[len(r.AtS)-1]
	if which == "from" {
		r.FromS = max(first, min(t, r.ToS-leastRunS))
	} else {
		r.ToS = min(last, max(t, r.FromS+leastRunS))
	}
}

func (s *State) changeRun(id string, now int64, change func(*keep.Run)) {
	at := s.Own.RunAt(id)
	if at < 0 {
		return
	}
	list := append([]keep.Run(nil), s.Own.Runs...)
	change(&list[at])
	list[at].Changed = now
	s.Own.Runs = list
	s.ownRevision++
	s.Bench.stale = true
}

func (s *State) forgetRun(id string) {
	at := s.Own.RunAt(id)
	if at < 0 {
		return
	}
	s.undoable(s.clone())
	s.Own.Runs = without(s.Own.Runs, at)
	s.ownRevision++
	s.Bench.stale = true
	s.say(Message{Key: words.KeptForgotten, Args: []string{s.Voice.Say(words.RunForgotten)}, Undo: true})
}

// ClickView is what a run's picture shows: the fine line and the spectrogram of
// a recording that was heard since the page was opened, else the run's readings
// alone.
func (s *State) ClickView(r *keep.Run) *draw.ClickView {
	v := &draw.ClickView{
		Picture: s.Bench.pictures[r.ID], FromS: r.FromS, ToS: r.ToS, Size: s.ClickSize(), Voice: s.Voice, ID: r.ID, Dots: r.Kind != keep.ClickRun,
	}
	by := 1.0
	switch r.Kind {
	case keep.ClickRun:
		line := s.Bench.lines[r.ID]
		if line == nil {
			line = r.Rates()
		}
		if per, known := s.metresPerClick(); known {
			by, v.PerHz = per, per
		}
		v.Line = spots(line, by)
	case keep.SpeedRun:
		v.PerHz, v.Line = 1, spots(r.Rates(), 1)
	default:
		v.PerHz = 1
		for i := 1; i < len(r.AtS); i++ {
			long, took := r.Is[i]-r.Is[i-1], r.AtS[i]-r.AtS[i-1]
			speed := long / took
			v.Line = append(v.Line, draw.Spot{AtS: (r.AtS[i] + r.AtS[i-1]) / 2, Is: speed, Error: speed * math.Sqrt2 * r.Error[i] / took})
		}
	}
	// Ends that are not cut are those of the line.
	if len(v.Line) > 0 && r.FromS <= r.AtS[0] {
		v.FromS = min(r.FromS, v.Line[0].AtS)
	}
	if n := len(v.Line); n > 0 && r.ToS >= r.AtS[len(r.AtS)-1] {
		v.ToS = max(r.ToS, v.Line[n-1].AtS)
	}
	return v
}

func spots(points []click.Point, by float64) []draw.Spot {
	out := make([]draw.Spot, len(points))
	for i, p := range points {
		out[i] = draw.Spot{AtS: p.AtS, Is: p.RateHz * by, Error: p.ErrorHz * by}
	}
	return out
}

// RunEnds are a run's speeds where the part that counts begins and ends [m/s],
// and how long it is [s]; ok is false while its speeds are not known.
func (s *State) RunEnds(r *keep.Run) (firstMps, lastMps, longS float64, ok bool) {
	v := s.ClickView(r)
	if v.PerHz == 0 || len(v.Line) == 0 {
		return 0, 0, r.ToS - r.FromS, false
	}
	first, last := -1, -1
	for i, spot := range v.Line {
		if spot.AtS >= r.FromS-1e-9 && first < 0 {
			first = i
		}
		if spot.AtS <= r.ToS+1e-9 {
			last = i
		}
	}
	if first < 0 || last < first {
		return 0, 0, r.ToS - r.FromS, false
	}
	return v.Line[first].Is, v.Line[last].Is, r.ToS - r.FromS, true
}
