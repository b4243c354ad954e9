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
	StartTilt                       // comes back as Tilted, Sensor
	StopTilt                        //
	StartRide                       // comes back as Located, LocateFailed
	StopRide                        //
	Wake                            // keeps the screen awake
	Sleep                           // lets it sleep
	Speak                           // Key: language, Data: plain text
	Tone                            // Key: a pattern of package words, or "step", "done"
	Show                            // Key: the id of an element to bring into view and to focus
	StartSound                      // the microphone; comes back as SoundLevel, SoundReady, SoundFailed
	StopSound                       //
	PickSound                       // comes back as SoundReady
	Listen                          // to the recording at hand; comes back as ListenPart, Listened, ListenFailed
	StopListening                   //
	SaveSound                       // Key: the name under which the recording at hand is given as a file
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
		out = changedRecords(prev.Own, next.Own)
	}
	if is := keep.EncodeSettings(next.settings()); string(is) != string(keep.EncodeSettings(prev.settings())) {
		out = append(out, Effect{Kind: StoreSettings, Data: is})
	}
	return out
}

// changedRecords gives what must be written so that the device has next: a file
// of its own for each thing that is new or not the same any more. Long hills
// are many numbers, so that one is written only when it must be.
func changedRecords(prev, next keep.Things) []Effect {
	var out []Effect
	for i := range next.Things {
		t := &next.Things[i]
		if at := prev.At(t.Kind, t.ID); at < 0 || !sameRecord(keep.Things{Things: prev.Things[at : at+1]}, keep.Things{Things: next.Things[i : i+1]}) {
			out = append(out, put(string(t.Kind)+":"+t.ID, keep.Things{Things: next.Things[i : i+1]}))
		}
	}
	for i := range next.Hills {
		h := &next.Hills[i]
		if at := prev.HillAt(h.ID); at < 0 || !sameHill(&prev.Hills[at], h) {
			out = append(out, put(string(Hill)+":"+h.ID, keep.Things{Hills: next.Hills[i : i+1]}))
		}
	}
	for i := range next.Readings {
		r := &next.Readings[i]
		if at := prev.ReadingAt(r.ID); at < 0 || !sameRecord(keep.Things{Readings: prev.Readings[at : at+1]}, keep.Things{Readings: next.Readings[i : i+1]}) {
			out = append(out, put("reading:"+r.ID, keep.Things{Readings: next.Readings[i : i+1]}))
		}
	}
	for _, r := range prev.Readings {
		if next.ReadingAt(r.ID) < 0 {
			out = append(out, Effect{Kind: DropThing, Key: "reading:" + r.ID})
		}
	}
	for i := range next.Runs {
		r := &next.Runs[i]
		if at := prev.RunAt(r.ID); at < 0 || !sameRun(&prev.Runs[at], r) {
			out = append(out, put("run:"+r.ID, keep.Things{Runs: next.Runs[i : i+1]}))
		}
	}
	for _, r := range prev.Runs {
		if next.RunAt(r.ID) < 0 {
			out = append(out, Effect{Kind: DropThing, Key: "run:" + r.ID})
		}
	}
	for _, t := range prev.Things {
		if next.At(t.Kind, t.ID) < 0 {
			out = append(out, Effect{Kind: DropThing, Key: string(t.Kind) + ":" + t.ID})
		}
	}
	for _, h := range prev.Hills {
		if next.HillAt(h.ID) < 0 {
			out = append(out, Effect{Kind: DropThing, Key: string(Hill) + ":" + h.ID})
		}
	}
	return out
}

func put(key string, one keep.Things) Effect {
	return Effect{Kind: StoreThing, Key: key, Data: keep.Encode(one)}
}

func sameRecord(a, b keep.Things) bool { return string(keep.Encode(a)) == string(keep.Encode(b)) }

// sameHill tells that a hill was not written to: lists are replaced when they
// change, so that the same first edge means the same list.
func sameHill(a, b *keep.Hill) bool {
	return a.Changed == b.Changed && a.Names[""] == b.Names[""] && &a.EdgeM[0] == &b.EdgeM[0]
}

// sameRun tells that a run was not written to; its numbers never are.
func sameRun(a, b *keep.Run) bool {
	return a.Back == b.Back && a.LeftOut == b.LeftOut && a.FromS == b.FromS && a.ToS == b.ToS && a.Changed == b.Changed
}
