package misreading

import (
	"context"
	"slices"
)

// What the campaign needs of the inside.

const Level = level

// A Candidate is one factor of one slip.
type Candidate struct {
	What, From, Grade string
	Factor            float64
}

// Tries holds the candidates of a part, to judge many claims by.
type Tries struct {
	q     Question
	found []candidate
}

func Try(ctx context.Context, q Question) (*Tries, error) {
	found, err := q.candidates(ctx)
	return &Tries{q, found}, err
}

func (t *Tries) Computed() float64 { return t.q.Factor }

func (t *Tries) List() (list []Candidate) {
	names := []string{"none", "line", "table", "choice", "free"}
	for _, c := range t.found {
		list = append(list, Candidate{c.what, c.from, names[c.grade], c.factor})
	}
	return list
}

// Judge tells whether a claim disagrees, and what would explain it.
func (t *Tries) Judge(claim, digit float64) (bool, []Suggestion) {
	q := t.q
	q.Claim, q.LastDigit = claim, digit
	if !q.wrongClaim(claim) {
		return false, nil
	}
	return true, q.accept(slices.Clone(t.found))
}
