package verify

import (
	"context"
	"testing"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

func shoulderOf(t *testing.T, dims scf.Dims) *specimen.Part {
	t.Helper()
	family, _ := scf.Lookup("shaft-shoulder")
	p, err := specimen.New(family, dims, "", scf.Options{Nu: 0.3})
	if err != nil {
		t.Fatal(err)
	}
	return p
}

// TestMeshGrowsLikeTheLogarithm: a decade of radius costs about the same number
// of triangles wherever it lies, and r/d = 1e-4 takes no more than three times
// the mesh of r/d = 0.1.
func TestMeshGrowsLikeTheLogarithm(t *testing.T) {
	for _, D := range []float64{1.2, 1.5, 3} {
		var counts []int
		for _, r := range []float64{1e-1, 1e-2, 1e-3, 1e-4, 1e-5} {
			s, err := newShape(shoulderOf(t, scf.Dims{"D": D, "d": 1, "r": r}), firstGrading())
			if err != nil {
				t.Fatal(err)
			}
			counts = append(counts, len(s.mesh.Triangles))
		}
		if counts[3] > 3*counts[0] {
			t.Errorf("D/d = %g: %d triangles at r/d = 1e-4, %d at 0.1", D, counts[3], counts[0])
		}
		for i := 2; i < len(counts); i++ {
			if more := counts[i] - counts[i-1]; more < 40 || more > 160 {
				t.Errorf("D/d = %g: triangles %v grow by %d in a decade", D, counts, more)
			}
		}
	}
}

// TestNotchGetsItsElements: along the fillet lie at least as many edges as the
// grading asks for per 90°, and where the arc is cut off at least half of them.
func TestNotchGetsItsElements(t *testing.T) {
	for _, row := range []struct {
		dims  scf.Dims
		least int
	}{
		{scf.Dims{"D": 1.5, "d": 1, "r": 0.1}, 6},
		{scf.Dims{"D": 1.01, "d": 1, "r": 0.3}, 3},
	} {
		p := shoulderOf(t, row.dims)
		s, err := newShape(p, firstGrading())
		if err != nil {
			t.Fatal(err)
		}
		edges := 0
		for _, e := range s.mesh.Boundary {
			if int(e.Side) == p.Notch[0] {
				edges++
			}
		}
		if edges < row.least {
			t.Errorf("%v: %d edges on the fillet, want %d", row.dims, edges, row.least)
		}
	}
}

// TestWorkersDoNotChangeBits: the answer is the same to the last bit whatever
// the number of goroutines.
func TestWorkersDoNotChangeBits(t *testing.T) {
	p := shoulderOf(t, scf.Dims{"D": 1.5, "d": 1, "r": 0.05})
	var first *Result
	for _, workers := range []int{1, 2, 5} {
		r, err := Run(context.Background(), p, nil, Options{Workers: workers})
		if err != nil {
			t.Fatal(err)
		}
		if first == nil {
			first = r
			continue
		}
		for i := range r.Findings {
			a, b := first.Findings[i].Computed, r.Findings[i].Computed
			if a.Factor.Value != b.Factor.Value || a.Factor.Uncertainty != b.Factor.Uncertainty || a.Peak != b.Peak {
				t.Errorf("%s: %v with one worker, %v with %d", r.Findings[i].Load.Name, a.Factor, b.Factor, workers)
			}
		}
	}
}
