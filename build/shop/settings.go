package shop

import (
	"errors"
	"sort"
	"strconv"
	"strings"

	"github.com/BurntSushi/toml"

	"hillwright/physics/ask"
	"hillwright/physics/rule"
	"hillwright/wasm/keep"
)

// typedHill is a hill as shop.toml names it: by a track's file or by sections.
type typedHill struct {
	id       string
	names    map[string]string
	file     string
	sections string
	at       func(key string) place
}

// settings reads shop.toml and gives the hills that it names.
func (r *reader) settings() []typedHill {
	data, ok := r.file(settingsFile)
	if !ok {
		r.mistakes.add(Mistake{File: settingsFile, Expected: "the shop's settings", Do: "make it with name, town, law, units and languages"})
		return nil
	}
	var tree map[string]any
	if _, err := toml.Decode(string(data), &tree); err != nil {
		m := Mistake{File: settingsFile, Expected: "settings in TOML", Do: err.Error()}
		var parse toml.ParseError
		if errors.As(err, &parse) {
			m.Row, m.Column, m.Do = parse.Position.Line, parse.Position.Col, parse.Message
		}
		r.mistakes.add(m)
		return nil
	}
	f := settingsReader{reader: r, lines: strings.Split(string(data), "\n")}
	return f.read(tree)
}

// settingsReader keeps the text beside the decoded tree, to tell places.
type settingsReader struct {
	*reader
	lines []string
}

func (f *settingsReader) read(tree map[string]any) []typedHill {
	var hills []typedHill
	for _, key := range sortedKeys(tree) {
		switch key {
		case "name":
			f.shop.Name = f.text(tree, key)
		case "town":
			f.shop.Town = f.text(tree, key)
		case "law":
			f.shop.LawID = f.oneOf(tree, key, lawIDs())
		case "region":
			f.region(tree)
		case "units":
			f.shop.Units = f.oneOf(tree, key, []string{"metric", "imperial"})
		case "languages":
			f.languages(tree[key])
		case "rider", "load", "day", "hill":
			hills = append(hills, f.list(key, tree[key])...)
		default:
			f.mistakes.add(f.at("", 0, key).mistake(key, "one of name, town, region, law, units, languages, [[rider]], [[load]], [[day]], [[hill]]", ""))
		}
	}
	for _, key := range []string{"name", "law", "units", "languages"} {
		_, given := tree[key]
		if _, regional := tree["region"]; key == "law" && regional {
			continue
		}
		if !given {
			f.mistakes.add(Mistake{File: settingsFile, Row: 1, Name: key, Expected: "a line " + key + " = …", Do: "add it above the first [[…]]"})
		}
	}
	for _, kind := range []string{"rider", "load", "day"} {
		if _, given := tree[kind]; !given {
			f.mistakes.add(Mistake{File: settingsFile, Name: kind, Expected: "at least one [[" + kind + "]]", Do: "add one"})
		}
	}
	return hills
}

// region takes the law that holds where the shop is, unless it names one.
func (f *settingsReader) region(tree map[string]any) {
	id := f.text(tree, "region")
	laws := rule.ForRegion(id)
	if len(laws) == 0 {
		if id != "" {
			f.mistakes.add(f.at("", 0, "region").mistake(literal(id), "a region whose law is known here: EU, or a country by ISO 3166 such as GB", "or name the law: one of "+strings.Join(lawIDs(), ", ")))
		}
		return
	}
	if _, named := tree["law"]; !named {
		f.shop.LawID = laws[0].ID
	}
}

func lawIDs() []string {
	var ids []string
	for _, l := range rule.All() {
		ids = append(ids, l.ID)
	}
	return ids
}

func (f *settingsReader) text(tree map[string]any, key string) string {
	s, ok := tree[key].(string)
	if !ok || strings.TrimSpace(s) == "" {
		f.mistakes.add(f.at("", 0, key).mistake(literal(tree[key]), "a text in quotes", ""))
	}
	return s
}

func (f *settingsReader) oneOf(tree map[string]any, key string, words []string) string {
	s, _ := tree[key].(string)
	if !contains(words, s) {
		f.mistakes.add(f.at("", 0, key).mistake(literal(tree[key]), "one of "+strings.Join(words, ", "), ""))
	}
	return s
}

func (f *settingsReader) languages(value any) {
	at := f.at("", 0, "languages")
	list, _ := value.([]any)
	if len(list) == 0 {
		f.mistakes.add(at.mistake(literal(value), "a list such as [\"en\", \"de\"], the page's own language first", ""))
		return
	}
	known := Languages()
	for _, each := range list {
		code, _ := each.(string)
		if !contains(known, code) || contains(f.shop.Languages, code) {
			f.mistakes.add(at.mistake(literal(each), "each of "+strings.Join(known, ", ")+" at most once", ""))
			continue
		}
		f.shop.Languages = append(f.shop.Languages, code)
	}
}

// list reads the tables [[kind]].
func (f *settingsReader) list(kind string, value any) []typedHill {
	tables, ok := value.([]map[string]any)
	if !ok {
		f.mistakes.add(f.at("", 0, kind).mistake("", "tables that begin with [["+kind+"]]", ""))
		return nil
	}
	var hills []typedHill
	for i, table := range tables {
		at := func(key string) place { return f.at(kind, i, key) }
		if kind == "hill" {
			hills = append(hills, f.hill(table, at))
			continue
		}
		f.thing(keep.Kind(kind), table, at)
	}
	return hills
}

