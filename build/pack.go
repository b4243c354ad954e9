// Package build makes the page of one shop: a folder of static files that any
// server can serve under any path. It is the pack step as a library, one
// subject a file: compile, render, minify, fingerprint, precache list,
// compress, budgets, write. Start with Compile and then Pack.
package build

import (
	"fmt"
	"io/fs"
	"strings"

	"hillwright/build/shop"

	"hillwright/wasm/words"
)

// Parts is what a page is made of. Site holds the shell, the styles and the
// scripts (site.Files); Shop is what shop.Read gave; Program is what Compile
// gave; Budget is what the page may weigh; Cache is a folder in which brotli's
// work on the wasm file, the longest of all, is kept from pack to pack, "" for
// none.
type Parts struct {
	Site    fs.FS
	Shop    shop.Copy
	Program Program
	Budget  Budget
	Cache   string
}

// Pack makes the page in the folder out, which is replaced as a whole when it
// holds an older page, and must be new or empty otherwise. Nothing is written
// unless everything succeeds. A page that is too heavy comes as *TooHeavy,
// with the report.
func Pack(parts Parts, out string) (*Report, error) {
	page, err := Assemble(parts)
	if err != nil {
		return nil, err
	}
	if err := page.compress(parts.Cache); err != nil {
		return nil, err
	}
	report := weigh(page, parts.Budget)
	if err := report.check(); err != nil {
		return report, err
	}
	return report, write(page, out)
}

// Assemble makes the page in memory, without the compressed siblings.
func Assemble(parts Parts) (*Page, error) {
	if err := words.Check(); err != nil {
		return nil, fmt.Errorf("the catalogue of words: %w", err)
	}
	own := parts.Shop
	p := &Page{files: map[string]*File{}}
	names, err := p.addHashed(parts)
	if err != nil {
		return nil, err
	}
	if err := p.addManifest(own.Shop, names); err != nil {
		return nil, err
	}
	if err := p.addIndex(parts.Site, own.Shop, names); err != nil {
		return nil, err
	}
	return p, p.addServiceWorker(parts.Site)
}

// addHashed adds every file that bears its content's hash in its name, and
// gives the names by what they are for.
func (p *Page) addHashed(parts Parts) (names, error) {
	n := names{}
	for _, name := range []string{"style.css", "boot.js", "worker.js", "recorder.js"} {
		data, err := fs.ReadFile(parts.Site, name)
		if err != nil {
			return nil, err
		}
		if err := p.add(n, name, data); err != nil {
			return nil, err
		}
	}
	data, err := shopJSON(parts.Shop.Shop)
	if err != nil {
		return nil, err
	}
	made := map[string][]byte{
		"hillwright.wasm": parts.Program.Wasm,
		"wasm_exec.js":    parts.Program.Exec,
		"shop.json":       data,
		"icon.svg":        iconSVG(),
	}
	if parts.Shop.Logo != nil {
		made["logo.svg"] = parts.Shop.Logo
	}
	for _, each := range icons {
		if made[each.name], err = iconPNG(each); err != nil {
			return nil, err
		}
	}
	for _, name := range sortedNames(made) {
		if err := p.add(n, name, made[name]); err != nil {
			return nil, err
		}
	}
	return n, nil
}

// MediaType gives a file's media type by the ending of its name, empty when a
// page has no such files.
func MediaType(name string) string {
	return mediaTypes[name[strings.LastIndexByte(name, '.')+1:]]
}

var mediaTypes = map[string]string{
	"html":        "text/html",
	"css":         "text/css",
	"js":          "text/javascript",
	"json":        "application/json",
	"webmanifest": "application/manifest+json",
	"svg":         "image/svg+xml",
	"png":         "image/png",
	"wasm":        "application/wasm",
}
