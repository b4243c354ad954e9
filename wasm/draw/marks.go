package draw

import (
	"math"

	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// sectionMarks is what stands above the road: the bracket over the hardest
// stretch and the stake where the rig stops, with their words.
type sectionMarks struct {
	bracket, stake path
	labels         dom.Parts
	taken          []box
}

func (s *section) marks(v words.Voice) sectionMarks {
	var m sectionMarks
	stakeAt, stakeTop := math.Inf(-1), math.Inf(1)
	if s.answer.Stalled {
		stakeAt = clampTo(s.x(s.answer.StalledAtM), s.start, s.x(s.lengthM))
		stakeTop = s.roadY(stakeAt) - stakeHeight
		m.stake.move(stakeAt, s.roadY(stakeAt))
		m.stake.upTo(stakeTop)
		m.stake.move(stakeAt-7, stakeTop+5)
		m.stake.across(stakeAt + 7)
		m.taken = append(m.taken, box{stakeAt - 8, stakeTop - 1, stakeAt + 8, s.roadY(stakeAt)})
	}
	from, to, bar := s.bracketBar(&m, stakeAt, stakeTop)
	if s.answer.Stalled {
		words := label{lines: []string{v.Say(words.SectionStalled, v.Length(s.answer.StalledAtM))}, px: wordsPx, class: "figure halo stops"}
		w := words.width()
		words, _ = s.aloft(words, m.taken, stakeTop+15,
			stakeAt-12-w, stakeAt+12, stakeAt-w/2)
		m.labels = append(m.labels, words.node())
		m.taken = append(m.taken, words.box())
	}
	if to <= from {
		return m
	}
	name := s.bracketWords(v)
	w := name.width()
	name, b := s.aloft(name, m.taken, bar-3, to-w+1, from-1, (from+to-w)/2)
	if middle := (from + to) / 2; b.y1 < bar-5 {
		m.bracket.move(clampTo(middle, b.x0+4, b.x1-4), b.y1)
		m.bracket.line(middle, bar)
	}
	m.labels = append(m.labels, name.node())
	m.taken = append(m.taken, b)
	return m
}

// bracketBar draws the bracket: a bar over the stretch, with ends that reach
// down to the road. It gives the bar's ends and height.
func (s *section) bracketBar(m *sectionMarks, stakeAt, stakeTop float64) (from, to, bar float64) {
	h := &s.answer.Hardest
	if !(h.ToM > h.FromM) {
		return 0, 0, 0
	}
	from, to = s.x(h.FromM), s.x(h.ToM)
	if narrow := 8 - (to - from); narrow > 0 {
		from = math.Max(from-narrow/2, s.start)
		to = from + 8
	}
	bar = s.roof(from, to) - bracketLift
	if stakeAt > from-10 && stakeAt < to+10 {
		bar = math.Min(bar, stakeTop-5)
	}
	m.bracket.move(from, s.roadY(from)-3)
	m.bracket.upTo(bar)
	m.bracket.across(to)
	m.bracket.upTo(s.roadY(to) - 3)
	m.taken = append(m.taken,
		box{from - 1, bar - 1, to + 1, bar + 1},
		box{from - 2, bar, from + 2, s.roadY(from)},
		box{to - 2, bar, to + 2, s.roadY(to)})
	return from, to, bar
}

// bracketWords are length, grade and limit of the hardest stretch, on two lines
// where one would be too long.
func (s *section) bracketWords(v words.Voice) label {
	a := s.answer
	line := v.Length(a.Hardest.ToM-a.Hardest.FromM) + " · " + v.Grade(a.Hardest.Grade)
	l := label{lines: []string{line}, px: wordsPx, class: "figure halo"}
	if !s.namesLimit() {
		return l
	}
	limit := v.Limit(a.Balance.Pegs[0].Limit)
	l.lines = []string{line + " · " + limit}
	if l.width() > s.size.W-2*sectionSide {
		l.lines = []string{line, limit}
	}
	return l
}

// aloft places words in the sky: at that of the given left edges where they
// come to stand lowest, above the road, not below a given y, free of what is
// taken.
func (s *section) aloft(l label, taken []box, bottom float64, lefts ...float64) (label, box) {
	const step, top = 2.0, 1.0
	best := l.at(clampTo(lefts[0], 2, s.size.W-2-l.width()), top)
	lowest := math.Inf(-1)
	for _, left := range lefts {
		left = clampTo(left, 2, math.Max(2, s.size.W-2-l.width()))
		y := math.Min(bottom, s.roof(left, left+l.width())-5) - l.height()
		try := l.at(left, y)
		for y > top && !try.box().free(taken) {
			y -= step
			try = l.at(left, y)
		}
		if y >= top && try.box().free(taken) && y > lowest+1 {
			best, lowest = try, y
		}
	}
	return best, best.box()
}

// namesLimit tells whether a limit binds on the hardest stretch: not where it
// falls, so that nothing is wanted.
func (s *section) namesLimit() bool {
	b := &s.answer.Balance
	return len(b.Pegs) > 0 && b.WantedN > 0
}
