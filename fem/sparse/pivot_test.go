package sparse

import (
	"context"
	"errors"
	"math"
	"math/rand/v2"
	"strings"
	"testing"
)

// floating makes semidefinite element matrices that resist everything but a
// common shift of all unknowns of the same component.
func floating(p Pattern, c int) *system {
	rng := rand.New(rand.NewPCG(11, 12))
	s := &system{Pattern: p}
	for e := range int32(p.Elements()) {
		n := len(p.list(e))
		m := make([]float64, n*n)
		v := make([]float64, n)
		for range n {
			sum := make([]float64, c)
			for i := range v {
				v[i] = rng.NormFloat64()
				sum[i%c] += v[i]
			}
			for i := range v {
				v[i] -= sum[i%c] / float64(n/c)
			}
			for i := range n {
				for j := range n {
					m[i*n+j] += v[i] * v[j]
				}
			}
		}
		s.matrices = append(s.matrices, m)
	}
	return s
}

// fault factorises a matrix that must be refused, with several numbers of
// workers, which must agree.
func fault(t *testing.T, s *system) *PivotError {
	t.Helper()
	p, err := Analyse(s.Pattern)
	if err != nil {
		t.Fatal(err)
	}
	var first *PivotError
	for _, workers := range []int{1, 2, 5} {
		f, err := p.Factor(context.Background(), s.fill, new(Workspace), workers)
		var e *PivotError
		if !errors.As(err, &e) || f != nil {
			t.Fatalf("got %v, %v, want a pivot error", f, err)
		}
		if first == nil {
			first = e
		} else if *e != *first && e.Pivot == e.Pivot {
			t.Fatalf("%d workers: %v, with one: %v", workers, e, first)
		}
	}
	return first
}

func TestFloatingBodyIsRefused(t *testing.T) {
	for order := 1; order <= 6; order++ {
		for c := 1; c <= 3; c++ {
			s := floating(fan(4, 5).pattern(order, c), c)
			e := fault(t, s)
			if r := math.Abs(e.Relative()); !(r <= 1e-12) {
				t.Errorf("order %d, %d components: relative pivot %g", order, c, r)
			}
			// Hold the unknown that was named, one of each component in turn:
			// the body must then be supported.
			for range c {
				stiffen(s, fault(t, s).Unknown, 1)
			}
			factorise(t, s, 1)
		}
	}
}

// stiffen adds a spring to one unknown.
func stiffen(s *system, unknown int, spring float64) {
	for e := range int32(s.Elements()) {
		list := s.list(e)
		for i, u := range list {
			if int(u) == unknown {
				s.matrices[e][i*len(list)+i] += spring
				return
			}
		}
	}
}

func TestLooseUnknownIsNamed(t *testing.T) {
	s := randomMatrices(rectangle(5, 4).pattern(3, 2), 1)
	const loose = 37
	for e := range int32(s.Elements()) {
		list := s.list(e)
		for i, u := range list {
			for j, v := range list {
				if u == loose || v == loose {
					s.matrices[e][i*len(list)+j] = 0
				}
			}
		}
	}
	if e := fault(t, s); e.Unknown != loose || e.Relative() != 0 {
		t.Errorf("got %v, want unknown %d", e, loose)
	}
}

func TestBadMatricesAreRefused(t *testing.T) {
	pattern := rectangle(3, 3).pattern(2, 2)
	for _, c := range []struct {
		name  string
		spoil func(m []float64)
		want  string
	}{
		{"negative", func(m []float64) {
			for i := range m {
				m[i] = -m[i]
			}
		}, "not positive"},
		{"zero", func(m []float64) { clear(m) }, "not positive"},
		{"not a number", func(m []float64) { m[len(m)-1] = math.NaN() }, "not a finite number"},
		{"infinite", func(m []float64) { m[len(m)-1] = math.Inf(1) }, "not a finite number"},
		{"indefinite", func(m []float64) { m[len(m)-2] += 1e3 }, "not positive definite"},
	} {
		s := randomMatrices(pattern, 2)
		for _, m := range s.matrices {
			c.spoil(m)
		}
		if e := fault(t, s); !strings.Contains(e.Error(), c.want) {
			t.Errorf("%s: got %q, want %q", c.name, e, c.want)
		}
	}
}

// TestPivotsOfADiagonalMatrix: without coupling, pivots are the entries.
func TestPivotsOfADiagonalMatrix(t *testing.T) {
	p := rectangle(3, 2).pattern(3, 1)
	s := &system{Pattern: p}
	for e := range int32(p.Elements()) {
		list := p.list(e)
		m := make([]float64, len(list)*len(list))
		for i, u := range list {
			m[i*len(list)+i] = float64(1 + (int(u)+7)%p.Unknowns)
		}
		s.matrices = append(s.matrices, m)
	}
	a := s.dense()
	want := Pivots{Smallest: math.Inf(1)}
	for u := range p.Unknowns {
		d := a[u*p.Unknowns+u]
		if want.Largest = max(want.Largest, d); d < want.Smallest {
			want.Smallest, want.Unknown = d, u
		}
	}
	if got := factorise(t, s, 2).Pivots(); got != want || got.Ratio() != want.Smallest/want.Largest {
		t.Errorf("got %+v, want %+v", got, want)
	}
}
