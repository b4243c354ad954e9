package state

import (
	"math"
	"strconv"

	"hillwright/physics/slope"
	"hillwright/physics/unit"
)

// Tilt is a phone that is laid down or held on edge: what its sensor says, and
// how far two readings have come.
type Tilt struct {
	// Sensor is "" before it has said anything, "on", "absent", "refused".
	Sensor string
	Up     slope.Up      // as it is now
	Now    slope.Average // of the average under way
	Taking bool          // an average is under way
	Frozen bool          // what is seen along the edge is held
	// First is the first of two readings; its Seconds are 0 before there is one.
	First slope.Average
	rest  slope.Rest

	// steady is the average under way. The states of one average share it: it is
	// only ever added to, and Now is what a state shows of it.
	steady *slope.Steady
}

// Lean is one sample of the sensor: when [s since 1970], up in the phone's axes,
// and what it is rounded to.
type Lean struct {
	TimeS float64
	Up    slope.Up
	Step  unit.Angle
}

// Angle is the angle of the phone's long edge now.
func (t *Tilt) Angle() unit.Angle {
	if t.Frozen {
		return t.Now.Mean
	}
	return t.Up.Angle(slope.LongEdge)
}

// Half tells that the first of two readings is done and the half turn is next.
func (t *Tilt) Half() bool { return t.First.Seconds > 0 }

// doTilt does what the sensor says and what is asked of it.
func (s *State) doTilt(a Action) (bool, []Effect) {
	t := &s.Side.Tilt
	switch a.Name {
	case Tilted:
		return true, s.tilted(a.Leans)
	case Sensor:
		if s.tilting() {
			t.Sensor = a.Arg
		}
	case Average:
		t.Taking, t.Now, t.steady = true, slope.Average{}, nil
		s.Side.Err = nil
	case Freeze:
		if t.Frozen = !t.Frozen; !t.Frozen {
			t.steady, t.Now, s.Side.Err = nil, slope.Average{}, nil
		}
	case OneReading:
		return true, s.readOnce(a.Now)
	case StartOver:
		s.Side.Ride = Recording{Sensor: s.Side.Ride.Sensor}
		t.Taking, t.Now, t.First, t.Frozen, t.steady = false, slope.Average{}, slope.Average{}, false, nil
		s.Side.Err = nil
	default:
		return false, nil
	}
	return true, nil
}

func (s *State) tilting() bool { return s.Side.Way == WayTilt || s.Side.Way == WaySight }

func (s *State) startTilt() []Effect {
	s.Side.Tilt = Tilt{First: s.Side.Tilt.First, rest: s.Side.Tilt.rest}
	return []Effect{{Kind: StartTilt}, {Kind: Wake}}
}

// tilted takes samples; an average that is good enough is taken at once, so
// that nobody has to look at the screen.
func (s *State) tilted(leans []Lean) []Effect {
	t := &s.Side.Tilt
	if !s.tilting() || len(leans) == 0 || t.Frozen {
		return nil
	}
	t.Sensor, t.Up = "on", leans[len(leans)-1].Up
	if s.Side.Way == WayTilt && !t.Taking {
		return nil
	}
	if t.steady == nil {
		t.steady = slope.NewSteady(0, leans[0].Step)
	}
	for _, l := range leans {
		t.steady.Add(l.TimeS, l.Up.Angle(slope.LongEdge))
	}
	t.Now = t.steady.Average()
	if s.Side.Way == WayTilt && t.Now.Enough {
		return s.averaged(int64(leans[len(leans)-1].TimeS))
	}
	return nil
}

// averaged takes an average that is good enough: the first of two, or the
// second, which makes a reading.
func (s *State) averaged(now int64) []Effect {
	t := &s.Side.Tilt
	rest := slope.RestOf(t.Up, slope.LongEdge)
	done := t.Now
	t.Taking, t.steady, t.Now = false, nil, slope.Average{}
	if !t.Half() {
		t.First, t.rest = done, rest
		return []Effect{{Kind: Tone, Key: "step"}}
	}
	read, offset, err := slope.Turned(t.First, done, s.support(), s.offsetKey(rest))
	if s.Side.Err = err; err != nil {
		return nil
	}
	s.Side.Tilt.First = slope.Average{}
	s.keepOffset(offset)
	s.keepReading(read, now)
	return append(s.stopMeasuring(), Effect{Kind: Tone, Key: "done"}, Effect{Kind: Show, Key: "side-grade"})
}

// readOnce makes a reading of a single average: the first of two with the
// offset that the device kept, or what was frozen along the edge.
func (s *State) readOnce(now int64) []Effect {
	t := &s.Side.Tilt
	var read slope.Reading
	var err error
	switch {
	case s.Side.Way == WaySight:
		read, err = s.ReadNow()
	case t.Half():
		read, err = slope.Tilt(t.First, s.Offset(t.rest), s.support())
	default:
		return nil
	}
	if s.Side.Err = err; err != nil {
		return nil
	}
	s.Side.Tilt.First = slope.Average{}
	s.keepReading(read, now)
	return append(s.stopMeasuring(), Effect{Kind: Show, Key: "side-grade"})
}

// support is what the phone lies on: a straight edge, or the bike's tube.
func (s *State) support() slope.Support {
	if s.OnTube() {
		return slope.Support{BaseM: s.Question.Bike.Places.WheelbaseM, Bike: true}
	}
	return slope.Support{BaseM: s.Dial(DialEdge)}
}

// OnTube tells that the phone lies on the bike's tube.
func (s *State) OnTube() bool { return s.Picked("support", "edge") == "tube" }

// offsetKey tells offsets of one device apart.
func (s *State) offsetKey(rest slope.Rest) string {
	if s.OnTube() {
		return "long-" + string(rest) + "-" + s.Chosen["bike"]
	}
	return "long-" + string(rest)
}

// Offset gives the offset that the device kept for a side of the phone; the
// zero value when there is none.
func (s *State) Offset(rest slope.Rest) slope.Offset {
	key := s.offsetKey(rest)
	angle, known := s.Side.dials["offset."+key]
	err := s.Side.dials["offset-error."+key]
	if !known || !(err > 0) || math.IsNaN(angle) {
		return slope.Offset{}
	}
	return slope.Offset{Angle: unit.Angle(angle), Error: unit.Angle(err), Key: key}
}

// FirstOffset gives the offset for the side on which the first reading was
// taken.
func (s *State) FirstOffset() slope.Offset { return s.Offset(s.Side.Tilt.rest) }

func (s *State) keepOffset(o slope.Offset) {
	s.Side.dials = with(s.Side.dials, "offset."+o.Key, float64(o.Angle))
	s.Side.dials = with(s.Side.dials, "offset-error."+o.Key, float64(o.Error))
}

// restoreFirst takes over the first of two readings from the settings.
func (t *Tilt) restoreFirst(kept map[string]string) {
	number := func(name string) float64 {
		v, err := strconv.ParseFloat(kept["first."+name], 64)
		if err != nil {
			return math.NaN()
		}
		return v
	}
	mean, err, seconds := number("mean"), number("error"), number("seconds")
	if math.Abs(mean) < 1 && err > 0 && err < 1 && seconds > 0 {
		t.First = slope.Average{Mean: unit.Angle(mean), Error: unit.Angle(err), Seconds: seconds, Progress: 1, Enough: true}
		t.rest = slope.Rest(kept["first.rest"])
	}
}
