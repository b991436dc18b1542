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
		f, err := finding(ctx, p, load, e)
		if err != nil {
			return Reading{}, err
		}
		r := reading(f)
		r.Value, r.Uncertainty = r.Factor, r.FactorBar
		return r, nil
	}
}

// PeakStress measures the largest stress at the notch under one load that stays
// the same while the dimensions change. It gives the nominal stress in a part
// whose nominal stress under a unit load (scf.Nominal.Net) is reference; the
// unit of stress is the caller's.
func PeakStress(load scf.Load, nominal, reference float64) Measure {
	return func(ctx context.Context, p *specimen.Part, e Effort) (Reading, error) {
		f, err := finding(ctx, p, load, e)
		if err != nil {
			return Reading{}, err
		}
		r := reading(f)
		stress := nominal * f.Load.Nominal.Net / reference
		r.Value, r.Uncertainty = r.Factor*stress, r.FactorBar*stress
		return r, nil
	}
}

func finding(ctx context.Context, p *specimen.Part, load scf.Load, e Effort) (*verify.Finding, error) {
	result, err := verify.Run(ctx, p, []scf.Load{load}, verify.Options{Target: e.Target, Workers: e.Workers})
	if err != nil {
		return nil, err
	}
	return &result.Findings[0], nil
}

// reading takes the factor off a finding.
func reading(f *verify.Finding) Reading {
	e := f.Computed.Factor
	r := Reading{Factor: e.Value, FactorBar: e.Uncertainty, Decided: f.Verdict != verify.Undecided}
	if !r.Decided {
		r.Why = strings.Join(f.Because, "; ")
	} else {
		r.Why = strings.Join(f.Warnings, "; ")
	}
	return r
}
