package shop

import (
	"bytes"
	"encoding/csv"
	"errors"
	"io"
	"strconv"
	"strings"

	"hillwright/physics/ask"
	"hillwright/wasm/keep"
)

// needed are the columns without which no promise can be made about a bike.
// What is missing otherwise is a class default, and marked as assumed.
var needed = []string{"id", "name", "mass_kg", "tyre", "chainrings", "sprockets", "motor.kind"}

// bikes reads bikes.csv. Its first row names the columns: id, name, name.de
// (and other languages), the inputs' paths without "bike.", and source.PATH.
// Spreadsheets that write semicolons and decimal commas are understood.
func (r *reader) bikes() {
	data, ok := r.file(bikesFile)
	if !ok {
		r.mistakes.add(Mistake{File: bikesFile, Expected: "a table with a row per bike", Do: "make it with the columns " + strings.Join(needed, ", ")})
		return
	}
	data = bytes.TrimPrefix(data, []byte("\xef\xbb\xbf"))
	table := csv.NewReader(bytes.NewReader(data))
	table.FieldsPerRecord = -1
	table.TrimLeadingSpace = true
	first, _, _ := bytes.Cut(data, []byte("\n"))
	semicolons := bytes.Count(first, []byte(";")) > bytes.Count(first, []byte(","))
	if semicolons {
		table.Comma = ';'
	}
	var head []string
	for {
		cells, err := table.Read()
		if err == io.EOF {
			break
		}
		if err != nil {
			r.mistakes.add(csvMistake(err))
			if len(cells) == 0 {
				return
			}
			continue
		}
		row, _ := table.FieldPos(0)
		if head == nil {
			head = r.bikeColumns(cells, row)
			continue
		}
		if !blankRow(cells) {
			r.bike(head, cells, row, semicolons)
		}
	}
	if head == nil {
		r.mistakes.add(Mistake{File: bikesFile, Row: 1, Expected: "the columns' names: " + strings.Join(needed, ", ") + " and others"})
	}
}

func csvMistake(err error) Mistake {
	m := Mistake{File: bikesFile, Expected: "a table as spreadsheets write it (CSV)", Do: err.Error()}
	var parse *csv.ParseError
	if errors.As(err, &parse) {
		m.Row, m.Do = parse.Line, parse.Err.Error()+", at sign "+strconv.Itoa(parse.Column)+" of the row"
	}
	return m
}

func blankRow(cells []string) bool {
	for _, c := range cells {
		if strings.TrimSpace(c) != "" {
			return false
		}
	}
	return true
}

// bikeColumns checks the heading row.
func (r *reader) bikeColumns(cells []string, row int) []string {
	head := make([]string, len(cells))
	at := map[string]int{}
	for i, cell := range cells {
		name := strings.TrimSpace(cell)
		head[i] = name
		here := place{bikesFile, row, i + 1, name}
		if name == "" {
			r.mistakes.add(here.mistake("", "a column name", "name the column or delete it"))
			continue
		}
		if _, twice := at[name]; twice {
			r.mistakes.add(here.mistake(name, "each column once", "delete one of the two"))
		}
		at[name] = i
		path := strings.TrimPrefix(name, "source.")
		if name == "id" || isName(name) {
			continue
		}
		if _, known := ask.InputAt("bike." + path); !known {
			r.noSuchInput(name, here)
			head[i] = ""
		}
	}
	for _, name := range needed {
		if _, given := at[name]; !given {
			r.mistakes.add(Mistake{File: bikesFile, Row: row, Name: name, Expected: "a column named " + name, Do: "add it"})
		}
	}
	return head
}

func isName(column string) bool { return column == "name" || strings.HasPrefix(column, "name.") }

// bike reads one row.
func (r *reader) bike(head, cells []string, row int, semicolons bool) {
	t := keep.Thing{Kind: keep.Bike, Names: map[string]string{}, Values: map[string]string{}, Sources: map[string]string{}}
	if len(cells) > len(head) {
		here := place{bikesFile, row, len(head) + 1, ""}
		r.mistakes.add(here.mistake(cells[len(head)], "no more cells than columns", "put cells that hold the separator in quotes"))
	}
	for i, name := range head {
		text := ""
		if i < len(cells) {
			text = strings.TrimSpace(cells[i])
		}
		here := place{bikesFile, row, i + 1, name}
		switch {
		case name == "":
			continue
		case text == "":
			if contains(needed, name) {
				r.mistakes.add(here.mistake("", neededText(name), "fill the cell"))
			}
		case name == "id":
			t.ID = text
			r.id(string(keep.Bike), text, here)
		case isName(name):
			r.name(t.Names, strings.TrimPrefix(strings.TrimPrefix(name, "name"), "."), text, here)
		case strings.HasPrefix(name, "source."):
			if r.source(text, here) {
				t.Sources[strings.TrimPrefix(name, "source.")] = text
			}
		default:
			if semicolons {
				text = decimalPoint(name, text)
			}
			if r.value(keep.Bike, name, text, here) {
				t.Values[name] = text
			}
		}
	}
	assume(&t)
	r.shop.Things = append(r.shop.Things, t)
}

func neededText(column string) string {
	switch column {
	case "id":
		return idForm
	case "name":
		return "the bike's name"
	}
	in, _ := ask.InputAt("bike." + column)
	p := ask.Problem{Input: in}
	return p.Expected()
}

// decimalPoint mends the decimal comma in a lone number.
func decimalPoint(path, text string) string {
	if in, _ := ask.InputAt("bike." + path); in.Form == ask.Number {
		return strings.Replace(text, ",", ".", 1)
	}
	return text
}

// assume marks as assumed what would count as the maker's word though the row
// does not give it: a class default stands in for it.
func assume(t *keep.Thing) {
	prefix := string(t.Kind) + "."
	for _, in := range ask.Inputs() {
		path, ours := strings.CutPrefix(in.Path, prefix)
		if _, given := t.Values[path]; ours && !given && in.Source == ask.Sheet && in.Blank == "" {
			if _, said := t.Sources[path]; !said {
				t.Sources[path] = ask.Assumed.String()
			}
		}
	}
}

func contains(list []string, word string) bool {
	for _, each := range list {
		if each == word {
			return true
		}
	}
	return false
}
