package build

import (
	"bytes"
	"compress/gzip"
	"encoding/json"
	"errors"
	"image/png"
	"io"
	"io/fs"
	"math"
	"os"
	"path/filepath"
	"regexp"
	"strings"
	"sync"
	"testing"
	"testing/fstest"

	"github.com/andybalholm/brotli"

	"hillwright/build/shop"
	"hillwright/site"
)

// demoParts are a page of the demo shop, save its tracks, which take long to
// compress, and a program that is none: packing does not care what it does.
func demoParts() (Parts, error) {
	own, err := shop.Read(site.DemoShop())
	own.Shop.Hills = own.Shop.Hills[:min(2, len(own.Shop.Hills))]
	own.Logo = []byte(`<svg xmlns="http://www.w3.org/2000/svg"><path d="M0 0h9"/></svg>`)
	return Parts{
		Site: site.Files(), Shop: own, Budget: DefaultBudget(),
		Program: Program{Wasm: []byte("\x00asm\x01\x00\x00\x00"), Exec: []byte("class Go {}\n")},
	}, err
}

func parts(t testing.TB) Parts {
	t.Helper()
	p, err := demoParts()
	if err != nil {
		t.Fatal(err)
	}
	return p
}

// one page serves all tests that only look at it.
var one = sync.OnceValues(func() (*Page, error) {
	p, err := demoParts()
	if err != nil {
		return nil, err
	}
	page, err := Assemble(p)
	if err != nil {
		return nil, err
	}
	return page, page.compress("")
})

func assemble(t testing.TB) *Page {
	t.Helper()
	p, err := one()
	if err != nil {
		t.Fatal(err)
	}
	return p
}

func TestPackingTwiceGivesTheSameBytes(t *testing.T) {
	var dirs [2]string
	for i := range dirs {
		dirs[i] = filepath.Join(t.TempDir(), "dist")
		if _, err := Pack(parts(t), dirs[i]); err != nil {
			t.Fatal(err)
		}
	}
	first, second := readAll(t, dirs[0]), readAll(t, dirs[1])
	if len(first) < 20 || len(first) != len(second) {
		t.Errorf("got %d and %d files", len(first), len(second))
	}
	for name, data := range first {
		if !bytes.Equal(data, second[name]) {
			t.Errorf("%s differs", name)
		}
	}
}

func readAll(t *testing.T, dir string) map[string][]byte {
	t.Helper()
	files := map[string][]byte{}
	err := fs.WalkDir(os.DirFS(dir), ".", func(name string, e fs.DirEntry, err error) error {
		if err != nil || e.IsDir() {
			return err
		}
		files[name], err = os.ReadFile(filepath.Join(dir, name))
		return err
	})
	if err != nil {
		t.Fatal(err)
	}
	return files
}

var address = regexp.MustCompile(`(?:https?:)?//[A-Za-z0-9.-]+\.[A-Za-z]|\burl\(["']?[^#d"']`)

// TestNoForeignAddress looks for the address of another place in all text: XML
// namespaces alone are allowed, nobody fetches those.
func TestNoForeignAddress(t *testing.T) {
	for _, f := range assemble(t).Files() {
		kind := MediaType(f.Name)
		if kind == "image/png" || kind == "application/wasm" {
			continue
		}
		text := strings.ReplaceAll(string(f.Data), "http://www.w3.org/2000/svg", "")
		for _, found := range address.FindAllString(text, -1) {
			t.Errorf("%s: has %q", f.Name, found)
		}
	}
}

var attribute = regexp.MustCompile(`\s(src|href|data-exec|data-wasm|data-worker|data-shop|action)="?([^"\s>]*)`)

