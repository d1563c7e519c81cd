package document

import (
	"bytes"
	"crypto/sha256"
	"fmt"
	"io/fs"
	"os"
	"path/filepath"
	"runtime"
	"strings"
	"testing"
	"testing/fstest"
	"time"
)

// TestFiles checks what is said of files that are no texts to begin with.
func TestFiles(t *testing.T) {
	dir := t.TempDir()
	write := func(name string, data []byte) string {
		path := filepath.Join(dir, name)
		if err := os.WriteFile(path, data, 0o644); err != nil {
			t.Fatal(err)
		}
		return path
	}
	write("skerrow-haven.yaml", []byte(goodHarbour))
	tests := []struct{ path, want string }{
		{filepath.Join(dir, "skerow-haven.yaml"), "there is no such file; did you mean skerrow-haven.yaml?"},
		{filepath.Join(dir, "nowhere", "x.yaml"), "there is no such file"},
		{filepath.Join(dir, "quite-another-name.yaml"), "there is no such file"},
		{dir, "this is a folder, not a file"},
		{".", "this is a folder, not a file"},
		{"..", "this is a folder, not a file"},
		{"", "the name of the file is empty"},
		{write("empty.yaml", nil), "the file is empty"},
		{write("blank.yaml", []byte(" \n\n")), "the file is empty"},
		{write("notes.yaml", []byte("# only notes\n")), "the file is empty"},
		{write("null.yaml", []byte("~\n")), "the file is empty"},
		{write("mark.yaml", []byte("---\n")), "the file is empty"},
		{write("big.yaml", bytes.Repeat([]byte("#"), MaxSize+1)), "the file is larger than 1 MB: it cannot be one of ours"},
		{write("utf16.yaml", []byte("\xff\xfeh\x00a\x00")), "the text is in UTF-16: save it as UTF-8"},
	}
	if runtime.GOOS != "windows" {
		tests = append(tests, struct{ path, want string }{os.DevNull, "this is not a file that can be read from start to end"})
	}
	for _, test := range tests {
		_, _, err := ReadHarbour(OnDisk(test.path))
		if got, want := said(err), test.path+": "+test.want; got != want {
			t.Errorf("got %s\nwant %s", got, want)
		}
	}
	for _, test := range []struct{ text, want string }{
		{"harbour: a\nunit: \xe9\n", "f.yaml:2: the text is not in UTF-8: save it as UTF-8"},
		{"harbour: a\nunit: \x00\n", "f.yaml:2: the character U+0000 has no place in a text: take it out"},
		{"harbour: a\u2028b\n", "f.yaml:1: the character U+2028 has no place in a text: take it out"},
		{"just words\n", `f.yaml:1: the file is "just words": a key, a colon and a value on each line is wanted`},
		{"- a\n", "f.yaml:1: the file is a list: a key, a colon and a value on each line is wanted"},
	} {
		_, _, err := ReadHarbour(In(folder("f.yaml", test.text), "f.yaml"))
		if got := said(err); got != test.want {
			t.Errorf("got %s\nwant %s", got, test.want)
		}
	}
}

// TestForbidden checks the sentence for a file that may not be read.
func TestForbidden(t *testing.T) {
	_, _, err := ReadHarbour(In(locked{folder("f.yaml", goodHarbour)}, "f.yaml"))
	if got, want := said(err), "f.yaml: the file may not be read: its permissions forbid it"; got != want {
		t.Errorf("got %s\nwant %s", got, want)
	}
}

// locked is a file system whose files can be seen but not opened.
type locked struct{ fs.FS }

func (l locked) Open(name string) (fs.File, error) {
	return nil, &fs.PathError{Op: "open", Path: name, Err: fs.ErrPermission}
}

func (l locked) Stat(name string) (fs.FileInfo, error) { return fs.Stat(l.FS, name) }

// TestEncodings checks that marks and line ends of other systems change
// nothing, lines counted as before.
func TestEncodings(t *testing.T) {
	for name, text := range map[string]string{
		"mark": "\uFEFF" + goodHarbour,
		"CRLF": strings.ReplaceAll(goodHarbour, "\n", "\r\n"),
		"CR":   strings.ReplaceAll(goodHarbour, "\n", "\r"),
	} {
		h, _, err := ReadHarbour(In(folder("f.yaml", text), "f.yaml"))
		if err != nil {
			t.Errorf("%s: %v", name, err)
		} else if len(h.Constants) != 8 || h.Source != "invented for this test" {
			t.Errorf("%s: %d constants, source %q", name, len(h.Constants), h.Source)
		}
		_, _, err = ReadHarbour(In(folder("f.yaml", strings.Replace(text, "3.12", "x", 1)), "f.yaml"))
		if got, want := said(err), `f.yaml:6: mean-level is "x": a number is wanted`; got != want {
			t.Errorf("%s: got %s\nwant %s", name, got, want)
		}
	}
}

