package hill

import (
	"math"
	"strings"
	"unicode/utf8"
)

// line is one track or route of a file: a range of gather.points.
type line struct {
	name     string
	route    bool
	from, to int
	segments []int // first point of each
}

// gather collects the lines of a file and chooses one.
type gather struct {
	points []Point
	lines  []line
}

// begin opens a new line.
func (g *gather) begin(route bool) {
	g.lines = append(g.lines, line{route: route, from: len(g.points), to: len(g.points)})
}

// current is the line that was opened last.
func (g *gather) current() *line { return &g.lines[len(g.lines)-1] }

// segment opens a new segment in the current line; empty ones vanish.
func (g *gather) segment() {
	l := g.current()
	if n := len(l.segments); n > 0 && l.segments[n-1] == len(g.points) {
		return
	}
	l.segments = append(l.segments, len(g.points))
}

// add puts a point into the current line.
func (g *gather) add(p Point) *TrackError {
	if len(g.points) >= MostTrackPoints {
		return &TrackError{Kind: TrackTooManyPoints}
	}
	l := g.current()
	if len(l.segments) == 0 {
		g.segment()
	}
	g.points = append(g.points, p)
	l.to = len(g.points)
	return nil
}

// choose gives the first track that is at least half as long as the longest
// one: recorders put the ride first and scraps behind it, but a scrap may come
// first. Routes count only where there is no track.
func (g *gather) choose(fileName string) (Track, bool) {
	hasTrack := false
	for _, l := range g.lines {
		hasTrack = hasTrack || !l.route && l.to-l.from >= 2
	}
	var fit []line
	for _, l := range g.lines {
		if l.to-l.from >= 2 && l.route != hasTrack {
			fit = append(fit, l)
		}
	}
	if len(fit) == 0 {
		return Track{}, false
	}
	t := g.track(fit[longEnough(g, fit)])
	t.Others = len(fit) - 1
	if t.Name == "" {
		t.Name = fileName
	}
	return t, true
}

// longEnough finds the first line that is at least half as long as the longest.
func longEnough(g *gather, lines []line) int {
	if len(lines) == 1 {
		return 0
	}
	lengths, longest := make([]float64, len(lines)), 0.0
	for i, l := range lines {
		t := g.track(l)
		lengths[i] = t.RawLengthM()
		longest = max(longest, lengths[i])
	}
	i := 0
	for lengths[i] < longest/2 {
		i++
	}
	return i
}

func (g *gather) track(l line) Track {
	t := Track{Name: l.name, Points: g.points[l.from:l.to:l.to]}
	for _, at := range l.segments {
		if at < l.to {
			t.SegmentStart = append(t.SegmentStart, at-l.from)
		}
	}
	return t
}

// RawLengthM is the sum of the legs within segments on the ellipsoid, level
// and with nothing mended [m].
func (t *Track) RawLengthM() float64 {
	sum := 0.0
	t.eachLeg(func(a, b *Point) {
		d := leg(a, b)
		sum += d
	})
	return sum
}

// RawAscentM is the sum of all rises from point to point within segments [m]:
// with the noise of every point in it, so larger than the ascent of the road.
func (t *Track) RawAscentM() float64 {
	sum := 0.0
	last := math.NaN()
	next := 0
	for i := range t.Points {
		if next < len(t.SegmentStart) && t.SegmentStart[next] == i {
			next++
			last = math.NaN()
		}
		h := t.Points[i].HeightM
		if d := h - last; d > 0 {
			sum += d
		}
		if !math.IsNaN(h) {
			last = h
		}
	}
	return sum
}

func (t *Track) eachLeg(do func(a, b *Point)) {
	next := 0
	for i := range t.Points {
		if next < len(t.SegmentStart) && t.SegmentStart[next] == i {
			next++
			continue
		}
		if i > 0 {
			do(&t.Points[i-1], &t.Points[i])
		}
	}
}

// label makes a name of a file's bytes: blanks tidied, at most 120 characters;
// bytes that are no UTF-8 are taken for Latin-1 (ISO 8859-1).
func label(b []byte) string {
	var s string
	if utf8.Valid(b) {
		s = string(b)
	} else {
		runes := make([]rune, len(b))
		for i, c := range b {
			runes[i] = rune(c)
		}
		s = string(runes)
	}
	s = strings.Map(func(r rune) rune {
		if r < ' ' || r >= 0x7f && r < 0xa0 {
			return ' '
		}
		return r
	}, s)
	runes := []rune(strings.Join(strings.Fields(s), " "))
	return string(runes[:min(len(runes), 120)])
}
