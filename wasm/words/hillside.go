package words

import (
	"math"
	"strconv"

	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/slope"
	"hillwright/physics/unit"
)

// Word is the hillside's word for a pitch, the better first.
type Word uint8

// The words. Go: it holds, and starts from rest on the pitch. Rolling: it holds
// when it comes rolling. Stop: it does not. Again: the reading does not decide.
const (
	Go Word = iota
	Rolling
	Again
	Stop
)

var wordNames = [...]Key{Go: WordGo, Rolling: WordRolling, Again: WordAgain, Stop: WordStop}

// WordOf is the word of an answer for a pitch that was ridden from a run-up.
func WordOf(a *ride.Answer) Word {
	switch {
	case a.Verdict == ride.Short || a.Stalled:
		return Stop
	case !a.Start.OK:
		return Rolling
	}
	return Go
}

// Word says it.
func (v Voice) Word(w Word) string { return v.text(wordNames[w]) }

// Tones that tell a word, and the steps of measuring: the pattern is what
// package device plays.
func ToneOf(w Word) string {
	return [...]string{Go: "go", Rolling: "rolling", Again: "again", Stop: "stop"}[w]
}

// Means says in one sentence what a word means here: low and high are the ends
// of the 90 % interval, lengthM the pitch's length [m].
func (v Voice) Means(r *rig.Rig, a *ride.Answer, w Word, low, high unit.Grade, lengthM, rollingMps float64) string {
	switch w {
	case Go:
		return v.text(MeansGo)
	case Rolling:
		if len(r.Gears) == 1 {
			return v.Say(MeansRollingOne, v.Speed(rollingMps))
		}
		return v.Say(MeansRolling, v.Gear(r, a.Hardest.Running.Gear), v.Speed(rollingMps))
	case Again:
		return v.Say(MeansAgain, v.Grade(low), v.Grade(high))
	}
	return v.Say(MeansStop, v.Length(a.StalledAtM), v.Length(lengthM))
}

// PitchSpoken is the answer as it is read aloud: the grade and its error, the
// word, the gear, the speed not to exceed on the way down.
func (v Voice) PitchSpoken(r *rig.Rig, a *ride.Answer, w Word, g unit.Grade, err float64) string {
	text := v.Say(SpokenGrade, v.Grade(g), v.Grade(unit.Grade(err)), v.Word(w))
	if w != Stop && len(r.Gears) > 1 && a.Hardest.Running.SpeedMps > 0 {
		text += " " + v.Say(SpokenGear, v.Gear(r, a.Hardest.Running.Gear))
	}
	if a.WayDown.Falls {
		text += " " + v.Say(SpokenDown, v.Speed(a.WayDown.MostMps))
	}
	return text
}

// GradeError writes the error of a grade, in per cent to a tenth below 10 %.
func (v Voice) GradeError(e float64) string {
	return v.Say(PlusMinus, v.with(v.Number(100*e, decimals(100*e, step{10, 1})), "%"))
}

// GradeFine writes a grade to a tenth of a per cent, as an instrument does.
func (v Voice) GradeFine(g unit.Grade) string { return v.with(v.Number(100*float64(g), 1), "%") }

// Degrees writes an angle to a tenth of a degree.
func (v Voice) Degrees(a unit.Angle) string { return v.with(v.Number(a.Degrees(), 1), "°") }

var methodNames = []struct {
	method slope.Method
	name   Key
}{
	{slope.ByTilt, MethodTilt}, {slope.ByTurnedTilt, MethodTurned}, {slope.BySight, MethodSight},
	{slope.ByTape, MethodTape}, {slope.ByLevel, MethodLevel},
	{slope.ByWheelHeights, MethodHeights}, {slope.ByWheelStairs, MethodStairs},
	{slope.ByRide, MethodRide}, {slope.ByTrack, MethodTrack},
}

// Method tells how a grade was read.
func (v Voice) Method(m slope.Method) string {
	for _, each := range methodNames {
		if each.method == m {
			return v.text(each.name)
		}
	}
	return v.text(MethodOther)
}