func (f *settingsReader) thing(kind keep.Kind, table map[string]any, at func(string) place) {
	t := keep.Thing{Kind: kind, Names: map[string]string{}, Values: map[string]string{}, Sources: map[string]string{}}
	flat := map[string]any{}
	flatten(flat, "", table)
	for _, key := range sortedKeys(flat) {
		text := literal(flat[key])
		switch {
		case key == "id":
			t.ID = text
		case isName(key):
			f.reader.name(t.Names, strings.TrimPrefix(strings.TrimPrefix(key, "name"), "."), text, at(key))
		case strings.HasPrefix(key, "source."):
			path := strings.TrimPrefix(key, "source.")
			if _, known := ask.InputAt(string(kind) + "." + path); !known {
				f.noSuchInput(path, at(key))
			} else if f.source(text, at(key)) {
				t.Sources[path] = text
			}
		default:
			if f.value(kind, key, text, at(key)) {
				t.Values[key] = text
			}
		}
	}
	f.id(string(kind), t.ID, at("id"))
	f.named(t.Names, at("name"))
	f.shop.Things = append(f.shop.Things, t)
}

func (f *settingsReader) hill(table map[string]any, at func(string) place) typedHill {
	h := typedHill{names: map[string]string{}, at: at}
	flat := map[string]any{}
	flatten(flat, "", table)
	for _, key := range sortedKeys(flat) {
		text := literal(flat[key])
		switch {
		case key == "id":
			h.id = text
		case isName(key):
			f.reader.name(h.names, strings.TrimPrefix(strings.TrimPrefix(key, "name"), "."), text, at(key))
		case key == "file":
			h.file = text
		case key == "sections":
			h.sections = text
		default:
			f.mistakes.add(at(key).mistake(key, "one of id, name, file, sections", ""))
		}
	}
	f.id("hill", h.id, at("id"))
	f.named(h.names, at("name"))
	if (h.file == "") == (h.sections == "") {
		f.mistakes.add(at("").mistake("", "either file = \"….gpx\" or sections = \"400m@7%,60m@18%\"", "give one of the two"))
	}
	return h
}

// name files a name under its language.
func (r *reader) name(names map[string]string, language, text string, at place) {
	if language != "" && !contains(Languages(), language) {
		r.mistakes.add(at.mistake(language, "one of the languages "+strings.Join(Languages(), ", "), ""))
		return
	}
	names[language] = text
}

// named checks that there is a name.
func (r *reader) named(names map[string]string, at place) {
	if len(names) == 0 {
		r.mistakes.add(at.mistake("", "name = \"…\" or a name.LANGUAGE for each language", "add it"))
	}
}

// flatten turns nested tables into dotted paths.
func flatten(into map[string]any, prefix string, table map[string]any) {
	for key, value := range table {
		if nested, ok := value.(map[string]any); ok {
			flatten(into, prefix+key+".", nested)
			continue
		}
		into[prefix+key] = value
	}
}

// literal writes a TOML value as the inputs take it: lists with blanks.
func literal(value any) string {
	switch v := value.(type) {
	case string:
		return strings.TrimSpace(v)
	case int64:
		return strconv.FormatInt(v, 10)
	case float64:
		return strconv.FormatFloat(v, 'g', -1, 64)
	case bool:
		return strconv.FormatBool(v)
	case []any:
		parts := make([]string, len(v))
		for i, each := range v {
			parts[i] = literal(each)
		}
		return strings.Join(parts, " ")
	}
	return ""
}

// at finds where a key stands: in the nth table [[kind]], or above all tables
// when kind is empty. A key that is not there is placed at its table's head.
func (f *settingsReader) at(kind string, nth int, key string) place {
	p := place{file: settingsFile, name: key}
	inside, count := kind == "", -1
	for i, line := range f.lines {
		text := strings.TrimSpace(line)
		if strings.HasPrefix(text, "[") {
			head := strings.Trim(strings.SplitN(text, "#", 2)[0], "[] \t\r")
			if kind == "" {
				inside = false
				if head == key && p.row == 0 {
					p.row, p.column = i+1, 1
				}
				continue
			}
			if head == kind {
				count++
			}
			inside = count == nth && (head == kind || strings.HasPrefix(head, kind+"."))
			if inside && head == kind {
				p.row, p.column = i+1, 1
			}
			continue
		}
		if !inside {
			continue
		}
		left, right, found := strings.Cut(line, "=")
		if found && bareKey(left) == key {
			p.row = i + 1
			p.column = len([]rune(left)) + 2 + len([]rune(right)) - len([]rune(strings.TrimLeft(right, " \t")))
			return p
		}
	}
	return p
}

// bareKey removes blanks and quotes from a dotted key.
func bareKey(s string) string {
	parts := strings.Split(s, ".")
	for i, part := range parts {
		parts[i] = strings.Trim(strings.TrimSpace(part), "\"'")
	}
	return strings.Join(parts, ".")
}

func sortedKeys(m map[string]any) []string {
	keys := make([]string, 0, len(m))
	for k := range m {
		keys = append(keys, k)
	}
	sort.Strings(keys)
	return keys
}
