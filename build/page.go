package build

import (
	"crypto/sha256"
	"encoding/hex"
	"sort"
	"strings"
)

// File is one file of a page. Gzip and Brotli are nil where compression gains
// nothing. Precached files are those that the service worker holds.
type File struct {
	Name      string
	Data      []byte
	Gzip      []byte
	Brotli    []byte
	Precached bool
}

// Sum is the SHA-256 of the file's content in hexadecimal.
func (f *File) Sum() string {
	sum := sha256.Sum256(f.Data)
	return hex.EncodeToString(sum[:])
}

// Page is a page in memory, before it is written.
type Page struct {
	files map[string]*File
	build string
}

// Files gives the page's files by name.
func (p *Page) Files() []*File {
	list := make([]*File, 0, len(p.files))
	for _, name := range sortedNames(p.files) {
		list = append(list, p.files[name])
	}
	return list
}

// names gives the name under which a file is served, hash included, by the
// name without it.
type names map[string]string

// hashDigits of the content's hash stand in a file's name: 64 bits, too many
// for two builds of one file to meet by chance.
const hashDigits = 16

// add minifies a file and files it under a name that bears its hash.
func (p *Page) add(n names, name string, data []byte) error {
	data, err := minified(name, data)
	if err != nil {
		return err
	}
	f := &File{Data: data, Precached: true}
	dot := strings.LastIndexByte(name, '.')
	f.Name = name[:dot] + "." + f.Sum()[:hashDigits] + name[dot:]
	n[name] = f.Name
	p.files[f.Name] = f
	return nil
}

// addPlain minifies a file and files it under its own name.
func (p *Page) addPlain(name string, data []byte, precached bool) error {
	data, err := minified(name, data)
	if err != nil {
		return err
	}
	p.files[name] = &File{Name: name, Data: data, Precached: precached}
	return nil
}

// Hashed tells whether a file's name bears its content's hash, so that the
// content under that name never changes.
func Hashed(name string) bool {
	parts := strings.Split(name, ".")
	if len(parts) < 3 {
		return false
	}
	hash := parts[len(parts)-2]
	if len(hash) != hashDigits {
		return false
	}
	return strings.Trim(hash, "0123456789abcdef") == ""
}

func sortedNames[V any](m map[string]V) []string {
	list := make([]string, 0, len(m))
	for name := range m {
		list = append(list, name)
	}
	sort.Strings(list)
	return list
}
