package ask

import (
	"math"
	"strings"

	"hillwright/physics/assume"
	"hillwright/physics/rig"
	"hillwright/physics/road"
)

// Shown is what stands behind an input in an answer. Text is its value as
// Question.Get writes it, or, where the question leaves it open, what the rig
// takes instead (empty when there is nothing, such as a motor's mass without a
// motor). Value is the same as a number, NaN for words and lists. Low and High
// bound it, NaN where no band is known. Reason is the stable key of the class
// default that stands in for it (assume.Value.Reason), Because the same in
// English; both empty when none does. Open tells that the question leaves it
// open.
type Shown struct {
	Text            string
	Value           float64
	Low, High       float64
	Reason, Because string
	Source          Source
	Open            bool
}

// Shown gives the value behind an input: the question's own, or what the rig
// made of this question took where it is left open: a class default with its
// band and reason, or what follows from other inputs. ok is false for a path
// that is not known.
func (q *Question) Shown(path string, r *rig.Rig) (s Shown, ok bool) {
	text, ok := q.Get(path)
	if !ok {
		return Shown{}, false
	}
	in, _ := InputAt(path)
	nan := math.NaN()
	s = Shown{Text: text, Value: nan, Low: nan, High: nan, Source: q.SourceOf(path)}
	if v, given := q.Value(path); given {
		s.Value = v
		s.Low, s.High, _ = q.Band(path)
		return s, true
	}
	if in.Blank == "" || text != in.Blank {
		return s, true
	}
	s.Open, s.Source = true, Assumed
	if a, found := assumedAt(r.Assumed, path); found {
		s.take(a.Value, a.Low, a.High)
		s.Reason, s.Because = a.Reason, a.Text
		return s, true
	}
	if strings.HasPrefix(path, "coast.") {
		q.showCoast(&s, path)
		return s, true
	}
	if in.Blank == classDefault {
		s.Text = "" // the bike has no motor: there is nothing to assume
		return s, true
	}
	switch path {
	case "bike.rollout_m":
		s.take(r.CircumferenceM, nan, nan)
	case "day.density_kgm3":
		spread := in.Spread * r.Road.DensityKgM3
		s.take(r.Road.DensityKgM3, r.Road.DensityKgM3-spread, r.Road.DensityKgM3+spread)
	case "day.grip":
		ground, _ := road.GroundByID(r.Day.Ground)
		s.take(ground.Mu.Usual, ground.Mu.Low, ground.Mu.High)
	case "day.pack_c":
		low, high, _ := q.Band("day.temperature_c")
		s.take(r.PackC, low, high)
	case "ride.level":
		s.take(float64(r.Level), nan, nan)
	}
	return s, true
}

func (s *Shown) take(value, low, high float64) {
	s.Text, s.Value, s.Low, s.High = format(value), value, low, high
}

func assumedAt(list []assume.Value, path string) (assume.Value, bool) {
	for _, a := range list {
		if a.Path == path {
			return a, true
		}
	}
	return assume.Value{}, false
}

var formNames = []string{"number", "whole number", "choice", "list", "tyre"}

// InputsJSON writes the catalogue as JSON: every input with its value, unit,
// band, source, range and form; where the question leaves one open, the value
// that the rig took, and why.
func InputsJSON(q *Question, r *rig.Rig) []byte {
	w := &writer{}
	w.open("", '[')
	for _, in := range catalogue {
		s, _ := q.Shown(in.Path, r)
		w.open("", '{')
		w.text("path", in.Path)
		switch {
		case !math.IsNaN(s.Value):
			w.number("value", s.Value)
		case s.Text == "":
			w.null("value")
		default:
			w.text("value", s.Text)
		}
		w.text("unit", in.Unit)
		w.number("low", s.Low)
		w.number("high", s.High)
		w.text("source", s.Source.String())
		w.flag("left_open", s.Open)
		if s.Reason != "" {
			w.text("reason", s.Reason)
			w.text("because", s.Because)
		}
		w.text("form", formNames[in.Form])
		if in.Form == Number || in.Form == Whole || in.Form == List {
			w.number("lowest", in.Low)
			w.number("highest", in.High)
		}
		if len(in.Choices) > 0 {
			w.text("choices", strings.Join(in.Choices, " "))
		}
		if in.Blank != "" {
			w.text("word_for_open", in.Blank)
		}
		w.close('}')
	}
	w.close(']')
	return append(w.out, '\n')
}
