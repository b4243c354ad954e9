package hill

import "io"

// ReadTrack reads a GPX 1.0 or 1.1 file, or GeoJSON lines.
func ReadTrack(r io.Reader, progress func(done float64) bool) (Track, error) {
	return Track{}, &TrackError{Kind: TrackNoPoints}
}
