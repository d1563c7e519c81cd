package main

import (
	"encoding/json"
	"path/filepath"
	"strings"
	"testing"
)

const reducedMark = "Secondary port: times and heights of the tide are reduced from those of Skerrow Haven by a table of corrections, not predicted."

// oneLine runs the lines of a text together.
func oneLine(s string) string { return strings.Join(strings.Fields(s), " ") }

// TestListsOfSecondaryPort looks for the mark of a secondary port in every list
// of its tide, in every format, and for none in those of Sun and Moon or of the
// standard port.
func TestListsOfSecondaryPort(t *testing.T) {
	dir := t.TempDir()
	must(t, "start", dir)
	pool, haven := filepath.Join(dir, "skerrow-pool.yaml"), filepath.Join(dir, "skerrow-haven.yaml")
	days := []string{"--from", "2027-04-01", "--to", "2027-04-02"}
	for _, list := range []string{"tides", "heights", "sky"} {
		for _, format := range []string{"text", "csv", "json", "ics"} {
			if list == "heights" && format == "ics" {
				continue
			}
			for _, file := range []string{pool, haven} {
				o := must(t, append([]string{"list", list, file, "--format", format}, days...)...)
				wants := file == pool && list != "sky"
				where := oneLine(o.out)
				if format == "csv" || format == "json" {
					where = oneLine(o.err)
				}
				if format == "ics" {
					where = oneLine(strings.NewReplacer("\r\n ", "", "\\,", ",").Replace(o.out))
				}
				if got := strings.Count(where, reducedMark); (got > 0) != wants || format != "ics" && got > 1 {
					t.Errorf("list %s of %s as %s: marked %d times\n%s%s", list, filepath.Base(file), format, got, o.err, o.out)
				}
				if format != "json" {
					continue
				}
				var whole map[string]any
				if err := json.Unmarshal([]byte(o.out), &whole); err != nil {
					t.Fatal(err)
				}
				if name, is := whole["reduced-from"]; is != wants || wants && name != "Skerrow Haven" {
					t.Errorf("list %s of %s: reduced-from is %v", list, filepath.Base(file), name)
				}
			}
		}
	}
	want := "Corrections: Invented for this example, from no measurement of any sea. Constants of Skerrow Haven: Invented"
	if o := must(t, append([]string{"list", "tides", pool}, days...)...); !strings.Contains(oneLine(o.out), want) {
		t.Errorf("the sources are not named: %s", o.out)
	}
}

// TestTidesOfSecondaryPort lists the tides of a day at the standard port and at
// the neighbour with ratios, and reduces the one to the other: 12 minutes earlier
// and 0.92 of the height for high water, 8 minutes earlier and 0.92 of the height
// and 0.05 m for low water.
func TestTidesOfSecondaryPort(t *testing.T) {
	dir := t.TempDir()
	must(t, "start", dir)
	days := []string{"--from", "2027-04-10", "--to", "2027-04-12", "--format", "csv", "--digits", "6"}
	there := rows(t, must(t, append([]string{"list", "tides", filepath.Join(dir, "skerrow-haven.yaml")}, days...)...), "time,kind,height")
	here := rows(t, must(t, append([]string{"list", "tides", filepath.Join(dir, "gull-rock.yaml")}, days...)...), "time,kind,height")
	if len(there) != len(here) || len(here) < 11 {
		t.Fatalf("%d tides, at the standard port %d", len(here), len(there))
	}
	for i := range here {
		earlier, more := 12.0, 0.0
		if there[i][1] == "LW" {
			earlier, more = 8, 0.05
		}
		minutes := moment(t, there[i][0]).Sub(moment(t, here[i][0])).Minutes()
		off := float(t, here[i][2]) - (0.92*float(t, there[i][2]) + more)
		if here[i][1] != there[i][1] || minutes < earlier-0.02 || minutes > earlier+0.02 || off > 2e-6 || off < -2e-6 {
			t.Errorf("%v from %v: %.2f minutes earlier, height off by %g m", here[i], there[i], minutes, off)
		}
	}
}

// TestProofOfSecondaryPort reads what proof says of the two neighbours.
func TestProofOfSecondaryPort(t *testing.T) {
	dir := t.TempDir()
	must(t, "start", dir)
	o := must(t, "proof", filepath.Join(dir, "skerrow-pool.yaml"), filepath.Join(dir, "gull-rock.yaml"))
	if o.err != "" {
		t.Errorf("proof said %q", o.err)
	}
	for _, want := range []string{
		"  reduced       from the tide of a standard port, not predicted\n",
		"  standard port Skerrow Haven, 50°12.8' N, 5°28.9' W, heights above Chart Datum, 33 constituents\n",
		"  low water     when it is there at 00:00 +0:40, 06:00 +1:05, 12:00 +0:40, 18:00 +1:05 (clock: UT)\n",
		"  heights       there and difference: MHWS 5.40 -0.400 m, MHWN 4.20 -0.300 m, MLWN 2.00 +0.100 m, MLWS 0.80 +0.300 m\n",
		"  range         3.900 m at springs, reduced\n", // by hand: 5.0 - 1.1
		"  low water     -0:08, height there x 0.920 +0.050 m\n",
	} {
		if !strings.Contains(o.out, want) {
			t.Errorf("no %q in\n%s", want, o.out)
		}
	}
	if strings.Contains(o.out, "constituents  ") || strings.Contains(o.out, "mean level") {
		t.Errorf("constants of a secondary port in\n%s", o.out)
	}
}
