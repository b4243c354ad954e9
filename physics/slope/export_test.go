package slope

import (
	"bytes"
	"encoding/csv"
	"encoding/xml"
	"math"
	"strings"
	"testing"
	"time"
	"unicode/utf8"

	"hillwright/physics/hill"
	"hillwright/physics/unit"
)

var nowhere = hill.Point{LatDeg: math.NaN(), LonDeg: math.NaN(), HeightM: math.NaN(), TimeS: math.NaN()}

func pitch(grade, lengthM float64, at hill.Point) Entry {
	return Entry{
		Reading: Reading{Grade: unit.Grade(grade), Error: 0.004, Method: ByTurnedTilt},
		Place:   "Mill lane", TimeS: 1715096864.5, Pitch: Measured{lengthM, 0.02 * lengthM}, At: at,
	}
}

func place(lat, lon, h float64) hill.Point {
	return hill.Point{LatDeg: lat, LonDeg: lon, HeightM: h, TimeS: math.NaN()}
}

func TestHillOfReadings(t *testing.T) {
	entries := []Entry{pitch(0.07, 400, nowhere), pitch(0.18, 60, nowhere)}
	p, err := Hill("Mill lane", entries)
	if err != nil {
		t.Fatal(err)
	}
	want := must(hill.ParseSections("400m@7%,60m@18%"))
	if p.Name != "Mill lane" || p.HeightKnown || hill.FormatSections(&p) != hill.FormatSections(&want) {
		t.Errorf("got %s, known %v", hill.FormatSections(&p), p.HeightKnown)
	}
	entries[0].At.HeightM = 412
	if p, _ = Hill("", entries); !p.HeightKnown || p.HeightM[0] != 412 {
		t.Errorf("the foot's height is lost: %v", p.HeightM)
	}
	entries[1].Pitch, entries[1].LengthM = Measured{}, 63
	if p, _ = Hill("", entries); p.LengthM() != 463 {
		t.Errorf("the reading's own length: %v", p.LengthM())
	}
	entries[1].LengthM = 0
	_, err = Hill("", entries)
	refused(t, "no length", err, NoLength)
	_, err = Hill("", nil)
	refused(t, "none", err, NotEnough)
	_, err = Hill("", []Entry{pitch(0.1, 600e3, nowhere)})
	refused(t, "600 km", err, OutOfRange)
}

func TestCSVThroughTheStandardLibrary(t *testing.T) {
	e := pitch(0.1234567, 60.25, place(47.1, 8.5, 412.3))
	e.Place, e.Note = "Mill lane, \"upper\" end", "wet\r\nleaves"
	unknown := pitch(-0.05, 0, nowhere)
	unknown.TimeS, unknown.Note = math.NaN(), " kept blanks "
	text := CSV([]Entry{e, unknown})
	rows, err := csv.NewReader(bytes.NewReader(text)).ReadAll()
	if err != nil {
		t.Fatal(err)
	}
	want := [][]string{
		csvHead,
		{"2024-05-07T15:47:44.500Z", "Mill lane, \"upper\" end", "12.3457", "0.4", "tilt-turned", "60.25", "1.205", "47.1", "8.5", "412.3", "wet\nleaves"},
		{"", "Mill lane", "-5", "0.4", "tilt-turned", "", "", "", "", "", " kept blanks "},
	}
	for i := range want {
		if strings.Join(rows[i], "|") != strings.Join(want[i], "|") {
			t.Errorf("row %d:\n got %q\nwant %q", i, rows[i], want[i])
		}
	}
	if !bytes.HasSuffix(text, []byte("\r\n")) {
		t.Error("the last line has no end")
	}
}

// back reads a file of GPX as the program reads any track.
func back(t *testing.T, file []byte) (hill.Track, hill.Profile) {
	t.Helper()
	track, err := hill.ReadTrack(bytes.NewReader(file), nil)
	if err != nil {
		t.Fatalf("%v\n%s", err, file)
	}
	return track, must(hill.FromTrack(&track, hill.Options{}))
}

