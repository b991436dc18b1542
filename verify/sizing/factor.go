package sizing

import (
	"context"
	"strings"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// Factor measures the stress concentration factor under one load.
func Factor(load scf.Load) Measure {
	return func(ctx context.Context, p *specimen.Part, e Effort) (Reading, error) {
		r, _, err := factor(ctx, p, load, e)
		r.Value, r.Uncertainty = r.Factor, r.FactorBar
		return r, err
	}
}

// PeakStress measures the largest stress at the notch under one load that stays
// the same while the dimensions change. It gives the nominal stress in a part
// whose nominal stress under a unit load (scf.Nominal.Net) is reference; the
// unit of stress is the caller's.
func PeakStress(load scf.Load, nominal, reference float64) Measure {
	return func(ctx context.Context, p *specimen.Part, e Effort) (Reading, error) {
		r, l, err := factor(ctx, p, load, e)
		if err != nil {
			return r, err
		}
		stress := nominal * l.Nominal.Net / reference
		r.Value, r.Uncertainty = r.Factor*stress, r.FactorBar*stress
		return r, nil
	}
}

// factor reads the factor of a part under one load.
func factor(ctx context.Context, p *specimen.Part, load scf.Load, e Effort) (Reading, *specimen.Load, error) {
	if e.Order > 0 {
		return rough(ctx, p, load, e)
	}
	result, err := verify.Run(ctx, p, []scf.Load{load}, verify.Options{Target: e.Target, Workers: e.Workers})
	if err != nil {
		return Reading{}, nil, err
	}
	f := &result.Findings[0]
	k := f.Computed.Factor
	r := Reading{Factor: k.Value, FactorBar: k.Uncertainty, Decided: f.Verdict != verify.Undecided, Why: strings.Join(f.Warnings, "; ")}
	if !r.Decided {
		r.Why = strings.Join(f.Because, "; ")
	}
	return r, f.Load, nil
}

// rough reads the factor off one solve.
func rough(ctx context.Context, p *specimen.Part, load scf.Load, e Effort) (Reading, *specimen.Load, error) {
	value, err := verify.Rough(ctx, p, load, e.Order, e.Workers)
	if err != nil {
		return Reading{}, nil, err
	}
	l, _ := p.Load(load)
	return Reading{Factor: value, FactorBar: e.allowance() * value, Decided: true, Rough: true}, l, nil
}
