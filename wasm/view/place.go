package view

import (
	"strings"

	"hillwright/physics/ride"
	. "hillwright/wasm/dom"
	"hillwright/wasm/draw"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// place is what opens right under the sentence: one thing at a time.
func (v *viewer) place() *Node {
	if v.Place == "" {
		return region("section", "place", Bare("hidden"))
	}
	var title words.Key
	var inside Part
	switch v.Place {
	case state.PlaceKept:
		title, inside = words.HeadKept, v.kept()
	case state.PlaceSettings:
		title, inside = words.HeadSettings, v.settings()
	case state.PlaceTour:
		title, inside = words.LabelTour, v.tour()
	case string(state.Hill):
		title, inside = words.HeadHill, v.hills()
	default:
		kind := keep.Kind(v.Place)
		title, inside = headOf(kind), v.things(kind)
	}
	return region("section", "place", Class("place"), With("aria-labelledby", "place-title"),
		El("h2", ID("place-title"), With("tabindex", "-1"), Text(capital(v.Voice.Say(title)))),
		El("div", Class("inside"), inside),
		v.placeFoot(),
	)
}

// placeFoot stays at the foot of the screen while a place is open: the answer
// as it is now, and the way out, both under the thumb.
func (v *viewer) placeFoot() *Node {
	var now Part
	if p := v.Side.Pitch; v.Side.Open && p != nil {
		now = El("p", Class("now "+wordClass(p.Word)), wordShape(p.Word), Text(v.Voice.Word(p.Word)))
	} else if v.Answer != nil && !v.Side.Open && !v.Bench.Open {
		now = El("p", Class("now word-"+v.Answer.Verdict.String()), v.shape(), Text(v.Verdict(v.Answer.Verdict)),
			El("span", Class("now-room"), Text(v.Headroom(v.Answer.Balance.Headroom()))))
	}
	return El("div", Class("place-foot"), now, button("main", state.Close, "", v.say(words.ButtonDone)))
}

// things is the place of a kind: one input's editor when a value was touched,
// else the list to choose from; on demand everything that goes into it.
func (v *viewer) things(kind keep.Kind) Part {
	if v.Path != "" && !v.All {
		return Parts{v.editor(v.Path), v.allButton(kind)}
	}
	named := kind != state.Ride && kind != state.Coast // things that have names
	return Parts{
		If(named && !v.All, v.choices(kind)),
		v.allButton(kind),
		If(v.All, v.inputs(kind)),
		If(named && (v.All || v.AnyChanged(kind)), v.saveAs(kind)),
	}
}

// allButton opens and closes the list of all inputs; the ride's list is all it
// has.
func (v *viewer) allButton(kind keep.Kind) *Node {
	if kind == state.Ride && v.All {
		return nil
	}
	key := words.AskMore
	if v.All {
		key = words.ButtonLess
	}
	return button("plain wide", state.ShowAll, string(kind), flag("aria-expanded", v.All), v.say(key))
}

func (v *viewer) choices(kind keep.Kind) *Node {
	list := Parts{Class("choices")}
	for _, t := range v.Things(kind) {
		list = append(list, v.choice(kind, t.ID, t.Name(v.Lang.Tag()), v.inShort(&t)))
	}
	return El("ul", list)
}

// choice is a row to choose from; the chosen one is ticked.
func (v *viewer) choice(kind keep.Kind, id, name, inShort string) *Node {
	chosen := v.Chosen[kind] == id
	return El("li", button("choice", state.Choose, string(kind)+":"+id, flag("aria-pressed", chosen),
		tick(chosen),
		El("span", Class("choice-name"), Text(name),
			If(v.IsOwn(kind, id), El("span", Class("own"), Text(" · "), v.say(words.OpenKept))),
			If(chosen && v.AnyChanged(kind), El("span", Class("own"), Text(" · "), v.say(words.KeptChanged)))),
		If(inShort != "", El("span", Class("in-short"), Text(inShort)))))
}

// tick marks what is chosen.
func tick(chosen bool) *Node {
	path := ""
	if chosen {
		path = "M4 13l6 6L21 5"
	}
	return SVG(Class("tick"), With("viewBox", "0 0 24 24"), With("width", "24"), With("height", "24"), With("aria-hidden", "true"),
		El("path", With("d", path)))
}

// short are the inputs that tell things of a kind apart.
var short = map[keep.Kind][]string{
	keep.Rider: {"mass_kg", "power_w"},
	keep.Load:  {"mass_kg"},
	keep.Bike:  {"motor.kind", "motor.torque_nm", "mass_kg", "pack.energy_wh"},
	keep.Day:   {"temperature_c", "wind_mps"},
}

// inShort tells a thing in a line.
func (v *viewer) inShort(t *keep.Thing) string {
	q := v.Question
	q.Source = nil
	values := map[string]string{}
	for _, key := range short[t.Kind] {
		if value, ok := t.Values[key]; ok && value != "0" {
			values[key] = value
		}
	}
	var parts []string
	for _, key := range short[t.Kind] {
		value, ok := values[key]
		if !ok {
			continue
		}
		path := string(t.Kind) + "." + key
		if q.Set(path, value) != nil {
			continue
		}
		if number, ok := q.Value(path); ok {
			parts = append(parts, v.Value(path, number))
		} else {
			parts = append(parts, v.Choice(path, value))
		}
	}
	return strings.Join(parts, " · ")
}

// saveAs keeps what is chosen, changes and all, under a name.
func (v *viewer) saveAs(kind keep.Kind) *Node {
	field := "name-" + string(kind)
	return El("div", Class("save-as"),
		El("label", With("for", field), Text(capital(v.Voice.Say(words.KeptName)))),
		El("input", ID(field), With("type", "text"), With("maxlength", "80"), With("autocomplete", "off"), With("value", v.Name), Act(state.TypeName, string(kind))),
		button("main", state.Keep, string(kind), v.say(words.ButtonSave)),
		If(v.NameTaken(kind), El("p", Class("hint"), v.say(words.KeptNameTaken))),
	)
}

// hills is the place of the hill: the list, a file, or sections as typed.
func (v *viewer) hills() Part {
	return Parts{
		v.reading(),
		v.hillChoices(),
		El("div", Class("track"),
			button("main wide", state.PickTrack, "", v.say(words.ButtonFile)),
			El("p", Class("hint"), v.say(words.HillDropHelp))),
		v.sections(),
		v.sketch(),
		v.saveAs(state.Hill),
	}
}

func (v *viewer) hillChoices() *Node {
	list := Parts{Class("choices")}
	for _, h := range v.Hills() {
		list = append(list, v.choice(state.Hill, h.ID, h.Name(v.Lang.Tag()), v.hillInShort(&h)))
	}
	return El("ul", list)
}

func (v *viewer) hillInShort(h *keep.Hill) string {
	if len(h.EdgeM) == 0 {
		return ""
	}
	up := 0.0
	for i := 1; i < len(h.HeightM); i++ {
		up += max(0, h.HeightM[i]-h.HeightM[i-1])
	}
	return v.Length(h.EdgeM[len(h.EdgeM)-1]) + " · ↑ " + v.Height(up)
}

// reading shows a track on its way, or why it gave no hill.
func (v *viewer) reading() Part {
	r := &v.Reading
	switch {
	case r.Active:
		part := v.Percent(r.Part)
		return El("div", Class("reading"),
			El("p", v.say(words.HillReading), Text(" "), Text(r.File)),
			El("progress", With("max", "100"), With("value", v.Voice.Number(r.Part*100, 0)), With("aria-label", v.Voice.Say(words.HillReading)), Text(part)),
			button("plain", state.StopTrack, "", v.say(words.ButtonCancel)))
	case r.Err != nil:
		return El("p", Class("problem"), With("role", "alert"), If(r.File != "", Text(r.File+": ")), Text(v.Problem(r.Err)))
	}
	return nil
}

// sections is the hill as typed, with what is wrong with it while it is typed.
func (v *viewer) sections() *Node {
	chosen := v.Chosen[state.Hill] == state.TypedHill
	return El("div", Class("typed"),
		El("label", With("for", "sections"), v.say(words.HillSections)),
		El("textarea", ID("sections"), With("rows", "3"), With("spellcheck", "false"), With("autocomplete", "off"),
			With("aria-describedby", "sections-note"), flag("aria-invalid", chosen && v.SectionsErr != nil),
			Act(state.TypeSections, ""), Text(v.Sections)),
		El("p", ID("sections-note"), Class("note"), v.sectionsNote(chosen)),
		If(!chosen, button("plain", state.Choose, "hill:"+state.TypedHill, v.say(words.SectionsUse))),
	)
}

func (v *viewer) sectionsNote(chosen bool) Part {
	switch {
	case !chosen:
		return v.say(words.HillSectionsHint)
	case v.SectionsErr != nil:
		return El("span", Class("problem"), Text(v.Problem(v.SectionsErr)))
	case v.Profile != nil:
		return Text(v.Length(v.Profile.LengthM()) + " · ↑ " + v.Height(v.Profile.AscentM()))
	}
	return nil
}

// shape is the answer's shape beside its word: a road that goes over the hill,
// just reaches its top, or ends in it.
func (v *viewer) shape() *Node { return verdictShape(v.Answer.Verdict) }

func verdictShape(verdict ride.Verdict) *Node {
	const hill = "M3 28C12 27 16 10 26 8C33 7 37 14 45 15"
	road, x, y := hill, "43", "14.7"
	switch verdict {
	case ride.Tight:
		road, x, y = "M3 28C12 27 16 10 26 8", "26", "8"
	case ride.Short:
		road, x, y = "M3 28C9 27 12 22 16 16M10 12L22 20", "", ""
	}
	return SVG(Class("shape"), With("viewBox", "0 0 48 32"), With("width", "48"), With("height", "32"), With("aria-hidden", "true"),
		El("path", Class("shape-hill"), With("d", hill+"M3 30H45")),
		El("path", Class("shape-road"), With("d", road)),
		If(x != "", El("circle", Class("shape-end"), With("cx", x), With("cy", y), With("r", "4.5"))))
}

// swatches explain the hatching.
func (v *viewer) swatches() *Node { return draw.Legend(v.Voice) }
