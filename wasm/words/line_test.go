package words

import (
	"fmt"
	"math"
	"strings"
	"testing"

	"hillwright/physics/ask"
	"hillwright/physics/hill"
	"hillwright/physics/motor"
	"hillwright/physics/pack"
	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/road"
)

// every reason that completing a motor or a pack can give, over all kinds and
// with nothing else on the sheet.
func everyReason() map[string]string {
	nan := math.NaN()
	found := map[string]string{}
	for kind := range motor.Kinds() {
		for _, direct := range []bool{false, true} {
			m := motor.Motor{Kind: motor.Kind(kind), DirectDrive: direct, TorqueNm: 50, PowerW: 400}
			_, list := motor.Complete(&m, motor.Sheet{MassKg: nan, NominalV: nan, WheelM: nan, TopMps: nan})
			_, more := motor.CompleteHeat(&m, nan)
			for _, a := range append(list, more...) {
				found[a.Reason] = a.Text
			}
		}
	}
	for c := range pack.Chemistries() {
		_, list := pack.Complete(500, nan, pack.Chemistry(c), nan)
		for _, a := range list {
			found[a.Reason] = a.Text
		}
	}
	return found
}

func TestEveryReasonHasWords(t *testing.T) {
	found := everyReason()
	for id := range found {
		for _, v := range []Voice{inEnglish, inGerman} {
			if text := v.Reason(id); text == id || text == "" {
				t.Errorf("%s: reason %q has no words", v.Lang.Tag(), id)
			}
		}
	}
	for _, r := range reasons {
		if found[r.id] == "" {
			t.Errorf("reason %q has words, and nothing gives it", r.id)
		}
	}
	if got := inEnglish.Reason("moonlight"); got != "moonlight" {
		t.Errorf("an unknown reason is its own word, got %q", got)
	}
}

