package extrapolate

import "fmt"

// Orders reads a ladder of polynomial orders (or any other positive, strictly
// growing levels) on one mesh and states the last rung's value.
//
// # How far off the last value is
//
// The error after rung n is the sum of all differences still to come, and only
// those behind are known. On smooth shapes they shrink by a constant share q a
// rung, where a boundary's curvature jumps like a power of the order (theory of
// the p-version: Babuška and Suri, SIAM Review 36 (1994) 578, cited from memory);
// signs may alternate, wander, or turn once when one part of the error overtakes another, and a single difference
// may be small by accident. Hence the rule works on up to four last differences
// d and their envelope, and claims only as much contraction as they show:
//
//   - lawful: their signs all agree or all alternate, and the contraction is
//     constant (q, within 2 %) or that of one power (k, within 2 %). The tail of
//     that law is summed: d q/(1-q), or d/((n/(n-1))^k - 1). With alternating
//     signs the limit lies between the last two values (Leibniz), so d is enough.
//     Factor 1.25.
//   - steady: signs agree, differences shrink, but by no single law. The tail
//     is summed as a power, slower than the geometric law through the same two
//     differences, with the worst recent contraction; where contraction is
//     weakening its fall is carried on one rung further. Factor 3.
//   - alternating with a contraction that is not weakening: a geometric tail
//     of the envelope, not above the envelope itself. Factor 3.
//   - wandering: signs mixed. Nothing can be summed; the error is taken to be
//     of the size of the last two differences, or of the third last scaled by
//     the envelope's contraction; where a difference grew, no contraction has
//     been shown and the third last counts in full. Factor 3.
//
// The two factors are Roache's for a confirmed and an unconfirmed order (1998). An observed contraction is not believed below a tenth: one
// lucky small difference must not shrink the tail to nothing, and it costs no
// more than a factor of two or so on ladders that truly are as fast. A power
// below 1 has no credible tail; the tail is then that of power 1. The rounding
// level is added to every bar, and no difference counts as smaller than it.
//
// # Status
//
// Diverging: the differences keep their sign and do not shrink as fast as 1/n,
// so that their sum has no limit (a sharp corner: order^s), or they alternate
// and grow; there is no value. Undecided: the envelope has not shrunk, a value
// is shown with its bar but may not be judged. Stagnating: the envelope no
// longer shrinks but has come down at least tenfold before, the scatter is
// the bar. Three rungs show one contraction and confirm none: their tail is not
// taken below the last difference, nor below a tenth of the first; factor 3.
//
// On the families of TestOrdersCalibrated but the last, ladders of four to seven
// rungs hold the true error in at least 99 %; with three rungs it is about 95 %
// on mixtures: give four.
//
// It panics when the lengths differ or the orders do not grow from at least 1.
func Orders(orders []int, values []float64) Estimate {
	checkOrders(orders, values)
	switch {
	case !finite(values):
		return nothing(Undecided, "a rung's value is not a number")
	case len(values) < 3:
		return nothing(TooFew, fmt.Sprintf("%d rungs, three are needed to observe a contraction", len(values)))
	}
	t := newTrail(orders, values)
	e := Estimate{Value: values[len(values)-1], Order: t.share()}
	switch {
	case t.diverges():
		return nothing(Diverging, "the differences between rungs do not shrink towards a limit")
	case t.last(0) <= t.level && t.last(1) <= t.level:
		e.Status, e.Order = Converged, 0
		e.Uncertainty = 2 * t.level
		return e
	}
	bar, law := t.bar()
	e.Uncertainty = bar + t.level
	e.Status = t.status()
	e.Notes = append(e.Notes, law)
	switch e.Status {
	case Stagnating:
		e.Notes = append(e.Notes, "the values scatter and come no closer")
	case Undecided:
		e.Notes = append(e.Notes, "the differences between rungs have not shrunk")
	}
	return e
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

// status tells the sequences apart that have neither diverged nor converged.
func (t *trail) status() Status {
	if t.stalled && t.mixed() && t.envelopeShare() >= 1 {
		// Tenfold: scatter about a limit, not the start of a ladder.
		if t.largest >= 10*t.recent(3) {
			return Stagnating
		}
		return Undecided
	}
	if t.same {
		return Monotone
	}
	return Oscillatory
}
