package verify

import (
	"math"
	"testing"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// TestStudyByOrderSettles: at order 8 rounding rules on ordinary parts, and its
// scatter does not take back what the orders below have shown.
func TestStudyByOrderSettles(t *testing.T) {
	for name, dims := range map[string]scf.Dims{
		"bar-collar":     {"D": 60, "d": 40, "r": 4, "L": 10},
		"bar-hole":       {"W": 60, "d": 20},
		"shaft-shoulder": {"D": 72, "d": 48, "r": 3},
	} {
		f, _ := scf.Lookup(name)
		p, err := specimen.New(f, dims, "mm", scf.Options{Nu: 0.3})
		if err != nil {
			t.Fatal(err)
		}
		l, _ := p.Load(scf.Tension)
		s, err := ByOrder(t.Context(), p, l, StudyOptions{})
		if err != nil {
			t.Fatalf("%s: %v", name, err)
		}
		e, last := s.Estimate, s.Rows[len(s.Rows)-1].Factor
		if !e.Status.Settled() || !(e.Uncertainty < 1e-4*e.Value) {
			t.Errorf("%s: %s, %g ± %g %v", name, e.Status, e.Value, e.Uncertainty, e.Notes)
		}
		if !(math.Abs(last-e.Value) <= e.Uncertainty) {
			t.Errorf("%s: order 8 gives %.9f, outside %.9f ± %.2g", name, last, e.Value, e.Uncertainty)
		}
	}
}
