package words

import (
	"strconv"

	"hillwright/physics/click"
	"hillwright/physics/coast"
	"hillwright/physics/sound"
)

// recordings are the names of kinds of recordings: those of their formats.
var recordings = map[sound.Look]string{
	sound.LookM4A: "m4a (MPEG-4)", sound.LookOgg: "Ogg", sound.LookFLAC: "FLAC", sound.LookAMR: "AMR",
	sound.LookAIFF: "AIFF", sound.LookCAF: "CAF", sound.LookWebM: "WebM",
}

func (v Voice) soundLook(l sound.Look) string {
	if name, ok := recordings[l]; ok {
		return v.Say(LookRecording, name)
	}
	switch l {
	case sound.LookTrack:
		return v.text(LookATrack)
	case sound.LookText:
		return v.text(LookAText)
	case sound.LookPicture:
		return v.text(LookAPicture)
	case sound.LookZIP:
		return v.text(LookAnArchive)
	}
	return v.text(SoundUnknown)
}

func (v Voice) soundProblem(e *sound.Error) string {
	got := strconv.Itoa(e.Got)
	switch e.Kind {
	case sound.Empty:
		return v.text(SoundEmpty)
	case sound.NotSound:
		return v.Say(SoundNotSound, v.soundLook(e.Looks))
	case sound.UnknownWAV:
		return v.Say(SoundWAV, got)
	case sound.OddBits:
		return v.Say(SoundBits, got)
	case sound.OddRate:
		return v.Say(SoundRate, got)
	case sound.SlowMP3:
		return v.Say(SoundSlow, got)
	case sound.NoSamples:
		return v.text(SoundNoSamples)
	}
	return v.text(SoundDamaged)
}

func (v Voice) clickProblem(e *click.Error) string {
	switch e.Kind {
	case click.OddRate:
		return v.Say(SoundRate, v.short(e.Got, 0))
	case click.TooShort:
		return v.Say(ClickTooShort, v.Number(e.Got, 1))
	case click.TooLong:
		return v.text(ClickTooLong)
	case click.Silent:
		return v.text(ClickSilent)
	case click.NotFlat:
		return v.text(ClickDamaged)
	case click.NoSingle:
		return v.text(ClickNoSingle)
	}
	return v.Say(ClickNone, v.Number(e.Got, 0))
}

func (v Voice) coastProblem(e *coast.Error) string {
	run := strconv.Itoa(e.Run + 1)
	switch e.Kind {
	case coast.NoRun:
		return v.text(CoastNoRun)
	case coast.BadNumber:
		return v.text(CoastBadNumber)
	case coast.TooFew:
		return v.Say(CoastTooFew, run, v.Number(e.Got, 0), v.Number(e.Want, 0))
	case coast.TooShort:
		return v.Say(CoastTooShort, run, v.Number(e.Got, 1), v.Number(e.Want, 0))
	case coast.TooSlow:
		return v.Say(CoastTooSlow, run, v.Speed(e.Got), v.Speed(e.Want))
	case coast.SmallRange:
		return v.Say(CoastSmallRange, run, v.Percent(e.Got), v.Percent(e.Want))
	case coast.SpeedsUp:
		return v.Say(CoastSpeedsUp, run)
	case coast.CannotTell:
		return v.text(CoastCannotTell)
	case coast.Impossible:
		return v.Say(CoastImpossible, v.Crr(e.Got), v.Area(e.Want))
	case coast.NotWhole:
		return v.Say(CoastNotWhole, v.Number(e.Got, 2), v.Number(e.Want, 0))
	}
	return v.text(CoastTooNoisy)
}

// Crr writes a coefficient of rolling resistance to four places.
func (v Voice) Crr(crr float64) string { return v.Number(crr, 4) }

// Area writes a drag area [m²] to three places.
func (v Voice) Area(m2 float64) string { return v.with(v.Number(m2, 3), "m²") }

// Seconds writes a time [s] to a tenth.
func (v Voice) Seconds(s float64) string { return v.with(v.Number(s, 1), "s") }

// leans is from which correlation on Crr and CdA are said to lean on each
// other.
const leans = 0.6

// Lean says how well Crr and CdA are told apart, by their correlation.
func (v Voice) Lean(correlation float64) string {
	if correlation < -leans {
		return v.Say(DragLean, v.Number(correlation, 2))
	}
	return v.Say(DragFree, v.Number(correlation, 2))
}

// Torque writes a small torque [N·m].
func (v Voice) Torque(nm float64) string { return v.with(v.Number(nm, 3), "N·m") }

// FinePower writes a small power [W] to a tenth.
func (v Voice) FinePower(w float64) string { return v.with(v.Number(w, 1), "W") }

// Decibel writes a ratio of loudness [dB].
func (v Voice) Decibel(db float64) string { return v.with(v.Number(db, 1), "dB") }
