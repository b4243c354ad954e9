package keep

import (
	"encoding/json"
	"reflect"
	"strings"
	"testing"

	"pgregory.net/rapid"
)

func anyThings() *rapid.Generator[Things] {
	return rapid.Custom(func(t *rapid.T) Things {
		word := rapid.StringOfN(rapid.Rune(), 1, 12, 60).Filter(func(s string) bool { return strings.TrimSpace(s) == s })
		var out Things
		for i := rapid.IntRange(0, 4).Draw(t, "things"); i > 0; i-- {
			out.Things = append(out.Things, Thing{
				Kind: Bike, ID: word.Draw(t, "id"), Names: map[string]string{"": word.Draw(t, "name")},
				Values:  map[string]string{"mass_kg": "24.5", "sprockets": "11 21 46"},
				Sources: map[string]string{"mass_kg": "measured"},
				Changed: rapid.Int64Range(0, 1<<40).Draw(t, "changed"),
			})
		}
		for i := rapid.IntRange(0, 3).Draw(t, "hills"); i > 0; i-- {
			h := Hill{ID: word.Draw(t, "id"), Names: map[string]string{"de": word.Draw(t, "name")}, EdgeM: []float64{0}, HeightKnown: rapid.Bool().Draw(t, "known"), Changed: 7}
			h.HeightM = []float64{rapid.Float64Range(1900, 4000).Draw(t, "foot")}
			for n := rapid.IntRange(1, 5).Draw(t, "pieces"); n > 0; n-- {
				last := len(h.EdgeM) - 1
				d := rapid.Float64Range(1, 500).Draw(t, "length")
				h.EdgeM = append(h.EdgeM, h.EdgeM[last]+d)
				h.HeightM = append(h.HeightM, h.HeightM[last]+rapid.Float64Range(-0.9, 0.9).Draw(t, "sine")*d)
				h.BearingDeg = append(h.BearingDeg, rapid.Float64Range(0, 360).Draw(t, "bearing"))
			}
			out.Hills = append(out.Hills, h)
		}
		return out
	})
}

func TestRoundTrip(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		want := anyThings().Draw(t, "things")
		got, faults := Decode(Encode(want))
		if len(faults) > 0 {
			t.Fatal(faults)
		}
		if !reflect.DeepEqual(got, want) {
			t.Fatalf("got  %+v\nwant %+v", got, want)
		}
	})
}

// Our JSON is JSON to the standard library as well, and the other way round.
func TestAgainstStandardLibrary(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		want := anyThings().Draw(t, "things")
		var theirs struct {
			Things []Thing `json:"things"`
			Hills  []Hill  `json:"hills"`
		}
		if err := json.Unmarshal(Encode(want), &theirs); err != nil {
			t.Fatal(err)
		}
		if len(theirs.Things) != len(want.Things) || len(want.Things) > 0 && !reflect.DeepEqual(theirs.Things, want.Things) {
			t.Fatalf("got %+v, want %+v", theirs.Things, want.Things)
		}
		shop := Shop{Name: "A \u2028 <shop>", Town: "T", LawID: "eu-25", Units: "metric", Languages: []string{"en", "de"}, Things: want.Things, Hills: want.Hills}
		data, err := json.Marshal(shop)
		if err != nil {
			t.Fatal(err)
		}
		got, faults := DecodeShop(data)
		if len(faults) > 0 || !reflect.DeepEqual(*got, shop) {
			t.Fatalf("got %+v (%v), want %+v", got, faults, shop)
		}
	})
}

