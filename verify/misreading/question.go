package misreading

import (
	"context"
	"math"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// A Question is a claim that disagrees, with what is known of the part.
type Question struct {
	Part *specimen.Part
	Load *specimen.Load

	Claim     float64
	LastDigit float64 // one unit of the claim's last digit
	Reading   float64 // relative reading tolerance of the claim

	Factor      float64 // computed, on the net section
	Uncertainty float64 // of Factor, absolute
	VonMises    float64 // computed

	// Solve gives the factor of a part under a load to about a thousandth;
	// nil: the slips have their charts only. It is called from several
	// goroutines. A part it cannot solve has no value and is left out.
	Solve   func(context.Context, *specimen.Part, *specimen.Load) (float64, error)
	Workers int // goroutines that call Solve; 0: one
}

// A Suggestion is a slip whose factor the claim meets.
type Suggestion struct {
	What   string
	Factor float64 // what the slip gives
	From   string  // the chart it was read from, or "computed"
	// Chance is the share of claims wrong for no such reason that some slip
	// meets as well by accident.
	Chance float64
}

// Explain tries every slip and returns the best suggestions, at most three.
// The error is that of an interrupted context.
func Explain(ctx context.Context, q Question) ([]Suggestion, error) {
	if !q.sane() {
		return nil, nil
	}
	found, err := q.candidates(ctx)
	if err != nil {
		return nil, err
	}
	return q.accept(found), nil
}

// sane tells that there are two factors to speak of, and a claim that something
// could disagree with.
func (q *Question) sane() bool {
	return q.Claim > 0 && q.Factor > 0 && !math.IsInf(q.Uncertainty, 0) && q.Reading >= 0 && q.Reading < 1
}

// given copies the dimensions as the user gave them: defaults follow what a
// slip changes.
func (q *Question) given(change scf.Dims) scf.Dims {
	dims := scf.Dims{}
	for name, v := range q.Part.Given {
		dims[name] = v
	}
	for name, v := range change {
		dims[name] = v
	}
	return dims
}
