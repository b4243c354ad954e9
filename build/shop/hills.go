package shop

import (
	"bytes"
	"errors"
	"io/fs"
	"math"
	"path"
	"sort"
	"strings"

	"hillwright/physics/hill"
	"hillwright/physics/unit"
	"hillwright/wasm/keep"
)

// hills makes the hills of shop.toml, in its order, then one of each track in
// hills/ that shop.toml does not name.
func (r *reader) hills(named []typedHill) {
	tracks := r.tracks()
	used := map[string]bool{}
	for _, t := range named {
		h := keep.Hill{ID: t.id, Names: t.names, Sections: t.sections}
		var profile hill.Profile
		var ok bool
		switch {
		case t.file != "" && !tracks[t.file]:
			r.mistakes.add(t.at("file").mistake(t.file, "the name of a track in "+hillsFolder+"/", "put the file there or mend the name"))
		case t.file != "":
			used[t.file] = true
			profile, ok = r.track(t.file)
		case t.sections != "":
			profile, ok = r.sections(t)
		}
		if ok {
			r.shop.Hills = append(r.shop.Hills, fill(h, &profile))
		}
	}
	for _, file := range sortedNames(tracks) {
		if !used[file] {
			r.unnamed(file)
		}
	}
	if len(r.shop.Hills) == 0 && len(r.mistakes) == 0 {
		r.mistakes.add(Mistake{File: settingsFile, Name: "hill", Expected: "at least one hill", Do: "add a [[hill]] with sections, or a track to " + hillsFolder + "/"})
	}
}

// tracks lists the files of hills/.
func (r *reader) tracks() map[string]bool {
	tracks := map[string]bool{}
	entries, err := fs.ReadDir(r.folder, hillsFolder)
	if err != nil && !errors.Is(err, fs.ErrNotExist) {
		r.mistakes.add(Mistake{File: hillsFolder, Expected: "a folder that can be read", Do: err.Error()})
	}
	for _, e := range entries {
		if strings.HasPrefix(e.Name(), ".") {
			continue
		}
		if e.IsDir() || !strings.EqualFold(path.Ext(e.Name()), ".gpx") {
			r.mistakes.add(Mistake{File: hillsFolder + "/" + e.Name(), Expected: "nothing but tracks whose names end in .gpx", Do: "take it out"})
			continue
		}
		tracks[e.Name()] = true
	}
	return tracks
}

// unnamed makes a hill of a track alone: its file's name is id and name.
func (r *reader) unnamed(file string) {
	id := strings.ToLower(strings.TrimSuffix(file, path.Ext(file)))
	before := len(r.mistakes)
	r.id("hill", id, place{file: hillsFolder + "/" + file})
	if len(r.mistakes) > before {
		return
	}
	if profile, ok := r.track(file); ok {
		h := keep.Hill{ID: id, Names: map[string]string{"": strings.ReplaceAll(id, "-", " ")}}
		r.shop.Hills = append(r.shop.Hills, fill(h, &profile))
	}
}

// track reads one GPX file.
func (r *reader) track(file string) (hill.Profile, bool) {
	name := hillsFolder + "/" + file
	data, ok := r.file(name)
	if !ok {
		return hill.Profile{}, false
	}
	track, err := hill.ReadTrack(bytes.NewReader(data), nil)
	if err == nil {
		var p hill.Profile
		if p, err = hill.FromTrack(&track, hill.Options{}); err == nil {
			return p, true
		}
	}
	r.mistakes.add(Mistake{File: name, Expected: "a GPX track of a way with heights", Do: err.Error()})
	return hill.Profile{}, false
}

// sections reads a hill that is typed.
func (r *reader) sections(t typedHill) (hill.Profile, bool) {
	p, err := hill.ParseSections(t.sections)
	if err != nil {
		r.mistakes.add(t.at("sections").mistake(t.sections, "lengths and grades such as 400m@7%,60m@18%", err.Error()))
		return hill.Profile{}, false
	}
	return p, true
}

// fill puts a profile into a stored hill, in whole millimetres: finer is noise
// that would only make the shop's file larger.
func fill(h keep.Hill, p *hill.Profile) keep.Hill {
	h.HeightKnown = p.HeightKnown
	for _, x := range p.EdgeM {
		h.EdgeM = append(h.EdgeM, rounded(x, 1e3))
	}
	for _, z := range p.HeightM {
		h.HeightM = append(h.HeightM, rounded(z, 1e3))
	}
	for _, b := range p.BearingRad {
		degrees := math.Mod(unit.Angle(b).Degrees()+360, 360)
		h.BearingDeg = append(h.BearingDeg, math.Mod(rounded(degrees, 10), 360))
	}
	return h
}

func rounded(x, perUnit float64) float64 { return math.Round(x*perUnit) / perUnit }

func sortedNames(set map[string]bool) []string {
	names := make([]string, 0, len(set))
	for name := range set {
		names = append(names, name)
	}
	sort.Strings(names)
	return names
}
