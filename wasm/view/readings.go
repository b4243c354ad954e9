package view

import (
	. "hillwright/wasm/dom"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// sideReadings is the list of what was read, by days, the latest first, and
// what can be made of it.
func (v *viewer) sideReadings() *Node {
	head := El("h2", ID("readings-title"), v.say(words.HeadReadings))
	list := v.Readings()
	if len(list) == 0 {
		return region("section", "side-readings", With("aria-labelledby", "readings-title"), head, El("p", Class("hint"), v.say(words.ReadingsNone)))
	}
	var days Parts
	var rows Parts
	day := v.DayOf(list[0].TimeS)
	odd := v.Odd()
	for i := range list {
		if d := v.DayOf(list[i].TimeS); d != day {
			days, rows, day = append(days, El("h3", Text(day)), El("ul", Class("readings"), rows)), nil, d
		}
		rows = append(rows, v.readingRow(&list[i], list[i].ID == odd))
	}
	days = append(days, El("h3", Text(day)), El("ul", Class("readings"), rows))
	return region("section", "side-readings", With("aria-labelledby", "readings-title"), head, days,
		El("div", Class("row"),
			button("main", state.HillOfReadings, "", v.say(words.ReadingsHill)),
			button("main", state.ReadingsCSV, "", v.say(words.ReadingsCSV)),
			button("main", state.ReadingsGPX, "", v.say(words.ReadingsGPX))),
		If(v.Side.Way == "" && v.Side.Err != nil, El("p", Class("problem"), With("role", "alert"), Text(v.Problem(v.Side.Err)))),
		If(v.Device.Storage == "refused", El("p", Class("problem"), v.say(words.StorageRefused))),
		If(v.Device.Storage == "full", El("p", Class("problem"), v.say(words.StorageFull))))
}

func (v *viewer) readingRow(r *keep.Reading, odd bool) *Node {
	open := v.Side.Shown == r.ID
	here := r.Place == v.PitchName()
	class := "reading-is"
	if here {
		class += " here"
	}
	line := r.Place + " · " + v.ClockOf(r.TimeS) + " · " + v.Method(r.Method)
	if r.Note != "" {
		line += " · " + r.Note
	}
	return El("li",
		button(class, state.ReadingOpen, r.ID, flag("aria-expanded", open),
			El("span", Class("reading-grade"), Text(v.GradeFine(r.Grade)+" "), El("span", Class("error"), Text(v.GradeError(r.PlusMinus()))),
				If(odd, El("span", Class("odd"), Text(" · "), v.say(words.ReadOdd)))),
			El("span", Class("in-short"), Text(line))),
		If(open, v.readingOpen(r, here)))
}

// readingOpen is a reading with what can be done with it.
func (v *viewer) readingOpen(r *keep.Reading, here bool) *Node {
	notes := Parts{Class("one-of"), With("role", "group"), With("aria-label", v.Voice.Say(words.ReadingNoteName))}
	for _, k := range []words.Key{words.NoteWet, words.NoteLoose, words.NoteSteepest} {
		text := v.Voice.Say(k)
		arg := r.ID + "=" + text
		if r.Note == text {
			arg = r.ID + "="
		}
		notes = append(notes, v.one(state.ReadingNote, arg, Text(text), r.Note == text))
	}
	field := func(id, act, arg string, name words.Key, value string) Parts {
		return Parts{
			El("label", With("for", id), Text(capital(v.Voice.Say(name)))),
			El("input", ID(id), With("type", "text"), With("maxlength", "80"), With("autocomplete", "off"), With("value", value), Act(act, arg)),
		}
	}
	return El("div", Class("reading-open"),
		El("div", notes),
		field("note-"+r.ID, state.TypeNote, r.ID, words.ReadingNoteName, r.Note),
		If(here, field("pitch-name", state.PlaceName, "", words.PlaceNamed, r.Place)),
		El("div", Class("row"),
			If(!here, button("plain", state.PlaceTo, r.Place, v.say(words.ReadingsCount))),
			button("plain", state.ReadingForget, r.ID, v.say(words.ButtonForget))))
}
