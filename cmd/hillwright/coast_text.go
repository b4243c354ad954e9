package main

import (
	"errors"
	"fmt"
	"io"

	"hillwright/physics/ask"
	"hillwright/physics/click"
	"hillwright/physics/coast"
	"hillwright/physics/unit"
	"hillwright/wasm/words"
)

func writeCoast(out io.Writer, q *ask.Question, m *measured, v words.Voice) error {
	r := m.result
	half := func(e coast.Estimate) float64 { return (e.High - e.Low) / 2 }
	fmt.Fprintf(out, "%s %s ± %s\n%s %s ± %s\n\n",
		v.Say(words.DragCrr), v.Crr(r.Crr.Value), v.Crr(half(r.Crr)),
		v.Say(words.DragCdA), v.Number(r.CdAM2.Value, 3), v.Area(half(r.CdAM2)))
	for _, note := range []struct {
		yes  bool
		text string
	}{
		{r.Crr.Held, v.Say(words.DragHeldCrr)},
		{r.CdAM2.Held, v.Say(words.DragHeldCdA)},
		{!r.BothWays, v.Say(words.DragOneWay)},
		{!r.Crr.Held && !r.CdAM2.Held, v.Lean(r.Correlation)},
		{r.BothWays, v.Say(words.DragRoad, v.GradeFine(unit.Grade(r.Grade.Value))+" "+v.GradeError(half(r.Grade)), v.Speed(r.HeadMps.Value)+" ± "+v.Speed(half(r.HeadMps)))},
	} {
		if note.yes {
			fmt.Fprintf(out, "- %s\n", note.text)
		}
	}
	fmt.Fprintln(out)
	s := newSheet(out)
	for i := range m.files {
		f := &m.files[i]
		for _, each := range f.runs {
			fit := &r.Runs[each.at]
			way := v.Say(words.RunOut)
			if each.run.Back {
				way = v.Say(words.RunBack)
			}
			text := way + " · " + v.Say(words.RunLine, v.Seconds(fit.ToS-fit.FromS), v.Speed(fit.StartMps), v.Speed(fit.EndMps))
			if fit.Odd {
				text += " · " + v.Say(words.RunOdd)
			}
			s.row(f.name, text)
		}
		if f.cut {
			s.row(f.name, v.Say(words.SoundCut, v.Number(f.sound.LengthS, 1)))
		}
	}
	s.row(v.Say(words.HeadIntoBike), fmt.Sprintf("bike.crr=%.5f bike.cda_m2=%.4f", m.bike[0].Value, m.bike[1].Value))
	if err := s.Flush(); err != nil {
		return err
	}
	return writeCautions(out, []string{v.Say(words.CautionCoast), v.Say(words.CautionMotorOff)}, v)
}

// spunAnswer is the answer for a wheel on the stand as JSON.
type spunAnswer struct {
	File       string       `json:"file"`
	PowerW     estimateJSON `json:"power_at_25_kmh_w"`
	ForceN     estimateJSON `json:"force_at_25_kmh_n"`
	TorqueNm   estimateJSON `json:"torque_nm"`
	RestS      estimateJSON `json:"seconds_from_25_kmh_to_rest"`
	TypicalW   estimateJSON `json:"typical_power_w"`
	Drags      bool         `json:"drags"`
	RubFound   bool         `json:"rub_once_per_turn"`
	RubDB      float64      `json:"rub_db"`
	RubErrorDB float64      `json:"rub_error_db"`
}

// spin judges wheels that spin down on a stand, each file by itself.
func (o *coastOptions) spin(out io.Writer, q *ask.Question, files []heard, v words.Voice) error {
	if !q.ClicksKnown() {
		return errClicksUnknown
	}
	var all []spunAnswer
	for _, h := range files {
		if h.sound == nil {
			return fmt.Errorf("%s: expected a recording", h.name)
		}
		st := longestFall(h.sound)
		if st == nil {
			return errNoFall(h.name)
		}
		spun, err := q.SpinWheel(st.Points, 0)
		if err != nil {
			return fmt.Errorf("%s: %w", h.name, err)
		}
		turn := st.Fold(q.Coast.ClicksPerTurn)
		if o.json {
			all = append(all, spunAnswer{
				File: h.name, PowerW: *estimateOf(spun.PowerW), ForceN: *estimateOf(spun.ForceN), TorqueNm: *estimateOf(spun.TorqueNm),
				RestS: *estimateOf(spun.RestS), TypicalW: *estimateOf(spun.Typical), Drags: spun.Drags,
				RubFound: turn.Found, RubDB: turn.PeakDB, RubErrorDB: turn.ErrorDB,
			})
			continue
		}
		if err := writeSpun(out, h.name, spun, &turn, v); err != nil {
			return err
		}
	}
	if o.json {
		return writeJSON(out, map[string]any{"interval": 0.9, "wheels": all})
	}
	return writeCautions(out, []string{v.Say(words.CautionStand)}, v)
}

func longestFall(h *click.Heard) *click.Stretch {
	var best *click.Stretch
	for i := range h.Stretches {
		if st := &h.Stretches[i]; st.Falls && (best == nil || st.ToS()-st.FromS() > best.ToS()-best.FromS()) {
			best = st
		}
	}
	return best
}

func writeSpun(out io.Writer, name string, s *coast.Spun, turn *click.Fold, v words.Voice) error {
	says := words.SpunFine
	if s.Drags {
		says = words.SpunDrags
	}
	rub := v.Say(words.SpunNoRub)
	if turn.Found {
		rub = v.Say(words.SpunRub, v.Decibel(turn.PeakDB))
	}
	fmt.Fprintf(out, "%s: %s %s\n\n", name, v.Say(says), rub)
	with := func(e coast.Estimate, write func(float64) string) string {
		return write(e.Value) + " ± " + write((e.High-e.Low)/2)
	}
	at := v.Speed(coast.SpunMps)
	t := newSheet(out)
	t.row(v.Say(words.SpunPower, at), with(s.PowerW, v.FinePower))
	t.row(v.Say(words.SpunTypical), v.FinePower(s.Typical.Low)+" – "+v.FinePower(s.Typical.High))
	t.row(v.Say(words.SpunTorque), with(s.TorqueNm, v.Torque))
	t.row(v.Say(words.SpunRest, at), with(s.RestS, v.Seconds))
	_, err := fmt.Fprintln(out)
	return errors.Join(t.Flush(), err)
}
