package build

import (
	"encoding/json"

	"hillwright/wasm/keep"
)

// manifest is the web app manifest. Its addresses are seen from itself, so the
// page can be installed from any path.
type manifest struct {
	Name            string         `json:"name"`
	ShortName       string         `json:"short_name"`
	Lang            string         `json:"lang"`
	StartURL        string         `json:"start_url"`
	Scope           string         `json:"scope"`
	Display         string         `json:"display"`
	BackgroundColor string         `json:"background_color"`
	ThemeColor      string         `json:"theme_color"`
	Icons           []manifestIcon `json:"icons"`
}

type manifestIcon struct {
	Src     string `json:"src"`
	Sizes   string `json:"sizes"`
	Type    string `json:"type"`
	Purpose string `json:"purpose"`
}

// mostShort is how long a name under a home-screen icon may be before devices
// cut it: about a dozen letters, common practice.
const mostShort = 12

func (p *Page) addManifest(s keep.Shop, n names) error {
	m := manifest{
		Name: s.Name, ShortName: s.Name, Lang: s.Languages[0],
		StartURL: "./", Scope: "./", Display: "standalone",
		BackgroundColor: paper, ThemeColor: paper,
		Icons: []manifestIcon{{n["icon.svg"], "any", MediaType("icon.svg"), "any"}},
	}
	if len([]rune(m.ShortName)) > mostShort {
		m.ShortName = "Hillwright"
	}
	for _, each := range icons {
		if each.purpose != "" {
			m.Icons = append(m.Icons, manifestIcon{n[each.name], each.sizes(), MediaType(each.name), each.purpose})
		}
	}
	data, err := json.Marshal(m)
	if err != nil {
		return err
	}
	return p.addPlain("manifest.webmanifest", data, true)
}
