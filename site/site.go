// Package site holds what of the page is not Go: its shell, styles, scripts,
// and the demo shop. Start with Files and DemoShop.
package site

import (
	"embed"
	"io/fs"
)

//go:embed shell.html *.css *.js
var files embed.FS

//go:embed shop
var demo embed.FS

// Files holds shell.html, style.css, boot.js, worker.js, recorder.js and sw.js.
func Files() fs.FS { return files }

// DemoShop is the folder of the demo shop, as build/shop reads it.
func DemoShop() fs.FS {
	shop, err := fs.Sub(demo, "shop")
	if err != nil {
		panic(err) // the name is valid: it is the one embedded above
	}
	return shop
}
