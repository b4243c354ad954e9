package view

import (
	. "hillwright/wasm/dom"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// kept is the place of what is kept on the device.
func (v *viewer) kept() Part {
	var lists Parts
	for _, kind := range state.Kinds() {
		rows := Parts{Class("kept")}
		n := 0
		add := func(id, name string) {
			n++
			rows = append(rows, v.keptRow(kind, id, name))
		}
		if kind == state.Hill {
			for _, h := range v.Own.Hills {
				add(h.ID, h.Name(v.Lang.Tag()))
			}
		} else {
			for _, t := range v.Own.Things {
				if t.Kind == kind {
					add(t.ID, t.Name(v.Lang.Tag()))
				}
			}
		}
		if n > 0 {
			lists = append(lists, El("h3", Text(capital(v.Voice.Say(keptOf(kind))))), El("ul", rows))
		}
	}
	if len(lists) == 0 {
		lists = Parts{El("p", v.say(words.KeptNone))}
	}
	return Parts{
		lists,
		v.faults(),
		El("div", Class("row"),
			button("main", state.Export, "", v.say(words.ButtonExport)),
			button("main", state.PickImport, "", v.say(words.ButtonImport))),
		If(v.Device.Storage == "loose", El("p", Class("hint"), v.say(words.StorageLoose))),
		If(v.Device.Storage == "refused", El("p", Class("problem"), v.say(words.StorageRefused))),
		If(v.Device.Storage == "full", El("p", Class("problem"), v.say(words.StorageFull))),
	}
}

func (v *viewer) keptRow(kind keep.Kind, id, name string) *Node {
	arg := string(kind) + ":" + id
	chosen := v.Chosen[kind] == id
	return El("li",
		button("choice", state.Choose, arg, flag("aria-pressed", chosen), tick(chosen), El("span", Class("choice-name"), Text(name))),
		button("plain", state.Forget, arg, With("aria-label", v.Voice.Say(words.ButtonForget)+": "+name), v.say(words.ButtonForget)))
}

func keptOf(kind keep.Kind) words.Key {
	switch kind {
	case keep.Rider:
		return words.KeptRiders
	case keep.Load:
		return words.KeptLoads
	case keep.Day:
		return words.KeptDays
	case state.Hill:
		return words.KeptHills
	}
	return words.KeptBikes
}

// faults lists what was wrong with the last file.
func (v *viewer) faults() Part {
	if len(v.Faults) == 0 {
		return nil
	}
	list := Parts{Class("faults")}
	for _, f := range v.Faults {
		list = append(list, El("li", Text(v.Problem(f))))
	}
	return El("div", Class("problem"), With("role", "alert"), El("p", v.say(words.FaultsIn)), El("ul", list))
}

// settings is the place of language, units, light and law.
func (v *viewer) settings() Part {
	languages := Parts{}
	for _, l := range v.Languages() {
		name := words.Voice{Lang: l}.Say(words.LanguageSelf)
		languages = append(languages, v.one(state.SetLanguage, l.Tag(), Parts{With("lang", l.Tag()), Text(name)}, v.Lang == l))
	}
	imperial := v.Units == words.Imperial
	return Parts{
		If(len(languages) > 1, v.oneOf(words.SetLanguage, languages)),
		v.oneOf(words.SetUnits, Parts{
			v.one(state.SetUnits, "metric", v.say(words.SetMetric), !imperial),
			v.one(state.SetUnits, "imperial", v.say(words.SetImperial), imperial)}),
		v.oneOf(words.SetMark, Parts{
			v.one(state.SetMark, "point", v.say(words.SetPoint), !v.Comma),
			v.one(state.SetMark, "comma", v.say(words.SetComma), v.Comma)}),
		v.oneOf(words.SetTheme, Parts{
			v.one(state.SetTheme, "device", v.say(words.SetThemeDevice), v.Theme == ""),
			v.one(state.SetTheme, "sun", v.say(words.SetThemeSun), v.Theme == "sun"),
			v.one(state.SetTheme, "dusk", v.say(words.SetThemeDusk), v.Theme == "dusk")}),
		v.law(),
	}
}

// law is the law on assistance, with the reminder that goes with it.
func (v *viewer) law() *Node {
	name, _ := v.Input("ride.law")
	is, _ := v.Question.Get("ride.law")
	list := Parts{Class("choices")}
	for _, in := range state.Inputs(state.Ride) {
		if in.Path != "ride.law" {
			continue
		}
		for _, word := range in.Choices {
			list = append(list, v.option(in.Path, word, v.Choice(in.Path, word), word == is))
		}
	}
	return El("div", Class("setting"), El("h3", Text(capital(name))), El("ul", list), El("p", Class("hint"), v.say(words.CautionLaw)))
}

func (v *viewer) oneOf(k words.Key, choices Parts) *Node {
	name := v.Voice.Say(k)
	return El("div", Class("setting"), El("h3", Text(capital(name))),
		El("div", Class("one-of"), With("role", "group"), With("aria-label", name), choices))
}

func (v *viewer) one(act, arg string, inside Part, chosen bool) *Node {
	return button("one", act, arg, flag("aria-pressed", chosen), inside)
}
