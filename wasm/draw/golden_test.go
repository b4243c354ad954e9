package draw

import (
	"math"
	"os"
	"path/filepath"
	"testing"

	"hillwright/wasm/dom"
)

// Pictures that a person has looked at, of made-up answers, so that only a
// change of the drawing changes them.
func TestGoldenPictures(t *testing.T) {
	steep, climbs := made([]float64{300, 120, 250, 90, 400}, []float64{0.04, -0.02, 0.09, 0.16, 0.06}, []float64{0.7, 1, 0.38, 0.06, 0.55}, math.NaN())
	wall, stops := made([]float64{200, 300, 200}, []float64{0.06, 0.24, 0.03}, []float64{0.4, -0.6, 0.6}, 214)
	r := bench(t)
	hotHill, hot := made([]float64{300, 120, 250, 90, 400}, []float64{0.04, -0.02, 0.09, 0.16, 0.06}, []float64{0.7, 1, 0.38, 0.06, 0.55}, 980)
	warmed(hot, 20, 135)
	balance := weighed(200, 300, 317, 410, 520)
	for name, n := range map[string]*dom.Node{
		"section":          Section(steep, climbs, Size{360, 220}, metric),
		"section-stops-de": Section(wall, stops, Size{360, 220}, german),
		"section-wide-mph": Section(steep, climbs, Size{700, 300}, imperial),
		"strip":            Strip(steep, climbs, r, 0.1, Size{360, 220}, metric),
		"strip-hot-de":     Strip(hotHill, hot, r, 0.3, Size{340, 210}, german),
		"balance":          Balance(&balance, Size{340, 230}, metric, own),
		"balance-dragged":  Balance(&balance, Size{340, 230}, german, BalanceOptions{WantedN: 360}),
		"hatches":          Hatches(),
	} {
		t.Run(name, func(t *testing.T) {
			got, err := dom.HTML(n)
			if err != nil {
				t.Fatal(err)
			}
			file := filepath.Join("testdata", name+".svg")
			want, err := os.ReadFile(file)
			if err == nil && string(want) == got+"\n" {
				return
			}
			fresh := filepath.Join("testdata", name+".got.svg")
			if err := os.WriteFile(fresh, []byte(got+"\n"), 0o644); err != nil {
				t.Fatal(err)
			}
			t.Errorf("%s differs: look at the previews (TestPreview); if it is right, mv %s %s", file, fresh, file)
		})
	}
}