func TestDecodeFaults(t *testing.T) {
	head := `{"format":"hillwright-things","version":1,`
	thing := `{"kind":"bike","id":"b","names":{"":"B"},"values":{"mass_kg":"24"}}`
	tests := []struct {
		name, file string
		want       FaultKind
		in         string // words that the message must have
		kept       int    // things and hills that are read all the same
	}{
		{"empty", ``, NotOurs, "", 0},
		{"cut off", head + `"things":[` + thing, NotJSON, "comma", 0},
		{"a track", `<?xml version="1.0"?>`, NotOurs, "", 0},
		{"other JSON", `{"a":1}`, NotOurs, "not a file of saved things", 0},
		{"a list", `[]`, NotOurs, "", 0},
		{"newer", `{"format":"hillwright-things","version":2}`, Newer, "newer", 0},
		{"kind", head + `"things":[{"kind":"boat","id":"x","names":{"":"X"}},` + thing + `]}`, BadThing, "things[1]", 1},
		{"no id", head + `"things":[` + thing + `,{"kind":"bike","names":{"":"X"}}]}`, BadThing, "things[2]", 1},
		{"no name", head + `"things":[{"kind":"bike","id":"x"}]}`, BadThing, "names", 0},
		{"range", head + `"things":[{"kind":"bike","id":"x","names":{"":"X"},"values":{"mass_kg":"9000"}}]}`, BadValue, "bike.mass_kg", 1},
		{"unknown value", head + `"things":[{"kind":"bike","id":"x","names":{"":"X"},"values":{"horn":"1"}}]}`, BadValue, "bike.horn", 1},
		{"unknown source", head + `"things":[{"kind":"bike","id":"x","names":{"":"X"},"sources":{"mass_kg":"guess"}}]}`, BadValue, "mass_kg", 1},
		{"one edge", head + `"hills":[{"id":"h","names":{"":"H"},"edge_m":[0],"height_m":[0]}]}`, BadHill, "edge_m", 0},
		{"falls back", head + `"hills":[{"id":"h","names":{"":"H"},"edge_m":[0,5,4],"height_m":[0,1,1]}]}`, BadHill, "edge", 0},
		{"no number", head + `"hills":[{"id":"h","names":{"":"H"},"edge_m":[0,5],"height_m":[0,null]}]}`, BadHill, "height_m", 0},
		{"a wall", head + `"hills":[{"id":"h","names":{"":"H"},"edge_m":[0,5],"height_m":[0,5]}]}`, BadHill, "length", 0},
		{"deep", `{"things":` + strings.Repeat("[", 100000), NotJSON, "nested", 0},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			got, faults := Decode([]byte(test.file))
			if len(faults) != 1 || faults[0].Kind != test.want || !strings.Contains(faults[0].Error(), test.in) {
				t.Fatalf("faults %v, want one of kind %d with %q", faults, test.want, test.in)
			}
			if n := len(got.Things) + len(got.Hills); n != test.kept {
				t.Errorf("kept %d, want %d", n, test.kept)
			}
		})
	}
}

func TestMerge(t *testing.T) {
	thing := func(id, mass string, changed int64) Thing {
		return Thing{Kind: Bike, ID: id, Names: map[string]string{"": id}, Values: map[string]string{"mass_kg": mass}, Changed: changed}
	}
	have := Things{Things: []Thing{thing("same", "20", 5), thing("older", "20", 5), thing("newer", "20", 5)}}
	from := Things{Things: []Thing{thing("same", "20", 5), thing("older", "30", 4), thing("newer", "30", 6), thing("added", "30", 1)}}
	got, did := Merge(have, from)
	if want := (Merged{Added: 1, Replaced: 1, Same: 1, Older: 1}); did != want {
		t.Errorf("did %+v, want %+v", did, want)
	}
	for id, mass := range map[string]string{"same": "20", "older": "20", "newer": "30", "added": "30"} {
		if at := got.At(Bike, id); at < 0 || got.Things[at].Values["mass_kg"] != mass {
			t.Errorf("%s: want %s in %+v", id, mass, got.Things)
		}
	}
	if have.Things[2].Values["mass_kg"] != "20" {
		t.Error("merging altered what the device had")
	}
}

func TestSettingsRoundTrip(t *testing.T) {
	want := Settings{Lang: "de", Theme: "dusk", Chosen: map[string]string{"bike": "a\"b"}, Values: map[string]string{"bike.mass_kg": "31"}}
	got, ok := DecodeSettings(EncodeSettings(want))
	if !ok || !reflect.DeepEqual(got, want) {
		t.Errorf("got %+v %v, want %+v", got, ok, want)
	}
	if _, ok := DecodeSettings([]byte("x")); ok {
		t.Error("took x for settings")
	}
}

// Whatever the file holds: no panic, and what is kept can be kept again.
func FuzzDecode(f *testing.F) {
	f.Add(Encode(Things{Things: []Thing{{Kind: Bike, ID: "b", Names: map[string]string{"": "B"}}}}))
	f.Add([]byte(`{"format":"hillwright-things","version":1,"hills":[{"id":"h","names":{"":"H"},"edge_m":[0,5],"height_m":[0,1]}]}`))
	f.Add([]byte(`{"a":"\ud83d\ude00\u00","b":[1e5,-0.1,true,null]}`))
	f.Fuzz(func(t *testing.T, data []byte) {
		if v, _, _, want := readJSON(data); want == "" {
			if !json.Valid(data) {
				t.Fatalf("took %q for JSON: %v", data, v)
			}
		} else if json.Valid(data) && want != "less deeply nested lists" && want != "a number" {
			t.Fatalf("refused %q: wanted %s", data, want)
		}
		things, _ := Decode(data)
		again, faults := Decode(Encode(things))
		if len(faults) > 0 || len(again.Things) != len(things.Things) || len(again.Hills) != len(things.Hills) {
			t.Fatalf("%q: kept %+v, read back %+v, %v", data, things, again, faults)
		}
		for i := range things.Hills {
			if _, err := things.Hills[i].Profile("en"); err != nil {
				t.Fatal(err)
			}
		}
	})
}
