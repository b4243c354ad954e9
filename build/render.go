package build

import (
	"bytes"
	"encoding/json"
	"fmt"
	"html/template"
	"io/fs"

	"hillwright/wasm/dom"
	"hillwright/wasm/keep"
	"hillwright/wasm/state"
	"hillwright/wasm/view"
)

// Policy is the page's content-security policy: nothing from another origin,
// no script or style inside the page, and no form sent anywhere.
// wasm-unsafe-eval is what a browser asks for to compile wasm.
const Policy = "default-src 'self'; script-src 'self' 'wasm-unsafe-eval'; style-src 'self'; img-src 'self' data: blob:; " +
	"connect-src 'self'; worker-src 'self'; object-src 'none'; base-uri 'none'; form-action 'none'"

// Colours of the browser's own frame: paper by day, slate at dusk.
const (
	paper = "#f4efe2"
	slate = "#22282b"
)

// shellData is what shell.html is filled with.
type shellData struct {
	Lang, Title, Policy, Paper, Slate string
	FirstPaint                        template.HTML
	names                             names
}

// File gives a file's name with its hash.
func (d shellData) File(name string) (string, error) {
	hashed, ok := d.names[name]
	if !ok {
		return "", fmt.Errorf("shell.html names %s, which the pack step does not make", name)
	}
	return hashed, nil
}

// addIndex fills the shell with the first paint: the page as the program will
// draw it, in the shop's first language.
func (p *Page) addIndex(site fs.FS, s keep.Shop, n names) error {
	paint, err := firstPaint(&s, s.Languages[0])
	if err != nil {
		return fmt.Errorf("draw the first paint: %w", err)
	}
	shell, err := template.ParseFS(site, "shell.html")
	if err != nil {
		return err
	}
	var page bytes.Buffer
	err = shell.Execute(&page, shellData{
		Lang: s.Languages[0], Title: s.Name, Policy: Policy, Paper: paper, Slate: slate,
		FirstPaint: paint, names: n,
	})
	if err != nil {
		return err
	}
	return p.addPlain("index.html", page.Bytes(), true)
}

// firstPaint draws the page as HTML. Trees are escaped by their writer.
func firstPaint(s *keep.Shop, lang string) (template.HTML, error) {
	text, err := dom.HTML(view.Page(state.First(s, lang)))
	return template.HTML(text), err
}

// shopJSON writes the shop as the page reads it.
func shopJSON(s keep.Shop) ([]byte, error) {
	return json.Marshal(s)
}
