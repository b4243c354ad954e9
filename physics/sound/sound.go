// Package sound reads recordings: WAV and MP3 files as one channel of samples,
// a part at a time, in a fixed amount of memory however long the file is.
// Start with Open.
package sound

import (
	"bufio"
	"errors"
	"io"
)

// Lowest and highest sampling rates that are read [Hz].
const (
	LowestHz  = 8_000
	HighestHz = 192_000
)

// Reader gives the samples of a recording.
type Reader struct {
	rateHz int
	from   samples
	frames int64 // given so far
	cut    bool
}

// samples is what a kind of file gives: samples of one channel, io.EOF where
// the file ends, errCut where it ends before its time or is damaged.
type samples interface {
	read(dst []float32) (int, error)
}

// errCut tells that a file ends within what it promised.
var errCut = errors.New("the recording is cut off")

// Open tells what a file is by its first bytes. A file that is no WAV or MP3,
// or one that cannot be read, is an *Error that says what it looks like.
func Open(r io.Reader) (*Reader, error) {
	in := bufio.NewReaderSize(r, 1<<15)
	head, err := in.Peek(1 << 13)
	if len(head) == 0 {
		if err != nil && err != io.EOF {
			return nil, err
		}
		return nil, &Error{Kind: Empty}
	}
	var s samples
	var rateHz int
	switch look := lookOf(head); look {
	case lookWAV:
		s, rateHz, err = openWAV(in)
	case lookMP3:
		s, rateHz, err = openMP3(in)
	default:
		return nil, &Error{Kind: NotSound, Looks: look}
	}
	if err != nil {
		return nil, err
	}
	if rateHz < LowestHz || rateHz > HighestHz {
		return nil, &Error{Kind: OddRate, Got: rateHz}
	}
	return &Reader{rateHz: rateHz, from: s}, nil
}

// RateHz is the sampling rate [Hz].
func (r *Reader) RateHz() int { return r.rateHz }

// Read gives the next samples, the mean of all channels, full scale from −1 to
// 1. It returns io.EOF at the end, and an *Error when there was no sound at
// all. A recording that is damaged or cut off after some sound ends there; Cut
// tells it.
func (r *Reader) Read(dst []float32) (int, error) {
	if r.cut {
		return 0, io.EOF
	}
	n, err := r.from.read(dst)
	r.frames += int64(n)
	switch {
	case err == errCut:
		r.cut, err = true, io.EOF
		if r.frames == 0 {
			return 0, &Error{Kind: Damaged}
		}
	case err == io.EOF && r.frames == 0:
		return 0, &Error{Kind: NoSamples}
	}
	return n, err
}

// Cut tells whether the recording ended before its time or was damaged, and
// where [s].
func (r *Reader) Cut() (atS float64, cut bool) {
	return float64(r.frames) / float64(r.rateHz), r.cut
}
