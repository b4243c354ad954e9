package synth

import (
	"encoding/binary"
	"math"
)

// WAV gives a RIFF file of one channel, 8 (unsigned), 16 or 24 bits.
func WAV(samples []float32, rateHz, bits int) []byte {
	wide := bits / 8
	size := len(samples) * wide
	out := append([]byte("RIFF"), make([]byte, 4)...)
	binary.LittleEndian.PutUint32(out[4:], uint32(36+size))
	out = append(out, "WAVEfmt "...)
	for _, v := range []uint32{16, 1 | 1<<16, uint32(rateHz), uint32(rateHz * wide), uint32(wide) | uint32(bits)<<16} {
		out = binary.LittleEndian.AppendUint32(out, v)
	}
	out = append(out, "data"...)
	out = binary.LittleEndian.AppendUint32(out, uint32(size))
	top := math.Ldexp(1, bits-1) - 1
	for _, x := range samples {
		v := int32(math.Round(math.Max(-1, math.Min(1, float64(x))) * top))
		if bits == 8 {
			v += 128
		}
		for k := range wide {
			out = append(out, byte(v>>(8*k)))
		}
	}
	return out
}
