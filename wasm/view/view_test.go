package view

import (
	"math"
	"os"
	"path/filepath"
	"regexp"
	"slices"
	"strings"
	"testing"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/wasm/dom"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
)

func shop() *keep.Shop {
	names := func(en, de string) map[string]string { return map[string]string{"en": en, "de": de} }
	return &keep.Shop{
		Name: "The <Shop> & Co", LawID: "eu-25", Units: "metric", Languages: []string{"en", "de"},
		Things: []keep.Thing{
			{Kind: keep.Rider, ID: "steady", Names: names("a steady rider", "eine geübte Fahrerin"), Values: map[string]string{"mass_kg": "80"}},
			{Kind: keep.Bike, ID: "trekking", Names: names("the trekking bike", "Trekkingrad"), Values: map[string]string{"mass_kg": "25", "motor.kind": "crank"}},
			{Kind: keep.Load, ID: "bag", Names: names("a bag", "Tasche"), Values: map[string]string{"mass_kg": "9"}},
			{Kind: keep.Day, ID: "mild", Names: names("mild", "mild"), Values: map[string]string{"temperature_c": "15", "wind_mps": "3"}},
		},
		Hills: []keep.Hill{{ID: "school", Names: names("the school hill", "Schulberg"), EdgeM: []float64{0, 400, 460}, HeightM: []float64{0, 28, 38}}},
	}
}

func after(lang string, actions ...state.Action) *state.State {
	s := state.First(shop(), lang)
	for _, a := range actions {
		a.Now = 1800000000
		s, _ = state.Reduce(s, a)
	}
	return s
}

// looks are states in which the page shows everything it has.
func looks() map[string][]state.Action {
	act := func(name, arg string) state.Action { return state.Action{Name: name, Arg: arg} }
	text := func(name, arg, text string) state.Action { return state.Action{Name: name, Arg: arg, Text: text} }
	all := map[string][]state.Action{
		"first":        nil,
		"kept empty":   {act(state.Open, "kept")},
		"kept":         {text(state.TypeName, "bike", "Otto"), act(state.Keep, "bike"), text(state.TypeName, "hill", "Home"), act(state.Keep, "hill"), act(state.Open, "kept")},
		"settings":     {act(state.Open, "settings")},
		"bad file":     {{Name: state.ImportFile, Arg: "x", Data: []byte("{")}},
		"half file":    {{Name: state.ImportFile, Arg: "x", Data: []byte(`{"format":"hillwright-things","version":1,"things":[{"kind":"boat"}]}`)}},
		"hill":         {act(state.Open, "hill")},
		"sections":     {act(state.Open, "hill"), text(state.TypeSections, "", "300 m at 12 %")},
		"bad sections": {act(state.Open, "hill"), text(state.TypeSections, "", "300 m 12")},
		"sketch":       {act(state.Open, "hill"), {Name: state.Sketch, Y: 160}, {Name: state.Sketch, X: 300, Y: 80}},
		"reading":      {{Name: state.TrackFile, Arg: "a.gpx", Data: []byte("<gpx")}, {Name: state.TrackPart, X: 0.4}},
		"bad track":    {{Name: state.TrackFile, Arg: "a.gpx"}, {Name: state.TrackFailed, Err: &hill.TrackError{Kind: hill.TrackEmpty}}},
		"typed wrong":  {act(state.ShowPath, "rider.mass_kg"), text(state.Type, "rider.mass_kg", "9000")},
		"changed":      {act(state.ShowPath, "rider.mass_kg"), act(state.StepUp, "rider.mass_kg"), act(state.Open, "rider")},
		"trouble":      {act(state.SetTo, "ride.level=9")},
		"short":        {text(state.TypeSections, "", "900 m at 40 %"), act(state.Choose, "hill:typed")},
		"tour":         {act(state.Open, state.PlaceTour), act(state.RoundTrip, "3"), act(state.StepUp, "ride.pause_s"), act(state.SetTo, "ride.charge=0.5"), act(state.ShowPath, "ride.charge")},
		"empty pack":   {act(state.SetTo, "ride.charge=0"), act(state.SetTo, "day.ground=leaves-wet"), act(state.RoundTrip, "10")},
		"hot brakes":   {text(state.TypeSections, "", "4 km at 16 %"), act(state.SetTo, "bike.front_brake=rim"), act(state.SetTo, "day.ground=gravel-wet"), act(state.SetTo, "ride.down_mps=12")},
		"too steep":    {text(state.TypeSections, "", "400 m at 70 %"), act(state.SetTo, "bike.front_brake=none"), act(state.StaffStep, "+")},
		"no motor":     {act(state.SetTo, "bike.motor.kind=none")},
		"downhill":     {text(state.TypeSections, "", "300 m at -8 %")},
		"pictures":     {act(state.Pull, ""), act(state.StaffStep, "+"), act(state.WeightStep, "+")},
		"imperial":     {act(state.SetUnits, "imperial"), act(state.Open, "bike"), act(state.ShowAll, "bike")},
		"news":         {act(state.Waiting, ""), act(state.Stored, "refused"), act(state.Dropping, "over"), act(state.CanShare, "")},
		"broken":       {text(state.Broke, "", "stack")},
	}
	for _, kind := range state.Kinds() {
		all["open "+string(kind)] = []state.Action{act(state.Open, string(kind))}
		all["all of "+string(kind)] = []state.Action{act(state.Open, string(kind)), act(state.ShowAll, string(kind))}
	}
	for _, in := range ask.Inputs() {
		kind, _, _ := strings.Cut(in.Path, ".")
		all["input "+in.Path] = []state.Action{act(state.ShowPath, in.Path)}
		all["row "+in.Path] = []state.Action{act(state.Open, kind), act(state.ShowAll, kind), act(state.ShowPath, in.Path)}
	}
	return all
}

