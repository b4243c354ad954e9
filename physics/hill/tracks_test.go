package hill

import (
	"bytes"
	"math"
	"os"
	"strconv"
	"strings"
	"testing"
)

// packaged opens a file of a package that `npm ci` in testdata/ installs.
func packaged(t *testing.T, name string) []byte {
	t.Helper()
	raw, err := os.ReadFile("../../testdata/node_modules/" + name)
	if err != nil {
		const advice = ": the test packages are not installed; run `npm ci --ignore-scripts` in testdata/"
		if os.Getenv("HILLWRIGHT_FULL") == "1" {
			t.Fatal(name + advice)
		}
		t.Skip(name + advice)
	}
	return raw
}

// Real recordings against an independent parser and an independent geodesic
// library. Source: testdata/tracks/reference.tsv, made by reference.py beside it.
func TestRecordedTracks(t *testing.T) {
	for _, row := range readTable(t, "../../testdata/tracks/reference.tsv") {
		t.Run(row[0], func(t *testing.T) {
			v := numbers(t, row[2:])
			segments, points, length, ascent, steadyAscent := int(v[0]), int(v[1]), v[2], v[3], v[4]
			tr, err := ReadTrack(bytes.NewReader(packaged(t, row[0])), nil)
			if err != nil {
				t.Fatal(err)
			}
			if tr.Name != row[1] || len(tr.SegmentStart) != segments || len(tr.Points) != points {
				t.Errorf("read %q, %d segments, %d points; want %q, %d, %d", tr.Name, len(tr.SegmentStart), len(tr.Points), row[1], segments, points)
			}
			if got := tr.RawLengthM(); math.Abs(got-length) > 0.002+1e-6*length {
				t.Errorf("raw length %.3f m, want %.3f", got, length)
			}
			if got := tr.RawAscentM(); math.Abs(got-ascent) > 0.002 {
				t.Errorf("raw ascent %.3f m, want %.3f", got, ascent)
			}
			p := mustProfile(t, &tr)
			sound(t, &p)
			// The road is as long as the recording, but for what standing still
			// adds and what the third dimension does.
			if off := p.LengthM()/length - 1; math.Abs(off) > 0.012 {
				t.Errorf("length along the road %.1f m, recording %.1f: off by %.2f %%", p.LengthM(), length, 100*off)
			}
			// Smoothing must stay between what noise adds and what a 5 m
			// hysteresis leaves.
			if got := p.AscentM(); got < steadyAscent || got > ascent {
				t.Errorf("ascent %.1f m, want %.1f (steps of 5 m) to %.1f (every point)", got, steadyAscent, ascent)
			}
			t.Logf("length %.1f of %.1f m, ascent %.1f m (%.1f to %.1f), notes %v", p.LengthM(), length, p.AscentM(), steadyAscent, ascent, p.Notes)
		})
	}
}

// The same recording converted to GeoJSON by another program is as long.
func TestGeoJSONOfARecording(t *testing.T) {
	gpx, err := ReadTrack(bytes.NewReader(packaged(t, "togeojson/test/data/blue_hills.gpx")), nil)
	if err != nil {
		t.Fatal(err)
	}
	json, err := ReadTrack(bytes.NewReader(packaged(t, "togeojson/test/data/blue_hills.geojson")), nil)
	if err != nil {
		t.Fatal(err)
	}
	// The converter dropped the one segment of a single point.
	if a, b := gpx.RawLengthM(), json.RawLengthM(); gpx.Name != json.Name || math.Abs(a-b) > 1e-6*a {
		t.Errorf("GPX %q, %.3f m; GeoJSON %q, %.3f m", gpx.Name, a, json.Name, b)
	}
}

// A long route in GeoJSON. Source: the sum of npm geographiclib-geodesic 2.2.0
// over the file's lines: 12,488 points, 557,116.384 m, raw ascent 29,031.79 m.
// Each of the 11 lines begins where the one before it ends, so ten points come
// twice. Its heights are rough: every seventh leg is steeper than 30 %.
func TestLongGeoJSON(t *testing.T) {
	raw := packaged(t, "leaflet.heightgraph/example/data_3.js")
	raw = raw[bytes.IndexByte(raw, '['):]
	tr, err := ReadTrack(bytes.NewReader(raw), nil)
	if err != nil {
		t.Fatal(err)
	}
	if len(tr.Points) != 12_478 || math.Abs(tr.RawLengthM()-557_116.384) > 0.01 || math.Abs(tr.RawAscentM()-29_031.79) > 0.01 {
		t.Errorf("%d points, %.3f m, ascent %.2f m", len(tr.Points), tr.RawLengthM(), tr.RawAscentM())
	}
	p := mustProfile(t, &tr)
	sound(t, &p)
	if off := p.LengthM()/557_116 - 1; off < 0 || off > 0.03 || len(p.Grade) > mostPieces {
		t.Errorf("%.1f km in %d pieces", p.LengthM()/1000, len(p.Grade))
	}
	if p.AscentM() > tr.RawAscentM() {
		t.Errorf("ascent %.0f m, more than the %.0f m of every point", p.AscentM(), tr.RawAscentM())
	}
	last := tr.Points[len(tr.Points)-1].HeightM
	if got := p.HeightM[len(p.Grade)]; math.Abs(got-last) > 15 {
		t.Errorf("ends at %.1f m, recording %.1f m", got, last)
	}
	t.Logf("%.1f km, ascent %.0f m of raw %.0f m, %d pieces", p.LengthM()/1000, p.AscentM(), tr.RawAscentM(), len(p.Grade))
}

// A recording that is thinned or read twice as dense keeps its ascent: within
// 6 % at half the points, as ascent must not grow with sampling.
func TestAscentDoesNotGrowWithSampling(t *testing.T) {
	var dense Track
	const every = 1.0
	for x := 0.0; x < 5000; x += every {
		h := 300 + 40*math.Sin(x/300) + 0.25*math.Sin(x*12.9898)*math.Sin(x*78.233)*2
		dense.Points = append(dense.Points, Point{LatDeg: 47 + x/111_170, LonDeg: 8, HeightM: h, TimeS: x / 4})
	}
	dense.SegmentStart = []int{0}
	p := mustProfile(t, &dense)
	want := p.AscentM()
	if truth := 40 * 2 * 5000 / (2 * math.Pi * 300.0); math.Abs(want/truth-1) > 0.15 {
		t.Errorf("ascent %.1f m, want about %.1f", want, truth)
	}
	for _, step := range []int{2, 5, 10} {
		thin := Track{SegmentStart: []int{0}}
		for i := 0; i < len(dense.Points); i += step {
			thin.Points = append(thin.Points, dense.Points[i])
		}
		q := mustProfile(t, &thin)
		if off := q.AscentM()/want - 1; math.Abs(off) > 0.03 {
			t.Errorf("every %d m: ascent %.1f m, every metre %.1f m: off by %.1f %%", step, q.AscentM(), want, 100*off)
		}
		if raw := dense.RawAscentM(); raw < 1.5*want {
			t.Errorf("the test has no noise: raw ascent %.1f m", raw)
		}
	}
}

func TestReferenceTableIsWhole(t *testing.T) {
	rows := readTable(t, "../../testdata/tracks/reference.tsv")
	if len(rows) < 6 {
		t.Fatalf("%d rows, want 6 or more", len(rows))
	}
	for _, row := range rows {
		if len(row) != 7 || strings.TrimSpace(row[0]) == "" {
			t.Errorf("odd row %v", row)
		}
		if _, err := strconv.ParseFloat(row[6], 64); err != nil {
			t.Error(err)
		}
	}
}
