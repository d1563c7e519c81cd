package pdf

import (
	"bytes"
	"fmt"
	"os"
	"os/exec"
	"path/filepath"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"ebbleaf/layout/page"
)

// tool runs a program on the file and returns what it prints. It must end well
// and say nothing on its standard error: that is where readers of PDF complain.
func tool(t *testing.T, file []byte, name string, args ...string) string {
	t.Helper()
	path, err := exec.LookPath(name)
	if err != nil {
		t.Skipf("%s is not on this machine, so the file is not looked at with it", name)
	}
	pdf := filepath.Join(t.TempDir(), "test.pdf")
	if err := os.WriteFile(pdf, file, 0o600); err != nil {
		t.Fatal(err)
	}
	for i, a := range args {
		args[i] = strings.ReplaceAll(a, "FILE", pdf)
	}
	cmd := exec.Command(path, args...)
	var out, complaints bytes.Buffer
	cmd.Stdout, cmd.Stderr = &out, &complaints
	if err := cmd.Run(); err != nil || complaints.Len() > 0 {
		t.Errorf("%s: %v\n%s%s", name, err, &complaints, &out)
	}
	return out.String()
}

func TestWithQpdf(t *testing.T) {
	for _, opts := range []Options{{}, {Spreads: true, TrueSize: true}} {
		tool(t, write(t, sample(), opts), "qpdf", "--check", "FILE")
	}
}

func TestWithPdftoppm(t *testing.T) {
	tool(t, write(t, sample(), Options{}), "pdftoppm", "-r", "60", "FILE", "FILE.page")
}

func TestWithMutool(t *testing.T) {
	// Titles with the pages they lead to, as numbers.
	got := tool(t, write(t, sample(), Options{}), "mutool", "show", "FILE", "outline")
	for _, want := range []string{"\"Skerrow Haven – 2027\"\t#page=1&", "\"Landscape\"\t#page=2&", "\"Ebbe\"\t#page=3&"} {
		if !strings.Contains(got, want) {
			t.Errorf("%q is not in\n%s", want, got)
		}
	}
}

func TestWithPdftotext(t *testing.T) {
	doc := sample()
	got := tool(t, write(t, doc, Options{}), "pdftotext", "-raw", "FILE", "-")
	got = strings.Join(strings.Fields(got), " ") // turned words come on lines of their own
	for _, p := range doc.Pages {
		for _, it := range p.Items {
			if tx, ok := it.(page.Text); ok && !strings.Contains(got, tx.S) {
				t.Errorf("%q is not in\n%s", tx.S, got)
			}
		}
	}
}

var word = regexp.MustCompile(`<word xMin="([\d.]+)" yMin="([\d.]+)" xMax="([\d.]+)" yMax="([\d.]+)">(.*?)</word>`)

// Every word begins and ends where the model says, in every face, to 0.02 mm:
// the widths in the file are those the layout reckoned with.
func TestWordBoxes(t *testing.T) {
	set := faces(t)
	var items []page.Item
	want := map[string]page.Rect{}
	for f := range page.Face(page.Faces) {
		for i, s := range []string{"12:34", "−0.5", "Wagtail", "Größe", "Ωμέγα", "Привет"} {
			s = fmt.Sprintf("%s|%d", s, f)
			tx := page.Text{X: 74, Y: 15 + 25*float64(f) + 4*float64(i), Align: page.Align(i % 3), Face: f, Size: 8.5, S: s}
			items = append(items, tx)
			want[s] = page.TextBox(set, tx)
		}
	}
	out := tool(t, write(t, onePage(items...), Options{}), "pdftotext", "-bbox", "FILE", "-")
	found := 0
	for _, m := range word.FindAllStringSubmatch(out, -1) {
		box, ok := want[m[5]]
		if !ok {
			t.Errorf("%q was never set", m[5])
			continue
		}
		found++
		var v [4]float64
		for i := range v {
			n, err := strconv.ParseFloat(m[i+1], 64)
			if err != nil {
				t.Fatal(err)
			}
			v[i] = n * page.PointMM
		}
		if !near(v[0], box.X, 0.02) || !near(v[2], box.Right(), 0.02) {
			t.Errorf("%q reaches from %.3f to %.3f mm, want %.3f to %.3f", m[5], v[0], v[2], box.X, box.Right())
		}
		// The tool reports ascent and descent of the face, not of the word.
		if v[1] > box.Y || v[3] < box.Bottom() {
			t.Errorf("%q stands between %.3f and %.3f mm down, want around %.3f to %.3f", m[5], v[1], v[3], box.Y, box.Bottom())
		}
	}
	if found != len(want) {
		t.Errorf("%d of %d words found", found, len(want))
	}
}
