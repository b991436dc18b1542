package chart

import (
	"errors"
	"math"
	"slices"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// A Table has all points of a question's grid: curve by curve, each along its
// axis.
type Table struct {
	Question *Question
	Points   []Point
	Books    []Book // published fits that cover any of the points

	held []bool // the point's row is on record
}

// A Book is a published fit.
type Book struct {
	ID       string
	Accuracy float64 // relative
	Source   string
}

// Status says what is known of a point. The zero value is nothing.
type Status int

const (
	Missing   Status = iota // not computed
	Settled                 // converged, all checks passed
	Undecided               // computed, and nothing to rely on
	NotDrawn                // there is no such shape
)

var statusWords = [...]string{"missing", "settled", "undecided", "notDrawn"}

func (s Status) String() string {
	if s < 0 || int(s) >= len(statusWords) {
		return "unknown"
	}
	return statusWords[s]
}

// A Point is one shape of the grid.
type Point struct {
	X, Y        float64 // along, and the value of its curve (NaN: there is only one)
	Factor      float64 // NaN where there is none
	Uncertainty float64 // absolute
	Status      Status
	Why         string    // why it is not settled; of one that is, what it does not tell
	Handbook    []float64 // by book; NaN where it does not cover the shape
}

// Table lays out the grid: which shapes there are, and what is published of
// them. It fails when none can be drawn.
func (q *Question) Table() (*Table, error) {
	t := &Table{Question: q}
	ys := []float64{math.NaN()}
	if q.Curves != nil {
		ys = q.Curves.Values
	}
	values := make([][]scf.Value, 0, len(ys)*len(q.Along.Values))
	for _, y := range ys {
		for _, x := range q.Along.Values {
			p := q.point(x, y)
			t.Points = append(t.Points, p)
			values = append(values, q.published(p))
		}
	}
	t.held = make([]bool, len(t.Points))
	t.books(values)
	if !slices.ContainsFunc(t.Points, func(p Point) bool { return p.Status != NotDrawn }) {
		return nil, fault("change the ranges or the other dimensions", "no point of the chart can be drawn, as %s: %s", q.Place(t.Points[0].X, t.Points[0].Y), t.Points[0].Why)
	}
	return t, nil
}

// point is a place of the chart before it is solved.
func (q *Question) point(x, y float64) Point {
	p := Point{X: x, Y: y, Factor: math.NaN(), Uncertainty: math.Inf(1)}
	if _, err := q.part(x, y); err != nil {
		p.Status, p.Why = NotDrawn, err.Error()
	}
	return p
}

var errSharp = errors.New("a sharp corner has no factor")

// part draws the shape at a place.
func (q *Question) part(x, y float64) (*specimen.Part, error) {
	dims := q.dims(x, y)
	part, err := specimen.New(q.Family, dims, q.Unit, q.Options)
	if err == nil && q.Family.Sharp(dims) {
		return nil, errSharp
	}
	return part, err
}

// published are the values in range at a point.
func (q *Question) published(p Point) []scf.Value {
	if p.Status == NotDrawn {
		return nil
	}
	all := q.Family.Handbook(q.Load, q.dims(p.X, p.Y), q.Options)
	return slices.DeleteFunc(all, func(v scf.Value) bool { return !v.InRange })
}

// books collects the fits, best first, and what each says of every point.
func (t *Table) books(values [][]scf.Value) {
	column := make(map[string]int)
	for _, list := range values {
		for _, v := range list {
			if _, seen := column[v.ID]; !seen {
				column[v.ID] = len(t.Books)
				t.Books = append(t.Books, Book{v.ID, v.Accuracy, v.Source})
			}
		}
	}
	for i, list := range values {
		row := make([]float64, len(t.Books))
		for k := range row {
			row[k] = math.NaN()
		}
		for _, v := range list {
			row[column[v.ID]] = v.Factor
		}
		t.Points[i].Handbook = row
	}
}

// Curve gives the points of one curve.
func (t *Table) Curve(k int) []Point {
	n := len(t.Question.Along.Values)
	return t.Points[k*n : (k+1)*n]
}

// Curves is the number of curves.
func (t *Table) Curves() int { return len(t.Points) / len(t.Question.Along.Values) }

// Count counts the points of a status.
func (t *Table) Count(s Status) int {
	n := 0
	for _, p := range t.Points {
		if p.Status == s {
			n++
		}
	}
	return n
}

// A Convention is a nominal stress, and the first point that is referred to it.
type Convention struct {
	scf.Nominal
	X, Y float64
}

// Conventions are the nominal stresses of the chart in the order of its points:
// one, unless the shape changes so that another formula is needed.
func (t *Table) Conventions() (list []Convention) {
	q := t.Question
	for _, p := range t.Points {
		if p.Status == NotDrawn {
			continue
		}
		n := q.Family.Nominal(q.Load, q.dims(p.X, p.Y), q.Options)
		if !slices.ContainsFunc(list, func(c Convention) bool { return c.Formula == n.Formula && c.Section == n.Section }) {
			list = append(list, Convention{n, p.X, p.Y})
		}
	}
	return list
}
