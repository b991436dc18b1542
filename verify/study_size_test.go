package verify

import (
	"math"
	"strings"
	"testing"

	"notchproof/scf"
	"notchproof/verify/extrapolate"
	"notchproof/verify/specimen"
)

func studyOf(t *testing.T, p *specimen.Part, load scf.Load, o StudyOptions) *Study {
	t.Helper()
	l, ok := p.Load(load)
	if !ok {
		t.Fatalf("%s does not carry %s", p.Name, load)
	}
	s, err := BySize(t.Context(), p, l, o)
	if err != nil {
		t.Fatal(err)
	}
	return s
}

func stepped(t *testing.T, r float64) *specimen.Part {
	t.Helper()
	f, _ := scf.Lookup("shaft-shoulder")
	p, err := specimen.New(f, scf.Dims{"D": 60, "d": 40, "r": r}, "mm", scf.Options{Nu: 0.3})
	if err != nil {
		t.Fatal(err)
	}
	return p
}

// A study of a sharp notch grows from rung to rung, at the end by the exponent
// of the wedge: once the rungs are all that there is, the largest stress on a mesh
// of size h goes like h^(λ−1). What the weaker modes add has not died out after
// three halvings, which the tenth allows for; the exponent measured at the corner is
// held to 2 %.
func TestStudyOfSharpNotchDiverges(t *testing.T) {
	for _, angle := range []float64{30, 60, 90, 120} {
		s := studyOf(t, sharpNotch(t, "bar-edge-notch", angle), scf.Bending, StudyOptions{Rungs: 4})
		lambda, _ := scf.Williams(angle)
		want := lambda - 1
		if s.Estimate.Status != extrapolate.Diverging || !math.IsNaN(s.Estimate.Value) || !s.Endless() {
			t.Errorf("%g°: %v", angle, s.Estimate)
		}
		for i, r := range s.Rows {
			if i > 0 && !(r.Change > 0) {
				t.Errorf("%g°: rung %d changes by %g", angle, i, r.Change)
			}
		}
		if got := s.Rows[3].ObservedOrder; !(math.Abs(got-want) < 0.1*math.Abs(want)) {
			t.Errorf("%g°: the rungs grow like size^%.4f, wedge %.4f", angle, got, want)
		}
		if got := s.Corners[0].Measured; !(math.Abs(got-want) < 0.02*math.Abs(want)) {
			t.Errorf("%g°: measured %.4f, wedge %.4f", angle, got, want)
		}
		if said := strings.Join(s.Says(), "\n"); !strings.Contains(said, "Williams (1952) mode I") || !strings.Contains(said, remedy) {
			t.Errorf("%g°: says %q", angle, said)
		}
	}
}

// A mesh whose elements are ten thousand times the radius gives, bit by bit, what
// it would give without the radius, and is not taken for one that converges.
func TestMeshThatMissesTheRoot(t *testing.T) {
	o := StudyOptions{Size: 4}
	small, none := studyOf(t, stepped(t, 4e-4), scf.Bending, o), studyOf(t, stepped(t, 0), scf.Bending, o)
	for i, r := range small.Rows {
		if !r.Blind || r.Factor != none.Rows[i].Factor || none.Rows[i].Blind {
			t.Errorf("rung %d: blind %t with %.15g, without a radius %t with %.15g", i, r.Blind, r.Factor, none.Rows[i].Blind, none.Rows[i].Factor)
		}
	}
	if small.Estimate.Status.Settled() || !math.IsNaN(small.Estimate.Value) {
		t.Errorf("no rung has seen the root, and the study comes to %v", small.Estimate)
	}
	if says := small.Says(); !strings.Contains(says[0], "all rungs have elements larger than the root, an arc of 0.00063 mm") || !strings.Contains(says[1], "0.00021 mm") {
		t.Errorf("says %q", says)
	}
}

// Rungs that have missed the root do not count among those that have seen it: two
// are too few, four settle the factor, to within their own bar.
func TestMeshThatFindsTheRoot(t *testing.T) {
	p := stepped(t, 1) // an arc of 1.57
	for _, c := range []struct {
		size  float64
		blind int
	}{{5, 2}, {10, 3}} {
		s := studyOf(t, p, scf.Bending, StudyOptions{Size: c.size, Rungs: c.blind + 2})
		if s.Estimate.Status != extrapolate.TooFew || !math.IsNaN(s.Estimate.Value) {
			t.Errorf("two rungs have seen the root, and the study comes to %v", s.Estimate)
		}
		for i, r := range s.Rows {
			if r.Blind != (i < c.blind) {
				t.Errorf("size %g, rung %d: blind %t", c.size, i, r.Blind)
			}
		}
	}
	s := studyOf(t, p, scf.Bending, StudyOptions{Size: 5, Rungs: 6})
	r, err := Run(t.Context(), p, []scf.Load{scf.Bending}, Options{})
	if err != nil {
		t.Fatal(err)
	}
	truth := r.Findings[0].Computed.Factor
	if e := s.Estimate; !e.Status.Settled() || math.Abs(e.Value-truth.Value) > e.Uncertainty+truth.Uncertainty {
		t.Errorf("study %v, check %v", e, truth)
	}
}
