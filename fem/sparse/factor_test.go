package sparse

import (
	"context"
	"math"
	"math/rand/v2"
	"testing"

	"gonum.org/v1/gonum/mat"
)

func factorise(t *testing.T, s *system, workers int) *Factor {
	t.Helper()
	p, err := Analyse(s.Pattern)
	if err != nil {
		t.Fatal(err)
	}
	f, err := p.Factor(context.Background(), s.fill, new(Workspace), workers)
	if err != nil {
		t.Fatal(err)
	}
	return f
}

func vector(rng *rand.Rand, n int) []float64 {
	b := make([]float64, n)
	for i := range b {
		b[i] = rng.NormFloat64()
	}
	return b
}

func TestAgainstDenseCholesky(t *testing.T) {
	rng := rand.New(rand.NewPCG(1, 2))
	var patterns []Pattern
	for n := 1; n < 80; n++ {
		patterns = append(patterns, random(rng, n, 1+rng.IntN(30), 12))
	}
	for p := 1; p <= 6; p++ {
		for c := 1; c <= 3; c++ {
			patterns = append(patterns, rectangle(3, 2).pattern(p, c), fan(4, 2).pattern(p, c))
		}
	}
	for i, p := range patterns {
		s := randomMatrices(p, uint64(i))
		b := vector(rng, p.Unknowns)
		var chol mat.Cholesky
		if !chol.Factorize(mat.NewSymDense(p.Unknowns, s.dense())) {
			t.Fatalf("pattern %d: test matrix is not positive definite", i)
		}
		var want mat.VecDense
		if err := chol.SolveVecTo(&want, mat.NewVecDense(len(b), b)); err != nil {
			t.Fatal(err)
		}
		x := append([]float64(nil), b...)
		factorise(t, s, 1).Solve(x)
		for u := range x {
			if d := math.Abs(x[u] - want.AtVec(u)); !(d <= 1e-12*chol.Cond()*mat.Norm(&want, math.Inf(1))) {
				t.Fatalf("pattern %d: unknown %d of %d: %g, dense %g", i, u, p.Unknowns, x[u], want.AtVec(u))
			}
		}
	}
}
