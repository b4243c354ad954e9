package ask

import (
	"math"
	"strconv"

	"hillwright/physics/ride"
	"hillwright/physics/rig"
	"hillwright/physics/unit"
)

// whPerJ turns joules into watt-hours.
const whPerJ = 1 / 3600.0

// AnswerJSON writes an answer as JSON, every value with its unit in the key.
// why is the sentence in the reader's language. The README documents the keys.
func AnswerJSON(r *rig.Rig, a *ride.Answer, why string) []byte {
	w := &writer{}
	w.open("", '{')
	w.text("verdict", a.Verdict.String())
	w.text("why", why)
	w.balance(r, &a.Balance)
	h := &a.Hardest
	w.open("hardest", '{')
	w.number("from_m", h.FromM)
	w.number("to_m", h.ToM)
	w.number("grade", float64(h.Grade))
	w.number("steepest_grade", float64(h.SteepestGrade))
	w.number("trip", float64(h.Trip+1))
	w.flag("on_the_way_back", h.Back)
	w.running(r, &h.Running, h.Running.SpeedMps > 0)
	w.close('}')
	w.start(r, &a.Start)
	w.number("climb_time_s", a.ClimbS)
	w.number("tour_time_s", a.TourS)
	e := &a.Energy
	w.number("rider_energy_wh", e.RiderJ*whPerJ)
	w.number("motor_energy_wh", e.MotorJ*whPerJ)
	w.number("pack_energy_wh", e.FromPackJ*whPerJ)
	w.number("brake_energy_wh", e.BrakesJ*whPerJ)
	w.number("recovered_energy_wh", e.RecoveredJ*whPerJ)
	w.number("rider_share", share(e.RiderJ, e.MotorJ))
	w.number("motor_share", share(e.MotorJ, e.RiderJ))
	w.number("distance_m", a.LengthM)
	w.number("ascent_m", a.AscentM)
	w.number("descent_m", a.DescentM)
	if a.Stalled {
		w.number("stalled_at_m", a.StalledAtM)
	} else {
		w.null("stalled_at_m")
	}
	if a.Footed {
		w.number("foot_down_at_m", a.FootedAtM)
	} else {
		w.null("foot_down_at_m")
	}
	w.number("winding_peak_c", a.WindingPeakC)
	w.number("minutes_to_easing_off", a.EasingS/60)
	w.number("charge_left", a.ChargeLeft)
	if a.CutOut {
		w.number("pack_gives_out_at_m", a.CutOutAtM)
	} else {
		w.null("pack_gives_out_at_m")
	}
	w.number("trips_per_charge", a.TripsPerCharge)
	w.number("w_prime_left_j", a.ReserveLeftJ)
	w.wayDown(&a.WayDown)
	w.rigFacts(r)
	w.close('}')
	return append(w.out, '\n')
}

// SteadyJSON writes the answer for one grade as JSON, as AnswerJSON.
func SteadyJSON(r *rig.Rig, g unit.Grade, a *ride.SteadyAnswer, why string) []byte {
	w := &writer{}
	w.open("", '{')
	w.text("verdict", a.Verdict.String())
	w.text("why", why)
	w.number("grade", float64(g))
	w.balance(r, &a.Balance)
	w.running(r, &a.Running, a.Held)
	w.start(r, &a.Start)
	w.number("minutes_to_easing_off", a.EasingS/60)
	w.rigFacts(r)
	w.close('}')
	return append(w.out, '\n')
}

// share is a's part of a and b, 0 when there is nothing to share.
func share(a, b float64) float64 {
	if a+b == 0 {
		return 0
	}
	return a / (a + b)
}

func (w *writer) balance(r *rig.Rig, b *ride.Balance) {
	w.text("limit", b.Pegs[0].Limit.String())
	w.number("headroom", b.Headroom())
	if len(b.Pegs) > 1 {
		w.text("next_limit", b.Pegs[1].Limit.String())
	} else {
		w.null("next_limit")
	}
	w.open("limits", '[')
	for _, p := range b.Pegs {
		w.open("", '{')
		w.text("limit", p.Limit.String())
		w.number("pull_n", p.PullN)
		w.number("headroom", p.Headroom)
		w.close('}')
	}
	w.close(']')
	w.number("pull_wanted_n", b.WantedN)
	w.number("pull_available_n", b.Pegs[0].PullN)
	w.number("weighed_at_mps", b.SpeedMps)
	w.text("weighed_in_gear", r.Gears[b.Gear].Label)
	w.number("steepest_grade_held", float64(b.SteepestGrade))
}

