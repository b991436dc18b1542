package strength

import (
	"fmt"
	"math"

	"notchproof/scf"
	"notchproof/verify"
)

// Cover is what the safety has to make up for, as far as the factors go.
type Cover struct {
	Factor   float64 // largest relative bar of the computed factors
	Handbook float64 // what the published fits are good for, the worst of them; 0: none in range
	Spread   float64 // largest relative difference between handbook and computed factor
	InChart  bool    // published fits cover this very shape under every load
	Without  []scf.Load
	// From and To are the usual range of safety against the uncertainty of
	// factor, load and material taken together. Common practice, no substitute
	// for the applicable code.
	From, To float64
	AndMore  bool // To is no end
}

// Usual spreads of the required safety. Common practice.
const (
	chartFrom, chartTo     = 1.5, 2.0 // the shape is exactly a chart's
	similarFrom, similarTo = 2.0, 2.5 // and more: the factor came from a similar shape or an old experiment
)

func cover(checked *verify.Result) Cover {
	var c Cover
	for i := range checked.Findings {
		f := &checked.Findings[i]
		e := f.Computed.Factor
		c.Factor = math.Max(c.Factor, e.Uncertainty/e.Value)
		best, ok := bestInRange(f.Handbook)
		if !ok {
			c.Without = append(c.Without, f.Load.Name)
			continue
		}
		c.Handbook = math.Max(c.Handbook, best.Value.Accuracy)
		c.Spread = math.Max(c.Spread, math.Abs(best.Difference))
	}
	c.InChart = len(c.Without) == 0
	c.From, c.To = chartFrom, chartTo
	if !c.InChart {
		c.From, c.To, c.AndMore = similarFrom, similarTo, true
	}
	return c
}

// decide holds the smallest safety against the one that is asked for.
func (r *Result) decide() {
	q, g := &r.Question, r.Governing()
	switch {
	case q.Required == 0:
		r.Decision = NotAsked
	case r.Pressed*q.Required > r.Strength && g.Safety.Low >= q.Required:
		r.because("the notch is pressed with %v, and no compressive strength is known that would bear it %.3g times", q.Material.Tensile.Like(r.Pressed), q.Required)
	case g.Safety.Low >= q.Required:
		r.Decision = Met
		r.because("the smallest safety, %.3g on the %s, is not below the %.3g asked for", g.Safety.Value, g.Name, q.Required)
	case g.Safety.High < q.Required:
		r.Decision = NotMet
		r.because("the smallest safety, %.3g on the %s, is below the %.3g asked for", g.Safety.Value, g.Name, q.Required)
		if s := r.Section; s != nil && !r.Brittle && s.Plastic >= q.Required {
			r.because("the net section as a whole flows at %.3g times the loads at the earliest: whether the peak may be shed by yielding is for the applicable code to say", s.Plastic)
		}
	default:
		r.because("the smallest safety, %.4g to %.4g on the %s, is too close to the %.4g asked for to be told from it", g.Safety.Low, g.Safety.High, g.Name, q.Required)
	}
}

func (r *Result) because(format string, args ...any) {
	r.Because = append(r.Because, fmt.Sprintf(format, args...))
}
