package ask_test

import (
	"fmt"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
)

// A question begins with class defaults; every input is set by its path.
func ExampleQuestion_Climb() {
	q := ask.Default()
	if err := q.Set("rider.mass_kg", "92"); err != nil {
		fmt.Println(err)
	}
	road, err := hill.ParseSections("400 m at 7 %, 60 m at 18 %")
	if err != nil {
		fmt.Println(err)
	}
	_, a, err := q.Climb(&road)
	if err != nil {
		fmt.Println(err)
	}
	fmt.Printf("%v, %v binds from %.0f m on\n", a.Verdict, a.Balance.Pegs[0].Limit, a.Hardest.FromM)
	// Output: clears, torque binds from 400 m on
}

// What is wrong with an input says what was expected.
func ExampleQuestion_Set() {
	q := ask.Default()
	fmt.Println(q.Set("bike.tyre", "28 inch"))
	fmt.Println(q.Set("day.wind_mps", "90"))
	// Output:
	// bike.tyre: got "28 inch", expected width and bead seat in mm by ISO 5775, such as 47-622
	// day.wind_mps: got "90", expected a number from -25 to 25 m/s
}

// A grade that goes on for ever needs no hill.
func ExampleQuestion_Steady() {
	q := ask.Default()
	r, a, err := q.Steady(0.10)
	if err != nil {
		fmt.Println(err)
	}
	fmt.Printf("%.1f km/h in %s, set by %v\n", a.Running.SpeedMps*3.6, r.Gears[a.Running.Gear].Label, a.Running.SetBy)
	// Output: 13.8 km/h in 38/24, set by rider
}
