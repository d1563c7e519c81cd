// Package record reads gauge records: heights of the sea that were measured,
// one a line, as CSV.
//
//	text ──lines──► header ──columns──► time ──clock──► UT ─┐
//	                          height ──number──► metres ────┴─► Record, notes
//
// A record is read in one go from start to end; a sample takes eight bytes, so
// that ten years at one minute take 42 MB. What cannot be right is a Fault with
// file and line; what can be used though it is odd is a note.
package record

import (
	"fmt"
	"slices"
	"time"
)

// Record is a series of heights in order of time.
type Record struct {
	Name    string // of the file, as its user knows it
	samples []sample
	start   int64 // Unix seconds that the samples count from

	// Missing is how many lines have a time and no height.
	Missing int
	// TimeColumns and HeightColumn are the columns read, as the header names
	// them.
	TimeColumns  []string
	HeightColumn string
	// Passed are the columns passed over.
	Passed []string
	// Notes say what is odd though it can be used, one sentence each.
	Notes []Fault
}

// sample is one height: seconds from the start of the record, and metres. A
// float32 holds 10 m to a thousandth of a millimetre.
type sample struct {
	at     uint32
	height float32
}

// Len returns how many heights there are.
func (r *Record) Len() int { return len(r.samples) }

// Unix returns the time of a height in seconds of UT since 1970.
func (r *Record) Unix(i int) int64 { return r.start + int64(r.samples[i].at) }

// Time returns the time of a height in UTC.
func (r *Record) Time(i int) time.Time { return time.Unix(r.Unix(i), 0).UTC() }

// Hours returns the time of a height in hours of UT since 1970.
func (r *Record) Hours(i int) float64 { return float64(r.Unix(i)) / 3600 }

// Height returns a height in metres above the zero of the record.
func (r *Record) Height(i int) float64 { return float64(r.samples[i].height) }

// Span returns the time from the first height to the last.
func (r *Record) Span() time.Duration {
	if len(r.samples) == 0 {
		return 0
	}
	return time.Duration(r.samples[len(r.samples)-1].at-r.samples[0].at) * time.Second
}

// Step returns the usual time from one height to the next: the median.
func (r *Record) Step() time.Duration {
	const enough = 100000 // the median of so many says as much as that of all
	n := len(r.samples) - 1
	if n < 1 {
		return 0
	}
	every := max(1, n/enough)
	var steps []uint32
	for i := 0; i < n; i += every {
		steps = append(steps, r.samples[i+1].at-r.samples[i].at)
	}
	slices.Sort(steps)
	return time.Duration(steps[len(steps)/2]) * time.Second
}

// Gap is a stretch without heights.
type Gap struct{ From, To time.Time } // the heights on either side

// Length returns how long the gap is.
func (g Gap) Length() time.Duration { return g.To.Sub(g.From) }

// Gaps returns the stretches longer than a given time from one height to the
// next, in order of time.
func (r *Record) Gaps(longer time.Duration) []Gap {
	var gaps []Gap
	for i := 1; i < len(r.samples); i++ {
		if d := r.samples[i].at - r.samples[i-1].at; time.Duration(d)*time.Second > longer {
			gaps = append(gaps, Gap{r.Time(i - 1), r.Time(i)})
		}
	}
	return gaps
}

// Fault is something that is wrong with a record.
type Fault struct {
	File    string
	Line    int    // from 1; 0 where it is not one line that is at fault
	Message string // one sentence, without a full stop
}

// Error returns "file.csv:12: sentence".
func (f *Fault) Error() string {
	if f.Line == 0 {
		return f.File + ": " + f.Message
	}
	return fmt.Sprintf("%s:%d: %s", f.File, f.Line, f.Message)
}

// Make returns a record of heights in metres at Unix times that rise, as a
// program has them at hand. It panics where they do not rise, or where a
// record would span more than 136 years.
func Make(name string, unix []int64, heights []float64) *Record {
	r := &Record{Name: name, HeightColumn: "height", TimeColumns: []string{"time"}}
	for i, t := range unix {
		if i == 0 {
			r.start = t
		}
		if i > 0 && t <= unix[i-1] || t-r.start > maxSpan {
			panic("record: times do not rise, or run on too long")
		}
		r.samples = append(r.samples, sample{uint32(t - r.start), float32(heights[i])})
	}
	return r
}
