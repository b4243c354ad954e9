package keep

import (
	"math"
	"strconv"
	"strings"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
)

// FaultKind is what is wrong with a file or with a thing in it.
type FaultKind uint8

// What can be wrong.
const (
	FileTooLarge FaultKind = iota // Detail: the most megabytes
	NotJSON                       // Where: line:column, Detail: what was expected
	NotOurs                       // JSON, but not a file of things
	Newer                         // written by a newer version
	BadThing                      // no kind, no id or no name: left out
	BadValue                      // one value does not fit: left out, Detail: what was expected
	BadHill                       // edges and heights do not make a hill: left out, Detail: what was expected
)

// Fault is one thing that was wrong. Where names the place in the file.
type Fault struct {
	Kind   FaultKind
	Where  string
	Detail string
}

func (f Fault) Error() string {
	switch f.Kind {
	case FileTooLarge:
		return "the file is larger than " + f.Detail + " MB"
	case NotJSON:
		return "the file is cut off or damaged at " + f.Where + ": expected " + f.Detail
	case NotOurs:
		return "this is not a file of saved things"
	case Newer:
		return "the file comes from a newer version; load the new version of the page first"
	}
	return f.Where + ": " + f.Detail
}

// longest is how many bytes an id, a name or a value may have.
const longest = 400

type reader struct{ faults []Fault }

func (r *reader) fault(kind FaultKind, where, detail string) {
	r.faults = append(r.faults, Fault{kind, where, detail})
}

func (r *reader) things(v any) []Thing {
	list, _ := v.([]any)
	var out []Thing
	for i, each := range list {
		where := "things[" + strconv.Itoa(i+1) + "]"
		m, _ := each.(map[string]any)
		t := Thing{
			Kind: Kind(text(m["kind"])), ID: text(m["id"]), Names: texts(m["names"]),
			Values: texts(m["values"]), Sources: texts(m["sources"]), Changed: whole(m["changed"]),
		}
		switch {
		case t.Kind != Bike && t.Kind != Rider && t.Kind != Load && t.Kind != Day:
			r.fault(BadThing, where, `kind: expected "bike", "rider", "load" or "day"`)
			continue
		case t.ID == "" || len(t.ID) > longest:
			r.fault(BadThing, where, "id: expected 1 to "+strconv.Itoa(longest)+" signs")
			continue
		case len(t.Names) == 0:
			r.fault(BadThing, where+" "+t.ID, "names: expected at least one")
			continue
		}
		r.values(&t, where+" "+t.ID)
		out = append(out, t)
	}
	return out
}

// values takes out of a thing what the calculator would not take.
func (r *reader) values(t *Thing, where string) {
	for _, key := range sorted(t.Values) {
		q := ask.Default()
		if err := q.Set(string(t.Kind)+"."+key, t.Values[key]); err != nil {
			r.fault(BadValue, where, err.Error())
			delete(t.Values, key)
		}
	}
	for _, key := range sorted(t.Sources) {
		_, known := ask.InputAt(string(t.Kind) + "." + key)
		if _, ok := ask.ParseSource(t.Sources[key]); !ok || !known {
			r.fault(BadValue, where, key+`: expected a source for an input: "assumed", "sheet" or "measured"`)
			delete(t.Sources, key)
		}
	}
}

func (r *reader) hills(v any) []Hill {
	list, _ := v.([]any)
	var out []Hill
	for i, each := range list {
		where := "hills[" + strconv.Itoa(i+1) + "]"
		m, _ := each.(map[string]any)
		h := Hill{
			ID: text(m["id"]), Names: texts(m["names"]),
			EdgeM: numbers(m["edge_m"]), HeightM: numbers(m["height_m"]), BearingDeg: numbers(m["bearing_deg"]),
			HeightKnown: m["height_known"] == true, Sections: text(m["sections"]), Changed: whole(m["changed"]),
		}
		if h.ID == "" || len(h.ID) > longest || len(h.Names) == 0 {
			r.fault(BadThing, where, "id and names: expected an id of 1 to "+strconv.Itoa(longest)+" signs and a name")
			continue
		}
		if wrong := h.wrong(); wrong != "" {
			r.fault(BadHill, where+" "+h.ID, wrong)
			continue
		}
		out = append(out, h)
	}
	return out
}

// wrong tells why a hill is none, or "".
func (h *Hill) wrong() string {
	for _, y := range h.HeightM {
		if !(y >= -500 && y <= 9000) {
			return "height_m: expected -500 to 9000"
		}
	}
	for _, b := range h.BearingDeg {
		if !(b >= -360 && b <= 720) {
			return "bearing_deg: expected degrees from north"
		}
	}
	if n := len(h.EdgeM); n > 0 && !(h.EdgeM[n-1] <= longestM) {
		return "edge_m: expected at most 10000 km"
	}
	if _, err := hill.FromHeights(h.EdgeM, h.HeightM, h.BearingDeg); err != nil {
		return "edge_m and height_m: " + err.Error()
	}
	return ""
}

// longestM is the length of the longest hill that is kept [m].
const longestM = 1e7

func text(v any) string { s, _ := v.(string); return s }

func whole(v any) int64 {
	n, _ := v.(float64)
	if !(n >= 0 && n < 1<<53) {
		return 0
	}
	return int64(n)
}

// texts gives an object's texts; the rest of it, and what is too long, is left
// out.
func texts(v any) map[string]string {
	m, _ := v.(map[string]any)
	if len(m) == 0 {
		return nil
	}
	out := make(map[string]string, len(m))
	for name, each := range m {
		if s, ok := each.(string); ok && len(s) <= longest && len(name) <= longest {
			out[name] = strings.TrimSpace(s)
		}
	}
	return out
}

// numbers gives a list's numbers; anything else in it becomes not a number, so
// that the check of ranges finds it.
func numbers(v any) []float64 {
	list, _ := v.([]any)
	if len(list) == 0 {
		return nil
	}
	out := make([]float64, len(list))
	for i, each := range list {
		n, ok := each.(float64)
		if !ok {
			n = math.NaN()
		}
		out[i] = n
	}
	return out
}
