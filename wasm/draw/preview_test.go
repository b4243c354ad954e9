package draw

import (
	"bytes"
	"math"
	"os"
	"path/filepath"
	"testing"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/wasm/dom"
	"hillwright/wasm/words"
)

// fataler is a test, a benchmark or a property.
type fataler interface {
	Helper()
	Fatal(args ...any)
	Fatalf(format string, args ...any)
}

// real answers a question about typed sections; set is pairs of path and value.
func real(t fataler, sections string, set ...string) (*hill.Profile, *ride.Answer, *rig.Rig, float64) {
	t.Helper()
	p, err := hill.ParseSections(sections)
	if err != nil {
		t.Fatal(err)
	}
	q := ask.Default()
	for i := 0; i+1 < len(set); i += 2 {
		if err := q.Set(set[i], set[i+1]); err != nil {
			t.Fatal(err)
		}
	}
	r, a, err := q.Climb(&p)
	if err != nil {
		t.Fatal(err)
	}
	return &p, a, r, q.Ride.DownMps
}

var (
	metric   = words.Voice{}
	german   = words.Voice{Lang: words.German, Comma: true}
	imperial = words.Voice{Units: words.Imperial}
	own      = BalanceOptions{WantedN: math.NaN()}
)

// showStaff moves the staff as the page does: by attributes only.
func showStaff(section *dom.Node, s Staff) {
	staff := classed(section, "staff")[0]
	var kept []dom.Attr
	for _, a := range staff.Attrs {
		if a.Name != "visibility" {
			kept = append(kept, a)
		}
	}
	staff.Attrs = append(kept, dom.Attr{Name: "transform", Value: s.Transform()})
}

// TestPreview writes pages with pictures to look at: set PICTURES_DIR and open
// the files, or take screenshots of them.
func TestPreview(t *testing.T) {
	dir := os.Getenv("PICTURES_DIR")
	if dir == "" {
		t.Skip("set PICTURES_DIR to a folder to get pages with pictures to look at")
	}
	css, err := os.ReadFile("testdata/pictures.css")
	if err != nil {
		t.Fatal(err)
	}
	hills := []struct {
		sections string
		voice    words.Voice
		set      []string
	}{
		{"400 m at 7 %, 60 m at 18 %", metric, nil},
		{"300 m at 4 %, 120 m at -2 %, 250 m at 9 %, 90 m at 16 %, 400 m at 6 %, 200 m at 1 %", german, nil},
		{"200 m at 6 %, 300 m at 24 %, 200 m at 3 %", metric, []string{"rider.mass_kg", "120", "load.mass_kg", "60"}},
		{"2 km at 5 %, 3 km at 8 %, 500 m at 12 %, 4 km at 4 %, 3 km at -6 %", imperial, nil},
		{"1 km at -8 %", metric, nil},
		{"30 km at 1 %, 20 km at 3 %, 8 km at 7 %, 10 km at -5 %, 900 m at 19 %, 30 km at 0.5 %", metric, nil},
		{"40 m at 35 %, 40 m at 45 %", german, []string{"rider.mass_kg", "60", "load.mass_kg", "0"}},
		{"500 m at 0 %", metric, nil},
		{"300 m at 10 %, 40 m at 22 %, 400 m at 3 %, 600 m at 12 %", german, []string{"bike.motor.kind", "rear-hub"}},
	}
	for _, theme := range []string{"sun", "dusk"} {
		for _, size := range []Size{{344, 220}, {700, 300}} {
			var b bytes.Buffer
			vars := "--paper:#f6f1e4;--ink:#1d2420;--ink-soft:#55605a;--ground:#e6dcc3;--panel:#ece4cf;--accent:#b3391d"
			if theme == "dusk" {
				vars = "--paper:#232b2e;--ink:#eef0e8;--ink-soft:#aab3ae;--ground:#303b3e;--panel:#2c3639;--accent:#ff8a5c"
			}
			b.WriteString("<!doctype html><meta charset=utf-8><style>:root{" + vars + "} body{margin:8px;background:var(--paper);color:var(--ink);font-family:system-ui,sans-serif} .row{display:flex;gap:16px;align-items:start;margin:0 0 16px} .cell{width:" + num(size.W) + "px}" + string(css) + "</style>")
			put := func(n *dom.Node) {
				b.WriteString("<div class=cell>")
				if err := dom.WriteHTML(&b, n); err != nil {
					t.Fatal(err)
				}
				b.WriteString("</div>")
			}
			put(Hatches())
			put(Legend(metric))
			many := weighed(330, 240, 300, 310, 345, 400, 420, 470, 520, 1900)
			b.WriteString("<div class=row>")
			put(Balance(&many, size, german, own))
			put(Balance(&many, size, imperial, BalanceOptions{WantedN: 100}))
			b.WriteString("</div>")
			for i, h := range hills {
				p, a, r, down := real(t, h.sections, h.set...)
				b.WriteString("<div class=row>")
				section := Section(p, a, size, h.voice)
				if i%2 == 0 {
					showStaff(section, SectionAt(p, a, size, size.W*0.6))
				}
				put(section)
				put(Balance(&a.Balance, size, h.voice, own))
				if i == 0 {
					put(Balance(&a.Balance, size, h.voice, BalanceOptions{WantedN: a.Balance.Pegs[0].PullN * 1.3}))
				}
				fresh := r.Fresh(1)
				st, held := ride.Settle(r, ride.At(a.Hardest.SteepestGrade, 0), &fresh, down)
				if !held {
					st = ride.Running{}
				}
				put(PullDiagram(r, a.Hardest.SteepestGrade, st, Size{size.W, size.H + 20}, h.voice))
				b.WriteString("</div>")
			}
			name := filepath.Join(dir, theme+"-"+num(size.W)+".html")
			if err := os.WriteFile(name, b.Bytes(), 0o644); err != nil {
				t.Fatal(err)
			}
		}
	}
}
