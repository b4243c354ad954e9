//go:build !js

package trial

import (
	"fmt"
	"testing"

	"github.com/chromedp/chromedp"
)

// TestFits looks for what is wider than the screen, cut off, or written too
// faintly, on narrow and wide screens in every main state.
func TestFits(t *testing.T) {
	for _, wide := range []int64{320, 360, 768, 1024} {
		t.Run(fmt.Sprint(wide), func(t *testing.T) {
			p := open(t, device{fmt.Sprint(wide), wide, 740, wide < 500})
			p.speak(German) // the longer words
			p.tap(act("pull", ""))
			for _, theme := range []string{"sun", "dusk"} {
				p.light(theme)
				p.inEachRoom(func(room string) {
					for _, fault := range eval[[]string](p, lookForFaults) {
						t.Errorf("%s, %s: %s", theme, room, fault)
					}
				})
			}
		})
	}
}

// lookForFaults gives what a person could not read: the page scrolling
// sideways, words cut off by their box or by the edge of the screen, and words
// whose contrast with what lies behind them is below 7:1 (WCAG 2.2, 1.4.6; the
// formulas are those of its glossary).
const lookForFaults = `(() => {
	const faults = new Set(), root = document.documentElement;
	if (root.scrollWidth > root.clientWidth) faults.add("the page is " + root.scrollWidth + " px wide on a screen of " + root.clientWidth);
	const lightness = c => { const [r, g, b] = c.map(v => (v /= 255) <= 0.04045 ? v/12.92 : ((v + 0.055)/1.055)**2.4); return 0.2126*r + 0.7152*g + 0.0722*b };
	const colour = text => { const n = text.match(/[\d.]+/g).map(Number); return n.length > 3 && n[3] === 0 ? null : n.slice(0, 3) };
	const behind = e => { for (; e; e = e.parentElement) { const c = colour(getComputedStyle(e).backgroundColor); if (c) return c } return [255, 255, 255] };
	const walk = document.createTreeWalker(document.body, NodeFilter.SHOW_TEXT);
	for (let n; (n = walk.nextNode()); ) {
		const e = n.parentElement, words = n.textContent.trim();
		if (!words || e.closest(".unseen, [hidden], .table-room, defs") || !e.checkVisibility({visibilityProperty: true})) continue;
		const range = document.createRange(); range.selectNodeContents(n);
		const svg = e.closest("svg"), box = svg ? e.getBoundingClientRect() : range.getBoundingClientRect();
		if (box.width === 0) continue;
		const told = JSON.stringify(words.slice(0, 40)) + " in " + (e.closest("[id]")?.id || e.tagName);
		if (box.left < -0.5 || box.right > root.clientWidth + 0.5) faults.add(told + " goes off the screen");
		for (let cut = e; cut && cut !== document.body; cut = cut.parentElement) {
			const style = getComputedStyle(cut);
			if (style.overflowX !== "visible" && cut.scrollWidth > cut.clientWidth + 1) faults.add(told + " is cut off");
		}
		const style = getComputedStyle(e), ink = colour(svg ? style.fill : style.color);
		if (!ink || (svg && e.classList.contains("on-ink"))) continue;
		const a = lightness(ink), b = lightness(behind(e)), ratio = (Math.max(a, b) + 0.05)/(Math.min(a, b) + 0.05);
		if (ratio < 7) faults.add(told + " has a contrast of " + ratio.toFixed(2) + ":1");
	}
	return [...faults];
})()`

// TestPrinted prints the answer: one page or two, with the verdict on them.
func TestPrinted(t *testing.T) {
	p := open(t, phone)
	c := newAsked(t, "", "", "", "", "").answer()
	made, err := chromedp.Run(p.ctx, chromedp.PrintToPDF())
	if err != nil {
		t.Fatal(err)
	}
	sheet := readPDF(made)
	if sheet.pages < 1 || sheet.pages > 2 {
		t.Errorf("%d pages, want one or two", sheet.pages)
	}
	for _, want := range []string{English.Verdict(c.Verdict), English.Headroom(c.Balance.Headroom()), English.Limit(c.Balance.Pegs[0].Limit)} {
		if !sheet.has(want) {
			t.Errorf("the printed page does not have %q", want)
		}
	}
	if sheet.has("no such words") {
		t.Error("the reader of the printed page finds what is not there")
	}
}
