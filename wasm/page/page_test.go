//go:build js && wasm

package page

import (
	"strings"
	"syscall/js"
	"testing"

	"hillwright/wasm/device"
	"hillwright/wasm/dom"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/view"

	"github.com/hexops/vecty"
)

func shop() *keep.Shop {
	name := func(s string) map[string]string { return map[string]string{"": s} }
	return &keep.Shop{
		Name: "Shop", LawID: "eu-25", Units: "metric", Languages: []string{"en", "de"},
		Things: []keep.Thing{
			{Kind: keep.Bike, ID: "a", Names: name("a bike"), Values: map[string]string{"mass_kg": "25"}},
			{Kind: keep.Bike, ID: "b", Names: name("a bike without a motor"), Values: map[string]string{"motor.kind": "none"}},
			{Kind: keep.Bike, ID: "c", Names: name("a hub bike"), Values: map[string]string{"motor.kind": "rear-hub"}},
			{Kind: keep.Rider, ID: "r", Names: name("a rider"), Values: map[string]string{"mass_kg": "80"}},
		},
		Hills: []keep.Hill{
			{ID: "h", Names: name("a hill"), EdgeM: []float64{0, 400, 460}, HeightM: []float64{0, 28, 38}},
			{ID: "i", Names: name("a wall"), EdgeM: []float64{0, 100, 300}, HeightM: []float64{0, 2, 82}},
		},
	}
}

// nextFrame waits for a frame: the library renders in them.
func nextFrame() {
	done := make(chan struct{})
	frame := js.FuncOf(func(js.Value, []js.Value) any {
		close(done)
		return nil
	})
	js.Global().Call("requestAnimationFrame", frame)
	<-done
	frame.Release()
}

// After any actions, the document shows exactly the tree that the view gives:
// nothing stale, nothing left over.
func TestDocumentFollowsTheView(t *testing.T) {
	document := js.Global().Get("document")
	app := document.Call("createElement", "div")
	app.Set("id", "app")
	document.Get("body").Call("append", app)
	p := &page{state: state.First(shop(), "en"), book: newBook(), works: device.New()}
	p.book.take(view.Page(p.state))
	if err := vecty.RenderInto("#app", &root{Book: p.book}); err != nil {
		t.Fatal(err)
	}
	skip := map[string]bool{ // they ask the browser for what a test has not
		state.Print: true, state.Export: true, state.Figures: true, state.PickTrack: true, state.PickImport: true, state.Share: true, state.SaveBroken: true,
		state.ReadingsCSV: true, state.ReadingsGPX: true, state.Tell: true,
	}
	seed := uint32(1)
	pick := func(n int) int {
		seed = seed*1664525 + 1013904223
		return int(seed>>8) % n
	}
	texts := []string{"", "12", "x", "300 m at 12 %", "Otto", "61"}
	var last []string
	for range 150 {
		var able []*dom.Node
		view.Page(p.state).Walk(func(n *dom.Node) {
			if act, ok := n.Attr("data-act"); ok && !skip[act] {
				able = append(able, n)
			}
		})
		n := able[pick(len(able))]
		act, _ := n.Attr("data-act")
		arg, _ := n.Attr("data-arg")
		a := state.Action{Name: act, Arg: arg, Text: texts[pick(len(texts))], X: float64(pick(328)), Now: 9}
		last = append(last, act+" "+arg)
		if isField(act) {
			id, _ := n.Attr("id")
			document.Call("getElementById", id).Set("value", a.Text)
		}
		p.do(a)
		wrong := "not rendered"
		for frames := 0; wrong != "" && frames < 20; frames++ {
			nextFrame()
			wrong = differs(document.Call("querySelector", "#app > .page"), view.Page(p.state), "")
		}
		if wrong != "" {
			t.Fatalf("after %s: %s", strings.Join(last[max(0, len(last)-5):], ", "), wrong)
		}
	}
}

// differs tells where an element is not what a node says, "" when it is.
func differs(el js.Value, n *dom.Node, at string) string {
	if n.Tag == "" {
		if el.Get("nodeType").Int() != 3 || el.Get("data").String() != n.Text {
			return at + ": expected the text " + n.Text
		}
		return ""
	}
	at += "/" + n.Tag
	if el.Get("localName").IsUndefined() || el.Get("localName").String() != n.Tag {
		return at + ": another element"
	}
	if space := el.Get("namespaceURI").String(); (space == dom.SVGNamespace) != inSVG(at) {
		return at + ": namespace " + space
	}
	field := n.Tag == "input" || n.Tag == "textarea"
	expected := 0
	for _, a := range n.Attrs {
		if a.Name == "xmlns" || a.Name == "value" && field {
			continue
		}
		expected++
		if got := el.Call("getAttribute", a.Name); got.IsNull() || got.String() != a.Value {
			return at + ": attribute " + a.Name + " is not " + a.Value
		}
	}
	if got := el.Get("attributes").Get("length").Int(); got != expected {
		return at + ": attributes left over"
	}
	if field {
		value := n.Words()
		if v, ok := n.Attr("value"); ok {
			value = v
		}
		if got := el.Get("value").String(); got != value {
			return at + ": the field shows " + got + ", expected " + value
		}
		return ""
	}
	kids := el.Get("childNodes")
	if kids.Length() != len(n.Kids) {
		return at + ": children left over or missing"
	}
	for i, kid := range n.Kids {
		if wrong := differs(kids.Index(i), kid, at); wrong != "" {
			return wrong
		}
	}
	return ""
}

func inSVG(at string) bool { return strings.Contains(at+"/", "/svg/") }
