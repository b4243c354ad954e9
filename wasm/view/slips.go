package view

import (
	. "hillwright/wasm/dom"
	"hillwright/wasm/state"
	"hillwright/wasm/words"
)

// message is a slip at the foot of the page: what was done, and undo.
func (v *viewer) message() *Node {
	if !v.Message.Set {
		return region("div", "message", Class("message"), With("role", "status"))
	}
	return region("div", "message", Class("message shown"), With("role", "status"),
		El("p", v.say(v.Message.Key, v.Message.Args...)),
		If(v.Message.Undo, button("plain", state.Undo, "", v.say(words.ButtonUndo))),
		button("plain", state.Dismiss, "", v.say(words.ButtonClose)),
	)
}

// dropping lies over the page while a file hangs over it.
func (v *viewer) dropping() *Node {
	if !v.Device.Dropping {
		return region("div", "dropping", Class("dropping"), Bare("hidden"))
	}
	return region("div", "dropping", Class("dropping"), El("p", v.say(words.HillDrop)))
}

// broken says that something failed: what is kept, a file of it, and on.
func (v *viewer) broken() *Node {
	if v.Broken == "" {
		return region("div", "broken", Bare("hidden"))
	}
	return region("div", "broken", Class("broken"), With("role", "alertdialog"), With("aria-labelledby", "broken-title"),
		El("h2", ID("broken-title"), v.say(words.BrokeTitle)),
		El("p", v.say(words.BrokeKept)),
		El("div", Class("row"),
			button("main", state.SaveBroken, "", v.say(words.BrokeSave)),
			button("main", state.GoOn, "", v.say(words.BrokeGoOn))),
		El("details", El("summary", v.say(words.BrokeDetail)), El("pre", Text(v.Broken))),
	)
}
