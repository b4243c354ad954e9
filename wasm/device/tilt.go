//go:build js && wasm

package device

import (
	"math"
	"syscall/js"

	"hillwright/physics/slope"
	"hillwright/physics/unit"
)

// Lean is one sample of the tilt sensor: when [s since 1970], up in the
// device's axes, and what it is rounded to.
type Lean struct {
	TimeS float64
	Up    slope.Up
	Step  unit.Angle
}

// tilt listens to the tilt sensor.
type tilt struct {
	listeners map[string]js.Func
	ended     bool
	heard     []Lean
	last      Lean
	oriented  bool // orientation events come: acceleration is not needed

}

const (
	tellLeans = 100.0  // samples are told so often [ms]
	waitTilt  = 2500.0 // without an event by then there is no sensor [ms]
)

// StartTilt listens to the tilt sensor until StopTilt: told gets what was heard
// every tenth of a second; failed "absent" or "refused". Where the browser asks
// for permission it does so now: call it from a touch.
func (d *Device) StartTilt(told func([]Lean), failed func(how string)) {
	d.StopTilt()
	t := &tilt{listeners: map[string]js.Func{}}
	d.tilt = t
	begin := func(js.Value) {
		if t.ended {
			return
		}
		t.listen()
		After(waitTilt, func() {
			if !t.ended && t.last.TimeS == 0 {
				failed("absent")
			}
		})
		t.tellOn(told)
	}
	refused := func(js.Value) {
		if !t.ended {
			failed("refused")
		}
	}
	kind := window().Get("DeviceOrientationEvent")
	if !given(kind) {
		failed("absent")
		return
	}
	if !given(kind.Get("requestPermission")) {
		begin(js.Undefined())
		return
	}
	ok := try(func() {
		then(kind.Call("requestPermission"), func(answer js.Value) {
			if answer.Type() == js.TypeString && answer.String() == "granted" {
				begin(answer)
				return
			}
			refused(answer)
		}, refused)
	})
	if !ok {
		refused(js.Undefined())
	}
}

// StopTilt ends listening.
func (d *Device) StopTilt() {
	if d.tilt == nil {
		return
	}
	d.tilt.ended = true
	for event, f := range d.tilt.listeners {
		window().Call("removeEventListener", event, f)
		f.Release()
	}
	d.tilt = nil
}

func (t *tilt) listen() {
	t.on("deviceorientation", func(e js.Value) {
		beta, gamma := numberOf(e.Get("beta")), numberOf(e.Get("gamma"))
		if up, ok := slope.UpOfOrientation(beta, gamma); ok {
			t.oriented = true
			t.hear(up, slope.OrientationStep)
		}
	})
	t.on("devicemotion", func(e js.Value) {
		g := e.Get("accelerationIncludingGravity")
		if t.oriented || !given(g) {
			return
		}
		if up, still, ok := slope.UpOfAcceleration(numberOf(g.Get("x")), numberOf(g.Get("y")), numberOf(g.Get("z"))); ok && still {
			t.hear(up, slope.AccelerationStep)
		}
	})
}

func (t *tilt) on(event string, take func(e js.Value)) {
	f := js.FuncOf(func(_ js.Value, args []js.Value) any {
		if !t.ended {
			take(args[0])
		}
		return nil
	})
	t.listeners[event] = f
	window().Call("addEventListener", event, f)
}

func (t *tilt) hear(up slope.Up, step unit.Angle) {
	t.last = Lean{TimeS: secondsNow(), Up: up, Step: step}
	t.heard = append(t.heard, t.last)
}

// tellOn tells what was heard, again and again. Some browsers say nothing while
// the angle stays the same: then the last one is told again.
func (t *tilt) tellOn(told func([]Lean)) {
	After(tellLeans, func() {
		if t.ended {
			return
		}
		if len(t.heard) == 0 && t.last.TimeS > 0 {
			t.last.TimeS = secondsNow()
			t.heard = append(t.heard, t.last)
		}
		if len(t.heard) > 0 && document().Get("visibilityState").String() == "visible" {
			told(t.heard)
		}
		t.heard = nil
		t.tellOn(told)
	})
}

// secondsNow is the time [s since 1970], to the millisecond.
func secondsNow() float64 { return js.Global().Get("Date").Call("now").Float() / 1000 }

// numberOf is a number, or not a number where there is none.
func numberOf(v js.Value) float64 {
	if v.Type() != js.TypeNumber {
		return math.NaN()
	}
	return v.Float()
}
