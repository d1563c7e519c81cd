package main

import (
	"encoding/json"
	"math"
	"strconv"
	"strings"
	"testing"
)

// TestListConstituents holds the three forms of the list to each other, and some
// of its rows to figures from outside: speeds of Schureman's table 2 and numbers
// of the International Hydrographic Organization's list, from memory.
func TestListConstituents(t *testing.T) {
	table := rows(t, must(t, "list", "constituents", "--format", "csv"), "name,speed,doodson,cycles,nodes,aliases,remark")
	if len(table) < 140 {
		t.Fatalf("%d rows", len(table))
	}
	byName := map[string][]string{}
	for _, r := range table {
		byName[r[0]] = r
	}
	for _, want := range []string{
		"M2,28.9841042,BZZZZZZ,2,as M2,", "K1,15.0410686,AAZZZZA,1,as K1,", "S2,30.0000000,BBXZZZZ,2,none,",
		`MS4,58.9841042,DBXZZZZ,4,as M2,`, "RHO1,13.4715145,AXBYZZY,1,as O1,RHO RO1", "2SM2,31.0158958,BDVZZZZ,2,f M2, u -M2,",
		"LAM2,29.4556253,BAXAZZB,2,as M2,LA2 LABDA2 LAMBDA2 LDA2",
	} {
		name, _, _ := strings.Cut(want, ",")
		r := byName[name]
		if r == nil || strings.Join(r[:6], ",") != want {
			t.Errorf("%s: %q, wanted %q", name, r, want)
		}
	}

	var got struct {
		Constituents []struct {
			Name, Doodson, Nodes, Remark string
			Speed                        float64
			Cycles                       int
			Aliases                      []string
		}
	}
	if err := json.Unmarshal([]byte(must(t, "list", "constituents", "--format", "json").out), &got); err != nil {
		t.Fatal(err)
	}
	if len(got.Constituents) != len(table) {
		t.Fatalf("%d in JSON, %d in CSV", len(got.Constituents), len(table))
	}
	text := must(t, "list", "constituents").out
	for i, r := range table {
		c := got.Constituents[i]
		speed, err := strconv.ParseFloat(r[1], 64)
		if err != nil || math.Abs(c.Speed-speed) > 1e-12 || c.Aliases == nil ||
			strings.Join([]string{c.Name, r[1], c.Doodson, strconv.Itoa(c.Cycles), c.Nodes, strings.Join(c.Aliases, " "), c.Remark}, "|") != strings.Join(r, "|") {
			t.Errorf("JSON has %v, CSV %v", c, r)
		}
		line := lines(text)[i+1]
		if f := strings.Fields(line); f[0] != r[0] || f[1] != r[1] || f[2] != r[2] || f[3] != r[3] || !strings.Contains(line, r[4]) || !strings.HasSuffix(line, r[5]) {
			t.Errorf("text has %q, CSV %v", line, r)
		}
		if r[6] != "" && !strings.Contains(strings.Join(strings.Fields(text), " "), r[0]+": "+r[6]) {
			t.Errorf("the remark on %s is not in the text", r[0])
		}
	}
}

func TestListConstituentsFaults(t *testing.T) {
	for args, want := range map[string]string{
		"M2":           `"M2" is one argument too many: ebbleaf list constituents [flags] (ebbleaf list constituents --help tells more)`,
		"--format ics": `--format is "ics": it can be text, csv or json (ebbleaf list constituents --help tells more)`,
	} {
		o := ebbleaf(append([]string{"list", "constituents"}, strings.Fields(args)...)...)
		if o.code != exitUsage || o.out != "" || !strings.Contains(o.err, want) {
			t.Errorf("%s: status %d, %q, %q", args, o.code, o.out, o.err)
		}
	}
}
