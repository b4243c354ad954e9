package coast_test

import (
	"bytes"
	"math"
	"math/rand/v2"
	"os"
	"os/exec"
	"strconv"
	"testing"

	"hillwright/physics/click"
	"hillwright/physics/coast"
	"hillwright/physics/sound"
	"hillwright/physics/synth"
)

const (
	clicks = 36
	around = 2.155
)

// heard follows the clicks of a file, as the page and the terminal do.
func heard(t *testing.T, file []byte) *click.Heard {
	t.Helper()
	r, err := sound.Open(bytes.NewReader(file))
	if err != nil {
		t.Fatal(err)
	}
	h, err := click.Hear(r, nil)
	if err != nil {
		t.Fatal(err)
	}
	return h
}

// run is the recording's one coast-down.
func run(t *testing.T, h *click.Heard, back bool) coast.Run {
	t.Helper()
	for _, s := range h.Stretches {
		if s.Falls {
			r := coast.Run{Back: back, Points: coast.FromClicks(s.Points, clicks, around)}
			return r.Cut(coast.Trim(r.Points))
		}
	}
	t.Fatal("no coast-down was heard")
	return coast.Run{}
}

func setup() coast.Setup {
	return coast.Setup{
		MassKg: coast.Value{Value: 105, Error: 0.5}, InertiaKg: coast.Value{Value: 1.8, Error: 0.4}, Grade: coast.Value{Error: 0.003},
		HeadMps: coast.Value{Error: 0.5}, DensityKgM3: coast.Value{Value: 1.19, Error: 0.01}, CircumferencePart: coast.Value{Value: 1, Error: 0.002},
		Crr: coast.Value{Value: 0.009, Error: 0.0025}, CdAM2: coast.Value{Value: 0.6, Error: 0.08},
	}
}

// The project's own MP3 recordings, two runs each way at 64 kbit/s, give the
// drag that they were made with (testdata/recordings).
func TestRecordingsGiveTheTruth(t *testing.T) {
	var runs []coast.Run
	for _, name := range []string{"out-1", "back-1", "out-2", "back-2"} {
		file, err := os.ReadFile("../../testdata/recordings/" + name + ".mp3")
		if err != nil {
			t.Fatal(err)
		}
		runs = append(runs, run(t, heard(t, file), name[0] == 'b'))
	}
	r, err := coast.Fit(runs, setup())
	if err != nil {
		t.Fatal(err)
	}
	t.Logf("Crr %.5f (%.5f to %.5f), CdA %.4f (%.4f to %.4f)", r.Crr.Value, r.Crr.Low, r.Crr.High, r.CdAM2.Value, r.CdAM2.Low, r.CdAM2.High)
	if math.Abs(r.Crr.Value/0.0070-1) > 0.05 || math.Abs(r.CdAM2.Value/0.52-1) > 0.08 {
		t.Errorf("Crr %v, CdA %v; truth 0.0070 and 0.52", r.Crr.Value, r.CdAM2.Value)
	}
	if r.Crr.Low > 0.0070 || r.Crr.High < 0.0070 || r.CdAM2.Low > 0.52 || r.CdAM2.High < 0.52 {
		t.Errorf("the intervals %v, %v do not hold the truth", r.Crr, r.CdAM2)
	}
}

// Speed within 1 % over 95 % of the coast at 10 dB, and the drag, through lossy
// coding at 64 to 320 kbit/s by Debian's lame.
func TestLossyCoding(t *testing.T) {
	if os.Getenv("HILLWRIGHT_FULL") == "" {
		t.Skip("needs lame: set HILLWRIGHT_FULL=1")
	}
	for _, kbit := range []int{64, 96, 128, 192, 320} {
		var runs []coast.Run
		for i := range 4 {
			d := synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.0075, CdAM2: 0.48, DensityKgM3: 1.19, Grade: 0.0015}
			if i%2 == 1 {
				d.Grade = -d.Grade
			}
			s := synth.Scene{
				RateHz: 44100, LengthS: 42, ClicksPerTurn: clicks, CircumferenceM: around, SNRdB: 10, Noise: synth.Colour(i % 3), Jitter: 0.02,
				ReverbS: 0.2, Speed: d.Coast(8.8), Seed: uint64(kbit + i),
			}
			cmd := exec.Command("lame", "--quiet", "-m", "m", "--cbr", "-b", strconv.Itoa(kbit), "-", "-")
			cmd.Stdin = bytes.NewReader(synth.WAV(s.Make(), s.RateHz, 16))
			file, err := cmd.Output()
			if err != nil {
				t.Fatalf("lame: %v; the tests need Debian's package lame", err)
			}
			h := heard(t, file)
			if share := right(&s, h); share < 0.95 {
				t.Errorf("%d kbit/s, run %d: right to 1 %% over %.1f %% of the coast", kbit, i+1, 100*share)
			}
			runs = append(runs, run(t, h, i%2 == 1))
		}
		r, err := coast.Fit(runs, setup())
		if err != nil {
			t.Fatal(err)
		}
		t.Logf("%d kbit/s: Crr %.5f, CdA %.4f", kbit, r.Crr.Value, r.CdAM2.Value)
		if math.Abs(r.Crr.Value/0.0075-1) > 0.05 || math.Abs(r.CdAM2.Value/0.48-1) > 0.08 {
			t.Errorf("%d kbit/s: Crr %v, CdA %v; truth 0.0075 and 0.48", kbit, r.Crr.Value, r.CdAM2.Value)
		}
	}
}

