package motor_test

import (
	"fmt"
	"math"

	"hillwright/physics/motor"
)

func ExampleComplete() {
	hub := motor.Motor{Kind: motor.RearHub, TorqueNm: 45, PowerW: 400}
	sheet := motor.Sheet{MassKg: 2.4, NominalV: 36, WheelM: 0.34, TopMps: 25 / 3.6}
	c, _ := motor.Complete(&hub, sheet)
	for _, kmh := range []float64{5, 20} {
		fmt.Printf("15 N·m at %.0f km/h: %.0f %%\n", kmh, 100*c.Efficiency(15, kmh/3.6/0.34, 60))
	}
	// Output:
	// 15 N·m at 5 km/h: 57 %
	// 15 N·m at 20 km/h: 78 %
}

func ExampleCircuit_SecondsToEasing() {
	hub := motor.Motor{Kind: motor.RearHub, TorqueNm: 45, PowerW: 400}
	c, _ := motor.Complete(&hub, motor.Sheet{MassKg: 2.4, NominalV: 36, WheelM: 0.34, TopMps: 25 / 3.6})
	h, _ := motor.CompleteHeat(&hub, 2.4)
	walking := 5 / 3.6 / 0.34
	seconds := c.SecondsToEasing(&h, 40, walking, 20, 20, 20, 5/3.6)
	held, windingC := c.EasedTorque(&h, 40, walking, 20, 5/3.6)
	fmt.Printf("40 N·m for %.0f min, then down to %.0f N·m at %.0f °C\n", math.Floor(seconds/60), held, windingC)
	// Output:
	// 40 N·m for 2 min, then down to 18 N·m at 127 °C
}
