package main

import (
	"fmt"
	"io"
	"math"
	"strings"
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

func writeAnswer(out io.Writer, q *ask.Question, r *rig.Rig, p *hill.Profile, a *ride.Answer, v words.Voice) error {
	fmt.Fprintf(out, "%s\n%s\n", v.Verdict(a.Verdict), v.Why(r, a))
	for _, n := range p.Notes {
		fmt.Fprintf(out, "(%s)\n", v.Note(n))
	}
	fmt.Fprintln(out)
	s := newSheet(out)
	h := &a.Hardest
	s.row(v.Say(words.LabelHardest), v.Say(words.StretchAt, v.Length(h.ToM-h.FromM), v.Grade(h.Grade), v.Length(h.FromM)))
	writeRunning(s, r, &h.Running, v)
	s.row(v.Say(words.LabelTime), v.Duration(a.ClimbS))
	if a.TourS > a.ClimbS {
		s.row(v.Say(words.LabelTourTime), v.Duration(a.TourS))
	}
	if a.Stalled {
		s.row(v.Say(words.LabelStalledAt), v.Length(a.StalledAtM))
	}
	s.row(v.Say(words.LabelRiderEnergy), v.Energy(a.Energy.RiderJ))
	s.row(v.Say(words.LabelMotorEnergy), v.Energy(a.Energy.MotorJ))
	s.row(v.Say(words.LabelPackEnergy), v.Energy(a.Energy.FromPackJ))
	s.row(v.Say(words.LabelLength), v.Length(a.LengthM))
	s.row(v.Say(words.LabelAscent), v.Height(a.AscentM))
	writeBalance(s, &a.Balance, v)
	writeStates(s, r, a, v)
	writeDown(s, &a.WayDown, v)
	if err := s.Flush(); err != nil {
		return err
	}
	writeLines(out, q, r, a, v)
	return writeCautions(out, v.Cautions(r, &a.WayDown, q.Ride.DownMps), v)
}

// writeStates are the rows of heat, charge and legs.
func writeStates(s sheet, r *rig.Rig, a *ride.Answer, v words.Voice) {
	if r.Assists() {
		s.row(v.Say(words.LabelEasing), easing(a.EasingS, v))
		s.row(v.Say(words.LabelWindingPeak), v.Temperature(unit.Celsius(a.WindingPeakC)))
		s.row(v.Say(words.LabelChargeLeft), v.Percent(a.ChargeLeft))
		if a.CutOut {
			s.row(v.Say(words.LabelGaveOut), v.CutOutAt(a))
		}
		if !a.Stalled || a.StalledTrip > 0 {
			s.row(v.Say(words.LabelTrips), v.Number(a.TripsPerCharge, 1))
		}
	}
	s.row(v.Say(words.LabelReserveLeft), v.Percent(a.ReserveLeftJ/r.Rider.ReserveJ))
}

func easing(seconds float64, v words.Voice) string {
	if math.IsInf(seconds, 1) {
		return v.Say(words.LabelNever)
	}
	return v.About(seconds)
}

// writeDown are the rows of the way down.
func writeDown(s sheet, d *ride.WayDown, v words.Voice) {
	if !d.Falls {
		return
	}
	s.row(v.Say(words.LabelDownMost), v.Speed(d.MostMps))
	s.row(v.Say(words.LabelStopping), v.Length(d.StoppingM))
	s.row(v.Say(words.LabelFrontPeak), v.Temperature(unit.Celsius(d.FrontPeakC)))
	s.row(v.Say(words.LabelRearPeak), v.Temperature(unit.Celsius(d.RearPeakC)))
}

// writeLines are what the answer says beside why, a sentence or two each.
func writeLines(out io.Writer, q *ask.Question, r *rig.Rig, a *ride.Answer, v words.Voice) {
	fmt.Fprintf(out, "\n%s:\n", v.Say(words.StripTitle))
	for _, line := range []struct {
		name words.Key
		text string
	}{
		{words.LabelStart, v.StartLine(r, &a.Start)},
		{words.StripHeat, strings.TrimSpace(v.HoldLine(a) + " " + v.MotorLine(&a.Hardest.Running))},
		{words.StripCharge, v.ChargeLine(a)},
		{words.StripLegs, v.LegsLine(r, a)},
		{words.LabelTour, v.TourLine(q, a)},
		{words.LabelDown, v.DownLine(r, &a.WayDown, q.Ride.DownMps)},
	} {
		if line.text != "" {
			fmt.Fprintf(out, "%s: %s\n", v.Say(line.name), line.text)
		}
	}
}

func writeSteady(out io.Writer, r *rig.Rig, g unit.Grade, a *ride.SteadyAnswer, v words.Voice) error {
	fmt.Fprintf(out, "%s\n%s\n\n", v.Verdict(a.Verdict), v.WhySteady(r, g, a))
	s := newSheet(out)
	s.row(v.Say(words.LabelGrade), v.Grade(g))
	if a.Held {
		writeRunning(s, r, &a.Running, v)
	}
	writeBalance(s, &a.Balance, v)
	if r.Assists() {
		s.row(v.Say(words.LabelEasing), easing(a.EasingS, v))
	}
	if err := s.Flush(); err != nil {
		return err
	}
	fmt.Fprintf(out, "\n%s: %s\n", v.Say(words.LabelStart), v.StartLine(r, &a.Start))
	return writeCautions(out, nil, v)
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
	if run.MotorEfficiency > 0 {
		s.row(v.Say(words.LabelEfficiency), v.Percent(run.MotorEfficiency))
		s.row(v.Say(words.LabelHeatShare), v.Percent(1-run.MotorEfficiency))
	}
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
		if i == 0 {
			s.row("", "("+v.LimitLong(p.Limit)+")")
		}
	}
	s.row(v.Say(words.LabelSteepestHeld), v.Grade(b.SteepestGrade))
}

func writeCautions(out io.Writer, list []string, v words.Voice) error {
	fmt.Fprintf(out, "\n%s:\n", v.Say(words.HeadCautions))
	for _, text := range append(list, v.Say(words.CautionEstimate), v.Say(words.CautionLaw)) {
		if _, err := fmt.Fprintf(out, "- %s\n", text); err != nil {
			return err
		}
	}
	return nil
}

// writeInputs prints the catalogue: path, value, unit, band, source, name, and
// why where a class default stands in.
func writeInputs(out io.Writer, q *ask.Question, r *rig.Rig, v words.Voice) error {
	w := tabwriter.NewWriter(out, 2, 0, 2, ' ', 0)
	fmt.Fprintln(w, "path\tvalue\tunit\tband\tsource\tname")
	for _, in := range ask.Inputs() {
		s, _ := q.Shown(in.Path, r)
		value, band, unitName := s.Text, "-", in.Unit
		if !math.IsNaN(s.Value) {
			value = fmt.Sprintf("%.6g", s.Value)
		}
		if !math.IsNaN(s.Low) {
			band = fmt.Sprintf("%.6g to %.6g", s.Low, s.High)
		}
		if value == "" {
			value = "-"
		}
		if unitName == "" {
			unitName = "-"
		}
		name, _ := v.Input(in.Path)
		if s.Reason != "" {
			name += " – " + v.Reason(s.Reason)
		}
		fmt.Fprintf(w, "%s\t%s\t%s\t%s\t%s\t%s\n", in.Path, value, unitName, band, s.Source, name)
	}
	return w.Flush()
}
