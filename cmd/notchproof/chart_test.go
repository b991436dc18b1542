package main

import (
	"bytes"
	"context"
	"encoding/csv"
	"encoding/json"
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"testing"
)

const smallChart = "chart shaft-groove --load torsion --along r/D=0.03:0.09:3 --curves d/D=0.7,0.9 "

// TestChartSharesJoin: shares from several runs, joined, are the table of one
// run, byte for byte; a part that is missing is named.
func TestChartSharesJoin(t *testing.T) {
	dir := t.TempDir()
	at := func(name string) string { return filepath.Join(dir, name) }
	for _, row := range []struct {
		line   string
		status int
		says   string
	}{
		{smallChart + "--bare -o " + at("whole.csv"), exitAgrees, "written to"},
		{smallChart + "--share 1/2 -o " + at("a.csv"), exitAgrees, "–"},
		{"chart --join " + at("a.csv") + " -o " + at("half.csv"), exitUndecided, "none while points are missing"},
		{smallChart + "--share 2/2 --csv " + at("b.csv"), exitAgrees, ""},
		{"chart --join " + at("b.csv") + " " + at("a.csv") + " -o " + at("c.csv") + " -o " + at("c.svg") + " -o " + at("c.png"), exitAgrees, "Kts = "},
	} {
		status, out, errs := program(t, row.line)
		if status != row.status || !strings.Contains(out, row.says) {
			t.Fatalf("%s: exit status %d\n%s%s", row.line, status, out, errs)
		}
	}
	want, _ := os.ReadFile(at("whole.csv"))
	if got, _ := os.ReadFile(at("c.csv")); len(want) == 0 || !bytes.Equal(got, want) {
		t.Errorf("joined\n%s\nin one run\n%s", got, want)
	}
	if half, _ := os.ReadFile(at("half.csv")); len(half) >= len(want) {
		t.Error("half of the points make the whole table")
	}
}

// TestChartGoesOn: a run that was interrupted is gone on with by the same words;
// the exit status and what is left behind are those of an interrupted run.
func TestChartGoesOn(t *testing.T) {
	dir := t.TempDir()
	whole, stopped := filepath.Join(dir, "whole.csv"), filepath.Join(dir, "stopped.csv")
	if status, out, errs := program(t, smallChart+"--bare -o "+whole); status != exitAgrees {
		t.Fatalf("exit status %d\n%s%s", status, out, errs)
	}
	want, err := os.ReadFile(whole)
	if err != nil {
		t.Fatal(err)
	}
	ctx, stop := context.WithCancel(context.Background())
	stop()
	var out, errs bytes.Buffer
	words := append(strings.Fields(smallChart), "-o", stopped, "-o", filepath.Join(dir, "stopped.png"))
	if status := run(ctx, words, &out, &errs); status != exitInterrupted || out.Len() > 0 {
		t.Fatalf("exit status %d\n%s%s", status, &out, &errs)
	}
	if _, err := os.Stat(filepath.Join(dir, "stopped.png")); err == nil {
		t.Error("an interrupted run left a picture")
	}
	// All but the last point and a half.
	if err := os.WriteFile(stopped, want[:len(want)-150], 0o644); err != nil {
		t.Fatal(err)
	}
	status, _, said := program(t, smallChart+"--bare -o "+stopped)
	if got, _ := os.ReadFile(stopped); status != exitAgrees || !bytes.Equal(got, want) {
		t.Errorf("exit status %d; gone on with\n%s\nin one run\n%s", status, got, want)
	}
	if !strings.Contains(said, "cut off") || !strings.Contains(said, "of 6 points") {
		t.Errorf("said %q", said)
	}
}

// TestChartManual: the examples of the manual are good questions; they are
// interrupted before any work is done.
func TestChartManual(t *testing.T) {
	t.Chdir(t.TempDir())
	ctx, stop := context.WithCancel(context.Background())
	stop()
	examples := 0
	for _, line := range strings.Split(chartCommand().long, "\n") {
		words, ok := strings.CutPrefix(line, "  notchproof chart ")
		if !ok || strings.HasPrefix(words, "--join") {
			continue
		}
		examples++
		var out, errs bytes.Buffer
		if status := run(ctx, append([]string{"chart"}, strings.Fields(words)...), &out, &errs); status != exitInterrupted {
			t.Errorf("%s: exit status %d\n%s", line, status, &errs)
		}
	}
	if examples < 3 {
		t.Errorf("%d examples", examples)
	}
}