// right is the share of the coast over which the curve says the speed to 1 %.
// Coding shifts the sound by up to 60 ms, which is 0.2 % of speed here.
func right(s *synth.Scene, h *click.Heard) float64 {
	perM := clicks / around
	good, all := 0.0, 0.0
	for t := 0.0; t < s.LengthS-0.1; t += 0.05 {
		all++
		for _, st := range h.Stretches {
			for k := 1; st.Falls && k < len(st.Curve); k++ {
				a, b := st.Curve[k-1], st.Curve[k]
				if t < a.AtS || t >= b.AtS || b.AtS-a.AtS > 1 {
					continue
				}
				rate := a.RateHz + (t-a.AtS)/(b.AtS-a.AtS)*(b.RateHz-a.RateHz)
				if math.Abs(rate/(s.Speed(t)*perM)-1) < 0.01 {
					good++
				}
			}
		}
	}
	return good / all
}

// The whole chain, from noisy sound to intervals, over seeded bikes and roads:
// the 90 % intervals hold the truth in at least 90 % of 200 runs.
func TestSoundToIntervals(t *testing.T) {
	fits := 200
	if os.Getenv("HILLWRIGHT_FULL") == "" {
		t.Skip("takes a minute: set HILLWRIGHT_FULL=1")
	}
	type truth struct{ inCrr, inCdA bool }
	results := make(chan truth, fits)
	work := make(chan uint64)
	for range 2 {
		go func() {
			for seed := range work {
				crr, cda := seeded(t, seed)
				results <- truth{crr, cda}
			}
		}()
	}
	for seed := range uint64(fits) {
		work <- seed
	}
	close(work)
	inCrr, inCdA := 0, 0
	for range fits {
		r := <-results
		if r.inCrr {
			inCrr++
		}
		if r.inCdA {
			inCdA++
		}
	}
	t.Logf("Crr in %d, CdA in %d of %d", inCrr, inCdA, fits)
	if inCrr*10 < 9*fits || inCdA*10 < 9*fits {
		t.Errorf("the intervals hold Crr in %d and CdA in %d of %d", inCrr, inCdA, fits)
	}
}

// seeded makes a bike and a road, records a run each way, and tells whether the
// intervals hold what it was made with.
func seeded(t *testing.T, seed uint64) (inCrr, inCdA bool) {
	rng := rand.New(rand.NewPCG(seed, 5))
	from := func(v coast.Value) float64 { return v.Value + v.Error*rng.NormFloat64() }
	s := setup()
	d := synth.Drag{
		MassKg: from(s.MassKg), InertiaKg: from(s.InertiaKg), Grade: from(s.Grade) / 2, HeadMps: from(s.HeadMps), DensityKgM3: from(s.DensityKgM3),
		Crr: 0.005 + 0.006*rng.Float64(), CdAM2: 0.4 + 0.3*rng.Float64(), GustN: 0.3,
	}
	scale := from(s.CircumferencePart)
	var runs []coast.Run
	for i := range 2 {
		e := d
		e.Seed = rng.Uint64()
		if i == 1 {
			e.Grade, e.HeadMps = -e.Grade, -e.HeadMps
		}
		v := e.Coast(7.5 + rng.Float64())
		scene := synth.Scene{
			RateHz: 16000, LengthS: 22, ClicksPerTurn: clicks, CircumferenceM: around * scale, SNRdB: 5 + 10*rng.Float64(), Noise: synth.Colour(rng.IntN(3)),
			Jitter: 0.03, Speed: v, Seed: rng.Uint64(),
		}
		l, err := click.NewListener(scene.RateHz)
		if err != nil {
			t.Error(err)
			return
		}
		l.Write(scene.Make())
		h, err := l.Finish()
		if err != nil || len(h.Stretches) == 0 {
			t.Errorf("seed %d: %v", seed, err)
			return
		}
		r := coast.Run{Back: i == 1, Points: coast.FromClicks(h.Stretches[0].Points, clicks, around)}
		runs = append(runs, r.Cut(coast.Trim(r.Points)))
	}
	r, err := coast.Fit(runs, s)
	if err != nil {
		t.Logf("seed %d: %v", seed, err)
		return
	}
	return r.Crr.Low <= d.Crr && d.Crr <= r.Crr.High, r.CdAM2.Low <= d.CdAM2 && d.CdAM2 <= r.CdAM2.High
}
