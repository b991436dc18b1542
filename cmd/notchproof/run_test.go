package main

import (
	"bytes"
	"context"
	"encoding/json"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"notchproof/verify/specimen"
)

// program runs the command line as a user types it, words parted by spaces.
func program(t *testing.T, line string) (status int, stdout, stderr string) {
	t.Helper()
	var out, errs bytes.Buffer
	status = run(context.Background(), strings.Fields(line), &out, &errs)
	return status, out.String(), errs.String()
}

// TestExitStatuses runs every command to every exit status it has.
func TestExitStatuses(t *testing.T) {
	dir := t.TempDir()
	for _, row := range []struct {
		line   string
		status int
		out    string // stands in standard output
	}{
		{"check", exitAgrees, "verdict    agrees"},
		{"check shaft-shoulder D=72mm d=48mm r=3mm --load bending", exitAgrees, "tipton-1996"},
		{"check shaft-shoulder D=72mm d=48mm r=3mm --load bending --claim 1.85 --claim-from chart", exitDisagrees, "too low: unsafe"},
		{"check shaft-shoulder D=72mm d=48mm r=3mm --load bending --claim 2.6", exitDisagrees, "too high: safe side"},
		{"check shaft-shoulder D=72mm d=48mm r=3mm --load tension", exitDisagrees, "known bias"},
		{"check shaft-shoulder D=100 d=1 r=0.1 --load torsion", exitAgrees, "out of range"},
		{"check bar-shoulder D=60mm d=40mm r=4mm --load tension --target 1e-9", exitAgrees, "uncertainty"},
		{"check shaft-shoulder D=72mm d=48mm r=0 --load bending", exitUndecided, "Williams (1952) mode I −0.4555"},
		{"check shaft-shoulder D=72mm d=48mm r=0 --load torsion --claim 9", exitUndecided, "π/w − 1 = −0.3333"},
		{"picture bar-notch D=60mm d=40mm r=0 angle=60 --width 400 -o " + filepath.Join(dir, "q.png"), exitUndecided, "picture written"},
		{"parts bar-notch D=60mm d=40mm r=0 angle=60 -o " + filepath.Join(dir, "r.png"), exitAgrees, "no factor"},
		{"study shaft-shoulder D=72mm d=48mm r=0 -o " + filepath.Join(dir, "corner.png"), exitUndecided, "without bound"},
		{"study shaft-shoulder D=72mm d=48mm r=0.0005mm --size 4mm --load bending", exitUndecided, "larger than the root"},
		{"study shaft-shoulder D=72mm d=48mm r=0 --by order --load torsion", exitUndecided, "measured −0.333"},
		{"study bar-shoulder D=60mm d=40mm r=4mm --order 3 --rungs 3", exitAgrees, "grid convergence index"},
		{"study bar-shoulder D=60mm d=40mm r=4mm --by order -o " + filepath.Join(dir, "é_ü.png"), exitAgrees, "plot written"},
		{"study bar-shoulder D=60mm d=40mm r=4mm --order 3 --rungs 3 -o " + filepath.Join(dir, "s.svg"), exitAgrees, "plot written"},
		{"plot shaft-shoulder D=72mm d=48mm r=3mm --load bending -o " + filepath.Join(dir, "section.svg"), exitAgrees, "plot of the section written"},
		{"plot bar-hole W=60mm d=20mm --load tension --of surface --width 80mm -o " + filepath.Join(dir, "surface.png"), exitAgrees, "plot of the surface written"},
		{"plot shaft-shoulder D=72mm d=48mm r=3mm --load bending --claim 1.85 --of ladder -o " + filepath.Join(dir, "ladder.svg"), exitDisagrees, "plot of the ladder written"},
		{"plot bar-shoulder D=60mm d=40mm r=0 --load tension -o " + filepath.Join(dir, "corner.svg"), exitUndecided, "no factor and no plot"},
		{"parts shaft-groove -o " + filepath.Join(dir, "p.SVG"), exitAgrees, "sketch written"},
		{"picture bar-shoulder D=60mm d=40mm r=4mm --width 400 -o " + filepath.Join(dir, "p.png"), exitAgrees, "picture written"},
		{"picture shaft-groove D=60mm d=40mm r=4mm --load torsion --style fringe --width 80mm -o " + filepath.Join(dir, "f.png"), exitAgrees, "picture written"},
		{"picture bar-hole W=60mm d=20mm --load tension --field shear-xy --whole --mesh --width 3in --dpi 150 -o " + filepath.Join(dir, "h.png"), exitAgrees, "picture written"},
		{"parts", exitAgrees, "shaft-shoulder"},
		{"parts bar-shoulder", exitAgrees, "typical proportions"},
		{"parts bar-shoulder D=60mm d=40mm r=4mm -o " + filepath.Join(dir, "s.png"), exitAgrees, "sketch written"},
		{"selfcheck", exitAgrees, "all passed: 16 of 16 cases"},
		{"help", exitAgrees, "usage: notchproof COMMAND"},
		{"help check", exitAgrees, "Exit status"},
		{"study --help", exitAgrees, "--by"},
	} {
		status, out, errs := program(t, row.line)
		if status != row.status {
			t.Errorf("%s: exit status %d, want %d\n%s%s", row.line, status, row.status, out, errs)
		}
		if !strings.Contains(out, row.out) {
			t.Errorf("%s: %q does not stand in the output\n%s", row.line, row.out, out)
		}
		if errs != "" {
			t.Errorf("%s: standard error is not empty: %s", row.line, errs)
		}
	}
}

