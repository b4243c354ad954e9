//go:build js && wasm

package device

import (
	"syscall/js"

	"hillwright/physics/hill"
	"hillwright/physics/slope"
)

// StartLocating tells where the device is, fix by fix, until StopLocating;
// failed gets "absent", "refused", or "lost" when there is no fix for a while.
// It needs no network. Where the browser asks for permission it does so now.
func (d *Device) StartLocating(told func(slope.Fix), failed func(how string)) {
	d.StopLocating()
	sensor := window().Get("navigator").Get("geolocation")
	if !given(sensor) {
		failed("absent")
		return
	}
	yes := js.FuncOf(func(_ js.Value, args []js.Value) any {
		told(fixOf(args[0]))
		return nil
	})
	no := js.FuncOf(func(_ js.Value, args []js.Value) any {
		const denied = 1
		if args[0].Get("code").Int() == denied {
			failed("refused")
		} else {
			failed("lost")
		}
		return nil
	})
	var watch js.Value
	ok := try(func() {
		watch = sensor.Call("watchPosition", yes, no, map[string]any{"enableHighAccuracy": true, "maximumAge": 0, "timeout": 30000})
	})
	d.unlocate = func() {
		if ok {
			sensor.Call("clearWatch", watch)
		}
		yes.Release()
		no.Release()
	}
	if !ok {
		d.StopLocating()
		failed("absent")
	}
}

// StopLocating ends it.
func (d *Device) StopLocating() {
	if d.unlocate != nil {
		d.unlocate()
		d.unlocate = nil
	}
}

func fixOf(position js.Value) slope.Fix {
	at := position.Get("coords")
	return slope.Fix{
		Point: hill.Point{
			LatDeg: numberOf(at.Get("latitude")), LonDeg: numberOf(at.Get("longitude")), HeightM: numberOf(at.Get("altitude")),
			TimeS: numberOf(position.Get("timestamp")) / 1000,
		},
		AccuracyM: numberOf(at.Get("accuracy")), HeightAccuracyM: numberOf(at.Get("altitudeAccuracy")),
	}
}