// TestIndexFitsItsPolicy looks for what the page's policy would block, and for
// addresses that would not work under another path.
func TestIndexFitsItsPolicy(t *testing.T) {
	p := assemble(t)
	page := string(p.files["index.html"].Data)
	for _, want := range []string{`http-equiv="Content-Security-Policy"`, "default-src 'self'", "'wasm-unsafe-eval'", "object-src 'none'", `<html lang="en"`, `type="image/svg+xml"`, `id="app"`} {
		if !strings.Contains(page, want) {
			t.Errorf("index.html lacks %s", want)
		}
	}
	if strings.Contains(Policy, "unsafe-inline") || strings.Contains(Policy, "'unsafe-eval'") {
		t.Error("the policy allows scripts or styles inside the page")
	}
	for _, wrong := range []string{`<style`, `\sstyle=`, `\son[a-z]+=`, `<script(?:\s+(?:async|defer))?>`, `javascript:`} {
		if found := regexp.MustCompile(wrong).FindString(page); found != "" {
			t.Errorf("index.html has %s, which its policy blocks", found)
		}
	}
	links := attribute.FindAllStringSubmatch(page, -1)
	if len(links) < 8 {
		t.Errorf("got %d addresses in index.html, want at least 8", len(links))
	}
	for _, link := range links {
		if p.files[link[2]] == nil && !strings.HasPrefix(link[2], "#") {
			t.Errorf("index.html: %s=%q names no file of the page", link[1], link[2])
		}
	}
}

func TestFirstPaintIsInTheIndex(t *testing.T) {
	p := parts(t)
	paint, err := firstPaint(&p.Shop.Shop, "en")
	if err != nil {
		t.Fatal(err)
	}
	page := string(assemble(t).files["index.html"].Data)
	_, inside, _ := strings.Cut(page, `<div id="app">`)
	if len(paint) == 0 || !strings.HasPrefix(inside, "<div") {
		t.Errorf("index.html has no first paint: %.80s", inside)
	}
}

func TestManifestIsRelative(t *testing.T) {
	p := assemble(t)
	var m manifest
	if err := json.Unmarshal(p.files["manifest.webmanifest"].Data, &m); err != nil {
		t.Fatal(err)
	}
	if m.StartURL != "./" || m.Scope != "./" || m.Name == "" {
		t.Errorf("got %+v", m)
	}
	purposes := map[string]bool{}
	for _, i := range m.Icons {
		purposes[i.Purpose+" "+i.Sizes] = true
		if p.files[i.Src] == nil {
			t.Errorf("icon %s is no file of the page", i.Src)
		}
	}
	for _, want := range []string{"any any", "any 192x192", "any 512x512", "maskable 512x512"} {
		if !purposes[want] {
			t.Errorf("no icon for %q", want)
		}
	}
}

// TestPrecacheList reads the list back from the packed service worker and
// compares it with what is written.
func TestPrecacheList(t *testing.T) {
	dir := filepath.Join(t.TempDir(), "dist")
	if _, err := Pack(parts(t), dir); err != nil {
		t.Fatal(err)
	}
	files := readAll(t, dir)
	entry := regexp.MustCompile(`"?([\w./-]+)"?:"([0-9a-f]{64})"`)
	listed := map[string]string{}
	for _, found := range entry.FindAllStringSubmatch(string(files["sw.js"]), -1) {
		listed[found[1]] = found[2]
	}
	for name, data := range files {
		if strings.HasSuffix(name, ".gz") || strings.HasSuffix(name, ".br") || name == "sw.js" {
			continue
		}
		address := name
		if name == "index.html" {
			address = "./"
		}
		if want := (&File{Data: data}).Sum(); listed[address] != want {
			t.Errorf("%s: listed with %q, has %q", name, listed[address], want)
		}
		delete(listed, address)
	}
	for name := range listed {
		t.Errorf("%s is listed but not written", name)
	}
}

func TestEveryChangeMakesANewBuild(t *testing.T) {
	before := assemble(t).build
	changed := parts(t)
	changed.Shop.Shop.Name = "Another"
	if p, err := Assemble(changed); err != nil || p.build == before {
		t.Errorf("another shop gives build %s again (%v)", before, err)
	}
	changed = parts(t)
	changed.Site = siteWith(t, "sw.js", func(s string) string { return s + "\nself.hillwrightOther = 1;\n" })
	if p, err := Assemble(changed); err != nil || p.build == before {
		t.Errorf("another service worker gives build %s again (%v)", before, err)
	}
}

