package tolerance_test

import (
	"context"
	"errors"
	"math"
	"testing"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
	"notchproof/verify/tolerance"
)

func question(t *testing.T, family string, dims scf.Dims, load scf.Load, list ...tolerance.Deviation) *tolerance.Question {
	t.Helper()
	f, ok := scf.Lookup(family)
	if !ok {
		t.Fatal(family)
	}
	return &tolerance.Question{Family: f, Dims: dims, Unit: "mm", Options: scf.Options{Nu: 0.3}, Deviations: list, Loads: []scf.Load{load}}
}

func find(t *testing.T, q *tolerance.Question) *tolerance.Answer {
	t.Helper()
	a, err := q.Find(context.Background())
	if err != nil {
		t.Fatal(err)
	}
	return a
}

// TestPointsAreDirectChecks: every point is what a check of its dimensions
// gives, the peak stress is that factor times the ratio of the nominal stresses,
// and the extremes are extreme.
func TestPointsAreDirectChecks(t *testing.T) {
	q := question(t, "shaft-shoulder", scf.Dims{"D": 72, "d": 48, "r": 3}, scf.Torsion,
		tolerance.Deviation{Name: "r", Lower: -0.2, Upper: 0.2}, tolerance.Deviation{Name: "d", Lower: 0, Upper: 0.05})
	a := find(t, q)
	seen := make(map[[2]float64]bool)
	for _, p := range a.Points {
		d, r := p.Dims["d"], p.Dims["r"]
		seen[[2]float64{d, r}] = true
		part, err := specimen.New(q.Family, scf.Dims{"D": 72, "d": d, "r": r}, "mm", q.Options)
		if err != nil {
			t.Fatal(err)
		}
		direct, err := verify.Run(context.Background(), part, q.Loads, verify.Options{Target: 2e-4, Workers: 1})
		if err != nil {
			t.Fatal(err)
		}
		e := direct.Findings[0].Computed.Factor
		if p.Factor[0] != (tolerance.Value{Value: e.Value, Uncertainty: e.Uncertainty}) {
			t.Errorf("d = %g, r = %g: %+v, a check gives %g ± %g", d, r, p.Factor[0], e.Value, e.Uncertainty)
		}
		if want := e.Value * math.Pow(48/d, 3); math.Abs(p.Peak[0].Value/want-1) > 1e-12 {
			t.Errorf("d = %g: peak stress %g, want %g", d, p.Peak[0].Value, want)
		}
		for i, s := range []tolerance.Spread{a.Loads[0].Factor, a.Loads[0].Peak} {
			if v := []tolerance.Value{p.Factor[0], p.Peak[0]}[i].Value; v < s.Least.Value.Value || v > s.Most.Value.Value {
				t.Errorf("%g lies outside its own range from %g to %g", v, s.Least.Value.Value, s.Most.Value.Value)
			}
		}
	}
	for _, corner := range [][2]float64{{48, 2.8}, {48, 3.2}, {48.05, 2.8}, {48.05, 3.2}, {48, 3}} {
		if !seen[corner] {
			t.Errorf("corner %v was not solved", corner)
		}
	}
}

// TestSmallHoleInAWideBar: around a small hole the factor on the gross section
// is 3 (Kirsch 1898), on the net section 3 (1 − d/W) to first order: the
// sensitivity to the diameter is −3/W and the peak stress does not move.
func TestSmallHoleInAWideBar(t *testing.T) {
	const W, d = 1000.0, 10.0
	a := find(t, question(t, "bar-hole", scf.Dims{"W": W, "d": d}, scf.Tension, tolerance.Deviation{Name: "d", Lower: -2, Upper: 2}))
	factor, peak := a.Loads[0].Factor.Contributions[0].Sensitivity, a.Loads[0].Peak.Contributions[0].Sensitivity
	// Second order terms are of the size of d/W.
	if math.Abs(factor.Value+3/W) > 2*3/W*d/W+factor.Uncertainty {
		t.Errorf("factor: %g ± %g per mm, want %g", factor.Value, factor.Uncertainty, -3/W)
	}
	if math.Abs(peak.Value) > 2*3/W*d/W+peak.Uncertainty {
		t.Errorf("peak stress: %g ± %g per mm, want 0", peak.Value, peak.Uncertainty)
	}
}

