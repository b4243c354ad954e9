//go:build !js

package trial

import (
	"bytes"
	"compress/zlib"
	"encoding/hex"
	"io"
	"regexp"
	"strings"
	"unicode/utf16"
)

// sheet is what a PDF file of the browser's says: only as much of the format
// (ISO 32000) as is needed to find words in it.
type sheet struct {
	pages int
	text  string
}

var (
	pageObject  = regexp.MustCompile(`/Type\s*/Page\b[^s]`)
	object      = regexp.MustCompile(`(?m)^(\d+) 0 obj`)
	fontName    = regexp.MustCompile(`/(F\d+) (\d+) 0 R`)
	fontTable   = regexp.MustCompile(`/ToUnicode (\d+) 0 R`)
	shownOrFont = regexp.MustCompile(`/(F\d+) [\d.]+ Tf|<([0-9A-Fa-f]+)>`)
	charLine    = regexp.MustCompile(`(?m)^<([0-9A-Fa-f]{4})> <([0-9A-Fa-f]{4,})>$`)
	rangeLine   = regexp.MustCompile(`(?m)^<([0-9A-Fa-f]{4})> <([0-9A-Fa-f]{4})> <([0-9A-Fa-f]{4})>$`)
)

func readPDF(file []byte) sheet {
	s := sheet{pages: len(pageObject.FindAll(file, -1))}
	objects := map[string][]byte{}
	starts := object.FindAllSubmatchIndex(file, -1)
	for i, at := range starts {
		end := len(file)
		if i+1 < len(starts) {
			end = starts[i+1][0]
		}
		objects[string(file[at[2]:at[3]])] = file[at[1]:end]
	}
	fonts := map[string]map[uint16]string{}
	for _, name := range fontName.FindAllSubmatch(file, -1) {
		if table := fontTable.FindSubmatch(objects[string(name[2])]); table != nil {
			fonts[string(name[1])] = glyphTable(stream(objects[string(table[1])]))
		}
	}
	var text strings.Builder
	for _, at := range starts {
		content := stream(objects[string(file[at[2]:at[3]])])
		if !bytes.Contains(content, []byte(" Tf")) {
			continue
		}
		font := ""
		for _, each := range shownOrFont.FindAllSubmatch(content, -1) {
			if len(each[1]) > 0 {
				font = string(each[1])
				continue
			}
			for _, glyph := range numbers(string(each[2])) {
				text.WriteString(fonts[font][glyph])
			}
		}
	}
	s.text = bare(text.String())
	return s
}

// bare takes the spaces out: a printed page has none, and packing leaves out
// those that make no difference.
func bare(text string) string { return strings.Join(strings.Fields(text), "") }

func (s sheet) has(words string) bool { return strings.Contains(s.text, bare(words)) }

// stream gives an object's compressed stream as it was; nil when it has none.
func stream(object []byte) []byte {
	from := bytes.Index(object, []byte("stream\n"))
	if from < 0 {
		return nil
	}
	in, err := zlib.NewReader(bytes.NewReader(object[from+len("stream\n"):]))
	if err != nil {
		return nil
	}
	data, _ := io.ReadAll(in)
	return data
}

// glyphTable reads which letters a font's glyphs stand for.
func glyphTable(cmap []byte) map[uint16]string {
	table := map[uint16]string{}
	for _, line := range rangeLine.FindAllStringSubmatch(string(cmap), -1) {
		from, to, letter := numbers(line[1])[0], numbers(line[2])[0], numbers(line[3])[0]
		for i := uint16(0); from+i <= to && from+i >= from; i++ {
			table[from+i] = string(rune(letter + i))
		}
	}
	for _, line := range charLine.FindAllStringSubmatch(string(cmap), -1) {
		table[numbers(line[1])[0]] = string(utf16.Decode(numbers(line[2])))
	}
	return table
}

// numbers reads hexadecimal digits, four at a time.
func numbers(digits string) []uint16 {
	data, _ := hex.DecodeString(digits)
	var out []uint16
	for i := 0; i+1 < len(data); i += 2 {
		out = append(out, uint16(data[i])<<8|uint16(data[i+1]))
	}
	return out
}
