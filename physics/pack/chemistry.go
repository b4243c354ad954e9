package pack

// Chemistry is the cells' kind, by its positive electrode.
type Chemistry uint8

// The chemistries. Nickel stands for the nickel-rich oxides (NMC, NCA) of most
// bike packs, IronPhosphate for LFP.
const (
	Nickel Chemistry = iota
	IronPhosphate
)

var chemistries = []string{"nickel", "iron-phosphate"}

// Chemistries gives the written names of all chemistries, in the order of the
// constants.
func Chemistries() []string { return append([]string(nil), chemistries...) }

func (c Chemistry) String() string { return chemistries[c] }

// steps is how finely the tables over charge are cut.
const steps = 20

// curve is a table over charge: at 0, 1/20, ... 1.
type curve [steps + 1]float64

// at gives a curve's value at a charge, straight between the entries; charges
// outside 0 to 1 are taken as the nearer end.
func (c *curve) at(charge float64) float64 {
	x := min(max(charge, 0), 1) * steps
	i := min(int(x), steps-1)
	return c[i] + (x-float64(i))*(c[i+1]-c[i])
}

// under is the area below a curve from 0 to a charge within 0 to 1.
func (c *curve) under(charge float64) float64 {
	x := min(max(charge, 0), 1) * steps
	whole := min(int(x), steps-1)
	sum := 0.0
	for i := range whole {
		sum += (c[i] + c[i+1]) / 2
	}
	part := x - float64(whole)
	return (sum + part*(c[whole]+c.at(charge))/2) / steps
}

// cell is what the cells of one chemistry have in common. openV is the voltage
// at rest at 25 °C, nominalV what makers multiply by, fullV where charging
// ends, cutV where the BMS cuts under load [V]. ohmAh is a cell's resistance
// within seconds times its capacity [Ω·Ah]: a larger cell resists less.
// All from memory of common data sheets, none from one source.
type cell struct {
	openV                 curve
	nominalV, fullV, cutV float64
	ohmAh                 float64
}

var cells = [...]cell{
	Nickel: {
		openV: curve{
			3.10, 3.35, 3.46, 3.52, 3.56, 3.59, 3.615, 3.64, 3.665, 3.69, 3.72,
			3.755, 3.80, 3.845, 3.89, 3.935, 3.985, 4.03, 4.075, 4.12, 4.18,
		},
		nominalV: 3.6, fullV: 4.2, cutV: 3.0, ohmAh: 0.105,
	},
	IronPhosphate: {
		openV: curve{
			2.70, 3.05, 3.18, 3.21, 3.235, 3.25, 3.265, 3.275, 3.28, 3.285, 3.29,
			3.295, 3.30, 3.305, 3.315, 3.325, 3.33, 3.333, 3.336, 3.345, 3.45,
		},
		nominalV: 3.2, fullV: 3.65, cutV: 2.5, ohmAh: 0.09,
	},
}

// lowCharge is how much more a cell resists as it empties. Common practice, no
// source.
var lowCharge = curve{
	2.0, 1.6, 1.35, 1.22, 1.12, 1.07, 1.04, 1.02, 1.01, 1, 1,
	1, 1, 1, 1, 1, 1, 1, 1, 1, 1,
}

// cold is what temperature does to a cell [°C]: the share of its capacity that
// it gives, and how much more it resists than at 25 °C.
type cold struct{ celsius, capacity, ohm float64 }

// colds is the table of it. Capacity: a maker-neutral 18650 sheet, at 10 A per
// cell (see CHECKS.md). A bike draws less per cell, so this errs on the careful
// side. Resistance: common practice, no source.
var colds = [...]cold{{-20, 0.60, 4.5}, {-10, 0.75, 3}, {0, 0.80, 2}, {25, 1, 1}, {60, 1, 0.75}}

// coldAt gives capacity and resistance at a cell temperature [°C], straight
// between the entries; beyond the ends the end holds.
func coldAt(cellC float64) (capacity, ohm float64) {
	if cellC <= colds[0].celsius {
		return colds[0].capacity, colds[0].ohm
	}
	for i := 1; i < len(colds); i++ {
		if low, high := &colds[i-1], &colds[i]; cellC <= high.celsius {
			part := (cellC - low.celsius) / (high.celsius - low.celsius)
			return low.capacity + part*(high.capacity-low.capacity), low.ohm + part*(high.ohm-low.ohm)
		}
	}
	end := &colds[len(colds)-1]
	return end.capacity, end.ohm
}
