package extrapolate

import (
	"math"
	"testing"
)

// samples are the three of Celik et al., J. Fluids Eng. 130 (2008) 078001,
// table 1, a plane calculation with N cells; h = sqrt(1/N). The limits are the
// paper's; orders and indices are recomputed from the paper's values to one
// figure more than it prints (1.53, 0.75, 1.51; 2.2, 1.1, 0.5 %). The last
// column but one is the distance, recomputed for the first sample alone.
var samples = []struct {
	name            string
	cells, f        [3]float64
	order, orderTol float64
	limit           float64
	gci             float64 // percent
	change          float64 // percent; 0: not compared
	distance        float64 // percent; 0: not compared
	status          Status
}{
	{"reattachment length", [3]float64{18000, 8000, 4500}, [3]float64{6.063, 5.972, 5.863}, 1.534, 5e-4, 6.1685, 2.17, 1.50, 1.71, Monotone},
	{"axial velocity", [3]float64{18000, 4500, 980}, [3]float64{10.7880, 10.7250, 10.6050}, 0.752, 5e-4, 10.8801, 1.07, 0, 0, Monotone},
	{"axial velocity, oscillating", [3]float64{18000, 4500, 980}, [3]float64{6.0042, 5.9624, 6.0909}, 1.51, 5e-3, 6.0269, 0.47, 0, 0, Oscillatory},
}

func TestSizesPublishedSamples(t *testing.T) {
	for _, c := range samples {
		h := make([]float64, 3)
		for i, n := range c.cells {
			h[i] = math.Sqrt(1 / n)
		}
		s := Sizes(h, c.f[:])
		check := func(what string, got, want, tol float64) {
			if want != 0 && !(math.Abs(got-want) <= tol) {
				t.Errorf("%s: %s %.6g, paper %.6g", c.name, what, got, want)
			}
		}
		check("order", s.Order, c.order, c.orderTol)
		check("limit", s.Limit, c.limit, 5.1e-5)
		check("change %", 100*s.Change, c.change, 0.0051)
		check("distance %", 100*s.Distance, c.distance, 0.0051)
		check("gci %", 100*s.GCI, c.gci, 0.0051)
		if s.Status != c.status {
			t.Errorf("%s: status %v, want %v", c.name, s.Status, c.status)
		}
	}
}

// Exact sequences f + C h^p must give p, f and an asymptotic ratio that is 1
// but for the change of f itself (the index is relative to each rung's value).
func TestSizesRecoversPowerLaw(t *testing.T) {
	for _, h := range [][]float64{{1, 2, 4}, {1, 1.31, 3}, {1, 3, 4}, {8, 4, 2, 1}, {1, 1.05, 9}, {1, 9, 9.5}} {
		for _, p := range []float64{0.3, 1, 2, 3.7, 8} {
			for _, c := range []float64{-1e-4, 1e-5} {
				f := make([]float64, len(h))
				for i := range h {
					f[i] = 5 + c*math.Pow(h[i], p)
				}
				s := Sizes(h, f)
				if s.Status != Monotone || math.Abs(s.Order-p) > 1e-5*p || math.Abs(s.Limit-5) > 1e-9 {
					t.Errorf("h %v p %g: %v order %.9g limit %.12g", h, p, s.Status, s.Order, s.Limit)
				}
				if e := s.Estimate(); math.Abs(e.Value-5) > e.Uncertainty {
					t.Errorf("h %v p %g: %.9g ± %.3g misses 5", h, p, e.Value, e.Uncertainty)
				}
			}
		}
	}
	s := Sizes([]float64{1, 2, 4}, []float64{5 + 1e-6, 5 + 4e-6, 5 + 16e-6})
	if math.Abs(s.Asymptotic-1) > 1e-5 {
		t.Errorf("asymptotic ratio %g", s.Asymptotic)
	}
}

func TestSizesStatus(t *testing.T) {
	h := []float64{4, 2, 1}
	for _, c := range []struct {
		name string
		h, f []float64
		want Status
	}{
		{"no rungs", nil, nil, TooFew},
		{"two rungs", h[:2], []float64{1, 2}, TooFew},
		{"corner: grows as h^-0.45", h, []float64{math.Pow(4, -.45), math.Pow(2, -.45), 1}, Diverging},
		{"grows as -ln h", h, []float64{0, 1, 2}, Diverging},
		{"growing oscillation", h, []float64{5, 6, 4}, Diverging},
		{"unequal ratios hide growth", []float64{9, 2, 1}, []float64{1, 2.5, 3.3}, Diverging},
		{"all equal", h, []float64{3, 3, 3}, Converged},
		{"to rounding", h, []float64{3, 3 + 1e-13, 3 - 1e-13}, Converged},
		{"accidental agreement", h, []float64{2, 3, 3}, Undecided},
		{"not a number", h, []float64{2, math.NaN(), 3}, Undecided},
		{"infinite", h, []float64{2, 2.5, math.Inf(1)}, Undecided},
		{"all zero", h, []float64{0, 0, 0}, Converged},
	} {
		s := Sizes(c.h, c.f)
		if s.Status != c.want {
			t.Errorf("%s: %v, want %v", c.name, s.Status, c.want)
		}
		e := s.Estimate()
		if !c.want.Settled() && (!math.IsNaN(e.Value) || !math.IsInf(e.Uncertainty, 1) || len(e.Notes) == 0) {
			t.Errorf("%s: %v ± %v must be no value, with a note", c.name, e.Value, e.Uncertainty)
		}
		if c.want.Settled() && (math.IsNaN(e.Value) || math.IsNaN(e.Uncertainty)) {
			t.Errorf("%s: %v ± %v", c.name, e.Value, e.Uncertainty)
		}
	}
	var zero Study
	if e := zero.Estimate(); e.Status != Undecided || !math.IsNaN(e.Value) {
		t.Errorf("zero study gives %+v", e)
	}
}

// Two rungs and the trusted order, from the definitions: 1 + h² at h = 1, 2.
func TestTwoRungs(t *testing.T) {
	if got := Richardson(2, 5, 2, 2); got != 1 {
		t.Errorf("limit %g, want 1", got)
	}
	if got, want := TwoRungs(2, 5, 2, 2), 3*1.5/3; got != want {
		t.Errorf("gci %g, want %g", got, want)
	}
}

func TestSizesPanics(t *testing.T) {
	for name, h := range map[string][]float64{"equal": {1, 1, 2}, "zero": {0, 1, 2}, "not monotone": {1, 3, 2}, "number": {1, 2}, "nan": {1, math.NaN(), 2}} {
		func() {
			defer func() {
				if recover() == nil {
					t.Errorf("%s: no panic", name)
				}
			}()
			Sizes(h, []float64{1, 2, 3})
		}()
	}
}

// A ladder that has come down a hundredfold and whose last difference but one is
// small by accident is undecided, not diverging; one that grows from the start
// diverges.
func TestSizesTellAccidentsFromGrowth(t *testing.T) {
	sizes := []float64{8, 4, 2, 1}
	if s := Sizes(sizes, []float64{2.054, 2.1044, 2.1043, 2.1022}); s.Status != Undecided || !math.IsNaN(s.Estimate().Value) {
		t.Errorf("an accident: %s, %v", s.Status, s.Estimate())
	}
	if s := Sizes(sizes, []float64{2, 2.7, 3.7, 5.1}); s.Status != Diverging {
		t.Errorf("growth: %s", s.Status)
	}
}
