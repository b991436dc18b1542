package sizing

import (
	"cmp"
	"context"
	"maps"
	"math"
	"slices"
	"sync/atomic"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// An Alternative is another way to meet the limit in the same envelope. One
// that could not be settled is not Decided, has no sizes, and says Why.
type Alternative struct {
	What string // in words, without sizes
	// Sizes are the dimensions that tell it from the answer.
	Sizes []Size
	// Sought is the one of them that was made to meet the limit, known to Bar;
	// empty where all were chosen.
	Sought string
	Bar    float64
	Reading
	Meets bool // keeps the limit, at it where a size was sought
	// Length is what the notch takes along the axis; of shoulders beside the
	// face, on the thinner section.
	Length float64
	// Changes are what it costs elsewhere.
	Changes []Size
}

// A Size is a dimension by its name.
type Size struct {
	Name  string
	Value float64
}

// A way is how an alternative is made: a part with one size left open, or none.
type way struct {
	what    string
	sizes   []Size
	sought  string
	within  Interval // from the part as it is, towards what helps
	guess   float64  // where to begin
	below   float64  // what the size closes in on; 0: nothing
	known   *Reading // the measure at within.From, nil where it is not known
	draw    func(x float64) (*specimen.Part, error)
	changes func(x float64) []Size
}

// Alternatives computes other ways to meet the limit. Those with a size of their
// own make it as large as the limit asks for; the radius stays what the part has
// now where that is not enough, else half of the answer.
func (q *Question) Alternatives(ctx context.Context, a *Answer) ([]Alternative, error) {
	ways, err := q.ways(ctx, a)
	if err != nil {
		return nil, err
	}
	list, errs := make([]Alternative, len(ways)), make([]error, len(ways))
	var failed atomic.Bool
	order := longestFirst(ways)
	verify.SideBySide(len(ways), q.workers(), func(k int) {
		if failed.Load() {
			return
		}
		i := order[k]
		if list[i], errs[i] = q.try(ctx, &ways[i]); errs[i] != nil {
			failed.Store(true)
		}
	})
	return list, cmp.Or(errs...)
}

// longestFirst is the order in which ways are begun: those with a size to seek,
// which take several solves, before those of one, so that none is left alone at
// the end.
func longestFirst(ways []way) (order []int) {
	for i := range ways {
		order = append(order, i)
	}
	sought := func(i int) int {
		if ways[i].sought == "" {
			return 1
		}
		return 0
	}
	slices.SortStableFunc(order, func(a, b int) int { return cmp.Compare(sought(a), sought(b)) })
	return order
}

// try makes one alternative.
func (q *Question) try(ctx context.Context, w *way) (Alternative, error) {
	sub := *q
	sub.draw, sub.Workers, sub.Dimension = w.draw, 1, w.what
	alt := Alternative{What: w.what, Sizes: w.sizes, Sought: w.sought}
	var s Sample
	var err error
	if w.sought == "" {
		s, err = sub.sample(ctx, w.within.From, sub.told())
		if err == nil && math.Abs(s.Value-q.Limit) <= s.Uncertainty { // on which side?
			s, err = sub.sample(ctx, w.within.From, sub.full())
		}
	} else {
		s, alt.Bar, err = sub.local(ctx, w)
		alt.Sizes = append(alt.Sizes, Size{w.sought, s.At})
	}
	if err != nil {
		return Alternative{}, err
	}
	alt.Reading = s.Reading
	if !s.Decided {
		return Alternative{What: w.what, Reading: s.Reading}, nil
	}
	alt.Meets = s.Value-s.Uncertainty <= q.Limit
	if p, err := w.draw(s.At); err == nil {
		alt.Length = Length(p)
	}
	if w.changes != nil {
		alt.Changes = w.changes(s.At)
	}
	return alt, nil
}

// Length is how far the notch reaches along the axis; of a shoulder, whose face
// is at x = 0 and whose thinner section is at x > 0, beside the face.
func Length(p *specimen.Part) float64 {
	sides := p.Region.Sides()
	from, to := math.Inf(1), math.Inf(-1)
	for _, i := range p.Notch {
		b := sides[i].Curve.Bounds()
		from, to = math.Min(from, b.Min.X), math.Max(to, b.Max.X)
	}
	if p.Family == nil || p.Family.Name == "bar-shoulder" || p.Family.Name == "shaft-shoulder" {
		return math.Max(to, 0)
	}
	return to - from
}

// familyWay is a part of a family with some dimensions changed and one, which
// may be none, left open within the given bounds.
func (q *Question) familyWay(what string, family *scf.Family, base scf.Dims, sizes []Size, sought string, within Interval) (way, bool) {
	dims := maps.Clone(base)
	for _, s := range sizes {
		dims[s.Name] = s.Value
	}
	with := func(x float64) scf.Dims {
		full := maps.Clone(dims)
		if sought != "" {
			full[sought] = x
		}
		return full
	}
	draw := func(x float64) (*specimen.Part, error) { return specimen.New(family, with(x), q.Unit, q.Options) }
	w := way{what: what, sizes: sizes, sought: sought, within: within, guess: math.Sqrt(within.From * within.To), draw: draw}
	if sought == "" {
		return w, family.Check(with(0)) == nil
	}
	for range 20 { // what cannot be drawn at the far end may be nearer
		if family.Check(with(w.within.To)) == nil {
			break
		}
		w.within.To = math.Sqrt(w.within.From * w.within.To)
		w.guess = w.within.To
	}
	return w, family.Check(with(w.within.From)) == nil && family.Check(with(w.within.To)) == nil && w.within.To != w.within.From
}
