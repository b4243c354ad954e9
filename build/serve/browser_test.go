package serve

import (
	"bytes"
	"context"
	"io/fs"
	"net/http"
	"net/http/httptest"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"sync"
	"sync/atomic"
	"testing"
	"testing/fstest"
	"time"

	"github.com/chromedp/cdproto/network"
	"github.com/chromedp/cdproto/page"
	"github.com/chromedp/cdproto/runtime"
	"github.com/chromedp/chromedp"

	"hillwright/build"
	"hillwright/build/shop"
	"hillwright/site"
)

// These tests put what starts the page (boot.js, worker.js, sw.js) into a real
// browser, with a small program in place of the page's own.

// chromium finds the browser, or skips the test where there is none.
func chromium(t *testing.T) string {
	t.Helper()
	path, err := exec.LookPath("chromium")
	switch {
	case err == nil:
		return path
	case os.Getenv("HILLWRIGHT_FULL") != "":
		t.Fatal("chromium is not installed")
	}
	t.Skip("chromium is not installed")
	return ""
}

// opened is the browser that all tests share; TestMain closes it.
var opened struct {
	once sync.Once
	ctx  context.Context
	stop []func()
	err  error
}

func TestMain(m *testing.M) {
	code := m.Run()
	for i := len(opened.stop) - 1; i >= 0; i-- {
		opened.stop[i]()
	}
	os.Exit(code)
}

func theBrowser(t *testing.T) context.Context {
	t.Helper()
	path := chromium(t)
	opened.once.Do(func() {
		profile, err := os.MkdirTemp("", "hillwright-browser-")
		if err != nil {
			opened.err = err
			return
		}
		flags := append(chromedp.DefaultExecAllocatorOptions[:], chromedp.ExecPath(path), chromedp.NoSandbox, chromedp.DisableGPU,
			chromedp.Flag("disable-quic", true), chromedp.Flag("disable-component-update", true), chromedp.UserDataDir(profile))
		start, stop := chromedp.NewExecAllocator(context.Background(), flags...)
		ctx, closeBrowser := chromedp.NewContext(start)
		opened.ctx, opened.err = ctx, chromedp.Do(ctx)
		opened.stop = []func(){func() { os.RemoveAll(profile) }, stop, closeBrowser}
	})
	if opened.err != nil {
		t.Fatal(opened.err)
	}
	return opened.ctx
}

// program compiles the small program once.
var program = sync.OnceValues(func() (build.Program, error) {
	dir, err := os.MkdirTemp("", "hillwright-tiny-")
	if err != nil {
		return build.Program{}, err
	}
	defer os.RemoveAll(dir)
	out := filepath.Join(dir, "tiny.wasm")
	cmd := exec.Command("go", "build", "-ldflags=-s -w", "-o", out, "./testdata/tiny")
	cmd.Env = append(os.Environ(), "GOOS=js", "GOARCH=wasm")
	if text, err := cmd.CombinedOutput(); err != nil {
		return build.Program{}, &exec.Error{Name: string(text), Err: err}
	}
	root, err := exec.Command("go", "env", "GOROOT").Output()
	if err != nil {
		return build.Program{}, err
	}
	var p build.Program
	if p.Wasm, err = os.ReadFile(out); err != nil {
		return p, err
	}
	p.Exec, err = os.ReadFile(filepath.Join(strings.TrimSpace(string(root)), "lib", "wasm", "wasm_exec.js"))
	return p, err
})

// packed makes a page of the demo shop under another name, which makes another
// build, without the compressed siblings.
func packed(t *testing.T, name string) fstest.MapFS {
	t.Helper()
	own, err := shop.Read(site.DemoShop())
	if err != nil {
		t.Fatal(err)
	}
	own.Shop.Name = name
	tiny, err := program()
	if err != nil {
		t.Fatal(err)
	}
	p, err := build.Assemble(build.Parts{Site: site.Files(), Shop: own, Program: tiny})
	if err != nil {
		t.Fatal(err)
	}
	files := fstest.MapFS{}
	for _, f := range p.Files() {
		files[f.Name] = &fstest.MapFile{Data: f.Data}
	}
	return files
}

// server serves pages below prefixes, and can be changed and cut off.
type server struct {
	*httptest.Server
	pages atomic.Pointer[map[string]fs.FS]
	down  atomic.Bool
	// plain serves every type as a dumb host would, when it is set.
	plain atomic.Bool
	// hold keeps the wasm file back until it is closed, when it is set.
	hold chan struct{}
}

