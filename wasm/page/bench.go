//go:build js && wasm

package page

import (
	"hillwright/wasm/device"
	"hillwright/wasm/state"
)

// runBench asks the device for one thing of the bench.
func (p *page) runBench(e state.Effect) {
	ready := func(how string) func(string) {
		return func(name string) {
			p.do(state.Action{Name: state.SoundReady, Arg: name, Text: how, Now: p.works.Now()})
		}
	}
	switch e.Kind {
	case state.StartSound:
		p.works.Record(p.level, ready("recorded"), func(how string) { p.do(state.Action{Name: state.SoundFailed, Arg: how}) })
	case state.StopSound:
		p.works.StopRecording()
	case state.PickSound:
		p.works.PickSound(ready("file"))
	case state.Listen:
		p.works.Listen(
			func(part float64) { p.do(state.Action{Name: state.ListenPart, X: part}) },
			func(h device.Heard) {
				if h.Err != nil {
					p.do(state.Action{Name: state.ListenFailed, Err: h.Err})
					return
				}
				p.do(state.Action{Name: state.Listened, Heard: h.Clicks, X: h.CutS, Now: p.works.Now()})
			})
	case state.StopListening:
		p.works.StopListening()
	case state.SaveSound:
		p.works.SaveSound(e.Key)
	}
}

func (p *page) level(peak, seconds float64, gain bool) {
	a := state.Action{Name: state.SoundLevel, X: peak, Y: seconds}
	if gain {
		a.Text = "gain"
	}
	p.do(a)
}
