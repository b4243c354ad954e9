//go:build !js

package trial

import (
	"context"
	"fmt"
	"os"
	"path/filepath"
	"time"

	"github.com/chromedp/cdproto/browser"
	"github.com/chromedp/cdproto/cdp"
	"github.com/chromedp/cdproto/dom"
	"github.com/chromedp/cdproto/input"
	"github.com/chromedp/cdproto/network"
	"github.com/chromedp/cdproto/page"
	"github.com/chromedp/chromedp"
)

func call[P, R any](p *tab, command cdp.Command[P, R], params P) R {
	p.t.Helper()
	got, err := chromedp.Call(p.ctx, command, params)
	if err != nil {
		p.fatal(err)
	}
	return got
}

// act finds what carries an action.
func act(name, arg string) string {
	return fmt.Sprintf(`[data-act="%s"][data-arg="%s"]`, name, arg)
}

// spot is where an element is on the screen [CSS px], and what lies on top at
// its middle when that is not the element itself.
type spot struct {
	X, Y, Wide, Tall float64
	Over             string
}

// thumb is how large what is touched must be at least [CSS px].
const thumb = 48

// spotOf waits for an element that shows, brings it into view, and measures it
// once it lies still for some frames: what was done just before may yet be
// drawn.
func (p *tab) spotOf(selector string) spot {
	p.t.Helper()
	const visible = `[...document.querySelectorAll($1)].find(e => e.getClientRects().length > 0)`
	p.until("there is "+selector, visible+" !== undefined", selector)
	return eval[spot](p, `new Promise(done => {
		let last = null, place = "", still = 0;
		const look = () => {
			const e = `+visible+`;
			if (!e) return requestAnimationFrame(look);
			if (e !== last || !still) e.scrollIntoView({block: "center", behavior: "instant"});
			const b = e.getBoundingClientRect(), now = [b.x, b.y, b.width, b.height].join();
			still = e === last && now === place ? still + 1 : 0;
			[last, place] = [e, now];
			if (still < 3) return requestAnimationFrame(look);
			const x = b.x + b.width/2, y = b.y + b.height/2, top = document.elementFromPoint(x, y);
			done({X: x, Y: y, Wide: b.width, Tall: b.height,
				Over: !top ? "nothing: it is off the screen" : e.contains(top) || top.contains(e) ? "" : top.outerHTML.slice(0, 120)});
		};
		look(); })`, selector)
}

// tap touches an element in its middle, as a thumb does, and fails when it is
// too small for one or lies under something.
func (p *tab) tap(selector string) {
	p.t.Helper()
	s := p.spotOf(selector)
	if s.Wide < thumb-0.01 || s.Tall < thumb-0.01 {
		p.t.Errorf("%s is %.0f × %.0f px, want at least %d each way", selector, s.Wide, s.Tall, thumb)
	}
	if s.Over != "" {
		p.fatal(selector + " is covered by " + s.Over)
	}
	p.do(chromedp.TapXY(s.X, s.Y))
}

// drag puts a finger on an element and moves it by parts of the width of the
// picture that it is in, one after the other.
func (p *tab) drag(selector string, by ...float64) {
	p.t.Helper()
	s := p.spotOf(selector)
	wide := eval[float64](p, `document.querySelector($1).ownerSVGElement.getBoundingClientRect().width`, selector)
	at := func(part float64) []*input.TouchPoint {
		one := 1.0
		return []*input.TouchPoint{{X: s.X + part*wide, Y: s.Y, RadiusX: &one, RadiusY: &one, Force: &one, ID: new(float64)}}
	}
	// A finger that stops before it is lifted: one that is lifted in full flight
	// sets off a fling, and the browser takes the next touch for stopping that.
	when := float64(time.Now().UnixMilli())/1000 - 1
	touch := func(kind input.DispatchTouchEventType, points []*input.TouchPoint) {
		call(p, input.DispatchTouchEvent, input.DispatchTouchEventParams{Type: kind, TouchPoints: points, Timestamp: input.TimeSinceEpoch(when)})
		when += 0.2
	}
	touch(input.DispatchTouchEventTypeTouchStart, at(0))
	for _, part := range by {
		touch(input.DispatchTouchEventTypeTouchMove, at(part))
	}
	touch(input.DispatchTouchEventTypeTouchEnd, []*input.TouchPoint{})
}

