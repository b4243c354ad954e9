package state

import (
	"hillwright/physics/click"
	"hillwright/physics/hill"
	"hillwright/physics/slope"
)

// Places of the page that are gone to.
const (
	GoHillside = "hillside"
	GoSentence = "sentence"
	GoBench    = "bench"
)

// Action is one thing that happens: a touch, a key, a file that arrives. Name
// is one of the constants below; the rest is what it needs.
type Action struct {
	Name string
	Arg  string  // what it is about: a path, "kind:id", a place of the page
	Text string  // what was typed
	X    float64 // a place in a picture [px of its viewBox], a part done, a width
	Y    float64 // with X, the place in a sketch
	Data []byte  // a file's content
	Hill *hill.Profile
	Err  error

	Heard *click.Heard // what was heard in a recording

	Leans []Lean    // samples of the tilt sensor
	Fix   slope.Fix // of the location sensor
	// Now is when it happens, in seconds since 1970: the state has no clock.
	Now int64
	// ClockS is a clock for spans [s].
	ClockS float64
}

// What a person does. Elements name these in data-act.
const (
	Open      = "open"      // Arg: a place that opens under the sentence, or closes when it is open
	Close     = "close"     // closes what is open
	ShowPath  = "path"      // Arg: an input whose editor opens, or closes when it is open
	ShowAll   = "all"       // Arg: a place; shows or hides all of its inputs
	StepUp    = "step-up"   // Arg: path
	StepDown  = "step-down" // Arg: path
	Type      = "type"      // Arg: path, Text: the whole field
	Typed     = "typed"     // Arg: path: the field is left
	SetTo     = "set"       // Arg: path=value
	SourceTo  = "source"    // Arg: path=source
	Reset     = "reset"     // Arg: path, back to the chosen thing's value
	RoundTrip = "tour"      // Arg: how often there and back; 0: one way
	Choose    = "choose"    // Arg: kind:id

	TypeSections   = "sections"       // Text: the whole field
	Sketch         = "sketch"         // X, Y: where the finger is, in the sketch
	SketchClear    = "sketch-clear"   // begins again
	SketchLong     = "sketch-long"    // Arg: how long the sketch is [m]
	PickTrack      = "track-pick"     // asks for a file
	StopTrack      = "track-stop"     // stops the reading
	TypeName       = "name"           // Arg: kind, Text: the whole field
	Keep           = "keep"           // Arg: kind: saves what is chosen, with its changes, under the typed name
	Forget         = "forget"         // Arg: kind:id
	Export         = "export"         // everything as a file
	PickImport     = "import-pick"    // asks for a file
	Figures        = "figures"        // the answer as a file of JSON
	Share          = "share"          // hands the answer's sentences on
	Print          = "print"          //
	Undo           = "undo"           //
	Dismiss        = "dismiss"        // takes the message away
	Pull           = "pull"           // shows or hides the pull diagram
	MoveStaff      = "move-staff"     // X: place in the section
	StaffStep      = "staff-step"     // Arg: "+" or "-": a fiftieth of the hill
	MoveWeight     = "drag-weight"    // X: place in the balance
	WeightStep     = "weight-step"    // Arg: "+" or "-": a fiftieth of what is wanted
	WeightBack     = "weight-back"    // the weight hangs again where the hill puts it
	SetLanguage    = "language"       // Arg: tag
	SetUnits       = "units"          // Arg: metric or imperial
	SetMark        = "mark"           // Arg: point or comma
	SetTheme       = "theme"          // Arg: sun, dusk, or device
	GoTo           = "go"             // Arg: a place of the page: GoHillside, GoBench or GoSentence
	Measure        = "measure"        // Arg: a way to measure a grade, "" ends it
	DialUp         = "dial-up"        // Arg: path of a dial
	DialDown       = "dial-down"      // Arg: path of a dial
	Pick           = "pick"           // Arg: name=choice
	Average        = "average"        // begins to average what the sensor says
	Freeze         = "freeze"         // holds what is seen along the edge, or goes on
	OneReading     = "once"           // makes a reading of one average
	StartOver      = "over"           // forgets the averages
	Read           = "read"           // makes a reading of what is set, recorded or marked
	TrackHandle    = "handle"         // Arg: DialFrom or DialTo, X: place in the section
	Tell           = "tell"           // says the answer
	PlaceNext      = "place-next"     // goes on to the next pitch
	PlaceTo        = "place-to"       // Arg: a pitch's name
	PlaceName      = "place-name"     // Text: the whole field
	ReadingOpen    = "reading"        // Arg: id
	ReadingNote    = "note"           // Arg: id=note
	TypeNote       = "note-type"      // Arg: id, Text: the whole field
	ReadingForget  = "reading-forget" // Arg: id
	HillOfReadings = "readings-hill"  // makes a hill of the day's pitches
	ReadingsCSV    = "readings-csv"   // all readings as a file
	ReadingsGPX    = "readings-gpx"   // all readings as a file
	GroupOpen      = "group"          // shows or hides who can be added
	GroupAdd       = "group-add"      // Arg: a rider's id, on the chosen bike
	GroupTake      = "group-take"     // Arg: number in the group: they become who is asked about
	GroupDrop      = "group-drop"     // Arg: number in the group
	BenchJob       = "bench-job"      // Arg: JobCoast or JobStand
	GradeFromSide  = "bench-grade"    // takes the hillside's grade
	SoundFor       = "sound-for"      // Arg: ForRun, ForSpin, ForCount: records
	SoundFrom      = "sound-from"     // Arg: as SoundFor: asks for a file
	SoundDone      = "sound-done"     // ends the recording
	SoundKeep      = "sound-keep"     // the recording at hand as a file
	SoundAgain     = "sound-again"    // listens to it once more
	SoundLeave     = "sound-leave"    // stops listening
	LapsBegin      = "laps"           // Arg: LapMarks or LapDisplay, "" ends without a run
	Lap            = "lap"            // ClockS
	LapBack        = "lap-back"       // takes the last back
	LapsEnd        = "laps-end"       // makes a run of them
	RunWay         = "run-way"        // Arg: id=out or id=back
	RunUse         = "run-use"        // Arg: id=yes or id=no
	RunForget      = "run-forget"     // Arg: id
	CutHandle      = "cut"            // Arg: id=from or id=to, X: place in the picture
	CutLater       = "cut-later"      // Arg: id=from or id=to: half a second later
	CutEarlier     = "cut-earlier"    // Arg: id=from or id=to
	IntoBike       = "into-bike"      // puts what was measured into the bike

	UseNew     = "use-new"    // takes the new version
	GoOn       = "go-on"      // after something broke
	SaveBroken = "broke-save" // everything as a file, after something broke
)

