package extrapolate

import (
	"math"
	"math/rand/v2"
	"testing"
)

// rungs makes a ladder of orders 2 … n+1 whose error falls by a share a rung,
// with a witness of the error's size times a factor.
func rungs(n int, limit, first, share, factor float64, sign func(i int) float64) (orders []int, values, wide, near []float64) {
	for i := range n {
		e := first * math.Pow(share, float64(i))
		orders = append(orders, i+2)
		values = append(values, limit+sign(i)*e)
		wide = append(wide, factor*e)
		near = append(near, factor*e/4)
	}
	return orders, values, wide, near
}

func plus(int) float64        { return 1 }
func alternate(i int) float64 { return 1 - 2*float64(i%2) }

// TestWitnessedCoversKnownLimits: geometric ladders of either sign pattern, with
// a witness of about the error's size, have their limit inside the bar, and the
// bar is not beyond all measure.
func TestWitnessedCoversKnownLimits(t *testing.T) {
	for _, share := range []float64{0.05, 0.1, 0.2, 0.4, 0.6, 0.75} {
		for _, factor := range []float64{1, 3, 10} {
			for n := 3; n <= 7; n++ {
				for name, sign := range map[string]func(int) float64{"one sign": plus, "alternating": alternate} {
					e := Witnessed(rungs(n, 2, 0.05, share, factor, sign))
					err := math.Abs(e.Value - 2)
					if !e.Status.Settled() {
						t.Errorf("%s, share %g, factor %g, %d rungs: %s", name, share, factor, n, e.Status)
						continue
					}
					if err > e.Uncertainty {
						t.Errorf("%s, share %g, factor %g, %d rungs: error %.2e outside the bar %.2e", name, share, factor, n, err, e.Uncertainty)
					}
					if e.Uncertainty > 20*err {
						t.Errorf("%s, share %g, factor %g, %d rungs: bar %.1f times the error", name, share, factor, n, e.Uncertainty/err)
					}
				}
			}
		}
	}
}

// TestWitnessedAccidents: errors of random sign and size below a falling envelope,
// beside a witness of half to one and a half times that envelope. A last difference
// that is small by accident does not shrink the bar below the error.
func TestWitnessedAccidents(t *testing.T) {
	rng := rand.New(rand.NewPCG(5, 6))
	inside, total := 0, 0
	for range 4000 {
		n := 3 + rng.IntN(4)
		share := 0.08 + 0.5*rng.Float64()
		orders, values, wide, near := rungs(n, 1.7, 0.05, share, 4*(0.5+rng.Float64()), func(int) float64 { return 2*rng.Float64() - 1 })
		e := Witnessed(orders, values, wide, near)
		if !e.Status.Settled() {
			continue
		}
		total++
		if math.Abs(e.Value-1.7) <= e.Uncertainty {
			inside++
		}
	}
	if share := float64(inside) / float64(total); share < 0.99 || total < 2000 {
		t.Errorf("%.2f %% of %d inside", 100*share, total)
	}
}

// TestWitnessedStatus: what each kind of ladder is called, and that a ladder
// without an answer has no value that could pass for one.
func TestWitnessedStatus(t *testing.T) {
	orders := []int{2, 3, 4, 5}
	small := []float64{1e-2, 1e-3, 1e-4, 1e-5}
	flat := []float64{1e-2, 1e-2, 0.9e-2, 1e-2}
	for _, row := range []struct {
		name    string
		values  []float64
		witness []float64
		want    Status
	}{
		{"two rungs", []float64{2, 2.1}, small[:2], TooFew},
		{"one sign", []float64{2, 2.1, 2.12, 2.121}, small, Monotone},
		{"alternating", []float64{2, 2.1, 2.08, 2.082}, small, Oscillatory},
		{"witness stays", []float64{2, 2.1, 2.12, 2.121}, flat, Undecided},
		{"growing like a corner", []float64{2, 3, 4.1, 5.3}, small, Diverging},
		{"rounding", []float64{2, 2 + 1e-14, 2, 2 - 1e-14}, []float64{1e-12, 1e-12, 1e-12, 1e-12}, Converged},
		{"not a number", []float64{2, math.NaN(), 2, 2}, small, Undecided},
	} {
		n := len(row.values)
		e := Witnessed(orders[:n], row.values, row.witness, row.witness)
		if e.Status != row.want {
			t.Errorf("%s: %s, want %s", row.name, e.Status, row.want)
		}
		if (row.want == TooFew || row.want == Diverging) && !(math.IsNaN(e.Value) && math.IsInf(e.Uncertainty, 1)) {
			t.Errorf("%s: %g ± %g is no answer", row.name, e.Value, e.Uncertainty)
		}
	}
}

