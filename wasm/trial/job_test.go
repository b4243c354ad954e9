//go:build !js

package trial

import "testing"

func TestFirstLook(t *testing.T) {
	for _, d := range devices {
		t.Run(d.name, func(t *testing.T) {
			p := open(t, d)
			p.answers(newAsked(t, "", "", "", "", ""))
			p.kept()
		})
	}
}
