package record

import (
	"bytes"
	"fmt"
	"io"
	"math"
	"strconv"
	"time"
)

// Options says how a record is to be read.
type Options struct {
	// Zone is the clock of times that do not say their offset; nil is UTC.
	Zone *time.Location
	// Unit is the length of the record's unit in metres; 0 is 1.
	Unit float64
	// TimeColumns names the column of the time, or those of the date and of the
	// time of day; none: they are told by their names.
	TimeColumns []string
	// HeightColumn names the column of the height; empty: it is told by its
	// name.
	HeightColumn string
}

const (
	firstYear, lastYear = 1900, 2100
	maxSpan             = math.MaxUint32 // seconds: 136 years
	maxSamples          = 24_000_000     // 45 years at one minute
	maxHeight           = 1000.0         // metres: some zeros lie far from the sea, but none farther
	leastStep           = 55 * time.Second
	longestStep         = 25 * time.Hour
)

// reader is a record being read.
type reader struct {
	*Record
	o       Options
	lines   *lines
	columns columns
	clock   clock

	line       int   // of the last height or missing height
	lastUnix   int64 // its time
	any        bool
	twice      int // times that the clock showed twice
	absent     int // and never
	firstTwice int // lines
	firstGone  int
	lowest     float32
	highest    float32
}

// Read reads a record. Name is that of the file, for faults. The error is of
// type *Fault where the text is at fault, and that of the io.Reader otherwise.
func Read(name string, text io.Reader, o Options) (*Record, error) {
	if o.Unit == 0 {
		o.Unit = 1
	}
	if o.Zone == nil {
		o.Zone = time.UTC
	}
	r := &reader{Record: &Record{Name: name}, o: o, lines: newLines(text), clock: clock{zone: o.Zone, last: math.MinInt64}}
	if err := r.head(); err != nil {
		return nil, err
	}
	if err := r.rows(); err != nil {
		return nil, err
	}
	if err := r.judge(); err != nil {
		return nil, err
	}
	return r.Record, nil
}

func (r *reader) fault(line int, format string, args ...any) error {
	return &Fault{r.Name, line, fmt.Sprintf(format, args...)}
}

// next returns the next line that is neither empty nor a remark.
func (r *reader) next() ([]byte, error) {
	for {
		line, err := r.lines.next()
		switch {
		case err == io.EOF:
			return nil, err
		case err == errLong, err == errUTF16, err == errBytes, err == errCR:
			return nil, r.fault(r.lines.number, "%v", err)
		case err != nil:
			return nil, fmt.Errorf("%s: the record cannot be read: %w", r.Name, err)
		}
		if t := bytes.TrimSpace(line); len(t) > 0 && t[0] != '#' {
			return line, nil
		}
	}
}

func (r *reader) head() error {
	line, err := r.next()
	if err == io.EOF {
		return r.fault(0, "the record is empty")
	}
	if err != nil {
		return err
	}
	c, problem := readHeader(line, r.o)
	if problem != "" {
		return r.fault(r.lines.number, "%s", problem)
	}
	r.columns = c
	r.HeightColumn = c.names[c.height]
	for i, name := range c.names {
		switch {
		case i == c.height:
		case i == c.time[0], len(c.time) > 1 && i == c.time[1]:
		default:
			r.Passed = append(r.Passed, name)
		}
	}
	for _, i := range c.time {
		r.TimeColumns = append(r.TimeColumns, c.names[i])
	}
	return nil
}

func (r *reader) rows() error {
	need := r.columns.height
	for _, i := range r.columns.time {
		need = max(need, i)
	}
	var fields [][]byte
	for {
		line, err := r.next()
		if err == io.EOF {
			return nil
		}
		if err != nil {
			return err
		}
		fields = split(line, r.columns.sep, fields[:0])
		if len(fields) <= need {
			return r.fault(r.lines.number, "the row has %d of the %d columns wanted", len(fields), need+1)
		}
		if err := r.row(fields); err != nil {
			return err
		}
	}
}

// row reads one row.
func (r *reader) row(fields [][]byte) error {
	n := r.lines.number
	unix, there, err := r.moment(fields)
	if err != nil {
		return err
	}
	height, missing, problem := r.height(fields[r.columns.height])
	if problem != "" {
		return r.fault(n, "%s", problem)
	}
	if !there {
		return nil
	}
	if r.any && unix <= r.lastUnix {
		was := time.Unix(r.lastUnix, 0).UTC().Format("2006-01-02T15:04:05Z")
		if unix == r.lastUnix {
			return r.fault(n, "the time %s stands twice: the first is on line %d", was, r.line)
		}
		return r.fault(n, "the time %s is before that of line %d, %s: a record runs from early to late",
			time.Unix(unix, 0).UTC().Format("2006-01-02T15:04:05Z"), r.line, was)
	}
	r.any, r.lastUnix, r.line = true, unix, n
	if missing {
		r.Missing++
		return nil
	}
	if len(r.samples) == 0 {
		r.start = unix
		r.lowest, r.highest = height, height
	}
	if unix-r.start > maxSpan {
		return r.fault(n, "the record runs over more than 136 years by here: cut it")
	}
	if len(r.samples) == maxSamples {
		return r.fault(n, "the record has more than %d million heights: thin it, 6 minutes apart are close enough", maxSamples/1_000_000)
	}
	r.lowest, r.highest = min(r.lowest, height), max(r.highest, height)
	r.samples = append(r.samples, sample{uint32(unix - r.start), height})
	return nil
}

