package shop

import (
	"errors"
	"strings"
	"testing"
	"testing/fstest"

	"hillwright/physics/ask"
	"hillwright/site"
)

const goodSettings = `name = "A shop"
town = "Somewhere"
law = "eu-25"
units = "metric"
languages = ["en", "de"]

[[rider]]
id = "steady"
name.en = "a steady rider"
name.de = "eine Fahrerin"
mass_kg = 80
source.mass_kg = "measured"

[[load]]
id = "bag"
name = "a bag"
mass_kg = 9

[[day]]
id = "mild"
name = "mild"
temperature_c = 15.5

[[hill]]
id = "school"
name = "the school hill"
sections = "400m@7%,60m@18%"
`

const goodBikes = `id,name,name.de,mass_kg,tyre,chainrings,sprockets,motor.kind,motor.torque_nm,source.mass_kg
longtail,the long-tail,Langheck,36,60-507,40,11 13 15,crank,85,measured
plain,the plain one,,14,37-622,28 38,11 34,none,,
`

// folder makes a shop's folder with a file changed, or taken out when the
// text is empty.
func folder(changed ...string) fstest.MapFS {
	files := fstest.MapFS{
		"shop.toml": {Data: []byte(goodSettings)},
		"bikes.csv": {Data: []byte(goodBikes)},
	}
	for i := 0; i < len(changed); i += 2 {
		if changed[i+1] == "" {
			delete(files, changed[i])
			continue
		}
		files[changed[i]] = &fstest.MapFile{Data: []byte(changed[i+1])}
	}
	return files
}

func TestRead(t *testing.T) {
	got, err := Read(folder("logo.svg", `<svg xmlns="http://www.w3.org/2000/svg"><path d="M0 0h9"/></svg>`))
	if err != nil {
		t.Fatal(err)
	}
	s := got.Shop
	if s.Name != "A shop" || s.Town != "Somewhere" || s.LawID != "eu-25" || s.Units != "metric" || strings.Join(s.Languages, " ") != "en de" {
		t.Errorf("settings: got %+v", s)
	}
	if got.Logo == nil {
		t.Error("the logo was not read")
	}
	var ids []string
	for _, each := range s.Things {
		ids = append(ids, string(each.Kind)+":"+each.ID)
		q := ask.Default()
		if err := each.Put(&q); err != nil {
			t.Errorf("%s does not fit a question: %v", each.ID, err)
		}
	}
	if want := "day:mild load:bag rider:steady bike:longtail bike:plain"; strings.Join(ids, " ") != want {
		t.Errorf("things: got %v, want %s", ids, want)
	}
	rider := s.Things[2]
	if rider.Names["en"] != "a steady rider" || rider.Names["de"] != "eine Fahrerin" || rider.Values["mass_kg"] != "80" || rider.Sources["mass_kg"] != "measured" {
		t.Errorf("rider: got %+v", rider)
	}
	bike := s.Things[3]
	if bike.Names[""] != "the long-tail" || bike.Names["de"] != "Langheck" || bike.Values["motor.torque_nm"] != "85" || bike.Values["sprockets"] != "11 13 15" {
		t.Errorf("bike: got %+v", bike)
	}
	if bike.Sources["mass_kg"] != "measured" || bike.Sources["pack.energy_wh"] != "assumed" || bike.Sources["motor.torque_nm"] != "" {
		t.Errorf("sources: got %v; what a row leaves out must count as assumed", bike.Sources)
	}
	h := s.Hills[0]
	if h.ID != "school" || h.Sections != "400m@7%,60m@18%" || len(h.EdgeM) != 3 || h.EdgeM[2] != 460 {
		t.Errorf("hill: got %+v", h)
	}
}

func TestReadSpreadsheetWithSemicolons(t *testing.T) {
	table := "\xef\xbb\xbfid;name;mass_kg;cda_m2;tyre;chainrings;sprockets;motor.kind\r\n" +
		"longtail;Langheck;36,5;0,62;60-507;40;11 13 15;crank\r\n;;;;;;;\r\n"
	got, err := Read(folder("bikes.csv", table))
	if err != nil {
		t.Fatal(err)
	}
	bike := got.Shop.Things[len(got.Shop.Things)-1]
	if bike.ID != "longtail" || bike.Values["mass_kg"] != "36.5" || bike.Values["cda_m2"] != "0.62" {
		t.Errorf("got %+v", bike)
	}
}

func TestDemoShop(t *testing.T) {
	got, err := Read(site.DemoShop())
	if err != nil {
		t.Fatal(err)
	}
	for _, each := range got.Shop.Things {
		for _, lang := range got.Shop.Languages {
			if each.Names[lang] == "" && each.Names[""] == "" {
				t.Errorf("%s %s has no name in %s", each.Kind, each.ID, lang)
			}
		}
	}
}