func serving(t *testing.T, pages map[string]fs.FS) *server {
	s := &server{}
	s.pages.Store(&pages)
	s.Server = httptest.NewServer(http.HandlerFunc(func(w http.ResponseWriter, r *http.Request) {
		if s.down.Load() {
			panic(http.ErrAbortHandler)
		}
		if s.hold != nil && strings.HasSuffix(r.URL.Path, ".wasm") {
			<-s.hold
		}
		for prefix, page := range *s.pages.Load() {
			if strings.HasPrefix(r.URL.Path, prefix) {
				if s.plain.Load() {
					w = plainTypes{w}
				}
				Handler(page, prefix).ServeHTTP(w, r)
				return
			}
		}
		http.NotFound(w, r)
	}))
	t.Cleanup(s.Close)
	return s
}

// plainTypes forgets the type of wasm files.
type plainTypes struct{ http.ResponseWriter }

func (w plainTypes) WriteHeader(status int) {
	if w.Header().Get("Content-Type") == "application/wasm" {
		w.Header().Set("Content-Type", "application/octet-stream")
	}
	w.ResponseWriter.WriteHeader(status)
}

// browser opens a tab, and gives what its page complained about. One browser
// serves all tests: each has a server of its own, and so an origin of its own
// with nothing stored.
func browser(t *testing.T) (context.Context, *complaints) {
	t.Helper()
	ctx, closeTab := chromedp.NewContext(theBrowser(t))
	t.Cleanup(closeTab)
	ctx, cancel := context.WithTimeout(ctx, time.Minute)
	t.Cleanup(cancel)
	c := &complaints{}
	err := chromedp.Listen(ctx, func(event any) {
		switch e := event.(type) {
		case *runtime.EventExceptionThrown:
			c.add(e.ExceptionDetails.Text)
		case *network.EventRequestWillBeSent:
			c.request(e.Request.URL)
		}
	})
	if err != nil {
		t.Fatal(err)
	}
	if _, err := chromedp.Call(ctx, network.Enable, network.EnableParams{}); err != nil {
		t.Fatal(err)
	}
	return ctx, c
}

// complaints gathers what went wrong in a page, and where it asked for files.
type complaints struct {
	mu       sync.Mutex
	all      []string
	requests []string
}

func (c *complaints) add(s string) {
	c.mu.Lock()
	defer c.mu.Unlock()
	c.all = append(c.all, s)
}

func (c *complaints) request(url string) {
	c.mu.Lock()
	defer c.mu.Unlock()
	c.requests = append(c.requests, url)
}

func navigate(t *testing.T, ctx context.Context, url string) {
	t.Helper()
	if err := chromedp.Do(ctx, chromedp.Navigate(url)); err != nil {
		t.Fatal(err)
	}
}

func reload(t *testing.T, ctx context.Context) {
	t.Helper()
	if err := chromedp.Do(ctx, chromedp.Reload()); err != nil {
		t.Fatal(err)
	}
}

// eval runs a script, waits for its promise and gives its value as a text.
func eval(t *testing.T, ctx context.Context, script string) string {
	t.Helper()
	got, err := chromedp.Run(ctx, chromedp.Evaluate[string]("Promise.resolve("+script+").then(String)", chromedp.EvalAwaitPromise))
	if err != nil {
		t.Fatal(err)
	}
	return got
}

// Scripts that wait for something without a clock.
const (
	untilRunning = `new Promise(done => { const look = () => document.documentElement.dataset.said !== undefined
		? done(document.documentElement.dataset.said) : requestAnimationFrame(look); look(); })`
	untilKept  = `navigator.serviceWorker.ready.then(() => "kept")`
	untilOffer = `new Promise(done => { if (window.hillwrightUpdate) done("offered"); addEventListener("hillwright-update", () => done("offered")); })`
	caches     = `caches.keys().then(names => names.length + " " + names.sort().join(" | "))`
	untilNote  = `new Promise(done => { const look = () => { const n = document.getElementById("boot-note");
		n && !n.hidden ? done(n.textContent) : requestAnimationFrame(look); }; look(); })`
)

