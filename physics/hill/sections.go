package hill

import (
	"math"
	"strconv"
	"strings"

	"hillwright/physics/unit"
)

// The limits of typed sections.
const (
	SteepestTyped  = 0.60  // rise over run, up or down
	ShortestTypedM = 1.0   // all sections together [m]
	LongestTypedM  = 500e3 // all sections together [m]
	MostTyped      = 1000  // sections
)

// SectionErrorKind says what is wrong with typed sections.
type SectionErrorKind uint8

// What can be wrong with typed sections.
const (
	SectionsEmpty      SectionErrorKind = iota // nothing is typed
	SectionEmpty                               // nothing between two separators
	SectionNoLength                            // it does not begin with a length
	SectionNoUnit                              // the length has no unit, or an unknown one
	SectionNoGrade                             // no grade after the length
	SectionNoPercent                           // the grade has no % sign
	SectionAmbiguous                           // a mark before three digits: decimal mark or thousands?
	SectionLeftOver                            // something stands behind the grade
	SectionLengthRange                         // the length is not above zero, or beyond LongestTypedM
	SectionGradeRange                          // the grade is beyond SteepestTyped
	SectionsTooShort                           // all together below ShortestTypedM
	SectionsTooLong                            // all together beyond LongestTypedM
	SectionsTooMany                            // more than MostTyped
)

// SectionError is what is wrong with typed sections. Section counts from 1 and
// is 0 when all of them together are meant; Text is the section as typed; Got
// is the part of it that does not fit.
type SectionError struct {
	Kind    SectionErrorKind
	Section int
	Text    string
	Got     string
}

// Error says it in English; the page says it in the reader's words by Kind.
func (e *SectionError) Error() string {
	where := "sections: "
	if e.Section > 0 {
		where = "section " + strconv.Itoa(e.Section) + " (" + strconv.Quote(e.Text) + "): "
	}
	return where + e.what() + `; write sections like "400m@7%,60m@18%" or "400 m at 7 %, 60 m at 18 %"`
}

func (e *SectionError) what() string {
	got := strconv.Quote(e.Got)
	if e.Got == "" {
		got = "nothing"
	}
	switch e.Kind {
	case SectionsEmpty:
		return "nothing is typed"
	case SectionEmpty:
		return "there is nothing between two separators"
	case SectionNoLength:
		return "expected a length first, got " + got
	case SectionNoUnit:
		return "expected m, km, ft, yd or mi behind the length, got " + got
	case SectionNoGrade:
		return "expected a grade behind the length, got " + got
	case SectionNoPercent:
		return "expected % behind the grade, got " + got
	case SectionAmbiguous:
		return got + " can be read in two ways; leave thousands unmarked, or write another decimal"
	case SectionLeftOver:
		return "got " + got + " behind the grade"
	case SectionLengthRange:
		return "a length must be above 0 and at most 500 km, got " + got
	case SectionGradeRange:
		return "a grade must lie between -60 % and 60 %, got " + got
	case SectionsTooShort:
		return "all together must be 1 m or more"
	case SectionsTooLong:
		return "all together must be 500 km or less"
	}
	return "at most 1000 sections are taken"
}

// ParseSections makes a profile of typed sections, foot first: a length along
// the road and a grade each, "400m@7%,60m@18%" or "400 m at 7 %, 60 m at 18 %"
// or "400 m mit 7,5 %; 60 m mit 1:8". Lengths in m, km, ft, yd or mi; a grade
// in per cent or as rise to run; a minus sign falls. Between sections stands a
// comma, a semicolon, a new line or "then"; within a number a point or a comma
// is the decimal mark. A mark with just three digits behind it is refused for
// metres, yards and feet, where it could part thousands. The error is a
// *SectionError. Heights begin at 0 and are above the foot.
func ParseSections(text string) (Profile, error) {
	if strings.TrimSpace(text) == "" {
		return Profile{}, &SectionError{Kind: SectionsEmpty}
	}
	parts := splitSections(text)
	if len(parts) > MostTyped {
		return Profile{}, &SectionError{Kind: SectionsTooMany}
	}
	p := Profile{EdgeM: []float64{0}, HeightM: []float64{0}}
	for i, part := range parts {
		part = strings.TrimSpace(part)
		length, grade, err := parseSection(part)
		if err != nil {
			err.Section, err.Text = i+1, part
			return Profile{}, err
		}
		p.EdgeM = append(p.EdgeM, p.EdgeM[i]+length)
		p.HeightM = append(p.HeightM, p.HeightM[i]+length*grade.Sin())
		p.Grade = append(p.Grade, grade)
		if !(p.EdgeM[i+1] > p.EdgeM[i]) {
			return Profile{}, &SectionError{Kind: SectionLengthRange, Section: i + 1, Text: part, Got: part}
		}
	}
	switch total := p.LengthM(); {
	case total < ShortestTypedM:
		return Profile{}, &SectionError{Kind: SectionsTooShort}
	case total > LongestTypedM:
		return Profile{}, &SectionError{Kind: SectionsTooLong}
	}
	return p, nil
}