func TestGPXComesBack(t *testing.T) {
	for _, c := range []struct {
		name    string
		entries []Entry
	}{
		{"places not known", []Entry{pitch(0.07, 400, nowhere), pitch(0.18, 120, nowhere), pitch(-0.04, 200, nowhere)}},
		{"the first known", []Entry{pitch(0.07, 400, place(47.1, 8.5, 412)), pitch(0.18, 120, nowhere)}},
		{"all known, turning", []Entry{pitch(0.07, 400, place(47.1, 8.5, 412)), pitch(0.18, 120, place(47.1, 8.505267, 440)), pitch(0.1, 200, place(47.101, 8.5053, 460))}},
		{"the last known", []Entry{pitch(0.07, 400, nowhere), pitch(0.12, 120, place(-33.2, -70.5, 900))}},
		{"across the date line", []Entry{pitch(0.07, 400, place(52, 179.999, 20)), pitch(0.12, 120, place(52, -179.996, 48))}},
		{"far north", []Entry{pitch(0.05, 300, place(88.9, 10, 20))}},
	} {
		want := must(Hill("Mill & lane <1>", c.entries))
		file := must(GPX("Mill & lane <1>", "made of readings", c.entries))
		track, got := back(t, file)
		if track.Name != want.Name {
			t.Errorf("%s: name %q", c.name, track.Name)
		}
		if math.Abs(got.LengthM()/want.LengthM()-1) > 0.002 {
			t.Errorf("%s: %v m, want %v m", c.name, got.LengthM(), want.LengthM())
		}
		level := 0.0
		for i, g := range want.Grade {
			level += (want.EdgeM[i+1] - want.EdgeM[i]) * g.Cos()
		}
		walked, steepest := 0.0, 0.0
		for i := 1; i < len(track.Points); i++ {
			d := hill.Apart(track.Points[i-1], track.Points[i])
			walked += d
			steepest = max(steepest, d)
		}
		if math.Abs(walked/level-1) > 1e-5 || steepest > gpxEveryM+1e-3 {
			t.Errorf("%s: points go %v m, want %v m level; steps up to %v m", c.name, walked, level, steepest)
		}
		first, last := track.Points[0], track.Points[len(track.Points)-1]
		n := len(want.HeightM) - 1
		if math.Abs(last.HeightM-first.HeightM-(want.HeightM[n]-want.HeightM[0])) > 0.002 {
			t.Errorf("%s: rises %v m, want %v m", c.name, last.HeightM-first.HeightM, want.HeightM[n]-want.HeightM[0])
		}
		for i := range want.Grade { // the grade amid each piece
			mid := (want.EdgeM[i] + want.EdgeM[i+1]) / 2
			if g := got.GradeAt(mid); math.Abs(float64(g-want.Grade[i])) > 0.01 {
				t.Errorf("%s: piece %d has %v, want %v", c.name, i, g, want.Grade[i])
			}
		}
		for i, e := range c.entries[:1] {
			if e.placed() && hill.Apart(e.At, track.Points[i]) > 0.01 {
				t.Errorf("%s: begins %v m from where it should", c.name, hill.Apart(e.At, track.Points[i]))
			}
		}
	}
}

// The second place lies where the first pitch ends when they fit.
func TestGPXLeadsToTheNextPlace(t *testing.T) {
	from := place(47.1, 8.5, 400)
	level := 400 * unit.Grade(0.07).Cos()
	to := moved(from, 1.1, level)
	entries := []Entry{pitch(0.07, 400, from), pitch(0.18, 120, to)}
	track, _ := back(t, must(GPX("", "", entries)))
	if off := hill.Apart(track.Points[40], to); off > 0.05 {
		t.Errorf("the first pitch ends %v m beside the second's begin", off)
	}
}

// gpxFile is the part of GPX 1.1 that is written, read by the standard library.
type gpxFile struct {
	XMLName xml.Name `xml:"http://www.topografix.com/GPX/1/1 gpx"`
	Version string   `xml:"version,attr"`
	Creator string   `xml:"creator,attr"`
	Wpt     []struct {
		Lat  float64   `xml:"lat,attr"`
		Lon  float64   `xml:"lon,attr"`
		Time time.Time `xml:"time"`
		Name string    `xml:"name"`
		Cmt  string    `xml:"cmt"`
		Desc string    `xml:"desc"`
	} `xml:"wpt"`
	Trk []struct {
		Name string `xml:"name"`
		Desc string `xml:"desc"`
		Seg  []struct {
			Pt []struct {
				Ele float64 `xml:"ele"`
			} `xml:"trkpt"`
		} `xml:"trkseg"`
	} `xml:"trk"`
}

