package sparse

import (
	"context"
	"math"
	"math/rand/v2"
	"slices"
	"testing"
)

// badly makes a matrix of the given condition, roughly: a floating body on
// soft springs.
func badly(condition float64) *system {
	s := floating(fan(5, 6).pattern(4, 2), 2)
	for u := range s.Unknowns {
		if u%97 < 2 {
			stiffen(s, u, 200/condition)
		}
	}
	return s
}

func TestResidualOfIllConditionedSystems(t *testing.T) {
	for _, condition := range []float64{1e2, 1e6, 1e10} {
		s := badly(condition)
		p, err := Analyse(s.Pattern)
		if err != nil {
			t.Fatal(err)
		}
		f, err := p.Factor(context.Background(), s.fill, new(Workspace), 2)
		if err != nil {
			t.Fatal(err)
		}
		rng := rand.New(rand.NewPCG(1, 2))
		b := [][]float64{vector(rng, s.Unknowns), vector(rng, s.Unknowns)}
		x := [][]float64{slices.Clone(b[0]), slices.Clone(b[1])}
		f.Solve(x...)
		for _, r := range f.Residual(s.fill, x, b) {
			if !(r.Backward < 1e-14 && r.Relative < 1e-15*condition) {
				t.Errorf("condition %.0e: residual %+v", condition, r)
			}
		}
	}
}

// TestResidualIsWhatItSays compares with the assembled matrix.
func TestResidualIsWhatItSays(t *testing.T) {
	s := randomMatrices(rectangle(3, 2).pattern(2, 2), 4)
	f := factorise(t, s, 2)
	n := s.Unknowns
	rng := rand.New(rand.NewPCG(3, 2))
	x, b := vector(rng, n), vector(rng, n)
	var top, size float64
	a := s.dense()
	for i := range n {
		r := b[i]
		for j := range n {
			r -= a[i*n+j] * x[j]
		}
		top, size = math.Max(top, math.Abs(r)), math.Max(size, math.Abs(b[i]))
	}
	got := f.Residual(s.fill, [][]float64{x}, [][]float64{b})[0]
	if math.Abs(got.Relative-top/size) > 1e-14*top/size || !(got.Backward > 0.01 && got.Backward <= 1) {
		t.Errorf("got %+v, want relative %g", got, top/size)
	}
}

func TestRefineRepairsASolution(t *testing.T) {
	s := badly(1e8)
	f := factorise(t, s, 1)
	rng := rand.New(rand.NewPCG(5, 2))
	b := vector(rng, s.Unknowns)
	x := slices.Clone(b)
	f.Solve(x)
	good := slices.Clone(x)
	for i := range x {
		x[i] *= 1 + 1e-5*rng.Float64()
	}
	was := f.Refine(s.fill, [][]float64{x}, [][]float64{b})[0]
	now := f.Residual(s.fill, [][]float64{x}, [][]float64{b})[0]
	if !(was.Backward > 1e-7 && now.Backward < 1e-11 && distance(good, x) < 1e-5) {
		t.Errorf("backward residual from %.2g to %.2g, distance %.2g", was.Backward, now.Backward, distance(good, x))
	}
}
