package extrapolate

import (
	"math"
	"math/rand/v2"
	"testing"
)

// A family draws sequences with a known limit: it returns the error at order p
// in units of its amplitude, and limit and amplitude are drawn by the test.
type family struct {
	name  string
	cover float64 // least share of bars that hold the true error, percent
	width float64 // largest median of bar ÷ true error; 0: only reported
	draw  func(r *rand.Rand) func(p float64) float64
}

func uniform(r *rand.Rand, a, b float64) float64 { return a + (b-a)*r.Float64() }
func decades(r *rand.Rand, a, b float64) float64 { return a * math.Pow(b/a, r.Float64()) }
func ratio(r *rand.Rand) float64                 { return uniform(r, 0.05, 0.7) }
func sign(r *rand.Rand) float64                  { return float64(2*r.IntN(2) - 1) }

var families = []family{
	{"geometric", 99, 10, func(r *rand.Rand) func(float64) float64 {
		q := ratio(r)
		return func(p float64) float64 { return math.Pow(q, p) }
	}},
	{"geometric, alternating", 99, 10, func(r *rand.Rand) func(float64) float64 {
		q := ratio(r)
		return func(p float64) float64 { return math.Pow(-q, p) }
	}},
	{"algebraic", 99, 10, func(r *rand.Rand) func(float64) float64 {
		k := uniform(r, 1, 8)
		return func(p float64) float64 { return math.Pow(p, -k) }
	}},
	{"geometric + noise", 99, 10, func(r *rand.Rand) func(float64) float64 {
		q, n := sign(r)*ratio(r), decades(r, 1e-9, 1e-3)
		return func(p float64) float64 { return math.Pow(q, p) + n*uniform(r, -1, 1) }
	}},
	{"two geometric, opposite", 99, 10, func(r *rand.Rand) func(float64) float64 {
		q, s, b := ratio(r), ratio(r), decades(r, 0.1, 10)
		return func(p float64) float64 { return math.Pow(q, p) - b*math.Pow(s, p) }
	}},
	{"geometric + alternating", 99, 10, func(r *rand.Rand) func(float64) float64 {
		q, s, b := ratio(r), ratio(r), decades(r, 0.1, 10)
		return func(p float64) float64 { return math.Pow(q, p) - b*math.Pow(-s, p) }
	}},
	{"geometric + algebraic", 99, 10, func(r *rand.Rand) func(float64) float64 {
		q, k, b := ratio(r), uniform(r, 2, 8), decades(r, 1e-3, 1)
		return func(p float64) float64 { return math.Pow(q, p) + b*math.Pow(p, -k) }
	}},
	{"stagnating at 1e-12", 99, 10, func(r *rand.Rand) func(float64) float64 {
		q := uniform(r, 0.01, 0.05)
		return func(p float64) float64 { return math.Pow(q, p) + 1e-12*uniform(r, -1, 1) }
	}},
	// A bar that follows the worst recent contraction is wide here.
	{"faster than geometric", 99, 0, func(r *rand.Rand) func(float64) float64 {
		a := sign(r) * uniform(r, 0.3, 3)
		return func(p float64) float64 { return math.Pow(a, p) / math.Gamma(p+1) }
	}},
	// Harder than anything a rule of differences can be sharp on: the true
	// error itself is now and then small by accident, or large by a factor. For
	// the last of them a lucky run of errors of one size passes for convergence
	// in one or two ladders of a hundred; the differences cannot tell.
	{"rotating phase", 99, 0, func(r *rand.Rand) func(float64) float64 {
		q, turn, start := ratio(r), uniform(r, 0, math.Pi), uniform(r, 0, 2*math.Pi)
		return func(p float64) float64 { return math.Pow(q, p) * math.Cos(turn*p+start) }
	}},
	{"random signs, factor 4", 99, 0, func(r *rand.Rand) func(float64) float64 {
		q := ratio(r)
		return func(p float64) float64 { return math.Pow(q, p) * decades(r, 0.5, 2) * sign(r) }
	}},
	{"one sign, factor 4", 98, 0, func(r *rand.Rand) func(float64) float64 {
		q := ratio(r)
		return func(p float64) float64 { return math.Pow(q, p) * decades(r, 0.5, 2) }
	}},
}

