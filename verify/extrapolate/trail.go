package extrapolate

import (
	"math"
	"slices"
)

// window is how many last differences are looked at: three contractions, the
// least that can both set a law and confirm it twice. Older ones belong to
// orders too low to have seen the notch.
const window = 4

// lawSlack is how far contractions may differ and still follow one law.
const lawSlack = 1.02

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

func (t *trail) mixed() bool { return !t.same && !t.alternating || t.stalled }

// diverges: see Orders. Differences of n^-1 sum to ln n, those of n^-(k+1) with
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

// bar returns the half width before rounding, and the name of the rule.
func (t *trail) bar() (float64, string) {
	switch {
	case len(t.d) == 2:
		tail := t.last(0)
		if t.same {
			tail *= math.Max(1, t.powerTail(t.leastPower()))
		}
		return safetyTrusted * math.Max(tail, fastest*t.last(1)), "one contraction seen, none confirmed"
	case t.lawful() && (t.same || t.alternating):
		return safetyObserved * t.lawfulTail(), "differences follow one law"
	case t.same && !t.stalled:
		return safetyTrusted * t.steadyTail(), "differences shrink by no single law"
	case t.alternating && !t.stalled && t.holding():
		return safetyTrusted * t.alternatingTail(), "differences alternate"
	}
	third := t.last(2)
	if !t.stalled {
		third *= t.envelopeShare()
	}
	return safetyTrusted * math.Max(t.recent(2), third), "differences wander"
}

// lawful: at least two contractions that agree, as a constant or as a power.
func (t *trail) lawful() bool {
	return !t.stalled && (agree(t.rates) || t.same && agree(t.powers))
}

func agree(x []float64) bool {
	if len(x) < 2 {
		return false
	}
	for i := 1; i < len(x); i++ {
		if !(x[i] < x[i-1]*lawSlack && x[i] > x[i-1]/lawSlack) {
			return false
		}
	}
	return true
}

func (t *trail) lawfulTail() float64 {
	if !agree(t.rates) {
		return t.last(0) * t.powerTail(t.leastPower())
	}
	q := t.slowest()
	tail := t.last(0) * q / (1 - q)
	if t.alternating {
		tail = math.Min(tail, t.last(0)/safetyObserved) // Leibniz: d is a bound as it stands
	}
	return tail
}

func (t *trail) steadyTail() float64 {
	k := t.leastPower()
	if n := len(t.powers); n > 1 && t.powers[n-1] < t.powers[n-2] {
		now := t.powers[n-1]
		k = math.Min(k, now*math.Max(0, now/t.powers[n-2]))
	}
	return math.Max(t.last(0), t.last(1)*t.slowest()) * t.powerTail(k)
}

// holding: the last contraction is no weaker than the one before it.
func (t *trail) holding() bool {
	n := len(t.rates)
	return n < 2 || t.rates[n-1] >= t.rates[n-2]/lawSlack
}

func (t *trail) alternatingTail() float64 {
	q := t.envelopeShare()
	envelope := math.Max(t.last(0), math.Max(t.last(1)*q, t.last(2)*q*q))
	if q >= 0.5 { // q/(1-q) would exceed 1
		return envelope
	}
	return envelope * q / (1 - q)
}

// slowest is the larger of the last two contractions, not below fastest.
func (t *trail) slowest() float64 {
	q := fastest
	for i := max(0, len(t.rates)-2); i < len(t.rates); i++ {
		q = math.Max(q, math.Exp(-t.rates[i]))
	}
	return q
}

// leastPower is the smaller of the last two exponents.
func (t *trail) leastPower() float64 {
	k := math.Inf(1)
	for i := max(0, len(t.powers)-2); i < len(t.powers); i++ {
		k = math.Min(k, t.powers[i])
	}
	return k
}

// envelopeShare is the contraction a rung of the larger of two neighbouring
// differences, which one accidentally small difference cannot fake; in fastest..1.
func (t *trail) envelopeShare() float64 {
	var q float64
	switch {
	case len(t.d) == 2:
		q = t.last(0) / t.last(1)
	case len(t.d) == 3:
		q = math.Max(t.recent(2)/math.Max(t.last(1), t.last(2)), math.Sqrt(t.last(0)/t.last(2)))
	default:
		q = math.Sqrt(math.Max(t.recent(2)/math.Max(t.last(2), t.last(3)), t.last(0)/t.last(2)))
	}
	return math.Min(math.Max(q, fastest), 1)
}

// share is the contraction a unit of order, as it is reported.
func (t *trail) share() float64 {
	n := len(t.p)
	return math.Pow(t.envelopeShare(), 1/(t.p[n-1]-t.p[n-2]))
}
