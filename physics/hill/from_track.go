package hill

// FromTrack makes a profile of a track: faults mended, heights smoothed, even
// pieces.
func FromTrack(t *Track, o Options) (Profile, error) {
	return Profile{}, &TrackError{Kind: TrackTooShort}
}
