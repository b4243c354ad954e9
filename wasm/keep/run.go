package keep

import (
	"math"
	"strconv"

	"hillwright/physics/click"
	"hillwright/physics/coast"
)

// RunKind says what the numbers of a run are.
type RunKind string

// The kinds of runs: click rates [1/s], speeds [m/s], places [m].
const (
	ClickRun RunKind = "clicks"
	SpeedRun RunKind = "speeds"
	MarkRun  RunKind = "marks"
)

// Run is a coast-down that is kept: when (TimeS, since 1970), from which
// recording or way (Name), on which bike; a number at each time [s], with its
// error: of the number, or of the time for marks. Back, LeftOut and the part
// that counts (FromS to ToS) are the person's.
type Run struct {
	ID, Name, Bike string
	Kind           RunKind
	TimeS          float64
	Back, LeftOut  bool
	FromS, ToS     float64
	AtS, Is, Error []float64
	Changed        int64
}

// Rates are the numbers as click rates, for a run of clicks.
func (r *Run) Rates() []click.Point {
	out := make([]click.Point, len(r.AtS))
	for i := range out {
		out[i] = click.Point{AtS: r.AtS[i], RateHz: r.Is[i], ErrorHz: r.Error[i]}
	}
	return out
}

// Coast gives the run that counts, its ends cut. Click rates become speeds by
// the metres that the wheel rolls for a click.
func (r *Run) Coast(metresPerClick float64) coast.Run {
	out := coast.Run{Back: r.Back}
	for i, t := range r.AtS {
		switch r.Kind {
		case MarkRun:
			out.Marks = append(out.Marks, coast.Mark{AtM: r.Is[i], AtS: t, ErrorS: r.Error[i]})
		case SpeedRun:
			out.Points = append(out.Points, coast.Point{AtS: t, SpeedMps: r.Is[i], ErrorMps: r.Error[i]})
		default:
			out.Points = append(out.Points, coast.Point{AtS: t, SpeedMps: r.Is[i] * metresPerClick, ErrorMps: r.Error[i] * metresPerClick})
		}
	}
	return out.Cut(r.FromS, r.ToS)
}

// putRun writes a run.
func putRun(out []byte, r *Run) []byte {
	out = putText(append(out, `{"id":`...), r.ID)
	for _, each := range []struct{ name, text string }{{"name", r.Name}, {"bike", r.Bike}, {"kind", string(r.Kind)}} {
		out = putText(append(putText(append(out, ','), each.name), ':'), each.text)
	}
	for _, each := range []struct {
		name string
		v    float64
	}{{"time_s", r.TimeS}, {"from_s", r.FromS}, {"to_s", r.ToS}} {
		out = strconv.AppendFloat(append(putText(append(out, ','), each.name), ':'), each.v, 'g', -1, 64)
	}
	out = strconv.AppendBool(append(out, `,"back":`...), r.Back)
	out = strconv.AppendBool(append(out, `,"left_out":`...), r.LeftOut)
	out = putNumbers(append(out, `,"at_s":`...), r.AtS)
	out = putNumbers(append(out, `,"is":`...), r.Is)
	out = putNumbers(append(out, `,"error":`...), r.Error)
	return append(putChanged(out, r.Changed), '}')
}

// mostOfRun is how many numbers a run may have.
const mostOfRun = 5000

// runs reads a file's runs; one that is wrong is left out and told.
func (r *reader) runs(v any) []Run {
	list, _ := v.([]any)
	var out []Run
	for i, each := range list {
		where := "runs[" + strconv.Itoa(i+1) + "]"
		m, _ := each.(map[string]any)
		one := Run{ID: text(m["id"]), Name: short(m["name"]), Bike: short(m["bike"]), Kind: RunKind(text(m["kind"])), Changed: whole(m["changed"])}
		one.Back, _ = m["back"].(bool)
		one.LeftOut, _ = m["left_out"].(bool)
		one.AtS, one.Is, one.Error = floats(m["at_s"]), floats(m["is"]), floats(m["error"])
		one.TimeS, one.FromS, one.ToS = float(m["time_s"]), float(m["from_s"]), float(m["to_s"])
		switch {
		case one.ID == "" || len(one.ID) > longest:
			r.fault(BadThing, where, "id: expected 1 to "+strconv.Itoa(longest)+" signs")
		case one.Kind != ClickRun && one.Kind != SpeedRun && one.Kind != MarkRun:
			r.fault(BadValue, where+" "+one.ID, `kind: expected "clicks", "speeds" or "marks"`)
		case !one.sound():
			r.fault(BadValue, where+" "+one.ID, "at_s, is, error: expected as many numbers in each, times that rise, errors above 0")
		default:
			out = append(out, one)
		}
	}
	return out
}

// sound tells that a run's numbers are such.
func (r *Run) sound() bool {
	n := len(r.AtS)
	if n < 2 || n > mostOfRun || len(r.Is) != n || len(r.Error) != n || !(r.FromS <= r.ToS) || !(math.Abs(r.TimeS) < 1e11) {
		return false
	}
	for i := range n {
		if !(r.Error[i] > 0 && r.Error[i] < 1e6) || !(math.Abs(r.Is[i]) < 1e6) || !(math.Abs(r.AtS[i]) < 1e6) || i > 0 && !(r.AtS[i] > r.AtS[i-1]) {
			return false
		}
	}
	return true
}

func float(v any) float64 {
	if f, ok := v.(float64); ok {
		return f
	}
	return math.NaN()
}

// floats reads a list of numbers; nil where one is none.
func floats(v any) []float64 {
	list, _ := v.([]any)
	out := make([]float64, len(list))
	for i, each := range list {
		f, ok := each.(float64)
		if !ok {
			return nil
		}
		out[i] = f
	}
	return out
}

// RunAt finds a run's place in the list, -1 where there is none of that id.
func (t *Things) RunAt(id string) int {
	for i := range t.Runs {
		if t.Runs[i].ID == id {
			return i
		}
	}
	return -1
}
