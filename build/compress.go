package build

import (
	"bytes"
	"compress/gzip"
	"io"
	"runtime"
	"sync"

	"github.com/andybalholm/brotli"
)

// compress gives every file that gains by it a gzip and a brotli sibling. The
// files are independent of each other, so all processors work at once; the
// outcome does not depend on their order.
// cache is where brotli's work is kept, "" for nowhere.
func (p *Page) compress(cache string) error {
	files := p.Files()
	errs := make([]error, len(files))
	var running sync.WaitGroup
	free := make(chan struct{}, runtime.NumCPU())
	for i, f := range files {
		if MediaType(f.Name) == "image/png" {
			continue
		}
		running.Add(1)
		free <- struct{}{}
		go func() {
			defer running.Done()
			errs[i] = f.compress(cache)
			<-free
		}()
	}
	running.Wait()
	for _, err := range errs {
		if err != nil {
			return err
		}
	}
	return nil
}

func (f *File) compress(cache string) error {
	zipped, err := squeezed(f.Data, func(w io.Writer) (io.WriteCloser, error) {
		return gzip.NewWriterLevel(w, gzip.BestCompression)
	})
	if err != nil {
		return err
	}
	f.Gzip = zipped
	f.Brotli, err = cached(cache, f, func() ([]byte, error) {
		return squeezed(f.Data, func(w io.Writer) (io.WriteCloser, error) {
			return brotli.NewWriterOptions(w, brotli.WriterOptions{Quality: brotli.BestCompression, LGWin: 22}), nil
		})
	})
	return err
}

// squeezed compresses data; nil when that gains nothing.
func squeezed(data []byte, open func(io.Writer) (io.WriteCloser, error)) ([]byte, error) {
	var out bytes.Buffer
	w, err := open(&out)
	if err != nil {
		return nil, err
	}
	if _, err := w.Write(data); err != nil {
		return nil, err
	}
	if err := w.Close(); err != nil {
		return nil, err
	}
	if out.Len() >= len(data) {
		return nil, nil
	}
	return out.Bytes(), nil
}