// TestOrdersCalibrated holds the bar against the known limits: ladders of 3 to
// 7 rungs starting at order 1, 2 or 3. go test -run Calibrated -v prints the table.
func TestOrdersCalibrated(t *testing.T) {
	const draws = 2500
	t.Logf("%-26s %5s %9s %8s %8s %9s %8s", "family", "rungs", "cover %", "median", "90 %", "worst", "no value")
	for _, f := range families {
		r := rand.New(rand.NewPCG(20, 26))
		var all tally
		for rungs := 3; rungs <= 7; rungs++ {
			var one tally
			for range draws {
				one.add(ladder(r, f, rungs))
			}
			t.Logf("%-26s %5d %s", f.name, rungs, &one)
			if rungs > 3 {
				all.merge(&one)
			}
		}
		t.Logf("%-26s %5s %s", f.name, "4-7", &all)
		if all.cover() < f.cover {
			t.Errorf("%s: the bar holds the error in %.2f %%, want %g %%", f.name, all.cover(), f.cover)
		}
		if m := all.quantile(0.5); f.width > 0 && !(m <= f.width) {
			t.Errorf("%s: the bar is %.1f times the error in the median, want at most %g", f.name, m, f.width)
		}
		// Below order 4 some of these do grow before they shrink, or by scatter.
		if float64(all.none) > 0.03*float64(all.n) {
			t.Errorf("%s: no value for %d of %d converging ladders", f.name, all.none, all.n)
		}
	}
}

// ladder draws one sequence; the limit has order one, the amplitude 1 to 100 %.
func ladder(r *rand.Rand, f family, rungs int) (Estimate, float64) {
	e := f.draw(r)
	limit, amplitude, start := sign(r)*uniform(r, 1, 4), decades(r, 0.01, 1), 1+r.IntN(3)
	if f.name == "stagnating at 1e-12" {
		amplitude = math.Abs(limit) // the scatter is relative to the values
	}
	orders, values := make([]int, rungs), make([]float64, rungs)
	for i := range orders {
		orders[i] = start + i
		values[i] = limit + amplitude*e(float64(orders[i]))
	}
	return Orders(orders, values), limit
}

func run(start, n int, f func(p float64) float64) ([]int, []float64) {
	orders, values := make([]int, n), make([]float64, n)
	for i := range orders {
		orders[i] = start + i
		values[i] = f(float64(start + i))
	}
	return orders, values
}

func TestOrdersStatus(t *testing.T) {
	geometric := func(q float64) func(float64) float64 {
		return func(p float64) float64 { return 2 + math.Pow(q, p) }
	}
	for _, c := range []struct {
		name     string
		start, n int
		f        func(p float64) float64
		want     Status
	}{
		{"one rung", 2, 1, geometric(0.3), TooFew},
		{"two rungs", 2, 2, geometric(0.3), TooFew},
		{"geometric", 2, 6, geometric(0.3), Monotone},
		{"alternating", 2, 6, geometric(-0.3), Oscillatory},
		{"constant", 2, 6, func(float64) float64 { return 3 }, Converged},
		{"zero", 2, 6, func(float64) float64 { return 0 }, Converged},
		{"to rounding", 5, 5, geometric(1e-3), Converged},
		// A sharp 90° re-entrant corner, wedge eigenvalue 0.5445 (Williams 1952):
		// the stress grows as order^(2 (1 - 0.5445)).
		{"corner", 2, 7, func(p float64) float64 { return 2 * math.Pow(p, 0.911) }, Diverging},
		{"corner, three rungs", 4, 3, func(p float64) float64 { return 2 * math.Pow(p, 0.911) }, Diverging},
		{"faint corner", 2, 7, func(p float64) float64 { return 2 * math.Pow(p, 0.05) }, Diverging},
		{"logarithm", 2, 7, math.Log, Diverging},
		{"falling logarithm", 2, 7, func(p float64) float64 { return -math.Log(p) }, Diverging},
		{"exponential", 1, 6, func(p float64) float64 { return math.Exp(p) }, Diverging},
		{"growing swings", 1, 6, func(p float64) float64 { return math.Pow(-1.5, p) }, Diverging},
		{"even swings", 1, 6, func(p float64) float64 { return math.Pow(-1, p) }, Diverging},
		{"corner with odd-even ripple", 2, 7, func(p float64) float64 { return math.Pow(p, 0.911) + 0.1*math.Cos(math.Pi*p) }, Diverging},
		{"scatter after convergence", 1, 7, func(p float64) float64 {
			return 2 + math.Pow(0.05, p) + 1e-5*[]float64{0, 3, -5, 4, -1, 5, 4, -3}[int(p)]
		}, Stagnating},
		{"scatter from the start", 1, 7, func(p float64) float64 { return []float64{0, 3, 5, 4, 1, 5, 2, 6}[int(p)] }, Undecided},
		{"not a number", 1, 4, func(p float64) float64 { return math.Sqrt(p - 2) }, Undecided},
		{"infinite", 1, 4, func(p float64) float64 { return 1 / (p - 2) }, Undecided},
	} {
		e := Orders(run(c.start, c.n, c.f))
		if e.Status != c.want {
			t.Errorf("%s: %v (%v), want %v", c.name, e.Status, e.Notes, c.want)
		}
		if c.want == Diverging || c.want == TooFew {
			if !math.IsNaN(e.Value) || !math.IsInf(e.Uncertainty, 1) || len(e.Notes) == 0 {
				t.Errorf("%s: %v ± %v must be no value, with a note", c.name, e.Value, e.Uncertainty)
			}
		}
		if c.want.Settled() && !(e.Uncertainty < math.Inf(1)) {
			t.Errorf("%s: bar %v", c.name, e.Uncertainty)
		}
	}
	var zero Estimate
	if zero.Status != Undecided || zero.Status.Settled() {
		t.Error("the zero estimate passes for an answer")
	}
}

