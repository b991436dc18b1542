package evidence

import (
	"context"
	"fmt"
	"math"
	"runtime"
	"sync"
)

// A Sureness says where an expected value comes from.
type Sureness int

const (
	Exact     Sureness = iota + 1 // a closed form, or arithmetic by hand
	Published                     // a number as it was printed
	Memory                        // from memory, checked numerically
)

func (s Sureness) String() string {
	switch s {
	case Exact:
		return "exact"
	case Published:
		return "published"
	case Memory:
		return "from memory"
	}
	return "unknown"
}

// A Case is a problem with its answers.
type Case struct {
	Name     string
	Source   string // author, place, year
	Sureness Sureness
	Expected []Expected
	// Compute gives as many answers as are expected, in their order.
	Compute func(ctx context.Context) ([]Got, error)
}

// An Expected is a number that is known from outside.
type Expected struct {
	What     string
	Value    float64
	Accuracy float64 // what it is good for, absolute: half a unit of the last digit printed; 0: exact
}

// A Got is a computed number with its bar, absolute.
type Got struct{ Value, Bar float64 }

// An Outcome is a case that was run.
type Outcome struct {
	Case     *Case
	Readings []Reading
	Err      error // the case could not be computed
}

// A Reading holds a computed number against the expected one.
type Reading struct {
	Expected
	Got    float64
	Bar    float64
	Passed bool
}

// Passed tells that a case was computed and met all that it expects.
func (o *Outcome) Passed() bool {
	if o.Err != nil || len(o.Readings) == 0 {
		return false
	}
	for _, r := range o.Readings {
		if !r.Passed {
			return false
		}
	}
	return true
}

// run computes a case.
func (c *Case) run(ctx context.Context) Outcome {
	got, err := c.Compute(ctx)
	if err == nil && len(got) != len(c.Expected) {
		err = fmt.Errorf("%d answers, %d are expected", len(got), len(c.Expected))
	}
	out := Outcome{Case: c, Err: err}
	if err != nil {
		return out
	}
	for i, e := range c.Expected {
		r := Reading{Expected: e, Got: got[i].Value, Bar: got[i].Bar}
		r.Passed = math.Abs(r.Got-r.Value) <= r.Bar+r.Accuracy // not so for NaN
		out.Readings = append(out.Readings, r)
	}
	return out
}

// Run computes cases side by side and gives their outcomes in order. tell hears
// the name of each as it begins, from several goroutines; nil: nobody listens. The
// error is that of the context.
func Run(ctx context.Context, cases []Case, tell func(name string)) ([]Outcome, error) {
	outcomes := make([]Outcome, len(cases))
	gate := make(chan struct{}, runtime.GOMAXPROCS(0))
	var group sync.WaitGroup
	for i := range cases {
		group.Go(func() {
			gate <- struct{}{}
			defer func() { <-gate }()
			if ctx.Err() != nil {
				return
			}
			if tell != nil {
				tell(cases[i].Name)
			}
			outcomes[i] = cases[i].run(ctx)
		})
	}
	group.Wait()
	return outcomes, ctx.Err()
}
