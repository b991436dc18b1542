package verify

import (
	"context"
	"math"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

func factors(t *testing.T, p *specimen.Part, o Options) map[scf.Load]Estimate {
	t.Helper()
	r, err := Run(context.Background(), p, nil, o)
	if err != nil {
		t.Fatal(err)
	}
	got := make(map[scf.Load]Estimate)
	for _, f := range r.Findings {
		got[f.Load.Name] = f.Computed.Factor
		for _, c := range f.Checks {
			if !c.Passed {
				t.Errorf("%s, %s: %s: %g against %g", p.Name, f.Load.Name, c.Name, c.Value, c.Limit)
			}
		}
	}
	return got
}

// A family written as an outline and read back meshes alike, and is solved to
// the same factor.
func TestFamilyAndItsPartFileAgree(t *testing.T) {
	dims := map[string]scf.Dims{
		"bar-shoulder":      {"D": 60, "d": 40, "r": 5, "ra": 8},
		"bar-notch":         {"D": 60, "d": 40, "r": 3, "angle": 10},
		"bar-edge-notch":    {"D": 60, "d": 45, "r": 5},
		"bar-hole":          {"W": 60, "d": 14, "e": -9},
		"bar-ellipse":       {"W": 60, "a": 12, "b": 5},
		"bar-collar":        {"D": 60, "d": 40, "r": 5, "L": 20},
		"shaft-shoulder":    {"D": 72, "d": 48, "r": 3},
		"shaft-groove":      {"D": 60, "d": 58, "r": 3},
		"shaft-ring-groove": {"D": 60, "d": 54, "r": 0.6, "w": 5},
		"shaft-collar":      {"D": 72, "d": 48, "r": 3, "L": 10},
	}
	for _, family := range scf.Families() {
		p, err := specimen.New(family, dims[family.Name], "mm", scf.Options{Nu: 0.3})
		if err != nil {
			t.Errorf("%s: %v", family.Name, err)
			continue
		}
		data, err := p.AsFile()
		if err != nil {
			t.Errorf("%s: %v", family.Name, err)
			continue
		}
		file, err := specimen.ReadPart(data, family.Name, specimen.Over{})
		if err != nil {
			t.Errorf("%s: %v", family.Name, err)
			continue
		}
		want, got := factors(t, p, Options{}), factors(t, file.Part, Options{})
		for load, w := range want {
			g := got[load]
			if !(math.Abs(g.Value/w.Value-1) <= 1e-10) || !(math.Abs(g.Uncertainty/w.Uncertainty-1) <= 1e-4) {
				t.Errorf("%s, %s: %.12g ± %.3g, as an outline %.12g ± %.3g", family.Name, load, w.Value, w.Uncertainty, g.Value, g.Uncertainty)
			}
		}
	}
}

func readPart(t *testing.T, file string) *specimen.Part {
	t.Helper()
	f, err := specimen.ReadPart([]byte(file), t.Name(), specimen.Over{})
	if err != nil {
		t.Fatal(err)
	}
	return f.Part
}

// The same hanger plate, drawn in different ways.
const (
	hangerHole = `, "holes": ["M -52 44 A 12 12 0 0 0 -28 44 A 12 12 0 0 0 -52 44 Z"]`
	hanger     = `"model": "bar", "outline": "M -300 0 H 210 V 50 H 8 A 8 8 0 0 0 0 58 V 80 H -300 Z"` + hangerHole
)

// What a drawing does not mean changes no bit of the factor.
func TestDrawnOtherwiseIsTheSamePart(t *testing.T) {
	want := factors(t, readPart(t, `{"shape": {`+hanger+`}}`), Options{})
	for name, path := range map[string]string{
		"begun elsewhere": "M 8 50 A 8 8 0 0 0 0 58 V 80 H -300 V 0 H 210 V 50 Z",
		"lines in pieces": "M -300 0 H -20 L 30 0 H 210 V 20 V 50 H 100 H 8 A 8 8 0 0 0 0 58 V 70 V 80 H -7 H -300 V 1 Z",
		"clockwise":       "M -300 0 V 80 H 0 V 58 A 8 8 0 0 1 8 50 H 210 V 0 Z",
		"relative":        "m -300 0 h 510 v 50 h -202 a 8 8 0 0 0 -8 8 v 22 h -300 z",
	} {
		got := factors(t, readPart(t, `{"shape": {"model": "bar", "outline": "`+path+`"`+hangerHole+`}}`), Options{})
		for load, w := range want {
			if g := got[load]; !(math.Abs(g.Value/w.Value-1) <= 1e-12) {
				t.Errorf("%s, %s: %.15g, want %.15g", name, load, g.Value, w.Value)
			}
		}
	}
}

// Half the size changes no more than the last bits. In another unit coordinates
// round differently, which may tip the mesh; an image, and a half in place of
// the whole, have other meshes anyway. Their bars must overlap.
func TestSameShapeOtherwisePlaced(t *testing.T) {
	compare := func(name string, a, b map[scf.Load]Estimate, rounding float64) {
		for load, w := range a {
			g := b[load]
			gap := math.Abs(g.Value - w.Value)
			if rounding > 0 && !(gap <= rounding*w.Value) || rounding == 0 && !(gap <= g.Uncertainty+w.Uncertainty) {
				t.Errorf("%s, %s: %.12g ± %.2g, want %.12g ± %.2g", name, load, g.Value, g.Uncertainty, w.Value, w.Uncertainty)
			}
		}
	}
	want := factors(t, readPart(t, `{"shape": {`+hanger+`}}`), Options{})
	compare("scaled", want, factors(t, readPart(t, `{"shape": {"unit": "m", "model": "bar",
		"outline": "M -0.3 0 H 0.21 V 0.05 H 0.008 A 0.008 0.008 0 0 0 0 0.058 V 0.08 H -0.3 Z",
		"holes": ["M -0.052 0.044 A 0.012 0.012 0 0 0 -0.028 0.044 A 0.012 0.012 0 0 0 -0.052 0.044 Z"]}}`), Options{}), 0)
	compare("half as large", want, factors(t, readPart(t, `{"shape": {"model": "bar",
		"outline": "M -150 0 H 105 V 25 H 4 A 4 4 0 0 0 0 29 V 40 H -150 Z",
		"holes": ["M -26 22 A 6 6 0 0 0 -14 22 A 6 6 0 0 0 -26 22 Z"]}}`), Options{}), 1e-12)
	compare("upside down", want, factors(t, readPart(t, `{"shape": {"model": "bar",
		"outline": "M -300 0 V -80 H 0 V -58 A 8 8 0 0 0 8 -50 H 210 V 0 Z",
		"holes": ["M -52 -44 A 12 12 0 0 0 -28 -44 A 12 12 0 0 0 -52 -44 Z"]}}`), Options{}), 0)
	compare("turned round", want, factors(t, readPart(t, `{"shape": {"model": "bar",
		"outline": "M 300 0 V 80 H 0 V 58 A 8 8 0 0 0 -8 50 H -210 V 0 Z",
		"holes": ["M 52 44 A 12 12 0 0 0 28 44 A 12 12 0 0 0 52 44 Z"]}}`), Options{}), 0)
	half := factors(t, readPart(t, `{"shape": {"model": "bar", "mirror": true,
		"outline": "M -180 0 H 130 V 20 H 5 A 5 5 0 0 0 0 25 V 30 H -180 Z"}}`), Options{})
	whole := factors(t, readPart(t, `{"shape": {"model": "bar",
		"outline": "M -180 -30 H 0 V -25 A 5 5 0 0 0 5 -20 H 130 V 20 H 5 A 5 5 0 0 0 0 25 V 30 H -180 Z"}}`), Options{})
	compare("whole", half, whole, 0)
}

// Every example converges, passes its checks and stays on the notch.
func TestExamplePartsAreSettled(t *testing.T) {
	names, err := filepath.Glob("../testdata/parts/*.json")
	if err != nil || len(names) < 6 {
		t.Fatal(names, err)
	}
	for _, name := range names {
		data, err := os.ReadFile(name)
		if err != nil {
			t.Fatal(err)
		}
		p := readPart(t, string(data))
		for load, e := range factors(t, p, Options{}) {
			if !e.Status.Settled() || !(e.Value > 1) || e.Uncertainty > 1e-3*e.Value {
				t.Errorf("%s, %s: %v", name, load, e)
			}
		}
	}
}

// A corner without a radius is named and has no factor; elsewhere it takes
// nothing from the factor of the notch.
func TestSharpCornerHasNoFactor(t *testing.T) {
	p := readPart(t, `{"shape": {"model": "shaft", "outline": "M -216 0 H 147 V 24 H 0 V 36 H -216 Z"}}`)
	if len(p.Sharp) != 1 || p.Sharp[0].At.X != 0 || p.Sharp[0].At.Y != 24 || math.Abs(p.Sharp[0].Degrees-270) > 1e-9 {
		t.Fatalf("sharp corners %+v", p.Sharp)
	}
	for load, power := range map[scf.Load][2]string{scf.Bending: {"measured −0.455", "mode I −0.4555"}, scf.Torsion: {"measured −0.333", "π/w − 1 = −0.3333"}} {
		r, err := Run(t.Context(), p, []scf.Load{load}, Options{})
		if err != nil {
			t.Fatal(err)
		}
		f := r.Findings[0]
		if f.Verdict != Undecided || len(f.Because) < 2 || !strings.Contains(f.Because[0], "x = 0, y = 24 (270°") || !strings.Contains(f.Because[1], power[0]) || !strings.Contains(f.Because[1], power[1]) {
			t.Errorf("%s: %v because %q", load, f.Verdict, f.Because)
		}
	}
	p = readPart(t, `{"shape": {"model": "shaft", "outline": "M -216 0 H 267 V 24 H 120 V 28 H 3 A 3 3 0 0 0 0 31 V 36 H -216 Z"}}`)
	r, err := Run(t.Context(), p, []scf.Load{scf.Torsion}, Options{})
	if err != nil {
		t.Fatal(err)
	}
	if f := r.Findings[0]; f.Verdict == Undecided || len(f.Warnings) == 0 || !strings.Contains(strings.Join(f.Warnings, "\n"), "x = 120, y = 24") {
		t.Errorf("%v, warnings %q", f.Verdict, f.Warnings)
	}
}
