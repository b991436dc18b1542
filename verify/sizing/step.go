package sizing

import (
	"context"
	"math"

	"notchproof/scf"
)

// drawingStep is the step that a size is rounded to on a drawing: one, two or
// five units of a decimal place, the largest that is no more than a fortieth of
// the value (common practice: 0.1 mm from 4 mm on, 1 mm from 40 mm on). Angles go in
// whole degrees.
func drawingStep(kind scf.Dimension, value float64) float64 {
	if kind.Angle {
		return 1
	}
	most := math.Abs(value) / 40
	decade := math.Pow(10, math.Floor(math.Log10(most)))
	for _, k := range []float64{5, 2} {
		if k*decade <= most {
			return k * decade
		}
	}
	return decade
}

// onStep is the number-th step, without the noise of multiplying a decimal
// fraction.
func onStep(number, step float64) float64 {
	if step < 1 {
		return number / math.Round(1/step)
	}
	return number * step
}

// round takes the answer to the next drawing step on the safe side, bar
// included, and shows by solving it that it keeps the limit. Where the curve is
// flat or turns the step after may be needed; where none of three does there is
// none to suggest.
func (q *Question) round(ctx context.Context, kind scf.Dimension, a *Answer) (*Sample, error) {
	x := a.At.At
	step := drawingStep(kind, x)
	if !(step > 0) || math.IsInf(a.Bar, 0) || math.IsNaN(a.Bar) || a.Bar > math.Abs(x) {
		return nil, nil
	}
	number, way := math.Ceil((x+a.Bar)/step-1e-9), 1.0
	if !a.Falling {
		number, way = math.Floor((x-a.Bar)/step+1e-9), -1
	}
	for k := range 3 {
		at := onStep(number+way*float64(k), step)
		if !q.ok(at) {
			break
		}
		s, err := q.sample(ctx, at, q.full())
		if err != nil {
			return nil, err
		}
		if s.Meets(q.Limit) {
			return &s, nil
		}
	}
	return nil, nil
}
