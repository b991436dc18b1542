package verify

import (
	"fmt"
	"math"

	"notchproof/verify/specimen"
)

// judge compares and comes to a verdict.
func (f *Finding) judge(p *specimen.Part, o Options) {
	e := f.Computed.Factor
	settled := f.settle(p, o)
	f.consult(p, settled)
	if claim := o.Claims[f.Load.Name]; claim != nil {
		tolerance := claimTolerance(claim.Factor, claim.LastDigit, claim.reading())
		f.Claim = &ClaimComparison{*claim, compare(claim.Factor, tolerance, e, settled)}
	}
	if !settled {
		return
	}
	f.Verdict = f.overall()
}

// consult holds the published factors against the computed one. Hints, which
// belong to neighbouring shapes, are out of range by nature.
func (f *Finding) consult(p *specimen.Part, settled bool) {
	if p.Family == nil {
		return
	}
	values := p.Family.Handbook(f.Load.Name, p.Dims, p.Options)
	values = append(values, p.Family.Hints(f.Load.Name, p.Dims, p.Options)...)
	for _, v := range values {
		c := HandbookComparison{v, compare(v.Factor, v.Accuracy*math.Abs(v.Factor), f.Computed.Factor, settled)}
		if settled && !v.InRange {
			c.Verdict = OutOfRange
		}
		f.Handbook = append(f.Handbook, c)
	}
}

// settle tells whether the computed factor may judge, and says why not.
func (f *Finding) settle(p *specimen.Part, o Options) bool {
	e := f.Computed.Factor
	if !f.sharp(p.Unit) {
		return false
	}
	settled := true
	if !e.Status.Settled() {
		f.because("the ladder has not converged: %s", e.Status)
		settled = false
	} else if e.Uncertainty > o.target()*e.Value {
		// A wide bar is still an honest one: comparisons take it into account.
		f.because("the uncertainty is %.2g %% of the factor, more than the %.2g %% asked for", 100*e.Uncertainty/e.Value, 100*o.target())
	}
	for _, c := range f.Checks {
		if !c.Passed {
			f.because("the check of the %s failed: %.3g against a limit of %.3g%s", c.Name, c.Value, c.Limit, c.remedy())
			settled = false
		}
	}
	return settled
}

// overall is the claim's verdict where there is one, else that of the handbook
// value in range with the best accuracy, the first of equals.
func (f *Finding) overall() Verdict {
	if f.Claim != nil {
		f.explain("the claim", f.Claim.Comparison)
		return f.Claim.Verdict
	}
	best := -1
	for i, h := range f.Handbook {
		if h.Value.InRange && (best < 0 || h.Value.Accuracy < f.Handbook[best].Value.Accuracy) {
			best = i
		}
	}
	if best >= 0 {
		f.explain(f.Handbook[best].Value.ID, f.Handbook[best].Comparison)
		return f.Handbook[best].Verdict
	}
	if len(f.Handbook) > 0 {
		f.because("%s", f.nothingInRange())
		return OutOfRange
	}
	f.because("there is no published factor for this shape and load")
	return NothingToCompare
}

// nothingInRange says why none of the published values may judge.
func (f *Finding) nothingInRange() string {
	for _, h := range f.Handbook {
		if !h.Value.Hint {
			return "no handbook value covers these proportions"
		}
	}
	return "there is no published factor for this shape and load, only hints from neighbouring shapes"
}

// explain says in words what a comparison rests on.
func (f *Finding) explain(who string, c Comparison) {
	e := f.Computed.Factor
	share := 100 * math.Abs(c.Difference)
	side := "higher"
	if c.Difference < 0 {
		side = "lower"
	}
	room := 100 * (c.Tolerance + e.Uncertainty) / e.Value
	switch {
	case c.Verdict == Agrees && share < 0.05:
		f.because("%s is the computed factor to 0.1 %%, within the %.1f %% that the two are good for", who, room)
	case c.Verdict == Agrees:
		f.because("%s is %.1f %% %s than the computed factor, within the %.1f %% that the two are good for", who, share, side, room)
	case c.Unsafe():
		f.because("%s is %.1f %% lower than the computed factor, on the unsafe side, and the two are only good for %.1f %%", who, share, room)
	default:
		f.because("%s is %.1f %% higher than the computed factor, on the safe side, and the two are only good for %.1f %%", who, share, room)
	}
}

func (f *Finding) because(format string, args ...any) {
	f.Because = append(f.Because, fmt.Sprintf(format, args...))
}
