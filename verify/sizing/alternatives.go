package sizing

import (
	"context"
	"maps"
	"math"
	"sync/atomic"

	"notchproof/scf"
	"notchproof/verify/specimen"
)

// An Alternative is another way to meet the limit in the same envelope.
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
	out, errs := make([]*Alternative, len(ways)), make([]error, len(ways))
	var failed atomic.Bool
	each(len(ways), q.workers(), func(i int) {
		if failed.Load() {
			return
		}
		if out[i], errs[i] = q.try(ctx, &ways[i]); errs[i] != nil {
			failed.Store(true)
		}
	})
	var list []Alternative
	for i := range ways {
		if errs[i] != nil {
			return nil, errs[i]
		}
		if out[i] != nil {
			list = append(list, *out[i])
		}
	}
	return list, nil
}

// try makes one alternative; nil where it cannot be drawn or judged.
func (q *Question) try(ctx context.Context, w *way) (*Alternative, error) {
	sub := *q
	sub.draw, sub.Workers, sub.Dimension = w.draw, 1, w.what
	alt := &Alternative{What: w.what, Sizes: w.sizes, Sought: w.sought}
	var s Sample
	var err error
	if w.sought == "" {
		s, err = sub.sample(ctx, w.within.From, sub.full())
	} else {
		s, alt.Bar, err = sub.local(ctx, w)
		alt.Sizes = append(alt.Sizes, Size{w.sought, s.At})
	}
	if err != nil || !s.Decided {
		return nil, err
	}
	alt.Reading = s.Reading
	alt.Meets = s.Value-s.Uncertainty <= q.Limit
	if p, err := w.draw(s.At); err == nil {
		alt.Length = Length(p)
	}
	if w.changes != nil {
		alt.Changes = w.changes(s.At)
	}
	return alt, nil
}

// local looks for the limit between two sizes, from the first, which is the
// part as it is, towards the second. It begins at a guess and steps out until
// the limit lies between two samples; where it never does the best is returned.
func (q *Question) local(ctx context.Context, w *way) (Sample, float64, error) {
	c := coordinate{}
	s := &scan{}
	if w.known != nil {
		s.add(q, c, Sample{w.within.From, *w.known})
	}
	from, to := c.of(w.within.From), c.of(w.within.To)
	u, stride := c.of(w.guess), math.Copysign(0.2, to-from)
	before := -1
	for range 12 {
		sample, err := q.sample(ctx, c.back(u), q.rough())
		if err != nil {
			return Sample{}, 0, err
		}
		s.add(q, c, sample)
		if before, _ = s.crossing(); before >= 0 {
			break
		}
		next := u + stride // not enough, or not to be judged
		if sample.Decided && sample.Value <= q.Limit {
			next = u - stride
		}
		next = math.Max(math.Min(next, math.Max(from, to)), math.Min(from, to))
		if next == u {
			break
		}
		u, stride = next, 2*stride
	}
	switch {
	case len(s.nodes) == 0:
		return Sample{}, 0, nil
	case before < 0:
		x, err := q.extreme(ctx, s, c, q.rough(), 1, 3)
		if err != nil {
			return Sample{}, 0, err
		}
		sample, err := q.sample(ctx, x, q.full())
		return sample, 0, err
	}
	end, others, ok, err := q.polish(ctx, c, s, before, q.rough())
	if err != nil || !ok || !end.Decided {
		return Sample{At: end.At}, 0, err
	}
	return end.Sample, q.bar(c, end, others), nil
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
