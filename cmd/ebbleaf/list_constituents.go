package main

import (
	"bufio"
	"encoding/csv"
	"fmt"
	"strings"

	"github.com/spf13/cobra"

	"ebbleaf/predict"
)

// listConstituents returns "list constituents".
func (p *program) listConstituents() *cobra.Command {
	cmd := &cobra.Command{
		Use:   "constituents",
		Short: "List the constituents known by name",
		Long: `List the constituents that a harbour file can name: speed in degrees an hour,
extended Doodson number (seven letters, for tau, s, h, p, N', p1 and the constant
in steps of 90 degrees: Z is 0, A is 1, B is 2, Y is -1, X is -2 and so on),
cycles a day, where the node factor f and the node angle u come from, and other
names in use. In CSV the columns are name, speed, doodson, cycles, nodes, aliases
and remark; aliases are parted by spaces.

Compounds that are not in the list are read by rule: 2MNK4 is 2 M2 + N2 - K2. Any
other constituent is given in a harbour file by its number:

  X1: {doodson: AYZZZZY, nodes: O1, amplitude: 0.004, phase: 12}`,
		Example: `  ebbleaf list constituents
  ebbleaf list constituents --format csv > constituents.csv`,
		Args: exactly(0, "nothing after it"),
	}
	format := choice{"text", []string{"text", "csv", "json"}}
	cmd.Flags().Var(&format, "format", "how the list is written")
	cmd.RunE = func(*cobra.Command, []string) error {
		writers := map[string]func(*bufio.Writer, []constituentRow) error{
			"text": constituentsText, "csv": constituentsCSV, "json": constituentsJSON,
		}
		return p.write(func(w *bufio.Writer) error { return writers[format.value](w, constituentRows()) })
	}
	return cmd
}

// constituentRow is a constituent as it is listed.
type constituentRow struct {
	Name    string   `json:"name"`
	Speed   plainNum `json:"speed"` // degrees an hour
	Doodson string   `json:"doodson"`
	Cycles  int      `json:"cycles"`
	Nodes   string   `json:"nodes"`
	Aliases []string `json:"aliases"`
	Remark  string   `json:"remark,omitempty"`
}

// plainNum is a number as it is printed.
type plainNum string

// MarshalJSON writes it as a number.
func (n plainNum) MarshalJSON() ([]byte, error) { return []byte(n), nil }

// constituentRows returns the rows of the list, slow constituents first.
func constituentRows() []constituentRow {
	var rows []constituentRow
	for _, c := range predict.Constituents() {
		rows = append(rows, constituentRow{c.Name, plainNum(number(c.Speed(), 7)), c.Doodson(), c.Species(), c.Node.Words(),
			append([]string{}, predict.Aliases(c.Name)...), c.Remark()})
	}
	return rows
}

func constituentsText(w *bufio.Writer, rows []constituentRow) error {
	name, nodes := 0, 0
	for _, r := range rows {
		name, nodes = max(name, len(r.Name)), max(nodes, len(r.Nodes))
	}
	line := func(a, b, c, d, e, f string) {
		text := fmt.Sprintf("%-*s  %11s  %-8s %6s  %-*s  %s", name, a, b, c, d, nodes, e, f)
		w.WriteString(strings.TrimRight(text, " ") + "\n")
	}
	line("name", "degrees/h", "Doodson", "cycles", "node factor", "also")
	for _, r := range rows {
		line(r.Name, string(r.Speed), r.Doodson, fmt.Sprint(r.Cycles), r.Nodes, strings.Join(r.Aliases, " "))
	}
	w.WriteString("\n")
	for _, r := range rows {
		if r.Remark != "" {
			fmt.Fprintf(w, "%s\n", wrap(r.Name+": "+r.Remark, textWidth))
		}
	}
	_, err := fmt.Fprintf(w, "\n%d constituents. Compounds that are not among them are read by rule.\n", len(rows))
	return err
}

func constituentsCSV(w *bufio.Writer, rows []constituentRow) error {
	out := csv.NewWriter(w)
	out.Write([]string{"name", "speed", "doodson", "cycles", "nodes", "aliases", "remark"})
	for _, r := range rows {
		out.Write([]string{r.Name, string(r.Speed), r.Doodson, fmt.Sprint(r.Cycles), r.Nodes, strings.Join(r.Aliases, " "), r.Remark})
	}
	out.Flush()
	return out.Error()
}

func constituentsJSON(w *bufio.Writer, rows []constituentRow) error {
	text, err := encode(struct {
		Constituents []constituentRow `json:"constituents"`
	}{rows})
	if err != nil {
		return err
	}
	_, err = w.Write(append(text, '\n'))
	return err
}
