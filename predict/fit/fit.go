package fit

import (
	"errors"
	"fmt"
	"math"
	"slices"
	"strings"
	"time"

	"ebbleaf/predict"
	"ebbleaf/predict/record"
)

// Options says how constants are fitted. The zero value is right for most
// records.
type Options struct {
	// NodeFactors is the convention the constants are for.
	NodeFactors predict.NodeFactors
	// Candidates are the constituents looked for, in order of priority; nil
	// stands for Candidates().
	Candidates []predict.Constituent
	// Inferences tie constituents that the record cannot tell apart to ones that
	// it can; nil stands for Equilibrium(). Of several for one constituent the
	// first whose neighbour was told apart counts.
	Inferences []Inference
	// Progress, if not nil, is told now and then what is being done and how far
	// all is, from 0 to 1.
	Progress func(what string, share float64)
}

// Estimate is one constituent with its errors.
type Estimate struct {
	predict.Constant
	// AmplitudeError, metres, and LagError, degrees, are standard errors.
	AmplitudeError, LagError float64
	// Signal is the signal-to-noise ratio, (amplitude / standard error)^2.
	Signal float64
	// From is the constituent that this one is inferred from; empty where it
	// was solved for. Ratio and Difference are those of amplitude and lag.
	From              string
	Ratio, Difference float64
}

// Result is what a record gives.
type Result struct {
	Constants []Estimate // in the order of predict.Constituents
	// Weak are constituents that were solved for and left out, as they do not
	// stand out of the noise; Unresolved those that the record cannot tell from
	// others.
	Weak       []Estimate
	Unresolved []predict.Constituent
	// Mean is the mean level above the record's zero, MeanError its standard
	// error, metres.
	Mean, MeanError float64
	NodeFactors     predict.NodeFactors

	From, To time.Time
	Step     time.Duration
	Heights  int // in the record
	Used     int // with a weight above 0
	Missing  int
	Gaps     []record.Gap // longer than two steps
	Faults   []Fault      // found in the record and left out or put right
	Far      int          // heights given no weight as they lie too far from the tide
	RMS      float64      // of the residual of the heights not left out, metres
	Within   float64      // metres: nine in ten of these heights lie so near
	// Condition is the condition number of the normal equations scaled to a
	// diagonal of 1; Solved how many constituents were solved for.
	Condition float64
	Solved    int
}

// Harbour puts constants and mean level into a copy of a harbour.
func (r *Result) Harbour(h predict.Harbour) *predict.Harbour {
	h.MeanLevel, h.NodeFactors, h.Constants = r.Mean, r.NodeFactors, nil
	for _, e := range r.Constants {
		h.Constants = append(h.Constants, e.Constant)
	}
	return &h
}

const (
	// mostInflation is how much the variance of a constituent may grow by what
	// gaps and close neighbours share with it (ours): beyond it the record does
	// not tell them apart.
	mostInflation = 10
	// leastSignal is the signal-to-noise ratio from which a constituent betters
	// predictions: its two coefficients carry a noise of 2 s^2, so that the square
	// of an amplitude comes out at H^2 + 2 s^2, and H^2 > 2 s^2 makes the error of
	// a prediction smaller with it than without (Mallows).
	leastSignal = 4
	// leastPerColumn is how many heights a column wants at least (ours).
	leastPerColumn = 2
)

// fitter is a fit at work.
type fitter struct {
	data
	o      Options
	step   time.Duration
	chosen chosen
	m      *model
	coef   []float64
	weigh  weighing
	faults []Fault
	shifts []shift // of the datum
}

// Fit works out the constants of a record. The error says why it cannot be
// done.
func Fit(rec *record.Record, o Options) (*Result, error) {
	f := newFitter(rec, o)
	if err := f.long(); err != nil {
		return nil, err
	}
	const mostRounds = 4
	for round := range mostRounds {
		f.tell("fitting a first time", 0.1+0.1*float64(round))
		if err := f.rough(); err != nil {
			return nil, err
		}
		f.tell("looking for faults", 0.15+0.1*float64(round))
		again, err := f.findFaults()
		if err != nil {
			return nil, err
		}
		if !again {
			break
		}
	}
	return f.finish()
}

func newFitter(rec *record.Record, o Options) *fitter {
	if o.Candidates == nil {
		o.Candidates = Candidates()
	}
	if o.Inferences == nil {
		o.Inferences = Equilibrium()
	}
	f := &fitter{o: o, step: rec.Step()}
	f.rec = rec
	f.out = make([]bool, rec.Len())
	for i := range rec.Len() {
		f.base += rec.Height(i) / float64(rec.Len())
	}
	f.thinOut()
	f.chosen = choose(o.Candidates, rec.Span()+f.step)
	return f
}

func (f *fitter) tell(what string, share float64) {
	if f.o.Progress != nil {
		f.o.Progress(what, share)
	}
}

