package keep

import (
	"bytes"
	"strconv"
)

// Things is what a person has saved: bikes, riders, loads and days, and hills.
type Things struct {
	Things   []Thing
	Hills    []Hill
	Readings []Reading
	Runs     []Run
}

// The file of saved things is JSON:
//
//	{"format":"hillwright-things","version":1,
//	 "things":[{"kind":"bike","id":"…","names":{"":"…"},"values":{"mass_kg":"24"},
//	            "sources":{"mass_kg":"measured"},"changed":1790000000}],
//	 "hills":[{"id":"…","names":{"":"…"},"edge_m":[0,400],"height_m":[0,28],
//	           "bearing_deg":[90],"height_known":false,"sections":"400 m at 7 %","changed":1790000000}],
//	 "readings":[{"id":"…","place":"…","note":"…","method":"tilt-turned","grade":0.12,"error":0.002,
//	              "time_s":1790000000,"pitch_m":60,"lat_deg":44.1,"lon_deg":8.2,"changed":1790000000}],
//	 "runs":[{"id":"…","name":"…","bike":"…","kind":"clicks","time_s":1790000000,"from_s":0.4,"to_s":41.2,
//	          "back":false,"left_out":false,"at_s":[0.4,0.9],"is":[140.1,138.7],"error":[0.05,0.05]}]}
//
// Grades and errors (1 σ) are plain fractions. Readings and runs are absent
// where there are none, and in files from before there were any.
// Version rises when an older reader would misread a newer file.
const (
	fileFormat  = "hillwright-things"
	fileVersion = 1
)

// Encode writes things as the file that Decode reads.
func Encode(t Things) []byte {
	out := append([]byte(`{"format":"`), fileFormat...)
	out = append(out, `","version":`...)
	out = strconv.AppendInt(out, fileVersion, 10)
	out = append(out, `,"things":[`...)
	for i := range t.Things {
		if i > 0 {
			out = append(out, ',')
		}
		out = putThing(append(out, '\n'), &t.Things[i])
	}
	out = append(out, `],"hills":[`...)
	for i := range t.Hills {
		if i > 0 {
			out = append(out, ',')
		}
		out = putHill(append(out, '\n'), &t.Hills[i])
	}
	if len(t.Readings) > 0 {
		out = append(out, `],"readings":[`...)
		for i := range t.Readings {
			if i > 0 {
				out = append(out, ',')
			}
			out = putReading(append(out, '\n'), &t.Readings[i])
		}
	}
	if len(t.Runs) > 0 {
		out = append(out, `],"runs":[`...)
		for i := range t.Runs {
			if i > 0 {
				out = append(out, ',')
			}
			out = putRun(append(out, '\n'), &t.Runs[i])
		}
	}
	return append(out, "]}\n"...)
}

func putThing(out []byte, t *Thing) []byte {
	out = append(out, `{"kind":`...)
	out = putText(out, string(t.Kind))
	out = append(out, `,"id":`...)
	out = putText(out, t.ID)
	out = append(out, `,"names":`...)
	out = putMap(out, t.Names)
	out = append(out, `,"values":`...)
	out = putMap(out, t.Values)
	if len(t.Sources) > 0 {
		out = append(out, `,"sources":`...)
		out = putMap(out, t.Sources)
	}
	return append(putChanged(out, t.Changed), '}')
}

func putHill(out []byte, h *Hill) []byte {
	out = append(out, `{"id":`...)
	out = putText(out, h.ID)
	out = append(out, `,"names":`...)
	out = putMap(out, h.Names)
	out = append(out, `,"edge_m":`...)
	out = putNumbers(out, h.EdgeM)
	out = append(out, `,"height_m":`...)
	out = putNumbers(out, h.HeightM)
	if len(h.BearingDeg) > 0 {
		out = append(out, `,"bearing_deg":`...)
		out = putNumbers(out, h.BearingDeg)
	}
	out = append(out, `,"height_known":`...)
	out = strconv.AppendBool(out, h.HeightKnown)
	if h.Sections != "" {
		out = append(out, `,"sections":`...)
		out = putText(out, h.Sections)
	}
	return append(putChanged(out, h.Changed), '}')
}

func putChanged(out []byte, at int64) []byte {
	if at == 0 {
		return out
	}
	out = append(out, `,"changed":`...)
	return strconv.AppendInt(out, at, 10)
}

// Decode reads a file of things. Faults tell what in it was wrong; all that
// was right is given all the same. When the file as a whole cannot be read,
// nothing is given and the only fault says why.
func Decode(data []byte) (Things, []Fault) {
	if len(data) > LargestFile {
		return Things{}, []Fault{{Kind: FileTooLarge, Detail: strconv.Itoa(LargestFile >> 20)}}
	}
	if text := bytes.TrimSpace(data); len(text) == 0 || text[0] != '{' {
		return Things{}, []Fault{{Kind: NotOurs}}
	}
	root, line, column, want := readJSON(data)
	if want != "" {
		return Things{}, []Fault{{Kind: NotJSON, Where: strconv.Itoa(line) + ":" + strconv.Itoa(column), Detail: want}}
	}
	file, _ := root.(map[string]any)
	if name, _ := file["format"].(string); name != fileFormat {
		return Things{}, []Fault{{Kind: NotOurs}}
	}
	if v, ok := file["version"].(float64); !ok || v > fileVersion {
		return Things{}, []Fault{{Kind: Newer}}
	}
	r := &reader{}
	var out Things
	out.Things = r.things(file["things"])
	out.Hills = r.hills(file["hills"])
	out.Readings = r.readings(file["readings"])
	out.Runs = r.runs(file["runs"])
	return out, r.faults
}

// LargestFile is the size of the largest file that Decode reads [bytes].
const LargestFile = 64 << 20

// DecodeShop reads a shop as the pack step wrote it with encoding/json.
func DecodeShop(data []byte) (*Shop, []Fault) {
	root, line, column, want := readJSON(data)
	if want != "" {
		return nil, []Fault{{Kind: NotJSON, Where: strconv.Itoa(line) + ":" + strconv.Itoa(column), Detail: want}}
	}
	file, ok := root.(map[string]any)
	if !ok {
		return nil, []Fault{{Kind: NotOurs}}
	}
	r := &reader{}
	shop := &Shop{
		Name: text(file["name"]), Town: text(file["town"]),
		LawID: text(file["law"]), Units: text(file["units"]),
	}
	languages, _ := file["languages"].([]any)
	for _, l := range languages {
		shop.Languages = append(shop.Languages, text(l))
	}
	shop.Things = r.things(file["things"])
	shop.Hills = r.hills(file["hills"])
	return shop, r.faults
}
