package dom

import (
	"strings"
	"testing"

	"pgregory.net/rapid"
)

func TestWriteHTML(t *testing.T) {
	tests := []struct {
		name string
		node *Node
		want string // starts with "!" when it must fail with these words
	}{
		{"text", &Node{Text: `a < b & "c" > d`}, `a &lt; b &amp; &quot;c&quot; &gt; d`},
		{"element", El("p", Class("why"), Text("so")), `<p class="why">so</p>`},
		{"empty element keeps its end", El("p"), `<p></p>`},
		{"void", El("input", With("value", `"<&>`), Bare("disabled")), `<input value="&quot;&lt;&amp;&gt;" disabled>`},
		{"nil parts", El("p", nil, (*Node)(nil), Parts{nil, Text("x")}, If(false, Text("y"))), `<p>x</p>`},
		{"act", El("button", Act("open", "rider.mass_kg")), `<button data-act="open" data-arg="rider.mass_kg"></button>`},
		{"picture", SVG(With("viewBox", "0 0 1 1"), El("path", With("d", "M0 0h1"))),
			`<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 1 1"><path d="M0 0h1"></path></svg>`},
		{"void with kids", El("br", Text("x")), "!nothing can stand inside"},
		{"script", El("script", Text("x")), "!escaped"},
		{"odd tag", El("a b"), "!tag"},
		{"odd attribute", El("a", With(`x"`, "y")), "!attribute"},
		{"twice", El("a", ID("x"), ID("y")), "!twice"},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			got, err := HTML(test.node)
			if want, fails := strings.CutPrefix(test.want, "!"); fails {
				if err == nil || !strings.Contains(err.Error(), want) {
					t.Fatalf("error %v, want one with %q", err, want)
				}
				return
			}
			if err != nil || got != test.want {
				t.Errorf("got  %s (%v)\nwant %s", got, err, test.want)
			}
		})
	}
}

// No text, whatever it holds, opens a tag or ends an attribute.
func TestNothingEscapes(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		text := rapid.String().Draw(t, "text")
		got, err := HTML(El("p", With("title", text), Text(text)))
		if err != nil {
			t.Fatal(err)
		}
		if strings.Count(got, "<") != 2 || strings.Count(got, ">") != 2 {
			t.Fatalf("%q writes %q", text, got)
		}
		if quotes := strings.Count(got[:strings.Index(got, ">")], `"`); text != "" && quotes != 2 {
			t.Fatalf("%q writes %q", text, got)
		}
	})
}
