package sound

import (
	"bytes"
	"math"
	"os"
	"os/exec"
	"path/filepath"
	"strconv"
	"testing"

	"hillwright/physics/synth"
)

// tool runs a program over a file; the full run of the tests must have it.
func tool(t *testing.T, in []byte, name string, args ...string) []byte {
	t.Helper()
	cmd := exec.Command(name, args...)
	cmd.Stdin = bytes.NewReader(in)
	var problems bytes.Buffer
	cmd.Stderr = &problems
	out, err := cmd.Output()
	if err != nil {
		t.Fatalf("%s: %v\n%s\nthe tests need Debian's packages ffmpeg and lame", name, err, problems.String())
	}
	return out
}

// The samples of MP3 files against an independent decoder, that of Debian's
// ffmpeg, over bit rates, sampling rates, channels and constant or variable
// coding by Debian's lame. The two may differ by how long the beginning is.
func TestMP3AgainstAnotherDecoder(t *testing.T) {
	if os.Getenv("HILLWRIGHT_FULL") == "" {
		t.Skip("needs ffmpeg and lame: set HILLWRIGHT_FULL=1")
	}
	for _, row := range []struct {
		name   string
		rateHz int
		args   []string
	}{
		{"64 mono", 44100, []string{"-m", "m", "--cbr", "-b", "64"}},
		{"128 joint stereo", 44100, []string{"-m", "j", "--cbr", "-b", "128"}},
		{"320 stereo", 48000, []string{"-m", "s", "--cbr", "-b", "320"}},
		{"variable", 44100, []string{"-m", "j", "-V", "4"}},
		{"22.05 kHz", 22050, []string{"-m", "m", "--cbr", "-b", "64"}},
		{"32 kHz", 32000, []string{"-m", "m", "--cbr", "-b", "96"}},
	} {
		t.Run(row.name, func(t *testing.T) {
			s := synth.Scene{
				RateHz: row.rateHz, LengthS: 8, ClicksPerTurn: 36, CircumferenceM: 2.155, SNRdB: 15, Noise: synth.Tyre, Seed: 3,
				Speed: synth.Drag{MassKg: 105, Crr: 0.007, CdAM2: 0.5, DensityKgM3: 1.2}.Coast(8),
			}
			coded := tool(t, synth.WAV(s.Make(), row.rateHz, 16), "lame", append([]string{"--quiet"}, append(row.args, "-", "-")...)...)
			got, r, err := all(bytes.NewReader(coded))
			if err != nil {
				t.Fatal(err)
			}
			file := filepath.Join(t.TempDir(), "a.mp3")
			if err := os.WriteFile(file, coded, 0o600); err != nil {
				t.Fatal(err)
			}
			raw := tool(t, nil, "ffmpeg", "-loglevel", "error", "-i", file, "-ac", "1", "-ar", strconv.Itoa(r.RateHz()), "-f", "f32le", "-")
			want := make([]float32, len(raw)/4)
			for i := range want {
				want[i] = math.Float32frombits(uint32(raw[4*i]) | uint32(raw[4*i+1])<<8 | uint32(raw[4*i+2])<<16 | uint32(raw[4*i+3])<<24)
			}
			late, apart := align(want, got)
			t.Logf("%d Hz, other begins %d samples later, they differ by %.1f dB of full scale", r.RateHz(), late, apart)
			if apart > -90 {
				t.Errorf("the decoders differ by %.1f dB of full scale, want below −90", apart)
			}
		})
	}
}

// align finds by how many samples the second list begins earlier, and how far
// the two are apart then: the root mean square of their difference [dB].
func align(a, b []float32) (late int, db float64) {
	best := math.Inf(1)
	for d := -2400; d <= 2400; d++ {
		sum, n := 0.0, 0
		for i := 20000; i < 20400; i++ {
			if k := i + d; k >= 0 && k < len(b) && i < len(a) {
				x := float64(a[i] - b[k])
				sum, n = sum+x*x, n+1
			}
		}
		if n > 300 && sum/float64(n) < best {
			best, late = sum/float64(n), d
		}
	}
	sum, n := 0.0, 0
	for i := 3000; i < len(a)-3000; i++ {
		if k := i + late; k >= 0 && k < len(b) {
			x := float64(a[i] - b[k])
			sum, n = sum+x*x, n+1
		}
	}
	return late, 10 * math.Log10(sum/float64(max(1, n))+1e-20)
}
