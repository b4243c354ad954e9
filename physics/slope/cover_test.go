package slope

import (
	"math"
	"math/rand/v2"
	"testing"

	"hillwright/physics/unit"
)

// runs is how many seeded runs each coverage test makes; covered is how many
// of them the shown error (± PlusMinus, two standard errors) must cover.
const runs, covered = 1000, 950

// cover counts the runs whose shown error covers the truth.
func cover(t *testing.T, run func(rng *rand.Rand) (r Reading, truth float64)) {
	t.Helper()
	n, sum, stated := 0, 0.0, 0.0
	for seed := range uint64(runs) {
		r, truth := run(rand.New(rand.NewPCG(seed, 11)))
		off := float64(r.Grade) - truth
		if math.Abs(off) <= r.PlusMinus() {
			n++
		}
		sum += off * off / runs
		stated += r.Error / runs
	}
	t.Logf("covered %d of %d; true error %.4f, stated %.4f", n, runs, math.Sqrt(sum), stated)
	if n < covered {
		t.Errorf("the shown error covers the truth in %d of %d runs, want %d or more", n, runs, covered)
	}
	if stated > 3*math.Sqrt(sum) {
		t.Errorf("the stated error, %.4f, is more than three times the true one, %.4f: too shy to be of use", stated, math.Sqrt(sum))
	}
}

func must[T any](v T, err error) T {
	if err != nil {
		panic(err)
	}
	return v
}

// The average alone: noise that hangs together, rounding, drift and bumps.
func TestSteadyCoversTheTruth(t *testing.T) {
	cover(t, func(rng *rand.Rand) (Reading, float64) {
		s := anyStream(rng)
		truth := (2*rng.Float64() - 1) * 20 * degree
		a, _ := s.lie(0, truth, 5+15*rng.Float64())
		return Reading{Grade: unit.Grade(a.Mean), Error: float64(a.Error)}, truth
	})
}

// Two readings, the phone turned half round: the sensor has an offset, the
// phone lies a little differently each time, the road is not even.
func TestTurnedCoversTheTruth(t *testing.T) {
	cover(t, func(rng *rand.Rand) (Reading, float64) {
		s := anyStream(rng)
		grade := unit.Grade(0.3 * (2*rng.Float64() - 1))
		offset := rng.NormFloat64() * 1 * degree
		onRoad := float64(grade.Angle()) + rng.NormFloat64()*roadUnevenM/0.6
		first, t := s.lie(0, onRoad+offset+rng.NormFloat64()*seatError, 20)
		second, _ := s.lie(t+5, -onRoad+offset+rng.NormFloat64()*seatError, 20)
		r, _, err := Turned(first, second, Support{BaseM: 0.6}, "phone")
		if err != nil {
			panic(err)
		}
		return r, float64(grade)
	})
}

// One reading with an offset kept from a half turn some time ago.
func TestTiltCoversTheTruth(t *testing.T) {
	cover(t, func(rng *rand.Rand) (Reading, float64) {
		s := anyStream(rng)
		offset := rng.NormFloat64() * 1 * degree
		seat := func() float64 { return rng.NormFloat64() * seatError }
		first, at := s.lie(0, offset+seat(), 20)
		second, _ := s.lie(at+5, offset+seat(), 20)
		on := Support{BaseM: 1}
		_, kept, err := Turned(first, second, on, "phone")
		if err != nil {
			panic(err)
		}
		offset += rng.NormFloat64() * ageingError
		grade := unit.Grade(0.3 * (2*rng.Float64() - 1))
		s = anyStream(rng)
		a, _ := s.lie(0, float64(grade.Angle())+offset+seat()+rng.NormFloat64()*roadUnevenM, 20)
		return must(Tilt(a, kept, on)), float64(grade)
	})
}

