package build

import (
	"bytes"
	"fmt"

	"github.com/tdewolff/minify/v2"
	"github.com/tdewolff/minify/v2/css"
	"github.com/tdewolff/minify/v2/html"
	"github.com/tdewolff/minify/v2/js"
	"github.com/tdewolff/minify/v2/json"
	"github.com/tdewolff/minify/v2/svg"
)

// minified makes a file smaller without changing what it means; files of kinds
// that it does not know come back as they are, and so does Go's own script,
// which bears its licence and must be the one of the Go that compiled. Values that are HTML's defaults
// stay: <input type=text> without its type would escape the style sheet.
func minified(name string, data []byte) ([]byte, error) {
	if name == "wasm_exec.js" {
		return data, nil
	}
	m := minify.New()
	m.Add("text/html", &html.Minifier{KeepDefaultAttrVals: true, KeepDocumentTags: true, KeepEndTags: true, KeepQuotes: true})
	m.Add("text/css", &css.Minifier{})
	m.Add("text/javascript", &js.Minifier{})
	m.Add("application/json", &json.Minifier{KeepNumbers: true})
	m.Add("application/manifest+json", &json.Minifier{KeepNumbers: true})
	m.Add("image/svg+xml", &svg.Minifier{})
	var out bytes.Buffer
	err := m.Minify(MediaType(name), &out, bytes.NewReader(data))
	if err == minify.ErrNotExist {
		return data, nil
	}
	if err != nil {
		return nil, fmt.Errorf("make %s smaller: %w", name, err)
	}
	return out.Bytes(), nil
}
