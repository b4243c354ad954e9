package words

// The catalogue goes on: what stops a bike besides pull, starting, heat, charge,
// legs, the way down, and the inputs that belong to them.
const (
	// The limits of heat, cells, grip and balance: short and long, as the others.
	LimitHeat Key = pageKeys + iota
	LimitCells
	LimitGrip
	LimitLift
	LimitHeatLong
	LimitCellsLong
	LimitGripLong
	LimitLiftLong

	// What binds, as the subject of a sentence. WhatHeatAt: the winding's
	// temperature. WhatCellsCold, WhatCellsColdLow: the pack's temperature.
	// WhatCellsOld: capacity left. WhatGripRear, WhatGripFront: ground; those that
	// end in Mu: friction coefficient. WhatRiderEmpty: assist level.
	WhatHeat
	WhatHeatAt
	WhatCells
	WhatCellsCold
	WhatCellsLow
	WhatCellsColdLow
	WhatCellsOld
	WhatGripRear
	WhatGripFront
	WhatGripRearMu
	WhatGripFrontMu
	WhatLift
	WhatRiderEmpty
	WhatRiderEmptyAlone

	// On which way: the stretch of the sentence, or a place; number of the trip.
	WhyOnBack
	WhyOnTrip
	WhyOnTripBack
	WhyAtBack
	WhyAtTrip
	WhyAtTripBack
	WhyStopsAtTurn

	// WhyStopsShift: where, gear from which it changed.
	WhyStopsShift

	// Starting from rest on the hardest stretch. StartOK, StartOther: gear.
	// StartNot: wanted pull, what stops it, pull it allows.
	StartOK
	StartOther
	StartOneGear
	StartNot
	StartPush
	StartNoPush

	// How long the motor holds. HoldsFor: how long, winding's peak on this ride.
	// HoldsAlways: the peak.
	HoldsFor
	HoldsAlways
	MotorTurnsInto

	// The pack. ChargeIsLeft: charge left. ChargeTrips: how many. ChargeGaveOut:
	// where.
	ChargeIsLeft
	ChargeGaveOut
	ChargeTrips
	ChargeOneTrip
	ChargeNoTrip
	ChargeManyTrips

	// The rider's legs. LegsForGood: power wanted, critical power. LegsLeft: power
	// wanted, critical power, part of W′ left at the least. LegsEmpty: the same.
	LegsForGood
	LegsLeft
	LegsEmpty

	// The round trip. TourTimes: how often, with TourOne or TourBack. TourAll: what
	// was said so far, time of everything. TourPause: the same with the pause.
	TourOne
	TourBack
	TourTimes
	TourAll
	TourPause

	// The way down. DownMost...: speed. DownStops: speed, stopping distance, fall,
	// what bounds the stop. DownBrakes: front and rear temperature.
	DownNone
	DownNever
	DownMostHeat
	DownMostSight
	DownMostCap
	DownTooHot
	DownStops
	DownNoStop
	DownBrakes
	StopBrakes
	StopFront
	StopRear
	StopBoth
	StopOver

	// Cautions made from the answer. CautionTooFast: chosen speed, speed not to
	// exceed. CautionFading: warmer brake's temperature. CautionSlippery: ground.
	// CautionCarries: load.
	CautionTooFast
	CautionFading
	CautionWet
	CautionOverBars
	CautionSlides
	CautionCarries
	CautionTrailer

	// Names of figures: the strip under the section, and the answer's.
	StripTitle
	StripHeat
	StripCharge
	StripLegs
	LabelStart
	LabelTour
	LabelTourTime
	LabelEasing
	LabelNever
	LabelWindingPeak
	LabelEfficiency
	LabelHeatShare
	LabelChargeLeft
	LabelGaveOut
	LabelTrips
	LabelReserveLeft
	LabelDown
	LabelDownMost
	LabelStopping
	LabelFrontPeak
	LabelRearPeak

	// Inputs, by path.
	InCritical
	InReserve
	InDirectDrive
	InVoltage
	InMotorMass
	InTorquePerAmp
	InWinding
	InMaxPackA
	InEaseFrom
	InEaseTo
	InCaseCooling
	InChemistry
	InHealth
	InPackOhm
	InPackMaxA
	InWheelbase
	InBikeAhead
	InBikeHeight
	InRiderAhead
	InRiderHeight
	InRackAhead
	InRackHeight
	InBoxAhead
	InBoxHeight
	InFrontBrake
	InRearBrake
	InFrontShare
	InLoadPlace
	InGround
	InGrip
	InPackTemperature
	InCharge
	InChargeKept
	InBack
	InTrips
	InPause
	InRecover
	InSight
	InReaction

	// Choices of inputs, and what stands when nothing is given.
	ChoiceYes
	ChoiceNo
	ChoiceNickel
	ChoiceIron
	ChoiceRack
	ChoiceBox
	ChoiceTrailer
	BrakeHydraulic160
	BrakeHydraulic180
	BrakeHydraulic203
	BrakeCable160
	BrakeRim
	BrakeDrum
	BrakeCoaster
	BrakeNone
	GroundAsphaltDry
	GroundAsphaltWet
	GroundCobblesDry
	GroundCobblesWet
	GroundGravelDry
	GroundGravelWet
	GroundLeavesWet
	GroundMud
	GroundSnow
	BlankAssumed
	BlankGround
	BlankDay

	// Problems with the parts of a rig.
	ProblemGears
	ProblemBrakes
	ProblemGround

	// Why a class default stands in for a number, by the reasons of
	// physics/assume.
	ReasonMotorMass
	ReasonMotorVoltage
	ReasonMotorCadence
	ReasonMotorTopSpeed
	ReasonMotorWheel
	ReasonMotorWound
	ReasonMotorResistance
	ReasonMotorLeads
	ReasonMotorNoLoad
	ReasonMotorIdle
	ReasonMotorPhase
	ReasonMotorPackCurrent
	ReasonMotorRatio
	ReasonMotorGears
	ReasonMotorRecovery
	ReasonHeatCapacity
	ReasonHeatWinding
	ReasonHeatCase
	ReasonHeatEasing
	ReasonPackVoltage
	ReasonPackNew
	ReasonPackSeries
	ReasonPackResistance
	ReasonPackRelaxation
	ReasonPackCurrent
	ReasonPackRecovery
	ReasonPackCut

	// The strip's bands, short. BandEasing: the temperature from which it eases
	// off. BandKept: the charge kept back. BandLow: a part.
	BandMotor
	BandLegs
	BandEasing
	BandKept
	BandLow

	// The round trip and the charge in the sentence of what is asked. AskPauses:
	// what was said so far, the pause. AskCharge: the charge.
	TourOneWay
	AskPauses
	AskCharge

	// Headings: of the answer's parts, of the groups of a bike's inputs.
	// BrakeCaution: temperature.
	HeadOnWay
	AllLimits
	BrakeCaution
	GroupRolling
	GroupPlaces
	GroupBrakes

	// OnGround: ground. TourTimesBack: how often.
	OnGround
	TourTimesBack

	rideKeys // how many there are so far; key_hillside.go goes on
)
