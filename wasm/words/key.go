package words

// Key is one text of the catalogue.
type Key uint16

// The catalogue. A comment above a key tells what its blanks {0}, {1} hold.
const (
	// The answer's word, its shape's name is the same.
	VerdictClears Key = iota
	VerdictTight
	VerdictShort
	VerdictClearsMeans
	VerdictTightMeans
	VerdictShortMeans

	// The sentence with blanks. AskClimb: rider, load, bike, hill, day. AskRider:
	// name, mass, power. AskLoad: name, mass. AskDay: name, temperature, ground. AskRide:
	// assist level, speed at the foot, law.
	AskClimb
	AskRider
	AskLoad
	AskDay
	AskLevel
	AskLevelOff
	AskLevelHighest
	AskTouch
	AskMore

	// Headings of the page's parts.
	HeadAnswer
	HeadInputs
	HeadFigures
	HeadLimits
	HeadBike
	HeadRider
	HeadLoad
	HeadHill
	HeadDay
	HeadRide
	HeadKept
	OpenKept
	HeadSettings
	HeadCautions

	// Names of the answer's figures.
	LabelHardest
	LabelBinds
	LabelNext
	LabelSetsSpeed
	LabelHeadroom
	LabelWanted
	LabelAllowed
	LabelSpeed
	LabelGear
	LabelCadence
	LabelTime
	LabelRiderShare
	LabelMotorShare
	LabelRiderEnergy
	LabelMotorEnergy
	LabelPackEnergy
	LabelLength
	LabelAscent
	LabelGrade
	LabelSteepestHeld
	LabelStalledAt
	LabelSource

	// StretchAt: length, grade, where from along the road.
	StretchAt

	HeadroomLeft
	HeadroomShort
	GearNone

	// The limits: short for a peg's label, long as what it means, in one clause.
	LimitTorque
	LimitPower
	LimitRider
	LimitCutOff
	LimitCadence
	LimitCoasting
	LimitTorqueLong
	LimitPowerLong
	LimitRiderLong
	LimitCutOffLong
	LimitCadenceLong
	LimitCoastingLong

	// The three pictures: title, what they show, and their text equivalents.
	SectionTitle
	SectionHelp

	// SectionText: length, ascent, hardest stretch (StretchAt), headroom there.
	SectionText

	// SectionStalled: where it stops.
	SectionStalled

	// StaffText: where, grade, speed, gear, headroom.
	StaffText
	Exaggeration
	HatchOpen
	HatchClose
	HatchSolid
	BalanceTitle
	BalanceHelp

	// BalanceText: wanted pull, grade, speed of the weighing.
	BalanceText

	BalanceWeight

	// BalanceTried: the grade that a dragged weight stands for.
	BalanceTried
	PullTitle
	PullHelp

	// PullText: grade, speed, gear, limit that sets it.
	PullText

	// PullTextNone: grade.
	PullTextNone
	PullLoad
	AxisSpeed
	AxisPull
	AxisLength
	AxisHeight

	// Buttons.
	ButtonDone
	ButtonCancel
	ButtonSave
	ButtonForget
	ButtonUndo
	ButtonLess
	ButtonClose
	ButtonFile
	ButtonExport
	ButtonImport
	ButtonPrint
	ButtonUseNew
	ButtonBackToShop

	// StepUp, StepDown: name of the input.
	StepUp
	StepDown

	// Things that are kept.
	KeptBikes
	KeptRiders
	KeptLoads
	KeptHills
	KeptDays
	KeptNone
	KeptName
	KeptNameTaken

	// KeptSaved, KeptForgotten: name.
	KeptSaved
	KeptForgotten
	KeptChanged

	// Hills.
	HillDrop
	HillDropHelp
	HillSections
	HillSectionsHint
	HillReading
	HillRead
	HillTyped
	HillDrawn
	HillDraw
	HillDrawHelp
	HillDrawAgain
	HillTrack

	// The device, settings and the network.
	NewVersion
	SetLanguage
	SetUnits
	SetMetric
	SetImperial
	SetMark
	SetPoint
	SetComma
	SetTheme
	SetThemeSun
	SetThemeDusk
	SetThemeDevice
	LanguageSelf
	StorageRefused
	StorageFull
	StorageLoose

	// ImportSummary: how many things are new, replaced, the same, older than what
	// is here.
	ImportSummary

	// ExportDone: file name.
	ExportDone

	// The panel when something broke.
	BrokeTitle
	BrokeKept
	BrokeSave
	BrokeGoOn
	BrokeDetail

	// ChangesGone: name.
	ChangesGone
	ButtonFigures
	ButtonShare
	StaffBack
	StaffOn
	WeightBackToHill
	SameInFigures

	// NoteThere: speed, gear, cadence.
	NoteThere

	// NoteBinds: limit, headroom.
	NoteBinds

	// NoteNext: limit, headroom.
	NoteNext

	// NoteWhole: length, ascent, time.
	NoteWhole

	// NoteUntil: where, time.
	NoteUntil

	// NoteShares: rider's energy, motor's energy, motor's part.
	NoteShares

	// NotePack: energy, part of the pack.
	NotePack

	// NoteHolds: steepest grade held.
	NoteHolds

	// NoteBand: lowest, highest.
	NoteBand
	FaultsIn
	SectionsUse

	// Cautions.
	CautionDescent
	CautionGrip
	CautionLoad
	CautionLaw
	CautionPractice
	CautionEstimate

	// Where a number came from.
	SourceAssumed
	SourceSheet
	SourceMeasured

	// Units that differ by language.
	UnitTurnsPerMin
	UnitTeeth

	// Inputs, by path.
	InRiderMass
	InRiderPower
	InCadenceLow
	InCadenceLiked
	InCadenceHigh
	InCrank
	InHoldSpeed
	InBikeMass
	InCrr
	InCdA
	InWheelDrag
	InWheelInertia
	InTyre
	InRollout
	InChainrings
	InSprockets
	InHubRatios
	InDriveEfficiency
	InShift
	InMotorKind
	InMotorTorque
	InMotorPower
	InMotorLevels
	InMotorCadence
	InPack
	InLoadMass
	InLoadCdA
	InTemperature
	InHumidity
	InAltitude
	InDensity
	InWind
	InWindFrom
	InLevel
	InStart
	InDown
	InLaw

	// Choices of inputs (laws: their cut-off), and what stands when nothing is
	// given.
	ChoiceNone
	ChoiceCrank
	ChoiceRearHub
	ChoiceFrontHub
	ChoiceEU25
	ChoiceGB15
	ChoiceUS1
	ChoiceUS2
	ChoiceUS3
	ChoiceJP24
	ChoiceEUL1eA
	ChoiceEU45
	ChoiceCH25
	ChoiceCH45
	ChoiceAU25
	BlankTyre
	BlankNoHub
	BlankNoLevels
	BlankHill
	BlankComputed
	BlankAhead
	BlankHighest

	// Notes on what was mended in a track. NoteAt and NoteTimes follow a note:
	// count, place of the first.
	NoteNoHeights
	NoteZeroHeights
	NoteSpike
	NoteDuplicate
	NotePause
	NoteGap
	NoteSegments
	NoteCoarseHeights
	NoteSomeHeights

	// NoteOver follows a note that concerns a length of road.
	NoteOver
	NoteAt
	NoteTimes
	NotePlain

	// Problems with inputs: name of the input, what was given, what was expected.
	ProblemNoPath
	ProblemGot
	ProblemSource
	ProblemLevel
	ExpectNumber
	ExpectWhole
	ExpectList
	ExpectChoice
	ExpectTyre
	ExpectOr

	// Problems with typed sections. SectionAt: number, text as typed, what is
	// wrong. SectionsAll: what is wrong. The others: the part that does not fit,
	// or the bounds.
	SectionAt
	SectionsAll
	SectionLike
	SectionsEmpty
	SectionEmpty
	SectionNoLength
	SectionNoUnit
	SectionNoGrade
	SectionNoPercent
	SectionAmbiguous
	SectionLeftOver
	SectionLengthRange
	SectionGradeRange
	SectionsTooShort
	SectionsTooLong
	SectionsTooMany

	// Problems with track files. TrackAtLine: line, what is wrong. TrackPoints:
	// how many were read. The others: what was got, or the bound.
	TrackProblem
	TrackAtLine
	TrackPoints
	TrackEmpty
	TrackWrongFile
	TrackDoctype
	TrackBroken
	TrackCutOff
	TrackTooLarge
	TrackTooManyPoints
	TrackNoPoints
	TrackBadPlace
	TrackCancelled
	TrackUnreadable
	TrackTooShort
	TrackBadOption

	// Problems with files of saved things. FaultTooLarge: megabytes. FaultNotJSON,
	// FaultLeftOut: where, detail.
	FaultTooLarge
	FaultNotJSON
	FaultNotOurs
	FaultNewer
	FaultLeftOut

	// Problems with hills made of edges and heights. ProfileAt: edge, what is
	// wrong.
	ProfileAt
	ProfileTooShort
	ProfileLengths
	ProfileNotRising
	ProfileNotANumber
	ProfileTooSteep
	ProblemNoRoad

	// What a wrong file looks like.
	LooksUnknown
	LooksFIT
	LooksZIP
	LooksJPEG
	LooksPNG
	LooksPDF
	LooksGzip
	LooksHTML
	LooksKML
	LooksTCX
	LooksXML
	LooksJSON
	LooksText

	// What binds, as the subject of a sentence, without a capital. WhatTorque,
	// WhatRider: gear; assist level. WhatCutOff: speed.
	WhatTorque
	WhatTorqueHub
	WhatPower
	WhatRider
	WhatRiderAlone
	WhatCutOff
	WhatRatio
	WhatCadence
	WhatCoasting

	// The stretch of the sentence: length, grade; where from. WhyUpTo: the
	// steepest piece.
	WhyStretch
	WhyStretchUpTo
	WhyWhole
	WhyWholeUpTo

	// WhyFoot stands for the place where a stretch begins.
	WhyFoot

	// WhyClears, WhyTight: stretch, wanted pull, what binds, its pull, headroom in
	// per cent.
	WhyClears
	WhyTight

	// WhyMomentum, WhyShort: stretch, wanted pull, what binds, its pull, speed of
	// the weighing.
	WhyMomentum
	WhyShort

	// WhyUnheld: stretch, wanted pull: no limit is known there.
	WhyUnheld

	// WhyStops: where.
	WhyStops
	WhyStopsBefore
	WhyStopsAtFoot
	WhyGivesUp

	// WhyFootDown: where a foot goes down and it starts again from rest.
	WhyFootDown

	// WhyStopsThough: where, though there was pull for the hardest place.
	WhyStopsThough

	// WhySpeed, WhySlowest: speed, what sets it.
	WhySpeed
	WhySpeedToo
	WhySlowest

	// WhyDown: the hill does not climb anywhere: most pull wanted, speed.
	WhyDown

	// WhyAllDown: it wants no pull anywhere: speed.
	WhyAllDown

	// Steady: grade.
	SteadyAt

	// SteadyHolds: steepest grade held. SteadySpeed: speed, what sets it.
	SteadyHolds

	// SteadyDown: grade, speed.
	SteadyDown
	SteadySpeed
	SteadySpeedToo

	pageKeys // how many there are in this file; key_ride.go goes on
)
