package ask

import (
	"encoding/json"
	"errors"
	"math"
	"math/rand/v2"
	"strconv"
	"testing"

	"pgregory.net/rapid"

	"hillwright/physics/hill"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
)

// anyQuestion sets every input to a value of its documented range, chosen by
// pick: a number from 0 to 1.
func anyQuestion(pick func(path string) float64) Question {
	q := Default()
	for _, in := range Inputs() {
		u := pick(in.Path)
		text := in.Blank
		switch {
		case in.Blank != "" && u < 0.3:
		case in.Form == Number:
			text = format(in.Low + u*(in.High-in.Low))
		case in.Form == Choice:
			text = in.Choices[int(u*0.999*float64(len(in.Choices)))]
		case in.Path == "ride.level":
			text = []string{"highest", "0", "1", "2"}[int(3.99*u)]
		case in.Path == "ride.trips":
			text = strconv.Itoa(1 + int(2.99*u))
		case in.Form == Whole:
			text = strconv.Itoa(int(in.Low + u*(in.High-in.Low)))
		case in.Form == List:
			text = format(math.Round(in.Low+u*(in.High-in.Low))) + " " + format(math.Round(in.Low+u*u*(in.High-in.Low)))
		case in.Form == Tyre:
			text = []string{"28-622", "57-559", "47-406", "100-559"}[int(3.99*u)]
		}
		if err := q.Set(in.Path, text); err != nil {
			panic(err)
		}
	}
	return q
}

// check fails when an answer is none: a problem that is not named, a number
// that is none, books that do not balance.
func check(t interface {
	Helper()
	Fatalf(string, ...any)
}, q *Question, p *hill.Profile) {
	t.Helper()
	r, a, err := q.Climb(p)
	if err != nil {
		for _, known := range []error{rig.ErrLevel, rig.ErrBrakes, rig.ErrGears, ride.ErrNoRoad} {
			if errors.Is(err, known) {
				return
			}
		}
		t.Fatalf("a problem without a name: %v", err)
	}
	if road, pack := a.Energy.Imbalance(); math.Abs(road) > 1e-6 || math.Abs(pack) > 1e-6 || math.IsNaN(road+pack) {
		t.Fatalf("books are out by %g at the road, %g behind the tyre: %+v", road, pack, a.Energy)
	}
	var m map[string]any
	if err := json.Unmarshal(AnswerJSON(r, a, ""), &m); err != nil {
		t.Fatalf("the answer is no JSON: %v", err)
	}
	for _, key := range []string{"headroom", "climb_time_s", "pack_energy_wh", "charge_left", "w_prime_left_j", "winding_peak_c", "pull_wanted_n", "steepest_grade_held"} {
		if m[key] == nil {
			t.Fatalf("%s is no number in %s", key, AnswerJSON(r, a, ""))
		}
	}
	if a.ChargeLeft < 0 || a.ChargeLeft > 1 || a.ReserveLeftJ < 0 {
		t.Fatalf("charge left %v, reserve left %v", a.ChargeLeft, a.ReserveLeftJ)
	}
}

func anyRoad(random func() float64) *hill.Profile {
	edge, height := []float64{0}, []float64{0}
	for range 1 + int(6*random()) {
		n := len(edge) - 1
		length := 2 + 300*random()
		edge = append(edge, edge[n]+length)
		height = append(height, height[n]+length*math.Sin(math.Atan(0.9*(random()-0.45))))
	}
	p, err := hill.FromHeights(edge, height, nil)
	if err != nil {
		panic(err)
	}
	return &p
}

func TestEveryQuestionHasAnAnswer(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		seed := rapid.Uint64().Draw(t, "seed")
		random := rand.New(rand.NewPCG(seed, 1))
		q := anyQuestion(func(string) float64 { return random.Float64() })
		check(t, &q, anyRoad(random.Float64))
	})
}

// Ordinary rigs, each time with a handful of inputs moved anywhere.
func TestNearlyOrdinaryQuestionsHaveAnAnswer(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		seed := rapid.Uint64().Draw(t, "seed")
		random := rand.New(rand.NewPCG(seed, 2))
		any := anyQuestion(func(string) float64 { return random.Float64() })
		q := Default()
		for range 4 {
			in := catalogue[random.IntN(len(catalogue))]
			text, _ := any.Get(in.Path)
			if err := q.Set(in.Path, text); err != nil {
				t.Fatal(err)
			}
		}
		check(t, &q, anyRoad(random.Float64))
	})
}

func FuzzQuestion(f *testing.F) {
	f.Add([]byte("any bytes make a question"))
	f.Add([]byte{0, 255, 0, 255, 128, 3, 9, 200})
	f.Fuzz(func(t *testing.T, data []byte) {
		at := 0
		next := func() float64 {
			if len(data) == 0 {
				return 0.5
			}
			at++
			return float64(data[at%len(data)]) / 255
		}
		q := anyQuestion(func(string) float64 { return next() })
		check(t, &q, anyRoad(next))
	})
}
