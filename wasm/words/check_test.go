package words

import (
	"strings"
	"testing"
)

func TestCatalogueIsComplete(t *testing.T) {
	if err := Check(); err != nil {
		t.Error(err)
	}
}

func TestBrokenCatalogueIsCaught(t *testing.T) {
	for _, c := range []struct {
		name  string
		spoil func(en, de *[keys]string)
		says  []string
	}{
		{"missing in one language", func(en, de *[keys]string) { de[ButtonDone] = "" }, []string{"de: ", "“" + english[ButtonDone] + "”", "no text"}},
		{"missing in the first language", func(en, de *[keys]string) { en[ButtonDone] = "" }, []string{"en: ", german[ButtonDone], "no text"}},
		{"missing in all", func(en, de *[keys]string) { en[ButtonDone], de[ButtonDone] = "", "" }, []string{"the one after “" + english[ButtonDone-1] + "”"}},
		{"blank lost", func(en, de *[keys]string) { de[Exaggeration] = "Höhen überhöht" }, []string{"de: ", "the blanks none where en has {0}"}},
		{"blank more", func(en, de *[keys]string) { de[Exaggeration] = "Höhen ×{0}{1}" }, []string{"{0}{1} where en has {0}"}},
		{"gap in the blanks", func(en, de *[keys]string) { en[Exaggeration], de[Exaggeration] = "×{1}", "×{1}" }, []string{"without a gap"}},
		{"brace", func(en, de *[keys]string) { en[ButtonDone] = "done {x}" }, []string{"a brace that is no blank"}},
		{"blank at the end", func(en, de *[keys]string) { en[ButtonDone] = "done " }, []string{"begins or ends with a blank"}},
	} {
		en, de := english, german
		c.spoil(&en, &de)
		faults := strings.Join(checkTexts([]*[keys]string{&en, &de}), "\n")
		for _, want := range c.says {
			if !strings.Contains(faults, want) {
				t.Errorf("%s: the fault does not say %q:\n%s", c.name, want, faults)
			}
		}
	}
	if faults := checkTexts([]*[keys]string{&english, &german}); len(faults) != 0 {
		t.Errorf("the real catalogue: %v", faults)
	}
}

func TestSay(t *testing.T) {
	if got := inEnglish.Say(NoteBand, "40 %", "60 %"); got != "likely 40 % to 60 %" {
		t.Error(got)
	}
	if got := inGerman.Say(NoteBand, "40 %"); got != "wohl 40 % bis " {
		t.Errorf("a blank without an argument stays empty: %q", got)
	}
	if got := (Voice{Lang: 200}).Say(ButtonDone); got != "done" {
		t.Errorf("a language that is not there falls back to English: %q", got)
	}
	// An argument is not read again for blanks.
	if got := inEnglish.Say(NoteBand, "{1}", "x"); got != "likely {1} to x" {
		t.Error(got)
	}
}

func TestPieces(t *testing.T) {
	var back strings.Builder
	for _, p := range inGerman.Pieces(AskClimb) {
		if p.Blank >= 0 {
			back.WriteString("{" + string(rune('0'+p.Blank)) + "}")
		}
		back.WriteString(p.Text)
	}
	if back.String() != german[AskClimb] {
		t.Errorf("pieces make %q of %q", back.String(), german[AskClimb])
	}
	if got := cut(""); len(got) != 1 || got[0].Blank >= 0 {
		t.Errorf("an empty text is one empty piece, got %v", got)
	}
}

func TestLangOf(t *testing.T) {
	for tag, want := range map[string]Lang{"en": English, "en-GB": English, "de": German, "de-AT": German, "DE": German} {
		if got, ok := LangOf(tag); !ok || got != want {
			t.Errorf("%s: got %v, %v", tag, got, ok)
		}
	}
	for _, tag := range []string{"", "fr", "den"} {
		if _, ok := LangOf(tag); ok {
			t.Errorf("%q is no language of the catalogue", tag)
		}
	}
	for _, l := range Langs() {
		if got, ok := LangOf(l.Tag()); !ok || got != l {
			t.Errorf("%v: its own tag finds %v", l, got)
		}
	}
	if len(Langs()) != int(langs) {
		t.Error("Langs does not give every language")
	}
}
