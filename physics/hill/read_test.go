package hill

import (
	"errors"
	"io"
	"math"
	"strconv"
	"strings"
	"testing"
	"testing/iotest"
	"unicode/utf16"
)

const smallGPX = `<?xml version="1.0" encoding="UTF-8"?>
<!-- made by hand -> > -- -->
<gpx version="1.1" creator="a test" xmlns="http://www.topografix.com/GPX/1/1" xmlns:x="urn:x">
 <metadata><name>The file</name><time>2024-01-01T00:00:00Z</time></metadata>
 <wpt lat="1" lon="2"><ele>9</ele><name>Not this</name></wpt>
 <trk><name><![CDATA[School & ]]>hill &#65;&amp;&#x42;</name>
  <trkseg>
   <trkpt lat="47.0000" lon='8.0000'><ele>400.5</ele><time>2024-05-01T10:00:00Z</time></trkpt>
   <trkpt lon="8.0010" lat="47.0000" ><time>2024-05-01T10:00:10.25Z</time><extensions><x:ele>77</x:ele><ele>78</ele></extensions></trkpt>
   <trkpt lat="47.0000" lon="8.0020"><ele> 4.025e2 </ele><time>2024-05-01T12:00:20+02:00</time></trkpt>
  </trkseg>
  <trkseg/>
  <trkseg><trkpt lat="47.0000" lon="8.0030"/><trkpt lat="47.0000" lon="8.0040"><ele>404</ele></trkpt></trkseg>
 </trk>
</gpx>
`

func read(text string) (Track, error) { return ReadTrack(strings.NewReader(text), nil) }

func TestReadSmallGPX(t *testing.T) {
	readers := map[string]io.Reader{
		"at once":       strings.NewReader(smallGPX),
		"byte by byte":  iotest.OneByteReader(strings.NewReader(smallGPX)),
		"data with EOF": iotest.DataErrReader(strings.NewReader(smallGPX)),
		"with BOM":      strings.NewReader("\ufeff" + smallGPX),
		"UTF-16LE":      strings.NewReader(inUTF16(smallGPX, false)),
		"UTF-16BE":      strings.NewReader(inUTF16(smallGPX, true)),
		"prefixed":      strings.NewReader(prefixed(smallGPX)),
		"odd UTF-16":    iotest.OneByteReader(strings.NewReader(inUTF16(smallGPX, true))),
	}
	for name, r := range readers {
		tr, err := ReadTrack(r, nil)
		if err != nil {
			t.Errorf("%s: %v", name, err)
			continue
		}
		nan := math.NaN()
		want := []Point{{47, 8, 400.5, 1714557600}, {47, 8.001, nan, 1714557610.25}, {47, 8.002, 402.5, 1714557620}, {47, 8.003, nan, nan}, {47, 8.004, 404, nan}}
		if tr.Name != "School & hill A&B" {
			t.Errorf("%s: name %q", name, tr.Name)
		}
		if len(tr.SegmentStart) != 2 || tr.SegmentStart[0] != 0 || tr.SegmentStart[1] != 3 {
			t.Errorf("%s: segments %v, want [0 3]", name, tr.SegmentStart)
		}
		if len(tr.Points) != len(want) {
			t.Errorf("%s: %d points, want %d", name, len(tr.Points), len(want))
			continue
		}
		for i, w := range want {
			p := tr.Points[i]
			if p.LatDeg != w.LatDeg || p.LonDeg != w.LonDeg || !alike(p.HeightM, w.HeightM) || !alike(p.TimeS, w.TimeS) {
				t.Errorf("%s: point %d is %v, want %v", name, i, p, w)
			}
		}
	}
}

func alike(a, b float64) bool { return a == b || math.IsNaN(a) && math.IsNaN(b) }

func inUTF16(s string, big bool) string {
	var b strings.Builder
	for _, u := range utf16.Encode([]rune("\ufeff" + s)) {
		if big {
			b.WriteByte(byte(u >> 8))
		}
		b.WriteByte(byte(u))
		if !big {
			b.WriteByte(byte(u >> 8))
		}
	}
	return b.String()
}

