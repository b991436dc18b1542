package fem

import "notchproof/mesh/lagrange"

// SamplePoints are the points of a triangle at which stresses of order 1 and 2
// are usually read: the centroid, where the constant stress of order 1 is right
// to one order more than elsewhere, and the three points of the cubature rule of
// degree 2, where order 2 comes closest to its linear part (the idea: J. Barlow,
// Int. J. Numer. Meth. Eng. 10 (1976) 243, from memory; on triangles of any shape
// the gain is a smaller error, not a higher order). Other orders panic.
func SamplePoints(order int) [][2]float64 {
	const a, b = 1. / 6, 2. / 3
	switch order {
	case 1:
		return [][2]float64{{1. / 3, 1. / 3}}
	case 2:
		return [][2]float64{{a, a}, {b, a}, {a, b}} // close to corners 0, 1, 2
	}
	panic("fem: sample points of an order above 2")
}

// NodalStress gives at every node the mean of the stresses that the triangles
// around it have there, the form in which meshes of order 1 and 2 are usually
// shown. A triangle's stress at its nodes is the polynomial of degree order−1
// through its sample points. Every triangle counts the same, whatever its size
// (common practice), and all six stresses are averaged on the drawn plane:
// principal stresses, which have directions of their own in every triangle, are
// to be taken from the mean.
//
// A stress that is constant, and at order 2 on straight triangles one that is
// linear, comes out exactly. At nodes on the boundary the triangles lie to one
// side, and the error falls with h^order only. Orders above 2 panic.
func (s *Solution) NodalStress() []Stress {
	shape := s.Problem.Shape
	points, weights := SamplePoints(shape.Element.Order), carried(shape.Element)
	mean := make([]Stress, len(shape.Nodes))
	count := make([]float64, len(shape.Nodes))
	sampled := make([]Stress, len(points))
	for tri := range shape.Mesh.Triangles {
		for q, x := range points {
			sampled[q] = s.Stress(tri, x[0], x[1])
		}
		for i, node := range shape.Triangle(tri) {
			count[node]++
			for q, w := range weights[i] {
				mean[node].add(w, sampled[q])
			}
		}
	}
	for node, n := range count {
		var m Stress
		m.add(1/n, mean[node])
		mean[node] = m
	}
	return mean
}

// carried gives, node by node, the weights that carry stresses from the sample
// points to the node: the constant, or the linear function of the barycentric
// coordinates that is 1 at the sample point of corner q (λ_q = 2/3) and 0 at the
// two others (λ_q = 1/6), which is 2λ_q − 1/3.
func carried(t *lagrange.Triangle) [][]float64 {
	weights := make([][]float64, t.Count)
	for i, x := range t.Nodes {
		if t.Order == 1 {
			weights[i] = []float64{1}
			continue
		}
		for _, l := range [3]float64{1 - x[0] - x[1], x[0], x[1]} {
			weights[i] = append(weights[i], 2*l-1./3)
		}
	}
	return weights
}

// add adds w times another stress.
func (s *Stress) add(w float64, b Stress) {
	s.XX += float64(w * b.XX)
	s.YY += float64(w * b.YY)
	s.ZZ += float64(w * b.ZZ)
	s.XY += float64(w * b.XY)
	s.XZ += float64(w * b.XZ)
	s.YZ += float64(w * b.YZ)
}
