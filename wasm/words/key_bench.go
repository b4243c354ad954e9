package words

// The catalogue goes on: the bench.
const (
	GoBench Key = hillsideKeys + iota
	HeadBench
	BenchJobs
	JobCoast
	JobStand
	BenchCoastIntro
	BenchStandIntro

	// AskBenchBike: {0} bike, {1} mass, {2} clicks, {3} roll-out.
	AskBenchBike

	// AskBenchRoad: {0} grade, {1} its error, {2} wind.
	AskBenchRoad

	// AskBenchWheel: {0} clicks, {1} roll-out, {2} inertia of both wheels.
	AskBenchWheel

	// BenchGradeHere: {0} grade with error.
	BenchGradeHere
	BenchClicksMissing
	BenchCount

	// BenchCountHow: {0} turns.
	BenchCountHow

	// BenchCounted: {0} clicks, {1} turns, {2} per turn.
	BenchCounted
	HeadSound
	SoundRecord
	SoundOpen
	SoundMarks
	SoundDisplay
	SoundHow
	SoundStart
	SoundStop

	// SoundSeconds: {0} seconds.
	SoundSeconds
	SoundQuiet
	SoundGood
	SoundLoud
	SoundLevelName
	SoundGain
	SoundRefused
	SoundAbsent
	SoundLost
	SoundFull

	// SoundListening: {0} name.
	SoundListening
	SoundListenStop
	SoundSave
	SoundAgain
	SoundStopped
	SoundNoFall

	// SoundCut: {0} seconds.
	SoundCut

	// MarksHow: {0} distance.
	MarksHow

	// DisplayHow: {0} speed now, {1} step.
	DisplayHow

	// LapTapAt: {0} what.
	LapTapAt
	LapUndo
	LapDone

	// LapCount: {0} taps.
	LapCount
	DialMarks
	DialShown
	DialFewer
	HeadRuns
	RunsNone

	// RunLine: {0} seconds, {1} from, {2} to speed.
	RunLine
	RunOut
	RunBack
	RunWay
	RunUse
	RunLeave
	RunUsed
	RunForget
	RunOdd
	RunCutFrom
	RunCutTo

	// RunMisfit: {0} factor.
	RunMisfit
	RunNoClicks
	RunForgotten
	ClickPicture

	// ClickPictureSays: {0} from, {1} to seconds, {2} first, {3} last speed.
	ClickPictureSays
	ClickPictureNote
	HeadDrag
	DragCrr
	DragCdA
	DragKey
	DragHeldCrr
	DragHeldCdA

	// DragLean: {0} correlation.
	DragLean

	// DragFree: {0} correlation.
	DragFree
	DragOneWay

	// DragRoad: {0} grade with error, {1} wind with error.
	DragRoad
	DragGusts

	// DragShares: {0} speed, {1} rolling, {2} air.
	DragShares
	HeadIntoBike
	IntoBikeButton

	// IntoBikeDone: {0} Crr, {1} CdA.
	IntoBikeDone
	IntoBikeNow
	IntoBikeThen
	IntoBikeSame
	HeadSpun
	SpunFine
	SpunDrags
	SpunTorque

	// SpunPower: {0} speed.
	SpunPower
	SpunTypical

	// SpunRest: {0} speed.
	SpunRest

	// SpunRub: {0} decibel.
	SpunRub
	SpunNoRub
	UnitClicks
	TurnPicture
	CautionCoast
	CautionMotorOff
	CautionStand
	InClicks
	InAround
	InCoastMass
	InCoastMassError
	InCoastGrade
	InCoastGradeError
	InCoastWind
	InCoastWindError
	InRolledTurns
	BlankUnknown
	BlankRollout
	BlankSum
	BlankLevel
	BlankUsual
	HeadCoast
	SoundEmpty

	// SoundNotSound: {0} what it looks like.
	SoundNotSound
	SoundUnknown

	// LookRecording: {0} kind.
	LookRecording
	LookATrack
	LookAText
	LookAPicture
	LookAnArchive

	// SoundWAV: {0} number.
	SoundWAV

	// SoundBits: {0} number.
	SoundBits

	// SoundRate: {0} number.
	SoundRate

	// SoundSlow: {0} number.
	SoundSlow
	SoundNoSamples
	SoundDamaged

	// ClickTooShort: {0} seconds.
	ClickTooShort
	ClickTooLong
	ClickSilent

	// ClickNone: {0} seconds.
	ClickNone
	ClickNoSingle
	ClickDamaged
	CoastNoRun
	CoastBadNumber

	// CoastTooFew: {0} run, {1} got, {2} wanted.
	CoastTooFew

	// CoastTooShort: {0} run, {1} got, {2} wanted.
	CoastTooShort

	// CoastTooSlow: {0} run, {1} got, {2} wanted.
	CoastTooSlow

	// CoastSmallRange: {0} run, {1} got, {2} wanted.
	CoastSmallRange

	// CoastSpeedsUp: {0} run.
	CoastSpeedsUp
	CoastCannotTell

	// CoastImpossible: {0} Crr, {1} CdA.
	CoastImpossible

	// CoastNotWhole: {0} per turn, {1} turns.
	CoastNotWhole
	CoastTooNoisy

	keys // how many there are
)
