package hill

import (
	"fmt"
	"math"
	"strings"
	"testing"
)

// recording writes a GPX file of n points, as recorders do: one a second, 5 m
// apart, on a winding way over hills.
func recording(n int) string {
	var b strings.Builder
	b.WriteString(`<?xml version="1.0" encoding="UTF-8"?><gpx version="1.1" xmlns="http://www.topografix.com/GPX/1/1"><trk><name>long</name><trkseg>` + "\n")
	lat, lon := 47.0, 8.0
	for i := range n {
		heading := 0.5 * math.Sin(float64(i)/200)
		lat += 5 * math.Cos(heading) / 111_170
		lon += 5 * math.Sin(heading) / 75_950
		if lat > 80 {
			lat = -80
		}
		h := 600 + 100*math.Sin(float64(i)/500) + 0.3*math.Sin(float64(i)*1.7)
		fmt.Fprintf(&b, "<trkpt lat=\"%.7f\" lon=\"%.7f\"><ele>%.1f</ele><time>2024-05-%02dT%02d:%02d:%02dZ</time></trkpt>\n", lat, lon, h, 1+i/86400, i/3600%24, i/60%60, i%60)
	}
	b.WriteString("</trkseg></trk></gpx>\n")
	return b.String()
}

var sizes = []struct {
	name string
	n    int
}{{"1k", 1000}, {"10k", 10_000}, {"100k", 100_000}}

func BenchmarkReadTrack(b *testing.B) {
	for _, size := range sizes {
		text := recording(size.n)
		b.Run(size.name, func(b *testing.B) {
			b.SetBytes(int64(len(text)))
			b.ReportAllocs()
			for b.Loop() {
				if _, err := ReadTrack(strings.NewReader(text), nil); err != nil {
					b.Fatal(err)
				}
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(size.n), "ns/point")
		})
	}
}

func BenchmarkFromTrack(b *testing.B) {
	for _, size := range sizes {
		t, err := ReadTrack(strings.NewReader(recording(size.n)), nil)
		if err != nil {
			b.Fatal(err)
		}
		b.Run(size.name, func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				if _, err := FromTrack(&t, Options{}); err != nil {
					b.Fatal(err)
				}
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(size.n), "ns/point")
		})
	}
}

func BenchmarkParseSections(b *testing.B) {
	for _, n := range []int{1, 10, 100, 1000} {
		text := strings.Repeat("400 m at 7,5 %, ", n)
		b.Run(fmt.Sprint(n), func(b *testing.B) {
			for b.Loop() {
				if _, err := ParseSections(text); err != nil {
					b.Fatal(err)
				}
			}
			b.ReportMetric(float64(b.Elapsed().Nanoseconds())/float64(b.N)/float64(n), "ns/section")
		})
	}
}
