package usermesh

import (
	"context"
	"math"

	"notchproof/fem"
	"notchproof/verify/specimen"
)

// Guidance says how fine meshes of order 1 and 2 must be at the root for the
// stress averaged at the nodes, and what the meshes that were tried gave.
type Guidance struct {
	Factor      float64 // the converged one that errors are counted from
	Uncertainty float64
	Trials      []Trial // by order, then by density
	Needed      []Need  // by order, then by level, widest first
}

// A Trial is one mesh that was tried.
type Trial struct {
	Density  specimen.Density
	Unknowns int
	Error    float64 // (reading − factor) ÷ factor, averaged at the nodes
	Bound    float64 // the largest that the error can be with the factor's own uncertainty
}

// A Need is the least number of elements per 90° from which on the error of every
// mesh tried stays within a level. Errors of order 1 scatter from mesh to mesh by
// about a step of the densities tried: with other large elements far from the root
// a need moves to the density before or after it.
type Need struct {
	Order int
	Level float64 // relative
	Arc   float64 // 0: not reached
	// MoreThan is, where the level was not reached, the finest mesh tried that
	// is known not to do.
	MoreThan float64
}

// Growth is that of the meshes of guidance: the share of the distance from the
// root by which the length of edges grows.
const Growth = 0.2

// Levels are the errors that guidance is given for.
func Levels() []float64 { return []float64{0.05, 0.02, 0.01} }

// arcs are the numbers of elements per 90° that are tried.
func arcs() []float64 {
	return []float64{2, 3, 4, 6, 8, 12, 16, 24, 32, 48, 64, 96, 128}
}

const (
	// The search for an order ends when so many densities in a row lie within a
	// quarter of the finest level: errors do not fall evenly, but do not come
	// back fourfold either.
	calmTrials = 3
	calmShare  = 0.25
	// mostWork ends it as well: the unknowns of all trials of an order together,
	// three to four times those of an ordinary part, about half a second.
	mostWork = 200_000
)

// Guide tries meshes of both orders, coarse to fine, against a factor that is
// known to within an uncertainty. Where the uncertainty is a good part of a
// level, the level may not be reached for that.
func (s *Subject) Guide(ctx context.Context, factor, uncertainty float64) (*Guidance, error) {
	orders := [2]int{1, 2}
	var tried [len(orders)][]Trial
	err := s.each(len(orders), func(i int, w *fem.Workspace) (err error) {
		tried[i], err = s.climb(ctx, orders[i], factor, uncertainty, w)
		return err
	})
	if err != nil {
		return nil, err
	}
	g := &Guidance{Factor: factor, Uncertainty: uncertainty}
	for i, order := range orders {
		g.Trials = append(g.Trials, tried[i]...)
		for _, level := range Levels() {
			g.Needed = append(g.Needed, need(tried[i], order, level))
		}
	}
	return g, nil
}

// climb tries the densities of one order.
func (s *Subject) climb(ctx context.Context, order int, factor, uncertainty float64, w *fem.Workspace) ([]Trial, error) {
	var tried []Trial
	levels := Levels()
	calm, work := 0, 0
	for _, arc := range arcs() {
		d := specimen.Density{Order: order, Arc: arc}
		v, err := s.value(ctx, d, Growth, w)
		if err != nil {
			return nil, err
		}
		e := v.nodes/factor - 1
		t := Trial{d, v.unknowns, e, math.Abs(e) + uncertainty/factor}
		tried = append(tried, t)
		if calm++; t.Bound > calmShare*levels[len(levels)-1] {
			calm = 0
		}
		if work += v.unknowns; calm == calmTrials || work > mostWork {
			break
		}
	}
	return tried, nil
}

// need is the least density from which on all are within the level. One that
// no finer one has confirmed does not count.
func need(tried []Trial, order int, level float64) Need {
	first := len(tried)
	for first > 0 && tried[first-1].Bound <= level {
		first--
	}
	n := Need{Order: order, Level: level}
	switch {
	case first < len(tried)-1:
		n.Arc = tried[first].Density.Arc
	case first > 0:
		n.MoreThan = tried[first-1].Density.Arc
	}
	return n
}