func eachLook(t *testing.T, check func(t *testing.T, s *state.State, page *dom.Node)) {
	for _, lang := range []string{"en", "de"} {
		for name, actions := range looks() {
			t.Run(lang+" "+name, func(t *testing.T) {
				s := after(lang, actions...)
				check(t, s, Page(s))
			})
		}
	}
}

func attr(n *dom.Node, name string) string {
	v, _ := n.Attr(name)
	return v
}

// TestPageIsSound checks what a browser would put right in silence, and what
// the policy, the reducer and people who listen rely on.
func TestPageIsSound(t *testing.T) {
	block := regexp.MustCompile(`^(div|p|ul|ol|table|h[1-6]|section|details|form|main|header|footer|pre)$`)
	eachLook(t, func(t *testing.T, s *state.State, page *dom.Node) {
		text, err := dom.HTML(page)
		if err != nil {
			t.Fatal(err)
		}
		for _, bad := range []string{"NaN", "Inf", "%!", "{0}", "{1}"} {
			if strings.Contains(text, bad) {
				t.Errorf("the page says %q: …%s", bad, text[max(0, strings.Index(text, bad)-80):])
			}
		}
		ids := map[string]bool{}
		page.Walk(func(n *dom.Node) {
			if id := attr(n, "id"); id != "" {
				if ids[id] {
					t.Errorf("id %s stands twice", id)
				}
				ids[id] = true
			}
		})
		page.Walk(func(n *dom.Node) {
			for _, a := range n.Attrs {
				switch {
				case a.Name == "style" || strings.HasPrefix(a.Name, "on"):
					t.Errorf("<%s> has %s, which the policy forbids", n.Tag, a.Name)
				case a.Name == "data-act" && !slices.Contains(state.ByHand(), a.Value):
					t.Errorf("<%s> asks for %q, which the state does not know", n.Tag, a.Value)
				case a.Name == "aria-controls" || a.Name == "aria-labelledby" || a.Name == "aria-describedby" || a.Name == "for":
					for _, id := range strings.Fields(a.Value) {
						if !ids[id] {
							t.Errorf("<%s> %s names %q, which is not there", n.Tag, a.Name, id)
						}
					}
				}
			}
			named := attr(n, "aria-label") != "" || attr(n, "aria-labelledby") != "" || strings.TrimSpace(n.Words()) != ""
			switch n.Tag {
			case "button":
				if !named {
					t.Errorf("a button without a name: %+v", n.Attrs)
				}
			case "input", "textarea":
				if attr(n, "aria-label") == "" && !strings.Contains(text, `for="`+attr(n, "id")+`"`) {
					t.Errorf("a field without a name: %+v", n.Attrs)
				}
			case "ul":
				for _, kid := range n.Kids {
					if kid.Tag != "li" {
						t.Errorf("<ul> holds <%s>", kid.Tag)
					}
				}
			}
			if n.Tag == "p" || n.Tag == "button" || n.Tag == "span" {
				for _, kid := range n.Kids {
					kid.Walk(func(k *dom.Node) {
						if block.MatchString(k.Tag) || n.Tag == "button" && (k.Tag == "button" || k.Tag == "input") {
							t.Errorf("<%s> holds <%s>", n.Tag, k.Tag)
						}
					})
				}
			}
		})
	})
}

