//go:build !js

package trial

import (
	"fmt"
	"net"
	"net/http"
	"net/url"
	"os"
	"os/exec"
	"path/filepath"
	"regexp"
	"strings"
	"testing"

	"github.com/chromedp/chromedp"
)

// TestPhysicsInBrowser runs the computation's own tests as wasm in the
// browser, files and all. Left out are those that ask the Go command.
func TestPhysicsInBrowser(t *testing.T) {
	browserPath(t)
	for _, name := range physicsWithTests(t) {
		t.Run(name, func(t *testing.T) {
			text, code := inBrowser(t, name, "-test.v")
			passed := len(regexp.MustCompile(`(?m)^--- PASS: `).FindAllString(text, -1))
			skipped := len(regexp.MustCompile(`(?m)^--- SKIP:`).FindAllString(text, -1))
			started := len(regexp.MustCompile(`(?m)^=== RUN   [^/\s]+\s*$`).FindAllString(text, -1))
			if code != 0 || passed == 0 || passed+skipped != started {
				t.Fatalf("exit code %d, %d passed and %d skipped of %d:\n%s", code, passed, skipped, started, lastOf(text, 4000))
			}
			t.Logf("%d passed, %d skipped", passed, skipped)
		})
	}
}

// physicsWithTests gives the names of the packages below physics that have
// tests.
func physicsWithTests(t *testing.T) []string {
	t.Helper()
	const format = `{{if or .TestGoFiles .XTestGoFiles}}{{.ImportPath}}{{end}}`
	out, err := exec.Command("go", "list", "-f", format, "hillwright/physics/...").Output()
	if err != nil {
		t.Fatal(err)
	}
	var names []string
	for _, path := range strings.Fields(string(out)) {
		if name, below := strings.CutPrefix(path, "hillwright/physics/"); below {
			names = append(names, name)
		}
	}
	if len(names) == 0 {
		t.Fatal("go list gave no package with tests")
	}
	return names
}

// inBrowser compiles a package's tests for the browser, runs them there with
// flags, and gives what they print and their exit code.
func inBrowser(t testing.TB, name string, flags ...string) (text string, code int) {
	t.Helper()
	dir := t.TempDir()
	compile := exec.Command("go", "test", "-c", "-o", filepath.Join(dir, "test.wasm"), "hillwright/physics/"+name)
	compile.Env = append(os.Environ(), "GOOS=js", "GOARCH=wasm")
	if said, err := compile.CombinedOutput(); err != nil {
		t.Fatalf("%v: %s", err, said)
	}
	root, err := exec.Command("go", "env", "GOROOT").Output()
	if err != nil {
		t.Fatal(err)
	}
	p := newTab(t, tablet, testHost(t, dir, filepath.Join(strings.TrimSpace(string(root)), "lib", "wasm", "wasm_exec.js")))
	question := url.Values{"run": {"test.wasm"}, "in": {"/physics/" + name}, "flag": flags}
	p.allow("404 (Not Found)")               // files that the tests do not need, such as old findings of fuzzing
	p.allow("Go program has already exited") // a timer of the program's that was set before its end
	p.do(chromedp.Navigate(p.host.URL + "?" + question.Encode()))
	over, err := chromedp.Run(p.ctx, chromedp.Evaluate[bool](`new Promise(done => {
		const look = () => ran.code !== null ? done(true) : setTimeout(look, 20); look() })`, chromedp.EvalAwaitPromise))
	text = eval[string](p, `ran.text`)
	if err != nil || !over {
		p.fatal(fmt.Errorf("%w: the tests of %s did not end; they printed:\n%s", err, name, lastOf(text, 2000)))
	}
	return text, eval[int](p, `ran.code`)
}

// testHost serves a compiled test program with Go's script, and the
// repository's files to the tests that read them.
func testHost(t testing.TB, dir, goScript string) *host {
	t.Helper()
	listener, err := net.Listen("tcp", "127.0.0.1:0")
	if err != nil {
		t.Fatal(err)
	}
	mux := http.NewServeMux()
	mux.HandleFunc("/{$}", func(w http.ResponseWriter, _ *http.Request) {
		w.Header().Set("Content-Type", "text/html")
		fmt.Fprint(w, `<!doctype html><link rel="icon" href="data:,"><script src="go.js"></script><script src="physics.js"></script>`)
	})
	mux.HandleFunc("/go.js", func(w http.ResponseWriter, r *http.Request) { http.ServeFile(w, r, goScript) })
	mux.HandleFunc("/physics.js", func(w http.ResponseWriter, r *http.Request) {
		http.ServeFile(w, r, filepath.Join("testdata", "physics.js"))
	})
	mux.Handle("/test.wasm", http.FileServer(http.Dir(dir)))
	mux.Handle("/files/", http.StripPrefix("/files", http.FileServer(http.Dir(filepath.Join("..", "..")))))
	h := &host{URL: "http://" + listener.Addr().String() + "/", server: &http.Server{Handler: mux}}
	go h.server.Serve(listener)
	t.Cleanup(h.cut)
	return h
}

func lastOf(text string, n int) string { return text[max(0, len(text)-n):] }
