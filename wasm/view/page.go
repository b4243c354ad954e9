// Package view turns a state into the page as a tree of dom nodes. Views are
// pure functions: they compute no physics and touch no browser. Start with
// Page, which gives the whole page.
//
// An element with data-region is a part that is rendered anew by itself when
// it changed; regions may lie in each other. data-act and data-arg on an
// element name the action (package state) that a touch asks for. A place of
// DESIGN.md has its own tree (hillside.go, bench.go) and its button in the masthead;
// one yet to come (Counter) does as they do.
package view

import (
	"unicode"
	"unicode/utf8"

	. "hillwright/wasm/dom"
	"hillwright/wasm/draw"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// Page is the whole page: what stands inside <div id="app">.
func Page(s *state.State) *Node {
	v := &viewer{State: s, Voice: s.Voice}
	switch {
	case s.Side.Open:
		return v.hillside()
	case s.Bench.Open:
		return v.bench()
	}
	return El("div", Class("page"),
		draw.Hatches(),
		v.masthead(),
		El("main",
			El("div", Class("asks"), v.sentence(), v.place(), v.answer()),
			El("div", Class("pictures"), v.section(), v.balance(), v.pull(), v.onWay(), v.wayDown()),
			El("div", Class("notes"), v.figures(), v.cautions()),
		),
		v.dropping(),
		v.message(),
		v.broken(),
	)
}

// viewer is a state while it is looked at, with the voice that speaks of it.
type viewer struct {
	*state.State
	words.Voice
}

func (v *viewer) say(k words.Key, args ...string) Part { return Text(v.Voice.Say(k, args...)) }

// region is a part of the page that is rendered anew by itself.
func region(tag, name string, parts ...Part) *Node {
	n := El(tag, ID(name), With("data-region", name))
	n.Add(parts...)
	return n
}

// button is a thing to touch that is not a blank of the sentence.
func button(class, act, arg string, parts ...Part) *Node {
	n := El("button", With("type", "button"), Class(class), Act(act, arg))
	n.Add(parts...)
	return n
}

func flag(name string, yes bool) Part {
	if yes {
		return With(name, "true")
	}
	return With(name, "false")
}

// capital makes the first letter of a sentence a large one.
func capital(s string) string {
	r, size := utf8.DecodeRuneInString(s)
	return string(unicode.ToUpper(r)) + s[size:]
}

// elsewhere leads to the other places of the page. Each button bears the id of
// where one stands, so that the focus finds it on the way back.
func (v *viewer) elsewhere() Parts {
	here := state.GoSentence
	switch {
	case v.Side.Open:
		here = state.GoHillside
	case v.Bench.Open:
		here = state.GoBench
	}
	var out Parts
	for _, to := range []struct {
		place string
		name  words.Key
	}{{state.GoSentence, words.GoSentence}, {state.GoHillside, words.GoHillside}, {state.GoBench, words.GoBench}} {
		if to.place != here {
			out = append(out, button("plain", state.GoTo, to.place, If(len(out) == 0, ID("go-"+here)), v.say(to.name)))
		}
	}
	return out
}

func (v *viewer) masthead() *Node {
	opener := func(place string, key words.Key) *Node {
		return button("plain", state.Open, place, ID("blank-"+place),
			flag("aria-expanded", v.Place == place), With("aria-controls", "place"), v.say(key))
	}
	return region("header", "masthead", Class("masthead"),
		El("h1", Text(v.Shop.Name)),
		El("div", Class("openers"), v.elsewhere(), opener(state.PlaceKept, words.OpenKept), opener(state.PlaceSettings, words.HeadSettings)),
		If(v.Device.Waiting, El("p", Class("waiting"), With("role", "status"),
			v.say(words.NewVersion), Text(" "), button("plain", state.UseNew, "", v.say(words.ButtonUseNew)))),
	)
}
