package specimen_test

import (
	"context"
	"math"
	"testing"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// A half model with its conditions of symmetry or antisymmetry and the whole
// part on three pins have the same factor.
func TestHalfAndWholeBarsAgree(t *testing.T) {
	for name, dims := range map[string]scf.Dims{
		"bar-notch":    {"D": 60, "d": 40, "r": 5, "angle": 60},
		"bar-shoulder": {"D": 60, "d": 40, "r": 5},
		"bar-hole":     {"W": 60, "d": 24},
		"bar-ellipse":  {"W": 60, "a": 10, "b": 6},
		"bar-collar":   {"D": 60, "d": 40, "r": 5, "L": 12},
	} {
		family, _ := scf.Lookup(name)
		half, err := specimen.New(family, dims, "mm", scf.Options{Nu: 0.3})
		if err != nil {
			t.Fatal(err)
		}
		whole, err := specimen.WholeBar(half)
		if err != nil {
			t.Fatal(err)
		}
		a, b := check(t, half), check(t, whole)
		for i := range a {
			x, y := a[i].Computed.Factor, b[i].Computed.Factor
			if math.Abs(x.Value-y.Value) > x.Uncertainty+y.Uncertainty {
				t.Errorf("%s %s: half %.8f ± %.1g, whole %.8f ± %.1g", name, a[i].Load.Name, x.Value, x.Uncertainty, y.Value, y.Uncertainty)
			}
		}
	}
}

func check(t *testing.T, p *specimen.Part) []verify.Finding {
	t.Helper()
	r, err := verify.Run(context.Background(), p, nil, verify.Options{Target: 1e-5})
	if err != nil {
		t.Fatal(err)
	}
	for _, f := range r.Findings {
		for _, c := range f.Checks {
			if !c.Passed {
				t.Errorf("%s %s: %s %g, limit %g", p.Name, f.Load.Name, c.Name, c.Value, c.Limit)
			}
		}
	}
	return r.Findings
}
