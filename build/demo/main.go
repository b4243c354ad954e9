// Command demo draws the demo shop's tracks: invented roads, laid where there
// is open ocean so that no real place is meant. Run it in the module's folder
// after a change of the roads below: go run ./build/demo
package main

import (
	"bytes"
	"fmt"
	"log"
	"math"
	"os"
	"path/filepath"
)

// leg is a stretch of road: its length [m], its grade [%] and how far it bends
// [°, to the right] from its beginning to its end.
type leg struct{ lengthM, percent, bendDeg float64 }

// road is an invented road. Its first point lies at latDeg, lonDeg and heightM.
type road struct {
	file, name              string
	latDeg, lonDeg, heightM float64
	bearingDeg              float64
	legs                    []leg
}

var roads = []road{
	{"pass-road.gpx", "Pass road", 44.1, -36.2, 310, 20, []leg{
		{500, 4, 10}, {700, 6.5, 25}, {350, 8, -40}, {60, 5, 150}, {650, 7.5, 10}, {50, 5, -160}, {700, 8.5, 15},
		{300, 10.5, 20}, {60, 6, 165}, {600, 7, -10}, {200, 2, -15}, {650, 8, -20}, {50, 5, -155}, {500, 9, 5},
		{130, 12.5, 10}, {450, 6, 15}, {150, 2, 20},
	}},
	{"way-home.gpx", "Way home", 44.3, -36.4, 142, 250, []leg{
		{600, 0.5, 15}, {450, 3, -20}, {350, 6, 10}, {300, -2, 30}, {700, -4.5, 20}, {900, 0.2, -15}, {280, 8, -30},
		{80, 13, 5}, {200, 4, 10}, {800, -1, -40}, {600, -3, 20}, {1200, 0.4, 35}, {500, 2.5, -10}, {650, 5, -25},
		{250, -6, 15}, {500, -3.5, 20}, {900, 1, -30}, {400, 4.5, 10}, {120, 9, -15}, {300, -1, 20}, {920, 0.8, 10},
	}},
}

func main() {
	for _, r := range roads {
		out := filepath.Join("site", "shop", "hills", r.file)
		if err := os.WriteFile(out, gpx(r), 0o644); err != nil {
			log.Fatal(err)
		}
	}
}

const (
	roundOffM = 20 // over this length a road changes its grade
	everyM    = 15 // from one recorded point to the next
	earthM    = 6371000.0
)

// gpx writes a road as a GPX 1.1 track.
func gpx(r road) []byte {
	var b bytes.Buffer
	b.WriteString(`<?xml version="1.0" encoding="UTF-8"?>` + "\n")
	b.WriteString(`<gpx xmlns="http://www.topografix.com/GPX/1/1" version="1.1" creator="Hillwright, an invented road">` + "\n")
	fmt.Fprintf(&b, "<trk><name>%s</name><trkseg>\n", r.name)
	grade, bearing := perMetre(r)
	lat, lon, height := r.latDeg, r.lonDeg, r.heightM
	for i := range grade {
		if i%everyM == 0 {
			fmt.Fprintf(&b, "<trkpt lat=\"%.6f\" lon=\"%.6f\"><ele>%.1f</ele></trkpt>\n", lat, lon, height)
		}
		height += grade[i]
		lat += math.Cos(bearing[i]) / earthM * 180 / math.Pi
		lon += math.Sin(bearing[i]) / earthM * 180 / math.Pi / math.Cos(lat*math.Pi/180)
	}
	fmt.Fprintf(&b, "<trkpt lat=\"%.6f\" lon=\"%.6f\"><ele>%.1f</ele></trkpt>\n</trkseg></trk></gpx>\n", lat, lon, height)
	return b.Bytes()
}

// perMetre gives the grade and the bearing [rad] of every metre of a road,
// grades rounded off where they change.
func perMetre(r road) (grade, bearing []float64) {
	at := r.bearingDeg
	for _, l := range r.legs {
		for range int(l.lengthM) {
			at += l.bendDeg / l.lengthM
			grade = append(grade, l.percent/100)
			bearing = append(bearing, at*math.Pi/180)
		}
	}
	smooth := make([]float64, len(grade))
	for i := range grade {
		n := 0.0
		for j := max(0, i-roundOffM/2); j < min(len(grade), i+roundOffM/2); j++ {
			smooth[i] += grade[j]
			n++
		}
		smooth[i] /= n
	}
	return smooth, bearing
}
