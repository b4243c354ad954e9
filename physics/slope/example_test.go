package slope_test

import (
	"fmt"

	"hillwright/physics/hill"
	"hillwright/physics/slope"
	"hillwright/physics/unit"
)

// A phone whose sensor is 0.8° off lies on a metre of batten on a road of 12 %,
// then turned half round.
func ExampleTurned() {
	lay := func(betaDeg float64) slope.Average {
		steady := slope.NewSteady(0, slope.OrientationStep)
		for t := 0.0; !steady.Average().Enough; t += 0.02 {
			if up, ok := slope.UpOfOrientation(betaDeg, 2); ok {
				steady.Add(t, up.Angle(slope.LongEdge))
			}
		}
		return steady.Average()
	}
	road := unit.Percent(12).Angle().Degrees()
	reading, offset, err := slope.Turned(lay(road+0.8), lay(-road+0.8), slope.Support{BaseM: 1}, "this phone, long edge, back")
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("%.1f %% ± %.1f %%, the phone is %.1f° off\n", 100*reading.Grade, 100*reading.PlusMinus(), offset.Angle.Degrees())
	// Output:
	// 12.0 % ± 0.5 %, the phone is 0.8° off
}

func ExampleCombine() {
	tape, _ := slope.Tape(slope.Measured{Value: 0.235, Error: 0.005}, slope.Measured{Value: 2, Error: 0.01}, slope.AlongLevel)
	wheel, _ := slope.WheelAndHeights(slope.Measured{Value: 30, Error: 0.1}, slope.Measured{Value: 2.1, Error: 0.01},
		slope.Measured{Value: 412, Error: 0.5}, slope.Measured{Value: 419.2, Error: 0.5})
	both, err := slope.Combine([]slope.Reading{tape, wheel})
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("%.1f %% and %.1f %% make %.1f %% ± %.1f %%, misfit %v\n", 100*tape.Grade, 100*wheel.Grade, 100*both.Grade, 100*both.PlusMinus(), both.Misfit)
	fmt.Println("held up to 12 %: measure again", both.Straddles(0.12))
	// Output:
	// 11.8 % and 11.5 % make 11.7 % ± 0.5 %, misfit false
	// held up to 12 %: measure again true
}

func ExampleHill() {
	pitches := []slope.Entry{
		{Reading: slope.Reading{Grade: 0.07, Error: 0.003}, Place: "Mill lane", Pitch: slope.Measured{Value: 400}},
		{Reading: slope.Reading{Grade: 0.18, Error: 0.004}, Place: "Ford", Pitch: slope.Measured{Value: 60}},
	}
	p, err := slope.Hill("Mill lane to the ford", pitches)
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("%s: %s, up %.1f m\n", p.Name, hill.FormatSections(&p), p.AscentM())
	// Output:
	// Mill lane to the ford: 400m@7%,60m@18%, up 38.6 m
}