func TestStartBelowAPathAndAgainWithoutNetwork(t *testing.T) {
	s := serving(t, map[string]fs.FS{"/shop/bikes/": packed(t, "One")})
	ctx, c := browser(t)
	navigate(t, ctx, s.URL+"/shop/bikes/")
	eval(t, ctx, untilRunning)
	eval(t, ctx, untilKept)
	for _, url := range c.requests {
		if !strings.HasPrefix(url, s.URL+"/shop/bikes/") {
			t.Errorf("asked for %s", url)
		}
	}
	s.down.Store(true)
	reload(t, ctx)
	eval(t, ctx, untilRunning)
	for path, want := range map[string]string{"index.html?from=link": "One", "some/where": "One"} {
		navigate(t, ctx, s.URL+"/shop/bikes/"+path)
		eval(t, ctx, untilRunning)
		if title := eval(t, ctx, "document.title"); title != want {
			t.Errorf("%s without network: got %q, want the page", path, title)
		}
	}
	missing := eval(t, ctx, `fetch("gone.0123456789abcdef.wasm").then(r => r.status + " " + r.headers.get("content-type"), () => "no answer")`)
	if missing != "no answer" {
		t.Errorf("a missing wasm file without network: got %q, want no answer", missing)
	}
	if len(c.all) > 0 {
		t.Errorf("the page complained: %v", c.all)
	}
}

func TestTapsBeforeTheProgramAreKept(t *testing.T) {
	s := serving(t, map[string]fs.FS{"/": packed(t, "One")})
	s.hold = make(chan struct{})
	ctx, _ := browser(t)
	navigate(t, ctx, s.URL+"/")
	eval(t, ctx, `(() => { const b = document.createElement("button"); b.dataset.act = "bike"; b.dataset.arg = "long";
		b.append(document.createElement("b")); const i = document.createElement("input"); i.dataset.act = "mass";
		document.body.append(b, i); b.firstChild.click(); document.body.click();
		i.value = "82"; i.dispatchEvent(new Event("input", {bubbles: true})); })()`)
	close(s.hold)
	const want = `[{"type":"click","act":"bike","arg":"long","value":""},{"type":"input","act":"mass","arg":"","value":"82"}]`
	if got := eval(t, ctx, untilRunning); got != want {
		t.Errorf("got %s\nwant %s", got, want)
	}
	eval(t, ctx, `document.querySelector("[data-act=bike]").click()`)
	if got := eval(t, ctx, "String(window.hillwrightTaps)"); got != "null" {
		t.Errorf("taps are still recorded after the program took them: %s", got)
	}
}

func TestWorkerRunsTheSameProgram(t *testing.T) {
	s := serving(t, map[string]fs.FS{"/a/": packed(t, "One")})
	ctx, _ := browser(t)
	navigate(t, ctx, s.URL+"/a/")
	eval(t, ctx, untilRunning)
	got := eval(t, ctx, `new Promise((done, fail) => { const w = window.hillwrightStartWorker();
		w.onmessage = e => done(e.data); w.onerror = e => fail(e.message); w.postMessage("hello"); })`)
	if got != "got hello" {
		t.Errorf("got %q", got)
	}
}

func TestHostWithoutTheTypeOfWasm(t *testing.T) {
	s := serving(t, map[string]fs.FS{"/": packed(t, "One")})
	s.plain.Store(true)
	ctx, _ := browser(t)
	navigate(t, ctx, s.URL+"/")
	eval(t, ctx, untilRunning)
}

func TestPlainWordsWhereTheProgramIsMissingOrStops(t *testing.T) {
	page := packed(t, "One")
	for name := range page {
		if strings.HasSuffix(name, ".wasm") {
			delete(page, name)
		}
	}
	german := packed(t, "One")
	german["index.html"] = &fstest.MapFile{Data: bytes.Replace(german["index.html"].Data, []byte(`lang="en"`), []byte(`lang="de"`), 1)}
	s := serving(t, map[string]fs.FS{"/missing/": page, "/stops/": german})
	ctx, _ := browser(t)
	navigate(t, ctx, s.URL+"/missing/")
	if got := eval(t, ctx, untilNote); !strings.Contains(got, "could not be loaded") {
		t.Errorf("got %q", got)
	}
	navigate(t, ctx, s.URL+"/stops/#stop")
	if got := eval(t, ctx, untilNote); !strings.Contains(got, "wurde beendet") {
		t.Errorf("got %q", got)
	}
}

