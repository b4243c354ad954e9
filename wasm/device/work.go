//go:build js && wasm

package device

import (
	"bytes"
	"math"
	"syscall/js"

	"hillwright/physics/hill"
)

// IsWorker tells that this program runs beside a page, not in one.
func IsWorker() bool { return js.Global().Get("hillwrightWorker").Truthy() }

// Work answers the page's requests from beside it, for ever.
func Work() {
	requests := make(chan js.Value, 16)
	listener := js.FuncOf(func(_ js.Value, args []js.Value) any {
		requests <- args[0].Get("data")
		return nil
	})
	js.Global().Call("addEventListener", "message", listener)
	if early := js.Global().Get("hillwrightEarly"); given(early) {
		for i := range early.Length() {
			requests <- early.Index(i)
		}
	}
	js.Global().Set("hillwrightEarly", js.Null())
	for r := range requests {
		answerRequest(r)
	}
}

// tellEvery is how often progress is told [ms].
const tellEvery = 60

func answerRequest(request js.Value) {
	id := request.Get("id").Int()
	told := nowMs()
	tell := func(part float64) bool {
		if now := nowMs(); now-told > tellEvery {
			told = now
			js.Global().Call("postMessage", map[string]any{"id": id, "part": part})
		}
		return true
	}
	if file := request.Get("sound"); given(file) {
		js.Global().Call("postMessage", heardMessage(id, listenTo(file, tell)))
		return
	}
	js.Global().Call("postMessage", messageOf(id, readTrack(bytesOf(request.Get("track")), tell)))
}

// readTrack makes a hill of a track file. A failure in our own program is an
// error of this file alone: the page goes on.
func readTrack(data []byte, progress func(float64) bool) (t Track) {
	defer func() {
		if failed := recover(); failed != nil {
			t = Track{Err: errFailed}
		}
	}()
	track, err := hill.ReadTrack(bytes.NewReader(data), progress)
	if err != nil {
		return Track{Err: err}
	}
	p, err := hill.FromTrack(&track, hill.Options{})
	if err != nil {
		return Track{Err: err}
	}
	return Track{Hill: &p}
}

// messageOf and trackOf are the two ends of what a worker says of a track: the
// hill as arrays, notes as numbers, errors by their parts, since only plain
// values pass between the two programs.
func messageOf(id int, t Track) map[string]any {
	if t.Err != nil {
		out := map[string]any{"id": id, "text": t.Err.Error()}
		if e, ok := t.Err.(*hill.TrackError); ok {
			out["kind"], out["looks"], out["line"], out["points"], out["got"] = int(e.Kind), int(e.Looks), e.Line, e.Points, e.Got
		}
		return out
	}
	var notes []any
	for _, n := range t.Hill.Notes {
		notes = append(notes, int(n.Kind), n.Count, n.AtM)
	}
	return map[string]any{
		"id": id, "name": t.Hill.Name, "known": t.Hill.HeightKnown, "notes": notes,
		"edges": numbersOf(t.Hill.EdgeM), "heights": numbersOf(t.Hill.HeightM), "bearings": numbersOf(t.Hill.BearingRad),
	}
}

func trackOf(message js.Value) Track {
	if kind := message.Get("kind"); kind.Type() == js.TypeNumber {
		return Track{Err: &hill.TrackError{
			Kind: hill.TrackErrorKind(kind.Int()), Looks: hill.FileLook(message.Get("looks").Int()),
			Line: message.Get("line").Int(), Points: message.Get("points").Int(), Got: message.Get("got").String(),
		}}
	}
	if text := message.Get("text"); text.Type() == js.TypeString {
		return Track{Err: workerError(text.String())}
	}
	p, err := hill.FromHeights(floatsOf(message.Get("edges")), floatsOf(message.Get("heights")), floatsOf(message.Get("bearings")))
	if err != nil {
		return Track{Err: err}
	}
	p.Name, p.HeightKnown = message.Get("name").String(), message.Get("known").Bool()
	notes := message.Get("notes")
	for i := 0; i+2 < notes.Length(); i += 3 {
		p.Notes = append(p.Notes, hill.Note{
			Kind: hill.NoteKind(notes.Index(i).Int()), Count: notes.Index(i + 1).Int(), AtM: notes.Index(i + 2).Float(),
		})
	}
	return Track{Hill: &p}
}

// workerError is an error of which there is only a text.
type workerError string

// errFailed is a failure of our own on one file.
const errFailed = workerError("the program failed on this file; please keep it for whoever mends the program")

func (e workerError) Error() string { return string(e) }

// numbersOf puts numbers into an array of bytes, lowest byte first; floatsOf
// takes them out. One copy is 80 times faster than number by number.
func numbersOf(values []float64) js.Value {
	data := make([]byte, 0, 8*len(values))
	for _, v := range values {
		bits := math.Float64bits(v)
		for shift := 0; shift < 64; shift += 8 {
			data = append(data, byte(bits>>shift))
		}
	}
	return arrayOf(data)
}

func floatsOf(array js.Value) []float64 {
	data := bytesOf(array)
	values := make([]float64, len(data)/8)
	for i := range values {
		var bits uint64
		for k := range 8 {
			bits |= uint64(data[8*i+k]) << (8 * k)
		}
		values[i] = math.Float64frombits(bits)
	}
	return values
}