var slopeTexts = [...]Key{
	slope.NotANumber: SlopeNumber, slope.OutOfRange: SlopeRange, slope.TooShort: SlopeShort,
	slope.NotTurned: SlopeNotTurned, slope.NotCalibrated: SlopeNotCalibrated,
	slope.NotEnough: SlopeNotEnough, slope.NoHeights: SlopeNoHeights,
}

var slopeThings = []struct {
	what string
	name Key
}{
	{"grade", LabelGrade}, {"rise", DialRise}, {"length", DialSpan}, {"length of the edge", DialEdge}, {"turns", DialTurns},
	{"steps", DialStairs}, {"height of a step", DialStair}, {"height", AxisHeight}, {"paces", DialPaces}, {"pace", DialPace},
}

func (v Voice) slopeProblem(e *slope.Error) string {
	what := e.What
	for _, each := range slopeThings {
		if each.what == e.What {
			what = v.text(each.name)
		}
	}
	return capital(v.Say(slopeTexts[e.Kind], what))
}

// dials are what a thumb sets while measuring, as inputs are.
var dials = []input{
	{"dial.rise", DialRise, asPlace, [2]float64{0.5, 0.25}},
	{"dial.span", DialSpan, asPlace, [2]float64{10, 4}},
	{"dial.edge", DialEdge, asPlace, [2]float64{10, 4}},
	{"dial.turns", DialTurns, asIs, [2]float64{0.25, 0.25}},
	{"dial.stairs", DialStairs, asIs, [2]float64{1, 1}},
	{"dial.stair", DialStair, asPlace, [2]float64{0.5, 0.25}},
	{"dial.foot", DialFoot, asHeight, [2]float64{1, 2}},
	{"dial.top", DialTop, asHeight, [2]float64{1, 2}},
	{"dial.length", DialLength, asHeight, [2]float64{5, 20}},
	{"dial.paces", DialPaces, asIs, [2]float64{1, 1}},
	{"dial.pace", DialPace, asPlace, [2]float64{5, 2}},
	{"dial.rolled", DialRolled, asIs, [2]float64{1, 1}},
	{"dial.from", DialFrom, asHeight, [2]float64{10, 20}},
	{"dial.to", DialTo, asHeight, [2]float64{10, 20}},
	{"dial.marks", DialMarks, asHeight, [2]float64{5, 10}},
	{"dial.shown", DialShown, asSpeed, [2]float64{1, 1}},
	{"dial.fewer", DialFewer, asSpeed, [2]float64{1, 1}},
}

// Clock writes the time of day of a local time [s since 1970]: "07:05".
func Clock(localS float64) string {
	if math.IsNaN(localS) {
		return dash
	}
	m := int64(math.Floor(localS/60)) % (24 * 60)
	if m < 0 {
		m += 24 * 60
	}
	return two(m/60) + ":" + two(m%60)
}

// Day writes the day of a local time [s since 1970] by ISO 8601: "2026-05-09".
func Day(localS float64) string {
	if math.IsNaN(localS) {
		return dash
	}
	// Days of the Gregorian calendar, counted from 1 March of the year 0 so that
	// the leap day comes last (Hatcher 1984, Q. J. R. astr. Soc. 25, 53–55).
	n := int64(math.Floor(localS/86400)) + 719468
	era := n / 146097
	day := n % 146097
	year := (day - day/1460 + day/36524 - day/146096) / 365
	day -= 365*year + year/4 - year/100
	month := (5*day + 2) / 153
	date := day - (153*month+2)/5 + 1
	year += 400 * era
	if month += 3; month > 12 {
		month, year = month-12, year+1
	}
	return strconv.FormatInt(year, 10) + "-" + two(month) + "-" + two(date)
}

func two(n int64) string {
	if n < 10 {
		return "0" + strconv.FormatInt(n, 10)
	}
	return strconv.FormatInt(n, 10)
}
