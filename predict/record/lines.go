package record

import (
	"bufio"
	"bytes"
	"errors"
	"io"
	"strings"
	"unicode/utf8"
)

// maxLine bounds a line in bytes: a longer one is no line of a table.
const maxLine = 1 << 16

// lines hands out a text line by line. Lines end in LF, CR LF or CR.
type lines struct {
	r      *bufio.Reader
	number int // of the last line handed out, from 1
}

func newLines(r io.Reader) *lines { return &lines{r: bufio.NewReaderSize(r, maxLine)} }

var (
	errLong  = errors.New("the line is longer than 64 kB: this is no table")
	errUTF16 = errors.New("the text is in UTF-16: save it as UTF-8")
	errBytes = errors.New("this is no text: it holds a zero byte")
	errCR    = errors.New("the lines end in CR alone: save the table with LF or CR LF")
)

// next returns the next line without its end, or io.EOF. The line is good
// until the next call.
func (l *lines) next() ([]byte, error) {
	line, err := l.r.ReadSlice('\n')
	l.number++
	switch {
	case errors.Is(err, bufio.ErrBufferFull):
		if bytes.Count(line, []byte("\r")) > 1 {
			return nil, errCR
		}
		return nil, errLong
	case err == io.EOF && len(line) > 0:
	case err != nil:
		return nil, err
	}
	if l.number == 1 {
		if bytes.HasPrefix(line, []byte{0xFF, 0xFE}) || bytes.HasPrefix(line, []byte{0xFE, 0xFF}) {
			return nil, errUTF16
		}
		line = bytes.TrimPrefix(line, []byte("\uFEFF"))
	}
	if bytes.IndexByte(line, 0) >= 0 {
		return nil, errBytes
	}
	line = bytes.TrimSuffix(line, []byte("\n"))
	line = bytes.TrimSuffix(line, []byte("\r"))
	if bytes.IndexByte(line, '\r') >= 0 {
		return nil, errCR
	}
	return line, nil
}

// split cuts a line into fields at sep and appends them to into. A field may
// stand in quotation marks, doubled within it (RFC 4180), and does not run on
// over the line. Space around fields is taken off.
func split(line []byte, sep byte, into [][]byte) [][]byte {
	for {
		trimmed := bytes.TrimLeft(line, " ")
		if len(trimmed) > 0 && trimmed[0] == '"' {
			field, rest := quoted(trimmed[1:])
			into = append(into, bytes.TrimSpace(field))
			i := bytes.IndexByte(rest, sep)
			if i < 0 {
				return into
			}
			line = rest[i+1:]
			continue
		}
		i := bytes.IndexByte(line, sep)
		if i < 0 {
			return append(into, bytes.TrimSpace(line))
		}
		into = append(into, bytes.TrimSpace(line[:i]))
		line = line[i+1:]
	}
}

// quoted returns what stands up to the closing quotation mark, and what
// follows it.
func quoted(s []byte) (field, rest []byte) {
	for i := 0; i < len(s); i++ {
		if s[i] != '"' {
			continue
		}
		if i+1 < len(s) && s[i+1] == '"' {
			i++
			continue
		}
		return bytes.ReplaceAll(s[:i], []byte(`""`), []byte(`"`)), s[i+1:]
	}
	return s, nil
}

// quote sets a piece of a file in quotation marks, made short and printable.
func quote(b []byte) string {
	const most = 40
	s := strings.Map(func(r rune) rune {
		if r < ' ' || r == 0x7F || r == utf8.RuneError {
			return '?'
		}
		return r
	}, string(b))
	if r := []rune(s); len(r) > most {
		s = string(r[:most-1]) + "…"
	}
	return `"` + s + `"`
}
