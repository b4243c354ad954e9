package shop

import (
	"sort"
	"strconv"
	"strings"
)

// Mistake is one thing that is wrong in a shop's folder: where it is, what
// stands there, what was expected and, where that does not follow from it,
// what to do. Row and Column count from 1 and are 0 where the whole file is
// meant. Name is the column's heading or the key's path, empty where there is
// none.
type Mistake struct {
	File     string
	Row      int
	Column   int
	Name     string
	Got      string
	Expected string
	Do       string
}

func (m Mistake) Error() string {
	var b strings.Builder
	b.WriteString(m.File)
	if m.Row > 0 {
		b.WriteString(": row " + strconv.Itoa(m.Row))
	}
	if m.Column > 0 {
		b.WriteString(", column " + strconv.Itoa(m.Column))
	}
	if m.Name != "" {
		b.WriteString(" (" + m.Name + ")")
	}
	b.WriteString(": ")
	if m.Got != "" {
		b.WriteString("got " + strconv.Quote(short(m.Got)) + ", ")
	}
	b.WriteString("expected " + m.Expected)
	if m.Do != "" {
		b.WriteString("; " + m.Do)
	}
	return b.String()
}

// short keeps a message readable when the text in question is long.
func short(s string) string {
	const most = 60
	runes := []rune(s)
	if len(runes) <= most {
		return s
	}
	return string(runes[:most]) + "…"
}

// Mistakes is every mistake found in a shop's folder, by file, row and column.
type Mistakes []Mistake

func (m Mistakes) Error() string {
	lines := make([]string, len(m))
	for i, each := range m {
		lines[i] = each.Error()
	}
	return strings.Join(lines, "\n")
}

func (m *Mistakes) add(each Mistake) { *m = append(*m, each) }

func (m Mistakes) sort() {
	sort.SliceStable(m, func(i, j int) bool {
		a, b := m[i], m[j]
		if a.File != b.File {
			return a.File < b.File
		}
		if a.Row != b.Row {
			return a.Row < b.Row
		}
		return a.Column < b.Column
	})
}
