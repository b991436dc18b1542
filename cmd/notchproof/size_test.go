package main

import (
	"encoding/json"
	"math"
	"os"
	"path/filepath"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"notchproof/verify/sizing"
)

// TestSizeAndToleranceStatuses runs both commands to every exit status that a
// good part can give.
func TestSizeAndToleranceStatuses(t *testing.T) {
	dir := t.TempDir()
	file := filepath.Join(dir, "seat.json")
	part := `{"title": "seat", "shape": {"family": "shaft-shoulder", "D": "72mm", "d": "48mm", "r": "3mm"}, "loads": ["torsion"]}`
	if err := os.WriteFile(file, []byte(part), 0o644); err != nil {
		t.Fatal(err)
	}
	for _, row := range []struct {
		line   string
		status int
		out    string
	}{
		{"size shaft-shoulder D=72mm d=48mm --kt 1.5 --load torsion", exitAgrees, "where Kts = "},
		{"size shaft-shoulder D=72mm d=48mm r=3mm --kt 1 --load torsion", exitNotMet, "no r meets it"},
		{"size shaft-shoulder D=72mm d=48mm r=3mm --kt 100 --load torsion", exitAgrees, "every r"},
		{"size shaft-shoulder D=72mm d=48mm r=0 --kt 1.5 --load torsion --bare", exitAgrees, "where Kts = "},
		{"size shaft-shoulder D=72mm d=48mm --stress 150MPa --load torsion --nominal 100MPa --bare", exitAgrees, "MPa nominal"},
		{"size shaft-shoulder D=72mm d=48mm --safety 2 --torque 900N·m --yield 25ksi --bare", exitAgrees, "a safety of 2 against"},
		{"size shaft-shoulder D=72mm d=48mm r=3mm --kt 1.4 --load torsion", exitAgrees, "elliptic fillet"},
		{"size " + file + " --kt 1.5", exitAgrees, "seat\n"},
		{"size shaft-groove D=60 d=50 r=2 --for angle --kt 1.7 --load torsion", exitAgrees, "°"},
		{"tolerance shaft-shoulder D=72mm d=48mm r=3mm r=±0.2mm --load torsion", exitAgrees, "by r"},
		{"tolerance " + file + " r=+-0.2mm d=+0.05/-0", exitAgrees, "d +0.05/0"},
		{"tolerance bar-hole W=60 d=20 e=0 e=+/-3 --load tension", exitAgrees, "no corner"},
	} {
		status, out, errs := program(t, row.line)
		if status != row.status || errs != "" || !strings.Contains(out, row.out) {
			t.Errorf("%s: exit status %d, want %d with %q\n%s%s", row.line, status, row.status, row.out, out, errs)
		}
	}
}

