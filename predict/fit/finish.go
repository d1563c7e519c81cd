package fit

import (
	"math"
	"slices"
	"time"

	"ebbleaf/predict"
)

// finish fits every height with the faults left out, weighs what comes of it,
// and leaves out what is weak.
func (f *fitter) finish() (*Result, error) {
	var n *normal
	var sol *solution
	for pass := range 2 {
		f.tell("fitting every height", 0.5+0.2*float64(pass))
		if pass > 0 {
			res, err := f.residuals(f.m, false, f.coef, false)
			if err != nil {
				return nil, err
			}
			f.weigh.scale = f.spreadOf(res, false)
		}
		var err error
		if n, err = f.gather(f.m, false, f.coef, f.weigh); err != nil {
			return nil, err
		}
		if sol, err = n.solve(n.all()); err != nil {
			return nil, err
		}
		f.coef = sol.coef
		if f.thin == nil {
			break // the passes before have been over every height
		}
	}
	f.tell("errors from the residual", 0.9)
	res, err := f.residuals(f.m, false, f.coef, false)
	if err != nil {
		return nil, err
	}
	spec := newSpectrum(len(res), func(i int) (float64, float64) {
		if f.out[i] {
			return f.rec.Hours(i), 0
		}
		r := float64(res[i])
		return f.rec.Hours(i), r * f.weigh.of(r)
	}, n.weight, f.step, f.m)

	// Weights follow the residuals, so that heights hold the fit less than their
	// weights say (Huber, section 7.6).
	var weights, slopes float64
	for i, v := range res {
		if !f.out[i] {
			weights += f.weigh.of(float64(v))
			slopes += f.weigh.slope(float64(v))
		}
	}
	for i := range spec.power {
		spec.power[i] *= weights / slopes * weights / slopes
	}

	r := f.result(n, sol, spec)
	// What stands out stays, and the rest is solved for without what does not.
	kept := f.strong(r)
	if len(kept) == 0 {
		return nil, errWeak
	}
	columns := []int{0}
	for k := range f.m.lines {
		if kept[f.m.lines[k].Name] {
			columns = append(columns, 1+2*k, 2+2*k)
		}
	}
	for k := range f.m.shifts {
		columns = append(columns, 1+2*len(f.m.lines)+k)
	}
	if sol, err = n.solve(columns); err != nil {
		return nil, err
	}
	full := make([]float64, f.m.columns())
	for i, c := range sol.columns {
		full[c] = sol.coef[i]
	}
	f.coef = full
	f.m.learn(f.coef)
	final := f.result(n, sol, spec)
	final.Constants = slices.DeleteFunc(final.Constants, func(e Estimate) bool {
		return !kept[e.Constituent.Name] && !(e.From != "" && kept[e.From])
	})
	for _, e := range r.Constants {
		if e.From == "" && !kept[e.Constituent.Name] {
			final.Weak = append(final.Weak, e)
		}
	}
	if res, err = f.residuals(f.m, false, f.coef, false); err != nil {
		return nil, err
	}
	f.describe(final, res)
	f.tell("done", 1)
	return final, nil
}

// leastAmplitude is the least amplitude that is kept, metres: a tenth of a
// millimetre, less than any file of constants holds (ours).
const leastAmplitude = 1e-4

// strong returns the names of the lines that stand out of the noise.
func (f *fitter) strong(r *Result) map[string]bool {
	kept := map[string]bool{}
	for _, e := range r.Constants {
		if e.From == "" && e.Signal >= leastSignal && e.Amplitude >= leastAmplitude {
			kept[e.Constituent.Name] = true
		}
	}
	return kept
}

// doubtOf returns how far an inferred constituent may be off, as a share of its
// amplitude (ours): ratios within a band are mostly found within a quarter of
// those of the equilibrium tide where the two are next to each other, and with
// the age of the tide between them within half.
func doubtOf(t *tie, from predict.Constituent) float64 {
	if t.c.Name == "MU2" {
		return 1 // 2MS2 of shallow water has the same argument
	}
	const near = 0.1 // degrees an hour: P1 and K1, K2 and T2 and S2, NU2 and N2
	if apart(t.c, from) < near {
		return 0.25
	}
	return 0.5
}

// leak adds to the errors of lines what an error of a constituent that was not
// solved for does to them: it goes into each as far as the two run together over
// the record, by sin(x)/x of half the turn they part, or its bound 1/x.
func leak(lines map[int]*Estimate, c predict.Constituent, amplitude float64, spec *spectrum) {
	for _, l := range lines {
		x := math.Pi * spec.length * math.Abs(spec.fold(c.Speed()/360)-spec.fold(l.Constituent.Speed()/360))
		a := amplitude * min(1, 1/x)
		l.AmplitudeError = math.Hypot(l.AmplitudeError, a)
		if l.Amplitude > 0 {
			l.LagError = min(180, math.Hypot(l.LagError, a/l.Amplitude/degree))
		}
	}
}

