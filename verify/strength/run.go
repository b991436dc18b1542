package strength

import (
	"context"
	"fmt"
	"slices"

	"notchproof/verify"
)

// Run answers a question: the ladder of every load that acts, their fields
// added on one mesh, every critical place, and what the section bears.
func Run(ctx context.Context, q Question) (*Result, error) {
	if err := q.Check(); err != nil {
		return nil, err
	}
	checked, err := verify.Run(ctx, q.Part, q.loads(), q.Options)
	if err != nil {
		return nil, err
	}
	r := &Result{
		Question: q, Brittle: q.Material.brittle(), Strength: q.Material.strength().Megapascals(),
		Checked: *checked, Settled: true,
	}
	for i := range checked.Findings {
		f := &checked.Findings[i]
		r.Nominal = append(r.Nominal, Nominal{f.Load.Name, q.nominal(f.Load)})
		if f.Verdict == verify.Undecided || !f.Computed.Factor.Status.Settled() {
			r.Settled = false
			r.because("%s: the factor is not settled", f.Load.Name)
			for _, why := range f.Because {
				if !slices.Contains(r.Because, why) {
					r.Because = append(r.Because, why)
				}
			}
		}
	}
	if !r.Settled {
		return r, nil
	}
	s, err := q.superpose(ctx, checked)
	if err != nil {
		return nil, err
	}
	for i, c := range s.fine.parts {
		r.Fields = append(r.Fields, Field{checked.Findings[i].Load, c.solution, c.nominal, c.turning})
	}
	r.Places = q.places(s)
	if r.Brittle {
		at, _ := s.fine.worst(s.fine.maxima(q.Part.Notch, pressed)[0], pressed)
		r.Pressed = pressed(at)
	}
	r.Hand = q.byHand(checked, r.Notch().Equivalent)
	if r.Section, err = q.capacity(q.firstYield(r.Places, s)); err != nil {
		return nil, err
	}
	r.Sensitivity = q.sensitivity(checked, s)
	r.Cover = cover(checked)
	r.warn()
	r.decide()
	return r, nil
}

// firstYield is the factor by which the loads may grow until the most stressed
// place yields by von Mises, whatever the criterion of the decision.
func (q *Question) firstYield(places []Place, s *solved) float64 {
	if q.Material.brittle() {
		ductile := *q
		ductile.Material.Brittle, ductile.Material.Elongation = false, 0
		places = ductile.places(s)
	}
	return q.Material.Yield.Megapascals() / places[0].Equivalent
}

// warn collects what the numbers do not tell.
func (r *Result) warn() {
	q := &r.Question
	for i := range r.Checked.Findings {
		r.Warnings = append(r.Warnings, r.Checked.Findings[i].Warnings...)
	}
	if r.Pressed > r.Notch().Equivalent {
		r.Warnings = append(r.Warnings, fmt.Sprintf("the notch is pressed with up to %v, more than it is pulled: the largest principal stress does not judge that",
			q.Material.Tensile.Like(r.Pressed)))
	}
}
