//go:build !js

package trial

import (
	"context"
	"encoding/json"
	"fmt"
	"strings"
	"sync"
	"testing"
	"time"

	"github.com/chromedp/cdproto/log"
	"github.com/chromedp/cdproto/network"
	"github.com/chromedp/cdproto/page"
	"github.com/chromedp/cdproto/runtime"
	"github.com/chromedp/chromedp"
)

// device is what the page is looked at with.
type device struct {
	name       string
	wide, tall int64 // CSS pixels
	mobile     bool
}

var (
	phone  = device{"phone", 360, 740, true}
	tablet = device{"tablet", 1024, 768, false}
)

var devices = []device{phone, tablet}

// tab is one open page, with a profile of its own.
type tab struct {
	t    testing.TB
	ctx  context.Context
	host *host

	mu      sync.Mutex
	wrong   []string // what the page complained about
	allowed []string // parts of complaints that a test brings about itself
}

// newTab opens an empty tab. When the test ends, whatever the page complained
// about fails it: errors on the console, exceptions, what the security policy
// stopped, requests to any other host.
func newTab(t testing.TB, d device, h *host) *tab {
	t.Helper()
	p := &tab{t: t, host: h}
	ctx, end := chromedp.NewContext(theBrowser(t), chromedp.WithNewBrowserContext(), chromedp.WithListener(p.listen))
	ctx, cancel := context.WithTimeout(ctx, most)
	p.ctx = ctx
	lookout.seen() // whatever was before
	t.Cleanup(func() {
		for _, asked := range lookout.seen() {
			p.complain("asked another host: " + asked)
		}
		cancel()
		end()
		for _, wrong := range p.complaints() {
			t.Error(wrong)
		}
	})
	options := []chromedp.EmulateViewportOption{chromedp.EmulateScale(2), chromedp.EmulateTouch}
	if d.mobile {
		options = append(options, chromedp.EmulateMobile, chromedp.EmulatePortrait)
	}
	p.do(chromedp.EmulateViewport(d.wide, d.tall, options...))
	call(p, network.Enable, network.EnableParams{})
	intercept := page.SetInterceptFileChooserDialogParams{Enabled: true}
	call(p, page.SetInterceptFileChooserDialog, intercept)
	return p
}

// open loads the page of a new host at the root, and waits for its program.
func open(t testing.TB, d device) *tab {
	t.Helper()
	p := newTab(t, d, newHost(t, atRoot, false))
	p.visit()
	return p
}

// visit loads the page and waits for its program.
func (p *tab) visit() {
	p.t.Helper()
	p.load()
	p.ready()
}

func (p *tab) load() {
	p.t.Helper()
	p.do(chromedp.Navigate(p.host.URL))
}

func (p *tab) reload() {
	p.t.Helper()
	p.do(chromedp.Reload())
	p.ready()
}

// ready waits until the page's program answers.
func (p *tab) ready() {
	p.t.Helper()
	p.until("the program answers", `window.hillwrightTaps === null`)
}

// kept waits until the service worker holds the page.
func (p *tab) kept() {
	p.t.Helper()
	eval[bool](p, `navigator.serviceWorker.ready.then(() => true)`)
}

func (p *tab) do(steps ...chromedp.Action[chromedp.Void]) {
	p.t.Helper()
	if err := chromedp.Do(p.ctx, steps...); err != nil {
		p.fatal(err)
	}
}

// fatal ends the test, after what the page complained about.
func (p *tab) fatal(problem any) {
	p.t.Helper()
	for _, wrong := range p.complaints() {
		p.t.Log(wrong)
	}
	p.t.Fatal(problem)
}

// eval runs a script in the page, waits for its promise and gives its value.
func eval[T any](p *tab, script string, args ...any) T {
	p.t.Helper()
	got, err := chromedp.Run(p.ctx, chromedp.Evaluate[T](withArgs(script, args), chromedp.EvalAwaitPromise))
	if err != nil {
		p.fatal(fmt.Errorf("%w in %.300s", err, script))
	}
	return got
}

// withArgs puts values for $1, $2 … of a script.
func withArgs(script string, args []any) string {
	for i, arg := range args {
		text, err := json.Marshal(arg)
		if err != nil {
			panic(err) // a test's own argument
		}
		script = strings.ReplaceAll(script, fmt.Sprintf("$%d", i+1), string(text))
	}
	return script
}

// until waits, frame by frame, until a script gives true.
func (p *tab) until(what, script string, args ...any) {
	p.t.Helper()
	ctx, cancel := context.WithTimeout(p.ctx, patience)
	defer cancel()
	wait := chromedp.Evaluate[bool](withArgs(`new Promise(done => {
		const look = () => { let yes = false; try { yes = (`+script+`) } catch { /* not there yet */ }
			yes ? done(true) : requestAnimationFrame(look) }; look() })`, args), chromedp.EvalAwaitPromise)
	_, err := chromedp.Run(ctx, wait)
	for err != nil && ctx.Err() == nil && strings.Contains(err.Error(), "navigated") { // to the page that is waited for
		_, err = chromedp.Run(ctx, wait)
	}
	if err != nil {
		last, end := context.WithTimeout(context.WithoutCancel(p.ctx), 2*time.Second)
		defer end()
		state, _ := chromedp.Run(last, chromedp.Evaluate[string](`document.querySelector("#app").innerText.slice(0, 1500)`))
		p.fatal(fmt.Errorf("waited for: %s: %w\nthe page shows:\n%s", what, err, state))
	}
}

func (p *tab) listen(event any) {
	switch e := event.(type) {
	case *runtime.EventExceptionThrown:
		text := e.ExceptionDetails.Text
		if thrown := e.ExceptionDetails.Exception; thrown != nil {
			text += " " + thrown.Description
		}
		p.complain("exception: " + text)
	case *runtime.EventConsoleAPICalled:
		if e.Type == "error" || e.Type == "assert" {
			var words []string
			for _, arg := range e.Args {
				words = append(words, arg.Description+string(arg.Value))
			}
			p.complain("console: " + strings.Join(words, " "))
		}
	case *log.EventEntryAdded:
		if e.Entry.Level == "error" {
			p.complain("log: " + e.Entry.Text + " " + e.Entry.URL)
		}
	case *network.EventRequestWillBeSent:
		url := e.Request.URL
		ours := p.host == nil || strings.HasPrefix(url, p.host.URL)
		if !ours && !strings.HasPrefix(url, "data:") && !strings.HasPrefix(url, "blob:"+origin(p.host.URL)) {
			p.complain("asked for " + url)
		}
	}
}

// origin is the scheme and host of an address.
func origin(address string) string {
	scheme, rest, _ := strings.Cut(address, "://")
	name, _, _ := strings.Cut(rest, "/")
	return scheme + "://" + name
}

func (p *tab) complain(text string) {
	p.mu.Lock()
	defer p.mu.Unlock()
	p.wrong = append(p.wrong, text)
}

// allow takes out complaints that the test brings about itself.
func (p *tab) allow(part string) {
	p.mu.Lock()
	defer p.mu.Unlock()
	p.allowed = append(p.allowed, part)
}

func (p *tab) complaints() []string {
	p.mu.Lock()
	defer p.mu.Unlock()
	var left []string
next:
	for _, wrong := range p.wrong {
		for _, part := range p.allowed {
			if strings.Contains(wrong, part) {
				continue next
			}
		}
		left = append(left, wrong)
	}
	return left
}
