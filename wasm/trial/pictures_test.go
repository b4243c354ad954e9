//go:build !js

package trial

import (
	"bytes"
	"image"
	"image/color"
	"image/png"
	"os"
	"path/filepath"
	"slices"
	"testing"

	"github.com/chromedp/chromedp"
)

// picturesFolder holds the README's pictures.
const picturesFolder = "../../testdata/pictures"

// TestPictures takes the README's pictures: phone and tablet, by day and at
// dusk. `make pictures` runs it.
func TestPictures(t *testing.T) {
	if os.Getenv("HILLWRIGHT_PICTURES") == "" {
		t.Skip("writes the README's pictures: HILLWRIGHT_PICTURES=1 runs it")
	}
	if err := os.MkdirAll(picturesFolder, 0o755); err != nil {
		t.Fatal(err)
	}
	for _, d := range devices {
		for _, theme := range []string{"sun", "dusk"} {
			p := open(t, d)
			p.light(theme)
			p.tap(act("open", "hill"))
			p.tap(act("choose", "hill:mill-lane"))
			p.answers(newAsked(t, "", "", "", "", "mill-lane"))
			p.drag("#section .touch", 0.05, -0.08)
			p.until("the staff stands", `document.querySelector("#section .staff[transform]") !== null`)
			if d.mobile { // down to the end of the section
				tall := eval[float64](p, `document.querySelector("#section").getBoundingClientRect().bottom + scrollY`)
				p.do(chromedp.EmulateViewport(d.wide, int64(tall), chromedp.EmulateScale(2), chromedp.EmulateTouch, chromedp.EmulateMobile))
			}
			eval[bool](p, `(scrollTo({top: 0, behavior: "instant"}), document.activeElement.blur(), new Promise(done => requestAnimationFrame(() => done(true))))`)
			p.take(d.name + "-" + theme + ".png")
		}
	}
}

// TestBenchPicture takes the README's picture of the bench.
func TestBenchPicture(t *testing.T) {
	if os.Getenv("HILLWRIGHT_PICTURES") == "" {
		t.Skip("writes the README's pictures: HILLWRIGHT_PICTURES=1 runs it")
	}
	p := open(t, device{"phone", 360, 1000, true})
	p.light("sun")
	p.toBench()
	p.counts()
	p.hears("out-1.mp3")
	p.hears("back-1.mp3")
	eval[bool](p, `(document.querySelector("#side-foot").remove(), document.querySelector(".run").scrollIntoView({block: "center", behavior: "instant"}),
		document.activeElement.blur(), new Promise(done => requestAnimationFrame(() => done(true))))`)
	p.take("bench-sun.png")
}

// take writes what the screen shows.
func (p *tab) take(name string) {
	p.t.Helper()
	shot, err := chromedp.Run(p.ctx, chromedp.CaptureScreenshot())
	if err != nil {
		p.fatal(err)
	}
	full, err := png.Decode(bytes.NewReader(shot))
	if err != nil {
		p.fatal(err)
	}
	out, err := os.Create(filepath.Join(picturesFolder, name))
	if err != nil {
		p.fatal(err)
	}
	defer out.Close()
	encoder := png.Encoder{CompressionLevel: png.BestCompression}
	if err := encoder.Encode(out, fewColours(full)); err != nil {
		p.fatal(err)
	}
}

// fewColours keeps the 256 colours that a picture uses most, and gives every
// other pixel the nearest of them: the page is flat, its edges alone have more.
func fewColours(from image.Image) *image.Paletted {
	count := map[color.RGBA]int{}
	box := from.Bounds()
	at := func(x, y int) color.RGBA { return color.RGBAModel.Convert(from.At(x, y)).(color.RGBA) }
	for y := box.Min.Y; y < box.Max.Y; y++ {
		for x := box.Min.X; x < box.Max.X; x++ {
			count[at(x, y)]++
		}
	}
	colours := make([]color.RGBA, 0, len(count))
	for c := range count {
		colours = append(colours, c)
	}
	slices.SortFunc(colours, func(a, b color.RGBA) int {
		if count[a] != count[b] {
			return count[b] - count[a]
		}
		return int(a.R)<<16 + int(a.G)<<8 + int(a.B) - int(b.R)<<16 - int(b.G)<<8 - int(b.B)
	})
	var palette color.Palette
	for _, c := range colours[:min(256, len(colours))] {
		palette = append(palette, c)
	}
	nearest := map[color.RGBA]uint8{}
	out := image.NewPaletted(box, palette)
	for y := box.Min.Y; y < box.Max.Y; y++ {
		for x := box.Min.X; x < box.Max.X; x++ {
			c := at(x, y)
			index, known := nearest[c]
			if !known {
				index = uint8(palette.Index(c))
				nearest[c] = index
			}
			out.SetColorIndex(x, y, index)
		}
	}
	return out
}
