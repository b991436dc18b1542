package misreading

import (
	"cmp"
	"math"
	"slices"
)

// reach: wrong claims of the null hypothesis are off by up to this, or by as
// much as the claim in question.
const reach = 0.30

// chance is the share of the wrong claims that some candidate meets at least
// as well as the claim meets c. Wherever wrong claims are even on the
// logarithmic scale, no more than a share p of them has a chance up to p.
func (q *Question) chance(c candidate, all []candidate) float64 {
	const rounding = 1e-12
	score, least := q.score(c)*(1+rounding), q.resolution()
	var windows []interval
	for _, other := range all {
		// What is closer than the claim's digits can tell is not told apart.
		if half := score / other.cost(); half >= least {
			at := math.Log(other.factor)
			windows = append(windows, interval{at - half, at + half})
		}
	}
	slices.SortFunc(windows, func(a, b interval) int { return cmp.Compare(a.low, b.low) })
	covered, total := 0.0, 0.0
	for _, stretch := range q.wrongClaims() {
		total += stretch.length()
		covered += stretch.covered(windows)
	}
	if total == 0 {
		return 1
	}
	return covered / total
}

// wrongClaims are the claims of the null hypothesis, on either side of the
// computed factor. A factor below one is nobody's claim, unless this one is.
func (q *Question) wrongClaims() [2]interval {
	at, claim := math.Log(q.Factor), math.Log(q.Claim)
	far := math.Max(math.Log(1+reach), math.Abs(claim-at))
	low, high := q.edges()
	least := math.Max(at-far, math.Min(0, claim))
	return [2]interval{{least, math.Log(math.Max(low, 0))}, {math.Log(high), at + far}}
}

// An interval on the logarithmic scale; without length where high is not above
// low.
type interval struct{ low, high float64 }

func (i interval) length() float64 { return math.Max(0, i.high-i.low) }

// covered is the length of an interval that windows, sorted by their lower
// ends, cover together.
func (i interval) covered(windows []interval) float64 {
	sum, end := 0.0, i.low
	for _, w := range windows {
		sum += interval{math.Max(w.low, end), math.Min(w.high, i.high)}.length()
		end = math.Max(end, w.high)
	}
	return sum
}
