package words

import (
	"errors"
	"strconv"
	"strings"

	"hillwright/physics/ask"
)

// Check tells everything that is missing or wrong in the catalogue: a text that
// is not there in some language, blanks that differ between languages, an
// input, choice, limit or note without a name. The pack step calls it and
// fails on its error. That no key is unused is checked by this package's test,
// which reads the source.
func Check() error {
	faults := checkTexts(catalogue[:])
	faults = append(faults, checkTables()...)
	if len(faults) == 0 {
		return nil
	}
	return errors.New("the catalogue of words (wasm/words) is not complete:\n" + strings.Join(faults, "\n"))
}

func checkTexts(all []*[keys]string) []string {
	var faults []string
	for k := Key(0); k < keys; k++ {
		for l, texts := range all {
			text := texts[k]
			where := tags[l] + ": " + label(all, k)
			if text == "" {
				faults = append(faults, where+" has no text")
				continue
			}
			if text != strings.TrimSpace(text) {
				faults = append(faults, where+" begins or ends with a blank; the view sets blanks")
			}
			if want, got := blanksOf(all[0][k]), blanksOf(text); want != got && all[0][k] != "" {
				faults = append(faults, where+" has the blanks "+got+" where "+tags[0]+" has "+want)
			}
			if has := blanksOf(text); !strings.HasPrefix("{0}{1}{2}{3}{4}{5}{6}{7}{8}{9}", has) && has != none {
				faults = append(faults, where+" has the blanks "+has+"; they are counted from {0} without a gap")
			}
			if bare := plain(text); strings.ContainsAny(bare, "{}") {
				faults = append(faults, where+" has a brace that is no blank; blanks are {0} to {9}")
			}
		}
	}
	return faults
}

// label names a key by its number and its text in whatever language has one,
// or by the key before it.
func label(all []*[keys]string, k Key) string {
	for _, texts := range all {
		if texts[k] != "" {
			return "key " + strconv.Itoa(int(k)) + " (“" + texts[k] + "”)"
		}
	}
	text := "key " + strconv.Itoa(int(k))
	if k > 0 {
		text += ", the one after “" + all[0][k-1] + "”,"
	}
	return text
}

const none = "none"

func blanksOf(text string) string {
	var has [10]bool
	for _, p := range cut(text) {
		if p.Blank >= 0 {
			has[p.Blank] = true
		}
	}
	out := ""
	for i, there := range has {
		if there {
			out += "{" + strconv.Itoa(i) + "}"
		}
	}
	if out == "" {
		return none
	}
	return out
}

func plain(text string) string {
	out := ""
	for _, p := range cut(text) {
		out += p.Text
	}
	return out
}

// checkTables looks for things of the computation that have no name here. A
// slot of a table that was forgotten holds key 0, which names the first
// verdict and nothing else.
func checkTables() []string {
	var faults []string
	for _, t := range []struct {
		what string
		keys []Key
	}{
		{"limit", limitNames[:]}, {"limit's meaning", limitMeanings[:]}, {"source", sourceNames}, {"what bounds a stop", stopTexts},
		{"note", noteTexts}, {"problem with sections", sectionTexts},
		{"problem with tracks", trackTexts}, {"problem with hills", profileTexts}, {"look of a file", lookTexts},
	} {
		for i, k := range t.keys {
			if k == 0 {
				faults = append(faults, t.what+" "+strconv.Itoa(i)+" has no key")
			}
		}
	}
	for _, in := range ask.Inputs() {
		if _, ok := inputAt(in.Path); !ok {
			faults = append(faults, "input "+in.Path+" has no name in input.go")
		}
		words := in.Choices
		if in.Blank != "" {
			words = append(append([]string(nil), words...), in.Blank)
		}
		for _, w := range words {
			if !named(in.Path, w) {
				faults = append(faults, "choice "+w+" of "+in.Path+" has no name in term.go")
			}
		}
	}
	for _, in := range inputs {
		if _, ok := ask.InputAt(in.path); !ok {
			faults = append(faults, "input.go names "+in.path+", which physics/ask does not have")
		}
	}
	return faults
}

func named(path, word string) bool {
	for _, c := range choices {
		if c.path == path && c.word == word {
			return true
		}
	}
	return false
}
