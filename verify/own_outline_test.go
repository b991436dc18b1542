package verify

import (
	"context"
	"math"
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
			if !(math.Abs(g.Value/w.Value-1) <= 1e-10) || !(math.Abs(g.Uncertainty/w.Uncertainty-1) <= 1e-6) {
				t.Errorf("%s, %s: %.12g ± %.3g, as an outline %.12g ± %.3g", family.Name, load, w.Value, w.Uncertainty, g.Value, g.Uncertainty)
			}
		}
	}
}
