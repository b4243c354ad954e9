package slope

import "math"

// Distance gives the road rolled over [m] by turns of a wheel of a known
// circumference [m]; the errors are 1 σ. A turn counted to a quarter is right
// to 0.1 turn. Turns 0 to 1e6, circumference up to 4 m.
func Distance(turns, circumference Measured) (Measured, error) {
	if err := number("turns", turns, 0, 1e6); err != nil {
		return Measured{}, err
	}
	if err := number("circumference", circumference, 0, 4); err != nil {
		return Measured{}, err
	}
	return product(turns, circumference), nil
}

// Paces gives the road walked [m] by a count of paces of a known length [m, at
// most 3], each with its error (1 σ). Beside the count's and the length's own
// errors each pace differs by a twentieth (common practice, no source).
func Paces(count, pace Measured) (Measured, error) {
	if err := number("paces", count, 0, 1e6); err != nil {
		return Measured{}, err
	}
	if err := number("pace", pace, 0, 3); err != nil {
		return Measured{}, err
	}
	m := product(count, pace)
	m.Error = root(m.Error, paceScatter*pace.Value*math.Sqrt(count.Value))
	return m, nil
}

const paceScatter = 0.05

// WheelAndHeights makes a reading of the road rolled over and the heights at
// its two ends by an altimeter [m], with errors (1 σ): for a barometric one on
// the spot about 0.5 m, for a satellite one 3 to 5 m (common practice, no source).
func WheelAndHeights(turns, circumference, foot, top Measured) (Reading, error) {
	length, err := Distance(turns, circumference)
	if err != nil {
		return Reading{}, err
	}
	for _, h := range []Measured{foot, top} {
		if err := number("height", h, -1e3, 12e3); err != nil {
			return Reading{}, err
		}
	}
	rise := Measured{top.Value - foot.Value, root(foot.Error, top.Error)}
	return riseOver(rise, length, AlongRoad, ByWheelHeights)
}

// WheelAndStairs makes a reading of the road rolled over and a flight of stairs
// beside it: steps, negative when they go down, of one height [m, at most 1]
// with its error (1 σ), which is the same for each.
func WheelAndStairs(turns, circumference, steps, step Measured) (Reading, error) {
	length, err := Distance(turns, circumference)
	if err != nil {
		return Reading{}, err
	}
	if err := number("steps", steps, -1e5, 1e5); err != nil {
		return Reading{}, err
	}
	if err := number("height of a step", step, 0, 1); err != nil {
		return Reading{}, err
	}
	return riseOver(product(steps, step), length, AlongRoad, ByWheelStairs)
}

// product multiplies two values that are measured apart from each other.
func product(a, b Measured) Measured {
	return Measured{a.Value * b.Value, root(a.Error*b.Value, b.Error*a.Value)}
}
