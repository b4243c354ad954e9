package hill

import "strconv"

// TrackErrorKind says why a track file gives no track.
type TrackErrorKind uint8

// Why a file gives no track, or no profile.
const (
	TrackEmpty         TrackErrorKind = iota // the file is empty
	TrackWrongFile                           // another kind of file: see Looks
	TrackDoctype                             // it declares a document type or entities
	TrackBroken                              // not well formed at Line: Got
	TrackCutOff                              // the file ends in the middle, Points were read
	TrackTooLarge                            // more than LargestTrackBytes
	TrackTooManyPoints                       // more than MostTrackPoints
	TrackNoPoints                            // a good file without a track or route of two points
	TrackBadPlace                            // a latitude or longitude is missing or out of range at Line: Got
	TrackCancelled                           // progress said stop
	TrackUnreadable                          // reading failed: Unwrap tells
	TrackTooShort                            // all points lie within a few metres
	TrackBadOption                           // an option is out of range: Got
)

// FileLook is what a file looks like that holds no track we read.
type FileLook uint8

// The kinds of files that people pick by mistake.
const (
	LooksUnknown FileLook = iota
	LooksFIT
	LooksZIP
	LooksJPEG
	LooksPNG
	LooksPDF
	LooksGzip
	LooksHTML
	LooksKML
	LooksTCX
	LooksXML  // some other XML
	LooksJSON // JSON without a line
	LooksText
)

var lookNames = []string{
	"a kind of file that is not known here", "a FIT recording", "a ZIP archive", "a JPEG picture", "a PNG picture", "a PDF document",
	"a gzip archive", "a web page", "a KML file", "a TCX recording", "some other XML file", "JSON without a line in it", "plain text",
}

// TrackError is why a file gives no track: what, where and what was expected.
// Line counts from 1, 0 when it says nothing; Points is how many good points
// were read before. The page says it in the reader's words by Kind and Looks.
type TrackError struct {
	Kind   TrackErrorKind
	Looks  FileLook
	Line   int
	Points int
	Got    string
	Err    error
}

// Unwrap gives the reader's own error of TrackUnreadable.
func (e *TrackError) Unwrap() error { return e.Err }

// Error says it in English.
func (e *TrackError) Error() string {
	s := "track"
	if e.Line > 0 {
		s += ", line " + strconv.Itoa(e.Line)
	}
	return s + ": " + e.what()
}

func (e *TrackError) what() string {
	points := strconv.Itoa(e.Points) + " points were read"
	switch e.Kind {
	case TrackEmpty:
		return "the file is empty; expected a GPX or GeoJSON file"
	case TrackWrongFile:
		return "this looks like " + lookNames[e.Looks] + "; expected a GPX or GeoJSON file: export the track as GPX"
	case TrackDoctype:
		return "the file declares a document type or entities, which no GPX file needs; it is refused for safety: export the track again"
	case TrackBroken:
		return "the file is not well formed (" + e.Got + "); " + points + ": export the track again"
	case TrackCutOff:
		return "the file ends in the middle; " + points + ": copy or export it again"
	case TrackTooLarge:
		return "the file is larger than 64 MB; export only the hill, or fewer points"
	case TrackTooManyPoints:
		return "the track has more than 500,000 points; export only the hill, or fewer points"
	case TrackNoPoints:
		return "there is no track or route of two points or more in the file"
	case TrackBadPlace:
		return "expected a latitude from -90 to 90 and a longitude from -180 to 180, got " + e.Got
	case TrackCancelled:
		return "stopped"
	case TrackTooShort:
		return "all points lie within a few metres; expected a way of 10 m or more"
	case TrackBadOption:
		return "option out of range: " + e.Got
	}
	if e.Err != nil {
		return "the file cannot be read: " + e.Err.Error()
	}
	return "the file cannot be read"
}
