package state

import (
	"math"
	"sort"
	"strconv"
	"strings"

	"hillwright/physics/slope"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// doReadings does what changes what was read.
func (s *State) doReadings(a Action) (bool, []Effect) {
	switch a.Name {
	case PlaceNext:
		s.Side.Place, s.Side.stale = s.freePlace(), true
		s.Message = Message{}
		return true, append(s.stopMeasuring(), Effect{Kind: Show, Key: "side-grade"})
	case PlaceTo:
		s.Side.Place, s.Side.stale = a.Arg, true
		return true, append(s.stopMeasuring(), Effect{Kind: Show, Key: "side-grade"})
	case PlaceName:
		s.renamePlace(strings.TrimSpace(a.Text), a.Now)
	case ReadingOpen:
		if s.Side.Shown == a.Arg {
			a.Arg = ""
		}
		s.Side.Shown = a.Arg
	case ReadingNote:
		id, note := cut(a.Arg, "=")
		s.changeReading(id, a.Now, func(r *keep.Reading) { r.Note = shortened(note) })
	case TypeNote:
		s.changeReading(a.Arg, a.Now, func(r *keep.Reading) { r.Note = shortened(a.Text) })
	case ReadingForget:
		s.forgetReading(a.Arg)
	case HillOfReadings:
		return true, s.hillOfReadings(a.Now)
	case ReadingsCSV:
		return true, s.readingsFile("text/csv", ".csv", slope.CSV(s.entries()))
	case ReadingsGPX:
		data, err := slope.GPX(s.Shop.Name, s.Voice.Say(words.GPXNote), s.pitches())
		if err != nil {
			s.Side.Err = err
			return true, nil
		}
		return true, s.readingsFile("application/gpx+xml", ".gpx", data)
	default:
		return false, nil
	}
	return true, nil
}

func (s *State) readingsFile(kind, ending string, data []byte) []Effect {
	name := "hillwright-readings" + ending
	s.say(Message{Key: words.ExportDone, Args: []string{name}})
	return []Effect{{Kind: Download, Key: name, Type: kind, Data: data}}
}

// keepReading keeps a reading of the pitch, at once. Grades count upward: a
// pitch that was read from above is the same pitch.
func (s *State) keepReading(read slope.Reading, now int64) {
	if read.Grade < 0 {
		read = read.Reversed()
	}
	if s.Side.Place == "" {
		s.Side.Place = s.freePlace()
	}
	r := keep.Reading{ID: s.newID(now), Changed: now}
	r.Reading, r.Place, r.TimeS, r.At = read, s.Side.Place, float64(now), keep.Nowhere()
	r.Pitch = s.pitchLength()
	if n := len(s.Side.Ride.Fixes); s.Side.Way == WayRide && n > 0 {
		r.At = s.Side.Ride.Fixes[0].Point
	}
	s.Own.Readings = append(append([]keep.Reading(nil), s.Own.Readings...), r)
	s.ownRevision++
	s.Side.stale = true
	s.Message = Message{}
}

// pitchLength is the pitch's length as it is set [m], with an error by how it
// was found.
func (s *State) pitchLength() slope.Measured {
	m := slope.Measured{Value: s.Dial(DialLength), Error: s.half(DialLength)}
	switch s.Picked("length", "typed") {
	case "paces":
		m.Error = 0.08 * m.Value // as of paces nobody measured: common practice, no source
	case "rolled":
		m.Error = rolloutOfTyre * m.Value
	}
	return m
}

// Readings gives what was read, the latest first.
func (s *State) Readings() []keep.Reading {
	list := append([]keep.Reading(nil), s.Own.Readings...)
	sort.SliceStable(list, func(i, j int) bool { return list[i].TimeS > list[j].TimeS })
	return list
}

// here are the readings of the pitch, in the order in which they were taken.
func (s *State) here() []keep.Reading {
	var out []keep.Reading
	for _, r := range s.Own.Readings {
		if s.Side.Place != "" && r.Place == s.Side.Place {
			out = append(out, r)
		}
	}
	return out
}

// Combined is what the readings of the pitch say together; false without any.
func (s *State) Combined() (slope.Combined, bool) {
	var reads []slope.Reading
	for _, r := range s.here() {
		reads = append(reads, r.Reading)
	}
	if len(reads) == 0 {
		return slope.Combined{}, false
	}
	c, err := slope.Combine(reads)
	return c, err == nil
}

// Odd is the id of the pitch's reading that fits worst, "" without a misfit.
func (s *State) Odd() string {
	if c, ok := s.Combined(); ok && c.Misfit && c.Odd >= 0 {
		return s.here()[c.Odd].ID
	}
	return ""
}

// ReadHere is how many readings the pitch has.
func (s *State) ReadHere() int { return len(s.here()) }

// entries are all readings in the order in which they were taken.
func (s *State) entries() []slope.Entry {
	var out []slope.Entry
	list := s.Readings()
	for i := len(list) - 1; i >= 0; i-- {
		out = append(out, list[i].Entry)
	}
	return out
}

// freePlace is the next name that is offered: place 1, place 2 and so on.
func (s *State) freePlace() string {
	taken := map[string]bool{}
	for _, r := range s.Own.Readings {
		taken[r.Place] = true
	}
	for n := 1; ; n++ {
		if name := s.Voice.Say(words.PlaceNumber, strconv.Itoa(n)); !taken[name] {
			return name
		}
	}
}

// PitchName gives the pitch's name, or the one that is offered.
func (s *State) PitchName() string {
	if s.Side.Place != "" {
		return s.Side.Place
	}
	return s.freePlace()
}

// renamePlace names the pitch anew, with all that was read there.
func (s *State) renamePlace(name string, now int64) {
	name = shortened(name)
	if name == "" || name == s.Side.Place {
		return
	}
	list := append([]keep.Reading(nil), s.Own.Readings...)
	for i := range list {
		if list[i].Place == s.Side.Place && s.Side.Place != "" {
			list[i].Place, list[i].Changed = name, now
		}
	}
	s.Own.Readings, s.Side.Place = list, name
	s.ownRevision++
}

// shortened holds a name or a note to the length that is kept.
func shortened(text string) string {
	if len(text) > longestName {
		return strings.ToValidUTF8(text[:longestName], "")
	}
	return text
}

func (s *State) changeReading(id string, now int64, change func(*keep.Reading)) {
	at := s.Own.ReadingAt(id)
	if at < 0 {
		return
	}
	list := append([]keep.Reading(nil), s.Own.Readings...)
	change(&list[at])
	list[at].Changed = now
	s.Own.Readings = list
	s.ownRevision++
}

func (s *State) forgetReading(id string) {
	at := s.Own.ReadingAt(id)
	if at < 0 {
		return
	}
	s.undoable(s.clone())
	r := s.Own.Readings[at]
	s.Own.Readings = without(s.Own.Readings, at)
	s.ownRevision++
	s.Side.stale, s.Side.Shown = true, ""
	s.say(Message{Key: words.KeptForgotten, Args: []string{r.Place + ", " + s.Voice.Grade(r.Grade)}, Undo: true})
}

// pitches gives one entry for each place of the latest day: what its readings
// say together, in the order in which they were come to.
func (s *State) pitches() []slope.Entry {
	var out []slope.Entry
	list := s.entries()
	if len(list) == 0 {
		return nil
	}
	day := s.dayOf(list[len(list)-1].TimeS)
	byPlace := map[string][]slope.Reading{}
	for _, e := range list {
		if s.dayOf(e.TimeS) != day {
			continue
		}
		if byPlace[e.Place] == nil {
			out = append(out, e)
		}
		byPlace[e.Place] = append(byPlace[e.Place], e.Reading)
	}
	for i := range out {
		if c, err := slope.Combine(byPlace[out[i].Place]); err == nil {
			out[i].Reading = c.Reading
		}
	}
	return out
}

// dayOf numbers a time's day where the device is.
func (s *State) dayOf(timeS float64) float64 { return math.Floor((timeS + s.Device.ZoneS) / 86400) }

// DayOf writes a time's day, and ClockOf its time of day, where the device is.
func (s *State) DayOf(timeS float64) string { return words.Day(timeS + s.Device.ZoneS) }

// ClockOf writes a time of day where the device is.
func (s *State) ClockOf(timeS float64) string { return words.Clock(timeS + s.Device.ZoneS) }

// hillOfReadings makes a hill of the day's pitches, one after the other, keeps
// it and chooses it.
func (s *State) hillOfReadings(now int64) []Effect {
	pitches := s.pitches()
	if len(pitches) == 0 {
		return nil
	}
	name := s.Voice.Say(words.HillOfDay, s.DayOf(pitches[0].TimeS))
	p, err := slope.Hill(name, pitches)
	if s.Side.Err = err; err != nil {
		return nil
	}
	id := s.ownHillID(name, now)
	s.undoable(s.clone())
	s.putHill(keep.HillOf(&p, id, name), now)
	s.chooseHill(id)
	s.say(Message{Key: words.HillMade, Args: []string{name, s.Voice.Length(p.LengthM()), s.Voice.Height(p.AscentM())}, Undo: true})
	return nil
}
