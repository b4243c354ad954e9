package air_test

import (
	"fmt"

	"hillwright/physics/air"
)

func ExampleDensity() {
	fmt.Printf("%.3f kg/m³ at 1000 m on a day of 20 °C\n", air.Density(20, air.StandardPressure(1000), 0.5))
	// Output: 1.063 kg/m³ at 1000 m on a day of 20 °C
}
