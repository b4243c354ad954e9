//go:build js && wasm

package page

import (
	"runtime"
	"syscall/js"

	"github.com/hexops/vecty"

	"hillwright/wasm/device"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/view"
)

// page is the running page.
type page struct {
	state *state.State
	book  *book
	works *device.Device
}

// Start shows a shop's page in place of the first paint, as the person left
// it, and answers from then on. It returns once the page is shown or the
// device's storage is being read.
func Start(shop *keep.Shop) {
	works := device.New()
	lang, mark := works.Prefers()
	p := &page{state: state.First(shop, lang), book: newBook(), works: works}
	p.state, _ = state.Reduce(p.state, state.Action{Name: state.DeviceLikes, Arg: lang, Text: mark})
	works.Load(func(things []byte, settings string, storage string) {
		p.mount(things, settings)
		if storage != "" {
			p.do(state.Action{Name: state.Stored, Arg: storage})
		}
	})
}

// mount takes the place of the first paint, then lets in what happens.
func (p *page) mount(things []byte, settings string) {
	if len(things) > 0 || settings != "" {
		p.restore(state.Action{Name: state.Restored, Data: things, Text: settings})
	}
	p.state, _ = state.Reduce(p.state, state.Action{Name: state.Wide, X: p.works.PictureWidth(p.state.Device.WidthPx)})
	p.state, _ = state.Reduce(p.state, state.Action{Name: state.Zone, X: p.works.ZoneS()})
	p.book.take(view.Page(p.state))
	p.works.Dress(p.state.Voice.Lang.Tag(), p.state.Theme)
	if err := vecty.RenderInto("#app", &root{Book: p.book}); err != nil {
		panic(err)
	}
	p.listen()
	p.reports()
	for _, tap := range p.works.EarlyTaps() {
		p.do(state.Action{Name: tap.Act, Arg: tap.Arg, Text: tap.Value, Now: p.works.Now()})
	}
}

// restore takes over what the device kept. What an older version left there
// must not keep the page from opening.
func (p *page) restore(a state.Action) {
	was := p.state
	defer func() {
		if failed := recover(); failed != nil {
			p.state = was
			p.state, _ = state.Reduce(p.state, state.Action{Name: state.Broke, Text: report("restore", failed)})
		}
	}()
	p.state, _ = state.Reduce(p.state, a)
}

// reports lets the device tell what it notices.
func (p *page) reports() {
	p.works.OnUpdate(func() { p.do(state.Action{Name: state.Waiting}) })
	p.works.OnResize(func() {
		if w := p.works.PictureWidth(p.state.Device.WidthPx); w != p.state.Device.WidthPx {
			p.do(state.Action{Name: state.Wide, X: w})
		}
	})
	if p.works.CanShare() {
		p.do(state.Action{Name: state.CanShare})
	}
	p.works.OnVoices(func(tags string) {
		if tags != p.state.Device.Voices {
			p.do(state.Action{Name: state.Voiced, Arg: tags})
		}
	})
}

// do is the loop: action, state, view, effects. A failure anywhere leaves the
// last good state, and says so on the page.
func (p *page) do(a state.Action) {
	defer func() {
		if failed := recover(); failed != nil {
			p.broke(report(a.Name+" "+a.Arg, failed))
		}
	}()
	next, effects := state.Reduce(p.state, a)
	tree := view.Page(next)
	p.state = next
	p.book.take(tree)
	for _, e := range effects {
		p.run(e)
	}
}

func report(doing string, failed any) string {
	what := "unknown"
	switch f := failed.(type) {
	case error:
		what = f.Error()
	case string:
		what = f
	}
	stack := make([]byte, 4096)
	stack = stack[:runtime.Stack(stack, false)]
	return doing + ": " + what + "\n" + string(stack)
}

// broke shows the panel that tells what happened. When even that fails the
// browser's console has it.
func (p *page) broke(text string) {
	defer func() {
		if failed := recover(); failed != nil {
			js.Global().Get("console").Call("error", text, report("broke", failed))
		}
	}()
	js.Global().Get("console").Call("error", text)
	p.state, _ = state.Reduce(p.state, state.Action{Name: state.Broke, Text: text})
	p.book.take(view.Page(p.state))
}

// run asks the device for one thing.
func (p *page) run(e state.Effect) {
	now := p.works.Now
	switch e.Kind {
	case state.StoreThing:
		p.works.Put(e.Key, string(e.Data), p.stored)
		p.works.Persist(p.stored)
	case state.DropThing:
		p.works.Delete(e.Key, p.stored)
	case state.StoreSettings:
		p.works.PutSettings(string(e.Data), p.stored)
	case state.Download:
		p.works.Download(e.Key, e.Type, e.Data)
	case state.PickTrackFile:
		p.works.Pick(device.TrackFiles, func(name string, data []byte) {
			p.do(state.Action{Name: state.TrackFile, Arg: name, Data: data, Now: now()})
		})
	case state.PickThings:
		p.works.Pick(device.ThingFiles, func(name string, data []byte) {
			p.do(state.Action{Name: state.ImportFile, Arg: name, Data: data, Now: now()})
		})
	case state.ReadTrack:
		p.readTrack(e.Key, e.Data)
	case state.StopReading:
		p.works.StopTrack()
	case state.ShareText:
		p.works.Share(string(e.Data))
	case state.PrintPage:
		p.works.Print()
	case state.UseNewVersion:
		p.works.UseNew()
	case state.Dress:
		p.works.Dress(p.state.Voice.Lang.Tag(), p.state.Theme)
	case state.Show:
		p.works.Show(e.Key)
	default:
		p.runHillside(e)
	}
}

// stored passes on how storing went: "", or what state.Stored takes.
func (p *page) stored(how string) {
	if how != "" && how != p.state.Device.Storage {
		p.do(state.Action{Name: state.Stored, Arg: how})
	}
}

func (p *page) readTrack(name string, data []byte) {
	p.works.ReadTrack(data,
		func(part float64) { p.do(state.Action{Name: state.TrackPart, X: part}) },
		func(t device.Track) {
			if t.Err != nil {
				p.do(state.Action{Name: state.TrackFailed, Arg: name, Err: t.Err})
				return
			}
			p.do(state.Action{Name: state.TrackRead, Arg: name, Hill: t.Hill, Now: p.works.Now()})
		})
}
