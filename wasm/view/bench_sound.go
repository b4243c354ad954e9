package view

import (
	. "hillwright/wasm/dom"
	"hillwright/wasm/draw"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// benchSound is the recording: the ways to one, the one that is made, what came
// of it.
func (v *viewer) benchSound() *Node {
	r := &v.Bench.Sound
	var inside Parts
	title := words.HeadSound
	switch {
	case r.Stage == state.SoundRecording:
		inside = v.recordingNow()
	case r.Stage == state.SoundListening:
		inside = Parts{El("div", With("role", "status"), El("p", v.say(words.SoundListening, r.Name)),
			region("p", "bench-part", El("progress", With("max", "100"), With("value", v.Voice.Number(100*r.Part, 0)), With("aria-label", v.Voice.Say(words.SoundListening, r.Name)))))}
	case v.Bench.Laps.Way != "":
		inside = v.laps()
	default:
		inside = v.soundWays()
	}
	return region("section", "bench-sound", Class("measure"), With("aria-labelledby", "sound-title"),
		El("h2", ID("sound-title"), With("tabindex", "-1"), v.say(title)), inside)
}

// recordingNow is a recording that is being made.
func (v *viewer) recordingNow() Parts {
	r := &v.Bench.Sound
	how := Part(v.say(words.SoundHow))
	if r.For == state.ForCount {
		how = v.say(words.BenchCountHow, v.valueOf("coast.rolled_turns"))
	}
	level := words.SoundGood
	switch {
	case r.Peak < draw.QuietPeak:
		level = words.SoundQuiet
	case r.Peak > draw.LoudPeak:
		level = words.SoundLoud
	}
	return Parts{
		El("p", how),
		region("div", "bench-level", Class("bench-level"),
			El("p", Class("huge"), v.say(words.SoundSeconds, v.Voice.Number(r.Seconds, 0))),
			El("div", Class("canvas"), With("role", "img"), With("aria-label", v.Voice.Say(words.SoundLevelName)), draw.Level(r.Peak, draw.Size{W: 328, H: 48})),
			El("p", Class("still"), With("role", "status"), v.say(level))),
		If(r.Gain, El("p", Class("hint"), v.say(words.SoundGain))),
	}
}

// soundWays are the ways to a run, after what came of the last one.
func (v *viewer) soundWays() Parts {
	r := &v.Bench.Sound
	stand := v.Bench.Doing() == state.JobStand
	purpose := state.ForRun
	if stand {
		purpose = state.ForSpin
	}
	way := func(act, arg, name string, k words.Key) *Node {
		return El("li", button("way", act, arg, soundPicture(name), El("span", v.say(k))))
	}
	list := Parts{Class("ways"), way(state.SoundFor, purpose, "record", words.SoundRecord), way(state.SoundFrom, purpose, "file", words.SoundOpen)}
	if !stand {
		list = append(list, way(state.LapsBegin, state.LapMarks, "marks", words.SoundMarks), way(state.LapsBegin, state.LapDisplay, "display", words.SoundDisplay))
	}
	fails := map[string]words.Key{"refused": words.SoundRefused, "absent": words.SoundAbsent, "lost": words.SoundLost, "full": words.SoundFull}
	var unknown Part
	if !v.Question.ClicksKnown() {
		unknown = El("div", Class("bench-count"),
			El("p", Class("hint"), v.say(words.BenchClicksMissing)),
			El("p", v.say(words.BenchCountHow, v.valueOf("coast.rolled_turns"))),
			El("div", Class("row"),
				button("plain", state.SoundFor, state.ForCount, v.say(words.BenchCount)),
				button("plain", state.SoundFrom, state.ForCount, v.say(words.SoundOpen)),
				v.input("coast.rolled_turns")))
	}
	return Parts{
		If(fails[r.Fails] != 0, El("p", Class("problem"), With("role", "alert"), v.say(fails[r.Fails]))),
		If(v.Bench.Err != nil, El("p", Class("problem"), With("role", "alert"), Text(v.Problem(v.Bench.Err)))),
		If(r.Said != 0, El("p", Class("still-said"), With("role", "status"), v.say(r.Said, r.SaidArgs...))),
		If(r.CutS > 0, El("p", Class("hint"), v.say(words.SoundCut, v.Voice.Number(r.CutS, 1)))),
		If(r.Stage == state.SoundHeld, El("div", Class("row"),
			button("plain", state.SoundAgain, "", v.say(words.SoundAgain)),
			If(r.Recorded, button("plain", state.SoundKeep, "", v.say(words.SoundSave))))),
		unknown,
		El("p", Class("hint"), v.say(words.SoundHow)),
		El("ul", list),
	}
}

// laps are the taps of a run without sound.
func (v *viewer) laps() Parts {
	l := &v.Bench.Laps
	how := El("p", v.say(words.MarksHow, v.Length(v.Dial(state.DialMarks))))
	dials := Parts{v.dialStepper(state.DialMarks)}
	if l.Way == state.LapDisplay {
		how = El("p", v.say(words.DisplayHow, v.Speed(v.Dial(state.DialShown)), v.Speed(v.Dial(state.DialFewer))))
		dials = Parts{v.dialStepper(state.DialShown), v.dialStepper(state.DialFewer)}
	}
	n := len(l.AtS)
	return Parts{
		how,
		If(n == 0, dials),
		If(n > 0, El("p", Class("huge"), With("role", "status"), v.say(words.LapCount, v.Voice.Number(float64(n), 0)))),
		If(v.Bench.Err != nil, El("p", Class("problem"), With("role", "alert"), Text(v.Problem(v.Bench.Err)))),
		El("div", Class("row"),
			If(n > 0, button("plain", state.LapBack, "", v.say(words.LapUndo))),
			button("plain", state.LapsBegin, "", v.say(words.MeasureStop))),
	}
}

// soundPicture draws a way to a run.
func soundPicture(way string) *Node {
	var lines, full string
	switch way {
	case "record": // a hub, its clicks, a phone that hears them
		lines = "M22 33m-14 0a14 14 0 1 1 28 0a14 14 0 1 1-28 0M42 24q6 9 0 18M49 19q9 14 0 28M66 10h18v46h-18z"
		full = "M22 29a4 4 0 1 1-.1 0ZM72 50h6v2h-6z"
	case "file": // a sheet with the course of a sound
		lines = "M22 6h36l16 16v38h-52zM58 6v16h16M30 44h6l3-12 5 22 5-28 5 26 3-8h9"
	case "marks": // a road with posts
		lines = "M4 56h88M16 56v-26M36 56v-26M56 56v-26M76 56v-26M16 30l9 4-9 4M36 30l9 4-9 4M56 30l9 4-9 4M76 30l9 4-9 4M48 4v4M40 16a8 8 0 1 1 16 0a8 8 0 1 1-16 0M48 16v-4"
	case "display": // figures that fall
		lines = "M14 12h68v40h-68zM24 22h10v10h-10v10h10M42 22h10v20h-10v-10h10M64 20v22M58 36l6 8 6-8"
	}
	return SVG(Class("way-picture"), With("viewBox", "0 0 96 66"), With("aria-hidden", "true"),
		El("path", Class("way-lines"), With("d", lines)),
		If(full != "", El("path", Class("way-full"), With("d", full))))
}
