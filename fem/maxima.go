package fem

import (
	"math"
	"sort"
)

// Quantity is a number read from the stress of a surface.
type Quantity func(SurfacePoint) float64

// Maxima finds the local maxima of a quantity along the given sides, largest
// first. They are sought on the curve itself: every edge is sampled a few times
// per degree of freedom, and each sample that tops its neighbours is refined
// between them, so that a peak inside an edge is found as well as one at a node.
// Ends of a chain of sides count as maxima when the quantity falls away from
// them.
func (s *Solution) Maxima(sides []int, of Quantity) []SurfacePoint {
	var found []SurfacePoint
	for _, chain := range s.chains(sides) {
		found = append(found, s.chainMaxima(chain, of)...)
	}
	sort.SliceStable(found, func(i, j int) bool { return of(found[i]) > of(found[j]) })
	return found
}

// chains lists the boundary edges of the sides in order, cut wherever one does
// not begin where the last one ended.
func (s *Solution) chains(sides []int) [][]int {
	m := s.Problem.Shape.Mesh
	wanted := make(map[int]bool, len(sides))
	for _, side := range sides {
		wanted[side] = true
	}
	var chains [][]int
	last := int32(-1)
	for i, e := range m.Boundary {
		if !wanted[int(e.Side)] {
			continue
		}
		corners := m.Triangles[e.Triangle]
		from, to := corners[(e.Opposite+1)%3], corners[(e.Opposite+2)%3]
		if from != last {
			chains = append(chains, nil)
		}
		chains[len(chains)-1] = append(chains[len(chains)-1], i)
		last = to
	}
	return chains
}

// A sample is a place on an edge with the value there.
type sample struct {
	edge  int
	s     float64
	value float64
}

// A place is a sampled point of a chain. Where two edges meet it has a sample
// on each of them, whose values differ by the error of the solution, and a
// maximum near by may lie on either.
type place struct {
	samples []sample
	value   float64 // the larger one
}

func (s *Solution) places(chain []int, of Quantity) (places []place, step float64) {
	per := 2*s.Problem.Shape.Element.Order + 1
	for i, edge := range chain {
		for k := range per + 1 {
			at := float64(k) / float64(per)
			here := sample{edge, at, of(s.Surface(edge, at))}
			if k == 0 && i > 0 {
				joint := &places[len(places)-1]
				joint.samples = append(joint.samples, here)
				joint.value = math.Max(joint.value, here.value)
				continue
			}
			places = append(places, place{[]sample{here}, here.value})
		}
	}
	return places, 1 / float64(per)
}

func (s *Solution) chainMaxima(chain []int, of Quantity) []SurfacePoint {
	places, step := s.places(chain, of)
	var found []SurfacePoint
	for i, here := range places {
		if i > 0 && here.value < places[i-1].value || i+1 < len(places) && here.value <= places[i+1].value {
			continue
		}
		best := s.refine(here.samples[0], step, of)
		for _, other := range here.samples[1:] {
			if p := s.refine(other, step, of); of(p) > of(best) {
				best = p
			}
		}
		found = append(found, best)
	}
	return found
}

// refine improves a sampled maximum within its edge by golden sections.
func (s *Solution) refine(at sample, step float64, of Quantity) SurfacePoint {
	a, b := math.Max(0, at.s-step), math.Min(1, at.s+step)
	ratio := (math.Sqrt(5) - 1) / 2
	x1, x2 := b-ratio*(b-a), a+ratio*(b-a)
	f1, f2 := of(s.Surface(at.edge, x1)), of(s.Surface(at.edge, x2))
	// The value near a maximum is flat: 1e-5 of an edge leaves about 1e-10 of it.
	for b-a > 1e-5 {
		if f1 > f2 {
			b, x2, f2 = x2, x1, f1
			x1 = b - ratio*(b-a)
			f1 = of(s.Surface(at.edge, x1))
		} else {
			a, x1, f1 = x1, x2, f2
			x2 = a + ratio*(b-a)
			f2 = of(s.Surface(at.edge, x2))
		}
	}
	best := at
	for _, c := range []sample{{at.edge, x1, f1}, {at.edge, x2, f2}} {
		if c.value > best.value {
			best = c
		}
	}
	return s.Surface(at.edge, best.s)
}
