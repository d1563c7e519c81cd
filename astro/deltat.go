package astro

import (
	"sort"
	"sync"
	"time"
)

// deltaTNode is a row of the table on the scale of Julian dates, with the
// slope (seconds per day) of the curve drawn through the table.
type deltaTNode struct{ jd, dt, slope float64 }

// deltaTNodes prepares the table once: the slope at a node is that of the
// parabola through the node and its neighbours.
var deltaTNodes = sync.OnceValue(func() []deltaTNode {
	n := make([]deltaTNode, len(deltaTTable))
	for i, r := range deltaTTable {
		n[i].jd, n[i].dt = JulianDate(r.year, time.Month(r.month), 1), r.seconds
	}
	last := len(n) - 1
	for i := 1; i < last; i++ {
		h0, h1 := n[i].jd-n[i-1].jd, n[i+1].jd-n[i].jd
		s0, s1 := (n[i].dt-n[i-1].dt)/h0, (n[i+1].dt-n[i].dt)/h1
		n[i].slope = (s0*h1 + s1*h0) / (h0 + h1)
	}
	n[0].slope = (n[1].dt - n[0].dt) / (n[1].jd - n[0].jd)
	n[last].slope = (n[last].dt - n[last-1].dt) / (n[last].jd - n[last-1].jd)
	return n
})

// lengthening is half the curvature of the long-term course of Delta T, seconds
// per day squared: 32.5 s per century squared. [Stephenson, Morrison and
// Hohenkerk 2016] (from memory)
const lengthening = 32.5 / (36525 * 36525)

// deltaTFade is the number of days before the table over which its difference from
// the older polynomials (a few milliseconds) dies away.
const deltaTFade = 3652.5

// DeltaT gives TT - UT in seconds.
//
// From 1990 to 2051 it follows the table delta_t.csv (testdata/sky): measured
// values to the present, then a forecast that goes on smoothly. Before the table
// stand the polynomials of [Espenak and Meeus 2006], good to some tenths of a second
// since 1900; after it the curve leaves the
// table with the table's last value and slope and bends at the long-term rate at
// which the day lengthens. All joins are continuous. (The polynomials of 2006
// foresaw a faster slowing of the Earth than came about: they give 75.7 s for
// 2027, 93 s for 2050, 203 s for 2100. They are not used for the future.)
//
// What it is worth: to 2025 a few hundredths of a second; 2027 68.8 s, likely
// within 0.3 s; 2050 74.6 s, within some 5 s; 2100 97 s, nobody knows it within
// 20 s. An error of 1 s moves the UT of a phase by 1 s and a moonrise by 0.04 s.
func DeltaT(u UT) float64 {
	n := deltaTNodes()
	jd := float64(u)
	first, last := n[0], n[len(n)-1]
	switch {
	case jd < first.jd:
		dt := deltaTPolynomial(u.decimalYear())
		if w := 1 - (first.jd-jd)/deltaTFade; w > 0 {
			dt += w * (first.dt - deltaTPolynomial(UT(first.jd).decimalYear()))
		}
		return dt
	case jd >= last.jd:
		d := jd - last.jd
		return last.dt + d*(last.slope+d*lengthening)
	}
	i := sort.Search(len(n), func(i int) bool { return n[i].jd > jd }) - 1
	a, b := n[i], n[i+1]
	h := b.jd - a.jd
	x := (jd - a.jd) / h
	// Cubic through both values with both slopes (Hermite's basis).
	return a.dt*(1+2*x)*(1-x)*(1-x) + b.dt*x*x*(3-2*x) + h*x*(1-x)*(a.slope*(1-x)-b.slope*x)
}

// deltaTPieces are the polynomials of [Espenak and Meeus 2006] (from memory): each holds
// from the year start, in years from the year zero. Before 1800 their parabola is enough here.
var deltaTPieces = []struct {
	start, zero float64
	c           []float64
}{
	{-10000, 1820, []float64{-20, 0, 0.0032}},
	{1800, 1800, []float64{13.72, -0.332447, 0.0068612, 0.0041116, -0.00037436, 0.0000121272, -0.0000001699, 0.000000000875}},
	{1860, 1860, []float64{7.62, 0.5737, -0.251754, 0.01680668, -0.0004473624, 1.0 / 233174}},
	{1900, 1900, []float64{-2.79, 1.494119, -0.0598939, 0.0061966, -0.000197}},
	{1920, 1920, []float64{21.20, 0.84493, -0.076100, 0.0020936}},
	{1941, 1950, []float64{29.07, 0.407, -1.0 / 233, 1.0 / 2547}},
	{1961, 1975, []float64{45.45, 1.067, -1.0 / 260, -1.0 / 718}},
	{1986, 2000, []float64{63.86, 0.3345, -0.060374, 0.0017275, 0.000651814, 0.00002373599}},
}

// deltaTPolynomial gives Delta T before the table, y in years. The pieces meet
// within 0.1 s from 1860 on; what is left dies away over a year.
func deltaTPolynomial(y float64) float64 {
	i := len(deltaTPieces) - 1
	for i > 0 && y < deltaTPieces[i].start {
		i--
	}
	p := deltaTPieces[i]
	dt := horner(y-p.zero, p.c...)
	if w := 1 - (y - p.start); i > 0 && w > 0 {
		q := deltaTPieces[i-1]
		dt += w * (horner(p.start-q.zero, q.c...) - horner(p.start-p.zero, p.c...))
	}
	return dt
}

// horner evaluates c[0] + c[1] x + c[2] x^2 + ...
func horner(x float64, c ...float64) float64 {
	s := 0.0
	for i := len(c) - 1; i >= 0; i-- {
		s = s*x + c[i]
	}
	return s
}
