package fit

import (
	"math"
	"math/rand/v2"
	"testing"
	"time"

	"gonum.org/v1/gonum/mat"

	"ebbleaf/predict"
)

// TestBlocksAgreeWithTheWholeMatrix holds the blocks of normal equations
// against a QR decomposition of the whole weighted matrix, gaps, shifts of the
// datum and inferred constituents in it. The terms of a chunk begin with
// arguments worked out afresh, those of the whole run on by turns of a day,
// which are good to 1e-7 (predict): so are the coefficients.
func TestBlocksAgreeWithTheWholeMatrix(t *testing.T) {
	s := newSea(t, start, 60*day, time.Hour, 0.1, 20, 0.02, 31)
	s.gap(0.3, 0.35)
	rec := s.record()
	f := newFitter(rec, Options{})
	shifts := []shift{{from: 400, to: 700}}
	f.m = newModel(f.chosen.lines, ties(f.chosen.lines, f.o.Inferences), predict.Daily, shifts)
	if len(f.m.ties) < 3 {
		t.Fatalf("%d inferred", len(f.m.ties))
	}
	coef := make([]float64, f.m.columns())
	weigh := weighing{0.1, false}
	n, err := f.gather(f.m, false, coef, weigh)
	if err != nil {
		t.Fatal(err)
	}
	got, err := n.solve(n.all())
	if err != nil {
		t.Fatal(err)
	}

	a := mat.NewDense(rec.Len(), f.m.columns(), nil)
	b := mat.NewVecDense(rec.Len(), nil)
	terms, err := predict.NewTerms(f.m.basis, predict.Daily)
	if err != nil {
		t.Fatal(err)
	}
	e := make([]complex128, len(f.m.basis))
	for i := range rec.Len() {
		y := rec.Height(i) - f.base
		w := math.Sqrt(weigh.of(y))
		terms.At(rec.Hours(i), e)
		a.Set(i, 0, w)
		for k := range f.m.lines {
			z := e[k]
			for j, tie := range f.m.ties {
				if tie.line == k {
					z += e[len(f.m.lines)+j] * complex(tie.Ratio*math.Cos(tie.Lag*degree), -tie.Ratio*math.Sin(tie.Lag*degree))
				}
			}
			a.Set(i, 1+2*k, w*real(z))
			a.Set(i, 2+2*k, w*imag(z))
		}
		if i >= 400 && i < 700 {
			a.Set(i, f.m.columns()-1, w)
		}
		b.SetVec(i, w*y)
	}
	var qr mat.QR
	qr.Factorize(a)
	var x mat.VecDense
	if err := qr.SolveVecTo(&x, false, b); err != nil {
		t.Fatal(err)
	}
	for i, v := range got.coef {
		if math.Abs(v-x.AtVec(i)) > 1e-7 {
			t.Errorf("coefficient %d is %.12f by blocks and %.12f by QR", i, v, x.AtVec(i))
		}
	}
}

// TestSingular wants equations without a solution refused, not solved.
func TestSingular(t *testing.T) {
	n := newNormal(3)
	for range 300 {
		n.add([]complex128{complex(1, 2)}, -1, 1, 1)
	}
	n.flush()
	if _, err := n.solve(n.all()); err == nil {
		t.Error("three columns that are one were told apart")
	}
}

// TestErrorsOfWhiteNoise holds the standard error of a constituent in white
// noise of standard deviation s to what theory has: s sqrt(2/n).
func TestErrorsOfWhiteNoise(t *testing.T) {
	const s, n = 0.1, 369 * 24
	r := rand.New(rand.NewPCG(1, 2))
	sea := newSea(t, start, n*time.Hour, time.Hour, 0, 10, 0, 41)
	for i := range sea.h {
		sea.h[i] += s * r.NormFloat64()
	}
	result, err := Fit(sea.record(), Options{})
	if err != nil {
		t.Fatal(err)
	}
	want := s * math.Sqrt(2.0/n)
	sum, k := 0.0, 0
	for _, e := range result.Constants {
		if e.From == "" && e.Constituent.Species() > 0 {
			sum += e.AmplitudeError
			k++
		}
	}
	// Node factors make those of single constituents up to a fifth different;
	// robust weights cost 5 % of the efficiency.
	if mean := sum / float64(k); math.Abs(mean/want-1) > 0.15 || k < 15 {
		t.Errorf("standard errors of %d constituents are %.5f m on the mean, in white noise they are %.5f m", k, mean, want)
	}
}

// TestEquilibriumRatios holds ratios of the equilibrium tide to those commonly
// used for inference (common practice, from memory: P1/K1 0.331, K2/S2 0.272,
// T2/S2 0.059, NU2/N2 0.194 in older tables, N2/M2 0.191).
func TestEquilibriumRatios(t *testing.T) {
	want := map[string][2]float64{"P1": {0.331, 0.001}, "K2": {0.272, 0.001}, "T2": {0.059, 0.001}, "NU2": {0.194, 0.006}, "N2": {0.191, 0.001}}
	for _, i := range Equilibrium() {
		w, ok := want[i.Name]
		if !ok {
			continue
		}
		delete(want, i.Name)
		if math.Abs(i.Ratio-w[0]) > w[1] || i.Lag != 0 {
			t.Errorf("%s from %s: ratio %.4f, lag %.1f", i.Name, i.From, i.Ratio, i.Lag)
		}
	}
	if len(want) > 0 {
		t.Errorf("no ratio for %v", want)
	}
}

// TestChoose holds the lengths at which constituents part, in days: a full
// turn of the difference of their speeds (Pugh, table 4.2: M2 and S2 14.8, M2
// and N2 27.6, K1 and P1 182.6, S2 and K2 182.6, S2 and T2 365), times the share
// asked for.
func TestChoose(t *testing.T) {
	for _, c := range []struct {
		a, b string
		days float64
	}{{"M2", "S2", 14.77}, {"K1", "O1", 13.66}, {"M2", "N2", 27.55}, {"K1", "P1", 182.6}, {"S2", "K2", 182.6}, {"S2", "T2", 365.3}} {
		x, _ := predict.Lookup(c.a)
		y, _ := predict.Lookup(c.b)
		list := []predict.Constituent{x, y}
		at := time.Duration(c.days * rayleigh * float64(day))
		if n := len(choose(list, at-at/200).lines); n != 1 {
			t.Errorf("%s and %s are told apart in less than %.1f days", c.a, c.b, c.days*rayleigh)
		}
		if n := len(choose(list, at+at/200).lines); n != 2 {
			t.Errorf("%s and %s are not told apart in more than %.1f days", c.a, c.b, c.days*rayleigh)
		}
	}
}
