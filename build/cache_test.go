package build

import (
	"bytes"
	"fmt"
	"os"
	"path/filepath"
	"testing"
)

func TestCache(t *testing.T) {
	dir := filepath.Join(t.TempDir(), "cache")
	work := 0
	get := func(data []byte) []byte {
		f := &File{Data: data}
		got, err := cached(dir, f, func() ([]byte, error) {
			work++
			again := &File{Data: data}
			err := again.compress("")
			return again.Brotli, err
		})
		if err != nil {
			t.Fatal(err)
		}
		return got
	}
	data := bytes.Repeat([]byte("hill"), worthKeeping)
	first := get(data)
	if second := get(data); work != 1 || !bytes.Equal(first, second) {
		t.Errorf("the work was done %d times, want once, the same: %v", work, bytes.Equal(first, second))
	}
	kept, err := filepath.Glob(filepath.Join(dir, "*.br"))
	if err != nil || len(kept) != 1 {
		t.Fatalf("got %v, %v in the cache, want one file", kept, err)
	}
	for _, spoilt := range [][]byte{nil, []byte("junk"), first[:len(first)/2]} {
		if err := os.WriteFile(kept[0], spoilt, 0o644); err != nil {
			t.Fatal(err)
		}
		if got := get(data); !bytes.Equal(got, first) {
			t.Errorf("a spoilt cache (%d bytes) changed what is packed", len(spoilt))
		}
	}
	if work != 4 {
		t.Errorf("the work was done %d times, want again for each spoilt file", work)
	}
	for i := range 2 * keptAtMost {
		get(append([]byte(fmt.Sprint(i)), data...))
	}
	if kept, _ := filepath.Glob(filepath.Join(dir, "*.br")); len(kept) != keptAtMost {
		t.Errorf("got %d files in the cache, want %d", len(kept), keptAtMost)
	}
	get([]byte("small"))
	if kept, _ := filepath.Glob(filepath.Join(dir, "*.br")); len(kept) != keptAtMost {
		t.Error("a small file was kept")
	}
}

func TestCacheThatCannotBeUsed(t *testing.T) {
	file := filepath.Join(t.TempDir(), "file")
	if err := os.WriteFile(file, nil, 0o644); err != nil {
		t.Fatal(err)
	}
	f := &File{Data: bytes.Repeat([]byte("hill"), worthKeeping)}
	if err := f.compress(filepath.Join(file, "cache")); err != nil || f.Brotli == nil {
		t.Errorf("got %v and %d bytes, want the work done without the cache", err, len(f.Brotli))
	}
}
