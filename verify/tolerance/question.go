package tolerance

import (
	"context"
	"errors"
	"fmt"
	"maps"
	"math"
	"runtime"
	"sync"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// A Deviation is the tolerance of one dimension: how far it may lie from the
// value as drawn, Lower < Upper, in the dimension's unit (degrees for angles).
type Deviation struct {
	Name         string
	Lower, Upper float64
}

// at is the deviation at a level: −1 lower, 0 middle, +1 upper.
func (d Deviation) at(level int) float64 {
	switch {
	case level < 0:
		return d.Lower
	case level > 0:
		return d.Upper
	}
	return d.Lower + (d.Upper-d.Lower)/2
}

// A Question asks for the range of a part over its tolerances.
type Question struct {
	Family     *scf.Family
	Dims       scf.Dims // as drawn
	Unit       string
	Options    scf.Options
	Deviations []Deviation
	Loads      []scf.Load // none: all that the family carries
	Target     float64    // relative uncertainty wished for at every point; 0: 2e-4
	Workers    int        // goroutines; 0: one a processor
	// Progress hears what is being done, from several goroutines; nil: nobody.
	Progress func(text string)
}

// defaultTarget is finer than a check's: differences between points are small.
const defaultTarget = 2e-4

// A CornerError is a place of the box that cannot be drawn, or has no factor.
type CornerError struct {
	Dims scf.Dims
	Err  error // a *scf.DimensionError
}

func (e *CornerError) Error() string {
	return "within the tolerances lies a shape that has no factor: " + e.Err.Error()
}

func (e *CornerError) Unwrap() error { return e.Err }

// dims are the dimensions at given levels of the deviations; nil: as drawn.
func (q *Question) dims(levels []int) scf.Dims {
	dims := maps.Clone(q.Dims)
	for i, d := range q.Deviations {
		if levels != nil {
			dims[d.Name] += d.at(levels[i])
		}
	}
	return dims
}

// A Value is a number with its bar.
type Value struct{ Value, Uncertainty float64 }

// A Point is one place of the box with what was found there, by load.
type Point struct {
	// Levels say for each deviation whether it is at its lower limit (−1), in its
	// middle (0) or at its upper limit (1); nil: the part as drawn.
	Levels  []int
	Dims    scf.Dims
	Factor  []Value
	Peak    []Value // over the nominal stress of the part as drawn
	Decided []bool
	Why     []string
}

// corner tells that every deviation is at a limit.
func (p *Point) corner() bool {
	for _, l := range p.Levels {
		if l == 0 {
			return false
		}
	}
	return p.Levels != nil
}

// solve solves a list of points, side by side and each on one goroutine.
func (q *Question) solve(ctx context.Context, list [][]int) ([]Point, error) {
	drawn, err := specimen.New(q.Family, q.Dims, q.Unit, q.Options)
	if err != nil {
		return nil, err
	}
	parts := make([]*specimen.Part, len(list))
	for i, levels := range list {
		dims := q.dims(levels)
		if parts[i], err = specimen.New(q.Family, dims, q.Unit, q.Options); err != nil {
			return nil, &CornerError{dims, err}
		}
		if q.Family.Sharp(dims) {
			return nil, &CornerError{dims, &scf.DimensionError{Name: "r", Reason: "a sharp corner has no factor, its stress grows without bound"}}
		}
	}
	points, errs := make([]Point, len(list)), make([]error, len(list))
	gate := make(chan struct{}, q.workers())
	var group sync.WaitGroup
	for i := range list {
		gate <- struct{}{}
		group.Go(func() {
			defer func() { <-gate }()
			if q.Progress != nil {
				q.Progress(fmt.Sprintf("point %d of %d", i+1, len(list)))
			}
			points[i], errs[i] = q.point(ctx, drawn, parts[i])
			points[i].Levels = list[i]
		})
	}
	group.Wait()
	return points, errors.Join(errs...)
}

func (q *Question) point(ctx context.Context, drawn, p *specimen.Part) (Point, error) {
	target := q.Target
	if target == 0 {
		target = defaultTarget
	}
	result, err := verify.Run(ctx, p, q.Loads, verify.Options{Target: target, Workers: 1})
	if err != nil {
		return Point{}, err
	}
	out := Point{Dims: p.Dims}
	for _, f := range result.Findings {
		l, _ := drawn.Load(f.Load.Name)
		section := f.Load.Nominal.Net / l.Nominal.Net
		e := f.Computed.Factor
		out.Factor = append(out.Factor, Value{e.Value, e.Uncertainty})
		out.Peak = append(out.Peak, Value{e.Value * section, e.Uncertainty * section})
		out.Decided = append(out.Decided, f.Verdict != verify.Undecided)
		why := ""
		if f.Verdict == verify.Undecided && len(f.Because) > 0 {
			why = f.Because[len(f.Because)-1]
		}
		out.Why = append(out.Why, why)
	}
	return out, nil
}

func (q *Question) workers() int {
	if q.Workers > 0 {
		return q.Workers
	}
	return runtime.GOMAXPROCS(0)
}

// validate refuses deviations that no caller should have let through.
func (q *Question) validate() {
	seen := make(map[string]bool)
	for _, d := range q.Deviations {
		if _, given := q.Dims[d.Name]; !given || seen[d.Name] || !(d.Lower < d.Upper) || math.IsInf(d.Upper-d.Lower, 0) {
			panic("tolerance: deviation without width, of a dimension that is not given, or given twice")
		}
		seen[d.Name] = true
	}
	if len(q.Deviations) == 0 {
		panic("tolerance: no deviations")
	}
}
