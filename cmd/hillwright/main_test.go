package main

import (
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"testing"

	"github.com/rogpeppe/go-internal/testscript"
)

func TestMain(m *testing.M) {
	testscript.Main(m, map[string]func(){"hillwright": main})
}

// TestScripts runs the command as a person does; each script in
// testdata/script is one matter. $SOURCE is the module's folder.
func TestScripts(t *testing.T) {
	source, err := filepath.Abs(filepath.Join("..", ".."))
	if err != nil {
		t.Fatal(err)
	}
	caches, err := exec.Command("go", "env", "GOCACHE", "GOMODCACHE").Output()
	if err != nil {
		t.Fatal(err)
	}
	dirs := strings.Fields(string(caches))
	testscript.Run(t, testscript.Params{
		Dir: filepath.Join("testdata", "script"),
		Setup: func(env *testscript.Env) error {
			env.Setenv("SOURCE", source)
			env.Setenv("GOCACHE", dirs[0])
			env.Setenv("GOMODCACHE", dirs[1])
			return nil
		},
		Condition: func(word string) (bool, error) {
			return word == "full" && os.Getenv("HILLWRIGHT_FULL") != "", nil
		},
	})
}
