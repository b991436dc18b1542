package tolerance

import (
	"cmp"
	"context"
	"fmt"
	"math"
	"slices"

	"notchproof/scf"
)

// An Answer is what the tolerances do, load by load.
type Answer struct {
	Question *Question
	Loads    []LoadAnswer
	Points   []Point
	Warnings []string
}

// A LoadAnswer holds both quantities under one load.
type LoadAnswer struct {
	Load    scf.Load
	Decided bool
	Why     string // why not
	Factor  Spread
	Peak    Spread // stress under the same load over the nominal stress as drawn
	// SameSection tells that the net section stays, so that Peak is Factor.
	SameSection bool
}

// A Spread is how one quantity varies over the box.
type Spread struct {
	Drawn  Value // as drawn
	Middle Value // in the middle of the box
	Least  Extreme
	Most   Extreme
	// RootSumSquare is the half width that independent deviations give about the
	// middle: the root of the sum of the squared contributions, common practice
	// for dimensions that vary independently. The corners are the worst case.
	RootSumSquare Value
	Contributions []Contribution // the largest first
	// Beyond says that a point inside the box lies beyond all corners by more than
	// the bars; empty where none does.
	Beyond string
}

// An Extreme is a value with the point where it was found.
type Extreme struct {
	Value
	At *Point
}

// A Contribution is what one tolerance does alone, the others in their middle.
type Contribution struct {
	Deviation
	Sensitivity Value // central difference over the tolerance, per unit of the dimension
	Change      Value // half the difference between upper and lower limit, signed
}

// mostCorners is the number of deviations up to which all corners are solved.
const mostCorners = 4

// Find solves the points and sums them up. Its error is a *scf.DimensionError
// or *CornerError, or the context's when interrupted.
func (q *Question) Find(ctx context.Context) (*Answer, error) {
	q.validate()
	if len(q.Loads) == 0 {
		q.Loads = q.Family.Loads
	}
	a := &Answer{Question: q}
	n := len(q.Deviations)
	first := [][]int{nil, make([]int, n)}
	for i := range n {
		for _, side := range []int{-1, 1} {
			face := make([]int, n)
			face[i] = side
			first = append(first, face)
		}
	}
	if n > 1 && n <= mostCorners { // of one deviation the faces are the corners
		first = append(first, corners(n)...)
	}
	var err error
	if a.Points, err = q.solve(ctx, first); err != nil {
		return nil, err
	}
	if n > mostCorners {
		if err := a.likelyCorners(ctx); err != nil {
			return nil, err
		}
	}
	for i := range q.Loads {
		a.Loads = append(a.Loads, a.load(i))
	}
	return a, nil
}

// corners lists all 2ⁿ corners.
func corners(n int) (list [][]int) {
	for code := range 1 << n {
		levels := make([]int, n)
		for i := range n {
			levels[i] = 2*(code>>i&1) - 1
		}
		list = append(list, levels)
	}
	return list
}

// likelyCorners solves those corners that the sensitivities of any load point
// to, for both quantities, and their neighbours by one dimension.
func (a *Answer) likelyCorners(ctx context.Context) error {
	var list [][]int
	add := func(levels []int) {
		if !slices.ContainsFunc(list, func(l []int) bool { return slices.Equal(l, levels) }) {
			list = append(list, levels)
		}
	}
	for load := range a.Question.Loads {
		for _, of := range []func(*Point) Value{factorOf(load), peakOf(load)} {
			for _, sign := range []int{-1, 1} {
				levels := make([]int, len(a.Question.Deviations))
				for i := range levels {
					levels[i] = sign
					if of(&a.Points[2+2*i]).Value > of(&a.Points[3+2*i]).Value {
						levels[i] = -sign
					}
				}
				add(levels)
				for i := range levels {
					flipped := slices.Clone(levels)
					flipped[i] = -flipped[i]
					add(flipped)
				}
			}
		}
	}
	points, err := a.Question.solve(ctx, list)
	a.Points = append(a.Points, points...)
	a.Warnings = append(a.Warnings, fmt.Sprintf("of %d corners %d were solved: those that the sensitivities point to, and their neighbours", 1<<len(a.Question.Deviations), len(list)))
	return err
}

func factorOf(load int) func(*Point) Value { return func(p *Point) Value { return p.Factor[load] } }
func peakOf(load int) func(*Point) Value   { return func(p *Point) Value { return p.Peak[load] } }

func (a *Answer) load(i int) LoadAnswer {
	out := LoadAnswer{Load: a.Question.Loads[i], Decided: true, SameSection: true}
	for k := range a.Points {
		p := &a.Points[k]
		out.SameSection = out.SameSection && p.Factor[i] == p.Peak[i]
		if !p.Decided[i] {
			out.Decided = false
			out.Why = fmt.Sprintf("at %s: %s", a.Question.Place(p), p.Why[i])
		}
	}
	if out.Decided {
		out.Factor = a.spread(factorOf(i))
		out.Peak = a.spread(peakOf(i))
	}
	return out
}

// spread sums up one quantity. The first points are as drawn, the middle, and
// the two faces of each deviation, lower first.
func (a *Answer) spread(of func(*Point) Value) Spread {
	s := Spread{Drawn: of(&a.Points[0]), Middle: of(&a.Points[1])}
	s.Least, s.Most = a.extreme(of, 1, false), a.extreme(of, -1, false)
	sum, bars := 0.0, 0.0
	for i, d := range a.Question.Deviations {
		lower, upper := of(&a.Points[2+2*i]), of(&a.Points[3+2*i])
		c := Contribution{Deviation: d}
		c.Change = Value{(upper.Value - lower.Value) / 2, (upper.Uncertainty + lower.Uncertainty) / 2}
		width := (d.Upper - d.Lower) / 2
		c.Sensitivity = Value{c.Change.Value / width, c.Change.Uncertainty / width}
		sum += float64(c.Change.Value * c.Change.Value)
		bars += math.Abs(c.Change.Value) * c.Change.Uncertainty
		s.Contributions = append(s.Contributions, c)
	}
	if root := math.Sqrt(sum); root > 0 {
		s.RootSumSquare = Value{root, bars / root}
	}
	slices.SortStableFunc(s.Contributions, func(a, b Contribution) int {
		return cmp.Compare(math.Abs(b.Change.Value), math.Abs(a.Change.Value))
	})
	s.Beyond = a.beyond(of)
	return s
}

// extreme is the least (sign +1) or largest (−1) value over all points, or over
// the corners alone.
func (a *Answer) extreme(of func(*Point) Value, sign float64, cornersOnly bool) Extreme {
	var best Extreme
	for k := range a.Points {
		p := &a.Points[k]
		if cornersOnly && !p.corner() {
			continue
		}
		v := of(p)
		if best.At == nil || sign*v.Value < sign*best.Value.Value || v.Value == best.Value.Value && p.corner() {
			best = Extreme{v, p}
		}
	}
	return best
}

// beyond looks for a point inside the box that lies beyond all corners.
func (a *Answer) beyond(of func(*Point) Value) string {
	for _, way := range []struct {
		sign float64
		word string
	}{{1, "below"}, {-1, "above"}} {
		all, corner := a.extreme(of, way.sign, false), a.extreme(of, way.sign, true)
		if way.sign*(corner.Value.Value-all.Value.Value) > all.Uncertainty+corner.Uncertainty {
			return fmt.Sprintf("the value at %s, which is no corner, lies %s those of all corners: the quantity does not run one way inside the tolerances; its true extreme may lie beyond, and neither sensitivities nor squares tell the width", a.Question.Place(all.At), way.word)
		}
	}
	return ""
}
