package slope

import (
	"unicode/utf8"

	"hillwright/physics/hill"
)

// Where a track begins whose place is not known: in the open sea, where nobody
// takes it for a road. It then runs north.
const seaLatDeg, seaLonDeg = 0.01, 0.01

// gpxEveryM is the distance between points along the road [m].
const gpxEveryM = 10.0

// GPX writes readings as a GPX 1.1 file: a waypoint for each whose place is
// known, and a track of the hill that they make (see Hill), with a point at
// each edge and every 10 m. Between places that are known the track runs
// straight towards the next, as far as the pitches reach; without any it lies
// in the open sea and runs north: only lengths and heights count then, and
// description is the place to say so.
func GPX(name, description string, entries []Entry) ([]byte, error) {
	p, err := Hill(name, entries)
	if err != nil {
		return nil, err
	}
	b := []byte(`<?xml version="1.0" encoding="UTF-8"?>` + "\n" +
		`<gpx version="1.1" creator="Hillwright" xmlns="http://www.topografix.com/GPX/1/1" ` +
		`xmlns:xsi="http://www.w3.org/2001/XMLSchema-instance" ` +
		`xsi:schemaLocation="http://www.topografix.com/GPX/1/1 http://www.topografix.com/GPX/1/1/gpx.xsd">` + "\n")
	for i := range entries {
		if entries[i].placed() {
			b = waypoint(b, &entries[i])
		}
	}
	b = append(b, "<trk>"...)
	b = element(b, "name", name)
	b = element(b, "desc", description)
	b = append(b, "<trkseg>\n"...)
	for _, at := range layTrack(&p, entries) {
		b = point(b, "trkpt", at)
		b = append(b, "</trkpt>\n"...)
	}
	return append(b, "</trkseg></trk>\n</gpx>\n"...), nil
}

func waypoint(b []byte, e *Entry) []byte {
	b = point(b, "wpt", e.At)
	b = element(b, "time", dateTime(e.TimeS))
	b = element(b, "name", e.Place)
	b = element(b, "cmt", e.Note)
	b = element(b, "desc", decimals(100*float64(e.Grade), 2)+" % ± "+decimals(100*e.PlusMinus(), 2)+" %")
	b = element(b, "type", string(e.Method))
	return append(b, "</wpt>\n"...)
}

// point opens a point and writes its height.
func point(b []byte, tag string, at hill.Point) []byte {
	b = append(b, '<')
	b = append(b, tag...)
	b = append(b, ` lat="`...)
	b = append(b, decimals(at.LatDeg, 8)...)
	b = append(b, `" lon="`...)
	b = append(b, decimals(at.LonDeg, 8)...)
	b = append(b, `">`...)
	return element(b, "ele", decimals(at.HeightM, 3))
}

// element writes an element with text, and nothing when the text is empty.
func element(b []byte, tag, text string) []byte {
	if text == "" {
		return b
	}
	b = append(append(append(b, '<'), tag...), '>')
	b = escaped(b, text)
	return append(append(append(b, "</"...), tag...), '>')
}

// escaped writes text as XML 1.0 takes it: marks as entities; what no XML file
// may hold as U+FFFD.
func escaped(b []byte, text string) []byte {
	for _, r := range text {
		switch {
		case r == '&':
			b = append(b, "&amp;"...)
		case r == '<':
			b = append(b, "&lt;"...)
		case r == '>':
			b = append(b, "&gt;"...)
		case r == '\r':
			b = append(b, "&#13;"...)
		case r < ' ' && r != '\t' && r != '\n' || r == 0xFFFE || r == 0xFFFF:
			b = append(b, "\uFFFD"...)
		default:
			b = utf8.AppendRune(b, r)
		}
	}
	return b
}
