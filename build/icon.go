package build

import (
	"bytes"
	"fmt"
	"image"
	"image/color"
	"image/png"
	"math"
	"strings"
)

// The mark, our own: a cut through rising ground, hatched, and above it the
// bracket that a surveyor draws over the stretch that counts. It is drawn on a
// square of side 1, y downwards, and given as SVG and as PNG from the same
// figures.

// icon is one PNG of the mark. scale is how much of the square the mark fills;
// purpose is what the manifest says, empty where it does not name the icon.
type icon struct {
	name    string
	side    int
	scale   float64
	purpose string
}

func (i icon) sizes() string { return fmt.Sprintf("%dx%d", i.side, i.side) }

// Devices cut a maskable icon to a circle of 80 % of its side, whatever is
// outside is lost (W3C Web Application Manifest, "Icon masks and safe zone").
var icons = []icon{
	{"icon-192.png", 192, 1, "any"},
	{"icon-512.png", 512, 1, "any"},
	{"icon-mask-512.png", 512, 0.66, "maskable"},
	{"apple-touch-icon.png", 180, 0.85, ""},
}

type point struct{ x, y float64 }

// ground is the cut: along the bottom, up the steep pitch, over the crest.
var ground = []point{{0.08, 0.88}, {0.08, 0.76}, {0.40, 0.66}, {0.68, 0.40}, {0.92, 0.34}, {0.92, 0.88}}

// bracket lies over the steep pitch: two ends and the bar between them.
var bracket = []point{{0.33, 0.58}, {0.26, 0.50}, {0.54, 0.24}, {0.61, 0.32}}

const (
	outline  = 0.045 // width of the ground's edge and of the bracket
	hatching = 0.095 // from one line of the hatching to the next, across them
	hatch    = 0.026 // width of a line of the hatching
)

var (
	inkColour   = color.RGBA{0x2b, 0x2a, 0x27, 0xff}
	paperColour = color.RGBA{0xf4, 0xef, 0xe2, 0xff}
	markColour  = color.RGBA{0xa8, 0x3f, 0x1f, 0xff}
)

// iconSVG gives the mark as SVG.
func iconSVG() []byte {
	var b strings.Builder
	b.WriteString(`<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 100 100">`)
	fmt.Fprintf(&b, `<path fill="%s" d="M0 0h100v100H0z"/>`, hexColour(paperColour))
	fmt.Fprintf(&b, `<clipPath id="g"><path d="%sz"/></clipPath>`, pathOf(ground))
	fmt.Fprintf(&b, `<path clip-path="url(#g)" fill="none" stroke="%s" stroke-width="%.4g" d="`, hexColour(inkColour), 100*hatch)
	// Lines fall at 45°: x − y is constant along each, a step apart is √2 wider.
	for d := -1.0; d < 1; d += hatching * math.Sqrt2 {
		fmt.Fprintf(&b, "M%.4g 0l100 100", 100*d)
	}
	b.WriteString(`"/>`)
	fmt.Fprintf(&b, `<g fill="none" stroke-linejoin="round" stroke-linecap="round" stroke-width="%.4g">`, 100*outline)
	fmt.Fprintf(&b, `<path stroke="%s" d="%sz"/>`, hexColour(inkColour), pathOf(ground))
	fmt.Fprintf(&b, `<path stroke="%s" d="%s"/></g></svg>`, hexColour(markColour), pathOf(bracket))
	return []byte(b.String())
}

func pathOf(points []point) string {
	var b strings.Builder
	for i, p := range points {
		letter := "L"
		if i == 0 {
			letter = "M"
		}
		fmt.Fprintf(&b, "%s%.4g %.4g", letter, 100*p.x, 100*p.y)
	}
	return b.String()
}

func hexColour(c color.RGBA) string { return fmt.Sprintf("#%02x%02x%02x", c.R, c.G, c.B) }

// samples per pixel and direction smooth the edges.
const samples = 4

// iconPNG gives the mark as PNG. Pixels whose four corners are alike are not
// sampled further: the mark's lines are wider than a pixel.
func iconPNG(i icon) ([]byte, error) {
	corners := make([]color.RGBA, 0, (i.side+1)*(i.side+1))
	for y := range i.side + 1 {
		for x := range i.side + 1 {
			corners = append(corners, i.colour(float64(x), float64(y)))
		}
	}
	picture := image.NewRGBA(image.Rect(0, 0, i.side, i.side))
	for y := range i.side {
		for x := range i.side {
			at := y*(i.side+1) + x
			c := corners[at]
			if c != corners[at+1] || c != corners[at+i.side+1] || c != corners[at+i.side+2] {
				c = i.mixed(x, y)
			}
			picture.SetRGBA(x, y, c)
		}
	}
	var out bytes.Buffer
	encoder := png.Encoder{CompressionLevel: png.BestCompression}
	err := encoder.Encode(&out, picture)
	return out.Bytes(), err
}

// mixed is the mean colour of a pixel.
func (i icon) mixed(x, y int) color.RGBA {
	var r, g, b int
	for s := range samples * samples {
		c := i.colour(float64(x)+(float64(s%samples)+0.5)/samples, float64(y)+(float64(s/samples)+0.5)/samples)
		r, g, b = r+int(c.R), g+int(c.G), b+int(c.B)
	}
	const n = samples * samples
	return color.RGBA{uint8(r / n), uint8(g / n), uint8(b / n), 0xff}
}

// colour is the mark's colour at a place counted in pixels.
func (i icon) colour(x, y float64) color.RGBA {
	side := float64(i.side)
	return colourAt(point{(x/side-0.5)/i.scale + 0.5, (y/side-0.5)/i.scale + 0.5})
}

// colourAt is the mark's colour at a point of the square.
func colourAt(p point) color.RGBA {
	if nearLine(p, bracket, false) {
		return markColour
	}
	if nearLine(p, ground, true) {
		return inkColour
	}
	if inside(p, ground) && onHatching(p) {
		return inkColour
	}
	return paperColour
}

func onHatching(p point) bool {
	step := hatching * math.Sqrt2
	off := math.Mod(p.x-p.y+1, step)
	return math.Min(off, step-off)/math.Sqrt2 <= hatch/2
}

// nearLine tells whether a point lies on a line's stroke.
func nearLine(p point, line []point, closed bool) bool {
	for i := range line {
		if i == 0 && !closed {
			continue
		}
		a := line[(i+len(line)-1)%len(line)]
		if distance(p, a, line[i]) <= outline/2 {
			return true
		}
	}
	return false
}

// distance is from a point to the stretch from a to b.
func distance(p, a, b point) float64 {
	dx, dy := b.x-a.x, b.y-a.y
	t := ((p.x-a.x)*dx + (p.y-a.y)*dy) / (dx*dx + dy*dy)
	t = math.Max(0, math.Min(1, t))
	return math.Hypot(p.x-a.x-t*dx, p.y-a.y-t*dy)
}

// inside counts the edges to the right of a point: odd means inside.
func inside(p point, area []point) bool {
	in := false
	for i, b := range area {
		a := area[(i+len(area)-1)%len(area)]
		if (a.y > p.y) != (b.y > p.y) && p.x < a.x+(p.y-a.y)/(b.y-a.y)*(b.x-a.x) {
			in = !in
		}
	}
	return in
}