func prefixed(s string) string {
	return strings.NewReplacer("<gpx", "<g:gpx xmlns:g='urn:g'", "</gpx", "</g:gpx", "<trk", "<g:trk", "</trk", "</g:trk", "<ele", "<g:ele", "</ele", "</g:ele", "<name", "<g:name", "</name", "</g:name", "<time", "<g:time", "</time", "</g:time").Replace(s)
}

// points writes n track points 10 m apart going north from a latitude.
func points(element string, n int, lat float64) string {
	var b strings.Builder
	for i := range n {
		b.WriteString("<" + element + ` lat="` + strconv.FormatFloat(lat+float64(i)*9e-5, 'f', 7, 64) + `" lon="8"><ele>` + strconv.Itoa(400+i/10) + "</ele></" + element + ">\n")
	}
	return b.String()
}

func TestWhichTrackIsTaken(t *testing.T) {
	trk := func(name string, n int) string {
		return "<trk><name>" + name + "</name><trkseg>" + points("trkpt", n, 47) + "</trkseg></trk>"
	}
	rte := func(name string, n int) string {
		return "<rte><name>" + name + "</name>" + points("rtept", n, 47) + "</rte>"
	}
	for _, c := range []struct {
		name, body, want string
		others           int
	}{
		{"the first of two long ones", trk("a", 80) + trk("b", 100), "a", 1},
		{"a scrap first", trk("a", 5) + trk("b", 100), "b", 1},
		{"a longer route", rte("r", 100) + trk("a", 50), "a", 0},
		{"routes only", rte("r", 3) + rte("s", 100), "s", 1},
		{"an empty track", trk("a", 0) + trk("b", 2), "b", 0},
		{"a track of one point and a route", trk("a", 1) + rte("r", 20), "r", 0},
		{"no name of its own", "<name>file</name>" + trk("", 20), "file", 0},
		{"GPX 1.0", "<name>file</name><time>2001-01-01T00:00:00Z</time><bounds minlat='1'/>" + trk("a", 20), "a", 0},
	} {
		tr, err := read("<gpx>" + c.body + "</gpx>")
		if err != nil || tr.Name != c.want || tr.Others != c.others {
			t.Errorf("%s: got %q, %d others, %v; want %q, %d", c.name, tr.Name, tr.Others, err, c.want, c.others)
		}
	}
}

func TestLatin1Name(t *testing.T) {
	tr, err := read("<?xml version='1.0' encoding='ISO-8859-1'?><gpx><trk><name>M\xfchlenweg</name><trkseg>" + points("trkpt", 9, 47) + "</trkseg></trk></gpx>")
	if err != nil || tr.Name != "M\u00fchlenweg" {
		t.Errorf("name %q, %v", tr.Name, err)
	}
}

func TestNameInUTF16(t *testing.T) {
	const name = "M\u00fchle \U0001F6B2"
	tr, err := read(inUTF16("<gpx><trk><name>"+name+"</name><trkseg>"+points("trkpt", 9, 47)+"</trkseg></trk></gpx>", false))
	if err != nil || tr.Name != name {
		t.Errorf("name %q, %v", tr.Name, err)
	}
}

