package hill

import (
	"bytes"
	"math"
)

// gpxReader reads GPX 1.0 and 1.1: trk with trkseg and trkpt, rte with rtept,
// with ele, time and name. Waypoints and extensions are passed over.
type gpxReader struct {
	xmlScanner
	gather
	fileName            string
	lineDepth, ptDepth  int // depth of the open trk or rte, trkpt or rtept; 0 when none
	skipDepth           int // depth of the open extensions; 0 when none
	metaDepth           int
	point               Point
	field               gpxField
	ele, when, nameText []byte
}

type gpxField uint8

const (
	noField gpxField = iota
	eleField
	timeField
	nameField
	fileNameField
)

// read reads the whole file; what was gathered stays usable after an error.
func (g *gpxReader) read() *TrackError {
	for {
		token, err := g.nextToken()
		if err == nil {
			switch token {
			case xmlStart:
				err = g.start()
			case xmlText:
				g.keep()
			case xmlEnd:
				err = g.end()
			case xmlDone:
				return nil
			}
		}
		if err != nil {
			err.Points = len(g.points)
			return err
		}
	}
}

func (g *gpxReader) start() *TrackError {
	if g.depth == 1 {
		return g.root()
	}
	if g.skipDepth > 0 {
		return nil
	}
	switch string(g.name) {
	case "extensions":
		g.skipDepth = g.depth
	case "trk", "rte":
		if g.depth == 2 {
			g.lineDepth = g.depth
			g.begin(g.name[0] == 'r')
		}
	case "trkseg":
		if g.lineDepth > 0 {
			g.segment()
		}
	case "trkpt", "rtept":
		if g.lineDepth > 0 && g.ptDepth == 0 {
			g.ptDepth = g.depth
			return g.place()
		}
	case "ele":
		g.want(g.ptDepth > 0 && g.depth == g.ptDepth+1, eleField)
	case "time":
		g.want(g.ptDepth > 0 && g.depth == g.ptDepth+1, timeField)
	case "name":
		g.want(g.lineDepth > 0 && g.depth == g.lineDepth+1, nameField)
		g.want(g.lineDepth == 0 && g.ptDepth == 0 && (g.depth == 2 || g.depth == 3 && g.metaDepth == 2), fileNameField)
	case "metadata":
		g.metaDepth = g.depth
	}
	return nil
}

func (g *gpxReader) root() *TrackError {
	look := LooksXML
	switch string(bytes.ToLower(g.name)) {
	case "gpx":
		return nil
	case "kml":
		look = LooksKML
	case "trainingcenterdatabase":
		look = LooksTCX
	case "html":
		look = LooksHTML
	}
	return &TrackError{Kind: TrackWrongFile, Looks: look}
}

// place reads where a point lies.
func (g *gpxReader) place() *TrackError {
	lat, lon := g.attr("lat"), g.attr("lon")
	p, ok := placeOf(lat, lon)
	if !ok {
		return &TrackError{Kind: TrackBadPlace, Line: g.line(), Got: label([]byte("lat=\"" + string(lat) + "\" lon=\"" + string(lon) + "\""))}
	}
	g.point = p
	g.ele, g.when = g.ele[:0], g.when[:0]
	return nil
}

func placeOf(lat, lon []byte) (Point, bool) {
	p := Point{HeightM: math.NaN(), TimeS: math.NaN()}
	var ok1, ok2 bool
	p.LatDeg, ok1 = decimal(lat)
	p.LonDeg, ok2 = decimal(lon)
	return p, ok1 && ok2 && math.Abs(p.LatDeg) <= 90 && math.Abs(p.LonDeg) <= 180
}

func (g *gpxReader) want(ok bool, f gpxField) {
	if ok {
		g.field, g.wantText = f, true
		if f == nameField || f == fileNameField {
			g.nameText = g.nameText[:0]
		}
	}
}

func (g *gpxReader) keep() {
	switch g.field {
	case eleField:
		g.ele = appendUpTo(g.ele, g.text)
	case timeField:
		g.when = appendUpTo(g.when, g.text)
	case nameField, fileNameField:
		g.nameText = appendUpTo(g.nameText, g.text)
	}
}

func appendUpTo(dst, more []byte) []byte {
	return append(dst, more[:min(len(more), max(0, mostKept-len(dst)))]...)
}

func (g *gpxReader) end() *TrackError {
	depth := g.depth + 1 // of the element that ended
	if g.field != noField {
		switch g.field {
		case nameField:
			g.current().name = label(g.nameText)
		case fileNameField:
			g.fileName = label(g.nameText)
		}
		g.field, g.wantText = noField, false
	}
	switch depth {
	case g.skipDepth:
		g.skipDepth = 0
	case g.ptDepth:
		g.ptDepth = 0
		g.point.HeightM = heightOf(g.ele)
		g.point.TimeS = clock(g.when)
		return g.add(g.point)
	case g.lineDepth:
		g.lineDepth = 0
	case g.metaDepth:
		g.metaDepth = 0
	}
	return nil
}

// heightOf reads a height [m]; NaN where there is none, or none on this earth.
func heightOf(b []byte) float64 {
	h, ok := decimal(b)
	if !ok || math.Abs(h) > 12_000 {
		return math.NaN()
	}
	return h
}
