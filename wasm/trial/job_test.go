//go:build !js

package trial

import (
	"math"
	"os"
	"testing"

	"github.com/chromedp/cdproto/storage"

	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/wasm/draw"
	"hillwright/wasm/keep"
	"hillwright/wasm/words"
)

// TestMainJob goes the whole way from first load to answer, and once more with
// the network cut: on a phone under a path of a dumb host, on a tablet at the
// root of a good one.
func TestMainJob(t *testing.T) {
	for _, each := range []struct {
		device device
		prefix string
		dumb   bool
	}{{phone, below, true}, {tablet, atRoot, false}} {
		t.Run(each.device.name, func(t *testing.T) {
			p := newTab(t, each.device, newHost(t, each.prefix, each.dumb))
			p.visit()
			p.answers(newAsked(t, "", "", "", "", ""))
			job{p, newAsked(t, "", "", "", "", ""), " (first)"}.goThrough()
			p.kept()
			p.cut()
			p.reload()
			p.speak(English)
			job{p, newAsked(t, "", "", "", "", ""), " (offline)"}.goThrough()
		})
	}
}

// job is the main job in one page; names of what is kept end with ending.
type job struct {
	*tab
	asked  *asked
	ending string
}

func (j job) goThrough() {
	j.t.Helper()
	j.choose()
	j.change()
	j.pictures()
	j.typeSections()
	j.readTrack()
	j.keepAndFind()
	j.exportAndImport()
	j.dress()
}

// choose takes another of everything by touching the blanks.
func (j job) choose() {
	j.t.Helper()
	for _, each := range []struct {
		kind keep.Kind
		id   string
	}{{keep.Bike, "city-hub"}, {keep.Rider, "strong"}, {keep.Load, "child"}, {keep.Day, "winter"}} {
		j.tap(act("open", string(each.kind)))
		j.tap(act("choose", string(each.kind)+":"+each.id))
		j.asked.take(each.kind, each.id)
	}
	j.tap(act("open", "hill"))
	j.tap(act("choose", "hill:mill-lane"))
	j.asked.climb("mill-lane")
	j.answers(j.asked)
}

// change steps a value, types one, and types what is none.
func (j job) change() {
	j.t.Helper()
	const path = "rider.mass_kg"
	j.tap(act("path", path))
	kg, _ := j.asked.q.Value(path)
	step := j.asked.voice.Step(path)
	j.tap(act("step-up", path))
	j.asked.set(path, words.Voice{}.Number((math.Floor(kg/step)+1)*step, 3))
	j.answers(j.asked)
	j.typeOver(act("type", path), "96.5")
	j.asked.set(path, "96.5")
	j.answers(j.asked)
	j.typeOver(act("type", path), "heavy")
	j.until("the field says what is wrong", `document.querySelector($1).getAttribute("aria-invalid") === "true"
		&& document.querySelector(".editor .problem").textContent.includes("heavy")`, act("type", path))
	j.answers(j.asked) // stays
	j.typeOver(act("type", path), "88")
	j.asked.set(path, "88")
	j.answers(j.asked)
	j.tap(act("close", ""))
	j.shows(act("path", path), j.asked.voice.Mass(88))
}

// pictures opens the pull diagram and drags on the other two.
func (j job) pictures() {
	j.t.Helper()
	c, v := j.asked.answer(), j.asked.voice
	fresh := c.rig.Fresh(j.asked.q.Ride.Charge)
	running, _ := ride.Settle(c.rig, ride.At(c.Balance.Grade, j.asked.q.Day.WindMps), &fresh, j.asked.q.Ride.DownMps)
	if eval[string](j.tab, `document.querySelector('[data-act=pull]').getAttribute("aria-expanded")`) == "false" {
		j.tap(act("pull", ""))
	}
	j.until("the pull diagram is drawn", `document.querySelector("#pull svg path") !== null`)
	j.same("#pull table", draw.PullText(c.rig, c.Balance.Grade, running, v).Words())
	j.same("#section table", draw.SectionText(j.asked.road, c.Answer, c.rig, v).Words())
	j.same("#balance table", draw.BalanceText(&c.Balance, v).Words())

	at := j.dragOn("#section .touch", 0.05, 0.21)
	staff := draw.SectionAt(j.asked.road, c.Answer, at.size, at.x)
	j.shows("#staff-reading", v.Length(staff.AtM))
	at = j.dragOn("#balance .weight", -0.03, -0.12)
	j.shows("#balance-reading", v.Pull(draw.BalancePull(&c.Balance, at.size, at.x)))
	j.tap(act("weight-back", ""))
	j.until("the weight is back", `document.querySelector("[data-act=weight-back]") === null`)
}

