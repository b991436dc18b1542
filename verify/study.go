package verify

import (
	"context"
	"fmt"
	"math"

	"notchproof/fem"
	"notchproof/verify/extrapolate"
	"notchproof/verify/specimen"
)

// StudyOptions say how a convergence study is made.
type StudyOptions struct {
	// Order is the order of the elements of a study by size; 0: 2, the order
	// most meshes in use have.
	Order int
	// Rungs is the number of meshes of a study by size; 0: 4.
	Rungs    int
	Workers  int
	Progress func(text string)
}

// A Study is a ladder that was climbed to be looked at, not to meet a target.
type Study struct {
	Part *specimen.Part
	Load *specimen.Load
	Rows []StudyRow
	// Sizes holds Richardson's limit and the grid convergence index of a study
	// by size; nil in a study by order.
	Sizes    *extrapolate.Study
	Estimate Estimate
}

// A StudyRow is one rung with what it changed.
type StudyRow struct {
	Rung
	Change        float64 // from the row before; NaN in the first
	ObservedOrder float64 // by size: from this row and the two before, NaN where there is none
}

// mostUnknowns bounds a single solve of a study: about 3 GB of factor.
const mostUnknowns = 1_200_000

// BySize solves one order on a graded mesh and on those made of it by halving
// every element, so that nothing but the size changes from rung to rung and the
// order can be observed.
func BySize(ctx context.Context, p *specimen.Part, l *specimen.Load, o StudyOptions) (*Study, error) {
	order, rungs := o.Order, o.Rungs
	if order == 0 {
		order = 2
	}
	if rungs == 0 {
		rungs = 4
	}
	s := &Study{Part: p, Load: l}
	made, err := newShape(p, grading{perQuarter: 3, growth: 0.6, joint: 0.5})
	if err != nil {
		return nil, err
	}
	var w fem.Workspace
	var sizes, values []float64
	for k := range rungs {
		if k > 0 {
			made = made.halved()
		}
		if n := estimateUnknowns(len(made.mesh.Triangles), order, l.Model.Unknowns()); n > mostUnknowns {
			return nil, fmt.Errorf("rung %d would have about %d unknowns, more than %d: ask for fewer rungs or a lower order", k+1, n, mostUnknowns)
		}
		if err := s.add(ctx, made, order, &w, o); err != nil {
			return nil, err
		}
		sizes = append(sizes, 1/math.Sqrt(float64(len(made.mesh.Triangles))))
		values = append(values, s.Rows[k].Factor)
	}
	// Surface stresses of elements of order p converge with h^p.
	study := extrapolate.Sizes(sizes, values).Against(float64(order), 2)
	s.Sizes, s.Estimate = &study, study.Estimate()
	// The grid convergence index knows differences alone, and these can be small
	// by accident; the traction that is left where none can be is known to be
	// wrong, and belongs to the bar as it does in a check.
	s.Estimate.Uncertainty += s.Rows[rungs-1].Leftover
	for i, observed := range study.Orders {
		s.Rows[i+2].ObservedOrder = observed
	}
	return s, nil
}

// ByOrder solves orders 1 to 8 on the mesh that a check begins with.
func ByOrder(ctx context.Context, p *specimen.Part, l *specimen.Load, o StudyOptions) (*Study, error) {
	s := &Study{Part: p, Load: l}
	made, err := newShape(p, stages()[0].grading)
	if err != nil {
		return nil, err
	}
	var w fem.Workspace
	for order := 1; order <= 8; order++ {
		if err := s.add(ctx, made, order, &w, o); err != nil {
			return nil, err
		}
	}
	c := Computed{}
	for _, r := range s.Rows {
		c.Ladder = append(c.Ladder, r.Rung)
	}
	c.estimate()
	s.Estimate = c.Factor
	return s, nil
}

func (s *Study) add(ctx context.Context, made *shape, order int, w *fem.Workspace, o StudyOptions) error {
	Options{Progress: o.Progress}.tell(fmt.Sprintf("%s: order %d on %d triangles", s.Load.Name, order, len(made.mesh.Triangles)))
	sol, err := solve(ctx, s.Part, s.Load, made.order(order), w, o.Workers)
	if err != nil {
		return err
	}
	rung, _ := read(s.Part, s.Load, sol)
	rung.PerQuarter = made.grading.perQuarter
	row := StudyRow{Rung: rung, Change: math.NaN(), ObservedOrder: math.NaN()}
	if n := len(s.Rows); n > 0 {
		row.Change = rung.Factor - s.Rows[n-1].Factor
	}
	s.Rows = append(s.Rows, row)
	return nil
}

// estimateUnknowns: a triangulation has about half as many corners and one and
// a half times as many edges as triangles.
func estimateUnknowns(triangles, order, unknowns int) int {
	t, p := float64(triangles), float64(order)
	return int(t * (0.5 + 1.5*(p-1) + (p-1)*(p-2)/2) * float64(unknowns))
}
