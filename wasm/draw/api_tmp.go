package draw

import (
	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// Section draws the hill as a cut through the ground, hatched by headroom.
func Section(p *hill.Profile, a *ride.Answer, size Size, v words.Voice) *dom.Node {
	return picture("img", "section", v.Say(words.SectionTitle), "", size)
}

// Staff is what the staff shows at one place, and where it stands in the
// picture (X, Y is its foot).
type Staff struct {
	AtM, HeightM float64
	Grade        unit.Grade
	// Known is false where the rig does not come: beyond a stall. What follows
	// is zero then.
	Known    bool
	TimeS    float64
	SpeedMps float64
	Gear     int
	Headroom float64
	Limit    rig.Limit

	X, Y float64
}

// Transform is the value of the transform attribute that moves the element
// .staff of the picture to the place; take its visibility attribute away to
// show it.
func (s Staff) Transform() string { return "translate(" + num(s.X) + " " + num(s.Y) + ")" }

// SectionAt gives the staff at a picture's x [px of its viewBox].
func SectionAt(p *hill.Profile, a *ride.Answer, size Size, x float64) Staff { return Staff{} }

// SectionAtDistance gives the staff at a distance along the road [m].
func SectionAtDistance(p *hill.Profile, a *ride.Answer, size Size, atM float64) Staff { return Staff{} }

// StaffText says what the staff shows.
func StaffText(s Staff, r *rig.Rig, v words.Voice) string { return "" }

// SectionText gives the section's figures as a table, with a caption.
func SectionText(p *hill.Profile, a *ride.Answer, r *rig.Rig, v words.Voice) *dom.Node {
	return dom.El("table")
}

// BalanceOptions say what a person has tried: WantedN is where they dragged the
// weight [N], NaN when they did not.
type BalanceOptions struct{ WantedN float64 }

// Balance draws the spring balance. It grows beyond size.H where the labels need it.
func Balance(b *ride.Balance, size Size, v words.Voice, opt BalanceOptions) *dom.Node {
	return picture("group", "balance", v.Say(words.BalanceTitle), "", size)
}

// BalancePull gives the pull [N] at a picture's x [px of its viewBox], held within the scale.
func BalancePull(b *ride.Balance, size Size, x float64) (newtons float64) { return 0 }

// BalanceText gives the balance's figures as a table, with a caption.
func BalanceText(b *ride.Balance, v words.Voice) *dom.Node { return dom.El("table") }

// PullDiagram draws pull against speed.
func PullDiagram(r *rig.Rig, g unit.Grade, running ride.Running, size Size, v words.Voice) *dom.Node {
	return picture("img", "pull", v.Say(words.PullTitle), "", size)
}

// PullText gives the pull diagram's figures as a table, with a caption.
func PullText(r *rig.Rig, g unit.Grade, running ride.Running, v words.Voice) *dom.Node {
	return dom.El("table")
}

// Hatches holds the patterns of the ground, once for a page.
func Hatches() *dom.Node { return dom.SVG(dom.Class("hatches")) }

// Legend explains the hatching: a list of swatches with words.
func Legend(v words.Voice) *dom.Node { return dom.El("ul", dom.Class("hatch-key")) }
