package main

import (
	"encoding/json"
	"io"
	"math"

	"hillwright/physics/ask"
	"hillwright/physics/coast"
)

// The answer of `hillwright coast -json`. The README documents the keys.
type (
	coastAnswer struct {
		Crr         *estimateJSON `json:"crr"`
		CdAM2       *estimateJSON `json:"cda_m2"`
		Correlation *float64      `json:"correlation"`
		Interval    float64       `json:"interval"`
		Refused     string        `json:"refused,omitempty"`
		Bike        *bikeJSON     `json:"bike,omitempty"`
		BothWays    bool          `json:"both_ways"`
		Grade       *estimateJSON `json:"grade,omitempty"`
		HeadMps     *estimateJSON `json:"wind_mps,omitempty"`
		MassKg      float64       `json:"mass_kg"`
		DensityKgM3 float64       `json:"density_kgm3"`
		AroundM     float64       `json:"circumference_m"`
		Clicks      *float64      `json:"clicks_per_turn"`
		Files       []fileJSON    `json:"files"`
	}
	estimateJSON struct {
		Value float64 `json:"value"`
		Low   float64 `json:"low"`
		High  float64 `json:"high"`
		Held  bool    `json:"held_at_prior"`
	}
	bikeJSON struct {
		Crr   estimateJSON `json:"crr"`
		CdAM2 estimateJSON `json:"cda_m2"`
	}
	fileJSON struct {
		File    string      `json:"file"`
		LengthS *float64    `json:"length_s,omitempty"`
		CutAtS  *float64    `json:"cut_off_at_s,omitempty"`
		Runs    []runJSON   `json:"runs"`
		Curve   []pointJSON `json:"curve"`
	}
	runJSON struct {
		Back     bool     `json:"back"`
		FromS    float64  `json:"from_s"`
		ToS      float64  `json:"to_s"`
		StartMps *float64 `json:"start_mps,omitempty"`
		EndMps   *float64 `json:"end_mps,omitempty"`
		LengthM  *float64 `json:"length_m,omitempty"`
		Misfit   *float64 `json:"misfit,omitempty"`
		Odd      bool     `json:"fits_better_the_other_way,omitempty"`
	}
	pointJSON struct {
		TimeS    float64  `json:"time_s"`
		SpeedMps *float64 `json:"speed_mps,omitempty"`
		ErrorMps *float64 `json:"error_mps,omitempty"`
		ClicksHz *float64 `json:"clicks_per_s,omitempty"`
	}
)

func estimateOf(e coast.Estimate) *estimateJSON { return &estimateJSON{e.Value, e.Low, e.High, e.Held} }

// given is a number that may be left out: nil for one that is none.
func given(v float64) *float64 {
	if math.IsNaN(v) || math.IsInf(v, 0) {
		return nil
	}
	return &v
}

// coastJSON puts what was measured together. Where the fit refuses, the speeds
// are there all the same.
func coastJSON(q *ask.Question, m *measured) *coastAnswer {
	a := &coastAnswer{
		Interval: 0.9, MassKg: m.setup.MassKg.Value, DensityKgM3: m.setup.DensityKgM3.Value,
		AroundM: q.Circumference().Value, Clicks: given(q.Coast.ClicksPerTurn),
	}
	if m.refused != nil {
		a.Refused = m.refused.Error()
	}
	if r := m.result; r != nil {
		a.Crr, a.CdAM2, a.Correlation = estimateOf(r.Crr), estimateOf(r.CdAM2), given(r.Correlation)
		a.Grade, a.HeadMps, a.BothWays = estimateOf(r.Grade), estimateOf(r.HeadMps), r.BothWays
		a.Bike = &bikeJSON{*estimateOf(m.bike[0]), *estimateOf(m.bike[1])}
	}
	for i := range m.files {
		a.Files = append(a.Files, m.fileJSON(&m.files[i]))
	}
	return a
}

func (m *measured) fileJSON(f *measuredFile) fileJSON {
	out := fileJSON{File: f.name, Runs: []runJSON{}, Curve: []pointJSON{}}
	if f.sound != nil {
		out.LengthS = given(f.sound.LengthS)
		if f.cut {
			out.CutAtS = given(f.sound.LengthS)
		}
	}
	for _, r := range f.runs {
		out.Runs = append(out.Runs, m.runJSON(&r))
		for _, p := range r.curve {
			out.Curve = append(out.Curve, pointJSON{TimeS: p.AtS, SpeedMps: given(p.SpeedMps), ErrorMps: given(p.ErrorMps)})
		}
	}
	if f.sound != nil && len(f.runs) == 0 {
		for _, s := range f.sound.Stretches {
			for _, p := range s.Curve {
				out.Curve = append(out.Curve, pointJSON{TimeS: p.AtS, ClicksHz: given(p.RateHz)})
			}
		}
	}
	return out
}

func (m *measured) runJSON(r *measuredRun) runJSON {
	out := runJSON{Back: r.run.Back}
	if n := len(r.run.Points); n > 0 {
		out.FromS, out.ToS = r.run.Points[0].AtS, r.run.Points[n-1].AtS
	} else if n := len(r.run.Marks); n > 0 {
		out.FromS, out.ToS = r.run.Marks[0].AtS, r.run.Marks[n-1].AtS
	}
	if m.result != nil {
		f := &m.result.Runs[r.at]
		out.StartMps, out.EndMps, out.LengthM, out.Misfit, out.Odd = given(f.StartMps), given(f.EndMps), given(f.LengthM), given(f.Misfit), f.Odd
	}
	return out
}

func writeJSON(out io.Writer, v any) error {
	w := json.NewEncoder(out)
	w.SetIndent("", "  ")
	return w.Encode(v)
}
