package hill

import (
	"math"
	"strconv"
)

// geoReader reads GeoJSON (RFC 7946): every LineString and MultiLineString,
// wherever it lies, with the third number of a position as its height. Lines
// that follow each other without a gap within one FeatureCollection are one.
type geoReader struct {
	*scanner
	gather
	token    []byte
	fileName string
	chain    bool // the next line may go on from the last one
	pending  []Point
	starts   []int // first pending point of each segment
	nest     int   // how deep the pending coordinates were nested: 2 for a line
	bad      *TrackError
}

func (g *geoReader) read() *TrackError {
	err := g.value(0)
	if err != nil {
		if err.Kind == TrackCutOff && (g.nest == 2 || g.nest == 3) {
			g.takePending()
		}
		err.Points = len(g.points)
	}
	return err
}

// value reads any value.
func (g *geoReader) value(depth int) *TrackError {
	c, ok := g.space()
	if !ok {
		return g.ended()
	}
	if depth > deepest {
		return g.broken("values nested too deep")
	}
	switch {
	case c == '{':
		return g.object(depth)
	case c == '[':
		return g.list(']', func() *TrackError { return g.value(depth + 1) })
	case c == '"':
		return g.str()
	case c == '-' || isDigit(c):
		g.back()
		return g.number()
	}
	g.back()
	g.token = g.token[:0]
	for len(g.token) < 6 {
		if c, ok = g.next(); !ok {
			return g.ended()
		}
		if c < 'a' || c > 'z' {
			g.back()
			break
		}
		g.token = append(g.token, c)
	}
	switch string(g.token) {
	case "true", "false", "null":
		return nil
	}
	return g.broken("unexpected " + strconv.QuoteRune(rune(c)))
}

// list reads items with commas between them up to the closing mark.
func (g *geoReader) list(closing byte, item func() *TrackError) *TrackError {
	c, ok := g.space()
	if ok && c == closing {
		return nil
	}
	if ok {
		g.back()
	}
	for {
		if !ok {
			return g.ended()
		}
		if err := item(); err != nil {
			return err
		}
		if c, ok = g.space(); !ok {
			return g.ended()
		}
		if c == closing {
			return nil
		}
		if c != ',' {
			return g.broken("expected a comma, got " + strconv.QuoteRune(rune(c)))
		}
	}
}

func (g *geoReader) object(depth int) *TrackError {
	kind, coordinates := "", false
	err := g.list('}', func() *TrackError {
		c, ok := g.space()
		if !ok {
			return g.ended()
		}
		if c != '"' {
			return g.broken("expected a name in quotes, got " + strconv.QuoteRune(rune(c)))
		}
		if err := g.str(); err != nil {
			return err
		}
		key := string(g.token)
		if c, ok = g.space(); !ok {
			return g.ended()
		}
		if c != ':' {
			return g.broken("expected a colon, got " + strconv.QuoteRune(rune(c)))
		}
		switch key {
		case "coordinates":
			coordinates = true
			return g.coordinates()
		case "features":
			g.chain = false
		case "type", "name":
			c, ok = g.space()
			if !ok {
				return g.ended()
			}
			g.back()
			if c != '"' {
				break
			}
			if err := g.value(depth + 1); err != nil {
				return err
			}
			if key == "type" {
				kind = string(g.token)
			} else if g.fileName == "" {
				g.fileName = label(g.token)
			}
			return nil
		}
		return g.value(depth + 1)
	})
	if err != nil || !coordinates {
		return err
	}
	if kind == "LineString" && g.nest == 2 || kind == "MultiLineString" && g.nest == 3 {
		if g.bad != nil {
			return g.bad
		}
		if len(g.points)+len(g.pending) > MostTrackPoints {
			return &TrackError{Kind: TrackTooManyPoints}
		}
		g.takePending()
	}
	g.drop()
	return nil
}

func (g *geoReader) drop() {
	g.pending, g.starts, g.nest, g.bad = g.pending[:0], g.starts[:0], 0, nil
}

