//go:build !js

package trial

import (
	"bytes"
	"fmt"
	"math"
	"os"
	"os/exec"
	"path/filepath"
	"slices"
	"strings"
	"testing"

	"github.com/chromedp/cdproto/emulation"
	"github.com/chromedp/cdproto/page"

	"hillwright/physics/synth"
)

// The benchmarks measure the page in the browser, on this machine and with its
// processor slowed down four times, a stand-in for a cheap phone. What an
// iteration takes is of no interest: see the figures beside it.

// slowed are the processors that are measured.
var slowed = []float64{1, 4}

// quick opens an empty tab on a new host with a processor slowed down.
func quick(b *testing.B, times float64) *tab {
	b.Helper()
	p := newTab(b, phone, newHost(b, atRoot, false))
	call(p, emulation.SetCPUThrottlingRate, emulation.SetCPUThrottlingRateParams{Rate: times})
	return p
}

// middle is the median of what was measured, and upper the 95th hundredth.
func middle(all []float64) float64 { return share(all, 0.5) }
func upper(all []float64) float64  { return share(all, 0.95) }

func share(all []float64, part float64) float64 {
	sorted := slices.Sorted(slices.Values(all))
	return sorted[min(len(sorted)-1, int(part*float64(len(sorted))))]
}

// BenchmarkSize tells what the page weighs by brotli.
func BenchmarkSize(b *testing.B) {
	browserPath(b)
	report := demoPage(b).report
	for b.Loop() {
	}
	b.ReportMetric(float64(report.Wasm.Brotli)/1000, "wasm-kB")
	b.ReportMetric(float64(report.First.Brotli)/1000, "first-load-kB")
}

// BenchmarkStart loads the page with nothing kept, and again from what the
// service worker keeps.
func BenchmarkStart(b *testing.B) {
	for _, times := range slowed {
		b.Run(fmt.Sprintf("x%g", times), func(b *testing.B) {
			var paint, cold, warm []float64
			for b.Loop() {
				p := quick(b, times)
				call(p, page.AddScriptToEvaluateOnNewDocument, page.AddScriptToEvaluateOnNewDocumentParams{Source: `{
					const look = () => { window.hillwrightTaps === null ? window.answersAt = performance.now() : setTimeout(look, 4) }; look() }`})
				p.load()
				p.until("it answers", `window.answersAt > 0`)
				cold = append(cold, eval[float64](p, `answersAt`))
				paint = append(paint, eval[float64](p, `performance.getEntriesByName("first-contentful-paint")[0].startTime`))
				p.kept()
				p.reload()
				p.until("it answers", `window.answersAt > 0`)
				warm = append(warm, eval[float64](p, `answersAt`))
			}
			b.ReportMetric(middle(paint), "first-paint-ms")
			b.ReportMetric(middle(cold), "answers-cold-ms")
			b.ReportMetric(middle(warm), "answers-warm-ms")
		})
	}
}

// fromTouchToPaint touches an element many times and gives how long each took
// until its frame was painted [ms]. The messages come after the frame.
const fromTouchToPaint = `(async () => {
	const took = [], painted = () => new Promise(done => requestAnimationFrame(() => {
		const c = new MessageChannel(); c.port1.onmessage = () => done(); c.port2.postMessage(0); }));
	for (let i = 0; i < 80; i++) {
		await painted();
		const from = performance.now();
		document.querySelector(i % 16 < 8 ? $1 : $2).click();
		await painted();
		took.push(performance.now() - from);
	}
	return took;
})()`

// BenchmarkTouchToPaint steps a value, which changes the whole answer, and
// moves the staff.
func BenchmarkTouchToPaint(b *testing.B) {
	for _, times := range slowed {
		b.Run(fmt.Sprintf("x%g", times), func(b *testing.B) {
			p := quick(b, times)
			p.visit()
			p.tap(act("path", "rider.mass_kg"))
			var value, staff []float64
			for b.Loop() {
				value = append(value, eval[[]float64](p, fromTouchToPaint, act("step-up", "rider.mass_kg"), act("step-down", "rider.mass_kg"))...)
				staff = append(staff, eval[[]float64](p, fromTouchToPaint, act("staff-step", "+"), act("staff-step", "-"))...)
			}
			b.ReportMetric(middle(value), "value-ms")
			b.ReportMetric(upper(value), "value-p95-ms")
			b.ReportMetric(upper(staff), "staff-p95-ms")
		})
	}
}

// BenchmarkRoad steps a value on roads of 3 and of 100 km: how long the page
// computes before it gives the frame away.
func BenchmarkRoad(b *testing.B) {
	for _, km := range []int{3, 100} {
		b.Run(fmt.Sprintf("%dkm", km), func(b *testing.B) {
			p := quick(b, 1)
			p.visit()
			p.tap(act("open", "hill"))
			p.typeOver("#sections", strings.TrimSuffix(strings.Repeat("400m@7%,200m@-3%,300m@2%,100m@12%,", km), ","))
			p.tap(act("path", "rider.mass_kg"))
			var took []float64
			for b.Loop() {
				took = append(took, eval[[]float64](p, `(() => { const took = [];
					for (let i = 0; i < 20; i++) {
						const from = performance.now();
						document.querySelector(i % 2 ? $1 : $2).click();
						took.push(performance.now() - from);
					}
					return took; })()`, act("step-up", "rider.mass_kg"), act("step-down", "rider.mass_kg"))...)
			}
			b.ReportMetric(middle(took), "answer-ms")
		})
	}
}

