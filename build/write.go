package build

import (
	"bytes"
	"errors"
	"fmt"
	"io/fs"
	"os"
	"path/filepath"
)

// write puts a page where out is: first whole into a folder beside it, then by
// renaming, so that out is never half of one page and half of another.
func write(p *Page, out string) error {
	out, err := filepath.Abs(out)
	if err != nil {
		return err
	}
	replace, err := replaceable(out)
	if err != nil {
		return err
	}
	parent := filepath.Dir(out)
	if err := os.MkdirAll(parent, 0o755); err != nil {
		return err
	}
	tmp, err := os.MkdirTemp(parent, ".hillwright-pack-")
	if err != nil {
		return err
	}
	defer os.RemoveAll(tmp)
	next := filepath.Join(tmp, "next")
	if err := writeFiles(p, next); err != nil {
		return err
	}
	if replace {
		if err := os.Rename(out, filepath.Join(tmp, "last")); err != nil {
			return err
		}
	}
	if err := os.Rename(next, out); err != nil {
		if replace {
			err = errors.Join(err, os.Rename(filepath.Join(tmp, "last"), out))
		}
		return err
	}
	return nil
}

func writeFiles(p *Page, dir string) error {
	if err := os.Mkdir(dir, 0o755); err != nil {
		return err
	}
	for _, f := range p.Files() {
		for ending, data := range map[string][]byte{"": f.Data, ".gz": f.Gzip, ".br": f.Brotli} {
			if data == nil {
				continue
			}
			if err := os.WriteFile(filepath.Join(dir, f.Name+ending), data, 0o644); err != nil {
				return err
			}
		}
	}
	return nil
}

// replaceable tells whether out must be moved away first. It refuses a folder
// that holds something else than a page that was packed.
func replaceable(out string) (bool, error) {
	entries, err := os.ReadDir(out)
	if errors.Is(err, fs.ErrNotExist) {
		return false, nil
	}
	if err != nil {
		return false, err
	}
	if len(entries) == 0 {
		return true, nil
	}
	worker, err := os.ReadFile(filepath.Join(out, workerName))
	if err != nil || !bytes.Contains(worker, []byte(cachePrefix)) {
		return false, fmt.Errorf("%s: expected a new folder, an empty one or one packed before; choose another for -out, its files would be lost", out)
	}
	return true, nil
}
