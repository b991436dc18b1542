package verify

import (
	"context"
	"fmt"
	"math"
	"slices"
	"sync"

	"notchproof/fem"
	"notchproof/verify/extrapolate"
	"notchproof/verify/specimen"
)

// Orders of a ladder: raising the order on a mesh that is graded to the notch
// converges geometrically.
const (
	firstOrder = 2
	lastOrder  = 8
	// enoughRungs is the least number of rungs from which a limit and its
	// uncertainty can be told.
	enoughRungs = 3
	// mostRounds bounds how often the mesh is refined where the error sits.
	mostRounds = 3
)

// A climb is the ladder of one part under one load. Beside the mesh of the
// ladder stands a second one, graded otherwise, of the same part with longer
// ends; the last order is solved on both.
type climb struct {
	part    *specimen.Part
	load    *specimen.Load
	pair    *pair // the first one, which all loads of the part share
	options Options
	workers int
	endless bool             // the notch has a sharp corner: no mesh is fine enough
	work    [2]fem.Workspace // the second for what is solved side by side
}

// run climbs until the target is met and the solution is sound, or the work
// limit is reached. From each rung on it raises the order where the ladder lets
// expect that this is enough, else it refines the mesh where the error sits and
// begins anew.
func (c *climb) run(ctx context.Context) (Computed, *shape, error) {
	var best Computed
	var at *shape
	p := c.pair
	for round := 0; ; round++ {
		out, s, err := c.orders(ctx, p, round)
		if err != nil {
			return out, s, err
		}
		if at == nil || out.supersedes(&best) {
			best, at = out, s
		}
		if c.done(at, &best) || round == mostRounds || c.endless || out.Factor.Status == extrapolate.Diverging || c.cramped() {
			return best, at, nil
		}
		next, err := c.refined(p, s, &out)
		if err != nil || next == nil {
			return best, at, err
		}
		p = next
	}
}

// supersedes tells that a later state of a ladder is to be reported in place of
// an earlier one: it says more, or it contradicts. A settled ladder whose later
// rungs come to nothing, as they do where rounding rules, stands as long as they
// lie within its bar.
func (c *Computed) supersedes(earlier *Computed) bool {
	late, early := c.Factor, earlier.Factor
	switch {
	case !early.Status.Settled():
		return true
	case !late.Status.Settled():
		last := c.Ladder[len(c.Ladder)-1].Factor
		return !(math.Abs(last-early.Value) <= early.Uncertainty)
	}
	return late.Uncertainty < early.Uncertainty || math.Abs(late.Value-early.Value) > early.Uncertainty
}

// orders climbs on one pair of meshes as far as that helps.
func (c *climb) orders(ctx context.Context, p *pair, round int) (Computed, *shape, error) {
	var out Computed
	first := firstOrder
	if round > 0 {
		first = firstOrder + 2 // low orders have nothing to tell on a fine mesh
	}
	s, err := c.begin(ctx, p, first, &out)
	best := out
	for err == nil && !c.done(s, &out) {
		order := out.Ladder[len(out.Ladder)-1].Order + 1
		if order > lastOrder || c.hopeless(out.Factor, order) || tooLarge(s, order, c.load) {
			break
		}
		if err = c.raise(ctx, p, s, order, &out); err == nil && (c.done(s, &out) || out.supersedes(&best)) {
			best = out
		}
	}
	return best, s, err
}

// done tells that the target is met and that no check asks for a finer rung. The
// factor may be there before the stress far off is, where elements are large.
func (c *climb) done(s *shape, out *Computed) bool {
	e := out.Factor
	if !e.Status.Settled() || e.Uncertainty > c.options.target()*e.Value {
		return false
	}
	if out.checks == nil {
		out.checks = c.checks(s, out)
	}
	for _, check := range out.checks {
		if !check.Passed && check.discretisation {
			return false
		}
	}
	return true
}

// cramped tells that an end is too near for any mesh to mend it.
func (c *climb) cramped() bool {
	return slices.ContainsFunc(c.part.Plain, func(plain specimen.Plain) bool { return plainLength(c.part, plain) < plainLimit })
}