// TestSizeAndToleranceRefuse: one clear line with the value, a hint, status 2.
func TestSizeAndToleranceRefuse(t *testing.T) {
	const size = "size shaft-shoulder D=72mm d=48mm "
	const good = "tolerance shaft-shoulder D=72mm d=48mm r=3mm "
	own := "../../testdata/parts/slotted-link.json"
	for _, row := range []struct{ line, says, hint string }{
		{"size", "no part", "shaft-shoulder"},
		{size, "nothing to meet", "--kt"},
		{size + "--kt 1.8", "which load", "bending"},
		{size + "--kt 1.8 --load torsion,bending", "which load", "bending"},
		{size + "--kt two --load torsion", `"two"`, "1.8"},
		{size + "--kt -1 --load torsion", `"-1"`, "1.8"},
		{size + "--kt NaN --load torsion", `"NaN"`, "1.8"},
		{size + "--kt 1.8 --for q --load torsion", `--for "q": no such dimension`, "[ra]"},
		{size + "--kt 1.8 --for d --load torsion", "r: missing", "[ra]"},
		{"size bar-hole W=60 --kt 2 --load tension", "which dimension", "--for"},
		{"size shaft-shoulder D=48mm d=72mm --kt 1.8 --load torsion", "d=72: not smaller", "net"},
		{"size " + own + " --kt 1.8", "no named dimensions", "family"},
		{size + "--kt 1.8 --safety 2", "--kt and --safety", "one of"},
		{size + "--stress 100MPa", "no load", "--axial"},
		{size + "--stress 100MPa --load torsion", "at which nominal stress", "--nominal"},
		{size + "--stress 100MPa --load torsion --torque 3N·m", "--load with --stress", "leave"},
		{size + "--stress 100 --load torsion --nominal 3MPa", `"100": no unit`, "MPa"},
		{size + "--stress -100MPa --load torsion --nominal 3MPa", "not above zero", "120MPa"},
		{size + "--nominal 3MPa", "--nominal without --stress", "--stress"},
		{size + "--kt 2 --torque 3N·m", "a factor needs none", "--safety"},
		{size + "--safety 2 --torque 3N·m", "no yield", "--yield"},
		{"size shaft-shoulder D=72mm r=3mm --for d --stress 100MPa --load torsion --nominal 3MPa", "of which d?", "give d"},
		{"size shaft-shoulder D=72 d=48 --safety 2 --torque 3N·m --yield 355MPa", "no unit", "72mm"},
		{"size bar-hole W=60mm d=70mm --for d --kt 2.6 --load tension", "d=70", "diameter"},
		{good, "no tolerances", "±"},
		{good + "r=+0.2", `"r=+0.2": one deviation alone`, "/-0"},
		{good + "r=±x", `"x"`, ""},
		{good + "r=±0", "without width", "±0.2"},
		{good + "r=+0/-0", "without width", "±0.2"},
		{good + "r=±0.1 r=±0.2", "second tolerance of r", "once"},
		{good + "q=±0.1", `"q": no such dimension`, "[ra]"},
		{good + "ra=±0.1", "not given", "ra"},
		{good + "r=±3mm", "allow r=0mm, which has no factor", "narrow"},
		{good + "r=±4mm", "allow r=-1mm, which has no factor", "narrow"},
		{"tolerance shaft-shoulder D=72 d=48 r=0 d=±1", "sharp corner", "radius"},
		{"tolerance shaft-shoulder D=72 d=48 r=3 r=±1mm", "the dimensions have none", "leave"},
		{"tolerance " + own + " r=±0.1", "no named dimensions", "family"},
	} {
		status, out, errs := program(t, row.line)
		lines := strings.Split(strings.TrimSuffix(errs, "\n"), "\n")
		if status != exitUsage || out != "" || len(lines) > 2 {
			t.Errorf("%s: exit status %d\n%s%s", row.line, status, out, errs)
		}
		if !strings.Contains(lines[0], row.says) || row.hint != "" && !strings.Contains(lines[len(lines)-1], row.hint) {
			t.Errorf("%s: want %q and %q in\n%s", row.line, row.says, row.hint, errs)
		}
	}
}

// TestDeviations: every way of writing them.
func TestDeviations(t *testing.T) {
	family, _ := familyOf("shaft-groove")
	s := &shape{family: family, dims: map[string]float64{"D": 60, "d": 50, "r": 2, "angle": 60}, unit: "mm"}
	for word, want := range map[string][2]float64{
		"r=±0.2mm": {-0.2, 0.2}, "r=+-0.2mm": {-0.2, 0.2}, "r=+/-0.2": {-0.2, 0.2}, "r=±1/64in": {-0.396875, 0.396875},
		"r=+0.3/-0": {0, 0.3}, "r=+0.3mm/-0.1mm": {-0.1, 0.3}, "r=+0.3/-0.1mm": {-0.1, 0.3}, "r=-0.1/+0.3": {-0.1, 0.3},
		"r=+0.3/+0.1": {0.1, 0.3}, "r=-0.1/−0.3mm": {-0.3, -0.1}, "r=+1/64in/-0": {0, 0.396875},
		"r=+0.2/0": {0, 0.2}, "r=0/-0.2": {-0.2, 0}, "r=+0.2mm/0mm": {0, 0.2}, "r=±20µm": {-0.02, 0.02}, "r=+20um/0": {0, 0.02},
		"angle=±2": {-2, 2}, "angle=+2/0": {0, 2}, "angle=+2deg/-1": {-1, 2},
	} {
		d, err := s.deviation(word)
		if !isDeviation(word) || err != nil || math.Abs(d.Lower-want[0]) > 1e-12 || math.Abs(d.Upper-want[1]) > 1e-12 {
			t.Errorf("%s: %+v, %v, want %v", word, d, err, want)
		}
	}
	for _, word := range []string{"r=3mm", "e=-3", "r=1/64in", "r", "r=+1/64in", "r=-1-1/4in", "r=0/0", "r=0/3in", "r=+0.2/", "r=/0"} {
		if isDeviation(word) {
			t.Errorf("%s is taken for a tolerance", word)
		}
	}
}