// What the device reports.
const (
	Restored    = "restored"     // Data: a file of things; Text: settings
	TrackFile   = "track-file"   // Arg: the file's name, Data: a track, picked or dropped
	TrackPart   = "track-part"   // X: the part that is read
	TrackRead   = "track-read"   // Hill, Arg: the file's name
	TrackFailed = "track-failed" // Err
	ImportFile  = "import-file"  // Arg: the file's name, Data
	Stored      = "stored"       // Arg: refused, full, loose or safe
	Waiting     = "waiting"      // a new version waits
	Wide        = "wide"         // X: how wide pictures are [px]
	Dropping    = "dropping"     // Arg: "over" or "": a file hangs over the page
	DeviceLikes = "device-likes" // Arg: language tag, Text: "," or ".": what the device prefers
	Broke       = "broke"        // Text: what happened
	CanShare    = "can-share"    //

	Tilted       = "tilted"        // Leans
	Sensor       = "sensor"        // Arg: absent or refused
	Located      = "located"       // Fix
	LocateFailed = "locate-failed" // Arg: absent, refused or lost
	Awoken       = "awoken"        // the screen is kept awake
	Zone         = "zone"          // X: what the device's clock is ahead of UTC [s]
	Voiced       = "voiced"        // Arg: tags of the languages that the device speaks by itself

	SoundLevel   = "sound-level"   // X: the loudest sample lately, full scale 1; Y: how long it records [s]; Text: "gain" where the device changes the level by itself
	SoundReady   = "sound-ready"   // Arg: the name of the recording at hand, Text: "recorded" or "file"
	SoundFailed  = "sound-failed"  // Arg: absent, refused, lost or full
	ListenPart   = "listen-part"   // X: the part that is heard
	Listened     = "listened"      // Heard; X: where the file is cut off [s], 0 when it is whole
	ListenFailed = "listen-failed" // Err
)

// ByHand lists the names that an element may carry in data-act.
func ByHand() []string {
	return []string{
		Open, Close, ShowPath, ShowAll, StepUp, StepDown, Type, Typed, SetTo, SourceTo, Reset, RoundTrip, Choose,
		TypeSections, Sketch, SketchClear, SketchLong, PickTrack, StopTrack, TypeName, Keep, Forget, Export, PickImport,
		Figures, Share, Print, Undo, Dismiss, Pull, MoveStaff, StaffStep, MoveWeight, WeightStep, WeightBack,
		SetLanguage, SetUnits, SetMark, SetTheme,
		GoTo, Measure, DialUp, DialDown, Pick, Average, Freeze, OneReading, StartOver, Read, TrackHandle, Tell,
		PlaceNext, PlaceTo, PlaceName, ReadingOpen, ReadingNote, TypeNote, ReadingForget, HillOfReadings, ReadingsCSV, ReadingsGPX,
		GroupOpen, GroupAdd, GroupTake, GroupDrop,
		BenchJob, GradeFromSide, SoundFor, SoundFrom, SoundDone, SoundKeep, SoundAgain, SoundLeave, LapsBegin, Lap, LapBack, LapsEnd,
		RunWay, RunUse, RunForget, CutHandle, CutLater, CutEarlier, IntoBike, UseNew, GoOn, SaveBroken,
	}
}
