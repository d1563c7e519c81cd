package fit

import (
	"runtime"
	"syscall"
	"testing"
	"time"

	"gonum.org/v1/gonum/mat"

	"ebbleaf/predict"
	"ebbleaf/predict/record"
)

// sixty returns sixty constituents.
func sixty(b testing.TB) []predict.Constituent {
	list := AllCandidates()
	if len(list) < 60 {
		b.Fatalf("%d constituents", len(list))
	}
	return list[:60]
}

// peak returns the most memory the process has held so far, MB.
func peak() float64 {
	var u syscall.Rusage
	if syscall.Getrusage(syscall.RUSAGE_SELF, &u) != nil {
		return 0
	}
	return float64(u.Maxrss) / 1024
}

func benchmark(b *testing.B, length, step time.Duration) {
	rec := newSea(b, start, length, step, 0.05, 30, 0.01, 1).record()
	runtime.GC()
	b.Run("fit", func(b *testing.B) {
		for b.Loop() {
			if _, err := Fit(rec, Options{Candidates: sixty(b)}); err != nil {
				b.Fatal(err)
			}
		}
		b.ReportMetric(peak(), "MB-peak")
	})
	// The floor: the product of the matrix of all heights and sixty constituents
	// with itself, by gonum, its blocks already filled.
	b.Run("product", func(b *testing.B) {
		columns := 1 + 2*len(sixty(b))
		block := mat.NewDense(512, columns, nil)
		fill(b, rec, block)
		for b.Loop() {
			sum := mat.NewDense(columns, columns, nil)
			var part mat.Dense
			for n := rec.Len(); n > 0; n -= 512 {
				part.Mul(block.T(), block)
				sum.Add(sum, &part)
			}
		}
	})
}

// fill fills a block with the columns of the first heights.
func fill(b *testing.B, rec *record.Record, block *mat.Dense) {
	t, err := newModel(sixty(b), nil, predict.Daily, nil).terms()
	if err != nil {
		b.Fatal(err)
	}
	rows, _ := block.Dims()
	for i := range rows {
		block.Set(i, 0, 1)
		for k, z := range t.at(rec.Hours(i)) {
			block.Set(i, 1+2*k, real(z))
			block.Set(i, 2+2*k, imag(z))
		}
	}
}

// BenchmarkYearHourly fits a year of hours with sixty constituents.
func BenchmarkYearHourly(b *testing.B) { benchmark(b, 366*day, time.Hour) }

// BenchmarkThreeYears fits three years at six minutes with sixty constituents.
func BenchmarkThreeYears(b *testing.B) { benchmark(b, 3*366*day, 6*time.Minute) }