// takePending makes a line of the pending points, or a part of the last one.
func (g *geoReader) takePending() {
	if len(g.pending) == 0 {
		return
	}
	goesOn := false
	if g.chain && len(g.points) > 0 {
		a, b := g.points[len(g.points)-1], g.pending[0]
		goesOn = math.Abs(a.LatDeg-b.LatDeg) < 1e-6 && math.Abs(a.LonDeg-b.LonDeg) < 1e-6
	}
	if !goesOn {
		g.begin(false)
	}
	g.chain = true
	next := 0
	for i, p := range g.pending {
		if next < len(g.starts) && g.starts[next] == i {
			next++
			if !goesOn || i > 0 {
				g.segment()
			}
		}
		if goesOn && i == 0 {
			continue // the last line ended there
		}
		if g.add(p) != nil {
			return
		}
	}
}

// coordinates reads nested lists of numbers into the pending points.
func (g *geoReader) coordinates() *TrackError {
	g.drop()
	c, ok := g.space()
	if !ok {
		return g.ended()
	}
	g.back()
	if c != '[' {
		return g.value(0)
	}
	return g.positions(1)
}

// positions reads one list at a depth of nesting: of numbers, or of lists.
func (g *geoReader) positions(depth int) *TrackError {
	if depth > 6 {
		return g.broken("coordinates nested too deep")
	}
	g.next() // the [, seen by the caller
	var at [3]float64
	numbers := 0
	first := len(g.pending)
	err := g.list(']', func() *TrackError {
		c, ok := g.space()
		if !ok {
			return g.ended()
		}
		g.back()
		if c == '[' {
			return g.positions(depth + 1)
		}
		if c == 'n' { // a height of null
			return g.value(0)
		}
		if err := g.number(); err != nil {
			return err
		}
		if numbers < 3 {
			v, ok := decimal(g.token)
			if !ok {
				return g.broken("no number: " + string(g.token))
			}
			at[numbers] = v
		}
		numbers++
		return nil
	})
	if err != nil {
		return err
	}
	if numbers == 0 {
		if len(g.pending) > first && (len(g.starts) == 0 || g.starts[len(g.starts)-1] < first) && depth == g.nest-1 {
			g.starts = append(g.starts, first)
		}
		return nil
	}
	if numbers < 2 || math.Abs(at[1]) > 90 || math.Abs(at[0]) > 180 {
		if g.bad == nil {
			g.bad = &TrackError{Kind: TrackBadPlace, Line: g.line(), Got: "longitude " + plainNumber(at[0]) + ", latitude " + plainNumber(at[1])}
		}
		return nil
	}
	if len(g.pending) >= MostTrackPoints {
		return &TrackError{Kind: TrackTooManyPoints}
	}
	p := Point{LatDeg: at[1], LonDeg: at[0], HeightM: math.NaN(), TimeS: math.NaN()}
	if numbers > 2 && math.Abs(at[2]) <= 12_000 {
		p.HeightM = at[2]
	}
	g.nest = depth
	g.pending = append(g.pending, p)
	return nil
}

// str reads a string, whose opening quote is taken, into token, as written
// but for \" and \\ and such; long ones are cut.
func (g *geoReader) str() *TrackError {
	g.token = g.token[:0]
	for {
		c, ok := g.next()
		if !ok {
			return g.ended()
		}
		switch c {
		case '"':
			return nil
		case '\\':
			if c, ok = g.next(); !ok {
				return g.ended()
			}
		}
		if len(g.token) < mostKept {
			g.token = append(g.token, c)
		}
	}
}

// number reads a number into token.
func (g *geoReader) number() *TrackError {
	g.token = g.token[:0]
	for {
		c, ok := g.next()
		if !ok {
			return g.ended()
		}
		if !isDigit(c) && c != '-' && c != '+' && c != '.' && c != 'e' && c != 'E' {
			g.back()
			break
		}
		if len(g.token) < 64 {
			g.token = append(g.token, c)
		}
	}
	if _, ok := decimal(g.token); !ok {
		return g.broken("no number: " + string(g.token))
	}
	return nil
}
