package brake

import (
	"math"

	"hillwright/physics/unit"
)

// Pair is a bike's two brakes. The cautions are the temperatures at which a
// rider should be told, the mosts those that a speed not to exceed must not
// lead to [°C]. FrontShare is the part of the braking that the front one does
// [0 to 1]. Start with NewPair.
type Pair struct {
	Front, Rear                 Sink
	FrontCautionC, RearCautionC float64
	FrontMostC, RearMostC       float64
	FrontShare                  float64
}

// FrontShare is the front brake's part of the braking on a long way down.
// Common practice, no source: a stop puts more on the front, a rider who
// drags the brakes favours the rear.
func FrontShare() unit.Band { return unit.Band{Low: 0.40, Usual: 0.60, High: 0.75} }

// NewPair puts a front and a rear brake together. Where one is of kind "none"
// the other does all, whatever the share. One of the two must be there. The
// most is the low end of the fade's band: where the first brake of its kind may
// have lost half its force.
func NewPair(front, rear Kind, frontShare float64) Pair {
	p := Pair{
		Front: front.Sink(), Rear: rear.Sink(),
		FrontCautionC: front.CautionC.Usual, RearCautionC: rear.CautionC.Usual,
		FrontMostC: front.FadeC.Low, RearMostC: rear.FadeC.Low,
		FrontShare: frontShare,
	}
	if front.None() {
		p.FrontShare, p.FrontCautionC, p.FrontMostC = 0, math.Inf(1), math.Inf(1)
	}
	if rear.None() {
		p.FrontShare, p.RearCautionC, p.RearMostC = 1, math.Inf(1), math.Inf(1)
	}
	return p
}

// Piece is a piece of road: its length [m, ≥ 0] and the force with which it
// drives the rig down [N]: weight·(−sin θ − Crr·cos θ); negative where the road
// holds back and somebody must pedal.
type Piece struct{ LengthM, DriveN float64 }

// Descent is a way down and who goes down it. MassKg is the rig's [kg];
// DragN the air's force per square of the air speed [N per (m/s)², ½·ρ·CdA];
// HeadMps the wind against the rider [m/s]; AirC the air and FrontC and RearC
// the brakes at the top [°C]; StopMps2 the deceleration of a stop [m/s², > 0].
type Descent struct {
	Pieces        []Piece
	MassKg, DragN float64
	HeadMps, AirC float64
	FrontC, RearC float64
	StopMps2      float64
}

// Peak is how warm the brakes get on a way down [°C] and where [m from the
// top].
type Peak struct {
	FrontC, RearC     float64
	FrontAtM, RearAtM float64
}

// HoldW is the braking power that holds a speed [m/s, ≥ 0] on a piece [W]; 0
// where the air and the road do it.
func (d *Descent) HoldW(driveN, speedMps float64) float64 {
	air := speedMps + d.HeadMps
	n := driveN - d.DragN*air*math.Abs(air)
	if n <= 0 {
		return 0
	}
	return n * speedMps
}

// StopJ is what the brakes take up in one stop from a speed [m/s, ≥ 0] on a
// piece [J]: the energy of motion and the work of the road on the way, without
// the help of the air.
func (d *Descent) StopJ(driveN, speedMps float64) float64 {
	j := (d.MassKg + driveN/d.StopMps2) * speedMps * speedMps / 2
	if j < 0 {
		return 0
	}
	return j
}

// Peak goes down at one speed [m/s, > 0], held by the brakes, and stops once
// wherever that warms the brakes most. Exact for such a ride: each piece is one
// closed-form step of Sink.Step, and no temperature has a peak inside a piece.
func (p *Pair) Peak(d *Descent, speedMps float64) Peak {
	front, rear := d.FrontC, d.RearC
	peak := Peak{FrontC: front, RearC: rear}
	frontShare, rearShare := p.FrontShare, 1-p.FrontShare
	air := speedMps + d.HeadMps
	atM := 0.0
	for i := range d.Pieces {
		piece := &d.Pieces[i]
		stop := d.StopJ(piece.DriveN, speedMps)
		frontStop, rearStop := p.Front.Stores(frontShare*stop), p.Rear.Stores(rearShare*stop)
		peak.see(front+frontStop, rear+rearStop, atM)
		watts, seconds := d.HoldW(piece.DriveN, speedMps), piece.LengthM/speedMps
		front = p.Front.Step(front, d.AirC, frontShare*watts, air, seconds)
		rear = p.Rear.Step(rear, d.AirC, rearShare*watts, air, seconds)
		atM += piece.LengthM
		peak.see(front+frontStop, rear+rearStop, atM)
	}
	return peak
}

func (k *Peak) see(frontC, rearC, atM float64) {
	if frontC > k.FrontC {
		k.FrontC, k.FrontAtM = frontC, atM
	}
	if rearC > k.RearC {
		k.RearC, k.RearAtM = rearC, atM
	}
}

// Cautious tells that a brake got warm enough for the rider to be told.
func (p *Pair) Cautious(k Peak) bool { return k.FrontC > p.FrontCautionC || k.RearC > p.RearCautionC }

// Bears tells that neither brake got warmer than its most.
func (p *Pair) Bears(k Peak) bool { return k.FrontC <= p.FrontMostC && k.RearC <= p.RearMostC }

// slowest is where the search begins [m/s]: below it one walks. scan is its
// stride [m/s].
const (
	slowest = 1.0
	scan    = 0.5
)

// SpeedByHeat is the speed not to exceed because of the brakes [m/s]: the
// highest speed, up to mostMps, such that at it and at every lower one both
// brakes stay below their most all the way down with one stop anywhere. Much
// faster the air may do the braking and the brakes stay cool again; that is no
// advice to give, so the first speed that is too warm ends it. 0 means not even
// 1 m/s: stop and let them cool, or walk.
func (p *Pair) SpeedByHeat(d *Descent, mostMps float64) float64 {
	if mostMps < slowest || !p.Bears(p.Peak(d, slowest)) {
		return 0
	}
	cool, warm := slowest, mostMps
	for cool < warm {
		next := cool + scan
		if next > warm {
			next = warm
		}
		if !p.Bears(p.Peak(d, next)) {
			warm = next
			break
		}
		cool = next
	}
	for warm-cool > 1e-6*warm {
		middle := (cool + warm) / 2
		if p.Bears(p.Peak(d, middle)) {
			cool = middle
		} else {
			warm = middle
		}
	}
	return cool
}
