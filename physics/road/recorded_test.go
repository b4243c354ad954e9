package road

import (
	"math"
	"os"
	"os/exec"
	"path/filepath"
	"runtime"
	"strings"
	"testing"

	"github.com/muktihari/fit/decoder"
	"github.com/muktihari/fit/profile/filedef"

	"hillwright/physics/air"
	"hillwright/physics/unit"
)

// sample is one second of a recorded ride.
type sample struct{ seconds, speed, height, watts, celsius float64 }

func recordedRide(t *testing.T) []sample {
	if runtime.GOOS == "js" {
		t.Skip("asks the Go command where the module with the recorded ride is")
	}
	dir, err := exec.Command("go", "list", "-m", "-f", "{{.Dir}}", "github.com/muktihari/fit").Output()
	if err != nil {
		t.Fatalf("the module with the recorded ride is not here: %v", err)
	}
	f, err := os.Open(filepath.Join(strings.TrimSpace(string(dir)), "testdata", "from_official_sdk", "activity_lowbattery.fit"))
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	listener := filedef.NewListener()
	defer listener.Close()
	d := decoder.New(f, decoder.WithMesgListener(listener), decoder.WithBroadcastOnly())
	if _, err := d.Decode(); err != nil {
		t.Fatal(err)
	}
	var ride []sample
	for _, r := range listener.File().(*filedef.Activity).Records {
		s := sample{float64(r.Timestamp.Unix()), r.SpeedScaled(), r.AltitudeScaled(), float64(r.Power), float64(r.Temperature)}
		if r.Power == 0xffff || math.IsNaN(s.speed) || math.IsNaN(s.height) {
			continue
		}
		ride = append(ride, s)
	}
	return ride
}

// interval is a few minutes of the recorded ride: the work that was left for
// rolling and air [J], and what they take for a coefficient of one.
type interval struct{ left, rolling, air, work float64 }

const (
	mass  = 85.0  // all-up [kg], common practice, no source
	chain = 0.976 // Martin et al. 1998
)

// intervals cuts a ride into pieces of some seconds.
func intervals(ride []sample, seconds float64) []interval {
	var all []interval
	var now interval
	var bearings, passed float64
	first := ride[0]
	for i := 1; i < len(ride); i++ {
		s, dt := ride[i], ride[i].seconds-ride[i-1].seconds
		density := air.Density(unit.Celsius(s.celsius), air.StandardPressure(s.height), 0.4)
		l := Load{MassKg: mass, Crr: 1, DragM2: 1, DensityKgM3: density, BearingFactor: 1}
		p := l.Parts(s.speed, 0, 1, 0, 0)
		now.work += chain * s.watts * dt
		now.rolling += p.Rolling * s.speed * dt
		now.air += p.Air * s.speed * dt
		bearings += p.Bearings * s.speed * dt
		if passed += dt; passed < seconds {
			continue
		}
		stored := mass*unit.Gravity*(s.height-first.height) + mass/2*(s.speed*s.speed-first.speed*first.speed)
		now.left = now.work - stored - bearings
		all = append(all, now)
		now, bearings, passed, first = interval{}, 0, 0, s
	}
	return all
}

// A bicycle ride of 28 km recorded with a power meter (the sample activity of
// the FIT SDK in github.com/muktihari/fit, BSD-3). Rider and bike are not
// known, so rolling and drag are fitted to pieces of five minutes; the equation
// must then explain the measured work, with coefficients that a road bike with
// a rider who also brakes can have, and to 15 %, the wind being unknown (common
// practice, no source).
func TestEquationExplainsARecordedRide(t *testing.T) {
	all := intervals(recordedRide(t), 300)
	var rr, ra, aa, rl, al float64
	for _, i := range all {
		rr, ra, aa = rr+i.rolling*i.rolling, ra+i.rolling*i.air, aa+i.air*i.air
		rl, al = rl+i.rolling*i.left, al+i.air*i.left
	}
	det := rr*aa - ra*ra
	crr, cda := (rl*aa-al*ra)/det, (al*rr-rl*ra)/det
	if crr < 0.003 || crr > 0.012 || cda < 0.25 || cda > 0.45 {
		t.Errorf("Crr %.4f and CdA %.3f m² are not a road bike's", crr, cda)
	}
	var off, work float64
	for _, i := range all {
		d := i.left - crr*i.rolling - cda*i.air
		off, work = off+d*d, work+i.work*i.work
	}
	if part := math.Sqrt(off / work); part > 0.15 {
		t.Errorf("the equation misses the measured work by %.1f %%", 100*part)
	} else {
		t.Logf("%d pieces, Crr %.4f, CdA %.3f m², missed by %.1f %%", len(all), crr, cda, 100*part)
	}
}