// TestBadInput: one clear line with the value, a hint, status 2, nothing on
// standard output and no file.
func TestBadInput(t *testing.T) {
	const part = "check shaft-shoulder "
	const good = "check shaft-shoulder D=72mm d=48mm r=3mm "
	for _, row := range []struct{ line, says, hint string }{
		{"", "usage", ""},
		{"chekc", `"chekc": no such command`, "did you mean check"},
		{"check shaft-sholder D=2", `"shaft-sholder": no such family`, "shaft-shoulder"},
		{part + "D=0 d=1 r=0.1", "D=0: must be greater than zero", ""},
		{part + "D=-3 d=1 r=0.1", "D=-3", ""},
		{part + "D=NaN d=1 r=0.1", `"NaN"`, "60mm"},
		{part + "D=2 d=1 r=Inf", `"Inf"`, "60mm"},
		{"check bar-notch D=2 d=1 r=0", "r=0: parallel flanks", "opening angle"},
		{"check bar-hole W=2 d=0", "d=0: must be greater than zero", ""},
		{part + "D=2 d=1 r=1e-9", "r=1e-09", "proportion"},
		{part + "D=1 d=2 r=0.1", "d=2: not smaller than D = 1", "net"},
		{part + "D=1e308 d=1e307 r=1e306", "1e+308", "unit"},
		{part + "D=1e-300 d=1e-301 r=1e-302", "1e-300", "unit"},
		{part + "D=72mm d=48 r=3mm", "d has none", "d=48mm"},
		{part + "D=72mm d=48mm", "r: missing", "[ra]"},
		{part + "D=72mm d=48mm r=3mm q=4", `"q": no such dimension`, "[ra]"},
		{part + "D=72mm d=48mm r=3furlong", "furlong", "mm"},
		{part + "D=72,5 d=48 r=3", "decimal comma", "72.5"},
		{part + "D=2 D=3 d=1 r=.1", "D: given twice", ""},
		{part + "D d r", `"D": not a dimension`, "name=value"},
		{part + "D=2 d=1 r=0.6 c=0.1", "r=0.6", "c"},
		{part + "D=2 d=1 r=0.2 c=0.5", "c=0.5", "chamfer"},
		{good + "--nu 0.5", `--nu "0.5"`, "0.3"},
		{good + "--nu x", `--nu "x"`, "0.3"},
		{good + "--claim 2", "--claim 2: for which load?", "--load"},
		{good + "--claim two --load tension", `"two"`, "1.85"},
		{good + "--claim -2 --load tension", `"-2"`, "1.85"},
		{good + "--claim-from chart", "--claim-from without --claim", "--claim"},
		{good + "--claim-tolerance 2%", "--claim-tolerance without --claim", "--claim"},
		{good + "--load tension --claim=", `--claim "": empty`, "leave the flag out"},
		{good + "--claim-mesh order=2,arc=6", "--claim-mesh without --claim", "--claim"},
		{good + "--claim 2 --load tension --claim-mesh order=3,arc=6", `order "3"`, "order=2,arc=6"},
		{good + "--claim 2 --load tension --claim-mesh order=2,arc=0", `arc "0"`, "2 to 200"},
		{good + "--claim 2 --load tension --claim-mesh order=2,arc=1e9", `arc "1e9"`, "2 to 200"},
		{good + "--claim 2 --load tension --claim-mesh order=2,arc=NaN", `arc "NaN"`, "2 to 200"},
		{good + "--claim 2 --load tension --claim-mesh order=2", "arc: missing", "order=2,arc=6"},
		{good + "--claim 2 --load tension --claim-mesh arc=4,arc=6", "arc: given twice", "order=2,arc=6"},
		{good + "--claim 2 --load tension --claim-mesh order=2,size=6", `"size": no such key`, "order=2,arc=6"},
		{good + "--claim 2 --load tension --claim-mesh fine", `"fine" is not a key`, "order=2,arc=6"},
		{good + "--load shear", `"shear"`, "tension, bending, torsion"},
		{good + "--target 0", `--target "0"`, "0.1%"},
		{good + "--bogus", "--bogus", "help check"},
		{good + "--force-line middle", `"middle"`, "gross"},
		{"study bar-shoulder D=60 d=40 r=4 --by magic", `--by "magic"`, "size or order"},
		{"study bar-shoulder D=60 d=40 r=4 --order 9", "--order 9", "1 to 8"},
		{"study bar-shoulder D=60 d=40 r=4 --size 1mm", `--size "1mm"`, "way of the part"},
		{"study bar-shoulder D=60 d=40 r=4 --size 0", `--size "0"`, "length"},
		{"study bar-shoulder D=60 d=40 r=4 --size nan", `--size "nan"`, "number"},
		{"study bar-shoulder D=60 d=40 r=4 --size 1e-5", "along the notch", ""},
		{"study bar-shoulder D=60 d=40 r=4 --size 1 --by order", "--size", "by order"},
		{"study bar-shoulder D=60 d=40 r=4 --rungs 2", "--rungs 2", "three"},
		{"study bar-shoulder D=60 d=40 r=4 --load tension,bending", "more than one", "one load"},
		{"picture bar-shoulder D=60 d=40 r=4", "no file", "-o"},
		{"picture bar-shoulder D=60 d=40 r=4 -o p.jpg", `"p.jpg"`, "format"},
		{"picture bar-shoulder D=60 d=40 r=4 -o no/such/folder/p.png", "folder", "make"},
		{"picture bar-shoulder D=60 d=40 r=4 -o p.png --width 3", "--width 3", "400"},
		{"picture bar-shoulder D=60 d=40 r=4 -o p.png --width 10mm", "--width 10mm", "400"},
		{"picture bar-shoulder D=60 d=40 r=4 -o p.png --width 16cubits", "--width", "160mm"},
		{"picture bar-shoulder D=60 d=40 r=4 -o p.png --dpi 5", "--dpi 5", "72"},
		{"picture bar-shoulder D=60 d=40 r=4 -o p.png --field sxx", `"sxx"`, "axial"},
		{"picture bar-shoulder D=60 d=40 r=4 -o p.png --field hoop", "hoop", "leave --field out"},
		{"picture shaft-shoulder D=60 d=40 r=4 --load torsion -o p.png --field axial", "axial", "leave --field out"},
		{"picture bar-shoulder D=60 d=40 r=4 -o p.png --style oil", `"oil"`, "fringe"},
		{"picture bar-shoulder D=60 d=40 r=4 -o p.png --style fringe --field mises", "mises", "leave --field out"},
		{"selfcheck bar-hole", `"bar-hole": takes no part`, "check PART"},
		{"plot bar-shoulder D=60 d=40 r=4", "no file", "-o"},
		{"plot bar-shoulder D=60 d=40 r=4 -o s.pdf", `"s.pdf"`, "ending"},
		{"plot bar-shoulder D=60 d=40 r=4 --of edge -o s.svg", `--of "edge"`, "ladder"},
		{"plot bar-shoulder D=60 d=40 r=4 --width wide -o s.svg", `--width "wide"`, "160mm"},
		{"plot bar-shoulder D=60 d=40 r=4 --width 5mm -o s.svg", "--width 5mm", "400"},
		{"study bar-shoulder D=60 d=40 r=4 --width 80mm --dpi 10 -o s.png", "--dpi 10", "300"},
		{"check bar-hole W=60mm d=20mm --load=", `--load "": empty`, "leave the flag out"},
		{good + "--load tension --target=", `--target "": empty`, "leave the flag out"},
		{"study bar-shoulder D=60mm d=40mm r=4mm --order=8 --rungs=6", "rung 5 would have about", "fewer rungs"},
		{"help check study", `help "check study"`, "notchproof help check"},
		{"CHECK", `"CHECK": no such command`, "did you mean check"},
		{"picture bar-hole W=60mm d=20mm -o " + strings.Repeat("p", 300) + ".png", "cannot be written", "another name"},
		{"parts bar-sholder", "no such family", "bar-shoulder"},
		{"parts -o s.png", "no family", "shaft-shoulder"},
	} {
		status, out, errs := program(t, row.line)
		if status != exitUsage {
			t.Errorf("%s: exit status %d, want 2", row.line, status)
		}
		if out != "" {
			t.Errorf("%s: standard output is not empty: %s", row.line, out)
		}
		lines := strings.Split(strings.TrimSuffix(errs, "\n"), "\n")
		if row.line != "" && (len(lines) > 2 || !strings.HasPrefix(lines[0], "notchproof: ") || len(lines) == 2 && !strings.HasPrefix(lines[1], "hint: ")) {
			t.Errorf("%s: want one line and a hint, got\n%s", row.line, errs)
		}
		if !strings.Contains(errs, row.says) || !strings.Contains(errs, row.hint) {
			t.Errorf("%s: want %q and %q in\n%s", row.line, row.says, row.hint, errs)
		}
	}
	for _, name := range []string{"p.png", "p.jpg", "s.png", "s.svg"} {
		if _, err := os.Stat(name); err == nil {
			t.Errorf("%s was written by a run that failed", name)
		}
	}
}

