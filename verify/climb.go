package verify

import (
	"context"
	"fmt"
	"sync"

	"notchproof/fem"
	"notchproof/verify/extrapolate"
	"notchproof/verify/specimen"
)

// A stage is one mesh and the orders that are solved on it.
type stage struct {
	grading     grading
	first, last int
}

// stages lists what a ladder tries, cheapest first. Raising the order on a mesh
// that is graded to the notch converges geometrically, so one mesh is enough
// as a rule; the later stages are for shapes or targets that ask for more.
func stages() []stage {
	return []stage{
		{grading{perQuarter: 6, growth: 0.6, joint: 0.2}, 2, 8},
		{grading{perQuarter: 12, growth: 0.35, joint: 0.05}, 4, 8},
	}
}

// A climb is the ladder of one part under one load.
type climb struct {
	part    *specimen.Part
	load    *specimen.Load
	shapes  *shapes
	options Options
	workers int
	work    [2]fem.Workspace // the second for rungs that are solved side by side
}

// run climbs until the target is met and the solution is sound, or the stages
// are used up; the last stage's state is what is reported.
func (c *climb) run(ctx context.Context) (Computed, *shape, error) {
	var out Computed
	var at *shape
	for i, st := range stages() {
		s, err := c.shapes.stage(i, st.grading)
		if err != nil {
			return out, nil, err
		}
		at = s
		out = Computed{}
		if err := c.begin(ctx, s, st.first, &out); err != nil {
			return out, s, err
		}
		for order := st.first + enoughRungs; ; order++ {
			if c.met(out.Factor) && c.sound(s, &out) {
				return out, s, nil
			}
			if order > st.last {
				break
			}
			next := c.solve(ctx, s, order, &c.work[0], c.workers)
			if err := out.add(next); err != nil {
				return out, s, err
			}
		}
	}
	return out, at, nil
}

// met tells that an estimate is as good as was wished for.
func (c *climb) met(e Estimate) bool {
	return e.Status.Settled() && e.Uncertainty <= c.options.target()*e.Value
}

// sound tells that no check asks for a finer rung. The factor may be there before
// the stress far off is, where elements are large; rounding only grows.
func (c *climb) sound(s *shape, out *Computed) bool {
	out.checks = c.checks(s, out)
	for _, check := range out.checks {
		if !check.Passed && check.discretisation {
			return false
		}
	}
	return true
}

// enoughRungs is the least number of rungs from which a limit and its
// uncertainty can be told.
const enoughRungs = 3

// begin solves the first rungs, which are always needed. The last of them costs
// about as much as the others together, so two goroutines share them better than
// they would share each factorisation.
func (c *climb) begin(ctx context.Context, s *shape, first int, out *Computed) error {
	var solved [enoughRungs]solvedRung
	last := enoughRungs - 1
	var group sync.WaitGroup
	small, large := 1, 1
	if c.workers > 1 {
		large = c.workers - 1
		group.Go(func() { solved[last] = c.solve(ctx, s, first+last, &c.work[0], large) })
	}
	for i := range last {
		solved[i] = c.solve(ctx, s, first+i, &c.work[1], small)
	}
	group.Wait()
	if c.workers <= 1 {
		solved[last] = c.solve(ctx, s, first+last, &c.work[1], large)
	}
	for _, r := range solved {
		if err := out.add(r); err != nil {
			return err
		}
	}
	return nil
}

// A solvedRung is a rung with what it was read from.
type solvedRung struct {
	Rung
	solution *fem.Solution
	peaks    []fem.SurfacePoint
	err      error
}

// solve solves one rung and reads it.
func (c *climb) solve(ctx context.Context, s *shape, order int, w *fem.Workspace, workers int) (r solvedRung) {
	c.options.tell(fmt.Sprintf("%s: order %d on %d triangles", c.load.Name, order, len(s.mesh.Triangles)))
	r.solution, r.err = solve(ctx, c.part, c.load, s.order(order), w, workers)
	if r.err != nil {
		return r
	}
	r.Rung, r.peaks = read(c.part, c.load, r.solution)
	r.PerQuarter = s.grading.perQuarter
	return r
}

// add puts a rung on the ladder and brings the estimates up to date.
func (c *Computed) add(r solvedRung) error {
	if r.err != nil {
		return r.err
	}
	c.Ladder = append(c.Ladder, r.Rung)
	c.Last, c.peaks = r.solution, r.peaks
	c.estimate()
	c.checks = nil // those of the rung before
	return nil
}

// estimate reads the ladder as it stands.
func (c *Computed) estimate() {
	n := len(c.Ladder)
	orders := make([]int, n)
	rows := make([]float64, 4*n)
	factors, mises, around, near := rows[:n], rows[n:2*n], rows[2*n:3*n], rows[3*n:]
	for i, r := range c.Ladder {
		orders[i], factors[i], mises[i] = r.Order, r.Factor, r.VonMises
		around[i], near[i] = r.Around, r.Leftover
	}
	c.Factor = extrapolate.Witnessed(orders, factors, around, near)
	c.VonMises = extrapolate.Witnessed(orders, mises, around, near)
}
