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
	// Rungs is the number of meshes of a study by size; 0: 4, and a fifth where
	// these leave it undecided.
	Rungs int
	// Size is the length of the elements at the notch with which a study by size
	// begins, in the part's unit; 0: three of them on 90° of its arc.
	Size     float64
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
	// SizeAsked is the size of the elements at the notch that the study began
	// with, 0 where it was graded.
	SizeAsked float64
	// Corners are the concave corners without a radius of the shape that the last
	// rung was solved on.
	Corners []Corner
}

// A StudyRow is one rung with what it changed.
type StudyRow struct {
	Rung
	Change        float64 // from the row before; NaN in the first
	ObservedOrder float64 // by size: from this row and the two before, negative where they grow without end, NaN where there is none
	Size          float64 // length of the element's edge at the peak, in the part's unit
	Blind         bool    // its elements are larger than the root, which is left out
}

// mostUnknowns bounds a single solve of a study: about 3 GB of factor.
const mostUnknowns = 1_200_000

// ByOrder solves orders 1 to 8 on the mesh that a check begins with.
func ByOrder(ctx context.Context, p *specimen.Part, l *specimen.Load, o StudyOptions) (*Study, error) {
	s := &Study{Part: p, Load: l}
	made, err := newShape(p, firstGrading())
	if err != nil {
		return nil, err
	}
	var w fem.Workspace
	for order := 1; order <= 8; order++ {
		if err := s.add(ctx, p, made, order, &w, o); err != nil {
			return nil, err
		}
	}
	s.Estimate = s.climbed()
	if err := s.seeCorners(ctx, p, &w, o); err != nil {
		return nil, err
	}
	if endless(s.Corners) {
		s.Estimate = noFactor()
	}
	return s, nil
}

// climbed is what the orders say together, by the rule of a check: where rounding
// rules and the last ones come to nothing, what the ladder had settled to before
// stands as long as they lie within its bar.
func (s *Study) climbed() Estimate {
	var best Computed
	for k := range s.Rows {
		c := Computed{}
		for _, r := range s.Rows[:k+1] {
			c.Ladder = append(c.Ladder, r.Rung)
		}
		c.estimate()
		if k == 0 || c.supersedes(&best) {
			best = c
		}
	}
	e := best.Factor
	if n := len(best.Ladder); n < len(s.Rows) && e.Status.Settled() {
		e.Notes = append(e.Notes, fmt.Sprintf("the limit is that of order %d: later ones add nothing to it and lie within its bar", best.Ladder[n-1].Order))
	}
	return e
}

func (s *Study) add(ctx context.Context, drawn *specimen.Part, made *shape, order int, w *fem.Workspace, o StudyOptions) error {
	Options{Progress: o.Progress}.tell(fmt.Sprintf("%s: order %d on %d triangles", s.Load.Name, order, len(made.mesh.Triangles)))
	load, ok := drawn.Load(s.Load.Name)
	if !ok {
		panic("verify: a part without its root carries other loads")
	}
	sol, err := solve(ctx, drawn, load, made.order(order), w, o.Workers)
	if err != nil {
		return err
	}
	rung, peaks := read(drawn, load, sol)
	rung.PerQuarter = made.grading.perQuarter
	row := StudyRow{Rung: rung, Change: math.NaN(), ObservedOrder: math.NaN(), Size: math.NaN()}
	if len(peaks) > 0 {
		row.Size = edgeLength(sol, peaks[0])
	}
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
