package templates_test

import (
	"io/fs"
	"path"
	"strings"
	"testing"

	"ebbleaf/templates"
)

// The faces ship with their licence.
func TestFontsComeWithTheirLicence(t *testing.T) {
	licence, err := fs.ReadFile(templates.Fonts(), "OFL.txt")
	if err != nil || !strings.Contains(string(licence), "SIL OPEN FONT LICENSE Version 1.1") {
		t.Errorf("the licence: %v, %.60q", err, licence)
	}
	files, err := fs.Glob(templates.Fonts(), "*.ttf")
	if err != nil || len(files) != 7 {
		t.Errorf("%d faces, %v", len(files), err)
	}
	for _, f := range files {
		b, err := fs.ReadFile(templates.Fonts(), path.Base(f))
		if err != nil || len(b) < 10000 {
			t.Errorf("%s: %d bytes, %v", f, len(b), err)
		}
	}
}
