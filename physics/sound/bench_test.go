package sound

import (
	"bytes"
	"io"
	"os"
	"testing"
)

// Decoding of a recording of 50 s; how many times faster than it lasts.
func BenchmarkMP3(b *testing.B) {
	data, err := os.ReadFile("../../testdata/recordings/out-1.mp3")
	if err != nil {
		b.Fatal(err)
	}
	part := make([]float32, 1<<14)
	for b.Loop() {
		r, err := Open(bytes.NewReader(data))
		if err != nil {
			b.Fatal(err)
		}
		for err == nil {
			_, err = r.Read(part)
		}
		if err != io.EOF {
			b.Fatal(err)
		}
	}
	b.ReportMetric(50*float64(b.N)/b.Elapsed().Seconds(), "x_realtime")
}