func TestWrongFilesAreTold(t *testing.T) {
	bomb := `<?xml version="1.0"?><!DOCTYPE lolz [<!ENTITY a "aaaaaaaaaa"><!ENTITY b "&a;&a;&a;&a;&a;&a;&a;&a;&a;&a;">]><gpx>&b;</gpx>`
	pt := `<trkpt lat="47" lon="8"></trkpt><trkpt lat="47.01" lon="8"></trkpt>`
	for _, c := range []struct {
		name, text string
		kind       TrackErrorKind
		looks      FileLook
		says       string
	}{
		{"empty", "", TrackEmpty, 0, "empty"},
		{"blank", " \n ", TrackEmpty, 0, "empty"},
		{"only a BOM", "\ufeff", TrackEmpty, 0, "empty"},
		{"FIT", "\x0e\x10\xd9\x07\x00\x00\x00\x00.FIT\x00\x00", TrackWrongFile, LooksFIT, "FIT"},
		{"ZIP", "PK\x03\x04\x14\x00", TrackWrongFile, LooksZIP, "ZIP"},
		{"JPEG", "\xff\xd8\xff\xe0\x00\x10JFIF", TrackWrongFile, LooksJPEG, "JPEG"},
		{"PNG", "\x89PNG\r\n\x1a\n", TrackWrongFile, LooksPNG, "PNG"},
		{"PDF", "%PDF-1.7", TrackWrongFile, LooksPDF, "PDF"},
		{"gzip", "\x1f\x8b\x08", TrackWrongFile, LooksGzip, "gzip"},
		{"web page", "<!DOCTYPE html><html><body>", TrackWrongFile, LooksHTML, "web page"},
		{"old web page", "<!doctype HTML PUBLIC \"-//W3C\">", TrackWrongFile, LooksHTML, "web page"},
		{"web page without a type", "<HTML><head>", TrackWrongFile, LooksHTML, "web page"},
		{"KML", "<?xml version='1.0'?><kml xmlns='x'><Document/></kml>", TrackWrongFile, LooksKML, "KML"},
		{"TCX", "<TrainingCenterDatabase><Activities/></TrainingCenterDatabase>", TrackWrongFile, LooksTCX, "TCX"},
		{"other XML", "<svg/>", TrackWrongFile, LooksXML, "XML"},
		{"text", "lat,lon\n47,8\n", TrackWrongFile, LooksText, "plain text"},
		{"bytes", "\x00\x01\x02", TrackWrongFile, LooksUnknown, "not known"},
		{"JSON", `{"a": [1, 2, {"b": null}], "c": true}`, TrackWrongFile, LooksJSON, "JSON"},
		{"entity bomb", bomb, TrackDoctype, 0, "entities"},
		{"a document type of GPX", "<!DOCTYPE gpx SYSTEM 'gpx.dtd'><gpx/>", TrackDoctype, 0, "document type"},
		{"no track", "<gpx><wpt lat='1' lon='2'/></gpx>", TrackNoPoints, 0, "two points"},
		{"one point", "<gpx><trk><trkseg><trkpt lat='1' lon='2'/></trkseg></trk></gpx>", TrackNoPoints, 0, "two points"},
		{"latitude of 91", "<gpx><trk><trkseg>" + pt + "\n<trkpt lat='91' lon='2'/></trkseg></trk></gpx>", TrackBadPlace, 0, `line 2: expected a latitude from -90 to 90 and a longitude from -180 to 180, got lat="91"`},
		{"no longitude", "<gpx><trk><trkseg><trkpt lat='9'/></trkseg></trk></gpx>", TrackBadPlace, 0, `lon=""`},
		{"decimal comma", "<gpx><trk><trkseg><trkpt lat='9,5' lon='8'/></trkseg></trk></gpx>", TrackBadPlace, 0, `"9,5"`},
		{"no number", "<gpx><trk><trkseg><trkpt lat='NaN' lon='8'/></trkseg></trk></gpx>", TrackBadPlace, 0, `"NaN"`},
		{"crossed tags", "<gpx><trk><trkseg>" + pt + "</trk></trkseg></gpx>", TrackBroken, 0, "2 points were read"},
		{"a closing tag too many", "<gpx></trk></gpx>", TrackBroken, 0, "</trk>"},
		{"attribute without quotes", "<gpx version=1></gpx>", TrackBroken, 0, "quotes"},
		{"deep nesting", "<gpx>" + strings.Repeat("<a>", 2000), TrackBroken, 0, "too deep"},
		{"deep JSON", strings.Repeat("[", 5000), TrackBroken, 0, "too deep"},
		{"deep coordinates", `{"coordinates":` + strings.Repeat("[", 5000), TrackBroken, 0, "too deep"},
		{"cut off", "<gpx><trk>\n<trkseg>" + pt + "<trkpt lat='4", TrackCutOff, 0, "line 2: the file ends in the middle; 2 points were read"},
		{"JSON cut off", `{"type":"LineString","coordinates":[[8,47],[8.1,47],[8.2,`, TrackCutOff, 0, "2 points were read"},
		{"broken JSON", `{"type" "LineString"}`, TrackBroken, 0, "colon"},
		{"JSON place", `{"type":"LineString","coordinates":[[8,97],[8.1,47]]}`, TrackBadPlace, 0, "latitude 97"},
	} {
		_, err := read(c.text)
		var e *TrackError
		if !errors.As(err, &e) {
			t.Errorf("%s: %v, want a *TrackError", c.name, err)
			continue
		}
		if e.Kind != c.kind || e.Looks != c.looks || !strings.Contains(e.Error(), c.says) {
			t.Errorf("%s: kind %d, looks %d, %q; want kind %d, looks %d, saying %q", c.name, e.Kind, e.Looks, e.Error(), c.kind, c.looks, c.says)
		}
	}
}

