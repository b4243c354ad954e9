// Package serve hands out a packed page as a good static host does: the right
// types, the compressed siblings, caching that fits the names, the page's
// security policy. Start with Handler and Run.
package serve

import (
	"context"
	"crypto/sha256"
	"encoding/hex"
	"errors"
	"fmt"
	"io"
	"io/fs"
	"net"
	"net/http"
	"strconv"
	"strings"
	"time"

	"hillwright/build"
)

// Handler serves the files of a packed page below prefix, which begins and
// ends with a slash ("/" for the root).
func Handler(page fs.FS, prefix string) http.Handler {
	return &host{page, prefix}
}

type host struct {
	page   fs.FS
	prefix string
}

func (h *host) ServeHTTP(w http.ResponseWriter, r *http.Request) {
	if r.Method != http.MethodGet && r.Method != http.MethodHead {
		w.Header().Set("Allow", "GET, HEAD")
		http.Error(w, "only GET and HEAD", http.StatusMethodNotAllowed)
		return
	}
	if r.URL.Path+"/" == h.prefix {
		http.Redirect(w, r, h.prefix, http.StatusMovedPermanently)
		return
	}
	name, ours := strings.CutPrefix(r.URL.Path, h.prefix)
	if name == "" {
		name = "index.html"
	}
	kind := build.MediaType(name)
	if !ours || kind == "" || !fs.ValidPath(name) {
		http.NotFound(w, r)
		return
	}
	data, coding, err := h.read(name, r.Header.Get("Accept-Encoding"))
	switch {
	case errors.Is(err, fs.ErrNotExist):
		http.NotFound(w, r)
	case err != nil:
		http.Error(w, err.Error(), http.StatusInternalServerError)
	default:
		send(w, r, name, kind, coding, data)
	}
}

// codings are the compressed siblings, the smaller first.
var codings = []struct{ name, ending string }{{"br", ".br"}, {"gzip", ".gz"}}

// read reads the smallest form of a file that the browser takes.
func (h *host) read(name, accepted string) (data []byte, coding string, err error) {
	for _, c := range codings {
		if !accepts(accepted, c.name) {
			continue
		}
		data, err = fs.ReadFile(h.page, name+c.ending)
		if !errors.Is(err, fs.ErrNotExist) {
			return data, c.name, err
		}
	}
	data, err = fs.ReadFile(h.page, name)
	return data, "", err
}

// accepts reads an Accept-Encoding header (RFC 9110, 12.5.3).
func accepts(header, coding string) bool {
	star := false
	for _, part := range strings.Split(header, ",") {
		name, weight, _ := strings.Cut(part, ";")
		key, value, _ := strings.Cut(strings.TrimSpace(weight), "=")
		q, err := strconv.ParseFloat(strings.TrimSpace(value), 64)
		wanted := strings.TrimSpace(key) != "q" || err != nil || q > 0
		switch {
		case strings.EqualFold(strings.TrimSpace(name), coding):
			return wanted
		case strings.TrimSpace(name) == "*":
			star = wanted
		}
	}
	return star
}

func send(w http.ResponseWriter, r *http.Request, name, kind, coding string, data []byte) {
	sum := sha256.Sum256(data)
	tag := `"` + hex.EncodeToString(sum[:16]) + `"`
	head := w.Header()
	head.Set("Content-Security-Policy", build.Policy+"; frame-ancestors 'none'")
	head.Set("X-Content-Type-Options", "nosniff")
	head.Set("Referrer-Policy", "no-referrer")
	head.Set("Vary", "Accept-Encoding")
	head.Set("ETag", tag)
	if build.Hashed(name) {
		head.Set("Cache-Control", "public, max-age=31536000, immutable")
	} else {
		head.Set("Cache-Control", "no-cache")
	}
	if strings.Contains(r.Header.Get("If-None-Match"), tag) {
		w.WriteHeader(http.StatusNotModified)
		return
	}
	if strings.HasPrefix(kind, "text/") {
		kind += "; charset=utf-8"
	}
	head.Set("Content-Type", kind)
	head.Set("Content-Length", strconv.Itoa(len(data)))
	if coding != "" {
		head.Set("Content-Encoding", coding)
	}
	w.WriteHeader(http.StatusOK)
	if r.Method == http.MethodGet {
		// A failure here is the browser's going away: there is nobody to tell.
		_, _ = w.Write(data)
	}
}

// patience is how long requests may still run after the stop [s].
const patience = 3 * time.Second

// Run serves until the context ends, then lets running requests finish. It
// prints the page's address to out; port 0 takes a free one.
func Run(ctx context.Context, addr, prefix string, page fs.FS, out io.Writer) error {
	listener, err := net.Listen("tcp", addr)
	if err != nil {
		return fmt.Errorf("%w; choose another address with -addr, port 0 takes a free one", err)
	}
	if _, err := fmt.Fprintf(out, "http://%s%s\n", listener.Addr(), prefix); err != nil {
		return errors.Join(err, listener.Close())
	}
	server := &http.Server{Handler: Handler(page, prefix), ReadHeaderTimeout: 10 * time.Second}
	ended := make(chan error, 1)
	go func() { ended <- server.Serve(listener) }()
	select {
	case err := <-ended:
		return err
	case <-ctx.Done():
	}
	last, cancel := context.WithTimeout(context.WithoutCancel(ctx), patience)
	defer cancel()
	return server.Shutdown(last)
}
