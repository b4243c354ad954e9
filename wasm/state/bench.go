package state

import (
	"errors"
	"math"
	"strconv"

	"hillwright/physics/ask"
	"hillwright/physics/click"
	"hillwright/physics/coast"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// The jobs of the bench.
const (
	JobCoast = "coast"
	JobStand = "stand"
)

// Bench is the place where a bike's drag is measured: by the sound of its
// freehub while it coasts, by times or speeds that are read off, and a wheel's
// on the stand.
type Bench struct {
	Open  bool
	Job   string // JobCoast until another is chosen
	Sound Sound
	Laps  Laps
	Err   error // why the last recording gave nothing

	// Of the runs that count: what comes out, or why nothing does. The bike's own
	// numbers are what Into puts into it; Then is the hill's answer with them.
	Result       *coast.Result
	Refused      error
	CrrOf, CdAOf coast.Estimate
	Then         *ride.Answer
	ThenRig      *rig.Rig

	// Spun is the wheel on the stand, with the stretch it came from.
	Spun    *coast.Spun
	SpunErr error
	Turn    click.Fold
	spin    *click.Stretch

	// pictures and lines are those of runs that were heard since the page was
	// opened, by id: they are not kept.
	pictures map[string]*click.Picture
	lines    map[string][]click.Point
	stale    bool
}

// Doing is the bench's job.
func (b *Bench) Doing() string {
	if b.Job == JobStand {
		return JobStand
	}
	return JobCoast
}

// doBench does what happens at the bench.
func (s *State) doBench(a Action) (bool, []Effect) {
	switch a.Name {
	case BenchJob:
		if s.Bench.Sound.busy() {
			return true, nil
		}
		s.Bench.Job, s.Bench.Err, s.Bench.Laps, s.Bench.Sound.Said = a.Arg, nil, Laps{}, 0
		return true, []Effect{{Kind: Show, Key: "bench-job"}}
	case GradeFromSide:
		s.gradeFromSide()
	case IntoBike:
		s.intoBike()
	default:
		for _, do := range []func(Action) (bool, []Effect){s.doSound, s.doLaps, s.doRuns} {
			if did, effects := do(a); did {
				return true, effects
			}
		}
		return false, nil
	}
	return true, nil
}

// gradeFromSide takes the hillside's grade for the road.
func (s *State) gradeFromSide() {
	read, ok := s.Combined()
	if !ok {
		return
	}
	_ = s.set("coast.grade", plain(float64(read.Grade))) // beyond the range it stays as it was
	_ = s.set("coast.grade_error", plain(read.Error))
	s.Question.Source["coast.grade"] = ask.Measured
}

// metresPerClick is how far the wheel rolls from click to click; false while
// the clicks of a turn are not known.
func (s *State) metresPerClick() (float64, bool) {
	if !s.Question.ClicksKnown() {
		return math.NaN(), false
	}
	return s.Question.Circumference().Value / s.Question.Coast.ClicksPerTurn, true
}

// Runs are the chosen bike's, the latest last.
func (s *State) Runs() []keep.Run {
	var out []keep.Run
	for _, r := range s.Own.Runs {
		if r.Bike == s.Chosen[keep.Bike] {
			out = append(out, r)
		}
	}
	return out
}

// counting gives the runs that count and can: clicks need the clicks of a turn.
func (s *State) counting() (runs []coast.Run, ids []string) {
	per, known := s.metresPerClick()
	for _, r := range s.Runs() {
		if r.LeftOut || r.Kind == keep.ClickRun && !known {
			continue
		}
		runs, ids = append(runs, r.Coast(per)), append(ids, r.ID)
	}
	return runs, ids
}

// weighRuns works out what the runs say, and what the hill's answer would be.
func (s *State) weighRuns() {
	b := &s.Bench
	b.stale, b.Result, b.Then, b.ThenRig = false, nil, nil, nil
	runs, ids := s.counting()
	if b.Result, b.Refused = coast.Fit(runs, s.CoastSetup()); b.Refused != nil {
		b.Refused = s.numbered(b.Refused, ids)
	} else {
		b.CrrOf, b.CdAOf = s.Question.BikeDrag(b.Result)
		q := s.Question
		q.Source = copied(q.Source)
		if s.Profile != nil && s.putDrag(&q) == nil {
			b.ThenRig, b.Then, _ = q.Climb(s.Profile) // without an answer there is nothing to compare
		}
	}
	s.judgeSpin()
}

// CoastSetup is what is known before the runs. The bike's own drag is that of
// the chosen bike: what the same runs put into it must not count a second time.
func (s *State) CoastSetup() coast.Setup {
	q := s.Question
	q.Bike.Crr, q.Bike.CdAM2 = s.base.Bike.Crr, s.base.Bike.CdAM2
	return q.CoastSetup(s.roadHeight())
}

// numbered lets an error name a run by its number on the page, where runs that
// do not count have numbers too.
func (s *State) numbered(err error, ids []string) error {
	var e *coast.Error
	if !errors.As(err, &e) || e.Run >= len(ids) {
		return err
	}
	named := *e
	for i, r := range s.Runs() {
		if r.ID == ids[e.Run] {
			named.Run = i
		}
	}
	return &named
}

// roadHeight is the height of the hill's foot, near which the road is taken to
// lie [m].
func (s *State) roadHeight() float64 {
	if p := s.Profile; p != nil && p.HeightKnown && len(p.HeightM) > 0 {
		return p.HeightM[0]
	}
	return 0
}

func (s *State) judgeSpin() {
	b := &s.Bench
	if b.spin == nil {
		return
	}
	b.Spun, b.SpunErr = nil, nil
	if _, known := s.metresPerClick(); !known {
		return
	}
	b.Spun, b.SpunErr = s.Question.SpinWheel(b.spin.Points, s.roadHeight())
	b.Turn = b.spin.Fold(s.Question.Coast.ClicksPerTurn)
}

// SpinHeard tells that a wheel on the stand was heard.
func (s *State) SpinHeard() bool { return s.Bench.spin != nil }

// RunFit gives how a run fits; nil for one that does not count.
func (s *State) RunFit(id string) *coast.RunFit {
	if s.Bench.Result == nil {
		return nil
	}
	_, ids := s.counting()
	for i, each := range ids {
		if each == id && i < len(s.Bench.Result.Runs) {
			return &s.Bench.Result.Runs[i]
		}
	}
	return nil
}

// putDrag puts what was measured into a question.
func (s *State) putDrag(q *ask.Question) error {
	for path, text := range map[string]string{"bike.crr": s.crrText(), "bike.cda_m2": s.cdaText()} {
		if err := q.Set(path, text); err != nil {
			return err
		}
		q.Source[path] = ask.Measured
	}
	return nil
}

func (s *State) crrText() string { return strconv.FormatFloat(s.Bench.CrrOf.Value, 'f', 5, 64) }
func (s *State) cdaText() string { return strconv.FormatFloat(s.Bench.CdAOf.Value, 'f', 4, 64) }

// BikeHas tells that the bike has what was measured.
func (s *State) BikeHas() bool {
	crr, _ := s.Question.Value("bike.crr")
	cda, _ := s.Question.Value("bike.cda_m2")
	is := func(v float64, text string) bool {
		w, _ := strconv.ParseFloat(text, 64)
		return v == w
	}
	return s.Bench.Result != nil && is(crr, s.crrText()) && is(cda, s.cdaText()) && s.Question.SourceOf("bike.crr") == ask.Measured
}

// intoBike puts what was measured into the bike.
func (s *State) intoBike() {
	if s.Bench.Result == nil {
		return
	}
	before := s.clone()
	if err := s.putDrag(&s.Question); err != nil {
		s.Bench.Refused = err
		return
	}
	s.undoable(before)
	s.stale = true
	s.say(Message{Key: words.IntoBikeDone, Args: []string{s.Voice.Crr(s.Bench.CrrOf.Value), s.Voice.Area(s.Bench.CdAOf.Value)}, Undo: true})
}
