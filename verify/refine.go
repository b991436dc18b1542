package verify

import (
	"math"
	"sort"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem"
	"notchproof/mesh"
	"notchproof/verify/specimen"
)

// Work limits of a ladder.
const (
	mostOfRound = 200_000 // unknowns of a rung of the ladder, about half a GB of factor
	bulk        = 0.8     // share of the estimated influence on the factor that is refined
	finer       = 0.35    // size of a refined element, as a share of what it was
)

func tooLarge(s *shape, order int, l *specimen.Load) bool {
	return estimateUnknowns(len(s.mesh.Triangles), order, l.Model.Unknowns()) > mostOfRound
}

// refined is the next pair: finer where the error of this one's last rung sits
// that reaches the peak. It is nil where nothing can be marked or the work limit
// would be passed.
func (c *climb) refined(p *pair, s *shape, out *Computed) (*pair, error) {
	if len(out.peaks) == 0 {
		return nil, nil
	}
	spots := marked(s, out)
	first, second := s.grading, secondGrading()
	first.spots = append(append([]mesh.SpotWish(nil), s.grading.spots...), spots...)
	// The second mesh is finer there by as much as tells: what is left of the
	// error at a point that is not smooth goes with the size around it, and would
	// be the same on both.
	for _, spot := range first.spots {
		second.spots = append(second.spots, mesh.SpotWish{At: spot.At, Size: spot.Size / 2})
	}
	next := newPair(p.part, p.long, first, second)
	made, err := next.first()
	if err != nil || len(made.mesh.Triangles) <= len(s.mesh.Triangles) || tooLarge(made, firstOrder+enoughRungs+1, c.load) {
		return nil, err
	}
	return next, nil
}

// marked wishes for smaller elements where the error is: in the elements that
// hold most of its influence on the factor.
func marked(s *shape, out *Computed) []mesh.SpotWish {
	peak := out.peaks[0].At
	parts := influence(s, out.Last, peak)
	order := make([]int, len(parts))
	total := 0.0
	for i := range order {
		order[i] = i
		total += parts[i]
	}
	sort.SliceStable(order, func(a, b int) bool { return parts[order[a]] > parts[order[b]] })
	var spots []mesh.SpotWish
	sum := 0.0
	for _, tri := range order {
		if sum >= bulk*total {
			break
		}
		sum += parts[tri]
		at, size := element(s.mesh, tri)
		spots = append(spots, mesh.SpotWish{At: at, Size: finer * size})
	}
	return spots
}

// influence estimates how much of each element's error reaches the factor. The
// error is seen in what the highest degree has brought. An element with such a
// stress acts on the rest like one with an initial stress, the effect of which
// falls with the square of distance (the nucleus of strain in the plane). It
// guides the refinement and enters no bar.
func influence(s *shape, sol *fem.Solution, peak r2.Vec) []float64 {
	list := sol.TopDegree()
	for tri, top := range list {
		at, size := element(s.mesh, tri)
		reach := size / (size + r2.Norm(r2.Sub(at, peak)))
		list[tri] = top * reach * reach
		if math.IsNaN(list[tri]) {
			list[tri] = 0
		}
	}
	return list
}

// element gives the centroid of a triangle and the length of its longest side.
func element(m *mesh.Mesh, tri int) (at r2.Vec, size float64) {
	c := m.Triangles[tri]
	for k := range 3 {
		p, q := m.Points[c[k]], m.Points[c[(k+1)%3]]
		at = r2.Add(at, r2.Scale(1.0/3, p))
		size = math.Max(size, r2.Norm(r2.Sub(q, p)))
	}
	return at, size
}