// TestMistakes has each mistake that a folder can hold: where it is told to be
// and a part of what is told.
func TestMistakes(t *testing.T) {
	row := func(cells string) string {
		return "id,name,mass_kg,tyre,chainrings,sprockets,motor.kind,source.mass_kg\n" + cells + "\n"
	}
	settings := func(old, new string) string {
		if !strings.Contains(goodSettings, old) {
			t.Fatalf("the test's own text lacks %q", old)
		}
		return strings.Replace(goodSettings, old, new, 1)
	}
	for _, each := range []struct {
		name, file, text string
		row, column      int
		in, says         string
	}{
		{"no settings", "shop.toml", "", 0, 0, "", "the shop's settings"},
		{"no TOML", "shop.toml", settings(`law = "eu-25"`, `law = eu-25`), 3, 7, "", "TOML"},
		{"law", "shop.toml", settings(`"eu-25"`, `"moon"`), 3, 7, "law", "one of eu-25"},
		{"units", "shop.toml", settings(`"metric"`, `"furlongs"`), 4, 9, "units", "metric, imperial"},
		{"language", "shop.toml", settings(`["en", "de"]`, `["en", "xx"]`), 5, 13, "languages", "en, de"},
		{"language twice", "shop.toml", settings(`["en", "de"]`, `["en", "en"]`), 5, 13, "languages", "at most once"},
		{"no name", "shop.toml", settings(`name = "A shop"`+"\n", ""), 1, 0, "name", "a line name"},
		{"name no text", "shop.toml", settings(`name = "A shop"`, "name = 5"), 1, 8, "name", "text in quotes"},
		{"unknown key", "shop.toml", settings(`town =`, `village =`), 2, 11, "village", "one of name, town"},
		{"unknown table", "shop.toml", goodSettings + "[[boat]]\nid = \"x\"\n", 28, 1, "boat", "[[rider]]"},
		{"rider out of range", "shop.toml", settings("mass_kg = 80", "mass_kg = 800"), 11, 11, "mass_kg", "25 to 180 kg"},
		{"rider's input unknown", "shop.toml", settings("mass_kg = 80", "mass = 80"), 11, 8, "mass", "name of an input"},
		{"rider's source", "shop.toml", settings(`"measured"`, `"guessed"`), 12, 18, "source.mass_kg", "assumed, sheet, measured"},
		{"source of nothing", "shop.toml", settings(`source.mass_kg`, `source.mas`), 12, 14, "source.mas", "name of an input"},
		{"rider without id", "shop.toml", settings(`id = "steady"`+"\n", ""), 7, 1, "id", "a short word"},
		{"rider without name", "shop.toml", settings("name.en = \"a steady rider\"\nname.de = \"eine Fahrerin\"\n", ""), 7, 1, "name", "name ="},
		{"name in no language", "shop.toml", settings(`name.de`, `name.xx`), 10, 11, "name.xx", "en, de"},
		{"sections", "shop.toml", settings(`60m@18%`, `60m@180%`), 27, 12, "sections", "400m@7%"},
		{"hill of nothing", "shop.toml", settings("sections = \"400m@7%,60m@18%\"\n", ""), 24, 1, "", "either file"},
		{"hill's key", "shop.toml", settings("sections =", "section ="), 27, 11, "section", "id, name, file, sections"},
		{"hill's file", "shop.toml", settings(`sections = "400m@7%,60m@18%"`, `file = "none.gpx"`), 27, 8, "file", "a track in hills/"},
		{"no loads", "shop.toml", settings("[[load]]\nid = \"bag\"\nname = \"a bag\"\nmass_kg = 9\n", ""), 0, 0, "load", "at least one [[load]]"},
		{"table instead of tables", "shop.toml", settings("[[load]]", "[load]"), 14, 1, "load", "[[load]]"},
		{"no bikes", "bikes.csv", "", 0, 0, "", "a row per bike"},
		{"column missing", "bikes.csv", "id,name\n", 1, 0, "mass_kg", "a column named mass_kg"},
		{"column unknown", "bikes.csv", "id,name,weight,mass_kg,tyre,chainrings,sprockets,motor.kind\n", 1, 3, "weight", "name of an input"},
		{"column without name", "bikes.csv", "id,name,,mass_kg,tyre,chainrings,sprockets,motor.kind\n", 1, 3, "", "column name"},
		{"column twice", "bikes.csv", "id,name,name,mass_kg,tyre,chainrings,sprockets,motor.kind\n", 1, 3, "name", "once"},
		{"number", "bikes.csv", row("a,A,heavy,47-622,38,11,crank,"), 2, 3, "mass_kg", "6 to 120 kg"},
		{"range", "bikes.csv", row("a,A,600,47-622,38,11,crank,"), 2, 3, "mass_kg", "6 to 120 kg"},
		{"tyre", "bikes.csv", row("a,A,20,28 inch,38,11,crank,"), 2, 4, "tyre", "ISO 5775"},
		{"teeth", "bikes.csv", row("a,A,20,47-622,38,2000,crank,"), 2, 6, "sprockets", "8 to 60"},
		{"kind", "bikes.csv", row("a,A,20,47-622,38,11,steam,"), 2, 7, "motor.kind", "rear-hub"},
		{"source", "bikes.csv", row("a,A,20,47-622,38,11,crank,hearsay"), 2, 8, "source.mass_kg", "sheet"},
		{"id", "bikes.csv", row("A bike,A,20,47-622,38,11,crank,"), 2, 1, "id", "a short word"},
		{"id twice", "bikes.csv", row("a,A,20,47-622,38,11,crank,\na,B,20,47-622,38,11,crank,"), 3, 1, "id", "of its own"},
		{"empty cell", "bikes.csv", row("a,A,,47-622,38,11,crank,"), 2, 3, "mass_kg", "fill the cell"},
		{"row too long", "bikes.csv", row("a,A,20,47-622,38,11,crank,sheet,more"), 2, 9, "", "no more cells"},
		{"quotes", "bikes.csv", row("a,\"A,20,47-622,38,11,crank,"), 2, 0, "", "at sign 29"},
		{"track", "hills/x.gpx", "no track", 0, 0, "", "GPX"},
		{"not a track", "hills/x.txt", "text", 0, 0, "", ".gpx"},
		{"track's name", "hills/my hill.gpx", "x", 0, 0, "", "a short word"},
		{"logo", "logo.svg", "<html></html>", 1, 7, "html", "<svg>"},
		{"logo cut off", "logo.svg", "<svg>", 1, 6, "", "SVG"},
		{"logo with a script", "logo.svg", "<svg><script>1</script></svg>", 1, 14, "script", "shapes"},
		{"logo from elsewhere", "logo.svg", `<svg><image href="https://host.example/x.png"/></svg>`, 1, 48, "href", "another place"},
		{"logo with a handler", "logo.svg", `<svg onload="x()"/>`, 1, 20, "onload", "script"},
	} {
		t.Run(each.name, func(t *testing.T) {
			got, err := Read(folder(each.file, each.text))
			var all Mistakes
			if !errors.As(err, &all) {
				t.Fatalf("got %v, want mistakes", err)
			}
			if len(got.Shop.Things) > 0 {
				t.Error("a folder with mistakes gave a shop")
			}
			for _, m := range all {
				if m.File == each.file && m.Row == each.row && m.Column == each.column && m.Name == each.in && strings.Contains(m.Error(), each.says) {
					return
				}
			}
			t.Errorf("no mistake at row %d, column %d (%s) that says %q in:\n%v", each.row, each.column, each.in, each.says, err)
		})
	}
}