// TestDigest compares the digest with one of the bytes on disk, mark, line
// ends and all.
func TestDigest(t *testing.T) {
	text := "\uFEFF" + strings.ReplaceAll(goodHarbour, "\n", "\r\n")
	_, reading, err := ReadHarbour(In(folder("sub/f.yaml", text), "sub/f.yaml"))
	if err != nil {
		t.Fatal(err)
	}
	if want := fmt.Sprintf("[{f.yaml %x}]", sha256.Sum256([]byte(text))); fmt.Sprint(reading.Inputs) != want {
		t.Errorf("inputs %v, wanted %s", reading.Inputs, want)
	}
}

// endless is a file of 50 MB that counts what is read of it.
type endless struct {
	read int
	size int64
}

func (e *endless) Open(string) (fs.File, error) { return e, nil }
func (e *endless) Stat() (fs.FileInfo, error)   { return fakeInfo{e.size}, nil }
func (e *endless) Close() error                 { return nil }
func (e *endless) Read(p []byte) (int, error)   { e.read += len(p); clear(p); return len(p), nil }

type fakeInfo struct{ size int64 }

func (f fakeInfo) Name() string       { return "f.yaml" }
func (f fakeInfo) Size() int64        { return f.size }
func (f fakeInfo) Mode() fs.FileMode  { return 0o644 }
func (f fakeInfo) ModTime() time.Time { return time.Time{} }
func (f fakeInfo) IsDir() bool        { return false }
func (f fakeInfo) Sys() any           { return nil }

// TestLargeFileIsLeft checks that a large file is not read through.
func TestLargeFileIsLeft(t *testing.T) {
	e := &endless{size: 50 << 20}
	_, _, err := ReadHarbour(In(e, "f.yaml"))
	if got, want := said(err), "f.yaml: the file is larger than 1 MB: it cannot be one of ours"; got != want {
		t.Errorf("got %s\nwant %s", got, want)
	}
	if e.read > 2*MaxSize {
		t.Errorf("%d bytes read", e.read)
	}
}

// TestLargestFile checks that a file of just 1 MB is read.
func TestLargestFile(t *testing.T) {
	text := goodHarbour + strings.Repeat("#", MaxSize-len(goodHarbour))
	if _, _, err := ReadHarbour(In(folder("f.yaml", text), "f.yaml")); err != nil {
		t.Error(err)
	}
}

// TestLimits feeds files made to be slow. Each must be over in seconds, on a
// slow machine too.
func TestLimits(t *testing.T) {
	if testing.Short() {
		t.Skip("takes seconds")
	}
	fill := func(s string) string { return strings.Repeat(s, MaxSize/len(s)) }
	var bomb strings.Builder
	bomb.WriteString("a0: &a0 [x, x, x, x, x, x, x, x, x]\n")
	for i := 1; i < 40; i++ {
		fmt.Fprintf(&bomb, "a%d: &a%d [%s]\n", i, i, strings.Repeat(fmt.Sprintf("*a%d, ", i-1), 9))
	}
	var keys strings.Builder
	for i := 0; keys.Len() < MaxSize-100; i++ {
		fmt.Fprintf(&keys, "k%d: 1\n", i)
	}
	for name, text := range map[string]string{
		"aliases":         bomb.String(),
		"lists":           fill("["),
		"closed lists":    strings.Repeat("[", 9000) + strings.Repeat("]", 9000),
		"groups":          fill("{a: "),
		"items":           fill("- "),
		"nested lines":    fill("-\n "),
		"question marks":  fill("? "),
		"keys":            keys.String(),
		"keys in words":   "language: en\nname: x\n" + keys.String(),
		"same key":        fill("a: 1\n"),
		"quotation marks": fill("\""),
		"open text":       "\"" + fill("a\n")[10:],
		"notes":           fill("#\n"),
		"notes on values": fill("a: 1 #\n"),
		"colons":          fill(": "),
		"anchors":         fill("&a "),
		"tags":            fill("!a "),
		"marks":           fill("---\n"),
		"spaces":          fill(" "),
		"lines":           fill("\n"),
		"braces":          "language: en\nname: x\na: '" + strings.Repeat("{", MaxSize-100) + "'\n",
		"bad end":         strings.Repeat("a: 1\n", 200000) + " b: 1\n",
		"minuses":         fill("-"),
		"accents":         "harbour: a" + strings.Repeat("\u0301", MaxSize/2-10),
	} {
		start := time.Now()
		files := fstest.MapFS{"f.yaml": {Data: []byte(text), Mode: 0o644}}
		_, _, err1 := ReadHarbour(In(files, "f.yaml"))
		_, err2 := ReadWords(In(files, "f.yaml"))
		if err1 == nil || err2 == nil {
			t.Errorf("%s: nothing wrong", name)
		}
		for _, err := range []error{err1, err2} {
			if f, _ := err.(Faults); len(f) > maxFaults+1 {
				t.Errorf("%s: %d faults", name, len(f))
			}
		}
		took := time.Since(start)
		t.Logf("%-16s %6.2f s  %.100q", name, took.Seconds(), said(err2))
		if took > 20*time.Second {
			t.Errorf("%s: %v", name, took)
		}
	}
}
