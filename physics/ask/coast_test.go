package ask

import (
	"math"
	"testing"

	"hillwright/physics/road"
	"hillwright/physics/unit"
)

func near(got, want float64) bool { return math.Abs(got-want) <= 1e-9*math.Max(1, math.Abs(want)) }

// What is left open is taken from the bike, the rider, the load and the day;
// what is given wins, with an error of its own.
func TestCoastSetup(t *testing.T) {
	q := Default()
	s := q.CoastSetup(0)
	mass := q.Bike.MassKg + q.Rider.MassKg + q.Load.MassKg
	around := q.Bike.Tyre.Circumference()
	radius := around / (2 * math.Pi)
	for _, row := range []struct {
		what      string
		got, want float64
	}{
		{"mass", s.MassKg.Value, mass},
		{"mass error", s.MassKg.Error, math.Sqrt(2*2 + 0.5*0.5 + math.Pow(0.1*q.Load.MassKg, 2))},
		{"inertia", s.InertiaKg.Value, q.Bike.WheelInertiaKgM2 / (radius * radius)},
		{"grade", s.Grade.Value, 0},
		{"grade error", s.Grade.Error, 0.003},
		{"wind", s.HeadMps.Value, 0},
		{"density", s.DensityKgM3.Value, q.Day.Density(0)},
		{"circumference", s.CircumferencePart.Error, 0.01},
		{"rolling", s.Crr.Value, q.Bike.Crr + road.Bearings(5)/(mass*unit.Gravity)},
		{"air", s.CdAM2.Value, q.Bike.CdAM2 + q.Load.CdAM2 + q.Bike.WheelDragM2},
	} {
		if !near(row.got, row.want) {
			t.Errorf("%s is %v, want %v", row.what, row.got, row.want)
		}
	}
	for path, text := range map[string]string{
		"coast.mass_kg": "105", "coast.grade": "0.004", "coast.circumference_m": "2.155", "coast.wind_mps": "1.5",
		"coast.wind_error_mps": "0.3", "day.density_kgm3": "1.19",
	} {
		if err := q.Set(path, text); err != nil {
			t.Fatal(err)
		}
	}
	s = q.CoastSetup(500)
	for _, row := range []struct {
		what      string
		got, want float64
	}{
		{"mass", s.MassKg.Value, 105}, {"mass error", s.MassKg.Error, 1},
		{"grade", s.Grade.Value, 0.004}, {"grade error", s.Grade.Error, 0.001},
		{"wind", s.HeadMps.Value, 1.5}, {"wind error", s.HeadMps.Error, 0.3},
		{"density", s.DensityKgM3.Value, 1.19}, {"density error", s.DensityKgM3.Error, 0.0119},
		{"circumference", s.CircumferencePart.Error, 0.003},
	} {
		if !near(row.got, row.want) {
			t.Errorf("given: %s is %v, want %v", row.what, row.got, row.want)
		}
	}
}

// A bike whose drag was measured is measured again with the same doubt: the
// second measurement must not lean on the first.
func TestPriorDoesNotNarrow(t *testing.T) {
	q := Default()
	before := q.CoastSetup(0)
	q.Source["bike.crr"], q.Source["bike.cda_m2"] = Measured, Measured
	if after := q.CoastSetup(0); after.Crr != before.Crr || after.CdAM2 != before.CdAM2 {
		t.Errorf("priors went from %v, %v to %v, %v", before.Crr, before.CdAM2, after.Crr, after.CdAM2)
	}
}

func TestShownOfCoast(t *testing.T) {
	q := Default()
	r, err := q.Rig(0)
	if err != nil {
		t.Fatal(err)
	}
	for path, want := range map[string]float64{
		"coast.mass_kg": q.CoastMass().Value, "coast.mass_error_kg": q.CoastMass().Error,
		"coast.grade": 0, "coast.grade_error": 0.003, "coast.circumference_m": r.CircumferenceM,
	} {
		if s, _ := q.Shown(path, r); !s.Open || !near(s.Value, want) {
			t.Errorf("%s shows %+v, want %v, open", path, s, want)
		}
	}
	if s, _ := q.Shown("coast.clicks_per_turn", r); !math.IsNaN(s.Value) || s.Text != "unknown" {
		t.Errorf("clicks per turn shows %+v, want unknown", s)
	}
}
