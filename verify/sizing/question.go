package sizing

import (
	"context"
	"errors"
	"fmt"
	"maps"
	"math"
	"runtime"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// A Question asks for one dimension of a part.
type Question struct {
	Family *scf.Family
	// Dims are the dimensions as given. The one that is sought may be among
	// them, as the value that the part has now.
	Dims      scf.Dims
	Unit      string
	Options   scf.Options
	Dimension string
	Measure   Measure
	Limit     float64 // the largest value that the measure may take
	Target    float64 // relative uncertainty wished for at the answer; 0: 0.001
	Workers   int     // goroutines; 0: one a processor
	// Progress hears what is being done, from several goroutines; nil: nobody.
	Progress func(text string)

	draw func(x float64) (*specimen.Part, error) // of an alternative; nil: the family's
}

// A Measure is the quantity that is held against the limit: it solves the part
// and reads it. The error is for interruption; a part that cannot be judged
// gives a reading that is not decided.
type Measure func(ctx context.Context, p *specimen.Part, e Effort) (Reading, error)

// Effort says how well a part is solved.
type Effort struct {
	Target  float64 // relative uncertainty wished for
	Workers int
	// Order, when not 0, says that one solve of that order will do, for finding
	// out where to look; a measure that has none solves the part as well as ever.
	Order int
}

// allowance is what a rough value of this effort is taken to be good for,
// relative.
func (e Effort) allowance() float64 {
	if e.Order >= rootOrder {
		return rootAllowance
	}
	return scanAllowance
}

// A Reading is what a measure says of a part. Bars are absolute.
type Reading struct {
	Value       float64 // the measure: a factor, or a stress
	Uncertainty float64
	Factor      float64 // the stress concentration factor behind it
	FactorBar   float64
	Where       string // the place that governs, where there are several
	Decided     bool   // the ladder has converged and the checks have passed
	// Rough tells a value of one solve. Its Uncertainty is an allowance, no bar.
	Rough bool
	Why   string // why not decided, or what the factor does not tell
}

// Meets tells that a reading keeps a limit with its bar.
func (r Reading) Meets(limit float64) bool { return r.Decided && r.Value+r.Uncertainty <= limit }

// A Sample is the measure at one value of the dimension.
type Sample struct {
	At float64
	Reading
}

// Efforts of the search. One solve of order 3 is good to half a percent, of order
// 4 to a tenth of that, on the meshes that ladders begin with; allowances are
// several times that, and nothing is answered that a full ladder has not confirmed.
const (
	defaultTarget  = 1e-3
	scanTarget     = 1e-2
	scanOrder      = 3
	rootOrder      = 4
	scanAllowance  = 1e-2
	rootAllowance  = 2e-3
	rootResolution = 0.1 // of the target, to which the rough search is taken
)

func (q *Question) target() float64 {
	if q.Target > 0 {
		return q.Target
	}
	return defaultTarget
}

func (q *Question) workers() int {
	if q.Workers > 0 {
		return q.Workers
	}
	return runtime.GOMAXPROCS(0)
}

// kind is the family's description of the dimension that is sought.
func (q *Question) kind() (scf.Dimension, error) {
	for _, d := range q.Family.Dimensions {
		if d.Name == q.Dimension {
			return d, nil
		}
	}
	return scf.Dimension{}, &scf.DimensionError{Name: q.Dimension, Missing: true, Reason: "no such dimension",
		Hint: "the dimensions of " + q.Family.Name + " are " + q.Family.Usage()}
}

// given is the value that the dimension has now. A sharp corner is none: it has
// no factor to begin from.
func (q *Question) given() (x float64, ok bool) {
	x, ok = q.Dims[q.Dimension]
	return x, ok && !(x == 0 && q.Family.Sharp(q.Dims))
}

// with are the dimensions with the one that is sought.
func (q *Question) with(x float64) scf.Dims {
	dims := maps.Clone(q.Dims)
	if dims == nil {
		dims = make(scf.Dims)
	}
	dims[q.Dimension] = x
	return dims
}

// Part draws the part with a value of the dimension.
func (q *Question) Part(x float64) (*specimen.Part, error) {
	if q.draw != nil {
		return q.draw(x)
	}
	return specimen.New(q.Family, q.with(x), q.Unit, q.Options)
}

// sample solves the part at one value. A part that cannot be drawn or meshed is
// not decided: beside a forbidden sliver there is always one that can.
func (q *Question) sample(ctx context.Context, x float64, e Effort) (Sample, error) {
	if q.Progress != nil {
		q.Progress(fmt.Sprintf("%s = %.4g %s", q.Dimension, x, q.Unit))
	}
	p, err := q.Part(x)
	if err != nil {
		return Sample{x, undecided(err)}, nil
	}
	r, err := q.Measure(ctx, p, e)
	if err != nil {
		if errors.Is(err, context.Canceled) || ctx.Err() != nil {
			return Sample{}, err
		}
		r = undecided(err)
	}
	return Sample{x, r}, nil
}

func undecided(err error) Reading {
	return Reading{Value: math.NaN(), Uncertainty: math.Inf(1), Factor: math.NaN(), FactorBar: math.Inf(1), Why: err.Error()}
}

// samples solves the part at several values, side by side and each on one
// goroutine: that divides better than a factorisation does.
func (q *Question) samples(ctx context.Context, xs []float64, e Effort) ([]Sample, error) {
	out, errs := make([]Sample, len(xs)), make([]error, len(xs))
	e.Workers = 1
	verify.SideBySide(len(xs), q.workers(), func(i int) { out[i], errs[i] = q.sample(ctx, xs[i], e) })
	return out, errors.Join(errs...)
}

// full is the effort of an answer, told that of a part that is only described,
// close that of a search for a root, rough that
// of a scan.
func (q *Question) full() Effort { return Effort{Target: q.target(), Workers: q.workers()} }
func (q *Question) told() Effort { return Effort{Target: 3 * q.target(), Workers: q.workers()} }
func (q *Question) close() Effort {
	return Effort{Target: q.target(), Workers: q.workers(), Order: rootOrder}
}
func (q *Question) rough() Effort {
	return Effort{Target: scanTarget, Workers: q.workers(), Order: scanOrder}
}
