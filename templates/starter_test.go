package templates

import (
	"io/fs"
	"strings"
	"testing"
)

// TestStarterFiles checks that the starter folder is whole and is plain text
// that any editor shows, and that its notes tell of every file in it.
func TestStarterFiles(t *testing.T) {
	notes, err := fs.ReadFile(Starter(), "NOTES.md")
	if err != nil {
		t.Fatal(err)
	}
	var names []string
	err = fs.WalkDir(Starter(), ".", func(name string, d fs.DirEntry, err error) error {
		if err != nil || d.IsDir() {
			return err
		}
		names = append(names, name)
		text, err := fs.ReadFile(Starter(), name)
		if strings.ContainsAny(string(text), "\t\r") {
			t.Errorf("%s has tabs or foreign line ends", name)
		}
		if !strings.Contains(string(notes), "`"+name+"`") {
			t.Errorf("the notes do not tell of %s", name)
		}
		return err
	})
	if err != nil {
		t.Fatal(err)
	}
	if got := strings.Join(names, " "); got != "NOTES.md almanac.yaml gull-rock.yaml skerrow-haven.yaml skerrow-pool.yaml" {
		t.Errorf("files: %s", got)
	}
}

func TestLanguages(t *testing.T) {
	if _, err := fs.Stat(Languages(), "en.yaml"); err != nil {
		t.Error(err)
	}
}
