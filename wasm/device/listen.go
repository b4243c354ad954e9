//go:build js && wasm

package device

import (
	"io"
	"syscall/js"

	"hillwright/physics/click"
	"hillwright/physics/sound"
)

// Heard is what came of a recording: the clicks, where a damaged file ends [s]
// (0 for a whole one), or why there is nothing.
type Heard struct {
	Clicks *click.Heard
	CutS   float64
	Err    error
}

// Listen follows the clicks of the recording at hand, beside the page. part is
// told how much is heard; done what came of it. Where the browser gives no
// worker it is done in slices between frames. Work that is under way is stopped
// first.
func (d *Device) Listen(part func(float64), done func(Heard)) {
	if !given(d.held) {
		return
	}
	file := d.held
	here := func() { d.listenHere(file, part, done) }
	d.ask(func() (map[string]any, []any) { return map[string]any{"sound": file}, []any{} },
		part, func(message js.Value) { done(heardOf(message)) }, here)
}

// StopListening stops it at once. The recording stays at hand.
func (d *Device) StopListening() { d.stopWork() }

// listenHere listens in the page itself, giving way to it between slices.
func (d *Device) listenHere(file js.Value, part func(float64), done func(Heard)) {
	var h Heard
	d.inSlices(func(progress func(float64) bool) { h = listenTo(file, progress) }, part, func() { done(h) })
}

// sliceBytes is how much of a file is read at a time.
const sliceBytes = 1 << 18

// blob reads a file of the browser's a slice at a time. It waits for each, and
// so may be read by a goroutine only, never within a call from the browser.
type blob struct {
	file     js.Value
	size, at int
	have     []byte
}

func (b *blob) Read(p []byte) (int, error) {
	if len(b.have) == 0 {
		if b.at >= b.size {
			return 0, io.EOF
		}
		end := min(b.size, b.at+sliceBytes)
		got := make(chan []byte, 1)
		then(b.file.Call("slice", b.at, end).Call("arrayBuffer"), func(buffer js.Value) {
			got <- bytesOf(js.Global().Get("Uint8Array").New(buffer))
		}, func(js.Value) { got <- nil })
		if b.have, b.at = <-got, end; len(b.have) == 0 {
			return 0, io.ErrUnexpectedEOF // the file went away while it was read
		}
	}
	n := copy(p, b.have)
	b.have = b.have[n:]
	return n, nil
}

// listenTo follows the clicks of a file; progress is told how much is heard,
// and ends it by false. A failure in our own program is an error of this file
// alone: the page goes on.
func listenTo(file js.Value, progress func(float64) bool) (h Heard) {
	defer func() {
		if failed := recover(); failed != nil {
			h = Heard{Err: errFailed}
		}
	}()
	b := &blob{file: file, size: file.Get("size").Int()}
	r, err := sound.Open(b)
	if err != nil {
		return Heard{Err: err}
	}
	h.Clicks, h.Err = click.Hear(r, func() bool {
		return progress(float64(b.at-len(b.have)) / float64(max(1, b.size)))
	})
	if at, cut := r.Cut(); cut {
		h.CutS = at
	}
	return h
}

// heardMessage and heardOf are the two ends of what a worker says of a
// recording.
func heardMessage(id int, h Heard) map[string]any {
	out := map[string]any{"id": id}
	switch e := h.Err.(type) {
	case nil:
		out["heard"], out["cut"] = numbersOf(h.Clicks.Flat()), h.CutS
	case *sound.Error:
		out["sound"], out["looks"], out["got"] = int(e.Kind), int(e.Looks), e.Got
	case *click.Error:
		out["click"], out["got"] = int(e.Kind), e.Got
	default:
		out["text"] = e.Error()
	}
	return out
}

func heardOf(message js.Value) Heard {
	number := func(name string) (int, bool) {
		v := message.Get(name)
		if v.Type() != js.TypeNumber {
			return 0, false
		}
		return v.Int(), true
	}
	if kind, ok := number("sound"); ok {
		looks, _ := number("looks")
		got, _ := number("got")
		return Heard{Err: &sound.Error{Kind: sound.ErrorKind(kind), Looks: sound.Look(looks), Got: got}}
	}
	if kind, ok := number("click"); ok {
		return Heard{Err: &click.Error{Kind: click.ErrorKind(kind), Got: message.Get("got").Float()}}
	}
	if text := message.Get("text"); text.Type() == js.TypeString {
		return Heard{Err: workerError(text.String())}
	}
	h, err := click.HeardOf(floatsOf(message.Get("heard")))
	return Heard{Clicks: h, CutS: message.Get("cut").Float(), Err: err}
}
