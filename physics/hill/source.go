package hill

import (
	"bytes"
	"io"
	"unicode/utf8"
)

// counted passes a file on, says how far it is, and stops at the size limit.
type counted struct {
	r        io.Reader
	read     int64
	total    int64 // 0 when the reader does not tell
	progress func(float64) bool
}

func newCounted(r io.Reader, progress func(float64) bool) *counted {
	c := &counted{r: r, progress: progress}
	if sized, ok := r.(interface{ Len() int }); ok {
		c.total = int64(sized.Len())
	}
	return c
}

func (c *counted) Read(p []byte) (int, error) {
	if c.progress != nil {
		done := 0.0
		if c.total > 0 {
			done = min(1, float64(c.read)/float64(c.total))
		}
		if !c.progress(done) {
			return 0, &TrackError{Kind: TrackCancelled}
		}
	}
	n, err := c.r.Read(p)
	if c.read += int64(n); c.read > LargestTrackBytes || c.total > LargestTrackBytes {
		return 0, &TrackError{Kind: TrackTooLarge}
	}
	if err != nil && err != io.EOF {
		err = &TrackError{Kind: TrackUnreadable, Err: err}
	}
	return n, err
}

// utf16Reader turns UTF-16 into UTF-8 on the way.
type utf16Reader struct {
	r         io.Reader
	bigEndian bool
	half      []byte // bytes that do not make a unit yet
	high      rune   // first half of a surrogate pair
	out       []byte
	err       error
}

func (u *utf16Reader) Read(p []byte) (int, error) {
	for len(u.out) == 0 {
		if u.err != nil {
			return 0, u.err
		}
		u.convert()
	}
	n := copy(p, u.out)
	u.out = u.out[n:]
	return n, nil
}

func (u *utf16Reader) convert() {
	raw := make([]byte, 32<<10)
	left := copy(raw, u.half)
	n, err := u.r.Read(raw[left:])
	raw, u.err = raw[:left+n], err
	u.out = u.out[:0]
	for ; len(raw) >= 2; raw = raw[2:] {
		c := rune(raw[1])<<8 | rune(raw[0])
		if u.bigEndian {
			c = rune(raw[0])<<8 | rune(raw[1])
		}
		switch {
		case c >= 0xD800 && c < 0xDC00:
			u.high = c
			continue
		case c >= 0xDC00 && c < 0xE000:
			c = (u.high-0xD800)<<10 | (c - 0xDC00) + 0x10000
		}
		u.out = utf8.AppendRune(u.out, c)
	}
	u.half = append(u.half[:0], raw...)
}

// scanner hands out a file byte by byte from a buffer of its own.
type scanner struct {
	r        io.Reader
	buf      []byte
	pos, end int
	lines    int // new lines before the buffer
	err      *TrackError
}

func newScanner(r io.Reader) *scanner {
	return &scanner{r: r, buf: make([]byte, 64<<10)}
}

// next gives one byte; ok is false at the end of the file and on an error.
func (s *scanner) next() (c byte, ok bool) {
	if s.pos < s.end {
		s.pos++
		return s.buf[s.pos-1], true
	}
	return s.nextOfFile()
}

// nextOfFile is next at the end of the buffer: apart, so that next is inlined.
func (s *scanner) nextOfFile() (c byte, ok bool) {
	if !s.refill() {
		return 0, false
	}
	s.pos = 1
	return s.buf[0], true
}

// back gives the last byte back, once.
func (s *scanner) back() { s.pos-- }

func (s *scanner) refill() bool {
	if s.err != nil {
		return false
	}
	s.lines += bytes.Count(s.buf[:s.end], []byte{'\n'})
	s.pos, s.end = 0, 0
	for tries := 0; tries < 100; tries++ {
		n, err := s.r.Read(s.buf)
		s.end = n
		if err != nil && err != io.EOF {
			if te, ok := err.(*TrackError); ok {
				s.err = te
			}
		}
		if n > 0 {
			return true
		}
		if err != nil {
			return false
		}
	}
	s.err = &TrackError{Kind: TrackUnreadable, Err: io.ErrNoProgress}
	return false
}

// line is the number of the line at which the scanner stands, from 1.
func (s *scanner) line() int {
	return 1 + s.lines + bytes.Count(s.buf[:s.pos], []byte{'\n'})
}

// until appends everything up to stop, which is taken too, to dst, of which at
// most mostKept bytes are kept; ok is false when the file ends before it.
func (s *scanner) until(stop byte, dst []byte) (_ []byte, ok bool) {
	for {
		if s.pos == s.end && !s.refill() {
			return dst, false
		}
		part := s.buf[s.pos:s.end]
		i := bytes.IndexByte(part, stop)
		if i >= 0 {
			part = part[:i]
		}
		s.pos += len(part)
		if room := mostKept - len(dst); room > 0 {
			dst = append(dst, part[:min(room, len(part))]...)
		}
		if i >= 0 {
			s.pos++
			return dst, true
		}
	}
}

// mostKept bounds one name, attribute or text [bytes]; numbers and names of
// tracks are far shorter.
const mostKept = 4096

// space skips white space and gives the byte behind it.
func (s *scanner) space() (c byte, ok bool) {
	for {
		c, ok = s.next()
		if !ok || c != ' ' && c != '\n' && c != '\r' && c != '\t' {
			return c, ok
		}
	}
}

// mark skips a byte order mark in UTF-8.
func (s *scanner) mark() {
	if c, ok := s.next(); ok && c != 0xEF {
		s.back()
	} else if ok {
		s.next()
		s.next()
	}
}

// broken makes the error for a file that is not well formed here.
func (s *scanner) broken(what string) *TrackError {
	return &TrackError{Kind: TrackBroken, Line: s.line(), Got: what}
}

// ended makes the error for a file that ends here, or that cannot be read on.
func (s *scanner) ended() *TrackError {
	if s.err != nil {
		return s.err
	}
	return &TrackError{Kind: TrackCutOff, Line: s.line()}
}