// hopeless tells that the orders which are left will not bring a settled ladder
// to its target at the pace that was seen: each leaves the share e.Order of the
// error.
func (c *climb) hopeless(e Estimate, order int) bool {
	if !e.Status.Settled() {
		return false // too early to tell
	}
	left := float64(lastOrder - order + 1)
	return e.Uncertainty*math.Pow(e.Order, left) > c.options.target()*e.Value
}

// begin makes the meshes and solves the first rungs, which are always needed,
// and the last of their orders on the second mesh. The two largest solves are of
// about one size, and so are side by side, and then the smaller ones.
func (c *climb) begin(ctx context.Context, p *pair, first int, out *Computed) (*shape, error) {
	last := first + enoughRungs - 1
	var second reading
	var rungs [enoughRungs]solvedRung
	var errs [enoughRungs]error
	var s *shape
	var err error
	rung := func(i int, w *fem.Workspace) { rungs[i], errs[i] = c.solve(ctx, s, first+i, w) }
	c.beside(func() {
		second = c.second(ctx, p, last, &c.work[1])
	}, func() {
		if s, err = p.first(); err == nil {
			rung(enoughRungs-1, &c.work[0])
		}
	})
	if err != nil {
		return nil, err
	}
	c.beside(func() {
		rung(1, &c.work[1])
	}, func() {
		rung(0, &c.work[0])
	})
	for i := range rungs {
		if errs[i] != nil {
			return s, errs[i]
		}
		out.add(rungs[i])
	}
	return s, c.confirm(out, second)
}

// raise solves one order more on both meshes.
func (c *climb) raise(ctx context.Context, p *pair, s *shape, order int, out *Computed) error {
	var second reading
	var next solvedRung
	var err error
	c.beside(func() {
		second = c.second(ctx, p, order, &c.work[1])
	}, func() {
		next, err = c.solve(ctx, s, order, &c.work[0])
	})
	if err != nil {
		return err
	}
	out.add(next)
	return c.confirm(out, second)
}

// beside does two things, at the same time if there are two workers.
func (c *climb) beside(a, b func()) {
	if c.workers <= 1 {
		b()
		a()
		return
	}
	var group sync.WaitGroup
	group.Go(a)
	b()
	group.Wait()
}

// A solvedRung is a rung with what it was read from.
type solvedRung struct {
	Rung
	solution *fem.Solution
	peaks    []fem.SurfacePoint
}

// solve solves one rung and reads it.
func (c *climb) solve(ctx context.Context, s *shape, order int, w *fem.Workspace) (r solvedRung, err error) {
	c.options.tell(fmt.Sprintf("%s: order %d on %d triangles", c.load.Name, order, len(s.mesh.Triangles)))
	r.solution, err = solve(ctx, c.part, c.load, s.order(order), w, max(1, c.workers/2))
	if err != nil {
		return r, err
	}
	r.Rung, r.peaks = read(c.part, c.load, r.solution)
	r.PerQuarter = s.grading.perQuarter
	return r, nil
}

// A reading is what the second mesh says.
type reading struct {
	factor, vonMises float64
	err              error
}

// second solves an order on the second mesh and reads its factors.
func (c *climb) second(ctx context.Context, p *pair, order int, w *fem.Workspace) (r reading) {
	s, err := p.second()
	if err != nil {
		return reading{err: err}
	}
	load, _ := p.long.Load(c.load.Name)
	solution, err := solve(ctx, p.long, load, s.order(order), w, max(1, c.workers/2))
	if err != nil {
		return reading{err: err}
	}
	rung, _ := read(p.long, load, solution)
	return reading{factor: rung.Factor, vonMises: rung.VonMises}
}

// add puts a rung on the ladder.
func (c *Computed) add(r solvedRung) {
	c.Ladder = append(c.Ladder, r.Rung)
	c.Last, c.peaks = r.solution, r.peaks
	c.checks = nil // those of the rung before
}

// confirm brings the estimates up to date with the ladder and the second mesh.
func (c *climb) confirm(out *Computed, second reading) error {
	if second.err != nil {
		return second.err
	}
	out.estimate()
	out.Factor = out.Factor.Confirmed(second.factor)
	out.VonMises = out.VonMises.Confirmed(second.vonMises)
	out.apart = apartLimit(out.Factor, c.options.target())
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
