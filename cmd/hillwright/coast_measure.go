package main

import (
	"hillwright/physics/ask"
	"hillwright/physics/coast"
)

// measured is what files say about a bike's drag.
type measured struct {
	setup   coast.Setup
	files   []measuredFile
	result  *coast.Result // nil when refused
	refused error
	bike    [2]coast.Estimate // Crr and CdA to put into the bike
}

// measuredFile is one file with its runs.
type measuredFile struct {
	heard
	runs []measuredRun
}

// measuredRun is one coast-down: its speeds over the whole time, and the part
// that is fitted.
type measuredRun struct {
	curve []coast.Point
	run   coast.Run
	at    int // its place in the fit
}

// measure fits what the files say. Recordings need the clicks per turn.
func measure(q *ask.Question, files []heard, back map[int]bool) *measured {
	m := &measured{setup: q.CoastSetup(0)}
	var runs []coast.Run
	add := func(f *measuredFile, r coast.Run, curve []coast.Point) {
		f.runs = append(f.runs, measuredRun{curve, r, len(runs)})
		runs = append(runs, r)
	}
	for i, h := range files {
		f := measuredFile{heard: h}
		if h.table != nil {
			r := *h.table
			r.Back = back[i]
			add(&f, r, r.Points)
		} else {
			falls := 0
			for _, s := range h.sound.Stretches {
				if !s.Falls {
					continue
				}
				if falls++; q.ClicksKnown() {
					r := q.RunOf(s.Points, back[i])
					add(&f, r, q.RunOf(s.Curve, false).Points)
				}
			}
			if falls == 0 && m.refused == nil {
				m.refused = errNoFall(h.name)
			}
		}
		m.files = append(m.files, f)
	}
	if m.refused == nil && !q.ClicksKnown() && len(runs) < len(files) {
		m.refused = errClicksUnknown
	}
	if m.refused != nil {
		return m
	}
	if m.result, m.refused = coast.Fit(runs, m.setup); m.refused == nil {
		m.bike[0], m.bike[1] = q.BikeDrag(m.result)
	}
	return m
}
