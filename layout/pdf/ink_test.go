package pdf

import (
	"image"
	_ "image/png"
	"os"
	"os/exec"
	"path/filepath"
	"strings"
	"testing"

	"ebbleaf/layout/page"
)

// render draws the first page of a file at 254 dots an inch, 0.1 mm a dot.
func render(t *testing.T, file []byte) image.Image {
	t.Helper()
	path, err := exec.LookPath("pdftoppm")
	if err != nil {
		t.Skip("pdftoppm is not on this machine, so the printed ink is not looked at")
	}
	dir := t.TempDir()
	pdf := filepath.Join(dir, "test.pdf")
	if err := os.WriteFile(pdf, file, 0o600); err != nil {
		t.Fatal(err)
	}
	if out, err := exec.Command(path, "-r", "254", "-png", "-singlefile", pdf, filepath.Join(dir, "test")).CombinedOutput(); err != nil || len(out) > 0 {
		t.Fatalf("pdftoppm: %v\n%s", err, out)
	}
	f, err := os.Open(filepath.Join(dir, "test.png"))
	if err != nil {
		t.Fatal(err)
	}
	defer f.Close()
	img, _, err := image.Decode(f)
	if err != nil {
		t.Fatal(err)
	}
	return img
}

// inked returns the box of what is darker than a quarter grey, millimetres.
func inked(img image.Image) page.Rect {
	b := img.Bounds()
	r := image.Rectangle{}
	for y := b.Min.Y; y < b.Max.Y; y++ {
		for x := b.Min.X; x < b.Max.X; x++ {
			if red, _, _, _ := img.At(x, y).RGBA(); red < 0xC000 {
				r = r.Union(image.Rect(x, y, x+1, y+1))
			}
		}
	}
	return page.Rect{X: float64(r.Min.X) / 10, Y: float64(r.Min.Y) / 10, W: float64(r.Dx()) / 10, H: float64(r.Dy()) / 10}
}

// The ink that is printed stays in the box that the model gives the text, and
// fills it: at both ends up to the space that the characters themselves keep,
// at top and bottom up to the steps of page.Extent. Upright and turned.
func TestInkStaysInTheTextBox(t *testing.T) {
	set := faces(t)
	for _, s := range []string{"H12:34H", "noon", "Hgap, (h)", "ÉÄH", "H−0.5H"} {
		for _, turn := range []float64{0, 90, 180, -90, 30} {
			tx := page.Text{X: 40, Y: 40, Align: page.Centre, Size: 28, S: s, Turn: turn}
			box := page.TextBox(set, tx)
			doc := page.Document{Pages: []page.Page{{Width: 80, Height: 80, Items: []page.Item{tx}}}}
			ink := inked(render(t, write(t, doc, Options{})))
			const overshoot = 0.25 // mm: 0.015 em of 28 pt, and a dot of 0.1 mm
			if !box.Contains(ink, overshoot) {
				t.Errorf("%q at %g°: ink at %.2f, box %.2f", s, turn, ink, box)
			}
			const side = 1.3 // mm: the space beside H is about 0.09 em, 0.9 mm
			if turn != 30 && !ink.Contains(box, side) {
				t.Errorf("%q at %g°: ink at %.2f does not fill the box %.2f", s, turn, ink, box)
			}
		}
	}
}

// A half moon drawn from two arcs is a half disc, as printed.
func TestMoon(t *testing.T) {
	const half = 1.5707963267948966
	var moon page.Path
	moon.Fill = &page.Black
	c := page.Point{X: 50, Y: 60}
	moon.Arc(c, 10, 10, 0, -half, half, true)
	moon.Arc(c, -5, 10, 0, half, -half, false) // bulges to the left: gibbous
	moon.End()
	img := render(t, write(t, onePage(moon), Options{}))
	if got, want := inked(img), (page.Rect{X: 45, Y: 50, W: 15, H: 20}); !got.Contains(want, 0.15) || !want.Contains(got, 0.15) {
		t.Errorf("ink at %v, want %v", got, want)
	}
	dark := 0
	for y := range img.Bounds().Dy() {
		for x := range img.Bounds().Dx() {
			if red, _, _, _ := img.At(x, y).RGBA(); red < 0x8000 {
				dark++
			}
		}
	}
	// Half a disc of radius 10 and half an ellipse of 5 and 10 mm: 75 π = 235.6 mm².
	if got := float64(dark) / 100; !near(got, 235.6, 0.5) {
		t.Errorf("%.1f mm² are inked, want 235.6", got)
	}
	if strings.Count(contents(t, write(t, onePage(moon), Options{}))[0], " c\n") != 4 {
		t.Error("a moon takes four curves")
	}
}
