package page

// sizeStep is the step in which type sizes are tried, points.
const sizeStep = 0.25

// Fit returns the largest size in points, from most down in steps of a quarter
// point and at last least itself, at which s is no wider than width
// millimetres in face f. Where even least is too wide, or most is under least,
// it returns least and false: the text then has to be broken or set in another
// face, never cut off.
func Fit(m Measurer, f Face, s string, width, least, most float64) (size float64, ok bool) {
	for n := 0; most-sizeStep*float64(n) > least; n++ {
		size = most - sizeStep*float64(n)
		if m.Width(f, size, s) <= width {
			return size, true
		}
	}
	return least, most >= least && m.Width(f, least, s) <= width
}
