package shop

import (
	"bytes"
	"encoding/xml"
	"errors"
	"io"
	"strings"
)

// logo reads logo.svg, where there is one. It must be a picture and nothing
// more: the page's rules forbid scripts and anything from another place.
func (r *reader) logo() []byte {
	data, ok := r.file(logoFile)
	if !ok {
		return nil
	}
	const picture = "an SVG picture"
	d := xml.NewDecoder(bytes.NewReader(data))
	found := false
	for {
		token, err := d.Token()
		if errors.Is(err, io.EOF) {
			break
		}
		row, column := d.InputPos()
		at := place{file: logoFile, row: row, column: column}
		if err != nil {
			r.mistakes.add(at.mistake("", picture, err.Error()))
			return nil
		}
		el, isStart := token.(xml.StartElement)
		if !isStart {
			continue
		}
		at.name = el.Name.Local
		if !found && el.Name.Local != "svg" {
			r.mistakes.add(at.mistake(el.Name.Local, picture+" that begins with <svg>", ""))
			return nil
		}
		found = true
		r.logoElement(el, at)
	}
	if !found {
		r.mistakes.add(Mistake{File: logoFile, Expected: picture})
	}
	return data
}

func (r *reader) logoElement(el xml.StartElement, at place) {
	switch strings.ToLower(el.Name.Local) {
	case "script", "foreignobject", "iframe":
		r.mistakes.add(at.mistake(el.Name.Local, "shapes and text only", "take it out"))
	}
	for _, a := range el.Attr {
		name, value := strings.ToLower(a.Name.Local), strings.ToLower(a.Value)
		at.name = a.Name.Local
		switch {
		case strings.HasPrefix(name, "on"):
			r.mistakes.add(at.mistake(a.Name.Local, "no attribute that runs a script", "take it out"))
		case a.Name.Space == "xmlns" || name == "xmlns":
		case strings.Contains(value, "//") || strings.Contains(value, "javascript:"):
			r.mistakes.add(at.mistake(a.Value, "nothing from another place", "put the picture's parts into the file itself"))
		}
	}
}