// A hand that shakes, half a degree and slowly, and an eye that errs.
func TestSightedCoversTheTruth(t *testing.T) {
	cover(t, func(rng *rand.Rand) (Reading, float64) {
		s := anyStream(rng)
		s.noise, s.togetherS = (0.3+0.5*rng.Float64())*degree, 0.1+0.4*rng.Float64()
		grade := unit.Grade(0.3 * (2*rng.Float64() - 1))
		off := rng.NormFloat64()*factoryError + rng.NormFloat64()*sightingError
		a, _ := s.lie(0, float64(grade.Angle())+off, 10)
		return must(Sighted(a, Offset{})), float64(grade)
	})
}

// Lengths and heights with errors that the user states, 1 σ.
func TestTapeAndWheelCoverTheTruth(t *testing.T) {
	off := func(rng *rand.Rand, truth, err float64) Measured {
		return Measured{truth + err*rng.NormFloat64(), err}
	}
	t.Run("tape", func(t *testing.T) {
		cover(t, func(rng *rand.Rand) (Reading, float64) {
			grade := unit.Grade(0.3 * (2*rng.Float64() - 1))
			road := 1 + 3*rng.Float64()
			return must(Tape(off(rng, road*grade.Sin(), 0.005), off(rng, road, 0.01), AlongRoad)), float64(grade)
		})
	})
	t.Run("wheel", func(t *testing.T) {
		cover(t, func(rng *rand.Rand) (Reading, float64) {
			grade := unit.Grade(0.3 * (2*rng.Float64() - 1))
			turns := 20 + 100*rng.Float64()
			rise := turns * 2.1 * grade.Sin()
			foot := 400 * rng.Float64()
			return must(WheelAndHeights(off(rng, turns, 0.1), off(rng, 2.1, 0.01), off(rng, foot, 0.5), off(rng, foot+rise, 0.5))), float64(grade)
		})
	})
	t.Run("stairs", func(t *testing.T) {
		cover(t, func(rng *rand.Rand) (Reading, float64) {
			turns, steps := 5+20*rng.Float64(), float64(5+rng.IntN(30))
			steps = math.Min(steps, math.Floor(turns*2.1*0.4/0.17))
			sine := steps * 0.17 / (turns * 2.1)
			return must(WheelAndStairs(off(rng, turns, 0.1), off(rng, 2.1, 0.01), Measured{steps, 0}, off(rng, 0.17, 0.004))),
				math.Tan(math.Asin(sine))
		})
	})
}

// A ride's fixes: places and heights with errors that hang together over
// seconds to minutes, as W3C's 95 % figures say.
func TestRideCoversTheTruth(t *testing.T) {
	for _, from := range []Heights{Satellite, Barometric} {
		cover(t, func(rng *rand.Rand) (Reading, float64) {
			grade := 0.25 * (2*rng.Float64() - 1)
			place, height := 2+4*rng.Float64(), 2+4*rng.Float64()
			if from == Barometric {
				height = barometricM
			}
			together := 1 * math.Pow(120, rng.Float64())
			speed := 1.5 + 5*rng.Float64()
			n := int((60 + 250*rng.Float64()) / speed)
			keep := math.Exp(-1 / together)
			var state [3]float64
			for i := range state {
				state[i] = rng.NormFloat64()
			}
			var fixes []Fix
			north, east, heading := 0.0, 0.0, 2*math.Pi*rng.Float64()
			meridian, parallel := radii(47)
			for i := range n {
				for k := range state {
					state[k] = keep*state[k] + math.Sqrt(1-keep*keep)*rng.NormFloat64()
				}
				f := Fix{AccuracyM: place * radius95, HeightAccuracyM: height * factor95}
				f.TimeS = 1e9 + float64(i)
				f.LatDeg = 47 + (north+place*state[0])/meridian/degree
				f.LonDeg = 8 + (east+place*state[1])/parallel/degree
				f.HeightM = 500 + grade*speed*float64(i) + height*state[2]
				fixes = append(fixes, f)
				heading += 0.02 * rng.NormFloat64()
				north += speed * math.Cos(heading)
				east += speed * math.Sin(heading)
			}
			return must(RideStretch(fixes, from)), grade
		})
	}
}
