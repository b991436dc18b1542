package render

import (
	"errors"
	"math"

	"notchproof/render/number"
)

// A Study is a ladder of solves to be plotted.
type Study struct {
	Title  string // what was solved: "shaft-shoulder, bending"
	Note   string // below: the dimensions, and what the study says
	Points []StudyPoint
	// Limit is the value that the ladder tends to, Uncertainty how far it may be
	// off; NaN when there is none.
	Limit, Uncertainty float64
	// Order is the power of the element size with which the error is expected to
	// fall; negative where it grows; 0: none is, as when the order climbs.
	Order float64
}

// A StudyPoint is one rung.
type StudyPoint struct {
	Label    string  // "order 4"
	Unknowns int     // above zero
	Factor   float64 // finite
	Change   float64 // size of the change from the rung before; 0 or NaN: none to show
	Traction float64 // left on the free surface at the peak; 0 or NaN: none to show
}

// StudyFigure plots a convergence study: the factor against the number of
// unknowns with its limit and the band of its uncertainty, and the size of the
// changes and of the traction that is left on logarithmic scales, on which an
// algebraic order is a straight line and a geometric one bends down. It fails on
// a study without rungs and on rungs without unknowns or factor.
func StudyFigure(study Study) (*Figure, error) {
	if len(study.Points) == 0 {
		return nil, errors.New("study plot: no rungs")
	}
	for _, p := range study.Points {
		if p.Unknowns <= 0 || math.IsNaN(p.Factor) || math.IsInf(p.Factor, 0) {
			return nil, errors.New("study plot: rung " + p.Label + " has no unknowns or no factor")
		}
	}
	plot := Plot{Title: study.Title, Note: study.Note, Diagrams: []Diagram{study.factors()}}
	if d := study.errors(); len(d.Curves) > 0 {
		plot.Diagrams = append(plot.Diagrams, d)
	}
	return Chart(plot)
}

// unknowns is the axis of both diagrams.
func (study Study) unknowns() Axis {
	low, high := math.Inf(1), 0.0
	for _, p := range study.Points {
		low, high = math.Min(low, float64(p.Unknowns)), math.Max(high, float64(p.Unknowns))
	}
	low, high = around(low, high, 0.14, true)
	return Axis{Label: "unknowns", Log: true, Low: low, High: high}
}

func (study Study) factors() Diagram {
	d := Diagram{X: study.unknowns(), Y: Axis{Label: "factor"}}
	c := Curve{Marked: true}
	for _, p := range study.Points {
		c.Points = append(c.Points, CurvePoint{X: float64(p.Unknowns), Y: p.Factor, Label: p.Label})
	}
	d.Curves = []Curve{c}
	if !math.IsNaN(study.Limit) && !math.IsInf(study.Limit, 0) && study.Uncertainty >= 0 && !math.IsInf(study.Uncertainty, 0) {
		d.Levels = []Level{{number.Uncertain(study.Limit, study.Uncertainty), study.Limit, study.Uncertainty}}
	}
	return d
}

// errors is the diagram of what is known of the error of each rung.
func (study Study) errors() Diagram {
	d := Diagram{X: study.unknowns(), Y: Axis{Label: "signs of the error", Log: true}}
	changes, traction := Curve{Label: "change from the rung before", Marked: true}, Curve{Label: "traction left at the peak", Marked: true}
	for _, p := range study.Points {
		x := float64(p.Unknowns)
		if d.Y.shows(p.Change) {
			changes.Points = append(changes.Points, CurvePoint{X: x, Y: p.Change})
		}
		if d.Y.shows(p.Traction) {
			traction.Points = append(traction.Points, CurvePoint{X: x, Y: p.Traction})
		}
	}
	for _, c := range []Curve{changes, traction} {
		if len(c.Points) > 0 {
			d.Curves = append(d.Curves, c)
		}
	}
	if slope, ok := study.slope(changes.Points); ok {
		d.Curves = append(d.Curves, slope)
	}
	return d
}

// slope is the line of the expected order through the last change. In the plane
// the number of unknowns goes with the inverse square of the element size.
func (study Study) slope(changes []CurvePoint) (Curve, bool) {
	n := len(changes)
	if n < 2 || study.Order == 0 {
		return Curve{}, false
	}
	first, last := changes[0], changes[n-1]
	const above = 1.6 // clear of the curve itself
	start := CurvePoint{X: first.X, Y: above * last.Y * math.Pow(last.X/first.X, study.Order/2)}
	return Curve{Label: "expected order " + number.Compact(study.Order, 3), Line: Dashed,
		Points: []CurvePoint{start, {X: last.X, Y: above * last.Y}}}, true
}
