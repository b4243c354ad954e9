package click

// Heard is what a recording says about clicks.
type Heard struct {
	LengthS   float64
	Picture   Picture
	Stretches []Stretch // in order of time

	onsets []float64 // when single clicks were heard [s]
}

// Picture is the click-rate spectrogram in a size for drawing: how much each
// click rate stands out, over time. StartS is the middle of the first column
// [s], StepS the distance between columns; RatesHz are the rows [clicks/s],
// rising by even factors; Levels are the columns one after the other, 0 to 255.
type Picture struct {
	StartS, StepS float64
	RatesHz       []float64
	Levels        []uint8
}

// Columns is how many columns the picture has.
func (p *Picture) Columns() int {
	if len(p.RatesHz) == 0 {
		return 0
	}
	return len(p.Levels) / len(p.RatesHz)
}

// Point is a click rate at a time [s]: clicks per second, and how far it may be
// off, one standard deviation.
type Point struct{ AtS, RateHz, ErrorHz float64 }

// Stretch is a part of a recording in which clicks were followed. Curve has a
// point every quarter of a second, whose windows overlap; Points have windows
// that share no sound, so that their errors are independent. Falls tells that
// the rate goes down as in a coast-down. SureOf is the share of the stretch in
// which the clicks stand out, 0 to 1.
type Stretch struct {
	Curve, Points []Point
	Falls         bool
	SureOf        float64

	between []float32 // loudness between each click and the next [dB]
}

// FromS and ToS are the ends of a stretch [s].
func (s *Stretch) FromS() float64 { return s.Curve[0].AtS }

// ToS is where the stretch ends [s].
func (s *Stretch) ToS() float64 { return s.Curve[len(s.Curve)-1].AtS }
