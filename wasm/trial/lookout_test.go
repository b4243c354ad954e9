//go:build !js

package trial

import (
	"net"
	"net/http"
	"slices"
	"strings"
	"sync"
)

// lookout stands where the browser would leave this machine: a proxy that
// answers nothing and remembers what was asked for, by pages, workers and
// service workers alike.
var lookout watch

type watch struct {
	mu    sync.Mutex
	asked []string
}

func (w *watch) open() (address string, end func(), err error) {
	listener, err := net.Listen("tcp", "127.0.0.1:0")
	if err != nil {
		return "", nil, err
	}
	server := &http.Server{Handler: w}
	go server.Serve(listener)
	return "http://" + listener.Addr().String(), func() { server.Close() }, nil
}

func (w *watch) ServeHTTP(out http.ResponseWriter, r *http.Request) {
	w.mu.Lock()
	w.asked = append(w.asked, r.Method+" "+r.URL.String())
	w.mu.Unlock()
	http.Error(out, "there is no other host", http.StatusForbidden)
}

// own are hosts that the browser asks for by itself, without any page.
var own = []string{"accounts.google.com", "optimizationguide-pa.googleapis.com", "update.googleapis.com", "clients2.google.com", "safebrowsing.googleapis.com", "content-autofill.googleapis.com", "redirector.gvt1.com"}

// seen gives what was asked for since the last call.
func (w *watch) seen() []string {
	w.mu.Lock()
	defer w.mu.Unlock()
	all := w.asked
	w.asked = nil
	return slices.DeleteFunc(all, func(asked string) bool {
		return slices.ContainsFunc(own, func(host string) bool { return strings.Contains(asked, "//"+host) })
	})
}
