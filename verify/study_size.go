package verify

import (
	"context"
	"fmt"
	"math"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/mesh/outline"
	"notchproof/verify/extrapolate"
	"notchproof/verify/specimen"
)

// BySize solves one order on a mesh and on those made of it by halving every
// element, so that nothing but the size changes from rung to rung and the order
// can be observed. The first mesh is graded to the notch, or has the size there
// that is asked for.
//
// Elements larger than a root's arc cannot follow it: as in a mesh of a user
// whose elements are that large, the arc is left out and the corner is sharp
// (StudyRow.Blind). The factors of such rungs say nothing about the part's.
func BySize(ctx context.Context, p *specimen.Part, l *specimen.Load, o StudyOptions) (*Study, error) {
	s := &Study{Part: p, Load: l, SizeAsked: o.Size}
	b := &bySize{study: s, options: o, order: o.Order, root: rootLength(p)}
	if b.order == 0 {
		b.order = 2
	}
	rungs := o.Rungs
	if rungs == 0 {
		rungs = 4
	}
	var w fem.Workspace
	for k := range rungs {
		if err := b.rung(ctx, k, rungs, &w); err != nil {
			return nil, err
		}
	}
	if err := s.seeCorners(ctx, b.drawn, &w, o); err != nil {
		return nil, err
	}
	s.observe(b.order)
	// Where nobody said how many, one rung more may tell what these do not.
	if o.Rungs == 0 && s.Estimate.Status == extrapolate.Undecided && b.affordable(rungs-1, rungs+1) == nil {
		if err := b.rung(ctx, rungs, rungs+1, &w); err != nil {
			return nil, err
		}
		s.observe(b.order)
	}
	return s, nil
}

// rung solves rung k of so many.
func (b *bySize) rung(ctx context.Context, k, rungs int, w *fem.Workspace) error {
	if err := b.next(k); err != nil {
		return err
	}
	if err := b.affordable(k, rungs); err != nil {
		return err
	}
	if err := b.study.add(ctx, b.drawn, b.made, b.order, w, b.options); err != nil {
		return err
	}
	b.study.Rows[k].Blind = b.blind
	return nil
}

// A bySize makes the meshes of a study by size, one after the other.
type bySize struct {
	study   *Study
	options StudyOptions
	order   int
	root    float64 // length of the shortest arc of the notch
	drawn   *specimen.Part
	made    *shape
	blind   bool
}

// next makes the mesh of rung k: the one before halved, or a new one where it is
// the first, or the first whose elements are small enough for the root.
func (b *bySize) next(k int) error {
	p := b.study.Part
	if b.options.Size == 0 {
		if k > 0 {
			b.made = b.made.halved()
			return nil
		}
		made, err := newShape(p, grading{perQuarter: 3, growth: 0.6, joint: 0.5})
		b.drawn, b.made = p, made
		return err
	}
	size := math.Ldexp(b.options.Size, -k)
	drawn, blind := p, false
	if size > b.root {
		drawn, blind = p.Sharpened()
	}
	if k > 0 && blind == b.blind {
		b.made = b.made.halved()
		return nil
	}
	b.drawn, b.blind = drawn, blind
	made, err := evenShape(drawn, size)
	b.made = made
	return err
}

// affordable refuses a study that one of its rungs would make too large, before
// the first of them is solved: halving makes four triangles of one.
func (b *bySize) affordable(k, rungs int) error {
	triangles := len(b.made.mesh.Triangles)
	for rung := k; rung < rungs; rung++ {
		n := estimateUnknowns(triangles, b.order, b.study.Load.Model.Unknowns())
		if n > mostUnknowns {
			return &beyondMachine{text: fmt.Sprintf("rung %d would have about %d unknowns, more than %d", rung+1, n, mostUnknowns)}
		}
		if b.blind { // the next mesh may be a new one
			return nil
		}
		triangles *= 4
	}
	return nil
}

// A beyondMachine error: the study asks for more than the machine is given.
type beyondMachine struct{ text string }

