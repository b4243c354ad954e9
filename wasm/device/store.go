//go:build js && wasm

package device

import (
	"syscall/js"

	"hillwright/wasm/keep"
)

const (
	databaseVersion = 1
	thingsStore     = "things"   // by "kind:id": a file with one thing
	settingsStore   = "settings" // under settingsKey
	settingsKey     = "page"
)

// databaseName tells apart the pages that lie beside each other on one host.
func databaseName() string {
	base := window().Get("URL").New("./", document().Get("baseURI"))
	return "hillwright " + base.Get("pathname").String()
}

// Load opens the storage and gives what is in it: things as a file that
// keep.Decode reads, settings as keep.DecodeSettings reads them. storage is
// "refused" where the browser keeps nothing, "safe" or "loose" where it does,
// by whether it may clear it.
func (d *Device) Load(got func(things []byte, settings, storage string)) {
	refused := func(js.Value) { got(nil, "", "refused") }
	request := window().Call("hillwrightDatabase", databaseName(), databaseVersion)
	if request.IsNull() {
		refused(request)
		return
	}
	opened := try(func() {
		request.Call("addEventListener", "upgradeneeded", js.FuncOf(func(js.Value, []js.Value) any {
			db := request.Get("result")
			db.Call("createObjectStore", thingsStore)
			db.Call("createObjectStore", settingsStore)
			return nil
		}))
		once(request, map[string]func(js.Value){
			"success": func(js.Value) {
				d.database = request.Get("result")
				d.letGo()
				d.readAll(got)
			},
			"error":   refused,
			"blocked": refused,
		})
	})
	if !opened {
		refused(js.Undefined())
	}
}

// letGo closes the database when a newer version of the page, in another
// window, wants to change it.
func (d *Device) letGo() {
	db := d.database
	db.Call("addEventListener", "versionchange", js.FuncOf(func(js.Value, []js.Value) any {
		db.Call("close")
		return nil
	}))
}

func (d *Device) readAll(got func(things []byte, settings, storage string)) {
	var things, settings js.Value
	ok := try(func() {
		both := d.database.Call("transaction", []any{thingsStore, settingsStore}, "readonly")
		things = both.Call("objectStore", thingsStore).Call("getAll")
		settings = both.Call("objectStore", settingsStore).Call("get", settingsKey)
		once(both, map[string]func(js.Value){
			"complete": func(js.Value) {
				text := ""
				if v := settings.Get("result"); v.Type() == js.TypeString {
					text = v.String()
				}
				d.lasting(func(how string) { got(joined(things.Get("result")), text, how) })
			},
			"error": func(js.Value) { got(nil, "", "refused") },
			"abort": func(js.Value) { got(nil, "", "refused") },
		})
	})
	if !ok {
		got(nil, "", "refused")
	}
}

// joined makes one file of the records; a record that cannot be read is left
// where it is.
func joined(records js.Value) []byte {
	var all keep.Things
	for i := range records.Length() {
		one, _ := keep.Decode([]byte(records.Index(i).String()))
		all.Things = append(all.Things, one.Things...)
		all.Hills = append(all.Hills, one.Hills...)
		all.Readings = append(all.Readings, one.Readings...)
		all.Runs = append(all.Runs, one.Runs...)
	}
	if len(all.Things)+len(all.Hills)+len(all.Readings)+len(all.Runs) == 0 {
		return nil
	}
	return keep.Encode(all)
}

// lasting tells whether the browser promised not to clear the storage.
func (d *Device) lasting(tell func(how string)) {
	manager := window().Get("navigator").Get("storage")
	if !given(manager) || !given(manager.Get("persisted")) {
		tell("loose")
		return
	}
	then(manager.Call("persisted"),
		func(v js.Value) { tell(safeIf(v.Truthy())) },
		func(js.Value) { tell("loose") })
}

func safeIf(lasts bool) string {
	if lasts {
		return "safe"
	}
	return "loose"
}

// Persist asks the browser, once, not to clear the storage.
func (d *Device) Persist(tell func(how string)) {
	manager := window().Get("navigator").Get("storage")
	if d.asked || !given(d.database) || !given(manager) || !given(manager.Get("persist")) {
		return
	}
	d.asked = true
	then(manager.Call("persist"), func(v js.Value) { tell(safeIf(v.Truthy())) }, nil)
}

// Put stores a record. tell gets "" when it is stored, "full" when there is no
// room, "refused" when the browser does not keep it.
func (d *Device) Put(key, text string, tell func(how string)) {
	d.write(thingsStore, tell, func(store js.Value) { store.Call("put", text, key) })
}

// Delete takes a record away; tell as for Put.
func (d *Device) Delete(key string, tell func(how string)) {
	d.write(thingsStore, tell, func(store js.Value) { store.Call("delete", key) })
}

// PutSettings stores the settings; tell as for Put.
func (d *Device) PutSettings(text string, tell func(how string)) {
	d.write(settingsStore, tell, func(store js.Value) { store.Call("put", text, settingsKey) })
}

func (d *Device) write(store string, tell func(how string), change func(store js.Value)) {
	if !given(d.database) {
		return // refused when it was opened: the page knows, and keeps it in memory
	}
	ok := try(func() {
		work := d.database.Call("transaction", store, "readwrite")
		once(work, map[string]func(js.Value){
			"complete": func(js.Value) { tell("") },
			"abort": func(js.Value) {
				if why := work.Get("error"); given(why) && why.Get("name").String() == "QuotaExceededError" {
					tell("full")
					return
				}
				tell("refused")
			},
		})
		change(work.Call("objectStore", store))
	})
	if !ok {
		tell("refused")
	}
}
