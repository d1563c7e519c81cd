// Package output puts finished files on the disk: whole or not at all, and
// never over a file that nobody meant to lose.
package output

import (
	"bytes"
	"errors"
	"fmt"
	"io/fs"
	"os"
	"path/filepath"
)

// Result says what Save did.
type Result uint8

// The results.
const (
	Written   Result = iota // a new file
	Replaced                // another file stood there
	Unchanged               // the same bytes stood there; nothing was written
)

// String returns the result as a word.
func (r Result) String() string {
	names := [...]string{"written", "replaced", "unchanged"}
	if int(r) >= len(names) {
		return fmt.Sprintf("result-%d", uint8(r))
	}
	return names[r]
}

// Save writes data to the file at path. It writes beside the target, waits
// until the bytes are on the disk, and then gives the file its name, so that a
// reader finds the old file or the new one and never half of one, and a failure
// leaves nothing behind. A different file at path is an error unless replace is
// set. The folder must exist. A link at path is followed: what it leads to is
// replaced. A file that is replaced keeps its permissions; a new one gets the
// usual ones.
func Save(path string, data []byte, replace bool) (Result, error) {
	// The target itself, where path is a symbolic link to it.
	target := path
	if real, err := filepath.EvalSymlinks(path); err == nil {
		target = real
	}
	result, mode, err := look(path, target, data, replace)
	if err != nil || result == Unchanged {
		return result, err
	}
	if err := write(target, data, mode); err != nil {
		return 0, explain(path, err)
	}
	return result, nil
}

// look tells from what stands at the target what is to be done.
func look(path, target string, data []byte, replace bool) (Result, fs.FileMode, error) {
	const usual = 0o644
	info, err := os.Stat(target)
	switch {
	case errors.Is(err, fs.ErrNotExist):
		return Written, usual, nil
	case err != nil:
		return 0, 0, explain(path, err)
	case info.IsDir():
		return 0, 0, fmt.Errorf("%s is a folder; give the name of a file", path)
	case !info.Mode().IsRegular():
		return 0, 0, fmt.Errorf("%s is not a regular file; give the name of a file", path)
	}
	if info.Size() == int64(len(data)) {
		old, err := os.ReadFile(target)
		if err == nil && bytes.Equal(old, data) {
			return Unchanged, 0, nil
		}
	}
	if !replace {
		return 0, 0, fmt.Errorf("%s exists and is different; give another name, or allow it to be replaced", path)
	}
	return Replaced, info.Mode().Perm(), nil
}

// write puts data into a new file beside the target and moves it there.
func write(target string, data []byte, mode fs.FileMode) (err error) {
	f, err := os.CreateTemp(filepath.Dir(target), ".ebbleaf-*")
	if err != nil {
		return err
	}
	defer func() {
		if err != nil {
			f.Close()
			os.Remove(f.Name())
		}
	}()
	if _, err = f.Write(data); err != nil {
		return err
	}
	if err = f.Chmod(mode); err != nil {
		return err
	}
	if err = f.Sync(); err != nil {
		return err
	}
	if err = f.Close(); err != nil {
		return err
	}
	return os.Rename(f.Name(), target)
}

// explain says in one sentence why path could not be written.
func explain(path string, err error) error {
	folder := filepath.Dir(path)
	switch info, e := os.Stat(folder); {
	case errors.Is(e, fs.ErrNotExist):
		return fmt.Errorf("%s cannot be written: the folder %s does not exist", path, folder)
	case e == nil && !info.IsDir():
		return fmt.Errorf("%s cannot be written: %s is not a folder", path, folder)
	case errors.Is(err, fs.ErrPermission):
		return fmt.Errorf("%s cannot be written: the folder %s does not allow it (%w)", path, folder, fs.ErrPermission)
	}
	// The rest of the message names the file beside the target, which means
	// nothing to the user; the cause does.
	var pathErr *fs.PathError
	if errors.As(err, &pathErr) {
		err = pathErr.Err
	}
	var linkErr *os.LinkError
	if errors.As(err, &linkErr) {
		err = linkErr.Err
	}
	return fmt.Errorf("%s cannot be written: %w", path, err)
}
