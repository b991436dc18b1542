package verify

import (
	"context"
	"fmt"
	"math"
	"testing"

	"notchproof/fem"
	"notchproof/scf"
)

// blemished is a bar whose fillet is checked and which has a sharp step without a
// radius at some distance: there the solution is not smooth at any order, and it
// spoils the factor of the fillet unless the mesh is refined towards it.
const blemished = `{"shape": {"model": "bar", "outline": "M -300 0 H 300 V 30 H 8 A 8 8 0 0 0 0 38 V 50 H -60 V 56 H -300 Z", "notch": ["A4"], "mirror": true}}`

// The ladder meets targets of eight digits next to a point that is not smooth,
// and its bar holds against a mesh that is finer everywhere.
func TestRefinesWhereTheErrorSits(t *testing.T) {
	p := readPart(t, blemished)
	load, _ := p.Load(scf.Tension)
	fine, err := newShape(p, far())
	if err != nil {
		t.Fatal(err)
	}
	s, err := solve(context.Background(), p, load, fine.order(farOrder), new(fem.Workspace), 0)
	if err != nil {
		t.Fatal(err)
	}
	truth, _ := read(p, load, s)
	for _, target := range []float64{1e-3, 1e-5, 1e-7} {
		r, err := Run(context.Background(), p, []scf.Load{scf.Tension}, Options{Target: target})
		if err != nil {
			t.Fatal(err)
		}
		e := r.Findings[0].Computed.Factor
		if e.Uncertainty > target*e.Value {
			t.Errorf("target %g: %.9f ± %.1g", target, e.Value, e.Uncertainty)
		}
		if off := math.Abs(e.Value - truth.Factor); off > e.Uncertainty+noTruth*truth.Factor {
			t.Errorf("target %g: off by %.1e, bar %.1e", target, off, e.Uncertainty)
		}
	}
}

// What is marked for smaller elements lies where the solution is least smooth:
// on the first mesh, which knows nothing of the step, at the step's corner.
func TestMarksTheCorner(t *testing.T) {
	p := readPart(t, blemished)
	load, _ := p.Load(scf.Tension)
	s, err := newShape(p, grading{perQuarter: 6, growth: 0.6, joint: 1})
	if err != nil {
		t.Fatal(err)
	}
	solution, err := solve(context.Background(), p, load, s.order(7), new(fem.Workspace), 0)
	if err != nil {
		t.Fatal(err)
	}
	out := Computed{Last: solution}
	_, out.peaks = read(p, load, solution)
	spots := marked(s, &out)
	if len(spots) == 0 {
		t.Fatal("nothing is marked")
	}
	near := 0
	for _, spot := range spots {
		if math.Hypot(spot.At.X+60, spot.At.Y-50) < 12 {
			near++
		}
	}
	if near == 0 || len(spots) > len(s.mesh.Triangles)/2 {
		t.Errorf("%d of %d marked elements (of %d) are near the corner", near, len(spots), len(s.mesh.Triangles))
	}
}

// Ends that are too near change the factor. The first mesh alone would not know;
// the second has longer ends, and its distance tells: it is a good part of what
// ends at three sizes show to be the error.
func TestShortEndsShow(t *testing.T) {
	const target = 1e-4
	bar := func(end float64) *Computed {
		t.Helper()
		p := readPart(t, fmt.Sprintf(`{"shape": {"model": "bar", "outline": "M %g 0 H %g V 30 H 8 A 8 8 0 0 0 0 38 V 50 H %g Z", "notch": ["A4"], "mirror": true}}`, -end*100, 8+end*60, -end*100))
		r, err := Run(context.Background(), p, []scf.Load{scf.Tension}, Options{Target: target})
		if err != nil {
			t.Fatal(err)
		}
		return &r.Findings[0].Computed
	}
	long, short := bar(3), bar(0.4)
	off := math.Abs(short.Factor.Value - long.Factor.Value)
	if off < 10*target*long.Factor.Value {
		t.Fatalf("short ends change the factor by %.1e only", off)
	}
	if seen := short.Factor.Signals.Second; seen < off/4 {
		t.Errorf("the second mesh is %.1e off, the short ends %.1e", seen, off)
	}
	if short.Converged() {
		t.Errorf("a factor of %.5f ± %.1g with ends that are too near is called converged; with long ends it is %.5f", short.Factor.Value, short.Factor.Uncertainty, long.Factor.Value)
	}
}