// thinOut picks the first height of every hour of a dense record, for all that
// is done before the last fit.
func (f *fitter) thinOut() {
	if f.step > 30*time.Minute {
		return
	}
	last := int64(math.MinInt64)
	for i := range f.rec.Len() {
		if hour := f.rec.Unix(i) / 3600; hour != last {
			f.thin = append(f.thin, int32(i))
			last = hour
		}
	}
}

// long tells whether the record is long enough for what a harbour needs: the
// four main constituents told apart, or tied to one that is.
func (f *fitter) long() error {
	days := (f.rec.Span() + f.step).Hours() / 24
	if days < 2 {
		return fmt.Errorf("the record covers %.1f days: two days are the least, with the ratios of a neighbour, and 15 without", days)
	}
	return f.main(f.chosen.lines)
}

// main tells whether the four main constituents are among lines or tied to one.
func (f *fitter) main(lines []predict.Constituent) error {
	t := ties(lines, f.o.Inferences)
	var gone []string
	for _, name := range []string{"M2", "S2", "K1", "O1"} {
		known := func(c predict.Constituent) bool { return c.Name == name }
		if slices.ContainsFunc(f.o.Candidates, known) && !slices.ContainsFunc(lines, known) &&
			!slices.ContainsFunc(t, func(t tie) bool { return t.c.Name == name }) {
			gone = append(gone, name)
		}
	}
	if len(gone) == 0 {
		return nil
	}
	days := (f.rec.Span() + f.step).Hours() / 24
	why := "a record with such gaps"
	switch {
	case days < 15:
		why = fmt.Sprintf("%.1f days", days)
	case f.step >= 3*time.Hour:
		why = fmt.Sprintf("a record at steps of %.0f hours", f.step.Hours())
	}
	return fmt.Errorf("%s cannot tell %s from others: M2 and S2 part in 14.8 days, K1 and O1 in 13.7, and constants need that much, "+
		"without long gaps and at steps of an hour or so, or the ratios of a neighbour", why, strings.Join(gone, " and "))
}

// rough fits the thinned record, leaving out constituents that it cannot tell
// apart, and robustly: once evenly, then with Huber's weights, then with the
// bisquare.
func (f *fitter) rough() error {
	var n *normal
	for {
		f.m = newModel(f.chosen.lines, ties(f.chosen.lines, f.o.Inferences), f.o.NodeFactors, f.shifts)
		var err error
		if n, err = f.gather(f.m, true, nil, weighing{}); err != nil {
			return err
		}
		if n.used < leastPerColumn*f.m.columns() && len(f.chosen.lines) > 4 {
			f.refuse(len(f.chosen.lines) - 1)
			continue
		}
		worst := f.worst(n)
		if worst < 0 {
			break
		}
		f.refuse(worst)
	}
	if err := f.main(f.chosen.lines); err != nil {
		return err
	}
	if n.used < leastPerColumn*f.m.columns() {
		return fmt.Errorf("the record has %d heights: constants need %d or more", n.used, leastPerColumn*f.m.columns())
	}
	sol, err := n.solve(n.all())
	if err != nil {
		return err
	}
	f.coef = sol.coef
	for _, hard := range []bool{false, true} {
		res, err := f.residuals(f.m, true, f.coef, false)
		if err != nil {
			return err
		}
		f.weigh = weighing{f.spreadOf(res, true), hard}
		if n, err = f.gather(f.m, true, f.coef, f.weigh); err != nil {
			return err
		}
		if sol, err = n.solve(n.all()); err != nil {
			return err
		}
		f.coef = sol.coef
	}
	f.m.learn(f.coef)
	return nil
}

// refuse takes a line out of the model.
func (f *fitter) refuse(i int) {
	f.chosen.refused = append(f.chosen.refused, f.chosen.lines[i])
	f.chosen.lines = slices.Delete(slices.Clone(f.chosen.lines), i, i+1)
}

// worst returns the line of least priority that the record does not tell from
// others, or -1.
func (f *fitter) worst(n *normal) int {
	sol, err := n.solve(n.all())
	if err != nil {
		// Not even solvable: the last goes, and so on.
		return len(f.chosen.lines) - 1
	}
	for k := len(f.chosen.lines) - 1; k >= 0; k-- {
		if max(sol.inflation[1+2*k], sol.inflation[2+2*k]) > mostInflation {
			return k
		}
	}
	return -1
}

// spreadOf returns the robust spread of residuals that are not left out, at
// least a hundredth of a millimetre, so that noiseless heights have weights.
func (f *fitter) spreadOf(res []float32, thinned bool) float64 {
	_, at := f.indices(thinned)
	kept := make([]float32, 0, len(res))
	for k, r := range res {
		if !f.out[at(k)] {
			kept = append(kept, r)
		}
	}
	return max(spread(kept), 1e-5)
}

var errWeak = errors.New("no constituent stands out of the noise: the record shows no tide")
