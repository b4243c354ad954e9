package hill

// The limits of a track file.
const (
	LargestTrackBytes = 64 << 20
	MostTrackPoints   = 500_000
)

// Point is one point of a track: WGS84 latitude and longitude [°], height [m]
// and time [s since 1970, UTC]. Height and time are NaN when the file has none.
type Point struct {
	LatDeg, LonDeg float64
	HeightM        float64
	TimeS          float64
}

// Track is one track or route as recorded, nothing mended yet. SegmentStart
// holds the index of each segment's first point; the first is 0. Others counts
// the tracks and routes of the file that were passed over.
type Track struct {
	Name         string
	Points       []Point
	SegmentStart []int
	Others       int
}

// Options say how a track becomes a profile. The zero value is right for
// nearly everybody.
type Options struct {
	// SmoothM is the length scale of the smoothing of heights [m], 5 to 500: a
	// gentle wave of 2π·SmoothM in length keeps half its height; sharp bends keep
	// more. 0 leaves the choice
	// to cross-validation, between ShortestSmoothM and LongestSmoothM.
	SmoothM float64
	// PieceM is the length of the pieces [m, horizontal], 1 to 1000. 0 means
	// 10 m, up to 50 m where points are that sparse, and more on routes that
	// would have over 20,000 pieces.
	PieceM float64
}
