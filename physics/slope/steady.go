package slope

import (
	"math"

	"hillwright/physics/unit"
)

// The steps to which browsers round what sensors say (W3C, Device Orientation
// and Motion, 2024, section 6): 0.1° for angles, 0.1 m/s² for accelerations.
const (
	OrientationStep  unit.Angle = 0.1 * math.Pi / 180
	AccelerationStep unit.Angle = 0.1 / unit.Gravity
)

const (
	cellS      = 0.1 // samples are gathered in cells of this time [s]
	mostCells  = 300 // of which the newest 30 s count
	leastCells = 20  // and 2 s are the least to trust
	gapS       = 2.0 // a longer silence begins anew [s]
)

// The error that is enough where nobody says, and the finest step of a sensor.
const (
	usualTarget = 0.1 * degree
	finestStep  = 1e-9
)

// degree is one degree [rad].
const degree = math.Pi / 180

// Average is what Steady has made of its samples so far. Mean and Error (1 σ)
// are angles; Error counts that samples hang together in time, their rounding,
// and a drift. It leaves out what an average cannot see: the sensor's offset
// and how the phone lies.
type Average struct {
	Mean, Error unit.Angle
	// Seconds is how long the samples span that count [s].
	Seconds float64
	// Steadiness tells how still the phone is now, 0 to 1; 0.5 is a scatter of
	// 0.3° over the last second.
	Steadiness float64
	// Progress goes from 0 to 1, at which the error has come down to the target.
	Progress float64
	// Drifting tells that the angle goes steadily one way.
	Drifting bool
	// Moves counts how often averaging began anew because the phone was moved;
	// Bumps counts tenths of a second that were left out.
	Moves, Bumps int
	// Enough tells that there are two seconds or more and the error is at the target.
	Enough bool
}

// Steady averages an angle while a phone lies or is held still. It leaves out
// bumps, begins anew when the phone is moved, and says when it is enough. Make
// it with NewSteady. It remembers 30 s and costs some 15 µs a sample.
type Steady struct {
	target, step float64
	cells        []cell
	open         cell
	openEndS     float64
	lastS        float64
	moves        int
	now          Average
	work         work
}

// cell is the mean of the samples of a tenth of a second.
type cell struct {
	timeS, mean, squares float64
	count                int
}

// NewSteady begins an average. target is the error (1 σ) that is enough, 0 for
// 0.1°; step is what the sensor rounds to, OrientationStep or
// AccelerationStep.
func NewSteady(target, step unit.Angle) *Steady {
	if !(target > 0) {
		target = usualTarget
	}
	return &Steady{target: float64(target), step: max(float64(step), finestStep)}
}

// Average gives the state; it costs nothing.
func (s *Steady) Average() Average { return s.now }

// Add takes a sample: its time [s, rising] and angle [rad]. A sample that is
// not a number is passed over; after a silence of two seconds, or when time
// goes back, averaging begins anew. Angles from −π to π.
func (s *Steady) Add(timeS float64, angle unit.Angle) {
	if !finite(timeS) || !(math.Abs(float64(angle)) <= math.Pi) {
		return
	}
	begun := s.open.count > 0 || len(s.cells) > 0
	if begun && (timeS < s.lastS || timeS > s.lastS+gapS) {
		s.cells, s.open = s.cells[:0], cell{}
		s.now = Average{Moves: s.moves}
	}
	s.lastS = timeS
	if s.open.count > 0 && timeS >= s.openEndS {
		if len(s.cells) == mostCells {
			copy(s.cells, s.cells[1:])
			s.cells = s.cells[:mostCells-1]
		}
		s.cells = append(s.cells, s.open)
		s.open = cell{}
		s.refresh()
	}
	if s.open.count == 0 {
		s.openEndS = timeS + cellS
	}
	s.open.add(timeS, float64(angle))
}

// add keeps mean and sum of squares (Welford 1962, Technometrics 4, 419).
func (c *cell) add(timeS, v float64) {
	c.count++
	d := v - c.mean
	c.mean += d / float64(c.count)
	c.squares += d * (v - c.mean)
	c.timeS += (timeS - c.timeS) / float64(c.count)
}

// refresh makes the average anew of the cells.
func (s *Steady) refresh() {
	w := &s.work
	if s.moved() {
		s.moves++
		s.cells = append(s.cells[:0], s.cells[len(s.cells)-newestCells:]...)
	}
	s.now = Average{Moves: s.moves, Steadiness: steadiness(s.cells)}
	bumps := w.keep(s.cells)
	n := len(w.kept)
	if n < 4 {
		return
	}
	s.now.Bumps = bumps
	s.now.Seconds = w.kept[n-1].timeS - w.kept[0].timeS + cellS
	mean, err, drift, drifting := w.mean(s.step)
	s.now.Mean, s.now.Error = unit.Angle(mean), unit.Angle(root(err, drift))
	s.now.Drifting = drifting
	wanted := s.target / float64(s.now.Error)
	s.now.Progress = min(1, wanted*wanted, float64(n)/leastCells)
	s.now.Enough = s.now.Progress >= 1 && !drifting
}