// leakRefused does so for the constituents that were neither solved for nor
// inferred, as large as the equilibrium tide has them beside the largest of
// their species.
func (f *fitter) leakRefused(lines map[int]*Estimate, spec *spectrum) {
	for _, c := range f.chosen.refused {
		if c.Equilibrium == 0 || c.Species() == 0 || slices.ContainsFunc(f.m.ties, func(t tie) bool { return t.c.Name == c.Name }) {
			continue
		}
		var largest *Estimate
		for _, l := range lines {
			if l.Constituent.Species() == c.Species() && l.Constituent.Equilibrium > 0 && (largest == nil || l.Amplitude > largest.Amplitude) {
				largest = l
			}
		}
		if largest != nil {
			leak(lines, c, largest.Amplitude*c.Equilibrium/largest.Constituent.Equilibrium, spec)
		}
	}
}

// seasonDoubt is how far the season may lift the mean level of a record that is
// too short to show it, metres (ours): SA is some 0.05 to 0.15 m along most
// coasts, and this is the root mean square of 0.1 m.
const seasonDoubt = 0.07

// result puts estimates and their errors together.
func (f *fitter) result(n *normal, sol *solution, spec *spectrum) *Result {
	r := &Result{NodeFactors: f.o.NodeFactors, Condition: sol.condition, Solved: (len(sol.columns) - 1 - len(f.m.shifts)) / 2}
	r.Mean = f.coef[0] + f.base
	r.MeanError = math.Sqrt(spec.about(0) * sol.inverse.At(0, 0))
	if !slices.ContainsFunc(f.m.lines, func(c predict.Constituent) bool { return c.Name == "SA" }) {
		r.MeanError = math.Hypot(r.MeanError, seasonDoubt)
	}
	errors := map[int]*Estimate{}
	for k, c := range f.m.lines {
		if !slices.Contains(sol.columns, 1+2*k) {
			continue
		}
		e := &Estimate{Constant: predict.Constant{Constituent: c}}
		e.Amplitude, e.Lag = f.m.constant(k, f.coef)
		e.AmplitudeError, e.LagError = spec.errorOf(c, k, sol, f.coef)
		errors[k] = e
	}
	for i := range f.m.ties {
		t := &f.m.ties[i]
		from, ok := errors[t.line]
		if !ok {
			continue
		}
		e := Estimate{Constant: predict.Constant{Constituent: t.c}, From: t.From, Ratio: t.Ratio, Difference: t.Lag}
		e.Amplitude, e.Lag = f.m.constant(len(f.m.lines)+i, f.coef)
		share := doubtOf(t, from.Constituent)
		e.AmplitudeError = math.Hypot(t.Ratio*from.AmplitudeError, share*e.Amplitude)
		e.LagError = min(180, math.Hypot(from.LagError, share/degree))
		r.Constants = append(r.Constants, e)
		leak(errors, t.c, share*e.Amplitude, spec)
	}
	f.leakRefused(errors, spec)
	for _, e := range errors {
		r.Constants = append(r.Constants, *e)
	}
	order := map[string]int{}
	for i, c := range predict.Constituents() {
		order[c.Name] = i
	}
	for i := range r.Constants {
		e := &r.Constants[i]
		if e.AmplitudeError > 0 {
			e.Signal = e.Amplitude / e.AmplitudeError * e.Amplitude / e.AmplitudeError
		} else if e.Amplitude > 0 {
			e.Signal = math.Inf(1)
		}
	}
	slices.SortFunc(r.Constants, func(a, b Estimate) int { return order[a.Constituent.Name] - order[b.Constituent.Name] })
	return r
}

// describe fills in what the result says of the record.
func (f *fitter) describe(r *Result, res []float32) {
	rec := f.rec
	r.From, r.To, r.Step = rec.Time(0), rec.Time(rec.Len()-1), f.step
	r.Heights, r.Missing = rec.Len(), rec.Missing
	r.Gaps = rec.Gaps(2 * f.step)
	for _, x := range f.faults {
		for _, s := range f.m.shifts {
			if x.Kind == Datum && x.From.Equal(rec.Time(s.from)) {
				x.Size = s.metres
			}
		}
		r.Faults = append(r.Faults, x)
	}
	var kept []float32
	sum := 0.0
	for i, v := range res {
		if f.out[i] {
			continue
		}
		if f.weigh.of(float64(v)) == 0 {
			r.Far++
			continue
		}
		kept = append(kept, float32(math.Abs(float64(v))))
		sum += float64(v) * float64(v)
	}
	r.Used = len(kept)
	if len(kept) > 0 {
		r.RMS = math.Sqrt(sum / float64(len(kept)))
		slices.Sort(kept)
		r.Within = float64(kept[min(len(kept)-1, len(kept)*9/10)])
	}
	for _, c := range f.chosen.refused {
		if !slices.ContainsFunc(f.m.ties, func(t tie) bool { return t.c.Name == c.Name }) {
			r.Unresolved = append(r.Unresolved, c)
		}
	}
}

// Covers returns the time that the record covers less its gaps.
func (r *Result) Covers() time.Duration {
	d := r.To.Sub(r.From) + r.Step
	for _, g := range r.Gaps {
		d -= g.Length() - r.Step
	}
	return d
}
