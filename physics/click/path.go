package click

// span is a stretch of columns in which a rate is followed: the row for each.
type span struct {
	from int
	rows []int
	sure float64
}

// What a path costs, in scores: a column below enough is not worth following;
// beginning or ending costs once; a change of the rate by a row costs a little,
// a change by more than mostRows is none.
const (
	enough    = 3.2
	mostScore = 9
	turnCost  = 6
	rowCost   = 0.12
	mostRows  = 9
)

// follow finds the best path through the spectrogram's columns by dynamic
// programming, with one more state for columns without clicks.
func follow(r *rates) []span {
	rows, columns := len(r.grid), r.columns()
	if columns == 0 {
		return nil
	}
	none := rows // the state without clicks
	cost := make([]float64, rows+1)
	next := make([]float64, rows+1)
	from := make([]int16, columns*(rows+1))
	for c := range columns {
		scores := r.scores[c*rows : (c+1)*rows]
		back := from[c*(rows+1) : (c+1)*(rows+1)]
		for row := range rows {
			best, origin := cost[none]-turnCost, none
			for d := -mostRows; d <= mostRows; d++ {
				if o := row + d; o >= 0 && o < rows {
					if v := cost[o] - rowCost*float64(d*d); v > best {
						best, origin = v, o
					}
				}
			}
			next[row] = best + min(mostScore, float64(scores[row])*scoreUnit) - enough
			back[row] = int16(origin)
		}
		best, origin := cost[none], none
		for row, v := range cost[:rows] {
			if v-turnCost > best {
				best, origin = v-turnCost, row
			}
		}
		next[none], back[none] = best, int16(origin)
		cost, next = next, cost
	}
	at := none
	for row, v := range cost[:rows] {
		if v > cost[at] {
			at = row
		}
	}
	found := make([]int, columns)
	for c := columns - 1; c >= 0; c-- {
		found[c] = at
		at = int(from[c*(rows+1)+at])
	}
	return spans(r, found, none)
}

// A gap of up to bridged columns, as of a gust or a word, does not end a span;
// the rates on both sides must fit.
const bridged = 8

func spans(r *rates, found []int, none int) []span {
	var out []span
	for c := 0; c < len(found); c++ {
		if found[c] == none {
			continue
		}
		s := span{from: c}
		for c < len(found) && found[c] != none {
			s.rows = append(s.rows, found[c])
			c++
		}
		if n := len(out); n > 0 {
			last := &out[n-1]
			gap := c - len(s.rows) - (last.from + len(last.rows))
			a, b := last.rows[len(last.rows)-1], s.rows[0]
			if gap <= bridged && b-a <= 1 && a-b <= 2*(gap+1) {
				for i := range gap {
					last.rows = append(last.rows, a+(b-a)*(i+1)/(gap+1))
				}
				last.rows = append(last.rows, s.rows...)
				continue
			}
		}
		out = append(out, s)
	}
	rows := len(r.grid)
	for i := range out {
		sure := 0
		for k, row := range out[i].rows {
			if float64(r.scores[(out[i].from+k)*rows+row])*scoreUnit > enough {
				sure++
			}
		}
		out[i].sure = float64(sure) / float64(len(out[i].rows))
	}
	return out
}
