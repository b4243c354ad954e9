//go:build js && wasm

package device

import (
	"syscall/js"

	"hillwright/physics/hill"
)

// Track is what came of a track file: a hill, or why there is none.
type Track struct {
	Hill *hill.Profile
	Err  error
}

// worker is the page's helper beside it, and what it is asked.
type worker struct {
	js   js.Value
	last int // the request that is answered; messages of others are of no use
	part func(float64)
	done func(message js.Value)
	here func() // does the same in the page, if the worker fails
}

// ReadTrack reads a track file beside the page and makes a hill of it. part is
// told how much is read; done what came of it. Where the browser gives no
// worker it is read in slices between frames. A reading that is under way is
// stopped first.
func (d *Device) ReadTrack(data []byte, part func(float64), done func(Track)) {
	here := func() { d.readHere(data, part, done) }
	d.ask(func() (map[string]any, []any) {
		array := arrayOf(data)
		return map[string]any{"track": array}, []any{array.Get("buffer")}
	}, part, func(message js.Value) { done(trackOf(message)) }, here)
}

// ask has the worker do one thing: request gives the message and what is handed
// over with it. Work that is under way is stopped, its answer is of no use.
func (d *Device) ask(request func() (message map[string]any, hand []any), part func(float64), done func(js.Value), here func()) {
	d.stopped++
	if d.worker == nil && !d.startWorker() {
		here()
		return
	}
	w := d.worker
	w.last++
	w.part, w.done, w.here = part, done, here
	message, hand := request()
	message["id"] = w.last
	w.js.Call("postMessage", message, hand)
}

// StopTrack stops a reading at once.
func (d *Device) StopTrack() { d.stopWork() }

func (d *Device) stopWork() {
	d.stopped++
	if d.worker != nil {
		d.worker.js.Call("terminate")
		d.worker = nil
	}
}

func (d *Device) startWorker() bool {
	start := window().Get("hillwrightStartWorker")
	if !given(start) {
		return false
	}
	w := &worker{}
	if !try(func() { w.js = start.Invoke() }) {
		return false
	}
	d.worker = w
	w.js.Call("addEventListener", "message", js.FuncOf(func(_ js.Value, args []js.Value) any {
		w.take(args[0].Get("data"))
		return nil
	}))
	once(w.js, map[string]func(js.Value){"error": func(e js.Value) {
		e.Call("preventDefault")
		if d.worker == w {
			d.stopWork()
			w.here()
		}
	}})
	return true
}

func (w *worker) take(message js.Value) {
	if id := message.Get("id"); id.Type() != js.TypeNumber || id.Int() != w.last {
		return
	}
	if part := message.Get("part"); part.Type() == js.TypeNumber {
		w.part(part.Float())
		return
	}
	w.here = nil // what it was asked need not be kept
	w.done(message)
}

// sliceFor is how long a slice of a reading in the page itself may take [ms].
const sliceFor = 12

// readHere reads a track in the page itself.
func (d *Device) readHere(data []byte, part func(float64), done func(Track)) {
	var t Track
	d.inSlices(func(progress func(float64) bool) { t = readTrack(data, progress) }, part, func() { done(t) })
}

// inSlices does long work in the page itself, giving way to it between slices.
// The work tells its progress, and ends early where that gives false: when
// other work was begun or this one stopped. done is called only at its own end.
func (d *Device) inSlices(work func(progress func(float64) bool), part func(float64), done func()) {
	mine := d.stopped
	go func() {
		began := nowMs()
		work(func(read float64) bool {
			if nowMs()-began > sliceFor {
				part(read)
				giveWay()
				began = nowMs()
			}
			return mine == d.stopped
		})
		if mine == d.stopped {
			done()
		}
	}()
}

// giveWay lets the page go on for a moment; only for goroutines of their own.
func giveWay() {
	on := make(chan struct{})
	After(0, func() { close(on) })
	<-on
}