// siteWith gives the site with one file changed.
func siteWith(t *testing.T, name string, change func(string) string) fs.FS {
	t.Helper()
	files := fstest.MapFS{}
	for _, each := range []string{"shell.html", "style.css", "boot.js", "worker.js", "recorder.js", "sw.js"} {
		data, err := fs.ReadFile(site.Files(), each)
		if err != nil {
			t.Fatal(err)
		}
		if each == name {
			data = []byte(change(string(data)))
		}
		files[each] = &fstest.MapFile{Data: data}
	}
	return files
}

func TestNamesBearTheirHash(t *testing.T) {
	plain := 0
	for _, f := range assemble(t).Files() {
		if !Hashed(f.Name) {
			plain++
			continue
		}
		if !strings.Contains(f.Name, "."+f.Sum()[:hashDigits]+".") {
			t.Errorf("%s does not bear its content's hash %s", f.Name, f.Sum())
		}
	}
	if plain != 3 {
		t.Errorf("got %d files without a hash, want index.html, sw.js and the manifest only", plain)
	}
}

func TestCompressedSiblingsHoldTheSame(t *testing.T) {
	squeezed := 0
	for _, f := range assemble(t).Files() {
		if f.Gzip != nil {
			squeezed++
			r, err := gzip.NewReader(bytes.NewReader(f.Gzip))
			if err != nil {
				t.Fatal(err)
			}
			same(t, f.Name+".gz", r, f.Data)
		}
		if f.Brotli != nil {
			same(t, f.Name+".br", brotli.NewReader(bytes.NewReader(f.Brotli)), f.Data)
		}
	}
	if squeezed < 5 {
		t.Errorf("only %d files are compressed", squeezed)
	}
}

func same(t *testing.T, name string, r io.Reader, want []byte) {
	t.Helper()
	if got, err := io.ReadAll(r); err != nil || !bytes.Equal(got, want) {
		t.Errorf("%s does not hold what the file holds (%v)", name, err)
	}
}

func TestTooHeavyFailsAndWritesNothing(t *testing.T) {
	heavy := parts(t)
	heavy.Budget = Budget{WasmLimit: 5, FirstLimit: 100}
	parent := t.TempDir()
	report, err := Pack(heavy, filepath.Join(parent, "dist"))
	var too *TooHeavy
	if !errors.As(err, &too) || report == nil {
		t.Fatalf("got %v, want *TooHeavy with the report", err)
	}
	for _, want := range []string{"hillwright.", "first load", "expected at most 0.1 kB"} {
		if !strings.Contains(err.Error(), want) {
			t.Errorf("the error lacks %q: %v", want, err)
		}
	}
	if left := readAll(t, parent); len(left) > 0 {
		t.Errorf("a failed pack wrote %d files", len(left))
	}
}

func TestPackReplacesAnOlderPageOnly(t *testing.T) {
	parent := t.TempDir()
	out := filepath.Join(parent, "dist")
	if err := os.MkdirAll(out, 0o755); err != nil {
		t.Fatal(err)
	}
	for range 2 {
		if _, err := Pack(parts(t), out); err != nil {
			t.Fatal(err)
		}
	}
	if err := os.WriteFile(filepath.Join(out, "left-over.js"), nil, 0o644); err != nil {
		t.Fatal(err)
	}
	if _, err := Pack(parts(t), out); err != nil {
		t.Fatal(err)
	}
	if _, err := os.Stat(filepath.Join(out, "left-over.js")); err == nil {
		t.Error("a file of the older page was left")
	}
	if entries, _ := os.ReadDir(parent); len(entries) != 1 {
		t.Errorf("beside the page there are left: %v", entries)
	}
	mine := filepath.Join(parent, "mine")
	if err := os.MkdirAll(mine, 0o755); err != nil {
		t.Fatal(err)
	}
	if err := os.WriteFile(filepath.Join(mine, "letter.txt"), []byte("dear"), 0o644); err != nil {
		t.Fatal(err)
	}
	if _, err := Pack(parts(t), mine); err == nil || !strings.Contains(err.Error(), "choose another") {
		t.Errorf("a folder with other files was not refused: %v", err)
	}
	if files := readAll(t, mine); len(files) != 1 {
		t.Errorf("the refused folder holds %d files, want its 1", len(files))
	}
}

