package keep

import "sort"

// Merged tells what a merge did: how many things were added, took the place of
// an older one of the same id, were the same, or were left out because the
// device has a newer one.
type Merged struct{ Added, Replaced, Same, Older int }

// Merge puts the things of a file into what the device has. Of two with the
// same id the one that was changed later stays. Neither side is altered; the
// result shares nothing that is written to.
func Merge(have, from Things) (Things, Merged) {
	out := Things{
		Things:   append([]Thing(nil), have.Things...),
		Hills:    append([]Hill(nil), have.Hills...),
		Readings: append([]Reading(nil), have.Readings...),
		Runs:     append([]Run(nil), have.Runs...),
	}
	var did Merged
	for i := range from.Things {
		t := &from.Things[i]
		at := out.At(t.Kind, t.ID)
		if at < 0 {
			out.Things = append(out.Things, *t)
			did.Added++
			continue
		}
		if did.count(t.Changed, out.Things[at].Changed, string(putThing(nil, t)) == string(putThing(nil, &out.Things[at]))) {
			out.Things[at] = *t
		}
	}
	for i := range from.Hills {
		h := &from.Hills[i]
		at := out.HillAt(h.ID)
		if at < 0 {
			out.Hills = append(out.Hills, *h)
			did.Added++
			continue
		}
		if did.count(h.Changed, out.Hills[at].Changed, string(putHill(nil, h)) == string(putHill(nil, &out.Hills[at]))) {
			out.Hills[at] = *h
		}
	}
	for i := range from.Readings {
		r := &from.Readings[i]
		at := out.ReadingAt(r.ID)
		if at < 0 {
			out.Readings = append(out.Readings, *r)
			did.Added++
			continue
		}
		if did.count(r.Changed, out.Readings[at].Changed, string(putReading(nil, r)) == string(putReading(nil, &out.Readings[at]))) {
			out.Readings[at] = *r
		}
	}
	for i := range from.Runs {
		r := &from.Runs[i]
		at := out.RunAt(r.ID)
		if at < 0 {
			out.Runs = append(out.Runs, *r)
			did.Added++
			continue
		}
		if did.count(r.Changed, out.Runs[at].Changed, string(putRun(nil, r)) == string(putRun(nil, &out.Runs[at]))) {
			out.Runs[at] = *r
		}
	}
	return out, did
}

// count books one thing that both sides have; true when the file's one wins.
func (m *Merged) count(theirs, ours int64, same bool) bool {
	switch {
	case same:
		m.Same++
	case theirs > ours:
		m.Replaced++
		return true
	default:
		m.Older++
	}
	return false
}

// At finds a thing's place, -1 where there is none of that kind and id.
func (t *Things) At(kind Kind, id string) int {
	for i := range t.Things {
		if t.Things[i].Kind == kind && t.Things[i].ID == id {
			return i
		}
	}
	return -1
}

// HillAt finds a hill's place, -1 where there is none of that id.
func (t *Things) HillAt(id string) int {
	for i := range t.Hills {
		if t.Hills[i].ID == id {
			return i
		}
	}
	return -1
}

func sorted(m map[string]string) []string {
	names := make([]string, 0, len(m))
	for name := range m {
		names = append(names, name)
	}
	sort.Strings(names)
	return names
}
