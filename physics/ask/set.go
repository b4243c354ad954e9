package ask

import (
	"math"
	"sort"
	"strconv"
	"strings"
)

// ProblemKind says what is wrong with an input.
type ProblemKind uint8

// What can be wrong.
const (
	NoSuchPath   ProblemKind = iota // there is no input of that path
	NotANumber                      // the text is no number
	OutOfRange                      // the number lies outside Low to High
	NotAChoice                      // the word is none of the Choices
	NotAList                        // the list has something in it that does not belong
	NotATyre                        // no ISO 5775 size
	NoSuchSource                    // the word on where it came from is unknown
)

// Problem is what is wrong with one input, with what was expected. The page
// says it in the reader's words; Error says it in English for the terminal.
type Problem struct {
	Kind  ProblemKind
	Path  string
	Got   string
	Input Input // zero for NoSuchPath
}

// Expected tells what the input takes, in English.
func (p *Problem) Expected() string {
	in := p.Input
	switch in.Form {
	case Choice:
		return "one of " + strings.Join(in.Choices, ", ")
	case List:
		return "numbers from " + format(in.Low) + " to " + format(in.High) + " with blanks between them"
	case Tyre:
		return "width and bead seat in mm by ISO 5775, such as 47-622"
	case Whole:
		return "a whole number from " + format(in.Low) + " to " + format(in.High) + orBlank(in)
	}
	text := "a number from " + format(in.Low) + " to " + format(in.High)
	if in.Unit != "1" {
		text += " " + in.Unit
	}
	return text + orBlank(in)
}

func orBlank(in Input) string {
	if in.Blank == "" {
		return ""
	}
	return ", or " + strconv.Quote(in.Blank)
}

func (p *Problem) Error() string {
	if p.Kind == NoSuchPath {
		return p.Path + ": there is no such input; `hillwright ask -inputs` lists all"
	}
	if p.Kind == NoSuchSource {
		return p.Path + ": " + strconv.Quote(p.Got) + " is no source; expected one of " + strings.Join(sourceNames, ", ")
	}
	return p.Path + ": got " + strconv.Quote(p.Got) + ", expected " + p.Expected()
}

// Set gives an input a value from its text form. It returns a *Problem, and
// leaves the question as it was, when the text does not fit.
func (q *Question) Set(path, text string) error {
	in, ok := InputAt(path)
	if !ok {
		return &Problem{Kind: NoSuchPath, Path: path, Got: text}
	}
	text = strings.TrimSpace(text)
	if in.num == nil {
		_, set := in.text(q)
		if !set(text) {
			return &Problem{Kind: problemOf(in.Form), Path: path, Got: text, Input: in}
		}
		return nil
	}
	if in.Blank != "" && (text == in.Blank || text == "") {
		*in.num(q) = math.NaN()
		return nil
	}
	v, err := strconv.ParseFloat(text, 64)
	if err != nil || math.IsNaN(v) {
		return &Problem{Kind: NotANumber, Path: path, Got: text, Input: in}
	}
	if v < in.Low || v > in.High {
		return &Problem{Kind: OutOfRange, Path: path, Got: text, Input: in}
	}
	*in.num(q) = v
	return nil
}

func problemOf(f Form) ProblemKind {
	switch f {
	case Choice:
		return NotAChoice
	case List:
		return NotAList
	case Tyre:
		return NotATyre
	}
	return NotANumber
}

// Get gives an input's text form, such that Set takes it back unchanged.
func (q *Question) Get(path string) (string, bool) {
	in, ok := InputAt(path)
	if !ok {
		return "", false
	}
	if in.num == nil {
		get, _ := in.text(q)
		return get(), true
	}
	v := *in.num(q)
	if math.IsNaN(v) {
		return in.Blank, true
	}
	return format(v), true
}

// Value gives a number's value; ok is false for inputs that are no numbers or
// not given.
func (q *Question) Value(path string) (v float64, ok bool) {
	in, found := InputAt(path)
	if !found || in.num == nil {
		return 0, false
	}
	v = *in.num(q)
	return v, !math.IsNaN(v)
}

// Band gives how far a number may be off, lowest and highest, within its valid
// range: its catalogue spread, a third of that once it was measured.
func (q *Question) Band(path string) (low, high float64, ok bool) {
	in, _ := InputAt(path)
	v, ok := q.Value(path)
	if !ok {
		return 0, 0, false
	}
	spread := in.Spread
	if !in.Absolute {
		spread *= math.Abs(v)
	}
	if in.Source != Measured && q.SourceOf(path) == Measured {
		spread /= 3
	}
	return math.Max(in.Low, v-spread), math.Min(in.High, v+spread), true
}

// SourceOf tells where an input's value came from.
func (q *Question) SourceOf(path string) Source {
	if s, ok := q.Source[path]; ok {
		return s
	}
	in, _ := InputAt(path)
	return in.Source
}

// ParseSource finds a source by its name.
func ParseSource(name string) (Source, bool) {
	for i, n := range sourceNames {
		if n == name {
			return Source(i), true
		}
	}
	return 0, false
}

// Put sets many inputs of one kind ("bike"): values and sources by the path
// after the kind. It sets all that fit and returns the first problem, paths in
// alphabetical order.
func (q *Question) Put(kind string, values, sources map[string]string) error {
	var first error
	for _, key := range sortedKeys(values) {
		if err := q.Set(kind+"."+key, values[key]); err != nil && first == nil {
			first = err
		}
		delete(q.Source, kind+"."+key)
	}
	for _, key := range sortedKeys(sources) {
		s, ok := ParseSource(sources[key])
		if !ok {
			if first == nil {
				first = &Problem{Kind: NoSuchSource, Path: kind + "." + key, Got: sources[key]}
			}
			continue
		}
		q.Source[kind+"."+key] = s
	}
	return first
}

func sortedKeys(m map[string]string) []string {
	keys := make([]string, 0, len(m))
	for k := range m {
		keys = append(keys, k)
	}
	sort.Strings(keys)
	return keys
}
