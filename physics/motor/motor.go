// Package motor tells what a motor gives from its sheet: a torque, a power, a
// kind, and how it follows the rider. Start with Motor.Torque.
package motor

import "math"

// Kind is where the motor sits and so through what its torque reaches the road.
type Kind uint8

// The kinds of motor. A crank motor pulls through the chain and the gears, a
// hub motor turns its own wheel at a fixed ratio.
const (
	None Kind = iota
	Crank
	RearHub
	FrontHub
)

// Kinds lists the kinds' names as they are written in files and on the command
// line, in the order of the constants.
var kinds = []string{"none", "crank", "rear-hub", "front-hub"}

// Kinds gives the written names of all kinds.
func Kinds() []string { return append([]string(nil), kinds...) }

func (k Kind) String() string { return kinds[k] }

// Motor is a motor as its sheet describes it. TorqueNm is the most torque at
// its output [N·m]: at the cranks for a crank motor, at the wheel for a hub
// motor. PowerW is the most mechanical power at that output [W]. Levels are
// the assist factors, motor power per rider power, level 1 first. CadenceHigh
// is the crank cadence above which a crank motor eases off [turns/min].
// DirectDrive tells of a hub motor that it has neither gears nor freewheel.
type Motor struct {
	Kind        Kind
	TorqueNm    float64
	PowerW      float64
	Levels      []float64
	CadenceHigh float64
	DirectDrive bool
}

// easeOut is the span above CadenceHigh, as a part of it, in which a crank
// motor's torque falls to nothing. Common practice, no source.
const easeOut = 0.10

// Share is the part of its torque that a crank motor still gives at a cadence
// [crank turns/min]. Hub motors do not care about cadence: 1.
func (m *Motor) Share(cadence float64) float64 {
	if m.Kind != Crank {
		return 1
	}
	over := cadence/m.CadenceHigh - 1
	switch {
	case over <= 0:
		return 1
	case over >= easeOut:
		return 0
	}
	return 1 - over/easeOut
}

// Torque is the torque [N·m] that the torque and power limits leave at a speed
// of the output [rad/s, ≥ 0].
func (m *Motor) Torque(radPerS float64) float64 {
	if m.Kind == None {
		return 0
	}
	return math.Min(m.TorqueNm, m.PowerW/math.Max(radPerS, 1e-9))
}
