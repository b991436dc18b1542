package main

import (
	"encoding/json"
	"fmt"
	"math"
	"os"
	"path/filepath"
	"regexp"
	"strconv"
	"strings"
	"testing"

	"notchproof/fem"
	"notchproof/verify/quantity"
	"notchproof/verify/specimen"
	"notchproof/verify/strength"
)

const (
	strongShaft = "strength shaft-shoulder D=72mm d=48mm r=3mm "
	strongBar   = "strength bar-shoulder D=60mm d=40mm r=5mm "
)

// TestStrengthStatuses runs the command to every exit status it has.
func TestStrengthStatuses(t *testing.T) {
	sharp := filepath.Join(t.TempDir(), "sharp.json")
	if err := os.WriteFile(sharp, []byte(`{"shape": {"model": "shaft", "unit": "mm", "outline": "M -120 0 H 90 V 20 H 0 V 30 H -120 Z"},
		"forces": {"bending": "1kNm"}, "material": {"yield": 300}}`), 0o644); err != nil {
		t.Fatal(err)
	}
	for _, row := range []struct {
		line   string
		status int
		says   []string
	}{
		{strongShaft + "--bending 300N·m --yield 355MPa", exitAgrees, []string{"none asked for", "governs", "An elastic factor is not an approval"}},
		{strongShaft + "--bending 300Nm --torque 450N*m --axial -12kN --yield 355MPa --safety 1.8", exitAgrees, []string{"1.8: met", "conservative", "176° around"}},
		{strongShaft + "--bending 2kN·m --yield 355MPa --safety 1.8", exitNotMet, []string{"1.8: not met", "may be shed"}},
		{strongBar + "--axial 20kN --thickness 8mm --yield 51ksi --tensile 74ksi", exitAgrees, []string{"ksi", "Neuber", "unchecked"}},
		{strongBar + "--axial -90kN --thickness 8mm --tensile 250MPa --brittle --safety 1.5", exitUndecided, []string{"undecided", "compressive strength"}},
		{strongBar + "--axial 9kN --thickness 8mm --tensile 250MPa --elongation 1% --metal grey-iron", exitAgrees, []string{"brittle", "largest principal stress"}},
		{"strength ../../testdata/parts/thruster-shaft-step.json", exitNotMet, []string{"1.8: not met"}},
		{"strength ../../testdata/parts/thruster-shaft-step.json --safety 1.4", exitAgrees, []string{"1.4: met"}},
		{"strength ../../testdata/parts/undercut-bearing-seat.json --bending 900N·m", exitAgrees, []string{"2.0 to 2.5 and more", "no chart covers", "none in range"}},
		{"strength ../../testdata/parts/hatch-hanger-plate.json --axial 40kN --bending -300N·m --thickness 12mm --yield 235MPa", exitAgrees, []string{"but the peaks lie apart", "conservative"}},
		{"strength " + sharp, exitUndecided, []string{"undecided", "no radius"}},
		{"strength " + sharp + " --json", exitUndecided, []string{`"decision": "undecided"`}},
		{"help strength", exitAgrees, []string{"--axial", "Exit status"}},
	} {
		status, out, errs := program(t, row.line)
		if status != row.status || errs != "" {
			t.Errorf("%s: exit status %d, want %d\n%s%s", row.line, status, row.status, out, errs)
		}
		for _, says := range row.says {
			if !strings.Contains(out, says) {
				t.Errorf("%s: %q does not stand in the output\n%s", row.line, says, out)
			}
		}
	}
}

