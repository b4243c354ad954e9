//go:build !js

package trial

import (
	"bytes"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"github.com/chromedp/cdproto/page"

	"hillwright/physics/sound"
	"hillwright/physics/synth"
	"hillwright/wasm/words"
)

const recordings = "../../testdata/recordings/"

// fakeSound is what the browser's microphone hears: a coast-down that the
// microphone's tests record.
func fakeSound(folder string) (string, error) {
	s := synth.Scene{
		RateHz: 44100, LengthS: 40, ClicksPerTurn: 36, CircumferenceM: 2.155, SNRdB: 15, Noise: synth.Tyre, Seed: 4,
		Speed: synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.02, CdAM2: 0.6, DensityKgM3: 1.19}.Coast(8.5),
	}
	file := filepath.Join(folder, "microphone.wav")
	return file, os.WriteFile(file, synth.WAV(s.Make(), s.RateHz, 16), 0o600)
}

func (p *tab) toBench() {
	p.t.Helper()
	p.tap(act("go", "bench"))
	p.until("the bench is open", `document.querySelector(".at-bench") !== null`)
}

// hears picks a recording and waits until it is a run.
func (p *tab) hears(file string) {
	p.t.Helper()
	runs := eval[int](p, `document.querySelectorAll(".run").length`)
	p.pick(`#bench-sound `+act("sound-from", "run"), recordings+file)
	p.until(file+" is a run", `document.querySelectorAll(".run").length === $1`, runs+1)
	p.until("it is shown", `document.querySelector("#bench-sound .ways") !== null`)
}

// counts finds the clicks per turn from a wheel that was rolled.
func (p *tab) counts() {
	p.t.Helper()
	p.pick(`#bench-sound `+act("sound-from", "count"), recordings+"rolled-5-turns.wav")
	p.shows("#bench-sound", English.Say(words.BenchCounted, "180", "5", "36"))
}

// TestDragByEar goes the whole way without a network: the clicks of a turn are
// counted, four recordings opened, the drag is found and put into the bike; a
// reload gives all back.
func TestDragByEar(t *testing.T) {
	for _, d := range devices {
		t.Run(d.name, func(t *testing.T) {
			p := open(t, d)
			p.kept()
			p.cut()
			p.toBench()
			p.counts()
			for _, file := range []string{"out-1.mp3", "back-1.mp3", "out-2.mp3", "back-2.mp3"} {
				p.hears(file)
			}
			p.until("the drag is there", `document.querySelectorAll("#bench-drag .picture").length === 2`)
			if said := p.text("#bench-drag"); !strings.Contains(said, "0.2") {
				t.Errorf("the road's grade of 0.2 %% is not said: %s", said)
			}
			p.tap(`.run:first-child ` + `[data-act="cut-later"]`)
			p.shows(".run:first-child .cutters", "0.7")
			p.drag(`.run:first-child [data-act="cut"][data-arg$="=to"]`, -0.1, -0.3)
			p.until("the end is cut", `parseFloat(document.querySelectorAll(".run:first-child .cutters output")[1].textContent) < 42`)
			p.tap(act("into-bike", ""))
			p.shows("#bench-into", English.Say(words.IntoBikeSame))
			p.tap(act("dismiss", ""))
			p.reload()
			p.toBench()
			p.until("the runs are back", `document.querySelectorAll(".run").length === 4`)
			p.shows("#bench-into", English.Say(words.IntoBikeSame))
			p.tap(act("go", "sentence"))
			p.tap(act("open", "bike"))
			p.tap(act("all", "bike"))
			p.shows("#place", English.Source(2))
		})
	}
}

// TestMicrophone records what the browser's microphone hears, hears it, and
// gives it as a file.
func TestMicrophone(t *testing.T) {
	p := open(t, phone)
	p.toBench()
	p.counts()
	p.tap(`#side-foot ` + act("sound-for", "run"))
	p.until("it records", `parseFloat(document.querySelector("#bench-level .huge")?.textContent) >= 13`)
	p.tap(act("sound-done", ""))
	p.until("it is a run", `document.querySelectorAll(".run").length === 1`)
	name, data := p.download(act("sound-keep", ""))
	r, err := sound.Open(bytes.NewReader(data))
	if err != nil || !strings.HasSuffix(name, ".wav") {
		t.Fatalf("%s: %v", name, err)
	}
	part := make([]float32, 1<<16)
	n, loud := 0, 0.0
	for err == nil {
		var got int
		got, err = r.Read(part)
		n += got
		for _, x := range part[:got] {
			loud = math.Max(loud, math.Abs(float64(x)))
		}
	}
	if seconds := float64(n) / float64(r.RateHz()); seconds < 12 || seconds > 25 || loud < 0.05 {
		t.Errorf("%g s of sound, its loudest %g", seconds, loud)
	}
}

// TestMicrophoneRefused has the browser refuse the microphone, and have none: it
// is said, and the other ways are offered.
func TestMicrophoneRefused(t *testing.T) {
	for how, script := range map[string]string{
		"refused": `navigator.mediaDevices.getUserMedia = () => Promise.reject(new DOMException("no", "NotAllowedError"))`,
		"absent":  `Object.defineProperty(navigator, "mediaDevices", {value: undefined})`,
	} {
		t.Run(how, func(t *testing.T) {
			p := newTab(t, phone, newHost(t, atRoot, false))
			call(p, page.AddScriptToEvaluateOnNewDocument, page.AddScriptToEvaluateOnNewDocumentParams{Source: script})
			p.visit()
			p.toBench()
			p.tap(`#side-foot ` + act("sound-for", "run"))
			want := words.SoundAbsent
			if how == "refused" {
				want = words.SoundRefused
			}
			p.shows("#bench-sound", English.Say(want))
			p.hears("out-1.mp3")
		})
	}
}