// A file that is cut at any byte is told, with what was read up to there; at
// no cut may more points come out than stand before it.
func TestCutAtEveryByte(t *testing.T) {
	whole := strings.TrimSpace(smallGPX)
	for n := 1; n < len(whole); n++ {
		tr, err := read(whole[:n])
		var e *TrackError
		if !errors.As(err, &e) || e.Kind != TrackCutOff {
			t.Fatalf("cut at %d (%q): %v", n, whole[max(0, n-20):n], err)
		}
		if most := strings.Count(whole[:n], "</trkpt>") + strings.Count(whole[:n], `8.0030"/>`); e.Points != most {
			t.Fatalf("cut at %d: %d points, want %d", n, e.Points, most)
		}
		if e.Points >= 2 && len(tr.Points) != e.Points {
			t.Fatalf("cut at %d: the track has %d points, want %d", n, len(tr.Points), e.Points)
		}
	}
	line := `{"type":"Feature","geometry":{"type":"LineString","coordinates":[[8,47,400],[8.001,47,410],[8.002,47,405]]},"properties":{"name":"x"}}`
	for n := 1; n < len(line); n++ {
		if _, err := read(line[:n]); err == nil {
			t.Fatalf("JSON cut at %d passes", n)
		}
	}
}

// endless gives one text for ever.
type endless struct {
	head, body string
	read       int64
}

func (e *endless) Read(p []byte) (int, error) {
	n := copy(p, e.head)
	e.head = e.head[n:]
	for n < len(p) {
		m := copy(p[n:], e.body[e.read%int64(len(e.body)):])
		n += m
		e.read += int64(m)
	}
	return n, nil
}

func TestTooMuchIsRefused(t *testing.T) {
	for _, c := range []struct {
		name, head, body string
		kind             TrackErrorKind
	}{
		{"endless points", "<gpx><trk><trkseg>", `<trkpt lat="47" lon="8"/>`, TrackTooManyPoints},
		{"endless comment", "<gpx><!--", "- blah ", TrackTooLarge},
		{"endless name", "<gpx><trk><name>", "blah ", TrackTooLarge},
		{"endless attribute", "<gpx a='", "blah ", TrackTooLarge},
		{"endless attributes", "<gpx", " a='b'", TrackBroken},
		{"endless tag", "<", "gpx", TrackBroken},
		{"endless CDATA", "<gpx><trk><name><![CDATA[", "]>]", TrackTooLarge},
		{"endless entities", "<gpx><trk><name>", "&amp;&#1;", TrackTooLarge},
		{"endless JSON points", `{"coordinates":[[8,47]`, ",[8,47]", TrackTooManyPoints},
		{"endless JSON text", `{"name":"`, "blah", TrackTooLarge},
		{"endless JSON number", `[1`, "1", TrackTooLarge},
		{"endless blanks", "", " ", TrackTooLarge},
	} {
		_, err := ReadTrack(&endless{head: c.head, body: strings.Repeat(c.body, 1000)}, nil)
		var e *TrackError
		if !errors.As(err, &e) || e.Kind != c.kind {
			t.Errorf("%s: %v, want kind %d", c.name, err, c.kind)
		}
	}
}

