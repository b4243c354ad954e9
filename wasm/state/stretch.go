package state

import (
	"math"
	"strconv"
	"strings"

	"hillwright/physics/hill"
	"hillwright/physics/slope"
	"hillwright/wasm/draw"
)

// Recording is a stretch of the ride that is being recorded.
type Recording struct {
	// Sensor is "" before there is a fix, "on", "absent", "refused", "lost".
	Sensor string
	Fixes  []slope.Fix
	Read   slope.Reading // of the fixes so far
	Err    error         // why they give no grade yet
	// LengthM is how far it has come [m].
	LengthM float64
}

// doStretch does what measures a length or a stretch.
func (s *State) doStretch(a Action) (bool, []Effect) {
	switch a.Name {
	case Located:
		s.located(a.Fix)
	case LocateFailed:
		if s.Side.Way == WayRide {
			s.Side.Ride.Sensor = a.Arg
		}
	case TrackHandle:
		s.moveHandle(a.Arg, a.X)
	case Read:
		return true, s.read(a.Now)
	default:
		return false, nil
	}
	return true, nil
}

// startRide begins to record, or goes on with what a reload has left.
func (s *State) startRide() []Effect {
	s.Side.Ride = Recording{Fixes: s.Side.Ride.Fixes}
	return []Effect{{Kind: StartRide}, {Kind: Wake}}
}

// mostFixes is how many fixes a stretch keeps: an hour and more.
const mostFixes = 4000

func (s *State) located(f slope.Fix) {
	r := &s.Side.Ride
	if s.Side.Way != WayRide || len(r.Fixes) >= mostFixes {
		return
	}
	r.Sensor = "on"
	r.Fixes = append(append(make([]slope.Fix, 0, len(r.Fixes)+1), r.Fixes...), f)
	r.Read, r.Err = slope.RideStretch(r.Fixes, slope.Satellite)
	r.LengthM = r.Read.LengthM
}

// mostKept is how many fixes are kept over a reload: a pitch takes fewer.
const mostKept = 300

// textOf writes a fix for the settings, and fixOf reads it.
func textOf(f *slope.Fix) string {
	out := ""
	for i, v := range []float64{f.LatDeg, f.LonDeg, f.HeightM, f.TimeS, f.AccuracyM, f.HeightAccuracyM} {
		if i > 0 {
			out += " "
		}
		out += strconv.FormatFloat(v, 'g', -1, 64)
	}
	return out
}

func fixOf(text string) (f slope.Fix, ok bool) {
	parts := strings.Fields(text)
	into := []*float64{&f.LatDeg, &f.LonDeg, &f.HeightM, &f.TimeS, &f.AccuracyM, &f.HeightAccuracyM}
	if len(parts) != len(into) {
		return f, false
	}
	for i, part := range parts {
		v, err := strconv.ParseFloat(part, 64)
		if err != nil {
			return f, false
		}
		*into[i] = v
	}
	return f, true
}

// startTrack puts the handles around the hardest stretch.
func (s *State) startTrack() {
	if s.Profile == nil || s.Answer == nil {
		return
	}
	from, to := s.Answer.Hardest.FromM, s.Answer.Hardest.ToM
	s.Side.dials = with(with(s.Side.dials, DialFrom, from), DialTo, to)
}

// Stretch gives the handles on the loaded hill [m], in order and on it.
func (s *State) Stretch() (fromM, toM float64) {
	length := s.Profile.LengthM()
	a, b := min(max(s.Dial(DialFrom), 0), length), min(max(s.Dial(DialTo), 0), length)
	return min(a, b), max(a, b)
}

// StretchSize is the size in which the section with its handles is drawn: a
// small phone's, so that they are large enough for a glove on any screen.
func StretchSize() draw.Size { return draw.Size{W: 300, H: 200} }

// moveHandle moves a handle to a place in the section.
func (s *State) moveHandle(which string, x float64) {
	if s.Profile == nil || s.Answer == nil || which != DialFrom && which != DialTo {
		return
	}
	s.setDial(which, draw.SectionAt(s.Profile, s.Answer, StretchSize(), x).AtM)
}

// TrackReading is the grade between the handles.
func (s *State) TrackReading() (slope.Reading, error) {
	from, to := s.Stretch()
	return slope.TrackStretch(s.Profile, from, to, s.trackHeights())
}

// trackHeights tells where the hill's heights come from, as the person said.
func (s *State) trackHeights() slope.Heights {
	switch s.Picked("track-heights", "satellite") {
	case "barometric":
		return slope.Barometric
	case "surveyed":
		return slope.Surveyed
	}
	return slope.Satellite
}

