package main

import (
	"bufio"
	"encoding/json"
	"fmt"
	"math"
	"strings"
	"time"

	"ebbleaf/predict"
)

// levelWords are the names of the levels in words.
var levelWords = map[predict.LevelName]string{
	predict.HAT:            "highest astronomical tide",
	predict.TropicHigh:     "high water at tropic tides",
	predict.MHWS:           "mean high water springs",
	predict.MHHW:           "mean higher high water",
	predict.MHW:            "mean high water",
	predict.EquatorialHigh: "high water at equatorial tides",
	predict.MHWN:           "mean high water neaps",
	predict.MTL:            "mean tide level",
	predict.MSL:            "mean sea level",
	predict.MLWN:           "mean low water neaps",
	predict.EquatorialLow:  "low water at equatorial tides",
	predict.MLW:            "mean low water",
	predict.MLLW:           "mean lower low water",
	predict.MLWS:           "mean low water springs",
	predict.TropicLow:      "low water at tropic tides",
	predict.LAT:            "lowest astronomical tide",
}

// how says in words how a level was worked out.
func (j *levelJob) how(v predict.Level) string {
	years := fmt.Sprintf("%d to %d", j.levels.First, j.levels.Last)
	if j.levels.First == j.levels.Last {
		years = fmt.Sprint(j.levels.First)
	}
	sums := map[predict.LevelName]string{
		predict.MHWS: "mean level + (M2 + S2)", predict.MHWN: "mean level + |M2 - S2|",
		predict.MLWN: "mean level - |M2 - S2|", predict.MLWS: "mean level - (M2 + S2)",
	}
	means := map[predict.LevelName]string{
		predict.MHHW: "mean of the highest high water of each lunar day of ",
		predict.MLLW: "mean of the lowest low water of each lunar day of ",
		predict.MHW:  "mean of all high waters predicted for ",
		predict.MLW:  "mean of all low waters predicted for ",
		predict.MTL:  "half-way between MHW and MLW of ",
		predict.MHWS: "mean of the high waters predicted for the days with the largest range of each fortnight of ",
		predict.MHWN: "mean of the high waters predicted for the days with the smallest range of each fortnight of ",
		predict.MLWN: "mean of the low waters predicted for the days with the smallest range of each fortnight of ",
		predict.MLWS: "mean of the low waters predicted for the days with the largest range of each fortnight of ",

		predict.TropicHigh:     "mean of the highest water of the days with the largest range of each fortnight of ",
		predict.TropicLow:      "mean of the lowest water of the days with the largest range of each fortnight of ",
		predict.EquatorialHigh: "mean of the highest water of the days with the smallest range of each fortnight of ",
		predict.EquatorialLow:  "mean of the lowest water of the days with the smallest range of each fortnight of ",
	}
	switch v.Method {
	case predict.FromExtremes:
		which, when := "highest", j.levels.Highest.Time
		if v.Name == predict.LAT {
			which, when = "lowest", j.levels.Lowest.Time
		}
		return "the " + which + " tide predicted for " + years + ", on " + when.In(j.harbour.Zone).Format("2 January 2006")
	case predict.FromMeans:
		return means[v.Name] + years
	case predict.FromConstants:
		return "from the harmonic constants, " + sums[v.Name]
	case predict.FromTable:
		return "from the table of corrections: the standard port's with its difference"
	default:
		return "the mean level of the harbour file"
	}
}

// rangeWords are the mean ranges in words.
var rangeWords = [...]string{
	predict.MeanOfTides: "mean range: MHW less MLW", predict.MeanOfDays: "mean range of a lunar day: MHHW less MLLW",
	predict.SpringRange: "mean spring range: MHWS less MLWS", predict.NeapRange: "mean neap range: MHWN less MLWN",
	predict.TropicRange: "mean range at tropic tides", predict.EquatorialRange: "mean range at equatorial tides",
}

