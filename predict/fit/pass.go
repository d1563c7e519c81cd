package fit

import (
	"runtime"
	"sync"

	"ebbleaf/predict/record"
)

// data are the heights of a record with what is known of them.
type data struct {
	rec  *record.Record
	out  []bool  // left out, by index
	base float64 // metres: taken off heights, so that sums keep their figures
	thin []int32 // indices of the thinned record; nil: every height is in it
}

// y returns a height less the base.
func (d *data) y(i int) float64 { return d.rec.Height(i) - d.base }

// indices returns how many heights there are and which, thinned or all.
func (d *data) indices(thinned bool) (n int, at func(int) int) {
	if thinned && d.thin != nil {
		return len(d.thin), func(k int) int { return int(d.thin[k]) }
	}
	return d.rec.Len(), func(k int) int { return k }
}

// chunks is how many pieces a record is cut into, to be worked on side by side.
// It is fixed, so that sums come out the same on any machine.
const chunks = 8

// inChunks runs work on every chunk of n, side by side.
func inChunks(n int, work func(chunk, from, to int) error) error {
	errs := make([]error, chunks)
	limit := make(chan struct{}, runtime.GOMAXPROCS(0))
	var wg sync.WaitGroup
	for c := range chunks {
		wg.Add(1)
		go func() {
			defer wg.Done()
			limit <- struct{}{}
			errs[c] = work(c, n*c/chunks, n*(c+1)/chunks)
			<-limit
		}()
	}
	wg.Wait()
	for _, err := range errs {
		if err != nil {
			return err
		}
	}
	return nil
}

// gather sums the normal equations of the heights. With coefficients, heights
// are weighted by their residual from them; without, alike.
func (d *data) gather(m *model, thinned bool, coef []float64, weigh weighing) (*normal, error) {
	n, at := d.indices(thinned)
	parts := make([]*normal, chunks)
	err := inChunks(n, func(c, from, to int) error {
		t, err := m.terms()
		if err != nil {
			return err
		}
		parts[c] = newNormal(m.columns())
		for k := from; k < to; k++ {
			i := at(k)
			if d.out[i] {
				continue
			}
			e := t.at(d.rec.Hours(i))
			y, w, at := d.y(i), 1.0, m.shiftAt(i)
			if coef != nil {
				w = weigh.of(y - height(e, coef) - m.level(at, coef))
			}
			parts[c].add(e, at, y, w)
		}
		return nil
	})
	if err != nil {
		return nil, err
	}
	sum := newNormal(m.columns())
	for _, p := range parts {
		sum.merge(p)
	}
	return sum, nil
}

// residuals returns height less model, metres, of every height of the record
// or of the thinned one, left out or not. With raw, shifts of the datum stay in
// it.
func (d *data) residuals(m *model, thinned bool, coef []float64, raw bool) ([]float32, error) {
	n, at := d.indices(thinned)
	res := make([]float32, n)
	err := inChunks(n, func(_, from, to int) error {
		t, err := m.terms()
		if err != nil {
			return err
		}
		for k := from; k < to; k++ {
			i := at(k)
			y := d.y(i)
			if !raw {
				y -= m.level(m.shiftAt(i), coef)
			}
			res[k] = float32(y - height(t.at(d.rec.Hours(i)), coef))
		}
		return nil
	})
	return res, err
}
