package state

import "hillwright/wasm/keep"

// EffectKind is one thing that the device is asked to do.
type EffectKind uint8

// What the device is asked to do.
const (
	StoreThing    EffectKind = iota // Key: where, Data: a file with this one thing
	DropThing                       // Key
	StoreSettings                   // Data
	Download                        // Key: the file's name, Type, Data
	PickTrackFile                   // comes back as TrackFile
	PickThings                      // comes back as ImportFile
	ReadTrack                       // Key: the file's name, Data; comes back as TrackPart, TrackRead, TrackFailed
	StopReading                     //
	ShareText                       // Data: plain text
	PrintPage                       //
	UseNewVersion                   //
	Dress                           // the page's language and theme have changed
	Show                            // Key: the id of an element to bring into view and to focus
)

// Effect is a request to the device. Files' types are media types.
type Effect struct {
	Kind EffectKind
	Key  string
	Type string
	Data []byte
}

// storage gives what must be written so that the device keeps what next has.
func storage(prev, next *State) []Effect {
	var out []Effect
	if prev.ownRevision != next.ownRevision {
		was, is := records(prev.Own), records(next.Own)
		for key, data := range is {
			if was[key] != data {
				out = append(out, Effect{Kind: StoreThing, Key: key, Data: []byte(data)})
			}
		}
		for key := range was {
			if _, stays := is[key]; !stays {
				out = append(out, Effect{Kind: DropThing, Key: key})
			}
		}
	}
	if is := keep.EncodeSettings(next.settings()); string(is) != string(keep.EncodeSettings(prev.settings())) {
		out = append(out, Effect{Kind: StoreSettings, Data: is})
	}
	return out
}

// records gives each thing as a file of its own, by its key in the database.
func records(own keep.Things) map[string]string {
	out := map[string]string{}
	for _, t := range own.Things {
		out[string(t.Kind)+":"+t.ID] = string(keep.Encode(keep.Things{Things: []keep.Thing{t}}))
	}
	for _, h := range own.Hills {
		out[string(Hill)+":"+h.ID] = string(keep.Encode(keep.Things{Hills: []keep.Hill{h}}))
	}
	return out
}
