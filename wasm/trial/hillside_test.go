//go:build !js

package trial

import (
	"encoding/xml"
	"fmt"
	"math"
	"os"
	"strings"
	"testing"

	"github.com/chromedp/cdproto/browser"
	"github.com/chromedp/cdproto/emulation"
	"github.com/chromedp/cdproto/page"
	"github.com/chromedp/chromedp"

	"hillwright/wasm/words"
)

// glove is how large what is touched at the hillside must be at least [CSS px].
const glove = 56

// atFoot opens the page, and the hillside by one touch.
func atFoot(t testing.TB, d device) *tab {
	t.Helper()
	p := open(t, d)
	p.toHillside()
	return p
}

func (p *tab) toHillside() {
	p.t.Helper()
	p.tap(act("go", "hillside"))
	p.until("the hillside is open", `document.querySelector(".at-hillside") !== null`)
}

// lay has the tilt sensor say, again and again, that the phone lies with its
// top raised by an angle [°], with a small shake.
func (p *tab) lay(deg float64) {
	p.t.Helper()
	eval[bool](p, `(clearInterval(window.laid), window.laid = setInterval(() => dispatchEvent(new DeviceOrientationEvent("deviceorientation",
		{alpha: 0, beta: $1 + 0.06*(Math.random() - 0.5), gamma: 0})), 25), true)`, deg)
}

// tape measures 16 % with a tape over a metre.
func (p *tab) tape() {
	p.t.Helper()
	p.tap(act("measure", "tape"))
	p.shows("#side-measure", English.Say(words.AwakeNote))
	p.tap(act("pick", "tape=map"))
	for range 12 {
		p.tap(act("dial-up", "dial.rise"))
	}
	p.tap(act("read", ""))
	p.shows("#side-readings", "16.0")
}

// TestHillside goes the whole way at the foot of a pitch: by the phone laid
// down and turned, go or don't, the group, a reload, offline.
func TestHillside(t *testing.T) {
	for _, d := range devices {
		t.Run(d.name, func(t *testing.T) {
			p := atFoot(t, d)
			p.kept()
			p.lay(9.5)
			p.tap(act("measure", "tilt"))
			p.until("it shows what the sensor says", `document.querySelector("#side-live")?.textContent.includes("%")`)
			p.tap(act("average", ""))
			p.shows("#side-foot", English.Say(words.TiltTurned))
			p.lay(-8.5)
			p.until("the sensor says so", `document.querySelector("#side-live").textContent.startsWith("\u2212")`)
			p.tap(act("average", ""))
			// tan 9° is 15.8 %; the offset of half a degree has cancelled.
			p.until("the grade is read", `/^15\.[78]/.test(document.querySelector("#side-grade .huge")?.textContent)`)
			p.shows("#side-pitch", English.Say(words.WordGo))
			p.tap(act("measure", "choose"))
			p.tape()
			p.shows("#side-grade", English.Say(words.ReadTimes, "2"))
			p.tap(act("group", ""))
			p.tap(act("group-add", "heavy"))
			p.tap(act("group-add", "light"))
			p.shows("#side-group", English.Say(words.GroupWeakest))
			grade := p.text("#side-grade .huge")
			p.cut()
			p.reload()
			p.shows("#side-grade .huge", grade)
			p.shows("#side-group", English.Say(words.GroupWeakest))
			if n := eval[int](p, `document.querySelectorAll(".readings > li").length`); n != 2 {
				t.Errorf("after a reload without a network there are %d readings, want 2", n)
			}
			p.tap(act("set", "day.ground=asphalt-wet"))
			p.shows("#down", English.Say(words.CautionWet))
		})
	}
}

// TestTiltRefused has the browser refuse the sensor, and have none: the other
// ways are offered at once.
func TestTiltRefused(t *testing.T) {
	for how, script := range map[string]string{
		"refused": `DeviceOrientationEvent.requestPermission = () => Promise.resolve("denied")`,
		"absent":  `delete window.DeviceOrientationEvent`,
		"silent":  `void 0`,
	} {
		t.Run(how, func(t *testing.T) {
			p := newTab(t, phone, newHost(t, atRoot, false))
			call(p, page.AddScriptToEvaluateOnNewDocument, page.AddScriptToEvaluateOnNewDocumentParams{Source: script})
			p.visit()
			p.toHillside()
			p.tap(act("measure", "tilt"))
			want := words.SensorAbsent
			if how == "refused" {
				want = words.SensorRefused
			}
			p.shows("#side-measure", English.Say(want))
			p.tape()
			p.shows("#side-pitch", English.Say(words.WordGo))
		})
	}
}

