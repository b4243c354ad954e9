package draw

import (
	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// table makes a text equivalent: a caption, a row of headings, rows whose first
// cell heads them.
func table(caption string, heads []string, rows [][]string) *dom.Node {
	var top, body dom.Parts
	for _, h := range heads {
		top = append(top, dom.El("th", dom.With("scope", "col"), dom.Text(h)))
	}
	for _, row := range rows {
		cells := dom.Parts{dom.El("th", dom.With("scope", "row"), dom.Text(row[0]))}
		for _, c := range row[1:] {
			cells = append(cells, dom.El("td", dom.Text(c)))
		}
		body = append(body, dom.El("tr", cells))
	}
	return dom.El("table", dom.Class("figures"),
		dom.El("caption", dom.Text(caption)),
		dom.El("thead", dom.El("tr", top)),
		dom.El("tbody", body))
}

// SectionText gives the section's figures as a table: what the staff shows at
// the named places, at the hardest stretch, and where the rig stops.
func SectionText(p *hill.Profile, a *ride.Answer, r *rig.Rig, v words.Voice) *dom.Node {
	s := newSection(p, a, Size{W: 360, H: 240})
	if s == nil {
		return table(v.Say(words.SectionTitle), nil, nil)
	}
	heads := []string{
		v.Say(words.AxisLength), v.Say(words.AxisHeight), v.Say(words.LabelGrade),
		v.Say(words.LabelHeadroom), v.Say(words.LabelSpeed), v.Say(words.LabelGear), v.Say(words.LabelSetsSpeed),
	}
	var rows [][]string
	for _, m := range s.named(v) {
		at := placeOn(p, s.answer, m)
		row := []string{v.Length(m), v.Height(at.HeightM), v.Grade(at.Grade), "", "", "", ""}
		if at.Known {
			row = append(row[:3], v.Headroom(at.Headroom), v.Speed(at.SpeedMps), v.Gear(r, at.Gear), v.Limit(at.Limit))
		}
		rows = append(rows, row)
	}
	caption := s.summary(v)
	if b := &s.answer.Balance; s.namesLimit() {
		caption += " " + v.Say(words.LabelBinds) + ": " + v.Limit(b.Pegs[0].Limit) + "."
	}
	return table(caption, heads, rows)
}

// named are the places of the table: stations, the ends of the hardest
// stretch, where the rig stops; in order.
func (s *section) named(v words.Voice) []float64 {
	more := []float64{}
	if h := &s.answer.Hardest; h.ToM > h.FromM {
		more = append(more, h.FromM, h.ToM)
	}
	if s.answer.Stalled {
		more = append(more, s.answer.StalledAtM)
	}
	at := stationsOf(s.lengthM, v)
	for _, m := range more {
		i := 0
		for i < len(at) && at[i] < m {
			i++
		}
		if i < len(at) && at[i] == m {
			continue
		}
		at = append(at[:i], append([]float64{m}, at[i:]...)...)
	}
	return at
}

// BalanceText gives the balance's figures as a table: each limit with its pull
// and headroom, in order.
func BalanceText(b *ride.Balance, v words.Voice) *dom.Node {
	heads := []string{v.Say(words.HeadLimits), v.Say(words.LabelAllowed), v.Say(words.LabelHeadroom)}
	var rows [][]string
	for _, p := range b.Pegs {
		rows = append(rows, []string{v.Limit(p.Limit), v.Pull(p.PullN), v.Headroom(p.Headroom)})
	}
	return table(balanceSummary(b, v), heads, rows)
}

// PullText gives the pull diagram's figures as a table: at tidy speeds the best
// gear, its pull, the limit that decides it, and the load.
func PullText(r *rig.Rig, g unit.Grade, running ride.Running, v words.Voice) *dom.Node {
	d := newDiagram(r, g, running, Size{W: 360, H: 260}, v)
	heads := []string{
		v.Say(words.AxisSpeed), v.Say(words.LabelGear), v.Say(words.AxisPull),
		v.Say(words.LabelBinds), v.Say(words.PullLoad),
	}
	var rows [][]string
	for i := 1; float64(i)*d.stepMps <= d.mostMps*(1+1e-9); i++ {
		mps := float64(i) * d.stepMps
		gear := r.BestGear(mps, &d.now)
		pull := r.PullAt(mps, gear, &d.now)
		rows = append(rows, []string{v.Speed(mps), v.Gear(r, gear), v.Pull(pull.Sum()), v.Limit(pull.By), v.Pull(d.loadAt(mps))})
	}
	return table(d.summary(v), heads, rows)
}
