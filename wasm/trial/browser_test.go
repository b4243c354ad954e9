//go:build !js

package trial

import (
	"context"
	"os"
	"sync"
	"testing"

	"github.com/chromedp/chromedp"
)

// running is the one browser of all tests.
var running struct {
	once sync.Once
	ctx  context.Context
	err  error
	ends []func()
}

// theBrowser starts the browser once. Whatever it asks of hosts other than
// this machine goes to the lookout, which answers nothing and remembers.
func theBrowser(t testing.TB) context.Context {
	t.Helper()
	path := browserPath(t)
	running.once.Do(func() {
		profile, err := os.MkdirTemp("", "hillwright-trial-")
		if err != nil {
			running.err = err
			return
		}
		address, closeLookout, err := lookout.open()
		if err != nil {
			running.err = err
			return
		}
		heard, err := fakeSound(profile)
		if err != nil {
			running.err = err
			return
		}
		flags := append(chromedp.DefaultExecAllocatorOptions[:],
			chromedp.ExecPath(path), chromedp.NoSandbox, chromedp.DisableGPU, chromedp.UserDataDir(profile),
			chromedp.Flag("disable-quic", true), chromedp.Flag("disable-component-update", true),
			chromedp.Flag("disable-features", "Translate,AutofillServerCommunication,OptimizationHints"),
			chromedp.Flag("lang", "en-GB"),
			chromedp.Flag("use-fake-ui-for-media-stream", true), chromedp.Flag("use-fake-device-for-media-stream", true),
			chromedp.Flag("use-file-for-fake-audio-capture", heard),
			chromedp.ProxyServer(address), chromedp.Flag("proxy-bypass-list", "127.0.0.1"))
		start, stop := chromedp.NewExecAllocator(context.Background(), flags...)
		ctx, end := chromedp.NewContext(start)
		running.ctx, running.err = ctx, chromedp.Do(ctx)
		running.ends = []func(){end, stop, closeLookout, func() { os.RemoveAll(profile) }}
	})
	if running.err != nil {
		t.Fatalf("chromium did not start: %v", running.err)
	}
	return running.ctx
}

func closeBrowser() {
	for _, end := range running.ends {
		end()
	}
}
