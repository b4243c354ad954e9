package words

import (
	"errors"
	"fmt"
	"go/ast"
	"go/parser"
	"go/token"
	"path/filepath"
	"strings"
	"testing"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/wasm/keep"
)

// constants counts the constants of an enumeration in the source of a package,
// so that one that is added there and forgotten here is found.
func constants(t *testing.T, folder, typeName string) int {
	t.Helper()
	files, err := filepath.Glob(filepath.Join("../..", folder, "*.go"))
	if err != nil || len(files) == 0 {
		t.Fatalf("no source in %s: %v", folder, err)
	}
	count := 0
	for _, name := range files {
		file, err := parser.ParseFile(token.NewFileSet(), name, nil, 0)
		if err != nil {
			t.Fatal(err)
		}
		for _, d := range file.Decls {
			g, ok := d.(*ast.GenDecl)
			if !ok || g.Tok != token.CONST || len(g.Specs) == 0 {
				continue
			}
			if id, ok := g.Specs[0].(*ast.ValueSpec).Type.(*ast.Ident); ok && id.Name == typeName {
				count += len(g.Specs)
			}
		}
	}
	if count == 0 {
		t.Fatalf("no constant of type %s in %s", typeName, folder)
	}
	return count
}

func TestEveryEnumerationIsNamed(t *testing.T) {
	for _, e := range []struct {
		folder, typeName string
		less             int // constants that only count
		say              func(v Voice, i int) string
	}{
		{"physics/rig", "Limit", 1, func(v Voice, i int) string { return v.Limit(rig.Limit(i)) }},
		{"physics/rig", "Limit", 1, func(v Voice, i int) string { return v.LimitLong(rig.Limit(i)) }},
		{"physics/ride", "Verdict", 0, func(v Voice, i int) string { return v.Verdict(ride.Verdict(i)) }},
		{"physics/ask", "Source", 0, func(v Voice, i int) string { return v.Source(ask.Source(i)) }},
		{"physics/hill", "NoteKind", 0, func(v Voice, i int) string {
			return v.Note(hill.Note{Kind: hill.NoteKind(i), Count: 3, AtM: 420})
		}},
		{"physics/hill", "SectionErrorKind", 0, func(v Voice, i int) string {
			return v.Problem(&hill.SectionError{Kind: hill.SectionErrorKind(i), Section: 2, Text: "60 m", Got: "999"})
		}},
		{"physics/hill", "TrackErrorKind", 0, func(v Voice, i int) string {
			return v.Problem(&hill.TrackError{Kind: hill.TrackErrorKind(i), Line: 7, Points: 12, Got: "999"})
		}},
		{"physics/hill", "FileLook", 0, func(v Voice, i int) string {
			return v.Problem(&hill.TrackError{Kind: hill.TrackWrongFile, Looks: hill.FileLook(i)})
		}},
		{"physics/hill", "ProfileErrorKind", 0, func(v Voice, i int) string {
			return v.Problem(&hill.ProfileError{Kind: hill.ProfileErrorKind(i), Index: 3})
		}},
	} {
		n := constants(t, e.folder, e.typeName) - e.less
		for _, v := range []Voice{inEnglish, inGerman} {
			seen := map[string]int{}
			for i := range n {
				text := e.say(v, i)
				if text == "" || strings.ContainsAny(text, "{}") {
					t.Errorf("%s.%s %d: no text of its own: %q", e.folder, e.typeName, i, text)
				}
				if was, there := seen[text]; there {
					t.Errorf("%s.%s: %d and %d read alike: %q", e.folder, e.typeName, was, i, text)
				}
				seen[text] = i
			}
		}
	}
}

func TestEveryInputIsNamedInEveryLanguage(t *testing.T) {
	for _, v := range []Voice{inEnglish, inGerman} {
		seen := map[string]string{}
		for _, in := range ask.Inputs() {
			name, _ := v.Input(in.Path)
			if name == "" || name == in.Path {
				t.Errorf("%s has no name", in.Path)
			}
			if was := seen[name]; was != "" {
				t.Errorf("%s and %s are both called %q", was, in.Path, name)
			}
			seen[name] = in.Path
			for _, word := range append(in.Choices, in.Blank) {
				if word != "" && (!named(in.Path, word) || v.Choice(in.Path, word) == "") {
					t.Errorf("choice %s of %s has no name", word, in.Path)
				}
			}
		}
	}
	if name, unitName := inEnglish.Input("bike.wings"); name != "bike.wings" || unitName != "" {
		t.Errorf("an unknown path is its own name, got %q %q", name, unitName)
	}
	if got := inEnglish.Choice("bike.motor.kind", "sail"); got != "sail" {
		t.Errorf("an unknown choice is its own word, got %q", got)
	}
}

