package chart

import (
	"context"
	"math"
)

// Fit fits a formula to the points of the chart and to further ones in half of
// the cells between them, and measures its error at points in the other half and
// on the curves, none of which it was fitted to: all these are solved for the
// purpose. Within is the share of the factor that is close enough, 0: 0.005; a
// wider one gives a shorter formula. It gives nil where there are too few settled
// points for a formula.
func (t *Table) Fit(ctx context.Context, within float64, e Effort) (*Fit, error) {
	if within == 0 {
		within = defaultWithin
	}
	more, others := t.between()
	all := append(append([]Point{}, more...), others...)
	list := make([]*Point, len(all))
	for k := range all {
		list[k] = &all[k]
	}
	if err := t.Question.solveAll(ctx, list, e, func(int) error { return nil }); err != nil {
		return nil, err
	}
	more, others = all[:len(more)], all[len(more):]
	fitted := append(append([]Point{}, t.Points...), more...)
	f := t.Question.fit(fitted, within)
	if f == nil {
		return nil, nil
	}
	f.measure(t, fitted, others)
	return f, nil
}

// between places points in all cells between settled points of the grid, by
// turns to fit to and to measure at, and on a third of the stretches of the
// curves to measure at. Where in a cell a point lies changes from one to the
// next, so that no place is left out by all.
func (t *Table) between() (more, others []Point) {
	q := t.Question
	for k := range t.Curves() {
		curve := t.Curve(k)
		for i := 1; i < len(curve); i++ {
			if curve[i-1].Status != Settled || curve[i].Status != Settled {
				continue
			}
			if (i+k)%3 == 0 || t.Curves() == 1 {
				others = append(others, q.point(q.inside(curve[i-1].X, curve[i].X, 0.5), curve[i].Y))
			}
			if k == 0 {
				continue
			}
			below := t.Curve(k - 1)
			if below[i-1].Status != Settled || below[i].Status != Settled {
				continue
			}
			shares := [...]float64{0.5, 0.3, 0.7}
			y := rounded(between(below[i].Y, curve[i].Y, shares[(i/2)%3], q.Curves.Log))
			p := q.point(q.inside(curve[i-1].X, curve[i].X, 0.5), y)
			if (i+k)%2 == 0 {
				more = append(more, p)
			} else {
				others = append(others, p)
			}
		}
	}
	return more, others
}

// inside is a place between two on the axis.
func (q *Question) inside(a, b, share float64) float64 {
	return rounded(between(a, b, share, q.Along.Log))
}

// measure finds how far the formula is from computed factors.
func (f *Fit) measure(t *Table, fitted, others []Point) {
	take := func(p Point) {
		if p.Status != Settled || !f.xs.holds(p.X) || f.across && !f.ys.holds(p.Y) {
			return
		}
		off := (math.Abs(f.Factor(p.X, p.Y)-p.Factor) + p.Uncertainty) / p.Factor
		if off > f.Error {
			f.Error, f.Worst = off, p
		}
		if t.drawn(p) {
			f.OnCurves = math.Max(f.OnCurves, off)
		}
	}
	for _, p := range fitted {
		take(p)
	}
	for _, p := range others {
		if p.Status == Settled {
			f.Between++
		}
		take(p)
	}
	f.Error, f.OnCurves = RoundUp(f.Error), RoundUp(f.OnCurves)
}

// drawn tells that a point lies on a curve of the chart.
func (t *Table) drawn(p Point) bool {
	for k := range t.Curves() {
		if y := t.Curve(k)[0].Y; y == p.Y || math.IsNaN(y) {
			return true
		}
	}
	return false
}

// RoundUp rounds an error up to one digit, two after a leading one, as bars are
// shown.
func RoundUp(x float64) float64 {
	if !(x > 0) || math.IsInf(x, 0) {
		return x
	}
	exponent := math.Floor(math.Log10(x))
	if x < 2*math.Pow(10, exponent) {
		exponent--
	}
	unit := math.Pow(10, exponent)
	return roundedTo(math.Ceil(x/unit-1e-9)*unit, 2)
}
