// Command tiny stands in for the page's program in the tests of what starts
// it: it takes the taps that came before, and answers as a worker.
package main

import "syscall/js"

func main() {
	global := js.Global()
	if global.Get("hillwrightWorker").Truthy() {
		answer := func(message js.Value) { global.Call("postMessage", "got "+message.String()) }
		global.Call("addEventListener", "message", js.FuncOf(func(_ js.Value, args []js.Value) any {
			answer(args[0].Get("data"))
			return nil
		}))
		early := global.Get("hillwrightEarly")
		global.Set("hillwrightEarly", nil)
		for i := range early.Length() {
			answer(early.Index(i))
		}
		select {}
	}
	taps := global.Get("hillwrightTaps")
	global.Set("hillwrightTaps", nil)
	said := global.Get("JSON").Call("stringify", taps).String()
	global.Get("document").Get("documentElement").Get("dataset").Set("said", said)
	if global.Get("location").Get("hash").String() == "#stop" {
		return
	}
	select {}
}
