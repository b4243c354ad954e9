// Package keep is what is stored and passed on: bikes, riders, loads, days and
// hills as named things whose values go by the dotted paths of physics/ask.
// The shop's file, the device's database, the file that a person exports and
// the take-away link all hold these. Start with Thing and Hill; Encode and
// Decode write and read the file of everything that a person saved.
package keep

import "hillwright/physics/ask"

// Kind says what a thing is: the first word of its paths.
type Kind string

// The kinds of things. Hills are of type Hill.
const (
	Bike  Kind = "bike"
	Rider Kind = "rider"
	Load  Kind = "load"
	Day   Kind = "day"
)

// Thing is a named set of inputs. Values go by the path without its first
// word ("mass_kg", "motor.torque_nm"), in the text form of ask.Question.Set.
// Names go by language ("en", "de"); "" is the name in every other language.
type Thing struct {
	Kind    Kind              `json:"kind"`
	ID      string            `json:"id"`
	Names   map[string]string `json:"names"`
	Values  map[string]string `json:"values"`
	Sources map[string]string `json:"sources,omitempty"`
	Changed int64             `json:"changed,omitempty"` // when, in seconds since 1970; 0 for the shop's
}

// Hill is a stored profile: edges along the road and heights [m]; grades follow
// from the two. BearingDeg [° from north] may be empty.
type Hill struct {
	ID          string            `json:"id"`
	Names       map[string]string `json:"names"`
	EdgeM       []float64         `json:"edge_m"`
	HeightM     []float64         `json:"height_m"`
	BearingDeg  []float64         `json:"bearing_deg,omitempty"`
	HeightKnown bool              `json:"height_known"`
	Sections    string            `json:"sections,omitempty"` // as typed, when it was typed
	Changed     int64             `json:"changed,omitempty"`  // when, in seconds since 1970; 0 for the shop's
}

// Shop is one shop's copy: what its page starts with.
type Shop struct {
	Name      string   `json:"name"`
	Town      string   `json:"town"`
	LawID     string   `json:"law"`
	Units     string   `json:"units"`     // "metric" or "imperial"
	Languages []string `json:"languages"` // the first is the page's own
	Things    []Thing  `json:"things"`
	Hills     []Hill   `json:"hills"`
}

// Put sets a thing's values and sources in a question. The error is the first
// *ask.Problem; what comes after it is still set.
func (t *Thing) Put(q *ask.Question) error {
	return q.Put(string(t.Kind), t.Values, t.Sources)
}