// Every input of the calculator can be reached and changed.
func TestEveryInputHasAnEditor(t *testing.T) {
	for _, in := range ask.Inputs() {
		kind, _, _ := strings.Cut(in.Path, ".")
		page := Page(after("en", state.Action{Name: state.Open, Arg: kind}, state.Action{Name: state.ShowAll, Arg: kind}))
		if kind == "ride" {
			page = Page(after("en", state.Action{Name: state.Open, Arg: kind}))
		}
		if !acts(page, state.ShowPath, in.Path) {
			t.Errorf("%s: no row in the list of %s", in.Path, kind)
		}
		page = Page(after("en", state.Action{Name: state.ShowPath, Arg: in.Path}))
		switch in.Form {
		case ask.Number:
			if !acts(page, state.StepUp, in.Path) || !acts(page, state.StepDown, in.Path) || !acts(page, state.Type, in.Path) {
				t.Errorf("%s: no stepper", in.Path)
			}
		case ask.Choice:
			for _, word := range in.Choices {
				if !acts(page, state.SetTo, in.Path+"="+word) {
					t.Errorf("%s: no choice %s", in.Path, word)
				}
			}
		case ask.Whole:
			if !acts(page, state.SetTo, in.Path+"=1") || !acts(page, state.SetTo, in.Path+"="+in.Blank) {
				t.Errorf("%s: no choices", in.Path)
			}
		default:
			if !acts(page, state.Type, in.Path) {
				t.Errorf("%s: no field", in.Path)
			}
		}
		if in.Blank != "" && !acts(page, state.SetTo, in.Path+"="+in.Blank) {
			t.Errorf("%s: no way to leave it out", in.Path)
		}
	}
}

func acts(page *dom.Node, act, arg string) bool {
	found := false
	page.Walk(func(n *dom.Node) {
		found = found || attr(n, "data-act") == act && attr(n, "data-arg") == arg
	})
	return found
}

// The message for a wrong text stands with its field, text and answer stay.
func TestProblemStandsByItsField(t *testing.T) {
	page := Page(after("de", state.Action{Name: state.ShowPath, Arg: "rider.mass_kg"}, state.Action{Name: state.Type, Arg: "rider.mass_kg", Text: "achtzig"}))
	text, err := dom.HTML(page)
	if err != nil {
		t.Fatal(err)
	}
	for _, want := range []string{`aria-invalid="true" value="achtzig"`, "Erwartet", `class="word"`} {
		if !strings.Contains(text, want) {
			t.Errorf("%q is missing in %s", want, text)
		}
	}
}

// Only what changed is another region: a staff that moves leaves the rest of
// the page alone.
func TestStaffIsItsOwnRegion(t *testing.T) {
	page := Page(after("en", state.Action{Name: state.StaffStep, Arg: "+"}))
	if !acts(page, "move-staff", "") {
		t.Error("the section cannot be touched")
	}
	found := false
	page.Walk(func(n *dom.Node) { found = found || attr(n, "data-region") == "staff" && attr(n, "transform") != "" })
	if !found {
		t.Error("the staff is no region of its own, or does not stand anywhere")
	}
	hidden := Page(after("en"))
	hidden.Walk(func(n *dom.Node) {
		if attr(n, "class") == "staff" && attr(n, "visibility") == "" {
			t.Error("the staff shows before it is touched")
		}
	})
}

// A component's field without the tag never updates: every exported field of
// the components in wasm/page must have it.
func TestComponentFieldsAreProps(t *testing.T) {
	files, err := filepath.Glob(filepath.Join("..", "page", "*.go"))
	if err != nil || len(files) == 0 {
		t.Fatal("no sources of wasm/page", err)
	}
	component := regexp.MustCompile(`(?s)struct \{\n\tvecty\.Core\n(.*?)\n\}`)
	n := 0
	for _, file := range files {
		source, err := os.ReadFile(file)
		if err != nil {
			t.Fatal(err)
		}
		for _, m := range component.FindAllStringSubmatch(string(source), -1) {
			for line := range strings.SplitSeq(m[1], "\n") {
				n++
				if field := strings.TrimSpace(line); field != "" && field[0] >= 'A' && field[0] <= 'Z' && !strings.Contains(field, "`vecty:\"prop\"`") {
					t.Errorf("%s: %s lacks the tag vecty:\"prop\"", file, field)
				}
			}
		}
	}
	if n == 0 {
		t.Error("found no component's fields")
	}
}

// BenchmarkDrag is the time for one move of a finger along the section.
func BenchmarkDrag(b *testing.B) {
	s := after("en")
	x := 0.0
	for b.Loop() {
		x += 7
		s, _ = state.Reduce(s, state.Action{Name: state.MoveStaff, X: math.Mod(x, 328)})
		Page(s)
	}
}

// BenchmarkPage is the time for the whole page after an action: it must fit
// into a frame many times over.
func BenchmarkPage(b *testing.B) {
	s := after("en", state.Action{Name: state.StaffStep, Arg: "+"})
	if math.IsNaN(s.StaffM) {
		b.Fatal("no staff")
	}
	for b.Loop() {
		Page(s)
	}
}
