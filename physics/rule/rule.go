// Package rule holds the laws on assistance as data, each with the text it
// comes from. They tell how much a motor may give at a speed. They are not
// advice: local rules decide, and change. Start with ByID.
package rule

// Law is one rule on assistance. SpeedMps is the speed at which assistance
// must have ended; TaperMps how far below it the motor begins to ease, so that
// it is "progressively reduced". PowerW is the continuous rated power allowed
// (the peak may be higher). MaxRatio is the most motor power per rider power,
// 0 when the rule sets none; RatioFallsFrom and RatioFallsOver [m/s] tell
// where the ratio begins to fall and over which span it would lose 1.
type Law struct {
	ID             string
	SpeedMps       float64
	TaperMps       float64
	PowerW         float64
	MaxRatio       float64
	RatioFallsFrom float64
	RatioFallsOver float64
	Text           string
	AsOf           string
}

const kmh = 1 / 3.6
const mph = 1609.344 / 3600

// Laws are the rules known here, the default first. The taper of 2 km/h is
// common practice, no source: EN 15194 says "progressively reduced" only.
var laws = []Law{
	{ID: "eu-25", SpeedMps: 25 * kmh, TaperMps: 2 * kmh, PowerW: 250, Text: "EN 15194; Regulation (EU) 168/2013 art. 2(2)(h)", AsOf: "2026-12"},
	{ID: "gb-15mph", SpeedMps: 15.5 * mph, TaperMps: 2 * kmh, PowerW: 250, Text: "SI 2015/24 reg. 2(4)", AsOf: "2026-12"},
	{ID: "us-1", SpeedMps: 20 * mph, TaperMps: 2 * kmh, PowerW: 750, Text: "16 CFR 1512.2(a)(2); class 1, e.g. California VC 312.5", AsOf: "2026-12"},
	{ID: "us-3", SpeedMps: 28 * mph, TaperMps: 2 * kmh, PowerW: 750, Text: "class 3, e.g. California VC 312.5", AsOf: "2026-12"},
	{ID: "jp-24", SpeedMps: 24 * kmh, PowerW: 0, MaxRatio: 2, RatioFallsFrom: 10 * kmh, RatioFallsOver: 7 * kmh, Text: "Road Traffic Act Enforcement Rules art. 1-3", AsOf: "2026-12"},
	{ID: "eu-45", SpeedMps: 45 * kmh, TaperMps: 2 * kmh, PowerW: 4000, MaxRatio: 4, Text: "Regulation (EU) 168/2013, L1e-B", AsOf: "2026-12"},
}

// All gives every law, the default first.
func All() []Law { return append([]Law(nil), laws...) }

// ByID finds a law; ok is false when there is none of that name.
func ByID(id string) (l Law, ok bool) {
	for _, l := range laws {
		if l.ID == id {
			return l, true
		}
	}
	return Law{}, false
}

// Share is the part of the motor's power that the speed limit leaves at a
// speed [m/s]: 1 well below, falling in a straight line to 0 at the cut-off.
func (l *Law) Share(speedMps float64) float64 {
	left := l.SpeedMps - speedMps
	if left <= 0 {
		return 0
	}
	if left >= l.TaperMps {
		return 1
	}
	return left / l.TaperMps
}

// Ratio is the most motor power per rider power at a speed [m/s]; limited is
// false where the law sets no ratio.
func (l *Law) Ratio(speedMps float64) (ratio float64, limited bool) {
	if l.MaxRatio == 0 {
		return 0, false
	}
	if speedMps >= l.SpeedMps {
		return 0, true
	}
	if l.RatioFallsOver == 0 || speedMps <= l.RatioFallsFrom {
		return l.MaxRatio, true
	}
	r := l.MaxRatio - (speedMps-l.RatioFallsFrom)/l.RatioFallsOver
	if r < 0 {
		r = 0
	}
	return r, true
}
