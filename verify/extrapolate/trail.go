package extrapolate

import (
	"math"
	"slices"
)

// window is how many last differences are looked at. Older ones belong to orders
// too low to have seen the notch.
const window = 4

// fastest is the smallest share of the error that one more rung is believed to leave.
const fastest = 0.1

// A trail is the differences of a ladder with what they show.
type trail struct {
	p       []float64 // orders as numbers, of the rungs in the window
	d       []float64 // |differences|, raised to level; d[i] is between p[i] and p[i+1]
	level   float64   // rounding level
	largest float64   // largest difference of the whole ladder

	same, alternating bool      // signs of all of d
	stalled           bool      // some difference did not shrink
	powers            []float64 // exponent k through neighbours d[i], d[i+1]
	rates             []float64 // -ln of the contraction d[i+1]/d[i], per rung
}

func newTrail(orders []int, values []float64) *trail {
	t := &trail{level: noise(values), same: true, alternating: true}
	first := max(0, len(values)-1-window)
	var before float64
	for i := 1; i < len(values); i++ {
		step := values[i] - values[i-1]
		t.largest = math.Max(t.largest, math.Abs(step))
		if i <= first {
			continue
		}
		t.p = append(t.p, float64(orders[i-1]))
		t.d = append(t.d, math.Max(math.Abs(step), t.level))
		if i > first+1 {
			turned := math.Signbit(step) != math.Signbit(before)
			t.same = t.same && !turned
			t.alternating = t.alternating && turned
		}
		before = step
	}
	t.p = append(t.p, float64(orders[len(orders)-1]))
	for i := 1; i < len(t.d); i++ {
		t.powers = append(t.powers, powerThrough(t.p[i-1:i+2], t.d[i-1], t.d[i]))
		rate := -math.Log(t.d[i] / t.d[i-1])
		t.rates = append(t.rates, rate)
		t.stalled = t.stalled || rate <= 0
	}
	return t
}

// last returns the i-th last difference, 0 the very last.
func (t *trail) last(i int) float64 { return t.d[len(t.d)-1-i] }

// recent returns the largest of the last n differences there are.
func (t *trail) recent(n int) float64 {
	m := 0.0
	for i := range min(n, len(t.d)) {
		m = math.Max(m, t.last(i))
	}
	return m
}

// diverges tells that the differences have no sum: they keep their sign and do
// not shrink as fast as 1/n (a sharp corner: order^s), or alternate and grow.
// Differences of n^-1 sum to ln n, those of n^-(k+1) with
// k > 0 to something finite, so the exponent from the older to the newer half of
// the window decides, each half standing for its larger difference (odd and even
// orders may differ). What has come down tenfold before is scatter, and growth at
// the rounding level means nothing.
func (t *trail) diverges() bool {
	n := len(t.d)
	if t.recent(n) <= 2*t.level || t.recent(2) < t.largest/10 {
		return false
	}
	old, late := 0, n-1
	if n > 2 && t.d[1] > t.d[0] {
		old = 1
	}
	if n > 3 && t.d[n-2] > t.d[n-1] {
		late = n - 2
	}
	ends := []float64{t.p[old], t.p[old+1], t.p[late], t.p[late+1]}
	if t.same {
		return powerBetween(ends, t.d[old], t.d[late]) <= summable && t.weakest() <= summable
	}
	return t.alternating && !slices.ContainsFunc(t.rates, func(r float64) bool { return r > 0 })
}

// summable is the exponent above which differences sum to a limit: 0, but for
// the rounding of the fit.
const summable = 1e-3

// weakest is the last exponent or, where odd and even orders differ, the lower
// of the last two. A geometric ladder starts below exponent 0 and climbs.
func (t *trail) weakest() float64 {
	if slices.IsSorted(t.powers) || !t.stalled {
		return t.powers[len(t.powers)-1]
	}
	return t.leastPower()
}

// leastPower is the smaller of the last two exponents.
func (t *trail) leastPower() float64 {
	k := math.Inf(1)
	for i := max(0, len(t.powers)-2); i < len(t.powers); i++ {
		k = math.Min(k, t.powers[i])
	}
	return k
}

func checkOrders(orders []int, values []float64) {
	if len(orders) != len(values) {
		panic("extrapolate: orders and values differ in number")
	}
	for i, p := range orders {
		if p < 1 || i > 0 && p <= orders[i-1] {
			panic("extrapolate: orders must grow from at least 1")
		}
	}
}