// A file of 50 MB, most of it extensions, is read; its length is known to the
// reader, so progress goes from 0 to 1 and never back.
func TestFiftyMegabytes(t *testing.T) {
	if testing.Short() {
		t.Skip("50 MB")
	}
	var b strings.Builder
	b.WriteString("<gpx><trk><trkseg>")
	filler := "<extensions>" + strings.Repeat("<x:v>123</x:v>", 50) + "</extensions>"
	n := 0
	for ; b.Len() < 50<<20; n++ {
		b.WriteString(`<trkpt lat="` + strconv.FormatFloat(47+float64(n)*9e-5, 'f', 6, 64) + `" lon="8">` + filler + "</trkpt>")
	}
	b.WriteString("</trkseg></trk></gpx>")
	last := 0.0
	calls := 0
	tr, err := ReadTrack(strings.NewReader(b.String()), func(done float64) bool {
		if done < last || done > 1 {
			t.Errorf("progress goes from %g to %g", last, done)
		}
		last = done
		calls++
		return true
	})
	if err != nil || len(tr.Points) != n {
		t.Fatalf("%d points of %d, %v", len(tr.Points), n, err)
	}
	if calls < 100 || last < 0.99 {
		t.Errorf("progress was told %d times, last %g", calls, last)
	}
}

func TestStoppedAndUnreadable(t *testing.T) {
	_, err := ReadTrack(strings.NewReader(smallGPX), func(float64) bool { return false })
	var e *TrackError
	if !errors.As(err, &e) || e.Kind != TrackCancelled {
		t.Errorf("stopped: %v", err)
	}
	broken := errors.New("the card came out")
	_, err = ReadTrack(io.MultiReader(strings.NewReader("<gpx>"), iotest.ErrReader(broken)), nil)
	if !errors.As(err, &e) || e.Kind != TrackUnreadable || !errors.Is(err, broken) {
		t.Errorf("unreadable: %v", err)
	}
}

func TestReadGeoJSON(t *testing.T) {
	for _, c := range []struct {
		name, text       string
		points, segments int
		height           float64 // of the last point
	}{
		{"bare line", `{"type":"LineString","coordinates":[[8,47,400],[8.001,47,410]]}`, 2, 1, 410},
		{"type comes last", `{"coordinates":[[8,47,400],[8.001,47,410.5,99]],"type":"LineString"}`, 2, 1, 410.5},
		{"without heights", `{"type":"LineString","coordinates":[[8,47],[8.001,47]]}`, 2, 1, math.NaN()},
		{"height of null", `{"type":"LineString","coordinates":[[8,47,1],[8.001,47,null]]}`, 2, 1, math.NaN()},
		{"several lines", `{"type":"MultiLineString","coordinates":[[[8,47,1],[8.001,47,2]],[[8.002,47,3],[8.003,47,4],[8.004,47,5]]]}`, 5, 2, 5},
		{"feature", `{"type":"Feature","properties":{"coordinates":[1,2],"name":"n"},"geometry":{"type":"LineString","coordinates":[[8,47,400],[8.001,47,410]]}}`, 2, 1, 410},
		{"collection whose lines go on", `{"type":"FeatureCollection","features":[
			{"type":"Feature","geometry":{"type":"LineString","coordinates":[[8,47,1],[8.001,47,2]]}},
			{"type":"Feature","geometry":{"type":"Point","coordinates":[8,47]}},
			{"type":"Feature","geometry":{"type":"LineString","coordinates":[[8.001,47,2],[8.002,47,3]]}}]}`, 3, 1, 3},
		{"the longest of two", `[{"type":"LineString","coordinates":[[8,47,1],[8.001,47,2]]},{"type":"LineString","coordinates":[[9,47,1],[9.01,47,7]]}]`, 2, 1, 7},
		{"a polygon is no way", `[{"type":"Polygon","coordinates":[[[8,47],[9,47],[9,48],[8,47]]]},{"type":"LineString","coordinates":[[9,47,1],[9.01,47,7]]}]`, 2, 1, 7},
		{"geometry of null", `[{"geometry":null,"coordinates":null},{"type":"LineString","coordinates":[[9,47,1],[9.01,47,7]]}]`, 2, 1, 7},
	} {
		tr, err := read(c.text)
		if err != nil {
			t.Errorf("%s: %v", c.name, err)
			continue
		}
		if len(tr.Points) != c.points || len(tr.SegmentStart) != c.segments || !alike(tr.Points[len(tr.Points)-1].HeightM, c.height) {
			t.Errorf("%s: %d points, segments %v, last %v", c.name, len(tr.Points), tr.SegmentStart, tr.Points[len(tr.Points)-1])
		}
	}
}

