//go:build js && wasm

package device

import (
	"strings"
	"syscall/js"
)

// ZoneS is what the device's clock is ahead of UTC now [s].
func (d *Device) ZoneS() float64 {
	return -60 * js.Global().Get("Date").New().Call("getTimezoneOffset").Float()
}

// KeepAwake keeps the screen from going dark until LetSleep. The browser lets
// go of it when the page is hidden; it is taken again when the page shows. told
// is called when it is held.
func (d *Device) KeepAwake(told func()) {
	lock := window().Get("navigator").Get("wakeLock")
	if !given(lock) {
		return
	}
	first := d.awake == nil
	d.awake = told
	if first && !d.watching {
		d.watching = true
		document().Call("addEventListener", "visibilitychange", js.FuncOf(func(js.Value, []js.Value) any {
			if d.awake != nil && document().Get("visibilityState").String() == "visible" {
				d.takeLock(lock)
			}
			return nil
		}))
	}
	d.takeLock(lock)
}

func (d *Device) takeLock(lock js.Value) {
	try(func() {
		then(lock.Call("request", "screen"), func(held js.Value) {
			if d.awake == nil {
				held.Call("release")
				return
			}
			d.lock = held
			d.awake()
		}, nil)
	})
}

// LetSleep lets the screen go dark again.
func (d *Device) LetSleep() {
	d.awake = nil
	if given(d.lock) {
		d.lock.Call("release")
		d.lock = js.Undefined()
	}
}

// OnVoices tells the tags of the languages that the device speaks by itself,
// without a network, with blanks between them; again when they change.
func (d *Device) OnVoices(told func(tags string)) {
	speech := window().Get("speechSynthesis")
	if !given(speech) {
		return
	}
	tell := func() {
		var tags []string
		voices := speech.Call("getVoices")
		for i := range voices.Length() {
			if v := voices.Index(i); v.Get("localService").Truthy() {
				tags = append(tags, v.Get("lang").String())
			}
		}
		told(strings.Join(tags, " "))
	}
	try(func() {
		speech.Call("addEventListener", "voiceschanged", js.FuncOf(func(js.Value, []js.Value) any {
			tell()
			return nil
		}))
		tell()
	})
}

// Speak reads a text aloud with a voice of the device's own.
func (d *Device) Speak(lang, text string) {
	try(func() {
		speech := window().Get("speechSynthesis")
		say := window().Get("SpeechSynthesisUtterance").New(text)
		say.Set("lang", lang)
		voices := speech.Call("getVoices")
		for i := range voices.Length() {
			if v := voices.Index(i); v.Get("localService").Truthy() && strings.HasPrefix(strings.ToLower(v.Get("lang").String()), lang) {
				say.Set("voice", v)
				break
			}
		}
		speech.Call("cancel")
		speech.Call("speak", say)
	})
}

// tone is one tone of a pattern: pitch [Hz] at its beginning and end, how long
// [s].
type tone struct{ from, to, long float64 }

// patterns tell a word, and the steps of measuring.
var patterns = map[string][]tone{
	"go":      {{440, 440, 0.18}, {660, 660, 0.18}, {880, 880, 0.3}},
	"rolling": {{550, 550, 0.9}},
	"again":   {{440, 660, 0.25}, {660, 440, 0.25}, {440, 660, 0.25}, {660, 440, 0.25}},
	"stop":    {{500, 180, 0.9}},
	"step":    {{700, 700, 0.15}},
	"done":    {{700, 700, 0.15}, {940, 940, 0.2}},
}

// Tones plays a pattern.
func (d *Device) Tones(pattern string) {
	try(func() {
		if !given(d.sound) {
			d.sound = window().Get("AudioContext").New()
		}
		d.sound.Call("resume")
		at := d.sound.Get("currentTime").Float() + 0.03
		for _, t := range patterns[pattern] {
			source, loud := d.sound.Call("createOscillator"), d.sound.Call("createGain")
			source.Get("frequency").Call("setValueAtTime", t.from, at)
			source.Get("frequency").Call("linearRampToValueAtTime", t.to, at+t.long)
			loud.Get("gain").Call("setValueAtTime", 0.0001, at)
			loud.Get("gain").Call("linearRampToValueAtTime", 0.5, at+0.02)
			loud.Get("gain").Call("setValueAtTime", 0.5, at+t.long-0.03)
			loud.Get("gain").Call("linearRampToValueAtTime", 0.0001, at+t.long)
			source.Call("connect", loud)
			loud.Call("connect", d.sound.Get("destination"))
			source.Call("start", at)
			source.Call("stop", at+t.long)
			at += t.long + 0.06
		}
	})
}
