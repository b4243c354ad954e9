package sound

import (
	"bytes"
	"encoding/binary"
	"errors"
	"io"
	"math"
	"os"
	"strings"
	"testing"
	"testing/iotest"

	"hillwright/physics/synth"
)

func all(r io.Reader) ([]float32, *Reader, error) {
	s, err := Open(r)
	if err != nil {
		return nil, nil, err
	}
	var out []float32
	part := make([]float32, 1000)
	for {
		n, err := s.Read(part)
		out = append(out, part[:n]...)
		if err == io.EOF {
			return out, s, nil
		}
		if err != nil {
			return out, s, err
		}
	}
}

// wav writes a WAV file of any coding; chunks stand before the samples.
func wavOf(tag, channels, bits, rateHz int, data []byte, size uint32, chunks ...string) []byte {
	out := []byte("RIFF\x00\x00\x00\x00WAVE")
	for _, c := range chunks {
		out = append(append(out, "LIST"...), byte(len(c)), 0, 0, 0)
		out = append(out, c...)
		if len(c)%2 == 1 {
			out = append(out, 0)
		}
	}
	format := binary.LittleEndian.AppendUint16(nil, uint16(tag))
	format = binary.LittleEndian.AppendUint16(format, uint16(channels))
	format = binary.LittleEndian.AppendUint32(format, uint32(rateHz))
	format = binary.LittleEndian.AppendUint32(format, uint32(rateHz*channels*bits/8))
	format = binary.LittleEndian.AppendUint16(format, uint16(channels*bits/8))
	format = binary.LittleEndian.AppendUint16(format, uint16(bits))
	if tag == tagExtensible {
		format = append(format, 22, 0, byte(bits), 0, 0, 0, 0, 0, 1, 0, 0, 0, 0, 0, 0x10, 0, 0x80, 0, 0, 0xaa, 0, 0x38, 0x9b, 0x71)
	}
	out = binary.LittleEndian.AppendUint32(append(out, "fmt "...), uint32(len(format)))
	out = append(out, format...)
	out = binary.LittleEndian.AppendUint32(append(out, "data"...), size)
	return append(out, data...)
}

// Every coding gives the samples that were written.
func TestWAVCodings(t *testing.T) {
	want := []float64{0, 0.5, -0.5, 0.25, -1, 0.75}
	for _, row := range []struct {
		name      string
		tag, bits int
		put       func(out []byte, x float64) []byte
		off       float64
	}{
		{"8 bits", 1, 8, func(o []byte, x float64) []byte { return append(o, byte(128+x*127.5)) }, 0.01},
		{"16 bits", 1, 16, func(o []byte, x float64) []byte { return binary.LittleEndian.AppendUint16(o, uint16(int16(x*32767.5))) }, 1e-4},
		{"24 bits", 1, 24, func(o []byte, x float64) []byte {
			v := int32(x * 8388607.5)
			return append(o, byte(v), byte(v>>8), byte(v>>16))
		}, 1e-6},
		{"32 bits", 1, 32, func(o []byte, x float64) []byte {
			return binary.LittleEndian.AppendUint32(o, uint32(int32(x*2147483647)))
		}, 1e-7},
		{"extensible", tagExtensible, 16, func(o []byte, x float64) []byte { return binary.LittleEndian.AppendUint16(o, uint16(int16(x*32767.5))) }, 1e-4},
		{"float", 3, 32, func(o []byte, x float64) []byte {
			return binary.LittleEndian.AppendUint32(o, math.Float32bits(float32(x)))
		}, 1e-7},
		{"double", 3, 64, func(o []byte, x float64) []byte { return binary.LittleEndian.AppendUint64(o, math.Float64bits(x)) }, 1e-7},
	} {
		for channels := 1; channels <= 3; channels += 2 {
			var data []byte
			for _, x := range want {
				for c := range channels {
					// The mean of the channels is x.
					data = row.put(data, x*[]float64{1, 0.5, 1.5}[c%3])
					if channels == 1 {
						break
					}
				}
			}
			if channels == 3 && row.bits <= 32 && row.tag != 3 {
				continue // 1.5 times full scale does not fit
			}
			file := wavOf(row.tag, channels, row.bits, 22050, data, uint32(len(data)), "odd", "even")
			got, r, err := all(iotest.OneByteReader(bytes.NewReader(file)))
			if err != nil || r.RateHz() != 22050 || len(got) != len(want) {
				t.Errorf("%s, %d channels: %d samples at %v, %v", row.name, channels, len(got), r, err)
				continue
			}
			for i, x := range got {
				if math.Abs(float64(x)-want[i]) > row.off {
					t.Errorf("%s, %d channels: sample %d is %v, want %v", row.name, channels, i, x, want[i])
				}
			}
		}
	}
}