func TestLines(t *testing.T) {
	r, single := rigWith(t), rigWith(t, "bike.sprockets=20")
	inf := math.Inf(1)
	q := ask.Default()
	tour := func(back bool, trips int, pauseS float64) *ask.Question {
		c := q
		c.Ride.Back, c.Ride.Trips, c.Ride.PauseS = back, float64(trips), pauseS
		return &c
	}
	down := func(by road.StopLimit, most, stopping float64, byHeat bool) *ride.WayDown {
		return &ride.WayDown{Falls: true, FrontPeakC: 160, RearPeakC: 133, SteepestGrade: 0.18, StoppingM: stopping, StopBy: by, MostMps: most, ByHeat: byHeat}
	}
	works := ride.Energy{MotorJ: 36000, FromPackJ: 54000}
	for _, c := range []struct {
		say    func(v Voice) string
		en, de string
	}{
		{func(v Voice) string { return v.StartLine(r, &ride.Start{OK: true, InGear: true}) },
			"From rest there it starts in gear 38/46, and in the gear it was riding too.", "Aus dem Stand fährt es dort im Gang 38/46 an, und auch im gefahrenen Gang."},
		{func(v Voice) string { return v.StartLine(r, &ride.Start{OK: true, Gear: 1}) },
			"From rest there it starts in gear 38/42, but not in the gear it was riding: change down before stopping.", "Aus dem Stand fährt es dort im Gang 38/42 an, nicht aber im gefahrenen Gang: vor dem Anhalten herunterschalten."},
		{func(v Voice) string { return v.StartLine(single, &ride.Start{OK: true, InGear: true}) },
			"From rest there it starts.", "Aus dem Stand fährt es dort an."},
		{func(v Voice) string {
			return v.StartLine(r, &ride.Start{StoppedBy: rig.Lift, WantedN: 330, PullN: 290, PushOK: true})
		},
			"From rest there it does not start: that wants 330 N, and the weight on the front wheel allows 290 N. On foot it can be pushed up.", "Aus dem Stand fährt es dort nicht an: dafür braucht es 330 N, und das Gewicht auf dem Vorderrad erlaubt 290 N. Zu Fuß lässt es sich hinaufschieben."},
		{func(v Voice) string {
			return v.StartLine(r, &ride.Start{StoppedBy: rig.Heat, WantedN: 330, PullN: 290})
		},
			"From rest there it does not start: that wants 330 N, and the hot motor allows 290 N. On foot, too, one person does not get it up.", "Aus dem Stand fährt es dort nicht an: dafür braucht es 330 N, und der heiße Motor erlaubt 290 N. Auch zu Fuß bekommt eine Person allein es nicht hinauf."},
		{func(v Voice) string { return v.HoldLine(&ride.Answer{Energy: works, EasingS: 250, WindingPeakC: 96}) },
			"At a steady climb of the hardest stretch the motor holds 4 min from cold, then eases off; on this ride its winding reaches 96 °C.", "Am schwersten Stück hält der Motor aus dem Kalten 4 min durch, dann nimmt er sich zurück; auf dieser Fahrt wird die Wicklung bis 96 °C warm."},
		{func(v Voice) string { return v.HoldLine(&ride.Answer{Energy: works, EasingS: inf, WindingPeakC: 60}) },
			"The motor never eases off on a climb as hard as this; on this ride its winding reaches 60 °C.", "Bei einem solchen Anstieg nimmt sich der Motor nie zurück; auf dieser Fahrt wird die Wicklung bis 60 °C warm."},
		{func(v Voice) string { return v.HoldLine(&ride.Answer{EasingS: inf}) }, "", ""},
		{func(v Voice) string { return v.MotorLine(&ride.Running{MotorEfficiency: 0.31}) },
			"There the motor turns 31 % of the pack's power into pull and 69 % into heat.", "Dort macht der Motor aus 31 % der Akkuleistung Vortrieb und aus 69 % Wärme."},
		{func(v Voice) string { return v.MotorLine(&ride.Running{}) }, "", ""},
		{func(v Voice) string {
			return v.ChargeLine(&ride.Answer{Energy: works, ChargeLeft: 0.78, TripsPerCharge: 3.9})
		},
			"78 % of the charge is left. A full charge serves 3 such trips, less what is kept back.", "Von der Ladung bleiben 78 %. Eine volle Ladung reicht ohne den Rückhalt für 3 solche Fahrten."},
		{func(v Voice) string {
			return v.ChargeLine(&ride.Answer{Energy: works, ChargeLeft: 0.2, TripsPerCharge: 1.06})
		},
			"20 % of the charge is left. A full charge serves one such trip, less what is kept back.", "Von der Ladung bleiben 20 %. Eine volle Ladung reicht ohne den Rückhalt für eine solche Fahrt."},
		{func(v Voice) string {
			return v.ChargeLine(&ride.Answer{Energy: works, ChargeLeft: 0.08, TripsPerCharge: 0.92})
		},
			"8 % of the charge is left. A full charge, less what is kept back, does not serve one such trip.", "Von der Ladung bleiben 8 %. Eine volle Ladung reicht ohne den Rückhalt nicht für eine solche Fahrt."},
		{func(v Voice) string {
			return v.ChargeLine(&ride.Answer{Energy: works, ChargeLeft: 1, TripsPerCharge: inf})
		},
			"100 % of the charge is left. A full charge serves more than 99 such trips.", "Von der Ladung bleiben 100 %. Eine volle Ladung reicht für mehr als 99 solche Fahrten."},
		{func(v Voice) string {
			return v.ChargeLine(&ride.Answer{Energy: works, ChargeLeft: 0.11, CutOut: true, CutOutAtM: 640, Stalled: true})
		},
			"At 640 m the pack gives out under load; in the end 11 % of its charge is left.", "Bei 640 m bricht der Akku unter Last ein; am Ende bleiben 11 % der Ladung."},
		{func(v Voice) string { return v.ChargeLine(&ride.Answer{ChargeLeft: 1, TripsPerCharge: inf}) }, "", ""},
		{func(v Voice) string { return v.LegsLine(r, &ride.Answer{ReserveLeftJ: 12000}) },
			"The rider pedals 110 W at most, below the 160 W that they hold for good.", "Getreten werden höchstens 110 W, weniger als die 160 W, die auf Dauer gehen."},
		{func(v Voice) string {
			return v.LegsLine(rigWith(t, "rider.power_w=220"), &ride.Answer{ReserveLeftJ: 6000})
		},
			"The rider wants 220 W, above the 160 W that they hold for good: at the least 50 % of the reserve is left.", "Getreten werden sollen 220 W, mehr als die 160 W, die auf Dauer gehen: von der Kraftreserve bleiben mindestens 50 %."},
		{func(v Voice) string {
			return v.LegsLine(rigWith(t, "rider.power_w=220"), &ride.Answer{ReserveLeftJ: 600})
		},
			"The rider wants 220 W, above the 160 W that they hold for good, and has run empty: at the least 5 % of the reserve is left.", "Getreten werden sollen 220 W, mehr als die 160 W, die auf Dauer gehen; die Kraft geht aus: von der Reserve bleiben nur 5 %."},
		{func(v Voice) string { return v.TourLine(tour(false, 1, 0), &ride.Answer{TourS: 3900}) }, "", ""},
		{func(v Voice) string { return v.TourLine(tour(true, 1, 0), &ride.Answer{TourS: 3900}) },
			"There and back: 1 h 5 min in all.", "Hin und zurück: zusammen 1 h 5 min."},
		{func(v Voice) string { return v.TourLine(tour(false, 3, 0), &ride.Answer{TourS: 3900}) },
			"The hill, 3 times: 1 h 5 min in all.", "Der Berg, 3-mal: zusammen 1 h 5 min."},
		{func(v Voice) string { return v.TourLine(tour(true, 3, 600), &ride.Answer{TourS: 3900}) },
			"There and back, 3 times, a pause of 10 min after every way: 1 h 5 min in all.", "Hin und zurück, 3-mal, nach jedem Weg 10 min Pause: zusammen 1 h 5 min."},
		{func(v Voice) string {
			return v.TourLine(tour(true, 3, 600), &ride.Answer{TourS: 3900, Stalled: true})
		}, "", ""},
		{func(v Voice) string { return v.DownLine(r, &ride.WayDown{}, 7) },
			"Nothing here falls: there is no way down.", "Hier geht es nirgends hinunter."},
		{func(v Voice) string { return v.DownLine(r, down(road.RearSlides, 11.9, 12.6, false), 25/3.6) },
			"Not above 42.8 km/h on the way down: faster, it does not stop within the way one sees. At 25.0 km/h it stops within 13 m on the steepest fall, 18 %; harder, and the rear tyre slides. The brakes reach 160 °C in front and 133 °C at the rear.",
			"Bergab höchstens 42,8 km/h: schneller reicht die Sicht nicht zum Anhalten. Bei 25,0 km/h steht es auf dem steilsten Gefälle, 18 %, nach 13 m; härter gebremst rutscht der Hinterreifen. Die Bremsen werden vorn bis 160 °C, hinten bis 133 °C warm."},
		{func(v Voice) string { return v.DownLine(r, down(road.OverTheBars, 5, 12.6, true), 25/3.6) },
			"Not above 18.0 km/h on the way down: faster, the brakes get too hot. At 25.0 km/h it stops within 13 m on the steepest fall, 18 %; harder, and it goes over the bars. The brakes reach 160 °C in front and 133 °C at the rear.",
			"Bergab höchstens 18,0 km/h: schneller werden die Bremsen zu heiß. Bei 25,0 km/h steht es auf dem steilsten Gefälle, 18 %, nach 13 m; härter gebremst geht es über den Lenker. Die Bremsen werden vorn bis 160 °C, hinten bis 133 °C warm."},
		{func(v Voice) string {
			return v.DownLine(r, down(road.BrakesBound, ride.FastestMps, inf, false), 25/3.6)
		},
			"Not above 50.0 km/h on the way down, however good brakes and sight are. At 25.0 km/h the brakes get so hot that they no longer stop it. The brakes reach 160 °C in front and 133 °C at the rear.",
			"Bergab höchstens 50,0 km/h, auch bei besten Bremsen und bester Sicht. Bei 25,0 km/h werden die Bremsen so heiß, dass sie es nicht mehr zum Stehen bringen. Die Bremsen werden vorn bis 160 °C, hinten bis 133 °C warm."},
		{func(v Voice) string { return v.DownLine(r, down(road.BrakesBound, 0, 12.6, true), 25/3.6) },
			"At no speed do the brakes bear the way down in one go: stop on the way and let them cool. At 25.0 km/h it stops within 13 m on the steepest fall, 18 %; the brakes bite no harder. The brakes reach 160 °C in front and 133 °C at the rear.",
			"Bei keinem Tempo halten die Bremsen die Abfahrt in einem Zug aus: unterwegs anhalten und abkühlen lassen. Bei 25,0 km/h steht es auf dem steilsten Gefälle, 18 %, nach 13 m; härter greifen die Bremsen nicht. Die Bremsen werden vorn bis 160 °C, hinten bis 133 °C warm."},
		{func(v Voice) string { return v.DownLine(r, down(road.BrakesBound, 0, inf, false), 25/3.6) },
			"Down the steepest fall, 18 %, brakes and tyres do not stop it: walk it down.", "Auf dem steilsten Gefälle, 18 %, bringen Bremsen und Reifen es nicht zum Stehen: hinunterschieben."},
	} {
		if got := bare(c.say(inEnglish)); got != c.en {
			t.Errorf("got  %s\nwant %s", got, c.en)
		}
		if got := bare(c.say(inGerman)); got != c.de {
			t.Errorf("got  %s\nwant %s", got, c.de)
		}
	}
}