func TestMinified(t *testing.T) {
	for _, each := range []struct{ name, in, has string }{
		{"a.html", `<p><input type="text" data-act="x"></p>`, `type="text"`},
		{"a.html", `<button type="submit">x</button>`, `type="submit"`},
		{"a.html", "<b>a</b>\n<b>b</b>", "</b>\n<b>"},
		{"a.css", "a { color : #ffffff ; }", "a{color:#fff}"},
		{"a.js", "const a = 1 ; // words\nf(a);", "const a=1;f(a)"},
		{"a.json", "{ \"a\" : 0.10 }", `{"a":0.10}`},
		{"a.svg", `<svg xmlns="http://www.w3.org/2000/svg"><!-- words --><path d="M 10 10 L 20 10"/></svg>`, `<path d="M10 10H20"/>`},
		{"wasm_exec.js", "// licence\n", "// licence\n"},
		{"a.png", " as it is ", " as it is "},
	} {
		got, err := minified(each.name, []byte(each.in))
		if err != nil || !strings.Contains(string(got), each.has) {
			t.Errorf("%s: got %q, %v, want %q in it", each.name, got, err, each.has)
		}
	}
	for name, in := range map[string]string{"a.js": "const = ;", "a.json": "{,"} {
		if _, err := minified(name, []byte(in)); err == nil || !strings.Contains(err.Error(), name) {
			t.Errorf("%s: got %v, want an error that names the file", name, err)
		}
	}
}

func TestFaultsOfTheSite(t *testing.T) {
	for _, each := range []struct {
		file   string
		change func(string) string
		says   string
	}{
		{"sw.js", func(s string) string { return strings.Replace(s, "%BUILD%", "", 1) }, "expected \"%BUILD%\" once"},
		{"shell.html", func(s string) string { return strings.Replace(s, "boot.js", "boots.js", 1) }, "boots.js"},
		{"boot.js", func(s string) string { return s + "}" }, "boot.js"},
	} {
		p := parts(t)
		p.Site = siteWith(t, each.file, each.change)
		if _, err := Assemble(p); err == nil || !strings.Contains(err.Error(), each.says) {
			t.Errorf("%s: got %v, want %q in it", each.file, err, each.says)
		}
	}
}

// TestBootSpeaksEveryLanguage: what is said when the program does not come
// cannot come from the program's catalogue of words.
func TestBootSpeaksEveryLanguage(t *testing.T) {
	boot, err := fs.ReadFile(site.Files(), "boot.js")
	if err != nil {
		t.Fatal(err)
	}
	for _, lang := range shop.Languages() {
		_, after, found := strings.Cut(string(boot), "\n    "+lang+": {")
		texts, _, _ := strings.Cut(after, "}")
		for _, key := range []string{"missing:", "failed:", "stopped:"} {
			if !found || !strings.Contains(texts, key) {
				t.Errorf("boot.js has no %s in %s", key, lang)
			}
		}
	}
}

func TestIcons(t *testing.T) {
	for _, i := range icons {
		data, err := iconPNG(i)
		if err != nil {
			t.Fatal(err)
		}
		picture, err := png.Decode(bytes.NewReader(data))
		if err != nil {
			t.Fatal(err)
		}
		if size := picture.Bounds().Size(); size.X != i.side || size.Y != i.side {
			t.Errorf("%s: got %v, want a side of %d", i.name, size, i.side)
		}
		r0, g0, b0, _ := picture.At(0, 0).RGBA()
		marked := 0
		for y := range i.side {
			for x := range i.side {
				r, g, b, a := picture.At(x, y).RGBA()
				if a != 0xffff {
					t.Fatalf("%s: is not opaque at %d, %d", i.name, x, y)
				}
				if r == r0 && g == g0 && b == b0 {
					continue
				}
				marked++
				off := math.Hypot(float64(x)+0.5-float64(i.side)/2, float64(y)+0.5-float64(i.side)/2)
				if i.purpose == "maskable" && off > 0.4*float64(i.side) {
					t.Fatalf("%s: the mark at %d, %d would be cut off", i.name, x, y)
				}
			}
		}
		if share := float64(marked) / float64(i.side*i.side); share < 0.05 || share > 0.6 {
			t.Errorf("%s: the mark covers %.0f %%", i.name, 100*share)
		}
	}
}
