package rule_test

import (
	"fmt"

	"hillwright/physics/rule"
)

// What a region allows, with the text it comes from.
func ExampleForRegion() {
	for _, l := range rule.ForRegion("US") {
		fmt.Printf("%s: %.1f km/h, %.0f W, %s\n", l.ID, l.SpeedMps*3.6, l.PowerW, l.Text)
	}
	// Output:
	// us-1: 32.2 km/h, 750 W, 16 CFR 1512.2(a)(2); class 1, e.g. California VC 312.5
	// us-2: 32.2 km/h, 750 W, 16 CFR 1512.2(a)(2); class 2, e.g. California VC 312.5
	// us-3: 45.1 km/h, 750 W, class 3, e.g. California VC 312.5
}
