//go:build !js

package trial

import (
	"encoding/json"
	"os"
	"strings"
	"testing"

	"hillwright/wasm/words"
)

// axeFile is the accessibility checker of the lock file in testdata.
const axeFile = "../../testdata/node_modules/axe-core/axe.min.js"

// rooms are the main states of the page, each reached by touches from the
// closed page and left by closing.
var rooms = []struct {
	name string
	open []string
}{
	{"closed", nil},
	{"choosing a bike", []string{act("open", "bike")}},
	{"all of a bike", []string{act("open", "bike"), act("all", "bike")}},
	{"choosing a rider", []string{act("open", "rider")}},
	{"one value", []string{act("path", "rider.mass_kg")}},
	{"a value from a list", []string{act("open", "bike"), act("all", "bike"), act("path", "bike.motor.kind")}},
	{"choosing a load", []string{act("open", "load")}},
	{"choosing a hill", []string{act("open", "hill")}},
	{"choosing a day", []string{act("open", "day")}},
	{"how it is ridden", []string{act("open", "ride")}},
	{"what is kept", []string{act("open", "kept")}},
	{"settings", []string{act("open", "settings")}},
}

// inEachRoom opens every room in turn.
func (p *tab) inEachRoom(do func(name string)) {
	p.t.Helper()
	for _, room := range rooms {
		for _, each := range room.open {
			p.tap(each)
		}
		p.until(room.name+" is open", `(document.querySelector("[data-act=close]") !== null) === $1`, len(room.open) > 0)
		do(room.name)
		if len(room.open) > 0 {
			p.tap(act("close", ""))
		}
	}
}

// TestAccessible has axe-core look at every main state. Sizes, lights and
// languages are paired so that each meets each other one.
func TestAccessible(t *testing.T) {
	for _, each := range []struct {
		device device
		theme  string
		voice  words.Voice
	}{{phone, "sun", English}, {phone, "dusk", German}, {tablet, "sun", German}, {tablet, "dusk", English}} {
		t.Run(each.device.name+" "+each.theme+" "+each.voice.Lang.Tag(), func(t *testing.T) {
			browserPath(t)
			axe, err := os.ReadFile(axeFile)
			if err != nil {
				t.Fatalf("%v: run `cd testdata && npm ci --ignore-scripts`", err)
			}
			p := open(t, each.device)
			p.speak(each.voice)
			p.light(each.theme)
			p.tap(act("pull", ""))
			eval[bool](p, `(document.querySelectorAll("details").forEach(d => d.open = true), true)`)
			eval[bool](p, string(axe)+"; true")
			p.inEachRoom(func(room string) {
				for _, v := range p.violations() {
					t.Errorf("%s: %s", room, v)
				}
			})
		})
	}
}

func (p *tab) violations() []string {
	p.t.Helper()
	text := eval[string](p, `axe.run(document, {resultTypes: ["violations"]}).then(r => JSON.stringify(
		r.violations.map(v => v.id + ": " + v.help + ": " + v.nodes.map(n => n.target.join(" ") + " " + n.any.concat(n.all, n.none).map(c => c.message).join("; ")).slice(0, 4).join(" | "))))`)
	var found []string
	if err := json.Unmarshal([]byte(text), &found); err != nil {
		p.fatal(err)
	}
	for i := range found {
		found[i] = strings.TrimSpace(found[i])
	}
	return found
}