// TestChartGaps: a point that is undecided is a gap, named, and makes the exit
// status that of an undecided check.
func TestChartGaps(t *testing.T) {
	dir := t.TempDir()
	file, drawn := filepath.Join(dir, "t.csv"), filepath.Join(dir, "t.svg")
	words := strings.Replace(smallChart, ":3", ":5", 1)
	if status, _, errs := program(t, words+"--bare -o "+file); status != exitAgrees {
		t.Fatal(errs)
	}
	data, err := os.ReadFile(file)
	if err != nil {
		t.Fatal(err)
	}
	lines := strings.SplitAfter(string(data), "\r\n")
	third := strings.Split(lines[len(lines)-4], ",")
	third[2], third[3], third[4], third[5] = "", "", "undecided", "\"the ladder, it seems, has not converged\""
	lines[len(lines)-4] = strings.Join(third, ",")
	if err := os.WriteFile(file, []byte(strings.Join(lines, "")), 0o644); err != nil {
		t.Fatal(err)
	}
	for _, line := range []string{words + "-o " + file + " -o " + drawn, "chart --join " + file + " -o " + drawn} {
		status, out, _ := program(t, line)
		if status != exitUndecided || !strings.Contains(out, "undecided  r/D = 0.0519615, d/D = 0.9: the ladder, it seems") || !strings.Contains(out, "Kts = ") {
			t.Errorf("%s: exit status %d\n%s", line, status, out)
		}
		if picture, _ := os.ReadFile(drawn); !bytes.Contains(picture, []byte("1 undecided and left")) {
			t.Errorf("%s: the picture does not tell of the gap", line)
		}
	}
}

// TestChartTableIsCSV reads the table as any reader of RFC 4180 with comments
// does, and holds the object of --json against it.
func TestChartTableIsCSV(t *testing.T) {
	dir := t.TempDir()
	file, part := filepath.Join(dir, "t.csv"), filepath.Join(dir, "part.json")
	if err := os.WriteFile(part, []byte(`{"title": "thruster shaft", "shape": {"family": "shaft-shoulder", "D": "72mm", "d": "48mm"}, "loads": ["torsion"]}`), 0o644); err != nil {
		t.Fatal(err)
	}
	status, out, errs := program(t, "chart "+part+" --along r=1mm,4mm,50mm,10000mm --json -o "+file)
	if status != exitAgrees || errs != "" {
		t.Fatalf("exit status %d\n%s", status, errs)
	}
	var object struct {
		Schema       int
		Family, Load string
		Along        string
		Curves       []struct {
			Value  *float64
			Points []struct {
				X                   float64
				Factor, Uncertainty *float64
				Status, Note        string
				Handbook            map[string]float64
			}
		}
		Fit *struct{}
	}
	if err := json.Unmarshal([]byte(out), &object); err != nil {
		t.Fatal(err)
	}
	if object.Schema != 1 || object.Family != "shaft-shoulder" || object.Load != "torsion" || object.Along != "r" || len(object.Curves) != 1 || object.Curves[0].Value != nil || object.Fit != nil {
		t.Errorf("%s", out)
	}
	data, err := os.ReadFile(file)
	if err != nil {
		t.Fatal(err)
	}
	r := csv.NewReader(bytes.NewReader(data))
	r.Comment = '#'
	rows, err := r.ReadAll()
	if err != nil || len(rows) != 5 {
		t.Fatalf("%v, %d records\n%s", err, len(rows), data)
	}
	if got := strings.Join(rows[0][:5], ","); got != "r,factor,uncertainty,status,note" || len(rows[0]) < 6 {
		t.Errorf("columns %s", rows[0])
	}
	read := func(text string) float64 {
		v, err := strconv.ParseFloat(text, 64)
		if err != nil {
			t.Error(err)
		}
		return v
	}
	for i, p := range object.Curves[0].Points {
		row := rows[i+1]
		if read(row[0]) != p.X || row[3] != p.Status {
			t.Errorf("%v and %v", row, p)
		}
		if p.Status == "settled" && (read(row[1]) != *p.Factor || read(row[2]) != *p.Uncertainty) || p.Status != "settled" && (row[1] != "" || row[4] == "") {
			t.Errorf("%v and %v", row, p)
		}
		for k, id := range rows[0][5:] {
			if v, ok := p.Handbook[id]; ok != (row[5+k] != "") || ok && read(row[5+k]) != v {
				t.Errorf("%s: %v and %v", id, row, p)
			}
		}
	}
	if last := object.Curves[0].Points[3]; last.Status != "notDrawn" || last.Factor != nil || object.Curves[0].Points[0].Status != "settled" {
		t.Errorf("%s", out)
	}
}

