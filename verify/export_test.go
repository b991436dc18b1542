package verify

import (
	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/verify/specimen"
)

// SectionAt samples a straight section of any solution, for the problems with
// known stresses.
func SectionAt(s *fem.Solution, from, into r2.Vec, depth float64) (SectionPoint, bool) {
	return line{s, &specimen.Load{}, from, into}.at(depth)
}
