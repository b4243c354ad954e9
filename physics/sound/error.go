package sound

import "strconv"

// ErrorKind says why a file gives no samples.
type ErrorKind uint8

// Why a file gives no samples.
const (
	Empty      ErrorKind = iota // there is nothing in it
	NotSound                    // neither WAV nor MP3; Looks says what it may be
	UnknownWAV                  // a WAV in a coding that is not read; Got is its tag
	OddBits                     // a WAV with a width that is not read; Got is the bits
	OddRate                     // a sampling rate beyond all use; Got is the rate [Hz]
	NoSamples                   // it is whole and holds no sound
	Damaged                     // it begins right and cannot be read on
	SlowMP3                     // an MP3 of MPEG-2.5, below 16 kHz, which is not read; Got is its rate [Hz]
)

// Look is what a file looks like by its first bytes.
type Look uint8

// What a file may look like.
const (
	LookNothing Look = iota
	LookM4A
	LookOgg
	LookFLAC
	LookAMR
	LookAIFF
	LookCAF
	LookWebM
	LookTrack
	LookText
	LookPicture
	LookZIP
	lookWAV
	lookMP3
)

var lookNames = [...]string{
	"", "an MPEG-4 recording (m4a, mp4)", "an Ogg recording", "a FLAC recording", "an AMR recording", "an AIFF recording",
	"a CAF recording", "a WebM recording", "a GPS track", "a text", "a picture", "a ZIP archive", "", "",
}

// Error says why a file gives no samples.
type Error struct {
	Kind  ErrorKind
	Looks Look
	Got   int
}

const remedy = "; expected MP3 or WAV: record it on the page, choose MP3 or WAV in the recorder's settings, or convert the file"

func (e *Error) Error() string {
	switch e.Kind {
	case Empty:
		return "the file is empty" + remedy
	case NotSound:
		if e.Looks == LookNothing || int(e.Looks) >= len(lookNames) {
			return "the file is no recording that can be read" + remedy
		}
		return "the file looks like " + lookNames[e.Looks] + remedy
	case UnknownWAV:
		return "the WAV file is coded in a way (tag " + strconv.Itoa(e.Got) + ") that is not read; expected PCM or float: choose uncompressed in the recorder's settings"
	case OddBits:
		return "the WAV file has " + strconv.Itoa(e.Got) + " bits in a sample; expected 8, 16, 24, 32 or 64 (float)"
	case OddRate:
		return "the sampling rate is " + strconv.Itoa(e.Got) + " Hz; expected " + strconv.Itoa(LowestHz) + " to " + strconv.Itoa(HighestHz) + " Hz"
	case SlowMP3:
		return "the MP3 file has a sampling rate of " + strconv.Itoa(e.Got) + " Hz; expected 16000 Hz or more: choose a better quality in the recorder's settings, or WAV"
	case NoSamples:
		return "there is no sound in the file; record again"
	}
	return "the file is damaged before its first sound; record again, or copy the file anew from the recorder"
}
