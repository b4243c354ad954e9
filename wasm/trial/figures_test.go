//go:build !js

package trial

import (
	"encoding/json"
	"fmt"
	"math"
	"strings"
	"testing"

	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/view"
)

// TestPageIsTerminal compares the figures that the page gives as a file with
// the terminal's for the same inputs, to 1e-9 relative, and every word and
// digit on the page with what the same views say when they run natively.
func TestPageIsTerminal(t *testing.T) {
	p := open(t, phone)
	from, err := parts()
	if err != nil {
		t.Fatal(err)
	}
	native := state.First(&from.Shop.Shop, "en")
	do := func(a state.Action) { native, _ = state.Reduce(native, a) }
	do(state.Action{Name: state.DeviceLikes, Arg: "en", Text: "."})
	do(state.Action{Name: state.Stored, Arg: "loose"})
	do(state.Action{Name: state.Wide, X: eval[float64](p, `document.querySelector("#section svg").viewBox.baseVal.width`)})
	for _, c := range [][5]string{
		{"trekking", "steady", "bag", "mild", "school-hill"},
		{"city-hub", "strong", "child", "winter", "mill-lane"},
		{"longtail", "heavy", "trailer", "headwind", "school-hill"},
		{"plain", "light", "none", "hot", "pass-road"},
		{"fast", "easy", "shopping", "cold-morning", "way-home"},
	} {
		for i, kind := range []keep.Kind{keep.Bike, keep.Rider, keep.Load, keep.Day, state.Hill} {
			p.tap(act("open", string(kind)))
			p.tap(act("choose", string(kind)+":"+c[i]))
			do(state.Action{Name: state.Open, Arg: string(kind)})
			do(state.Action{Name: state.Choose, Arg: string(kind) + ":" + c[i]})
		}
		a := newAsked(t, c[0], c[1], c[2], c[3], c[4])
		p.answers(a)
		_, data := p.download(act("figures", ""))
		for _, difference := range differences("", parsed(t, data), parsed(t, a.json())) {
			t.Errorf("%v: %s", c, difference)
		}
		want := spaced(view.Page(native).Words())
		if got := p.text(".page"); got != want {
			t.Errorf("%v: %s", c, firstDifference(got, want))
		}
	}
}

func parsed(t *testing.T, data []byte) any {
	t.Helper()
	var v any
	if err := json.Unmarshal(data, &v); err != nil {
		t.Fatalf("%v in %.200s", err, data)
	}
	return v
}

// alike is how far the page and the terminal may be apart, relative: their
// exponentials differ in the last bits.
const alike = 1e-9

// differences tells where two JSON values differ.
func differences(path string, page, terminal any) []string {
	var out []string
	switch want := terminal.(type) {
	case map[string]any:
		got, _ := page.(map[string]any)
		for key := range got {
			if _, known := want[key]; !known {
				out = append(out, path+"."+key+": only the page has it")
			}
		}
		for key := range want {
			out = append(out, differences(path+"."+key, got[key], want[key])...)
		}
	case []any:
		got, _ := page.([]any)
		if len(got) != len(want) {
			return []string{fmt.Sprintf("%s: %d entries on the page, %d in the terminal", path, len(got), len(want))}
		}
		for i := range want {
			out = append(out, differences(fmt.Sprintf("%s[%d]", path, i), got[i], want[i])...)
		}
	case float64:
		got, ok := page.(float64)
		if !ok || math.Abs(got-want) > alike*math.Max(math.Abs(want), 1e-6) {
			out = append(out, fmt.Sprintf("%s: %v on the page, %v in the terminal", path, page, want))
		}
	default:
		if page != terminal {
			out = append(out, fmt.Sprintf("%s: %v on the page, %v in the terminal", path, page, terminal))
		}
	}
	return out
}

// firstDifference shows two texts where they part.
func firstDifference(got, want string) string {
	i := 0
	for i < len(got) && i < len(want) && got[i] == want[i] {
		i++
	}
	from := max(0, i-60)
	cut := func(s string) string { return strings.ToValidUTF8(s[from:min(len(s), i+60)], "") }
	return fmt.Sprintf("the page shows …%q, natively it is …%q", cut(got), cut(want))
}
