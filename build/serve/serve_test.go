package serve

import (
	"bufio"
	"context"
	"io"
	"net"
	"net/http"
	"net/http/httptest"
	"strings"
	"testing"
	"testing/fstest"
)

func small() fstest.MapFS {
	return fstest.MapFS{
		"index.html":                          {Data: []byte("<p>page")},
		"index.html.gz":                       {Data: []byte("zipped page")},
		"hillwright.0123456789abcdef.wasm":    {Data: []byte("wasm")},
		"hillwright.0123456789abcdef.wasm.br": {Data: []byte("small")},
		"hillwright.0123456789abcdef.wasm.gz": {Data: []byte("zipped")},
		"icon-192.0123456789abcdef.png":       {Data: []byte("png")},
		"manifest.webmanifest":                {Data: []byte("{}")},
		"sw.js":                               {Data: []byte("1")},
		"secret":                              {Data: []byte("no ending")},
	}
}

func TestHandler(t *testing.T) {
	const wasm, immutable = "hillwright.0123456789abcdef.wasm", "public, max-age=31536000, immutable"
	for _, each := range []struct {
		name, method, path, accept string
		status                     int
		body, kind, coding, cache  string
	}{
		{"the page", "GET", "/shop/bikes/", "", 200, "<p>page", "text/html; charset=utf-8", "", "no-cache"},
		{"the page by name", "GET", "/shop/bikes/index.html", "", 200, "<p>page", "text/html; charset=utf-8", "", "no-cache"},
		{"no brotli there", "GET", "/shop/bikes/", "br, gzip", 200, "zipped page", "text/html; charset=utf-8", "gzip", "no-cache"},
		{"wasm", "GET", "/shop/bikes/" + wasm, "", 200, "wasm", "application/wasm", "", immutable},
		{"wasm by brotli", "GET", "/shop/bikes/" + wasm, "gzip, deflate, br", 200, "small", "application/wasm", "br", immutable},
		{"brotli refused", "GET", "/shop/bikes/" + wasm, "br;q=0, gzip;q=0.5", 200, "zipped", "application/wasm", "gzip", immutable},
		{"anything", "GET", "/shop/bikes/" + wasm, "*", 200, "small", "application/wasm", "br", immutable},
		{"anything but brotli", "GET", "/shop/bikes/" + wasm, "*, br;q=0", 200, "zipped", "application/wasm", "gzip", immutable},
		{"picture", "GET", "/shop/bikes/icon-192.0123456789abcdef.png", "br", 200, "png", "image/png", "", immutable},
		{"manifest", "GET", "/shop/bikes/manifest.webmanifest", "", 200, "{}", "application/manifest+json", "", "no-cache"},
		{"service worker", "GET", "/shop/bikes/sw.js", "", 200, "1", "text/javascript; charset=utf-8", "", "no-cache"},
		{"only the head", "HEAD", "/shop/bikes/sw.js", "", 200, "", "text/javascript; charset=utf-8", "", "no-cache"},
		{"folder without slash", "GET", "/shop/bikes", "", 301, "", "", "", ""},
		{"missing", "GET", "/shop/bikes/gone.0123456789abcdef.wasm", "", 404, "", "", "", ""},
		{"outside", "GET", "/sw.js", "", 404, "", "", "", ""},
		{"sibling itself", "GET", "/shop/bikes/index.html.gz", "", 404, "", "", "", ""},
		{"no ending", "GET", "/shop/bikes/secret", "", 404, "", "", "", ""},
		{"above", "GET", "/shop/bikes/../index.html", "", 404, "", "", "", ""},
		{"post", "POST", "/shop/bikes/", "", 405, "", "", "", ""},
	} {
		t.Run(each.name, func(t *testing.T) {
			w := httptest.NewRecorder()
			r := httptest.NewRequest(each.method, "http://host"+each.path, nil)
			r.URL.Path = each.path
			r.Header.Set("Accept-Encoding", each.accept)
			Handler(small(), "/shop/bikes/").ServeHTTP(w, r)
			if w.Code != each.status {
				t.Fatalf("got status %d, want %d", w.Code, each.status)
			}
			if each.status != 200 {
				return
			}
			if w.Body.String() != each.body {
				t.Errorf("got body %q, want %q", w.Body, each.body)
			}
			for name, want := range map[string]string{
				"Content-Type": each.kind, "Content-Encoding": each.coding, "Cache-Control": each.cache,
				"X-Content-Type-Options": "nosniff", "Vary": "Accept-Encoding", "Referrer-Policy": "no-referrer",
			} {
				if got := w.Header().Get(name); got != want {
					t.Errorf("%s: got %q, want %q", name, got, want)
				}
			}
			if policy := w.Header().Get("Content-Security-Policy"); !strings.Contains(policy, "default-src 'self'") || !strings.Contains(policy, "frame-ancestors 'none'") {
				t.Errorf("got policy %q", policy)
			}
		})
	}
}

func TestNotModified(t *testing.T) {
	h := Handler(small(), "/")
	first := httptest.NewRecorder()
	h.ServeHTTP(first, httptest.NewRequest("GET", "/sw.js", nil))
	again := httptest.NewRequest("GET", "/sw.js", nil)
	again.Header.Set("If-None-Match", first.Header().Get("ETag"))
	second := httptest.NewRecorder()
	h.ServeHTTP(second, again)
	if second.Code != http.StatusNotModified || second.Body.Len() != 0 {
		t.Errorf("got status %d with %d bytes, want 304 and none", second.Code, second.Body.Len())
	}
}

// TestRun starts at a free port, reads the address that is printed, asks for
// the page there and stops.
func TestRun(t *testing.T) {
	ctx, cancel := context.WithCancel(t.Context())
	read, write := io.Pipe()
	ended := make(chan error, 1)
	go func() { ended <- Run(ctx, "127.0.0.1:0", "/a/", small(), write) }()
	line, err := bufio.NewReader(read).ReadString('\n')
	if err != nil {
		t.Fatal(err)
	}
	address := strings.TrimSpace(line)
	if !strings.HasPrefix(address, "http://127.0.0.1:") || !strings.HasSuffix(address, "/a/") {
		t.Errorf("got address %q", address)
	}
	got, err := http.Get(address)
	if err != nil {
		t.Fatal(err)
	}
	if got.StatusCode != 200 {
		t.Errorf("got status %d", got.StatusCode)
	}
	if err := got.Body.Close(); err != nil {
		t.Fatal(err)
	}
	cancel()
	if err := <-ended; err != nil {
		t.Errorf("the stop was not graceful: %v", err)
	}
}

func TestRunWhereThePortIsTaken(t *testing.T) {
	taken, err := net.Listen("tcp", "127.0.0.1:0")
	if err != nil {
		t.Fatal(err)
	}
	defer taken.Close()
	err = Run(t.Context(), taken.Addr().String(), "/", small(), io.Discard)
	if err == nil || !strings.Contains(err.Error(), "-addr") {
		t.Errorf("got %v, want an error that names -addr", err)
	}
}
