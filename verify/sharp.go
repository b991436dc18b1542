package verify

import (
	"fmt"
	"math"
	"slices"

	"notchproof/mesh/outline"
	"notchproof/scf"
	"notchproof/verify/specimen"
)

// sharp names the concave corners without a radius. One that the notch runs
// into leaves no factor to settle; another is none of the factor's business,
// but is no better for that.
func (f *Finding) sharp(p *specimen.Part) (settled bool) {
	settled = true
	for _, c := range p.Sharp {
		where := fmt.Sprintf("the concave corner at x = %.6g, y = %.6g (%.4g° of material) has no radius: the stress there grows without bound%s, and there is no factor",
			c.At.X, c.At.Y, c.Degrees, growth(f.Load, c))
		if slices.Contains(p.Notch, c.Before) || slices.Contains(p.Notch, c.After) {
			f.because("%s: give it the radius that it is made with", where)
			settled = false
			continue
		}
		f.Warnings = append(f.Warnings, where+" for it")
	}
	return settled
}

// growth is the power of the distance by which the stress grows: in the plane
// λ − 1 with the least λ of M. L. Williams, J. Appl. Mech. 19 (1952) 526; in
// torsion π/w − 1, from the harmonic function r^(π/w) cos(πφ/w) on a wedge of
// the angle w with free flanks. Close to a corner a body of revolution is plane,
// save on its axis.
func growth(l *specimen.Load, c outline.Corner) string {
	degrees := math.Min(c.Degrees, 360)
	if c.At.Y == 0 {
		return ""
	}
	lambda := 180 / degrees
	if !l.Shear {
		lambda, _ = scf.Williams(360 - degrees)
	}
	return fmt.Sprintf(" like distance^%.3f", lambda-1)
}
