package main

import (
	"errors"
	"flag"
	"fmt"
	"io"
	"io/fs"
	"math"
	"os"
	"strings"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/physics/unit"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// askOptions are the command line of `hillwright ask`.
type askOptions struct {
	parts
	hill, grade  string
	json, inputs bool
}

// runAsk answers a question in the terminal. It gives the process's exit code:
// 0 answered (whatever the verdict), 1 it could not, 2 the command line is off.
func runAsk(args []string, out, errs io.Writer) int {
	var o askOptions
	f := flag.NewFlagSet("ask", flag.ContinueOnError)
	f.SetOutput(errs)
	o.parts.flags(f)
	f.StringVar(&o.hill, "hill", "", "a track file, a hill of the shop by its id, or `sections` such as 400m@7%,60m@18% (default: the shop's first hill)")
	f.StringVar(&o.grade, "grade", "", "a `grade` such as 12% instead of a hill: the steady state")
	f.BoolVar(&o.json, "json", false, "answer as JSON, every value with its unit in the key")
	f.BoolVar(&o.inputs, "inputs", false, "print every input with its value, unit, band and source; with -json as JSON")
	f.Usage = func() {
		fmt.Fprint(errs, "usage: hillwright ask [-bike ID] [-rider ID] [-load ID] [-day ID] [-hill FILE.gpx|ID|SECTIONS | -grade 12%] [-set PATH=VALUE …] [-inputs] [-json]\n\n")
		f.PrintDefaults()
	}
	if err := f.Parse(args); err != nil {
		if errors.Is(err, flag.ErrHelp) {
			return 0
		}
		return 2
	}
	if f.NArg() > 0 {
		fmt.Fprintf(errs, "ask: %q is left over: every part of the question has a flag; see `hillwright ask -h`\n", f.Arg(0))
		return 2
	}
	if err := o.answer(out); err != nil {
		fmt.Fprintf(errs, "ask: %v\n", err)
		return 1
	}
	return 0
}

func (o *askOptions) answer(out io.Writer) error {
	voice, copied, q, err := o.asked()
	if err != nil {
		return err
	}
	switch {
	case o.inputs:
		return o.listInputs(out, &q, voice)
	case o.grade != "":
		return o.steady(out, &q, voice)
	}
	return o.climb(out, &q, &copied.Shop, voice)
}

// road finds the hill that -hill means.
func (o *askOptions) road(s *keep.Shop) (*hill.Profile, error) {
	var ids []string
	for _, h := range s.Hills {
		if o.hill == "" || h.ID == o.hill {
			return h.Profile(o.lang)
		}
		ids = append(ids, h.ID)
	}
	if strings.ContainsAny(o.hill, "@%") {
		p, err := hill.ParseSections(o.hill)
		return &p, err
	}
	file, err := os.Open(o.hill)
	if errors.Is(err, fs.ErrNotExist) {
		return nil, fmt.Errorf("-hill %q: no file of that name, no hill of the shop (it has %s), and no sections such as 400m@7%%,60m@18%%", o.hill, strings.Join(ids, ", "))
	}
	if err != nil {
		return nil, err
	}
	defer file.Close()
	track, err := hill.ReadTrack(file, nil)
	if err != nil {
		return nil, fmt.Errorf("-hill %s: %w", o.hill, err)
	}
	p, err := hill.FromTrack(&track, hill.Options{})
	if err != nil {
		return nil, fmt.Errorf("-hill %s: %w", o.hill, err)
	}
	return &p, nil
}

func (o *askOptions) climb(out io.Writer, q *ask.Question, s *keep.Shop, v words.Voice) error {
	p, err := o.road(s)
	if err != nil {
		return err
	}
	r, a, err := q.Climb(p)
	if err != nil {
		return err
	}
	why := v.Why(r, a)
	if o.json {
		_, err = out.Write(ask.AnswerJSON(r, a, why))
		return err
	}
	return writeAnswer(out, q, r, p, a, v)
}

func (o *askOptions) steady(out io.Writer, q *ask.Question, v words.Voice) error {
	percent, ok := v.ParseNumber(strings.TrimSuffix(strings.TrimSpace(o.grade), "%"))
	if !ok || math.Abs(percent) > 60 {
		return fmt.Errorf("-grade %q: expected a grade from -60%% to 60%%, such as 12%%", o.grade)
	}
	g := unit.Percent(percent)
	r, a, err := q.Steady(g)
	if err != nil {
		return err
	}
	why := v.WhySteady(r, g, a)
	if o.json {
		_, err = out.Write(ask.SteadyJSON(r, g, a, why))
		return err
	}
	return writeSteady(out, r, g, a, v)
}

// listInputs prints the catalogue for this question.
func (o *askOptions) listInputs(out io.Writer, q *ask.Question, v words.Voice) error {
	r, err := q.Rig(0)
	if err != nil {
		return err
	}
	if o.json {
		_, err = out.Write(ask.InputsJSON(q, r))
		return err
	}
	return writeInputs(out, q, r, v)
}
