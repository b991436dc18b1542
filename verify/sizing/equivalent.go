package sizing

import (
	"context"
	"math"
	"strings"

	"notchproof/scf"
	"notchproof/verify"
	"notchproof/verify/specimen"
	"notchproof/verify/strength"
)

// Equivalent measures the equivalent stress in MPa at the place that governs,
// under the loads of a strength question, which stay the same while the
// dimensions change: von Mises, of brittle materials the largest principal
// stress. The factor of its readings is that stress over the one that the
// nominal stresses of the net section give. The part of the question is
// replaced.
func Equivalent(q strength.Question) Measure {
	return func(ctx context.Context, p *specimen.Part, e Effort) (Reading, error) {
		now := q
		now.Part = p
		now.Options = verify.Options{Target: e.Target, Workers: e.Workers}
		if e.Order > 0 {
			return roughEquivalent(ctx, now, e)
		}
		result, err := strength.Run(ctx, now)
		if err != nil {
			return Reading{}, err
		}
		if !result.Settled {
			return Reading{Value: math.NaN(), Uncertainty: math.Inf(1), Why: strings.Join(result.Because, "; ")}, nil
		}
		g := result.Governing()
		nominal := nominalEquivalent(result)
		return Reading{
			Value: g.Equivalent, Uncertainty: g.Uncertainty, Where: g.Name,
			Factor: g.Equivalent / nominal, FactorBar: g.Uncertainty / nominal,
			Decided: true, Why: strings.Join(result.Warnings, "; "),
		}, nil
	}
}

// roughEquivalent is the same from one solve of each load.
func roughEquivalent(ctx context.Context, q strength.Question, e Effort) (Reading, error) {
	result, err := strength.Rough(ctx, q, e.Order)
	if err != nil {
		return Reading{}, err
	}
	g, nominal := result.Governing(), nominalEquivalent(result)
	return Reading{
		Value: g.Equivalent, Uncertainty: e.allowance() * g.Equivalent, Where: g.Name,
		Factor: g.Equivalent / nominal, FactorBar: e.allowance() * g.Equivalent / nominal,
		Decided: true, Rough: true,
	}, nil
}

// nominalEquivalent adds the nominal stresses of the net section as if they
// met in one point.
func nominalEquivalent(r *strength.Result) float64 {
	direct, shear := 0.0, 0.0
	for _, n := range r.Nominal {
		if n.Load == scf.Torsion {
			shear += math.Abs(n.Stress)
		} else {
			direct += math.Abs(n.Stress)
		}
	}
	if r.Brittle {
		return direct/2 + math.Hypot(direct/2, shear)
	}
	return math.Hypot(direct, math.Sqrt(3)*shear)
}
