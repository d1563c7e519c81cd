package main

import (
	"os/exec"
	"slices"
	"strings"
	"testing"
)

// TestArrows holds which package imports which, as DEVELOPERS.md draws it.
func TestArrows(t *testing.T) {
	if _, err := exec.LookPath("go"); err != nil {
		t.Skip("the go command is not on the PATH, and it tells what imports what")
	}
	list := exec.Command("go", "list", "-f", `{{.ImportPath}} {{join .Imports " "}}`, "ebbleaf/...")
	list.Dir = "../.."
	out, err := list.Output()
	if err != nil {
		t.Fatalf("go list: %v", err)
	}
	imports := map[string][]string{}
	for _, line := range lines(string(out)) {
		words := strings.Fields(line)
		imports[strings.TrimPrefix(words[0], "ebbleaf/")] = words[1:]
	}

	// What of ours a package may import. A package that is not named here must
	// be added, so that its arrows are thought of.
	may := map[string]string{
		"astro":                "",
		"predict":              "astro",
		"predict/fit":          "predict astro predict/record",
		"predict/record":       "",
		"templates":            "",
		"layout/page":          "",
		"layout/page/pagetest": "layout/page",
		"layout/calendar":      "",
		"layout/output":        "",
		"layout/face":          "layout/page",
		"layout/chart":         "layout/page",
		"layout":               "astro predict layout/page layout/chart layout/calendar",
		"layout/pdf":           "layout/page layout/face",
		"layout/document":      "astro predict layout layout/calendar",
		"cmd/ebbleaf":          "astro predict predict/fit predict/record templates layout layout/calendar layout/document layout/face layout/output layout/page layout/pdf",
	}
	for name, list := range imports {
		allowed, ok := may[name]
		if !ok {
			t.Errorf("package %s is not on the list of arrows", name)
			continue
		}
		for _, path := range list {
			if ours, ok := strings.CutPrefix(path, "ebbleaf/"); ok && !slices.Contains(strings.Fields(allowed), ours) {
				t.Errorf("%s imports %s; of ours it may import: %s", name, ours, allowed)
			}
		}
	}

	// Libraries with one user each. Optional ones may have none yet.
	for _, c := range []struct {
		library, user string
		optional      bool
	}{
		{"github.com/go-pdf/fpdf", "layout/pdf", false},
		{"gopkg.in/yaml.v3", "layout/document", false},
		{"github.com/spf13/cobra", "cmd/ebbleaf", false},
		{"github.com/arran4/golang-ical", "cmd/ebbleaf", false},
		{"github.com/wcharczuk/go-chart", "layout/chart", false},
		{"gonum.org/v1/", "predict/fit", false},
	} {
		used := false
		for name, list := range imports {
			if !slices.ContainsFunc(list, func(path string) bool { return strings.HasPrefix(path, c.library) }) {
				continue
			}
			used = used || name == c.user
			if name != c.user {
				t.Errorf("%s imports %s, whose one user is %s", name, c.library, c.user)
			}
		}
		if !used && !c.optional {
			t.Errorf("%s does not import %s: the rule is out of date", c.user, c.library)
		}
	}
}
