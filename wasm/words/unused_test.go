package words

import (
	"go/ast"
	"go/parser"
	"go/token"
	"io/fs"
	"os"
	"path/filepath"
	"strings"
	"testing"
)

// Every key is said somewhere outside the catalogue's own files. The test
// waits until the page has its main file, since keys come before their views.
func TestNoKeyIsUnused(t *testing.T) {
	if _, err := os.Stat("../main.go"); err != nil {
		t.Skip("the page is not put together yet: there is no wasm/main.go")
	}
	unused := keyNames(t)
	err := filepath.WalkDir("../..", func(path string, d fs.DirEntry, err error) error {
		switch {
		case err != nil:
			return err
		case d.IsDir() && (strings.HasPrefix(d.Name(), ".") && d.Name() != ".." || d.Name() == "testdata"):
			return filepath.SkipDir
		case strings.HasSuffix(path, ".go") && !strings.HasSuffix(path, "_test.go"):
			return strikeUsed(path, unused)
		}
		return nil
	})
	if err != nil {
		t.Fatal(err)
	}
	for name := range unused {
		t.Errorf("%s is said nowhere: use it, or take it out of the catalogue", name)
	}
}

func keyNames(t *testing.T) map[string]bool {
	names := map[string]bool{}
	for _, name := range []string{"key.go", "key_ride.go", "key_hillside.go", "key_bench.go"} {
		file, err := parser.ParseFile(token.NewFileSet(), name, nil, 0)
		if err != nil {
			t.Fatal(err)
		}
		ast.Inspect(file, func(n ast.Node) bool {
			if spec, ok := n.(*ast.ValueSpec); ok {
				names[spec.Names[0].Name] = true
			}
			return true
		})
	}
	delete(names, "keys")
	delete(names, "pageKeys")
	delete(names, "rideKeys")
	delete(names, "hillsideKeys")
	if len(names) != int(keys) {
		t.Fatalf("the key files have %d names for %d keys", len(names), keys)
	}
	return names
}

// strikeUsed strikes the keys that a file uses: words.Key elsewhere, Key
// alone in this package.
func strikeUsed(path string, unused map[string]bool) error {
	switch filepath.Base(path) {
	case "key.go", "english.go", "german.go", "key_ride.go", "english_ride.go", "german_ride.go", "key_hillside.go", "english_hillside.go", "german_hillside.go",
		"key_bench.go", "english_bench.go", "german_bench.go":
		return nil
	}
	file, err := parser.ParseFile(token.NewFileSet(), path, nil, parser.SkipObjectResolution)
	if err != nil {
		return err
	}
	inside := filepath.Base(filepath.Dir(path)) == "words"
	ast.Inspect(file, func(n ast.Node) bool {
		switch x := n.(type) {
		case *ast.SelectorExpr:
			if from, ok := x.X.(*ast.Ident); ok {
				if from.Name == "words" {
					delete(unused, x.Sel.Name)
				}
				return false // hill.NoteSpike is not this package's NoteSpike
			}
		case *ast.Ident:
			if inside {
				delete(unused, x.Name)
			}
		}
		return true
	})
	return nil
}
