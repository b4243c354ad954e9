package pack

import "testing"

func BenchmarkPack(b *testing.B) {
	p := fresh(500)
	var sum float64
	for _, each := range []struct {
		name string
		do   func(charge float64)
	}{
		{"Current", func(c float64) { a, _ := p.Current(300, c, 1, 5); sum += a }},
		{"MaxPower", func(c float64) { w, _ := p.MaxPower(c, 1, 5); sum += w }},
		{"SustainedPower", func(c float64) { w, _ := p.SustainedPower(c, 5); sum += w }},
		{"Step", func(c float64) { _, v := p.Step(c, 1, 8, 5, 0.05); sum += v }},
	} {
		b.Run(each.name, func(b *testing.B) {
			b.ReportAllocs()
			for i := range b.N {
				each.do(0.3 + float64(i&7)*0.08)
			}
		})
	}
	_ = sum
}
