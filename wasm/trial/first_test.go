//go:build !js

package trial

import (
	"testing"
)

// place is where a part of the page lies [CSS px].
type place struct {
	Name               string
	X, Y, Wide, Height float64
}

// places gives where every part of the page lies.
func (p *tab) places() []place {
	p.t.Helper()
	return eval[[]place](p, `[...document.querySelectorAll("[data-region], .blank, h1, h2, svg.picture")].filter(e => !e.matches("svg *"))
		.map(e => { const b = e.getBoundingClientRect(); return {Name: e.id || e.textContent.slice(0, 20), X: b.x, Y: b.y, Wide: b.width, Height: b.height} })`)
}

// TestFirstPaint holds the program back: the answer must be in what the host
// sends, and nothing may move when the program takes over.
func TestFirstPaint(t *testing.T) {
	for _, d := range devices {
		t.Run(d.name, func(t *testing.T) {
			p := newTab(t, d, newHost(t, atRoot, false))
			p.host.hold()
			p.load()
			p.until("the first paint", `performance.getEntriesByName("first-contentful-paint").length === 1`)
			if eval[bool](p, `window.hillwrightTaps === null`) {
				t.Fatal("the program runs, though its file was held back")
			}
			p.answers(newAsked(t, "", "", "", "", ""))
			before, words := p.places(), p.text("main")
			p.host.letGo()
			p.ready()
			p.until("two frames are past", `(window.frames2 = (window.frames2 || 0) + 1) > 2`)
			after := p.places()
			if len(after) != len(before) {
				t.Fatalf("%d parts before the program, %d after", len(before), len(after))
			}
			for i, b := range before {
				if a := after[i]; a.Name != b.Name || off(a.X, b.X) || off(a.Y, b.Y) || off(a.Wide, b.Wide) || off(a.Height, b.Height) {
					t.Errorf("the page jumps: %+v became %+v", b, a)
				}
			}
			// A wider picture names more places along the road.
			if got := p.text("main"); d == phone && bare(got) != bare(words) {
				t.Errorf("the words change:\n%s\n%s", words, got)
			}
			shift := eval[float64](p, `new Promise(done => { let sum = 0;
				const watch = new PerformanceObserver(() => {});
				watch.observe({type: "layout-shift", buffered: true});
				for (const e of watch.takeRecords()) sum += e.value;
				done(sum); })`)
			if shift > 0.01 {
				t.Errorf("layout shift %.3f, want none", shift)
			}
		})
	}
}

// off tells that two places differ by more than what rounding to device
// pixels makes.
func off(a, b float64) bool { return a-b > 1 || b-a > 1 }

// TestEarlyTap touches a blank before the program is there: it opens once it
// is.
func TestEarlyTap(t *testing.T) {
	p := newTab(t, phone, newHost(t, atRoot, false))
	p.host.hold()
	p.load()
	p.tap(act("open", "bike"))
	p.until("the touch is kept", `window.hillwrightTaps.length === 1`)
	p.host.letGo()
	p.ready()
	p.tap(act("choose", "bike:plain"))
	p.answers(newAsked(t, "plain", "", "", "", ""))
}