// finger is where a finger was lifted, in the picture's own measures.
type finger struct {
	size draw.Size
	x    float64
}

// dragOn drags on a picture and tells where that ended.
func (j job) dragOn(selector string, by ...float64) finger {
	j.t.Helper()
	s := j.spotOf(selector)
	box := eval[struct{ Left, Wide, W, H float64 }](j.tab, `(() => { const p = document.querySelector($1).ownerSVGElement, b = p.getBoundingClientRect();
		return {Left: b.left, Wide: b.width, W: p.viewBox.baseVal.width, H: p.viewBox.baseVal.height} })()`, selector)
	j.drag(selector, by...)
	end := s.X + by[len(by)-1]*box.Wide
	return finger{draw.Size{W: box.W, H: box.H}, (end - box.Left) / box.Wide * box.W}
}

func (j job) typeSections() {
	j.t.Helper()
	j.tap(act("open", "hill"))
	for _, text := range []string{"250 m at 6 %", "400 m at 7 %, 60 m at 18 %"} {
		j.typeOver("#sections", text)
		j.asked.typed(text)
		j.answers(j.asked)
	}
	j.typeOver("#sections", "400 m at 7 %, 60 m up")
	j.until("the field says what is wrong", `document.querySelector("#sections").getAttribute("aria-invalid") === "true"
		&& document.querySelector("#sections-note .problem").textContent !== ""`)
	j.answers(j.asked) // stays
	j.typeOver("#sections", "400 m at 7 %, 60 m at 18 %")
	j.until("the field is right", `document.querySelector("#sections").getAttribute("aria-invalid") === "false"`)
	j.answers(j.asked)
	j.typeOver("#name-hill", "Two pitches"+j.ending)
	j.tap(act("keep", "hill"))
	j.shows(act("open", "hill"), "Two pitches"+j.ending)
}

// realTrack is a recorded ride of a registry package, which the lock file of
// testdata names.
const realTrack = "../../testdata/node_modules/stoplight/gpx/sample-ride.gpx"

// readRide makes a hill of a track file as the terminal does.
func readRide(t testing.TB, file string) *hill.Profile {
	t.Helper()
	in, err := os.Open(file)
	if err != nil {
		t.Fatalf("%v: run `cd testdata && npm ci --ignore-scripts`", err)
	}
	defer in.Close()
	track, err := hill.ReadTrack(in, nil)
	if err != nil {
		t.Fatal(err)
	}
	road, err := hill.FromTrack(&track, hill.Options{})
	if err != nil {
		t.Fatal(err)
	}
	return &road
}

func (j job) readTrack() {
	j.t.Helper()
	j.asked.road = readRide(j.t, realTrack)
	j.tap(act("open", "hill"))
	j.pick(act("track-pick", ""), realTrack)
	j.answers(j.asked)
	for _, note := range j.asked.road.Notes {
		j.shows("#cautions", j.asked.voice.Note(note))
	}
}

// keepAndFind keeps the bike and the rider as they are and finds them, and the
// hills, after a reload.
func (j job) keepAndFind() {
	j.t.Helper()
	for _, kind := range []string{"bike", "rider"} {
		j.tap(act("open", kind))
		if kind == "bike" { // nothing was changed: only the full list offers to keep it
			j.tap(act("all", kind))
		}
		j.typeOver("#name-"+kind, "My "+kind+j.ending)
		j.tap(act("keep", kind))
		j.shows(act("open", kind), "My "+kind+j.ending)
	}
	j.stored(4)
	j.reload()
	j.find()
}

