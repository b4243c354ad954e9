package build

import (
	"fmt"
	"io"
	"strings"
	"text/tabwriter"
)

// Budget is what a page may weigh, brotli [bytes]: the wasm file, and all that
// the first load fetches. Above the limits packing fails; the targets are
// printed beside.
type Budget struct {
	WasmLimit, WasmTarget   int
	FirstLimit, FirstTarget int
}

// DefaultBudget is the budget of the project. DEVELOPERS.md says where the
// wasm file's weight lies and why the limits stand where they do.
func DefaultBudget() Budget {
	return Budget{WasmLimit: 1_300_000, WasmTarget: 850_000, FirstLimit: 1_350_000, FirstTarget: 900_000}
}

// Weight is one file's size as it is, by gzip and by brotli [bytes].
type Weight struct {
	Name              string
	Raw, Gzip, Brotli int
}

// Report is what a page weighs. First is the sum of the first load.
type Report struct {
	Build  string
	Files  []Weight
	Wasm   Weight
	First  Weight
	Budget Budget
}

func weigh(p *Page, b Budget) *Report {
	r := &Report{Build: p.build, Budget: b, First: Weight{Name: "first load"}}
	for _, f := range p.Files() {
		w := Weight{f.Name, len(f.Data), orRaw(f.Gzip, f), orRaw(f.Brotli, f)}
		r.Files = append(r.Files, w)
		r.First.Raw += w.Raw
		r.First.Gzip += w.Gzip
		r.First.Brotli += w.Brotli
		if strings.HasSuffix(f.Name, ".wasm") {
			r.Wasm = w
		}
	}
	return r
}

func orRaw(squeezed []byte, f *File) int {
	if squeezed == nil {
		return len(f.Data)
	}
	return len(squeezed)
}

// TooHeavy says that a page weighs more than it may.
type TooHeavy struct{ Report *Report }

func (e *TooHeavy) Error() string {
	r := e.Report
	var over []string
	if r.Wasm.Brotli > r.Budget.WasmLimit {
		over = append(over, fmt.Sprintf("%s: got %s by brotli, expected at most %s; see what was imported lately", r.Wasm.Name, kilo(r.Wasm.Brotli), kilo(r.Budget.WasmLimit)))
	}
	if r.First.Brotli > r.Budget.FirstLimit {
		over = append(over, fmt.Sprintf("first load: got %s by brotli, expected at most %s", kilo(r.First.Brotli), kilo(r.Budget.FirstLimit)))
	}
	return strings.Join(over, "\n")
}

func (r *Report) check() error {
	if r.Wasm.Brotli > r.Budget.WasmLimit || r.First.Brotli > r.Budget.FirstLimit {
		return &TooHeavy{r}
	}
	return nil
}

// Write prints the report as a table.
func (r *Report) Write(out io.Writer) error {
	t := tabwriter.NewWriter(out, 0, 4, 2, ' ', tabwriter.AlignRight)
	fmt.Fprintln(t, "file\tas it is\tgzip\tbrotli\ttarget\tlimit\t")
	for _, w := range r.Files {
		if w == r.Wasm {
			r.row(t, w, r.Budget.WasmTarget, r.Budget.WasmLimit)
			continue
		}
		fmt.Fprintf(t, "%s\t%s\t%s\t%s\t\t\t\n", w.Name, kilo(w.Raw), kilo(w.Gzip), kilo(w.Brotli))
	}
	r.row(t, r.First, r.Budget.FirstTarget, r.Budget.FirstLimit)
	if err := t.Flush(); err != nil {
		return err
	}
	_, err := fmt.Fprintln(out, "build", r.Build)
	return err
}

func (r *Report) row(t io.Writer, w Weight, target, limit int) {
	fmt.Fprintf(t, "%s\t%s\t%s\t%s\t%s\t%s\t\n", w.Name, kilo(w.Raw), kilo(w.Gzip), kilo(w.Brotli), kilo(target), kilo(limit))
}

// kilo writes a size in kB (1,000 bytes).
func kilo(n int) string { return fmt.Sprintf("%.1f kB", float64(n)/1000) }
