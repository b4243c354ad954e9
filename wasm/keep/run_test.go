package keep

import (
	"math"
	"slices"
	"testing"

	"pgregory.net/rapid"
)

func someRun() Run {
	return Run{
		ID: "own-1", Name: "out.mp3", Bike: "city", Kind: ClickRun, TimeS: 1.79e9, FromS: 0.5, ToS: 2,
		AtS: []float64{0.5, 1, 1.5, 2}, Is: []float64{140, 138.5, 137, 135.2}, Error: []float64{0.1, 0.1, 0.1, 0.2}, Changed: 7,
	}
}

// What is written is read again, figure for figure.
func TestRunRoundTrip(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		r := someRun()
		r.Name = rapid.StringN(0, 20, 80).Draw(t, "name")
		r.Back, r.LeftOut = rapid.Bool().Draw(t, "back"), rapid.Bool().Draw(t, "left out")
		r.Kind = rapid.SampledFrom([]RunKind{ClickRun, SpeedRun, MarkRun}).Draw(t, "kind")
		r.Is[1] = rapid.Float64Range(0.1, 500).Draw(t, "rate")
		file := Encode(Things{Runs: []Run{r}})
		got, faults := Decode(file)
		if len(faults) > 0 || len(got.Runs) != 1 {
			t.Fatalf("%s: %v", file, faults)
		}
		g := got.Runs[0]
		if g.ID != r.ID || g.Name != r.Name || g.Bike != r.Bike || g.Kind != r.Kind || g.Back != r.Back || g.LeftOut != r.LeftOut ||
			g.TimeS != r.TimeS || g.FromS != r.FromS || g.ToS != r.ToS || g.Changed != r.Changed ||
			!slices.Equal(g.AtS, r.AtS) || !slices.Equal(g.Is, r.Is) || !slices.Equal(g.Error, r.Error) {
			t.Fatalf("%+v became %+v", r, g)
		}
	})
}

// Runs that are wrong are left out and told; those beside them stay.
func TestRunFaults(t *testing.T) {
	head := `{"format":"hillwright-things","version":1,"things":[],"hills":[],"runs":[`
	good := `{"id":"a","kind":"speeds","time_s":1,"from_s":0,"to_s":2,"at_s":[0,1,2],"is":[8,7,6],"error":[0.1,0.1,0.1]}`
	for _, bad := range []string{
		`7`, `{}`,
		`{"id":"b","kind":"songs","time_s":1,"from_s":0,"to_s":2,"at_s":[0,1],"is":[8,7],"error":[0.1,0.1]}`,
		`{"id":"b","kind":"speeds","time_s":1,"from_s":0,"to_s":2,"at_s":[0,1],"is":[8],"error":[0.1,0.1]}`,
		`{"id":"b","kind":"speeds","time_s":1,"from_s":0,"to_s":2,"at_s":[1,0],"is":[8,7],"error":[0.1,0.1]}`,
		`{"id":"b","kind":"speeds","time_s":1,"from_s":0,"to_s":2,"at_s":[0,1],"is":[8,7],"error":[0.1,0]}`,
		`{"id":"b","kind":"speeds","time_s":1,"from_s":3,"to_s":2,"at_s":[0,1],"is":[8,7],"error":[0.1,1]}`,
		`{"id":"b","kind":"speeds","from_s":0,"to_s":2,"at_s":[0,1],"is":[8,7],"error":[0.1,1]}`,
		`{"id":"b","kind":"speeds","time_s":1,"from_s":0,"to_s":2,"at_s":[0,"1"],"is":[8,7],"error":[0.1,1]}`,
	} {
		got, faults := Decode([]byte(head + bad + "," + good + `]}`))
		if len(faults) != 1 || len(got.Runs) != 1 || got.Runs[0].ID != "a" {
			t.Errorf("%s: %v, %d kept", bad, faults, len(got.Runs))
		}
	}
}

func TestRunMerge(t *testing.T) {
	old, new := someRun(), someRun()
	new.Back, new.Changed = true, 8
	other := someRun()
	other.ID = "own-2"
	got, did := Merge(Things{Runs: []Run{old}}, Things{Runs: []Run{new, other}})
	if did.Replaced != 1 || did.Added != 1 || len(got.Runs) != 2 || !got.Runs[0].Back {
		t.Errorf("merged: %+v, %+v", did, got.Runs)
	}
}

// A run's part that counts, by kind.
func TestRunAsCoast(t *testing.T) {
	r := someRun()
	r.FromS = 1
	if got := r.Coast(0.06); len(got.Points) != 3 || math.Abs(got.Points[0].SpeedMps-138.5*0.06) > 1e-12 || math.Abs(got.Points[0].ErrorMps-0.006) > 1e-12 {
		t.Errorf("clicks: %+v", got)
	}
	r.Kind = MarkRun
	if got := r.Coast(0.06); len(got.Marks) != 3 || got.Marks[0].AtM != 138.5 || got.Marks[0].ErrorS != 0.1 {
		t.Errorf("marks: %+v", got)
	}
}
