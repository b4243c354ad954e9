package words

import (
	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/road"
	"hillwright/physics/rule"
)

// Tables from the computation's own words to keys. Arrays are indexed by its
// constants; Check finds the ones that were forgotten.
var (
	limitNames = [rig.Limits]Key{
		rig.Torque:   LimitTorque,
		rig.Power:    LimitPower,
		rig.Rider:    LimitRider,
		rig.CutOff:   LimitCutOff,
		rig.Cadence:  LimitCadence,
		rig.Heat:     LimitHeat,
		rig.Cells:    LimitCells,
		rig.Grip:     LimitGrip,
		rig.Lift:     LimitLift,
		rig.Coasting: LimitCoasting,
	}
	limitMeanings = [rig.Limits]Key{
		rig.Torque:   LimitTorqueLong,
		rig.Power:    LimitPowerLong,
		rig.Rider:    LimitRiderLong,
		rig.CutOff:   LimitCutOffLong,
		rig.Cadence:  LimitCadenceLong,
		rig.Heat:     LimitHeatLong,
		rig.Cells:    LimitCellsLong,
		rig.Grip:     LimitGripLong,
		rig.Lift:     LimitLiftLong,
		rig.Coasting: LimitCoastingLong,
	}
	verdictNames = []Key{ride.Clears: VerdictClears, ride.Tight: VerdictTight, ride.Short: VerdictShort}
	sourceNames  = []Key{ask.Assumed: SourceAssumed, ask.Sheet: SourceSheet, ask.Measured: SourceMeasured}
	stopTexts    = []Key{
		road.BrakesBound: StopBrakes,
		road.FrontSlides: StopFront,
		road.RearSlides:  StopRear,
		road.BothSlide:   StopBoth,
		road.OverTheBars: StopOver,
	}
	noteTexts = []Key{
		hill.NoteNoHeights:     NoteNoHeights,
		hill.NoteZeroHeights:   NoteZeroHeights,
		hill.NoteSpike:         NoteSpike,
		hill.NoteDuplicate:     NoteDuplicate,
		hill.NotePause:         NotePause,
		hill.NoteGap:           NoteGap,
		hill.NoteSegments:      NoteSegments,
		hill.NoteCoarseHeights: NoteCoarseHeights,
		hill.NoteSomeHeights:   NoteSomeHeights,
	}
)

// choice is the word of one choice, or blank, of one input.
type choice struct {
	path, word string
	name       Key
}

