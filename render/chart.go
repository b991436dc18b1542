package render

import (
	"errors"
	"fmt"
	"math"
	"strings"
)

// A Plot is a sheet of diagrams: beside each other where the paper is wide
// enough, else one above the other.
type Plot struct {
	Title    string
	Note     string // below the diagrams: of what, and what they say
	Diagrams []Diagram
}

// A Diagram is a family of curves over one pair of axes.
type Diagram struct {
	X, Y   Axis
	Curves []Curve
	Levels []Level
	Stops  []Stop
}

// An Axis is one scale of a diagram. Low and High are its ends; both zero: it
// reaches a little further than the values do.
type Axis struct {
	Label     string // "depth below the root"
	Unit      string // "mm"; empty: the label says it all
	Log       bool   // needs values above zero
	Fine      bool   // ruled finely, for values to be read off
	Low, High float64
}

// A Curve joins points. It is told apart from the others of its diagram by the
// label at its end, by its line and by the form of its marks, never by colour
// alone.
type Curve struct {
	Label  string
	Points []CurvePoint
	Line   LineKind
	Marked bool // a mark on every point
	Band   bool // the bars of the points as one faint band, not one by one
	Strong bool // this is the one that the diagram is about
}

// A CurvePoint is a value at a place.
type CurvePoint struct {
	X, Y  float64
	Bar   float64 // half height of the error bar; 0 or NaN: none
	Label string  // beside the point where there is room; empty: none
}

// LineKind is how points are joined.
type LineKind int

// Kinds of lines: what is computed is solid, what it is held against broken.
const (
	Solid LineKind = iota
	Dashed
	Dotted
	Chain
	NoLine
)

// A Level is a value that holds all along a diagram.
type Level struct {
	Label string
	Value float64
	Bar   float64 // half height of its band; 0: none
}

// A Stop is a place on the x axis that has a name: where a fillet ends.
type Stop struct {
	Label string
	At    float64
}

// Chart draws a plot. It fails where there is nothing to draw, on values that
// are not finite, and on logarithmic scales on values that are not above zero.
func Chart(p Plot) (*Figure, error) {
	if len(p.Diagrams) == 0 {
		return nil, errors.New("plot: no diagram")
	}
	for _, d := range p.Diagrams {
		if err := d.check(); err != nil {
			return nil, fmt.Errorf("plot of %s: %w", d.Y.Label, err)
		}
	}
	return &Figure{
		title:       p.Title,
		description: p.describe(),
		height:      func(wide float64) float64 { return p.layout(wide).height },
		draw:        func(s *sheet) { s.plot(p) },
	}, nil
}

// describe says in words what is drawn.
func (p Plot) describe() string {
	var sentences []string
	if p.Note != "" {
		sentences = append(sentences, p.Note+".")
	}
	for _, d := range p.Diagrams {
		var labels []string
		for _, c := range d.Curves {
			if c.Label != "" {
				labels = append(labels, c.Label)
			}
		}
		sentence := fmt.Sprintf("Diagram of %s against %s", d.Y.text(), d.X.text())
		if len(labels) > 0 {
			sentence += ": " + strings.Join(labels, ", ")
		}
		sentences = append(sentences, sentence+".")
	}
	return strings.Join(sentences, " ")
}

// text is what is lettered beside an axis.
func (a Axis) text() string {
	if a.Unit == "" {
		return a.Label
	}
	return a.Label + " in " + a.Unit
}

func (d Diagram) check() error {
	count := 0
	for _, c := range d.Curves {
		for _, p := range c.Points {
			count++
			if !d.X.shows(p.X) || !d.Y.shows(p.Y) {
				return fmt.Errorf("%s: the point %g, %g cannot be drawn", c.Label, p.X, p.Y)
			}
		}
	}
	for _, l := range d.Levels {
		if !d.Y.shows(l.Value) || math.IsNaN(l.Bar) || math.IsInf(l.Bar, 0) || l.Bar < 0 {
			return fmt.Errorf("%s: the level %g ± %g cannot be drawn", l.Label, l.Value, l.Bar)
		}
	}
	if count == 0 {
		return errors.New("no points")
	}
	return nil
}

func (a Axis) shows(v float64) bool {
	return !math.IsNaN(v) && !math.IsInf(v, 0) && (!a.Log || v > 0)
}

// scale gives the axis for what it has to show. Share is how far it reaches
// beyond, as a share of the range.
func (a Axis) scale(values []float64, share float64) axis {
	if a.Low != 0 || a.High != 0 {
		return axis{low: a.Low, high: a.High, log: a.Log, fine: a.Fine}
	}
	low, high := math.Inf(1), math.Inf(-1)
	for _, v := range values {
		if a.shows(v) {
			low, high = math.Min(low, v), math.Max(high, v)
		}
	}
	low, high = around(low, high, share, a.Log)
	return axis{low: low, high: high, log: a.Log, fine: a.Fine}
}

// scales gives both axes of a diagram.
func (d Diagram) scales() (x, y axis) {
	var xs, ys []float64
	for _, c := range d.Curves {
		for _, p := range c.Points {
			xs, ys = append(xs, p.X), append(ys, p.Y)
			if bar := p.bar(); bar > 0 {
				ys = append(ys, p.Y-bar, p.Y+bar)
			}
		}
	}
	for _, l := range d.Levels {
		ys = append(ys, l.Value-l.Bar, l.Value+l.Bar)
	}
	return d.X.scale(xs, 0.03), d.Y.scale(ys, 0.12)
}

// bar is the half height of the error bar, 0 where there is none.
func (p CurvePoint) bar() float64 {
	if p.Bar > 0 && !math.IsInf(p.Bar, 0) {
		return p.Bar
	}
	return 0
}
