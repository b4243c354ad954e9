//go:build js && wasm

package device

import (
	"encoding/binary"
	"syscall/js"
)

// longestRecordingS is when a recording ends by itself [s].
const longestRecordingS = 20 * 60

// recording is a recording that is being made. Its sound is kept by the
// browser, not by the program.
type recording struct {
	stream, audio, node, chunks js.Value
	rateHz                      int
	samples                     int
	gain                        bool // the browser changes the level by itself
	level                       func(peak, seconds float64, gain bool)
	done                        func()
	message, ended              js.Func
	stopping                    bool
}

// Record begins to record the microphone, its samples as they are. level is
// told the loudest sample lately (full scale 1), the length [s] and whether the
// browser changes the level by itself; ready that the recording is at hand,
// under a name; failed why there is none: absent, refused, or why it ended by
// itself: lost when the microphone was taken away, full when it lasted as long
// as it may (what was recorded is then at hand as well).
func (d *Device) Record(level func(peak, seconds float64, gain bool), ready func(name string), failed func(string)) {
	if d.recording != nil {
		return
	}
	media := window().Get("navigator").Get("mediaDevices")
	worklet := window().Get("AudioWorkletNode")
	if !given(media) || !given(worklet) || !given(media.Get("getUserMedia")) {
		failed("absent")
		return
	}
	r := &recording{level: level, chunks: js.Global().Get("Array").New()}
	r.done = func() {
		d.held = r.file()
		ready(d.held.Get("name").String())
	}
	d.recording = r
	end := func(how string) {
		if d.recording == r {
			d.recording = nil
		}
		r.release()
		failed(how)
	}
	ask := map[string]any{"audio": map[string]any{
		"echoCancellation": false, "noiseSuppression": false, "autoGainControl": false, "channelCount": 1,
	}}
	then(media.Call("getUserMedia", ask), func(stream js.Value) {
		r.stream = stream
		if d.recording != r { // stopped while it was asked for
			r.release()
			return
		}
		if !try(func() { r.audio = window().Get("AudioContext").New() }) {
			end("absent")
			return
		}
		address := window().Get("hillwrightRecorder").String()
		then(r.audio.Get("audioWorklet").Call("addModule", address), func(js.Value) {
			if d.recording == r {
				r.begin(func(how string) {
					if d.recording == r {
						failed(how)
						d.StopRecording()
					}
				})
			}
		}, func(js.Value) { end("absent") })
	}, func(why js.Value) {
		how := "absent"
		if name := why.Get("name").String(); name == "NotAllowedError" || name == "SecurityError" {
			how = "refused"
		}
		end(how)
	})
}

// begin lets the samples in; ends is told when no more come.
func (r *recording) begin(ends func(how string)) {
	r.rateHz = r.audio.Get("sampleRate").Int()
	track := r.stream.Call("getAudioTracks").Index(0)
	r.gain = track.Call("getSettings").Get("autoGainControl").Truthy()
	r.node = window().Get("AudioWorkletNode").New(r.audio, "hillwright-recorder", map[string]any{"numberOfOutputs": 0})
	r.message = js.FuncOf(func(_ js.Value, args []js.Value) any {
		r.take(args[0].Get("data"), ends)
		return nil
	})
	r.node.Get("port").Set("onmessage", r.message)
	r.ended = js.FuncOf(func(js.Value, []js.Value) any {
		ends("lost")
		return nil
	})
	track.Set("onended", r.ended)
	r.audio.Call("createMediaStreamSource", r.stream).Call("connect", r.node)
	r.audio.Call("resume")
}

func (r *recording) take(part js.Value, ends func(how string)) {
	samples := part.Get("samples")
	r.chunks.Call("push", samples)
	r.samples += samples.Length()
	seconds := float64(r.samples) / float64(r.rateHz)
	if r.stopping {
		r.release()
		r.done()
		return
	}
	r.level(part.Get("peak").Float(), seconds, r.gain)
	if seconds > longestRecordingS {
		ends("full")
	}
}

// StopRecording ends the recording; what was recorded comes as the file at
// hand.
func (d *Device) StopRecording() {
	r := d.recording
	d.recording = nil
	if r == nil {
		return
	}
	if !given(r.node) { // it had not begun
		r.release()
		return
	}
	r.stopping = true
	r.node.Get("port").Call("postMessage", "end") // the rest comes back, then it is done
}

// release lets the microphone go.
func (r *recording) release() {
	if given(r.stream) {
		tracks := r.stream.Call("getTracks")
		for i := range tracks.Length() {
			tracks.Index(i).Set("onended", js.Null())
			tracks.Index(i).Call("stop")
		}
		r.stream = js.Undefined()
	}
	if given(r.audio) && r.audio.Get("state").String() != "closed" {
		r.audio.Call("close")
	}
	if given(r.node) {
		r.node.Get("port").Set("onmessage", js.Null())
		r.node = js.Undefined()
		r.message.Release()
		r.ended.Release()
	}
}

// file makes a WAV file of what was recorded, of one channel and 16 bits.
func (r *recording) file() js.Value {
	size := uint32(2 * r.samples)
	head := append([]byte("RIFF"), make([]byte, 4)...)
	binary.LittleEndian.PutUint32(head[4:], 36+size)
	head = append(head, "WAVEfmt "...)
	for _, v := range []uint32{16, 1 | 1<<16, uint32(r.rateHz), uint32(2 * r.rateHz), 2 | 16<<16} {
		head = binary.LittleEndian.AppendUint32(head, v)
	}
	head = binary.LittleEndian.AppendUint32(append(head, "data"...), size)
	parts := js.Global().Get("Array").New(arrayOf(head)).Call("concat", r.chunks)
	return window().Get("File").New(parts, "recording.wav", map[string]any{"type": "audio/wav"})
}

// PickSound lets the person pick a recording, which is then at hand.
func (d *Device) PickSound(ready func(name string)) {
	d.pickFile(SoundFiles, func(file js.Value) {
		d.held = file
		ready(file.Get("name").String())
	})
}

// SaveSound gives the person the recording at hand as a file.
func (d *Device) SaveSound(name string) {
	if given(d.held) {
		d.give(d.held, name)
	}
}
