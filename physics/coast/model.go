package coast

import (
	"math"

	"hillwright/physics/unit"
)

// Places of the numbers that all runs share; each run's own follow.
const (
	pCrr = iota
	pCdA
	pGrade
	pHead
	pMass
	pInertia
	pDensity
	pScale
	shared
)

// A run's own numbers: its first speed [m/s], its own change of the wind [m/s],
// and for marks where it was at its first time [m].
const (
	pStart = iota
	pGust
	pPlace
	own
)

func ownAt(run, which int) int { return shared + own*run + which }

// model gives what each reading of a run should be.
type model struct {
	run      *Run
	back     float64 // 1 or −1
	at       int     // of the run
	readings int
}

func (m *model) time(i int) float64 {
	if m.run.Marks != nil {
		return m.run.Marks[i].AtS
	}
	return m.run.Points[i].AtS
}

// longestStep is that of the integration [s].
const longestStep = 0.5

// predict integrates a run's speed and place by the fourth-order method and
// puts what each reading should be into out: speeds as the wheel would show
// them, or places.
func (m *model) predict(p []float64, out []float64) {
	cos := 1 / math.Hypot(1, p[pGrade])
	sin := m.back * p[pGrade] * cos
	head := m.back*p[pHead] + p[ownAt(m.at, pGust)]
	inert := p[pMass] + p[pInertia]
	even := p[pMass] * unit.Gravity * (p[pCrr]*cos + sin) / inert
	air := 0.5 * p[pDensity] * p[pCdA] / inert
	slow := func(v float64) float64 {
		along := v + head
		return -even - air*along*math.Abs(along)
	}
	v, x, t := p[ownAt(m.at, pStart)], p[ownAt(m.at, pPlace)], m.time(0)
	for i := range out {
		to := m.time(i)
		steps := math.Ceil((to - t) / longestStep)
		for h := (to - t) / math.Max(1, steps); steps > 0; steps-- {
			k1 := slow(v)
			k2 := slow(v + h/2*k1)
			k3 := slow(v + h/2*k2)
			k4 := slow(v + h*k3)
			x += h*v + h*h/6*(k1+k2+k3)
			v += h / 6 * (k1 + 2*k2 + 2*k3 + k4)
		}
		t = to
		if m.run.Marks != nil {
			out[i] = x
		} else {
			out[i] = v / p[pScale]
		}
	}
}

// error is the standard deviation of a reading: of a speed, or of a place by
// its time's.
func (m *model) error(i int) float64 {
	if m.run.Marks == nil {
		return m.run.Points[i].ErrorMps
	}
	marks := m.run.Marks
	a, b := max(0, i-1), min(len(marks)-1, i+1)
	return marks[i].ErrorS * (marks[b].AtM - marks[a].AtM) / (marks[b].AtS - marks[a].AtS)
}

func (m *model) reading(i int) float64 {
	if m.run.Marks != nil {
		return m.run.Marks[i].AtM
	}
	return m.run.Points[i].SpeedMps
}
