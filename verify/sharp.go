package verify

import (
	"fmt"
	"math"
	"strings"
)

// endless tells that a corner leaves the notch without a factor.
func endless(list []Corner) bool {
	for _, c := range list {
		if c.OnNotch && !c.Bounded() {
			return true
		}
	}
	return false
}

// sharp says what the concave corners without a radius do. One that the notch
// runs into leaves no factor to settle; another is none of the factor's business,
// but is no better for that.
func (f *Finding) sharp(unit string) (settled bool) {
	for _, c := range f.Corners {
		switch {
		case !c.OnNotch || c.Bounded():
			f.Warnings = append(f.Warnings, strings.Join(c.Says(unit), "; "))
		default:
			f.Because = append(f.Because, c.Says(unit)...)
		}
	}
	if endless(f.Corners) {
		f.because("%s", remedy)
		return false
	}
	return true
}

// remedy is what to do about a sharp corner.
const remedy = "give the corner the radius that it is made with: then it has a factor"

// Says tells in words what the stress at a corner does, and how that is known.
// unit is that of the part's lengths.
func (c Corner) Says(unit string) []string {
	where := fmt.Sprintf("the concave corner at x = %.6g, y = %.6g (%.4g° of material) has no radius", c.X, c.Y, c.Degrees)
	switch {
	case c.Bounded():
		where += ", but this load leaves the stress there bounded"
	case math.IsNaN(c.Measured) && math.IsNaN(c.Wedge):
		where += ": whether the stress there has a bound could not be told, and there is no factor"
	case c.OnNotch:
		where += ": the stress there grows without bound, and there is no factor"
	default:
		where += ": the stress there grows without bound, and there is no factor for it"
	}
	says := []string{where}
	if exponents := c.exponents(unit); exponents != "" {
		says = append(says, "it goes like a power of the distance: "+exponents)
	}
	return says
}

// exponents holds the measured exponent beside that of the theory.
func (c Corner) exponents(unit string) string {
	var words []string
	if !math.IsNaN(c.Measured) {
		far := strings.TrimSpace(fmt.Sprintf("%.2g %s", c.To, unit))
		words = append(words, fmt.Sprintf("measured %s (%.2g to %s from the corner)", c.measured(), c.From, far))
	}
	switch {
	case !math.IsNaN(c.Wedge):
		words = append(words, c.Mode.source()+" "+signed(c.Wedge, 4))
	case len(words) > 0:
		words = append(words, "on the axis it is the tip of a cone, for which no wedge speaks")
	}
	return strings.Join(words, ", ")
}

// measured is the exponent with the digits that its uncertainty leaves.
func (c Corner) measured() string {
	decimals := int(math.Max(1, math.Min(5, 1-math.Floor(math.Log10(c.Uncertainty)))))
	return fmt.Sprintf("%s ± %.*f", signed(c.Measured, decimals), decimals, c.Uncertainty)
}

// signed writes a number with the sign that print has for minus.
func signed(v float64, decimals int) string {
	return strings.Replace(fmt.Sprintf("%.*f", decimals, v), "-", "−", 1)
}

// growthLimit is what the measured exponent may be off the theory's, relative,
// beside its own uncertainty.
const growthLimit = 0.02

// growthChecks holds the measured exponents at the notch against the theory.
func growthChecks(list []Corner) []Check {
	var checks []Check
	for _, c := range list {
		if !c.OnNotch || math.IsNaN(c.Measured) || math.IsNaN(c.Wedge) {
			continue
		}
		checks = append(checks, below(fmt.Sprintf("growth at the sharp corner x = %.6g against its wedge", c.X),
			math.Abs(c.Measured-c.Wedge), growthLimit*math.Abs(c.Wedge)+c.Uncertainty))
	}
	return checks
}