// What recorders leave behind that were cut off.
func TestWAVLengths(t *testing.T) {
	data := make([]byte, 2000)
	for _, row := range []struct {
		name    string
		size    uint32
		samples int
		cut     bool
	}{
		{"as it is", 2000, 1000, false}, {"0", 0, 1000, false}, {"not known", 0xffffffff, 1000, false},
		{"shorter", 1000, 500, false}, {"longer", 5000, 1000, true}, {"gigabytes", 0xfffffff0, 1000, true},
	} {
		got, r, err := all(bytes.NewReader(wavOf(1, 1, 16, 8000, data, row.size)))
		if err != nil || len(got) != row.samples {
			t.Errorf("%s: %d samples, %v", row.name, len(got), err)
			continue
		}
		if at, cut := r.Cut(); cut != row.cut || cut && at != 0.125 {
			t.Errorf("%s: cut %v at %v s", row.name, cut, at)
		}
	}
	floats := binary.LittleEndian.AppendUint32(nil, math.Float32bits(float32(math.NaN())))
	floats = binary.LittleEndian.AppendUint32(floats, math.Float32bits(float32(math.Inf(1))))
	got, _, err := all(bytes.NewReader(wavOf(3, 1, 32, 8000, floats, 8)))
	if err != nil || got[0] != 0 || got[1] != 8 {
		t.Errorf("what is no number became %v, %v", got, err)
	}
}

func TestErrors(t *testing.T) {
	pad := strings.Repeat("x", 600)
	for _, row := range []struct {
		name, file string
		kind       ErrorKind
		looks      Look
		says       string
	}{
		{"nothing", "", Empty, 0, "empty"},
		{"m4a", "\x00\x00\x00\x20ftypM4A " + pad, NotSound, LookM4A, "MPEG-4"},
		{"ogg", "OggS" + pad, NotSound, LookOgg, "Ogg"},
		{"flac", "fLaC" + pad, NotSound, LookFLAC, "FLAC"},
		{"amr", "#!AMR\n" + pad, NotSound, LookAMR, "AMR"},
		{"aiff", "FORM\x00\x00\x00\x00AIFF" + pad, NotSound, LookAIFF, "AIFF"},
		{"caf", "caff" + pad, NotSound, LookCAF, "CAF"},
		{"webm", "\x1aE\xdf\xa3" + pad, NotSound, LookWebM, "WebM"},
		{"zip", "PK\x03\x04" + pad, NotSound, LookZIP, "ZIP"},
		{"png", "\x89PNG\r\n" + pad, NotSound, LookPicture, "picture"},
		{"gpx", `<?xml version="1.0"?><gpx version="1.1"></gpx>`, NotSound, LookTrack, "GPS track"},
		{"text", "time_s,speed_kmh\n0,31\n", NotSound, LookText, "a text"},
		{"umlauts", "Größe", NotSound, LookText, "a text"},
		{"anything", "\x00\x01\x02" + pad, NotSound, LookNothing, "no recording"},
		{"a head", "RIFF\x00\x00\x00\x00WAVE", Damaged, 0, "damaged"},
		{"a head without samples", string(wavOf(1, 1, 16, 8000, nil, 0))[:36], NoSamples, 0, "no sound"},
		{"no samples", string(wavOf(1, 1, 16, 8000, nil, 0)), NoSamples, 0, "no sound"},
		{"samples that are missing", string(wavOf(1, 1, 16, 8000, nil, 100)), Damaged, 0, "damaged"},
		{"a-law", string(wavOf(6, 1, 8, 8000, []byte("aaaa"), 4)), UnknownWAV, 0, "tag 6"},
		{"12 bits", string(wavOf(1, 1, 12, 8000, []byte("aaaa"), 4)), OddBits, 0, "12 bits"},
		{"100 Hz", string(wavOf(1, 1, 16, 100, []byte("aaaa"), 4)), OddRate, 0, "100 Hz"},
		{"no channel", string(wavOf(1, 0, 16, 8000, []byte("aaaa"), 4)), Damaged, 0, "damaged"},
		{"an MP3 of 11 kHz", strings.Repeat("\xff\xe3\x40\xc0"+strings.Repeat("\x00", 204), 5), SlowMP3, 0, "11025 Hz"},
		{"a tag and no frames", "ID3\x04\x00\x00\x00\x00\x00\x0a" + pad, Damaged, 0, "damaged"},
	} {
		_, _, err := all(strings.NewReader(row.file))
		var e *Error
		if !errors.As(err, &e) || e.Kind != row.kind || e.Looks != row.looks || !strings.Contains(err.Error(), row.says) {
			t.Errorf("%s: %v", row.name, err)
		}
	}
}

