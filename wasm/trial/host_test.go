//go:build !js

package trial

import (
	"context"
	"io/fs"
	"math"
	"net"
	"net/http"
	"os"
	"path"
	"strings"
	"sync"
	"sync/atomic"
	"testing"

	"hillwright/build"
	"hillwright/build/serve"
	"hillwright/build/shop"
	"hillwright/site"
)

// folder is where the packed pages lie until the tests end.
var folder struct {
	once sync.Once
	path string
	err  error
}

func removePacked() {
	if folder.path != "" {
		os.RemoveAll(folder.path)
	}
}

func packedFolder() (string, error) {
	folder.once.Do(func() { folder.path, folder.err = os.MkdirTemp("", "hillwright-packed-") })
	return folder.path, folder.err
}

// parts is what the demo shop's page is made of. What it may weigh is a matter
// of the pack's own tests.
var parts = sync.OnceValues(func() (build.Parts, error) {
	program, err := build.Compile(context.Background(), "../..")
	if err != nil {
		return build.Parts{}, err
	}
	own, err := shop.Read(site.DemoShop())
	budget := build.DefaultBudget()
	budget.WasmLimit, budget.FirstLimit = math.MaxInt, math.MaxInt
	return build.Parts{Site: site.Files(), Shop: own, Program: program, Budget: budget}, err
})

// demo packs the demo shop's page once.
var demo = sync.OnceValues(func() (*packed, error) {
	dir, err := packedFolder()
	if err != nil {
		return nil, err
	}
	from, err := parts()
	if err != nil {
		return nil, err
	}
	out := path.Join(dir, "demo")
	report, err := build.Pack(from, out)
	return &packed{os.DirFS(out), report}, err
})

type packed struct {
	files  fs.FS
	report *build.Report
}

func demoPage(t testing.TB) *packed {
	t.Helper()
	p, err := demo()
	if err != nil {
		t.Fatalf("the demo shop could not be packed: %v", err)
	}
	return p
}

// host is a static file server that can be changed and cut off.
type host struct {
	URL    string // of the page's folder
	server *http.Server
	files  atomic.Pointer[fs.FS]
	// held is what the wasm file waits for, when it is set.
	held atomic.Pointer[chan struct{}]
	dumb bool
}

// prefixes under which the page is served.
const (
	atRoot = "/"
	below  = "/shop/bikes/"
)

// newHost serves the demo shop's page below a prefix. A dumb host has no
// compressed files, no headers of the page's own, and knows no types but those
// without which a browser refuses scripts and styles.
func newHost(t testing.TB, prefix string, dumb bool) *host {
	t.Helper()
	page := demoPage(t).files
	listener, err := net.Listen("tcp", "127.0.0.1:0")
	if err != nil {
		t.Fatal(err)
	}
	h := &host{URL: "http://" + listener.Addr().String() + prefix, dumb: dumb}
	h.files.Store(&page)
	h.server = &http.Server{Handler: http.HandlerFunc(func(w http.ResponseWriter, r *http.Request) { h.answer(w, r, prefix) })}
	go h.server.Serve(listener)
	t.Cleanup(func() {
		h.letGo()
		h.cut()
	})
	return h
}

func (h *host) answer(w http.ResponseWriter, r *http.Request, prefix string) {
	if gate := h.held.Load(); gate != nil && strings.HasSuffix(r.URL.Path, ".wasm") {
		<-*gate
	}
	files := *h.files.Load()
	if !strings.HasPrefix(r.URL.Path, prefix) {
		http.NotFound(w, r)
		return
	}
	if !h.dumb {
		serve.Handler(files, prefix).ServeHTTP(w, r)
		return
	}
	name := strings.TrimPrefix(r.URL.Path, prefix)
	if name == "" {
		name = "index.html"
	}
	data, err := fs.ReadFile(files, name)
	if err != nil {
		http.NotFound(w, r)
		return
	}
	types := map[string]string{".html": "text/html", ".css": "text/css", ".js": "text/javascript"}
	kind, known := types[path.Ext(name)]
	if !known {
		kind = "application/octet-stream"
	}
	w.Header().Set("Content-Type", kind)
	w.Write(data)
}

// hold keeps the wasm file back until letGo.
func (h *host) hold() {
	gate := make(chan struct{})
	h.held.Store(&gate)
}

func (h *host) letGo() {
	if gate := h.held.Swap(nil); gate != nil {
		close(*gate)
	}
}

// cut closes the server and every connection to it.
func (h *host) cut() { h.server.Close() }
