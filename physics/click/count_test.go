package click

import (
	"math"
	"slices"
	"testing"

	"hillwright/physics/synth"
)

// rolled is a wheel that is rolled through counted turns at walking speed, from
// standstill to standstill.
func rolled(turns float64, clicks int, seed uint64) synth.Scene {
	const around = 2.155
	long := turns * around / 1.1 * 1.3
	return synth.Scene{
		RateHz: 16000, LengthS: long + 3, ClicksPerTurn: clicks, CircumferenceM: around, SNRdB: 10, Noise: synth.Tyre, Seed: seed,
		Speed: func(t float64) float64 {
			t -= 1.5
			if t < 0 || t > long {
				return 0
			}
			// A speed that rises, holds and falls, with a wobble, of the right length.
			shape := math.Min(1, math.Min(t, long-t)/(0.2*long))
			return turns * around / (0.8 * long) * shape * (1 + 0.15*math.Sin(2*math.Pi*t/long*3))
		},
	}
}

func TestCount(t *testing.T) {
	for _, clicks := range []int{18, 24, 36, 54} {
		for seed := range seeds() / 2 {
			s := rolled(5, clicks, seed)
			h, err := hear(s.RateHz, s.Make())
			if err != nil {
				t.Fatal(err)
			}
			n, off, err := h.Count(0, h.LengthS)
			if err != nil || math.Abs(float64(n-5*clicks)) > 2 {
				t.Errorf("%d clicks per turn, seed %d: counted %d ± %.1f in 5 turns, want %d (%v)", clicks, seed, n, off, 5*clicks, err)
			}
		}
	}
}

// What cannot be counted is not counted.
func TestCountRefuses(t *testing.T) {
	fast := scene(func(s *synth.Scene) { s.ClicksPerTurn = 72; s.LengthS = 20; s.ReverbS = 0.5 })
	h, err := hear(fast.RateHz, fast.Make())
	if err != nil {
		t.Fatal(err)
	}
	if n, off, err := h.Count(0, 20); err == nil {
		perM := 72 / 2.155
		metres := 0.0
		for x := 0.0; x < 20; x += 0.01 {
			metres += 0.01 * fast.Speed(x)
		}
		if math.Abs(float64(n)-metres*perM) > off+1 {
			t.Errorf("counted %d ± %.1f, there were %.0f", n, off, metres*perM)
		}
	}
	if _, _, err := h.Count(3, 3.01); kindOf(err) != NoSingle {
		t.Errorf("ten milliseconds: %v", err)
	}
}

// spin is a wheel on a stand that comes to rest.
func spin(rub float64, seed uint64) synth.Scene {
	slow := synth.Drag{MassKg: 1, InertiaKg: 2, Crr: 0.012, CdAM2: 0.006, DensityKgM3: 1.2}
	return synth.Scene{
		RateHz: 22050, LengthS: 30, ClicksPerTurn: 36, CircumferenceM: 2.155, Speed: slow.Coast(7), SNRdB: 15, Seed: seed, Rub: rub, Uneven: 0.3,
	}
}

func TestFoldFindsARub(t *testing.T) {
	for seed := range seeds() / 2 {
		for _, rub := range []float64{0, 0.3} {
			s := spin(rub, seed)
			h, err := hear(s.RateHz, s.Make())
			if err != nil {
				t.Fatal(err)
			}
			f := h.Stretches[0].Fold(36)
			if f.Found != (rub > 0) {
				t.Errorf("seed %d, rub %.1f: found %v, %.1f dB ± %.2f", seed, rub, f.Found, f.PeakDB, f.ErrorDB)
			}
			// Laid over another number of clicks, a rub smears out.
			if rub > 0 && h.Stretches[0].Fold(29).PeakDB > f.PeakDB/2 {
				t.Errorf("the rub stands out over a wrong turn too")
			}
		}
	}
	if f := (&Stretch{}).Fold(36); f.Found || len(f.LevelDB) != foldParts {
		t.Error("a stretch without sound gives no even fold")
	}
}

func TestFlat(t *testing.T) {
	s := spin(0.3, 1)
	h, err := hear(s.RateHz, s.Make())
	if err != nil {
		t.Fatal(err)
	}
	back, err := HeardOf(h.Flat())
	if err != nil {
		t.Fatal(err)
	}
	if !slices.Equal(back.Flat(), h.Flat()) || !slices.Equal(back.Picture.Levels, h.Picture.Levels) {
		t.Error("numbers there and back differ")
	}
	a, b := h.Stretches[0].Fold(36), back.Stretches[0].Fold(36)
	if !slices.Equal(a.LevelDB, b.LevelDB) {
		t.Error("the fold differs after the way there and back")
	}
	n, _, _ := h.Count(0, 99)
	m, _, _ := back.Count(0, 99)
	if n != m {
		t.Errorf("%d clicks, %d after the way there and back", n, m)
	}
	flat := h.Flat()
	for i := 0; i < len(flat); i += 997 {
		if _, err := HeardOf(flat[:i]); kindOf(err) != NotFlat {
			t.Errorf("cut at %d: %v", i, err)
		}
	}
}

func FuzzHeardOf(f *testing.F) {
	f.Add([]byte{1, 2, 3})
	f.Add(make([]byte, 400))
	f.Fuzz(func(t *testing.T, data []byte) {
		var numbers []float64
		for i := 0; i+1 < len(data); i += 2 {
			v := float64(int8(data[i])) * math.Pow(2, float64(int8(data[i+1])%60))
			if data[i] == 0x80 {
				v = math.NaN()
			}
			numbers = append(numbers, v)
		}
		h, err := HeardOf(numbers)
		if err != nil {
			return
		}
		for i := range h.Stretches {
			s := &h.Stretches[i]
			s.Fold(12)
			if s.FromS() > s.ToS() {
				t.Fatal("a stretch ends before it begins")
			}
		}
		h.Picture.Columns()
		_, _, _ = h.Count(0, 10)
	})
}
