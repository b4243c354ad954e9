//go:build js && wasm

package page

import (
	"hillwright/physics/slope"
	"hillwright/wasm/device"
	"hillwright/wasm/state"
)

// runHillside asks the device for one thing of the hillside.
func (p *page) runHillside(e state.Effect) {
	switch e.Kind {
	case state.StartTilt:
		p.works.StartTilt(p.tilted, func(how string) { p.do(state.Action{Name: state.Sensor, Arg: how}) })
	case state.StopTilt:
		p.works.StopTilt()
	case state.StartRide:
		p.works.StartLocating(
			func(f slope.Fix) { p.do(state.Action{Name: state.Located, Fix: f}) },
			func(how string) { p.do(state.Action{Name: state.LocateFailed, Arg: how}) })
	case state.StopRide:
		p.works.StopLocating()
	case state.Wake:
		p.works.KeepAwake(func() { p.do(state.Action{Name: state.Awoken}) })
	case state.Sleep:
		p.works.LetSleep()
	case state.Speak:
		p.works.Speak(e.Key, string(e.Data))
	case state.Tone:
		p.works.Tones(e.Key)
	default:
		p.runBench(e)
	}
}

func (p *page) tilted(leans []device.Lean) {
	a := state.Action{Name: state.Tilted, Leans: make([]state.Lean, len(leans))}
	for i, l := range leans {
		a.Leans[i] = state.Lean(l)
	}
	p.do(a)
}
