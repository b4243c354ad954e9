//go:build !js

package trial

import (
	"io/fs"
	"os"
	"path/filepath"
	"strings"
	"testing"
	"testing/fstest"

	"github.com/chromedp/cdproto/page"

	"hillwright/build"
	"hillwright/wasm/words"
)

// TestStorageRefused opens the page where the browser keeps nothing: it says
// so and goes on.
func TestStorageRefused(t *testing.T) {
	for name, source := range map[string]string{
		"opening throws": `IDBFactory.prototype.open = () => { throw new DOMException("refused", "SecurityError") }`,
		"looking throws": `Object.defineProperty(window, "indexedDB", { get() { throw new DOMException("refused", "SecurityError") } })`,
	} {
		t.Run(name, func(t *testing.T) { storageRefused(t, source) })
	}
}

func storageRefused(t *testing.T, source string) {
	p := newTab(t, phone, newHost(t, atRoot, false))
	call(p, page.AddScriptToEvaluateOnNewDocument, page.AddScriptToEvaluateOnNewDocumentParams{Source: source})
	p.visit()
	p.shows("#message", English.Say(words.StorageRefused))
	p.tap(act("dismiss", ""))
	p.tap(act("open", "bike"))
	p.tap(act("choose", "bike:plain"))
	p.answers(newAsked(t, "plain", "", "", "", ""))
	p.tap(act("open", "bike"))
	p.tap(act("all", "bike"))
	p.typeOver("#name-bike", "For today")
	p.tap(act("keep", "bike"))
	p.shows(act("open", "bike"), "For today")
	p.tap(act("open", "kept"))
	p.shows("#place", "For today")
	p.shows("#place", English.Say(words.StorageRefused))
	if name, data := p.download(act("export", "")); !strings.Contains(string(data), "For today") {
		t.Errorf("%s does not hold what was kept: %.300s", name, data)
	}
}

// TestBadFiles picks files that are no tracks and no things: each is told, the
// answer stays, and so does what was kept.
func TestBadFiles(t *testing.T) {
	p := open(t, phone)
	a := newAsked(t, "", "", "", "", "")
	p.tap(act("open", "rider"))
	p.tap(act("all", "rider"))
	p.typeOver("#name-rider", "Keep me")
	p.tap(act("keep", "rider"))
	p.shows(act("open", "rider"), "Keep me")
	dir := t.TempDir()
	file := func(name, content string) string {
		full := filepath.Join(dir, name)
		if err := os.WriteFile(full, []byte(content), 0o600); err != nil {
			t.Fatal(err)
		}
		return full
	}
	for name, content := range map[string]string{
		"cut.gpx":    `<gpx version="1.1"><trk><trkseg><trkpt lat="44.1" lon="8.2"><ele>3`,
		"bomb.gpx":   `<!DOCTYPE g [<!ENTITY a "aaaaaaaaaa"><!ENTITY b "&a;&a;&a;&a;&a;&a;&a;&a;&a;&a;">]><gpx><trk><name>&b;</name></trk></gpx>`,
		"photo.png":  "\x89PNG\r\n\x1a\n\x00\x00\x00\rIHDR",
		"empty.gpx":  "",
		"no-way.gpx": `<gpx version="1.1"><wpt lat="44.1" lon="8.2"/></gpx>`,
	} {
		p.tap(act("open", "hill"))
		p.pick(act("track-pick", ""), file(name, content))
		p.until("the page says what is wrong with "+name, `(e => e && e.textContent.startsWith($1) && e.textContent.length > $1.length + 20)
			(document.querySelector("#place .problem[role=alert]"))`, name)
		p.tap(act("close", ""))
		p.answers(a)
	}
	p.tap(act("open", "kept"))
	for name, content := range map[string]string{"none.json": "{", "other.json": `{"a": 1}`, "text.json": "hello"} {
		p.pick(act("import-pick", ""), file(name, content))
		p.until("the page says what is wrong with "+name, `document.querySelector("#place .problem li") !== null`)
		p.shows("#place", "Keep me")
		p.tap(act("close", ""))
		p.tap(act("open", "kept"))
	}
	p.reload()
	p.shows(act("open", "rider"), "Keep me")
}

// secondBuild is the page of the demo shop under another name.
func secondBuild(t *testing.T) fs.FS {
	t.Helper()
	from, err := parts()
	if err != nil {
		t.Fatal(err)
	}
	from.Shop.Shop.Name = "Second build"
	made, err := build.Assemble(from)
	if err != nil {
		t.Fatal(err)
	}
	files := fstest.MapFS{}
	for _, f := range made.Files() {
		files[f.Name] = &fstest.MapFile{Data: f.Data}
	}
	return files
}

// TestNewVersion puts a new build on the host: the page goes on with the one
// it has, offers the new one, and changes as a whole when told to.
func TestNewVersion(t *testing.T) {
	p := open(t, phone)
	p.kept()
	first := p.text("h1")
	second := secondBuild(t)
	p.host.files.Store(&second)
	p.reload()
	p.until("the new version is offered", `document.querySelector("[data-act=use-new]") !== null`)
	if name := p.text("h1"); name != first {
		t.Errorf("the page is %q before anyone said so, want %q", name, first)
	}
	p.answers(newAsked(t, "", "", "", "", ""))
	p.tap(act("use-new", ""))
	p.until("the page is the new one", `document.querySelector("h1").textContent === "Second build" && window.hillwrightTaps === null`)
	p.answers(newAsked(t, "", "", "", "", ""))
	if n := eval[int](p, `caches.keys().then(all => all.length)`); n != 1 {
		t.Errorf("%d builds are kept, want the new one alone", n)
	}
}