func TestNewBuildIsOfferedAndNeverMixed(t *testing.T) {
	s := serving(t, map[string]fs.FS{"/": packed(t, "One")})
	ctx, _ := browser(t)
	navigate(t, ctx, s.URL+"/")
	eval(t, ctx, untilKept)
	pages := map[string]fs.FS{"/": packed(t, "Two")}
	s.pages.Store(&pages)
	reload(t, ctx)
	eval(t, ctx, untilOffer)
	if title := eval(t, ctx, "document.title"); title != "One" {
		t.Errorf("before the word is given: got page %q, want One", title)
	}
	if got := eval(t, ctx, caches); !strings.HasPrefix(got, "2 ") {
		t.Errorf("while the new build waits: got caches %s, want 2", got)
	}
	reload(t, ctx)
	eval(t, ctx, untilRunning)
	if title := eval(t, ctx, "document.title"); title != "One" {
		t.Errorf("loaded again before the word is given: got page %q, want One", title)
	}
	eval(t, ctx, untilOffer)
	// The page loads itself again.
	change := chromedp.Evaluate[any](`window.hillwrightUpdate(), 0`)
	loaded := func(page.EventLoadEventFired) bool { return true }
	if _, err := chromedp.Run(ctx, chromedp.WaitEvent(page.LoadEventFired, loaded, change)); err != nil {
		t.Fatal(err)
	}
	eval(t, ctx, untilRunning)
	if title := eval(t, ctx, "document.title"); title != "Two" {
		t.Errorf("after the word: got page %q, want Two", title)
	}
	if got := eval(t, ctx, caches); !strings.HasPrefix(got, "1 ") {
		t.Errorf("after the change: got caches %s, want 1", got)
	}
}

func TestWrongFileIsNeverInstalled(t *testing.T) {
	s := serving(t, map[string]fs.FS{"/": packed(t, "One")})
	ctx, _ := browser(t)
	navigate(t, ctx, s.URL+"/")
	eval(t, ctx, untilKept)
	before := eval(t, ctx, caches)
	spoilt := packed(t, "Two")
	for name, f := range spoilt {
		if strings.HasPrefix(name, "shop.") {
			f.Data = append(f.Data[:len(f.Data)-1:len(f.Data)-1], ' ')
		}
	}
	pages := map[string]fs.FS{"/": spoilt}
	s.pages.Store(&pages)
	got := eval(t, ctx, `navigator.serviceWorker.getRegistration().then(r => new Promise(done => {
		r.addEventListener("updatefound", () => { const w = r.installing;
			w.addEventListener("statechange", () => done(w.state)); });
		r.update(); }))`)
	if got != "redundant" {
		t.Errorf("a build with a wrong file became %q, want redundant", got)
	}
	if after := eval(t, ctx, caches); after != before {
		t.Errorf("caches before: %s, after: %s", before, after)
	}
	s.down.Store(true)
	reload(t, ctx)
	eval(t, ctx, untilRunning)
	if title := eval(t, ctx, "document.title"); title != "One" {
		t.Errorf("got page %q, want One", title)
	}
}

// TestCopiesOnOneHost has a copy inside another's folder: the worst case.
func TestCopiesOnOneHost(t *testing.T) {
	outer, inner := packed(t, "Outer"), packed(t, "Inner")
	// The handler's map has no order: the inner page lies in the outer's tree.
	all := fstest.MapFS{}
	for name, f := range outer {
		all[name] = f
	}
	for name, f := range inner {
		all["in/"+name] = f
	}
	s := serving(t, map[string]fs.FS{})
	files := http.FileServerFS(all)
	s.Config.Handler = http.HandlerFunc(func(w http.ResponseWriter, r *http.Request) {
		if s.down.Load() {
			panic(http.ErrAbortHandler)
		}
		files.ServeHTTP(w, r)
	})
	ctx, _ := browser(t)
	for _, path := range []string{"/", "/in/"} {
		navigate(t, ctx, s.URL+path)
		eval(t, ctx, untilRunning)
		eval(t, ctx, untilKept)
	}
	if got := eval(t, ctx, caches); !strings.HasPrefix(got, "2 ") {
		t.Errorf("got caches %s, want one for each copy", got)
	}
	s.down.Store(true)
	for path, want := range map[string]string{"/": "Outer", "/in/": "Inner"} {
		navigate(t, ctx, s.URL+path)
		if title := eval(t, ctx, "document.title"); title != want {
			t.Errorf("%s: got page %q, want %q", path, title, want)
		}
	}
}
