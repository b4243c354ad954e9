// Package shop reads a shop's folder: shop.toml (name, town, law, units,
// languages, riders, loads, days and typed hills), bikes.csv (a row per bike),
// hills/*.gpx and logo.svg. Every mistake in it is reported at once. Start
// with Read.
package shop

import (
	"errors"
	"io/fs"

	"hillwright/physics/ask"
	"hillwright/wasm/keep"
)

// The names of the files in a shop's folder.
const (
	settingsFile = "shop.toml"
	bikesFile    = "bikes.csv"
	hillsFolder  = "hills"
	logoFile     = "logo.svg"
)

// Copy is what a shop's folder holds: what its page starts with, and its logo
// as SVG, nil when it has none.
type Copy struct {
	Shop keep.Shop
	Logo []byte
}

// Read reads a shop's folder. When anything is wrong in it the error is
// Mistakes, with all of them, and the copy is empty.
func Read(folder fs.FS) (Copy, error) {
	r := reader{folder: folder, seen: map[string]string{}, question: ask.Default()}
	typed := r.settings()
	if len(r.shop.Languages) == 0 {
		r.shop.Languages = []string{"en"}
	}
	r.bikes()
	r.hills(typed)
	logo := r.logo()
	if len(r.mistakes) > 0 {
		r.mistakes.sort()
		return Copy{}, r.mistakes
	}
	return Copy{Shop: r.shop, Logo: logo}, nil
}

// reader gathers the shop and the mistakes while the files are read.
type reader struct {
	folder   fs.FS
	shop     keep.Shop
	mistakes Mistakes
	// seen tells where an id was used first, by kind and id.
	seen map[string]string
	// question is where values are tried.
	question ask.Question
}

// file reads one file of the folder; ok is false when it is not there.
func (r *reader) file(name string) (data []byte, ok bool) {
	data, err := fs.ReadFile(r.folder, name)
	if err == nil {
		return data, true
	}
	if !errors.Is(err, fs.ErrNotExist) {
		r.mistakes.add(Mistake{File: name, Expected: "a file that can be read", Do: err.Error()})
	}
	return nil, false
}

// place is where a text stands.
type place struct {
	file        string
	row, column int
	name        string
}

func (p place) mistake(got, expected, do string) Mistake {
	return Mistake{File: p.file, Row: p.row, Column: p.column, Name: p.name, Got: got, Expected: expected, Do: do}
}

const idForm = "a short word of small letters, digits and hyphens, beginning with a letter, such as longtail"

// id checks an id's form and that it is used once among its kind.
func (r *reader) id(kind, id string, at place) {
	if !wellFormed(id) {
		r.mistakes.add(at.mistake(id, idForm, ""))
		return
	}
	key := kind + " " + id
	here := at.file
	if first, used := r.seen[key]; used {
		r.mistakes.add(at.mistake(id, "an id of its own", "another "+kind+" in "+first+" has it"))
		return
	}
	r.seen[key] = here
}

func wellFormed(id string) bool {
	if id == "" || len(id) > 40 || id[0] < 'a' || id[0] > 'z' {
		return false
	}
	for _, c := range id {
		if (c < 'a' || c > 'z') && (c < '0' || c > '9') && c != '-' {
			return false
		}
	}
	return true
}

// value tries a value; it reports a mistake at its place when it does not fit.
func (r *reader) value(kind keep.Kind, path, text string, at place) bool {
	err := r.question.Set(string(kind)+"."+path, text)
	var problem *ask.Problem
	if !errors.As(err, &problem) {
		return true
	}
	if problem.Kind == ask.NoSuchPath {
		r.noSuchInput(path, at)
		return false
	}
	r.mistakes.add(at.mistake(text, problem.Expected(), ""))
	return false
}

func (r *reader) noSuchInput(path string, at place) {
	r.mistakes.add(at.mistake(path, "the name of an input", "`hillwright ask -inputs` lists all"))
}

// source tries the word on where a value came from.
func (r *reader) source(word string, at place) bool {
	if _, ok := ask.ParseSource(word); ok {
		return true
	}
	r.mistakes.add(at.mistake(word, "one of assumed, sheet, measured", ""))
	return false
}