// The contraction is reported a unit of order, whatever the steps.
func TestOrdersShare(t *testing.T) {
	for _, step := range []int{1, 2} {
		var orders []int
		var values []float64
		for p := 1; p <= 11; p += step {
			orders = append(orders, p)
			values = append(values, 1+math.Pow(0.4, float64(p)))
		}
		e := Orders(orders, values)
		if math.Abs(e.Order-0.4) > 1e-6 {
			t.Errorf("step %d: share %.9g, want 0.4", step, e.Order)
		}
	}
}

// Steps may be unequal: a power law is still recognised and covered tightly
// (1.25, and a little more where the contraction is faster than is believed).
func TestOrdersUnequalSteps(t *testing.T) {
	orders := []int{1, 2, 4, 6, 8, 12}
	for _, k := range []float64{1.5, 3, 6} {
		values := make([]float64, len(orders))
		for i, p := range orders {
			values[i] = 7 - math.Pow(float64(p), -k)
		}
		e := Orders(orders, values)
		off := math.Abs(e.Value - 7)
		if !(off <= e.Uncertainty && e.Uncertainty <= 1.5*off) {
			t.Errorf("k %g: bar %.3g, error %.3g", k, e.Uncertainty, off)
		}
	}
}

// Scale and sign of the values must not matter. (A shift does: rounding is
// relative to the values.)
func TestOrdersScales(t *testing.T) {
	r := rand.New(rand.NewPCG(3, 4))
	for range 2000 {
		f := families[r.IntN(len(families))]
		e := f.draw(r)
		orders, values := run(1, 3+r.IntN(5), func(p float64) float64 { return 2 + e(p) })
		want := Orders(orders, values)
		for _, scale := range []float64{-1, 0x1p40, -0x1p-60} {
			scaled := make([]float64, len(values))
			for i, v := range values {
				scaled[i] = scale * v
			}
			got := Orders(orders, scaled)
			same := got.Value == scale*want.Value && got.Uncertainty == math.Abs(scale)*want.Uncertainty || math.IsNaN(want.Value) && math.IsNaN(got.Value)
			if got.Status != want.Status || got.Order != want.Order || !same {
				t.Fatalf("%s × %g: %+v, unscaled %+v", f.name, scale, got, want)
			}
		}
	}
}

// An accidentally small last difference must not shrink the bar.
func TestOrdersAccident(t *testing.T) {
	orders := []int{2, 3, 4, 5, 6}
	values := []float64{2.2, 2.05, 1.95, 2.0004, 2.0003}
	if e := Orders(orders, values); e.Uncertainty < 0.01 {
		t.Errorf("bar %.3g trusts a difference of 1e-4 after one of 0.05", e.Uncertainty)
	}
}

func TestOrdersPanics(t *testing.T) {
	for name, orders := range map[string][]int{"number": {1, 2}, "equal": {1, 2, 2}, "falling": {3, 2, 1}, "zero": {0, 1, 2}} {
		func() {
			defer func() {
				if recover() == nil {
					t.Errorf("%s: no panic", name)
				}
			}()
			Orders(orders, []float64{1, 2, 3})
		}()
	}
}

func BenchmarkOrders(b *testing.B) {
	orders, values := run(2, 7, func(p float64) float64 { return 2 + math.Pow(-0.3, p) + 0.1*math.Pow(0.5, p) })
	for b.Loop() {
		Orders(orders, values)
	}
}
