// Package templates holds what ships inside the program and what a club may
// copy and change.
package templates

import (
	"embed"
	"io/fs"
)

//go:embed fonts/*.ttf fonts/OFL.txt
var fonts embed.FS

// Fonts returns the embedded type faces by file name ("NotoSans-Regular.ttf"),
// with their licence OFL.txt beside them. See fonts/README.md for what they are
// and how one is replaced.
func Fonts() fs.FS {
	sub, err := fs.Sub(fonts, "fonts")
	if err != nil { // cannot be: the name is constant and valid
		panic(err)
	}
	return sub
}