// splitSections cuts at semicolons, new lines, the words for "then", and at
// commas that are not between two digits. A separator at the very end is free.
func splitSections(text string) []string {
	for _, word := range []string{" then ", " dann "} {
		text = strings.ReplaceAll(text, word, ";")
	}
	text = strings.TrimRight(strings.TrimSpace(text), ",; \n\r\t")
	var parts []string
	start := 0
	for i := 0; i < len(text) && len(parts) <= MostTyped; i++ {
		c := text[i]
		inNumber := c == ',' && i > 0 && isDigit(text[i-1]) && i+1 < len(text) && isDigit(text[i+1])
		if c == ';' || c == '\n' || c == ',' && !inNumber {
			parts = append(parts, text[start:i])
			start = i + 1
		}
	}
	return append(parts, text[start:])
}

func parseSection(s string) (lengthM float64, g unit.Grade, err *SectionError) {
	if s == "" {
		return 0, 0, &SectionError{Kind: SectionEmpty}
	}
	length, lengthText, rest, ok := leadingNumber(s)
	if !ok {
		return 0, 0, &SectionError{Kind: SectionNoLength, Got: firstWord(s)}
	}
	word, rest := cutWord(rest)
	inM, known := metresPer(word)
	if !known {
		if word == "" {
			word = firstWord(rest)
		}
		return 0, 0, &SectionError{Kind: SectionNoUnit, Got: word}
	}
	if inM < 100 && threeBehindMark(lengthText) {
		return 0, 0, &SectionError{Kind: SectionAmbiguous, Got: lengthText}
	}
	lengthM = length * inM
	if !(lengthM > 0 && lengthM <= LongestTypedM) {
		return 0, 0, &SectionError{Kind: SectionLengthRange, Got: lengthText + " " + word}
	}
	g, err = parseGrade(afterJoiner(rest))
	return lengthM, g, err
}

// parseGrade reads "7 %", "-6,5%" or "1:8".
func parseGrade(s string) (unit.Grade, *SectionError) {
	v, text, rest, ok := leadingNumber(s)
	if !ok {
		return 0, &SectionError{Kind: SectionNoGrade, Got: s}
	}
	rest = strings.TrimSpace(rest)
	var g float64
	if run, runText, after, ok := leadingNumber(strings.TrimPrefix(rest, ":")); ok && strings.HasPrefix(rest, ":") {
		g, rest, text = v/run, after, text+":"+runText
		if run <= 0 {
			return 0, &SectionError{Kind: SectionGradeRange, Got: text}
		}
	} else if after, ok := strings.CutPrefix(rest, "%"); ok {
		g, rest = v/100, after
	} else {
		word, after := cutWord(rest)
		switch strings.ToLower(word) {
		case "percent", "prozent", "pct":
			g, rest = v/100, after
		default:
			return 0, &SectionError{Kind: SectionNoPercent, Got: rest}
		}
	}
	if rest = strings.TrimSpace(rest); rest != "" {
		return 0, &SectionError{Kind: SectionLeftOver, Got: rest}
	}
	if !(math.Abs(g) <= SteepestTyped) {
		return 0, &SectionError{Kind: SectionGradeRange, Got: text}
	}
	return unit.Grade(g), nil
}