// TestWrongSounds opens what is no coast-down: each says why, nothing is lost.
func TestWrongSounds(t *testing.T) {
	p := open(t, phone)
	p.toBench()
	p.counts()
	p.hears("out-1.mp3")
	dir := t.TempDir()
	write := func(name string, data []byte) string {
		file := filepath.Join(dir, name)
		if err := os.WriteFile(file, data, 0o600); err != nil {
			t.Fatal(err)
		}
		return file
	}
	for _, row := range []struct {
		file string
		says string
	}{
		{write("empty.mp3", nil), English.Say(words.SoundEmpty)},
		{write("other.m4a", []byte("\x00\x00\x00\x20ftypM4A "+strings.Repeat("x", 900))), "m4a"},
		{write("damaged.wav", []byte("RIFF\x00\x00\x00\x00WAVE")), English.Say(words.SoundDamaged)},
		{write("silent.wav", synth.WAV(make([]float32, 90_000), 8000, 16)), English.Say(words.ClickSilent)},
		{write("short.wav", synth.WAV(make([]float32, 9000), 8000, 16)), "1.1"},
		{recordings + "speech.mp3", English.Say(words.SoundNoFall)},
	} {
		p.pick(`#bench-sound `+act("sound-from", "run"), row.file)
		p.shows("#bench-sound", row.says)
		p.until("it is at hand", `document.querySelector("#bench-sound .ways") !== null`)
	}
	if n := eval[int](p, `document.querySelectorAll(".run").length`); n != 1 {
		t.Errorf("%d runs, want the one from before", n)
	}
}

// TestListeningStops stops the listening to a long file; the page goes on, the
// file stays at hand. Meanwhile frames come.
func TestListeningStops(t *testing.T) {
	one, err := os.ReadFile(recordings + "out-1.mp3")
	if err != nil {
		t.Fatal(err)
	}
	file := filepath.Join(t.TempDir(), "long.mp3")
	if err := os.WriteFile(file, bytes.Repeat(one, 20), 0o600); err != nil {
		t.Fatal(err)
	}
	p := open(t, phone)
	p.toBench()
	p.pick(`#bench-sound `+act("sound-from", "run"), file)
	p.until("it listens", `document.querySelector("#bench-part progress")?.value > 0`)
	if frames := eval[int](p, `new Promise(done => { let n = 0; const from = performance.now(), look = now => { n++; now - from > 1000 ? done(n) : requestAnimationFrame(look) }; requestAnimationFrame(look) })`); frames < 5 {
		t.Errorf("%d frames in a second while it listens", frames)
	}
	p.tap(act("sound-leave", ""))
	p.shows("#bench-sound", English.Say(words.SoundStopped))
	p.counts()
	p.hears("out-1.mp3")
}

// TestLaps takes times at marks by a thumb.
func TestLaps(t *testing.T) {
	p := open(t, phone)
	p.toBench()
	p.tap(act("laps", "marks"))
	p.tap(act("laps-end", ""))
	p.shows("#bench-sound", "at least 5")
	for i := range 6 {
		p.tap(act("lap", ""))
		p.shows("#bench-sound", English.Say(words.LapCount, string(rune('1'+i))))
	}
	p.tap(act("lap-back", ""))
	p.shows("#bench-sound", English.Say(words.LapCount, "5"))
	p.tap(act("laps-end", ""))
	p.until("it is a run", `document.querySelectorAll(".run").length === 1`)
	p.shows("#bench-drag", English.Say(words.CoastBadNumber)) // a thumb of seconds rides at 700 km/h
}

// TestStand judges a wheel on the stand.
func TestStand(t *testing.T) {
	p := open(t, phone)
	p.toBench()
	p.counts()
	p.tap(act("bench-job", "stand"))
	for file, says := range map[string]words.Key{"stand-free.mp3": words.SpunNoRub, "stand-rub.mp3": words.SpunDrags} {
		p.pick(`#bench-sound `+act("sound-from", "spin"), recordings+file)
		p.shows("#bench-spun", English.Say(says))
	}
}

// TestBenchFits looks for what is too small for a glove, cut off or faint, and
// has axe-core look, in the states of the bench, on every size.
func TestBenchFits(t *testing.T) {
	for _, d := range []device{phone, tablet, {"narrow", 320, 640, true}} {
		t.Run(d.name, func(t *testing.T) {
			p := open(t, d)
			p.toBench()
			look := p.looker(thumb)
			look("nothing yet")
			p.counts()
			p.hears("out-1.mp3")
			p.hears("back-1.mp3")
			p.speak(German) // the longer words
			for _, theme := range []string{"sun", "dusk"} {
				p.light(theme)
				look("measured, " + theme)
			}
			p.tap(act("path", "coast.grade"))
			look("an input")
			p.tap(act("close", ""))
			p.tap(act("laps", "display"))
			look("taps")
			p.tap(act("laps", ""))
			p.tap(act("bench-job", "stand"))
			p.pick(`#bench-sound `+act("sound-from", "spin"), recordings+"stand-rub.mp3")
			p.until("the wheel is judged", `document.querySelector("#bench-spun dl") !== null`)
			look("a wheel")
			p.tap(`#side-foot ` + act("sound-for", "spin"))
			p.until("it records", `document.querySelector("#bench-level") !== null`)
			look("recording")
		})
	}
}
