package fem

import (
	"math"
	"sort"

	"gonum.org/v1/gonum/spatial/r2"

	"notchproof/fem/cubature"
)

// Resultant is what the stresses on a cut x = const add up to: the force along
// x, the force across (what does work on a rigid shift along y), the moment of
// the force along x about y = 0, and for torsion the torque. Per unit thickness for plates, per radian for bodies of
// revolution (for the bending harmonic per ∫cos²θ dθ, the moment being that of
// the amplitude about the axis: ∫σ_x r² dr).
type Resultant struct{ Axial, Transverse, Moment, Torque float64 }

// Section integrates the stresses across the cut at x.
func (s *Solution) Section(x float64) Resultant {
	var sum Resultant
	points, weights := cubature.Interval(s.Problem.Shape.Element.Order + 3)
	marks := s.crossings(x)
	for i := 1; i < len(marks); i++ {
		low, high := marks[i-1], marks[i]
		if high-low < 1e-12*(math.Abs(low)+math.Abs(high)) {
			continue
		}
		tri, _, _, ok := s.Find(r2.Vec{X: x, Y: (low + high) / 2})
		if !ok {
			continue
		}
		for q, t := range points {
			y := low + t*(high-low)
			xi, eta, _ := s.Problem.Shape.Locate(tri, r2.Vec{X: x, Y: y})
			st := s.Amplitude(tri, xi, eta)
			w := weights[q] * (high - low)
			if s.revolved {
				w *= y
			}
			sum.Axial += w * st.XX
			sum.Transverse += w * (s.kin.Displacement[1][1]*st.XY + s.kin.Displacement[2][1]*st.XZ)
			sum.Moment += w * st.XX * y
			sum.Torque += w * st.XZ * y
		}
	}
	return sum
}

// crossings lists, in rising order, where the cut meets edges of triangles.
// Bent edges are met where their own polynomial crosses the cut, found between
// samples of opposite sign by halving.
func (s *Solution) crossings(x float64) []float64 {
	shape := s.Problem.Shape
	var marks []float64
	for i, c := range shape.Mesh.Triangles {
		for k := range 3 {
			a, b := c[(k+1)%3], c[(k+2)%3]
			neighbour := shape.Mesh.Neighbors[i][k]
			if neighbour >= 0 && b < a {
				continue // the other side of the edge does it
			}
			p, q := shape.Mesh.Points[a], shape.Mesh.Points[b]
			if neighbour < 0 && !shape.Straight[i] {
				marks = append(marks, s.bentCrossings(i, k, x)...)
				continue
			}
			if (p.X-x)*(q.X-x) > 0 {
				continue
			}
			if p.X == q.X {
				marks = append(marks, p.Y, q.Y)
				continue
			}
			marks = append(marks, p.Y+(q.Y-p.Y)*(x-p.X)/(q.X-p.X))
		}
	}
	sort.Float64s(marks)
	return marks
}

func (s *Solution) bentCrossings(tri, k int, x float64) (marks []float64) {
	at := func(t float64) r2.Vec {
		var bary [3]float64
		bary[(k+1)%3], bary[(k+2)%3] = 1-t, t
		return s.Problem.Shape.At(tri, bary[1], bary[2])
	}
	const pieces = 16
	for i := range pieces {
		lo, hi := float64(i)/pieces, float64(i+1)/pieces
		from, to := at(lo).X-x, at(hi).X-x
		if from == 0 {
			marks = append(marks, at(lo).Y)
			continue
		}
		if to == 0 && i == pieces-1 {
			marks = append(marks, at(hi).Y)
		}
		if from*to >= 0 {
			continue
		}
		for range 50 {
			mid := (lo + hi) / 2
			if (at(mid).X-x)*from > 0 {
				lo = mid
			} else {
				hi = mid
			}
		}
		marks = append(marks, at((lo+hi)/2).Y)
	}
	return marks
}
