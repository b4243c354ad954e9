package rule_test

import (
	"fmt"

	"hillwright/physics/rule"
)

func ExampleByID() {
	law, _ := rule.ByID("eu-25")
	fmt.Printf("in %s it ends at %.0f km/h\n", law.Region, law.SpeedMps*3.6)
	// Output: in EU it ends at 25 km/h
}
