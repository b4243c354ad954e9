package words

import "hillwright/physics/hill"

// sectionTexts says what is wrong with typed sections.
var sectionTexts = []Key{
	hill.SectionsEmpty:      SectionsEmpty,
	hill.SectionEmpty:       SectionEmpty,
	hill.SectionNoLength:    SectionNoLength,
	hill.SectionNoUnit:      SectionNoUnit,
	hill.SectionNoGrade:     SectionNoGrade,
	hill.SectionNoPercent:   SectionNoPercent,
	hill.SectionAmbiguous:   SectionAmbiguous,
	hill.SectionLeftOver:    SectionLeftOver,
	hill.SectionLengthRange: SectionLengthRange,
	hill.SectionGradeRange:  SectionGradeRange,
	hill.SectionsTooShort:   SectionsTooShort,
	hill.SectionsTooLong:    SectionsTooLong,
	hill.SectionsTooMany:    SectionsTooMany,
}

func (v Voice) sectionProblem(e *hill.SectionError) string {
	first, second := e.Got, ""
	switch e.Kind {
	case hill.SectionLengthRange:
		second = v.Length(hill.LongestTypedM)
	case hill.SectionGradeRange:
		second = v.Grade(hill.SteepestTyped)
	case hill.SectionsTooShort:
		first = v.Height(hill.ShortestTypedM)
	case hill.SectionsTooLong:
		first = v.Length(hill.LongestTypedM)
	case hill.SectionsTooMany:
		first = v.Number(hill.MostTyped, 0)
	}
	what := v.Say(sectionTexts[e.Kind], first, second)
	example := v.Say(SectionLike, v.text(HillSectionsHint))
	if e.Section == 0 {
		return v.Say(SectionsAll, what) + " " + example
	}
	return v.Say(SectionAt, v.Number(float64(e.Section), 0), e.Text, what) + " " + example
}

// profileTexts says what is wrong with a hill of edges and heights.
var profileTexts = []Key{
	hill.ProfileTooShort:   ProfileTooShort,
	hill.ProfileLengths:    ProfileLengths,
	hill.ProfileNotRising:  ProfileNotRising,
	hill.ProfileNotANumber: ProfileNotANumber,
	hill.ProfileTooSteep:   ProfileTooSteep,
}

// trackTexts says why a file gives no track, lookTexts what it looks like.
var (
	trackTexts = []Key{
		hill.TrackEmpty:         TrackEmpty,
		hill.TrackWrongFile:     TrackWrongFile,
		hill.TrackDoctype:       TrackDoctype,
		hill.TrackBroken:        TrackBroken,
		hill.TrackCutOff:        TrackCutOff,
		hill.TrackTooLarge:      TrackTooLarge,
		hill.TrackTooManyPoints: TrackTooManyPoints,
		hill.TrackNoPoints:      TrackNoPoints,
		hill.TrackBadPlace:      TrackBadPlace,
		hill.TrackCancelled:     TrackCancelled,
		hill.TrackUnreadable:    TrackUnreadable,
		hill.TrackTooShort:      TrackTooShort,
		hill.TrackBadOption:     TrackBadOption,
	}
	lookTexts = []Key{
		hill.LooksUnknown: LooksUnknown,
		hill.LooksFIT:     LooksFIT,
		hill.LooksZIP:     LooksZIP,
		hill.LooksJPEG:    LooksJPEG,
		hill.LooksPNG:     LooksPNG,
		hill.LooksPDF:     LooksPDF,
		hill.LooksGzip:    LooksGzip,
		hill.LooksHTML:    LooksHTML,
		hill.LooksKML:     LooksKML,
		hill.LooksTCX:     LooksTCX,
		hill.LooksXML:     LooksXML,
		hill.LooksJSON:    LooksJSON,
		hill.LooksText:    LooksText,
	}
)

// shortestTrackM is the way that a track must have at least [m], as
// physics/hill says in its own error.
const shortestTrackM = 10

func (v Voice) trackProblem(e *hill.TrackError) string {
	detail := e.Got
	switch e.Kind {
	case hill.TrackWrongFile:
		detail = v.text(lookTexts[e.Looks])
	case hill.TrackTooLarge:
		detail = v.Number(hill.LargestTrackBytes>>20, 0)
	case hill.TrackTooManyPoints:
		detail = v.Number(hill.MostTrackPoints, 0)
	case hill.TrackTooShort:
		detail = v.Height(shortestTrackM)
	case hill.TrackUnreadable:
		detail = dash
		if e.Err != nil {
			detail = e.Err.Error()
		}
	}
	what := v.Say(trackTexts[e.Kind], detail)
	text := v.Say(TrackProblem, what)
	if e.Line > 0 {
		text = v.Say(TrackAtLine, v.Number(float64(e.Line), 0), what)
	}
	if e.Kind == hill.TrackBroken || e.Kind == hill.TrackCutOff {
		text += " " + v.Say(TrackPoints, v.Number(float64(e.Points), 0))
	}
	return text
}