func (w *writer) start(r *rig.Rig, s *ride.Start) {
	w.open("start", '{')
	w.flag("ok", s.OK)
	if s.OK {
		w.null("stopped_by")
	} else {
		w.text("stopped_by", s.StoppedBy.String())
	}
	w.text("gear", r.Gears[s.Gear].Label)
	w.flag("in_the_gear_it_rides", s.InGear)
	w.number("pull_wanted_n", s.WantedN)
	w.number("pull_available_n", s.PullN)
	w.flag("can_be_pushed", s.PushOK)
	w.close('}')
}

func (w *writer) wayDown(d *ride.WayDown) {
	w.open("way_down", '{')
	if d.Falls {
		w.number("brake_peak_c", math.Max(d.FrontPeakC, d.RearPeakC))
		w.number("front_brake_peak_c", d.FrontPeakC)
		w.number("rear_brake_peak_c", d.RearPeakC)
		w.number("speed_not_to_exceed_mps", d.MostMps)
		w.number("stopping_m", d.StoppingM)
		w.number("deceleration_mps2", d.DecelMps2)
		w.number("steepest_grade", float64(d.SteepestGrade))
	} else {
		for _, key := range []string{"brake_peak_c", "front_brake_peak_c", "rear_brake_peak_c", "speed_not_to_exceed_mps", "stopping_m", "deceleration_mps2", "steepest_grade"} {
			w.null(key)
		}
	}
	w.close('}')
}

func (w *writer) running(r *rig.Rig, run *ride.Running, moves bool) {
	if !moves {
		for _, key := range []string{"speed_mps", "gear", "cadence_rpm", "rider_power_w", "motor_power_w", "motor_efficiency", "speed_set_by"} {
			w.null(key)
		}
		return
	}
	w.number("speed_mps", run.SpeedMps)
	w.text("gear", r.Gears[run.Gear].Label)
	w.number("cadence_rpm", run.CadenceRPM)
	w.number("rider_power_w", run.RiderW)
	w.number("motor_power_w", run.MotorW)
	w.number("motor_efficiency", run.MotorEfficiency)
	w.text("speed_set_by", run.SetBy.String())
}

func (w *writer) rigFacts(r *rig.Rig) {
	w.number("all_up_mass_kg", r.Road.MassKg)
	w.number("air_density_kgm3", r.Road.DensityKgM3)
	w.number("rollout_m", r.CircumferenceM)
	w.text("law", r.Law.ID)
}

// writer writes indented JSON of numbers, texts, lists and objects, keys in
// the order in which they come.
type writer struct {
	out   []byte
	depth int
	first bool
}

func (w *writer) key(name string) {
	if w.depth > 0 {
		if !w.first {
			w.out = append(w.out, ',')
		}
		w.newline()
	}
	w.first = false
	if name != "" {
		w.out = appendText(w.out, name)
		w.out = append(w.out, ": "...)
	}
}

func (w *writer) newline() {
	w.out = append(w.out, '\n')
	for range w.depth {
		w.out = append(w.out, "  "...)
	}
}

func (w *writer) open(name string, bracket byte) {
	w.key(name)
	w.out = append(w.out, bracket)
	w.depth++
	w.first = true
}

func (w *writer) close(bracket byte) {
	w.depth--
	w.newline()
	w.out = append(w.out, bracket)
	w.first = false
}

func (w *writer) text(name, value string) {
	w.key(name)
	w.out = appendText(w.out, value)
}

func (w *writer) flag(name string, v bool) {
	w.key(name)
	w.out = strconv.AppendBool(w.out, v)
}

func (w *writer) null(name string) {
	w.key(name)
	w.out = append(w.out, "null"...)
}

// number writes a number such that it reads back to the same value; what is no
// number is null, since JSON has no word for it.
func (w *writer) number(name string, v float64) {
	if math.IsNaN(v) || math.IsInf(v, 0) {
		w.null(name)
		return
	}
	w.key(name)
	w.out = strconv.AppendFloat(w.out, v, 'g', -1, 64)
}

// appendText quotes a text for JSON (RFC 8259).
func appendText(out []byte, s string) []byte {
	const hex = "0123456789abcdef"
	out = append(out, '"')
	for _, r := range s {
		switch {
		case r == '"' || r == '\\':
			out = append(out, '\\', byte(r))
		case r < 0x20:
			out = append(out, '\\', 'u', '0', '0', hex[r>>4], hex[r&15])
		default:
			out = append(out, string(r)...)
		}
	}
	return append(out, '"')
}
