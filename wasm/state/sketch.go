package state

import (
	"strconv"

	"hillwright/physics/hill"
)

// The sketch's own size [px]; its foot lies at the left. Heights are drawn
// larger than lengths, so that a line from corner to corner is a fifth.
const (
	SketchWide = 320.0
	SketchTall = 160.0
	cornerRise = 0.20
)

// sketchLengths are how long a sketch may be [m].
var sketchLengths = []float64{300, 1000, 3000}

// SketchLengths gives how long a sketch may be [m].
func SketchLengths() []float64 { return append([]float64(nil), sketchLengths...) }

// Drawing is a hill drawn with a finger: places in the order drawn [px of the
// sketch], and how long the whole sketch is [m].
type Drawing struct {
	Points []Point
	LongM  float64
}

// Point is a place in the sketch [px].
type Point struct{ X, Y float64 }

// apart is how far places lie from each other along the sketch [px]: nearer
// ones are a finger's tremble.
const apart = 6

// draw takes the finger's next place. Where the finger goes back, the line
// behind it is wiped.
func (s *State) draw(x, y float64) {
	at := Point{min(max(x, 0), SketchWide), min(max(y, 0), SketchTall)}
	kept := s.Drawn.Points
	for len(kept) > 0 && kept[len(kept)-1].X > at.X-apart {
		if at.X >= kept[len(kept)-1].X {
			return
		}
		kept = kept[:len(kept)-1]
	}
	s.Drawn.Points = append(append([]Point(nil), kept...), at)
	if len(s.Drawn.Points) > 1 {
		s.chooseHill(SketchedHill)
	}
}

func (s *State) drawLong(arg string) {
	for _, m := range sketchLengths {
		if strconv.FormatFloat(m, 'f', 0, 64) == arg {
			s.Drawn.LongM = m
		}
	}
	if s.Chosen[Hill] == SketchedHill {
		s.pickHill()
	}
}

func (d *Drawing) profile() (*hill.Profile, error) {
	along, height := make([]float64, len(d.Points)), make([]float64, len(d.Points))
	for i, p := range d.Points {
		along[i] = p.X / SketchWide * d.LongM
		height[i] = (d.Points[0].Y - p.Y) / SketchTall * cornerRise * d.LongM
	}
	p, err := hill.Drawn(along, height)
	return &p, err
}
