package motor

import "testing"

func BenchmarkCircuit(b *testing.B) {
	c := completed(&gearedMotor)
	h, _ := CompleteHeat(&gearedMotor, 2.4)
	var sum float64
	for _, each := range []struct {
		name string
		do   func(x float64)
	}{
		{"TorqueByVoltage", func(x float64) { sum += c.TorqueByVoltage(x, 36, 60) }},
		{"TorqueByPackCurrent", func(x float64) { sum += c.TorqueByPackCurrent(x, 36, 20, 60) }},
		{"Draw", func(x float64) { sum += c.Draw(20, x, 60).ElectricW }},
		{"Step", func(x float64) { w, _ := h.Step(60, 40, 20, x, 50, 30, 0.05); sum += w }},
		{"HoldTorque", func(x float64) { sum += c.HoldTorque(&h, 110, x, 20, x) }},
		{"EasedTorque", func(x float64) { nm, _ := c.EasedTorque(&h, 45, x, 20, x); sum += nm }},
		{"SecondsToEasing", func(x float64) { sum += c.SecondsToEasing(&h, 40, x, 20, 20, 20, x) }},
	} {
		b.Run(each.name, func(b *testing.B) {
			b.ReportAllocs()
			for i := range b.N {
				each.do(4 + float64(i&7))
			}
		})
	}
	_ = sum
}
