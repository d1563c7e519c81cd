package document

import (
	"bytes"
	"crypto/sha256"
	"encoding/hex"
	"errors"
	"fmt"
	"io"
	"io/fs"
	"os"
	"path"
	"path/filepath"
	"strings"
	"unicode/utf8"

	"ebbleaf/layout"
)

// MaxSize is the size in bytes up to which a file is read. The longest harbour
// file is a hundredth of it.
const MaxSize = 1 << 20

// File is a file that may be read and the name its user knows it by.
type File struct {
	fsys  fs.FS
	name  string // within fsys
	shown string
}

// OnDisk returns the file at a path of the operating system.
func OnDisk(path string) File {
	dir, base := filepath.Split(filepath.Clean(path))
	if path == "" || base == "" || base == "." || base == ".." {
		return File{os.DirFS(filepath.Clean(path)), ".", path}
	}
	if dir == "" {
		dir = "."
	}
	return File{os.DirFS(dir), base, path}
}

// In returns a file of a file system, such as one embedded in the program.
func In(fsys fs.FS, name string) File { return File{fsys, name, name} }

// String returns the file's name as its user knows it.
func (f File) String() string { return f.shown }

// beside returns the file that a text in f names. The name must have passed
// reader.fileName.
func (f File) beside(name string) File {
	return File{f.fsys, path.Join(path.Dir(f.name), name), filepath.Join(filepath.Dir(f.shown), filepath.FromSlash(name))}
}

// absent says in words why there is no file to be read, or nothing. It looks
// without opening: opening a pipe would wait for its other end.
func (f File) absent() string {
	if f.shown == "" {
		return "the name of the file is empty"
	}
	info, err := fs.Stat(f.fsys, f.name)
	switch {
	case errors.Is(err, fs.ErrNotExist):
		sentence := "there is no such file"
		entries, _ := fs.ReadDir(f.fsys, path.Dir(f.name))
		var names []string
		for _, e := range entries {
			if !e.IsDir() {
				names = append(names, e.Name())
			}
		}
		if near, ok := nearest(path.Base(f.name), names); ok {
			sentence += "; did you mean " + near + "?"
		}
		return sentence
	case err != nil:
		return unreadable(err)
	case info.IsDir():
		return "this is a folder, not a file"
	case !info.Mode().IsRegular():
		return "this is not a file that can be read from start to end"
	}
	return ""
}

// unreadable says in words why a file could not be read.
func unreadable(err error) string {
	if errors.Is(err, fs.ErrPermission) {
		return "the file may not be read: its permissions forbid it"
	}
	var at *fs.PathError
	if errors.As(err, &at) { // its message would repeat the name
		err = at.Err
	}
	return "the file cannot be read: " + err.Error()
}

// load reads a whole text file. It returns the text with line ends as LF and
// without a byte order mark, or a fault.
func (f File) load() (text []byte, input layout.Input, faults Faults) {
	fail := func(line int, format string, args ...any) ([]byte, layout.Input, Faults) {
		return nil, layout.Input{}, Faults{{File: f.shown, Line: line, Message: fmt.Sprintf(format, args...)}}
	}
	if why := f.absent(); why != "" {
		return fail(0, "%s", why)
	}
	file, err := f.fsys.Open(f.name)
	if err != nil {
		return fail(0, "%s", unreadable(err))
	}
	defer file.Close()
	data, err := io.ReadAll(io.LimitReader(file, MaxSize+1))
	if err != nil {
		return fail(0, "%s", unreadable(err))
	}
	if len(data) > MaxSize {
		return fail(0, "the file is larger than 1 MB: it cannot be one of ours")
	}
	sum := sha256.Sum256(data)
	input = layout.Input{Name: path.Base(f.name), SHA256: hex.EncodeToString(sum[:])}

	if bytes.HasPrefix(data, []byte{0xFF, 0xFE}) || bytes.HasPrefix(data, []byte{0xFE, 0xFF}) {
		return fail(0, "the text is in UTF-16: save it as UTF-8")
	}
	data = bytes.TrimPrefix(data, []byte("\uFEFF"))
	data = bytes.ReplaceAll(data, []byte("\r\n"), []byte("\n"))
	data = bytes.ReplaceAll(data, []byte("\r"), []byte("\n"))
	if line, r, ok := firstOdd(data); !ok {
		if r == utf8.RuneError {
			return fail(line, "the text is not in UTF-8: save it as UTF-8")
		}
		return fail(line, "the character U+%04X has no place in a text: take it out", r)
	}
	return data, input, nil
}

// firstOdd finds the first thing that is no text: a byte outside UTF-8
// (utf8.RuneError) or a control character.
func firstOdd(data []byte) (line int, odd rune, ok bool) {
	line = 1
	for i := 0; i < len(data); {
		r, n := utf8.DecodeRune(data[i:])
		switch {
		case r == utf8.RuneError && n == 1:
			return line, utf8.RuneError, false
		case r == '\n':
			line++
		case r != '\t' && isControl(r):
			return line, r, false
		}
		i += n
	}
	return 0, 0, true
}

// fileName checks the name of a file that a text names: it stays in the
// folder of the file that names it, so that a file from elsewhere cannot make
// the program read what it likes.
func fileName(name string) (problem string) {
	switch {
	case strings.Contains(name, `\`):
		return "write / between folders"
	case path.IsAbs(name) || strings.Contains(name, ":"):
		return "name a file in the same folder, without a path from the top"
	case !fs.ValidPath(name) || name == ".":
		return "name a file in the same folder or below it, without .."
	}
	return ""
}