// TestSquaresAndCorners: for small tolerances both are made of the same
// contributions: the corners are as far apart as twice their sum, the squares
// give the root of their squares.
func TestSquaresAndCorners(t *testing.T) {
	q := question(t, "bar-notch", scf.Dims{"D": 60, "d": 40, "r": 4}, scf.Tension,
		tolerance.Deviation{Name: "d", Lower: -0.4, Upper: 0.4}, tolerance.Deviation{Name: "r", Lower: -0.1, Upper: 0.1},
		tolerance.Deviation{Name: "D", Lower: -0.2, Upper: 0.6})
	s := find(t, q).Loads[0].Peak
	sum, squares, bars := 0.0, 0.0, 0.0
	for i, c := range s.Contributions {
		sum += math.Abs(c.Change.Value)
		squares += c.Change.Value * c.Change.Value
		bars += c.Change.Uncertainty
		if i > 0 && math.Abs(c.Change.Value) > math.Abs(s.Contributions[i-1].Change.Value) {
			t.Errorf("%s stands after a smaller contribution", c.Name)
		}
	}
	if half := (s.Most.Value.Value - s.Least.Value.Value) / 2; math.Abs(half-sum) > 0.02*sum+2*bars {
		t.Errorf("corners %g from the middle, contributions add up to %g", half, sum)
	}
	if math.Abs(s.RootSumSquare.Value-math.Sqrt(squares)) > 1e-12 || !(s.RootSumSquare.Value < sum) {
		t.Errorf("root of squares %g of %g", s.RootSumSquare.Value, math.Sqrt(squares))
	}
	if s.Beyond != "" {
		t.Errorf("a quantity that runs one way: %s", s.Beyond)
	}
}

// TestInsideBeyondTheCorners: a hole that may lie off the middle on either side
// has its lowest factor between the corners.
func TestInsideBeyondTheCorners(t *testing.T) {
	a := find(t, question(t, "bar-hole", scf.Dims{"W": 60, "d": 20, "e": 0}, scf.Tension, tolerance.Deviation{Name: "e", Lower: -3, Upper: 3}))
	if s := a.Loads[0].Factor; s.Beyond == "" || s.Least.At.Dims["e"] != 0 || !(s.Most.Value.Value > s.Drawn.Value*1.01) {
		t.Errorf("least at %v, beyond %q", s.Least.At.Dims, s.Beyond)
	}
}

// TestManyTolerances: of 32 corners those that matter.
func TestManyTolerances(t *testing.T) {
	var list []tolerance.Deviation
	for _, name := range []string{"D", "d", "r", "ra", "c"} {
		list = append(list, tolerance.Deviation{Name: name, Lower: -0.05, Upper: 0.05})
	}
	a := find(t, question(t, "bar-shoulder", scf.Dims{"D": 60, "d": 40, "r": 4, "ra": 5, "c": 1}, scf.Tension, list...))
	if len(a.Warnings) != 1 || len(a.Points) >= 12+32 {
		t.Errorf("%d points, %v", len(a.Points), a.Warnings)
	}
	sum, bars := 0.0, 0.0
	s := a.Loads[0].Peak
	for _, c := range s.Contributions {
		sum += math.Abs(c.Change.Value)
		bars += c.Change.Uncertainty
	}
	if half := (s.Most.Value.Value - s.Least.Value.Value) / 2; math.Abs(half-sum) > 0.02*sum+2*bars {
		t.Errorf("the corners found are %g from the middle, contributions add up to %g", half, sum)
	}
}

// TestCornerThatCannotBeDrawn and other refusals.
func TestCornerThatCannotBeDrawn(t *testing.T) {
	q := question(t, "shaft-shoulder", scf.Dims{"D": 50, "d": 48, "r": 1}, scf.Torsion, tolerance.Deviation{Name: "d", Lower: -1, Upper: 3})
	var corner *tolerance.CornerError
	var fault *scf.DimensionError
	if _, err := q.Find(context.Background()); !errors.As(err, &corner) || !errors.As(err, &fault) || corner.Dims["d"] != 51 {
		t.Errorf("%v", err)
	}
	ctx, cancel := context.WithCancel(context.Background())
	cancel()
	q = question(t, "shaft-shoulder", scf.Dims{"D": 60, "d": 48, "r": 1}, scf.Torsion, tolerance.Deviation{Name: "d", Lower: -1, Upper: 1})
	if _, err := q.Find(ctx); !errors.Is(err, context.Canceled) {
		t.Errorf("not interrupted: %v", err)
	}
}

// BenchmarkTolerance has four tolerances, sixteen corners.
func BenchmarkTolerance(b *testing.B) {
	f, _ := scf.Lookup("bar-edge-notch")
	q := &tolerance.Question{Family: f, Dims: scf.Dims{"D": 60, "d": 40, "r": 4, "angle": 60}, Unit: "mm", Options: scf.Options{Nu: 0.3}, Loads: []scf.Load{scf.Bending}}
	for _, name := range []string{"D", "d", "r", "angle"} {
		q.Deviations = append(q.Deviations, tolerance.Deviation{Name: name, Lower: -0.1, Upper: 0.1})
	}
	for b.Loop() {
		if _, err := q.Find(context.Background()); err != nil {
			b.Fatal(err)
		}
	}
}
