package hill

import (
	"math"
	"math/rand/v2"
	"testing"
)

// noise says how far a recorder's heights are off: white noise from point to
// point, slow drift (first-order, its correlation length along the road), and
// the step of the heights written. Sizes are common practice, no source.
type noise struct {
	name           string
	everyM         float64
	whiteM         float64
	driftM, overM  float64
	stepM          float64
	riseBand       float64 // how far one recording's rise may be off, relative
	leastSteepest  float64 // the ramp's 18 % is recognised: mean of the steepest grades
	mostSteepest   float64
	mostFlatAscent float64 // on 2 km of flat road [m], mean
}

var noises = []noise{
	{"no noise", 5, 0, 0, 1, 0, 0.03, 0.16, 0.195, 0.01},
	{"fine barometer", 5, 0.1, 0.2, 500, 0.1, 0.10, 0.15, 0.19, 4},
	{"receiver, 0.3 m", 5, 0.3, 0, 1, 0, 0.12, 0.14, 0.20, 4},
	{"receiver, 0.6 m", 5, 0.6, 0, 1, 0, 0.2, 0.13, 0.20, 6},
	{"receiver, 1 m, each metre and a half", 1.5, 1, 0, 1, 0, 0.26, 0.13, 0.22, 6},
	{"receiver, sparse", 10, 0.5, 0, 1, 0, 0.2, 0.13, 0.22, 8},
	{"whole metres", 5, 0, 0, 1, 1, 0.15, 0.13, 0.2, 0.01},
	{"whole metres, noise", 5, 0.3, 0, 1, 1, 0.12, 0.12, 0.20, 3},
	{"whole metres, dense", 2, 0.3, 0, 1, 1, 0.10, 0.12, 0.2, 3},
}

func newRand(seed uint64) *rand.Rand { return rand.New(rand.NewPCG(seed, 18)) }

func (n noise) record(r *rand.Rand, lengthM float64, height func(x float64) float64) Track {
	t := Track{SegmentStart: []int{0}}
	drift := n.driftM * r.NormFloat64()
	keep := math.Exp(-n.everyM / n.overM)
	for x := 0.0; x <= lengthM; x += n.everyM {
		drift = keep*drift + n.driftM*math.Sqrt(1-keep*keep)*r.NormFloat64()
		h := height(x) + drift + n.whiteM*r.NormFloat64()
		if n.stepM > 0 {
			h = math.Round(h/n.stepM) * n.stepM
		}
		t.Points = append(t.Points, Point{LatDeg: 47 + x/111_170, LonDeg: 8, HeightM: h, TimeS: x / 5})
	}
	return t
}

func mustProfile(t *testing.T, tr *Track) Profile {
	t.Helper()
	p, err := FromTrack(tr, Options{})
	if err != nil {
		t.Fatal(err)
	}
	return p
}

// A ramp of 30 m of road at 18 % between flats: the rise must stay, the grade
// must be recognised, and flats must stay flat.
func TestShortRampSurvives(t *testing.T) {
	const runs = 40
	angle := math.Atan(0.18)
	run, rise := 30*math.Cos(angle), 30*math.Sin(angle)
	for _, n := range noises {
		t.Run(n.name, func(t *testing.T) {
			meanRise, meanSteepest, meanFlat, worst := 0.0, 0.0, 0.0, 0.0
			for seed := range uint64(runs) {
				r := newRand(seed)
				foot, from := 300+r.Float64(), 995+10*r.Float64()
				tr := n.record(r, 2000, func(x float64) float64 {
					return foot + rise*math.Max(0, math.Min(1, (x-from)/run))
				})
				p := mustProfile(t, &tr)
				middle := from + run/2
				got := p.HeightAt(middle+60) - p.HeightAt(middle-60)
				worst = math.Max(worst, math.Abs(got/rise-1))
				steepest := 0.0
				for _, g := range p.Grade {
					steepest = math.Max(steepest, float64(g))
				}
				flat := n.record(r, 2000, func(float64) float64 { return foot })
				pf := mustProfile(t, &flat)
				meanRise += got / runs
				meanSteepest += steepest / runs
				meanFlat += pf.AscentM() / runs
			}
			t.Logf("rise %.2f of %.2f m (worst %.0f %%), steepest %.3f, flat ascent %.2f m", meanRise, rise, 100*worst, meanSteepest, meanFlat)
			if math.Abs(meanRise/rise-1) > 0.10 {
				t.Errorf("mean rise %.2f m, want %.2f within 10 %%", meanRise, rise)
			}
			if worst > n.riseBand {
				t.Errorf("worst rise is off by %.0f %%, want at most %.0f %%", 100*worst, 100*n.riseBand)
			}
			if meanSteepest < n.leastSteepest || meanSteepest > n.mostSteepest {
				t.Errorf("mean steepest grade %.3f, want %.3f to %.3f", meanSteepest, n.leastSteepest, n.mostSteepest)
			}
			if meanFlat > n.mostFlatAscent {
				t.Errorf("flat road: ascent %.2f m, want at most %.2f", meanFlat, n.mostFlatAscent)
			}
		})
	}
}
