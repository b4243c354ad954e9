package ride

import "hillwright/physics/rig"

// newTrace makes an empty trace with room for n points.
func newTrace(n int) Trace {
	floats := func() []float64 { return make([]float64, 0, n) }
	return Trace{
		AtM: floats(), TimeS: floats(), SpeedMps: floats(), Gear: make([]int, 0, n), CadenceRPM: floats(),
		RiderW: floats(), MotorW: floats(), WantedN: floats(), PullN: floats(), Headroom: floats(),
		SetBy: make([]rig.Limit, 0, n), WindingC: floats(), Charge: floats(), ReserveJ: floats(),
	}
}

// mark adds a point to the trace.
func (s *run) mark(at *Place, now *rig.Now, coast bool) {
	v := s.speed()
	run := s.running(v, now, coast)
	want, pull := wanted(s.rig, at, s.rig.Rider.HoldMps), s.strongest(now)
	t := &s.trace
	t.AtM = append(t.AtM, s.atM)
	t.TimeS = append(t.TimeS, s.timeS-s.beganS)
	t.SpeedMps = append(t.SpeedMps, v)
	t.Gear = append(t.Gear, run.Gear)
	t.CadenceRPM = append(t.CadenceRPM, run.CadenceRPM)
	t.RiderW = append(t.RiderW, run.RiderW)
	t.MotorW = append(t.MotorW, run.MotorW)
	t.WantedN = append(t.WantedN, want)
	t.PullN = append(t.PullN, pull)
	t.Headroom = append(t.Headroom, headroom(want, pull))
	t.SetBy = append(t.SetBy, run.SetBy)
	t.WindingC = append(t.WindingC, s.body.WindingC)
	t.Charge = append(t.Charge, s.body.Charge)
	t.ReserveJ = append(t.ReserveJ, s.body.ReserveJ)
	s.nextM = s.atM + s.everyM
}
