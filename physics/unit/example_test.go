package unit_test

import (
	"fmt"

	"hillwright/physics/unit"
)

func ExampleGrade() {
	g := unit.Percent(18)
	fmt.Printf("18 %% is %.1f°, and lifts %.3f m per metre of road\n", g.Angle().Degrees(), g.Sin())
	// Output: 18 % is 10.2°, and lifts 0.177 m per metre of road
}
