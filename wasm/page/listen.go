//go:build js && wasm

package page

import (
	"syscall/js"

	"hillwright/wasm/device"
	"hillwright/wasm/state"
)

// listen hangs one listener for each kind of event on the document; elements
// say by data-act and data-arg what they are for.
func (p *page) listen() {
	h := &hand{page: p}
	for _, each := range []struct {
		event string
		take  func(e js.Value)
	}{
		{"click", h.click},
		{"input", h.input},
		{"focusout", h.leave},
		{"keydown", h.key},
		{"pointerdown", h.down},
		{"pointermove", h.move},
		{"pointerup", h.up},
		{"pointercancel", h.up},
		{"dragover", h.dragOver},
		{"dragleave", h.dragLeave},
		{"drop", h.drop},
	} {
		js.Global().Get("document").Call("addEventListener", each.event, js.FuncOf(func(_ js.Value, args []js.Value) any {
			defer func() {
				if failed := recover(); failed != nil {
					p.broke(report(each.event, failed))
				}
			}()
			each.take(args[0])
			return nil
		}))
	}
}

// hand is what fingers, keys and the mouse are doing.
type hand struct {
	page     *page
	drag     js.Value // the element that is dragged
	act, arg string   // its action, "" when nothing is dragged
	repeats  int      // numbers the presses of stepper buttons
	repeated bool     // the press stepped on by itself: the click that ends it counts for nothing
}

// touched finds the element with an action at or above an event's target.
func touched(e js.Value) (el js.Value, act, arg string) {
	target := e.Get("target")
	if target.IsNull() || target.IsUndefined() || target.Get("closest").IsUndefined() {
		return js.Null(), "", ""
	}
	el = target.Call("closest", "[data-act]")
	if el.IsNull() {
		return el, "", ""
	}
	return el, el.Call("getAttribute", "data-act").String(), orEmpty(el.Call("getAttribute", "data-arg"))
}

func orEmpty(v js.Value) string {
	if v.Type() != js.TypeString {
		return ""
	}
	return v.String()
}

// isField tells that an action comes from a field and not from a press.
func isField(act string) bool {
	return act == state.Type || act == state.TypeName || act == state.TypeSections || act == state.TypeNote || act == state.PlaceName
}

// isDrag tells that an action follows the finger.
func isDrag(act string) bool {
	return act == state.MoveStaff || act == state.MoveWeight || act == state.Sketch || act == state.TrackHandle || act == state.CutHandle
}

func (h *hand) do(a state.Action) {
	a.Now, a.ClockS = h.page.works.Now(), h.page.works.ClockS()
	h.page.do(a)
}

func (h *hand) click(e js.Value) {
	_, act, arg := touched(e)
	if act == "" || isField(act) || isDrag(act) {
		return
	}
	if h.repeated {
		h.repeated = false
		return
	}
	h.do(state.Action{Name: act, Arg: arg})
}

func (h *hand) input(e js.Value) {
	el, act, arg := touched(e)
	if isField(act) {
		h.do(state.Action{Name: act, Arg: arg, Text: el.Get("value").String()})
	}
}

func (h *hand) leave(e js.Value) {
	if _, act, arg := touched(e); act == state.Type {
		h.do(state.Action{Name: state.Typed, Arg: arg})
	}
}

func (h *hand) key(e js.Value) {
	_, act, arg := touched(e)
	key := e.Get("key").String()
	sign := map[string]string{"ArrowLeft": "-", "ArrowDown": "-", "ArrowRight": "+", "ArrowUp": "+"}[key]
	switch {
	case key == "Escape" && h.page.state.Place != "":
		h.do(state.Action{Name: state.Close})
	case key == "Enter" && act == state.TypeName:
		h.do(state.Action{Name: state.Keep, Arg: arg})
	case act == state.Type && (key == "ArrowUp" || key == "ArrowDown"):
		e.Call("preventDefault")
		h.do(state.Action{Name: map[string]string{"+": state.StepUp, "-": state.StepDown}[sign], Arg: arg})
	case act == state.MoveWeight && sign != "":
		e.Call("preventDefault")
		h.do(state.Action{Name: state.WeightStep, Arg: sign})
	}
}

// Holding a stepper's button steps on by itself [ms].
const (
	holdFor   = 450
	stepEvery = 90
)

func (h *hand) down(e js.Value) {
	el, act, arg := touched(e)
	h.repeated = false
	switch {
	case isDrag(act):
		h.drag, h.act, h.arg = el, act, arg
		el.Call("setPointerCapture", e.Get("pointerId"))
		h.move(e)
	case act == state.StepUp || act == state.StepDown || act == state.StaffStep || act == state.DialUp || act == state.DialDown || act == state.CutLater || act == state.CutEarlier:
		h.repeats++
		press := h.repeats
		device.After(holdFor, func() { h.repeat(press, state.Action{Name: act, Arg: arg}) })
	}
}

func (h *hand) repeat(press int, a state.Action) {
	if press != h.repeats {
		return
	}
	h.repeated = true
	h.do(a)
	device.After(stepEvery, func() { h.repeat(press, a) })
}

func (h *hand) move(e js.Value) {
	if h.act == "" {
		return
	}
	picture := h.drag.Get("ownerSVGElement")
	box := picture.Call("getBoundingClientRect")
	inside := picture.Get("viewBox").Get("baseVal")
	at := func(client, edge, size string) float64 {
		return (e.Get(client).Float() - box.Get(edge).Float()) / box.Get(size).Float() * inside.Get(size).Float()
	}
	if box.Get("width").Float() == 0 {
		return
	}
	h.do(state.Action{Name: h.act, Arg: h.arg, X: at("clientX", "left", "width"), Y: at("clientY", "top", "height")})
}

func (h *hand) up(js.Value) {
	h.act = ""
	h.repeats++
}

func hasFiles(e js.Value) bool {
	types := e.Get("dataTransfer").Get("types")
	for i := range types.Length() {
		if types.Index(i).String() == "Files" {
			return true
		}
	}
	return false
}

func (h *hand) dragOver(e js.Value) {
	if !hasFiles(e) {
		return
	}
	e.Call("preventDefault")
	if !h.page.state.Device.Dropping {
		h.do(state.Action{Name: state.Dropping, Arg: "over"})
	}
}

func (h *hand) dragLeave(e js.Value) {
	if e.Get("relatedTarget").IsNull() && h.page.state.Device.Dropping {
		h.do(state.Action{Name: state.Dropping})
	}
}

func (h *hand) drop(e js.Value) {
	if !hasFiles(e) {
		return
	}
	e.Call("preventDefault")
	h.do(state.Action{Name: state.Dropping})
	files := e.Get("dataTransfer").Get("files")
	if files.Length() == 0 {
		return
	}
	h.page.works.ReadFile(files.Index(0), func(name string, data []byte) {
		h.do(state.Action{Name: state.TrackFile, Arg: name, Data: data})
	})
}
