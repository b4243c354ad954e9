package road_test

import (
	"fmt"

	"hillwright/physics/brake"
	"hillwright/physics/road"
	"hillwright/physics/unit"
)

// A long-tail with a child behind: where does the front wheel lift, and where
// does the rear tyre slip on wet gravel?
func ExampleStance_LiftGrade() {
	f := road.NewFrame(1.28,
		road.Place{MassKg: 32, AheadM: 0.60, HeightM: 0.55},  // the bike
		road.Place{MassKg: 75, AheadM: 0.55, HeightM: 1.10},  // the rider
		road.Place{MassKg: 30, AheadM: -0.05, HeightM: 1.00}, // child and seat
	)
	s := road.Stand(f, road.Trailer{})
	gravel, _ := road.GroundByID("gravel-wet")
	fmt.Printf("lifts at %.0f %%, steers to %.0f %%, slips at %.0f %%\n",
		100*s.LiftGrade(0), 100*s.LiftGrade(0.10), 100*s.SlideGrade(road.RearDrive, gravel.Mu.Usual))
	// Output: lifts at 45 %, steers to 32 %, slips at 41 %
}

// The speed not to exceed for the sight one has, on a wet descent of 12 %.
func ExampleStance_Decel() {
	s := road.Stand(road.NewFrame(1.1, road.Place{MassKg: 105, AheadM: 0.42, HeightM: 1.05}), road.Trailer{})
	rim, _ := brake.KindByID("rim")
	wet, _ := road.GroundByID("asphalt-wet")
	down := unit.Percent(-12)
	n := rim.ForceN(20, true)
	decel, by := s.Decel(wet.Mu.Usual, down.Sin(), down.Cos(), n, n)
	v := road.SpeedForM(30, decel, road.ReactionS().Usual)
	fmt.Printf("%.2f m/s², the brakes bound: %v; %.1f m/s\n", decel, by == road.BrakesBound, v)
	// Output: 1.83 m/s², the brakes bound: true; 8.8 m/s
}
