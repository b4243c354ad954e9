package view

import (
	"slices"
	"strings"

	"hillwright/physics/ask"
	. "hillwright/wasm/dom"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// usual are the inputs of a bike that stand first: what a label or a sheet
// says.
var usual = []string{
	"bike.motor.kind", "bike.motor.torque_nm", "bike.motor.power_w", "bike.pack.energy_wh",
	"bike.mass_kg", "bike.chainrings", "bike.sprockets", "bike.tyre",
}

// groups are the headings under which the others fold away.
var groups = []words.Key{words.BandMotor, words.LimitCells, words.GroupRolling, words.GroupPlaces, words.GroupBrakes}

// groupOf gives an input's place in groups, −1 for those that stand first.
func groupOf(path string) int {
	switch key := strings.TrimPrefix(path, "bike."); {
	case slices.Contains(usual, path):
		return -1
	case strings.HasPrefix(key, "motor."):
		return 0
	case strings.HasPrefix(key, "pack."):
		return 1
	case key == "wheelbase_m" || strings.Contains(key, "_ahead_") || strings.Contains(key, "_height_"):
		return 3
	case strings.Contains(key, "brake"):
		return 4
	}
	return 2
}

// inputs lists everything that goes into a kind; a touched row opens its
// editor in place. A bike's many inputs are grouped: the usual ones first, the
// others folded away.
func (v *viewer) inputs(kind keep.Kind) Part {
	all := state.Inputs(kind)
	if kind != keep.Bike {
		return v.rows(all)
	}
	first := make([]ask.Input, 0, len(usual))
	for _, path := range usual {
		in, _ := ask.InputAt(path)
		first = append(first, in)
	}
	out := Parts{v.rows(first)}
	for i, head := range groups {
		var inside []ask.Input
		changed := false
		for _, in := range all {
			if groupOf(in.Path) == i {
				inside = append(inside, in)
				changed = changed || v.Changed(in.Path)
			}
		}
		out = append(out, El("details", Class("group"),
			El("summary", Text(capital(v.Voice.Say(head))), If(changed, El("span", Class("own"), Text(" · "), v.say(words.KeptChanged)))),
			v.rows(inside)))
	}
	return out
}

func (v *viewer) rows(of []ask.Input) *Node {
	rows := Parts{Class("inputs")}
	for _, in := range of {
		open := v.Path == in.Path
		value, instead := v.valueAndWord(in.Path)
		rows = append(rows, El("li",
			button("input-row", state.ShowPath, in.Path, flag("aria-expanded", open),
				El("span", Class("input-name"), Text(capital(v.inputName(in.Path)))),
				El("span", Class("input-value"), Text(value)),
				v.sourceMark(in.Path, instead)),
			If(open, v.editor(in.Path))))
	}
	return El("ul", rows)
}
