package chart

import (
	"math"
	"slices"
)

// A Fit is a formula for the factor over the range of a chart, and how far it is
// from computed factors.
type Fit struct {
	Terms int
	// Error is the largest share by which the formula may be off a computed
	// factor, its bar included, rounded up to the digits that are shown; at Worst.
	// It is measured at the points that the formula was fitted to and at others
	// between them that were solved for that alone.
	Error           float64
	Worst           Point
	Fitted, Between int     // how many points of each kind
	OnCurves        float64 // the same as Error on the curves that are drawn

	xs, ys       extent // ys: of the curves
	form         form
	across       bool // there are several curves
	u, v         scaling
	coefficients []float64
	digits       int
}

// A datum is a point that a formula is fitted to.
type datum struct{ x, y, k, weight float64 }

// fit chooses the shortest form that is good to within a share of the factor, or
// else as good as any, and fits it. nil: there are too few points for any form.
func (q *Question) fit(points []Point, within float64) *Fit {
	data, along, across := q.data(points)
	if len(data) < 4 || len(along) < 3 {
		return nil
	}
	f := &Fit{xs: nowhere(), ys: nowhere(), across: len(across) > 1, Fitted: len(data)}
	least := math.Inf(1)
	for _, d := range data {
		f.xs, f.ys, least = f.xs.with(d.x), f.ys.with(d.y), math.Min(least, d.k)
	}
	var tried []trial
	some := thinned(data)
	for _, form := range forms(f.xs, f.ys, least, min(highestAlong, len(along)-2), min(highestAcross, len(across)-1)) {
		if t, ok := f.try(form, some); ok {
			tried = append(tried, t)
		}
	}
	if len(tried) == 0 {
		return nil
	}
	best, ok := f.try(choose(tried, within).form, data)
	if !ok {
		return nil
	}
	f.form, f.Terms = best.form, len(best.coefficients)
	f.u, f.v = f.scalings(best.form)
	f.round(best.coefficients, data)
	return f
}

// data takes the settled points. Errors count relative to the factor; a point is
// worth less where its own bar is wider than what is asked for.
func (q *Question) data(points []Point) (data []datum, xs, ys []float64) {
	for _, p := range points {
		if p.Status != Settled {
			continue
		}
		y := p.Y
		if q.Curves == nil {
			y = 0
		}
		data = append(data, datum{p.X, y, p.Factor, 1 / math.Hypot(q.Target*p.Factor, p.Uncertainty)})
		xs, ys = append(xs, p.X), append(ys, y)
	}
	slices.Sort(xs)
	slices.Sort(ys)
	return data, slices.Compact(xs), slices.Compact(ys)
}

// enoughToChoose is how many points the choice among forms rests on at most: it
// takes as long as solving a few of them, whatever the size of the chart.
const enoughToChoose = 400

// thinned takes points all over the chart.
func thinned(data []datum) []datum {
	every := (len(data) + enoughToChoose - 1) / enoughToChoose
	var some []datum
	for i := 0; i < len(data); i += every {
		some = append(some, data[i])
	}
	return some
}

// A trial is a form fitted, and how well it stands cross-validation.
type trial struct {
	form         form
	coefficients []float64
	left         float64 // largest relative error at a point left out of the fit
}

const (
	// asGood as the best is a trial within this factor of its error.
	asGood = 1.25
	// defaultWithin is enough: a chart is read to three figures at most (common
	// practice).
	defaultWithin = 0.005
)

// choose takes the fewest terms among the trials that are within what is enough,
// or else as good as the best, and of equals the better.
func choose(tried []trial, within float64) trial {
	least := math.Inf(1)
	for _, t := range tried {
		least = math.Min(least, t.left)
	}
	limit := math.Max(asGood*least, within)
	var best *trial
	for i := range tried {
		t := &tried[i]
		if t.left > limit {
			continue
		}
		if best == nil || len(t.coefficients) < len(best.coefficients) || len(t.coefficients) == len(best.coefficients) && t.left < best.left {
			best = t
		}
	}
	return *best
}

func (f *Fit) scalings(form form) (u, v scaling) {
	u = form.x.scaling(f.xs)
	return u, form.y.scaling(f.ys)
}

// roundingShare of the factor is what the rounding of coefficients may change.
const roundingShare = 1e-5

// round takes the fewest digits that keep the factor: what is printed is what is
// used.
func (f *Fit) round(c []float64, data []datum) {
	whole := make([]float64, len(data))
	f.coefficients = c
	for i, d := range data {
		whole[i] = f.Factor(d.x, d.y)
	}
	for f.digits = 3; f.digits < 16; f.digits++ {
		f.coefficients = make([]float64, len(c))
		for k := range c {
			f.coefficients[k] = roundedTo(c[k], f.digits)
		}
		worst := 0.0
		for i, d := range data {
			worst = math.Max(worst, math.Abs(f.Factor(d.x, d.y)/whole[i]-1))
		}
		if worst <= roundingShare {
			return
		}
	}
}

// Factor is the value of the formula. It means nothing outside the range.
func (f *Fit) Factor(x, y float64) float64 {
	u, v := f.u.of(f.form.x.of(x)), 0.0
	if f.form.q > 0 {
		v = f.v.of(f.form.y.of(y))
	}
	rows := f.rows()
	p := 0.0
	for j := len(rows) - 1; j >= 0; j-- {
		row := 0.0
		for i := len(rows[j]) - 1; i >= 0; i-- {
			row = float64(row*u) + rows[j][i]
		}
		p = float64(p*v) + row
	}
	return f.form.outer.of(p)
}

// rows are the coefficients by powers of v, in each by powers of u.
func (f *Fit) rows() [][]float64 {
	rows := make([][]float64, f.form.q+1)
	for k, w := range f.form.terms() {
		rows[w.j] = append(rows[w.j], f.coefficients[k])
	}
	return rows
}