// TapeReading is the grade of rise and length as they are set.
func (s *State) TapeReading() (slope.Reading, error) {
	rise := slope.Measured{Value: s.Dial(DialRise), Error: s.half(DialRise)}
	span := slope.Measured{Value: s.Dial(DialSpan), Error: s.half(DialSpan) / 10}
	switch s.Picked("tape", "level") {
	case "road":
		return slope.Tape(rise, span, slope.AlongRoad)
	case "map":
		return slope.Tape(rise, span, slope.AlongLevel)
	}
	return slope.LevelRaised(rise, span)
}

// countError is how far a count of wheel turns is off [turns]: read to a
// quarter (see slope.Distance). rolloutError is a roll-out's error by where it
// is from, as part of it: measured, or from the tyre's size. Common practice,
// no source. altimeterError [m] is that of a device with an air pressure
// sensor, on the spot; stairError that of a stair's height [m].
const (
	countError      = 0.1
	rolloutMeasured = 0.003
	rolloutOfTyre   = 0.015
	altimeterError  = 0.5
	satelliteError  = 4.0
	stairError      = 0.003
)

// Rollout is the wheel's circumference with its error [m].
func (s *State) Rollout() slope.Measured {
	part := rolloutMeasured
	if math.IsNaN(s.Question.Bike.RolloutM) {
		part = rolloutOfTyre
	}
	if s.Rig == nil {
		return slope.Measured{}
	}
	return slope.Measured{Value: s.Rig.CircumferenceM, Error: part * s.Rig.CircumferenceM}
}

// WheelReading is the grade of wheel turns and heights as they are set.
func (s *State) WheelReading() (slope.Reading, error) {
	turns := slope.Measured{Value: s.Dial(DialTurns), Error: countError}
	if s.Picked("heights", "stairs") == "stairs" {
		return slope.WheelAndStairs(turns, s.Rollout(),
			slope.Measured{Value: s.Dial(DialStairs)}, slope.Measured{Value: s.Dial(DialStair), Error: stairError})
	}
	e := altimeterError
	if s.Picked("heights", "stairs") == "satellite" {
		e = satelliteError
	}
	return slope.WheelAndHeights(turns, s.Rollout(), slope.Measured{Value: s.Dial(DialFoot), Error: e}, slope.Measured{Value: s.Dial(DialTop), Error: e})
}

// ReadNow is what the way that is open would read now.
func (s *State) ReadNow() (slope.Reading, error) {
	switch s.Side.Way {
	case WaySight:
		return slope.Sighted(s.Side.Tilt.Now, s.Offset(slope.RestOf(s.Side.Tilt.Up, slope.LongEdge)))
	case WayTape:
		return s.TapeReading()
	case WayWheel:
		return s.WheelReading()
	case WayRide:
		return s.Side.Ride.Read, s.Side.Ride.Err
	case WayTrack:
		if s.Profile == nil {
			return slope.Reading{}, &slope.Error{Kind: slope.NoHeights}
		}
		return s.TrackReading()
	}
	return slope.Reading{}, &slope.Error{Kind: slope.NotEnough}
}

// read keeps what the way that is open reads now.
func (s *State) read(now int64) []Effect {
	if s.Side.Way == WayRide && len(s.Side.Ride.Fixes) == 0 {
		return nil
	}
	read, err := s.ReadNow()
	if s.Side.Err = err; err != nil {
		return nil
	}
	s.keepReading(read, now)
	return append(s.stopMeasuring(), Effect{Kind: Show, Key: "side-grade"})
}

// lengthFromCount takes the pitch's length from paces or wheel turns.
func (s *State) lengthFromCount(path string) {
	var m slope.Measured
	var err error
	if path == DialRolled {
		m, err = slope.Distance(slope.Measured{Value: s.Dial(DialRolled), Error: countError}, s.Rollout())
	} else {
		m, err = slope.Paces(slope.Measured{Value: s.Dial(DialPaces), Error: 1}, slope.Measured{Value: s.Dial(DialPace), Error: 0.05})
	}
	if err == nil {
		limits := dialRanges[DialLength]
		s.Side.dials = with(s.Side.dials, DialLength, min(max(m.Value, limits.low), limits.high))
	}
}

// pitchProfile is a hill of one section, by the sine of its angle.
func pitchProfile(lengthM, sine float64) (*hill.Profile, error) {
	p, err := hill.FromHeights([]float64{0, lengthM}, []float64{0, lengthM * sine}, nil)
	return &p, err
}
