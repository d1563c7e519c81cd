package templates

import (
	"embed"
	"io/fs"
)

//go:embed starter
var starter embed.FS

// Starter returns the files of a starter folder: a harbour with invented
// constants, an almanac that prints it, and notes on what to change.
func Starter() fs.FS { return within(starter, "starter") }

// within returns a folder of an embedded file system as one of its own.
func within(files embed.FS, folder string) fs.FS {
	sub, err := fs.Sub(files, folder)
	if err != nil {
		panic(err) // the folder's name is a constant of ours
	}
	return sub
}
