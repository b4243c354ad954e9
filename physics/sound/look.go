package sound

import "unicode/utf8"

// marks are the bytes by which files are told apart.
var marks = []struct {
	at   int
	text string
	look Look
}{
	{8, "WAVE", lookWAV}, {4, "ftyp", LookM4A}, {0, "OggS", LookOgg}, {0, "fLaC", LookFLAC}, {0, "#!AMR", LookAMR},
	{8, "AIFF", LookAIFF}, {8, "AIFC", LookAIFF}, {0, "caff", LookCAF}, {0, "\x1aE\xdf\xa3", LookWebM}, {0, "PK\x03\x04", LookZIP},
	{0, "\x89PNG", LookPicture}, {0, "\xff\xd8\xff", LookPicture}, {0, "GIF8", LookPicture}, {8, "WEBP", LookPicture},
	{0, "ID3", lookMP3},
}

// lookOf tells what a file is by its first bytes.
func lookOf(head []byte) Look {
	for _, m := range marks {
		if len(head) >= m.at+len(m.text) && string(head[m.at:m.at+len(m.text)]) == m.text {
			return m.look
		}
	}
	if frameAt(head) >= 0 {
		return lookMP3
	}
	if isText(head) {
		for i := range head {
			if rest := head[i:]; len(rest) >= 4 && string(rest[:4]) == "<gpx" {
				return LookTrack
			}
		}
		return LookText
	}
	return LookNothing
}

func isText(head []byte) bool {
	for i := 0; i < len(head); {
		r, size := utf8.DecodeRune(head[i:])
		if r == utf8.RuneError && size == 1 && i+utf8.UTFMax <= len(head) || r < ' ' && r != '\n' && r != '\r' && r != '\t' {
			return false
		}
		i += size
	}
	return true
}

// frameAt finds the first of two MP3 frames that follow each other, −1 without.
func frameAt(head []byte) int {
	for i := 0; i+4 <= len(head); i++ {
		long := frameBytes(head[i:])
		if long > 0 && i+long+4 <= len(head) && frameBytes(head[i+long:]) > 0 {
			return i
		}
	}
	return -1
}

// Bit rates [kbit/s] of layer III by index, ISO/IEC 11172-3 and 13818-3.
var (
	rates1 = [16]int{0, 32, 40, 48, 56, 64, 80, 96, 112, 128, 160, 192, 224, 256, 320, 0}
	rates2 = [16]int{0, 8, 16, 24, 32, 40, 48, 56, 64, 80, 96, 112, 128, 144, 160, 0}
)

// slowHz is the sampling rate [Hz] of a frame of MPEG-2.5, 0 for any other.
func slowHz(b []byte) int {
	if frameBytes(b) == 0 || b[1]>>3&3 != 0 {
		return 0
	}
	return [3]int{11025, 12000, 8000}[b[2]>>2&3]
}

// frameBytes is the length of the layer III frame whose header stands at the
// beginning, 0 where none does.
func frameBytes(b []byte) int {
	if len(b) < 4 || b[0] != 0xff || b[1]&0xe0 != 0xe0 {
		return 0
	}
	version, layer, rate, sampling := b[1]>>3&3, b[1]>>1&3, b[2]>>4, b[2]>>2&3
	if version == 1 || layer != 1 || sampling == 3 {
		return 0
	}
	hz := [3]int{44100, 48000, 32000}[sampling]
	kbit, samples := rates1[rate], 144
	if version != 3 {
		hz, kbit, samples = hz/2, rates2[rate], 72
	}
	if version == 0 {
		hz /= 2
	}
	if kbit == 0 {
		return 0
	}
	return samples*1000*kbit/hz + int(b[2]>>1&1)
}
