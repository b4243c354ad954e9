package words

import (
	"errors"
	"math"
	"strconv"
	"strings"

	"hillwright/physics/ask"
	"hillwright/physics/click"
	"hillwright/physics/coast"
	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/slope"
	"hillwright/physics/sound"
	"hillwright/wasm/keep"
)

// Problem says an error in the reader's words: what, where, what was expected.
// An error that the catalogue does not know is said as it is, in English.
func (v Voice) Problem(err error) string {
	if err == nil {
		return ""
	}
	var input *ask.Problem
	var section *hill.SectionError
	var track *hill.TrackError
	var profile *hill.ProfileError
	var fault keep.Fault
	var grade *slope.Error
	var heard *sound.Error
	var clicks *click.Error
	var run *coast.Error
	switch {
	case errors.As(err, &grade):
		return v.slopeProblem(grade)
	case errors.As(err, &heard):
		return v.soundProblem(heard)
	case errors.As(err, &clicks):
		return v.clickProblem(clicks)
	case errors.As(err, &run):
		return v.coastProblem(run)
	case errors.As(err, &input):
		return v.inputProblem(input)
	case errors.As(err, &section):
		return v.sectionProblem(section)
	case errors.As(err, &track):
		return v.trackProblem(track)
	case errors.As(err, &profile):
		return v.Say(ProfileAt, v.Number(float64(profile.Index), 0), v.text(profileTexts[profile.Kind]))
	case errors.As(err, &fault):
		return v.fault(fault)
	case errors.Is(err, ride.ErrNoRoad):
		return v.text(ProblemNoRoad)
	case errors.Is(err, rig.ErrLevel):
		return v.text(ProblemLevel)
	case errors.Is(err, rig.ErrGears):
		return v.text(ProblemGears)
	case errors.Is(err, rig.ErrBrakes):
		return v.text(ProblemBrakes)
	case errors.Is(err, rig.ErrGround):
		return v.text(ProblemGround)
	}
	return err.Error()
}

func (v Voice) inputProblem(p *ask.Problem) string {
	name, _ := v.Input(p.Path)
	switch p.Kind {
	case ask.NoSuchPath:
		return v.Say(ProblemNoPath, name)
	case ask.NoSuchSource:
		var all []string
		for _, k := range sourceNames {
			all = append(all, v.text(k))
		}
		return v.Say(ProblemSource, capital(name), p.Got, strings.Join(all, ", "))
	case ask.OutOfRange:
		if got, err := strconv.ParseFloat(p.Got, 64); err == nil && !math.IsInf(got, 0) {
			return v.Say(ProblemGot, capital(name), v.Value(p.Path, got), v.expected(p.Input))
		}
	}
	return v.Say(ProblemGot, capital(name), p.Got, v.expected(p.Input))
}

// expected tells what an input takes, in shown units.
func (v Voice) expected(in ask.Input) string {
	text := ""
	switch in.Form {
	case ask.Choice:
		var all []string
		for _, c := range in.Choices {
			all = append(all, v.Choice(in.Path, c))
		}
		return v.Say(ExpectChoice, strings.Join(all, "; "))
	case ask.Tyre:
		return v.text(ExpectTyre)
	case ask.List:
		text = v.Say(ExpectList, v.Entry(in.Path, in.Low), v.Entry(in.Path, in.High))
	case ask.Whole:
		text = v.Say(ExpectWhole, v.Entry(in.Path, in.Low), v.Entry(in.Path, in.High))
	default:
		text = v.Say(ExpectNumber, v.Entry(in.Path, in.Low), v.Value(in.Path, in.High))
	}
	if in.Blank == "" {
		return text
	}
	return v.Say(ExpectOr, text, v.Choice(in.Path, in.Blank))
}

// fault says what is wrong with a file of saved things. The detail of a thing
// that was left out is for whoever wrote the file, and stays in English.
func (v Voice) fault(f keep.Fault) string {
	switch f.Kind {
	case keep.FileTooLarge:
		return v.Say(FaultTooLarge, f.Detail)
	case keep.NotJSON:
		return v.Say(FaultNotJSON, f.Where, f.Detail)
	case keep.NotOurs:
		return v.text(FaultNotOurs)
	case keep.Newer:
		return v.text(FaultNewer)
	}
	return v.Say(FaultLeftOut, f.Where, f.Detail)
}
