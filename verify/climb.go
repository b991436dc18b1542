package verify

import (
	"context"
	"fmt"

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
		{grading{perQuarter: 6, growth: 0.5, joint: 0.2}, 2, 8},
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
	work    fem.Workspace
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
		for order := st.first; order <= st.last; order++ {
			if err := c.step(ctx, s, order, &out); err != nil {
				return out, s, err
			}
			if c.met(out.Factor) && c.sound(s, &out) {
				return out, s, nil
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

// step solves one rung and brings the estimates up to date.
func (c *climb) step(ctx context.Context, s *shape, order int, out *Computed) error {
	c.options.tell(fmt.Sprintf("%s: order %d on %d triangles", c.load.Name, order, len(s.mesh.Triangles)))
	sol, err := solve(ctx, c.part, c.load, s.order(order), &c.work, c.workers)
	if err != nil {
		return err
	}
	rung, peaks := read(c.part, c.load, sol)
	rung.PerQuarter = s.grading.perQuarter
	out.Ladder = append(out.Ladder, rung)
	out.Last, out.peaks = sol, peaks
	out.estimate()
	out.checks = nil // those of the rung before
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
