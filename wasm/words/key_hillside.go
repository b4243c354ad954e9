package words

// The catalogue goes on: the hillside.
const (
	// The other place of the page, as a button in its head.
	GoHillside Key = rideKeys + iota
	GoSentence
	HeadGrade
	HeadMeasure
	HeadPitch
	HeadGroup
	HeadReadings
	NoGrade

	// PlusMinus: error. PlaceNumber: number. ReadTimes: how many readings count together.
	PlusMinus
	PlaceNumber
	ReadOnce
	ReadTimes

	// ReadMisfit: factor.
	ReadMisfit
	ReadOdd

	PlaceNextButton
	FootName
	PlaceNamed
	MeasureAgain
	MeasureStop

	// The ways to measure: name, and one line.
	WayTilt
	WaySight
	WayTape
	WayWheel
	WayRide
	WayTrack
	TiltHow
	TiltTake
	TiltTurn
	TiltTurnBike
	TiltTurned
	TiltOnce
	TiltOver

	// TiltFirst: angle in per cent.
	TiltFirst

	// TiltKnown: offset in degrees.
	TiltKnown
	TiltUnknown
	TiltSteady
	TiltMoving
	TiltDrifting
	TiltAveraging
	TiltWaiting
	SensorAbsent
	SensorRefused
	SupportName
	SupportEdge
	SupportTube
	SightHow
	SightFreeze
	SightGoOn
	SightUse
	TapeHow
	TapeHowLength
	TapeName
	TapeLevel
	TapeRoad
	TapeMap

	// WheelHow: roll-out.
	WheelHow
	HeightsName
	HeightsStairs
	HeightsPressure
	HeightsSatellite
	HeightsSurveyed
	RideHow
	RideWaiting
	RideRefused
	RideAbsent
	RideLost

	// RideFixes: how many, how far.
	RideFixes

	// TrackHow: hill.
	TrackHow
	TrackHeights
	ReadUse
	AwakeNote

	// Dials: what a thumb sets while measuring.
	DialRise
	DialSpan
	DialEdge
	DialTurns
	DialStairs
	DialStair
	DialFoot
	DialTop
	DialLength
	DialPaces
	DialPace
	DialRolled
	DialFrom
	DialTo
	LengthName
	LengthTyped
	LengthPaces
	LengthRolled

	// The word of the hillside. WordRolling: the gear.
	WordGo
	WordRolling
	WordStop
	WordAgain
	MeansGo

	// MeansRolling: gear, speed of the run-up. MeansRollingOne: that speed.
	MeansRolling
	MeansRollingOne

	// MeansStop: where, how long the pitch is.
	MeansStop

	// MeansAgain: the gentler grade, the steeper one.
	MeansAgain
	StraddleStart

	// Names of the pitch's figures.
	PitchSpeed
	PitchGear
	PitchBinds
	PitchHolds
	PitchHoldsAlways
	PitchNoMotor
	PitchCharge
	PitchGrip
	PitchLift
	PitchLoose
	PitchLifts
	PitchStays
	PitchHeld
	PitchTime

	// DownStop: speed.
	DownStop
	DownNoStopping
	TellButton
	TellName
	TellVoice
	TellTones
	TellNone
	TonesMean

	// SpokenGrade: grade, error, word. SpokenGear: gear. SpokenDown: speed.
	SpokenGrade
	SpokenGear
	SpokenDown

	// GroupAdd: bike.
	GroupAdd
	GroupNone

	// GroupOn: rider, bike.
	GroupOn
	GroupWeakest
	GroupRemove

	// GroupAll: how many, the word of the weakest.
	GroupAll
	ReadingsNone
	ReadingsHill
	ReadingsCSV
	ReadingsGPX
	ReadingsCount
	ReadingNoteName
	NoteWet
	NoteLoose
	NoteSteepest

	// HillOfDay: day.
	HillOfDay

	// HillMade: name, length, ascent.
	HillMade
	GPXNote

	// How a reading was taken.
	MethodTilt
	MethodTurned
	MethodSight
	MethodTape
	MethodLevel
	MethodHeights
	MethodStairs
	MethodRide
	MethodTrack
	MethodOther

	// Why no reading comes out. SlopeNumber, SlopeRange: what.
	SlopeNumber
	SlopeRange
	SlopeShort
	SlopeNotTurned
	SlopeNotCalibrated
	SlopeNotEnough
	SlopeNoHeights
	CautionHillside
	CautionWetRoad

	hillsideKeys // how many there are so far; key_bench.go goes on
)
