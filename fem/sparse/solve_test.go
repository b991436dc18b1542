package sparse

import (
	"context"
	"math"
	"math/rand/v2"
	"slices"
	"testing"
)

func TestSidesTogetherAndAloneGiveTheSameBits(t *testing.T) {
	s := randomMatrices(fan(5, 4).pattern(4, 2), 1)
	f := factorise(t, s, 1)
	rng := rand.New(rand.NewPCG(7, 8))
	for sides := 1; sides <= 9; sides++ {
		var alone, together [][]float64
		for range sides {
			b := vector(rng, s.Unknowns)
			together = append(together, slices.Clone(b))
			f.Solve(b)
			alone = append(alone, b)
		}
		f.Solve(together...)
		for j := range alone {
			if !sameBits(alone[j], together[j]) {
				t.Fatalf("side %d of %d differs from the same side alone", j, sides)
			}
		}
	}
}

func TestOrderOfElementsDoesNotMatter(t *testing.T) {
	s := randomMatrices(rectangle(7, 6).pattern(3, 2), 1)
	rng := rand.New(rand.NewPCG(9, 10))
	x := vector(rng, s.Unknowns)
	b := slices.Clone(x)
	factorise(t, s, 1).Solve(x)
	for range 5 {
		o := &system{Pattern: Pattern{Unknowns: s.Unknowns, Start: []int32{0}}}
		for _, e := range rng.Perm(s.Elements()) {
			o.Index = append(o.Index, s.list(int32(e))...)
			o.Start = append(o.Start, int32(len(o.Index)))
			o.Center = append(o.Center, s.Center[e])
			o.matrices = append(o.matrices, s.matrices[e])
		}
		y := slices.Clone(b)
		factorise(t, o, 2).Solve(y)
		if d := distance(x, y); d > 1e-12 {
			t.Errorf("solution changes by %.2g of its size", d)
		}
	}
}

// distance returns max |x − y| ÷ max |x|.
func distance(x, y []float64) float64 {
	var top, size float64
	for i := range x {
		top, size = math.Max(top, math.Abs(x[i]-y[i])), math.Max(size, math.Abs(x[i]))
	}
	return top / size
}

func TestEmptySystems(t *testing.T) {
	for _, p := range []Pattern{
		{},
		{Start: []int32{0}},
		{Start: []int32{0, 0}, Center: make([][2]float64, 1)},
		{Start: []int32{0, 2, 3}, Index: []int32{-1, -1, -1}, Center: make([][2]float64, 2)},
	} {
		s := randomMatrices(p, 1)
		for workers := 1; workers < 3; workers++ {
			f := factorise(t, s, workers)
			f.Solve(nil, []float64{})
			if got := f.Pivots(); got != (Pivots{}) {
				t.Errorf("pivots of nothing: %+v", got)
			}
		}
	}
}

func TestOneUnknown(t *testing.T) {
	s := &system{Pattern: Pattern{Unknowns: 1, Start: []int32{0, 1, 3}, Index: []int32{0, -1, 0}, Center: make([][2]float64, 2)}}
	s.matrices = [][]float64{{3}, {math.NaN(), math.NaN(), math.NaN(), 1}}
	f := factorise(t, s, 1)
	x := []float64{10}
	f.Solve(x)
	if x[0] != 2.5 || f.Pivots() != (Pivots{Smallest: 4, Largest: 4}) {
		t.Errorf("10 ÷ 4 gives %g, pivots %+v", x[0], f.Pivots())
	}
}

func TestPrescribedUnknownsAreLeftOut(t *testing.T) {
	whole := rectangle(4, 3).pattern(3, 2)
	some := Pattern{Start: whole.Start, Center: whole.Center}
	renamed := make([]int32, whole.Unknowns)
	var kept []int
	for u := range renamed {
		if renamed[u] = -1; u%5 != 0 {
			renamed[u] = int32(len(kept))
			kept = append(kept, u)
		}
	}
	for _, u := range whole.Index {
		some.Index = append(some.Index, renamed[u])
	}
	some.Unknowns = len(kept)
	s := randomMatrices(whole, 3)
	o := &system{Pattern: some, matrices: s.matrices}

	full, part := s.dense(), o.dense()
	for i, u := range kept {
		for j, v := range kept {
			if full[u*whole.Unknowns+v] != part[i*some.Unknowns+j] {
				t.Fatal("test matrices differ")
			}
		}
	}
	x := vector(rand.New(rand.NewPCG(1, 1)), some.Unknowns)
	b := slices.Clone(x)
	factorise(t, o, 1).Solve(x)
	for i := range b {
		for j := range x {
			b[i] -= part[i*some.Unknowns+j] * x[j]
		}
	}
	if d := distance(x, plus(x, b)); d > 1e-12 {
		t.Errorf("remainder is %.2g of the solution", d)
	}
}

func plus(x, y []float64) []float64 {
	z := slices.Clone(x)
	for i := range z {
		z[i] += y[i]
	}
	return z
}

func TestFactorStopsWithItsContext(t *testing.T) {
	s := randomMatrices(rectangle(8, 8).pattern(3, 2), 1)
	p, err := Analyse(s.Pattern)
	if err != nil {
		t.Fatal(err)
	}
	for workers := 1; workers < 4; workers++ {
		ctx, cancel := context.WithCancel(context.Background())
		fill := func(worker, e int, m []float64) {
			s.fill(worker, e, m)
			if e == 20 {
				cancel()
			}
		}
		if f, err := p.Factor(ctx, fill, new(Workspace), workers); err != context.Canceled || f != nil {
			t.Errorf("%d workers: got %v, %v", workers, f, err)
		}
	}
}

func TestFactorEndsWithItsWorkspace(t *testing.T) {
	s := randomMatrices(rectangle(2, 2).pattern(2, 1), 1)
	p, _ := Analyse(s.Pattern)
	w := new(Workspace)
	f, err := p.Factor(context.Background(), s.fill, w, 1)
	if err != nil {
		t.Fatal(err)
	}
	if _, err := p.Factor(context.Background(), s.fill, w, 1); err != nil {
		t.Fatal(err)
	}
	defer func() {
		if recover() == nil {
			t.Error("a factor whose workspace went on still solves")
		}
	}()
	f.Solve(make([]float64, s.Unknowns))
}