// writeLevels writes levels to be read.
func writeLevels(w *bufio.Writer, j *levelJob) error {
	h, l := j.harbour, j.levels
	fmt.Fprintf(w, "%s: levels of the tide\n", h.Name)
	if mark := reduced(h); mark != "" {
		fmt.Fprintf(w, "%s\n", wrap(mark, textWidth))
	}
	fmt.Fprintf(w, "Heights in %s above %s.\n", j.unit.Symbol, h.Datum)
	if len(l.Ranges) == 0 {
		fmt.Fprintf(w, "\nThere is no tide here.\n")
	}
	fmt.Fprintln(w)
	widest := 0
	for _, v := range l.All {
		widest = max(widest, len(j.height(v.Height)))
	}
	for _, v := range l.All {
		head := fmt.Sprintf("  %-6s%*s  ", v.Name, widest, j.height(v.Height))
		hang(w, head, levelWords[v.Name]+": "+j.how(v))
	}
	if len(l.Ranges) > 0 {
		fmt.Fprintln(w)
	}
	for _, r := range l.Ranges {
		fmt.Fprintf(w, "  %*s %s  %s\n", widest, j.height(r.Range), j.unit.Symbol, rangeWords[r.Kind])
	}
	fmt.Fprintln(w)
	hang(w, "  ", kindOfTide(h))
	if l.Declination {
		hang(w, "  ", "The fortnight follows the Moon's declination: there are tropic and equatorial tides instead of springs and neaps.")
	} else if age, ok := h.AgeOfTide(); ok {
		hang(w, "  ", ageOfTide(age))
	}
	j.writeGiven(w)
	fmt.Fprintf(w, "\n%s\n", wrap(tideSource(h), textWidth))
	_, err := fmt.Fprintf(w, "\n%s\n", wrap(levelsCaution, textWidth))
	return err
}

// writeGiven writes published levels beside ours.
func (j *levelJob) writeGiven(w *bufio.Writer) {
	g := j.harbour.Given
	if g == nil {
		return
	}
	differ := map[predict.LevelName]predict.LevelDifference{}
	for _, d := range j.levels.Compare(g) {
		differ[d.Name] = d
	}
	fmt.Fprintf(w, "\nPublished levels beside ours\n\n")
	if g.Source != "" {
		hang(w, "  ", "Published: "+g.Source)
	}
	const width = 10
	fmt.Fprintf(w, "  %-6s%*s%*s%*s\n", "", width, "published", width, "ours", width, "more")
	for _, v := range g.Levels {
		line := fmt.Sprintf("  %-6s%*s", v.Name, width, j.height(v.Height))
		if d, ok := differ[v.Name]; ok {
			line += fmt.Sprintf("%*s%*s", width, j.height(d.Ours), width, j.signed(d.More()))
			if d.Large {
				line += fmt.Sprintf("  differs by more than %s %s", number(j.tolerance()/j.unit.Metres, 2), j.unit.Symbol)
			}
		} else {
			line += "  not worked out here"
		}
		fmt.Fprintln(w, line)
	}
	if len(j.large()) > 0 {
		fmt.Fprintln(w)
		hang(w, "  ", "A difference can come from another datum, another mean level, other years or constants that do not fit. Find out which before you rely on either.")
	}
}

// hang writes a text wrapped behind a head, its further lines indented as far.
func hang(w *bufio.Writer, head, text string) {
	lines := strings.Split(wrap(text, textWidth-len(head)), "\n")
	fmt.Fprintf(w, "%s%s\n", head, lines[0])
	for _, line := range lines[1:] {
		fmt.Fprintf(w, "%*s%s\n", len(head), "", line)
	}
}

// kindOfTide says the kind of tide and its form factor.
func kindOfTide(h *predict.Harbour) string {
	text := "Kind of tide: " + h.Regime().String()
	switch form := h.FormFactor(); {
	case math.IsNaN(form):
		return text + "."
	case math.IsInf(form, 0):
		return text + "; there is no semidiurnal tide."
	default:
		return text + fmt.Sprintf("; form factor (K1 + O1)/(M2 + S2) = %s.", number(form, 2))
	}
}

// ageOfTide says the age of the tide, hours.
func ageOfTide(age float64) string {
	if age < 0 {
		return fmt.Sprintf("Age of the tide: %s hours; springs come that long before new and full Moon on average.", number(age, 0))
	}
	return fmt.Sprintf("Age of the tide: %s hours; springs come that long after new and full Moon on average.", number(age, 0))
}

// writeLevelsCSV writes levels as CSV, published ones that we have not worked
// out at the end.
func writeLevelsCSV(w *bufio.Writer, j *levelJob) error {
	given, differ := j.given()
	if _, err := w.WriteString("level,height,method,published,difference\n"); err != nil {
		return err
	}
	for _, v := range j.levels.All {
		published, difference := "", ""
		if g, ok := given[v.Name]; ok {
			published, difference = j.height(g), j.height(differ[v.Name].More())
		}
		fmt.Fprintf(w, "%s,%s,%s,%s,%s\n", v.Name, j.height(v.Height), v.Method, published, difference)
	}
	if j.harbour.Given == nil {
		return nil
	}
	for _, g := range j.harbour.Given.Levels {
		if _, ok := j.levels.Level(g.Name); !ok {
			if _, err := fmt.Fprintf(w, "%s,,,%s,\n", g.Name, j.height(g.Height)); err != nil {
				return err
			}
		}
	}
	return nil
}