// typeOver touches a field and types in place of what is in it.
func (p *tab) typeOver(selector, text string) {
	p.t.Helper()
	p.tap(selector)
	p.until("the field has the focus", `document.activeElement === document.querySelector($1)`, selector)
	eval[bool](p, `(document.activeElement.select(), true)`)
	call(p, input.InsertText, input.InsertTextParams{Text: text})
	p.until("the field has the text", `document.querySelector($1).value === $2`, selector, text)
}

// pick touches what asks for a file, and picks one.
func (p *tab) pick(selector, file string) {
	p.t.Helper()
	full, err := filepath.Abs(file)
	if err != nil {
		p.fatal(err)
	}
	touched := chromedp.Func(func(context.Context, *chromedp.Target) error { p.tap(selector); return nil })
	asked, err := chromedp.Run(p.ctx, chromedp.WaitEvent(page.FileChooserOpened, nil, touched))
	if err != nil {
		p.fatal(fmt.Errorf("%s asked for no file: %w", selector, err))
	}
	call(p, dom.SetFileInputFiles, dom.SetFileInputFilesParams{Files: []string{full}, BackendNodeID: asked.BackendNodeID})
}

// download touches what gives a file, and reads it.
func (p *tab) download(selector string) (name string, data []byte) {
	p.t.Helper()
	dir := p.t.TempDir()
	yes := true
	_, err := chromedp.CallBrowser(p.ctx, browser.SetDownloadBehavior, browser.SetDownloadBehaviorParams{
		Behavior: browser.SetDownloadBehaviorBehaviorAllowAndName, DownloadPath: dir, EventsEnabled: &yes,
		BrowserContextID: chromedp.FromContext(p.ctx).BrowserContextID,
	})
	if err != nil {
		p.fatal(err)
	}
	ended := make(chan browser.EventDownloadProgress, 8)
	frame := cdp.FrameID(chromedp.FromContext(p.ctx).Target.TargetID)
	var mine string // the browser tells of other tabs' files too
	err = chromedp.ListenBrowser(p.ctx, func(event any) {
		switch e := event.(type) {
		case *browser.EventDownloadWillBegin:
			if e.FrameID == frame {
				name, mine = e.SuggestedFilename, e.GUID
			}
		case *browser.EventDownloadProgress:
			if e.GUID == mine && e.State != browser.DownloadProgressStateInProgress {
				ended <- *e
			}
		}
	})
	if err != nil {
		p.fatal(err)
	}
	p.tap(selector)
	select {
	case e := <-ended:
		if e.State != browser.DownloadProgressStateCompleted {
			p.fatal(selector + ": the download was " + string(e.State))
		}
		// The browser may tell before the file has its name.
		for file := filepath.Join(dir, e.GUID); ; {
			if data, err = os.ReadFile(file); err == nil {
				break
			}
			eval[bool](p, `new Promise(done => requestAnimationFrame(() => done(true)))`)
		}
	case <-p.ctx.Done():
		p.fatal(selector + " gave no file")
	}
	return name, data
}

// cut takes the network away: the server is closed and the browser is told
// that it is offline.
func (p *tab) cut() {
	p.t.Helper()
	p.host.cut()
	offline := []*network.Conditions{{Offline: true, DownloadThroughput: -1, UploadThroughput: -1}}
	yes := true
	call(p, network.EmulateNetworkConditionsByRule, network.EmulateNetworkConditionsByRuleParams{EmulateOfflineServiceWorker: &yes, MatchedNetworkConditions: offline})
	call(p, network.OverrideNetworkState, network.OverrideNetworkStateParams{Offline: true, DownloadThroughput: -1, UploadThroughput: -1})
}

// text gives an element's words as they are read, without line breaks.
func (p *tab) text(selector string) string {
	p.t.Helper()
	return eval[string](p, `document.querySelector($1).textContent.replace(/\s+/g, " ").trim()`, selector)
}

// shows waits until an element's words have a part in them.
func (p *tab) shows(selector, words string) {
	p.t.Helper()
	p.until(selector+" shows "+words, `document.querySelector($1).textContent.replace(/\s+/g, " ").includes($2)`, selector, spaced(words))
}