// TestTiltGranted asks for the permission from the touch, and uses it.
func TestTiltGranted(t *testing.T) {
	p := newTab(t, phone, newHost(t, atRoot, false))
	call(p, page.AddScriptToEvaluateOnNewDocument, page.AddScriptToEvaluateOnNewDocumentParams{
		Source: `DeviceOrientationEvent.requestPermission = () => { window.askedByTouch = navigator.userActivation.isActive; return Promise.resolve("granted") }`,
	})
	p.visit()
	p.toHillside()
	p.lay(6)
	p.tap(act("measure", "sight"))
	p.until("it shows what the sensor says", `document.querySelector("#side-live")?.textContent.startsWith("10.5")`)
	if !eval[bool](p, `window.askedByTouch`) {
		t.Error("the permission was not asked for by a touch")
	}
	p.until("there is enough to go by", `document.querySelector("#side-measure .still") !== null`)
	p.tap(act("freeze", ""))
	p.lay(20)
	p.tap(act("once", ""))
	p.until("the frozen grade is read", `/^10\.[456]/.test(document.querySelector("#side-grade .huge")?.textContent)`)
}

// TestRecorded records a stretch by emulated locations, and has them refused.
func TestRecorded(t *testing.T) {
	p := atFoot(t, phone)
	allow := func(setting browser.PermissionSetting) {
		_, err := chromedp.CallBrowser(p.ctx, browser.SetPermission, browser.SetPermissionParams{
			Permission: &browser.PermissionDescriptor{Name: "geolocation"}, Setting: setting,
			BrowserContextID: chromedp.FromContext(p.ctx).BrowserContextID,
		})
		if err != nil {
			p.fatal(err)
		}
	}
	allow(browser.PermissionSettingDenied)
	p.tap(act("measure", "ride"))
	p.shows("#side-measure", English.Say(words.RideRefused))
	p.tap(act("measure", ""))
	allow(browser.PermissionSettingGranted)
	at := func(i int) {
		lat, lon, accuracy, height, own := 44+float64(i)*6/111111, 8.0, 4.0, 300+0.6*float64(i), 2.0
		call(p, emulation.SetGeolocationOverride, emulation.SetGeolocationOverrideParams{Latitude: &lat, Longitude: &lon, Accuracy: &accuracy, Altitude: &height, AltitudeAccuracy: &own})
	}
	at(0)
	p.tap(act("measure", "ride"))
	for i := range 25 {
		at(i)
		p.until(fmt.Sprint("fix ", i), `[...document.querySelectorAll("#side-measure .hint")].some(e => parseInt(e.textContent.split(": ")[1]) > $1)`, i)
	}
	p.until("there is a grade", `document.querySelector("#side-measure .huge") !== null`)
	p.tap(act("read", ""))
	p.until("it is read", `document.querySelector("#side-grade .huge") !== null`)
	var percent float64
	fmt.Sscanf(p.text("#side-grade .huge"), "%f", &percent)
	if math.Abs(percent-10) > 4 {
		t.Errorf("a stretch of 10 %% reads as %g %%", percent)
	}
}

// TestReadingsGoOut exports the readings, and makes a hill of them.
func TestReadingsGoOut(t *testing.T) {
	p := atFoot(t, phone)
	p.tape()
	if name, data := p.download(act("readings-csv", "")); !strings.HasSuffix(name, ".csv") || !strings.Contains(string(data), "place 1") {
		t.Errorf("%s: %.300s", name, data)
	}
	name, data := p.download(act("readings-gpx", ""))
	var file struct {
		Version string     `xml:"version,attr"`
		Points  []struct{} `xml:"trk>trkseg>trkpt"`
	}
	if err := xml.Unmarshal(data, &file); err != nil || file.Version != "1.1" || len(file.Points) < 2 {
		t.Errorf("%s: %v, %+v", name, err, file)
	}
	p.tap(act("dismiss", ""))
	p.tap(act("readings-hill", ""))
	p.tap(act("dismiss", ""))
	p.tap(act("go", "sentence"))
	p.shows("#sentence", "pitches of")
}