// given returns the published levels and their differences by name.
func (j *levelJob) given() (map[predict.LevelName]float64, map[predict.LevelName]predict.LevelDifference) {
	given, differ := map[predict.LevelName]float64{}, map[predict.LevelName]predict.LevelDifference{}
	if g := j.harbour.Given; g != nil {
		for _, v := range g.Levels {
			given[v.Name] = v.Height
		}
	}
	for _, d := range j.levels.Compare(j.harbour.Given) {
		differ[d.Name] = d
	}
	return given, differ
}

// writeLevelsJSON writes levels as one JSON object.
func writeLevelsJSON(w *bufio.Writer, j *levelJob) error {
	type level struct {
		Level      string       `json:"level"`
		Name       string       `json:"name"`
		Height     *json.Number `json:"height"`
		Method     string       `json:"method,omitempty"`
		How        string       `json:"how,omitempty"`
		Published  *json.Number `json:"published,omitempty"`
		Difference *json.Number `json:"difference,omitempty"`
		Large      *bool        `json:"large-difference,omitempty"`
	}
	type meanRange struct {
		Range  string      `json:"range"`
		Name   string      `json:"name"`
		Height json.Number `json:"height"`
		Method string      `json:"method"`
	}
	type tide struct {
		Time   string      `json:"time"`
		Height json.Number `json:"height"`
	}
	h, l := j.harbour, j.levels
	out := struct {
		Harbour   string       `json:"harbour"`
		Datum     string       `json:"datum"`
		Unit      string       `json:"unit"`
		FirstYear int          `json:"first-year"`
		LastYear  int          `json:"last-year"`
		Levels    []level      `json:"levels"`
		Ranges    []meanRange  `json:"ranges"`
		Highest   *tide        `json:"highest,omitempty"`
		Lowest    *tide        `json:"lowest,omitempty"`
		Kind      string       `json:"kind"`
		Form      *json.Number `json:"form-factor"`
		Age       *json.Number `json:"age-hours"`
		Published string       `json:"published-source,omitempty"`
		Tolerance *json.Number `json:"tolerance,omitempty"`
		Source    string       `json:"source,omitempty"`
		Reduced   string       `json:"reduced,omitempty"`
		Caution   string       `json:"caution"`
	}{Harbour: h.Name, Datum: h.Datum, Unit: j.unit.Symbol, FirstYear: l.First, LastYear: l.Last, Levels: []level{}, Ranges: []meanRange{},
		Kind: h.Regime().String(), Source: sourceMember(h), Reduced: reduced(h), Caution: levelsCaution}
	value := func(s string) *json.Number { n := json.Number(s); return &n }
	given, differ := j.given()
	for _, v := range l.All {
		one := level{Level: string(v.Name), Name: levelWords[v.Name], Height: value(j.height(v.Height)), Method: v.Method.String(), How: j.how(v)}
		if g, ok := given[v.Name]; ok {
			d := differ[v.Name]
			one.Published, one.Difference, one.Large = value(j.height(g)), value(j.height(d.More())), &d.Large
		}
		out.Levels = append(out.Levels, one)
	}
	if g := h.Given; g != nil {
		for _, v := range g.Levels {
			if _, ok := l.Level(v.Name); !ok {
				out.Levels = append(out.Levels, level{Level: string(v.Name), Name: levelWords[v.Name], Published: value(j.height(v.Height))})
			}
		}
		out.Published, out.Tolerance = g.Source, value(number(j.tolerance()/j.unit.Metres, max(j.digits, 2)))
	}
	for _, r := range l.Ranges {
		out.Ranges = append(out.Ranges, meanRange{r.Kind.String(), rangeWords[r.Kind], json.Number(j.height(r.Range)), r.Method.String()})
	}
	if !l.Highest.Time.IsZero() {
		out.Highest = &tide{rfc3339(l.Highest.Time, time.UTC), json.Number(j.height(l.Highest.Height))}
		out.Lowest = &tide{rfc3339(l.Lowest.Time, time.UTC), json.Number(j.height(l.Lowest.Height))}
	}
	if form := h.FormFactor(); !math.IsNaN(form) && !math.IsInf(form, 0) {
		out.Form = value(number(form, 3))
	}
	if age, ok := h.AgeOfTide(); ok && !l.Declination {
		out.Age = value(number(age, 1))
	}
	data, err := encode(out)
	if err != nil {
		return err
	}
	_, err = w.WriteString(string(data) + "\n")
	return err
}
