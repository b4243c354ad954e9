package main

import (
	"fmt"
	"io"
	"text/tabwriter"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
	"hillwright/wasm/words"
)

// sheet writes rows of name and value, the values in one column.
type sheet struct{ *tabwriter.Writer }

func newSheet(out io.Writer) sheet { return sheet{tabwriter.NewWriter(out, 2, 0, 2, ' ', 0)} }

func (s sheet) row(name, value string) { fmt.Fprintf(s, "%s\t%s\n", name, value) }

func writeAnswer(out io.Writer, r *rig.Rig, p *hill.Profile, a *ride.Answer, v words.Voice) error {
	fmt.Fprintf(out, "%s\n%s\n", v.Verdict(a.Verdict), v.Why(r, a))
	for _, n := range p.Notes {
		fmt.Fprintf(out, "(%s)\n", v.Note(n))
	}
	fmt.Fprintln(out)
	s := newSheet(out)
	h := &a.Hardest
	s.row(v.Say(words.LabelHardest), v.Say(words.StretchAt, v.Length(h.ToM-h.FromM), v.Grade(h.Grade), v.Length(h.FromM)))
	writeRunning(s, r, &h.Running, v)
	s.row(v.Say(words.LabelTime), v.Duration(a.TimeS))
	if a.Stalled {
		s.row(v.Say(words.LabelStalledAt), v.Length(a.StalledAtM))
	}
	s.row(v.Say(words.LabelRiderEnergy), v.Energy(a.Energy.RiderJ))
	s.row(v.Say(words.LabelMotorEnergy), v.Energy(a.Energy.MotorJ))
	s.row(v.Say(words.LabelPackEnergy), v.Energy(a.Energy.FromPackJ))
	s.row(v.Say(words.LabelLength), v.Length(a.LengthM))
	s.row(v.Say(words.LabelAscent), v.Height(a.AscentM))
	writeBalance(s, &a.Balance, v)
	return finish(s, out, v)
}

func writeSteady(out io.Writer, r *rig.Rig, g unit.Grade, a *ride.SteadyAnswer, v words.Voice) error {
	fmt.Fprintf(out, "%s\n%s\n\n", v.Verdict(a.Verdict), v.WhySteady(r, g, a))
	s := newSheet(out)
	s.row(v.Say(words.LabelGrade), v.Grade(g))
	if a.Held {
		writeRunning(s, r, &a.Running, v)
	}
	writeBalance(s, &a.Balance, v)
	return finish(s, out, v)
}

func writeRunning(s sheet, r *rig.Rig, run *ride.Running, v words.Voice) {
	if run.SpeedMps == 0 {
		return
	}
	s.row(v.Say(words.LabelSpeed), v.Speed(run.SpeedMps))
	s.row(v.Say(words.LabelSetsSpeed), v.Limit(run.SetBy))
	s.row(v.Say(words.LabelGear), v.Gear(r, run.Gear))
	s.row(v.Say(words.LabelCadence), v.Cadence(run.CadenceRPM))
	s.row(v.Say(words.LabelRiderShare), v.Power(run.RiderW))
	s.row(v.Say(words.LabelMotorShare), v.Power(run.MotorW))
}

func writeBalance(s sheet, b *ride.Balance, v words.Voice) {
	s.row(v.Say(words.LabelWanted), v.Pull(b.WantedN))
	for i, p := range b.Pegs {
		label := v.Say(words.LabelNext)
		switch {
		case i == 0:
			label = v.Say(words.LabelBinds)
		case i > 1:
			label = ""
		}
		s.row(label, v.Limit(p.Limit)+": "+v.Pull(p.PullN)+", "+v.Headroom(p.Headroom))
	}
	s.row(v.Say(words.LabelSteepestHeld), v.Grade(b.SteepestGrade))
}

func finish(s sheet, out io.Writer, v words.Voice) error {
	if err := s.Flush(); err != nil {
		return err
	}
	_, err := fmt.Fprintf(out, "\n%s\n", v.Say(words.CautionLaw))
	return err
}

// writeInputs prints the catalogue: path, value, unit, band, source.
func writeInputs(out io.Writer, q *ask.Question, v words.Voice) error {
	w := tabwriter.NewWriter(out, 2, 0, 2, ' ', 0)
	fmt.Fprintln(w, "path\tvalue\tunit\tband\tsource\tname")
	for _, in := range ask.Inputs() {
		value, _ := q.Get(in.Path)
		band := "-"
		if low, high, ok := q.Band(in.Path); ok {
			band = fmt.Sprintf("%.6g to %.6g", low, high)
		}
		shown := in.Unit
		if shown == "" {
			shown = "-"
		}
		name, _ := v.Input(in.Path)
		fmt.Fprintf(w, "%s\t%s\t%s\t%s\t%s\t%s\n", in.Path, value, shown, band, q.SourceOf(in.Path), name)
	}
	return w.Flush()
}
