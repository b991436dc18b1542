package fem

import (
	"math"
	"slices"
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
	for _, c := range s.chains(sides) {
		found = append(found, s.chainMaxima(c, of)...)
	}
	sort.SliceStable(found, func(i, j int) bool { return of(found[i]) > of(found[j]) })
	return found
}

// A chain is a run of boundary edges, each beginning where the one before it
// ends. A closed one ends where it began.
type chain struct {
	edges  []int
	closed bool
}

// chains lists the boundary edges of the sides in order, cut wherever the
// boundary leaves those sides.
func (s *Solution) chains(sides []int) []chain {
	m := s.Problem.Shape.Mesh
	wanted := make(map[int]bool, len(sides))
	for _, side := range sides {
		wanted[side] = true
	}
	var runs [][]int
	for i, e := range m.Boundary {
		if !wanted[int(e.Side)] {
			continue
		}
		if n := len(runs) - 1; n >= 0 && s.follows(runs[n], []int{i}) {
			runs[n] = append(runs[n], i)
		} else {
			runs = append(runs, []int{i})
		}
	}
	return s.joinUp(runs)
}

// joinUp puts together what the first side of a loop has cut.
func (s *Solution) joinUp(runs [][]int) []chain {
	var chains []chain
	for len(runs) > 0 {
		last := len(runs) - 1
		run := runs[last]
		runs = runs[:last]
		before := slices.IndexFunc(runs, func(r []int) bool { return s.follows(run, r) })
		if before >= 0 {
			runs[before] = append(run, runs[before]...)
			continue
		}
		chains = append(chains, chain{run, s.follows(run, run)})
	}
	slices.Reverse(chains)
	return chains
}

// follows tells whether one run begins where another ends.
func (s *Solution) follows(before, after []int) bool {
	_, end := s.edgeCorners(before[len(before)-1])
	start, _ := s.edgeCorners(after[0])
	return start == end
}

// edgeCorners are the mesh points at the ends of a boundary edge, in its
// direction.
func (s *Solution) edgeCorners(edge int) (from, to int32) {
	e := s.Problem.Shape.Mesh.Boundary[edge]
	corners := s.Problem.Shape.Mesh.Triangles[e.Triangle]
	return corners[(e.Opposite+1)%3], corners[(e.Opposite+2)%3]
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

func (s *Solution) places(c chain, of Quantity) (places []place, step float64) {
	per := 2*s.Problem.Shape.Element.Order + 1
	join := func(p *place, here sample) {
		p.samples = append(p.samples, here)
		p.value = math.Max(p.value, here.value)
	}
	for i, edge := range c.edges {
		for k := range per + 1 {
			at := float64(k) / float64(per)
			here := sample{edge, at, of(s.Surface(edge, at))}
			switch {
			case k == 0 && i > 0:
				join(&places[len(places)-1], here)
			case k == per && c.closed && i == len(c.edges)-1:
				join(&places[0], here)
			default:
				places = append(places, place{[]sample{here}, here.value})
			}
		}
	}
	return places, 1 / float64(per)
}

func (s *Solution) chainMaxima(c chain, of Quantity) []SurfacePoint {
	places, step := s.places(c, of)
	n := len(places)
	var found []SurfacePoint
	for i, here := range places {
		if (i > 0 || c.closed) && here.value < places[(i+n-1)%n].value {
			continue
		}
		if (i+1 < n || c.closed) && here.value <= places[(i+1)%n].value {
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
	if len(found) == 0 {
		// The same value all around: any place will do.
		found = append(found, s.Surface(c.edges[0], 0))
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