// TestSizeNamesTheUnsettled: in one line, and only where there are any.
func TestSizeNamesTheUnsettled(t *testing.T) {
	var s sizeQuestion
	var b strings.Builder
	if s.unsettledText(&b, style{}); b.Len() > 0 {
		t.Errorf("nothing to say, but %q", b.String())
	}
	for _, what := range []string{"undercut", "chamfer"} {
		s.unsettled = append(s.unsettled, sizing.Alternative{What: what, Reading: sizing.Reading{Why: "too steep"}})
	}
	if s.unsettledText(&b, style{}); b.String() != "  warning not settled: undercut (too steep); chamfer (too steep)\n" {
		t.Errorf("%q", b.String())
	}
}

// TestSizeJSON holds the names that others read, and the bar against the factor's.
func TestSizeJSON(t *testing.T) {
	_, out, _ := program(t, "size shaft-shoulder D=72mm d=48mm --kt 1.5 --load torsion --json")
	var got struct {
		Schema                       int
		Dimension, Unit, Outcome     string
		Value, Factor, Uncertainty   float64
		ValueUncertainty             float64
		Rounded                      struct{ Value, Factor, Uncertainty float64 }
		Alternatives, Scanned, Keeps []any
	}
	if err := json.Unmarshal([]byte(out), &got); err != nil {
		t.Fatal(err)
	}
	if got.Schema != 1 || got.Dimension != "r" || got.Unit != "mm" || got.Outcome != "met" || got.Alternatives == nil ||
		math.Abs(got.Factor-1.5) > got.Uncertainty || !(got.Rounded.Factor+got.Rounded.Uncertainty <= 1.5) || !(got.Rounded.Value > got.Value+got.ValueUncertainty) {
		t.Errorf("%+v", got)
	}
	_, out, _ = program(t, "size shaft-shoulder D=72mm d=48mm --kt 1 --load torsion --json")
	if !strings.Contains(out, `"value": null`) || !strings.Contains(out, `"outcome": "notMet"`) || !strings.Contains(out, `"best": {`) {
		t.Errorf("a value where nothing meets the limit\n%s", out)
	}
}

// The factor that the answer stands at is the one asked for, within its bar.
func TestSizeStandsAtTheFactor(t *testing.T) {
	status, out, errs := program(t, "size shaft-shoulder D=72mm d=48mm --kt 1.5 --load torsion --bare")
	at := regexp.MustCompile(`answer .* where Kts\s*=[\s\x{a0}]*([0-9.]+)[\s\x{a0}]*±[\s\x{a0}]*([0-9.]+)`).FindStringSubmatch(out)
	if status != exitAgrees || errs != "" || at == nil {
		t.Fatalf("exit status %d\n%s%s", status, out, errs)
	}
	factor, _ := strconv.ParseFloat(at[1], 64)
	bar, _ := strconv.ParseFloat(at[2], 64)
	if math.Abs(factor-1.5) > bar || bar > 1.5e-3 {
		t.Errorf("the answer stands at %g ± %g, asked for 1.5", factor, bar)
	}
}
