package pack_test

import (
	"fmt"

	"hillwright/physics/pack"
)

func ExamplePack_MaxPower() {
	p, _ := pack.Complete(500, 36, pack.Nickel, 0.75)
	for _, celsius := range []float64{25, -10} {
		watts, by := p.MaxPower(0.3, 0, celsius)
		fmt.Printf("with 30 %% left at %.0f °C: %.0f W, ended by %v\n", celsius, watts, by)
	}
	// Output:
	// with 30 % left at 25 °C: 856 W, ended by current
	// with 30 % left at -10 °C: 320 W, ended by voltage
}

func ExamplePack_Step() {
	p, _ := pack.Complete(500, 36, pack.Nickel, 1)
	charge, relaxV := 0.8, 0.0
	for range 600 { // ten minutes of 300 W
		amps, _ := p.Current(300, charge, relaxV, 20)
		charge, relaxV = p.Step(charge, relaxV, amps, 20, 1)
	}
	fmt.Printf("%.0f %% left\n", 100*charge)
	// Output:
	// 70 % left
}