func TestCautions(t *testing.T) {
	calm := ride.WayDown{Falls: true, MostMps: 12, StoppingM: 9, FrontPeakC: 90, RearPeakC: 80}
	with := func(change func(d *ride.WayDown)) *ride.WayDown {
		d := calm
		change(&d)
		return &d
	}
	for _, c := range []struct {
		name string
		rig  *rig.Rig
		down *ride.WayDown
		want []Key
	}{
		{"nothing to say", rigWith(t), &calm, nil},
		{"level", rigWith(t), &ride.WayDown{}, nil},
		{"too fast", rigWith(t), with(func(d *ride.WayDown) { d.MostMps = 4 }), []Key{CautionTooFast}},
		{"fading", rigWith(t), with(func(d *ride.WayDown) { d.Warm = true }), []Key{CautionFading}},
		{"over the bars", rigWith(t), with(func(d *ride.WayDown) { d.StopBy = road.OverTheBars }), []Key{CautionOverBars}},
		{"front slides", rigWith(t), with(func(d *ride.WayDown) { d.StopBy = road.FrontSlides }), []Key{CautionSlides}},
		{"wet", rigWith(t, "day.ground=asphalt-wet"), &calm, []Key{CautionWet}},
		{"load", rigWith(t, "load.mass_kg=40"), &calm, []Key{CautionCarries}},
		{"trailer", rigWith(t, "load.mass_kg=40", "load.place=trailer"), &calm, []Key{CautionCarries, CautionTrailer}},
	} {
		for _, v := range []Voice{inEnglish, inGerman} {
			got := v.Cautions(c.rig, c.down, 7)
			if len(got) != len(c.want) {
				t.Errorf("%s: %q", c.name, got)
				continue
			}
			for i, k := range c.want {
				if first, _, _ := strings.Cut(v.text(k), "{"); !strings.HasPrefix(got[i], first) || strings.ContainsAny(got[i], "{}") {
					t.Errorf("%s: %q is not %q", c.name, got[i], v.text(k))
				}
			}
		}
	}
}