// TestStrengthBadInput: one clear line, a hint, status 2, nothing printed.
func TestStrengthBadInput(t *testing.T) {
	dir := t.TempDir()
	file := func(name, text string) string {
		path := filepath.Join(dir, name)
		if err := os.WriteFile(path, []byte(text), 0o644); err != nil {
			t.Fatal(err)
		}
		return path
	}
	const shape = `"shape": {"family": "shaft-shoulder", "D": "72mm", "d": "48mm", "r": "3mm"}`
	for _, row := range []struct{ line, says, hint string }{
		{"strength", "no part given", "shaft-shoulder"},
		{strongShaft, "no load", "--axial 12kN"},
		{strongShaft + "--axial 12kN", "no yield stress", "--yield 355MPa"},
		{strongShaft + "--axial 12kN --brittle --yield 355MPa", "no tensile strength", "--tensile"},
		{strongShaft + "--axial 12kN --yield 355", `--yield "355": no unit`, "MPa"},
		{strongShaft + "--axial 450N·m --yield 355MPa", `--axial "450N·m": a moment where a force belongs`, "12kN"},
		{strongShaft + "--torque 12kN --yield 355MPa", `--torque "12kN": a force where a moment belongs`, "300N·m"},
		{strongShaft + "--axial 12KN --yield 355MPa", `--axial "12KN": unknown unit`, "12kN"},
		{strongShaft + "--axial 1,2kN --yield 355MPa", "comma in a number", "point"},
		{strongShaft + "--axial NaN --yield 355MPa", "no number", "12kN"},
		{strongShaft + "--axial 12kN --yield 355MPa --elongation -3%", `--elongation "-3%"`, "18%"},
		{strongShaft + "--axial 12kN --yield 355MPa --safety 0.3", `--safety "0.3"`, "1.8"},
		{strongShaft + "--axial 12kN --yield 355MPa --metal mithril", `"mithril": no such metal`, "cast-steel"},
		{strongShaft + "--axial 12kN --yield 355MPa --slip-layer 5", `--slip-layer "5"`, "0.05mm"},
		{strongShaft + "--axial 12kN --yield 355MPa --thickness 8mm", "a shaft has none", "leave"},
		{strongShaft + "--axial 12kN --yield 355MPa --thickness 8furlong", `thickness "8furlong"`, "mm"},
		{strongShaft + "--axial 12kN --yield 355MPa -o p.jpg", `"p.jpg"`, "format"},
		{strongBar + "--torque 450N·m --thickness 8mm --yield 355MPa", "torque 450 N·m: a flat bar carries none", "shaft"},
		{strongBar + "--axial 12kN --yield 355MPa", "no thickness of the bar", "--thickness 8mm"},
		{"strength bar-shoulder D=60 d=40 r=5 --axial 12kN --thickness 8mm --yield 355MPa", "lengths of the part have no unit", "D=72mm"},
		{"strength " + file("a.json", `{`+shape+`, "forces": {"axial": 12}}`), `a.json:1:99: forces.axial "12": no unit`, "kN"},
		{"strength " + file("b.json", `{`+shape+`, "forces": {"torque": "12kN"}}`), "a force where a moment belongs", "300N·m"},
		{"strength " + file("c.json", `{`+shape+`, "forces": {"axial": "1kN"}, "material": {"yield": "1kN"}}`), `material.yield "1kN": a force where a stress belongs`, "MPa"},
		{"strength " + file("d.json", `{`+shape+`, "forces": {"shear": "1kN"}}`), "no such key", "axial"},
		{"strength " + file("e.json", `{`+shape+`, "forces": {"axial": "1kN"}, "material": {"elongation": 18}}`), "not an elongation", "18%"},
		{"strength " + file("f.json", `{`+shape+`, "safety": 0.2}`), "not a safety", "1.8"},
		{"strength " + file("g.json", `{`+shape+`, "thickness": "-8mm"}`), "not above zero", "8mm"},
	} {
		status, out, errs := program(t, row.line)
		lines := strings.Split(strings.TrimSuffix(errs, "\n"), "\n")
		if status != exitUsage || out != "" || len(lines) != 2 || !strings.HasPrefix(lines[0], "notchproof: ") || !strings.HasPrefix(lines[1], "hint: ") {
			t.Errorf("%s: exit status %d\n%s%s", row.line, status, out, errs)
			continue
		}
		if !strings.Contains(lines[0], row.says) || !strings.Contains(lines[1], row.hint) {
			t.Errorf("%s: got\n%swant …%s… and …%s…", row.line, errs, row.says, row.hint)
		}
	}
}

// TestReadmeShowsStrength runs the README's examples: every line that stands
// under them is printed, in that order. Values with a bar count to three digits;
// how wide the bars are is the ladder's affair.
func TestReadmeShowsStrength(t *testing.T) {
	text, err := os.ReadFile("../../README.md")
	if err != nil {
		t.Fatal(err)
	}
	blocks := regexp.MustCompile("(?s)\\$ notchproof (strength [^\n#]*)[^\n]*\n(.*?)\n```").FindAllStringSubmatch(string(text), -1)
	if len(blocks) < 2 {
		t.Fatalf("%d examples in the README", len(blocks))
	}
	for _, block := range blocks {
		_, out, errs := program(t, strings.ReplaceAll(block[1], " testdata/", " ../../testdata/"))
		if errs != "" {
			t.Error(errs)
		}
		out = withoutBars(out)
		for _, line := range strings.Split(withoutBars(block[2]), "\n") {
			before, after, found := strings.Cut(out, line+"\n")
			if !found {
				t.Errorf("%s: not printed, or not in this order: %s\n%s", block[1], line, before)
				break
			}
			out = after
		}
	}
}

// withoutBars has plain spaces, one at a time, and no bars.
func withoutBars(text string) string {
	text = strings.NewReplacer("\u00a0", " ", "\u202f", " ").Replace(text)
	text = regexp.MustCompile(` +`).ReplaceAllString(text, " ")
	return regexp.MustCompile(`([0-9.]+) ± [0-9.]+`).ReplaceAllStringFunc(text, func(s string) string {
		value, _, _ := strings.Cut(s, " ")
		v, err := strconv.ParseFloat(value, 64)
		if err != nil {
			return s
		}
		return fmt.Sprintf("%.3g", v)
	})
}

