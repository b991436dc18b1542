package chart

import (
	"cmp"
	"context"
	"math"
	"slices"
)

// Fit fits a formula to the points of the chart and to further ones in half of
// the cells between them, and measures its error at points in the other half, on
// the curves, on the edges of the range and about the worst of all these, none of
// which it was fitted to: they are solved for the purpose. Within is the share of
// the factor that is close enough, 0: 0.005; a wider one gives a shorter formula.
// It gives nil where there are too few settled points for a formula.
func (t *Table) Fit(ctx context.Context, within float64, e Effort) (*Fit, error) {
	if within == 0 {
		within = defaultWithin
	}
	more, others := t.between()
	all := slices.Concat(more, others)
	if err := t.Question.solveExtra(ctx, all, e); err != nil {
		return nil, err
	}
	fitted := slices.Concat(t.Points, all[:len(more)])
	f := t.Question.fit(fitted, within)
	if f == nil {
		return nil, nil
	}
	measured := f.measure(t, fitted, all[len(more):])
	near := t.about(measured)
	if err := t.Question.solveExtra(ctx, near, e); err != nil {
		return nil, err
	}
	f.measure(t, nil, near)
	f.Error, f.OnCurves = RoundUp(f.Error), RoundUp(f.OnCurves)
	return f, nil
}

// solveExtra solves points that are not on the chart.
func (q *Question) solveExtra(ctx context.Context, points []Point, e Effort) error {
	list := make([]*Point, len(points))
	for k := range points {
		list[k] = &points[k]
	}
	return q.solveAll(ctx, list, e, func(int) error { return nil })
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
			x := rounded(between(curve[i-1].X, curve[i].X, 0.5, q.Along.Log))
			if ((i+k)%3 == 0 || t.Curves() == 1) && t.Inside(x, curve[i].Y) {
				others = append(others, q.point(x, curve[i].Y))
			}
			if k == 0 {
				continue
			}
			shares := [...]float64{0.5, 0.3, 0.7}
			y := rounded(between(t.Curve(k - 1)[i].Y, curve[i].Y, shares[(i/2)%3], q.Curves.Log))
			switch {
			case !t.Inside(x, y):
			case (i+k)%2 == 0:
				more = append(more, q.point(x, y))
			default:
				others = append(others, q.point(x, y))
			}
		}
		if k > 0 {
			a, b := t.edges(k)
			more, others = append(more, a...), append(others, b...)
		}
	}
	return more, others
}

// edges are points at both ends of the range between a curve and the one before:
// there the error of a polynomial is largest.
func (t *Table) edges(k int) (more, others []Point) {
	q := t.Question
	xs := q.Along.Values
	for _, x := range [2]float64{xs[0], xs[len(xs)-1]} {
		for _, share := range [3]float64{0.25, 0.5, 0.75} {
			y := rounded(between(q.Curves.Values[k-1], q.Curves.Values[k], share, q.Curves.Log))
			switch {
			case !t.Inside(x, y):
			case share == 0.5:
				more = append(more, q.point(x, y))
			default:
				others = append(others, q.point(x, y))
			}
		}
	}
	return more, others
}

// Inside tells that a place lies between settled points of the chart, on all
// sides: where a formula fitted to them may be used.
func (t *Table) Inside(x, y float64) bool {
	q := t.Question
	is := bracket(q.Along.Values, x)
	ks := []int{0}
	if q.Curves != nil {
		ks = bracket(q.Curves.Values, y)
	}
	for _, k := range ks {
		for _, i := range is {
			if t.Curve(k)[i].Status != Settled {
				return false
			}
		}
	}
	return len(is)*len(ks) > 0
}

// bracket gives the indices of the value itself or of those on both sides; none
// outside the range.
func bracket(values []float64, v float64) []int {
	i, exact := slices.BinarySearch(values, v)
	switch {
	case exact:
		return []int{i}
	case i == 0 || i == len(values):
		return nil
	}
	return []int{i - 1, i}
}

// How the error is followed up: a quarter of a cell to all sides of the worst.
const (
	worstPlaces = 3
	followUp    = 0.25
)

// about places points around the worst of those measured.
func (t *Table) about(measured []measurement) (near []Point) {
	q := t.Question
	slices.SortStableFunc(measured, func(a, b measurement) int { return cmp.Compare(b.off, a.off) })
	add := func(x, y float64) {
		if t.Inside(x, y) {
			near = append(near, q.point(x, y))
		}
	}
	for _, m := range measured[:min(worstPlaces, len(measured))] {
		for _, by := range [2]float64{-followUp, followUp} {
			add(q.Along.moved(m.X, by), m.Y)
			if q.Curves != nil {
				add(m.X, q.Curves.moved(m.Y, by))
			}
		}
	}
	return near
}

// moved is the place a share of a cell further along an axis, outside the range
// beyond its ends.
func (a Axis) moved(v, by float64) float64 {
	i := bracket(a.Values, v)
	if len(i) == 0 {
		return math.NaN()
	}
	low := max(0, min(i[0], len(a.Values)-2))
	if len(i) == 1 && by < 0 {
		low = max(0, i[0]-1)
	}
	from, to := a.Values[low], a.Values[min(low+1, len(a.Values)-1)]
	if a.Log {
		return rounded(v * math.Exp(by*math.Log(to/from)))
	}
	return rounded(v + by*(to-from))
}

// A measurement is a computed point and the share by which the formula may be off
// there.
type measurement struct {
	Point
	off float64
}

// measure finds how far the formula is from computed factors.
func (f *Fit) measure(t *Table, fitted, others []Point) (list []measurement) {
	for k, p := range slices.Concat(fitted, others) {
		if p.Status != Settled {
			continue
		}
		if k >= len(fitted) {
			f.Between++
		}
		off := (math.Abs(f.Factor(p.X, p.Y)-p.Factor) + p.Uncertainty) / p.Factor
		if off > f.Error {
			f.Error, f.Worst = off, p
		}
		if t.drawn(p) {
			f.OnCurves = math.Max(f.OnCurves, off)
		}
		list = append(list, measurement{p, off})
	}
	return list
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
