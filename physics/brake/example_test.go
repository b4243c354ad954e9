package brake_test

import (
	"fmt"

	"hillwright/physics/brake"
)

// Ten minutes of dragging the brake at 200 W and 5 m/s.
func ExampleSink_Step() {
	small, _ := brake.KindByID("hydraulic-160")
	rim, _ := brake.KindByID("rim")
	rotor, wall := small.Sink(), rim.Sink()
	fmt.Printf("%.0f °C the rotor, %.0f °C the rim\n", rotor.Step(20, 20, 200, 5, 600), wall.Step(20, 20, 200, 5, 600))
	// Output: 187 °C the rotor, 44 °C the rim
}

// 110 kg down 3 km at 12 %: how fast may one go because of the brakes?
func ExamplePair_SpeedByHeat() {
	disc, _ := brake.KindByID("hydraulic-180")
	pair := brake.NewPair(disc, disc, 0.6)
	down := brake.Descent{
		Pieces: []brake.Piece{{LengthM: 3000, DriveN: 120}},
		MassKg: 110, DragN: 0.36, AirC: 20, FrontC: 20, RearC: 20, StopMps2: 3,
	}
	v := pair.SpeedByHeat(&down, 15)
	peak := pair.Peak(&down, v)
	fmt.Printf("%.1f m/s, front %.0f °C, rear %.0f °C\n", v, peak.FrontC, peak.RearC)
	// Output: 4.3 m/s, front 250 °C, rear 173 °C
}
