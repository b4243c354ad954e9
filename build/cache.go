package build

import (
	"bytes"
	"io"
	"os"
	"path/filepath"
	"runtime/debug"

	"github.com/andybalholm/brotli"
)

// worthKeeping is the size from which brotli's work is kept [bytes]: below it
// the work is done sooner than a file is written.
const worthKeeping = 200_000

// keptAtMost is how many files the cache holds.
const keptAtMost = 8

// cached gives a file's brotli form from the cache, or makes it and keeps it
// there. What is kept is believed only when it unpacks to the file's content,
// and only of the same encoder, so that the cache never changes what is packed.
// A cache that cannot be used is passed over.
func cached(dir string, f *File, compress func() ([]byte, error)) ([]byte, error) {
	if dir == "" || len(f.Data) < worthKeeping {
		return compress()
	}
	name := filepath.Join(dir, encoder()+"-"+f.Sum()+".br")
	if kept, err := os.ReadFile(name); err == nil {
		content, err := io.ReadAll(brotli.NewReader(bytes.NewReader(kept)))
		if err == nil && bytes.Equal(content, f.Data) {
			return kept, nil
		}
	}
	small, err := compress()
	if err != nil || small == nil {
		return small, err
	}
	if os.MkdirAll(dir, 0o755) == nil && os.WriteFile(name, small, 0o644) == nil {
		forget(dir)
	}
	return small, nil
}

// encoder names the brotli module and its version.
func encoder() string {
	if info, ok := debug.ReadBuildInfo(); ok {
		for _, m := range info.Deps {
			if m.Path == "github.com/andybalholm/brotli" {
				return "brotli-" + m.Version
			}
		}
	}
	return "brotli"
}

// forget removes the oldest files of the cache above keptAtMost.
func forget(dir string) {
	names, err := filepath.Glob(filepath.Join(dir, "brotli*.br"))
	for err == nil && len(names) > keptAtMost {
		oldest := 0
		for i := range names {
			if changed(names[i]) < changed(names[oldest]) {
				oldest = i
			}
		}
		err = os.Remove(names[oldest])
		names = append(names[:oldest], names[oldest+1:]...)
	}
}

func changed(name string) int64 {
	info, err := os.Stat(name)
	if err != nil {
		return 0
	}
	return info.ModTime().UnixNano()
}