// BenchmarkComputation runs the computation's own benchmarks in the browser
// and prints what they say, to be laid beside the native ones.
func BenchmarkComputation(b *testing.B) {
	browserPath(b)
	for _, name := range []string{"ride", "motor", "pack", "hill"} {
		text, code := inBrowser(b, name, "-test.run=^$", "-test.bench=.", "-test.benchtime=40x")
		if code != 0 {
			b.Fatal(text)
		}
		for line := range strings.Lines(text) {
			if strings.HasPrefix(line, "Benchmark") {
				fmt.Print("in the browser: " + line)
			}
		}
	}
}

// BenchmarkTrack reads a recorded ride of 100,000 points, from the file being
// picked to its answer being shown, and watches the longest frame meanwhile.
func BenchmarkTrack(b *testing.B) {
	browserPath(b)
	file := filepath.Join(b.TempDir(), "long.gpx")
	if err := os.WriteFile(file, longTrack(100_000), 0o600); err != nil {
		b.Fatal(err)
	}
	for _, times := range slowed {
		b.Run(fmt.Sprintf("x%g", times), func(b *testing.B) {
			var took, longest []float64
			for b.Loop() {
				p := quick(b, times)
				p.visit()
				p.tap(act("open", "hill"))
				p.pick(act("track-pick", ""), file)
				eval[bool](p, `(() => { window.readFrom = performance.now(); let last = readFrom; window.longest = 0;
					const look = now => { longest = Math.max(longest, now - last); last = now;
						document.querySelector("[data-act=undo]") ? window.readTo = performance.now() : requestAnimationFrame(look) };
					requestAnimationFrame(look); return true })()`)
				p.until("the track is read", `window.readTo > 0`)
				took = append(took, eval[float64](p, `readTo - readFrom`))
				longest = append(longest, eval[float64](p, `longest`))
			}
			b.ReportMetric(middle(took), "track-ms")
			b.ReportMetric(middle(longest), "longest-frame-ms")
		})
	}
}

// longTrack makes a GPX file of points a few metres apart on rolling ground.
func longTrack(points int) []byte {
	var b strings.Builder
	b.WriteString(`<gpx version="1.1" xmlns="http://www.topografix.com/GPX/1/1"><trk><name>Long</name><trkseg>`)
	for i := range points {
		x := float64(i)
		fmt.Fprintf(&b, "<trkpt lat=\"%.6f\" lon=\"%.6f\"><ele>%.1f</ele></trkpt>\n",
			44+0.02*math.Sin(x/9000), 8+x*4e-5, 300+80*math.Sin(x/700)+15*math.Sin(x/90))
	}
	b.WriteString(`</trkseg></trk></gpx>`)
	return []byte(b.String())
}

// BenchmarkListen follows the clicks of MP3 recordings of 44.1 kHz, from the
// file being picked to the run being shown: how many times faster than it was
// ridden, for one length and for four times that. What an hour needs of memory is
// a benchmark of physics/click.
func BenchmarkListen(b *testing.B) {
	browserPath(b)
	s := synth.Scene{
		RateHz: 44100, LengthS: 50, ClicksPerTurn: 36, CircumferenceM: 2.155, SNRdB: 10, Seed: 1,
		Speed: synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.007, CdAM2: 0.52, DensityKgM3: 1.19}.Coast(8.5),
	}
	coder := exec.Command("lame", "--quiet", "-m", "m", "--cbr", "-b", "128", "-", "-")
	coder.Stdin = bytes.NewReader(synth.WAV(s.Make(), s.RateHz, 16))
	one, err := coder.Output()
	if err != nil {
		b.Fatalf("lame: %v; on Debian: apt-get install lame", err)
	}
	for _, row := range []struct {
		name  string
		times int
	}{{"50s", 1}, {"200s", 4}} {
		b.Run(row.name, func(b *testing.B) {
			file := filepath.Join(b.TempDir(), "long.mp3")
			if err := os.WriteFile(file, bytes.Repeat(one, row.times), 0o600); err != nil {
				b.Fatal(err)
			}
			p := newTab(b, phone, newHost(b, atRoot, false))
			p.visit()
			p.toBench()
			var faster []float64
			for b.Loop() {
				runs := eval[int](p, `document.querySelectorAll(".run").length`)
				p.pick(`#bench-sound `+act("sound-from", "run"), file)
				eval[bool](p, `(window.heardFrom = performance.now(), window.heardTo = 0, (function look() {
					document.querySelectorAll(".run").length > $1 ? window.heardTo = performance.now() : requestAnimationFrame(look) })(), true)`, runs)
				for !eval[bool](p, `new Promise(done => { const from = performance.now(), look = () => window.heardTo > 0 || performance.now() - from > 5000 ? done(window.heardTo > 0) : requestAnimationFrame(look); look() })`) {
				}
				faster = append(faster, s.LengthS*float64(row.times)/(eval[float64](p, `heardTo - heardFrom`)/1000))
			}
			b.ReportMetric(middle(faster), "x_realtime")
		})
	}
}
