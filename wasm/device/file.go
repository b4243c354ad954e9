//go:build js && wasm

package device

import "syscall/js"

// What a file picker offers. Phones give GPX files all kinds of types, so the
// lists are generous; what is in the file decides.
const (
	TrackFiles = ".gpx,.xml,.geojson,.json,application/gpx+xml,application/xml,text/xml,application/geo+json,application/json,application/octet-stream,text/plain"
	ThingFiles = ".json,application/json,text/plain,application/octet-stream"
	SoundFiles = ".mp3,.wav,audio/*,application/octet-stream"
)

// Pick lets the person pick a file, and gives its name and content. Nothing
// comes back when they pick none.
func (d *Device) Pick(accept string, got func(name string, data []byte)) {
	d.pickFile(accept, func(file js.Value) { d.ReadFile(file, got) })
}

func (d *Device) pickFile(accept string, got func(file js.Value)) {
	field := document().Call("createElement", "input")
	field.Set("type", "file")
	field.Set("accept", accept)
	field.Set("hidden", true)
	field.Set("id", "picked-file")
	if old := document().Call("getElementById", "picked-file"); given(old) {
		old.Call("remove")
	}
	document().Get("body").Call("append", field)
	once(field, map[string]func(js.Value){
		"change": func(js.Value) {
			files := field.Get("files")
			if files.Length() > 0 {
				got(files.Index(0))
			}
			field.Call("remove")
		},
		"cancel": func(js.Value) { field.Call("remove") },
	})
	field.Call("click")
}

// ReadFile gives a file's name and content; a file that cannot be read gives
// no content, which the reader of the content tells the person.
func (d *Device) ReadFile(file js.Value, got func(name string, data []byte)) {
	name := file.Get("name").String()
	then(file.Call("arrayBuffer"), func(buffer js.Value) {
		got(name, bytesOf(window().Get("Uint8Array").New(buffer)))
	}, func(js.Value) { got(name, nil) })
}

// Download gives the person a file.
func (d *Device) Download(name, mediaType string, data []byte) {
	d.give(window().Get("Blob").New([]any{arrayOf(data)}, map[string]any{"type": mediaType}), name)
}

func (d *Device) give(blob js.Value, name string) {
	address := window().Get("URL").Call("createObjectURL", blob)
	link := document().Call("createElement", "a")
	link.Set("href", address)
	link.Set("download", name)
	link.Call("click")
	afterRender(func() { window().Get("URL").Call("revokeObjectURL", address) })
}

func bytesOf(array js.Value) []byte {
	data := make([]byte, array.Length())
	js.CopyBytesToGo(data, array)
	return data
}

func arrayOf(data []byte) js.Value {
	array := js.Global().Get("Uint8Array").New(len(data))
	js.CopyBytesToJS(array, data)
	return array
}