func recorded(t testing.TB, name string) []byte {
	data, err := os.ReadFile("../../testdata/recordings/" + name)
	if err != nil {
		t.Fatal(err)
	}
	return data
}

// An MP3 file gives all of its length; one that is cut off gives what it has;
// one with damage in the middle does not fail.
func TestMP3(t *testing.T) {
	file := recorded(t, "stand-free.mp3")
	got, r, err := all(bytes.NewReader(file))
	if err != nil || r.RateHz() != 32000 || math.Abs(float64(len(got))/32000-30) > 0.1 {
		t.Fatalf("%d samples, %v", len(got), err)
	}
	half, r, err := all(bytes.NewReader(file[:len(file)/2]))
	if err != nil || math.Abs(float64(len(half))/32000-15) > 0.1 {
		t.Errorf("half a file: %d samples, %v", len(half), err)
	}
	_ = r
	tagged := append([]byte("ID3\x04\x00\x00\x00\x00\x10\x00"), make([]byte, 2048)...)
	if with, _, err := all(bytes.NewReader(append(tagged, file...))); err != nil || len(with) != len(got) {
		t.Errorf("behind a tag: %d samples, want %d, %v", len(with), len(got), err)
	}
	broken := bytes.Clone(file)
	for i := len(file) / 3; i < len(file)/3+3000; i++ {
		broken[i] = byte(i * 7)
	}
	if some, _, err := all(bytes.NewReader(broken)); err != nil || len(some) < len(got)/4 {
		t.Errorf("damaged in the middle: %d samples, %v", len(some), err)
	}
}

func FuzzOpen(f *testing.F) {
	f.Add(wavOf(1, 2, 16, 44100, make([]byte, 64), 64, "odd"))
	f.Add(wavOf(tagExtensible, 1, 24, 8000, make([]byte, 9), 0))
	f.Add(synth.WAV(make([]float32, 100), 8000, 8))
	f.Add(recorded(f, "speech.mp3")[:3000])
	f.Add([]byte("ID3"))
	f.Fuzz(func(t *testing.T, data []byte) {
		r, err := Open(bytes.NewReader(data))
		if err != nil {
			var e *Error
			if !errors.As(err, &e) {
				t.Fatalf("an error of no kind: %v", err)
			}
			return
		}
		part := make([]float32, 4096)
		// The tightest MP3 frame holds 1152 samples in 24 bytes.
		for most := 1152*(len(data)/20+4) + 4096; ; {
			n, err := r.Read(part)
			for _, x := range part[:n] {
				if math.IsNaN(float64(x)) {
					t.Fatal("a sample is no number")
				}
			}
			if most -= n; most < 0 {
				t.Fatalf("more than so many samples of %d bytes", len(data))
			}
			if err != nil {
				return
			}
		}
	})
}
