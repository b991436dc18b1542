package misreading

import (
	"cmp"
	"math"
	"slices"
)

const (
	// level is the chance up to which a match is shown. At even odds that a
	// wrong claim comes from a slip on the list at all, a suggestion at this
	// level is right five times of six.
	level = 0.20

	most = 3 // suggestions
)

// A match is a candidate that the claim meets.
type match struct {
	candidate
	score, chance float64
}

// accept keeps the best of the candidates that the claim meets.
func (q *Question) accept(found []candidate) []Suggestion {
	// A slip whose factor agrees with the computed one explains nothing.
	usable := slices.DeleteFunc(slices.Clone(found), func(c candidate) bool { return !q.wrongClaim(c.factor) })
	var matches []match
	for _, c := range usable {
		if math.Abs(c.factor-q.Claim) >= q.tolerance() {
			continue
		}
		if chance := q.chance(c, usable); chance <= level {
			matches = append(matches, match{c, q.score(c), chance})
		}
	}
	slices.SortStableFunc(matches, func(a, b match) int {
		return cmp.Or(cmp.Compare(a.grade, b.grade), cmp.Compare(a.score, b.score))
	})
	return best(matches)
}

// best takes the first matches, each slip once: where both its chart and its
// computed factor fit, the closer speaks for it.
func best(matches []match) []Suggestion {
	var out []Suggestion
	for _, m := range matches {
		said := slices.ContainsFunc(out, func(s Suggestion) bool { return s.What == m.what })
		if !said && len(out) < most {
			out = append(out, Suggestion{What: m.what, Factor: m.factor, From: m.from, Chance: m.chance})
		}
	}
	return out
}

// score is how well the claim meets a candidate, less being better: its
// distance on the logarithmic scale, no less than the claim's digits tell,
// times what the slip costs.
func (q *Question) score(c candidate) float64 {
	return c.cost() * math.Max(math.Abs(math.Log(c.factor/q.Claim)), q.resolution())
}

// tolerance is what the claim is good for by itself.
func (q *Question) tolerance() float64 { return q.LastDigit/2 + q.Reading*q.Claim }

// resolution is half a unit of the claim's last digit, relative to it.
func (q *Question) resolution() float64 { return q.LastDigit / 2 / q.Claim }

// edges are the claims next to the computed factor that just agree with it:
// they differ from it by its uncertainty and their own tolerance.
func (q *Question) edges() (low, high float64) {
	bar := q.Uncertainty + q.LastDigit/2
	return (q.Factor - bar) / (1 + q.Reading), (q.Factor + bar) / (1 - q.Reading)
}

// wrongClaim tells that a claim of this size would disagree.
func (q *Question) wrongClaim(factor float64) bool {
	low, high := q.edges()
	return factor < low || factor > high
}