// TestStrengthJSON: every field that the manual names, in the unit of the input,
// and numbers that go together.
func TestStrengthJSON(t *testing.T) {
	status, out, errs := program(t, strongShaft+"--axial 12kN --bending 2.5kip·in --yield 51ksi --tensile 74ksi --safety 1.8 --json")
	if status != exitAgrees || errs != "" {
		t.Fatalf("exit status %d %s", status, errs)
	}
	var got struct {
		Schema     int
		Loads      map[string]struct{ Value float64 }
		StressUnit string
		Strength   float64
		Factors    []struct{ Nominal, Factor, Uncertainty float64 }
		Places     []struct {
			Kind                    string
			Equivalent, Uncertainty float64
			Safety                  struct{ Value, Low, High float64 }
		}
		ByHand      []struct{ Equivalent, Difference float64 }
		Section     struct{ FirstYield, Elastic, Plastic float64 }
		Fluctuating []struct{ Gradient float64 }
		Cover       struct{ Usual [2]float64 }
		Decision    string
	}
	if err := json.Unmarshal([]byte(out), &got); err != nil {
		t.Fatal(err)
	}
	if got.Schema != 1 || got.StressUnit != "ksi" || got.Strength != 51 || got.Loads["bending"].Value != 2.5 || got.Decision != "met" || got.Cover.Usual != [2]float64{1.5, 2} {
		t.Errorf("%+v", got)
	}
	for i, want := range []float64{4 * 12e3 / (math.Pi * 48 * 48), 32 * 2500 * 112.9848290276167 / (math.Pi * 48 * 48 * 48)} {
		if f := got.Factors[i]; math.Abs(f.Nominal*6.894757293168361/want-1) > 1e-12 {
			t.Errorf("nominal stress %d: %g ksi, want %g MPa", i, f.Nominal, want)
		}
	}
	least := math.Inf(1)
	for _, p := range got.Places {
		least = math.Min(least, p.Safety.Value)
		if math.Abs(p.Safety.Value*p.Equivalent/51-1) > 1e-12 || p.Safety.Low > p.Safety.Value || p.Safety.High < p.Safety.Value {
			t.Errorf("%+v", p)
		}
	}
	if got.Places[0].Kind != "notch" || got.Places[0].Safety.Value != least || got.Section.FirstYield != least {
		t.Errorf("smallest safety %g, %+v, %+v", least, got.Places[0], got.Section)
	}
	for _, h := range got.ByHand {
		if math.Abs(h.Equivalent/got.Places[0].Equivalent-1-h.Difference) > 1e-12 {
			t.Errorf("%+v", h)
		}
	}
	if len(got.Fluctuating) != 2 || got.Section.Elastic >= got.Section.Plastic {
		t.Errorf("%+v", got)
	}
}

// TestStrengthPicture: the picture is written, and what it draws at the surface of
// the governing half is the equivalent stress over the strength.
func TestStrengthPicture(t *testing.T) {
	file := filepath.Join(t.TempDir(), "shaft.png")
	status, _, errs := program(t, "strength ../../testdata/parts/thruster-shaft-step.json -o "+file)
	if info, err := os.Stat(file); status != exitNotMet || errs != "" || err != nil || info.Size() < 10000 {
		t.Fatalf("exit status %d, %s, %v", status, errs, err)
	}
	data, err := os.ReadFile("../../testdata/parts/thruster-shaft-step.json")
	if err != nil {
		t.Fatal(err)
	}
	part, err := specimen.ReadPart(data, "shaft.json", specimen.Over{})
	if err != nil {
		t.Fatal(err)
	}
	for _, row := range []struct {
		axial, bending, torque float64
	}{{-18e3, 9e5, 1.25e6}, {18e3, 9e5, 0}, {-18e3, -9e5, 1e5}, {0, 0, 1e6}} {
		q := strength.Question{Part: part.Part, Axial: quantity.Newtons(row.axial), Bending: quantity.NewtonMillimetres(row.bending),
			Torque: quantity.NewtonMillimetres(row.torque), Material: strength.Material{Yield: quantity.Megapascals(355)}}
		r, err := strength.Run(t.Context(), q)
		if err != nil {
			t.Fatal(err)
		}
		var d drawing
		utilisation(r, &d)
		// On the drawn half the stresses of all terms add up without any angle.
		of := func(p fem.SurfacePoint) float64 {
			p.Tangential, p.Hoop, p.Shear = 0, 0, 0
			for _, term := range d.o.Terms {
				s := term.Solution.Surface(p.Edge, p.S)
				p.Tangential += term.Scale * s.Tangential
				p.Hoop += term.Scale * s.Hoop
				p.Shear += term.Scale * s.Shear
			}
			if len(d.o.Terms) == 1 && row.torque != 0 {
				return math.Abs(p.Shear) // which a picture of torsion alone shows
			}
			return p.VonMises()
		}
		got := of(d.o.Terms[0].Solution.Maxima(part.Part.Notch, of)[0])
		if want := r.Notch().Equivalent / 355; math.Abs(got/want-1) > 0.02 { // a few degrees beside the governing angle
			t.Errorf("%+v: drawn %g, governing %g", row, got, want)
		}
	}
}
