//go:build js && wasm

// Command wasm is the page's program. The same program runs in the page and,
// for long work, in a worker beside it.
package main

import (
	"syscall/js"

	"hillwright/wasm/device"
	"hillwright/wasm/keep"
	"hillwright/wasm/page"
)

func main() {
	if device.IsWorker() {
		device.Work()
		return
	}
	shop, faults := keep.DecodeShop([]byte(js.Global().Get("hillwrightShop").String()))
	if shop == nil {
		panic(faults[0])
	}
	page.Start(shop)
	select {} // the page's listeners do the rest
}