// Every line that the computation itself gives is clean: no dash for a missing
// figure, no brace, no double blank.
func TestLinesSpeakOfRealAnswers(t *testing.T) {
	for _, set := range []string{
		"", "bike.motor.kind=none", "bike.motor.kind=rear-hub", "bike.motor.kind=front-hub day.ground=snow", "day.ground=leaves-wet",
		"ride.charge=0.03 day.temperature_c=-15", "bike.pack.energy_wh=60 ride.charge=0.3 ride.back=yes ride.trips=4 ride.pause_s=300",
		"rider.power_w=400 ride.level=0", "load.mass_kg=120", "load.mass_kg=60 load.place=trailer", "bike.front_brake=none bike.rear_brake=coaster load.mass_kg=80",
	} {
		r0 := strings.Fields(set)
		q := ask.Default()
		for _, s := range r0 {
			path, value, _ := strings.Cut(s, "=")
			if err := q.Set(path, value); err != nil {
				t.Fatal(err)
			}
		}
		for percent := -20; percent <= 40; percent += 5 {
			p, err := hill.ParseSections(fmt.Sprintf("1500m@4%%,400m@%d%%,50m@1%%", percent))
			if err != nil {
				t.Fatal(err)
			}
			r, a, err := q.Climb(&p)
			if err != nil {
				t.Fatal(err)
			}
			for _, v := range []Voice{inEnglish, inGerman, inFeet} {
				lines := append(v.Cautions(r, &a.WayDown, q.Ride.DownMps), v.Why(r, a), v.StartLine(r, &a.Start), v.HoldLine(a), v.MotorLine(&a.Hardest.Running),
					v.ChargeLine(a), v.LegsLine(r, a), v.TourLine(&q, a), v.DownLine(r, &a.WayDown, q.Ride.DownMps))
				for _, text := range lines {
					if strings.Contains(text, dash) || strings.ContainsAny(text, "{}") || strings.Contains(text, "  ") || text != "" && !strings.HasSuffix(text, ".") {
						t.Errorf("%s, %d %%: %s", set, percent, text)
					}
				}
			}
		}
	}
}
