package verify

import (
	"sync"

	"notchproof/verify/specimen"
)

// Gradings of the two meshes that a ladder begins with: the first as coarse as
// high orders like it, the second a little coarser and graded to joints by another
// share, so that no element of the one is one of the other. Their distance is then
// about the larger error of the two, the one that is not stated.
func firstGrading() grading  { return grading{perQuarter: 6, growth: 0.6, joint: 0.2} }
func secondGrading() grading { return grading{perQuarter: 5, growth: 0.7, joint: 0.15} }

// longer is by how many of their sizes the ends of the second mesh's part are
// longer. Where the place of an end matters to the factor, the second mesh has
// another one.
const longer = 0.5

// A pair is the two meshes that a ladder is solved on, made when first asked
// for; all loads of a part share the first pair.
type pair struct {
	part, long *specimen.Part
	first      func() (*shape, error)
	second     func() (*shape, error)
}

func newPair(p, long *specimen.Part, first, second grading) *pair {
	return &pair{
		part: p, long: long,
		first:  sync.OnceValues(func() (*shape, error) { return newShape(p, first) }),
		second: sync.OnceValues(func() (*shape, error) { return newShape(long, second) }),
	}
}
