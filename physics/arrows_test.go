package physics_test

import (
	"os/exec"
	"strings"
	"testing"
)

// floors are the packages of the computation, lowest first: a package may know
// those of lower floors only.
var floors = map[string]int{
	"unit": 0, "sound": 1, "click": 1, "synth": 1, "air": 1, "gear": 1, "rider": 1, "motor": 1, "pack": 1, "brake": 1, "assume": 0,
	"road": 2, "rule": 2, "rig": 3, "hill": 3, "coast": 3, "ride": 4, "ask": 5, "slope": 5,
}

// banned are what the computation must not know, with the reason.
var banned = map[string]string{
	"syscall/js": "the browser", "net": "the network", "net/http": "the network", "math/rand": "the system's chance",
	"math/rand/v2": "the system's chance", "encoding/json": "size in the page", "encoding/xml": "size in the page",
	"regexp": "size in the page", "text/template": "size in the page", "html/template": "size in the page",
	"fmt": "size in the page", "log": "size in the page", "log/slog": "size in the page", "os/exec": "the system",
}

func list(t *testing.T, format, pattern string) []string {
	t.Helper()
	out, err := exec.Command("go", "list", "-f", format, pattern).CombinedOutput()
	if err != nil {
		t.Fatalf("go list: %v\n%s", err, out)
	}
	return strings.Split(strings.TrimSpace(string(out)), "\n")
}

func TestArrowsRunDown(t *testing.T) {
	const prefix = "hillwright/physics/"
	for _, line := range list(t, `{{.ImportPath}} {{join .Imports " "}}`, "hillwright/physics/...") {
		words := strings.Fields(line)
		name := strings.TrimPrefix(words[0], prefix)
		if words[0] == "hillwright/physics" {
			continue
		}
		floor, known := floors[name]
		if !known {
			t.Errorf("%s has no floor: give it one in this test", name)
		}
		for _, imported := range words[1:] {
			if why, bad := banned[imported]; bad {
				t.Errorf("%s imports %s (%s)", name, imported, why)
			}
			if imported == "time" || imported == "os" {
				t.Errorf("%s imports %s: the computation has no clock and no files", name, imported)
			}
			if !strings.HasPrefix(imported, "hillwright/") {
				continue
			}
			below, inside := strings.CutPrefix(imported, prefix)
			if !inside {
				t.Errorf("%s imports %s from outside the computation", name, imported)
			} else if floors[below] >= floor {
				t.Errorf("%s imports %s, which is not on a lower floor", name, below)
			}
		}
	}
}

// What the page's pure packages draw in, through whatever they import, must
// not know the browser.
func TestOnlyThePageKnowsTheBrowser(t *testing.T) {
	for _, line := range list(t, `{{.ImportPath}} {{join .Deps " "}}`, "hillwright/wasm/...") {
		words := strings.Fields(line)
		switch words[0] {
		case "hillwright/wasm", "hillwright/wasm/page", "hillwright/wasm/device", "hillwright/wasm/trial":
			continue
		}
		for _, dep := range words[1:] {
			if dep == "syscall/js" || strings.HasPrefix(dep, "github.com/hexops/vecty") {
				t.Errorf("%s draws in %s", words[0], dep)
			}
		}
	}
}
