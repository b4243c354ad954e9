package state

import (
	"math"

	"hillwright/physics/ask"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/slope"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// Ways to measure a grade.
const (
	WayTilt  = "tilt"  // the phone laid down
	WaySight = "sight" // the phone held on edge
	WayTape  = "tape"  // a level and a tape
	WayWheel = "wheel" // wheel turns and heights
	WayRide  = "ride"  // a stretch recorded now
	WayTrack = "track" // a stretch of the loaded hill

	WayChoose = "choose" // none yet: the ways are offered
)

// Ways gives the ways to measure a grade, in the order in which they are
// offered.
func Ways() []string { return []string{WayTilt, WaySight, WayTape, WayWheel, WayRide, WayTrack} }

// Hillside is the place at the foot of a pitch: how its grade is being
// measured, what was read, and what that means for a bike.
type Hillside struct {
	Open  bool
	Way   string // how the grade is being measured, "" when it is not
	Err   error  // why no reading came out
	Tilt  Tilt
	Ride  Recording
	Awake bool // the screen is kept awake

	// Place is the name of the pitch whose readings count together.
	Place  string
	Shown  string // the id of the reading that is opened
	Group  []Pair
	Adding bool // riders are being added

	dials map[string]float64 // by path, SI, as the person set them
	picks map[string]string  // by name: which of a few they chose

	// Pitch is the answer for the pitch, nil before its grade is known.
	Pitch *Pitch

	stale bool // something changed since Pitch and the group's were answered
}

// Pair is one of the group: a rider on a bike, with its answer.
type Pair struct {
	Bike, Rider string // ids
	Pitch       *Pitch
}

// Pitch is what a grade with its error means for one rider on one bike: the
// answer at the grade itself, and the words at both ends of the 90 % interval.
type Pitch struct {
	Read      slope.Combined
	LengthM   float64
	Word      words.Word
	Low, High words.Word // at the gentler end, at the steeper end
	Rig       *rig.Rig
	Answer    *ride.Answer
}

// RollingMps is the speed of a run-up to a pitch [m/s]: 10 km/h. Common
// practice, no source.
const RollingMps = 10 / 3.6

// goTo opens the hillside, the bench or the sentence. A recording ends where
// one leaves it, and is listened to.
func (s *State) goTo(place string) []Effect {
	s.leave()
	s.Place, s.Path, s.Message = "", "", Message{}
	s.Side.Open, s.Bench.Open = place == GoHillside, place == GoBench
	effects := s.stopMeasuring()
	if s.Bench.Sound.Stage == SoundRecording && !s.Bench.Open {
		effects = append(effects, Effect{Kind: StopSound}, Effect{Kind: Sleep})
	}
	return append(effects, Effect{Kind: Show, Key: "go-" + place})
}

// doHillside does what happens at the hillside.
func (s *State) doHillside(a Action) (bool, []Effect) {
	switch a.Name {
	case GoTo:
		return true, s.goTo(a.Arg)
	case Awoken:
		s.Side.Awake = s.Side.Way != ""
	case Zone:
		s.Device.ZoneS = a.X
	case Voiced:
		s.Device.Voices = a.Arg
	case Measure:
		return true, s.measure(a.Arg)
	case DialUp:
		s.turnDial(a.Arg, 1)
	case DialDown:
		s.turnDial(a.Arg, -1)
	case Pick:
		name, choice := cut(a.Arg, "=")
		s.Side.picks = with(s.Side.picks, name, choice)
	case Tell:
		return true, s.tell()
	case GroupAdd, GroupOpen, GroupTake, GroupDrop:
		s.doGroup(a)
	default:
		if did, effects := s.doTilt(a); did {
			return true, effects
		}
		if did, effects := s.doStretch(a); did {
			return true, effects
		}
		return s.doReadings(a)
	}
	return true, nil
}

// measure begins to measure in a way, or ends it.
func (s *State) measure(way string) []Effect {
	effects := s.stopMeasuring()
	s.Message = Message{}
	if way == "" {
		return append(effects, Effect{Kind: Show, Key: "side-grade"})
	}
	s.Side.Way = way
	switch way {
	case WayTilt, WaySight:
		effects = append(effects, s.startTilt()...)
	case WayRide:
		effects = append(effects, s.startRide()...)
	case WayTrack:
		s.startTrack()
	case WayTape, WayWheel:
		effects = append(effects, Effect{Kind: Wake})
	}
	return append(effects, Effect{Kind: Show, Key: "side-measure"})
}

// stopMeasuring ends what is being measured. What was read once of two tilt
// readings stays, so that the half turn can follow.
func (s *State) stopMeasuring() []Effect {
	if s.Side.Way == "" {
		return nil
	}
	effects := []Effect{{Kind: Sleep}}
	switch s.Side.Way {
	case WayTilt, WaySight:
		effects = append(effects, Effect{Kind: StopTilt})
		s.Side.Tilt = Tilt{First: s.Side.Tilt.First}
	case WayRide:
		effects = append(effects, Effect{Kind: StopRide})
		s.Side.Ride = Recording{}
	}
	s.Side.Way, s.Side.Err, s.Side.Awake = "", nil, false
	return effects
}

// consider answers for the pitch and for the group, when the grade or anything
// else of the question has changed.
func (s *State) consider() {
	s.Side.Pitch, s.Side.stale = nil, false
	read, ok := s.Combined()
	group := append([]Pair(nil), s.Side.Group...)
	s.Side.Group = group
	for i := range group {
		group[i].Pitch = nil
	}
	if !ok {
		return
	}
	lengthM := s.Dial(DialLength)
	s.Side.Pitch = pitchOf(s.Question, read, lengthM)
	for i := range group {
		q := s.Question
		q.Source = nil
		bike, rider := s.thing("bike", group[i].Bike), s.thing("rider", group[i].Rider)
		if bike == nil || rider == nil {
			continue
		}
		q.Source = map[string]ask.Source{}
		// The chosen bike and rider stand as they are now, changes included.
		// Values that do not fit are left out, as where things are chosen.
		if group[i].Bike != s.Chosen[keep.Bike] {
			q.Bike = ask.Default().Bike
			_ = bike.Put(&q)
		}
		if group[i].Rider != s.Chosen[keep.Rider] {
			q.Rider = ask.Default().Rider
			_ = rider.Put(&q)
		}
		group[i].Pitch = pitchOf(q, read, lengthM)
	}
}

// pitchOf answers a question for a pitch of one grade, at the grade and at both
// ends of its 90 % interval; nil where the inputs give no answer.
func pitchOf(q ask.Question, read slope.Combined, lengthM float64) *Pitch {
	q.Ride.StartMps, q.Ride.Back, q.Ride.Trips = RollingMps, false, 1
	low, high := read.Interval90()
	p := &Pitch{Read: read, LengthM: lengthM}
	word := func(g float64) (w words.Word, r *rig.Rig, a *ride.Answer) {
		sine := g / math.Hypot(1, g)
		hill, err := pitchProfile(lengthM, sine)
		if err != nil {
			return words.Stop, nil, nil
		}
		if r, a, err = q.Climb(hill); err != nil {
			return words.Stop, nil, nil
		}
		return words.WordOf(a), r, a
	}
	p.Low, _, _ = word(float64(low))
	p.High, _, _ = word(float64(high))
	if p.Word, p.Rig, p.Answer = word(float64(read.Grade)); p.Answer == nil {
		return nil
	}
	// Where one end holds and the other does not, the reading does not decide;
	// where only the start hangs on it, the careful word is said.
	switch {
	case p.Low != words.Stop && p.High == words.Stop:
		p.Word = words.Again
	case p.High > p.Word:
		p.Word = p.High
	}
	return p
}

// Straddles tells that the 90 % interval reaches to both sides of what decides.
func (p *Pitch) Straddles() bool { return p.Low != p.High }

// with gives a map with one more entry; the old one is not altered.
func with[V any](m map[string]V, key string, value V) map[string]V {
	out := copied(m)
	out[key] = value
	return out
}
