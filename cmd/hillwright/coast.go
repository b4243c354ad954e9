package main

import (
	"errors"
	"flag"
	"fmt"
	"io"
	"math"
	"strconv"
	"strings"

	"hillwright/physics/ask"
	"hillwright/physics/coast"
)

// coastOptions are the command line of `hillwright coast`.
type coastOptions struct {
	parts
	files  []string
	back   string // numbers of the files that were ridden the other way
	rolled string // a recording of counted turns
	stand  bool
	json   bool
}

// runCoast works out the drag of a bike from recordings of coast-downs. It
// gives the process's exit code: 0 answered, 1 it could not, 2 the command line
// is off.
func runCoast(args []string, out, errs io.Writer) int {
	var o coastOptions
	f := flag.NewFlagSet("coast", flag.ContinueOnError)
	f.SetOutput(errs)
	o.parts.flags(f)
	f.StringVar(&o.back, "back", "", "which files were ridden the other way, by their `numbers`: 2,4")
	f.StringVar(&o.rolled, "rolled", "", "a `recording` of the wheel rolled through coast.rolled_turns turns: gives the clicks per turn")
	f.BoolVar(&o.stand, "stand", false, "the files are of a wheel that spins down on a stand")
	f.BoolVar(&o.json, "json", false, "answer as JSON, every value with its unit in the key")
	f.Usage = func() {
		fmt.Fprint(errs, "usage: hillwright coast FILE… [-bike ID] [-set PATH=VALUE …] [-back 2,4] [-rolled FILE] [-stand] [-json]\n\n"+
			"FILE is a recording of a coast-down (MP3 or WAV), or a table of speeds or of times at marks:\n"+tableExpected+".\n\n")
		f.PrintDefaults()
	}
	for rest := args; ; {
		if err := f.Parse(rest); err != nil {
			if errors.Is(err, flag.ErrHelp) {
				return 0
			}
			return exitUsage
		}
		if f.NArg() == 0 {
			break
		}
		o.files, rest = append(o.files, f.Arg(0)), f.Args()[1:]
	}
	if len(o.files) == 0 {
		fmt.Fprintln(errs, "coast: expected at least one recording; see `hillwright coast -h`")
		return exitUsage
	}
	if err := o.answer(out); err != nil {
		fmt.Fprintf(errs, "coast: %v\n", err)
		return exitFailed
	}
	return 0
}

func (o *coastOptions) answer(out io.Writer) error {
	voice, _, q, err := o.asked()
	if err != nil {
		return err
	}
	back, err := o.backFiles()
	if err != nil {
		return err
	}
	files, err := hearAll(o.files)
	if err != nil {
		return err
	}
	if o.rolled != "" {
		if err := o.countClicks(&q); err != nil {
			return err
		}
	}
	if o.stand {
		return o.spin(out, &q, files, voice)
	}
	c := measure(&q, files, back)
	if o.json {
		return errors.Join(writeJSON(out, coastJSON(&q, c)), c.refused)
	}
	if c.refused != nil {
		return c.refused
	}
	return writeCoast(out, &q, c, voice)
}

// hearAll reads all files; what is wrong with any is told at once.
func hearAll(names []string) ([]heard, error) {
	var all []heard
	var wrong []error
	for _, name := range names {
		h, err := hear(name)
		all, wrong = append(all, h), append(wrong, err)
	}
	return all, errors.Join(wrong...)
}

// backFiles tells which files were ridden the other way.
func (o *coastOptions) backFiles() (map[int]bool, error) {
	back := map[int]bool{}
	if o.back == "" {
		return back, nil
	}
	for _, text := range strings.Split(o.back, ",") {
		n, err := strconv.Atoi(strings.TrimSpace(text))
		if err != nil || n < 1 || n > len(o.files) {
			return nil, fmt.Errorf("-back %q: expected numbers of files from 1 to %d with commas between them", o.back, len(o.files))
		}
		back[n-1] = true
	}
	return back, nil
}

// countClicks finds the clicks per turn from a wheel that was rolled through
// counted turns.
func (o *coastOptions) countClicks(q *ask.Question) error {
	h, err := hear(o.rolled)
	if err != nil {
		return fmt.Errorf("-rolled %w", err)
	}
	if h.sound == nil {
		return fmt.Errorf("-rolled %s: expected a recording", o.rolled)
	}
	n, off, err := h.sound.Count(0, h.sound.LengthS)
	if err != nil {
		return fmt.Errorf("-rolled %s: %w", o.rolled, err)
	}
	turns := math.Round(q.Coast.RolledTurns)
	per, err := coast.ClicksPerTurn(n, off, turns)
	if err != nil {
		return fmt.Errorf("-rolled %s: %w", o.rolled, err)
	}
	q.Coast.ClicksPerTurn = per
	return nil
}

// errClicksUnknown says what a recording needs.
var errClicksUnknown = errors.New("the clicks per turn of the wheel are not known; give them with -set coast.clicks_per_turn=…, or count them with -rolled FILE, a recording of the wheel rolled through counted turns")

func errNoFall(name string) error {
	return fmt.Errorf("%s: no clicks that slow down as in a coast-down were found; expected at least 6 s of coasting, without pedalling or braking", name)
}