var choices = []choice{
	{"bike.motor.kind", "none", ChoiceNone},
	{"bike.motor.kind", "crank", ChoiceCrank},
	{"bike.motor.kind", "rear-hub", ChoiceRearHub},
	{"bike.motor.kind", "front-hub", ChoiceFrontHub},
	{"ride.law", "eu-25", ChoiceEU25},
	{"ride.law", "gb-15mph", ChoiceGB15},
	{"ride.law", "us-1", ChoiceUS1},
	{"ride.law", "us-2", ChoiceUS2},
	{"ride.law", "us-3", ChoiceUS3},
	{"ride.law", "jp-24", ChoiceJP24},
	{"ride.law", "eu-l1e-a", ChoiceEUL1eA},
	{"ride.law", "eu-45", ChoiceEU45},
	{"ride.law", "ch-25", ChoiceCH25},
	{"ride.law", "ch-45", ChoiceCH45},
	{"ride.law", "au-25", ChoiceAU25},
	{"bike.rollout_m", "tyre", BlankTyre},
	{"bike.hub_ratios", "none", BlankNoHub},
	{"bike.motor.levels", "none", BlankNoLevels},
	{"day.altitude_m", "hill", BlankHill},
	{"day.density_kgm3", "computed", BlankComputed},
	{"day.wind_from_deg", "ahead", BlankAhead},
	{"ride.level", "highest", BlankHighest},
	{"bike.motor.direct_drive", "no", ChoiceNo},
	{"bike.motor.direct_drive", "yes", ChoiceYes},
	{"ride.back", "no", ChoiceNo},
	{"ride.back", "yes", ChoiceYes},
	{"ride.recover", "no", ChoiceNo},
	{"ride.recover", "yes", ChoiceYes},
	{"bike.pack.chemistry", "nickel", ChoiceNickel},
	{"bike.pack.chemistry", "iron-phosphate", ChoiceIron},
	{"load.place", "rack", ChoiceRack},
	{"load.place", "box", ChoiceBox},
	{"load.place", "trailer", ChoiceTrailer},
	{"bike.front_brake", "hydraulic-160", BrakeHydraulic160},
	{"bike.front_brake", "hydraulic-180", BrakeHydraulic180},
	{"bike.front_brake", "hydraulic-203", BrakeHydraulic203},
	{"bike.front_brake", "cable-disc-160", BrakeCable160},
	{"bike.front_brake", "rim", BrakeRim},
	{"bike.front_brake", "drum", BrakeDrum},
	{"bike.front_brake", "coaster", BrakeCoaster},
	{"bike.front_brake", "none", BrakeNone},
	{"bike.rear_brake", "hydraulic-160", BrakeHydraulic160},
	{"bike.rear_brake", "hydraulic-180", BrakeHydraulic180},
	{"bike.rear_brake", "hydraulic-203", BrakeHydraulic203},
	{"bike.rear_brake", "cable-disc-160", BrakeCable160},
	{"bike.rear_brake", "rim", BrakeRim},
	{"bike.rear_brake", "drum", BrakeDrum},
	{"bike.rear_brake", "coaster", BrakeCoaster},
	{"bike.rear_brake", "none", BrakeNone},
	{"day.ground", "asphalt-dry", GroundAsphaltDry},
	{"day.ground", "asphalt-wet", GroundAsphaltWet},
	{"day.ground", "cobbles-dry", GroundCobblesDry},
	{"day.ground", "cobbles-wet", GroundCobblesWet},
	{"day.ground", "gravel-dry", GroundGravelDry},
	{"day.ground", "gravel-wet", GroundGravelWet},
	{"day.ground", "leaves-wet", GroundLeavesWet},
	{"day.ground", "mud", GroundMud},
	{"day.ground", "snow", GroundSnow},
	{"bike.motor.mass_kg", "assumed", BlankAssumed},
	{"bike.motor.torque_nm_per_a", "assumed", BlankAssumed},
	{"bike.motor.winding_ohm", "assumed", BlankAssumed},
	{"bike.motor.max_pack_a", "assumed", BlankAssumed},
	{"bike.motor.ease_from_c", "assumed", BlankAssumed},
	{"bike.motor.ease_to_c", "assumed", BlankAssumed},
	{"bike.motor.case_w_per_k", "assumed", BlankAssumed},
	{"bike.pack.resistance_ohm", "assumed", BlankAssumed},
	{"bike.pack.max_a", "assumed", BlankAssumed},
	{"day.grip", "ground", BlankGround},
	{"day.pack_c", "day", BlankDay},
	{"coast.clicks_per_turn", "unknown", BlankUnknown},
	{"coast.circumference_m", "rollout", BlankRollout},
	{"coast.mass_kg", "sum", BlankSum},
	{"coast.mass_error_kg", "usual", BlankUsual},
	{"coast.grade", "level", BlankLevel},
	{"coast.grade_error", "usual", BlankUsual},
}

// Choice gives the person's word for a choice of an input ("crank" of
// bike.motor.kind), or for the word that means "not given" ("tyre" of
// bike.rollout_m). One that is not known is its own word.
func (v Voice) Choice(path, word string) string {
	for _, c := range choices {
		if c.path != path || c.word != word {
			continue
		}
		if law, ok := rule.ByID(word); ok {
			return v.Say(c.name, v.cutOff(&law))
		}
		return v.text(c.name)
	}
	return word
}

// cutOff is the speed at which a law ends assistance.
func (v Voice) cutOff(law *rule.Law) string {
	value, unitName := v.speedIn(law.SpeedMps)
	return v.with(v.short(value, 1), unitName)
}

// Limit is a limit's short name, as on a peg's label.
func (v Voice) Limit(l rig.Limit) string { return v.text(limitNames[l]) }

// LimitLong tells in one clause what a limit is.
func (v Voice) LimitLong(l rig.Limit) string { return v.text(limitMeanings[l]) }

// Verdict is the word of an answer.
func (v Voice) Verdict(x ride.Verdict) string { return v.text(verdictNames[x]) }

// Source tells where a number came from.
func (v Voice) Source(s ask.Source) string { return v.text(sourceNames[s]) }

// Note tells what was mended in a track, how often and where first.
func (v Voice) Note(n hill.Note) string {
	text := v.text(noteTexts[n.Kind])
	if n.LengthM > 0 {
		text = v.Say(NoteOver, text, v.Length(n.LengthM))
	}
	switch {
	case everywhere(n.Kind) || n.Count < 1:
		return v.Say(NotePlain, text)
	case n.Count == 1:
		return v.Say(NoteAt, text, v.Length(n.AtM))
	}
	return v.Say(NoteTimes, text, v.Number(float64(n.Count), 0), v.Length(n.AtM))
}

// everywhere tells that a note is of the whole track and not of places in it.
func everywhere(k hill.NoteKind) bool {
	return k == hill.NoteNoHeights || k == hill.NoteZeroHeights || k == hill.NoteCoarseHeights
}