func TestDecimal(t *testing.T) {
	for _, s := range []string{"0", "-0", "1", "-1", "+1.5", "47.1234567", "-121.792390000", "8.786560000000001", "48.058220000000006", "1e2", ".5", "5.", "123456789012345678", "0.1", "0.3"} {
		want, err := strconv.ParseFloat(s, 64)
		if err != nil {
			t.Fatal(err)
		}
		if got, ok := decimal([]byte(s)); !ok || got != want {
			t.Errorf("%s: %g %v, want %g", s, got, ok, want)
		}
	}
	for _, s := range []string{"", "-", ".", "1,5", "NaN", "Inf", "1e999", "0x", "--1", "1.2.3", strings.Repeat("1", 100)} {
		if got, ok := decimal([]byte(s)); ok {
			t.Errorf("%q is read as %g", s, got)
		}
	}
}

func TestClock(t *testing.T) {
	for _, c := range []struct {
		s    string
		want float64
	}{
		{"1970-01-01T00:00:00Z", 0},
		{"2000-02-29T12:00:00Z", 951825600},
		{"2013-05-07T15:47:44.500Z", 1367941664.5},
		{"2013-05-07T17:47:44+02:00", 1367941664},
		{"2013-05-07T10:17:44-05:30", 1367941664},
		{"2013-05-07T15:47:44", 1367941664},
		{"2013-05-07", math.NaN()},
		{"", math.NaN()},
		{"2013-13-07T15:47:44Z", math.NaN()},
		{"20x3-05-07T15:47:44Z", math.NaN()},
	} {
		if got := clock([]byte(c.s)); !alike(got, c.want) {
			t.Errorf("%q: %f, want %f", c.s, got, c.want)
		}
	}
}

func FuzzReadTrack(f *testing.F) {
	f.Add([]byte(smallGPX))
	f.Add([]byte(inUTF16(smallGPX, true)))
	f.Add([]byte(`{"type":"Feature","geometry":{"type":"MultiLineString","coordinates":[[[8,47,400],[8.001,47,410]],[[8.002,47]]]},"properties":{"name":"x"}}`))
	f.Add([]byte("<gpx><rte><name>r</name>" + points("rtept", 30, -89.999) + "</rte></gpx>"))
	f.Add([]byte("<gpx><trk><trkseg><trkpt lat='0' lon='180'><ele>1e4</ele></trkpt><trkpt lat='0' lon='-180'><ele>-1e4</ele></trkpt><trkpt lat='90' lon='0'/></trkseg></trk></gpx>"))
	f.Add([]byte("<!DOCTYPE a [<!ENTITY b 'c'>]><gpx/>"))
	f.Fuzz(func(t *testing.T, file []byte) {
		tr, err := ReadTrack(strings.NewReader(string(file)), nil)
		if err != nil && err.Error() == "" {
			t.Error("an error without words")
		}
		if err == nil && len(tr.Points) < 2 {
			t.Errorf("a track of %d points", len(tr.Points))
		}
		if len(tr.Points) < 2 {
			return
		}
		p, err := FromTrack(&tr, Options{})
		if err == nil {
			sound(t, &p)
		} else if e, ok := err.(*TrackError); !ok || e.Kind != TrackTooShort {
			t.Errorf("a track that was read gives %v", err)
		}
	})
}
