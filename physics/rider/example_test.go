package rider_test

import (
	"fmt"

	"hillwright/physics/rider"
)

// Three minutes at 280 W, then two minutes of rest at 100 W.
func ExampleEndurance_Step() {
	e := rider.Endurance{CriticalW: 220, ReserveJ: 18000}
	left := e.Step(e.ReserveJ, 280, 180)
	fmt.Printf("%.0f J left, ", left)
	left = e.Step(left, 100, 120)
	fmt.Printf("%.0f J after the rest\n", left)
	// Output: 7200 J left, 13147 J after the rest
}

// What a rider who wants 300 W gives as the reserve runs out.
func ExampleEndurance_Able() {
	e := rider.Endurance{CriticalW: 220, ReserveJ: 18000}
	for _, left := range []float64{18000, 4500, 2250, 0} {
		fmt.Printf("%.0f W ", e.Able(left, 300))
	}
	fmt.Println()
	// Output: 300 W 300 W 260 W 220 W
}
