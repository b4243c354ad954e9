package sound

import (
	"bufio"
	"io"

	mp3 "github.com/hajimehoshi/go-mp3"
)

// mpeg gives the samples of an MP3 file. The decoder writes two channels of 16
// bits whatever the file has.
type mpeg struct {
	d        *mp3.Decoder
	buf      [4 << 10]byte
	have, at int
}

// stream hides all but Read, so that the decoder does not look through the
// whole file first.
type stream struct{ io.Reader }

func openMP3(in *bufio.Reader) (s samples, rateHz int, err error) {
	defer func() {
		if recover() != nil { // the decoder panics on some damage
			err = &Error{Kind: Damaged}
		}
	}()
	skipTag(in)
	if head, _ := in.Peek(4); slowHz(head) > 0 { // the decoder does not know these
		return nil, 0, &Error{Kind: SlowMP3, Got: slowHz(head)}
	}
	d, err := mp3.NewDecoder(stream{in})
	if err != nil {
		return nil, 0, &Error{Kind: Damaged}
	}
	return &mpeg{d: d}, d.SampleRate(), nil
}

// skipTag passes over what stands before the first frame: an ID3v2 tag, which
// may hold pictures, and what recorders leave.
func skipTag(in *bufio.Reader) {
	if b, err := in.Peek(10); err == nil && string(b[:3]) == "ID3" {
		size := int(b[6]&0x7f)<<21 | int(b[7]&0x7f)<<14 | int(b[8]&0x7f)<<7 | int(b[9]&0x7f)
		_, _ = io.CopyN(io.Discard, in, int64(10+size)) // a tag longer than the file leaves nothing, which the decoder tells
	}
	head, _ := in.Peek(1 << 13)
	if at := frameAt(head); at > 0 {
		_, _ = in.Discard(at)
	}
}

func (m *mpeg) read(dst []float32) (n int, err error) {
	defer func() {
		if recover() != nil {
			err = errCut
		}
	}()
	for n < len(dst) {
		for m.have-m.at < 4 {
			m.have, m.at = copy(m.buf[:], m.buf[m.at:m.have]), 0
			got, err := m.d.Read(m.buf[m.have:])
			m.have += got
			if got == 0 && err == io.EOF {
				return n, io.EOF
			}
			if got == 0 {
				return n, errCut // also where the decoder says nothing at all
			}
		}
		b := m.buf[m.at:]
		left, right := int16(uint16(b[0])|uint16(b[1])<<8), int16(uint16(b[2])|uint16(b[3])<<8)
		dst[n] = float32((int(left) + int(right))) / (1 << 16)
		m.at += 4
		n++
	}
	return n, nil
}
