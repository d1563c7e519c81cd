package layout

import (
	"math"
	"math/rand/v2"
	"slices"
	"testing"
)

func TestSpreadOut(t *testing.T) {
	ones := []float64{1, 1, 1, 1}
	for _, c := range []struct {
		wants []float64
		size  float64
		want  []float64
	}{
		{[]float64{1, 5, 9}, 1, []float64{1, 5, 9}},
		{[]float64{5, 5}, 2, []float64{4, 6}},       // they share the push
		{[]float64{0, 0, 9}, 2, []float64{1, 3, 9}}, // the end pushes back
		{[]float64{4, 5, 5, 6}, 2, []float64{2, 4, 6, 8}},
		{[]float64{9.5, 10}, 1, []float64{8.5, 9.5}},
	} {
		sizes := slices.Clone(ones[:len(c.wants)])
		for i := range sizes {
			sizes[i] = c.size
		}
		got := spreadOut(c.wants, sizes, 0, 10)
		for i := range c.want {
			if math.Abs(got[i]-c.want[i]) > 1e-9 {
				t.Errorf("%v apart by %g: %v, wanted %v", c.wants, c.size, got, c.want)
				break
			}
		}
	}
	if spreadOut(nil, nil, 0, 1) != nil {
		t.Error("places of nothing")
	}
}

// TestSpreadOutIsBest compares with a slow search: from the places found, no
// small move of one label or of a run of them that keeps them clear makes the
// squares less.
func TestSpreadOutIsBest(t *testing.T) {
	r := rand.New(rand.NewPCG(1, 2))
	for range 300 {
		n := 1 + r.IntN(9)
		wants, sizes := make([]float64, n), make([]float64, n)
		for i := range wants {
			wants[i], sizes[i] = 100*r.Float64(), 1+9*r.Float64()
		}
		slices.Sort(wants)
		got := spreadOut(wants, sizes, 0, 100)
		cost := func(at []float64) (sum float64, ok bool) {
			for i := range at {
				sum += (at[i] - wants[i]) * (at[i] - wants[i])
				if i > 0 && at[i]-at[i-1] < (sizes[i]+sizes[i-1])/2-1e-9 || at[i] < sizes[i]/2-1e-9 || at[i] > 100-sizes[i]/2+1e-9 {
					return 0, false
				}
			}
			return sum, true
		}
		best, ok := cost(got)
		if !ok {
			t.Fatalf("%v of sizes %v stand over each other at %v", wants, sizes, got)
		}
		for i := range n {
			for j := i; j < n; j++ {
				for _, move := range []float64{-0.01, 0.01} {
					other := slices.Clone(got)
					for k := i; k <= j; k++ {
						other[k] += move
					}
					if c, ok := cost(other); ok && c < best-1e-9 {
						t.Fatalf("%v of sizes %v: better than %v is %v", wants, sizes, got, other)
					}
				}
			}
		}
	}
}