// TestInterrupted: a run that is broken off says so, with its own status.
func TestInterrupted(t *testing.T) {
	ctx, cancel := context.WithCancel(context.Background())
	cancel()
	var out, errs bytes.Buffer
	status := run(ctx, strings.Fields("check shaft-shoulder D=72mm d=48mm r=3mm"), &out, &errs)
	if status != exitInterrupted || out.String() != "" || errs.String() != "interrupted\n" {
		t.Errorf("exit status %d, %q, %q", status, out.String(), errs.String())
	}
}

// TestJSONContract holds the names, types and meaning of the object that
// others read. Numbers are held to the bar of the factor, not to bits.
func TestJSONContract(t *testing.T) {
	status, out, errs := program(t, "check shaft-shoulder D=72mm d=48mm r=3mm --claim 1.85 --claim-from chart --load bending --json")
	if status != exitDisagrees || errs != "" {
		t.Fatalf("exit status %d, %s", status, errs)
	}
	golden, err := os.ReadFile("testdata/check.json")
	if err != nil {
		t.Fatal(err)
	}
	var got, want any
	if err := json.Unmarshal([]byte(out), &got); err != nil {
		t.Fatal(err)
	}
	if err := json.Unmarshal(golden, &want); err != nil {
		t.Fatal(err)
	}
	before := t.Failed()
	sameShape(t, "", got, want)
	if t.Failed() && !before {
		file := filepath.Join("testdata", "check.got.json")
		if err := os.WriteFile(file, []byte(out), 0o644); err == nil {
			t.Logf("what was printed is left in %s", file)
		}
	}
	root := got.(map[string]any)
	result := root["results"].([]any)[0].(map[string]any)
	computed := result["computed"].(map[string]any)
	claim := result["claim"].(map[string]any)
	factor := computed["factor"].(float64)
	if d := claim["difference"].(float64); math.Abs(d-(1.85-factor)/factor) > 1e-12 {
		t.Errorf("difference %g is not (claim − computed) ÷ computed", d)
	}
	if tol := claim["tolerance"].(float64); math.Abs(tol-(0.005+0.03*1.85)) > 1e-12 {
		t.Errorf("tolerance %g is not half a last digit plus 3 %%", tol)
	}
}

