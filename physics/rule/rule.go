// Package rule holds the laws on assistance as data, each with the text it
// comes from. They tell how much a motor may give at a speed. They are not
// advice: local rules decide, and change. Start with ByID.
package rule

import "hillwright/physics/unit"

// Law is one rule on assistance. Region is where it holds, by ISO 3166 (EU for
// the Union). SpeedMps is the speed at which assistance must have ended;
// TaperMps how far below it the motor begins to ease, so that it is
// "progressively reduced". PowerW is the continuous rated power allowed (the
// peak may be higher), 0 when the rule sets none. MaxRatio is the most motor
// power per rider power, 0 when the rule sets none; RatioFallsFrom and
// RatioFallsOver [m/s] tell where the ratio begins to fall and over which span
// it would lose 1.
//
// AloneMps is up to which speed the motor may drive with nobody pedalling: walk
// assistance and start-up assistance, 6 km/h in most places; 0 where the rule
// as known here grants none. StopsWithinM is the way in which the motor must
// end after the pedalling has ended [m], StopsWithinSwitchM the same on a bike
// whose brake levers switch the motor off; 0 where the rule sets none.
// SpeedTolerance and PowerTolerance are what a test of a bike allows, as parts.
//
// Text is the text of the law, AsOf the month in which this row was written;
// FromMemory tells that the row was written without the text at hand.
type Law struct {
	ID                 string
	Region             string
	SpeedMps           float64
	TaperMps           float64
	PowerW             float64
	MaxRatio           float64
	RatioFallsFrom     float64
	RatioFallsOver     float64
	AloneMps           float64
	StopsWithinM       float64
	StopsWithinSwitchM float64
	SpeedTolerance     float64
	PowerTolerance     float64
	Text               string
	AsOf               string
	FromMemory         bool
}

const (
	kmh = 1 / 3.6
	mph = unit.MetresPerMile / 3600
)

// Laws are the rules known here, the default first, each region's default
// before its others. The taper of 2 km/h is common practice, no source:
// EN 15194 says "progressively reduced" only.
var laws = []Law{
	{ID: "eu-25", Region: "EU", SpeedMps: 25 * kmh, TaperMps: 2 * kmh, PowerW: 250,
		// Clauses 4.2.12 and 4.2.13.1 as numbered in the identical TBIS 15194:2019.
		AloneMps: 6 * kmh, StopsWithinM: 2, StopsWithinSwitchM: 5, SpeedTolerance: 0.10, PowerTolerance: 0.05,
		Text: "EN 15194 (start-up assistance 4.2.12, end of pedalling 4.2.13.1); Regulation (EU) 168/2013 art. 2(2)(h)", AsOf: "2026-12"},
	{ID: "gb-15mph", Region: "GB", SpeedMps: 15.5 * mph, TaperMps: 2 * kmh, PowerW: 250,
		Text: "SI 2015/24 reg. 2(4)", AsOf: "2026-12"},
	{ID: "us-1", Region: "US", SpeedMps: 20 * mph, TaperMps: 2 * kmh, PowerW: 750,
		Text: "16 CFR 1512.2(a)(2); class 1, e.g. California VC 312.5", AsOf: "2026-12"},
	{ID: "us-2", Region: "US", SpeedMps: 20 * mph, TaperMps: 2 * kmh, PowerW: 750, AloneMps: 20 * mph,
		Text: "16 CFR 1512.2(a)(2); class 2, e.g. California VC 312.5", AsOf: "2026-12"},
	{ID: "us-3", Region: "US", SpeedMps: 28 * mph, TaperMps: 2 * kmh, PowerW: 750,
		Text: "class 3, e.g. California VC 312.5", AsOf: "2026-12"},
	{ID: "jp-24", Region: "JP", SpeedMps: 24 * kmh, MaxRatio: 2, RatioFallsFrom: 10 * kmh, RatioFallsOver: 7 * kmh,
		Text: "Road Traffic Act Enforcement Rules art. 1-3", AsOf: "2026-12"},
	{ID: "eu-l1e-a", Region: "EU", SpeedMps: 25 * kmh, TaperMps: 2 * kmh, PowerW: 1000, MaxRatio: 4,
		Text: "Regulation (EU) 168/2013, L1e-A", AsOf: "2026-12"},
	{ID: "eu-45", Region: "EU", SpeedMps: 45 * kmh, TaperMps: 2 * kmh, PowerW: 4000, MaxRatio: 4,
		Text: "Regulation (EU) 168/2013, L1e-B", AsOf: "2026-12"},
	{ID: "ch-25", Region: "CH", SpeedMps: 25 * kmh, TaperMps: 2 * kmh, PowerW: 500, AloneMps: 20 * kmh,
		Text: "VTS (SR 741.41) art. 18 b", AsOf: "2026-12", FromMemory: true},
	{ID: "ch-45", Region: "CH", SpeedMps: 45 * kmh, TaperMps: 2 * kmh, PowerW: 1000, AloneMps: 30 * kmh,
		Text: "VTS (SR 741.41) art. 18 a", AsOf: "2026-12", FromMemory: true},
	{ID: "au-25", Region: "AU", SpeedMps: 25 * kmh, TaperMps: 2 * kmh, PowerW: 250, AloneMps: 6 * kmh,
		Text: "Australian Design Rule, Definitions and Vehicle Categories: power-assisted pedal cycle by EN 15194", AsOf: "2026-12", FromMemory: true},
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

// ForRegion gives a region's laws, its default first; none for a region that
// is not known here.
func ForRegion(region string) []Law {
	var found []Law
	for _, l := range laws {
		if l.Region == region {
			found = append(found, l)
		}
	}
	return found
}

// Alone tells whether the motor may drive with nobody pedalling at a speed
// [m/s]: a push-off, walk assistance, start-up assistance.
func (l *Law) Alone(speedMps float64) bool { return l.AloneMps > 0 && speedMps <= l.AloneMps }

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
