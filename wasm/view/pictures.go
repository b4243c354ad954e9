package view

import (
	"math"
	"strconv"

	. "hillwright/wasm/dom"
	"hillwright/wasm/draw"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// section is the hill as a cut through the ground, with the staff on it.
func (v *viewer) section() *Node {
	if v.Answer == nil || v.Profile == nil {
		return region("section", "section", Bare("hidden"))
	}
	size := v.SectionSize()
	picture := draw.Section(v.Profile, v.Answer, size, v.Voice)
	kept := v.Question.Ride.ChargeKept
	strip := draw.Strip(v.Profile, v.Answer, v.Rig, kept, size, v.Voice)
	reading := Parts{v.help(words.SectionHelp)}
	if !math.IsNaN(v.StaffM) {
		at := draw.SectionAtDistance(v.Profile, v.Answer, size, v.StaffM)
		put(picture, "staff", at.Transform())
		put(strip, "plumb", at.PlumbTransform())
		reading = Parts{Text(capital(draw.StaffText(at, v.Rig, v.Voice))),
			El("span", Class("staff-state"), Text(draw.StateText(at, v.Answer, v.Rig, v.Voice)))}
	}
	return region("section", "section", Class("picture-part"), With("aria-labelledby", "section-head"),
		El("h2", ID("section-head"), v.say(words.SectionTitle)),
		// Beside the picture, not on it: a thumb that moves the staff would lie on it.
		region("p", "staff-reading", Class("staff-reading"), With("role", "status"), reading),
		region("div", "section-picture", Class("canvas"), picture),
		region("div", "strip-picture", Class("canvas bands-"+strconv.Itoa(draw.StripBands(v.Answer, v.Rig))), strip),
		El("div", Class("row spread"),
			button("step small", state.StaffStep, "-", With("aria-label", v.Voice.Say(words.StaffBack)), Text("‹")),
			v.swatches(),
			button("step small", state.StaffStep, "+", With("aria-label", v.Voice.Say(words.StaffOn)), Text("›"))),
		v.table(words.SameInFigures, words.SectionTitle,
			draw.SectionText(v.Profile, v.Answer, v.Rig, v.Voice), draw.StripText(v.Profile, v.Answer, v.Rig, kept, v.Voice)),
	)
}

// help says how a picture is touched and read: nothing for paper.
func (v *viewer) help(k words.Key) *Node { return El("span", Class("help"), v.say(k)) }

// put moves the part of a picture with a class to a place and makes it a
// region, so that it alone changes while a finger moves it.
func put(picture *Node, part, transform string) {
	picture.Walk(func(n *Node) {
		if class, _ := n.Attr("class"); class != part {
			return
		}
		kept := []Attr{{Name: "data-region", Value: part}, {Name: "transform", Value: transform}}
		for _, a := range n.Attrs {
			if a.Name != "visibility" && a.Name != "transform" {
				kept = append(kept, a)
			}
		}
		n.Attrs = kept
	})
}

// table is a picture's figures as text, on demand.
func (v *viewer) table(opener, title words.Key, tables ...*Node) *Node {
	room := Parts{Class("table-room"), With("role", "group"), With("tabindex", "0"), With("aria-label", v.Voice.Say(title))}
	for _, t := range tables {
		room = append(room, t)
	}
	return El("details", Class("in-figures"), El("summary", v.say(opener)), El("div", room))
}

// balance is the wanted pull against every limit's peg.
func (v *viewer) balance() *Node {
	if v.Answer == nil || len(v.Answer.Balance.Pegs) == 0 {
		return region("section", "balance", Bare("hidden"))
	}
	b := &v.Answer.Balance
	reading := Parts{v.help(words.BalanceHelp)}
	if grade, tried := v.TriedGrade(); tried {
		reading = Parts{El("b", Text(v.Voice.Pull(v.WeightN))), Text(" · "), v.say(words.BalanceTried, v.Grade(grade))}
	}
	return region("section", "balance", Class("picture-part"), With("aria-labelledby", "balance-head"),
		El("h2", ID("balance-head"), v.say(words.BalanceTitle)),
		region("p", "balance-reading", Class("staff-reading"), With("role", "status"), reading),
		region("div", "balance-picture", Class("canvas"), draw.Balance(b, v.BalanceSize(), v.Voice, draw.BalanceOptions{WantedN: v.WeightN})),
		El("div", Class("row"), If(!math.IsNaN(v.WeightN), button("plain", state.WeightBack, "", v.say(words.WeightBackToHill)))),
		v.table(words.AllLimits, words.BalanceTitle, draw.BalanceText(b, v.Voice)),
	)
}

// pull is the pull diagram, for those who ask for it.
func (v *viewer) pull() *Node {
	if v.Answer == nil {
		return region("section", "pull", Bare("hidden"))
	}
	opener := El("h2", button("plain wide", state.Pull, "", flag("aria-expanded", v.ShowPull), With("aria-controls", "pull"), v.say(words.PullTitle)))
	if !v.ShowPull {
		return region("section", "pull", opener)
	}
	grade, running := v.Answer.Balance.Grade, v.Settled()
	return region("section", "pull", Class("picture-part"), opener,
		El("p", Class("staff-reading"), v.help(words.PullHelp)),
		El("div", Class("canvas"), draw.PullDiagram(v.Rig, grade, running, v.PullSize(), v.Voice)),
		v.table(words.SameInFigures, words.PullTitle, draw.PullText(v.Rig, grade, running, v.Voice)),
	)
}