// moment reads the time of a row. There is none where the clock leapt over it.
func (r *reader) moment(fields [][]byte) (unix int64, there bool, err error) {
	n := r.lines.number
	text := fields[r.columns.time[0]]
	c, ok := parseMoment(text)
	if len(r.columns.time) > 1 {
		day := fields[r.columns.time[1]]
		if ok && !c.hasTime {
			c, ok = c.clock(day)
			text = []byte(string(text) + " " + string(day))
		} else if !ok {
			// The other way round, or the column of the time of day has both.
			if both, good := parseMoment(day); good {
				c, ok = both, both.hasTime
				if !both.hasTime {
					c, ok = both.clock(text)
				}
			}
		}
	}
	if !ok {
		if len(bytes.TrimSpace(text)) == 0 {
			return 0, false, r.fault(n, "the time is empty")
		}
		return 0, false, r.fault(n, "the time is %s: write it year first, such as 2027-04-01T05:30Z, or with date and time of day in two columns", quote(text))
	}
	if y := time.Unix(c.seconds, 0).UTC().Year(); y < firstYear || y > lastYear {
		return 0, false, r.fault(n, "the year is %d: records are taken from %d to %d", y, firstYear, lastYear)
	}
	if c.zoned {
		r.clock.last = c.seconds - c.offset
		return r.clock.last, true, nil
	}
	if r.o.Zone == time.UTC {
		return c.seconds, true, nil
	}
	unix, v := r.clock.ut(c.seconds)
	switch v {
	case twice:
		if r.twice == 0 {
			r.firstTwice = n
		}
		r.twice++
	case absent:
		if r.absent == 0 {
			r.firstGone = n
		}
		r.absent++
		return 0, false, nil
	}
	return unix, true, nil
}

// height reads a height and turns it into metres.
func (r *reader) height(s []byte) (metres float32, missing bool, problem string) {
	switch len(s) {
	case 0:
		return 0, true, ""
	case 1:
		if s[0] == '-' {
			return 0, true, ""
		}
	}
	if r.columns.sep != ',' && bytes.Count(s, []byte{','}) == 1 {
		s = bytes.Replace(s, []byte{','}, []byte{'.'}, 1)
	}
	x, err := strconv.ParseFloat(string(s), 64)
	switch {
	case err != nil:
		for _, word := range []string{"na", "n/a", "null", "none", "missing", "--", "---"} {
			if bytes.EqualFold(s, []byte(word)) {
				return 0, true, ""
			}
		}
		return 0, false, fmt.Sprintf("the height is %s, which is no number", quote(s))
	case math.IsNaN(x), x == -9999, x == -99999, x == -999.9:
		return 0, true, ""
	case math.IsInf(x, 0), math.Abs(x*r.o.Unit) > maxHeight:
		return 0, false, fmt.Sprintf("the height is %s: it must lie within %g m of zero; write missing heights as nothing, NaN or -9999", quote(s), maxHeight)
	}
	return float32(x * r.o.Unit), false, ""
}

// judge looks at the record as a whole.
func (r *reader) judge() error {
	switch n := len(r.samples); {
	case n == 0 && r.Missing == 0 && r.absent == 0:
		return r.fault(0, "the record has a header and no rows")
	case n == 0:
		return r.fault(0, "every height is missing")
	case n == 1:
		return r.fault(r.line, "the record has one height: a tide needs many")
	case r.lowest == r.highest:
		return r.fault(0, "every height is %.3f m: a gauge that never moves tells nothing of the tide", r.lowest)
	}
	if step := r.Step(); step < leastStep || step > longestStep {
		return r.fault(0, "the heights are usually %v apart: steps from one minute to one day are taken", step)
	}
	if r.twice > 0 {
		r.note(r.firstTwice, "%s in an hour that the clock of %s showed twice, as it was put back: one alone is taken for the first showing",
			many(r.twice, "time falls", "times fall"), r.o.Zone)
	}
	if r.absent > 0 {
		r.note(r.firstGone, "%s, which the clock of %s leapt over: left out; if the gauge keeps one time all year, its summers are an hour wrong here: give that time as --record-zone, such as Etc/GMT-1 for an hour ahead of UT",
			many(r.absent, "time does not exist", "times do not exist"), r.o.Zone)
	}
	return nil
}

func (r *reader) note(line int, format string, args ...any) {
	r.Notes = append(r.Notes, Fault{r.Name, line, fmt.Sprintf(format, args...)})
}

// many puts a number before a word for one or for several.
func many(n int, one, more string) string {
	if n == 1 {
		return "1 " + one
	}
	return fmt.Sprintf("%d %s", n, more)
}
