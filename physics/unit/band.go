package unit

// Band is a value that is not known well: the usual one and the bounds between
// which it lies in four cases of five, all in one unit, Low ≤ Usual ≤ High.
type Band struct{ Low, Usual, High float64 }