func TestMistakesAllAtOnce(t *testing.T) {
	settings := strings.Replace(strings.Replace(goodSettings, `"eu-25"`, `"moon"`, 1), "mass_kg = 9", "mass_kg = -9", 1)
	bikes := strings.Replace(strings.Replace(goodBikes, ",36,", ",360,", 1), "37-622", "37", 1)
	_, err := Read(folder("shop.toml", settings, "bikes.csv", bikes, "logo.svg", "no picture", "hills/y.gpx", "no track"))
	want := []string{
		`bikes.csv: row 2, column 4 (mass_kg): got "360", expected a number from 6 to 120 kg`,
		`bikes.csv: row 3, column 5 (tyre): got "37", expected width and bead seat in mm by ISO 5775, such as 47-622`,
		`hills/y.gpx: `,
		`logo.svg: expected an SVG picture`,
		`shop.toml: row 3, column 7 (law): got "moon", expected one of eu-25, gb-15mph, us-1, us-2, us-3, jp-24, eu-l1e-a, eu-45, ch-25, ch-45, au-25`,
		`shop.toml: row 17, column 11 (mass_kg): got "-9", expected a number from 0 to 250 kg`,
	}
	if err == nil {
		t.Fatal("got no error")
	}
	lines := strings.Split(err.Error(), "\n")
	if len(lines) != len(want) {
		t.Fatalf("got %d mistakes, want %d:\n%v", len(lines), len(want), err)
	}
	for i := range want {
		if !strings.HasPrefix(lines[i], want[i]) {
			t.Errorf("mistake %d:\n got %s\nwant %s", i+1, lines[i], want[i])
		}
	}
}

// The law may be left to the region; a region that is not known is told.
func TestRegionGivesTheLaw(t *testing.T) {
	got, err := Read(folder("shop.toml", strings.Replace(goodSettings, `law = "eu-25"`, `region = "GB"`, 1)))
	if err != nil || got.Shop.LawID != "gb-15mph" {
		t.Errorf("in GB the law is %q, %v", got.Shop.LawID, err)
	}
	_, err = Read(folder("shop.toml", strings.Replace(goodSettings, `law = "eu-25"`, `region = "Moon"`, 1)))
	if err == nil || !strings.Contains(err.Error(), "a region whose law is known here") {
		t.Errorf("on the moon: %v", err)
	}
}
