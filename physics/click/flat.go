package click

import "math"

// Flat gives all of it as numbers, to be sent or stored; HeardOf takes them
// back.
func (h *Heard) Flat() []float64 {
	p := &h.Picture
	out := []float64{h.LengthS, p.StartS, p.StepS}
	out = appendList(out, p.RatesHz)
	// Six levels go into one number.
	out = append(out, float64(len(p.Levels)))
	for i := 0; i < len(p.Levels); i += packed {
		v := 0.0
		for k := range packed {
			v *= 256
			if i+k < len(p.Levels) {
				v += float64(p.Levels[i+k])
			}
		}
		out = append(out, v)
	}
	out = appendList(out, h.onsets)
	out = append(out, float64(len(h.Stretches)))
	for i := range h.Stretches {
		s := &h.Stretches[i]
		fall := 0.0
		if s.Falls {
			fall = 1
		}
		out = append(out, fall, s.SureOf)
		for _, list := range [][]Point{s.Curve, s.Points} {
			out = append(out, float64(len(list)))
			for _, q := range list {
				out = append(out, q.AtS, q.RateHz, q.ErrorHz)
			}
		}
		out = append(out, float64(len(s.between)))
		for _, v := range s.between {
			out = append(out, float64(v))
		}
	}
	return out
}

const packed = 6

func appendList(out, list []float64) []float64 {
	return append(append(out, float64(len(list))), list...)
}

// flat reads numbers; once something does not fit, bad stays.
type flat struct {
	left []float64
	bad  bool
}

func (f *flat) next() float64 {
	if len(f.left) == 0 {
		f.bad = true
		return 0
	}
	v := f.left[0]
	f.left = f.left[1:]
	if math.IsNaN(v) || math.IsInf(v, 0) {
		f.bad = true
	}
	return v
}

// length is how many entries follow, of so many numbers each.
func (f *flat) length(each int) int {
	v := f.next()
	if !(v >= 0 && v <= float64(len(f.left)/each)) || v != math.Trunc(v) {
		f.bad = true
		return 0
	}
	return int(v)
}

func (f *flat) list() []float64 {
	out := make([]float64, f.length(1))
	for i := range out {
		out[i] = f.next()
	}
	return out
}

func (f *flat) points() []Point {
	out := make([]Point, f.length(3))
	for i := range out {
		out[i] = Point{f.next(), f.next(), f.next()}
		p := &out[i]
		if !(p.RateHz > 0) || !(p.ErrorHz >= 0) || i > 0 && !(p.AtS > out[i-1].AtS) {
			f.bad = true
		}
	}
	return out
}

func (f *flat) levels() []uint8 {
	n := f.next()
	if !(n >= 0 && n <= float64(packed*len(f.left))) || n != math.Trunc(n) {
		f.bad = true
		return nil
	}
	out := make([]uint8, int(n))
	for i := 0; i < len(out); i += packed {
		v := f.next()
		if !(v >= 0 && v < 1<<(8*packed)) || v != math.Trunc(v) {
			f.bad = true
			return nil
		}
		whole := uint64(v)
		for k := packed - 1; k >= 0; k-- {
			if i+k < len(out) {
				out[i+k] = uint8(whole)
			}
			whole >>= 8
		}
	}
	return out
}

// HeardOf takes back what Flat gave. The error is an *Error.
func HeardOf(numbers []float64) (*Heard, error) {
	f := &flat{left: numbers}
	h := &Heard{LengthS: f.next()}
	p := &h.Picture
	p.StartS, p.StepS = f.next(), f.next()
	p.RatesHz = f.list()
	p.Levels = f.levels()
	if rows := len(p.RatesHz); rows == 0 && len(p.Levels) > 0 || rows > 0 && len(p.Levels)%rows != 0 {
		f.bad = true
	}
	h.onsets = f.list()
	for range f.length(5) {
		s := Stretch{Falls: f.next() == 1, SureOf: f.next()}
		s.Curve, s.Points = f.points(), f.points()
		for _, v := range f.list() {
			s.between = append(s.between, float32(v))
		}
		if len(s.Curve) < 2 {
			f.bad = true
		}
		h.Stretches = append(h.Stretches, s)
	}
	if f.bad || len(f.left) > 0 {
		return nil, &Error{Kind: NotFlat}
	}
	return h, nil
}
