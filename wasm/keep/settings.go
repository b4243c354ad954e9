package keep

// Settings is how a person left the page, so that a reload finds it again:
// what they like (Lang, Units, Mark, Theme, each empty when the device
// decides), what is chosen by kind ("bike", "hill"), the inputs that were
// changed since, with their sources, by whole path, the sections as typed, and
// how the hillside was left (package state says what by which name).
type Settings struct {
	Lang, Units, Mark, Theme string
	Sections                 string
	Chosen                   map[string]string
	Values, Sources          map[string]string
	Hillside                 map[string]string
}

// EncodeSettings writes settings as the JSON that DecodeSettings reads.
func EncodeSettings(s Settings) []byte {
	return append(putParts(nil, []part{
		{"lang", s.Lang, nil}, {"units", s.Units, nil}, {"mark", s.Mark, nil}, {"theme", s.Theme, nil},
		{"sections", s.Sections, nil},
		{"chosen", "", s.Chosen}, {"values", "", s.Values}, {"sources", "", s.Sources},
		{"hillside", "", s.Hillside},
	}), '\n')
}

type part struct {
	name, text string
	texts      map[string]string
}

func putParts(out []byte, parts []part) []byte {
	out = append(out, '{')
	for i, p := range parts {
		if i > 0 {
			out = append(out, ',')
		}
		out = append(putText(out, p.name), ':')
		if p.texts != nil {
			out = putMap(out, p.texts)
		} else {
			out = putText(out, p.text)
		}
	}
	return append(out, '}')
}

// DecodeSettings reads settings; ok is false, and the settings are empty, when
// the text is none.
func DecodeSettings(data []byte) (s Settings, ok bool) {
	root, _, _, want := readJSON(data)
	m, isObject := root.(map[string]any)
	if want != "" || !isObject {
		return s, false
	}
	return Settings{
		Lang: text(m["lang"]), Units: text(m["units"]), Mark: text(m["mark"]), Sections: text(m["sections"]), Theme: text(m["theme"]),
		Chosen: texts(m["chosen"]), Values: texts(m["values"]), Sources: texts(m["sources"]),
		Hillside: texts(m["hillside"]),
	}, true
}
