package hill

// NoteKind names one kind of thing that was mended in a track.
type NoteKind uint8

// What is found in tracks and mended.
const (
	NoteNoHeights     NoteKind = iota // the track has no heights: the profile is level
	NoteZeroHeights                   // every height is zero: taken for no heights
	NoteSpike                         // a point or a height off the way was dropped
	NoteDuplicate                     // points at the same place were joined
	NotePause                         // standing still was cut out
	NoteGap                           // a hole in the track was bridged by a straight line
	NoteSegments                      // segments were joined; what lies between was not recorded and is left out
	NoteCoarseHeights                 // heights come in whole metres: smoothed
	NoteSomeHeights                   // some points had no height: filled in between
)

// Note is one thing that was found in a track and mended: how often, and where
// along the road first [m].
type Note struct {
	Kind  NoteKind
	Count int
	AtM   float64
	// LengthM is the road that it concerns, all together [m]; 0 for points.
	LengthM float64
}