// TestHillsideForgets keeps on in memory where storage is refused, and says so.
func TestHillsideInMemory(t *testing.T) {
	p := newTab(t, phone, newHost(t, atRoot, false))
	call(p, page.AddScriptToEvaluateOnNewDocument, page.AddScriptToEvaluateOnNewDocumentParams{
		Source: `IDBFactory.prototype.open = () => { throw new DOMException("refused", "SecurityError") }`,
	})
	p.visit()
	p.tap(act("dismiss", ""))
	p.toHillside()
	p.tape()
	p.shows("#side-readings", English.Say(words.StorageRefused))
}

// TestHillsideFits looks for what is too small for a glove, cut off or faint,
// and has axe-core look, in every state and light, on every size.
func TestHillsideFits(t *testing.T) {
	landscape := device{"landscape", 740, 360, true}
	for _, d := range []device{phone, landscape, tablet, {"narrow", 320, 640, true}} {
		t.Run(d.name, func(t *testing.T) {
			p := atFoot(t, d)
			look := p.looker(glove)
			look("nothing measured")
			p.tape()
			p.speak(German) // the longer words
			p.tap(act("group", ""))
			p.tap(act("group-add", "heavy"))
			p.tap(act("group-add", "light"))
			p.until("they are answered", `document.querySelector(".weakest") !== null`)
			p.tap(`.reading-is`)
			for _, theme := range []string{"sun", "dusk"} {
				p.light(theme)
				look("answered, " + theme)
			}
			for _, size := range eval[[]float64](p, `[...document.querySelectorAll(".huge, .pitch-figures dd, .side-pitch .word")].map(e => parseFloat(getComputedStyle(e).fontSize))`) {
				if size < 28 {
					t.Errorf("a figure of %g px, want 28 at least", size)
				}
			}
			for _, way := range []string{"tilt", "sight", "tape", "wheel", "track"} {
				p.lay(8)
				p.tap(act("measure", "choose"))
				p.tap(act("measure", way))
				if way == "tilt" || way == "sight" {
					p.until("the sensor is heard", `document.querySelector("#side-live") !== null`)
				} else {
					p.until("it can be read", `document.querySelector("[data-act=read]") !== null`)
				}
				look("measuring by " + way)
				p.tap(act("measure", ""))
			}
		})
	}
}

// looker looks at a state of the page for what cannot be read, what a hand of
// some size [CSS px] would miss, and for what axe-core finds.
func (p *tab) looker(hand float64) func(state string) {
	p.t.Helper()
	axe, err := os.ReadFile(axeFile)
	if err != nil {
		p.fatal(fmt.Errorf("%w: run `cd testdata && npm ci --ignore-scripts`", err))
	}
	eval[bool](p, string(axe)+"; true")
	return func(state string) {
		p.t.Helper()
		p.until("nothing moves", `document.getAnimations().length === 0`)
		for _, fault := range eval[[]string](p, lookForFaults) {
			p.t.Errorf("%s: %s", state, fault)
		}
		for _, small := range eval[[]string](p, lookForSmall, hand) {
			p.t.Errorf("%s: %s", state, small)
		}
		for _, v := range p.violations() {
			p.t.Errorf("%s: %s", state, v)
		}
	}
}

// lookForSmall gives what a glove would miss.
const lookForSmall = `[...document.querySelectorAll("button, input, summary, [data-act=handle]")].filter(e => e.checkVisibility() && !e.closest(".unseen")).map(e => [e, e.getBoundingClientRect()])
	.filter(([e, b]) => b.width < $1 - 0.5 || b.height < $1 - 0.5)
	.map(([e, b]) => (e.textContent || e.outerHTML).slice(0, 60) + " is " + Math.round(b.width) + " × " + Math.round(b.height))`
