// Command recordings makes the recordings of testdata/recordings anew: scenes
// of physics/synth whose truth is known, coded by the tool lame (Debian's
// package of that name). Their truth stands in truth.csv beside them.
//
//	go run ./build/recordings
package main

import (
	"bytes"
	"fmt"
	"math"
	"os"
	"os/exec"
	"path/filepath"
	"strconv"

	"hillwright/physics/synth"
)

const folder = "testdata/recordings"

func main() {
	if err := makeAll(); err != nil {
		fmt.Fprintln(os.Stderr, "recordings:", err)
		os.Exit(1)
	}
}

func makeAll() error {
	truth := []byte("file,clicks_per_turn,circumference_m,what\n")
	for _, r := range Recordings() {
		s := r.Scene
		sound := s.Make()
		if r.Instead != nil {
			sound = r.Instead
		}
		data := synth.WAV(sound, s.RateHz, 16)
		if r.Kbit > 0 {
			var err error
			if data, err = lame(data, r.Kbit); err != nil {
				return err
			}
		} else {
			data = synth.WAV(sound, s.RateHz, 8)
		}
		if err := os.WriteFile(filepath.Join(folder, r.File), data, 0o644); err != nil {
			return err
		}
		truth = append(truth, fmt.Sprintf("%s,%d,%g,%s\n", r.File, s.ClicksPerTurn, s.CircumferenceM, r.What)...)
	}
	return os.WriteFile(filepath.Join(folder, "truth.csv"), truth, 0o644)
}

func lame(wav []byte, kbit int) ([]byte, error) {
	cmd := exec.Command("lame", "--quiet", "-m", "m", "--cbr", "-b", strconv.Itoa(kbit), "-", "-")
	cmd.Stdin = bytes.NewReader(wav)
	cmd.Stderr = os.Stderr
	return cmd.Output()
}

// Recording is one file: what is heard, its coding (kbit/s of MP3; 0: an 8-bit
// WAV file), and what it is in words.
type Recording struct {
	File    string
	Scene   synth.Scene
	Instead []float32 // in place of the scene's own sound
	Kbit    int
	What    string
}

// Recordings lists them. The bike of the coast-downs: 105 kg, ΣI/r² 1.8 kg, Crr
// 0.0070, CdA 0.52 m², air of 1.19 kg/m³, a road of 0.2 % one way.
func Recordings() []Recording {
	base := synth.Scene{RateHz: 32000, LengthS: 50, ClicksPerTurn: 36, CircumferenceM: 2.155, SNRdB: 15, Noise: synth.Tyre, Jitter: 0.02}
	var out []Recording
	for i, v0 := range []float64{8.9, 8.6, 8.5, 8.9} {
		s := base
		d := synth.Drag{MassKg: 105, InertiaKg: 1.8, Crr: 0.0070, CdAM2: 0.52, DensityKgM3: 1.19, Grade: 0.002}
		way := "out"
		if i%2 == 1 {
			d.Grade, way = -0.002, "back"
		}
		s.Speed, s.Seed = d.Coast(v0), uint64(11+i)
		s.Noise = []synth.Colour{synth.Tyre, synth.Wind}[i/2]
		out = append(out, Recording{File: fmt.Sprintf("%s-%d.mp3", way, i/2+1), Scene: s, Kbit: 64, What: fmt.Sprintf("a coast-down %s from %g m/s", way, v0)})
	}
	roll := base
	roll.RateHz, roll.LengthS, roll.SNRdB, roll.Noise, roll.Seed = 16000, 14, 20, synth.White, 21
	roll.Speed = func(t float64) float64 {
		// 5 turns in 10 s: a speed that rises for 2 s, holds, and falls for 2 s.
		if t -= 2; t < 0 || t > 10 {
			return 0
		}
		return 5 * 2.155 / 8 * math.Min(1, math.Min(t, 10-t)/2)
	}
	out = append(out, Recording{File: "rolled-5-turns.wav", Scene: roll, What: "a wheel rolled through 5 turns"})
	for name, rub := range map[string]float64{"stand-free.mp3": 0, "stand-rub.mp3": 0.3} {
		s := base
		crr := 0.012
		if rub > 0 {
			crr = 0.035
		}
		s.RateHz, s.LengthS, s.Noise, s.Rub, s.Uneven, s.Seed = 32000, 30, synth.White, rub, 0.3, 31
		s.Speed = synth.Drag{MassKg: 1e-9, InertiaKg: 1, Crr: crr * 1e9, CdAM2: 0.0044, DensityKgM3: 1.19}.Coast(7.5)
		out = append(out, Recording{File: name, Scene: s, Kbit: 64, What: fmt.Sprintf("a wheel on the stand, slowing by %g of gravity and its wind", crr)})
	}
	talk := synth.Scene{RateHz: 32000, LengthS: 12, SNRdB: math.Inf(1), Speed: func(float64) float64 { return 0 }, ClicksPerTurn: 36, CircumferenceM: 2.155}
	voice := synth.Voice(12*32000, 32000, 5)
	spoken := make([]float32, len(voice))
	for i, x := range voice {
		spoken[i] = float32(0.4 * x)
	}
	return append(out, Recording{File: "speech.mp3", Scene: talk, Instead: spoken, Kbit: 64, What: "something like speech and no clicks"})
}
