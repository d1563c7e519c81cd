package main

import (
	"errors"
	"fmt"
	"io/fs"
	"os"
	"path/filepath"
	"strings"

	"github.com/spf13/cobra"

	"ebbleaf/templates"
)

// start returns the command that writes a starter folder.
func (p *program) start() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "start DIR",
		Short: "Write a folder to start from",
		Long: `Write a folder that prints at once: a harbour, an almanac, and notes on what to
change. The harbour is invented; put your own in its place before anyone goes
afloat by it.

The folder is made if it is not there. A file that is there already is never
overwritten: then nothing is written at all.`,
		Example: `  ebbleaf start my-almanac`,
		Args:    exactly(1, "the name of a folder"),

		DisableFlagsInUseLine: true,
	}
	cmd.RunE = func(_ *cobra.Command, args []string) error {
		dir := args[0]
		names, err := copyNew(templates.Starter(), dir)
		if err != nil {
			return err
		}
		p.say("Written to %s: %s.", dir, and(names))
		p.say("The harbour in it is invented. Read %s on how to put yours in its place.", filepath.Join(dir, "NOTES.md"))
		p.say("It prints as it is: ebbleaf press %s", filepath.Join(dir, "almanac.yaml"))
		return nil
	}
	return cmd
}

// copyNew writes the files of a file system into a folder, all or none, and
// returns their names. It never overwrites a file.
func copyNew(files fs.FS, dir string) (names []string, err error) {
	err = fs.WalkDir(files, ".", func(name string, d fs.DirEntry, err error) error {
		if err == nil && !d.IsDir() {
			names = append(names, name)
		}
		return err
	})
	if err != nil {
		return nil, err
	}
	var there []string
	for _, name := range names {
		path := filepath.Join(dir, filepath.FromSlash(name))
		if _, err := os.Lstat(path); err == nil {
			there = append(there, path)
		}
	}
	if len(there) > 0 {
		verb := "are"
		if len(there) == 1 {
			verb = "is"
		}
		return nil, fmt.Errorf("%s %s there already: nothing was written; name a new folder", and(there), verb)
	}
	var written []string
	defer func() {
		if err != nil { // all or none
			for _, path := range written {
				os.Remove(path)
			}
		}
	}()
	for _, name := range names {
		data, err := fs.ReadFile(files, name)
		if err != nil {
			return nil, err
		}
		path := filepath.Join(dir, filepath.FromSlash(name))
		if err := os.MkdirAll(filepath.Dir(path), 0o777); err != nil {
			return nil, fmt.Errorf("the folder %s cannot be made: %s", filepath.Dir(path), reason(err))
		}
		if err := createNew(path, data, &written); err != nil {
			return nil, fmt.Errorf("%s cannot be written: %s; nothing was left behind", path, reason(err))
		}
	}
	return names, nil
}

// createNew writes a file that must not be there yet, and notes that it did.
func createNew(path string, data []byte, written *[]string) error {
	f, err := os.OpenFile(path, os.O_WRONLY|os.O_CREATE|os.O_EXCL, 0o666)
	if err != nil {
		return err
	}
	*written = append(*written, path)
	_, err = f.Write(data)
	return errors.Join(err, f.Close())
}

// reason returns what an error of the file system says, without the names of
// calls and files.
func reason(err error) string {
	var at *fs.PathError
	if errors.As(err, &at) {
		err = at.Err
	}
	return strings.TrimSpace(err.Error())
}
