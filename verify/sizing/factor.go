package sizing

import (
	"context"
	"strings"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
)

// Factor measures the stress concentration factor under one load. reference is
// the nominal stress under a unit load of the part as given, to which the peak
// stress is referred while the load stays; 0: of the part measured.
func Factor(load scf.Load, reference float64) Measure {
	return func(ctx context.Context, p *specimen.Part, e Effort) (Reading, error) {
		f, err := finding(ctx, p, load, e)
		if err != nil {
			return Reading{}, err
		}
		r := reading(f)
		r.Value, r.Uncertainty = r.Factor, r.FactorBar
		r.Peak = r.Factor * ratio(f, reference)
		return r, nil
	}
}

// PeakStress measures the highest stress under one load that stays the same
// while the dimensions change: factor times the nominal stress, which is stress
// where the nominal stress under a unit load is reference.
func PeakStress(load scf.Load, stress, reference float64) Measure {
	return func(ctx context.Context, p *specimen.Part, e Effort) (Reading, error) {
		f, err := finding(ctx, p, load, e)
		if err != nil {
			return Reading{}, err
		}
		r := reading(f)
		r.Peak = r.Factor * ratio(f, reference)
		r.Value = r.Peak * stress
		r.Uncertainty = r.FactorBar * ratio(f, reference) * stress
		return r, nil
	}
}

func ratio(f *verify.Finding, reference float64) float64 {
	if reference == 0 {
		return 1
	}
	return f.Load.Nominal.Net / reference
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