// stored waits until the device holds at least so many things: what was just
// kept is written beside the page.
func (j job) stored(n int) {
	j.t.Helper()
	eval[bool](j.tab, `new Promise((done, fail) => {
		const open = indexedDB.open("hillwright " + new URL("./", document.baseURI).pathname);
		open.onerror = () => fail(open.error);
		open.onsuccess = () => { const count = () => {
			const asked = open.result.transaction("things").objectStore("things").count();
			asked.onsuccess = () => asked.result >= $1 ? (open.result.close(), done(true)) : requestAnimationFrame(count); };
			count(); } })`, n)
}

// find sees that everything kept is there and chosen.
func (j job) find() {
	j.t.Helper()
	j.shows(act("open", "bike"), "My bike"+j.ending)
	j.shows(act("open", "rider"), "My rider"+j.ending)
	j.answers(j.asked)
	j.tap(act("open", "kept"))
	for _, name := range []string{"My bike", "My rider", "Two pitches"} {
		j.shows("#place", name+j.ending)
	}
	j.tap(act("close", ""))
}

// exportAndImport writes everything to a file, empties the device, and reads
// the file.
func (j job) exportAndImport() {
	j.t.Helper()
	j.tap(act("open", "kept"))
	name, data := j.download(act("export", ""))
	got, faults := keep.Decode(data)
	if len(faults) > 0 || len(got.Hills) < 2 || len(got.Things) < 2 {
		j.t.Errorf("the file %s holds %d things and %d hills, with faults %v", name, len(got.Things), len(got.Hills), faults)
	}
	call(j.tab, storage.ClearDataForOrigin, storage.ClearDataForOriginParams{Origin: origin(j.host.URL), StorageTypes: "indexeddb"})
	j.reload()
	j.tap(act("open", "kept"))
	j.shows("#place", j.asked.voice.Say(words.KeptNone))
	file := j.t.TempDir() + "/" + name
	if err := os.WriteFile(file, data, 0o600); err != nil {
		j.fatal(err)
	}
	j.pick(act("import-pick", ""), file)
	j.shows("#place", "My bike"+j.ending)
	for _, kind := range []keep.Kind{keep.Bike, keep.Rider} {
		j.tap(act("open", string(kind)))
		for _, thing := range got.Things {
			if thing.Kind == kind && thing.Name("en") == "My "+string(kind)+j.ending {
				j.tap(act("choose", string(kind)+":"+thing.ID))
			}
		}
	}
	// Load, day and hill are the shop's first again.
	j.asked.take(keep.Load, "")
	j.asked.take(keep.Day, "")
	j.asked.climb("")
	j.stored(len(got.Things) + len(got.Hills))
	j.reload()
	j.find()
}

// English and German are how a page speaks that was told the language alone.
var (
	English = words.Voice{}
	German  = words.Voice{Lang: words.German, Comma: true}
)

// speak sets language and units, and the light of the sun.
func (p *tab) speak(v words.Voice) {
	p.t.Helper()
	p.tap(act("open", "settings"))
	units := "metric"
	if v.Units == words.Imperial {
		units = "imperial"
	}
	p.tap(act("language", v.Lang.Tag()))
	p.tap(act("units", units))
	p.until("the page is in "+v.Lang.Tag(), `document.documentElement.lang === $1`, v.Lang.Tag())
	p.until("the units are "+units, `document.querySelector($1).getAttribute("aria-pressed") === "true"`, act("units", units))
	p.tap(act("close", ""))
}

// light sets the theme.
func (p *tab) light(theme string) {
	p.t.Helper()
	p.tap(act("open", "settings"))
	p.tap(act("theme", theme))
	p.until("the theme is "+theme, `document.documentElement.dataset.theme === $1`, theme)
	p.tap(act("close", ""))
}

func (j job) dress() {
	j.t.Helper()
	j.asked.voice = German
	j.speak(German)
	j.answers(j.asked)
	j.asked.voice.Units = words.Imperial
	j.speak(j.asked.voice)
	j.answers(j.asked)
	day := eval[string](j.tab, `getComputedStyle(document.body).backgroundColor`)
	j.light("dusk")
	if dusk := eval[string](j.tab, `getComputedStyle(document.body).backgroundColor`); dusk == day {
		j.t.Errorf("paper stays %s at dusk", day)
	}
	j.light("sun")
}
