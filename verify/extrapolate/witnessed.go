package extrapolate

import (
	"fmt"
	"math"
)

// Witnessed reads a ladder of orders beside which something that ought to
// vanish was measured on every rung, and states the last rung's value. For a
// stress on a free surface the witness is the traction that the solution
// leaves there: wide[i] is its largest size around the place, near the size at
// the place itself, both in the unit of the values.
//
// # How far off the last value is
//
// The bar is the sum of two pieces of evidence that come from different sides.
//
//   - What the ladder has still to bring: the last difference d, or the one
//     before it scaled by its contraction if that is larger (a single difference
//     may be small by accident), times q + q² + … = q/(1−q), with q the share of
//     the error that one more order leaves. There are two observations of q. The
//     differences show it of the value itself, but they are signed and wander.
//     The witness, averaged over the last two steps, is a size and does not
//     wander, but may be ruled by a blemish at some distance. The exponents are
//     averaged: q is the geometric mean of the two. Less than a tenth is not
//     believed of the differences: one lucky one must not shrink the bar to
//     nothing.
//   - What is known to be wrong now: the witness at the place. The stress
//     stated and the traction left over come from the same gradients.
//
// There are no factors on either. That the sum covers the error in 99 of 100
// cases, and how wide it is, is shown by the sweeps in package verify.
//
// # Status
//
// At least three rungs; the witness must have shrunk over the last two steps
// by more than a fifth (no credible tail otherwise: Undecided). Four rungs or more
// whose differences have no sum are Diverging and have no value.
//
// It panics when the lengths differ or the orders do not grow from at least 1.
func Witnessed(orders []int, values, wide, near []float64) Estimate {
	checkOrders(orders, values)
	n := len(values)
	if len(wide) != n || len(near) != n {
		panic("extrapolate: values and witnesses differ in number")
	}
	switch {
	case !finite(values) || !finite(wide) || !finite(near):
		return nothing(Undecided, "a rung's value is not a number")
	case n < 3:
		return nothing(TooFew, fmt.Sprintf("%d rungs, three are needed to observe a contraction", n))
	}
	t := newTrail(orders, values)
	if n > 3 && t.diverges() {
		return nothing(Diverging, "the differences between rungs do not shrink towards a limit")
	}
	w := witness{level: t.level, wide: wide}
	e := Estimate{Value: values[n-1]}
	if t.last(0) <= t.level && t.last(1) <= t.level && near[n-1] <= 1e3*t.level {
		e.Status, e.Uncertainty = Converged, near[n-1]+2*t.level
		e.Signals, e.ahead = Signals{Ladder: 2 * t.level, Witness: near[n-1]}, near[n-1]
		return e
	}
	seen := w.share(n - 1)
	share := math.Min(seen, WeakestShare)
	differences := math.Min(math.Max(t.last(0)/t.last(1), fastest), WeakestShare)
	e.Status = Monotone
	if !t.same {
		e.Status = Oscillatory
	}
	if seen >= WeakestShare {
		e.Status = Undecided
		e.Notes = append(e.Notes, "the traction left on the free surface does not shrink")
	}
	q := math.Sqrt(share * differences)
	if e.Order = q; e.Status == Undecided {
		e.Order = seen
	}
	before := math.Min(w.share(n-2), WeakestShare)
	envelope := math.Max(t.last(0), t.last(1)*before)
	e.Signals = Signals{Ladder: envelope*q/(1-q) + t.level, Witness: near[n-1]}
	e.Uncertainty = e.Signals.Ladder + e.Signals.Witness
	if e.ahead = near[n-1]; n > 3 {
		e.ahead *= q
	}
	return e
}

// Confirmed adds the value that the same order gave on a second mesh, one that
// shares no element with the first. Its distance is an error seen, not inferred:
// what the rungs of one mesh have in common, such as a peak that they all miss,
// shows in it alone. It is added to the bar.
//
// Beside two sizes of the error itself the witness is a third opinion. It falls
// behind the error, being read from the whole tensor and the value from the
// strain within the surface: it counts as large as it will be with one order more,
// once four rungs have shown the pace twice, in full before; and as far as the two
// others bear it out, no more than both together.
func (e Estimate) Confirmed(second float64) Estimate {
	if math.IsNaN(e.Value) {
		return e
	}
	s := &e.Signals
	s.Second = math.Abs(second - e.Value)
	seen := s.Ladder + s.Second
	e.Uncertainty = seen + math.Min(e.ahead, seen)
	if math.IsNaN(e.Uncertainty) {
		return nothing(Undecided, "the second mesh gives no number")
	}
	return e
}

// WeakestShare is the largest share left by one order more whose tail is summed;
// a ladder whose witness leaves more is undecided. The sum is then
// four times the last difference, about as far as three rungs can be trusted.
const WeakestShare = 0.8

// A witness is what was measured beside the values.
type witness struct {
	level float64
	wide  []float64
}

// share is the contraction a rung, averaged over the two steps up to rung i
// where there are two.
func (w witness) share(i int) float64 {
	from := max(0, i-2)
	late, early := math.Max(w.wide[i], w.level), math.Max(w.wide[from], w.level)
	return math.Pow(late/early, 1/float64(i-from))
}
