package build

import (
	"bytes"
	"context"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"hillwright/wasm/keep"
)

func TestCompile(t *testing.T) {
	p, err := Compile(t.Context(), "..")
	if err != nil {
		t.Fatal(err)
	}
	if !bytes.HasPrefix(p.Wasm, []byte("\x00asm\x01\x00\x00\x00")) {
		t.Error("what was compiled is no wasm file")
	}
	here, err := os.Getwd()
	if err != nil {
		t.Fatal(err)
	}
	for _, path := range []string{filepath.Dir(here), os.Getenv("HOME") + "/"} {
		if len(path) > 2 && bytes.Contains(p.Wasm, []byte(path)) {
			t.Errorf("the wasm file holds a path of this machine, %s", path)
		}
	}
	if !bytes.Contains(p.Exec, []byte("importObject")) {
		t.Error("Go's script is not the one that starts wasm files")
	}
}

// TestCompileElsewhere compiles the same source in another folder: the same
// bytes must come out.
func TestCompileElsewhere(t *testing.T) {
	if os.Getenv("HILLWRIGHT_FULL") == "" {
		t.Skip("takes long; HILLWRIGHT_FULL=1 runs it")
	}
	here, err := Compile(t.Context(), "..")
	if err != nil {
		t.Fatal(err)
	}
	dir := t.TempDir()
	for _, each := range []string{"physics", "wasm"} {
		if err := os.CopyFS(filepath.Join(dir, each), os.DirFS(filepath.Join("..", each))); err != nil {
			t.Fatal(err)
		}
	}
	for _, each := range []string{"go.mod", "go.sum"} {
		data, err := os.ReadFile(filepath.Join("..", each))
		if err != nil {
			t.Fatal(err)
		}
		if err := os.WriteFile(filepath.Join(dir, each), data, 0o644); err != nil {
			t.Fatal(err)
		}
	}
	elsewhere, err := Compile(t.Context(), dir)
	if err != nil {
		t.Fatal(err)
	}
	if !bytes.Equal(here.Wasm, elsewhere.Wasm) {
		t.Error("the wasm file depends on the folder in which it is compiled")
	}
}

func TestCompileTellsWhatIsWrong(t *testing.T) {
	dir := t.TempDir()
	if err := os.MkdirAll(filepath.Join(dir, "wasm"), 0o755); err != nil {
		t.Fatal(err)
	}
	for name, text := range map[string]string{"go.mod": "module hillwright\n\ngo 1.26.0\n", "wasm/main.go": "package main\n\nfunc main() { nothing() }\n"} {
		if err := os.WriteFile(filepath.Join(dir, name), []byte(text), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	if _, err := Compile(t.Context(), dir); err == nil || !strings.Contains(err.Error(), "undefined: nothing") {
		t.Errorf("got %v, want what the compiler says", err)
	}
	stopped, cancel := context.WithCancel(t.Context())
	cancel()
	if _, err := Compile(stopped, ".."); err == nil {
		t.Error("a stopped compile succeeded")
	}
}

func TestFindSource(t *testing.T) {
	if got, err := FindSource("shop"); err != nil || !exists(filepath.Join(got, "build", "compile.go")) {
		t.Errorf("got %q, %v", got, err)
	}
	if _, err := FindSource(t.TempDir()); err == nil || !strings.Contains(err.Error(), "expected the source of hillwright") {
		t.Errorf("got %v", err)
	}
}

// TestPageReadsTheShop gives shop.json to the page's own reader.
func TestPageReadsTheShop(t *testing.T) {
	p := parts(t)
	data, err := shopJSON(p.Shop.Shop)
	if err != nil {
		t.Fatal(err)
	}
	got, faults := keep.DecodeShop(data)
	if len(faults) > 0 || got == nil {
		t.Fatalf("the page finds faults in shop.json: %v", faults)
	}
	again, err := shopJSON(*got)
	if err != nil {
		t.Fatal(err)
	}
	if !bytes.Equal(data, again) {
		t.Errorf("the page reads another shop than was written:\n%.300s\n%.300s", data, again)
	}
}

func exists(path string) bool {
	_, err := os.Stat(path)
	return err == nil
}