// TestChartRefuses: one clear line with the value, a hint, status 2, and nothing
// written.
func TestChartRefuses(t *testing.T) {
	dir := t.TempDir()
	at := func(name string) string { return filepath.Join(dir, name) }
	if status, _, errs := program(t, smallChart+"--bare -o "+at("good.csv")); status != exitAgrees {
		t.Fatal(errs)
	}
	good, err := os.ReadFile(at("good.csv"))
	if err != nil {
		t.Fatal(err)
	}
	lines := strings.SplitAfter(string(good), "\r\n")
	write := func(name, text string) {
		if err := os.WriteFile(at(name), []byte(text), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	write("other.csv", strings.Replace(string(good), "nu 0.3", "nu 0.29", 1))
	write("off.csv", strings.Replace(string(good), ",0.7,2.", ",0.7,7.", 1))
	write("place.csv", strings.Replace(string(good), "\r\n0.03,", "\r\n0.031,", 1))
	write("status.csv", strings.Replace(string(good), "settled", "perhaps", 1))
	write("quote.csv", strings.Join(lines[:len(lines)-2], "")+"0.03,\"0.7,1\r\n")
	write("columns.csv", strings.Replace(string(good), "factor", "value", 1))
	write("head.csv", lines[0]+lines[1])
	write("grown.csv", strings.Replace(string(good), ":3\r", ":1000000000\r", 1))
	const step = "chart shaft-shoulder --load bending "
	const ratios = step + "--along r/d=0.02:0.3 --curves D/d=1.5 "
	for _, row := range []struct{ line, says, hint string }{
		{"chart", "no part", "shaft-shoulder"},
		{step, "along what", "--along r/d"},
		{"chart shaft-shoulder --along r/d=0.1:0.2 --curves D/d=2", "which load", "torsion"},
		{"chart shaft-shoulder --load torsion,bending --along r/d=0.1:0.2 --curves D/d=2", "which load", "torsion"},
		{step + "--along r/d=0:1 --curves D/d=1.5", "r/d cannot be zero", "above zero"},
		{step + "--along r/d=-1:1 --curves D/d=1.5", "-1 is below zero", "above zero"},
		{step + "--along r/d=0.3:0.02 --curves D/d=1.5", "does not rise", "smaller end"},
		{step + "--along r/d=0.02:0.3:1000000000 --curves D/d=1.5", `"1000000000" points`, "200"},
		{step + "--along r/d=0.02:0.3:1 --curves D/d=1.5", `"1" points`, "200"},
		{step + "--along r/d=0.02:0.3:5:6 --curves D/d=1.5", "neither a range nor a list", "r/d="},
		{step + "--along r/d=NaN:0.3 --curves D/d=1.5", `"NaN"`, ""},
		{step + "--along r/d=1e-300:1e300 --curves D/d=1.5", "no point of the chart", "ranges"},
		{step + "--along r/d=0.02mm:0.3 --curves D/d=2", "a ratio has no unit", "unit"},
		{step + "--along q/d=0.02:0.3 --curves D/d=1.5", `"q/d": no such dimension`, "[ra]"},
		{step + "--along r/r=0.02:0.3 --curves D/d=1.5", "1 for every shape", "r/d"},
		{step + "--along r/d=0.02,0.02 --curves D/d=1.5", "0.02 twice", "once"},
		{step + "--along r/d=0.02:0.3", "D, the larger diameter: not settled", "ratio"},
		{step + "--along ra/r=1:2 --curves D/d=1.5", "D, d: not settled", "ratio"},
		{step + "--along r=1:3mm --curves D/d=1.5", "D, d: not settled", "ratio"},
		{ratios + "d=40mm D=60mm", "D/d: the shape is settled without it", "leave"},
		{ratios + "d=40mm d=41mm", "d: given twice", "once"},
		{ratios + "stray", `"stray": not a dimension`, "name=value"},
		{step + "--along r=1:6mm --curves D=60,70 d=50mm", "r has a unit and D has none", "60mm"},
		{step + "--along r/d=0.02:0.3 --curves D/d=0.5,0.6", "no point of the chart can be drawn", "ranges"},
		{ratios + "--share 3/2 -o " + at("x.csv"), `--share "3/2"`, "1/3"},
		{ratios + "--share 1/2x -o " + at("x.csv"), `--share "1/2x"`, "1/3"},
		{ratios + "--share 1/2", "--share without a table", ".csv"},
		{ratios + "--share 1/2 -o " + at("x.png"), "no chart yet", "joined"},
		{ratios + "-o " + at("x.png") + " -o " + at("x.png"), "given twice", "once"},
		{ratios + "-o " + at("x.csv") + " --csv " + at("y.csv"), "more than one table", "one"},
		{ratios + "-o " + at("x.gif"), "not a name that ends in", "format"},
		{ratios + "--within 0", `--within "0"`, "1%"},
		{ratios + "--target 2", `--target "2"`, "0.1%"},
		{smallChart + "--nu 0.29 -o " + at("good.csv"), "another question: nu 0.3, not nu 0.29", "name another"},
		{smallChart + "-o " + at("columns.csv"), "its columns are not", "by hand"},
		{"chart --join", "--join without tables", "a.csv"},
		{"chart --join " + at("good.csv") + " --along r/d=1:2", "the tables have theirs", "leave"},
		{"chart --join " + at("good.csv") + " " + at("other.csv"), "nu 0.29, not nu 0.3", "same words"},
		{"chart --join " + at("good.csv") + " " + at("off.csv"), "exclude each other", "again"},
		{"chart --join " + at("place.csv"), "line 10: r/D = 0.031, d/D = 0.7 is no point", "remove"},
		{"chart --join " + at("status.csv"), `"perhaps": no such status`, "remove"},
		{"chart --join " + at("quote.csv"), "not the table of a chart", "remove"},
		{"chart --join " + at("head.csv"), "family with a load", "chart wrote"},
		{"chart --join " + at("grown.csv"), "question cannot be read", "by hand"},
		{"chart --join " + at("none.csv"), "no such file", "chart wrote"},
		{"chart ../../testdata/parts/slotted-link.json --along r/d=1:2", "no named dimensions", "family"},
	} {
		status, out, errs := program(t, row.line)
		text := strings.Split(strings.TrimSuffix(errs, "\n"), "\n")
		if status != exitUsage || out != "" || len(text) > 2 {
			t.Errorf("%s: exit status %d\n%s%s", row.line, status, out, errs)
		}
		if !strings.Contains(text[0], row.says) || row.hint != "" && !strings.Contains(text[len(text)-1], row.hint) {
			t.Errorf("%s: want %q and %q in\n%s", row.line, row.says, row.hint, errs)
		}
	}
	if got, _ := os.ReadFile(at("good.csv")); !bytes.Equal(got, good) {
		t.Error("a table was changed by a question that it does not answer")
	}
	for _, name := range []string{"x.csv", "x.png", "y.csv"} {
		if _, err := os.Stat(at(name)); err == nil {
			t.Errorf("%s was written", name)
		}
	}
}
