package output_test

import (
	"io/fs"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"ebbleaf/layout/output"
)

// holds fails unless the folder holds just the named file with these bytes.
func holds(t *testing.T, file, want string) {
	t.Helper()
	got, err := os.ReadFile(file)
	if err != nil || string(got) != want {
		t.Errorf("%s holds %q (%v), want %q", file, got, err, want)
	}
	entries, err := os.ReadDir(filepath.Dir(file))
	if err != nil {
		t.Fatal(err)
	}
	if len(entries) != 1 {
		t.Errorf("the folder holds %v, want one file", entries)
	}
}

func TestSave(t *testing.T) {
	file := filepath.Join(t.TempDir(), "2027.pdf")
	for _, step := range []struct {
		data    string
		replace bool
		want    output.Result
	}{
		{"first", false, output.Written},
		{"first", false, output.Unchanged},
		{"first", true, output.Unchanged},
		{"other", true, output.Replaced},
		{"longer than the other", true, output.Replaced},
		{"", true, output.Replaced},
		{"", false, output.Unchanged},
	} {
		got, err := output.Save(file, []byte(step.data), step.replace)
		if err != nil || got != step.want {
			t.Errorf("%q: %s, %v; want %s", step.data, got, err, step.want)
		}
		holds(t, file, step.data)
	}
}

func TestSaveDoesNotReplaceUnasked(t *testing.T) {
	file := filepath.Join(t.TempDir(), "2027.pdf")
	if err := os.WriteFile(file, []byte("kept"), 0o600); err != nil {
		t.Fatal(err)
	}
	for _, data := range []string{"lost", "of another length"} {
		_, err := output.Save(file, []byte(data), false)
		if err == nil || !strings.Contains(err.Error(), "exists and is different; give another name, or allow it to be replaced") {
			t.Errorf("got %v", err)
		}
		holds(t, file, "kept")
	}
	if _, err := output.Save(file, []byte("new"), true); err != nil {
		t.Fatal(err)
	}
	info, err := os.Stat(file)
	if err != nil || info.Mode().Perm() != 0o600 {
		t.Errorf("the permissions became %v, %v", info.Mode(), err)
	}
}

func TestSaveThroughALink(t *testing.T) {
	file := filepath.Join(t.TempDir(), "2027.pdf")
	link := filepath.Join(t.TempDir(), "latest.pdf")
	if err := os.WriteFile(file, []byte("old"), 0o644); err != nil {
		t.Fatal(err)
	}
	if err := os.Symlink(file, link); err != nil {
		t.Skip("this system makes no symbolic links:", err)
	}
	if got, err := output.Save(link, []byte("new"), true); err != nil || got != output.Replaced {
		t.Errorf("%s, %v", got, err)
	}
	holds(t, file, "new")
	if info, err := os.Lstat(link); err != nil || info.Mode()&fs.ModeSymlink == 0 {
		t.Errorf("the link is gone: %v, %v", info, err)
	}
}

func TestSaveExplains(t *testing.T) {
	dir := t.TempDir()
	plain := filepath.Join(dir, "plain")
	if err := os.WriteFile(plain, nil, 0o644); err != nil {
		t.Fatal(err)
	}
	for _, c := range []struct{ path, want string }{
		{dir, " is a folder; give the name of a file"},
		{filepath.Join(dir, "none", "a.pdf"), "cannot be written: the folder " + filepath.Join(dir, "none") + " does not exist"},
		{filepath.Join(plain, "a.pdf"), "cannot be written: " + plain + " is not a folder"},
	} {
		_, err := output.Save(c.path, []byte("x"), true)
		if err == nil || !strings.HasPrefix(err.Error(), c.path) || !strings.HasSuffix(err.Error(), c.want) {
			t.Errorf("%s: got %v, want %q", c.path, err, c.want)
		}
	}
	holds(t, plain, "")
}

func TestSaveInAFolderThatCannotBeWritten(t *testing.T) {
	dir := t.TempDir()
	if err := os.Chmod(dir, 0o500); err != nil {
		t.Fatal(err)
	}
	t.Cleanup(func() { os.Chmod(dir, 0o700) })
	if f, err := os.Create(filepath.Join(dir, "probe")); err == nil {
		f.Close()
		t.Skip("this user may write everywhere, so the folder cannot be closed to the test")
	}
	file := filepath.Join(dir, "a.pdf")
	_, err := output.Save(file, []byte("x"), true)
	if err == nil || !strings.Contains(err.Error(), "cannot be written: the folder "+dir+" does not allow it") {
		t.Errorf("got %v", err)
	}
}

// The longest name that the disk takes is no reason to fail, and one that is
// too long is explained under the name the user gave.
func TestSaveUnderALongName(t *testing.T) {
	file := filepath.Join(t.TempDir(), strings.Repeat("n", 255))
	if _, err := output.Save(file, []byte("x"), false); err != nil {
		t.Fatal(err)
	}
	holds(t, file, "x")
	_, err := output.Save(file+"n", []byte("x"), false)
	if err == nil || !strings.HasPrefix(err.Error(), file+"n cannot be written: ") {
		t.Errorf("got %v", err)
	}
	holds(t, file, "x")
}
