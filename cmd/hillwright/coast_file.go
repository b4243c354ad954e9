package main

import (
	"errors"
	"fmt"
	"io"
	"os"

	"hillwright/physics/click"
	"hillwright/physics/coast"
	"hillwright/physics/sound"
)

// heard is one file of a coast-down: what was followed in a recording, or what
// a table says.
type heard struct {
	name  string
	sound *click.Heard
	cut   bool       // the recording ends before its time
	table *coast.Run // nil for a recording
}

// hear reads a file: a recording, else a table.
func hear(name string) (heard, error) {
	h := heard{name: name}
	file, err := os.Open(name)
	if err != nil {
		return h, err
	}
	defer file.Close()
	var other *sound.Error
	h.sound, h.cut, err = listen(file)
	if errors.As(err, &other) && other.Kind == sound.NotSound && other.Looks == sound.LookText {
		if _, err = file.Seek(0, io.SeekStart); err != nil {
			return h, fmt.Errorf("%s: %w", name, err)
		}
		var run coast.Run
		run, err = readTable(file)
		h.table = &run
	}
	if err != nil {
		return h, fmt.Errorf("%s: %w", name, err)
	}
	return h, nil
}

// listen follows the clicks of a recording.
func listen(file io.Reader) (*click.Heard, bool, error) {
	r, err := sound.Open(file)
	if err != nil {
		return nil, false, err
	}
	h, err := click.Hear(r, nil)
	_, cut := r.Cut()
	return h, cut, err
}
