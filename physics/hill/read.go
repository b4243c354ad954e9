package hill

import (
	"bytes"
	"io"
)

// ReadTrack reads one track from a GPX 1.0 or 1.1 file, or from GeoJSON lines
// with heights (RFC 7946), as a stream: memory grows with the points only. Of
// several tracks it takes the first that is at least half as long as the
// longest; a route only where there is no track.
//
// progress, when not nil, is told from time to time which part of the file is
// done, 0 to 1 (always 0 when the reader has no Len); false stops.
//
// The error is a *TrackError. After TrackCutOff, TrackBroken and TrackBadPlace
// the track holds what was read up to there.
func ReadTrack(r io.Reader, progress func(done float64) bool) (Track, error) {
	t, err := readTrack(r, progress)
	if err != nil {
		return t, err
	}
	return t, nil
}

func readTrack(r io.Reader, progress func(done float64) bool) (Track, *TrackError) {
	file := newCounted(r, progress)
	head := make([]byte, 16)
	n, err := io.ReadFull(file, head)
	head = head[:n]
	if err != nil && err != io.EOF && err != io.ErrUnexpectedEOF {
		return Track{}, err.(*TrackError)
	}
	if n == 0 {
		return Track{}, &TrackError{Kind: TrackEmpty}
	}
	whole := io.MultiReader(bytes.NewReader(head), file)
	s := newScanner(whole)
	switch {
	case bytes.HasPrefix(head, []byte{0xFE, 0xFF}):
		s = newScanner(&utf16Reader{r: whole, bigEndian: true})
	case bytes.HasPrefix(head, []byte{0xFF, 0xFE}):
		s = newScanner(&utf16Reader{r: whole})
	}
	if look := binaryLook(head); look != LooksUnknown {
		return Track{}, &TrackError{Kind: TrackWrongFile, Looks: look}
	}
	s.mark()
	c, ok := s.space()
	if !ok {
		if s.err != nil {
			return Track{}, s.err
		}
		return Track{}, &TrackError{Kind: TrackEmpty}
	}
	s.back()
	switch c {
	case '<':
		g := &gpxReader{xmlScanner: xmlScanner{scanner: s}}
		err := g.read()
		return chosen(&g.gather, g.fileName, err, LooksUnknown)
	case '{', '[':
		g := &geoReader{scanner: s}
		err := g.read()
		return chosen(&g.gather, g.fileName, err, LooksJSON)
	}
	look := LooksText
	if bytes.IndexByte(head, 0) >= 0 || c < ' ' {
		look = LooksUnknown
	}
	return Track{}, &TrackError{Kind: TrackWrongFile, Looks: look}
}

// chosen gives the chosen track and what is to be said about the file.
func chosen(g *gather, fileName string, err *TrackError, without FileLook) (Track, *TrackError) {
	if err != nil && err.Kind != TrackCutOff && err.Kind != TrackBroken && err.Kind != TrackBadPlace {
		return Track{}, err
	}
	t, ok := g.choose(fileName)
	if ok || err != nil {
		return t, err
	}
	if without == LooksJSON && len(g.lines) == 0 {
		return Track{}, &TrackError{Kind: TrackWrongFile, Looks: LooksJSON}
	}
	return Track{}, &TrackError{Kind: TrackNoPoints, Points: len(g.points)}
}

// binaryLook tells files that are no text by their first bytes.
func binaryLook(head []byte) FileLook {
	for _, sign := range []struct {
		at   int
		text string
		look FileLook
	}{
		{8, ".FIT", LooksFIT},
		{0, "PK\x03\x04", LooksZIP},
		{0, "\xFF\xD8\xFF", LooksJPEG},
		{0, "\x89PNG", LooksPNG},
		{0, "%PDF", LooksPDF},
		{0, "\x1F\x8B", LooksGzip},
	} {
		if len(head) > sign.at && bytes.HasPrefix(head[sign.at:], []byte(sign.text)) {
			return sign.look
		}
	}
	return LooksUnknown
}