func (e *beyondMachine) Error() string { return e.text }

// Hint says what to do.
func (e *beyondMachine) Hint() string { return "ask for fewer rungs, larger elements or a lower order" }

// mostEdges bounds the elements along a notch that is meshed with one size.
const mostEdges = 20_000

// evenShape is a mesh with one size at the notch, growing slowly off it.
func evenShape(p *specimen.Part, size float64) (*shape, error) {
	wish := mesh.Sizing{Growth: 0.25}
	edges := 0.0
	sides := p.Region.Sides()
	for _, c := range p.Sharp {
		if onNotch(p, c) {
			wish.Spots = append(wish.Spots, mesh.SpotWish{At: c.At, Size: size})
		}
	}
	for _, side := range p.Notch {
		if len(wish.Spots) == 0 {
			wish.Sides = append(wish.Sides, mesh.SideWish{Side: side, Size: size})
			edges += sides[side].Curve.Length(0, 1) / size
		}
	}
	if edges > mostEdges {
		return nil, &beyondMachine{text: fmt.Sprintf("elements of %.3g along the notch would be %.0f, more than %d", size, edges, mostEdges)}
	}
	m, err := mesh.Generate(p.Region, wish)
	if err != nil {
		return nil, err
	}
	return &shape{grading: grading{perQuarter: math.NaN()}, mesh: m, curved: make(map[int]*mesh.Curved)}, nil
}

// rootLength is the length of the shortest bent side of the notch; none is bent:
// infinite, there is no root to be missed.
func rootLength(p *specimen.Part) float64 {
	least := math.Inf(1)
	sides := p.Region.Sides()
	for _, side := range p.Notch {
		if _, straight := sides[side].Curve.(outline.Line); !straight {
			least = math.Min(least, sides[side].Curve.Length(0, 1))
		}
	}
	return least
}

// seeCorners measures the corners of what the last rung was solved on.
func (s *Study) seeCorners(ctx context.Context, drawn *specimen.Part, w *fem.Workspace, o StudyOptions) error {
	l, ok := drawn.Load(s.Load.Name)
	if !ok {
		panic("verify: a part without its root carries other loads")
	}
	var err error
	s.Corners, err = corners(ctx, drawn, l, w, o.Workers)
	return err
}

// observe reads the rungs that stand on one and the same shape, the last one's.
func (s *Study) observe(order int) {
	first := len(s.Rows) - 1
	for first > 0 && s.Rows[first-1].Blind == s.Rows[first].Blind {
		first--
	}
	if first > 0 {
		s.Rows[first].Change = math.NaN() // a change of shape, not of size
	}
	var sizes, values []float64
	for i := range s.Rows[first:] {
		sizes = append(sizes, math.Ldexp(1, -i))
		values = append(values, s.Rows[first+i].Factor)
	}
	// Surface stresses of elements of order p converge with h^p.
	study := extrapolate.Sizes(sizes, values)
	if len(values) >= 3 {
		study = study.Against(float64(order), 2)
	}
	s.Sizes, s.Estimate = &study, study.Estimate()
	s.rates(study, first)
	if endless(s.Corners) {
		s.Estimate = noFactor()
		return
	}
	// The grid convergence index knows differences alone, and these can be small
	// by accident; the traction that is left where none can be is known to be
	// wrong, and belongs to the bar as it does in a check.
	s.Estimate.Uncertainty += s.Rows[len(s.Rows)-1].Leftover
}

// rates fills in the orders that were observed, and where a ladder grows without
// end the power of the size with which it does, negative.
func (s *Study) rates(study extrapolate.Study, first int) {
	for i, observed := range study.Orders {
		at := first + 2 + i
		s.Rows[at].ObservedOrder = observed
		if growth := s.Rows[at].Change / s.Rows[at-1].Change; study.Status == extrapolate.Diverging && math.IsNaN(observed) && growth > 0 {
			s.Rows[at].ObservedOrder = -math.Log2(growth)
		}
	}
}
