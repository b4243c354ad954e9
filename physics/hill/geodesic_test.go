package hill

import (
	"math"
	"os"
	"strconv"
	"strings"
	"testing"
)

// readTable reads a reference table: a header line, then fields by tabs.
func readTable(t *testing.T, path string) [][]string {
	t.Helper()
	raw, err := os.ReadFile(path)
	if err != nil {
		t.Fatal(err)
	}
	var rows [][]string
	for i, line := range strings.Split(strings.TrimSpace(string(raw)), "\n") {
		if i > 0 {
			rows = append(rows, strings.Split(line, "\t"))
		}
	}
	return rows
}

func numbers(t *testing.T, fields []string) []float64 {
	t.Helper()
	out := make([]float64, len(fields))
	for i, f := range fields {
		v, err := strconv.ParseFloat(f, 64)
		if err != nil {
			t.Fatal(err)
		}
		out[i] = v
	}
	return out
}

// Source: testdata/geodesic, GeodSolve (Karney 2013).
func TestLegAgainstGeodesicLibrary(t *testing.T) {
	rows := readTable(t, "../../testdata/geodesic/short.tsv")
	if len(rows) < 50 {
		t.Fatalf("%d rows, want 50 or more", len(rows))
	}
	for _, row := range rows {
		v := numbers(t, row)
		a, b := Point{LatDeg: v[0], LonDeg: v[1]}, Point{LatDeg: v[2], LonDeg: v[3]}
		length := leg(&a, &b)
		if off := math.Abs(length - v[6]); off > 2e-7+1e-8*v[6] {
			t.Errorf("%v: length %.7f m, want %.7f", v[:4], length, v[6])
		}
		// A place written to 1e-12 degrees is uncertain by 1e-7 m.
		band := 1e-7 + 1e-6/v[6]
		for k, got := range []float64{bearing(&a, &b), turned(bearing(&b, &a) + math.Pi)} {
			off := math.Remainder(got-v[4+k]*math.Pi/180, 2*math.Pi)
			if math.Abs(off) > band {
				t.Errorf("%v: bearing %d is %.9f°, want %.9f°", v[:4], k, got*180/math.Pi, v[4+k])
			}
		}
	}
}

// One degree along the equator is 111,319.490793 m (2πa/360); the metre count
// of the date line and of the poles must not break.
func TestLegAtOddPlaces(t *testing.T) {
	for _, c := range []struct {
		name string
		a, b Point
		want float64
		band float64
	}{
		{"equator", Point{}, Point{LonDeg: 1}, 2 * math.Pi * wgs84A / 360, 1e-6},
		{"date line", Point{LonDeg: 179.9995}, Point{LonDeg: -179.9995}, 2 * math.Pi * wgs84A / 360 / 1000, 1e-6},
		// Both near the pole, opposite sides: twice the distance to the pole, with M at the pole = a²/b.
		{"over the pole", Point{LatDeg: 89.9999, LonDeg: 0}, Point{LatDeg: 89.9999, LonDeg: 180}, 2 * 0.0001 * math.Pi / 180 * wgs84A / (1 - wgs84F), 1e-3},
		{"the same", Point{LatDeg: 12, LonDeg: 34}, Point{LatDeg: 12, LonDeg: 34}, 0, 0},
	} {
		got := leg(&c.a, &c.b)
		if math.Abs(got-c.want) > c.band {
			t.Errorf("%s: %.9f m, want %.9f", c.name, got, c.want)
		}
	}
}
