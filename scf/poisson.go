package scf

import (
	"fmt"
	"math"
)

// warnPoisson warns where Poisson's ratio is far from the 0.3 that charts of
// round bars are drawn for. It matters in tension and bending, not in torsion.
func warnPoisson(values []Value, load Load, opt Options) []Value {
	if load == Torsion || math.Abs(opt.Nu-0.3) <= 0.05 {
		return values
	}
	for i := range values {
		values[i].Warnings = append(values[i].Warnings,
			fmt.Sprintf("ν = %g: the factor of a round bar depends on Poisson's ratio, the source is for about 0.3", opt.Nu))
	}
	return values
}