// TestWitnessedScales: the unit of the values is without meaning.
func TestWitnessedScales(t *testing.T) {
	orders, values, wide, near := rungs(5, 3, 0.1, 0.3, 1, alternate)
	one := Witnessed(orders, values, wide, near)
	for _, list := range [][]float64{values, wide, near} {
		for i := range list {
			list[i] *= 1024
		}
	}
	many := Witnessed(orders, values, wide, near)
	if many.Value != 1024*one.Value || many.Uncertainty != 1024*one.Uncertainty || many.Order != one.Order || many.Status != one.Status {
		t.Errorf("%+v, scaled %+v", one, many)
	}
}

// TestWitnessedSeesGrowth: values that grow like a power of the order or its
// logarithm, as at a sharp corner, are called diverging from four rungs on;
// values that converge, however slowly, are not.
func TestWitnessedSeesGrowth(t *testing.T) {
	for _, row := range []struct {
		name  string
		value func(p float64) float64
		grows bool
	}{
		{"order^0.1", func(p float64) float64 { return math.Pow(p, 0.1) }, true},
		{"order^0.9", func(p float64) float64 { return math.Pow(p, 0.9) }, true},
		{"logarithm", math.Log, true},
		{"1/order", func(p float64) float64 { return 2 - 1/p }, false},
		{"1/order^3", func(p float64) float64 { return 2 - 1/(p*p*p) }, false},
		{"geometric", func(p float64) float64 { return 2 - math.Pow(0.7, p) }, false},
	} {
		for n := 4; n <= 7; n++ {
			var orders []int
			var values, witness []float64
			for i := range n {
				p := float64(i + 2)
				orders, values, witness = append(orders, i+2), append(values, row.value(p)), append(witness, math.Pow(0.5, p))
			}
			if e := Witnessed(orders, values, witness, witness); (e.Status == Diverging) != row.grows {
				t.Errorf("%s, %d rungs: %s", row.name, n, e.Status)
			}
		}
	}
}

// TestConfirmed: the distance of a second mesh is in the bar, the witness counts
// no more than ladder and second mesh together, and a ladder without a value gets
// none from a second mesh.
func TestConfirmed(t *testing.T) {
	orders, values, wide, near := rungs(4, 2, 0.05, 0.2, 3, alternate)
	e := Witnessed(orders, values, wide, near)
	for _, gap := range []float64{0, 1e-4, -1e-4, 0.3} {
		c := e.Confirmed(e.Value + gap)
		open := c.Signals.Ladder + math.Abs(gap)
		if c.Value != e.Value || math.Abs(c.Signals.Second-math.Abs(gap)) > 1e-15 {
			t.Errorf("gap %g: value %g, second %g", gap, c.Value, c.Signals.Second)
		}
		if c.Uncertainty < open || c.Uncertainty > 2*open || c.Uncertainty > open+e.Signals.Witness {
			t.Errorf("gap %g: bar %g, ladder and second mesh %g", gap, c.Uncertainty, open)
		}
	}
	if c := e.Confirmed(math.NaN()); c.Status.Settled() || !math.IsNaN(c.Value) {
		t.Errorf("a second mesh without a number: %+v", c)
	}
	none := Witnessed(orders[:2], values[:2], wide[:2], near[:2]).Confirmed(2)
	if !math.IsNaN(none.Value) || none.Status.Settled() {
		t.Errorf("two rungs and a second mesh: %+v", none)
	}
}
