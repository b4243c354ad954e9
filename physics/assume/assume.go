// Package assume describes a value that no sheet gave and nobody measured: a
// class default, with its band and the reason for it. Chapters that complete a
// maker's sheet (motor, pack) return a list of Value.
package assume

// Value is one assumed value. Path is the last word of its input's path, with
// its unit; Low and High bound what is usual (nine in ten of the class, common
// practice where no source stands beside the class). Reason is a stable key
// that a page translates, Text the same reason in English.
type Value struct {
	Path             string
	Value, Low, High float64
	Reason, Text     string
}

// Around makes a value with a band that reaches from value·low to value·high.
func Around(path string, value, low, high float64, reason, text string) Value {
	return Value{Path: path, Value: value, Low: value * low, High: value * high, Reason: reason, Text: text}
}
