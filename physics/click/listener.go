// Package click follows the clicks of a freehub, or of a card on the spokes,
// in a recording: samples in, clicks per second over time out, with errors. It
// takes the sound a part at a time and keeps about 7 kB of each second. Start
// with Hear, or with NewListener where the samples come by themselves.
//
// The onset envelope is the loudness in a few bands, each beside its own recent
// mean (after Bello et al., A tutorial on onset detection in music signals,
// IEEE Trans. Speech Audio Proc. 13 (2005) 1035; from memory). Its spectrum is
// taken after the fan-chirp transform, which straightens a rate that falls
// within the window (Weruaga & Képesi, Signal Processing 87 (2007) 1504; from
// memory); the rate's salience is the sum over its harmonics (Hermes,
// J. Acoust. Soc. Am. 83 (1988) 257; from memory) less what lies half-way
// between them. The rate's path is the best one by dynamic programming
// (Bellman), and each of its points is then found anew by least squares on the
// envelope's phase.
package click

import (
	"errors"
	"io"
	"math"
)

// What a listener takes.
const (
	LowestHz  = 8_000
	HighestHz = 192_000
	longestS  = 2 * 3600
	shortestS = 3
)

// Clicks per second that are followed.
const (
	LowestRateHz  = 3
	HighestRateHz = 700
)

// Listener takes a recording's samples, a part at a time.
type Listener struct {
	front  front
	rates  rates
	onset  []uint8 // the envelope, by onsetUnit
	level  []uint8 // the loudness, by levelOf
	loud   float64 // the loudest sample
	count  int64   // samples
	rateHz int
	long   bool // more came than is kept
}

// NewListener makes a listener for a sampling rate [Hz], LowestHz to HighestHz.
func NewListener(rateHz int) (*Listener, error) {
	if rateHz < LowestHz || rateHz > HighestHz {
		return nil, &Error{Kind: OddRate, Got: float64(rateHz)}
	}
	l := &Listener{rateHz: rateHz, front: newFront(rateHz)}
	l.rates = newRates(l.envelopeHz())
	return l, nil
}

func (l *Listener) envelopeHz() float64 {
	return float64(l.rateHz) / float64(l.front.every*l.front.thin)
}

// Seconds is how much was heard [s].
func (l *Listener) Seconds() float64 { return float64(l.count) / float64(l.rateHz) }

// Write takes samples of one channel, full scale −1 to 1. What is no number is
// taken as silence.
func (l *Listener) Write(mono []float32) {
	for _, x := range mono {
		v := float64(x)
		if !(v > -1e3 && v < 1e3) {
			v = 0
		}
		if a := math.Abs(v); a > l.loud {
			l.loud = a
		}
		l.count++
		if !l.front.take(v) {
			continue
		}
		if len(l.onset) >= int(longestS*l.envelopeHz()) {
			l.long = true
			continue
		}
		l.onset = append(l.onset, l.front.onset())
		l.level = append(l.level, levelOf(l.front.energy))
		l.rates.take(l.onset)
	}
}

// Full tells that more came than is kept, so that no more need be written:
// Finish will say so.
func (l *Listener) Full() bool { return l.long }

// Source is a recording of one channel that is read a part at a time, until
// io.EOF (physics/sound).
type Source interface {
	RateHz() int
	Read(dst []float32) (int, error)
}

// ErrStopped is the error of a recording that was not heard to its end because the
// listener was told so.
var ErrStopped = errors.New("the listening was stopped")

// Hear follows the clicks in a whole recording. on is asked between parts
// whether to go on; nil always does. The error is an *Error, ErrStopped, or the
// source's own.
func Hear(from Source, on func() bool) (*Heard, error) {
	l, err := NewListener(from.RateHz())
	if err != nil {
		return nil, err
	}
	part := make([]float32, 1<<12)
	for !l.Full() {
		n, err := from.Read(part)
		l.Write(part[:n])
		if err == io.EOF {
			break
		}
		if err != nil {
			return nil, err
		}
		if on != nil && !on() {
			return nil, ErrStopped
		}
	}
	return l.Finish()
}

// Finish follows the clicks in all that was heard. The error is an *Error.
func (l *Listener) Finish() (*Heard, error) {
	switch s := l.Seconds(); {
	case l.long:
		return nil, &Error{Kind: TooLong, Got: s}
	case s < shortestS:
		return nil, &Error{Kind: TooShort, Got: s}
	case l.loud < silentBelow:
		return nil, &Error{Kind: Silent, Got: l.loud}
	}
	h := &Heard{LengthS: l.Seconds(), onsets: onsetsOf(l.level, l.envelopeHz())}
	l.rates.finish(l.onset)
	path := follow(&l.rates)
	h.Picture = l.rates.picture()
	for _, s := range path {
		if got, ok := l.stretch(s); ok {
			h.Stretches = append(h.Stretches, got)
		}
	}
	if len(h.Stretches) == 0 && len(h.onsets) == 0 {
		return nil, &Error{Kind: NoClicks, Got: h.LengthS}
	}
	return h, nil
}

// silentBelow is the loudest sample of a recording in which nothing was heard:
// −70 dB of full scale.
const silentBelow = 3e-4