func TestProblems(t *testing.T) {
	set := func(path, text string) error {
		q := ask.Default()
		return q.Set(path, text)
	}
	_, sections := hill.ParseSections("400 m at 7 %, 60 m at 90 %")
	for _, c := range []struct {
		err    error
		en, de string
	}{
		{nil, "", ""},
		{errors.New("out of luck"), "out of luck", "out of luck"},
		{set("bike.wings", "2"), "bike.wings: there is no such input.", "bike.wings: diese Angabe gibt es nicht."},
		{set("rider.mass_kg", "300"), "Rider's mass: “300 kg” does not fit. Expected: a number from 25 to 180 kg.", "Fahrergewicht: „300 kg“ passt nicht. Erwartet: eine Zahl von 25 bis 180 kg."},
		{set("day.altitude_m", "x"), "Altitude: “x” does not fit. Expected: a number from −400 to 6000 m, or “as the hill”.", "Höhe über Meer: „x“ passt nicht. Erwartet: eine Zahl von −400 bis 6000 m, oder „wie der Berg“."},
		{set("bike.crr", "0.5"), "Rolling resistance: “0.5” does not fit. Expected: a number from 0.001 to 0.1.", "Rollwiderstand: „0,5“ passt nicht. Erwartet: eine Zahl von 0,001 bis 0,1."},
		{set("bike.motor.kind", "sail"), "Motor: “sail” does not fit. Expected: one of: no motor; crank motor; rear hub motor; front hub motor.", "Motor: „sail“ passt nicht. Erwartet: eines von: ohne Motor; Mittelmotor; Hinterradmotor; Vorderradmotor."},
		{set("bike.sprockets", "11 x"), "Sprockets: “11 x” does not fit. Expected: numbers from 8 to 60, with blanks between them.", "Ritzel: „11 x“ passt nicht. Erwartet: Zahlen von 8 bis 60, mit Leerzeichen dazwischen."},
		{set("bike.tyre", "fat"), "Tyre size: “fat” does not fit. Expected: width and bead seat in mm, such as 47-622.", "Reifengröße: „fat“ passt nicht. Erwartet: Breite und Felgenmaß in mm, etwa 47-622."},
		{set("ride.level", "x"), "Assist level: “x” does not fit. Expected: a whole number from 0 to 9, or “highest”.", "Unterstützungsstufe: „x“ passt nicht. Erwartet: eine ganze Zahl von 0 bis 9, oder „höchste“."},
		{fmt.Errorf("bike: %w", rig.ErrLevel), "The motor has no such assist level. Choose a lower one.", "Diese Unterstützungsstufe hat der Motor nicht. Eine niedrigere wählen."},
		{sections, "Section 2 (“60 m at 90 %”): a grade lies between −60 % and 60 %, not “90”. Write them like this: 400 m at 7 %, 60 m at 18 %.", "Abschnitt 2 („60 m at 90 %“): eine Steigung liegt zwischen −60 % und 60 %, nicht „90“. So schreiben: 400 m mit 7 %, 60 m mit 18 %."},
		{&hill.TrackError{Kind: hill.TrackCutOff, Line: 70, Points: 12000}, "Track, line 70: the file ends in the middle: copy or export it again. 12 000 points were read.", "Track, Zeile 70: die Datei bricht mittendrin ab: neu kopieren oder ausgeben. Gelesen wurden 12 000 Punkte."},
		{&hill.TrackError{Kind: hill.TrackTooLarge}, "Track: the file is larger than 64 MB: export only the hill, or fewer points.", "Track: die Datei ist größer als 64 MB: nur den Berg ausgeben, oder weniger Punkte."},
		{ride.ErrNoRoad, "The hill has no road: give it at least one stretch.", "Der Berg hat keine Straße: mindestens einen Abschnitt angeben."},
		{keep.Fault{Kind: keep.NotJSON, Where: "3:7", Detail: "}"}, "The file is cut off or damaged at 3:7 (}). Copy it again.", "Die Datei ist bei 3:7 abgeschnitten oder beschädigt (}). Neu kopieren."},
	} {
		if got := bare(inEnglish.Problem(c.err)); got != c.en {
			t.Errorf("got  %s\nwant %s", got, c.en)
		}
		if got := bare(inGerman.Problem(c.err)); got != c.de {
			t.Errorf("got  %s\nwant %s", got, c.de)
		}
	}
	out := &ask.Problem{}
	if !errors.As(set("rider.mass_kg", "300"), &out) {
		t.Fatal("no *ask.Problem")
	}
	if got, want := bare(inFeet.Problem(out)), "Rider's mass: “661.4 lb” does not fit. Expected: a number from 55.1 to 396.8 lb."; got != want {
		t.Errorf("got %s, want %s", got, want)
	}
	for kind := range constants(t, "wasm/keep", "FaultKind") {
		if got := inGerman.Problem(keep.Fault{Kind: keep.FaultKind(kind), Where: "a", Detail: "b"}); got == "" || strings.ContainsAny(got, "{}") {
			t.Errorf("fault %d: %q", kind, got)
		}
	}
}

func TestNotes(t *testing.T) {
	for _, c := range []struct {
		note   hill.Note
		en, de string
	}{
		{hill.Note{Kind: hill.NoteSpike, Count: 1, AtM: 420}, "Stray point or height left out, at 420 m.", "Ausreißer in Ort oder Höhe weggelassen, bei 420 m."},
		{hill.Note{Kind: hill.NoteSpike, Count: 3, AtM: 420}, "Stray point or height left out, 3 times, first at 420 m.", "Ausreißer in Ort oder Höhe weggelassen, 3-mal, zuerst bei 420 m."},
		{hill.Note{Kind: hill.NoteGap, Count: 2, AtM: 1500, LengthM: 120}, "Gap bridged by a straight line (120 m), 2 times, first at 1.50 km.", "Lücke gerade überbrückt (120 m), 2-mal, zuerst bei 1,50 km."},
		{hill.Note{Kind: hill.NoteNoHeights, Count: 900}, "The track has no heights: it is taken as level.", "Der Track hat keine Höhen: er gilt als eben."},
	} {
		if got := bare(inEnglish.Note(c.note)); got != c.en {
			t.Errorf("got %s, want %s", got, c.en)
		}
		if got := bare(inGerman.Note(c.note)); got != c.de {
			t.Errorf("got %s, want %s", got, c.de)
		}
	}
}