// sameShape compares keys, types and texts exactly and numbers to 1e-3 of the
// golden ones; numbers below 1e-6 are rounding and only need to stay so.
func sameShape(t *testing.T, path string, got, want any) {
	t.Helper()
	switch w := want.(type) {
	case map[string]any:
		g, ok := got.(map[string]any)
		if !ok || len(g) != len(w) {
			t.Errorf("%s: keys %v, want %v", path, keys(got), keys(want))
			return
		}
		for k := range w {
			if _, ok := g[k]; !ok {
				t.Errorf("%s.%s is missing", path, k)
				continue
			}
			sameShape(t, path+"."+k, g[k], w[k])
		}
	case []any:
		g, ok := got.([]any)
		if !ok || len(g) != len(w) {
			t.Errorf("%s: not a list of %d", path, len(w))
			return
		}
		for i := range w {
			sameShape(t, path+"[]", g[i], w[i])
		}
	case float64:
		g, ok := got.(float64)
		if !ok || math.Abs(g-w) > 1e-3*math.Abs(w)+1e-6 && !(strings.HasSuffix(path, "[].value") || strings.HasSuffix(path, ".uncertainty")) {
			t.Errorf("%s: %v, want %v", path, got, want)
		}
	default:
		if got != want {
			t.Errorf("%s: %v, want %v", path, got, want)
		}
	}
}

func keys(v any) (list []string) {
	m, _ := v.(map[string]any)
	for k := range m {
		list = append(list, k)
	}
	return list
}

// TestLastDigit: one unit of the last digit as the number was written.
func TestLastDigit(t *testing.T) {
	for text, want := range map[string]float64{"1.85": 0.01, "2": 1, "2.0": 0.1, "1.850": 0.001, "18e-1": 0.1, "1.85e1": 0.1} {
		if got := specimen.LastDigit(text); math.Abs(got/want-1) > 1e-12 {
			t.Errorf("%s: %g, want %g", text, got, want)
		}
	}
}
