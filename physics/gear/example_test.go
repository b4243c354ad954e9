package gear_test

import (
	"fmt"

	"hillwright/physics/gear"
)

func ExampleTrain_Gears() {
	wheel := gear.Tyre{WidthMM: 47, BeadSeatMM: 622}.Circumference()
	for _, g := range (gear.Train{Rings: []int{38}, Sprockets: []int{11, 24, 46}}).Gears() {
		fmt.Printf("%s: %.2f m a turn\n", g.Label, g.Development(wheel))
	}
	// Output:
	// 38/46: 1.84 m a turn
	// 38/24: 3.53 m a turn
	// 38/11: 7.69 m a turn
}
