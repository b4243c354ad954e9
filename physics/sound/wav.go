package sound

import (
	"bufio"
	"encoding/binary"
	"io"
	"math"
)

// Codings of a WAV file: the format tags of Multimedia Programming Interface
// and Data Specifications 1.0 (1991), with the extensible one of later.
const (
	tagPCM        = 1
	tagFloat      = 3
	tagExtensible = 0xfffe
)

// wav gives the samples of a WAV file.
type wav struct {
	in       *bufio.Reader
	channels int
	wide     int   // bytes of a sample
	float    bool  //
	left     int64 // bytes left; −1: to the end of the file
	frame    []byte
}

// unknownLength is the length that a recorder leaves which was cut off, or
// whose file is longer than the header can say.
const unknownLength = 0xffffffff

func openWAV(in *bufio.Reader) (samples, int, error) {
	var head [12]byte
	if _, err := io.ReadFull(in, head[:]); err != nil || string(head[:4]) != "RIFF" && string(head[:4]) != "RF64" {
		return nil, 0, &Error{Kind: Damaged}
	}
	w := &wav{in: in}
	rateHz := 0
	for {
		var chunk [8]byte
		if _, err := io.ReadFull(in, chunk[:]); err != nil {
			if rateHz > 0 {
				return nil, 0, &Error{Kind: NoSamples}
			}
			return nil, 0, &Error{Kind: Damaged}
		}
		size := int64(binary.LittleEndian.Uint32(chunk[4:]))
		switch string(chunk[:4]) {
		case "fmt ":
			hz, err := w.format(size)
			if err != nil {
				return nil, 0, err
			}
			rateHz = hz
		case "data":
			if rateHz == 0 {
				return nil, 0, &Error{Kind: Damaged}
			}
			if w.left = size; size == 0 || size == unknownLength {
				w.left = -1
			}
			w.frame = make([]byte, w.channels*w.wide)
			return w, rateHz, nil
		default:
			if _, err := io.CopyN(io.Discard, in, size+size%2); err != nil {
				return nil, 0, &Error{Kind: Damaged}
			}
		}
	}
}

// format reads the chunk that tells how samples are written, and gives their
// rate [Hz].
func (w *wav) format(size int64) (int, error) {
	if size < 16 || size > 1<<12 {
		return 0, &Error{Kind: Damaged}
	}
	b := make([]byte, size+size%2)
	if _, err := io.ReadFull(w.in, b); err != nil {
		return 0, &Error{Kind: Damaged}
	}
	tag := int(binary.LittleEndian.Uint16(b))
	if tag == tagExtensible && size >= 26 {
		tag = int(binary.LittleEndian.Uint16(b[24:]))
	}
	w.channels = int(binary.LittleEndian.Uint16(b[2:]))
	bits := int(binary.LittleEndian.Uint16(b[14:]))
	w.float, w.wide = tag == tagFloat, bits/8
	switch {
	case tag != tagPCM && tag != tagFloat:
		return 0, &Error{Kind: UnknownWAV, Got: tag}
	case w.channels < 1 || w.channels > 32:
		return 0, &Error{Kind: Damaged}
	case bits%8 != 0 || w.float && bits != 32 && bits != 64 || !w.float && (bits < 8 || bits > 32):
		return 0, &Error{Kind: OddBits, Got: bits}
	}
	return int(min(binary.LittleEndian.Uint32(b[4:]), math.MaxInt32)), nil
}

func (w *wav) read(dst []float32) (int, error) {
	for i := range dst {
		if w.left >= 0 && w.left < int64(len(w.frame)) {
			return i, io.EOF
		}
		if _, err := io.ReadFull(w.in, w.frame); err != nil {
			if w.left < 0 && err == io.EOF {
				return i, io.EOF
			}
			return i, errCut
		}
		if w.left >= 0 {
			w.left -= int64(len(w.frame))
		}
		sum := 0.0
		for c := range w.channels {
			sum += w.value(w.frame[c*w.wide:])
		}
		dst[i] = float32(sum / float64(w.channels))
	}
	return len(dst), nil
}

// value is one sample; what is no number is silence.
func (w *wav) value(b []byte) float64 {
	switch {
	case w.float && w.wide == 4:
		return sane(float64(math.Float32frombits(binary.LittleEndian.Uint32(b))))
	case w.float:
		return sane(math.Float64frombits(binary.LittleEndian.Uint64(b)))
	case w.wide == 1:
		return (float64(b[0]) - 128) / 128
	case w.wide == 2:
		return float64(int16(binary.LittleEndian.Uint16(b))) / (1 << 15)
	case w.wide == 3:
		return float64(int32(uint32(b[0])<<8|uint32(b[1])<<16|uint32(b[2])<<24)) / (1 << 31)
	}
	return float64(int32(binary.LittleEndian.Uint32(b))) / (1 << 31)
}

// sane keeps float samples to what a recorder may mean.
func sane(x float64) float64 {
	if math.IsNaN(x) {
		return 0
	}
	return math.Max(-8, math.Min(8, x))
}
