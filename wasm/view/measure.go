package view

import (
	"hillwright/physics/slope"
	"hillwright/physics/unit"
	. "hillwright/wasm/dom"
	"hillwright/wasm/draw"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// wayName is a way's name in the list of ways.
func wayName(way string) words.Key {
	switch way {
	case state.WaySight:
		return words.WaySight
	case state.WayTape:
		return words.WayTape
	case state.WayWheel:
		return words.WayWheel
	case state.WayRide:
		return words.WayRide
	case state.WayTrack:
		return words.WayTrack
	}
	return words.WayTilt
}

// sideMeasure is how the grade is measured: the ways while there is none, and
// the one that was chosen.
func (v *viewer) sideMeasure() *Node {
	if v.Side.Way == "" && v.ReadHere() > 0 {
		return region("section", "side-measure", Bare("hidden"))
	}
	title := words.HeadMeasure
	var inside Part
	switch v.Side.Way {
	case state.WayTilt:
		title, inside = words.WayTilt, v.tilt()
	case state.WaySight:
		title, inside = words.WaySight, v.sight()
	case state.WayTape:
		title, inside = words.WayTape, v.tape()
	case state.WayWheel:
		title, inside = words.WayWheel, v.wheel()
	case state.WayRide:
		title, inside = words.WayRide, v.recording()
	case state.WayTrack:
		title, inside = words.WayTrack, v.track()
	default:
		inside = v.ways()
	}
	return region("section", "side-measure", Class("measure"), With("aria-labelledby", "measure-title"),
		El("h2", ID("measure-title"), With("tabindex", "-1"), Text(capital(v.Voice.Say(title)))),
		inside,
		If(v.Side.Err != nil, El("p", Class("problem"), With("role", "alert"), Text(v.Problem(v.Side.Err)))),
		If(v.Side.Awake, El("p", Class("hint"), v.say(words.AwakeNote))))
}

// ways are the ways to measure, as large drawn choices.
func (v *viewer) ways(without ...string) *Node {
	list := Parts{Class("ways")}
next:
	for _, way := range state.Ways() {
		for _, out := range without {
			if way == out {
				continue next
			}
		}
		list = append(list, El("li", button("way", state.Measure, way, wayPicture(way), El("span", v.say(wayName(way))))))
	}
	return El("ul", list)
}

// sensorFails tells that the way that was chosen has no sensor to go by.
func (v *viewer) sensorFails() bool {
	sensor := ""
	switch v.Side.Way {
	case state.WayTilt, state.WaySight:
		sensor = v.Side.Tilt.Sensor
	case state.WayRide:
		sensor = v.Side.Ride.Sensor
	}
	return sensor == "absent" || sensor == "refused"
}

// noTilt says that there is no tilt sensor, and offers the other ways.
func (v *viewer) noTilt() Part {
	key := words.SensorAbsent
	if v.Side.Tilt.Sensor == "refused" {
		key = words.SensorRefused
	}
	return Parts{El("p", Class("problem"), With("role", "alert"), v.say(key)), v.ways(state.WayTilt, state.WaySight)}
}

func (v *viewer) tilt() Part {
	t := &v.Side.Tilt
	if v.sensorFails() {
		return v.noTilt()
	}
	how := words.TiltHow
	switch {
	case t.Half() && v.OnTube():
		how = words.TiltTurnBike
	case t.Half():
		how = words.TiltTurn
	}
	parts := Parts{El("p", v.say(how))}
	if t.Half() {
		parts = append(parts, El("p", Class("hint"), v.say(words.TiltFirst, v.GradeFine(unit.GradeOf(t.First.Mean)))))
	}
	parts = append(parts, v.live(t.Taking))
	if !t.Taking {
		parts = append(parts, v.picking(words.SupportName, "support", "edge", words.SupportEdge, "tube", words.SupportTube),
			If(!v.OnTube(), v.dialStepper(state.DialEdge)))
		if t.Half() {
			note := v.Voice.Say(words.TiltUnknown)
			if o := v.FirstOffset(); o.Known() {
				note = v.Voice.Say(words.TiltKnown, v.Degrees(o.Angle))
			}
			parts = append(parts, El("p", Class("hint"), Text(note)),
				El("div", Class("row"),
					button("plain", state.OneReading, "", v.say(words.TiltOnce)),
					button("plain", state.StartOver, "", v.say(words.TiltOver))))
		}
	}
	return parts
}

// live is the grade as the sensor says it now, with how still it is and how far
// the average has come.
func (v *viewer) live(taking bool) Part {
	t := &v.Side.Tilt
	if t.Sensor == "" {
		return El("p", With("role", "status"), v.say(words.TiltWaiting))
	}
	angle := t.Angle()
	if taking && t.Now.Seconds > 0 {
		angle = t.Now.Mean
	}
	parts := Parts{
		region("p", "side-live", Class("huge"), Text(v.GradeFine(unit.GradeOf(angle)))),
		v.liveWedge(angle),
	}
	if taking {
		word := words.TiltSteady
		switch {
		case t.Now.Drifting:
			word = words.TiltDrifting
		case t.Now.Steadiness < 0.5:
			word = words.TiltMoving
		}
		parts = append(parts, region("div", "side-still", Class("reading"),
			El("progress", With("max", "100"), With("value", v.Voice.Number(t.Now.Progress*100, 0)), With("aria-label", v.Voice.Say(words.TiltAveraging))),
			El("p", Class("still"), v.say(word), If(t.Now.Error > 0 && t.Now.Seconds > 1, Text(" · "+v.GradeError(slope.ShownFactor*float64(t.Now.Error)))))))
	}
	return parts
}

func (v *viewer) sight() Part {
	if v.sensorFails() {
		return v.noTilt()
	}
	t := &v.Side.Tilt
	var sure Part
	if read, err := v.ReadNow(); err == nil {
		sure = El("p", Class("still"), Text(v.GradeError(read.PlusMinus())))
	}
	return Parts{
		El("p", v.say(words.SightHow)),
		v.live(false),
		sure,
		If(t.Frozen, El("div", Class("row"), button("plain", state.Freeze, "", v.say(words.SightGoOn)))),
	}
}

// result is what would be read now, with its error.
func (v *viewer) result() Part {
	read, err := v.ReadNow()
	if err != nil {
		return El("p", Class("hint"), With("role", "status"), Text(v.Problem(err)))
	}
	return El("p", Class("huge"), With("role", "status"), Text(v.GradeFine(read.Grade)), El("span", Class("error"), Text(v.GradeError(read.PlusMinus()))))
}

func (v *viewer) tape() Part {
	how := words.TapeHow
	if v.Picked("tape", "level") != "level" {
		how = words.TapeHowLength
	}
	return Parts{
		v.result(), El("p", v.say(how)),
		v.picking(words.TapeName, "tape", "level", words.TapeLevel, "road", words.TapeRoad, "map", words.TapeMap),
		v.units(),
		v.dialStepper(state.DialRise), v.dialStepper(state.DialSpan),
	}
}

// units are those of the tape at hand.
func (v *viewer) units() *Node {
	is, label := v.TapeUnit(), capital(v.Voice.Say(words.SetUnits))
	return El("div", El("p", Class("editor-name"), Text(label)),
		El("div", Class("one-of"), With("role", "group"), With("aria-label", label),
			v.one(state.Pick, state.TapeUnits+"=metric", v.say(words.SetMetric), is == "metric"),
			v.one(state.Pick, state.TapeUnits+"=imperial", v.say(words.SetImperial), is == "imperial")))
}

func (v *viewer) wheel() Part {
	parts := Parts{
		v.result(), El("p", v.say(words.WheelHow, v.Voice.Value("bike.rollout_m", v.Rollout().Value))),
		v.dialStepper(state.DialTurns),
		v.picking(words.HeightsName, "heights", "stairs", words.HeightsStairs, "pressure", words.HeightsPressure, "satellite", words.HeightsSatellite),
	}
	if v.Picked("heights", "stairs") == "stairs" {
		return append(parts, v.dialStepper(state.DialStairs), v.dialStepper(state.DialStair))
	}
	return append(parts, v.dialStepper(state.DialFoot), v.dialStepper(state.DialTop))
}

func (v *viewer) recording() Part {
	r := &v.Side.Ride
	if v.sensorFails() {
		key := words.RideAbsent
		if r.Sensor == "refused" {
			key = words.RideRefused
		}
		return Parts{El("p", Class("problem"), With("role", "alert"), v.say(key)), v.ways(state.WayRide)}
	}
	if len(r.Fixes) == 0 {
		return Parts{El("p", v.say(words.RideHow)), El("p", With("role", "status"), v.say(words.RideWaiting))}
	}
	return Parts{
		v.result(), El("p", v.say(words.RideHow)),
		El("p", Class("hint"), v.say(words.RideFixes, v.Voice.Number(float64(len(r.Fixes)), 0), v.Voice.Length(r.LengthM))),
		If(r.Sensor == "lost", El("p", Class("problem"), v.say(words.RideLost))),
		El("div", Class("row"), button("plain", state.StartOver, "", v.say(words.TiltOver))),
	}
}

func (v *viewer) track() Part {
	if v.Profile == nil || v.Answer == nil {
		return v.result()
	}
	size := state.StretchSize()
	from, to := v.Dial(state.DialFrom), v.Dial(state.DialTo)
	at := func(m float64) float64 { return draw.SectionAtDistance(v.Profile, v.Answer, size, m).X }
	names := [2]string{capital(v.inputName(state.DialFrom)), capital(v.inputName(state.DialTo))}
	picture := draw.Marks(draw.Section(v.Profile, v.Answer, size, v.Voice), size, state.TrackHandle,
		[2]string{state.DialFrom, state.DialTo}, names, [2]float64{at(from), at(to)})
	return Parts{
		v.result(), El("p", v.say(words.TrackHow, v.NameOf(state.Hill))),
		El("div", Class("canvas"), picture),
		v.dialStepper(state.DialFrom), v.dialStepper(state.DialTo),
		v.picking(words.TrackHeights, "track-heights", "satellite", words.HeightsSatellite, "barometric", words.HeightsPressure, "surveyed", words.HeightsSurveyed),
	}
}

// wayPicture draws a way to measure.
func wayPicture(way string) *Node {
	ground := "M4 58L92 34V62H4Z"
	var lines, full string
	switch way {
	case state.WayTilt: // a phone flat on the slope
		lines = "M26 44L66 33L68 40L28 51ZM60 36.6L62 41.6"
	case state.WaySight: // an eye, a phone on edge, the line of sight
		ground = "M4 62L92 38V64H4Z"
		lines = "M6 40C10 32 20 32 24 40C20 48 10 48 6 40ZM34 30L60 23L63 34L37 41ZM63 27L90 20"
		full = "M15 36A4 4 0 1 1 14.9 36Z"
	case state.WayTape: // a level held out, a tape under its low end
		lines = "M14 22H84V32H14ZM42 27H56M20 32V53M16 37H24M16 43H24M16 49H24"
	case state.WayWheel: // a wheel at a flight of stairs
		ground = "M4 62V57H40V54H52V46H64V38H76V30H92V62Z"
		lines = "M22 24A16 16 0 1 1 21.9 24ZM22 40V24M22 40L36 48M22 40L8 48"
		full = "M22 37A3 3 0 1 1 21.9 37Z"
	case state.WayRide: // places along the road as they were found
		full = "M16 51A4 4 0 1 1 15.9 51ZM36 44A4 4 0 1 1 35.9 44ZM56 41A4 4 0 1 1 55.9 41ZM80 31A4 4 0 1 1 79.9 31Z"
		lines = "M76 27V8L90 13L76 18"
	case state.WayTrack: // a hill with two marks
		ground = "M4 58C24 56 34 50 44 36C54 24 66 28 92 22V62H4Z"
		lines = "M34 62V10H24V20H34M62 62V10H72V20H62"
	}
	return SVG(Class("way-picture"), With("viewBox", "0 0 96 66"), With("aria-hidden", "true"),
		El("path", Class("way-ground"), With("d", ground), With("fill", "url(#hatch-open)")),
		El("path", Class("way-lines"), With("d", lines)),
		If(full != "", El("path", Class("way-full"), With("d", full))))
}