func TestGPXThroughTheStandardLibrary(t *testing.T) {
	e := pitch(0.12, 100, place(47.1, 8.5, 412))
	e.Place, e.Note = "Ünter & <\"Über\">", "a\x00b\x1f\nc\uFFFEd\xffe ]]> f"
	var f gpxFile
	if err := xml.Unmarshal(must(GPX("n", "d & d", []Entry{e, pitch(0.1, 50, nowhere)})), &f); err != nil {
		t.Fatal(err)
	}
	if f.Version != "1.1" || f.Creator == "" || len(f.Wpt) != 1 || len(f.Trk) != 1 || len(f.Trk[0].Seg) != 1 || len(f.Trk[0].Seg[0].Pt) != 16 {
		t.Fatalf("got %+v", f)
	}
	w := f.Wpt[0]
	if w.Name != e.Place || w.Cmt != "a\uFFFDb\uFFFD\nc\uFFFDd\uFFFDe ]]> f" || w.Desc != "12 % ± 0.86 %" || w.Lat != 47.1 || w.Lon != 8.5 {
		t.Errorf("waypoint %+v", w)
	}
	if want := time.UnixMilli(1715096864500); !w.Time.Equal(want) {
		t.Errorf("time %v, want %v", w.Time, want)
	}
	if f.Trk[0].Desc != "d & d" || f.Trk[0].Seg[0].Pt[0].Ele != 412 {
		t.Errorf("track %+v", f.Trk[0])
	}
}

func TestDateAgainstTheStandardLibrary(t *testing.T) {
	for s := int64(-62135596799); s < latestS; s += 86399*37 + 11 {
		if got, want := dateTime(float64(s)), time.Unix(s, 0).UTC().Format("2006-01-02T15:04:05Z"); got != want {
			t.Fatalf("%d: %s, want %s", s, got, want)
		}
	}
	for _, c := range []struct {
		s    float64
		want string
	}{{math.NaN(), ""}, {math.Inf(1), ""}, {1e18, ""}, {-1e18, ""}, {-0.25, "1969-12-31T23:59:59.750Z"}, {951782400, "2000-02-29T00:00:00Z"}} {
		if got := dateTime(c.s); got != c.want {
			t.Errorf("%v: %q, want %q", c.s, got, c.want)
		}
	}
}

func FuzzExport(f *testing.F) {
	f.Add("Mill lane", "wet, \"slick\"\r\n", 0.12, 60.0, 47.1, 8.5, 412.0, 1.7e9)
	f.Add("<a&b>]]>", "\x00\xff", -0.3, 1.0, 88.99, -180.0, -5.0, -1e12)
	f.Add("=1+1", " ", 0.0, 1e5, math.NaN(), 1.0, math.Inf(1), math.NaN())
	f.Fuzz(func(t *testing.T, name, note string, grade, length, lat, lon, height, timeS float64) {
		if length > 2000 { // a track of 500 km takes a second to write and read
			length = math.Mod(length, 2000)
		}
		e := pitch(grade, length, place(lat, lon, height))
		e.Place, e.Note, e.TimeS = name, note, timeS
		entries := []Entry{e, pitch(0.1, 30, nowhere), e}
		r := csv.NewReader(bytes.NewReader(CSV(entries)))
		rows, err := r.ReadAll()
		if err != nil || len(rows) != 4 || len(rows[1]) != len(csvHead) {
			t.Fatalf("CSV does not come back: %v, %q", err, rows)
		}
		// The standard library reads \r\n within quotes as \n.
		if want := strings.ReplaceAll(name, "\r\n", "\n"); rows[1][1] != want {
			t.Fatalf("place %q came back as %q", want, rows[1][1])
		}
		if strings.Contains(strings.Join(rows[1][2:], ""), "NaN") && !strings.Contains(note, "NaN") {
			t.Fatal("NaN in the table")
		}
		file, err := GPX(name, note, entries)
		if err != nil {
			return
		}
		var got gpxFile
		if !utf8.Valid(file) {
			t.Fatal("GPX is not UTF-8")
		}
		d := xml.NewDecoder(bytes.NewReader(file))
		if err := d.Decode(&got); err != nil && !strings.Contains(err.Error(), "year outside") {
			t.Fatalf("GPX does not come back: %v", err)
		}
		track, err := hill.ReadTrack(bytes.NewReader(file), nil)
		if err != nil {
			t.Fatalf("GPX is no track: %v", err)
		}
		for _, p := range track.Points {
			if !(math.Abs(p.LatDeg) <= 90 && math.Abs(p.LonDeg) <= 180) || math.IsInf(p.HeightM, 0) {
				t.Fatalf("point %+v", p)
			}
		}
	})
}
