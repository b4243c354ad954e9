//go:build js && wasm

package device

import (
	"strings"
	"syscall/js"
)

// Device is the browser the page runs in.
type Device struct {
	database js.Value // undefined where storage is refused
	asked    bool     // whether storage was asked to last
	worker   *worker
	dressed  bool // the browser's frame was given a colour
	stopped  int  // how many readings were stopped: an older inline one ends

	tilt     *tilt
	unlocate func()   // ends locating
	awake    func()   // is told that the screen is kept awake; nil when it may sleep
	watching bool     // the page's showing is watched for the lock
	lock     js.Value // on the screen
	sound    js.Value // an audio context, once there was a tone

	recording *recording // what is being recorded
	held      js.Value   // the recording at hand, a file of the browser's
}

// New takes hold of the browser.
func New() *Device {
	return &Device{database: js.Undefined(), lock: js.Undefined(), sound: js.Undefined(), held: js.Undefined()}
}

// Now is the time in seconds since 1970.
func (d *Device) Now() int64 { return int64(js.Global().Get("Date").Call("now").Float() / 1000) }

// ClockS is a clock for spans [s].
func (d *Device) ClockS() float64 { return nowMs() / 1000 }

// nowMs is a clock for spans [ms].
func nowMs() float64 { return js.Global().Get("performance").Call("now").Float() }

// After calls f after a time [ms]. The package time would do, and makes the
// program larger by a thirtieth.
func After(ms float64, f func()) {
	var then js.Func
	then = js.FuncOf(func(js.Value, []js.Value) any {
		then.Release()
		f()
		return nil
	})
	js.Global().Call("setTimeout", then, ms)
}

func window() js.Value   { return js.Global() }
func document() js.Value { return js.Global().Get("document") }

func given(v js.Value) bool { return !v.IsUndefined() && !v.IsNull() }

// try runs what the browser may refuse by throwing; false when it did.
func try(f func()) (ok bool) {
	defer func() {
		if failed := recover(); failed != nil {
			if _, thrown := failed.(js.Error); !thrown {
				panic(failed)
			}
			ok = false
		}
	}()
	f()
	return true
}

// once hangs functions on events of a target; when the first comes, all are
// taken off and released.
func once(target js.Value, on map[string]func(js.Value)) {
	listeners := map[string]js.Func{}
	for event, f := range on {
		listeners[event] = js.FuncOf(func(_ js.Value, args []js.Value) any {
			for name, each := range listeners {
				target.Call("removeEventListener", name, each)
				each.Release()
			}
			f(args[0])
			return nil
		})
	}
	for event, f := range listeners {
		target.Call("addEventListener", event, f)
	}
}

// then takes a promise's outcome; failed gets the reason.
func then(promise js.Value, done, failed func(js.Value)) {
	var yes, no js.Func
	end := func(f func(js.Value)) js.Func {
		return js.FuncOf(func(_ js.Value, args []js.Value) any {
			yes.Release()
			no.Release()
			v := js.Undefined()
			if len(args) > 0 {
				v = args[0]
			}
			if f != nil {
				f(v)
			}
			return nil
		})
	}
	yes, no = end(done), end(failed)
	promise.Call("then", yes, no)
}

// Prefers gives the device's language as a BCP 47 tag, and its decimal mark.
func (d *Device) Prefers() (lang, mark string) {
	navigator := window().Get("navigator")
	lang = navigator.Get("language").String()
	try(func() {
		text := window().Get("Intl").Get("NumberFormat").New(lang).Call("format", 1.5).String()
		mark = strings.Trim(text, "15")
	})
	return lang, mark
}

// Dress puts the page's language and light on the document; theme is "sun",
// "dusk", or "" for the device's own.
func (d *Device) Dress(lang, theme string) {
	html := document().Get("documentElement")
	html.Call("setAttribute", "lang", lang)
	if theme == "" {
		html.Call("removeAttribute", "data-theme")
	} else {
		html.Call("setAttribute", "data-theme", theme)
	}
	d.dressFrame(theme)
}

// dressFrame gives the browser's own frame the page's colour where the person
// chose another light than the device's. Without a choice the page's head says
// it for either light.
func (d *Device) dressFrame(theme string) {
	frames := document().Call("querySelectorAll", "meta[name=theme-color]")
	if theme == "" && !d.dressed {
		return
	}
	d.dressed = true
	colour := window().Call("getComputedStyle", document().Get("body")).Get("backgroundColor")
	for i := range frames.Length() {
		frames.Index(i).Call("setAttribute", "content", colour)
	}
}

// Tap is a touch that came before the program ran.
type Tap struct{ Act, Arg, Value string }

// EarlyTaps takes the touches that boot.js kept, and ends the keeping.
func (d *Device) EarlyTaps() []Tap {
	kept := window().Get("hillwrightTaps")
	var taps []Tap
	if given(kept) {
		for i := range kept.Length() {
			t := kept.Index(i)
			taps = append(taps, Tap{t.Get("act").String(), t.Get("arg").String(), t.Get("value").String()})
		}
	}
	window().Set("hillwrightTaps", js.Null())
	return taps
}

// PictureWidth is how wide pictures may be [px], or otherwise when the page
// shows none.
func (d *Device) PictureWidth(otherwise float64) float64 {
	canvas := document().Call("querySelector", "#section-picture")
	if !given(canvas) || canvas.Get("clientWidth").Float() == 0 {
		return otherwise
	}
	return canvas.Get("clientWidth").Float()
}

// OnResize calls f when the window's size has changed.
func (d *Device) OnResize(f func()) {
	window().Call("addEventListener", "resize", js.FuncOf(func(js.Value, []js.Value) any {
		f()
		return nil
	}))
}

// OnUpdate calls f when a new version waits, or at once when one does already.
func (d *Device) OnUpdate(f func()) {
	window().Call("addEventListener", "hillwright-update", js.FuncOf(func(js.Value, []js.Value) any {
		f()
		return nil
	}))
	if given(window().Get("hillwrightUpdate")) {
		f()
	}
}

// UseNew changes to the version that waits.
func (d *Device) UseNew() {
	if given(window().Get("hillwrightUpdate")) {
		window().Call("hillwrightUpdate")
	}
}

// Show brings an element into view and gives it the focus, once the page has
// been rendered.
func (d *Device) Show(id string) {
	afterRender(func() {
		el := document().Call("getElementById", id)
		if !given(el) {
			return
		}
		focus := el
		if inner := el.Call("querySelector", "[tabindex='-1']"); given(inner) {
			focus = inner
		}
		focus.Call("focus", map[string]any{"preventScroll": true})
		el.Call("scrollIntoView", map[string]any{"block": "nearest"})
	})
}

// afterRender calls f two frames on: the first is the one that renders.
func afterRender(f func()) {
	left := 2
	var frame js.Func
	frame = js.FuncOf(func(js.Value, []js.Value) any {
		if left--; left > 0 {
			window().Call("requestAnimationFrame", frame)
			return nil
		}
		frame.Release()
		f()
		return nil
	})
	window().Call("requestAnimationFrame", frame)
}

// CanShare tells whether the device can hand a text on.
func (d *Device) CanShare() bool { return given(window().Get("navigator").Get("share")) }

// Share hands a text on to what the person chooses.
func (d *Device) Share(text string) {
	try(func() {
		then(window().Get("navigator").Call("share", map[string]any{"text": text}), nil, nil)
	})
}

// Print prints the page.
func (d *Device) Print() { window().Call("print") }
