package click

import "math"

// foldParts is into how many parts a turn of the wheel is laid.
const foldParts = 32

// Fold is the sound between the clicks over one turn of the wheel: how loud
// each part is beside the turn's mean [dB], the loudest, how sure a part is
// (one standard deviation), whether it stands out, and where it lies (0 to 1
// of a turn from the stretch's beginning).
type Fold struct {
	LevelDB         []float64
	PeakDB, ErrorDB float64
	Found           bool
	AtTurn          float64
}

// betweens gives the loudness between each click and the next along a stretch:
// the lower quarter of each gap, so that the clicks' own sound and its echo
// count little.
func (l *Listener) betweens(s *Stretch) []float32 {
	var out []float32
	hz := l.envelopeHz()
	phase, k := 0.0, 0
	i := int(s.FromS() * hz)
	var gap [256]int
	n := 0
	for ; i < min(len(l.level), int(s.ToS()*hz)); i++ {
		t := float64(i) / hz
		for k+2 < len(s.Curve) && s.Curve[k+1].AtS < t {
			k++
		}
		a, b := s.Curve[k], s.Curve[k+1]
		phase += (a.RateHz + (t-a.AtS)/(b.AtS-a.AtS)*(b.RateHz-a.RateHz)) / hz
		gap[l.level[i]]++
		n++
		if phase < 1 {
			continue
		}
		phase--
		below, at := 0, 0
		for v, c := range gap {
			if below += c; below*4 >= n {
				at = v
				break
			}
		}
		out = append(out, float32(float64(at)*levelDB))
		gap, n = [256]int{}, 0
	}
	return out
}

// Fold lays the sound between a stretch's clicks over the wheel's turn. A rub
// once per turn is Found where a part of the turn is louder than its
// surroundings by more than chance makes it, 1 dB at least.
func (s *Stretch) Fold(clicksPerTurn float64) Fold {
	f := Fold{LevelDB: make([]float64, foldParts)}
	around := int(math.Round(clicksPerTurn))
	if around < 4 || len(s.between) < 5*around {
		return f
	}
	var n, sum, square [foldParts]float64
	total := 0.0
	for _, v := range s.between[:around] {
		total += float64(v)
	}
	for i := 0; i+around < len(s.between); i++ {
		// Each gap beside the mean of the turn around it: what changes slowly
		// goes.
		mid := i + around/2
		turn := float64(mid) / clicksPerTurn
		part := int((turn - math.Floor(turn)) * foldParts)
		v := float64(s.between[mid]) - total/float64(around)
		n[part], sum[part], square[part] = n[part]+1, sum[part]+v, square[part]+v*v
		total += float64(s.between[i+around]) - float64(s.between[i])
	}
	scatter, filled := 0.0, 0.0
	for p := range foldParts {
		if n[p] == 0 {
			continue
		}
		f.LevelDB[p] = sum[p] / n[p]
		scatter += square[p] - sum[p]*sum[p]/n[p]
		filled += n[p]
	}
	// Gaps that follow each other are alike: about four count as one.
	f.ErrorDB = math.Sqrt(4 * scatter / math.Max(1, filled-foldParts) / (filled / foldParts))
	smooth := make([]float64, foldParts)
	for p := range foldParts {
		smooth[p] = (f.LevelDB[(p+foldParts-1)%foldParts] + 2*f.LevelDB[p] + f.LevelDB[(p+1)%foldParts]) / 4
		if smooth[p] > f.PeakDB {
			f.PeakDB, f.AtTurn = smooth[p], (float64(p)+0.5)/foldParts
		}
	}
	f.Found = f.PeakDB > max(1, 3.5*f.ErrorDB)
	return f
}
